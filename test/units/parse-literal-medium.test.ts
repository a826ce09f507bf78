import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isLiteralMedium } from '../../src/units/is-literal-medium.ts';
import { parseComplex } from '../../src/units/parse-complex.ts';
import { parseLiteralMedium, type TypedMedium } from '../../src/units/parse-literal-medium.ts';
import { outcome } from './outcome.ts';

const z = (re: number, im = 0) => ({ re, im });

describe('complex numbers', () => {
  it.each<[string, object]>([
    ['1.5', z(1.5)],
    ['1.5+0.02i', z(1.5, 0.02)],
    ['1.5 + 0.02i', z(1.5, 0.02)],
    ['1.5-0.02i', z(1.5, -0.02)],
    ['1.5\u22120.02i', z(1.5, -0.02)],
    ['-10+1.2i', z(-10, 1.2)],
    ['0.02i', z(0, 0.02)],
    ['i', z(0, 1)],
    ['-i', z(0, -1)],
    ['2+i', z(2, 1)],
    ['2-i', z(2, -1)],
    ['1e-1+2e-3i', z(0.1, 0.002)],
    ['1e3', z(1000)],
  ])('%j', (text, value) => {
    expect(parseComplex(text)).toEqual(value);
  });

  it.each(['1.5+0.02', '1.5+0.02ii', '1 2i', 'ni', '1.5+i2', '+', '1.5+-0.02i', '1e+i'])(
    '%j is refused',
    (text) => {
      expect(outcome(parseComplex(text))).toMatch(/^not-a-number: /);
    },
  );

  it('reads back every complex number', () => {
    const finite = fc.double({ noNaN: true, noDefaultInfinity: true }).map((x) => x + 0);
    fc.assert(
      fc.property(finite, finite, (re, im) => {
        expect(parseComplex(`${re}${im < 0 ? '' : '+'}${im}i`)).toEqual(z(re, im));
      }),
    );
  });
});

describe('media given by their numbers', () => {
  it.each<[string, TypedMedium]>([
    ['n=1.5', { n: z(1.5) }],
    ['N = 1.5', { n: z(1.5) }],
    ['n=1.5+0.02i', { n: z(1.5, 0.02) }],
    ['n=1.5,k=0.02', { n: z(1.5, 0.02) }],
    ['n=0+3i', { n: z(0, 3) }],
    ['no=1.6584,ne=1.4864', { n: z(1.6584), ne: z(1.4864) }],
    ['NE=1.55, no=1.54+0.001i', { n: z(1.54, 0.001), ne: z(1.55) }],
    ['eps=9.8', { eps: z(9.8) }],
    ['eps=9.8+0.01i,mu=1.2', { eps: z(9.8, 0.01), mu: z(1.2) }],
    ['mu=1.2+0.1i, eps=9.8', { eps: z(9.8), mu: z(1.2, 0.1) }],
    ['eps=2.1,tand=0.0003', { eps: z(2.1), lossTangent: 3e-4 }],
    ['eps=4,sigma=0.01', { eps: z(4), conductivity_S_per_m: 0.01 }],
    ['eps=80,sigma=50mS/cm', { eps: z(80), conductivity_S_per_m: 5 }],
    ['eps=-10+1.2i', { eps: z(-10, 1.2) }],
    ['eps=-1,mu=-1', { eps: z(-1), mu: z(-1) }],
    ['ε=2.1,tanδ=0.0003', { eps: z(2.1), lossTangent: 3e-4 }],
    ['ε=9.8,\u00b5=1.2', { eps: z(9.8), mu: z(1.2) }],
  ])('%j', (text, medium) => {
    expect(isLiteralMedium(text)).toBe(true);
    expect(parseLiteralMedium(text)).toEqual(medium);
  });

  it('a name is no literal medium', () => {
    expect(isLiteralMedium('fused-silica')).toBe(false);
  });
});

