import { expect, it } from 'vitest';
import { parseThickness } from '../../src/units/parse-thickness.ts';
import { outcome } from './outcome.ts';

it.each<[string, object]>([
  ['100nm', { kind: 'length', thickness_m: 1e-7 }],
  ['5 mm', { kind: 'length', thickness_m: 5e-3 }],
  ['qw', { kind: 'waves', waves: 0.25 }],
  ['QW', { kind: 'waves', waves: 0.25 }],
  ['3qw', { kind: 'waves', waves: 0.75 }],
  ['3 qw', { kind: 'waves', waves: 0.75 }],
  ['hw', { kind: 'waves', waves: 0.5 }],
  ['0.5hw', { kind: 'waves', waves: 0.25 }],
])('a thickness of %j', (text, thickness) => {
  expect(parseThickness(text)).toEqual(thickness);
});

const examples = 'write for example 100nm, 5mm, qw or 3qw';
it.each<[string, string]>([
  ['100', `unit-missing: 100 what? a thickness needs a unit; ${examples}`],
  ['0nm', `out-of-range: "0nm" is out of range: a thickness must be above 0; ${examples}`],
  ['-1qw', `out-of-range: "-1qw" is no thickness: it must be above 0; ${examples}`],
  ['1,5qw', 'not-a-number: "1,5" is not a number; did you mean 1.5?'],
  ['thin', `not-a-number: "thin" is not a thickness: it does not begin with a number; ${examples}`],
])('%j is refused as a thickness', (text, line) => {
  expect(outcome(parseThickness(text))).toBe(line);
});
