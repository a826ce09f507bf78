/** Multilayers: published values. Each row carries its source; see `check-rows.ts`. */
import { coherentStack } from '../../../src/stack/coherent-stack.ts';
import { fieldAt, solveField } from '../../../src/stack/field-profile.ts';
import {
  type Layer,
  type LayeredPath,
  layerFromIndex,
  reversedPath,
  substanceFromIndex,
} from '../../../src/stack/layered-path.ts';
import {
  pairsForReflectance,
  quarterWaveMirrorReflectance,
  stopBand,
} from '../../../src/stack/quarter-wave-mirror.ts';
import { VACUUM_IMPEDANCE_ohm as Z0 } from '../../../src/units/constants.ts';
import { checkRows, row } from './check-rows.ts';

const air = substanceFromIndex(1);
const wave_m = 1e-6;
const quarter = (n: number): Layer => layerFromIndex(wave_m / (4 * n), n);

/** A conducting sheet, far thinner than wave and skin depth: eps'' = Z0/(Rs k0 d). */
function sheet(sheet_ohm: number, longWave_m: number): Layer {
  const thickness_m = 1e-9 * longWave_m;
  const conductance = Z0 / (sheet_ohm * ((2 * Math.PI) / longWave_m) * thickness_m);
  return { eps: { re: 1, im: conductance }, mu: { re: 1, im: 0 }, thickness_m };
}

const freeSheet = (sheet_ohm: number) =>
  coherentStack({ incidence: air, layers: [sheet(sheet_ohm, 0.03)], exit: air }, 0.03, 0).s;

/** Air, pairs of quarter waves, the high index outermost, on a substrate n + ik. */
function pairsOn(nH: number, nL: number, pairs: number, n: number, k = 0): number {
  const layers = Array.from({ length: pairs }, () => [quarter(nH), quarter(nL)]).flat();
  return coherentStack({ incidence: air, layers, exit: substanceFromIndex(n, k) }, wave_m, 0).s.R;
}

const oddMirror = (nH: number, nL: number, n: number, pairs: number): number =>
  quarterWaveMirrorReflectance(
    { outsideIndex: 1, high: nH, low: nL, substrate: { re: n, im: 0 }, outermost: 'high', extraLayer: true },
    pairs,
  );

const absorbing: LayeredPath = {
  incidence: air,
  layers: [
    layerFromIndex(3e-8, 0.2, 3.4),
    layerFromIndex(2.3e-7, 2.1, 0.05),
    layerFromIndex(1.1e-6, 1.4, 1e-3),
  ],
  exit: air,
};

