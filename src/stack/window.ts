/**
 * A plate with two plain faces and no interference between them: closed forms, beam by beam.
 *
 *   R = R1 + (1 - R1)^2 R2 tau^2/(1 - R1 R2 tau^2),  T = (1 - R1)(1 - R2) tau/(1 - R1 R2 tau^2),  A = 1 - R - T
 *
 * with tau = exp(-alpha d/cos) the internal transmittance of one pass. For absorbing plates the factors are the squares of
 * the amplitudes (|1 - r1^2|^2 in place of (1 - R1)^2), so that the sums equal the coherent plate averaged over a fringe;
 * they agree with `mixed-stack.ts`. Each polarization on its own, the mean last.
 * Source: Born & Wolf, Principles of Optics, 7.6; Stokes, Proc. R. Soc. 11, 545 (1862).
 */
import { abs2, add, type Complex, complex, div, mul, scale, sqrtDecaying, sub } from '../num/complex.ts';
import {
  checkPath,
  indexSquared,
  isLossless,
  type LayeredPath,
  type Polarization,
  type Substance,
} from './layered-path.ts';
import { incidentKappa2 } from './solved-stack.ts';
import { StackRefusal } from './stack-refusal.ts';

/** What a plate with face reflectances R1, R2 and internal transmittance does, all orders summed as intensities. */
export interface SlabFractions {
  readonly R: number;
  readonly T: number;
  readonly A: number;
}

export interface WindowFractions extends SlabFractions {
  /** Reflectance of the first face, and of the second from inside. */
  readonly R1: number;
  readonly R2: number;
  /** One pass, oblique path included. */
  readonly internalTransmittance: number;
  /** Share of the incident power in each transmitted beam: the direct one, then the ghosts. */
  readonly transmittedBeams: readonly number[];
  /** Share in each reflected beam: the first face, the second face, then the ghosts. */
  readonly reflectedBeams: readonly number[];
}

export interface WindowResult {
  readonly s: WindowFractions;
  readonly p: WindowFractions;
  /** Mean of s and p. */
  readonly unpolarized: WindowFractions;
}

/** The sums for given face reflectances of a transparent plate. */
export function slabFractions(R1: number, R2: number, internalTransmittance: number): SlabFractions {
  const tau = internalTransmittance;
  const fractions = R1 >= 0 && R1 <= 1 && R2 >= 0 && R2 <= 1 && tau >= 0 && tau <= 1;
  if (!(fractions && R1 * R2 * tau * tau < 1)) {
    throw new StackRefusal(
      'out-of-range',
      `R1 = ${R1}, R2 = ${R2}, internal transmittance ${tau} describe no plate`,
      'power fractions lie between 0 and 1, and not all of them are 1',
    );
  }
  const rounds = 1 / (1 - R1 * R2 * tau * tau);
  const R = R1 + (1 - R1) ** 2 * R2 * tau * tau * rounds;
  const T = (1 - R1) * (1 - R2) * tau * rounds;
  // 1 - R - T without the cancellation.
  return { R, T, A: (1 - R1) * (1 - tau) * (1 + R2 * tau) * rounds };
}

/** m equal lossless plates of face reflectance R, gaps included: (1 - R)/(1 + (2 m - 1) R). Source: Stokes 1862. */
export function plateStackTransmittance(R: number, plates: number): number {
  return (1 - R) / (1 + (2 * plates - 1) * R);
}

/** Power loss of a transmittance in dB, positive; null where nothing comes through. */
export function insertionLoss_dB(T: number): number | null {
  // 0 - x: no negative zero for T = 1.
  return T > 0 ? 0 - 10 * Math.log10(T) : null;
}

/** Absorption coefficient from the extinction coefficient, 4 pi k/lambda. */
export function absorptionCoefficient_per_m(k: number, vacuumWavelength_m: number): number {
  return (4 * Math.PI * k) / vacuumWavelength_m;
}

/** exp(-alpha d), the path inside being d. */
export function internalTransmittance(absorptionCoefficient_per_m: number, path_m: number): number {
  return Math.exp(-absorptionCoefficient_per_m * path_m);
}

