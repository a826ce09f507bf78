/**
 * One stack over many waves or angles: typed arrays in, typed arrays out, nothing allocated per layer and point.
 * Same inner loop, conventions and numbers as `coherent-stack.ts`.
 *
 * Give each distinct material once and let the layers refer to it: normal wave vector and admittances are then worked out
 * once per material and point, not once per layer.
 */
import {
  checkIncidence,
  checkSubstance,
  checkThickness,
  checkWave,
  type Polarization,
} from './layered-path.ts';
import { complexAt, exitFlux, fieldPerH, incidentFlux, writeDissipations } from './solved-stack.ts';
import {
  createStackKernel,
  EXIT_SCALE_P,
  EXIT_SCALE_S,
  propagate,
  R_P_TANGENTIAL,
  R_S,
  type StackKernel,
} from './stack-kernel.ts';
import { EPS, MEDIUM_STRIDE, MU, setIncidence, setMedium } from './stack-media.ts';

/** Relative permittivity and permeability at every point; an array of length 1 holds for all points. */
export interface SubstanceScan {
  readonly epsRe: Float64Array;
  readonly epsIm: Float64Array;
  readonly muRe: Float64Array;
  readonly muIm: Float64Array;
}

export interface StackScan {
  /** Vacuum wavelength and angle of incidence of every point; either may have length 1. */
  readonly vacuumWavelength_m: Float64Array;
  readonly incidenceAngle_rad: Float64Array;
  readonly substances: readonly SubstanceScan[];
  /** Indices into `substances`. */
  readonly incidence: number;
  readonly exit: number;
  readonly layerSubstance: ArrayLike<number>;
  readonly thickness_m: ArrayLike<number>;
}

/** One value per point; see `PolarizedStack` for what they are. */
export interface PolarizedScan {
  readonly R: Float64Array;
  readonly T: Float64Array;
  readonly rRe: Float64Array;
  readonly rIm: Float64Array;
  readonly tRe: Float64Array;
  readonly tIm: Float64Array;
  /** Layer after layer, one value per point each; empty unless asked for. */
  readonly layerAbsorptance: Float64Array;
}

export interface StackSpectrum {
  readonly pointCount: number;
  readonly s: PolarizedScan;
  readonly p: PolarizedScan;
}

const ONE = Float64Array.of(1);
const ZERO = Float64Array.of(0);
const SIDES = ['s', 'p'] as const;

/** A non-magnetic material from n and k at every point (either may have length 1). */
export function substanceScanFromIndex(n: Float64Array, k: Float64Array = ZERO): SubstanceScan {
  const length = Math.max(n.length, k.length);
  const epsRe = new Float64Array(length);
  const epsIm = new Float64Array(length);
  for (let i = 0; i < length; i++) {
    const a = valueAt(n, i);
    const b = valueAt(k, i);
    epsRe[i] = (a - b) * (a + b);
    epsIm[i] = 2 * a * b;
  }
  return { epsRe, epsIm, muRe: ONE, muIm: ZERO };
}

/**
 * R, T, r, t at every point, in both polarizations. `absorptance` asks for each layer's too.
 * Throws `StackRefusal` at the first point outside the physics (see `checkPath`).
 */
export function scanStack(scan: StackScan, { absorptance = false } = {}): StackSpectrum {
  const pointCount = Math.max(
    scan.vacuumWavelength_m.length,
    scan.incidenceAngle_rad.length,
    ...scan.substances.map((x) => x.epsRe.length),
  );
  const layerCount = scan.layerSubstance.length;
  for (let j = 0; j < layerCount; j++) checkThickness(scan.thickness_m[j] as number, `layer ${j + 1}`);
  const kernel = createStackKernel(
    scan.substances.length,
    scan.layerSubstance,
    scan.thickness_m,
    scan.incidence,
    scan.exit,
  );
  const spectrum: StackSpectrum = {
    pointCount,
    s: createPolarizedScan(pointCount, absorptance ? layerCount : 0),
    p: createPolarizedScan(pointCount, absorptance ? layerCount : 0),
  };
  for (let i = 0; i < pointCount; i++) {
    const wavelength_m = valueAt(scan.vacuumWavelength_m, i);
    const angle_rad = valueAt(scan.incidenceAngle_rad, i);
    checkWave(wavelength_m, angle_rad);
    setSubstances(kernel, scan, i);
    const cos = Math.cos(angle_rad);
    const from = kernel.incidence * MEDIUM_STRIDE;
    setIncidence(
      kernel,
      (kernel.media[from + EPS] as number) * (kernel.media[from + MU] as number) * (cos * cos),
      0,
    );
    propagate(kernel, (2 * Math.PI) / wavelength_m);
    storeS(kernel, spectrum.s, i);
    storeP(kernel, spectrum.p, i, cos);
    if (absorptance) {
      for (const side of SIDES) {
        const { layerAbsorptance } = spectrum[side];
        writeDissipations(kernel, side, 1 / incidentFlux(kernel, side), layerAbsorptance, i, pointCount);
      }
    }
  }
  return spectrum;
}

