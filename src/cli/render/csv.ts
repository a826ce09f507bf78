/** The answer as one CSV record under a header line (RFC 4180, LF): the same keys as the JSON, joined by dots. */
import type { Answer } from '../../answer/answer.ts';
import { toAscii } from '../../units/to-ascii.ts';

/** Leaves of the answer in order; lists of cautions are joined by their codes, ranges split in two. */
export function flatAnswer(answer: Answer): readonly (readonly [string, string])[] {
  const rows: (readonly [string, string])[] = [];
  const walk = (value: unknown, path: string): void => {
    if (value === null || value === undefined) rows.push([path, '']);
    else if (Array.isArray(value)) for (const [i, v] of value.entries()) walk(v, `${path}.${i}`);
    else if (typeof value === 'object') {
      for (const [key, v] of Object.entries(value)) walk(v, path === '' ? key : `${path}.${key}`);
    } else rows.push([path, typeof value === 'number' && !Number.isFinite(value) ? '' : String(value)]);
  };
  const { cautions, energy, ...rest } = answer;
  walk(rest, '');
  if (energy) walk(energy, 'energy');
  rows.push(['cautions', cautions.map((c) => `${c.about}:${c.code}`).join(';')]);
  return rows;
}

export function renderCsv(answer: Answer, ascii = false): string {
  const all = flatAnswer(answer);
  const rows = ascii ? all.map(([key, value]) => [key, toAscii(value)] as const) : all;
  return `${rows.map(([key]) => field(key)).join(',')}\n${rows.map(([, value]) => field(value)).join(',')}\n`;
}

/** Quoted where a comma, quote or line break asks for it. */
export function field(text: string): string {
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
