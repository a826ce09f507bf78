/**
 * What a surface and a plain plate take of a beam at normal incidence, in air.
 *   surface   R of one surface, air to medium
 *   plate     1 - T of an uncoated plane plate: two surfaces, all reflections summed as intensities, absorption inside
 */
import type { FitWave } from '../catalog/choose-fit.ts';
import { fresnel } from '../interface/fresnel.ts';
import { type Optics, opticsFromIndex } from '../interface/optics.ts';
import { complex, ONE } from '../num/complex.ts';
import { windowFractions } from '../stack/window.ts';
import { quickMedium } from './quick-medium.ts';
import type { Survey } from './survey.ts';

/** The catalogue's air as the medium around a part, transparent; vacuum where its data do not reach (below 0.185 um). */
export function airAround(survey: Survey, wave: FitWave): Optics {
  const air = survey.material('air');
  const n = air ? quickMedium(survey, air, 'isotropic', wave)?.n : undefined;
  return opticsFromIndex(complex(n ?? 1), ONE);
}

export function surfaceReflectance(outside: Optics, inside: Optics): number {
  return fresnel(outside, inside, 0).Rs;
}

export interface PlateFractions {
  /** One surface, from outside. */
  readonly R1: number;
  readonly internalTransmittance: number;
  readonly T: number;
  /** 1 - T: reflected by both surfaces and absorbed. */
  readonly loss: number;
}

export function plateFractions(
  outside: Optics,
  inside: Optics,
  thickness_m: number,
  vacuumWavelength_m: number,
): PlateFractions {
  const around = { eps: outside.eps, mu: outside.mu };
  const { s } = windowFractions(
    around,
    { eps: inside.eps, mu: inside.mu },
    thickness_m,
    around,
    vacuumWavelength_m,
    0,
    1,
  );
  return { R1: s.R1, internalTransmittance: s.internalTransmittance, T: s.T, loss: 1 - s.T };
}
