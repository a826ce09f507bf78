import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { editDistance } from '../../src/cli/edit-distance.ts';
import { nearest } from '../../src/cli/nearest.ts';

describe('editDistance', () => {
  it.each<[string, string, number]>([
    ['', '', 0],
    ['', 'abc', 3],
    ['abc', 'abc', 0],
    ['abc', 'abd', 1],
    ['abc', 'acb', 1],
    ['abcd', 'badc', 2],
    ['kitten', 'sitting', 3],
    // No part is edited twice: the unrestricted distance would be 2.
    ['ca', 'abc', 3],
    ['angel', 'angle', 1],
  ])('%j to %j is %d', (a, b, distance) => {
    expect(editDistance(a, b)).toBe(distance);
  });

  it('is symmetric, zero only for equal texts, and at most the longer length', () => {
    const word = fc.string({ unit: fc.constantFrom('a', 'b', 'c'), maxLength: 8 });
    fc.assert(
      fc.property(word, word, (a, b) => {
        const distance = editDistance(a, b);
        expect(distance).toBe(editDistance(b, a));
        expect(distance === 0).toBe(a === b);
        expect(distance).toBeLessThanOrEqual(Math.max(a.length, b.length));
        expect(distance).toBeGreaterThanOrEqual(Math.abs(a.length - b.length));
      }),
    );
  });

  it('one insertion, deletion, substitution or swap costs one at most', () => {
    fc.assert(
      fc.property(
        fc.string({ minLength: 2, maxLength: 12 }),
        fc.nat(),
        fc.string({ minLength: 1, maxLength: 1 }),
        (a, n, c) => {
          const i = n % (a.length - 1);
          expect(editDistance(a, a.slice(0, i) + a.slice(i + 1))).toBe(1);
          expect(editDistance(a, a.slice(0, i) + c + a.slice(i))).toBe(1);
          expect(editDistance(a, a.slice(0, i) + c + a.slice(i + 1))).toBeLessThanOrEqual(1);
          expect(
            editDistance(a, a.slice(0, i) + a.slice(i + 1, i + 2) + a.slice(i, i + 1) + a.slice(i + 2)),
          ).toBeLessThanOrEqual(1);
        },
      ),
    );
  });
});

describe('nearest', () => {
  const options = [
    '--angle',
    '--ascii',
    '--air-wavelength',
    '--temperature',
    '--tolerance',
    '--json',
    '--pol',
    '--power',
  ];
  it.each<[string, string[]]>([
    ['--angel', ['--angle']],
    ['-angle', ['--angle']],
    ['--temp', ['--temperature']],
    ['--ANGLE', ['--angle']],
    ['--po', ['--pol', '--power']],
    ['--jsno', ['--json']],
    ['--frobnicate', []],
    ['--', []],
    ['', []],
    [`--${'x'.repeat(10_000)}`, []],
  ])('of %j', (typed, candidates) => {
    expect(nearest(typed, options)).toEqual(candidates);
  });

  it('lists five at most', () => {
    expect(nearest('aa', ['aa1', 'aa2', 'aa3', 'aa4', 'aa5', 'aa6'])).toHaveLength(5);
  });
});
