/**
 * Reflectance over the angle of incidence, for both polarizations, from the media of an answer. The same law that made the
 * answer makes the curve.
 */
import type { Answer, MediumAnswer } from '../answer/answer.ts';
import { type OpticsPath, opticsPowers } from '../answer/optics-powers.ts';
import type { Optics } from '../interface/optics.ts';

export interface Curve {
  /** Name of the line: "s", "p". */
  readonly name: string;
  /** From 0 to 1 along the axis to a value from 0 to 1; null where there is none. */
  readonly valueAt: (x: number) => number | null;
}

const RIGHT_ANGLE = Math.PI / 2;

export function angleCurves(answer: Answer): readonly Curve[] {
  const path: OpticsPath = {
    from: opticsOf(answer.from),
    layers: answer.layers.map(({ medium, thickness_m, coherent }) => ({
      optics: opticsOf(medium),
      thickness_m,
      coherent,
    })),
    into: opticsOf(answer.into),
    coherenceLength_m: answer.stack?.coherenceLength_m ?? 0,
  };
  const at = (x: number) => opticsPowers(path, answer.wave.vacuumWavelength_m, x * RIGHT_ANGLE);
  return [
    { name: 's', valueAt: (x) => clamp(at(x)?.Rs) },
    { name: 'p', valueAt: (x) => clamp(at(x)?.Rp) },
  ];
}

export function opticsOf(medium: MediumAnswer): Optics {
  return {
    n: { re: medium.n, im: medium.k },
    eps: medium.relativePermittivity,
    mu: medium.relativePermeability,
  };
}

export function clamp(value: number | undefined): number | null {
  return value !== undefined && Number.isFinite(value) ? Math.max(0, Math.min(1, value)) : null;
}
