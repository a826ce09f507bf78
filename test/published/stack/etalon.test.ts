/** Etalons: published values. Each row carries its source; see `check-rows.ts`. */
import { etalonFringes, etalonSpacing, etalonTransmittance } from '../../../src/stack/etalon.ts';
import { slabFractions } from '../../../src/stack/window.ts';
import { checkRows, row } from './check-rows.ts';

const fringes = (R: number) => etalonFringes({ R1: R, R2: R });
const spacing_GHz = (n: number, d_m: number): number =>
  etalonSpacing(d_m, n, n, 0, 1e-6, null).freeSpectralRange_Hz * 1e-9;

checkRows('Etalons', [
  row({
    id: 'fp-F-90',
    quantity: 'coefficient of finesse, R=0.9',
    inputs: { R: 0.9 },
    unit: '1',
    wanted: 360,
    tolerance: 1e-6,
    toleranceBasis: 'numerical or printed digits',
    source: 'Hecht 9.6',
    kind: 'exact',
    fromMemory: true,
    got: ({ R }) => fringes(R).coefficientOfFinesse,
  }),
  row({
    id: 'fp-f-90',
    quantity: 'finesse, R=0.9',
    inputs: { R: 0.9 },
    unit: '1',
    wanted: 29.8,
    tolerance: 0.05,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'Saleh & Teich / Hecht (about 30)',
    kind: 'published',
    fromMemory: false,
    got: ({ R }) => fringes(R).finesse,
  }),
  row({
    id: 'fp-f-50',
    quantity: 'finesse, R=0.5',
    inputs: { R: 0.5 },
    unit: '1',
    wanted: 4.44,
    tolerance: 0.005,
    toleranceBasis: 'numerical or printed digits',
    source: 'exact',
    kind: 'exact',
    fromMemory: true,
    got: ({ R }) => fringes(R).finesse,
  }),
  row({
    id: 'fp-f-4',
    quantity: 'contrast of an uncoated glass etalon, R=0.04',
    inputs: { R: 0.04 },
    unit: '1',
    wanted: 1.1736,
    tolerance: 5e-5,
    toleranceBasis: 'numerical or printed digits',
    source: 'exact ((1+R)/(1-R))^2',
    kind: 'exact',
    fromMemory: true,
    got: ({ R }) => fringes(R).contrast ?? Number.NaN,
  }),
  row({
    id: 'fp-fsr-1cm',
    quantity: 'free spectral range of a 1 cm air gap',
    inputs: { n_g: 1, d_cm: 1 },
    unit: 'GHz',
    wanted: 14.99,
    tolerance: 0.005,
    toleranceBasis: 'numerical or printed digits',
    source: 'textbook example (15 GHz)',
    kind: 'exact',
    fromMemory: false,
    got: ({ n_g, d_cm }) => spacing_GHz(n_g, d_cm * 1e-2),
  }),
  row({
    id: 'fp-Tmin',
    quantity: 'minimum transmittance, R=0.9',
    inputs: { R: 0.9 },
    unit: '%',
    wanted: 0.277,
    tolerance: 0.0005,
    toleranceBasis: 'numerical or printed digits',
    source: '1/(1+F)',
    kind: 'exact',
    fromMemory: true,
    got: ({ R }) => 100 * fringes(R).T_min,
  }),
  row({
    id: 'fp-mean',
    quantity: 'average of Airy transmittance over phase equals the incoherent sum, R=0.3',
    inputs: { R: 0.3 },
    unit: '1',
    wanted: 0.5384615384615384,
    tolerance: 1e-6,
    toleranceBasis: 'numerical or printed digits',
    source: 'identity',
    kind: 'exact',
    fromMemory: true,
    got: ({ R }) => {
      const steps = 1000;
      let sum = 0;
      for (let i = 0; i < steps; i++) sum += etalonTransmittance(fringes(R), (2 * Math.PI * i) / steps);
      // The mean of the fringes, and what the sum of intensities says beside it.
      return Math.abs(sum / steps - slabFractions(R, R, 1).T) < 1e-12 ? sum / steps : Number.NaN;
    },
  }),
  row({
    id: 'fp-laser',
    quantity: 'mode spacing of a cavity of length c/(2 GHz)',
    inputs: { d_m: 0.149896229 },
    unit: 'GHz',
    wanted: 1.0,
    tolerance: 1e-9,
    toleranceBasis: 'numerical or printed digits',
    source: 'exact',
    kind: 'exact',
    fromMemory: true,
    got: ({ d_m }) => spacing_GHz(1, d_m),
  }),
  row({
    id: 'fp-exact-finesse',
    quantity: 'ratio of the FWHM-defined finesse to pi sqrt(R)/(1-R) at R = 0.3',
    inputs: { R: 0.3 },
    unit: '1',
    wanted: 0.9218124202630648,
    tolerance: 1e-12,
    toleranceBasis: 'numerical or printed digits',
    source: 'definition',
    kind: 'exact',
    fromMemory: true,
    got: ({ R }) => (fringes(R).finesseFromWidth ?? Number.NaN) / fringes(R).finesse,
  }),
]);
