/** `halfspace stream` as users run it: rows in, the same rows out with their answers behind them, and what goes wrong on the way. */
import { once } from 'node:events';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { halfspace, inShell, PROGRAM, startHalfspace } from '../cli/program.ts';
import { PtySession } from '../helpers/pty.ts';

const PATIENT = { timeout: 120_000 };

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'halfspace-stream-'));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));
const at = (name: string): string => path.join(folder, name);

/** Rows that differ from each other, and whose answers can be told apart. */
const angles = (count: number, from = 0): string[] =>
  Array.from({ length: count }, (_, i) => ((from + i) * 1e-4).toFixed(4));
const HEAD = 'angle_deg,R,error';
const FIXED = ['--from', 'air', '--into', 'n-bk7', '--wave', '633nm', '--columns', 'R'];

describe('rows of CSV', PATIENT, () => {
  const questions = [
    'from,into,wave_nm,angle_deg,pol,note',
    'air,n-bk7,633,45,s,first',
    'air,nonsuch,633,45,s,no such medium',
    'air,n-bk7,50,0,,no data there',
    'n-bk7,air,589.3,50,p,"with a comma, and ""quotes"""',
    'air,n-bk7,abc,0,,no number',
    'air,n-bk7,633,95,,no such angle',
    'air,n-bk7,633',
    'air,water,1064,0,,last',
  ];

  it('keep their order and their cells; a bad one says why in its place, the others go on, status 1', () => {
    const input = `${questions.join('\n')}\n`;
    const { status, out, err } = halfspace(['stream', '--columns', 'R,n2'], { input });
    const lines = out.split('\n');
    expect(lines.pop()).toBe('');
    expect(lines[0]).toBe(`${questions[0]},R,n2,error`);
    // Each row comes back as it was given, the short one filled up.
    for (const [i, row] of questions.entries()) if (i > 0) expect(lines[i]?.startsWith(row)).toBe(true);
    const errors = lines.map((line) => /"(line \d+: .*)"$/.exec(line)?.[1]?.replaceAll('""', '"') ?? '');
    expect(errors.map((text) => text !== '')).toEqual([
      false,
      false,
      true,
      true,
      false,
      true,
      true,
      true,
      false,
    ]);
    expect(errors[2]).toMatch(/^line 3: there is no medium "nonsuch".*; .+/);
    expect(errors[3]).toMatch(/^line 4: .*no data at 50 nm.*; .+/);
    expect(errors[5]).toMatch(/^line 6: wave: "abc" is not a number; .+/);
    expect(errors[6]).toMatch(/^line 7: angle.*95/);
    expect(status).toBe(1);
    expect(err).toContain('halfspace: 5 of 8 rows not answered; the column error says why\n');
    expect(err).toContain('columns passed on unread: note');
    // Bad rows have no answers at all.
    expect(lines[2]?.startsWith(`${questions[2]},,,"`)).toBe(true);
  });

  it('have the numbers of the one question, to the last bit', () => {
    const { out } = halfspace(['stream', '--columns', 'R,n2'], {
      input: `${[questions[0], questions[1], questions[4], questions[8]].join('\n')}\n`,
    });
    const asked = [
      ['air', 'n-bk7', '633nm', '--angle', '45', '--pol', 's'],
      ['n-bk7', 'air', '589.3nm', '--angle', '50', '--pol', 'p'],
      ['air', 'water', '1064nm'],
    ];
    const rows = out.split('\n').slice(1, -1);
    for (const [i, words] of asked.entries()) {
      const { interface: surface, into } = JSON.parse(halfspace([...words, '--json']).out);
      expect(rows[i]?.endsWith(`,${surface.R},${into.n},`), rows[i]).toBe(true);
    }
  });

  it('come from several files in their order, and go into one', () => {
    writeFileSync(at('1.csv'), `angle_deg\n${angles(3000).join('\n')}\n`);
    writeFileSync(at('2.csv'), `angle_deg\n${angles(3000, 3000).join('\n')}`);
    const run = halfspace(['stream', at('1.csv'), at('2.csv'), ...FIXED, '-o', at('out.csv')]);
    expect([run.status, run.out, run.err]).toEqual([0, '', '']);
    const lines = readFileSync(at('out.csv'), 'utf8').trimEnd().split('\n');
    expect(lines[0]).toBe(HEAD);
    expect(lines.slice(1).map((line) => line.split(',')[0])).toEqual(angles(6000));
  });

  it('that cannot be read at all are refused as a whole, with nothing written', () => {
    const cases: readonly [string, string[], string][] = [
      ['', [], 'the input is empty'],
      ['foo,bar\n1,2\n', [], 'nothing says what the wave is'],
      ['angle_deg\n1\n', ['--from', 'nonsuch', '--into', 'air', '--wave', '1um'], 'nonsuch'],
      ['wave_nm,wave_nm\n1,2\n', ['--from', 'air', '--into', 'water'], 'wave_nm'],
    ];
    for (const [input, words, part] of cases) {
      const { status, out, err } = halfspace(['stream', ...words], { input });
      expect([status, out], err).toEqual([2, '']);
      expect(err).toContain(part);
    }
    const missing = halfspace(['stream', at('none.csv')]);
    expect([missing.status, missing.out]).toEqual([4, '']);
    expect(missing.err).toContain('none.csv cannot be read (ENOENT)');
    const same = halfspace(['stream', at('1.csv'), ...FIXED, '-o', at('1.csv')]);
    expect(same.status).toBe(4);
    expect(readFileSync(at('1.csv'), 'utf8').length).toBeGreaterThan(1000);
  });
});

