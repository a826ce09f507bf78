/** `--sweep` through the program: a table without a file, over one quantity or two, in every form. */
import { once } from 'node:events';
import { setTimeout as sleep } from 'node:timers/promises';
import { describe, expect, it } from 'vitest';
import { halfspace, inShell, startHalfspace } from '../cli/program.ts';

const PATIENT = { timeout: 120_000 };

const rowsOf = (csv: string): string[][] =>
  csv
    .trimEnd()
    .split('\n')
    .slice(1)
    .map((line) => line.split(','));

describe('a sweep', PATIENT, () => {
  it('over the angle has both ends, even steps, and the numbers of the one question', () => {
    const words = ['air', 'n-bk7', '633nm', '--pol', 'p'];
    const { status, out, err } = halfspace([...words, '--sweep', 'angle=0..89:1', '--columns', 'R,T']);
    expect([status, err]).toEqual([0, '']);
    expect(out.split('\n')[0]).toBe('angle_deg,R,T,error');
    const rows = rowsOf(out);
    expect(rows.map(([angle]) => angle)).toEqual(Array.from({ length: 90 }, (_, i) => String(i)));
    for (const i of [0, 45, 89]) {
      const { interface: surface } = JSON.parse(halfspace([...words, '--angle', String(i), '--json']).out);
      expect(rows[i]).toEqual([String(i), String(surface.R), String(surface.T), '']);
    }
  });

  it('over two quantities is a grid, the later one running faster', () => {
    const sweeps = ['--sweep', 'wave=400nm..700nm:5nm', '--sweep', 'angle=0..60:30'];
    const { status, out } = halfspace(['air', 'n-bk7', ...sweeps, '--columns', 'Rs']);
    expect(status).toBe(0);
    const rows = rowsOf(out);
    expect(rows).toHaveLength(61 * 3);
    expect(rows.slice(0, 4).map((row) => row.slice(0, 2))).toEqual([
      ['400', '0'],
      ['400', '30'],
      ['400', '60'],
      ['405', '0'],
    ]);
    expect(rows.at(-1)?.slice(0, 2)).toEqual(['700', '60']);
    const one = halfspace(['air', 'n-bk7', '550nm', '--angle', '30', '--json']);
    const found = rows.find(([wave, angle]) => wave === '550' && angle === '30');
    expect(found?.[2]).toBe(String(JSON.parse(one.out).interface.Rs));
  });

  it('says why where a point has no answer, goes on, and ends with 1', () => {
    const { status, out, err } = halfspace([
      ...['air', 'n-bk7', '--sweep', 'wave=200nm..400nm:50nm', '--columns', 'R'],
    ]);
    const rows = rowsOf(out);
    expect(rows.map(([wave, R]) => [wave, R !== ''])).toEqual([
      ['200', false],
      ['250', false],
      ['300', true],
      ['350', true],
      ['400', true],
    ]);
    expect(rows[0]?.slice(2).join(',')).toMatch(/no data at 0\.2 um/);
    expect(status).toBe(1);
    expect(err).toContain('2 of 5 rows not answered');
  });

  it('comes as JSON lines, as Markdown and as plain lines, with the same numbers', () => {
    const words = ['air', 'n-bk7', '--sweep', 'wave=400nm..700nm:100nm', '--columns', 'R'];
    const csv = rowsOf(halfspace(words).out);
    const json = halfspace([...words, '--json'])
      .out.trimEnd()
      .split('\n')
      .map((line) => JSON.parse(line));
    expect(json).toEqual(csv.map(([wave, R]) => ({ wave_nm: Number(wave), R: Number(R), error: null })));
    for (const form of ['--markdown', '--plain']) {
      const { out } = halfspace([...words, form]);
      for (const [wave = '', R] of csv) {
        expect(out).toMatch(
          new RegExp(`\\b${wave}\\b.*\\b${Number(R).toPrecision(6).replace('.', '\\.')}\\b`),
        );
      }
    }
  });

  it('of a thickness moves the layer that is named', () => {
    const path = ['air', 'n=1.38@100nm', 'n-bk7', '550nm'];
    const { out } = halfspace([...path, '--sweep', 'thickness=90nm..110nm:10nm', '--columns', 'R']);
    const one = halfspace(['air', 'n=1.38@110nm', 'n-bk7', '550nm', '--json']);
    expect(rowsOf(out).at(-1)).toEqual(['110', String(JSON.parse(one.out).interface.R), '']);
  });

  it.each([
    ['the wave twice', ['air', 'n-bk7', '633nm', '--sweep', 'wave=400nm..700nm:5nm'], 'given too'],
    ['a step of nothing', ['air', 'n-bk7', '633nm', '--sweep', 'angle=0..89:0'], 'step'],
    ['no such quantity', ['air', 'n-bk7', '633nm', '--sweep', 'angel=0..89:1'], 'angle'],
    [
      'the same quantity twice',
      ['air', 'n-bk7', '633nm', ...['--sweep', 'angle=0..1:1', '--sweep', 'angle=0..1:1']],
      'twice',
    ],
    [
      'a value both swept and given',
      ['air', 'n-bk7', '633nm', '--angle', '3', '--sweep', 'angle=0..1:1'],
      'both',
    ],
    ['a medium unknown', ['air', 'nonsuch', '633nm', '--sweep', 'angle=0..1:1'], 'nonsuch'],
  ])('is refused as a whole, with nothing written: %s', (_, words, part) => {
    const { status, out, err } = halfspace(words);
    expect([status, out], err).toEqual([2, '']);
    expect(err).toMatch(/^halfspace: [^\n]+; [^\n]+\n(see halfspace[^\n]* --help\n)?$/);
    expect(err).toContain(part);
  });

  it('ends silently where its reader goes away', () => {
    const line =
      '"$@" air n-bk7 633nm --sweep angle=0..89:0.00001 --columns R | head -2; echo "${PIPESTATUS[0]}"';
    const { out, err } = inShell(line);
    expect(err).toBe('');
    expect(out).toMatch(/^angle_deg,R,error\n0\.00000,0\.04\d+,\n(0|141)\n$/);
  });

  it('ends by SIGINT after a whole row, with that signal', async () => {
    const child = startHalfspace([
      'air',
      'n-bk7',
      '633nm',
      '--sweep',
      'angle=0..89:0.00001',
      '--columns',
      'R',
    ]);
    let out = '';
    child.stdout.on('data', (data) => {
      if (out.length < 1e6) out += data;
      last = data.toString();
    });
    let last = '';
    while (out.length < 1e5) await sleep(5);
    child.kill('SIGINT');
    const [status, signal] = await once(child, 'close');
    expect([status, signal]).toEqual([null, 'SIGINT']);
    expect(last.endsWith(',\n')).toBe(true);
  });
});
