/**
 * A chart as a standalone SVG file for a logbook: axes with ticks and units, lines told apart by dashes (and by colours that differ for
 * colour-blind people too), marks, hatching, legend, caption with sources. No fonts, no scripts, nothing outside the file.
 *
 * Special cases as for every chart: gaps break lines, a point on its own is a small circle, points outside are clipped.
 */
import type { Chart, ChartSeries } from './chart.ts';
import { forEachRun } from './chart.ts';
import { chartSentence } from './chart-sentence.ts';
import { colourOf, FONT_px, LINE_px, lineElement, SMALL_px, strokeOf, textElement } from './svg-elements.ts';
import { atX, atY, makeFrame, type SvgFrame } from './svg-frame.ts';
import { legendElements, legendRows } from './svg-legend.ts';
import { brokenText, decimal, escapeXml, labelMarkup } from './svg-text.ts';

export interface SvgOptions {
  /** 800 by 500 where absent; at least 200 by 150. Grows downwards with the caption. */
  readonly width_px?: number;
  readonly height_px?: number;
  /** Paragraphs below the chart: what was asked, the sources. */
  readonly caption?: readonly string[];
  /** Start of the ids within the file, to be told apart where several charts are put into one page; letters and digits. */
  readonly id?: string;
}

const EDGE_px = 20;

export function svgChart(chart: Chart, options: SvgOptions = {}): string {
  return `${svgPanel(chart, options).markup}\n`;
}

export interface SvgPanel {
  readonly width: number;
  readonly height: number;
  /** A whole svg element, which may stand in another one. */
  readonly markup: string;
}

/** @param top where the panel stands in a picture of several */
export function svgPanel(chart: Chart, options: SvgOptions, top = 0): SvgPanel {
  const id = (options.id ?? 'chart').replace(/[^A-Za-z0-9-]/g, '') || 'chart';
  const width = Math.max(200, Math.round(options.width_px ?? 800));
  const legend = legendRows(chart, width - 2 * EDGE_px);
  const frame = makeFrame(chart, width, Math.max(150, Math.round(options.height_px ?? 500)), legend.length);
  const caption = (options.caption ?? []).flatMap((text) => brokenText(text, width - 2 * EDGE_px, SMALL_px));
  const captionTop = frame.top + frame.height + 48;
  const height = captionTop + (caption.length === 0 ? 0 : caption.length * LINE_px + 12);
  const parts = [
    `<svg xmlns="http://www.w3.org/2000/svg"${top === 0 ? '' : ` y="${top}"`} width="${width}" height="${height}" viewBox="0 0 ${width} ${height}" role="img" font-family="sans-serif" font-size="${FONT_px}" fill="#000000">`,
    `<title>${escapeXml(chart.title)}</title>`,
    `<desc>${escapeXml(chartSentence(chart))}</desc>`,
    ...definitions(frame, id),
    `<rect width="${width}" height="${height}" fill="#ffffff"/>`,
    textElement(width / 2, 20, escapeXml(chart.title), 'middle', 'font-weight="bold"'),
    ...hatching(chart, frame, id),
    ...axes(frame),
    ...marks(frame),
    ...chart.series.map((series, i) => curve(chart, series, frame, i, id)),
    ...legendElements(legend, EDGE_px, 40, `${id}-hatch`),
    ...caption.map((line, i) =>
      textElement(
        EDGE_px,
        captionTop + LINE_px * (i + 1),
        escapeXml(line),
        'start',
        `font-size="${SMALL_px}"`,
      ),
    ),
    '</svg>',
  ];
  return { width, height, markup: parts.join('\n') };
}

function definitions({ left, top, width, height }: SvgFrame, id: string): readonly string[] {
  return [
    '<defs>',
    `<clipPath id="${id}-plot"><rect x="${decimal(left)}" y="${decimal(top)}" width="${decimal(width)}" height="${decimal(height)}"/></clipPath>`,
    `<pattern id="${id}-hatch" width="8" height="8" patternUnits="userSpaceOnUse" patternTransform="rotate(45)"><line x1="0" y1="0" x2="0" y2="8" stroke="#888888" stroke-width="2"/></pattern>`,
    '</defs>',
  ];
}

function axes(frame: SvgFrame): readonly string[] {
  const { left, top, width, height, xTexts, yTexts } = frame;
  const bottom = top + height;
  const middle = top + height / 2;
  return [
    `<g class="axes" stroke="#000000" fill="none">`,
    `<rect x="${decimal(left)}" y="${decimal(top)}" width="${decimal(width)}" height="${decimal(height)}"/>`,
    ...xTexts.ticks.map(({ value }) => lineElement(atX(frame, value), bottom, atX(frame, value), bottom + 5)),
    ...yTexts.ticks.map(({ value }) => lineElement(left - 5, atY(frame, value), left, atY(frame, value))),
    '</g>',
    ...xTexts.ticks.map((tick) =>
      textElement(atX(frame, tick.value), bottom + 19, escapeXml(tick.text), 'middle'),
    ),
    ...yTexts.ticks.map((tick) =>
      textElement(left - 8, atY(frame, tick.value) + 4, escapeXml(tick.text), 'end'),
    ),
    textElement(left + width / 2, bottom + 38, labelMarkup(xTexts.title, FONT_px), 'middle'),
    textElement(
      16,
      middle,
      labelMarkup(yTexts.title, FONT_px),
      'middle',
      `transform="rotate(-90 16 ${decimal(middle)})"`,
    ),
  ];
}

function hatching(chart: Chart, frame: SvgFrame, id: string): readonly string[] {
  return (chart.hatched ?? []).flatMap(({ from, to }) => {
    const [low, high] = [
      Math.max(Math.min(from, to), frame.x.domain[0]),
      Math.min(Math.max(from, to), frame.x.domain[1]),
    ];
    if (!(low < high)) return [];
    const start = atX(frame, low);
    return [
      `<rect class="hatched" x="${decimal(start)}" y="${decimal(frame.top)}" width="${decimal(atX(frame, high) - start)}" height="${decimal(frame.height)}" fill="url(#${id}-hatch)" fill-opacity="0.5"/>`,
    ];
  });
}

function marks({ top, height, marks: placed }: SvgFrame): readonly string[] {
  return placed.map(({ mark, x_px, centre_px, row }) => {
    const label_px = top - 8 - row * LINE_px;
    const line = lineElement(
      x_px,
      label_px + 4,
      x_px,
      top + height,
      'stroke="#555555" stroke-dasharray="2 3"',
    );
    const markup = labelMarkup(mark.label, SMALL_px);
    return `<g class="mark">${line}${textElement(centre_px, label_px, markup, 'middle', `font-size="${SMALL_px}"`)}</g>`;
  });
}

function curve(chart: Chart, series: ChartSeries, frame: SvgFrame, index: number, id: string): string {
  const runs: string[] = [];
  forEachRun(chart, series, (first, last) => {
    const points: string[] = [];
    for (let i = first; i <= last; i++) {
      points.push(`${decimal(atX(frame, series.x[i] ?? 0))},${decimal(atY(frame, series.y[i] ?? 0))}`);
    }
    const [cx = '', cy = ''] = (points[0] ?? '').split(',');
    runs.push(
      first === last
        ? `<circle cx="${cx}" cy="${cy}" r="3" fill="${colourOf(index)}"/>`
        : `<polyline points="${points.join(' ')}"/>`,
    );
  });
  return `<g class="series" clip-path="url(#${id}-plot)" fill="none" ${strokeOf(index)}>${runs.join('')}</g>`;
}
