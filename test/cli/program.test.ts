/** End to end: the program in a process of its own, its streams, its statuses, its files. */
import {
  chmodSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { expectAscii, expectPage } from './page-shape.ts';
import { halfspace, inputsFile, inShell, startHalfspace } from './program.ts';
import { validDocument } from './schema.ts';

let folder = '';
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'halfspace-program-'));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const at = (...names: readonly string[]): string => join(folder, ...names);
/** Each run is a process; on a busy machine many of them take their time. */
const PATIENT = { timeout: 120_000 };
const QUESTION = ['air', 'fused-silica', '632.8nm'];

describe('streams', PATIENT, () => {
  it.each([
    [[...QUESTION, '--json'], 'answer'],
    [['verify', '--json'], 'verify'],
    [['cite', 'air', '--json'], 'cite'],
    [['cite', 'air', '--csl'], 'csl'],
    [['material', 'n-bk7', '--json'], 'material'],
    [['equivalent', 'n-bk7', '--json'], 'equivalent'],
    [['config', '--json'], 'config'],
  ])('hold one document on standard output and nothing on standard error: %j', (args, schema) => {
    const { status, out, err } = halfspace(args);
    expect([status, err]).toEqual([0, '']);
    validDocument(schema, out);
    expect(out.endsWith('\n') && !out.endsWith('\n\n')).toBe(true);
  });

  it('hold the text of every command within 72 columns', () => {
    for (const args of [
      QUESTION,
      ['verify'],
      ['cite', 'air'],
      ['material', 'gold'],
      ['equivalent', '517642'],
      ['config'],
    ]) {
      const { status, out, err } = halfspace(args);
      expect([status, err], args.join(' ')).toEqual([0, '']);
      expectPage(out);
    }
  });

  it('give help, versions and the manual page on standard output, with status 0', () => {
    for (const args of [
      ['--help'],
      ['-h'],
      ['help', 'verify'],
      ['verify', '--help'],
      ['--version'],
      ['man'],
    ]) {
      const { status, out, err } = halfspace(args);
      expect([status, err], args.join(' ')).toEqual([0, '']);
      expect(out.length).toBeGreaterThan(20);
    }
    expect(halfspace(['--version']).out).toMatch(
      /^halfspace \d+\.\d+\.\d+\ncatalogue \d+\.\d+\.\d+, \d{4}-\d\d-\d\d, [0-9a-f]{12}\n$/,
    );
  });

  it('stay free of escape codes wherever they lead, whatever the environment says', () => {
    for (const env of [
      {},
      { FORCE_COLOR: '3', TERM: 'xterm-256color', COLORTERM: 'truecolor' },
      { NO_COLOR: '1' },
    ]) {
      for (const args of [QUESTION, ['--help'], ['nosuch', 'thing', '1um'], ['material', 'gold']]) {
        const { out, err } = halfspace(args, { env });
        expect(out + err).not.toContain('\u001b');
      }
    }
  });

  it('are the same bytes with and without NO_COLOR', () => {
    expect(halfspace(QUESTION, { env: { NO_COLOR: '1' } }).out).toBe(halfspace(QUESTION).out);
  });

  it('keep to ASCII with --ascii, and without it where the locale has no more', () => {
    for (const [args, env] of [
      [[...QUESTION, '--ascii'], {}],
      [QUESTION, { LANG: 'C' }],
      [QUESTION, { LANG: 'C.UTF-8', LC_ALL: 'POSIX' }],
      [['material', 'n-bk7'], { LANG: undefined }],
      [['verify', '--full', '--ascii'], {}],
    ] as const) {
      const { status, out, err } = halfspace(args, { env });
      expect([status, err]).toEqual([0, '']);
      expectAscii(out);
    }
    expect(halfspace(QUESTION).out).toContain('µ');
  });

  it('say in JSON the same in every locale', () => {
    expect(halfspace([...QUESTION, '--json'], { env: { LANG: 'C' } }).out).toBe(
      halfspace([...QUESTION, '--json']).out,
    );
  });
});

describe('statuses', PATIENT, () => {
  it.each([
    [['air', 'fused-silica', '632.8nm'], 0],
    [['air', 'quarts', '632.8nm'], 2],
    [['air', 'fused-silica', '20um'], 3],
    [['air', 'fused-silica', '20um', '-o', '/no/such/folder/x'], 3],
    [[...QUESTION, '-o', '/no/such/folder/x.json'], 4],
    [['air', 'toluene', '589nm', '--strict'], 1],
    [['fit', '/no/such/file.csv'], 4],
    [['equivalent', 'sapphire'], 3],
  ])('%j ends with %i', (args, expected) => {
    const { status, out, err } = halfspace(args);
    expect(status).toBe(expected);
    expect(err === '').toBe(expected === 0 || expected === 1);
    if (expected > 1) expect(out).toBe('');
  });

  it('without operands, and without a terminal, is 2 with a sentence on standard error', () => {
    const { status, out, err } = halfspace([]);
    expect([status, out]).toEqual([2, '']);
    expect(err).toMatch(/needs a terminal.*\nsee halfspace --help\n$/);
  });
});

