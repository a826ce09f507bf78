/**
 * Standard uncertainties stated with a question: `wave=1nm,angle=0.5deg,n=1e-4,thickness=5nm,temperature=0.5C`.
 * `n` belongs to the medium beyond, `n1` to the medium of incidence, `nlayer` to every layer between them; a thickness may be
 * a share of each layer's own, `thickness=1%`; a bare angle is in degrees.
 * The wave's may be in any of its units; `wavelengthTolerance_m` turns it into a wavelength once the wave is known.
 */
import { parseAngleTolerance } from './parse-angle.ts';
import { parseFraction } from './parse-fraction.ts';
import { LENGTH_SPEC } from './parse-length.ts';
import { parseNumber } from './parse-number.ts';
import { NOT_BELOW_ZERO, parseQuantity, parseValue } from './parse-quantity.ts';
import { parseTemperatureInterval } from './parse-temperature.ts';
import { WAVE_KINDS } from './parse-wave.ts';
import { isProblem, type Problem, problem } from './problem.ts';
import { quoteInput } from './quote-input.ts';
import { frequencyFromWavelength, photonEnergyFromWavelength } from './wave.ts';

export interface WaveTolerance {
  readonly kind: 'wavelength' | 'frequency' | 'photon-energy' | 'wavenumber';
  /** m, Hz, eV or 1/m. */
  readonly value: number;
}

export interface TypedTolerances {
  readonly wave?: WaveTolerance;
  readonly angle_rad?: number;
  readonly index?: number;
  readonly indexFrom?: number;
  readonly indexLayers?: number;
  readonly thickness_m?: number;
  readonly thicknessShare?: number;
  readonly temperature_K?: number;
}

const EXAMPLES = 'write for example wave=1nm,angle=0.5deg,n=1e-4,thickness=5nm,temperature=0.5C';

const PARTS: Readonly<Record<string, (text: string) => TypedTolerances | Problem>> = {
  wave: (text) => field('wave', parseWaveTolerance(text)),
  angle: (text) => field('angle_rad', parseAngleTolerance(text)),
  n: (text) => field('index', parseIndexTolerance(text)),
  n1: (text) => field('indexFrom', parseIndexTolerance(text)),
  nlayer: (text) => field('indexLayers', parseIndexTolerance(text)),
  thickness: (text) =>
    /%\s*$/.test(text)
      ? field('thicknessShare', parseFraction(text))
      : field(
          'thickness_m',
          parseValue(text, { ...LENGTH_SPEC, what: 'a tolerance of the thickness', range: NOT_BELOW_ZERO }),
        ),
  temperature: (text) => field('temperature_K', parseTemperatureInterval(text)),
};

export function parseTolerances(text: string): TypedTolerances | Problem {
  let all: TypedTolerances = {};
  const seen = new Set<string>();
  for (const part of text.split(',')) {
    const [typed = '', value, ...more] = part.split('=');
    const name = typed.trim().toLowerCase();
    const parse = Object.hasOwn(PARTS, name) ? PARTS[name] : undefined;
    if (!parse || value === undefined || more.length > 0) {
      return problem('not-a-tolerance', `${quoteInput(part.trim())} is no tolerance`, EXAMPLES);
    }
    if (seen.has(name))
      return problem('not-a-tolerance', `the tolerance of ${name} is given twice`, 'give it once');
    seen.add(name);
    const one = parse(value);
    if (isProblem(one)) return one;
    all = { ...all, ...one };
  }
  return all;
}

/** The tolerance as one of the vacuum wavelength, to first order, in metres. */
export function wavelengthTolerance_m(tolerance: WaveTolerance, vacuumWavelength_m: number): number {
  const { kind, value } = tolerance;
  if (kind === 'wavelength') return value;
  const share =
    kind === 'frequency'
      ? value / frequencyFromWavelength(vacuumWavelength_m)
      : kind === 'photon-energy'
        ? value / photonEnergyFromWavelength(vacuumWavelength_m)
        : value * vacuumWavelength_m;
  return share * vacuumWavelength_m;
}

function field<Name extends keyof TypedTolerances>(
  name: Name,
  value: NonNullable<TypedTolerances[Name]> | Problem,
): TypedTolerances | Problem {
  return isProblem(value) ? value : { [name]: value };
}

function parseWaveTolerance(text: string): WaveTolerance | Problem {
  const quantity = parseQuantity(text, {
    what: 'a tolerance of the wave',
    kinds: WAVE_KINDS,
    examples: '1nm, 2GHz or 0.5cm-1',
    unitNames: 'nm, um, mm, m, Hz to PHz, meV, eV and cm-1',
    range: NOT_BELOW_ZERO,
  });
  if (isProblem(quantity)) return quantity;
  const { kind } = quantity.unit;
  return {
    kind: kind === 'length' ? 'wavelength' : kind,
    value: quantity.value_SI,
  };
}

function parseIndexTolerance(text: string): number | Problem {
  const value = parseNumber(text);
  if (isProblem(value) || value >= 0) return value;
  return problem(
    'out-of-range',
    `${quoteInput(text)} is out of range: a tolerance must be 0 or above`,
    'write for example n=1e-4',
  );
}
