/** Appending and reading under failures made on purpose: cut-off lines, full disks, closed doors, files swapped underneath. */
import * as fs from 'node:fs';
import path from 'node:path';
import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { isRefusal, type Refusal } from '../../src/medium/refusal.ts';
import { keepRecord, type LogEntry, logEntries } from '../../src/record/logbook.ts';
import { appendToLogbook, type Confirmed, type Files, logbookLines } from '../../src/record/logbook-file.ts';
import { placeAt } from '../../src/record/logbook-path.ts';
import { recordLine } from '../../src/record/record-line.ts';
import { sampleRecord } from './sample-record.ts';
import { bundleWriter, runUntilEnd, testFolder } from './writer.ts';

let folder: string;
let fileCount = 0;
beforeAll(() => {
  folder = testFolder();
});
afterAll(() => {
  fs.rmSync(folder, { recursive: true, force: true });
});
const freshFile = (): string => path.join(folder, `logbook-${fileCount++}.jsonl`);

function keep(file: string, note: string, files?: Files): Confirmed {
  const outcome = keepRecord({ file, base: folder }, sampleRecord(note), files);
  if (isRefusal(outcome)) throw new Error(outcome.message);
  return outcome;
}

function refusal(file: string, files?: Files): Refusal {
  const outcome = keepRecord({ file, base: folder }, sampleRecord('refused'), files);
  if (!isRefusal(outcome)) throw new Error('the record was confirmed');
  return outcome;
}

const noteOf = (entry: LogEntry): string =>
  entry.kind === 'record' ? String(entry.record.question['note']) : entry.kind;
const notes = (file: string): string[] => [...logEntries(file, 'oldest-first')].map(noteOf);

/** A disk on which one call goes wrong in some way; the rest is the real one. */
const disk = (more: Partial<Files>): Files => ({ ...fs, ...more });
const failing = (code: string) => (): never => {
  throw Object.assign(new Error(`${code}: told to fail`), { code });
};

