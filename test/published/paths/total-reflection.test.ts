/** Total reflection, frustrated and not: published values by the command line. Each row carries its source; see `one-shot-rows.ts`. */
import { checkOneShot, number } from './one-shot-rows.ts';

const DEGREE = Math.PI / 180;

checkOneShot('Total reflection, frustrated and not', [
  {
    id: 'tir-ftir-s',
    quantity: 'FTIR transmittance, prisms 1.5, air gap lambda/4, 45 deg, s',
    unit: '1',
    wanted: 0.51321023243269,
    tolerance: 1e-9,
    toleranceBasis: 'numerical or printed digits',
    source: 'closed form 1/(1 + (25/9) sinh^2(pi sqrt(1/8)/2))',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) =>
      number((await answer('n=1.5 n=1@250nm n=1.5 1um --angle 45 --pol s')).interface.T),
  },
  {
    id: 'tir-s-45',
    quantity: 'phase of r_s, 1.5 -> 1, 45 deg (e^{-iwt})',
    unit: 'deg',
    wanted: -36.8699,
    tolerance: 5e-5,
    toleranceBasis: 'numerical or printed digits',
    source: 'exact: -2 atan(1/3)',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) =>
      number((await answer('n=1.5 vacuum 1um --angle 45 --pol s')).interface.phaseRs_rad) / DEGREE,
  },
  {
    id: 'tir-depth-45',
    quantity: 'field 1/e depth, 1.5 -> air, 45 deg, 1 um',
    unit: 'um',
    wanted: 0.45016,
    tolerance: 5e-6,
    toleranceBasis: 'numerical or printed digits',
    source: 'exact: sqrt(8)/(2 pi)',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) =>
      1e6 * number((await answer('n=1.5 vacuum 1um --angle 45')).interface.evanescentDepth_m),
  },
  {
    id: 'tir-gh-s',
    quantity: 'Goos-Haenchen displacement (perpendicular to ray), s, 1.5 -> 1, 45 deg',
    unit: 'vacuum wavelengths',
    wanted: 0.6366197723675814,
    tolerance: 1e-9,
    toleranceBasis: 'numerical or printed digits',
    source: 'Artmann formula, exact 2/pi',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) =>
      1e6 * number((await answer('n=1.5 vacuum 1um --angle 45 --pol s')).interface.goosHanchenS_m),
  },
]);
