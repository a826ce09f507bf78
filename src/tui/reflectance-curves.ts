/**
 * Reflectance over the angle of incidence, for both polarizations, from the media of an answer. The same law that made the
 * answer makes the curve.
 */
import type { Answer, MediumAnswer } from '../answer/answer.ts';
import { fresnel } from '../interface/fresnel.ts';
import type { Optics } from '../interface/optics.ts';

export interface Curve {
  /** Name of the line: "s", "p". */
  readonly name: string;
  /** From 0 to 1 along the axis to a value from 0 to 1; null where there is none. */
  readonly valueAt: (x: number) => number | null;
}

const RIGHT_ANGLE = Math.PI / 2;
/** Grazing incidence itself has no transmitted wave to divide by. */
const NEARLY = 1 - 1e-6;

export function angleCurves(answer: Answer): readonly Curve[] {
  const from = opticsOf(answer.from);
  const into = opticsOf(answer.into);
  const at = (x: number) => fresnel(from, into, Math.min(x, NEARLY) * RIGHT_ANGLE);
  return [
    { name: 's', valueAt: (x) => clamp(at(x).Rs) },
    { name: 'p', valueAt: (x) => clamp(at(x).Rp) },
  ];
}

export function opticsOf(medium: MediumAnswer): Optics {
  return {
    n: { re: medium.n, im: medium.k },
    eps: medium.relativePermittivity,
    mu: medium.relativePermeability,
  };
}

export function clamp(value: number): number | null {
  return Number.isFinite(value) ? Math.max(0, Math.min(1, value)) : null;
}
