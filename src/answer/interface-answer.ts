/** The interface part of the answer: Fresnel, special angles, total reflection, losses; null wherever a value does not exist. */
import type { FresnelResult } from '../interface/fresnel.ts';
import { reflectionLoss_dB, returnLoss_dB } from '../interface/losses.ts';
import { pseudoBrewsterAngle } from '../interface/pseudo-brewster.ts';
import { brewsterAngles } from '../interface/special-angles.ts';
import { surfaceWave } from '../interface/surface-wave.ts';
import { totalReflection } from '../interface/total-reflection.ts';
import { abs2, arg, type Complex } from '../num/complex.ts';
import type { InterfaceAnswer } from './answer.ts';
import type { MediumSide } from './medium-side.ts';
import type { Polarization } from './question.ts';
import type { UncertaintyPart } from './spread-answer.ts';

/** Below this R counts as none for phases: its amplitude is rounding noise. */
const NO_REFLECTION = 1e-31;

export interface InterfaceParts {
  readonly answer: Omit<InterfaceAnswer, keyof UncertaintyPart>;
  readonly wave: FresnelResult;
}

export function powerOf(polarization: Polarization, s: number, p: number): number {
  return polarization === 's' ? s : polarization === 'p' ? p : (s + p) / 2;
}

export function interfaceParts(
  from: MediumSide,
  into: MediumSide,
  angle_rad: number,
  polarization: Polarization,
  vacuumWavelength_m: number,
): InterfaceParts {
  const a = from.optics;
  const b = into.optics;
  const met = surfaceWave(a, b, angle_rad);
  const { wave, powersKnown } = met;
  const total = met.totalReflection;
  const tunnelling = total ? totalReflection(met.from, b, angle_rad, vacuumWavelength_m) : null;
  const brewster = brewsterAngles(a, b);
  const R = powerOf(polarization, wave.Rs, wave.Rp);
  return {
    wave,
    answer: {
      Rs: wave.Rs,
      Rp: wave.Rp,
      R,
      Ts: powersKnown ? wave.Ts : null,
      Tp: powersKnown ? wave.Tp : null,
      T: powersKnown ? powerOf(polarization, wave.Ts, wave.Tp) : null,
      rs: tidy(wave.rs),
      rp: tidy(wave.rp),
      ts: tidy(wave.ts),
      tp: tidy(wave.tp),
      phaseRs_rad: phase(wave.rs),
      phaseRp_rad: phase(wave.rp),
      refractionAngle_rad: total ? null : Math.atan2(wave.q.re, wave.kappa2.re),
      brewsterAngle_rad: brewster.p,
      brewsterAngleS_rad: brewster.s,
      pseudoBrewsterAngle_rad: b.n.im > 0 ? pseudoBrewsterAngle(a, b) : null,
      criticalAngle_rad: met.criticalAngle_rad,
      totalReflection: total,
      evanescentDepth_m: tunnelling?.evanescentDepth_m ?? null,
      goosHanchenS_m: tunnelling?.goosHanchenS_m ?? null,
      goosHanchenP_m: tunnelling?.goosHanchenP_m ?? null,
      reflectionLoss_dB: powersKnown ? reflectionLoss_dB(R) : null,
      returnLoss_dB: returnLoss_dB(R),
    },
  };
}

const tidy = (z: Complex): Complex => ({ re: z.re === 0 ? 0 : z.re, im: z.im === 0 ? 0 : z.im });

/** arg r in (-pi, pi]; null where nothing is reflected. A negative real r has phase +pi whatever the sign of its zero. */
function phase(r: Complex): number | null {
  if (abs2(r) < NO_REFLECTION) return null;
  return arg(tidy(r));
}
