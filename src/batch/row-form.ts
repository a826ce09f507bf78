/** The forms in which computed rows are written: CSV, JSON lines, a Markdown table, a table for the eye. */
import type { AnswerColumn } from './answer-columns.ts';
import { ANSWER_KEY, ERROR_COLUMN, OUTSIDE_COLUMN } from './batch-format.ts';
import type { ByteWriter } from './byte-writer.ts';
import type { Trouble } from './question-column.ts';
import type { RowAnswers } from './row-answers.ts';
import { quotedField } from './row-reader.ts';
import { roundedText } from './write-rounded.ts';

export interface RowForm {
  readonly begin: () => void;
  /** `texts` are numbers in the units that the names of their columns state. */
  readonly row: (texts: readonly string[], answers: RowAnswers, bad: Trouble | undefined) => void;
}

export interface FormSetup {
  readonly writer: ByteWriter;
  /** Names of the columns before the answers, units included. */
  readonly names: readonly string[];
  readonly columns: readonly AnswerColumn[];
  readonly marksOutside: boolean;
  readonly whole: boolean;
  readonly wording: (text: string) => string;
}

const LF = 10;
const said = ({ message, remedy }: Trouble): string => `${message}; ${remedy}`;

/** Text of an answer column; empty where there is no value. */
function valueText(answers: RowAnswers, i: number, digits: number): string {
  const value = answers.value(i);
  if (value === null) return '';
  return typeof value === 'number' && digits > 0 ? roundedText(value, digits) : String(value);
}

export function csvForm({ writer, names, columns, marksOutside, wording }: FormSetup): RowForm {
  const added = [...columns.map(({ name }) => name), ...(marksOutside ? [OUTSIDE_COLUMN] : []), ERROR_COLUMN];
  const field = (text: string): string => quotedField(text, ',');
  return {
    begin: () => writer.text(`${[...names, ...added].map(field).join(',')}\n`),
    row(texts, answers, bad) {
      for (const text of texts) {
        writer.text(text);
        writer.byte(44);
      }
      for (let i = 0; i < columns.length; i++) {
        const value = bad ? null : answers.value(i);
        if (typeof value === 'number') writer.number(value);
        else if (value !== null) writer.text(field(String(value)));
        writer.byte(44);
      }
      if (marksOutside) writer.text(`${bad ? '' : answers.outside},`);
      if (bad) writer.text(field(wording(said(bad))));
      writer.byte(LF);
    },
  };
}

export function jsonForm({ writer, names, columns, marksOutside, whole, wording }: FormSetup): RowForm {
  const key = (name: string): void => writer.text(`${JSON.stringify(name)}:`);
  return {
    begin: () => undefined,
    row(texts, answers, bad) {
      writer.byte(123);
      for (const [i, name] of names.entries()) {
        key(name);
        writer.text(`${texts[i] ?? 'null'},`);
      }
      for (const [i, { name }] of columns.entries()) {
        key(name);
        const value = bad ? null : answers.value(i);
        if (typeof value === 'number') writer.number(value);
        else writer.text(JSON.stringify(value));
        writer.byte(44);
      }
      if (marksOutside) writer.text(`"${OUTSIDE_COLUMN}":${JSON.stringify(bad ? null : answers.outside)},`);
      if (whole)
        writer.text(`"${ANSWER_KEY}":${JSON.stringify(bad ? null : (answers.whole ?? null), finite)},`);
      key(ERROR_COLUMN);
      writer.text(bad ? wording(JSON.stringify(bad)) : 'null');
      writer.text('}\n');
    },
  };
}

export const finite = (_: string, value: unknown): unknown =>
  typeof value === 'number' && !Number.isFinite(value) ? null : value;

export function markdownForm({ writer, names, columns, marksOutside, wording }: FormSetup): RowForm {
  const heads = [
    ...names,
    ...columns.map(({ name }) => name),
    ...(marksOutside ? [OUTSIDE_COLUMN] : []),
    ERROR_COLUMN,
  ];
  const line = (cells: readonly string[]): string =>
    `| ${cells.map((cell) => cell.replaceAll('|', '\\|')).join(' | ')} |\n`;
  return {
    begin: () =>
      writer.text(line(heads) + line(heads.map((name) => (name === ERROR_COLUMN ? '---' : '---:')))),
    row(texts, answers, bad) {
      const values = columns.map((_, i) => (bad ? '' : valueText(answers, i, writer.digits)));
      const outside = marksOutside ? [bad ? '' : answers.outside] : [];
      writer.text(line([...texts, ...values, ...outside, bad ? wording(said(bad)) : '']));
    },
  };
}

/** Columns under one another, as wide as their numbers can get; what is wrong with a point stands at the end of its line. */
export function plainForm(
  { writer, names, columns, marksOutside, wording }: FormSetup,
  widest: readonly number[],
): RowForm {
  const heads = [...names, ...columns.map(({ name }) => name), ...(marksOutside ? [OUTSIDE_COLUMN] : [])];
  // A sign, the point and an exponent beside the digits.
  const number = writer.digits + 7;
  const widths = heads.map((name, i) => Math.max(name.length, widest[i] ?? number));
  const line = (cells: readonly string[], end: string): string =>
    `${[...cells.map((cell, i) => cell.padStart(widths[i] ?? 0)), end].join('  ').trimEnd()}\n`;
  return {
    begin: () => writer.text(line(heads, '')),
    row(texts, answers, bad) {
      const values = columns.map((_, i) => (bad ? '-' : valueText(answers, i, writer.digits) || '-'));
      const outside = marksOutside ? [bad ? '' : answers.outside] : [];
      writer.text(line([...texts, ...values, ...outside], bad ? wording(said(bad)) : ''));
    },
  };
}
