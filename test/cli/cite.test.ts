import { describe, expect, it } from 'vitest';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { parseBibtex } from '../cite/parse-bibtex.ts';
import { run } from './in-process.ts';
import { expectAscii, expectPage } from './page-shape.ts';
import { validDocument } from './schema.ts';

const catalogue = catalogueFromSources();

describe('cite', () => {
  it('names every work behind a medium once, with the fits it is the source of', async () => {
    const { status, out, err } = await run(['cite', 'fused-silica']);
    expect([status, err]).toEqual([0, '']);
    expectPage(out);
    const material = catalogue.material('fused-silica');
    for (const fit of material?.fits ?? []) {
      expect(out.match(new RegExp(`^${fit.source}$`, 'gm')), fit.source).toHaveLength(1);
      expect(out).toContain(`- fit ${fit.id},`);
    }
    expect(out).toContain('https://doi.org/10.1364/josa.55.001205');
  });

  it('takes several media, an axis, ids of works and what was read elsewhere', async () => {
    const { out } = await run(['cite', 'sapphire:e', 'stainless-steel', 'ciddor-1996-refractive']);
    expectPage(out);
    expect(out).toContain('Sapphire, extraordinary [sapphire]');
    expect(out).not.toContain('ordinary axis, 0.2 µm to 5 µm, second');
    expect(out).toContain('reflectance of samples in air');
    expect(out).toMatch(/facts for handling: typical, textbook/);
    expect(out).toMatch(/\nciddor-1996-refractive\n {2}P\. E\. Ciddor/);
  });

  it('gives BibTeX that a strict reader takes, and CSL-JSON of the published schema, for every medium', async () => {
    const everything = catalogue.keys();
    const bibtex = parseBibtex((await run(['cite', ...everything, '--bibtex'])).out);
    const csl = JSON.parse((await run(['cite', ...everything, '--csl'])).out) as readonly { id: string }[];
    validDocument('csl', JSON.stringify(csl));
    expect(new Set(bibtex.map((e) => e.key)).size).toBe(bibtex.length);
    expect(csl.map((item) => item.id)).toEqual(bibtex.map((e) => e.key));
    const used = new Set(
      everything.flatMap((key) => catalogue.material(key)?.fits.map((f) => f.source) ?? []),
    );
    for (const id of used)
      expect(
        csl.some((item) => item.id === id),
        id,
      ).toBe(true);
  });

  it('gives one line a work, and JSON of the published schema', async () => {
    const plain = (await run(['cite', 'bk7', 'fused-silica', '--plain'])).out.trimEnd().split('\n');
    const document = validDocument('cite', (await run(['cite', 'bk7', 'fused-silica', '--json'])).out);
    const sources = document['sources'] as readonly { id: string; text: string }[];
    expect(plain).toEqual(sources.map(({ id, text }) => `${id}\t${text}`));
    expect(document['media']).toMatchObject([{ key: 'bk7' }, { key: 'fused-silica', axis: null }]);
  });

  it('keeps to ASCII where asked, without losing a letter of CSL-JSON', async () => {
    for (const form of ['--text', '--csl', '--json', '--plain', '--bibtex'])
      expectAscii((await run(['cite', 'air', '--ascii', form])).out.replaceAll('\t', ' '));
    const item = (JSON.parse((await run(['cite', 'air', '--ascii', '--csl'])).out) as { id: string }[]).find(
      ({ id }) => id === 'bonsch-1998-measurement',
    );
    expect(JSON.stringify(item)).toContain('Bönsch');
  });

  it.each([
    ['quarts', 'there is no medium "quarts" in the catalogue; did you mean crystal-quartz?'],
    ['malitson-1965-interspecimn', 'did you mean malitson-1965-interspecimen?'],
    ['n=1.5', 'has no source'],
    ['517642', 'fits several media'],
    ['water:o', 'has no axis'],
    ['\u001b[31m', 'there is no medium "?[31m"'],
  ])('refuses %j and says what would be right', async (text, message) => {
    const { status, out, err } = await run(['cite', text]);
    expect([status, out]).toEqual([2, '']);
    expect(err).toContain(message);
    expect(err.trimEnd().split('\n')).toHaveLength(1);
  });
});
