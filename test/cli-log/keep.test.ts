/** `--log`: what is kept of an answer, and the command that asks it again. */
import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { Answer } from '../../src/answer/answer.ts';
import { optionsOf } from '../../src/cli/command-table.ts';
import { type OptionKey, optionSpec } from '../../src/cli/options.ts';
import { run } from '../cli/in-process.ts';
import { expectPage } from '../cli/page-shape.ts';
import { validDocument } from '../cli/schema.ts';
import { TestLogbook } from './logbook.ts';

let log: TestLogbook;
beforeEach(() => {
  log = new TestLogbook();
});
afterEach(() => log.remove());

/** Options that say where the output goes or how loud the program is, and nothing of the answer. */
const SAY_NOTHING_OF_THE_ANSWER: readonly OptionKey[] = [
  ...(['log', 'logFile', 'output', 'quiet', 'color', 'noColor', 'noInput', 'catalog', 'svg'] as const),
  ...(['help', 'version'] as const),
  // Of many questions at once, which are not logged.
  ...(['sweeps', 'columns', 'digits'] as const),
];

/** Between them every option of a question. */
const COMMANDS: readonly string[] = [
  'air fused-silica 633nm',
  'BK7 n=1.46 633nm --angle=45 --pol p --strict',
  'air sapphire:O 1064nm',
  'air n-bk7 632.8nm --air-wavelength --angle 0.3rad --tolerance wave=1nm,angle=0.5deg,n=1e-4',
  'air water 589.3nm --temperature 25C --pressure 98kPa --humidity 50% --co2 420 --json',
  'air glucose-syrup-solution 589.3nm --composition 30%',
  'air seawater 589.3nm --salinity 35 --temperature=-1C --extrapolate --plain',
  'air fused-silica 633nm --power 5mW --beam 1mm --profile flat --csv',
  'air fused-silica 633nm --irradiance 1kW/m2 --markdown',
  'air fused-silica 633nm --field 100V/m --ascii',
  'air 3x: n=2.3@qw n=1.46@qw : BK7@2mm air 633nm --design-wave 600nm --linewidth 0.1nm',
  'air n=1.38@100nm n-bk7 550nm --coherence 1mm --field-profile --json',
  'air fused-silica@10mm air 800nm --pulse 30fs --pulse-energy 1uJ --repetition 1kHz --beam 1mm --nonlinear-index 2.7e-20m2/W',
  'air quartz@1mm air 633nm --cut-angle 90 --cut-azimuth 0 --retardance quarter',
  'n-bk7 air 633nm --plot angle --span 30..50',
  'air fused-silica 633nm --plot wave --span 400..700nm --linear',
  'air n=1.38@100nm n-bk7 550nm --plot field',
];

describe('the recorded command', () => {
  it('is tried with every option that a question has', () => {
    const tried = optionsOf('answer').filter((key) =>
      COMMANDS.some((line) => new RegExp(`--${optionSpec(key).name}(?:[ =]|$)`).test(line)),
    );
    const untried = optionsOf('answer').filter(
      (key) => !tried.includes(key) && !SAY_NOTHING_OF_THE_ANSWER.includes(key) && !optionSpec(key).hidden,
    );
    expect(untried).toEqual([]);
  });

  it.each(COMMANDS)('of %s prints the same bytes and makes the same record', async (line) => {
    const words = line.split(' ');
    const plain = await run(words);
    const logged = await log.run([...words, '-q', '--no-input', '--color', 'never']);
    expect(logged.out).toBe(plain.out);
    expect(logged.status).toBe(plain.status);
    const { commandWords } = log.last();
    expect(commandWords.slice(1).filter((word) => /^-[^\d-]/.test(word))).toEqual([]);
    const again = await log.run(commandWords.slice(1));
    expect(again.out).toBe(plain.out);
    const [first, second] = log.text().trimEnd().split('\n');
    expect(second).toBe(first);
  });

  it('names media by their keys, whatever they were called, and leaves thicknesses and groups as typed', async () => {
    await log.run('AIR 2x: N-BK7@QW n=2.3@0.1um : Sapphire:O 633nm'.split(' '));
    expect(log.last().command).toBe('halfspace air 2x: n-bk7@QW n=2.3@0.1um : sapphire:ordinary 633nm');
  });

  it('says in so many words what the surroundings decided', async () => {
    await log.run(['air', 'n=1.5', '633nm', '--plot', 'angle'], { env: { ACCESSIBLE: '1' } });
    expect(log.last().command).toBe('halfspace air n=1.5 633nm --plot angle --linear');
  });

  it('is a line for a POSIX shell', async () => {
    await log.run(['air', ' n=1.5 ', '633 nm', '--angle', '45 deg']);
    expect(log.last().command).toBe("halfspace air n=1.5 '633 nm' --angle '45 deg'");
  });
});

