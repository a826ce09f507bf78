import { describe, expect, it } from 'vitest';
import type { ModelParameters } from '../../src/dispersion/parameters.ts';
import { bindModel } from '../../src/dispersion/registry.ts';
import { index } from './evaluate.ts';

describe('tables', () => {
  it('take rows in either order', () => {
    const at = [0.4, 0.5, 0.7, 1];
    const n = [1.5, 1.48, 1.47, 1.46];
    const table = (x: number[], v: number[]): ModelParameters => ({
      model: 'table',
      abscissa: 'um',
      at: x,
      n: { values: v, along: 'E', kind: 'cubic' },
    });
    const falling = table([...at].reverse(), [...n].reverse());
    for (const um of [0.4, 0.55, 0.93]) expect(index(falling, um)).toEqual(index(table(at, n), um));
  });

  it('interpolate k in its logarithm, and alpha as k = alpha L/(4 pi)', () => {
    const p: ModelParameters = {
      model: 'table',
      abscissa: 'nm',
      at: [400, 800],
      n: { values: [1.5, 1.4], along: 'L', kind: 'linear' },
      alpha_per_cm: { values: [1, 100], along: 'L', kind: 'linear', of: 'log' },
    };
    expect(index(p, 0.6).im).toBeCloseTo((10 * 0.6e-4) / (4 * Math.PI), 14);
    expect(bindModel(p, {}).derivativeOrder).toBe(1);
  });

  it('fill an empty place with the change of the nearest row', () => {
    const p: ModelParameters = {
      model: 'table',
      abscissa: 'um',
      at: [0.4, 0.5, 0.6],
      n: { values: [1.7, 1.6, 1.5], along: 'L', kind: 'linear' },
      warmer: { temperature_C: 20, columns: [{ temperature_C: 30, n: [null, 1.595, 1.496] }] },
    };
    expect(index(p, 0.4, { temperature_K: 303.15 }).re).toBeCloseTo(1.695, 12);
    expect(index(p, 0.4, { temperature_K: 298.15 }).re).toBeCloseTo(1.6975, 12);
    expect(index(p, 0.4).re).toBe(1.7);
  });

  it('say what is wrong with rows that cannot be interpolated', () => {
    const bad: ModelParameters = {
      model: 'table',
      abscissa: 'um',
      at: [0.4, 0.5],
      n: { values: [1.5, 1.4, 1.3], along: 'L', kind: 'linear' },
    };
    expect(() => bindModel(bad, {})).toThrow('2 places, 3 values');
    const zero: ModelParameters = {
      model: 'table',
      abscissa: 'um',
      at: [0.4, 0.5],
      n: { values: [1.5, 1.4], along: 'L', kind: 'linear' },
      k: { values: [0, 1e-3], along: 'L', kind: 'linear', of: 'log' },
    };
    expect(() => bindModel(zero, {})).toThrow('above 0');
  });
});
