/** Total reflection: published values. Each row carries its source; see `check-rows.ts`. */
import { arg } from '../../../src/num/complex.ts';
import { coherentStack } from '../../../src/stack/coherent-stack.ts';
import { fieldAt, solveField } from '../../../src/stack/field-profile.ts';
import { layerFromIndex, substanceFromIndex } from '../../../src/stack/layered-path.ts';
import { checkRows, row } from './check-rows.ts';

const deg = Math.PI / 180;
const wave_m = 1e-6;

const face = (n1: number, n2: number, angle_rad: number) =>
  coherentStack(
    { incidence: substanceFromIndex(n1), layers: [], exit: substanceFromIndex(n2) },
    wave_m,
    angle_rad,
  );

/** |arg r_p - arg r_s|, the phases running from 0 to -180 deg in both. */
function phaseDifference_deg(n1: number, n2: number, angle_rad: number): number {
  const { s, p } = face(n1, n2, angle_rad);
  return Math.abs(arg(p.r) - arg(s.r)) / deg;
}

/** Angle at which the phase difference is greatest, by golden section above the critical angle. */
function greatest(n1: number, n2: number): { angle_rad: number; difference_deg: number } {
  const golden = (Math.sqrt(5) - 1) / 2;
  let [low, high] = [Math.asin(n2 / n1) + 1e-9, Math.PI / 2 - 1e-9];
  while (high - low > 1e-8) {
    const [a, b] = [high - golden * (high - low), low + golden * (high - low)];
    if (phaseDifference_deg(n1, n2, a) > phaseDifference_deg(n1, n2, b)) high = b;
    else low = a;
  }
  return { angle_rad: low, difference_deg: phaseDifference_deg(n1, n2, low) };
}

/** 1/e depth of the field behind a totally reflecting face, read off the field profile. */
function fieldDepth_m(n1: number, n2: number, angle_rad: number, vac_m: number): number {
  const path = { incidence: substanceFromIndex(n1), layers: [], exit: substanceFromIndex(n2) };
  const field = solveField(path, vac_m, angle_rad, 's');
  const step = vac_m / 10;
  return (-2 * step) / Math.log(fieldAt(field, 0, step).intensity / fieldAt(field, 0, 0).intensity);
}

/** Index whose greatest phase difference is 90 deg against air. */
function indexForRightAngle(): number {
  let [low, high] = [2, 3];
  while (high - low > 1e-9) {
    const middle = (low + high) / 2;
    if (greatest(middle, 1).difference_deg < 90) low = middle;
    else high = middle;
  }
  return low;
}

