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
import { abs2, type Complex, complex, sqrtDecaying } from '../num/complex.ts';
import { isCoherent } from './coherence.ts';
import { meanFractions } from './coherent-stack.ts';
import { type Group, type MixedFractions, type Slab, sumIntensities } from './intensity-sum.ts';
import { checkPath, indexSquared, type LayeredPath, type Substance } from './layered-path.ts';
import { incidentKappa2 } from './solved-stack.ts';

export type { MixedFractions } from './intensity-sum.ts';

export interface LayerCoherence extends Slab {
  readonly coherent: boolean;
  /** 2 n d cos(theta inside). */
  readonly roundTripOpticalPath_m: number;
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
