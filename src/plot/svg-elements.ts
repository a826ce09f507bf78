/** The elements that the parts of an SVG chart are made of, and how the line of each series is drawn. */
import { dashOf } from './dash-patterns.ts';
import { decimal } from './svg-text.ts';

export const FONT_px = 13;
export const SMALL_px = 11;
export const LINE_px = 16;

/** Okabe and Ito's colours, from memory, without the yellow that vanishes on white paper. */
const COLOURS = ['#000000', '#0072b2', '#d55e00', '#009e73', '#cc79a7', '#56b4e9', '#e69f00', '#555555'];

export function colourOf(seriesIndex: number): string {
  return COLOURS[seriesIndex % COLOURS.length] ?? '#000000';
}

export function strokeOf(seriesIndex: number): string {
  const dashes = dashOf(seriesIndex);
  const dashArray = dashes.length === 0 ? '' : ` stroke-dasharray="${dashes.join(' ')}"`;
  return `stroke="${colourOf(seriesIndex)}" stroke-width="1.6"${dashArray}`;
}

export function lineElement(x1: number, y1: number, x2: number, y2: number, more = ''): string {
  return `<line x1="${decimal(x1)}" y1="${decimal(y1)}" x2="${decimal(x2)}" y2="${decimal(y2)}"${attributes(more)}/>`;
}

/** @param markup escaped already */
export function textElement(
  x: number,
  y: number,
  markup: string,
  anchor: 'start' | 'middle' | 'end',
  more = '',
): string {
  return `<text x="${decimal(x)}" y="${decimal(y)}" text-anchor="${anchor}"${attributes(more)}>${markup}</text>`;
}

function attributes(more: string): string {
  return more === '' ? '' : ` ${more}`;
}
