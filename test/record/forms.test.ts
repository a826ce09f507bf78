/** Every form of one full record against the text agreed on, and what holds for every record whatever stands in it. */
import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { latexText } from '../../src/record/latex-text.ts';
import { type LogRecord, makeRecord } from '../../src/record/record.ts';
import { recordCsvHeader, recordCsvRow, recordsCsv } from '../../src/record/record-csv.ts';
import { recordLatex } from '../../src/record/record-latex.ts';
import { recordLine } from '../../src/record/record-line.ts';
import { recordMarkdown } from '../../src/record/record-markdown.ts';
import { recordText } from '../../src/record/record-text.ts';
import { FULL_RECORD } from './full-record.ts';
import { CATALOGUE } from './sample-record.ts';

const golden = (name: string): string => readFileSync(new URL(`./golden/${name}`, import.meta.url), 'utf8');

describe('the forms of a full record', () => {
  it.each([
    ['record.txt', recordText(FULL_RECORD)],
    ['record-ascii.txt', recordText(FULL_RECORD, { ascii: true, precise: true })],
    ['record-markdown.txt', recordMarkdown(FULL_RECORD)],
    ['record.csv', recordsCsv([FULL_RECORD])],
    ['record.tex', recordLatex(FULL_RECORD)],
    ['record.jsonl', `${recordLine(FULL_RECORD)}\n`],
  ])('%s is as agreed', (name, made) => {
    expect(made).toBe(golden(name));
  });

  it('holds what a notebook needs: versions, question, digits, cautions, sources, conventions, command', () => {
    const text = recordText(FULL_RECORD, { precise: true }).replace(/\s+/g, ' ');
    for (const part of [
      FULL_RECORD.id,
      '2026-03-14T09:26:53+01:00',
      'halfspace 0.1.0',
      '0123456789ab',
      '632.8 nm in standard air',
      '0.01235(4) %',
      'interface.Rp = 0.00012345678901234567',
      'laser-safety officer',
      'https://doi.org/10.1364/josa.55.001205',
      'exp(i(k r - w t))',
      '--angle 56.3deg',
    ])
      expect(text).toContain(part);
  });
});

const word = fc.string({ unit: 'grapheme', minLength: 1, maxLength: 30 });
const sentence = fc.array(
  fc.oneof(word, fc.constantFrom('a', 'of', '|', '`', '\u001b[31m', 'µm', '{', '\\', '%')),
  {
    maxLength: 25,
  },
);
const phrase = sentence.map((words) => words.join(' '));
const anyRow = fc.record({ about: word, symbol: word, label: phrase, text: phrase });
const anyRecord: fc.Arbitrary<LogRecord> = fc
  .record({
    asked: fc.array(anyRow, { maxLength: 4 }),
    rows: fc.array(anyRow, { maxLength: 6 }),
    cautions: fc.array(
      phrase.map((text) => ({ code: 'hygroscopic', about: 'into', level: 'note', text }) as const),
      { maxLength: 3 },
    ),
    moreSources: fc.array(fc.record({ id: word, text: phrase, doi: fc.option(word) }), { maxLength: 3 }),
    more: fc.array(
      word.filter((w) => !w.includes('\0')),
      { maxLength: 20 },
    ),
    answer: fc.dictionary(fc.string({ maxLength: 5 }), fc.oneof(fc.double(), phrase), { maxKeys: 5 }),
  })
  .map(({ more, ...parts }) =>
    makeRecord({
      ...parts,
      time: '2026-03-14T09:26:53Z',
      version: '0.1.0',
      catalogue: CATALOGUE,
      commandWords: ['halfspace', ...more],
      question: {},
    }),
  );

