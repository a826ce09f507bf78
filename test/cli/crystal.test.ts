import { describe, expect, it } from 'vitest';
import type { CrystalReport } from '../../src/answer/crystal-report.ts';
import { run } from './in-process.ts';
import { expectAscii, expectPage } from './page-shape.ts';
import { unknownKeys, validDocument } from './schema.ts';

const words = (line: string): readonly string[] => line.split(' ');

async function report(line: string): Promise<CrystalReport> {
  const { status, out, err } = await run(['crystal', ...words(line), '--json']);
  expect([status, err], line).toEqual([0, '']);
  const document = validDocument('crystal', out);
  expect(unknownKeys('crystal', document)).toEqual([]);
  return document as unknown as CrystalReport;
}

describe('halfspace crystal', () => {
  it('knows a uniaxial crystal by its principal axes, directions and faces', async () => {
    const { kind, axes, directions, faces, plates, cut } = await report('calcite 633nm --angle 30');
    expect(kind).toBe('uniaxial');
    const [no, ne] = axes.map((a) => a.n) as [number, number];
    expect(directions[0]?.n).toBeCloseTo(no, 12);
    expect(directions.at(-1)?.n).toBeCloseTo(ne, 12);
    expect(directions.map((d) => d.walkOff_rad > 0)).toEqual([false, true, true, true, true, true, false]);
    expect(faces.map((f) => [f.sWave, f.pWave])).toEqual([
      ['ordinary', 'extraordinary'],
      ['ordinary', 'extraordinary'],
      ['extraordinary', 'ordinary'],
    ]);
    expect(plates[0]?.waveplates.map((w) => w.retardance_waves)).toEqual([0.25, 0.5]);
    expect(cut).toBeNull();
  });

  it('knows a biaxial one by its three axes, its optic axes and the plates between them', async () => {
    const { kind, axes, opticAxisAngle_rad: V, plates } = await report('ktp 1064nm --thickness 1mm');
    expect(kind).toBe('biaxial');
    expect(axes.map((a) => a.axis)).toEqual(['x', 'y', 'z']);
    // Makers of KTP print 17 to 18 degrees from z at 1064 nm (common practice).
    expect((V! * 180) / Math.PI).toBeGreaterThan(16);
    expect((V! * 180) / Math.PI).toBeLessThan(19);
    expect(plates.map((p) => p.axes.join(''))).toEqual(['yz', 'xz', 'xy']);
    for (const p of plates) expect(p.retardance_waves).toBeCloseTo((p.birefringence * 1e-3) / 1064e-9, 9);
  });

  it('takes the medium in front, air where none is named', async () => {
    const air = await report('calcite 633nm');
    const water = await report('water calcite 633nm');
    expect(air.from.key).toBe('air');
    expect(water.normalReflectances[0]).toBeLessThan(air.normalReflectances[0]!);
  });

  it('takes a crystal by its numbers', async () => {
    const { axes, cut, key } = await report('vacuum no=1.6584,ne=1.4864 589nm --cut-angle 45');
    expect([key, axes.map((a) => a.n)]).toEqual([null, [1.6584, 1.4864]]);
    expect(cut?.extraordinary.n).toBeCloseTo(1.5654, 4);
  });

  it.each([
    ['fused-silica 633nm', 2, 'is isotropic'],
    ['ktp 633nm --cut-angle 3', 2, 'is biaxial'],
    ['sapphire:o 633nm', 2, 'picks a principal axis already'],
    ['gallium-nitride 633nm', 2, 'has the ordinary index only'],
    ['n=1.5 633nm', 2, 'give a uniaxial crystal by its two indices'],
    ['no=1.5 633nm', 2, 'one principal index is missing'],
    ['calcite 633nm --angle 30 --cut-angle 40 --cut-azimuth 20', 2, 'mixes s and p'],
    ['calcit 633nm', 2, 'did you mean calcite'],
    ['calcite 20um', 3, 'no data'],
    ['aluminium calcite 633nm', 3, 'no transparent medium'],
  ])('%j is refused', async (line, code, text) => {
    const { status, out, err } = await run(['crystal', ...words(line)]);
    expect([status, out]).toEqual([code, '']);
    expect(err).toContain(text);
    expect(err.split('\n').length).toBeLessThanOrEqual(3);
  });

  it('is a row a fact as CSV, with the numbers of the JSON', async () => {
    const line = 'calcite 633nm --cut-angle 45 --thickness 1mm --retardance quarter';
    const document = await report(line);
    const { status, out } = await run(['crystal', ...words(line), '--csv']);
    expect(status).toBe(0);
    const [head = [], ...rows] = out
      .trimEnd()
      .split('\n')
      .map((l) => l.split(','));
    const all = rows.map((row) => Object.fromEntries(head.map((name, i) => [name, row[i] ?? ''])));
    const of = (part: string) => all.filter((row) => row['part'] === part);
    expect(rows.every((row) => row.length === head.length)).toBe(true);
    expect(of('axis').map((row) => Number(row['n']))).toEqual(document.axes.map((a) => a.n));
    expect(of('direction').map((row) => Number(row['walkOff_rad']))).toEqual(
      document.directions.map((d) => d.walkOff_rad),
    );
    expect(of('face').map((row) => Number(row['Rp']))).toEqual(document.faces.map((f) => f.Rp));
    expect(of('cut').map((row) => row['about'])).toEqual(['ordinary', 'extraordinary', 'plate']);
    expect(Number(of('cut')[2]?.['retardance_waves'])).toBe(document.cut?.plate?.retardance_waves);
    const thinnest = document.plates[0]?.waveplates[0]?.zeroOrderThickness_m;
    expect(of('waveplate').map((row) => Number(row['thickness_m']))).toContain(thinnest);
  });

  it('is a heading, tables and lists as Markdown, with the cells of the text', async () => {
    for (const line of ['calcite 633nm --cut-angle 45 --thickness 1mm', 'ktp 1064nm']) {
      const { out } = await run(['crystal', ...words(line), '--markdown']);
      expect(out).toMatch(/^### \S/);
      const widths = (block: string): readonly number[] =>
        block.split('\n').map((l) => l.split(' | ').length);
      const tables = out.split('\n\n').filter((block) => block.startsWith('|'));
      expect(tables.length).toBeGreaterThan(4);
      for (const table of tables) expect(new Set(widths(table)).size).toBe(1);
      expectAscii((await run(['crystal', ...words(line), '--markdown', '--ascii'])).out);
    }
  });

  it('fits 72 columns, in ASCII too', async () => {
    for (const line of [
      'calcite 633nm --cut-angle 45 --thickness 1mm --retardance quarter',
      'ktp 1064nm --thickness 5mm',
      'bbo 532nm --cut-angle 22.8 --angle 10',
      'rutile 1um',
      'no=1.6584,ne=1.4864 589nm',
      'zinc-germanium-phosphide 5um',
      'potassium-niobate 860nm',
    ]) {
      const { status, out, err } = await run(['crystal', ...words(line)]);
      expect([status, err], line).toEqual([0, '']);
      expectPage(out);
      expectAscii((await run(['crystal', ...words(line), '--ascii'])).out);
    }
  });
});
