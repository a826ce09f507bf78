/**
 * The logbook as records: keep one, go through them lazily from either end, find one by its id, search their text.
 * Lines that are no records do not stop the reading; they come as entries of their own kind.
 */
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { quoteInput } from '../units/quote-input.ts';
import type { RawLine } from './line-reader.ts';
import { appendToLogbook, type Confirmed, type Files, logbookLines } from './logbook-file.ts';
import type { LogbookPlace } from './logbook-path.ts';
import type { LogRecord } from './record.ts';
import { parseRecordLine, recordLine } from './record-line.ts';

export type LogEntry =
  | {
      readonly kind: 'record';
      readonly record: LogRecord;
      /** True where its content no longer fits its id: changed after it was kept. */
      readonly altered: boolean;
      readonly offset: number;
    }
  /** Cut off while it was written, never confirmed. */
  | { readonly kind: 'unfinished'; readonly text: string; readonly offset: number }
  /** Not written by this program. */
  | { readonly kind: 'foreign'; readonly text: string; readonly offset: number }
  /** The file could not be read on; always the last entry. */
  | { readonly kind: 'unreadable'; readonly refusal: Refusal };

export type RecordEntry = Extract<LogEntry, { kind: 'record' }>;

/** Returns when the record is on disk, or says why it is not. */
export function keepRecord(place: LogbookPlace, record: LogRecord, files?: Files): Confirmed | Refusal {
  return appendToLogbook(place, recordLine(record), files);
}

export function* logEntries(
  file: string,
  order: 'oldest-first' | 'newest-first',
  files?: Files,
): Generator<LogEntry, void> {
  for (const line of logbookLines(file, order, files))
    yield isRefusal(line) ? { kind: 'unreadable', refusal: line } : entryOf(line);
}

function entryOf({ text, offset, ended, tooLong }: RawLine): LogEntry {
  const parsed = parseRecordLine(text);
  if (tooLong) return { kind: 'foreign', text, offset };
  if (!ended) return { kind: 'unfinished', text, offset };
  return parsed.kind === 'record' ? { ...parsed, offset } : { kind: parsed.kind, text, offset };
}

/** The records alone. A refusal ends them. */
export function* recordsOf(entries: Iterable<LogEntry>): Generator<RecordEntry | Refusal, void> {
  for (const entry of entries) {
    if (entry.kind === 'record') yield entry;
    else if (entry.kind === 'unreadable') yield entry.refusal;
  }
}

const MOST_CANDIDATES = 5;

/**
 * The record with an id, or with the only id that starts so. Case does not matter.
 * A record kept twice counts once.
 */
export function findRecord(entries: Iterable<LogEntry>, idOrStart: string): RecordEntry | Refusal {
  const start = idOrStart.trim().toLowerCase();
  const found = new Map<string, RecordEntry>();
  for (const entry of recordsOf(entries)) {
    if (isRefusal(entry)) return entry;
    const { id } = entry.record;
    if (start !== '' && id.startsWith(start) && !found.has(id)) found.set(id, entry);
  }
  const [only, ...others] = found.values();
  if (!only)
    return refuse(
      'record-not-found',
      2,
      `no record has an id that starts with ${quoteInput(idOrStart)}`,
      'give the first digits of an id as the list of records shows it',
    );
  if (others.length === 0) return only;
  return refuse(
    'record-ambiguous',
    2,
    `${found.size} records have an id that starts with ${quoteInput(idOrStart)}`,
    'give more digits of the id',
    [...found.keys()].slice(0, MOST_CANDIDATES),
  );
}

/** The records in whose text every word occurs, as they come. */
export function* searchRecords(
  entries: Iterable<LogEntry>,
  words: string,
): Generator<RecordEntry | Refusal, void> {
  const wanted = fold(words)
    .split(/\s+/)
    .filter((word) => word !== '');
  for (const entry of recordsOf(entries)) {
    if (isRefusal(entry)) {
      yield entry;
      continue;
    }
    const text = fold(searchedText(entry.record));
    if (wanted.every((word) => text.includes(word))) yield entry;
  }
}

function searchedText(record: LogRecord): string {
  const { id, time, command, asked, rows, cautions, sources } = record;
  const ofRow = (row: { about: string; symbol: string; label: string; text: string }): string =>
    `${row.about} ${row.symbol} ${row.label} ${row.text}`;
  return [
    id,
    time,
    command,
    ...asked.map(ofRow),
    ...rows.map(ofRow),
    ...cautions.map((caution) => `${caution.code} ${caution.text}`),
    ...sources.map((source) => `${source.text} ${source.doi ?? ''}`),
  ].join('\n');
}

/** Case, accents, sub- and superscripts do not matter; micro is found as `u`. */
function fold(text: string): string {
  return text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase().replaceAll('μ', 'u');
}
