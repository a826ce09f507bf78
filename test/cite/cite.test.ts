import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { SOURCE_TYPES } from '../../src/catalog/material-shape.ts';
import type { Source } from '../../src/catalog/types.ts';
import { bibtexEntry, bibtexKey } from '../../src/cite/bibtex.ts';
import { cite } from '../../src/cite/cite.ts';
import { bareDoi, cslItem } from '../../src/cite/csl.ts';
import { latexText } from '../../src/cite/latex-text.ts';
import { sourceText } from '../../src/cite/source-text.ts';
import { parseBibtex } from './parse-bibtex.ts';

const malitson: Source = {
  id: 'malitson-1965',
  type: 'article-journal',
  title: 'Interspecimen comparison of the refractive index of fused silica',
  author: [{ family: 'Malitson', given: 'I. H.' }],
  issued: { 'date-parts': [[1965]] },
  'container-title': 'J. Opt. Soc. Am.',
  volume: '55',
  page: '1205-1209',
  DOI: '10.1364/josa.55.001205',
};
const sheet: Source = {
  id: 'maker-2025',
  type: 'report',
  title: 'Optical glass: overview & data sheets',
  author: [{ literal: 'Glass Maker AG' }],
  issued: { 'date-parts': [[2025, 6]] },
  publisher: 'Mainz',
  URL: 'https://example.org/a_b',
  accessed: { 'date-parts': [[2026, 1, 5]] },
};

describe('a source as text', () => {
  it.each([
    [
      malitson,
      'I. H. Malitson, "Interspecimen comparison of the refractive index of fused silica", J. Opt. Soc. Am. 55, 1205-1209 (1965), https://doi.org/10.1364/josa.55.001205',
    ],
    [
      sheet,
      'Glass Maker AG, "Optical glass: overview & data sheets", Mainz (2025), https://example.org/a_b (accessed 2026-01-05)',
    ],
    [{ id: 'x', type: 'article' }, 'x'],
    [{ id: 'x', type: 'article', title: 'Two\nlines' }, '"Two lines"'],
    [
      { id: 'x', type: 'article-journal', 'container-title': 'J', volume: '5', issue: '2', page: 'A1' },
      'J 5(2), A1',
    ],
    [{ id: 'x', type: 'book', author: 'abcde'.split('').map((family) => ({ family })) }, 'a et al.'],
    [{ id: 'x', type: 'book', author: 'abcd'.split('').map((family) => ({ family })) }, 'a, b, c, d'],
  ] as readonly (readonly [Source, string])[])('%#', (source, text) => {
    expect(sourceText(source)).toBe(text);
  });
});

