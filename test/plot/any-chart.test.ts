/** What holds for every chart at every size: it is drawn, it fits, it is made of the characters allowed. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { brailleChart } from '../../src/plot/braille-chart.ts';
import { cursorColumns, readColumn } from '../../src/plot/chart-cursor.ts';
import { chartSentence, chartTable, chartTableLines } from '../../src/plot/chart-sentence.ts';
import { svgChart } from '../../src/plot/svg-chart.ts';
import { anyChart } from './arbitrary-chart.ts';
import { parseXml } from './parse-xml.ts';
import { ANGLE_CHART, INDEX_CHART } from './sample-charts.ts';

const anySize = fc.record({
  width: fc.integer({ min: 0, max: 110 }),
  height: fc.integer({ min: 0, max: 40 }),
});
const anyLevel = fc.constantFrom('braille' as const, 'blocks' as const, 'ascii' as const);
const cells = (line: string): number => [...line].filter((c) => !/[\p{M}\u200d]/u.test(c)).length;

describe('any chart', () => {
  it('fills exactly the cells asked for, with nothing that could steer a terminal', () => {
    fc.assert(
      fc.property(anyChart, anySize, anyLevel, fc.option(fc.double()), (chart, size, level, cursor) => {
        const lines = brailleChart(chart, { ...size, level, ...(cursor === null ? {} : { cursor }) });
        expect(lines.length).toBe(size.height);
        for (const line of lines) {
          expect(cells(line)).toBe(size.width);
          expect(line).not.toMatch(level === 'ascii' ? /[^\x20-\x7e]/ : /[\x00-\x1f\x7f-\x9f\u2028-\u202e]/);
          expect(line).not.toContain('\u2800');
          if (level === 'blocks') expect(line.replace(/\P{Script=Braille}/gu, '')).toBe('');
        }
      }),
      { numRuns: 1500 },
    );
  });

  it('is drawn at every size from 1 x 1 up', () => {
    for (const chart of [ANGLE_CHART, INDEX_CHART])
      for (const level of ['braille', 'blocks', 'ascii'] as const)
        for (let width = 1; width < 45; width++)
          for (let height = 1; height < 14; height++) {
            const lines = brailleChart(chart, { width, height, level });
            expect(lines.map(cells)).toEqual(new Array(height).fill(width));
            expect(lines.join('').trim()).not.toBe('');
          }
    expect(brailleChart(ANGLE_CHART, { width: Number.NaN, height: -3, level: 'braille' })).toEqual([]);
    expect(brailleChart(ANGLE_CHART, { width: 0, height: 2, level: 'braille' })).toEqual(['', '']);
  });

  it('can be read at every column, without NaN or infinity in a text', () => {
    fc.assert(
      fc.property(anyChart, anySize, anyLevel, fc.integer(), (chart, size, level, column) => {
        const options = { ...size, level };
        const reading = readColumn(chart, options, column);
        const columns = cursorColumns(chart, options);
        expect(reading === undefined).toBe(columns === 0);
        if (!reading) return;
        expect(reading.column).toBeGreaterThanOrEqual(0);
        expect(reading.column).toBeLessThan(columns);
        expect(Number.isFinite(reading.x)).toBe(true);
        for (const text of [reading.xText, ...reading.values.map((value) => value.text)])
          expect(text).not.toMatch(/NaN|Infinity|undefined/);
      }),
      { numRuns: 800 },
    );
  });

  it('is a well-formed SVG with finite coordinates', () => {
    fc.assert(
      fc.property(anyChart, fc.array(fc.string({ unit: 'binary' }), { maxLength: 3 }), (chart, caption) => {
        const svg = svgChart(chart, { caption });
        const root = parseXml(svg);
        expect(root.name).toBe('svg');
        expect(svg).not.toMatch(/="[^"]*(?:NaN|Infinity|undefined)/);
        expect(svg).not.toMatch(/(?:x|y|x1|x2|y1|y2|cx|cy|width|height|points)="[^"]*e[+-]?\d/);
      }),
      { numRuns: 400 },
    );
  });

  it('has a sentence and a table without drawing characters', () => {
    fc.assert(
      fc.property(anyChart, (chart) => {
        const plainLabels = { ...chart, title: 'T', series: chart.series.map((s) => ({ ...s, label: 'L' })) };
        const axes = { x: { ...chart.x, label: 'X', unit: 'u' }, y: { ...chart.y, label: 'Y', unit: 'v' } };
        const plain = { ...plainLabels, ...axes, marks: [], hatched: [] };
        const sentence = chartSentence(plain);
        expect(sentence).toMatch(/^T over X from .* to .*: .*\.$/s);
        const { header, rows } = chartTable(plain);
        expect(rows.length).toBeGreaterThanOrEqual(1);
        expect(rows.length).toBeLessThanOrEqual(13);
        for (const row of rows) expect(row.length).toBe(header.length);
        for (const text of [sentence, ...chartTableLines(plain)])
          expect(text).not.toMatch(/NaN|Infinity|undefined|[\u2500-\u259f\u2800-\u28ff]/);
        for (const text of [chartSentence(chart, true), ...chartTableLines(chart, true)])
          expect(text).toMatch(/^[\x20-\x7e\n]*$/);
      }),
      { numRuns: 800 },
    );
  });
});
