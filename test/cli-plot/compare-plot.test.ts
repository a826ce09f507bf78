/** `halfspace compare ... --plot wave`: the dispersion of the media compared, in every form. */
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { run } from '../cli/in-process.ts';
import { expectAscii, expectPage } from '../cli/page-shape.ts';
import { validDocument } from '../cli/schema.ts';
import { elementsOf, parseXml } from '../plot/parse-xml.ts';

const folder = mkdtempSync(path.join(tmpdir(), 'halfspace-dispersion-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const ask = (line: string) => run(line.split(' '), { env: { LANG: 'C.UTF-8' } });

interface Dispersion {
  readonly curves: readonly {
    readonly medium: string;
    readonly columns: Readonly<Record<string, readonly (number | null)[]>>;
  }[];
}
const documentOf = async (line: string): Promise<Dispersion> =>
  validDocument('dispersion', (await ask(`${line} --json`)).out) as unknown as Dispersion;

const LINE = 'compare n-bk7 n-sf11@3mm calcium-fluoride n=1.5 633nm 1064nm --plot wave';

describe('the dispersion of media compared', () => {
  it('is a chart of each index with every medium in the legend, in braille, ASCII and words', async () => {
    const { status, out, err } = await ask(LINE);
    expect([status, err]).toEqual([0, '']);
    expectPage(out);
    expect(out.match(/^refractive index {2}|^group index {2}/gm)).toHaveLength(2);
    const legends = out.match(/^(?:refractive|group) index {2}.*\n.*\n/gm) ?? [];
    for (const name of ['n-bk7', 'n-sf11', 'calcium-fluoride', 'n=1.5'])
      for (const legend of legends) expect(legend).toMatch(new RegExp(`[\\u2800-\\u28ff] ${name}(?: |\\n)`));
    expect(out).toContain('A line ends where the data of its medium end.');
    expect(out).toMatch(/Malitson/);
    expectAscii((await ask(`${LINE} --ascii`)).out);
    const spoken = (await ask(`${LINE} --linear`)).out;
    expectPage(spoken);
    expect(spoken).not.toMatch(/[\u2500-\u28ff]/);
    expect(spoken).toMatch(/n-sf11 no value/);
  });

  it('has the numbers of the one answer, and none where a medium has no data', async () => {
    const { curves } = await documentOf(LINE);
    expect(curves.map(({ medium }) => medium)).toEqual(['n-bk7', 'n-sf11', 'calcium-fluoride', 'n=1.5']);
    const csv = (await ask(`${LINE} --csv`)).out.trimEnd().split('\n');
    expect(csv).toHaveLength((curves[0]?.columns['n']?.length ?? 0) + 1);
    for (const wave of [633e-9, 1.064e-6]) {
      for (const { medium, columns } of curves) {
        const at = columns['vacuumWavelength_m']?.indexOf(wave) ?? -1;
        const { into } = JSON.parse((await ask(`air ${medium} ${wave * 1e9}nm --json`)).out);
        expect(columns['n']?.[at], `${medium} at ${wave}`).toBe(into.n);
      }
    }
    // Glass is the one that ends: 0.37 um to 2.5 um, SCHOTT data sheet of N-SF11.
    const sf11 = curves[1]?.columns;
    const inside = sf11?.['vacuumWavelength_m']?.filter((_, i) => sf11['n']?.[i] !== null) as number[];
    expect(inside[0]).toBeCloseTo(0.37e-6, 7);
    expect(inside.at(-1)).toBeCloseTo(2.5e-6, 7);
    expect(sf11?.['n']?.[0]).toBeNull();
  });

  it('is a picture of its lines', async () => {
    const file = path.join(folder, 'dispersion.svg');
    expect((await ask(`${LINE} --svg ${file}`)).status).toBe(0);
    const root = parseXml(readFileSync(file, 'utf8'));
    const lines = elementsOf(root, 'g').filter((g) => g.attributes['class'] === 'legend');
    expect(lines).toHaveLength(8);
  });

  it('runs along the frequency where the wave is one, and over the span asked for', async () => {
    const { out } = await ask('compare water ptfe 10GHz --plot wave --span 8..12GHz');
    expect(out).toMatch(/frequency \(GHz\)/);
    expect(out).toMatch(/^ +8 +9 +10 +11 +12$/m);
  });

  it('is refused for what is a chart of one question', async () => {
    const { status, err } = await ask('compare n-bk7 n-sf11 633nm --plot angle');
    expect([status, err]).toEqual([2, expect.stringContaining('write --plot wave')]);
  });
});
