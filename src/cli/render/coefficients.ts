/** The coefficients of a fit as its source prints them, one a line; short lists in one. */
import type { ModelParameters } from '../../dispersion/parameters.ts';
import { labelled } from './page.ts';

export function coefficientLines(parameters: ModelParameters): readonly string[] {
  return coefficientRows(parameters).flatMap(([name, text]) => labelled(name, text, COLUMN));
}

/** Name and value. */
export function coefficientRows(parameters: ModelParameters): readonly (readonly [string, string])[] {
  const { model: _, ...rest } = parameters;
  return [...leaves(rest, '')];
}

const COLUMN = 30;

/** Names as in the catalogue's files, units included; `poles.1.B`. */
function* leaves(value: unknown, path: string): Generator<readonly [string, string]> {
  if (Array.isArray(value) && value.every((x) => typeof x !== 'object' || x === null)) {
    yield [path, value.map((x) => (x === null ? '-' : String(x))).join(', ')];
  } else if (typeof value === 'object' && value !== null) {
    for (const [key, part] of Object.entries(value)) {
      const name = Array.isArray(value) ? String(Number(key) + 1) : key;
      yield* leaves(part, path === '' ? name : `${path}.${name}`);
    }
  } else yield [path, String(value)];
}
