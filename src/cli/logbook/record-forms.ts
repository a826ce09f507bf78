/** The forms that records can be written in, one after another: what stands before, between and behind them. */

import type { LogRecord } from '../../record/record.ts';
import { recordCsvHeader, recordCsvRow } from '../../record/record-csv.ts';
import { recordLatex } from '../../record/record-latex.ts';
import { recordLine } from '../../record/record-line.ts';
import { recordMarkdown } from '../../record/record-markdown.ts';
import { recordText } from '../../record/record-text.ts';
import { toAscii } from '../../units/to-ascii.ts';
import type { OptionValues } from '../options.ts';
import { escaped } from '../render/json-document.ts';

export interface RecordForm {
  readonly before: string;
  readonly one: (record: LogRecord) => string;
  readonly between: string;
  readonly after: string;
}

export interface FormHead {
  readonly version: string;
  readonly logbook: string;
}

const RULE = `\n${'-'.repeat(72)}\n\n`;

/** `head` opens the one JSON document of several records. */
export function recordForm(options: OptionValues, head: FormHead, ascii: boolean): RecordForm {
  const style = { ascii, precise: options.full === true };
  if (options.json) {
    const json = (text: string): string => (options.ascii ? escaped(text) : text);
    const start = JSON.stringify({ schema: 1, ...head }).slice(0, -1);
    return {
      before: json(`${start},"records":[`),
      one: (record) => json(recordLine(record)),
      between: ',\n',
      after: ']}\n',
    };
  }
  const plain = (text: string): string => (ascii ? asciiLines(text) : text);
  if (options.csv) {
    return { before: recordCsvHeader(), one: (r) => plain(recordCsvRow(r)), between: '', after: '' };
  }
  if (options.markdown)
    return { before: '', one: (record) => recordMarkdown(record, style), between: '\n', after: '' };
  if (options.latex)
    return { before: '', one: (record) => plain(recordLatex(record)), between: '\n', after: '' };
  return { before: '', one: (record) => recordText(record, style), between: RULE, after: '' };
}

/** One record alone: its JSON is a document of its own. */
export function oneRecord(record: LogRecord, options: OptionValues, head: FormHead, ascii: boolean): string {
  const { before, one } = recordForm(options, head, ascii);
  return options.json ? `${one(record)}\n` : before + one(record);
}

/** No sign becomes a quotation mark: in CSV that would end the cell. */
function asciiLines(text: string): string {
  return text.replace(/[″“”]/g, "''").split('\n').map(toAscii).join('\n');
}
