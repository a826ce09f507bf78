/**
 * Reflection, transmission and absorption of a coherent stack: any passive layers, any permittivity and permeability,
 * s and p, any thickness. Waves add as amplitudes; the light is monochromatic and the faces are parallel.
 *
 * r and t are ratios of electric field amplitudes at the first interface and at the surface of the exit medium, in the
 * convention exp(i(k r - w t)): r_s = -r_p at normal incidence (Born & Wolf); t_p is the ratio of full E amplitudes, so
 * for no layers at all these are the Fresnel coefficients. R = |r|^2, T and A are fractions of the incident power through
 * a plane parallel to the faces. Method and source: `stack-kernel.ts`.
 *
 * Special cases: an exit medium in total reflection takes T = 0 exactly; a zero-thickness layer is absent; an opaque
 * layer gives T = 0 by underflow, never NaN. An absorbing medium of incidence is refused.
 */
import { abs2, type Complex, neg } from '../num/complex.ts';
import { checkPath, type LayeredPath, type Polarization } from './layered-path.ts';
import {
  exitFlux,
  fieldTransmissionP,
  incidentFlux,
  incidentKappa2,
  solveStack,
  tangentialReflection,
  tangentialTransmission,
  writeDissipations,
} from './solved-stack.ts';
import type { StackKernel } from './stack-kernel.ts';

export interface StackFractions {
  /** Reflectance, transmittance, absorptance (the sum over the layers). */
  readonly R: number;
  readonly T: number;
  readonly A: number;
  /** Of each layer, in the order the wave meets them. */
  readonly layerAbsorptance: readonly number[];
}

export interface PolarizedStack extends StackFractions {
  readonly r: Complex;
  readonly t: Complex;
}

export interface CoherentStack {
  readonly s: PolarizedStack;
  readonly p: PolarizedStack;
  /** Mean of s and p. */
  readonly unpolarized: StackFractions;
}

/** Throws `StackRefusal` for media, lengths and angles outside the physics (see `checkPath`). */
export function coherentStack(
  path: LayeredPath,
  vacuumWavelength_m: number,
  incidenceAngle_rad: number,
): CoherentStack {
  checkPath(path, vacuumWavelength_m, incidenceAngle_rad);
  const k0_rad_per_m = (2 * Math.PI) / vacuumWavelength_m;
  const kernel = solveStack(path, k0_rad_per_m, incidentKappa2(path.incidence, incidenceAngle_rad));
  const s = polarized(path, kernel, 's', incidenceAngle_rad);
  const p = polarized(path, kernel, 'p', incidenceAngle_rad);
  return { s, p, unpolarized: meanFractions(s, p) };
}

/** The mean of two polarizations, quantity by quantity. */
export function meanFractions(s: StackFractions, p: StackFractions): StackFractions {
  return {
    R: (s.R + p.R) / 2,
    T: (s.T + p.T) / 2,
    A: (s.A + p.A) / 2,
    layerAbsorptance: s.layerAbsorptance.map((a, i) => (a + (p.layerAbsorptance[i] as number)) / 2),
  };
}

function polarized(
  path: LayeredPath,
  kernel: StackKernel,
  polarization: Polarization,
  incidenceAngle_rad: number,
): PolarizedStack {
  const overIncoming = 1 / incidentFlux(kernel, polarization);
  const rTangential = tangentialReflection(kernel, polarization);
  const layerAbsorptance = new Float64Array(path.layers.length);
  writeDissipations(kernel, polarization, overIncoming, layerAbsorptance);
  return {
    R: abs2(rTangential),
    T: exitFlux(kernel, polarization) * overIncoming,
    A: layerAbsorptance.reduce((sum, a) => sum + a, 0),
    layerAbsorptance: [...layerAbsorptance],
    r: polarization === 's' ? rTangential : neg(rTangential),
    t:
      polarization === 's'
        ? tangentialTransmission(kernel, 's')
        : fieldTransmissionP(kernel, path.exit, incidenceAngle_rad),
  };
}