describe('appending', () => {
  it('makes the folders above the file, closed to others, and puts one line per record into it', () => {
    const file = path.join(folder, 'a', 'b', 'c', 'logbook.jsonl');
    const first = keep(file, 'one');
    const second = keep(file, 'two');
    expect(first).toEqual({ confirmed: true, path: file, offset: 0, afterUnfinishedLine: false });
    expect(fs.readFileSync(file, 'utf8')).toBe(
      `${recordLine(sampleRecord('one'))}\n${recordLine(sampleRecord('two'))}\n`,
    );
    expect(second.offset).toBe(recordLine(sampleRecord('one')).length + 1);
    expect(fs.statSync(path.join(folder, 'a')).mode & 0o777).toBe(0o700);
  });

  it('makes no folder at or above the base, so that a disk not mounted does not go unnoticed', () => {
    const unmounted = path.join(folder, 'mounts', 'lab');
    const file = path.join(unmounted, 'notes', 'logbook.jsonl');
    for (const place of [placeAt(file), { file, base: unmounted }]) {
      const told = keepRecord(place, sampleRecord('x'));
      expect(told).toMatchObject({ code: 'logbook-path', exit: 4 });
    }
    expect(fs.existsSync(path.join(folder, 'mounts'))).toBe(false);
    expect(keepRecord({ file, base: '/' }, sampleRecord('x'))).toMatchObject({ confirmed: true });
  });

  it('writes once, then syncs the file and its folder, then reads back, and only then confirms', () => {
    const calls: string[] = [];
    const opened = new Map<number, string>();
    const file = freshFile();
    const watched = disk({
      openSync: (name, flags, mode) => {
        const handle = fs.openSync(name, flags, mode);
        opened.set(handle, path.basename(String(name)));
        return handle;
      },
      writeSync: ((handle: number, data: Uint8Array) => {
        calls.push('write');
        return fs.writeSync(handle, data);
      }) as Files['writeSync'],
      fsyncSync: (handle) => {
        calls.push(`sync ${opened.get(handle)}`);
        fs.fsyncSync(handle);
      },
    });
    keep(file, 'one', watched);
    expect(calls).toEqual(['write', `sync ${path.basename(file)}`, `sync ${path.basename(folder)}`]);
  });

  it('keeps a line that was cut off and goes on below it', () => {
    const file = freshFile();
    keep(file, 'one');
    const half = recordLine(sampleRecord('two')).slice(0, 100);
    fs.appendFileSync(file, half);
    expect(notes(file)).toEqual(['one', 'unfinished']);
    expect(keep(file, 'three').afterUnfinishedLine).toBe(true);
    expect(keep(file, 'four').afterUnfinishedLine).toBe(false);
    expect(notes(file)).toEqual(['one', 'unfinished', 'three', 'four']);
    expect(fs.readFileSync(file, 'utf8')).toContain(`\n${half}\n`);
  });

  it('finds every other record again wherever a line was cut', () => {
    const whole = recordLine(sampleRecord('cut'));
    fc.assert(
      fc.property(fc.integer({ min: 0, max: whole.length - 1 }), (length) => {
        const file = freshFile();
        keep(file, 'before');
        fs.appendFileSync(file, whole.slice(0, length));
        const confirmed = keep(file, 'after');
        expect(confirmed.afterUnfinishedLine).toBe(length > 0);
        const found = notes(file);
        expect(found.filter((note) => note !== 'unfinished')).toEqual(['before', 'after']);
        expect(found.length).toBe(length > 0 ? 3 : 2);
        fs.rmSync(file);
      }),
      { numRuns: 60 },
    );
  });

  it('writes the record again where another program is cut off between the look and the write', () => {
    const file = freshFile();
    keep(file, 'one');
    const half = recordLine(sampleRecord('other')).slice(0, 200);
    let raced = false;
    const racing = disk({
      writeSync: ((handle: number, data: Uint8Array) => {
        if (!raced) fs.appendFileSync(file, half);
        raced = true;
        return fs.writeSync(handle, data);
      }) as Files['writeSync'],
    });
    const confirmed = keep(file, 'two', racing);
    expect(confirmed.afterUnfinishedLine).toBe(true);
    expect(notes(file)).toEqual(['one', 'unfinished', 'two']);
  });

  it('adds no half line where another program is in the middle of a write', () => {
    const file = freshFile();
    keep(file, 'one');
    const other = `${recordLine(sampleRecord('other'))}\n`;
    fs.appendFileSync(file, other.slice(0, 50));
    let raced = false;
    const racing = disk({
      writeSync: ((handle: number, data: Uint8Array) => {
        if (!raced) fs.appendFileSync(file, other.slice(50));
        raced = true;
        return fs.writeSync(handle, data);
      }) as Files['writeSync'],
    });
    expect(keep(file, 'two', racing).afterUnfinishedLine).toBe(false);
    expect(notes(file)).toEqual(['one', 'other', 'two']);
  });

  it('confirms only what stands in the file that has the name in the end', () => {
    const file = freshFile();
    keep(file, 'one');
    let swapped = false;
    const swapping = disk({
      fsyncSync: (handle) => {
        fs.fsyncSync(handle);
        if (!swapped) fs.renameSync(file, `${file}.moved`);
        swapped = true;
      },
      realpathSync: ((name: string) =>
        fs.existsSync(name) ? fs.realpathSync(name) : name) as Files['realpathSync'],
    });
    // The name is gone at the moment of reading back: no confirmation.
    expect(refusal(file, swapping).exit).toBe(4);
    // A new file has the name by then: the record goes there.
    swapped = false;
    keep(file, 'fresh start');
    const replacing = disk({
      fsyncSync: (handle) => {
        fs.fsyncSync(handle);
        if (!swapped) {
          fs.renameSync(file, `${file}.moved`);
          fs.writeFileSync(file, '');
        }
        swapped = true;
      },
    });
    keep(file, 'two', replacing);
    expect(notes(file)).toEqual(['two']);
  });

  it('gives up with a refusal where something truncates the file again and again', () => {
    const file = freshFile();
    const truncating = disk({
      fsyncSync: (handle) => {
        fs.fsyncSync(handle);
        fs.truncateSync(file, 0);
      },
    });
    const { code, exit, message } = refusal(file, truncating);
    expect([code, exit]).toEqual(['logbook-unconfirmed', 4]);
    expect(message).toContain(file);
  });

  it('takes no text that is not one line', () => {
    expect(() => appendToLogbook(placeAt(freshFile()), 'a\nb')).toThrow(RangeError);
    expect(() => appendToLogbook(placeAt(freshFile()), '')).toThrow(RangeError);
  });
});

