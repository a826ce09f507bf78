/**
 * The electric field along the ray of an answer: along the incident ray up to the boundary, along the refracted ray beyond
 * it (along the normal in total reflection, where there is no refracted ray). In units of the incident amplitude.
 *
 *   before, at distance d from the boundary:  exp(-i k d) + g exp(i k d cos 2a)
 *   beyond, at distance d:                    t exp(i K d - K'' d)
 *
 * a is the angle of incidence. The reflected wave runs at the angle 2a to the incident one, so its phase along the incident
 * ray goes as cos 2a; g is its amplitude along the incident field: r_s for s, -r_p cos 2a for p (at 45° the two fields are
 * perpendicular and nothing beats). Unpolarized light is drawn as s. All of it follows from the answer's amplitudes.
 */
import type { Answer } from '../answer/answer.ts';
import { type Complex, mul, sqrtDecaying } from '../num/complex.ts';

export interface RayField {
  /** Wave number over 2 pi / (vacuum wavelength); crests are 1/index vacuum wavelengths apart. */
  readonly indexBefore: number;
  /** 0 where the field beyond has no crests (total reflection). */
  readonly indexBeyond: number;
  /** Vacuum wavelengths in which the field beyond falls to 1/e; Infinity where it does not. */
  readonly depthBeyond: number;
  /** Largest field on either side. */
  readonly peak: number;
  /** Field at a distance in vacuum wavelengths: real part at the instant chosen for the drawing. */
  before(distance: number): number;
  beyond(distance: number): number;
  /** Amplitude of the field beyond. */
  envelopeBeyond(distance: number): number;
}

const TURN = 2 * Math.PI;
/** Draws a running wave with a crest at the boundary where no standing wave asks for another instant. */
const CREST_AT_BOUNDARY = 0.3;
/** A wave that has been damped on its way to the boundary is drawn at most this many times larger before it. */
const LARGEST = 2.5;

export function rayField(answer: Answer): RayField {
  const { from, geometry } = answer;
  const angle = geometry.incidenceAngle_rad;
  const isP = geometry.polarization === 'p';
  const { Rs, Rp, Ts, Tp } = answer.interface;
  // Layers summed as intensities have no amplitude: their size is drawn, without a phase.
  const rs = answer.interface.rs ?? { re: Math.sqrt(Rs), im: 0 };
  const rp = answer.interface.rp ?? { re: Math.sqrt(Rp), im: 0 };
  const ts = answer.interface.ts ?? { re: Math.sqrt(Ts ?? 0), im: 0 };
  const tp = answer.interface.tp ?? { re: Math.sqrt(Tp ?? 0), im: 0 };
  const cos2a = Math.cos(2 * angle);
  const g = isP ? { re: -rp.re * cos2a, im: -rp.im * cos2a } : rs;
  const t = isP ? tp : ts;
  const q = from.n * Math.sin(angle);
  const beyond = waveBeyond(answer, q);

  const fieldBefore = (d: number): Complex => {
    const phase = TURN * from.n * d;
    const grown = Math.min(LARGEST, Math.exp(TURN * from.k * d));
    const fallen = Math.exp(-TURN * from.k * d * cos2a);
    const back = mul(g, { re: Math.cos(phase * cos2a) * fallen, im: Math.sin(phase * cos2a) * fallen });
    return { re: Math.cos(phase) * grown + back.re, im: -Math.sin(phase) * grown + back.im };
  };
  const instant = instantOf(fieldBefore, from.n);
  const realPart = (z: Complex): number => z.re * instant.re + z.im * instant.im;
  const amplitude = Math.hypot(t.re, t.im);
  const envelopeBeyond = (d: number): number => amplitude * Math.exp(-d / beyond.depth);
  return {
    indexBefore: Math.abs(from.n),
    indexBeyond: Math.abs(beyond.index),
    depthBeyond: beyond.depth,
    peak: Math.max(1 + Math.hypot(g.re, g.im), amplitude),
    before: (d) => realPart(fieldBefore(d)),
    beyond: (d) => {
      const phase = TURN * beyond.index * d;
      const decay = Math.exp(-d / beyond.depth);
      return realPart(mul(t, { re: Math.cos(phase) * decay, im: Math.sin(phase) * decay }));
    },
    envelopeBeyond,
  };
}

function waveBeyond(answer: Answer, q: number): { readonly index: number; readonly depth: number } {
  const { into, wave } = answer;
  const evanescent_m = answer.interface.evanescentDepth_m;
  if (answer.interface.totalReflection && evanescent_m !== null) {
    return { index: 0, depth: evanescent_m / wave.vacuumWavelength_m };
  }
  const square = { re: into.n ** 2 - into.k ** 2 - q ** 2, im: 2 * into.n * into.k };
  const kappa = sqrtDecaying(square);
  const sign = into.n < 0 ? -1 : 1;
  const angle = Math.atan2(q, kappa.re);
  const index = sign * (q * Math.sin(angle) + kappa.re * Math.cos(angle));
  const damping = TURN * Math.abs(kappa.im) * Math.cos(angle);
  return { index, depth: damping > 0 ? 1 / damping : Number.POSITIVE_INFINITY };
}

/**
 * A standing wave is zero everywhere at some instants: the one drawn is where the field before the boundary is largest.
 * Re(F exp(-i w t)) has the largest mean square at w t = arg(mean F^2) / 2. Returned as exp(i w t).
 */
function instantOf(field: (distance: number) => Complex, index: number): Complex {
  let re = CREST_AT_BOUNDARY;
  let im = 0;
  const samples = 64;
  for (let i = 0; i < samples; i++) {
    const f = field((2 * i) / samples / Math.max(Math.abs(index), 1e-9));
    re += (f.re * f.re - f.im * f.im) / samples;
    im += (2 * f.re * f.im) / samples;
  }
  const phase = Math.atan2(im, re) / 2;
  return { re: Math.cos(phase), im: Math.sin(phase) };
}
