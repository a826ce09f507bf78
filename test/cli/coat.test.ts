import { describe, expect, it } from 'vitest';
import type { CoatingReport } from '../../src/answer/coating-shape.ts';
import { run } from './in-process.ts';
import { expectAscii, expectPage } from './page-shape.ts';
import { unknownKeys, validDocument } from './schema.ts';

const words = (line: string): readonly string[] => line.split(' ');

async function report(line: string): Promise<CoatingReport> {
  const { status, out, err } = await run(['coat', ...words(line), '--json']);
  expect([status, err], line).toEqual([0, '']);
  const document = validDocument('coat', out);
  expect(unknownKeys('coat', document)).toEqual([]);
  return document as unknown as CoatingReport;
}

/** R of a path as the one-shot command answers it. */
async function R(line: string): Promise<number> {
  const { out } = await run([...words(line), '--json']);
  return (JSON.parse(out) as { interface: { R: number } }).interface.R;
}

describe('halfspace coat', () => {
  it('ranks films by what they leave, and each is what the path command answers', async () => {
    const { singleFilms, bare, ideal } = await report('air n-bk7 550nm');
    expect(singleFilms.length).toBeGreaterThan(15);
    const all = singleFilms.map((f) => f.R);
    expect(all).toEqual([...all].sort((a, b) => a - b));
    expect(ideal?.n).toBeCloseTo(Math.sqrt(1.000278 * 1.518952), 5);
    expect(bare.R).toBeCloseTo(await R('air n-bk7 550nm'), 12);
    const film = singleFilms.find((f) => f.film.key === 'magnesium-fluoride-film');
    expect(film?.R).toBeCloseTo(await R('air magnesium-fluoride-film@qw n-bk7 550nm'), 12);
    // R over the spread of the process holds R itself.
    expect(film?.R_low).toBeLessThan(film!.R);
    expect(film?.R_high).toBeGreaterThan(film!.R);
  });

  it('V-coats have no reflection, in both solutions, by the path command too', async () => {
    const films = 'magnesium-fluoride-film,zinc-sulfide-film';
    const { twoLayers } = await report(`air n-bk7 600nm --films ${films}`);
    expect(twoLayers[0]?.solutions).toHaveLength(2);
    for (const { outerThickness_m: a, innerThickness_m: b } of twoLayers[0]!.solutions) {
      const path = `magnesium-fluoride-film@${a * 1e9}nm zinc-sulfide-film@${b * 1e9}nm`;
      expect(await R(`air ${path} n-bk7 600nm`)).toBeLessThan(1e-9);
    }
  });

  it('bands end where R crosses the limit', async () => {
    const { singleFilms } = await report('air fused-silica 700nm --films cryolite-film --limit 1%');
    const film = (await report('air n-bk7 700nm --films magnesium-fluoride-film --limit 1.5%'))
      .singleFilms[0]!;
    expect(singleFilms).toHaveLength(0);
    const d = `${film.thickness_m * 1e9}nm`;
    const blue = (await report('air n-bk7 560nm --films magnesium-fluoride-film --limit 1.5%'))
      .singleFilms[0]!;
    expect([blue.band?.openBelow, film.band?.openBelow, film.band?.openAbove]).toEqual([true, false, false]);
    const edge = film.band!.to_m * 1e9;
    expect(await R(`air magnesium-fluoride-film@${d} n-bk7 ${edge}nm`)).toBeCloseTo(0.015, 9);
  });

  it('of a film printed for one wave nothing but that wave is told', async () => {
    const { singleFilms } = await report('air n-bk7 550nm --films cryolite-film --limit 1%');
    expect(singleFilms[0]?.band).toEqual({ from_m: 550e-9, to_m: 550e-9, openBelow: true, openAbove: true });
    const { out } = await run(words('coat air n-bk7 550nm --films cryolite-film --limit 1%'));
    expect(out).toMatch(/cryolite-film .* 550 only\*\n/);
    expect(out).toMatch(/the data of a medium end here/);
  });

  it('reflectors: each row is the very path; the pairs needed are the fewest', async () => {
    const films = '--high tantalum-pentoxide-film --low silicon-dioxide-film';
    const { mirror } = await report(`air fused-silica 633nm ${films} --reflect 99% --pairs 6`);
    expect(mirror?.rows.map((r) => r.pairs)).toEqual([1, 2, 3, 4, 5, 6]);
    const path = (n: number) =>
      R(
        `air ${n}x: tantalum-pentoxide-film@qw silicon-dioxide-film@qw : tantalum-pentoxide-film@qw fused-silica 633nm`,
      );
    expect(mirror?.rows[3]?.R).toBeCloseTo(await path(4), 12);
    const needed = mirror?.pairsNeeded?.pairs ?? 0;
    expect(await path(needed)).toBeGreaterThanOrEqual(0.99);
    expect(await path(needed - 1)).toBeLessThan(0.99);
    for (const row of mirror!.rows) {
      expect(row.R_low).toBeLessThanOrEqual(row.R);
      expect(row.R_high).toBeGreaterThanOrEqual(row.R);
    }
  });

  it('off the normal: zero for s and for p, and the least mean for unpolarized light', async () => {
    const films = '--films magnesium-fluoride-film,zinc-sulfide-film --angle 45';
    for (const pol of ['s', 'p']) {
      const { twoLayers, ideal } = await report(`air n-bk7 600nm ${films} --pol ${pol}`);
      expect(ideal?.R).toBeLessThan(1e-12);
      for (const s of twoLayers[0]!.solutions) expect(s.R).toBeLessThan(1e-9);
    }
    const { twoLayers, bare } = await report(`air n-bk7 600nm ${films}`);
    for (const s of twoLayers[0]!.solutions) {
      expect(s.R).toBeGreaterThan(1e-5);
      expect(s.R).toBeLessThan(bare.R / 5);
    }
  });

  it('says which films were left out, and why', async () => {
    const { skipped } = await report('air n-bk7 550nm');
    expect(skipped.map((s) => s.key)).toContain('ytterbium-fluoride-film');
    const names = 'zinc-sulfide-film,gold';
    const left = (await report(`air n-bk7 1um --films ${names}`)).skipped;
    expect(left).toMatchObject([{ key: 'gold', reason: expect.stringContaining('absorbs') }]);
  });

  it('a metal has no ideal film but a better mirror', async () => {
    const { ideal, twoLayers, mirror, bare } = await report('air aluminium 550nm');
    expect([ideal, twoLayers]).toEqual([null, []]);
    expect(mirror?.extraHigh).toBe(false);
    expect(mirror?.rows[0]?.R).toBeGreaterThan(bare.R);
  });

  it.each([
    ['air n-bk7 550nm --high magnesium-fluoride-film --low zinc-sulfide-film', 2, 'is not above that of'],
    ['air n-bk7 550nm --high gold', 3, 'it absorbs'],
    ['air n-bk7 550nm --films no-such-film', 2, 'there is no medium'],
    ['air n-bk7 550nm --films n=glass', 2, 'is not a real or complex number'],
    ['air n-bk7 550nm --films a,,b', 2, 'has an empty name'],
    ['air n-bk7 550nm --reflect 100%', 2, 'no number of pairs reaches 1'],
    ['air n-bk7 550nm --pairs 0', 2, 'write a whole number from 1 to 200'],
    ['air n-bk7 550nm --limit 5', 2, 'from 0 to 1'],
    ['aluminium n-bk7 550nm', 3, 'absorbs too much'],
    ['air n-bk7 10um', 3, 'no data'],
  ])('%j is refused', async (line, code, text) => {
    const { status, out, err } = await run(['coat', ...words(line)]);
    expect([status, out]).toEqual([code, '']);
    expect(err).toContain(text);
  });

  it('fits 72 columns, and gives lines that run', async () => {
    for (const line of [
      'air n-bk7 550nm',
      'air n-bk7 633nm --angle 45 --pol p --limit 0.3%',
      'air aluminium 550nm',
      'air germanium 10.6um --films zinc-sulfide,barium-fluoride,znse --limit 1%',
    ]) {
      const { status, out, err } = await run(['coat', ...words(line)]);
      expect([status, err], line).toEqual([0, '']);
      expectPage(out);
      expectAscii((await run(['coat', ...words(line), '--ascii'])).out);
      for (const next of out.replace(/ \\\n\s+/g, ' ').match(/^ {2}halfspace (.*)$/gm) ?? []) {
        expect((await run(words(next.trim()).slice(1))).status, next).toBe(0);
      }
    }
  });

  it('CSV has a row a design, Markdown a table a kind', async () => {
    const { out } = await run(words('coat air n-bk7 550nm --csv'));
    const rows = out.trim().split('\n');
    const width = rows[0]!.split(',').length;
    for (const row of rows) expect(row.split(',')).toHaveLength(width);
    for (const kind of ['bare', 'quarter-wave', 'two-layer', 'reflector'])
      expect(rows.some((row) => row.startsWith(`${kind},`))).toBe(true);
    const { out: markdown } = await run(words('coat air n-bk7 550nm --markdown'));
    expect(markdown.match(/^\| --- /gm)).toHaveLength(3);
    expect(markdown).not.toMatch(/NaN|undefined/);
  });
});
