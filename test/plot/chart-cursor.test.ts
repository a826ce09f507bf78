/** Reading a chart at a column: the values are those of the curve at the x that is shown. */
import { describe, expect, it } from 'vitest';
import { brailleChart } from '../../src/plot/braille-chart.ts';
import { cursorColumnOf, cursorColumns, readColumn } from '../../src/plot/chart-cursor.ts';
import { ANGLE_CHART, INDEX_CHART, reflectances, silicaIndex } from './sample-charts.ts';

const options = { width: 70, height: 20, level: 'braille' } as const;

describe('the cursor of a chart', () => {
  it('reads the curve at the value of x that it shows', () => {
    const columns = cursorColumns(ANGLE_CHART, options);
    expect(columns).toBe(62);
    for (let column = 0; column < columns; column++) {
      const reading = readColumn(ANGLE_CHART, options, column);
      if (!reading) throw new Error('no reading');
      expect(reading.xText).toMatch(/^\d+\.\d°$/);
      expect(Number.parseFloat(reading.xText)).toBe(reading.x);
      expect(cursorColumnOf(ANGLE_CHART, options, reading.x)).toBe(column);
      const [s, p] = reading.values;
      const expected = reflectances(reading.x);
      // Straight lines between points half a degree apart.
      expect(Math.abs((s?.y ?? Number.NaN) - expected.s)).toBeLessThan(0.05);
      expect(Math.abs((p?.y ?? Number.NaN) - expected.p)).toBeLessThan(0.05);
      expect([s?.label, p?.label]).toEqual(['R_s', 'R_p']);
    }
  });

  it('names marks and hatched ranges in its column', () => {
    const column = cursorColumnOf(ANGLE_CHART, options, 56.309_932);
    expect(readColumn(ANGLE_CHART, options, column)?.marks).toEqual(['Brewster 56.31°']);
    expect(readColumn(ANGLE_CHART, options, column + 1)?.marks).toEqual([]);
    const far = readColumn(INDEX_CHART, options, cursorColumnOf(INDEX_CHART, options, 5));
    expect(far?.hatched).toEqual(['outside the fit']);
    expect(readColumn(INDEX_CHART, options, 0)?.hatched).toEqual([]);
  });

  it('reads a logarithmic axis, with the digits asked for', () => {
    const at = cursorColumnOf(INDEX_CHART, options, 1.55);
    const reading = readColumn(INDEX_CHART, options, at);
    expect(reading?.x).toBeGreaterThan(1.5);
    expect(reading?.x).toBeLessThan(1.6);
    expect(reading?.values[0]?.y).toBeCloseTo(silicaIndex(reading?.x ?? 0), 5);
    expect(reading?.values[0]?.text).toMatch(/^1\.44\d\d$/);
    expect(reading?.xText).toMatch(/^1\.5\d µm$/);
    expect(readColumn(INDEX_CHART, { ...options, level: 'ascii' }, at)?.xText).toMatch(/^1\.5\d um$/);
  });

  it('has no value in a gap, and stays within the chart', () => {
    const gap = { ...ANGLE_CHART, series: [{ label: 'R', x: [0, 10, 20, 90], y: [1, 2, Number.NaN, 3] }] };
    const at = (x: number) => readColumn(gap, options, cursorColumnOf(gap, options, x))?.values[0]?.text;
    expect(at(5)).toMatch(/^1\.\d+ %$/);
    expect(at(15)).toBe('-');
    expect(at(90)).toBe('3.000 %');
    expect(readColumn(gap, options, -50)?.column).toBe(0);
    expect(readColumn(gap, options, 5000)?.x).toBe(90);
    expect(cursorColumnOf(gap, options, 1e9)).toBe(cursorColumns(gap, options) - 1);
    expect(readColumn(gap, { ...options, width: 0 }, 3)).toBeUndefined();
  });

  it('stands where the chart draws it', () => {
    for (const column of [3, 20, 50]) {
      const x = readColumn(ANGLE_CHART, options, column)?.x ?? 0;
      const lines = brailleChart(ANGLE_CHART, { ...options, cursor: x });
      expect(lines[4]?.[4 + column]).toBe('│');
    }
  });
});
