/** A chart in words: sentences and tables as agreed on, values those of the curve. */
import { describe, expect, it } from 'vitest';
import type { Chart } from '../../src/plot/chart.ts';
import { chartSentence, chartTable, chartTableLines } from '../../src/plot/chart-sentence.ts';
import { ANGLE_CHART, INDEX_CHART, reflectances, silicaIndex } from './sample-charts.ts';

const withSeries = (y: readonly number[], more: Partial<Chart> = {}): Chart => ({
  ...ANGLE_CHART,
  marks: [],
  series: [{ label: 'R', x: y.map((_, i) => 10 * i), y }],
  ...more,
});
const said = (y: readonly number[]): string => chartSentence(withSeries(y)).replace(/^.*?: |\.$/g, '');

describe('the sentence', () => {
  it('says what the curves do, where the marks are and what is not to be relied on', () => {
    expect(chartSentence(ANGLE_CHART)).toBe(
      'Reflectance over angle of incidence from 0° to 90°: R_s rises from 4.000 % to 100.0 %; R_p rises from 4.000 % to 100.0 %, lowest 0.0004023 % at 56.5°; mark Brewster 56.31° at 56.31°.',
    );
    expect(chartSentence(INDEX_CHART, true)).toBe(
      `Fused silica over vacuum wavelength from 0.2 um to 8 um: n falls from 1.5505 to ${silicaIndex(8).toPrecision(5)}; outside the fit from 3.71 um to 8 um.`,
    );
  });

  it.each([
    [[5], 'R is 5.000 % at 0° alone'],
    [[5, 5, 5], 'R stays at 5.000 %'],
    [[5, 5 + 1e-9, 5], 'R stays at 5.000 %'],
    [[5, 2, 5], 'R starts and ends at 5.000 %, lowest 2.000 % at 10°'],
    [[5, 9, 2, 4], 'R falls from 5.000 % to 4.000 %, lowest 2.000 % at 20°, highest 9.000 % at 10°'],
    [[1, Number.NaN, 3], 'R rises from 1.000 % to 3.000 %, with gaps'],
    [[Number.NaN, Number.NaN], 'R has no values'],
  ])('of %j is "%s"', (y, expected) => {
    expect(said(y)).toBe(expected);
  });

  it('says that nothing is drawn where nothing is', () => {
    expect(said([])).toBe('R has no values');
    expect(chartSentence({ ...ANGLE_CHART, series: [], marks: [] })).toContain(': nothing is drawn.');
  });
});

describe('the table', () => {
  it('has about ten rows at round values, read off the curve', () => {
    const { header, rows } = chartTable(ANGLE_CHART);
    expect(header).toEqual(['angle of incidence', 'R_s', 'R_p']);
    expect(rows.map(([angle]) => angle)).toEqual([0, 10, 20, 30, 40, 50, 60, 70, 80, 90].map((a) => `${a}°`));
    for (const [angle = '', s = '', p = ''] of rows) {
      const expected = reflectances(Number.parseFloat(angle));
      expect(Number.parseFloat(s)).toBeCloseTo(expected.s, 1);
      expect(Number.parseFloat(p)).toBeCloseTo(expected.p, 1);
    }
  });

  it('names every value on its line, also in ASCII', () => {
    expect(chartTableLines(ANGLE_CHART)[4]).toBe('angle of incidence 40°: R_s 7.716 %, R_p 1.431 %');
    expect(chartTableLines(ANGLE_CHART, true)[4]).toBe('angle of incidence 40 deg: R_s 7.716 %, R_p 1.431 %');
  });

  it('spreads over a logarithmic axis that has few round values', () => {
    const rows = chartTableLines(INDEX_CHART, true);
    expect(rows.length).toBe(10);
    expect(rows[0]).toBe('vacuum wavelength 0.2 um: n 1.5505');
    expect(rows.at(-1)).toBe(`vacuum wavelength 8 um: n ${silicaIndex(8).toPrecision(5)}`);
  });

  it('tells values of a narrow axis apart and says where there is none', () => {
    const x = [1.55, 1.55005, 1.5501];
    const chart: Chart = {
      ...INDEX_CHART,
      x: { ...INDEX_CHART.x, scale: 'linear' },
      hatched: [],
      series: [{ label: 'n', x, y: [1, Number.NaN, 3] }],
    };
    const { rows } = chartTable(chart);
    expect(new Set(rows.map(([at]) => at)).size).toBe(rows.length);
    expect(rows[0]).toEqual(['1.55 µm', '1.0000']);
    expect(rows[3]?.[1]).toBe('no value');
  });
});