function setSubstances(kernel: StackKernel, scan: StackScan, i: number): void {
  for (let m = 0; m < scan.substances.length; m++) {
    const { epsRe, epsIm, muRe, muIm } = scan.substances[m] as SubstanceScan;
    const er = valueAt(epsRe, i);
    const ei = valueAt(epsIm, i);
    const mr = valueAt(muRe, i);
    const mi = valueAt(muIm, i);
    setMedium(kernel, m, er, ei, mr, mi);
    const ordinary = Number.isFinite(er + ei + mr + mi) && ei >= 0 && mi >= 0 && er !== 0 && mr !== 0;
    if (ordinary && (m !== scan.incidence || (ei === 0 && mi === 0 && er * mr > 0))) continue;
    const substance = { eps: { re: er, im: ei }, mu: { re: mr, im: mi } };
    if (m === scan.incidence) checkIncidence(substance);
    else checkSubstance(substance, m === scan.exit ? 'the exit medium' : `material ${m + 1}`);
  }
}

function storeS(kernel: StackKernel, target: PolarizedScan, i: number): void {
  const { waves } = kernel;
  storePowers(kernel, 's', target, i);
  target.rRe[i] = waves[R_S] as number;
  target.rIm[i] = waves[R_S + 1] as number;
  target.tRe[i] = waves[EXIT_SCALE_S] as number;
  target.tIm[i] = waves[EXIT_SCALE_S + 1] as number;
}

function storeP(kernel: StackKernel, target: PolarizedScan, i: number, cos: number): void {
  const { waves, media } = kernel;
  storePowers(kernel, 'p', target, i);
  target.rRe[i] = -(waves[R_P_TANGENTIAL] as number);
  target.rIm[i] = -(waves[R_P_TANGENTIAL + 1] as number);
  const exit = kernel.exit * MEDIUM_STRIDE;
  const { re, im } = fieldPerH({ eps: complexAt(media, exit + EPS), mu: complexAt(media, exit + MU) });
  const hRe = waves[EXIT_SCALE_P] as number;
  const hIm = waves[EXIT_SCALE_P + 1] as number;
  target.tRe[i] = (hRe * re - hIm * im) * cos;
  target.tIm[i] = (hRe * im + hIm * re) * cos;
}

function storePowers(kernel: StackKernel, side: Polarization, target: PolarizedScan, i: number): void {
  const at = side === 's' ? R_S : R_P_TANGENTIAL;
  const re = kernel.waves[at] as number;
  const im = kernel.waves[at + 1] as number;
  target.R[i] = re * re + im * im;
  target.T[i] = exitFlux(kernel, side) * (1 / incidentFlux(kernel, side));
}

function createPolarizedScan(pointCount: number, layerCount: number): PolarizedScan {
  return {
    R: new Float64Array(pointCount),
    T: new Float64Array(pointCount),
    rRe: new Float64Array(pointCount),
    rIm: new Float64Array(pointCount),
    tRe: new Float64Array(pointCount),
    tIm: new Float64Array(pointCount),
    layerAbsorptance: new Float64Array(pointCount * layerCount),
  };
}

const valueAt = (values: Float64Array, i: number): number =>
  (values.length === 1 ? values[0] : values[i]) as number;
