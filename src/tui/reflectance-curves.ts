/**
 * Reflectance over the angle of incidence, for both polarizations, from the media of an answer. The same law that made the
 * answer makes the curve.
 */
import type { Answer, MediumAnswer } from '../answer/answer.ts';
import { fresnel } from '../interface/fresnel.ts';
import type { Optics } from '../interface/optics.ts';
import type { LayeredPath } from '../stack/layered-path.ts';
import { mixedStack } from '../stack/mixed-stack.ts';

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
  if (answer.layers.length > 0) return pathCurves(answer);
  const from = opticsOf(answer.from);
  const into = opticsOf(answer.into);
  const at = (x: number) => fresnel(from, into, Math.min(x, NEARLY) * RIGHT_ANGLE);
  return [
    { name: 's', valueAt: (x) => clamp(at(x).Rs) },
    { name: 'p', valueAt: (x) => clamp(at(x).Rp) },
  ];
}

/** Of a path of layers, at the wave of the answer and with its coherence. */
function pathCurves(answer: Answer): readonly Curve[] {
  const substance = ({ relativePermittivity: eps, relativePermeability: mu }: MediumAnswer) => ({ eps, mu });
  const { from, into, layers, stack, wave } = answer;
  const path: LayeredPath = {
    incidence: {
      eps: { re: from.relativePermittivity.re, im: 0 },
      mu: { re: from.relativePermeability.re, im: 0 },
    },
    layers: layers.map((l) => ({ ...substance(l.medium), thickness_m: l.thickness_m })),
    exit: substance(into),
  };
  const coherence_m = stack?.coherenceLength_m ?? Number.POSITIVE_INFINITY;
  const at = (x: number) =>
    mixedStack(path, wave.vacuumWavelength_m, Math.min(x, NEARLY) * RIGHT_ANGLE, coherence_m);
  return [
    { name: 's', valueAt: (x) => clamp(at(x).s.R) },
    { name: 'p', valueAt: (x) => clamp(at(x).p.R) },
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
