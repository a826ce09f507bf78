/**
 * The electric field inside and in front of a coherent stack: |E|^2 relative to that of the incident wave, along the normal.
 *
 *   s: |E|^2 = |E_t|^2        p: |E|^2 = |E_t|^2 + |q H_t/eps|^2, which jumps at interfaces (normal E does)
 *   in front, s: |1 + r exp(-2 i k0 kappa0 z)|^2;  p: cos^2 |1 + r_tan ..|^2 + sin^2 |1 - r_tan ..|^2
 *
 * The position z runs from the first interface along the wave: negative in front. Peak values, time dependence
 * exp(-i w t); in p the ellipse's semi-axes add in squares. Source: Macleod, Thin-Film Optical Filters (electric field
 * distribution); fields as in `stack-kernel.ts`.
 *
 * Why the maximum is found near the faces: in a layer |E|^2 = a exp(-2 u) + b exp(2 u) + an oscillation of constant
 * amplitude, u = k0 Im kappa z. Its envelope is convex, so the highest crest is the first or the last one.
 */
import { abs2, arg, type Complex, div, mul, scale } from '../num/complex.ts';
import { checkPath, type LayeredPath, type Polarization } from './layered-path.ts';
import {
  complexAt,
  fieldScales,
  incidentFlux,
  incidentKappa2,
  solveStack,
  tangentialReflection,
} from './solved-stack.ts';
import { FIELD_STRIDE, type StackKernel } from './stack-kernel.ts';
import { EPS, KAPPA, MEDIUM_STRIDE, Y_P, Y_S, Z_P, Z_S } from './stack-media.ts';

/** A solved stack in one polarization, ready to be asked for its field. */
export interface StackField {
  readonly polarization: Polarization;
  readonly kernel: StackKernel;
  readonly k0_rad_per_m: number;
  readonly incidenceAngle_rad: number;
  /** Tangential wave vector over k0, squared. */
  readonly q2: number;
  /** See `fieldScales`. */
  readonly scales: readonly Complex[];
  /** Position of the upper face of every layer, and last that of the exit medium. */
  readonly faces_m: Float64Array;
}

/** -1 in front of the stack, 0 .. N-1 the layers, N the exit medium. */
export type Region = number;

export interface FieldPoint {
  readonly position_m: number;
  readonly region: Region;
  /** |E|^2 over |E|^2 of the incident wave. */
  readonly intensity: number;
  /** Share of the incident power absorbed per length; its integral over a layer is the layer's absorptance. */
  readonly absorbed_per_m: number;
}

export interface FrontField {
  /** Greatest |E|^2 in front of the stack and the place nearest to it, z <= 0. */
  readonly intensity: number;
  readonly position_m: number;
  /** Distance from crest to crest, lambda/(2 n cos). */
  readonly period_m: number;
}

/** Throws `StackRefusal` as `coherentStack` does. */
export function solveField(
  path: LayeredPath,
  vacuumWavelength_m: number,
  incidenceAngle_rad: number,
  polarization: Polarization,
): StackField {
  checkPath(path, vacuumWavelength_m, incidenceAngle_rad);
  const k0_rad_per_m = (2 * Math.PI) / vacuumWavelength_m;
  const kernel = solveStack(path, k0_rad_per_m, incidentKappa2(path.incidence, incidenceAngle_rad));
  const n2 = mul(path.incidence.eps, path.incidence.mu).re;
  return {
    polarization,
    kernel,
    k0_rad_per_m,
    incidenceAngle_rad,
    q2: n2 * Math.sin(incidenceAngle_rad) ** 2,
    scales: fieldScales(kernel, polarization),
    faces_m: facesOf(kernel),
  };
}

/** The field in a region, at a depth below its upper face (in front: a distance before the first interface). */
export function fieldAt(field: StackField, region: Region, depth_m: number): FieldPoint {
  if (region < 0)
    return { position_m: -depth_m, region, intensity: frontIntensity(field, depth_m), absorbed_per_m: 0 };
  const { kernel, polarization, k0_rad_per_m, q2 } = field;
  const exit = region === kernel.layerCount;
  const m = (exit ? kernel.exit : (kernel.layerMedium[region] as number)) * MEDIUM_STRIDE;
  const { E, H } = exit ? exitWave(field, m, depth_m) : layerWave(field, region, m, depth_m);
  const s = polarization === 's';
  const eps2 = abs2(complexAt(kernel.media, m + EPS));
  // In p the incident wave of unit |E| has tangential E cos(theta).
  const unit = s ? 1 : Math.cos(field.incidenceAngle_rad) ** 2;
  const lossE = kernel.media[m + (s ? Y_S : Y_P) + 1] as number;
  const lossH = kernel.media[m + (s ? Z_S : Z_P) + 1] as number;
  return {
    position_m: (field.faces_m[region] as number) + depth_m,
    region,
    intensity: unit * (s ? abs2(E) : abs2(E) + (q2 * abs2(H)) / eps2),
    absorbed_per_m: (k0_rad_per_m * (lossE * abs2(E) + lossH * abs2(H))) / incidentFlux(kernel, polarization),
  };
}

