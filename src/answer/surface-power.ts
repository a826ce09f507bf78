/** The powers of one bare surface at inputs that may be moved, for the uncertainty. */
import { surfaceWave } from '../interface/surface-wave.ts';
import type { Moved } from './moved.ts';

/** [s, p] of reflectance and transmittance. */
export interface BothPolarizations {
  readonly R: readonly [number, number];
  readonly T: readonly [number, number];
}

export function surfacePower({ from, into, angle_rad }: Moved): BothPolarizations {
  const { wave } = surfaceWave(from, into, angle_rad);
  return { R: [wave.Rs, wave.Rp], T: [wave.Ts, wave.Tp] };
}
