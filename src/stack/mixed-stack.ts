/**
 * A path with thick layers: coherent groups of layers between slabs whose two faces do not interfere. Inside a group waves
 * add as amplitudes, across a slab as intensities, each polarization on its own.
 *
 * With one slab the result is exactly the coherent one averaged over a fringe, absorbing slab included: the recursion runs
 * on |E|^2 of the waves (no power is divided by Re y of a lossy medium), and the power that incident and reflected wave
 * exchange there (Im y) is kept in the absorptances. With several slabs it is the usual sum of all intensities, as in the
 * pile of plates (Stokes, Proc. R. Soc. 11, 545 (1862)), which leaves out interference of equal paths taken in other order.
 * The slab's internal transmittance is exp(-2 k0 Im kappa d), at any angle.
 *
 * Special cases: a layer whose round trip is shorter than a wavelength, or in which the wave dies within one (Im kappa >=
 * Re kappa), is coherent whatever was asked: there is no fringe to average. A slab exactly at its critical angle is
 * taken a hair inside it, where R -> 1. R_back is null where the exit medium absorbs or carries no wave.
 */
import { abs2, type Complex, complex, div, sqrtDecaying } from '../num/complex.ts';
import { isCoherent } from './coherence.ts';
import { meanFractions, type StackFractions } from './coherent-stack.ts';
import {
  checkPath,
  indexSquared,
  isLossless,
  type Layer,
  type LayeredPath,
  type Polarization,
  type Substance,
} from './layered-path.ts';
import {
  exitFlux,
  incidentFlux,
  incidentKappa2,
  solveStack,
  tangentialReflection,
  tangentialTransmission,
  writeDissipations,
} from './solved-stack.ts';

export interface LayerCoherence {
  readonly coherent: boolean;
  /** 2 n d cos(theta inside). */
  readonly roundTripOpticalPath_m: number;
  /** Internal transmittance of one pass. */
  readonly internalTransmittance: number;
  /** 1 less that, to all its digits. */
  readonly internalAbsorptance: number;
}

export interface MixedFractions extends StackFractions {
  /** Reflectance met from the exit side at the conjugate angle. T is the same from both sides. */
  readonly R_back: number | null;
}

export interface MixedStack {
  readonly s: MixedFractions;
  readonly p: MixedFractions;
  /** Mean of s and p. */
  readonly unpolarized: MixedFractions;
  readonly layers: readonly LayerCoherence[];
}

/**
 * Layers are coherent or not by `coherence.ts` unless `Layer.coherent` says; a coherence length of Infinity makes all of
 * them coherent. Throws `StackRefusal` as `coherentStack` does.
 */
export function mixedStack(
  path: LayeredPath,
  vacuumWavelength_m: number,
  incidenceAngle_rad: number,
  coherenceLength_m: number,
): MixedStack {
  checkPath(path, vacuumWavelength_m, incidenceAngle_rad);
  const k0_rad_per_m = (2 * Math.PI) / vacuumWavelength_m;
  const exact = incidentKappa2(path.incidence, incidenceAngle_rad);
  const atCritical = path.layers.some((layer) => abs2(kappaSquared(layer, path.incidence, exact)) < 1e-40);
  const incident = atCritical ? complex(exact.re + 1e-14) : exact;
  const kappa2 = (x: Substance): Complex => kappaSquared(x, path.incidence, incident);
  const layers = path.layers.map((layer) => {
    const kappa = sqrtDecaying(kappa2(layer));
    const optical = 2 * k0_rad_per_m * kappa.im * layer.thickness_m;
    const roundTripOpticalPath_m = 2 * Math.abs(kappa.re) * layer.thickness_m;
    const noFringe = roundTripOpticalPath_m < vacuumWavelength_m || kappa.im >= Math.abs(kappa.re);
    return {
      coherent: noFringe || (layer.coherent ?? isCoherent(roundTripOpticalPath_m, coherenceLength_m)),
      roundTripOpticalPath_m,
      internalTransmittance: Math.exp(-optical),
      internalAbsorptance: -Math.expm1(-optical),
    };
  });
  const groups = split(path, layers);
  const s = sumIntensities(path, groups, layers, kappa2, k0_rad_per_m, 's');
  const p = sumIntensities(path, groups, layers, kappa2, k0_rad_per_m, 'p');
  const R_back = s.R_back === null || p.R_back === null ? null : (s.R_back + p.R_back) / 2;
  return { s, p, unpolarized: { ...meanFractions(s, p), R_back }, layers };
}

/** eps mu - q^2, from the incident wave (see `stack-media.ts`). */
function kappaSquared(x: Substance, incidence: Substance, incident: Complex): Complex {
  const [a, b] = [indexSquared(x), indexSquared(incidence)];
  return complex(a.re - b.re + incident.re, a.im - b.im + incident.im);
}

/** Coherent layers between two media that are each a slab or an end of the path. */
interface Group {
  readonly above: Substance;
  readonly layers: readonly Layer[];
  /** Index in the path of the first of `layers`; the slab below, if any, follows the last. */
  readonly start: number;
  readonly below: Substance;
}

