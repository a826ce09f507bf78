import { describe, expect, it } from 'vitest';
import { run } from '../cli/in-process.ts';
import { expectAscii, expectPage } from '../cli/page-shape.ts';
import { unknownKeys, validDocument } from '../cli/schema.ts';

const line = (text: string): readonly string[] => text.split(' ');
const COMMANDS = [
  'find --at 633nm --n 1.37..1.39',
  'find --at 10.6um --max-loss 40% --thickness 3mm --not hygroscopic --not toxic',
  'find class liquid n 1.45..1.48 at 589nm not toxic',
  'find --at 1064nm --birefringence 0.1.. --sort -birefringence',
  'find --abbe 80.. --class glass',
  'find --at 800nm --gvd -20..40 --group-index 1.4..1.6',
  'find --clear 3..5um --not film',
  'find zinc',
  'find',
  'find --at 10GHz --n 3.. --not metal,ground',
  'find --at d-line --n 1.5..1.52 --sort loss',
  'find --at 633nm --n 9..10',
];

describe('halfspace find', () => {
  it.each(COMMANDS)('%s: a table within 80 columns, valid JSON, one CSV record a hit', async (command) => {
    const text = await run(line(command));
    expect([text.status, text.err]).toEqual([0, '']);
    expectPage(text.out, 80);
    expectAscii((await run([...line(command), '--ascii'])).out);
    const json = validDocument('find', (await run([...line(command), '--json'])).out);
    expect(unknownKeys('find', json)).toEqual([]);
    const hits = json['hits'] as readonly Record<string, unknown>[];
    expect(json['matched']).toBe(hits.length);
    expect(text.out).toContain(`${hits.length} of ${String(json['examined'])} media`);
    for (const hit of hits) {
      for (const [name, value] of Object.entries(hit)) {
        const explained = name in (hit['reasons'] as object);
        if (
          value === null &&
          ['n', 'groupIndex', 'gvd_s2_per_m', 'Vd', 'loss', 'birefringence'].includes(name)
        ) {
          expect(explained, `${String(hit['key'])} ${name}`).toBe(true);
        }
      }
    }
    const csv = (await run([...line(command), '--csv'])).out;
    expect(csv.trimEnd().split('\n')).toHaveLength(hits.length + 1);
  });

  it('joins what --not is given several times', async () => {
    const twice = JSON.parse((await run(line('find --not toxic --not hygroscopic --not toxic --json'))).out);
    const once = JSON.parse((await run(line('find --not toxic,hygroscopic --json'))).out);
    expect(twice.hits).toEqual(once.hits);
  });

  it('takes a wave among the conditions for one in air where told to, like that of --at', async () => {
    const nOf = async (command: string) => JSON.parse((await run(line(command))).out).hits[0].n;
    const inAir = await nOf('find n-bk7 at 400nm --air-wavelength --json');
    expect(inAir).toBe(await nOf('find n-bk7 --at 400nm --air-wavelength --json'));
    expect(inAir).not.toBe(await nOf('find n-bk7 at 400nm --json'));
  });

  it('says what was left out for want of data', async () => {
    const { out } = await run(line('find --at 10.6um --n 1.2..1.6'));
    expect(out.replace(/\s+/g, ' ')).toMatch(
      /Left out because the catalogue cannot tell: \d+ with no data at this wave/,
    );
  });

  it.each([
    ['find --n 1.3', '1.3.. or ..1.3'],
    ['find --n 1.3-1.4 --at 633nm', 'write 1.3..1.4'],
    ['find --n 1.3..1.4', '--at 633nm'],
    ['find --at 633', '633nm'],
    ['find --at 633nm --class gals', 'liquid, glass'],
    ['find --not foo', 'hygroscopic, toxic, hazardous'],
    ['find n', 'n 1.37..1.39'],
    ['find laser window 266nm', 'write at 266nm or clear 266nm'],
    ['find 1.3..1.4', 'n 1.3..1.4'],
    ['find --class flint', 'words of names stand by themselves'],
    ['find n 1.3..1.4 at 633nm --n 1..', 'give it once'],
    ['find --clear 3-5um', 'write 3..5um'],
    ['find --sort size', 'hardness'],
    ['find --max-loss 50', '50%'],
    ['find --gvd a..', 'fs2/mm'],
    ['find --class ,glass', 'commas'],
  ])('refuses %s with what would be right', async (command, hint) => {
    const { status, out, err } = await run(line(command));
    expect([status, out]).toEqual([2, '']);
    expect(err).toContain(hint);
    expect(err.split('\n').length).toBeLessThanOrEqual(3);
    expect(err).toMatch(/^halfspace: .+; .+\n/);
  });
});
