import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cubic, linear, quadratic, TableError, taylorAt } from '../../src/num/interpolate.ts';
import { evenly } from '../helpers/evenly.ts';

const rows = fc
  .array(fc.tuple(evenly(0.05, 2), evenly(-5, 5)), {
    minLength: 4,
    maxLength: 20,
  })
  .map((steps) => {
    let x = 0;
    const places = steps.map(([step]) => {
      x += step;
      return x;
    });
    return { x: places, y: steps.map(([, y]) => y) };
  });

describe('interpolants', () => {
  it('pass through their rows', () => {
    fc.assert(
      fc.property(rows, ({ x, y }) => {
        for (const f of [linear(x, y), cubic(x, y)])
          for (const [i, xi] of x.entries()) expect(taylorAt(f, xi)[0]).toBeCloseTo(y[i] as number, 8);
      }),
    );
  });

  it('a spline reproduces any cubic, ends included, with all derivatives', () => {
    const c = [0.3, -1.2, 0.7, 0.25] as const;
    const p = (t: number): number => c[0] + t * (c[1] + t * (c[2] + t * c[3]));
    const x = [0, 0.3, 1, 1.4, 2.5, 3];
    const f = cubic(x, x.map(p));
    for (const t of [-0.2, 0.1, 0.3, 0.9, 2, 2.99, 3.3]) {
      const [v, d1, d2, d3] = taylorAt(f, t);
      expect(v).toBeCloseTo(p(t), 12);
      expect(d1).toBeCloseTo(c[1] + 2 * c[2] * t + 3 * c[3] * t * t, 11);
      expect(d2).toBeCloseTo(c[2] + 3 * c[3] * t, 11);
      expect(d3).toBeCloseTo(c[3], 10);
    }
  });

  it('a spline has continuous first and second derivatives at its inner rows', () => {
    fc.assert(
      fc.property(rows, ({ x, y }) => {
        const f = cubic(x, y);
        for (const xi of x.slice(1, -1)) {
          const h = 1e-9;
          const left = taylorAt(f, xi - h);
          const right = taylorAt(f, xi + h);
          const scale = Math.max(...left.map(Math.abs), ...right.map(Math.abs), 1);
          expect(Math.abs(left[1] - right[1])).toBeLessThan(1e-6 * scale);
          expect(Math.abs(left[2] - right[2])).toBeLessThan(1e-6 * scale);
        }
      }),
    );
  });

  it('a spline is fourth-order accurate up to the ends', () => {
    const error = (n: number): number => {
      const x = Array.from({ length: n + 1 }, (_, i) => i / n);
      const f = cubic(x, x.map(Math.exp));
      return Math.max(
        ...Array.from({ length: 997 }, (_, i) => i / 996).map((t) =>
          Math.abs(taylorAt(f, t)[0] - Math.exp(t)),
        ),
      );
    };
    expect(error(10) / error(20)).toBeGreaterThan(12);
  });

  it('three rows make a parabola, two a line, one a constant', () => {
    const f = quadratic([1, 2, 4], [1, 4, 16]);
    expect(taylorAt(f, 3)[0]).toBeCloseTo(9, 12);
    // t^2 - 3 t + 5
    const [value, slope, half] = taylorAt(quadratic([1, 1.5, 3], [3, 2.75, 5]), 2);
    expect(value).toBeCloseTo(3, 13);
    expect(slope).toBeCloseTo(1, 13);
    expect(half).toBeCloseTo(1, 13);
    expect(taylorAt(cubic([1, 2, 4], [1, 4, 16]), 3)[2]).toBeCloseTo(1, 12);
    expect(taylorAt(cubic([0, 1], [2, 3]), 0.5)).toEqual([2.5, 1, 0, 0]);
    expect(taylorAt(linear([0.5], [1.5]), 7)).toEqual([1.5, 0, 0, 0]);
  });

  it('a line takes the slope of its piece and continues outside', () => {
    const f = linear([0, 1, 3], [0, 2, 4]);
    expect(taylorAt(f, 0.5)[1]).toBe(2);
    expect(taylorAt(f, 1)[1]).toBe(1);
    expect(taylorAt(f, 5)[0]).toBe(6);
    expect(taylorAt(f, -1)[0]).toBe(-2);
  });

  it('refuses tables that no interpolant exists for', () => {
    expect(() => linear([], [])).toThrow(TableError);
    expect(() => linear([], [])).toThrow('a table needs at least 1 rows, not 0');
    expect(() => quadratic([0, 1], [1, 2])).toThrow('at least 3 rows, not 2');
    expect(() => linear([0, 1, 1], [1, 2, 3])).toThrow('row 3 does not');
    expect(() => linear([0, 1], [1, Infinity])).toThrow('row 2 of the table');
    expect(new TableError('').name).toBe('TableError');
    expect(() => linear([0, 1], [1])).toThrow(/one value per place/);
    expect(() => linear([0, 0], [1, 2])).toThrow(/rise strictly/);
    expect(() => cubic([0, 1, 2, Number.NaN], [1, 2, 3, 4])).toThrow(/not a finite number/);
    expect(() => quadratic([0, 1, 2, 3], [1, 2, 3, 4])).toThrow(/exactly 3 rows/);
  });
});
