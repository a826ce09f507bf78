import { describe, expect, it } from 'vitest';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { readOwnFiles, withOwn } from '../../src/catalog/own.ts';
import { run } from './in-process.ts';
import { expectAscii, expectPage } from './page-shape.ts';
import { validDocument } from './schema.ts';

const catalogue = catalogueFromSources();
const flat = (text: string): string => text.replace(/\s+/g, ' ');

describe('material', () => {
  it('gives the whole sheet of every material in 72 columns, in ASCII where asked, with every fit and its source', async () => {
    for (const key of catalogue.keys()) {
      const { status, out, err } = await run(['material', key]);
      expect([status, err], key).toEqual([0, '']);
      expectPage(out);
      for (const fit of catalogue.material(key)?.fits ?? []) {
        expect(out, key).toContain(`Fit ${fit.id}`);
        expect(flat(out)).toContain(`grade ${fit.grade}`);
      }
      expectAscii((await run(['material', key, '--full', '--ascii'])).out);
    }
  }, 120_000);

  it('shows what the catalogue holds of a glass', async () => {
    const { out } = await run(['material', 'n-bk7']);
    const text = flat(out);
    expect(text).toContain('maker SCHOTT AG glass code 517642');
    expect(text).toContain('range 0.3 µm to 2.5 µm confirmed over 0.3126 µm to 2.3254 µm');
    expect(text).toContain('reference index and wavelength relative to air measured at 22 °C');
    expect(text).toContain('dispersive formula of glass makers, from 20 °C');
    expect(text).toContain('grade A coefficients and an independent value both read in publications');
    // SCHOTT data sheet: n_d = 1.51680 relative to air; standard air at 587.6 nm has n = 1.000277 (Ciddor 1996).
    expect(out).toMatch(/^ +d 587\.5618 nm +1\.517220\(10\) +1\.516800 /m);
    expect(text).toContain('transparent 0.333 µm to 2.053 µm (internal transmittance of 10 mm at least 0.90');
    expect(text).toContain('absorption 21 measured values, 0.3 µm to 2.5 µm');
    expect(text).toContain('not hygroscopic');
    expect(text).toContain('resistance climatic CR 1.0, stain FR 0.0, acid SR 1.0');
    expect(text).toContain('density 2.51 g/cm³ hardness, Knoop 610');
    expect(text).toContain('expansion 7.1 × 10⁻⁶ /K (-30 to 70 °C)');
    expect(text).toContain('dn/dT 1.62 × 10⁻⁶ /K, at 0.546 µm, absolute, mean 20-40 C');
  });

  it('adds coefficients and every row of absorption on request', async () => {
    const { out } = await run(['material', 'n-bk7', '--full']);
    expectPage(out);
    expect(out).toMatch(/^ {2}poles\.1\.B +1\.03961212$/m);
    expect(out.match(/internal transmittance 0\.\d+ over 25 mm/g)).toHaveLength(21);
  });

  it('shows the reflectance of samples that have no optical constants', async () => {
    const { out } = await run(['material', 'stainless', 'steel', '(type', '300', 'series)']);
    expect(out).toContain('Reflectance of real samples: total reflectance at normal incidence');
    // NASA TN D-5353, table of stainless steel: R = 0.630 at 0.614..0.63 um.
    expect(out).toMatch(/0\.63 µm +63\.8 %/);
    expect(out.match(/\d µm +\d\d\.\d %/g)).toHaveLength(47);
  });

  it('keeps to one axis where one is named, and says how to name the others where none is', async () => {
    const both = (await run(['material', 'sapphire'])).out;
    expect(both).toContain('axes            ordinary (sapphire:o), extraordinary (sapphire:e)');
    expect(both).toContain('Index, ordinary axis');
    const one = (await run(['material', 'sapphire:e'])).out;
    expect(one).not.toContain('Index, ordinary axis');
    expect(one).toContain('Fit malitson-1972, extraordinary axis, recommended');
  });

  it('gives JSON of the published schema for every material, at the digits of the catalogue', async () => {
    for (const key of catalogue.keys()) {
      const document = validDocument('material', (await run(['material', key, '--json'])).out) as {
        material: { fits: readonly { id: string; parameters: unknown; source: string }[] };
        lines: readonly { n: number }[];
        sources: readonly { id: string }[];
      };
      const record = catalogue.material(key);
      const parameters = new Set(record?.fits.map((f) => JSON.stringify(f.parameters)));
      for (const fit of document.material.fits) {
        expect(parameters).toContain(JSON.stringify(fit.parameters));
        expect(document.sources.map((s) => s.id)).toContain(fit.source);
      }
      expect(document.material.fits).toHaveLength(record?.fits.length ?? -1);
    }
  }, 60_000);

  it('gives Markdown whose tables have as many cells in each row as in the head', async () => {
    for (const key of ['n-bk7', 'sapphire', 'stainless-steel', 'air', 'zinc-selenide']) {
      const { out } = await run(['material', key, '--markdown', '--full']);
      let columns = 0;
      for (const line of out.split('\n')) {
        const cells = line.startsWith('|') ? line.replaceAll('\\|', '').split('|').length : 0;
        if (cells > 0 && columns > 0) expect(cells, line).toBe(columns);
        columns = cells;
      }
      expect(out).toContain(`| key | \`${key}\` |`);
    }
  });

  it("shows an entry of one's own with facts that have no row of their own", async () => {
    const text = JSON.stringify({
      key: 'my-oil',
      name: 'Mein Öl',
      handling: { hygroscopic: 'no', viscosity_mPa_s: 12.5, smell: 'none' },
      fits: [
        {
          parameters: { model: 'constant', n: 1.5 },
          range_um: [0.4, 0.8],
          reference: 'air',
          source: 'my-notes',
        },
      ],
      sources: [{ id: 'my-notes', type: 'manuscript', title: 'Notebook 3' }],
    });
    const own = readOwnFiles([{ path: 'my-oil.json', name: 'my-oil.json', text }], catalogue);
    const { out } = await run(['material', 'my-oil'], { catalogue: () => withOwn(catalogue, own) });
    expectPage(out);
    expect(out).toMatch(/^ {2}entry +your own$/m);
    expect(out).toMatch(/^ {2}viscosity_mPa_s +12\.5$/m);
    expect(out).toMatch(/^ {2}source +"Notebook 3"$/m);
  });

  it.each([
    ['quarts', 'there is no medium "quarts" in the catalogue; did you mean crystal-quartz?'],
    ['n=1.5', 'is a medium given by its numbers'],
    ['517642', 'fits several media: bk7'],
    ['water:o', 'has no axis'],
  ])('refuses %j and says what would be right', async (text, message) => {
    const { status, out, err } = await run(['material', text]);
    expect([status, out]).toEqual([2, '']);
    expect(err).toContain(message);
  });
});
