import { describe, expect, it } from 'vitest';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { readOwnFiles, withOwn } from '../../src/catalog/own.ts';
import { run } from './in-process.ts';
import { expectAscii, expectPage } from './page-shape.ts';
import { validDocument } from './schema.ts';

/** A catalogue with one own entry whose check value is this. */
function withOwnCheck(published: number) {
  const entry = {
    key: 'my-glass',
    name: 'My glass',
    fits: [
      {
        parameters: { model: 'constant', n: 1.5 },
        range_um: [0.4, 0.8],
        reference: 'air',
        source: 'my-notes',
        checks: [
          {
            source: 'notebook 3, page 7',
            recalled: false,
            independent: true,
            columns: ['wavelength_um', 'n', 'tolerance_n'],
            rows: [[0.5893, published, 0.001]],
          },
        ],
      },
    ],
    sources: [{ id: 'my-notes', type: 'manuscript', title: 'Notebook 3' }],
  };
  const bundled = catalogueFromSources();
  const own = readOwnFiles(
    [{ path: 'my-glass.json', name: 'my-glass.json', text: JSON.stringify(entry) }],
    bundled,
  );
  expect(own.problems).toEqual([]);
  return () => withOwn(bundled, own);
}

describe('verify', () => {
  it('finds every published value of the catalogue in agreement, and says how many', async () => {
    const { status, out, err } = await run(['verify']);
    expect([status, err]).toEqual([0, '']);
    expectPage(out);
    const [, tested = ''] = /All (\d+) published values agree/.exec(out) ?? [];
    expect(Number(tested)).toBeGreaterThan(3000);
    for (const grade of ['A', 'B', 'C']) expect(out).toMatch(new RegExp(`^ {2}${grade} {2}\\d+ values`, 'm'));
  });

  it('counts the same in every form', async () => {
    const document = validDocument('verify', (await run(['verify', '--json'])).out);
    expect(document['passed']).toBe(document['tested']);
    expect(document['failed']).toBe(0);
    expect(document).not.toHaveProperty('values');
    const records = (await run(['verify', '--csv'])).out.trimEnd().split('\n');
    expect(records.length - 1).toBe(Number(document['tested']) + Number(document['setAside']));
    const full = validDocument('verify', (await run(['verify', '--full', '--json'])).out);
    expect((full['values'] as unknown[]).length).toBe(records.length - 1);
  });

  it('lists every value with its source on request, in 72 columns, in ASCII where asked', async () => {
    const full = await run(['verify', '--full']);
    expectPage(full.out);
    expect(full.out).toContain('SCHOTT N-BK7 data sheet line index');
    const values = validDocument('verify', (await run(['verify', '--full', '--json'])).out)['values'];
    const lines = full.out.split('\n').filter((line) => /^ +(?:[\d.]+ [nµmk]?m|-) {2}\S/.test(line));
    expect(lines.length).toBe((values as unknown[]).length);
    expectAscii((await run(['verify', '--full', '--ascii'])).out);
  });

  it("recomputes the check values of one's own entries too", async () => {
    const good = await run(['verify', '--json'], { catalogue: withOwnCheck(1.5004) });
    const bare = await run(['verify', '--json']);
    expect(good.status).toBe(0);
    expect(JSON.parse(good.out).tested).toBe(JSON.parse(bare.out).tested + 1);
  });

  it('fails with status 1 and names the value, the fit and the source where one disagrees', async () => {
    const catalogue = withOwnCheck(1.52);
    const { status, out } = await run(['verify'], { catalogue });
    expect(status).toBe(1);
    expectPage(out);
    expect(out).toMatch(/do NOT/);
    expect(out.replace(/\s+/g, ' ')).toContain(
      'my-glass, fit-1 at 589.3 nm: n 1.52 published, 1.5000 computed; tolerance 0.001, 2000 % of it used source: notebook 3, page 7',
    );
    const json = await run(['verify', '--json'], { catalogue });
    expect(json.status).toBe(1);
    expect(validDocument('verify', json.out)['failed']).toBe(1);
    expect((await run(['verify', '--full'], { catalogue })).out).toContain('FAILS');
  });
});