describe('a disk that refuses', () => {
  it('never confirms a short write, and leaves the rest of the file as it was', () => {
    const file = freshFile();
    keep(file, 'one');
    const full = disk({
      writeSync: ((handle: number, data: Uint8Array) =>
        fs.writeSync(handle, data.subarray(0, 40))) as Files['writeSync'],
    });
    const { code, exit, message, remedy } = refusal(file, full);
    expect([code, exit]).toEqual(['logbook-disk-full', 4]);
    expect(message).toContain(file);
    expect(message).toContain('40 of ');
    expect(remedy).toContain('space');
    keep(file, 'two');
    expect(notes(file)).toEqual(['one', 'unfinished', 'two']);
  });

  const cases: readonly [keyof Files, string, string][] = [
    ['writeSync', 'ENOSPC', 'logbook-disk-full'],
    ['writeSync', 'EDQUOT', 'logbook-disk-full'],
    ['fsyncSync', 'EIO', 'logbook-disk-failed'],
    ['fsyncSync', 'ENOSPC', 'logbook-disk-full'],
    ['openSync', 'EROFS', 'logbook-read-only'],
    ['openSync', 'EACCES', 'logbook-permission'],
    ['openSync', 'ESTALE', 'logbook-disk-failed'],
    ['openSync', 'EMFILE', 'logbook-busy'],
    ['writeSync', 'ENOTCONN', 'logbook-disk-failed'],
    ['readSync', 'EIO', 'logbook-disk-failed'],
    ['fstatSync', 'EWHATEVER', 'logbook-failed'],
  ];
  it.each(cases)('%s failing with %s is %s, with the path and what to do', (call, errno, code) => {
    const file = freshFile();
    keep(file, 'one');
    const told = refusal(file, disk({ [call]: failing(errno) }));
    expect(told).toMatchObject({ refused: true, code, exit: 4 });
    expect(told.message).toContain(file);
    expect(told.remedy).not.toBe('');
    expect(told.message + told.remedy).not.toMatch(/\bat .*:\d+|Error/);
  });

  it('does not hide an error of its own making', () => {
    const broken = disk({
      fstatSync: (() => {
        throw new TypeError('not a file matter');
      }) as unknown as Files['fstatSync'],
    });
    expect(() => keepRecord(placeAt(freshFile()), sampleRecord('x'), broken)).toThrow(TypeError);
  });

  it('refuses a path below a file, a folder, a pipe, a name too long and a name with a NUL', () => {
    const file = freshFile();
    keep(file, 'one');
    expect(refusal(path.join(file, 'logbook.jsonl')).code).toBe('logbook-path');
    expect(refusal(path.join(file, 'deeper', 'logbook.jsonl')).code).toBe('logbook-path');
    expect(refusal(folder)).toMatchObject({ code: 'logbook-path', message: `${folder} is a folder` });
    expect(refusal(path.join(folder, 'x'.repeat(300))).code).toBe('logbook-path');
    expect(refusal(path.join(folder, 'a\0b')).code).toBe('logbook-path');
    expect(notes(file)).toEqual(['one']);
  });

  it.skipIf(!fs.existsSync('/dev/full'))(
    'reports a full device as full and keeps nothing on the null device',
    () => {
      expect(refusal('/dev/full')).toMatchObject({ code: 'logbook-disk-full', exit: 4 });
      expect(refusal('/dev/null')).toMatchObject({ code: 'logbook-path', exit: 4 });
    },
  );
});

