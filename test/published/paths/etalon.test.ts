/** Etalons: published values by the command line. Each row carries its source; see `one-shot-rows.ts`. */
import type { Answer } from '../../../src/answer/answer.ts';
import { checkOneShot, number } from './one-shot-rows.ts';

const finesseRatio = ({ window }: Answer): number =>
  number(window?.etalon.finesseFromWidth) / number(window?.etalon.finesse);

checkOneShot('Etalons', [
  {
    id: 'fp-F-90',
    quantity: 'coefficient of finesse, R=0.9',
    unit: '1',
    wanted: 360,
    tolerance: 1e-6,
    toleranceBasis: 'numerical or printed digits',
    source: 'Hecht 9.6',
    kind: 'exact',
    fromMemory: true,
    note: 'faces of reflectance 0.9 by an index of (1 + sqrt R)/(1 - sqrt R)',
    got: async ({ answer }) =>
      number(
        (await answer('vacuum n=37.973665961010255@1mm vacuum 1um')).window?.etalon.coefficientOfFinesse,
      ),
  },
  {
    id: 'fp-f-90',
    quantity: 'finesse, R=0.9',
    unit: '1',
    wanted: 29.8,
    tolerance: 0.05,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'Saleh & Teich / Hecht (about 30)',
    kind: 'published',
    fromMemory: false,
    got: async ({ answer }) =>
      number((await answer('vacuum n=37.973665961010255@1mm vacuum 1um')).window?.etalon.finesse),
  },
  {
    id: 'fp-f-50',
    quantity: 'finesse, R=0.5',
    unit: '1',
    wanted: 4.44,
    tolerance: 0.005,
    toleranceBasis: 'numerical or printed digits',
    source: 'exact',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) =>
      number((await answer('vacuum n=5.828427124746191@1mm vacuum 1um')).window?.etalon.finesse),
  },
  {
    id: 'fp-f-4',
    quantity: 'contrast of an uncoated glass etalon, R=0.04',
    unit: '1',
    wanted: 1.1736,
    tolerance: 5e-5,
    toleranceBasis: 'numerical or printed digits',
    source: 'exact ((1+R)/(1-R))^2',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) => number((await answer('vacuum n=1.5@1mm vacuum 1um')).window?.etalon.contrast),
  },
  {
    id: 'fp-fsr-1cm',
    quantity: 'free spectral range of a 1 cm air gap',
    unit: 'GHz',
    wanted: 14.99,
    tolerance: 0.005,
    toleranceBasis: 'numerical or printed digits',
    source: 'textbook example (15 GHz)',
    kind: 'exact',
    fromMemory: false,
    got: async ({ answer }) =>
      1e-9 * number((await answer('n=1.5 n=1@1cm n=1.5 1um')).window?.etalon.freeSpectralRange_Hz),
  },
  {
    id: 'fp-Tmin',
    quantity: 'minimum transmittance, R=0.9',
    unit: '%',
    wanted: 0.277,
    tolerance: 0.0005,
    toleranceBasis: 'numerical or printed digits',
    source: '1/(1+F)',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) =>
      100 * number((await answer('vacuum n=37.973665961010255@1mm vacuum 1um')).window?.etalon.T_min),
  },
  {
    id: 'fp-mean',
    quantity: 'average of Airy transmittance over phase equals the incoherent sum, R=0.3',
    unit: '1',
    wanted: 0.5384615384615384,
    tolerance: 1e-6,
    toleranceBasis: 'numerical or printed digits',
    source: 'identity',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) => number((await answer('vacuum n=3.42206445001476@1mm vacuum 1um')).interface.T),
  },
  {
    id: 'fp-laser',
    quantity: 'mode spacing of a cavity of length c/(2 GHz)',
    unit: 'GHz',
    wanted: 1.0,
    tolerance: 1e-9,
    toleranceBasis: 'numerical or printed digits',
    source: 'exact',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) =>
      1e-9 * number((await answer('n=1.5 n=1@0.149896229m n=1.5 1um')).window?.etalon.freeSpectralRange_Hz),
  },
  {
    id: 'fp-exact-finesse',
    quantity: 'ratio of the FWHM-defined finesse to pi sqrt(R)/(1-R) at R = 0.3',
    unit: '1',
    wanted: 0.9218124202630648,
    tolerance: 1e-12,
    toleranceBasis: 'numerical or printed digits',
    source: 'definition',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) => finesseRatio(await answer('vacuum n=3.42206445001476@1mm vacuum 1um')),
  },
]);
