/**
 * The powers of one surface and nothing else: R, T of both polarizations and the angle of refraction, for curves, sweeps and
 * batches. The same laws in the same order as the answer's interface part, so that the numbers are its numbers to the last
 * bit; cautions, sources, uncertainties, phases and special angles are left to `answerQuestion`.
 */
import type { Conditions } from '../dispersion/evaluator.ts';
import { fresnel } from '../interface/fresnel.ts';
import type { Optics } from '../interface/optics.ts';
import { criticalAngle, WEAK_ABSORPTION } from '../interface/special-angles.ts';
import { type BoundMedium, bindLiteral, bindMaterial } from '../medium/bound-medium.ts';
import type { InterfaceAnswer } from './answer.ts';
import { LOSSY_INCIDENCE, powerOf } from './interface-answer.ts';
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
  const wave = fresnel(from, into, angle_rad);
  const critical = criticalAngle(from, into);
  const totalReflection =
    critical !== null &&
    angle_rad > critical &&
    into.n.im <= WEAK_ABSORPTION * into.n.re &&
    wave.kappa2.im > 0;
  const known = from.n.im <= LOSSY_INCIDENCE * Math.abs(from.n.re);
  return {
    Rs: wave.Rs,
    Rp: wave.Rp,
    R: powerOf(polarization, wave.Rs, wave.Rp),
    Ts: known ? wave.Ts : null,
    Tp: known ? wave.Tp : null,
    T: known ? powerOf(polarization, wave.Ts, wave.Tp) : null,
    refractionAngle_rad: totalReflection ? null : Math.atan2(wave.q.re, wave.kappa2.re),
    totalReflection,
  };
}
