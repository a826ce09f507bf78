/** How one value stands on a line of an answer's text, and a titled list of them. */
import type { Shown } from '../../present/shown.ts';
import { wrap } from '../../present/wrap.ts';

/** Columns that no line of text passes. */
export const WIDTH = 72;

/** Characters, not UTF-16 units. */
export const length = (text: string): number => [...text].length;
export const pad = (text: string, width: number): string =>
  text + ' '.repeat(Math.max(0, width - length(text)));

const LABEL_AT = 38;

/** Symbol, value, label; a label that has no room beside a long value stands below it. */
export function oneValue({ symbol, text, label }: Shown): readonly string[] {
  const head = pad(`  ${symbol}`, 17);
  const value = `${head} ${text}`;
  const beside = `${pad(value, LABEL_AT - 1)} ${label}`;
  if (length(beside) <= WIDTH) return [beside];
  return [value, ...wrap(label, WIDTH - LABEL_AT).map((line) => ' '.repeat(LABEL_AT) + line)];
}

export function section(title: string, rows: readonly Shown[]): readonly string[] {
  return rows.length === 0 ? [] : ['', title, ...rows.flatMap(oneValue)];
}
