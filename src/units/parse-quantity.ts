/**
 * A number and a unit, `5mW` or `5 mW`, for one kind of quantity. Every other parser of this folder that takes a unit
 * is a `QuantitySpec` given to `parseQuantity`, so that all refuse in the same words: a bare number (unless one unit is
 * declared for it), an unknown unit, a unit of another kind, a spelling that fits two units, a value out of range.
 */
import type { Decimal } from './decimal.ts';
import { findUnit } from './find-unit.ts';
import { scanNumber } from './parse-number.ts';
import { isProblem, type Problem, problem } from './problem.ts';
import { quoteInput } from './quote-input.ts';
import { KIND_NAMES, type Unit, type UnitKind, type UnitOf } from './unit.ts';

export interface QuantitySpec<Kind extends UnitKind = UnitKind> {
  /** With its article: "a power". */
  readonly what: string;
  readonly kinds: readonly Kind[];
  /** Right ways to write it: "5mW, 1kW or 10dBm". */
  readonly examples: string;
  /** Units to name when the unit is missing or unknown: "nm, um, mm". */
  readonly unitNames: string;
  /** The one unit that a bare number is taken in. */
  readonly bare?: string;
  /** The values allowed, in SI, and the words for them: "above 0". */
  readonly range?: { readonly allows: (value_SI: number) => boolean; readonly words: string };
}

export interface Quantity<Kind extends UnitKind = UnitKind> {
  /** In the unit of the kind that `Unit.toSI` gives. */
  readonly value_SI: number;
  readonly unit: UnitOf<Kind>;
  /** As typed, digits kept. */
  readonly decimal: Decimal;
}

export const ABOVE_ZERO = { allows: (x: number): boolean => x > 0, words: 'above 0' };
export const NOT_BELOW_ZERO = { allows: (x: number): boolean => x >= 0, words: '0 or above' };

export function parseQuantity<Kind extends UnitKind>(
  text: string,
  spec: QuantitySpec<Kind>,
): Quantity<Kind> | Problem {
  const examples = `write for example ${spec.examples}`;
  if (text.trim() === '') return problem('empty', `${spec.what} is missing`, examples);
  const scanned = scanNumber(text);
  if (isProblem(scanned)) return explain(text, spec, scanned);
  const unitText = scanned.rest.trim() === '' ? spec.bare : scanned.rest;
  if (unitText === undefined) {
    return problem('unit-missing', `${scanned.numberText} what? ${spec.what} needs a unit`, examples);
  }
  const lookup = findUnit(unitText, spec.kinds);
  if (lookup.found === 'none') {
    const shown = quoteInput(unitText.trim());
    return problem('unit-unknown', `${shown} is no unit of ${spec.what}`, `units are ${spec.unitNames}`);
  }
  if (lookup.found === 'other-kind') {
    const message = `${quoteInput(text)} is ${KIND_NAMES[lookup.unit.kind]}, not ${spec.what}`;
    return problem('unit-of-another-kind', message, examples);
  }
  if (lookup.found === 'several') return ambiguous(text, scanned.numberText, lookup.readings);
  const value_SI = lookup.unit.toSI(scanned.decimal) + 0;
  if (!Number.isFinite(value_SI) || (spec.range && !spec.range.allows(value_SI))) {
    const words = spec.range?.words ?? 'a number a computer holds';
    return problem(
      'out-of-range',
      `${quoteInput(text)} is out of range: ${spec.what} must be ${words}`,
      examples,
    );
  }
  return { value_SI, unit: lookup.unit, decimal: scanned.decimal };
}

/** As `parseQuantity`, the SI value only. */
export function parseValue(text: string, spec: QuantitySpec): number | Problem {
  const quantity = parseQuantity(text, spec);
  return isProblem(quantity) ? quantity : quantity.value_SI;
}

/** A text without any number is no quantity at all; a malformed number keeps its own remedy. */
function explain(text: string, spec: QuantitySpec, p: Problem): Problem {
  const hasNumber = /^\s*[+\-\u2212]?\.?\d/.test(text);
  if (hasNumber) return p;
  const message = `${quoteInput(text)} is not ${spec.what}: it does not begin with a number`;
  return problem(p.code, message, `write for example ${spec.examples}`);
}

function ambiguous(text: string, numberText: string, readings: readonly Unit[]): Problem {
  const each = readings.map((unit) => `${numberText} ${unit.symbol} (${unit.name})`);
  const usable = readings
    .filter((unit) => unit.mistakenFor === undefined)
    .map((unit) => numberText + unit.symbol);
  const message = `${quoteInput(text)} may be read as ${each.join(' or ')}`;
  const other = usable.length < readings.length ? ', or another unit' : ' in exact case';
  return problem('unit-ambiguous', message, `write ${usable.join(' or ')}${other}`);
}