describe('limits of the system', () => {
  let writer: string;
  beforeAll(async () => {
    writer = await bundleWriter(folder);
  });

  it('confirms nothing that a limit on the size of files cut off', async () => {
    const file = freshFile();
    // Blocks of 512 bytes: the limit falls into the middle of a record.
    const limited = `ulimit -f 10 && exec "$0" "$@"`;
    const run = await runUntilEnd('sh', ['-c', limited, process.execPath, writer, file, 'limited', '1000']);
    const told = run.lines.at(-1) ?? '';
    expect(told).toMatch(/^refused 4 logbook-disk-full: /);
    expect(run.errors).toBe('');
    const confirmed = run.lines.slice(0, -1);
    expect(confirmed.length).toBeGreaterThan(1);
    expect(fs.statSync(file).size).toBe(5120);
    const entries = [...logEntries(file, 'oldest-first')];
    expect(entries.flatMap((entry) => (entry.kind === 'record' ? [entry.record.id] : []))).toEqual(confirmed);
    expect(entries.at(-1)?.kind).toBe('unfinished');
    keep(file, 'after the limit');
    expect(notes(file).slice(-2)).toEqual(['unfinished', 'after the limit']);
  });

  it('says so where the folder may not be written or read by the person', async () => {
    const closed = path.join(folder, 'closed');
    fs.mkdirSync(closed, { mode: 0o555 });
    const locked = path.join(folder, 'locked');
    fs.mkdirSync(locked, { mode: 0o000 });
    // The administrator passes every door, so the writer then runs as somebody else.
    const somebody = process.getuid?.() === 0 ? { uid: 65_534 } : {};
    for (const place of [closed, locked]) {
      const file = path.join(place, 'logbook.jsonl');
      const run = await runUntilEnd(process.execPath, [writer, file, 'shut out', '1'], somebody);
      expect(run.errors).toBe('');
      expect(run.lines.length).toBe(1);
      expect(run.lines[0]).toMatch(/^refused 4 logbook-permission: /);
      expect(run.lines[0]).toContain(file);
    }
    fs.chmodSync(locked, 0o700);
  });
});

describe('reading', () => {
  it('finds nothing where there is no logbook yet', () => {
    expect([...logbookLines(freshFile(), 'oldest-first')]).toEqual([]);
    expect([...logbookLines(path.join(folder, 'nowhere', 'x'), 'newest-first')]).toEqual([]);
  });

  it('gives trouble as the last entry, not as an exception', () => {
    const file = freshFile();
    for (let i = 0; i < 200; i++) fs.appendFileSync(file, `${'foreign '.repeat(100)}\n`);
    let calls = 0;
    const breaking = disk({
      readSync: ((handle: number, buffer: Uint8Array, offset: number, length: number, position: number) => {
        if (calls++ === 1) failing('EIO')();
        return fs.readSync(handle, buffer, offset, length, position);
      }) as Files['readSync'],
    });
    const kinds = [...logEntries(file, 'oldest-first', breaking)].map((entry) => entry.kind);
    expect(kinds.length).toBeGreaterThan(10);
    expect(kinds.at(-1)).toBe('unreadable');
    expect(kinds.indexOf('unreadable')).toBe(kinds.length - 1);
    expect([...logEntries(folder, 'oldest-first')]).toMatchObject([
      { kind: 'unreadable', refusal: { code: 'logbook-path', exit: 4 } },
    ]);
  });

  it('closes the file where the reader stops early', () => {
    const file = freshFile();
    keep(file, 'one');
    keep(file, 'two');
    let open = 0;
    const counting = disk({
      openSync: (name, flags, mode) => {
        open += 1;
        return fs.openSync(name, flags, mode);
      },
      closeSync: (handle) => {
        open -= 1;
        fs.closeSync(handle);
      },
    });
    for (const entry of logEntries(file, 'newest-first', counting)) {
      expect(noteOf(entry)).toBe('two');
      break;
    }
    expect(open).toBe(0);
  });
});