describe('a full disk behind standard output', PATIENT, () => {
  it
    .runIf(existsSync('/dev/full'))
    .each(['air fused-silica 633nm', '--json air gold 633nm', 'find --at 633nm'])(
    'is said in one line, and ends %s with 4',
    (line) => {
      const { status, err } = inShell(`"$@" ${line} > /dev/full`);
      expect(status).toBe(4);
      expect(err).toMatch(/^halfspace: the answer cannot be written \(the disk is full\); .*\n$/);
    },
  );
});

describe('what is not understood', PATIENT, () => {
  it.each([
    ['an unknown medium', ['air', 'quarts', '633nm'], 'did you mean crystal-quartz?'],
    ['a name of several media', ['air', '517642', '633nm'], 'fits several media: bk7'],
    ['an axis that is none', ['air', 'water:o', '633nm'], 'it is isotropic: write water'],
    ['a unit that is none', ['air', 'water', '633nn'], '"nn" is no unit of a wave'],
    ['a unit of another kind', ['air', 'water', '20C'], 'is a temperature, not a wave'],
    ['a missing unit', ['air', 'water', '633'], '633 what?'],
    ['a decimal comma', ['air', 'water', '0,633um'], '0.633'],
    ['an angle beyond the surface', [...QUESTION, '--angle', '95'], '--angle'],
    ['a negative angle', [...QUESTION, '--angle', '-5'], '--angle'],
    ['no number', [...QUESTION, '--angle', 'NaN'], '--angle'],
    ['an infinite number', [...QUESTION, '--angle', 'Infinity'], '--angle'],
    ['a hexadecimal number', ['air', 'n=0x10', '633nm'], '0x10'],
    ['a huge number', ['air', 'n=1e400', '633nm'], '1e400'],
    ['a number beyond any medium', ['air', 'n=1e30', '633nm'], 'no medium is'],
    ['a wave beyond reach', ['air', 'water', '1e-9nm'], '1e-9nm'],
    ['gain', ['air', 'n=1.5-0.1i', '633nm'], 'gain'],
    ['an empty medium', ['air', '', '633nm'], 'a medium is empty'],
    ['an empty wave', ['air', 'water', ''], 'a wave is missing'],
    ['a blank medium', ['air', '   ', '633nm'], 'a medium is empty'],
    ['control characters', ['air', 'wa\u001b[31mter\u0007', '633nm'], 'wa?[31mter?'],
    ['another direction of writing', ['air', 'x\u202eretaw', '633nm'], 'x?retaw'],
    ['a very long name', ['air', 'x'.repeat(5000), '633nm'], '...'],
    ['an unknown option', [...QUESTION, '--angel', '5'], '--angle'],
    ['an unknown command', ['verfy'], 'verify'],
    ['a missing operand', ['air', 'water'], 'WAVE'],
    ['a thickness at an end', ['air', 'water@1mm', '633nm'], 'fill their half-spaces'],
    ['an option that belongs elsewhere', ['verify', '--angle', '5'], 'halfspace verify takes no --angle'],
    ['a contradiction', [...QUESTION, '--json', '--csv'], 'contradict each other'],
  ])('is refused with what would be right: %s', (_, args, part) => {
    const { status, out, err } = halfspace(args);
    expect([status, out]).toEqual([2, '']);
    expect(err.startsWith('halfspace: ')).toBe(true);
    expect(err).toContain(part);
    expect(err).toMatch(/^halfspace: [^\n]+; [^\n]+\n(see halfspace[^\n]* --help\n)?$/);
    expect(err).not.toMatch(/[\x00-\x09\x0b-\x1f\x7f-\x9f]|\bat .*\.[jt]s:\d|undefined|\[object/);
    expect(err.length).toBeLessThan(900);
  });
});

describe('pipes', PATIENT, () => {
  it('that close early end the program silently', () => {
    for (const command of ['verify --full', 'verify --full --json', 'material gold --full']) {
      const { out, err } = inShell(`"$@" ${command} | head -1; echo "\${PIPESTATUS[0]}"`);
      expect(err).toBe('');
      expect(out.trimEnd().split('\n').at(-1)).toMatch(/^(0|141)$/);
    }
  });

  it('that are slow still get the whole of a megabyte', async () => {
    const whole = halfspace(['verify', '--full', '--csv']).out;
    const child = startHalfspace(['verify', '--full', '--csv']);
    const chunks: Buffer[] = [];
    let seen = 0;
    for await (const chunk of child.stdout) {
      chunks.push(chunk as Buffer);
      seen += (chunk as Buffer).length;
      if (seen < 400_000) await sleep(20);
    }
    expect(Buffer.concat(chunks).toString('utf8')).toBe(whole);
    const document = inShell('"$@" verify --full --json | (sleep 1; cat)').out;
    expect(document.length).toBeGreaterThan(1_000_000);
    validDocument('verify', document);
  });

  it('may feed a fit', () => {
    const input = 'wavelength_nm,n\n400,1.53\n500,1.52\n600,1.515\n700,1.512\n';
    const { status, out, err } = halfspace(['fit', '-', '--model', 'cauchy', '--terms', '2'], { input });
    expect([status, err]).toEqual([0, '']);
    expectPage(out);
  });
});

describe('files', PATIENT, () => {
  it('take the result in place of standard output, byte for byte', () => {
    for (const form of [[], ['--json'], ['--csv'], ['--markdown'], ['--plain']]) {
      const file = at('answer.out');
      writeFileSync(file, 'old');
      const { status, out, err } = halfspace([...QUESTION, ...form, '-o', file]);
      expect([status, out, err]).toEqual([0, '', '']);
      expect(readFileSync(file, 'utf8')).toBe(halfspace([...QUESTION, ...form]).out);
    }
    expect(halfspace([...QUESTION, '-o', '-']).out).toBe(halfspace(QUESTION).out);
    expect(readdirSync(folder).filter((name) => name.endsWith('.part'))).toEqual([]);
  });

  it('that cannot be written are named, with status 4', () => {
    const { status, out, err } = halfspace([...QUESTION, '-o', at('none', 'x.json')]);
    expect([status, out]).toEqual([4, '']);
    expect(err).toBe(
      `halfspace: ${at('none', 'x.json')} cannot be written (its folder does not exist); name a place you may write to\n`,
    );
    expect(halfspace([...QUESTION, '-o', folder]).err).toContain('is a folder; name a file in it');
  });

  it('keep their mode, and devices are written as they stand', () => {
    const file = at('mode.out');
    writeFileSync(file, '');
    chmodSync(file, 0o640);
    expect(halfspace([...QUESTION, '-o', file]).status).toBe(0);
    expect(inShell(`stat -c %a ${file}`).out.trim()).toBe('640');
    expect(inShell('"$@" air water 633nm -o /dev/stdout | head -1').out).toContain('Air → Water');
  });
});

describe("a person's own files", PATIENT, () => {
  it('that are broken are named on standard error, and the answer still comes', () => {
    const own = at('materials');
    mkdirSync(own, { recursive: true });
    writeFileSync(join(own, 'broken.json'), '{ "key": "broken", ');
    writeFileSync(join(own, 'fine.csv'), 'wavelength_nm,n\n400,1.53\n700,1.51\n');
    const { status, out, err } = halfspace(['air', 'fine', '500nm', '--catalog', own]);
    expect(status).toBe(0);
    expect(out).toContain('fine');
    expect(err).toMatch(/^halfspace: .*broken\.json (the file )?is not JSON .*; correct it there\n$/);
    expect(halfspace(['air', 'fine', '500nm', '--catalog', own, '--quiet']).err).toBe('');
    const data = { XDG_DATA_HOME: folder };
    mkdirSync(at('halfspace'), { recursive: true });
    expect(inShell(`ln -s ${own} ${at('halfspace', 'materials')}`).status).toBe(0);
    expect(halfspace(['air', 'fine', '500nm'], { env: data }).status).toBe(0);
  });

  it('may be absent, with a home that cannot be written or is not there', () => {
    const before = halfspace([...QUESTION, '--json']).out;
    for (const env of [
      { HOME: '/dev/null/none' },
      { HOME: '/no/such/home' },
      { HOME: undefined },
      { HOME: '' },
    ]) {
      for (const args of [[...QUESTION, '--json'], ['config']]) {
        const { status, err } = halfspace(args, { env });
        expect([status, err], JSON.stringify(env)).toEqual([0, '']);
      }
      expect(halfspace([...QUESTION, '--json'], { env }).out).toBe(before);
    }
  });
});

describe.runIf(existsSync(inputsFile))('the build', () => {
  it('answers one question without any library of the full-screen program', () => {
    const { entry } = JSON.parse(readFileSync(inputsFile, 'utf8')) as { entry: readonly string[] };
    expect(entry.length).toBeGreaterThan(20);
    expect(entry.filter((file) => file.startsWith('node_modules/'))).toEqual([]);
    expect(entry.filter((file) => /ink|react|fuse|conf\b|src\/tui|src\/plot/.test(file))).toEqual([]);
  });
});
