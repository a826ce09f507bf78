/**
 * One path at one wave, solved: the kernel filled in, and what is read from it. Unlike `coherent-stack.ts` it takes the
 * normal wave vector instead of an angle, so that a group of layers can be met from inside an absorbing slab as well.
 */
import { abs2, type Complex, mul, neg, scale, sqrtDecaying } from '../num/complex.ts';
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
import { KAPPA, MEDIUM_STRIDE, setIncidence, setMedium, Y_P, Z_S } from './stack-media.ts';

export interface SolvedStack {
  readonly kernel: StackKernel;
  readonly k0_rad_per_m: number;
}

/** `kappa2`: squared normal wave vector over k0 of the incident wave in the medium of incidence. No checks. */
export function solveStack(path: LayeredPath, k0_rad_per_m: number, kappa2: Complex): SolvedStack {
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
  return { kernel, k0_rad_per_m };
}

/** Squared normal wave vector over k0 at an angle of incidence: eps mu cos^2. */
export function incidentKappa2(incidence: Substance, incidenceAngle_rad: number): Complex {
  const cos = Math.cos(incidenceAngle_rad);
  return scale(indexSquared(incidence), cos * cos);
}

/** Reflected over incident tangential E. */
export function tangentialReflection(stack: SolvedStack, polarization: Polarization): Complex {
  return complexAt(stack.kernel.waves, polarization === 's' ? R_S : R_P_TANGENTIAL);
}

/** Transmitted over incident tangential E. */
export function tangentialTransmission(stack: SolvedStack, polarization: Polarization): Complex {
  const { kernel } = stack;
  const last = kernel.layerCount * FIELD_STRIDE;
  return polarization === 's'
    ? complexAt(kernel.waves, EXIT_SCALE_S)
    : mul(complexAt(kernel.waves, EXIT_SCALE_P), complexAt(kernel.fields, last + 4));
}

/** Power into the exit medium, in units of Re(E H*) for unit incident tangential E. */
export function exitFlux(stack: SolvedStack, polarization: Polarization): number {
  const { kernel } = stack;
  const s = polarization === 's';
  const at = kernel.layerCount * FIELD_STRIDE + (s ? 0 : 4);
  const E = complexAt(kernel.fields, at);
  const H = complexAt(kernel.fields, at + 2);
  return (E.re * H.re + E.im * H.im) * abs2(complexAt(kernel.waves, s ? EXIT_SCALE_S : EXIT_SCALE_P));
}

/** Real part of the admittance y0 of the incident wave: its power for unit tangential E, alone in the medium. */
export function incidentFlux(stack: SolvedStack, polarization: Polarization): number {
  const { media, incidence } = stack.kernel;
  const at = incidence * MEDIUM_STRIDE;
  const kappa = complexAt(media, at + KAPPA);
  // kappa/mu, or eps/kappa; Z_S holds mu and Y_P eps.
  const [u, v] =
    polarization === 's' ? [kappa, complexAt(media, at + Z_S)] : [complexAt(media, at + Y_P), kappa];
  return (u.re * v.re + u.im * v.im) / abs2(v);
}

/** Factor from the stored fields of interface j to the true ones for unit incident tangential E, for j = 0 .. N. */
export function fieldScales(stack: SolvedStack, polarization: Polarization): Complex[] {
  const { kernel } = stack;
  const s = polarization === 's';
  const rescale = s ? kernel.rescaleS : kernel.rescaleP;
  const scales = [complexAt(kernel.waves, s ? SCALE_S : SCALE_P)];
  for (let j = 0; j < kernel.layerCount; j++) {
    scales.push(scale(scales[j] as Complex, (kernel.decay[j] as number) * (rescale[j] as number)));
  }
  return scales;
}

/** Power dissipated in each layer, in units of Re(E H*) for unit incident tangential E. */
export function dissipations(stack: SolvedStack, polarization: Polarization): number[] {
  const { kernel, k0_rad_per_m } = stack;
  const rescale = polarization === 's' ? kernel.rescaleS : kernel.rescaleP;
  const scales = fieldScales(stack, polarization);
  return Array.from({ length: kernel.layerCount }, (_, j) => {
    const factor = rescale[j] as number;
    return (
      layerDissipation(kernel, j, polarization, k0_rad_per_m) * abs2(scales[j] as Complex) * factor * factor
    );
  });
}

/** Refractive index, backward (Re < 0) in a lossless doubly negative medium. */
export function refractiveIndexOf(x: Substance): Complex {
  const n = sqrtDecaying(indexSquared(x));
  return n.im === 0 && x.mu.re < 0 ? neg(n) : n;
}

/** The complex number whose parts stand at `at` and `at + 1`. */
export function complexAt(values: Float64Array, at: number): Complex {
  return { re: values[at] as number, im: values[at + 1] as number };
}