checkRows('Total reflection', [
  row({
    id: 'tir-s-45',
    quantity: 'phase of r_s, 1.5 -> 1, 45 deg (e^{-iwt})',
    inputs: { n1: 1.5, n2: 1, angle_deg: 45, pol: 's' },
    unit: 'deg',
    wanted: -36.8699,
    tolerance: 5e-5,
    toleranceBasis: 'numerical or printed digits',
    source: 'exact: -2 atan(1/3)',
    kind: 'exact',
    fromMemory: true,
    got: ({ n1, n2, angle_deg }) => arg(face(n1, n2, angle_deg * deg).s.r) / deg,
  }),
  row({
    id: 'tir-rhomb-a',
    quantity: '|phase difference p-s| at TIR',
    inputs: { n1: 1.5, n2: 1, angle_deg: 50.2 },
    unit: 'deg',
    wanted: 45.0,
    tolerance: 0.05,
    toleranceBasis: 'printed digits of the input angle or of the limit',
    source: 'Zangwill, Modern Electrodynamics, Fresnel rhomb problem (50.2 and 53.3 deg)',
    kind: 'published',
    fromMemory: false,
    got: ({ n1, n2, angle_deg }) => phaseDifference_deg(n1, n2, angle_deg * deg),
  }),
  row({
    id: 'tir-rhomb-c',
    quantity: '|phase difference p-s| at TIR',
    inputs: { n1: 1.51, n2: 1, angle_deg: 48.61666666666667 },
    unit: 'deg',
    wanted: 45.0,
    tolerance: 0.05,
    toleranceBasis: 'printed digits of the input angle or of the limit',
    source: 'Born & Wolf 1.5.4: n = 1.51, 48 deg 37 min',
    kind: 'published',
    fromMemory: true,
    got: ({ n1, n2, angle_deg }) => phaseDifference_deg(n1, n2, angle_deg * deg),
  }),
  row({
    id: 'tir-max-151',
    quantity: 'largest phase difference, n = 1.51',
    inputs: { n1: 1.51, n2: 1 },
    unit: 'deg',
    wanted: 45.93333333333333,
    tolerance: 0.01,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'Born & Wolf 1.5.4: 45 deg 56 min',
    kind: 'published',
    fromMemory: true,
    got: ({ n1, n2 }) => greatest(n1, n2).difference_deg,
  }),
  row({
    id: 'tir-max-151-ang',
    quantity: 'angle of the largest phase difference, n = 1.51',
    inputs: { n1: 1.51, n2: 1 },
    unit: 'deg',
    wanted: 51.333333333333336,
    tolerance: 0.01,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'Born & Wolf 1.5.4: 51 deg 20 min',
    kind: 'published',
    fromMemory: true,
    got: ({ n1, n2 }) => greatest(n1, n2).angle_rad / deg,
  }),
  row({
    id: 'tir-min-n-90',
    quantity: 'index for which one TIR can give 90 deg',
    inputs: {},
    unit: '1',
    wanted: 2.414,
    tolerance: 0.0005,
    toleranceBasis: 'numerical or printed digits',
    source: 'Born & Wolf 1.5.4 (n = 2.41)',
    kind: 'exact',
    fromMemory: true,
    got: () => indexForRightAngle(),
  }),
  row({
    id: 'tir-depth-80',
    quantity: 'intensity penetration depth, 1.52/1.33, 445 nm, 80 deg',
    inputs: { n1: 1.52, n2: 1.33, vac_nm: 445, angle_deg: 80 },
    unit: 'nm',
    wanted: 51,
    tolerance: 1.0,
    toleranceBasis: 'widened: page truncates',
    source: 'Evident/Olympus TIRF tutorial (51 nm at 80 deg)',
    kind: 'published',
    fromMemory: false,
    note: 'lambda/(4 pi sqrt(n1^2 sin^2 - n2^2)) = 51.6; page truncates',
    got: ({ n1, n2, vac_nm, angle_deg }) => fieldDepth_m(n1, n2, angle_deg * deg, vac_nm * 1e-9) * 0.5e9,
  }),
  row({
    id: 'tir-depth-45',
    quantity: 'field 1/e depth, 1.5 -> air, 45 deg, 1 um',
    inputs: { n1: 1.5, n2: 1, vac_um: 1, angle_deg: 45 },
    unit: 'um',
    wanted: 0.45016,
    tolerance: 5e-6,
    toleranceBasis: 'numerical or printed digits',
    source: 'exact: sqrt(8)/(2 pi)',
    kind: 'exact',
    fromMemory: true,
    got: ({ n1, n2, vac_um, angle_deg }) => fieldDepth_m(n1, n2, angle_deg * deg, vac_um * 1e-6) * 1e6,
  }),
  row({
    id: 'tir-gh-s',
    quantity: 'Goos-Haenchen displacement (perpendicular to ray), s, 1.5 -> 1, 45 deg',
    inputs: { n1: 1.5, n2: 1, angle_deg: 45, pol: 's' },
    unit: 'vacuum wavelengths',
    wanted: 0.6366197723675814,
    tolerance: 1e-9,
    toleranceBasis: 'numerical or printed digits',
    source: 'Artmann formula, exact 2/pi',
    kind: 'exact',
    fromMemory: true,
    got: ({ n1, n2, angle_deg }) => {
      // -(lambda/(2 pi n1)) dphi/dtheta, the derivative by differences of fourth order.
      const h = 2e-4;
      const phase = (i: number): number => arg(face(n1, n2, angle_deg * deg + i * h).s.r);
      const slope = (phase(-2) - 8 * phase(-1) + 8 * phase(1) - phase(2)) / (12 * h);
      return -slope / (2 * Math.PI * n1);
    },
  }),
  row({
    id: 'tir-ftir-s',
    quantity: 'FTIR transmittance, prisms 1.5, air gap lambda/4, 45 deg, s',
    inputs: { n1: 1.5, gap_over_lambda: 0.25, angle_deg: 45, pol: 's' },
    unit: '1',
    wanted: 0.51321023243269,
    tolerance: 1e-9,
    toleranceBasis: 'numerical or printed digits',
    source: 'closed form 1/(1 + (25/9) sinh^2(pi sqrt(1/8)/2))',
    kind: 'exact',
    fromMemory: true,
    got: ({ n1, gap_over_lambda, angle_deg, pol }) =>
      coherentStack(
        {
          incidence: substanceFromIndex(n1),
          layers: [layerFromIndex(gap_over_lambda * wave_m, 1)],
          exit: substanceFromIndex(n1),
        },
        wave_m,
        angle_deg * deg,
      )[pol].T,
  }),
]);
