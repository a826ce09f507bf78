/**
 * What salt does to the two relaxations of water and how well it conducts, after Meissner and Wentz.
 *
 *   es exp(b0 S + b1 S^2 + b2 S t);  f1 [1 + S (b3 + b4 t + b5 t^2)];  e1 exp(b6 S + b7 S^2 + b8 S t)
 *   f2 [1 + S (b9 + b10 t)];  ei [1 + S (b11 + b12 t)]
 *   sigma = s35(t) R15(S) [1 + (t - 15) a0(S)/(a1(S) + t)] S/m
 *   R15 = S (r0 + r1 S + r2 S^2)/(r3 + r4 S + S^2);  a0 = (p0 + p1 S + p2 S^2)/(p3 + p4 S + S^2);  a1 = q0 + q1 S + q2 S^2
 *
 * S in g/kg, t in C. Source: T. Meissner, F. J. Wentz, IEEE Trans. Geosci. Remote Sens. 42, 1836 (2004); conductivity after
 * A. Stogryn et al. (1995).
 */
import { polynomial } from '../num/polynomial.ts';
import type { WaterRelaxationParameters } from './parameters.ts';

type Salt = NonNullable<Extract<WaterRelaxationParameters, { form: 'meissner-wentz' }>['salt']>;

/** Permittivities at zero, middle and infinite frequency, the two relaxation frequencies, and the conductivity. */
export interface SalineState {
  readonly es: number;
  readonly e1: number;
  readonly ei: number;
  readonly f1_GHz: number;
  readonly f2_GHz: number;
  readonly sigma_S_per_m: number;
}

export function saltFactors(salt: Salt, fresh: SalineState, t: number, S: number): SalineState {
  const b = (i: number): number => salt.b[i]!;
  const grown = (i: number): number => Math.exp(S * (b(i) + b(i + 1) * S + b(i + 2) * t));
  return {
    es: fresh.es * grown(0),
    f1_GHz: fresh.f1_GHz * (1 + S * (b(3) + (b(4) + b(5) * t) * t)),
    e1: fresh.e1 * grown(6),
    f2_GHz: fresh.f2_GHz * (1 + S * (b(9) + b(10) * t)),
    ei: fresh.ei * (1 + S * (b(11) + b(12) * t)),
    sigma_S_per_m: conductivity_S_per_m(salt, t, S),
  };
}

function conductivity_S_per_m(salt: Salt, t: number, S: number): number {
  const ratio = (c: readonly number[]): number => polynomial(c.slice(0, 3), S) / (c[3]! + c[4]! * S + S * S);
  const slope = ratio(salt.a0) / (polynomial(salt.a1, S) + t);
  return polynomial(salt.s35, t) * S * ratio(salt.r) * (1 + (t - 15) * slope);
}