/** The field at a position along the normal; at an interface, on its lower side. */
export function fieldAtPosition(field: StackField, position_m: number): FieldPoint {
  if (position_m < 0) return fieldAt(field, -1, -position_m);
  const { thickness_m, layerCount } = field.kernel;
  let top = 0;
  for (let j = 0; j < layerCount; j++) {
    const thickness = thickness_m[j] as number;
    if (position_m < top + thickness) return fieldAt(field, j, position_m - top);
    top += thickness;
  }
  return fieldAt(field, layerCount, position_m - top);
}

/** The field through the whole stack: `samples` points in each layer, both faces included, and before and behind it. */
export function fieldProfile(
  field: StackField,
  { samples = 48, front_m = 0, behind_m = 0 }: { samples?: number; front_m?: number; behind_m?: number } = {},
): FieldPoint[] {
  const points: FieldPoint[] = [];
  const add = (region: Region, from_m: number, to_m: number): void => {
    for (let i = 0; i < samples; i++) {
      points.push(fieldAt(field, region, from_m + ((to_m - from_m) * i) / (samples - 1)));
    }
  };
  if (front_m > 0) add(-1, front_m, 0);
  field.kernel.thickness_m.forEach((thickness, j) => {
    add(j, 0, thickness);
  });
  if (behind_m > 0) add(field.kernel.layerCount, 0, behind_m);
  return points;
}

/** Standing wave in front of the stack. */
export function frontField(field: StackField): FrontField {
  const r = tangentialReflection(field.kernel, field.polarization);
  const contrast = field.polarization === 's' ? 1 : Math.cos(2 * field.incidenceAngle_rad);
  const kappa = field.kernel.media[field.kernel.incidence * MEDIUM_STRIDE + KAPPA] as number;
  const period_m = Math.PI / (field.k0_rad_per_m * Math.abs(kappa));
  // |E|^2 = 1 + R + 2 |r| contrast cos(2 k0 kappa z - arg r)
  const turns = (arg(r) + (contrast < 0 ? Math.PI : 0)) / (2 * Math.PI);
  const nearest = turns - Math.ceil(turns);
  return {
    intensity: 1 + abs2(r) + 2 * Math.sqrt(abs2(r)) * Math.abs(contrast),
    position_m: nearest * period_m,
    period_m,
  };
}

/** Greatest |E|^2 inside one layer, its faces included. */
export function layerMaximum(field: StackField, layer: number): FieldPoint {
  const { kernel, k0_rad_per_m } = field;
  const m = (kernel.layerMedium[layer] as number) * MEDIUM_STRIDE;
  const thickness = kernel.thickness_m[layer] as number;
  const period = Math.PI / (k0_rad_per_m * Math.abs(kernel.media[m + KAPPA] as number));
  if (!(thickness > 3 * period)) return highest(field, layer, 0, thickness, period);
  const first = highest(field, layer, 0, period, period);
  const last = highest(field, layer, thickness - period, thickness, period);
  return first.intensity >= last.intensity ? first : last;
}

/** Greatest |E|^2 in the layers and at the surface of the exit medium. */
export function stackMaximum(field: StackField): FieldPoint {
  let best = fieldAt(field, field.kernel.layerCount, 0);
  for (let j = 0; j < field.kernel.layerCount; j++) {
    const here = layerMaximum(field, j);
    if (here.intensity > best.intensity) best = here;
  }
  return best;
}

const SAMPLES_PER_FRINGE = 48;
const FEWEST_SAMPLES = 16;

/** Greatest |E|^2 in an interval of at most three fringes: every crest the samples show is narrowed down. */
function highest(
  field: StackField,
  region: Region,
  from_m: number,
  to_m: number,
  period_m: number,
): FieldPoint {
  // Evanescent layers have an endless period.
  const samples = Math.max(FEWEST_SAMPLES, Math.ceil((SAMPLES_PER_FRINGE * (to_m - from_m)) / period_m) || 0);
  const depths = Array.from({ length: samples + 1 }, (_, i) =>
    i === samples ? to_m : from_m + ((to_m - from_m) * i) / samples,
  );
  const points = depths.map((depth) => fieldAt(field, region, depth));
  let best = points.reduce((a, b) => (b.intensity > a.intensity ? b : a));
  const span = best.intensity - Math.min(...points.map((x) => x.intensity));
  // No fringe, nothing to narrow down. A crest falls short of its top by a thousandth of the span at most, at 48 samples
  // a fringe: only those within a hundredth of the best can win.
  if (span < 1e-10 * best.intensity) return best;
  const within = best.intensity - span / 100;
  points.forEach((here, i) => {
    const left = points[i - 1]?.intensity ?? 0;
    const right = points[i + 1]?.intensity ?? 0;
    if (here.intensity < within || here.intensity < left || here.intensity < right) return;
    const crest = narrowed(field, region, depths[i - 1] ?? from_m, depths[i + 1] ?? to_m, here);
    if (crest.intensity > best.intensity) best = crest;
  });
  return best;
}

