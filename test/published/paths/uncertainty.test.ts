/** Uncertainty: published values by the command line. Each row carries its source; see `one-shot-rows.ts`. */
import { checkOneShot, number } from './one-shot-rows.ts';

checkOneShot('Uncertainty', [
  {
    id: 'unc-dRdn',
    quantity: 'dR/dn at normal incidence, n=1.5',
    unit: '1',
    wanted: 0.128,
    tolerance: 1e-9,
    toleranceBasis: 'numerical or printed digits',
    source: '4(n-1)/(n+1)^3',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) =>
      number((await answer('vacuum n=1.5 1um --tolerance n=1e-6')).interface.R_uncertainty) / 1e-6,
  },
  {
    id: 'unc-rel',
    quantity: 'relative uncertainty of R for u(n)=1e-4 at n=1.5',
    unit: '%',
    wanted: 0.032,
    tolerance: 1e-6,
    toleranceBasis: 'numerical or printed digits',
    source: 'propagation',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) =>
      (100 * number((await answer('vacuum n=1.5 1um --tolerance n=1e-4')).interface.R_uncertainty)) / 0.04,
  },
]);
