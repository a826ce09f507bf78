/**
 * Numbers as people type them, strictly: `1`, `-1.5`, `.5`, `1.5e-3`, also with U+2212 as the minus and as
 * `4.1 × 10⁻⁶`, the way the program prints them. Refused: empty text, hexadecimal, an unfinished exponent, doubled signs,
 * grouping (`1_000`, `1 000`), the decimal comma, and what does not fit a double.
 */
import { type Decimal, decimalOfText, decimalToNumber, isZero } from './decimal.ts';
import { isProblem, type Problem, problem } from './problem.ts';
import { quoteInput } from './quote-input.ts';

export interface ScannedNumber {
  readonly value: number;
  readonly decimal: Decimal;
  /** The number as written, with an ASCII minus. */
  readonly numberText: string;
  /** What follows, not trimmed. */
  readonly rest: string;
}

const MANTISSA = /^[+-]?(?:\d+\.?\d*|\.\d+)/;
const EXPONENT = /^[eE]([+-]?\d+)/;
const TIMES_TEN = /^\s*×\s*10(?:\^([+-]?\d+)|([⁺⁻]?[⁰¹²³⁴⁵⁶⁷⁸⁹]+))/;
/** Digits, a second point or grouping after the number: it was meant as one number. `15800 1/cm` is a number and a unit. */
const RUNS_ON = /^(?:[.\d]|_\d|\s+\d(?!\/)|\s+1\/\d)/;
const UNFINISHED_EXPONENT = /^[eE](?:[+-]|\s|$)/;
const LONGEST = 400;
const IN_DECIMAL = 'write it in decimal, for example 1.5 or 1.5e-3';

/** The number at the start of the text, and the rest. */
export function scanNumber(text: string): ScannedNumber | Problem {
  const plain = text.trim().replaceAll('\u2212', '-');
  if (plain === '') return problem('empty', 'a number is missing', IN_DECIMAL);
  const mantissa = MANTISSA.exec(plain)?.[0];
  if (mantissa === undefined || plain.length > LONGEST) return notANumber(text, IN_DECIMAL);
  const after = plain.slice(mantissa.length);
  const power = EXPONENT.exec(after) ?? TIMES_TEN.exec(after);
  const exponent = power ? asciiExponent(power[1] ?? power[2] ?? '0') : 0;
  const rest = after.slice(power?.[0].length ?? 0);
  if (/^,\d/.test(rest)) return notANumber(text, commaRemedy(plain));
  if (UNFINISHED_EXPONENT.test(rest))
    return notANumber(text, `complete its exponent, for example ${mantissa}e-3`);
  if (RUNS_ON.test(rest))
    return notANumber(text, 'write one number without grouping, for example 1550 or 1.55');
  const written = decimalOfText(mantissa);
  if (!written) return notANumber(text, IN_DECIMAL);
  const decimal = { ...written, exponent: written.exponent + exponent };
  const value = decimalToNumber(decimal);
  if (!Number.isFinite(value) || (value === 0 && !isZero(decimal))) {
    return problem(
      'number-too-large',
      `${quoteInput(text)} is beyond the numbers a computer holds`,
      IN_DECIMAL,
    );
  }
  return { value: value + 0, decimal, numberText: plain.slice(0, plain.length - rest.length), rest };
}

/** The whole text as one number. */
export function parseNumber(text: string): number | Problem {
  const scanned = scanNumber(text);
  if (isProblem(scanned)) return scanned;
  return scanned.rest === '' ? scanned.value : notANumber(text, IN_DECIMAL);
}

function notANumber(text: string, remedy: string): Problem {
  return problem('not-a-number', `${quoteInput(text)} is not a number`, remedy);
}

const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

function asciiExponent(text: string): number {
  const ascii = [...text].map((c) => {
    if (c === '⁻') return '-';
    return c === '⁺' ? '+' : SUPERSCRIPTS.includes(c) ? String(SUPERSCRIPTS.indexOf(c)) : c;
  });
  return Number(ascii.join(''));
}

/** `1,55` can only be 1.55; `1,550` can be two numbers; `1,234.5` and `1,234,567` are grouped. */
function commaRemedy(plain: string): string {
  const [, whole = '', groups = '', point = '', tail = ''] =
    /^([+-]?\d*)((?:,\d+)+)(\.\d*)?(.*)$/su.exec(plain) ?? [];
  const shown = (number: string): string => quoteInput(number + tail).slice(1, -1);
  const digits = groups.replaceAll(',', '');
  if (point !== '' || /,.*,/.test(groups)) return `did you mean ${shown(whole + digits + point)}?`;
  const decimal = `did you mean ${shown(`${whole || '0'}.${digits}`)}`;
  return digits.length === 3 && /[1-9]/.test(whole)
    ? `${decimal} or ${shown(whole + digits)}?`
    : `${decimal}?`;
}
