import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { foldLoose, foldTight } from '../../src/catalog/fold.ts';

describe('folding of names', () => {
  it.each([
    ['SiO₂', 'sio2'],
    ['sio2', 'sio2'],
    ['ＳｉＯ２', 'sio2'],
    ['N-BK7', 'nbk7'],
    ['n bk 7', 'nbk7'],
    ['N‑BK7', 'nbk7'],
    ['Fused Silica', 'fusedsilica'],
    ['fused_silica.', 'fusedsilica'],
    ['β-BaB₂O₄', 'betabab2o4'],
    ['Beta-BaB2O4', 'betabab2o4'],
    ['µ-metal', 'umetal'],
    ['μ-metal', 'umetal'],
    ['Ångström', 'angstrom'],
    ['Ångström', 'angstrom'],
    ['ZERODUR®', 'zerodur'],
    ['Tl(Br,I)', 'tlbri'],
    ['KD*P', 'kd*p'],
    ['MgO:LiNbO3', 'mgo:linbo3'],
    ['CaSO4·2H2O', 'caso42h2o'],
    ['\u200bwater\u0007', 'water'],
  ])('%s is %s', (text, tight) => {
    expect(foldTight(text)).toBe(tight);
  });

  it('keeps separators apart in the loose form only', () => {
    expect(foldLoose('  N — BK7 ')).toBe('n-bk7');
    expect(foldLoose('c-Si')).not.toBe(foldLoose('CsI'));
    expect(foldTight('c-Si')).toBe(foldTight('CsI'));
  });

  it('is total, idempotent and blind to case', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string({ unit: 'binary' }), fc.string({ unit: 'grapheme' })), (text) => {
        const loose = foldLoose(text);
        expect(foldLoose(loose)).toBe(loose);
        expect(foldTight(foldTight(text))).toBe(foldTight(text));
        expect(foldTight(loose)).toBe(foldTight(text));
        expect(foldTight(text)).not.toMatch(/[\s\p{Cc}]/u);
      }),
      { numRuns: 500 },
    );
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme-ascii' }), (text) => {
        expect(foldLoose(text.toUpperCase())).toBe(foldLoose(text));
      }),
    );
  });
});
