/** `halfspace log`: records listed, shown, searched, exported, asked again. */
import { appendFileSync, writeFileSync } from 'node:fs';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { isRefusal } from '../../src/medium/refusal.ts';
import { keepRecord } from '../../src/record/logbook.ts';
import { placeAt } from '../../src/record/logbook-path.ts';
import { run } from '../cli/in-process.ts';
import { expectAscii, expectPage } from '../cli/page-shape.ts';
import { validDocument } from '../cli/schema.ts';
import { sampleRecord } from '../record/sample-record.ts';
import { TestLogbook } from './logbook.ts';

let log: TestLogbook;
beforeEach(() => {
  log = new TestLogbook();
});
afterEach(() => log.remove());

const QUESTIONS = [
  'air n=1.5 633nm',
  'air sapphire:o 1064nm --angle 45 --pol p',
  'air magnesium-fluoride-film@qw n-bk7 550nm',
];

async function keepAll(): Promise<void> {
  for (const question of QUESTIONS) await log.run(question.split(' '));
}

const LINE = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}:\d{2}[+-]\d{2}:\d{2} {2}[0-9a-f]{12} {2}R/;

describe('log list', () => {
  it('is one line a record, the newest first, and what `log` alone does', async () => {
    await keepAll();
    const { status, out, err } = await log.run(['log']);
    expect([status, err]).toEqual([0, '']);
    const lines = out.trimEnd().split('\n');
    expect(lines.length).toBe(QUESTIONS.length);
    for (const line of lines) expect(line).toMatch(LINE);
    expect(lines[0]).toContain('air → magnesium-fluoride-film 0.25 waves → n-bk7, 550nm, 0°, unpolarized');
    expect(lines[1]).toMatch(/R_p = 2\.\S+ % +air → sapphire:ordinary, 1064nm, 45°, p$/);
    expect((await log.run(['log', 'list'])).out).toBe(out);
  });

  it('has forms for programs', async () => {
    await keepAll();
    const plain = (await log.run(['log', '--plain'])).out.trimEnd().split('\n');
    expect(plain.map((line) => line.split('\t').length)).toEqual([5, 5, 5]);
    const document = validDocument('log', (await log.run(['log', '--json'])).out);
    const entries = document['entries'] as { id: string; R: number; command: string }[];
    const records = [...log.records()].reverse();
    expect(entries.map(({ id }) => id)).toEqual(records.map(({ id }) => id));
    expect(entries.map(({ R }) => R)).toEqual(
      records.map(({ answer }) => (answer['interface'] as unknown as { R: number }).R),
    );
    const csv = (await log.run(['log', '--csv'])).out.trimEnd().split('\n');
    expect(csv.length).toBe(1 + QUESTIONS.length);
    expectAscii((await log.run(['log', '--ascii'])).out);
    expectAscii((await log.run(['log', '--ascii', '--json'])).out);
  });

  it('says so where there is nothing yet', async () => {
    const { status, out, err } = await log.run(['log']);
    expect([status, out]).toEqual([0, '']);
    expect(err).toContain('there is no record in');
    expect((await log.run(['log', '-q'])).err).toBe('');
    expect(validDocument('log', (await log.run(['log', '--json'])).out)['entries']).toEqual([]);
  });

  it('passes over lines that are no records, says how many, and marks a record that was changed', async () => {
    await keepAll();
    const [first = '', ...others] = log.text().trimEnd().split('\n');
    const changed = first.replace('"version":"0.1.0"', '"version":"9.9.9"');
    expect(changed).not.toBe(first);
    writeFileSync(log.file, [changed, 'a remark of mine', ...others, '{"schema":1,"id":"cut o'].join('\n'));
    const { out, err } = await log.run(['log']);
    const lines = out.trimEnd().split('\n');
    expect(lines.length).toBe(QUESTIONS.length);
    expect(lines.at(-1)).toMatch(/\(changed after it was kept\)$/);
    expect(err).toContain('1 line of');
    expect(err).toMatch(/cut off while being written/);
    expect(err).toMatch(/not written by halfspace/);
    const shown = await log.run(['log', 'show', lines.at(-1)?.split('  ')[1] ?? '']);
    expect(shown.err).toContain('was changed after it was kept');
    // The next record stands on a line of its own.
    await log.run(['air', 'n=1.6', '633nm']);
    expect((await log.run(['log', '-q'])).out.trimEnd().split('\n').length).toBe(QUESTIONS.length + 1);
  });
});

