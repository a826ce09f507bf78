import { describe, expect, it } from 'vitest';
import { run } from '../cli/in-process.ts';
import { expectAscii, expectPage } from '../cli/page-shape.ts';
import { unknownKeys, validDocument } from '../cli/schema.ts';

const line = (text: string): readonly string[] => text.split(' ');
const COMMANDS = [
  'order-check air zinc-selenide@3mm air 10.6um --power 30W --beam 6mm',
  'order-check air zinc-selenide@3mm air 10.6um --angle 67.4 --pol p --power 30W --beam 6mm',
  'order-check air fused-silica@5mm air 10.6um',
  'order-check air sapphire@2mm air 532nm 3um',
  'order-check air magnesium-fluoride-film@qw n-bk7@3mm magnesium-fluoride-film@qw air 633nm',
  'order-check air fused-silica@1mm water@10mm fused-silica@1mm air 589nm --temperature 25C',
  'order-check air n-bk7 633nm',
  'order-check air n=1.5@3mm air 633nm',
  'order-check air gold@1mm air 633nm',
  'order-check air ptfe@10mm air 10GHz',
];

interface Document {
  readonly counts: Readonly<Record<string, number>>;
  readonly waves: readonly { readonly findings: readonly { readonly level: string }[] }[];
  readonly general: readonly { readonly level: string }[];
}

describe('halfspace order-check', () => {
  it.each(COMMANDS)('%s: a page of 72 columns, Markdown, valid JSON', async (command) => {
    const text = await run(line(command));
    expect([text.status, text.err]).toEqual([0, '']);
    expectPage(text.out);
    expectAscii((await run([...line(command), '--ascii'])).out);
    const markdown = (await run([...line(command), '--markdown'])).out;
    expect(markdown).toMatch(/^## Order check: /);
    const json = validDocument('order-check', (await run([...line(command), '--json'])).out);
    expect(unknownKeys('order-check', json)).toEqual([]);
    const { counts, waves, general } = json as unknown as Document;
    const levels = [...waves.flatMap((w) => w.findings), ...general].map((f) => f.level);
    for (const level of ['stop', 'look', 'fine']) {
      expect(counts[level]).toBe(levels.filter((l) => l === level).length);
    }
    expect(text.out).toContain(`${counts['stop']} stop, ${counts['look']} look, ${counts['fine']} fine`);
  });

  it('numbers every source that a finding names, and lists no other', async () => {
    for (const command of COMMANDS) {
      const { out } = await run(line(command));
      const [body = '', list = ''] = out.split('\nSources\n');
      const named = new Set([...body.matchAll(/\[(\d+)\]/g)].map((m) => Number(m[1])));
      const listed = [...list.matchAll(/^\[(\d+)\]/gm)].map((m) => Number(m[1]));
      expect([...named].sort((a, b) => a - b)).toEqual(listed);
    }
  });

  it('makes a film once: a quarter wave at the first wave, or at the design wave', async () => {
    const at800 = async (command: string): Promise<string> => {
      const { out } = await run(line(command));
      return /At 800 nm in vacuum\n[\s\S]*?front face, coated, ([\d.]+) %/.exec(out)?.[1] ?? out;
    };
    const path = 'order-check air magnesium-fluoride-film@qw n-bk7@3mm air';
    const [first, named] = [
      await at800(`${path} 550nm 800nm`),
      await at800(`${path} 800nm --design-wave 550nm`),
    ];
    expect(first).toBe(named);
    expect(Number(await at800(`${path} 800nm`))).toBeLessThan(Number(first));
  });

  it('puts the graver remarks first', async () => {
    const { out } = await run(line('order-check air gold@1mm air 633nm'));
    const levels = [...out.matchAll(/^(stop|look|fine) +/gm)].map((m) => m[1]);
    expect(levels[0]).toBe('stop');
  });

  it.each([
    ['order-check air znse@3mm air', 'a wave is missing', 2],
    ['order-check air znse@3 air 10.6um', '3 what?', 2],
    ['order-check air znse@3mm air 10.6um --beam 3mm', '--power', 2],
    ['order-check air znse2@3mm air 10.6um', 'did you mean', 2],
    ['order-check air znse@3mm air 10.6um --angle 95', '0 <= angle < 90', 2],
  ])('refuses %s', async (command, hint, wanted) => {
    const { status, out, err } = await run(line(command));
    expect([status, out]).toEqual([wanted, '']);
    expect(err).toContain(hint);
  });
});
