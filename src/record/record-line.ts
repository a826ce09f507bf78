/**
 * A record as one line of JSON, and back. The line is plain JSON for other programs; characters that could steer a terminal when the
 * file is looked at (C1 controls, bidirectional marks, line separators) are written as \u escapes.
 */
import { isJsonObject, type JsonValue } from './plain-json.ts';
import { idOfRecord, type LogRecord } from './record.ts';
import { isTimeStamp } from './time-stamp.ts';

const UNSAFE = /[\x7f-\x9f\u200b-\u200f\u2028-\u202e\u2060-\u2069\ufeff]/g;

export function recordLine(record: LogRecord): string {
  return JSON.stringify(record).replace(
    UNSAFE,
    (c) => `\\u${(c.codePointAt(0) ?? 0).toString(16).padStart(4, '0')}`,
  );
}

export type ParsedLine =
  | { readonly kind: 'record'; readonly record: LogRecord; readonly altered: boolean }
  /** Starts as a record does and is no JSON: cut off while it was written. */
  | { readonly kind: 'unfinished' }
  /** Something else that somebody put into the file. */
  | { readonly kind: 'foreign' };

export function parseRecordLine(text: string): ParsedLine {
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch {
    return { kind: text.startsWith('{') ? 'unfinished' : 'foreign' };
  }
  if (!isRecord(value)) return { kind: 'foreign' };
  return { kind: 'record', record: value, altered: idOfRecord(value) !== value.id };
}

/** True for data with every part that the forms and the comparison rely on. */
export function isRecord(value: unknown): value is LogRecord {
  if (!isJsonObject(value)) return false;
  const { schema, id, time, program, catalogue, command, question, answer } = value;
  return (
    typeof schema === 'number' &&
    schema >= 1 &&
    isText(id) &&
    /^[0-9a-f]{12}$/.test(id) &&
    isText(time) &&
    isTimeStamp(time) &&
    hasTexts(program, 'name', 'version') &&
    hasTexts(catalogue, 'hash', 'date') &&
    isText(command) &&
    isListOf(value['commandWords'], isText) &&
    isJsonObject(question) &&
    isJsonObject(answer) &&
    isListOf(value['asked'], isRow) &&
    isListOf(value['rows'], isRow) &&
    isListOf(value['cautions'], (x) => hasTexts(x, 'code', 'about', 'level', 'text')) &&
    isListOf(value['sources'], (x) => hasTexts(x, 'id', 'text') && (x['doi'] === null || isText(x['doi']))) &&
    isListOf(value['conventions'], isText)
  );
}

const isText = (value: unknown): value is string => typeof value === 'string';

function hasTexts(
  value: unknown,
  ...keys: readonly string[]
): value is { readonly [key: string]: JsonValue } {
  return isJsonObject(value) && keys.every((key) => isText(value[key]));
}

const isRow = (value: unknown): boolean => hasTexts(value, 'about', 'symbol', 'label', 'text');

function isListOf(value: unknown, test: (item: unknown) => boolean): boolean {
  return Array.isArray(value) && value.every(test);
}