describe('media that are refused', () => {
  const sign =
    'absorption has the plus sign here (fields exp(i(k r - w t)), n + ik with k >= 0); gain is not covered';
  const examples =
    'write for example n=1.5, n=1.5+0.02i, eps=9.8+0.01i,mu=1.2, eps=2.1,tand=0.0003 or eps=4,sigma=0.01';
  it.each<[string, string]>([
    ['n=1.5-0.02i', `gain: k is -0.02, which is gain; ${sign}`],
    ['n=1.5,k=-0.02', `gain: k is -0.02, which is gain; ${sign}`],
    ['eps=2-0.1i', `gain: the imaginary part of eps is -0.1, which is gain; ${sign}`],
    ['eps=2,mu=1-0.1i', `gain: the imaginary part of mu is -0.1, which is gain; ${sign}`],
    ['eps=2,tand=-0.1', `gain: tand is negative, which is gain; ${sign}`],
    ['eps=2,sigma=-1', `gain: sigma is negative, which is gain; ${sign}`],
    ['n=0', 'out-of-range: n is 0; no wave exists there; give n or k above 0'],
    ['eps=0', 'out-of-range: eps is 0; no wave exists there; give another value'],
    ['eps=2,mu=0', 'out-of-range: mu is 0; no wave exists there; give another value'],
    ['n=-1.5', 'out-of-range: n is -1.5; a negative index needs both eps and mu negative: eps=-1,mu=-1'],
    ['eps=-2,tand=0.1', 'out-of-range: tand needs eps above 0; write eps=-10+1i for a negative permittivity'],
    ['n=1.5,eps=2', 'not-a-medium: n and eps are given together; give the index alone, or eps and mu'],
    ['n=1.5,mu=2', 'not-a-medium: n and mu are given together; give the index alone, or eps and mu'],
    ['k=0.02', 'not-a-medium: k is given without n; write n=1.5,k=0.02 or n=1.5+0.02i'],
    ['n=1.5+0.1i,k=0.02', 'not-a-medium: k is given twice; give it once'],
    ['n=1.5,n=1.6', 'not-a-medium: n is given twice; give it once'],
    ['mu=2', `not-a-medium: neither n nor eps is given; ${examples}`],
    [
      'eps=2+1i,tand=0.1',
      'not-a-medium: tand and the imaginary part of eps both state the loss; give one of them',
    ],
    ['eps=2,tand=0.1,sigma=1', 'not-a-medium: tand and sigma both state the loss; give one of them'],
    ['index=1.5', `not-a-medium: "index=1.5" is no property of a medium; ${examples}`],
    ['n=1.5=2', `not-a-medium: "n=1.5=2" is no property of a medium; ${examples}`],
    ['=', `not-a-medium: "=" is no property of a medium; ${examples}`],
    ['__proto__=1', `not-a-medium: "__proto__=1" is no property of a medium; ${examples}`],
    ['n=1,55', 'not-a-medium: "n=1,55" has a decimal comma; write numbers with a point, as in n=1.55'],
    [
      'n=1.5-0.02j',
      'not-a-number: "1.5-0.02j" is written with j; the imaginary unit is i here, and n + ik absorbs: a loss written n - jk is n + ik',
    ],
    [
      'no=1.658',
      'not-a-medium: one principal index is missing; give a uniaxial crystal by both of its indices: no=1.658,ne=1.486',
    ],
    [
      'no=1.658,ne=1.486,mu=2',
      'not-a-medium: no, ne and mu are given together; give a uniaxial crystal by both of its indices: no=1.658,ne=1.486',
    ],
    ['n=glass', 'not-a-number: "glass" is not a real or complex number; write it as 1.5 or 1.5+0.02i'],
  ])('%j', (text, line) => {
    expect(outcome(parseLiteralMedium(text))).toBe(line);
  });
});

describe('numbers beyond any medium', () => {
  it.each<[string, string]>([
    ['n=1e21', 'greater than 1e20'],
    ['eps=1e21', 'greater than 1e20'],
    ['eps=4,sigma=1e21', 'greater than 1e20'],
    ['n=1e-21', 'smaller than 1e-20'],
    ['eps=1e-21', 'smaller than 1e-20'],
  ])('%j', (text, words) => {
    const line = outcome(parseLiteralMedium(text));
    expect(line).toContain('out-of-range: ');
    expect(line).toContain(`is ${words}; no medium is: check the exponent`);
  });

  it('are not those at the limits, nor a conductivity of zero', () => {
    for (const text of ['n=1e20', 'n=1e-20', 'eps=4,sigma=0'])
      expect(typeof outcome(parseLiteralMedium(text))).toBe('object');
  });
});
