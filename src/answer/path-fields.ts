/**
 * How strong the field is in the layers and in front of them, for unit incident |E|^2: nothing here depends on the beam.
 *
 * Wholly coherent paths have a standing wave: its greatest |E|^2 in each layer, from the exact field. Where layers are summed
 * as intensities there is none; a layer then has the wave that enters it, from the power that arrives at its front face (the
 * path up to there, closed by the layer's own medium), spread over the refracted beam: I_j/I = T_j cos/cos_j.
 * Unpolarized light: powers are means; the standing wave is that of s.
 */

import { LOSSY_INCIDENCE } from '../interface/special-angles.ts';
import {
  type FrontField,
  frontField,
  layerMaximum,
  solveField,
  stackMaximum,
} from '../stack/field-profile.ts';
import { mixedStack } from '../stack/mixed-stack.ts';
import { StackRefusal } from '../stack/stack-refusal.ts';
import { powerOf } from './interface-answer.ts';
import type { MediumSide } from './medium-side.ts';
import { layeredPath, type Path } from './path.ts';
import type { Question } from './question.ts';
import type { StackParts } from './stack-answer.ts';

export interface LayerField {
  /** |E|^2 over that of the incident wave, greatest in the layer; null where no wave propagates in a slab. */
  readonly intensity: number | null;
  readonly position_m: number | null;
  /** Irradiance of the entering wave over that of the incident one; null where not asked for. */
  readonly enteringShare: number | null;
  /** Along the ray. */
  readonly rayLength_m: number | null;
  readonly absorptionCoefficient_per_m: number;
}

export interface PathFields {
  readonly layers: readonly LayerField[];
  readonly maximum: {
    readonly intensity: number;
    readonly position_m: number;
    readonly layer: number;
  } | null;
  readonly before: FrontField | null;
}

/** In front of a single surface; null where the first medium absorbs too much for a standing wave to be told. */
export function surfaceFields(
  from: MediumSide,
  into: MediumSide,
  question: Question,
  vacuumWavelength_m: number,
): PathFields {
  const lossy = from.optics.n.im > LOSSY_INCIDENCE * Math.abs(from.optics.n.re);
  const before = lossy ? null : frontOf({ from, layers: [], into }, question, vacuumWavelength_m);
  return { layers: [], maximum: null, before };
}

export function pathFields(
  path: Path,
  question: Question,
  { stack: { coherence, coherenceLength_m } }: StackParts,
  vacuumWavelength_m: number,
): PathFields {
  const { incidenceAngle_rad, polarization } = question;
  const wholly = coherence === 'coherent';
  const layered = layeredPath(path);
  const field = wholly
    ? solveField(layered, vacuumWavelength_m, incidenceAngle_rad, polarization === 'p' ? 'p' : 's')
    : null;
  const highest = field && stackMaximum(field);
  const n0 = path.from.optics.n.re;
  const q = n0 * Math.sin(incidenceAngle_rad);
  let front_m = 0;
  const layers = path.layers.map(({ side, thickness_m }, i): LayerField => {
    const top_m = front_m;
    front_m += thickness_m;
    const n = side.optics.n.re;
    const cos = Math.abs(q) < n ? Math.sqrt(1 - (q / n) ** 2) : null;
    const asked = !wholly || question.layers[i]?.nonlinearIndex_m2_per_W !== undefined;
    let enteringShare: number | null = null;
    if (asked && cos !== null) {
      const { eps, mu } = side.optics;
      const upToHere = { ...layered, layers: layered.layers.slice(0, i), exit: { eps, mu } };
      const { s, p } = mixedStack(upToHere, vacuumWavelength_m, incidenceAngle_rad, coherenceLength_m);
      enteringShare = (powerOf(polarization, s.T, p.T) * Math.cos(incidenceAngle_rad)) / cos;
    }
    const standing = field && layerMaximum(field, i);
    const entering = enteringShare === null ? null : enteringShare * (n0 / n) * side.optics.mu.re;
    return {
      intensity: standing ? standing.intensity : entering,
      position_m: standing ? standing.position_m : entering === null ? null : top_m,
      enteringShare,
      rayLength_m: cos === null ? null : thickness_m / cos,
      absorptionCoefficient_per_m: (4 * Math.PI * side.optics.n.im) / vacuumWavelength_m,
    };
  });
  return {
    layers,
    maximum: highest && {
      intensity: highest.intensity,
      position_m: highest.position_m,
      layer: highest.region + 1,
    },
    before: field && frontField(field),
  };
}

/** Null where the laws have no answer for the two media. */
function frontOf(path: Path, question: Question, vacuumWavelength_m: number): FrontField | null {
  const polarization = question.polarization === 'p' ? 'p' : 's';
  try {
    const { incidenceAngle_rad } = question;
    const front = frontField(
      solveField(layeredPath(path), vacuumWavelength_m, incidenceAngle_rad, polarization),
    );
    // Indices at the end of the range of doubles overflow on the way.
    return Number.isFinite(front.intensity) ? front : null;
  } catch (error) {
    if (error instanceof StackRefusal) return null;
    throw error;
  }
}
