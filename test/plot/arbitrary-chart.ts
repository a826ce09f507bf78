/** Charts of every kind: ordinary data, gaps, flat and single points, nothing at all, the ends of what a double holds. */
import fc from 'fast-check';
import type { Chart, ChartAxis, ChartSeries } from '../../src/plot/chart.ts';

const coordinate = fc.oneof(
  { weight: 6, arbitrary: fc.double({ min: -100, max: 100, noNaN: true }) },
  { weight: 2, arbitrary: fc.double() },
  {
    weight: 2,
    arbitrary: fc.constantFrom(
      ...[Number.NaN, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY, 0, -0, 1, 1, 1, 5e-324],
      ...[Number.MAX_VALUE, -Number.MAX_VALUE, 1e300, 1e-300, 1 + 2 ** -52],
    ),
  },
);
// Braille in a label would be taken for a curve by the checks.
const label = fc.oneof(
  fc.constantFrom('R_s', 'R_p', 'n', '', 'µm', '<&">'),
  fc.string({ unit: 'binary', maxLength: 12 }).map((text) => text.replace(/\p{Script=Braille}/gu, ' ')),
);

const axis: fc.Arbitrary<ChartAxis> = fc
  .record({
    label,
    unit: label,
    scale: fc.constantFrom('linear' as const, 'log' as const),
    range: fc.option(fc.tuple(coordinate, coordinate), { nil: undefined }),
  })
  .map(({ range, ...rest }) => (range ? { ...rest, range } : rest));

const series: fc.Arbitrary<ChartSeries> = fc.record({
  label,
  x: fc.oneof(
    fc.array(coordinate, { maxLength: 30 }),
    fc
      .array(fc.double({ min: 0.1, max: 20, noNaN: true }), { maxLength: 30 })
      .map((xs) => xs.sort((a, b) => a - b)),
  ),
  y: fc.array(coordinate, { maxLength: 30 }),
});

export const anyChart: fc.Arbitrary<Chart> = fc.record({
  title: label,
  x: axis,
  y: axis,
  series: fc.array(series, { maxLength: 10 }),
  marks: fc.array(fc.record({ x: coordinate, label }), { maxLength: 4 }),
  hatched: fc.array(fc.record({ from: coordinate, to: coordinate, label }), { maxLength: 3 }),
});