describe('rows of JSON', PATIENT, () => {
  it('are an object a line, in and out, with what they had before', () => {
    const rows = [
      { from: 'air', into: 'n-bk7', wave: '633nm', angle: '45', pol: 's', id: 7, tags: ['a'] },
      { from: 'air', into: 'nonsuch', wave: '633nm' },
      { path: 'air > magnesium-fluoride-film@qw > n-bk7', wave: '550nm' },
    ];
    const input = `${rows.map((row) => JSON.stringify(row)).join('\n')}\nno object\n`;
    const { status, out, err } = halfspace(['stream', '--json', '--columns', 'R,T'], { input });
    const answers = out
      .trimEnd()
      .split('\n')
      .map((line) => JSON.parse(line));
    expect(answers).toHaveLength(4);
    for (const [i, row] of rows.entries()) expect(answers[i]).toMatchObject(row);
    const [first, second, third, fourth] = answers;
    const one = halfspace(['air', 'n-bk7', '633nm', '--angle', '45', '--pol', 's', '--json']);
    expect(first).toMatchObject({ R: JSON.parse(one.out).interface.R, error: null });
    expect(second).toMatchObject({ R: null, T: null, error: { line: 2, code: 'unknown-medium' } });
    expect(third.R + third.T).toBeCloseTo(1, 12);
    expect(fourth).toMatchObject({ R: null, error: { line: 4, code: 'not-json' } });
    expect(status).toBe(1);
    expect(err).toContain('2 of 4 rows not answered');
  });
});

