/**
 * The powers of one surface and nothing else: R, T of both polarizations and the angle of refraction, for curves, sweeps and
 * batches. The same laws in the same order as the answer's interface part, so that the numbers are its numbers to the last
 * bit; cautions, sources, uncertainties, phases and special angles are left to `answerQuestion`.
 */
import type { Conditions } from '../dispersion/evaluator.ts';
import type { Optics } from '../interface/optics.ts';
import { surfaceWave } from '../interface/surface-wave.ts';
import { type BoundMedium, bindLiteral, bindMaterial } from '../medium/bound-medium.ts';
import type { InterfaceAnswer } from './answer.ts';
import { powerOf } from './interface-answer.ts';
import type { MediumSpec, Polarization } from './question.ts';

/** T is null where the medium of incidence absorbs too much for a fraction of its power to mean anything. */
export type SurfacePowers = Pick<
  InterfaceAnswer,
  'Rs' | 'Rp' | 'R' | 'Ts' | 'Tp' | 'T' | 'refractionAngle_rad' | 'totalReflection'
>;

/** The medium of a question under its conditions, ready for many waves. */
export function bindMedium(spec: MediumSpec, conditions: Conditions, extrapolate: boolean): BoundMedium {
  return spec.kind === 'literal'
    ? bindLiteral(spec.literal)
    : bindMaterial(spec.material, spec.axis, conditions, extrapolate);
}

export function surfacePowers(
  from: Optics,
  into: Optics,
  angle_rad: number,
  polarization: Polarization,
): SurfacePowers {
  const { wave, totalReflection, powersKnown } = surfaceWave(from, into, angle_rad);
  return {
    Rs: wave.Rs,
    Rp: wave.Rp,
    R: powerOf(polarization, wave.Rs, wave.Rp),
    Ts: powersKnown ? wave.Ts : null,
    Tp: powersKnown ? wave.Tp : null,
    T: powersKnown ? powerOf(polarization, wave.Ts, wave.Tp) : null,
    refractionAngle_rad: totalReflection ? null : Math.atan2(wave.q.re, wave.kappa2.re),
    totalReflection,
  };
}