function split(path: LayeredPath, layers: readonly LayerCoherence[]): Group[] {
  const slabs = layers.flatMap((layer, i) => (layer.coherent ? [] : [i]));
  const bounds = [-1, ...slabs, path.layers.length];
  return bounds.slice(1).map((end, g) => {
    const start = (bounds[g] as number) + 1;
    return {
      above: path.layers[start - 1] ?? path.incidence,
      layers: path.layers.slice(start, end),
      start,
      below: path.layers[end] ?? path.exit,
    };
  });
}

/** A group met from one side: tangential r, |t|^2, power beyond and dissipated, all for unit |E|^2 of the incident wave. */
interface GroupResponse {
  readonly r: Complex;
  readonly t2: number;
  readonly flux: number;
  readonly incidentFlux: number;
  readonly dissipated: Float64Array;
}

function respond(
  from: Substance,
  layers: readonly Layer[],
  to: Substance,
  kappa2: Complex,
  k0_rad_per_m: number,
  polarization: Polarization,
): GroupResponse {
  const kernel = solveStack({ incidence: from, layers, exit: to }, k0_rad_per_m, kappa2);
  const dissipated = new Float64Array(layers.length);
  writeDissipations(kernel, polarization, 1, dissipated);
  return {
    r: tangentialReflection(kernel, polarization),
    t2: abs2(tangentialTransmission(kernel, polarization)),
    flux: exitFlux(kernel, polarization),
    incidentFlux: incidentFlux(kernel, polarization),
    dissipated,
  };
}

function sumIntensities(
  path: LayeredPath,
  groups: readonly Group[],
  layers: readonly LayerCoherence[],
  kappa2: (x: Substance) => Complex,
  k0_rad_per_m: number,
  polarization: Polarization,
): MixedFractions {
  const down = groups.map((g) =>
    respond(g.above, g.layers, g.below, kappa2(g.above), k0_rad_per_m, polarization),
  );
  const up = groups.map((g) =>
    respond(g.below, [...g.layers].reverse(), g.above, kappa2(g.below), k0_rad_per_m, polarization),
  );
  // Slab g lies below group g.
  const slabIndex = groups.map((g) => g.start + g.layers.length);
  const tau = slabIndex.map((i) => layers[i]?.internalTransmittance ?? 0);

  // From the exit up: |r|^2 of everything from group g on, and the gain of the slab above it by going to and fro.
  const count = groups.length;
  const below: number[] = new Array(count + 1).fill(0);
  const gain: number[] = new Array(count).fill(1);
  for (let g = count - 1; g >= 0; g--) {
    const { r, t2 } = down[g] as GroupResponse;
    const { r: rUp, t2: t2Up } = up[g] as GroupResponse;
    const returned = (tau[g] as number) ** 2 * (below[g + 1] as number);
    gain[g] = 1 / (1 - abs2(rUp) * returned);
    below[g] = abs2(r) + t2 * t2Up * returned * (gain[g] as number);
  }

  // From the incidence down: |E|^2 that arrives at each group from above.
  const unit = (down[0] as GroupResponse).incidentFlux;
  const layerAbsorptance: number[] = new Array(path.layers.length).fill(0);
  let arriving = 1;
  let T = 0;
  groups.forEach((group, g) => {
    const forth = down[g] as GroupResponse;
    const back = up[g] as GroupResponse;
    const t = tau[g] as number;
    const last = g === count - 1;
    const entering = arriving * forth.t2 * (gain[g] as number);
    const leavingBottom = last ? 0 : entering * t * (below[g + 1] as number);
    const leavingTop = leavingBottom * t;
    group.layers.forEach((_, j) => {
      const fromBelow = back.dissipated[group.layers.length - 1 - j] as number;
      const power = arriving * (forth.dissipated[j] as number) + leavingTop * fromBelow;
      layerAbsorptance[group.start + j] = power / unit;
    });
    if (last) {
      T = (arriving * forth.flux) / unit;
    } else {
      const slab = slabIndex[g] as number;
      const y = admittance(group.below, kappa2(group.below), polarization);
      const lost = (layers[slab]?.internalAbsorptance ?? 0) * (entering + leavingBottom);
      const beating = back.r.im * leavingTop + (down[g + 1] as GroupResponse).r.im * entering * t;
      layerAbsorptance[slab] = isLossless(group.below) ? 0 : (y.re * lost - 2 * y.im * beating) / unit;
    }
    arriving = entering * t;
  });
  return {
    R: below[0] as number,
    T,
    A: layerAbsorptance.reduce((sum, a) => sum + a, 0),
    layerAbsorptance,
    R_back: carriesWave(path.exit, kappa2(path.exit)) ? reflectanceFromBelow(down, up, tau) : null,
  };
}

function reflectanceFromBelow(
  down: readonly GroupResponse[],
  up: readonly GroupResponse[],
  tau: readonly number[],
): number {
  let above = 0;
  up.forEach(({ r, t2 }, g) => {
    const { r: rDown, t2: t2Down } = down[g] as GroupResponse;
    const returned = g === 0 ? 0 : (tau[g - 1] as number) ** 2 * above;
    above = abs2(r) + (t2 * t2Down * returned) / (1 - abs2(rDown) * returned);
  });
  return above;
}

const carriesWave = (x: Substance, kappa2: Complex): boolean => isLossless(x) && kappa2.re > 0;

function admittance(x: Substance, kappa2: Complex, polarization: Polarization): Complex {
  const kappa = sqrtDecaying(kappa2);
  return polarization === 's' ? div(kappa, x.mu) : div(x.eps, kappa);
}
