/** A record in Markdown (CommonMark with pipe tables): headings, tables, lists, the command in a fence. */
import type { LogRecord, RecordRow } from './record.ts';
import {
  byHeading,
  doiLink,
  exactNumbers,
  type FormStyle,
  harmless,
  harmlessWords,
  unlinked,
  versionsText,
} from './record-parts.ts';
import { shellCommand } from './shell-quote.ts';

export function recordMarkdown(record: LogRecord, style: FormStyle = {}): string {
  const text = (raw: string): string => escapeMarkdown(harmless(raw, style));
  const sections = [
    [`## ${text(`${record.program.name} record ${record.id}`)}`, '', text(record.time)],
    [
      '### Asked',
      '',
      ...table(
        ['asked', 'as understood'],
        record.asked.map((row) => [row.label, row.text]),
        text,
      ),
    ],
    ['### Found', '', ...foundTables(record.rows, text)],
    list(
      'Cautions',
      record.cautions.map((caution) => text(caution.text)),
    ),
    list(
      'Sources',
      record.sources.map((source) =>
        source.doi === null ? text(source.text) : `${text(unlinked(source))} <${doiLink(source.doi)}>`,
      ),
    ),
    list('Conventions', record.conventions.map(text)),
    style.precise ? exactSection(record) : [],
    [
      '### Made with',
      '',
      text(versionsText(record)),
      '',
      ...fence(shellCommand(harmlessWords(record.commandWords, style)), 'sh'),
    ],
  ];
  return `${sections
    .filter((section) => section.length > 0)
    .map((section) => section.join('\n'))
    .join('\n\n')}\n`;
}

/** Every ASCII sign that Markdown may read as markup gets a backslash, which Markdown takes off again. */
function escapeMarkdown(text: string): string {
  return text.replace(/[\\`*_{}[\]<>#|~$&!]/g, '\\$&').replace(/^(\d*)([-+=.)])(?=[\s\-=]|$)/, '$1\\$2');
}

function table(
  head: readonly string[],
  rows: readonly (readonly string[])[],
  text: (raw: string) => string,
): readonly string[] {
  const line = (cells: readonly string[]): string => `| ${cells.join(' | ')} |`;
  return [line(head), line(head.map(() => '---')), ...rows.map((cells) => line(cells.map(text)))];
}

function foundTables(rows: readonly RecordRow[], text: (raw: string) => string): readonly string[] {
  return [...byHeading(rows)]
    .map(([about, group]) => [
      ...(about === '' ? [] : [`#### ${text(about)}`, '']),
      ...table(
        ['quantity', 'symbol', 'value'],
        group.map((row) => [row.label, row.symbol, row.text]),
        text,
      ),
    ])
    .flatMap((lines, i) => (i === 0 ? lines : ['', ...lines]));
}

function list(title: string, items: readonly string[]): readonly string[] {
  return items.length === 0 ? [] : [`### ${title}`, '', ...items.map((item) => `- ${item}`)];
}

function exactSection(record: LogRecord): readonly string[] {
  const lines = exactNumbers(record.answer).map(({ path, text }) => `${path} = ${text}`);
  return ['### Every number to the last bit', '', ...fence(lines.join('\n'), '')];
}

/** A fence longer than any run of backticks inside. */
function fence(content: string, language: string): readonly string[] {
  const longest = Math.max(2, ...(content.match(/`+/g) ?? []).map((run) => run.length));
  const marks = '`'.repeat(longest + 1);
  return [marks + language, content, marks];
}
