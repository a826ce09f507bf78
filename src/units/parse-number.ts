/**
 * Numbers as people type them, strictly: `1`, `-1.5`, `.5`, `1.5e-3`, also with U+2212 as the minus and as
 * `4.1 × 10⁻⁶`, the way the program prints them. Refused: empty text, hexadecimal, an unfinished exponent, doubled signs,
 * grouping (`1_000`, `1 000`), the decimal comma, and what does not fit a double.
 */
import { isLetter, skipDigits, skipSign } from '../num/ascii.ts';
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
  const mantissa = plain.slice(0, mantissaEnd(plain));
  if (mantissa === '' || plain.length > LONGEST) return notANumber(text, IN_DECIMAL);
  const { length, exponent } = powerOf(plain.slice(mantissa.length));
  const rest = plain.slice(mantissa.length + length);
  // What begins with a letter but e, a unit as a rule, is none of these.
  const first = rest.charCodeAt(0);
  if ((!isLetter(first) || (first | 0x20) === 0x65) && rest !== '') {
    if (/^,\d/.test(rest)) return notANumber(text, commaRemedy(plain));
    if (UNFINISHED_EXPONENT.test(rest))
      return notANumber(text, `complete its exponent, for example ${mantissa}e-3`);
    if (RUNS_ON.test(rest))
      return notANumber(text, 'write one number without grouping, for example 1550 or 1.55');
  }
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

/** The place behind a sign, digits and a point among or before them; 0 where there is no digit. */
function mantissaEnd(plain: string): number {
  const start = skipSign(plain, 0);
  const point = skipDigits(plain, start);
  const end = plain[point] === '.' ? skipDigits(plain, point + 1) : point;
  return end - start > (plain[point] === '.' ? 1 : 0) ? end : 0;
}

/** The power of ten that `after` begins with, in either way of writing it, and how many characters it takes. */
function powerOf(after: string): { readonly length: number; readonly exponent: number } {
  if (after[0] === 'e' || after[0] === 'E') {
    const digits = skipSign(after, 1);
    const end = skipDigits(after, digits);
    if (end > digits) return { length: end, exponent: Number(after.slice(1, end)) };
  }
  const power = after.includes('×') ? TIMES_TEN.exec(after) : undefined;
  return power
    ? { length: power[0].length, exponent: asciiExponent(power[1] ?? power[2] ?? '0') }
    : { length: 0, exponent: 0 };
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
