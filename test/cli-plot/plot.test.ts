/** `--plot`: charts that fit and can be read anywhere, their points for programs, pictures for the notebook. */
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { run } from '../cli/in-process.ts';
import { expectAscii, expectPage } from '../cli/page-shape.ts';
import { validDocument } from '../cli/schema.ts';
import { elementsOf, parseXml } from '../plot/parse-xml.ts';

const UTF8 = { env: { LANG: 'C.UTF-8' } };
const ask = (line: string) => run(line.split(' '), UTF8);

const folder = mkdtempSync(path.join(tmpdir(), 'halfspace-plot-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const LINES: readonly string[] = [
  'n-bk7 air 633nm --angle 30 --plot angle',
  'air gold 633nm --plot angle --span 40deg..80deg',
  'air fused-silica 633nm --plot wave',
  'air germanium 10.6um --plot wave --span 1..20um',
  'vacuum eps=9.8,tand=0.0003@3mm vacuum 10GHz --plot wave --span 8..12GHz',
  'air 8x: n=2.3@qw n=1.46@qw : n-bk7 633nm --angle 30 --pol p --plot wave --span 500nm..800nm',
  'air 8x: n=2.3@qw n=1.46@qw : n-bk7 633nm --plot field',
  'n-bk7 air 633nm --angle 45 --plot field',
];

interface PlotDocument {
  readonly marks: { readonly brewsterAngle_rad: number; readonly criticalAngle_rad: number };
  readonly curves: readonly {
    readonly kind: string;
    readonly columns: Readonly<Record<string, readonly (number | null)[]>>;
    readonly outsideData?: readonly { readonly from_m: number; readonly to_m: number }[];
  }[];
}

const documentOf = async (line: string): Promise<PlotDocument> =>
  validDocument('plot', (await ask(`${line} --json`)).out) as unknown as PlotDocument;

describe.each(LINES)('%s', (line) => {
  it('is a page of 72 columns with question, result, sources, without escape codes', async () => {
    const { status, out, err } = await ask(line);
    expect([status, err]).toEqual([0, '']);
    expectPage(out);
    expect(out).toMatch(/[\u2800-\u28ff]/);
    expect(out).toMatch(/^Here: .*R(?:_[sp])? = /m);
  });

  it('is in ASCII where asked, or where the locale has no more', async () => {
    const ascii = await ask(`${line} --ascii`);
    expectAscii(ascii.out);
    expectPage(ascii.out);
    expect(ascii.out).toMatch(/\+-[-+]+\n/);
  });

  it('is a sentence and a table for those who hear it', async () => {
    const { out } = await ask(`${line} --linear`);
    expectPage(out);
    expect(out).not.toMatch(/[\u2500-\u28ff]/);
    const variable = out
      .replace(/\n {2}/g, ' ')
      .match(/^(?:angle of incidence|wavelength in vacuum|frequency|depth behind the first face) -?[\d.]+/gm);
    expect(variable?.length ?? 0).toBeGreaterThan(6);
    const spoken = await run(line.split(' '), { env: { LANG: 'C.UTF-8', ACCESSIBLE: '1' } });
    expect(spoken.out).toBe(out);
  });

  it('has one set of points in JSON and CSV', async () => {
    const { curves } = await documentOf(line);
    const [first] = curves;
    const columns = Object.entries(first?.columns ?? {});
    const count = columns[0]?.[1].length ?? 0;
    expect(count).toBeGreaterThan(50);
    for (const { columns: own } of curves)
      expect(new Set(Object.values(own).map((column) => column.length)).size).toBe(1);
    const rows = (await ask(`${line} --csv`)).out
      .trimEnd()
      .split('\n')
      .map((row) => row.split(','));
    const [header = [], ...body] = rows;
    expect(body.length).toBe(count);
    columns.forEach(([name, values], j) => {
      expect(header[j]).toBe(name);
      expect(body.map((row) => row[j])).toEqual(values.map((value) => (value === null ? '' : String(value))));
    });
    expect(new Set(body.map((row) => row.length))).toEqual(new Set([header.length]));
  });

  it('has a Markdown table and plain lines', async () => {
    const markdown = (await ask(`${line} --markdown`)).out;
    expect(markdown.match(/^\| .* \|$/gm)?.length).toBeGreaterThan(8);
    const plain = (await ask(`${line} --plain`)).out;
    expect(plain).not.toMatch(/[\u2500-\u28ff\u001b]/);
    expectAscii((await ask(`${line} --plain --ascii`)).out);
    expectAscii((await ask(`${line} --markdown --ascii`)).out);
    expectAscii((await ask(`${line} --json --ascii`)).out);
  });

  it('is a well-formed picture with axes, legend and sources', async () => {
    const file = path.join(folder, 'chart.svg');
    const { status, out } = await ask(`${line} --svg ${file}`);
    expect([status, out]).toEqual([0, (await ask(line)).out]);
    const svg = readFileSync(file, 'utf8');
    const root = parseXml(svg);
    expect(root.name).toBe('svg');
    expect(Number(root.attributes['width'])).toBe(800);
    expect(elementsOf(root, 'g', 'axes').length).toBeGreaterThan(0);
    expect(elementsOf(root, 'g', 'series').length).toBeGreaterThan(0);
    expect(elementsOf(root, 'g', 'legend').length).toBe(
      elementsOf(root, 'g', 'series').length + hatchLabels(svg),
    );
    const text = root.text.replace(/\s+/g, ' ');
    expect(text).toMatch(/halfspace 0\.1\.0, catalogue [0-9a-f]{12}/);
    expect(text).toMatch(/(?:°|%|nm|µm|GHz)\)/);
    if (!/^vacuum/.test(line)) expect(text).toContain('Applied Optics');
    expect(svg).not.toMatch(/NaN|Infinity|undefined/);
    expect((await ask(`${line} --svg -`)).out).toBe(svg);
  });
});