/** Golden section in an interval with one crest. */
function narrowed(
  field: StackField,
  region: Region,
  from_m: number,
  to_m: number,
  known: FieldPoint,
): FieldPoint {
  const golden = (Math.sqrt(5) - 1) / 2;
  let best = known;
  let low = from_m;
  let high = to_m;
  for (let i = 0; i < 40; i++) {
    const left = fieldAt(field, region, high - golden * (high - low));
    const right = fieldAt(field, region, low + golden * (high - low));
    if (left.intensity > best.intensity) best = left;
    if (right.intensity > best.intensity) best = right;
    if (left.intensity >= right.intensity) high = low + golden * (high - low);
    else low = high - golden * (high - low);
  }
  return best;
}

function facesOf({ thickness_m, layerCount }: StackKernel): Float64Array {
  const faces_m = new Float64Array(layerCount + 1);
  for (let j = 0; j < layerCount; j++) {
    faces_m[j + 1] = (faces_m[j] as number) + (thickness_m[j] as number);
  }
  return faces_m;
}

function frontIntensity(field: StackField, distance_m: number): number {
  const r = tangentialReflection(field.kernel, field.polarization);
  const kappa = field.kernel.media[field.kernel.incidence * MEDIUM_STRIDE + KAPPA] as number;
  const contrast = field.polarization === 's' ? 1 : Math.cos(2 * field.incidenceAngle_rad);
  const phase = -2 * field.k0_rad_per_m * kappa * distance_m - arg(r);
  return 1 + abs2(r) + 2 * Math.sqrt(abs2(r)) * contrast * Math.cos(phase);
}

interface TangentialField {
  readonly E: Complex;
  readonly H: Complex;
}

/** E = c E_b - i Z g H_b, H = c H_b - i Y g E_b from the lower face, divided by the growth that the scale leaves out. */
function layerWave(field: StackField, j: number, m: number, depth_m: number): TangentialField {
  const { kernel, k0_rad_per_m } = field;
  const s = field.polarization === 's';
  const kappa = complexAt(kernel.media, m + KAPPA);
  const x = k0_rad_per_m * ((kernel.thickness_m[j] as number) - depth_m);
  const sinh = -Math.expm1(-2 * kappa.im * x) / 2;
  const sin = Math.sin(kappa.re * x);
  const cos = Math.cos(kappa.re * x);
  const c: Complex = { re: cos * (1 - sinh), im: -sin * sinh };
  const sine: Complex = { re: sin * (1 - sinh), im: cos * sinh };
  const g = abs2(kappa) < 1e-300 ? { re: x, im: 0 } : div(sine, kappa);
  const minusIg: Complex = { re: g.im, im: -g.re };
  const at = (j + 1) * FIELD_STRIDE + (s ? 0 : 4);
  const E = complexAt(kernel.fields, at);
  const H = complexAt(kernel.fields, at + 2);
  const Z = mul(complexAt(kernel.media, m + (s ? Z_S : Z_P)), minusIg);
  const Y = mul(complexAt(kernel.media, m + (s ? Y_S : Y_P)), minusIg);
  const rescale = (s ? kernel.rescaleS : kernel.rescaleP)[j] as number;
  const factor = scale(field.scales[j] as Complex, rescale * Math.exp(-kappa.im * k0_rad_per_m * depth_m));
  const turned = (a: Complex, by: Complex, b: Complex): Complex => {
    const p = mul(c, a);
    const q = mul(by, b);
    return mul(factor, { re: p.re + q.re, im: p.im + q.im });
  };
  return { E: turned(E, Z, H), H: turned(H, Y, E) };
}

function exitWave(field: StackField, m: number, depth_m: number): TangentialField {
  const { kernel, k0_rad_per_m } = field;
  const n = kernel.layerCount;
  const at = n * FIELD_STRIDE + (field.polarization === 's' ? 0 : 4);
  const x = k0_rad_per_m * depth_m;
  const kr = kernel.media[m + KAPPA] as number;
  const ki = kernel.media[m + KAPPA + 1] as number;
  const decay = Math.exp(-ki * x);
  const wave = { re: decay * Math.cos(kr * x), im: decay * Math.sin(kr * x) };
  const factor = mul(field.scales[n] as Complex, wave);
  return { E: mul(factor, complexAt(kernel.fields, at)), H: mul(factor, complexAt(kernel.fields, at + 2)) };
}