describe('--log', () => {
  it('keeps the answer of the JSON form, rows of the text form, sources, versions, the time', async () => {
    const words = 'air fused-silica 632.8nm --angle 45 --pol p --power 5mW --beam 1mm'.split(' ');
    const { out, err } = await log.run(words);
    const record = log.last();
    expect(err).toBe(`logged as ${record.id} in ${log.file}\n`);
    const document = JSON.parse((await run([...words, '--json'])).out) as Answer & { version: string };
    expect(record.answer['interface']).toEqual(document.interface);
    expect(record.answer['energy']).toEqual(document.energy);
    expect(record.program.version).toBe(document.version);
    expect(record.catalogue.hash).toMatch(/^[0-9a-f]{12}$/);
    expect(record.time).toBe('1970-01-01T00:00:00+00:00');
    expect(record.cautions).toEqual(document.cautions);
    expect(record.sources.map(({ id }) => id)).toContain(document.into.fit?.source.id);
    expect(record.conventions.join(' ')).toContain('exp(i(k r - w t))');
    const [asked] = record.asked;
    expect(asked?.text).toBe('Air (air)');
    expect(record.asked.map(({ label }) => label)).toEqual(
      expect.arrayContaining(['tolerances', 'conditions']),
    );
    // What was shown is what is kept, digit for digit.
    for (const { symbol, text } of record.rows.filter(({ about }) => about === 'Interface')) {
      expect(out, symbol).toContain(text);
    }
  });

  it('says nothing where asked to be quiet, and changes neither output nor status', async () => {
    const plain = await run(['air', 'beryllium-oxide', '633nm', '--strict']);
    const logged = await log.run(['air', 'beryllium-oxide', '633nm', '--strict', '--quiet']);
    expect(logged).toEqual({ ...plain, err: '' });
    expect(plain.status).toBe(1);
  });

  it('goes to the logbook of the person without a file, making its folder', async () => {
    const env = { XDG_STATE_HOME: path.join(log.folder, 'state') };
    const { err } = await run(['air', 'n=1.5', '633nm', '--log'], { env });
    expect(err).toContain(path.join(log.folder, 'state', 'halfspace', 'logbook.jsonl'));
    const { out } = await run(['log'], { env });
    expect(out).toMatch(/^\S+ {2}[0-9a-f]{12} {2}R = 3\.\S+ % +air → n=1\.5, 633nm, 0°, unpolarized\n$/);
  });

  it('keeps nothing where there is no answer', async () => {
    const { status, out } = await log.run(['air', 'fused-silica', '20um']);
    expect([status, out]).toEqual([3, '']);
    expect(() => log.text()).toThrow();
  });
});

describe('a record that cannot be kept', () => {
  const unkept = (file: string, ...words: string[]) =>
    run(['air', 'n=1.5', '633nm', ...words, '--log-file', file]);

  it('is shown behind the answer, with status 4 and the reason', async () => {
    const { out: answer } = await run(['air', 'n=1.5', '633nm']);
    const file = path.join(log.folder, 'missing', 'log.jsonl');
    const { status, out, err } = await unkept(file);
    expect(status).toBe(4);
    expect(err).toMatch(/^halfspace: .*missing\/log\.jsonl cannot be opened.*\n$/);
    expect(out.startsWith(`${answer}\nhalfspace record `)).toBe(true);
    expect(out).toContain('halfspace air n=1.5 633nm\n');
    expectPage(out);
  });

  it('is told by the system: a full disk, a folder, a path through a file', async () => {
    const full = await unkept('/dev/full');
    expect([full.status, full.err]).toEqual([4, expect.stringContaining('no room is left for /dev/full')]);
    const folder = path.join(log.folder, 'folder');
    mkdirSync(folder);
    expect((await unkept(folder)).err).toContain('is a folder');
    await log.run(['air', 'n=1.5', '633nm']);
    expect((await unkept(path.join(log.file, 'x'))).status).toBe(4);
  });

  it('leaves a document for a program alone on standard output', async () => {
    const { out: plain } = await run(['air', 'n=1.5', '633nm', '--json']);
    const { status, out, err } = await unkept('/dev/full', '--json');
    expect([status, out]).toEqual([4, plain]);
    expect(err).toContain('halfspace record ');
    expect(err).toContain('halfspace: no room is left for /dev/full');
    const markdown = await unkept('/dev/full', '--markdown');
    expect(markdown.out).toContain('## halfspace record');
  });
});

describe('the JSON of a record', () => {
  it('holds to its schema', async () => {
    await log.run('air 3x: n=2.3@qw n=1.46@qw : n-bk7 633nm --pulse 30fs --json'.split(' '));
    const { out } = await log.run(['log', 'last', '--json']);
    expect(validDocument('log', out)).toEqual(JSON.parse(log.text()));
  });
});
