/**
 * A table as people keep it: rows of numbers with comma, semicolon or tab between them under a header line, and lines from
 * `#` on as comments, of which those of the form "# word: value" may state facts (name, source, reference, temperature_C,
 * accuracy_n, note). Faults name the line.
 */
import type { Fault } from './check-shape.ts';

const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;

export interface CsvRow {
  readonly line: number;
  readonly fields: readonly string[];
}

export function splitCsv(text: string): {
  readonly comments: readonly CsvRow[];
  readonly rows: readonly CsvRow[];
} {
  const comments: CsvRow[] = [];
  const rows: CsvRow[] = [];
  for (const [i, raw] of text
    .replace(/^\ufeff/, '')
    .split(/\r\n|\n|\r/)
    .entries()) {
    const line = raw.trim();
    if (line === '') continue;
    if (line.startsWith('#')) comments.push({ line: i + 1, fields: [line.slice(1)] });
    else {
      const separator = line.includes('\t') ? '\t' : line.includes(';') ? ';' : ',';
      rows.push({
        line: i + 1,
        fields: line.split(separator).map((f) => f.trim().replace(/^"(.*)"$/, '$1')),
      });
    }
  }
  return { comments, rows };
}

/** The numbers of one row, or undefined with the fault noted. */
export function numbersOf(
  row: CsvRow,
  columns: readonly string[],
  faults: Fault[],
): readonly number[] | undefined {
  const where = `line ${row.line}`;
  // The first few faults tell the story of a wrong file.
  if (faults.length >= 5) return undefined;
  if (row.fields.length !== columns.length) {
    faults.push(
      fault(where, `has ${row.fields.length} values`, `must have ${columns.length}: ${columns.join(', ')}`),
    );
    return undefined;
  }
  const values: number[] = [];
  for (const [i, field] of row.fields.entries()) {
    const column = columns[i] ?? '';
    const value = NUMBER.test(field) ? Number(field) : Number.NaN;
    const fits = Number.isFinite(value) && (column === 'k' ? value >= 0 : value > 0);
    if (!fits) {
      const want = column === 'k' ? 'a number of at least 0 (k >= 0 absorbs)' : 'a number above 0';
      const comma = /^\d+,\d+$/.test(field) ? `, with a point: ${field.replace(',', '.')}` : '';
      faults.push(fault(`${where}, ${column}`, `is "${shorten(field)}"`, `must be ${want}${comma}`));
      return undefined;
    }
    values.push(value);
  }
  return values;
}

/** What the comments state. */
export interface CsvFacts {
  name?: string;
  source?: string;
  note?: string;
  reference?: 'air' | 'vacuum';
  temperature_C?: number;
  accuracy_n?: number;
}

export function readFacts(comments: readonly CsvRow[], faults: Fault[]): CsvFacts {
  const facts: CsvFacts = {};
  for (const { line, fields } of comments) {
    const match = /^\s*(name|source|note|reference|temperature_C|accuracy_n)\s*:\s*(.*?)\s*$/i.exec(
      fields[0] ?? '',
    );
    const [, word = '', value = ''] = match ?? [];
    if (!match) continue;
    const wrong = (want: string): void => {
      faults.push(fault(`line ${line}, ${word}`, `is "${shorten(value)}"`, `must be ${want}`));
    };
    const number = NUMBER.test(value) ? Number(value) : Number.NaN;
    switch (word.toLowerCase()) {
      case 'name':
      case 'source':
      case 'note':
        if (value === '' || /\p{Cc}/u.test(value)) wrong('a text without control characters');
        else facts[word.toLowerCase() as 'name' | 'source' | 'note'] = value;
        break;
      case 'reference':
        if (value === 'air' || value === 'vacuum') facts.reference = value;
        else wrong('air or vacuum');
        break;
      case 'temperature_c':
        if (number >= -273.15 && Number.isFinite(number)) facts.temperature_C = number;
        else wrong('a temperature in degrees Celsius, a number only');
        break;
      default:
        if (number >= 0 && Number.isFinite(number)) facts.accuracy_n = number;
        else wrong('the standard uncertainty of n, a number of at least 0');
    }
  }
  return facts;
}

export const fault = (path: string, message: string, remedy: string): Fault => ({ path, message, remedy });

/** A quotation fit for one line of a message. */
export const shorten = (s: string): string =>
  (s.length > 40 ? `${s.slice(0, 40)}...` : s).replace(/\p{Cc}/gu, '?');
