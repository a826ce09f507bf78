/** Scales and ticks: round values within the axis, also on logarithmic, flat, empty and huge ones. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Chart, ChartAxis } from '../../src/plot/chart.ts';
import { xScale, yScale } from '../../src/plot/chart-scale.ts';
import { axisTexts, valueText } from '../../src/plot/tick-text.ts';
import { anyChart } from './arbitrary-chart.ts';

const axis = (scale: 'linear' | 'log', range?: readonly [number, number], unit = ''): ChartAxis =>
  range ? { label: 'q', unit, scale, range } : { label: 'q', unit, scale };
const chartOf = (x: ChartAxis, xs: readonly number[], ys: readonly number[] = xs): Chart => ({
  title: '',
  x,
  y: axis('linear'),
  series: [{ label: '', x: xs, y: ys }],
});
const ticksOf = (x: ChartAxis, count: number, xs: readonly number[] = []): readonly number[] =>
  xScale(chartOf(x, xs)).ticks(count);
const textsOf = (x: ChartAxis, count: number, ascii = false) =>
  axisTexts(xScale(chartOf(x, [])), count, ascii);

describe('ticks', () => {
  it.each([
    [axis('linear', [0, 90]), 6, [0, 20, 40, 60, 80]],
    [axis('linear', [-1, 1]), 4, [-1, -0.5, 0, 0.5, 1]],
    [axis('linear', [1.4501, 1.4509]), 4, [1.4502, 1.4504, 1.4506, 1.4508]],
    [axis('log', [0.2, 12]), 5, [0.2, 0.5, 1, 2, 5, 10]],
    [axis('log', [1e-3, 1e3]), 6, [1e-3, 1e-2, 0.1, 1, 10, 100, 1000]],
    [axis('log', [0.4, 0.7]), 3, [0.4, 0.5, 0.6, 0.7]],
    [axis('log', [12, 18]), 3, [12, 14, 16, 18]],
    // Ends in either order.
    [axis('linear', [90, 0]), 6, [0, 20, 40, 60, 80]],
  ])('of %j about %i are %j', (x, count, expected) => {
    const ticks = ticksOf(x, count);
    expect(ticks.length).toBe(expected.length);
    ticks.forEach((tick, i) => {
      expect(tick).toBeCloseTo(expected[i] ?? Number.NaN, 12);
    });
  });

  it('lie within the axis, ascend, and are at most twice as many as asked for', () => {
    fc.assert(
      fc.property(anyChart, fc.integer({ min: 1, max: 20 }), (chart, count) => {
        const x = xScale(chart);
        for (const scale of [x, yScale(chart, x, count)]) {
          const [low, high] = scale.domain;
          expect(low).toBeLessThan(high);
          const ticks = scale.ticks(count);
          expect(ticks.length).toBeLessThanOrEqual(2 * count + 2);
          ticks.forEach((tick, i) => {
            expect(tick).toBeGreaterThanOrEqual(Math.max(low, ticks[i - 1] ?? low));
            expect(tick).toBeLessThanOrEqual(high);
          });
          const texts = axisTexts(scale, count, false).ticks.map(({ text }) => text);
          expect(new Set(texts).size).toBe(texts.length);
        }
      }),
      { numRuns: 1000 },
    );
  });
});

describe('the domain', () => {
  it('is that of the data, with round ends for y', () => {
    const chart = chartOf(axis('linear'), [3, 47, Number.NaN], [0.3, 97.2, 500]);
    const x = xScale(chart);
    expect(x.domain).toEqual([3, 47]);
    expect(yScale(chart, x, 5).domain).toEqual([0, 100]);
  });

  it('counts for y only what lies within x', () => {
    const chart = chartOf(axis('linear', [0, 10]), [1, 2, 50], [1, 3, 1000]);
    expect(yScale(chart, xScale(chart), 4).domain).toEqual([1, 3]);
  });

  it.each([
    [axis('linear'), [], [0, 1]],
    [axis('log'), [], [1, 10]],
    [axis('log'), [-5, 0, Number.NaN], [1, 10]],
    [axis('linear'), [0, 0], [-1, 1]],
    [axis('linear'), [1.5, 1.5], [1.35, 1.65]],
    [axis('linear'), [1.5, 1.5 + 2e-16], [1.35, 1.65]],
    [axis('log'), [4], [2, 8]],
    [axis('linear'), [-Number.MAX_VALUE, Number.MAX_VALUE], [-1e300, 1e300]],
    [axis('log', [0, 5]), [1, 3], [1, 3]],
    [axis('linear', [Number.NaN, 5]), [1, 3], [1, 3]],
  ])('of %j with %j is %j', (x, xs, expected) => {
    const { domain } = xScale(chartOf(x, xs));
    expect(domain[0]).toBeCloseTo(expected[0] ?? 0, 12);
    expect(domain[1]).toBeCloseTo(expected[1] ?? 0, 12);
  });

  it('has a place for every value in it and gives the value back', () => {
    const scales = [axis('linear', [-3, 12]), axis('log', [0.2, 300])].map((a) => xScale(chartOf(a, [])));
    fc.assert(
      fc.property(fc.constantFrom(...scales), fc.double({ min: 0, max: 1, noNaN: true }), (scale, place) => {
        expect(scale.place(scale.valueAt(place))).toBeCloseTo(place, 10);
      }),
    );
    const [linear, log] = scales;
    expect(linear?.place(4.5)).toBeCloseTo(0.5, 14);
    expect(log?.place(Math.sqrt(60))).toBeCloseTo(0.5, 14);
    expect(log?.place(-1)).toBeNaN();
    expect(linear?.place(100)).toBeGreaterThan(1);
  });
});

describe('tick texts', () => {
  it('share their decimals', () => {
    expect(textsOf(axis('linear', [0, 1]), 4).ticks.map(({ text }) => text)).toEqual([
      '0.0',
      '0.2',
      '0.4',
      '0.6',
      '0.8',
      '1.0',
    ]);
    expect(textsOf(axis('linear', [1.4501, 1.4509]), 4).ticks[0]?.text).toBe('1.4502');
    expect(textsOf(axis('linear', [-40, 0]), 4).ticks.map(({ text }) => text)).toEqual([
      '-40',
      '-30',
      '-20',
      '-10',
      '0',
    ]);
  });

  it('set a common power of ten apart into the title', () => {
    const small = textsOf(axis('linear', [0, 3e-6], 'K⁻¹'), 3);
    expect(small.ticks.map(({ text }) => text)).toEqual(['0', '1', '2', '3']);
    expect(small.title).toBe('q (10⁻⁶ K⁻¹)');
    expect(textsOf(axis('linear', [0, 3e-6], 'K⁻¹'), 3, true).title).toBe('q (1e-6 K-1)');
    expect(textsOf(axis('linear', [0, 90], '°'), 3, true).title).toBe('q (deg)');
    expect(textsOf(axis('linear', [0, 90]), 3).title).toBe('q');
  });

  it('write powers of ten on long logarithmic axes', () => {
    expect(textsOf(axis('log', [1e-6, 1e2]), 5).ticks.map(({ text }) => text)).toEqual([
      '10⁻⁶',
      '10⁻⁴',
      '0.01',
      '1',
      '100',
    ]);
    expect(textsOf(axis('log', [1e6, 3e7]), 4, true).ticks.map(({ text }) => text)).toEqual([
      '1e6',
      '2e6',
      '5e6',
      '1e7',
      '2e7',
    ]);
  });

  it('write a value with its unit', () => {
    expect(valueText(56.3099, axis('linear', undefined, '°'), 4, false)).toBe('56.31°');
    expect(valueText(56.3099, axis('linear', undefined, '°'), 4, true)).toBe('56.31 deg');
    expect(valueText(4.0123, axis('linear', undefined, '%'), 3, false)).toBe('4.01 %');
    expect(valueText(Number.NaN, axis('linear', undefined, '%'), 3, false)).toBe('-');
  });
});