describe('a source as BibTeX', () => {
  it('of an article', () => {
    expect(bibtexEntry(malitson)).toBe(
      [
        '@article{malitson-1965,',
        '  author = {Malitson, I. H.},',
        '  title = {Interspecimen comparison of the refractive index of fused silica},',
        '  journal = {J. Opt. Soc. Am.},',
        '  volume = {55},',
        '  pages = {1205--1209},',
        '  year = {1965},',
        '  doi = {10.1364/josa.55.001205}',
        '}',
      ].join('\n'),
    );
  });

  it('of a report by a body, with month and address', () => {
    const [entry] = parseBibtex(bibtexEntry(sheet));
    expect(entry).toEqual({
      type: 'techreport',
      key: 'maker-2025',
      fields: {
        author: '{Glass Maker AG}',
        title: 'Optical glass: overview \\& data sheets',
        institution: 'Mainz',
        year: '2025',
        month: 'jun',
        url: 'https://example.org/a_b',
        urldate: '2026-01-05',
      },
    });
  });

  it.each([
    // Formulas, names and abbreviations keep their capitals; the first letter of the title needs no help.
    ['Index of SiO2 and KH2PO4', 'Index of {SiO2} and {KH2PO4}'],
    ['SiO₂ films by Sellmeier', '{SiO$_{2}$} films by {Sellmeier}'],
    ['Refractive index of β-BaB₂O₄', 'Refractive index of {{$\\beta$}-BaB$_{2}$O$_{4}$}'],
    ['ZnSe at 10.6 µm', '{ZnSe} at 10.6 {\\textmu}m'],
    ['A 5 % change in n_e', 'A 5 \\% change in n\\_e'],
    ['GaAs: n(T)', '{GaAs:} {n(T)}'],
    ['Über Brechung', '{\\"{U}}ber {Brechung}'],
  ])('title %s', (title, expected) => {
    expect(latexText(title, 'title')).toBe(expected);
  });

  it.each([
    ['Kröger–Łoś, É. ø', "Kr{\\\"{o}}ger--{\\L}o{\\'{s}}, {\\'{E}}. {\\o}"],
    ['Δn, Ω', '{$\\Delta$}n, {$\\Omega$}'],
    ['10⁻⁶ K⁻¹', '10$^{-6}$ K$^{-1}$'],
    ['{a} ~ "b" \\c', "{\\textbraceleft}a{\\textbraceright} {\\textasciitilde} ''b'' {\\textbackslash}c"],
  ])('text %s', (text, expected) => {
    expect(latexText(text, 'plain')).toBe(expected);
  });

  it.each([
    ['1205-1209', '1205--1209'],
    ['1205–1209', '1205--1209'],
    ['S12 - S15', 'S12--S15'],
    ['62732J', '62732J'],
    ['12-15, 20-21', '12--15, 20--21'],
  ])('pages %s', (page, expected) => {
    expect(parseBibtex(bibtexEntry({ ...malitson, page }))[0]?.fields['pages']).toBe(expected);
  });

  it('parses whatever the record holds, in printable ASCII where the letters are Latin', () => {
    const latin = fc.string({
      unit: fc.oneof(
        fc.constantFrom(...'{}\\%&$#_~^"@,=\n\t éÅøßµ₂²–αΔ'),
        fc.string({ unit: 'grapheme-ascii', minLength: 1, maxLength: 1 }),
      ),
    });
    fc.assert(
      fc.property(
        fc.array(latin, { minLength: 9, maxLength: 9 }),
        fc.constantFrom(...SOURCE_TYPES),
        (t, type) => {
          const [
            id = '',
            title = '',
            family = '',
            given = '',
            journal = '',
            volume = '',
            page = '',
            DOI = '',
            note = '',
          ] = t;
          const source: Source = {
            id: `a${id}`,
            type,
            title,
            author: [{ family, given }, { literal: note }],
            'container-title': journal,
            volume,
            page,
            DOI,
            URL: title,
            note,
          };
          const [entry, ...others] = parseBibtex(bibtexEntry(source));
          expect(others).toEqual([]);
          expect(entry?.key).toBe(bibtexKey(source));
          expect(sourceText(source)).not.toMatch(/[\n\t]/);
        },
      ),
      { numRuns: 500 },
    );
    fc.assert(
      fc.property(fc.string({ unit: fc.constantFrom(...'abAB{}\\%&$#_~^"éÅøßłµ₂²–—°×αΔ ') }), (text) => {
        expect(latexText(text, 'title')).toMatch(/^[\x20-\x7e]*$/);
      }),
    );
  });
});

describe('a source as CSL-JSON', () => {
  it('is the record itself with the DOI in its canonical form', () => {
    expect(cslItem({ ...malitson, DOI: 'https://doi.org/10.1364/JOSA.55.001205' })).toEqual(malitson);
    expect(Object.keys(cslItem({ ...malitson, extra: 1 } as Source))).not.toContain('extra');
  });
  it.each([
    ['10.1000/ABC', '10.1000/abc'],
    ['doi: 10.1000/abc', '10.1000/abc'],
    ['http://dx.doi.org/10.1000/abc', '10.1000/abc'],
  ])('%s', (doi, bare) => {
    expect(bareDoi(doi)).toBe(bare);
  });
});

describe('several sources', () => {
  it('each once, in the order given', () => {
    const all = [malitson, sheet, malitson];
    expect(cite(all, 'text').split('\n')).toHaveLength(2);
    expect(parseBibtex(cite(all, 'bibtex')).map((e) => e.key)).toEqual(['malitson-1965', 'maker-2025']);
    expect(JSON.parse(cite(all, 'csl'))).toEqual([malitson, sheet]);
    expect(cite([], 'csl')).toBe('[]');
  });
});
