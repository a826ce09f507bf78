import { describe, expect, it } from 'vitest';
import { run } from '../cli/in-process.ts';
import { expectAscii, expectPage } from '../cli/page-shape.ts';
import { unknownKeys, validDocument } from '../cli/schema.ts';

const line = (text: string): readonly string[] => text.split(' ');
const COMMANDS = [
  'compare zinc-selenide@3mm germanium@3mm kcl@3mm 10.6um',
  'compare n-bk7 fused-silica caf2@5mm sapphire:e znse ge 400nm 5um',
  'compare n-bk7 fused-silica calcium-fluoride 400nm 1064nm d-line',
  'compare air water 10GHz',
  'compare n=1.5@2mm n=1.5+0.001i@2mm 633nm',
  'compare zinc-sulfide@qw/germanium@3mm/zinc-sulfide@qw germanium@3mm zinc-sulfide@qw/germanium 10um 9um',
  'compare magnesium-fluoride-film@100nm/n-bk7@5mm n=1.38@qw/n=1.5@2mm 550nm --design-wave 600nm',
  'compare lithium-tantalate-stoichiometric potassium-titanyl-phosphate:z 1064nm --temperature 40C',
];

describe('halfspace compare', () => {
  it.each(COMMANDS)('%s: a page, Markdown, valid JSON, one CSV record a part and wave', async (command) => {
    const text = await run(line(command));
    expect([text.status, text.err]).toEqual([0, '']);
    expectPage(text.out, 80);
    expectAscii((await run([...line(command), '--ascii'])).out);
    const markdown = await run([...line(command), '--markdown']);
    expect([markdown.status, markdown.err]).toEqual([0, '']);
    const tables = markdown.out.split('\n').filter((l) => l.startsWith('|'));
    expect(new Set(tables.map((l) => l.replace(/\\\|/g, '').split('|').length)).size).toBe(1);
    const json = validDocument('compare', (await run([...line(command), '--json'])).out);
    expect(unknownKeys('compare', json)).toEqual([]);
    const parts = json['parts'] as readonly { atWave: readonly unknown[] }[];
    const waves = json['waves'] as readonly unknown[];
    for (const { atWave } of parts) expect(atWave).toHaveLength(waves.length);
    const csv = (await run([...line(command), '--csv'])).out;
    expect(csv.trimEnd().split('\n')).toHaveLength(parts.length * waves.length + 1);
  });

  it('marks the best of a row without colour', async () => {
    const { out } = await run(line('compare zinc-selenide@3mm germanium@3mm kcl@3mm 10.6um'));
    expect(out).toMatch(/^R +one surface +16\.99 % +36\.03 % +3\.42\d % \*$/m);
    expect(out).toMatch(/^Knoop +hardness +120 +780 \* +7\.2$/m);
    expect(out).toMatch(/^ +hygroscopic +no \* +no \* +yes$/m);
    expect(out).not.toContain('\u001b');
  });

  it('sets a coated part beside the bare one, and says what is on it', async () => {
    // Single quarter-wave film of MgF2 on crown glass, 1.3 % in place of 4.2 % (Hecht, Optics, 9.7.2).
    const { out } = await run(line('compare magnesium-fluoride-film@qw/n-bk7@5mm n-bk7@5mm 550nm'));
    expect(out).toMatch(/^ +n-bk7@5mm \(a\) +n-bk7@5mm$/m);
    expect(out).toMatch(/^R +one surface +1\.27 % \* +4\.239 %$/m);
    expect(out).toMatch(/^R +back surface +4\.239 % +4\.239 %$/m);
    expect(out.replace(/\s+/g, ' ')).toContain(
      '(a) magnesium-fluoride-film@qw/n-bk7@5mm; quarter and half waves at 550 nm in vacuum.',
    );
    expect(out).toContain('Magnesium fluoride film: H. A. Macleod');
  });

  it('shows 64.17 and 63.96 for N-BK7 (Schott data sheet)', async () => {
    const { out } = await run(line('compare n-bk7 n-sf11 d-line'));
    expect(out).toMatch(/^V_d +Abbe number +64\.17 +25\.68$/m);
    expect(out).toMatch(/^V_e +Abbe number +63\.96 +25\.47$/m);
  });

  it.each([
    ['compare n-bk7 10.6um', 'name 2 to 6'],
    ['compare n-bk7 znse', 'a wave is missing'],
    ['compare n-bk7 znse 10.6', '10.6um'],
    ['compare n-bk7@qw znse 1um', 'n-bk7@3mm'],
    ['compare n-bk7@1mm@2mm znse 1um', 'two thicknesses'],
    ['compare bk77 znse 1um', 'did you mean'],
    ['compare n=1.38@qw/n=1.5@qw znse 1um', 'films alone'],
    ['compare n=1.38/n=1.5 znse 1um', 'more than one medium without a thickness'],
    ['compare n=1.38@qw/n-bk77@3mm znse 1um', 'did you mean n-bk7'],
    ['compare n=1.38@qw znse 1um', 'n=1.38@qw/MEDIUM@3mm'],
  ])('refuses %s', async (command, hint) => {
    const { status, out, err } = await run(line(command));
    expect([status, out]).toEqual([2, '']);
    expect(err).toContain(hint);
  });

  it('answers 3 where the data of none reach the wave', async () => {
    const { status, err } = await run(line('compare n-bk7 fused-silica 10.6um'));
    expect(status).toBe(3);
    expect(err).not.toContain('--extrapolate');
  });
});
