/**
 * One path at one wave, solved: the kernel filled in, and what is read from it. Unlike `coherent-stack.ts` it takes the
 * normal wave vector instead of an angle, so that a group of layers can be met from inside an absorbing slab as well.
 */
import { abs2, type Complex, div, mul, neg, scale, sqrtDecaying } from '../num/complex.ts';
import { layerDissipation } from './layer-dissipation.ts';
import { indexSquared, type LayeredPath, type Polarization, type Substance } from './layered-path.ts';
import {
  createStackKernel,
  EXIT_SCALE_P,
  EXIT_SCALE_S,
  FIELD_STRIDE,
  propagate,
  R_P_TANGENTIAL,
  R_S,
  SCALE_P,
  SCALE_S,
  type StackKernel,
} from './stack-kernel.ts';
import { EPS, KAPPA, MEDIUM_STRIDE, MU, setIncidence, setMedium } from './stack-media.ts';

/** `kappa2`: squared normal wave vector over k0 of the incident wave in the medium of incidence. No checks. */
export function solveStack(path: LayeredPath, k0_rad_per_m: number, kappa2: Complex): StackKernel {
  const substances: Substance[] = [path.incidence, ...path.layers, path.exit];
  const kernel = createStackKernel(
    substances.length,
    path.layers.map((_, i) => i + 1),
    path.layers.map((layer) => layer.thickness_m),
    0,
    substances.length - 1,
  );
  substances.forEach(({ eps, mu }, i) => {
    setMedium(kernel, i, eps.re, eps.im, mu.re, mu.im);
  });
  setIncidence(kernel, kappa2.re, kappa2.im);
  propagate(kernel, k0_rad_per_m);
  return kernel;
}

/** Squared normal wave vector over k0 at an angle of incidence: eps mu cos^2. */
export function incidentKappa2(incidence: Substance, incidenceAngle_rad: number): Complex {
  const cos = Math.cos(incidenceAngle_rad);
  return scale(indexSquared(incidence), cos * cos);
}

/** Reflected over incident tangential E. */
export function tangentialReflection(kernel: StackKernel, polarization: Polarization): Complex {
  return complexAt(kernel.waves, polarization === 's' ? R_S : R_P_TANGENTIAL);
}

/** Transmitted over incident tangential E. */
export function tangentialTransmission(kernel: StackKernel, polarization: Polarization): Complex {
  const last = kernel.layerCount * FIELD_STRIDE;
  return polarization === 's'
    ? complexAt(kernel.waves, EXIT_SCALE_S)
    : mul(complexAt(kernel.waves, EXIT_SCALE_P), complexAt(kernel.fields, last + 4));
}

/** Transmitted over incident E amplitude in p, for a wave that arrives at a real angle. */
export function fieldTransmissionP(
  kernel: StackKernel,
  exit: Substance,
  incidenceAngle_rad: number,
): Complex {
  // The scale is the transmitted H for unit incident tangential E, which is cos(theta) of the incident E.
  const scaleP = complexAt(kernel.waves, EXIT_SCALE_P);
  return scale(mul(scaleP, fieldPerH(exit)), Math.cos(incidenceAngle_rad));
}

/** E over Z0 H of a plane wave, n/eps; n is backward (Re < 0) in a lossless doubly negative medium. */
export function fieldPerH(x: Substance): Complex {
  const n = sqrtDecaying(indexSquared(x));
  return div(n.im === 0 && x.mu.re < 0 ? neg(n) : n, x.eps);
}

/** Power into the exit medium, in units of Re(E H*) for unit incident tangential E. */
export function exitFlux({ fields, waves, layerCount }: StackKernel, polarization: Polarization): number {
  const s = polarization === 's';
  const at = layerCount * FIELD_STRIDE + (s ? 0 : 4);
  const to = s ? EXIT_SCALE_S : EXIT_SCALE_P;
  const Er = fields[at] as number;
  const Ei = fields[at + 1] as number;
  const Hr = fields[at + 2] as number;
  const Hi = fields[at + 3] as number;
  const re = waves[to] as number;
  const im = waves[to + 1] as number;
  return (Er * Hr + Ei * Hi) * (re * re + im * im);
}

/** Real part of the admittance y0 of the incident wave: its power for unit tangential E, alone in the medium. */
export function incidentFlux({ media, incidence }: StackKernel, polarization: Polarization): number {
  const at = incidence * MEDIUM_STRIDE;
  // kappa/mu, or eps/kappa.
  const u = at + (polarization === 's' ? KAPPA : EPS);
  const v = at + (polarization === 's' ? MU : KAPPA);
  const ur = media[u] as number;
  const ui = media[u + 1] as number;
  const vr = media[v] as number;
  const vi = media[v + 1] as number;
  return (ur * vr + ui * vi) / (vr * vr + vi * vi);
}

/** Admittance of the incident wave: kappa/mu in s, eps/kappa in p. */
export function incidentAdmittance({ media, incidence }: StackKernel, polarization: Polarization): Complex {
  const at = incidence * MEDIUM_STRIDE;
  const kappa = complexAt(media, at + KAPPA);
  return polarization === 's'
    ? div(kappa, complexAt(media, at + MU))
    : div(complexAt(media, at + EPS), kappa);
}

/** Factor from the stored fields of interface j to the true ones for unit incident tangential E, for j = 0 .. N. */
export function fieldScales(kernel: StackKernel, polarization: Polarization): Complex[] {
  const s = polarization === 's';
  const rescale = s ? kernel.rescaleS : kernel.rescaleP;
  const scales = [complexAt(kernel.waves, s ? SCALE_S : SCALE_P)];
  for (let j = 0; j < kernel.layerCount; j++) {
    scales.push(scale(scales[j] as Complex, (kernel.decay[j] as number) * (rescale[j] as number)));
  }
  return scales;
}

/**
 * Power dissipated in each layer, in units of Re(E H*) for unit incident tangential E, times `factor`; layer j goes to
 * `target[start + j stride]`.
 */
export function writeDissipations(
  kernel: StackKernel,
  polarization: Polarization,
  factor: number,
  target: Float64Array,
  start = 0,
  stride = 1,
): void {
  const s = polarization === 's';
  const rescale = s ? kernel.rescaleS : kernel.rescaleP;
  let scale2 = factor * abs2(complexAt(kernel.waves, s ? SCALE_S : SCALE_P));
  for (let j = 0; j < kernel.layerCount; j++) {
    scale2 *= (rescale[j] as number) ** 2;
    target[start + j * stride] = layerDissipation(kernel, j, polarization) * scale2;
    scale2 *= (kernel.decay[j] as number) ** 2;
  }
}

/** The complex number whose parts stand at `at` and `at + 1`. */
export function complexAt(values: Float64Array, at: number): Complex {
  return { re: values[at] as number, im: values[at + 1] as number };
}