/** Labels of hatching in the legend: one a panel and medium. */
function hatchLabels(svg: string): number {
  const panels = svg.split('<defs>').slice(1);
  return panels.reduce((sum, panel) => sum + (panel.match(/<g class="legend"><rect/g)?.length ?? 0), 0);
}

describe('--plot angle', () => {
  it('marks Brewster and critical angle where R_p vanishes and R reaches 1', async () => {
    const { out } = await ask('n-bk7 air 633nm --plot angle');
    expect(out).toContain('Brewster 33.43°');
    expect(out).toContain('critical 41.30°');
    const { marks, curves } = await documentOf('n=1.5 vacuum 633nm --plot angle');
    const { incidenceAngle_rad: angle = [], Rs = [], Rp = [] } = curves[0]?.columns ?? {};
    expect(Rp[angle.indexOf(marks.brewsterAngle_rad)]).toBeLessThan(1e-12);
    angle.forEach((a, i) => {
      if ((a ?? 0) > marks.criticalAngle_rad) expect(Rs[i]).toBe(1);
    });
  });

  it('agrees with the answer at the question', async () => {
    const answer = JSON.parse((await ask('air n-bk7 633nm --angle 60 --json')).out);
    const { curves } = await documentOf('air n-bk7 633nm --angle 60 --plot angle');
    const { incidenceAngle_rad: angle = [], Rs = [], Tp = [] } = curves[0]?.columns ?? {};
    const i = angle.indexOf(answer.geometry.incidenceAngle_rad);
    expect([Rs[i], Tp[i]]).toEqual([answer.interface.Rs, answer.interface.Tp]);
  });
});

describe('--plot wave', () => {
  it('hatches what is outside the data and draws nothing there', async () => {
    const line = 'vacuum fused-silica 633nm --plot wave --span 100nm..500nm';
    const { out } = await ask(line);
    expect(out).toContain('outside data: Fused silica');
    const { curves } = await documentOf(line);
    const [powers, index] = curves;
    const { vacuumWavelength_m: wave = [], R = [] } = powers?.columns ?? {};
    const [range] = powers?.outsideData ?? [];
    const end = range?.to_m ?? 0;
    const at = async (wavelength_m: number) => (await ask(`vacuum fused-silica ${wavelength_m}m`)).status;
    expect([await at(end), await at(end * (1 - 1e-9))]).toEqual([0, 3]);
    wave.forEach((at, i) => {
      expect(R[i] === null, String(at)).toBe((at ?? 0) < end);
    });
    expect(index?.columns['n']?.[0]).toBeNull();
  });

  it('agrees with the answer at the question, and runs along the frequency where that is asked for', async () => {
    const answer = JSON.parse((await ask('air fused-silica 633nm --json')).out);
    const { curves } = await documentOf('air fused-silica 633nm --plot wave --span 400..700nm');
    const { vacuumWavelength_m: wave = [], R = [], T = [] } = curves[0]?.columns ?? {};
    const i = wave.indexOf(answer.wave.vacuumWavelength_m);
    expect(R[i]).toBe(answer.interface.R);
    expect(T[i]).toBe(answer.interface.T);
    expect((await ask('vacuum eps=4 10GHz --plot wave')).out).toContain('frequency (GHz)');
    expect((await ask('vacuum eps=4 10GHz --plot wave --span 1cm..5cm')).out).toContain(
      'wavelength in vacuum',
    );
  });
});

describe('what cannot be drawn', () => {
  it.each([
    ['air n=1.5 633nm --span 1..2', 'says nothing without --plot'],
    ['air n=1.5 633nm --svg x.svg', 'says nothing without --plot'],
    ['air n=1.5 633nm --plot angel', 'is not a plot'],
    ['air n=1.5 633nm --plot wave --span 400nm', 'is no span'],
    ['air n=1.5 633nm --plot wave --span 400..700', '--span:'],
    ['air n=1.5 633nm --plot wave --span 500nm..500nm', 'are the same'],
    ['air n=1.5 633nm --plot angle --span 10..95', '--span:'],
    ['air n=1.5 633nm --plot angle --span 10nm..20nm', '--span:'],
    ['air n=1.5 633nm --plot field --span 10..20', '--span says nothing to --plot field'],
  ])('%s', async (line, reason) => {
    const { status, out, err } = await ask(line);
    expect([status, out]).toEqual([2, '']);
    expect(err).toContain(reason);
    expect(err.trimEnd().split('\n').length).toBeLessThanOrEqual(3);
  });

  it('is refused with status 3 where the data say nothing, and 4 where the picture has no place', async () => {
    const incoherent = await ask('air fused-silica@5mm air 633nm --plot field');
    expect([incoherent.status, incoherent.out]).toEqual([3, '']);
    const file = path.join(folder, 'missing', 'chart.svg');
    const nowhere = await ask(`air n=1.5 633nm --plot angle --svg ${file}`);
    expect([nowhere.status, nowhere.out]).toEqual([4, '']);
    expect(nowhere.err).toContain('cannot be written');
    expect(existsSync(file)).toBe(false);
  });
});
