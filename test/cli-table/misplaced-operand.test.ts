import { describe, expect, it } from 'vitest';
import { nameOptions } from '../../src/cli/misplaced-operand.ts';
import { refuse } from '../../src/medium/refusal.ts';

const refusal = refuse('bad-wave', 2, 'this is wrong', 'do that');
const remedyFor = (...operands: readonly string[]): string => nameOptions(refusal, operands).remedy;

describe('an operand that is the value of an option', () => {
  it.each<[readonly string[], string]>([
    [['air', 'fused-silica', '633nm', '45deg'], '--angle 45deg'],
    [['air', 'fused-silica', '633nm', '45', 'p'], '--angle 45 --pol p'],
    [['air', 'fused-silica', '633nm', 'P'], '--pol p'],
    [['air', 'fused-silica', '0.5rad', '633nm'], '--angle 0.5rad'],
    [['air', 'n-bk7', '56°', '633nm'], '--angle 56°'],
  ])('is named in the remedy: %j', (operands, options) => {
    expect(remedyFor(...operands)).toBe(`write ${options} in its place; the wave is the last operand`);
  });

  it.each<readonly string[][]>([
    [['air', 'n-bk7', '10']],
    [['air', 'p', '633nm']],
    [['air', '45', '633nm']],
    [['air', 'n-bk7', '633nm', '95deg']],
    [['air', 'n-bk7', '633nm', '1064nm']],
    [[]],
  ])('is not seen in %j', (operands) => {
    expect(nameOptions(refusal, operands)).toBe(refusal);
  });
});