checkRows('Multilayers', [
  row({
    id: 'hr-utk',
    quantity: 'pairs (2.5/1.5 on 1.5) needed for R = 0.995 (real number)',
    inputs: { nH: 2.5, nL: 1.5, n_sub: 1.5, R: 0.995 },
    unit: '1',
    wanted: 6.94,
    tolerance: 0.01,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'Univ. Tennessee OPT 507 assignment 3 solution',
    kind: 'published',
    fromMemory: false,
    note: "the solution's wave impedance is n_s^-1 (n1/n2)^2m, i.e. the LOW-index layer is the outermost one; with H outermost 6.15 pairs are enough",
    got: ({ nH, nL, n_sub, R }) =>
      pairsForReflectance(
        {
          outsideIndex: 1,
          high: nH,
          low: nL,
          substrate: { re: n_sub, im: 0 },
          outermost: 'low',
          extraLayer: false,
        },
        R,
      ).exact,
  }),
  row({
    id: 'hr-dbr-bw',
    quantity: 'stop band of 2.5/1.5 quarter-wave stack at 630 nm',
    inputs: { nH: 2.5, nL: 1.5, vac_nm: 630 },
    unit: 'nm',
    wanted: 200,
    tolerance: 5,
    toleranceBasis: 'widened: source says about',
    source: 'encyclopaedia article on distributed Bragg reflectors (about 200 nm)',
    kind: 'published',
    fromMemory: false,
    got: ({ nH, nL, vac_nm }) => stopBand(nH, nL, vac_nm * 1e-9).relativeWidth * vac_nm,
  }),
  row({
    id: 'hr-zns-cryolite-0',
    quantity: 'air|(HL)^0 H|glass, H=2.3 L=1.35 glass 1.52, normal',
    inputs: { nH: 2.3, nL: 1.35, n_sub: 1.52, pairs: 0 },
    unit: '%',
    wanted: 30.6,
    tolerance: 0.06,
    toleranceBasis: 'numerical or printed digits',
    source: 'formula of Born & Wolf 1.6.5 / Macleod; indices of the classic ZnS/cryolite stack',
    kind: 'exact',
    fromMemory: true,
    got: ({ nH, nL, n_sub, pairs }) => 100 * oddMirror(nH, nL, n_sub, pairs),
  }),
  row({
    id: 'hr-zns-cryolite-2',
    quantity: 'air|(HL)^2 H|glass, H=2.3 L=1.35 glass 1.52, normal',
    inputs: { nH: 2.3, nL: 1.35, n_sub: 1.52, pairs: 2 },
    unit: '%',
    wanted: 87.2,
    tolerance: 0.06,
    toleranceBasis: 'numerical or printed digits',
    source: 'formula of Born & Wolf 1.6.5 / Macleod; indices of the classic ZnS/cryolite stack',
    kind: 'exact',
    fromMemory: true,
    got: ({ nH, nL, n_sub, pairs }) => 100 * oddMirror(nH, nL, n_sub, pairs),
  }),
  row({
    id: 'hr-zns-cryolite-4',
    quantity: 'air|(HL)^4 H|glass, H=2.3 L=1.35 glass 1.52, normal',
    inputs: { nH: 2.3, nL: 1.35, n_sub: 1.52, pairs: 4 },
    unit: '%',
    wanted: 98.4,
    tolerance: 0.06,
    toleranceBasis: 'numerical or printed digits',
    source: 'formula of Born & Wolf 1.6.5 / Macleod; indices of the classic ZnS/cryolite stack',
    kind: 'exact',
    fromMemory: true,
    got: ({ nH, nL, n_sub, pairs }) => 100 * oddMirror(nH, nL, n_sub, pairs),
  }),
  row({
    id: 'hr-pedrotti',
    quantity: 'six double layers SiO2 1.46 / ZnS 2.35 on 1.48',
    inputs: { nH: 2.35, nL: 1.46, n_sub: 1.48, pairs: 6 },
    unit: '%',
    wanted: 99.1,
    tolerance: 0.05,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'Pedrotti, Introduction to Optics, multilayer chapter example (99.1 %)',
    kind: 'published',
    fromMemory: true,
    got: ({ nH, nL, n_sub, pairs }) => 100 * pairsOn(nH, nL, pairs, n_sub),
  }),
  row({
    id: 'ml-al-2',
    quantity: 'aluminium 0.82+5.99i with one quarter-wave pair: air|2.35|1.38|Al',
    inputs: { n_metal: '0.82+5.99i', nH: 2.35, nL: 1.38, pairs: 1 },
    unit: '%',
    wanted: 96.9,
    tolerance: 0.07,
    toleranceBasis: 'widened: printed digits plus rounding of n, k',
    source: 'Macleod, Thin-Film Optical Filters, enhanced metal mirrors (96.9 %)',
    kind: 'published',
    fromMemory: true,
    got: ({ nH, nL, pairs }) => 100 * pairsOn(nH, nL, pairs, 0.82, 5.99),
  }),
  row({
    id: 'ml-al-4',
    quantity: 'same with two pairs',
    inputs: { n_metal: '0.82+5.99i', nH: 2.35, nL: 1.38, pairs: 2 },
    unit: '%',
    wanted: 99,
    tolerance: 0.5,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'Macleod (99 %)',
    kind: 'published',
    fromMemory: true,
    got: ({ nH, nL, pairs }) => 100 * pairsOn(nH, nL, pairs, 0.82, 5.99),
  }),
  row({
    id: 'ml-wolt-R',
    quantity: 'reflectance of a free-standing film with sheet resistance Z0/2 (thin, long wavelength)',
    inputs: { sheet_ohm: 188.365 },
    unit: '%',
    wanted: 25.0,
    tolerance: 0.001,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'Woltersdorff, Z. Phys. 91, 230 (1934); Am. J. Phys. 60, 257 (1992)',
    kind: 'published',
    fromMemory: false,
    got: ({ sheet_ohm }) => 100 * freeSheet(sheet_ohm).R,
  }),
  row({
    id: 'ml-wolt-A',
    quantity: 'absorptance of that film',
    inputs: { sheet_ohm: 188.365 },
    unit: '%',
    wanted: 50.0,
    tolerance: 0.001,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'Woltersdorff 1934',
    kind: 'published',
    fromMemory: false,
    got: ({ sheet_ohm }) => 100 * freeSheet(sheet_ohm).A,
  }),
  row({
    id: 'ml-salisbury',
    quantity: 'Salisbury screen: Z0 sheet, quarter-wave spacer, perfect mirror: reflectance',
    inputs: { sheet_ohm: 376.73 },
    unit: '1',
    wanted: 0.0,
    tolerance: 1e-6,
    toleranceBasis: 'numerical or printed digits',
    source: 'Salisbury 1952',
    kind: 'exact',
    fromMemory: true,
    got: ({ sheet_ohm }) =>
      coherentStack(
        {
          incidence: air,
          layers: [sheet(sheet_ohm, 0.03), layerFromIndex(0.03 / 4, 1)],
          // A perfect mirror, near enough.
          exit: { eps: { re: 1, im: 1e24 }, mu: { re: 1, im: 0 } },
        },
        0.03,
        0,
      ).s.R,
  }),
  row({
    id: 'ml-halfwave',
    quantity: 'half-wave film of any index is absent',
    inputs: { n_film: 2.1, n_sub: 1.52 },
    unit: '%',
    wanted: 4.258,
    tolerance: 0.0005,
    toleranceBasis: 'numerical or printed digits',
    source: 'Hecht 9.7',
    kind: 'exact',
    fromMemory: true,
    got: ({ n_film, n_sub }) =>
      100 *
      coherentStack(
        {
          incidence: air,
          layers: [layerFromIndex(wave_m / (2 * n_film), n_film)],
          exit: substanceFromIndex(n_sub),
        },
        wave_m,
        0,
      ).s.R,
  }),
  row({
    id: 'ml-stand',
    quantity: '|E|^2/|E_in|^2 at the surface of a quarter-wave HR stack (H outermost)',
    inputs: { nH: 2.25, nL: 1.45, pairs: 20 },
    unit: '1',
    wanted: 0.0,
    tolerance: 1e-6,
    toleranceBasis: 'numerical or printed digits',
    source: 'node at the surface because r = -1',
    kind: 'exact',
    fromMemory: true,
    got: ({ nH, nL, pairs }) => {
      const layers = Array.from({ length: pairs }, () => [quarter(nH), quarter(nL)]).flat();
      return fieldAt(
        solveField({ incidence: air, layers, exit: substanceFromIndex(1.5) }, wave_m, 0, 's'),
        -1,
        0,
      ).intensity;
    },
  }),
  row({
    id: 'ml-reverse',
    quantity: 'T of an absorbing stack from both sides is equal (difference)',
    inputs: {},
    unit: '1',
    wanted: 0.0,
    tolerance: 1e-12,
    toleranceBasis: 'numerical or printed digits',
    source: 'reciprocity',
    kind: 'exact',
    fromMemory: true,
    got: () => {
      const [there, back] = [absorbing, reversedPath(absorbing)].map(
        (path) => coherentStack(path, wave_m, 0.8).p.T,
      );
      return (there ?? 0) - (back ?? 1);
    },
  }),
]);
