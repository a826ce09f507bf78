import { describe, expect, it } from 'vitest';
import { run } from '../cli/in-process.ts';
import { expectAscii, expectPage } from '../cli/page-shape.ts';
import { unknownKeys, validDocument } from '../cli/schema.ts';

const line = (text: string): readonly string[] => text.split(' ');
const COMMANDS = [
  'match n-bk7 --at 589nm --class liquid',
  'match fused-silica --at 633nm --mix --class liquid --not toxic',
  'match n=2.4 --at 10.6um --within 0.02',
  'match sapphire:e class liquid clear 400..700nm --at d-line',
  'match gold --at 633nm --mix',
  'match eps=9.8,tand=0.0003 --at 10GHz',
  'match water --at 589nm --within 0.0001 --class liquid',
];

describe('halfspace match', () => {
  it.each(COMMANDS)('%s: a page, valid JSON, one CSV record a match', async (command) => {
    const text = await run(line(command));
    expect([text.status, text.err]).toEqual([0, '']);
    expectPage(text.out, 80);
    expectAscii((await run([...line(command), '--ascii'])).out);
    const json = validDocument('match', (await run([...line(command), '--json'])).out);
    expect(unknownKeys('match', json)).toEqual([]);
    const matches = json['matches'] as readonly { R: number; key: string }[];
    expect(matches.map((m) => m.R)).toEqual(matches.map((m) => m.R).sort((a, b) => a - b));
    for (const { key } of matches.slice(0, 3)) expect(text.out).toContain(key);
    const csv = (await run([...line(command), '--csv'])).out;
    expect(csv.trimEnd().split('\n')).toHaveLength(matches.length + 1);
  });

  it('calls mixtures an estimate, and says that mixing must be tried', async () => {
    const { out } = await run(line('match fused-silica --at 633nm --mix --class liquid'));
    const flat = out.replace(/\s+/g, ' ');
    expect(flat).toContain('Estimate: shares by volume before mixing');
    expect(flat).toContain('recalled from memory and not read in a source: try a little first');
  });

  it.each([
    ['match n-bk7', '--at 589nm', 2],
    ['match --at 633nm', 'halfspace match TARGET', 2],
    ['match nbk77 --at 633nm', 'did you mean', 2],
    ['match fused-silica --at 10.6um', 'choose a wave inside', 3],
    ['match n-bk7 --at 633nm --within 0', '0.002', 2],
    ['match n-bk7 foo=1 at', 'at 633nm', 2],
  ])('refuses %s', async (command, hint, wanted) => {
    const { status, out, err } = await run(line(command));
    expect([status, out]).toEqual([wanted, '']);
    expect(err).toContain(hint);
  });
});
