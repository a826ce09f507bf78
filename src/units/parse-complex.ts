/** Complex numbers: `1.5`, `1.5+0.02i`, `1.5 - 0.02i`, `0.02i`, `2+i`. The imaginary unit is i; j is refused by name. */
import type { Complex } from '../num/complex.ts';
import { parseNumber, scanNumber } from './parse-number.ts';
import { isProblem, type Problem, problem } from './problem.ts';
import { quoteInput } from './quote-input.ts';

export function parseComplex(text: string): Complex | Problem {
  const joined = text
    .trim()
    .replaceAll('\u2212', '-')
    .replace(/\s*([+-])\s*(?=[\d.i])/g, '$1');
  if (/j$/i.test(joined)) {
    const remedy = `the imaginary unit is i here, and n + ik absorbs: a loss written n - jk is n + ik`;
    return problem('not-a-number', `${quoteInput(text)} is written with j`, remedy);
  }
  const imaginary = /^(.*[^eE+-])?([+-]?)i$/.exec(joined);
  if (!imaginary) {
    const re = parseNumber(joined);
    if (isProblem(re)) return re.code === 'not-a-number' ? notComplex(text) : re;
    return { re, im: 0 };
  }
  const [, before = '', sign = ''] = imaginary;
  // `2+i` and `i`: the imaginary part has no digits.
  if (sign !== '' || before === '') return withImaginary(text, before, sign === '-' ? -1 : 1);
  const first = scanNumber(before);
  if (isProblem(first)) return first;
  if (first.rest === '') return { re: 0, im: first.value };
  const im = /^[+-]/.test(first.rest) ? parseNumber(first.rest) : notComplex(text);
  return isProblem(im) ? im : { re: first.value, im };
}

function withImaginary(text: string, realText: string, im: number): Complex | Problem {
  const re = realText === '' ? 0 : parseNumber(realText);
  return isProblem(re) ? notComplex(text) : { re, im };
}

function notComplex(text: string): Problem {
  return problem(
    'not-a-number',
    `${quoteInput(text)} is not a real or complex number`,
    'write it as 1.5 or 1.5+0.02i',
  );
}