describe('the forms of any record', () => {
  it('text keeps to 72 columns but for single long words, has no escape codes and no trailing blanks', () => {
    fc.assert(
      fc.property(anyRecord, fc.boolean(), (record, ascii) => {
        const text = recordText(record, { ascii });
        const isTooLong = (line: string): boolean => [...line].length > 72;
        const [body = '', command = ''] = text.split('\nTo ask again\n');
        // Words bound to a number count as one with it.
        const isOneWord = (line: string): boolean =>
          !/\S +\S/u.test(line.trim().replace(/^[-!] |(?<=[\d)×]) (?=\S)/gu, ''));
        expect(
          body
            .split('\n')
            .filter(isTooLong)
            .filter((line) => !isOneWord(line)),
        ).toEqual([]);
        const words = record.commandWords.map((word) => [...word].length);
        if (Math.max(...words) < 20 && !ascii)
          expect(
            command
              .split('\n')
              .filter(isTooLong)
              .filter((line) => !line.includes("'\\''")),
          ).toEqual([]);
        expect(text).not.toMatch(ascii ? /[^\x20-\x7e\n]/ : /[\x00-\x09\x0b-\x1f\x7f-\x9f]/);
        expect(text).not.toMatch(/[ \t]+\n/);
        expect(text).toMatch(/[^\n]\n$/);
      }),
      { numRuns: 300 },
    );
  });

  it('Markdown tables have the same number of cells in every row', () => {
    fc.assert(
      fc.property(anyRecord, (record) => {
        const markdown = recordMarkdown(record);
        const cells = (line: string): number => line.replace(/\\./gsu, '').split('|').length - 2;
        const lines = markdown.slice(0, markdown.lastIndexOf('### Made with')).split('\n');
        let columns = 0;
        for (const line of lines) {
          if (!line.startsWith('|')) columns = 0;
          else if (columns === 0) columns = cells(line);
          else expect([line, cells(line)]).toEqual([line, columns]);
        }
        expect(markdown).not.toMatch(/[\x00-\x09\x0b-\x1f\x7f-\x9f]/);
      }),
      { numRuns: 200 },
    );
  });

  it('CSV has as many cells in every row as in the header, and reads back what was put in', () => {
    fc.assert(
      fc.property(anyRecord, (record) => {
        const header = parseCsv(recordCsvHeader())[0] ?? [];
        const rows = parseCsv(recordCsvRow(record));
        expect(rows.length).toBe(1);
        expect(rows[0]?.length).toBe(header.length);
        expect(rows[0]?.[header.indexOf('command')]).toBe(record.command);
        expect(rows[0]?.[header.indexOf('id')]).toBe(record.id);
      }),
      { numRuns: 200 },
    );
  });

  it('LaTeX text has balanced braces and dollars and no sign left that would be read as a command', () => {
    fc.assert(
      fc.property(phrase, (text) => {
        const made = latexText(text);
        const bare = made.replace(/\\(?:[a-zA-Z]+|[{}$&#%_])/g, '');
        let depth = 0;
        for (const c of bare) {
          if (c === '{') depth += 1;
          if (c === '}') depth -= 1;
          expect(depth).toBeGreaterThanOrEqual(0);
        }
        expect(depth).toBe(0);
        expect(bare.split('$').length % 2).toBe(1);
        const outsideMath = bare.replace(/\$[^$]*\$/g, '');
        expect(outsideMath).not.toMatch(/[&#%_^~\\]/);
      }),
      { numRuns: 500 },
    );
  });
});

describe('LaTeX text', () => {
  it.each([
    ['50 % of n_e & R_p, -3 dB', '50 \\% of $n_{\\mathrm{e}}$ \\& $R_{\\mathrm{p}}$, $-$3 dB'],
    ['1.3 × 10⁻⁶ K⁻¹', '1.3 $\\times$ 10$^{-6}$ K$^{-1}$'],
    ['56.31° at 10.6 µm in MgF₂', '56.31$^{\\circ}$ at 10.6 \\textmu{}m in MgF$_{2}$'],
    ['2026-03-14, a_long_name, θ_i', '2026-03-14, a\\_long\\_name, $\\theta_{\\mathrm{i}}$'],
    ['[x] * é \\ ~^', '{[}x] {*} é \\textbackslash{} \\textasciitilde{}\\textasciicircum{}'],
  ])('%s', (text, expected) => {
    expect(latexText(text)).toBe(expected);
  });
});

/** Reads CSV with quotes, as RFC 4180 has it. */
function parseCsv(text: string): string[][] {
  const rows: string[][] = [];
  let row: string[] = [];
  for (const [, quoted, plain, end] of text.matchAll(/(?:"((?:[^"]|"")*)"|([^",\n]*))(,|\n)/g)) {
    row.push(quoted === undefined ? (plain ?? '') : quoted.replaceAll('""', '"'));
    if (end === '\n') {
      rows.push(row);
      row = [];
    }
  }
  return rows;
}