/** Absorption coefficient from two transmittances of plates that differ in thickness only; the faces drop out. */
export function absorptionFromThicknesses_per_m(
  thinner: number,
  thicker: number,
  difference_m: number,
): number {
  return Math.log(thinner / thicker) / difference_m;
}

/** A plate between two media. `beams`: how many transmitted and reflected beams to list. Throws `StackRefusal`. */
export function windowFractions(
  before: Substance,
  plate: Substance,
  thickness_m: number,
  after: Substance,
  vacuumWavelength_m: number,
  incidenceAngle_rad: number,
  beams = 4,
): WindowResult {
  const path: LayeredPath = { incidence: before, layers: [{ ...plate, thickness_m }], exit: after };
  checkPath(path, vacuumWavelength_m, incidenceAngle_rad);
  const incident = incidentKappa2(before, incidenceAngle_rad);
  const optical = (4 * Math.PI * thickness_m) / vacuumWavelength_m;
  const s = onePolarization(before, plate, after, incident, optical, beams, 's');
  const p = onePolarization(before, plate, after, incident, optical, beams, 'p');
  return { s, p, unpolarized: mean(s, p) };
}

function onePolarization(
  before: Substance,
  plate: Substance,
  after: Substance,
  incident: Complex,
  optical: number,
  beams: number,
  polarization: Polarization,
): WindowFractions {
  const kappa = (x: Substance): Complex => {
    const w = add(sub(indexSquared(x), indexSquared(before)), incident);
    // Exactly at a critical angle eps/kappa has no value: a hair inside it has.
    return abs2(w) < 1e-40 ? complex(1e-10) : sqrtDecaying(w);
  };
  const admittance = (x: Substance): Complex =>
    polarization === 's' ? div(kappa(x), x.mu) : div(x.eps, kappa(x));
  const [y1, y2, y3] = [admittance(before), admittance(plate), admittance(after)];
  const r1 = div(sub(y1, y2), add(y1, y2));
  const r2 = div(sub(y2, y3), add(y2, y3));
  const enter = abs2(div(scale(y1, 2), add(y1, y2)));
  const leave = (abs2(div(scale(y2, 2), add(y2, y3))) * y3.re) / y1.re;
  const turnBack = abs2(sub(complex(1), mul(r1, r1)));
  const exponent = optical * kappa(plate).im;
  const tau = Math.exp(-exponent);
  const [R1, R2] = [abs2(r1), abs2(r2)];
  const round = R1 * R2 * tau * tau;
  const rounds = 1 / (1 - round);
  const transmitted = Array.from({ length: beams }, (_, m) => enter * leave * tau * round ** m);
  const reflected = Array.from({ length: beams }, (_, m) =>
    m === 0 ? R1 : turnBack * R2 * tau * tau * round ** (m - 1),
  );
  // Power between the faces, with what forward and backward wave exchange in a lossy plate (see `mixed-stack.ts`).
  const forward = enter * rounds;
  const backward = forward * tau * R2;
  const beating = -r1.im * backward * tau + r2.im * forward * tau;
  const lost = -Math.expm1(-exponent) * (forward + backward);
  return {
    R1,
    R2,
    internalTransmittance: tau,
    R: R1 + turnBack * R2 * tau * tau * rounds,
    T: enter * leave * tau * rounds,
    A: isLossless(plate) ? 0 : (y2.re * lost - 2 * y2.im * beating) / y1.re,
    transmittedBeams: transmitted,
    reflectedBeams: reflected,
  };
}

function mean(s: WindowFractions, p: WindowFractions): WindowFractions {
  const half = (a: number, b: number): number => (a + b) / 2;
  const each = (a: readonly number[], b: readonly number[]): number[] =>
    a.map((x, i) => half(x, b[i] as number));
  return {
    R1: half(s.R1, p.R1),
    R2: half(s.R2, p.R2),
    internalTransmittance: s.internalTransmittance,
    R: half(s.R, p.R),
    T: half(s.T, p.T),
    A: half(s.A, p.A),
    transmittedBeams: each(s.transmittedBeams, p.transmittedBeams),
    reflectedBeams: each(s.reflectedBeams, p.reflectedBeams),
  };
}
