/**
 * A record as plain text to paste into a notebook: 72 columns, no escape codes, no trailing blanks, one newline at the end. A
 * single word longer than a line (a link, a quoted word of the command) is left whole.
 */
import { wrap } from '../present/wrap.ts';
import type { LogRecord, RecordRow } from './record.ts';
import {
  byHeading,
  exactNumbers,
  type FormStyle,
  harmless,
  harmlessWords,
  sourceText,
  versionsText,
} from './record-parts.ts';
import { shellCommandLines } from './shell-quote.ts';

const WIDTH = 72;
const MOST_LEFT = 38;
const BOUND_SPACE = '\u00a0';

export function recordText(record: LogRecord, style: FormStyle = {}): string {
  const clean = (text: string): string => harmless(text, style);
  const lines = [
    ...hanging('', clean(`${record.program.name} record ${record.id}, ${record.time}`), ''),
    '',
    'Asked',
    ...rowLines(record.asked, '  ', clean),
    '',
    'Found',
    ...[...byHeading(record.rows)].flatMap(([about, rows]) =>
      about === ''
        ? rowLines(rows, '  ', clean)
        : [...hanging('  ', clean(about), '    '), ...rowLines(rows, '    ', clean)],
    ),
    ...list(
      'Cautions',
      '! ',
      record.cautions.map(({ text }) => clean(text)),
    ),
    ...list(
      'Sources',
      '- ',
      record.sources.map((source) => clean(sourceText(source))),
    ),
    ...list('Conventions', '- ', record.conventions.map(clean)),
    ...(style.precise ? exactLines(record) : []),
    '',
    'Made with',
    ...hanging('  ', clean(versionsText(record)), '  '),
    '',
    'To ask again',
    ...shellCommandLines(harmlessWords(record.commandWords, style), WIDTH - 2).map((line) => `  ${line}`),
  ];
  return `${lines.map((line) => line.trimEnd()).join('\n')}\n`;
}

function hanging(first: string, text: string, rest: string): readonly string[] {
  return wrap(bindUnits(text), WIDTH - [...rest].length).map(
    (line, i) => (i === 0 ? first : rest) + line.replaceAll(BOUND_SPACE, ' '),
  );
}

/** No line ends between a number and its unit, or within a power of ten. */
function bindUnits(text: string): string {
  return text.replace(/(?<=[\d)×]) (?=[×%°]|[a-zA-ZµΩ]{1,4}(?![\p{L}\d])|10[⁻⁰¹²³⁴⁵⁶⁷⁸⁹])/gu, BOUND_SPACE);
}

function list(title: string, mark: string, items: readonly string[]): readonly string[] {
  if (items.length === 0) return [];
  return ['', title, ...items.flatMap((item) => hanging(`  ${mark}`, item, '    '))];
}

/** Label before value, values in one column; what does not fit beside its label goes below it. */
function rowLines(
  rows: readonly RecordRow[],
  indent: string,
  clean: (text: string) => string,
): readonly string[] {
  const symbols = rows.map((row) => clean(row.symbol));
  const symbolWidth = Math.max(0, ...symbols.map((symbol) => [...symbol].length));
  const lefts = rows.map((row, i) => {
    const label = clean(row.label);
    return symbolWidth === 0 ? label : `${padEnd(symbols[i] ?? '', symbolWidth)}  ${label}`;
  });
  const leftWidth = Math.max(0, ...lefts.map((left) => [...left].length).filter((n) => n <= MOST_LEFT));
  return rows.flatMap((row, i) => {
    const left = lefts[i] ?? '';
    const text = clean(row.text);
    const beside = `${indent}${padEnd(left, leftWidth)}  `;
    const room = WIDTH - [...beside].length;
    if ([...left].length <= leftWidth && longestWord(text) <= room)
      return hanging(beside, text, ' '.repeat(WIDTH - room));
    return [...hanging(indent, left, `${indent}  `), ...hanging(`${indent}    `, text, `${indent}    `)];
  });
}

function longestWord(text: string): number {
  return Math.max(
    ...bindUnits(text)
      .split(' ')
      .map((word) => [...word].length),
  );
}

function exactLines(record: LogRecord): readonly string[] {
  const numbers = exactNumbers(record.answer);
  return ['', 'Every number to the last bit', ...numbers.map(({ path, text }) => `  ${path} = ${text}`)];
}

function padEnd(text: string, width: number): string {
  return text + ' '.repeat(Math.max(0, width - [...text].length));
}