describe('a long stream', PATIENT, () => {
  /** Bytes of the resident memory of a process. */
  const memory = (pid: number): number =>
    Number(/VmHWM:\s*(\d+) kB/.exec(readFileSync(`/proc/${pid}/status`, 'utf8'))?.[1]) * 1024;

  it.skipIf(process.platform !== 'linux')(
    'takes no more memory for five times the rows, and loses none',
    async () => {
      const peakOf = async (blocks: number): Promise<number> => {
        const child = startHalfspace(['stream', ...FIXED]);
        let rows = -1;
        child.stdout.on('data', (data: Buffer) => {
          for (const byte of data) if (byte === 10) rows += 1;
        });
        const block = `${angles(20_000).join('\n')}\n`;
        child.stdin.write('angle_deg\n');
        for (let i = 0; i < blocks; i++) if (!child.stdin.write(block)) await once(child.stdin, 'drain');
        while (rows < blocks * 20_000) await sleep(10);
        const peak = memory(child.pid as number);
        child.stdin.end();
        expect((await once(child, 'close'))[0]).toBe(0);
        return peak;
      };
      const [short, long] = [await peakOf(3), await peakOf(15)];
      expect(long - short).toBeLessThan(16_000_000);
    },
  );

  it('waits for a reader that does not read, and then gives every row', async () => {
    const child = startHalfspace(['stream', ...FIXED]);
    const block = `${angles(100_000).join('\n')}\n`;
    child.stdin.write('angle_deg\n');
    let given = 0;
    let blocked = false;
    while (!blocked && given < 40) {
      given += 1;
      if (child.stdin.write(block)) continue;
      blocked = await Promise.race([once(child.stdin, 'drain').then(() => false), sleep(1500, true)]);
    }
    // The pipes and one chunk in the program hold far less than this.
    expect(given).toBeLessThan(10);
    child.stdin.end();
    let text = '';
    for await (const chunk of child.stdout) text += chunk;
    const lines = text.trimEnd().split('\n');
    expect(lines).toHaveLength(given * 100_000 + 1);
    expect(lines.slice(1, 100_001).map((line) => line.split(',')[0])).toEqual(angles(100_000));
  });

  it('ends silently where its reader goes away', () => {
    const endless = `(echo angle_deg; yes 45) | "$@" stream ${FIXED.join(' ')}`;
    const { out, err } = inShell(`${endless} | head -3; echo "\${PIPESTATUS[@]}"`);
    expect(err).toBe('');
    const lines = out.trimEnd().split('\n');
    expect(lines.slice(0, 2)).toEqual([HEAD, expect.stringMatching(/^45,0\.0\d+,$/)]);
    expect(lines.at(-1)).toMatch(/^141 (0|141) 0$|^\d+ (0|141) 0$/);
  });

  it.each(['SIGINT', 'SIGTERM'] as const)(
    'ends by %s after a whole row, with that signal',
    async (signal) => {
      const child = startHalfspace(['stream', ...FIXED]);
      let out = '';
      child.stdout.on('data', (data) => {
        out += data;
      });
      let err = '';
      child.stderr.on('data', (data) => {
        err += data;
      });
      child.stdin.on('error', () => undefined);
      child.stdin.write(`angle_deg\n${angles(500).join('\n')}\n`);
      while (out.split('\n').length < 400) await sleep(10);
      child.kill(signal);
      const [status, by] = await once(child, 'close');
      expect([status, by, err]).toEqual([null, signal, '']);
      expect(out.endsWith(',\n')).toBe(true);
      expect(
        out
          .split('\n')
          .slice(1, -1)
          .map((line) => line.split(',')[0]),
      ).toEqual(angles(500));
    },
  );

  it('answers a row as soon as it has come', async () => {
    const child = startHalfspace(['stream', ...FIXED]);
    child.stdout.setEncoding('utf8');
    child.stdin.write('angle_deg\n');
    let out = '';
    child.stdout.on('data', (data) => {
      out += data;
    });
    for (const angle of ['10', '20', '30']) {
      child.stdin.write(`${angle}\n`);
      while (!out.includes(`\n${angle},0.`)) await sleep(5);
    }
    child.stdin.end();
    expect((await once(child, 'close'))[0]).toBe(0);
  });
});

describe('progress', PATIENT, () => {
  it('is shown on a terminal that shows nothing else, and taken away at the end', async () => {
    writeFileSync(
      at('many.csv'),
      `angle_deg,thickness_note\n${angles(1500)
        .map((a) => `${a},"x"`)
        .join('\n')}\n`,
    );
    const words = ['stream', at('many.csv'), '--from', 'air', '--into', 'n-bk7', '--wave', '633nm'];
    const more = ['--columns', 'R,brewster_deg,ng2', '--tolerance', 'wave=1nm'];
    const line = `"$0" "$@" > ${at('many.out')}`;
    const session = new PtySession('sh', ['-c', line, process.execPath, ...PROGRAM, ...words, ...more]);
    expect(await session.exited).toBe(0);
    await session.quiet();
    expect(session.output()).toMatch(/\r\d+ rows, \d+ per second/);
    expect(session.screen().trim()).toBe('halfspace: columns passed on unread: thickness_note');
    expect(readFileSync(at('many.out'), 'utf8').split('\n')).toHaveLength(1502);
  });
});
