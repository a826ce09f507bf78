import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { shiftDecimal } from '../../src/num/shift-decimal.ts';

describe('shifting a decimal', () => {
  it('keeps the digits where a product does not', () => {
    expect(20 * 1e-6).not.toBe(0.00002);
    expect(shiftDecimal(20, -6)).toBe(0.00002);
    expect(1.6 / 1e6).not.toBe(0.0000016);
    expect(shiftDecimal(1.6, -6)).toBe(0.0000016);
    expect(shiftDecimal(-2.5e-7, -3)).toBe(-2.5e-10);
    expect(shiftDecimal(1e22, -6)).toBe(1e16);
    expect(shiftDecimal(0, 5)).toBe(0);
  });

  it('reads every decimal as if it had been written in the other unit', () => {
    const decimals = fc.tuple(
      fc.integer(),
      fc.integer({ min: -12, max: 12 }),
      fc.integer({ min: -9, max: 9 }),
    );
    fc.assert(
      fc.property(decimals, ([mantissa, exponent, power]) => {
        const value = Number(`${mantissa}e${exponent}`);
        expect(shiftDecimal(value, power)).toBe(Number(`${mantissa}e${exponent + power}`));
      }),
    );
  });
});
