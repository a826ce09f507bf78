import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { applySgr, PLAIN, type Style, styleTransition } from '../../src/term/sgr.ts';

const parameter = fc.constantFrom(
  '0',
  '1',
  '2',
  '3',
  '4',
  '7',
  '9',
  '22',
  '24',
  '27',
  '39',
  '49',
  '31',
  '97',
  '44',
  '38;5;9',
  '48;2;1;2;3',
);
const style = fc.array(parameter, { maxLength: 6 }).map((codes) => codes.reduce(applySgr, PLAIN));

const apply = (from: Style, sequence: string): Style =>
  sequence === '' ? from : applySgr(from, sequence.slice(2, -1));

describe('style transitions', () => {
  it('lead to the style asked for, by no more than a reset and a fresh start', () => {
    fc.assert(
      fc.property(style, style, (from, to) => {
        const sequence = styleTransition(from, to);
        expect(apply(from, sequence)).toBe(to);
        expect(sequence.length).toBeLessThanOrEqual(`\x1b[;${to.code}m`.length);
      }),
      { numRuns: 2000 },
    );
  });

  it.each([
    ['', '1', '\x1b[1m'],
    ['1', '', '\x1b[m'],
    ['1', '1;31', '\x1b[31m'],
    ['1;31', '1', '\x1b[39m'],
    ['1;2', '2', '\x1b[;2m'],
    ['1;4;31', '2;4;31', '\x1b[22;2m'],
    ['31', '32', '\x1b[32m'],
  ])('from %j to %j', (from, to, sequence) => {
    const styleOf = (code: string): Style => (code === '' ? PLAIN : applySgr(PLAIN, code));
    expect(styleTransition(styleOf(from), styleOf(to))).toBe(sequence);
  });
});
