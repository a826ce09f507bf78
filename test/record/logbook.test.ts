/** Reading the logbook: order, foreign lines, ids and their beginnings, words in the text. */
import * as fs from 'node:fs';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { isRefusal, type Refusal, refuse } from '../../src/medium/refusal.ts';
import {
  findRecord,
  keepRecord,
  type LogEntry,
  logEntries,
  type RecordEntry,
  recordsOf,
  searchRecords,
} from '../../src/record/logbook.ts';
import { placeAt } from '../../src/record/logbook-path.ts';
import { recordLine } from '../../src/record/record-line.ts';
import { FULL_RECORD } from './full-record.ts';
import { sampleRecord } from './sample-record.ts';
import { testFolder } from './writer.ts';

let folder: string;
let file: string;
beforeAll(() => {
  folder = testFolder();
  file = path.join(folder, 'logbook.jsonl');
  keepRecord(placeAt(file), sampleRecord('first, Brewster window'));
  fs.appendFileSync(file, '# a note by hand\n\n{"other":"program"}\n[1,2]\n');
  keepRecord(placeAt(file), FULL_RECORD);
  fs.appendFileSync(file, `${recordLine(sampleRecord('changed')).replaceAll('changed', 'Changed')}\n`);
  keepRecord(placeAt(file), sampleRecord('last, 10.6 µm on ZnSe'));
  fs.appendFileSync(file, '{"schema":1,"id":"0');
});
afterAll(() => fs.rmSync(folder, { recursive: true, force: true }));

const entries = () => logEntries(file, 'newest-first');
const nameOf = (entry: LogEntry | Refusal): string => {
  if (isRefusal(entry)) return entry.code;
  if (entry.kind !== 'record') return entry.kind;
  return `${entry.altered ? 'altered ' : ''}${entry.record.asked[0]?.text}`;
};

describe('reading the logbook', () => {
  it('gives every line in order, from either end, as what it is', () => {
    const expected = [
      'first, Brewster window',
      'foreign',
      'foreign',
      'foreign',
      'Air (air)',
      'altered Changed',
      'last, 10.6 µm on ZnSe',
      'unfinished',
    ];
    expect([...logEntries(file, 'oldest-first')].map(nameOf)).toEqual(expected);
    expect([...entries()].map(nameOf)).toEqual(expected.reverse());
    expect([...recordsOf(entries())].map(nameOf).length).toBe(4);
  });

  it('says where each line stands', () => {
    const bytes = fs.readFileSync(file);
    for (const entry of entries()) {
      if (entry.kind !== 'record') continue;
      const line = bytes.subarray(entry.offset, bytes.indexOf(10, entry.offset)).toString();
      expect(JSON.parse(line)).toEqual(entry.record);
    }
  });

  it('finds a record by its id or the beginning of it, in any case', () => {
    const { id } = FULL_RECORD;
    for (const typed of [id, id.slice(0, 6), id.toUpperCase(), ` ${id.slice(0, 8)} `]) {
      const found = findRecord(entries(), typed) as RecordEntry;
      expect(found.record.id).toBe(id);
    }
  });

  it('says that no id starts so, or that several do', () => {
    expect(findRecord(entries(), 'zzz')).toMatchObject({ code: 'record-not-found', exit: 2 });
    expect(findRecord(entries(), '')).toMatchObject({ code: 'record-not-found', exit: 2 });
    const two = [sampleRecord('a'), sampleRecord('b')].map((record) => ({
      ...record,
      id: `abc${record.id.slice(3)}`,
    }));
    const several = two.map((record): LogEntry => ({ kind: 'record', record, altered: false, offset: 0 }));
    const told = findRecord(several, 'abc');
    expect(told).toMatchObject({ code: 'record-ambiguous', exit: 2, candidates: two.map(({ id }) => id) });
    // The same record twice is one record.
    const twice = [several[0] as LogEntry, several[0] as LogEntry];
    expect(findRecord(twice, 'abc')).toBe(several[0]);
  });

  it('finds records by words in their text, whatever the case, the accents and the micro', () => {
    const search = (words: string): string[] => [...searchRecords(entries(), words)].map(nameOf);
    expect(search('brewster WINDOW')).toEqual(['first, Brewster window']);
    expect(search('10.6 um')).toEqual(['last, 10.6 µm on ZnSe']);
    expect(search('10.6 µm')).toEqual(['last, 10.6 µm on ZnSe']);
    expect(search('zizka mgf2')).toEqual(['Air (air)']);
    expect(search('laser-safety')).toEqual(['Air (air)']);
    expect(search('10.1364/josa.55.001205')).toEqual(['Air (air)']);
    expect(search('brewster ZnSe')).toEqual([]);
    expect(search('').length).toBe(4);
  });

  it('hands trouble with the file on', () => {
    const refusal = refuse('logbook-disk-failed', 4, 'gone', 'mount it');
    const broken: LogEntry[] = [{ kind: 'unreadable', refusal }];
    expect(findRecord(broken, 'abc')).toBe(refusal);
    expect([...searchRecords(broken, 'abc')]).toEqual([refusal]);
    expect([...recordsOf(broken)]).toEqual([refusal]);
  });
});
