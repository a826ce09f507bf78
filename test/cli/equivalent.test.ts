import { describe, expect, it } from 'vitest';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { placeOfCode } from '../../src/selection/glass-equivalents.ts';
import { run } from './in-process.ts';
import { expectAscii, expectPage } from './page-shape.ts';
import { validDocument } from './schema.ts';

interface Glass {
  readonly key: string;
  readonly maker: string | null;
  readonly n_d: number;
  readonly Vd: number;
  readonly n_d_difference: number;
  readonly Vd_difference: number;
  readonly distance_melts: number;
  readonly withinMelt: boolean;
  readonly lines: readonly { readonly n: number | null; readonly difference: number | null }[];
}

async function glasses(
  ...args: readonly string[]
): Promise<{ sought: Glass; glasses: Glass[]; bearers: Glass[] | null }> {
  const { status, out, err } = await run(['equivalent', ...args, '--json']);
  expect([status, err]).toEqual([0, '']);
  return validDocument('equivalent', out) as never;
}

describe('equivalent', () => {
  it('ranks glasses of other makers by their distance in n_d and V_d', async () => {
    const found = await glasses('n-bk7');
    expect(found.glasses.map((g) => g.key).slice(0, 3)).toEqual(['bsc7', 'h-k9l', 's-bsl7']);
    expect(found.glasses).toHaveLength(12);
    expect(found.bearers).toBeNull();
    for (const [i, glass] of found.glasses.entries()) {
      expect(glass.maker).not.toBe('SCHOTT AG');
      expect(glass.distance_melts).toBeGreaterThanOrEqual(found.glasses[i - 1]?.distance_melts ?? 0);
      expect(glass.n_d_difference).toBeCloseTo(glass.n_d - found.sought.n_d, 12);
      expect(glass.distance_melts).toBeCloseTo(
        Math.hypot(glass.n_d_difference / 5e-4, glass.Vd_difference / (0.008 * found.sought.Vd)),
        9,
      );
      // Makers' catalogues: two glasses of one code agree to the melt; neighbours do not.
      expect(glass.withinMelt).toBe(['bsc7', 'h-k9l', 's-bsl7', 'l-bsl7'].includes(glass.key));
    }
  });

  it('gives the published n_d and V_d of every glass that prints a code', async () => {
    // A code is n_d and V_d rounded: 517642. Rounding may fall either way at a half.
    const catalogue = catalogueFromSources();
    const everything = (await glasses('517642', '--within', '2')).glasses;
    expect(everything.length).toBeGreaterThan(200);
    for (const { key, n_d, Vd } of everything) {
      const code = catalogue.entry(key)?.glassCode;
      if (code === undefined) continue;
      const place = placeOfCode(code);
      expect(Math.abs(n_d - place.n_d), key).toBeLessThanOrEqual(0.00051);
      expect(Math.abs(Vd - place.Vd), key).toBeLessThanOrEqual(0.06);
    }
  });

  it('lists all glasses that bear a code before their neighbours', async () => {
    const found = await glasses('517642');
    expect(found.bearers?.map((g) => g.key).sort()).toEqual(['bk7', 'bsc7', 'h-k9l', 'n-bk7']);
    expect(found.glasses.map((g) => g.key)).not.toContain('n-bk7');
    const { out } = await run(['equivalent', '517642.251']);
    expectPage(out);
    expect(out).toContain('Code 517642: n_d 1.517, V_d 64.2; 4 glasses of the catalogue bear it');
    expect((await run(['equivalent', '518001'])).out).toContain('no glass of the catalogue bears it');
  });

  it('keeps to a maker, a greatest difference and a range of V_d where asked', async () => {
    for (const { maker } of (await glasses('n-sf11', '--maker', 'ohara')).glasses)
      expect(maker).toBe('OHARA Corporation');
    const near = await glasses('n-sf11', '--within', '0.02', '--abbe', '20..30');
    expect(near.glasses.length).toBeGreaterThan(0);
    for (const { n_d_difference, Vd } of near.glasses) {
      expect(Math.abs(n_d_difference)).toBeLessThanOrEqual(0.02);
      expect(Vd >= 20 && Vd <= 30).toBe(true);
    }
    const none = await run(['equivalent', 'n-bk7', '--within', '0.0000001']);
    expect([none.status, none.out]).toEqual([
      0,
      expect.stringContaining('No glass of other makers is as near as asked.'),
    ]);
  });

  it('tells n off the d line where both fits reach', async () => {
    const { sought, glasses: list } = await glasses('n-bk7');
    for (const { lines } of list) {
      for (const [i, { n, difference }] of lines.entries()) {
        if (n === null) expect(difference).toBeNull();
        else expect(difference).toBeCloseTo(n - (sought.lines[i]?.n ?? Number.NaN), 12);
      }
    }
    expect(list.find((g) => g.key === 'h-k9l')?.lines.at(-1)?.n).toBeNull();
  });

  it.each(['n-bk7', 'n-sf11', '517642', 'fused silica', '001291', 'n-lasf46b', 'polycarbonate'])(
    'fits 72 columns and ASCII for %s',
    async (glass) => {
      const { status, out } = await run(['equivalent', glass]);
      expect(status).toBe(0);
      expectPage(out);
      expectAscii((await run(['equivalent', glass, '--ascii'])).out);
      const csv = (await run(['equivalent', glass, '--csv'])).out.trimEnd().split('\n');
      const shown = out.split('\n').filter((line) => /^[* ] [a-z0-9-]+ +\S+ +(\d{6}|-) /.test(line));
      expect(csv.length - 1).toBe(shown.length);
    },
  );

  it.each([
    [['sapphire'], 3, 'has no n_d and V_d'],
    [['gold'], 3, 'has no n_d and V_d'],
    [['n=1.5'], 2, 'is a medium given by its numbers'],
    [['nbk77'], 2, 'did you mean'],
    [['n-bk7', '--maker', 'acme'], 2, 'makers are CDGM Glass Company, HOYA Corporation'],
    [['n-bk7', '--within', '-1'], 2, '--within'],
  ])('refuses %j with status %i', async (args, status, message) => {
    const outcome = await run(['equivalent', ...args]);
    expect([outcome.status, outcome.out]).toEqual([status, '']);
    expect(outcome.err).toContain(message);
  });
});

describe('a code of six digits', () => {
  it.each([
    ['517642', 1.517, 64.2],
    ['001291', 2.001, 29.1],
    ['022291', 2.022, 29.1],
    ['437951', 1.437, 95.1],
  ])('%s stands for n_d %f, V_d %f', (code, n_d, Vd) => {
    const place = placeOfCode(code);
    expect(place.n_d).toBeCloseTo(n_d, 12);
    expect(place.Vd).toBeCloseTo(Vd, 12);
  });
});
