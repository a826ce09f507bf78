/** SVG charts: well-formed, and every coordinate recomputed from the data and the frame. */
import { describe, expect, it } from 'vitest';
import type { Chart } from '../../src/plot/chart.ts';
import { svgChart } from '../../src/plot/svg-chart.ts';
import { brokenText, escapeXml, estimatedWidth, labelMarkup } from '../../src/plot/svg-text.ts';
import { elementsOf, parseXml, type XmlElement } from './parse-xml.ts';
import { ANGLE_CHART, INDEX_CHART } from './sample-charts.ts';

const number = (element: XmlElement | undefined, name: string): number => Number(element?.attributes[name]);

interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** The frame of the plot, as drawn. */
function frameOf(root: XmlElement): Box {
  const [axes] = elementsOf(root, 'g', 'axes');
  const [rect] = axes ? elementsOf(axes, 'rect') : [];
  return {
    x: number(rect, 'x'),
    y: number(rect, 'y'),
    width: number(rect, 'width'),
    height: number(rect, 'height'),
  };
}

const pointsOf = (element: XmlElement | undefined): number[][] =>
  (element?.attributes['points'] ?? '').split(' ').map((pair) => pair.split(',').map(Number));

describe('an SVG chart', () => {
  const root = parseXml(
    svgChart(ANGLE_CHART, { caption: ['Asked: air to n=1.5.', 'Source: somebody & others <1999>.'] }),
  );
  const frame = frameOf(root);

  it('is a file of its own, with title, description and no reference outside', () => {
    const svg = svgChart(ANGLE_CHART);
    expect(root.attributes['xmlns']).toBe('http://www.w3.org/2000/svg');
    expect(root.children[0]).toMatchObject({ name: 'title', text: 'Reflectance' });
    expect(root.children[1]?.name).toBe('desc');
    expect(root.children[1]?.text).toContain('R_s rises from 4.000 % to 100.0 %');
    expect(svg.replace('http://www.w3.org/2000/svg', '')).not.toMatch(
      /http|href|@import|<script|<style|font-face/,
    );
    expect(svg.endsWith('</svg>\n')).toBe(true);
  });

  it('has every point of a line where the scales put it', () => {
    const lines = elementsOf(root, 'polyline');
    expect(lines.length).toBe(2);
    ANGLE_CHART.series.forEach((series, i) => {
      const points = pointsOf(lines[i]);
      expect(points.length).toBe(181);
      points.forEach(([x = 0, y = 0], k) => {
        expect(Math.abs(x - (frame.x + (frame.width * (series.x[k] ?? 0)) / 90))).toBeLessThan(0.006);
        expect(Math.abs(y - (frame.y + frame.height * (1 - (series.y[k] ?? 0) / 100)))).toBeLessThan(0.006);
      });
    });
  });

  it('has its ticks and their numbers at round values', () => {
    const texts = elementsOf(root, 'text');
    const below = texts.filter((text) => number(text, 'y') === frame.y + frame.height + 19);
    expect(below.map(({ text }) => text)).toEqual([
      '0',
      '10',
      '20',
      '30',
      '40',
      '50',
      '60',
      '70',
      '80',
      '90',
    ]);
    const [axes] = elementsOf(root, 'g', 'axes');
    const tickLines = axes ? elementsOf(axes, 'line') : [];
    for (const text of below) {
      const expected = frame.x + (frame.width * Number(text.text)) / 90;
      expect(Math.abs(number(text, 'x') - expected)).toBeLessThan(0.006);
      expect(tickLines.some((line) => Math.abs(number(line, 'x1') - expected) < 0.006)).toBe(true);
    }
    const left = texts.filter((text) => text.attributes['text-anchor'] === 'end');
    for (const text of left) {
      const expected = frame.y + frame.height * (1 - Number(text.text) / 100);
      expect(Math.abs(number(text, 'y') - 4 - expected)).toBeLessThan(0.006);
    }
    expect(left.map(({ text }) => text)).toContain('100');
    const titles = texts.map(({ text }) => text);
    expect(titles).toContain('angle of incidence (°)');
    expect(titles).toContain('R (%)');
  });

  it('marks the Brewster angle with a line and its name', () => {
    const [mark] = elementsOf(root, 'g', 'mark');
    const [line] = mark ? elementsOf(mark, 'line') : [];
    expect(number(line, 'x1')).toBeCloseTo(frame.x + (frame.width * 56.309_932) / 90, 1);
    expect(number(line, 'y2')).toBeCloseTo(frame.y + frame.height, 1);
    expect(mark?.text).toBe('Brewster 56.31°');
  });

  it('tells lines apart by dashes as well as by colour, and names them in the legend', () => {
    const groups = elementsOf(root, 'g', 'series');
    expect(new Set(groups.map((g) => g.attributes['stroke-dasharray'])).size).toBe(2);
    expect(new Set(groups.map((g) => g.attributes['stroke'])).size).toBe(2);
    const legend = elementsOf(root, 'g', 'legend');
    expect(legend.map(({ text }) => text)).toEqual(['Rs', 'Rp']);
    const samples = legend.map((entry) => elementsOf(entry, 'line')[0]?.attributes['stroke-dasharray']);
    expect(samples).toEqual(groups.map((g) => g.attributes['stroke-dasharray']));
  });

  it('carries the caption below, inside the picture', () => {
    const caption = elementsOf(root, 'text')
      .filter((text) => text.attributes['font-size'] === '11')
      .slice(1);
    expect(caption.map(({ text }) => text)).toEqual([
      'Asked: air to n=1.5.',
      'Source: somebody & others <1999>.',
    ]);
    for (const line of caption) {
      expect(number(line, 'y')).toBeGreaterThan(frame.y + frame.height + 40);
      expect(number(line, 'y')).toBeLessThan(number(root, 'height'));
    }
  });

  it('hatches the range outside the fit on a logarithmic axis, and clips what lies outside of y', () => {
    const file = parseXml(svgChart(INDEX_CHART, { width_px: 600, height_px: 400, id: 'second' }));
    const box = frameOf(file);
    const [hatched] = elementsOf(file, 'rect', 'hatched');
    const place = Math.log(3.71 / 0.2) / Math.log(8 / 0.2);
    expect(number(hatched, 'x')).toBeCloseTo(box.x + box.width * place, 1);
    expect(number(hatched, 'x') + number(hatched, 'width')).toBeCloseTo(box.x + box.width, 1);
    expect(hatched?.attributes['fill']).toBe('url(#second-hatch)');
    const [series] = elementsOf(file, 'g', 'series');
    expect(series?.attributes['clip-path']).toBe('url(#second-plot)');
    const [clip] = elementsOf(file, 'clipPath');
    const [clipBox] = clip ? elementsOf(clip, 'rect') : [];
    expect(number(clipBox, 'width')).toBe(box.width);
    expect(elementsOf(file, 'g', 'legend').map(({ text }) => text)).toEqual(['n', 'outside the fit']);
  });

  it('breaks lines at gaps and draws lonely points as circles', () => {
    const y = [1, 2, Number.NaN, 3, Number.NaN, 4, 5, 6];
    const chart: Chart = { ...ANGLE_CHART, marks: [], series: [{ label: 'a', x: y.map((_, i) => i), y }] };
    const file = parseXml(svgChart(chart));
    expect(elementsOf(file, 'polyline').map((line) => pointsOf(line).length)).toEqual([2, 3]);
    expect(elementsOf(file, 'circle').length).toBe(1);
  });

  it('keeps the labels of near marks apart', () => {
    const marks = ['Brewster', 'critical', 'asked'].map((label, i) => ({ x: 41 + i / 4, label }));
    const file = parseXml(svgChart({ ...ANGLE_CHART, marks }));
    const labels = elementsOf(file, 'g', 'mark').map((mark) => elementsOf(mark, 'text')[0]);
    const boxes = labels.map((label) => {
      const half = estimatedWidth(label?.text ?? '', 11) / 2;
      return { left: number(label, 'x') - half, right: number(label, 'x') + half, y: number(label, 'y') };
    });
    for (const [i, a] of boxes.entries())
      for (const b of boxes.slice(i + 1))
        expect(a.y !== b.y || a.right < b.left || b.right < a.left).toBe(true);
    expect(Math.max(...boxes.map(({ y }) => y))).toBeLessThan(frameOf(file).y);
  });

  it('has a plot of some size even in the smallest picture with many series', () => {
    const series = Array.from({ length: 10 }, (_, i) => ({
      label: `a long label ${i}`,
      x: [0, 1],
      y: [i, 1],
    }));
    const file = parseXml(svgChart({ ...ANGLE_CHART, series }, { width_px: 1, height_px: 1 }));
    const box = frameOf(file);
    expect(box.height).toBeGreaterThanOrEqual(60);
    expect(box.y + box.height).toBeLessThan(number(file, 'height'));
  });
});

describe('text for SVG', () => {
  it('is escaped, and lowers an index', () => {
    expect(escapeXml(`a<b> & "c" 'd' \u0000\ud800`)).toBe(
      'a&lt;b&gt; &amp; &quot;c&quot; &#39;d&#39; \ufffd\ufffd',
    );
    expect(labelMarkup('R_s of n', 12)).toBe(
      'R<tspan dy="3" font-size="9">s</tspan><tspan dy="-3"> of n</tspan>',
    );
    expect(labelMarkup('snake_case <a_b>', 12)).toBe(
      'snake_case &lt;a<tspan dy="3" font-size="9">b</tspan><tspan dy="-3">&gt;</tspan>',
    );
  });

  it('is broken at spaces', () => {
    expect(brokenText('one two three', 60, 11)).toEqual(['one two', 'three']);
    expect(brokenText('  ', 60, 11)).toEqual([]);
  });
});