describe('log search', () => {
  it('finds records that hold every word, in question, result, cautions or sources', async () => {
    await keepAll();
    const found = async (...words: string[]) => (await log.run(['log', 'search', ...words, '--json'])).out;
    const count = async (...words: string[]) => (JSON.parse(await found(...words)).entries as []).length;
    expect(await count('sapphire')).toBe(1);
    expect(await count('sapphire', '1064')).toBe(1);
    expect(await count('SAPPHIRE', '550nm')).toBe(0);
    expect(await count('air')).toBe(3);
    expect(await count('Ciddor 1996')).toBe(3);
    const none = await log.run(['log', 'search', 'unobtainium']);
    expect(none).toEqual({ status: 0, out: '', err: 'halfspace: no record holds all of these words\n' });
  });
});

describe('log show and log last', () => {
  it('show a record by the first digits of its id', async () => {
    await keepAll();
    const [record] = log.records();
    const { status, out, err } = await log.run(['log', 'show', record?.id.slice(0, 6).toUpperCase() ?? '']);
    expect([status, err]).toEqual([0, '']);
    expectPage(out);
    expect(out).toContain(`halfspace record ${record?.id}`);
    expect(out).toContain('halfspace air n=1.5 633nm\n');
    const last = await log.run(['log', 'last']);
    expect(last.out).toContain(`record ${log.last().id}`);
    for (const id of [log.last().id, 'last']) expect((await log.run(['log', 'show', id])).out).toBe(last.out);
    expect((await log.run(['log', 'export', 'last'])).out).toBe(last.out);
    expect((await log.run(['log', 'rerun', 'last'])).out).toContain(log.last().id);
  });

  it('in every form, every number to the last bit on request', async () => {
    await keepAll();
    const form = async (...words: string[]) => (await log.run(['log', 'last', ...words])).out;
    expect(await form('--markdown')).toMatch(/^## halfspace record [0-9a-f]{12}\n/);
    expect(await form('--latex')).toMatch(/^\\begin\{table\}/);
    expect((await form('--csv')).split('\n')[0]).toMatch(/^id,time,version,/);
    expect(JSON.parse(await form('--json'))).toEqual(log.last());
    const R = (log.last().answer['interface'] as unknown as { R: number }).R;
    expect(await form()).not.toContain(String(R));
    expect(await form('--full')).toContain(`interface.R = ${String(R)}\n`);
    for (const words of [['--ascii'], ['--ascii', '--csv'], ['--ascii', '--latex'], ['--ascii', '--json']])
      expectAscii(await form(...words));
    expectPage(await form('--ascii'));
  });

  it('names each source with its link once', async () => {
    await keepAll();
    const { out } = await log.run(['log', 'last']);
    const links = out.match(/https:\/\/doi\.org\/\S+/g) ?? [];
    expect(links.length).toBeGreaterThan(1);
    expect(new Set(links).size).toBe(links.length);
  });

  it('refuse an id that is not there, or fits several', async () => {
    for (let i = 0; i < 20; i++) await log.run(['air', `n=1.${10 + i}`, '633nm']);
    const missing = await log.run(['log', 'show', 'xyz']);
    expect([missing.status, missing.out]).toEqual([2, '']);
    const first = log.records().map(({ id }) => id[0] ?? '');
    const twice = first.find((digit, i) => first.indexOf(digit) !== i) ?? '';
    const several = await log.run(['log', 'show', twice]);
    expect(several.status).toBe(2);
    expect(several.err).toContain(`records have an id that starts with "${twice}"`);
    const empty = new TestLogbook();
    expect((await empty.run(['log', 'last'])).status).toBe(2);
    empty.remove();
  });
});

describe('log export', () => {
  it('writes all records, the oldest first, or those named', async () => {
    await keepAll();
    const ids = log.records().map(({ id }) => id);
    const document = validDocument('log', (await log.run(['log', 'export', '--json'])).out);
    expect(document['records']).toEqual(log.records());
    const csv = (await log.run(['log', 'export', '--csv'])).out.trimEnd().split('\n');
    expect(csv.slice(1).map((line) => line.split(',')[0])).toEqual(ids);
    const two = (await log.run(['log', 'export', ids[2] ?? '', ids[0] ?? ''])).out;
    expect([...two.matchAll(/^halfspace record (\w+)/gm)].map(([, id]) => id)).toEqual([ids[2], ids[0]]);
    expectPage(two);
    const markdown = (await log.run(['log', 'export', '--markdown'])).out;
    expect(markdown.match(/^## /gm)?.length).toBe(QUESTIONS.length);
    const latex = (await log.run(['log', 'export', '--latex'])).out;
    expect(latex.match(/^\\end\{table\}/gm)?.length).toBe(QUESTIONS.length);
  });
});

describe('--log-file', () => {
  it('is a file: - is refused, and no file of that name is made', async () => {
    const { status, err } = await run(['air', 'n=1.5', '633nm', '--log-file', '-']);
    expect([status, err]).toEqual([2, expect.stringContaining('- is standard output')]);
  });
});

describe('log rerun', () => {
  it('finds the same answer to the last bit, with the status 0', async () => {
    await keepAll();
    const { status, out } = await log.run(['log', 'rerun', 'all']);
    expect(status).toBe(0);
    expect(out.match(/the answer is the same, to the last bit/g)?.length).toBe(QUESTIONS.length);
    expect(out).toMatch(/^3 records: 3 the same\n$/m);
    const { id } = log.last();
    const one = await log.run(['log', 'rerun', id.slice(0, 8)]);
    expect(one.out).toMatch(new RegExp(`^${id} {2}air → .*\n {2}the answer is the same, to the last bit\n$`));
  });

  it('says what differs and why: the catalogue, the version, or nothing that explains it', async () => {
    await log.run(['air', 'n-bk7', '587.6nm']);
    const { answer } = log.last();
    const moved = structuredClone(answer) as unknown as { into: { n: number }; interface: { R: number } };
    moved.into.n -= 1e-3;
    moved.interface.R *= 0.99;
    const byCatalogue = log.keepAs({
      answer: moved,
      catalogue: { hash: 'ffffffffffff', date: '2020-01-01' },
    });
    const byVersion = log.keepAs({ answer: moved, version: '0.0.1' });
    const byNothing = log.keepAs({ answer: moved });
    const rerun = async (id: string) => (await log.run(['log', 'rerun', id])).out;
    expect(await rerun(byCatalogue.id)).toMatch(/into\.n: 1\.5\d+ then, 1\.5\d+ now \(\+0\.00\d+ relative\)/);
    expect(await rerun(byCatalogue.id)).toContain('cause: catalogue ffffffffffff of 2020-01-01 then,');
    expect(await rerun(byVersion.id)).toContain('cause: version 0.0.1 then, 0.1.0 now');
    expect(await rerun(byNothing.id)).toContain('one of the two answers is wrong');
    const all = await log.run(['log', 'rerun', 'all', '--json']);
    expect(all.status).toBe(1);
    const records = validDocument('log', all.out)['records'] as {
      outcome: string;
      causes: { code: string }[];
    }[];
    expect(records.map(({ outcome, causes }) => [outcome, ...causes.map(({ code }) => code)])).toEqual([
      ['same'],
      ['differs', 'catalogue'],
      ['differs', 'version'],
      ['differs', 'unexplained'],
    ]);
    expect((await log.run(['log', 'rerun', 'all'])).out).toMatch(/^4 records: 1 the same, 3 differ$/m);
  });

  it('lists the first differences, and all on request', async () => {
    await log.run(['air', 'n-bk7', '587.6nm']);
    const { answer } = log.last();
    const moved = JSON.parse(JSON.stringify(answer), (_, value: unknown) =>
      typeof value === 'number' ? value + 1 : value,
    ) as object;
    const { id } = log.keepAs({ answer: moved, version: '0.0.1' });
    const short = (await log.run(['log', 'rerun', id])).out;
    expect(short).toMatch(/and \d+ more values; --full lists all/);
    const full = (await log.run(['log', 'rerun', id, '--full'])).out;
    expect(full.split('\n').length).toBeGreaterThan(short.split('\n').length + 20);
  });

  it('tells where a record has no answer any more, or asks nothing', async () => {
    await log.run(['air', 'n=1.5', '633nm']);
    const gone = log.keepAs({ commandWords: ['halfspace', 'air', 'unobtainium', '633nm'] });
    const { status, out } = await log.run(['log', 'rerun', gone.id]);
    expect(status).toBe(2);
    expect(out).toContain('no answer now: there is no medium "unobtainium"');
    const newer = sampleRecord('from a later version', { commandWords: ['halfspace', 'air', '--new-thing'] });
    if (isRefusal(keepRecord(placeAt(log.file), newer))) throw new Error('not kept');
    expect((await log.run(['log', 'rerun', newer.id])).out).toContain('is not understood by this version');
    const all = await log.run(['log', 'rerun', 'all']);
    expect(all.status).toBe(1);
    expect(all.out).toMatch(/^3 records: 1 the same, 2 without an answer now$/m);
  });
});

describe('log', () => {
  it('names the nearest action, and the right form of an id alone', async () => {
    expect((await log.run(['log', 'shwo'])).err).toContain('did you mean log show?');
    expect((await log.run(['log', '3f09ab'])).err).toContain('write log show 3f09ab');
    for (const words of [['show'], ['search'], ['rerun'], ['last', 'x'], ['list', 'x'], ['show', 'a', 'b']])
      expect((await log.run(['log', ...words])).status, words.join(' ')).toBe(2);
  });

  it('refuses forms that an action has not', async () => {
    const { status, err } = await log.run(['log', 'list', '--latex']);
    expect(status).toBe(2);
    expect(err).toContain('log list takes no --latex; its forms are text and --json, --csv, --plain');
  });

  it('reports a logbook that cannot be read, with status 4', async () => {
    const { status, out, err } = await run(['log', '--log-file', log.folder]);
    expect([status, out]).toEqual([4, '']);
    expect(err).toContain('is a folder');
  });

  it('never lets control characters of the file reach the terminal', async () => {
    const text = 'x\u001b[31mred\u009b2J\u202e';
    const record = sampleRecord(text, {
      commandWords: ['halfspace', `air${text}`],
      rows: [{ about: 'Interface', symbol: 'R', label: text, text }],
      sources: [],
    } as never);
    if (isRefusal(keepRecord(placeAt(log.file), record))) throw new Error('not kept');
    appendFileSync(log.file, `${text}\n`);
    for (const words of [
      ['list'],
      ['list', '--plain'],
      ['last'],
      ['export', '--markdown'],
      ['rerun', 'all'],
    ]) {
      const { out, err } = await log.run(['log', ...words]);
      expect(out + err, words.join(' ')).not.toMatch(/[\x00-\x08\x0b-\x1f\x7f-\x9f\u202e]/);
    }
  });
});
