import { describe, expect, it } from 'vitest';
import { JET_LENGTH } from '../../src/dispersion/evaluator.ts';
import type { ModelParameters } from '../../src/dispersion/parameters.ts';
import { bindModel } from '../../src/dispersion/registry.ts';

const indexOf = (model: ModelParameters, wavelength_um: number): number => {
  const out = new Float64Array(JET_LENGTH);
  bindModel(model, {}).evaluate(wavelength_um, out);
  return out[0] as number;
};

describe('powers of the wavelength', () => {
  it('may be as high as anybody types them, without taking memory for all those between', () => {
    for (const power of [1e308, -1e308, 2 ** 40, -(2 ** 40)]) {
      const cauchy: ModelParameters = {
        model: 'cauchy',
        wavelengthUnit: 'um',
        terms: [
          { c: 1.5, power: 0 },
          { c: 1e-3, power },
        ],
      };
      // 1 to any power is 1.
      expect(indexOf(cauchy, 1)).toBeCloseTo(1.501, 12);
    }
  });

  it('mean the same on both sides of the limit of the short way', () => {
    for (const power of [38, 40, 42, 44, -40, -42]) {
      const terms = [
        { c: 1.5, power: 0 },
        { c: 1e-3, power },
      ];
      const cauchy: ModelParameters = { model: 'cauchy', wavelengthUnit: 'um', terms };
      expect(indexOf(cauchy, 1.1)).toBeCloseTo(1.5 + 1e-3 * 1.1 ** power, 12);
    }
  });
});
