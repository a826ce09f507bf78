/** The powers of one bare surface at inputs that may be moved, for the uncertainty. */
import { fresnel } from '../interface/fresnel.ts';
import type { Moved } from './moved.ts';

/** [s, p] of reflectance and transmittance. */
export interface BothPolarizations {
  readonly R: readonly [number, number];
  readonly T: readonly [number, number];
}

export function surfacePower({ from, into, angle_rad }: Moved): BothPolarizations {
  const w = fresnel(from, into, angle_rad);
  return { R: [w.Rs, w.Rp], T: [w.Ts, w.Tp] };
}
