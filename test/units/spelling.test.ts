/** One spelling for what is written in several: units, screen text in ASCII, quoted input, lines of glass. */
import { describe, expect, it } from 'vitest';
import { canonicalUnit } from '../../src/units/canonical-unit.ts';
import { findUnit } from '../../src/units/find-unit.ts';
import { printedInput, quoteInput } from '../../src/units/quote-input.ts';
import { findSpectralLine, lineSpelling, namesLine, SPECTRAL_LINES } from '../../src/units/spectral-lines.ts';
import { toAscii } from '../../src/units/to-ascii.ts';

describe('a unit', () => {
  it.each<[string, string]>([
    ['nm', 'nm'],
    [' µm ', 'um'],
    ['μm', 'um'],
    ['W/cm²', 'W/cm2'],
    ['W cm^-2', 'W/cm2'],
    ['W cm**-2', 'W/cm2'],
    ['W·cm⁻²', 'W/cm2'],
    ['W ⋅ cm−2', 'W/cm2'],
    ['kW  * cm-2', 'kW/cm2'],
    ['W.cm-2', 'W/cm2'],
    ['W  /  cm2', 'W/cm2'],
    ['W⁄cm2', 'W/cm2'],
    ['W÷cm2', 'W/cm2'],
    ['mV mm-1', 'mV/mm'],
    ['V/m1', 'V/m'],
    ['°  C', '°C'],
    ['ºC', '°C'],
    ['cm  -1', 'cm-1'],
    ['″', "''"],
    ['”', '"'],
    ['′', "'"],
    ['’', "'"],
    ['Å', 'Å'],
    ['\u2126', 'Ω'],
    ['\u212a', 'K'],
    ['1/cm', '1/cm'],
    ['W/cm12', 'W/cm12'],
    ['9 W/m1', '9 W/m1'],
    ['9 W m-1', '9 W m-1'],
    ['W m-1x', 'W m-1x'],
  ])('%j is %j', (typed, unit) => {
    expect(canonicalUnit(typed)).toBe(unit);
  });

  it('of another kind is the one of the very spelling, if there is one', () => {
    expect(findUnit('mHz', ['length'])).toMatchObject({ found: 'other-kind', unit: { symbol: 'mHz' } });
    expect(findUnit('MHz', ['length'])).toMatchObject({ found: 'other-kind', unit: { symbol: 'MHz' } });
    expect(findUnit('mhZ', ['length'])).toMatchObject({ found: 'other-kind' });
    expect(findUnit('NM', ['length'])).toMatchObject({ found: 'one', unit: { symbol: 'nm' } });
    expect(findUnit('furlong', ['length'])).toEqual({ found: 'none' });
  });
});

describe('screen text in ASCII', () => {
  it.each<[string, string]>([
    ['plain\ntext', 'plain\ntext'],
    ['µm\nµm', 'um\num'],
    ['4.1 × 10⁻⁶', '4.1e-6'],
    ['2 × 10⁺¹²', '2e12'],
    ['W/m²', 'W/m2'],
    ['cm⁻¹², x¹⁰', 'cm-12, x10'],
    ['20 °C, 68 °F, 45°, 45 °', '20 degC, 68 degF, 45 deg, 45 deg'],
    ['n ± 0.1', 'n +/- 0.1'],
    ['Fabry–Pérot, Ångström, Gauß', 'Fabry-Perot, Angstrom, Gauss'],
    ['½', '?'],
    ['ﬁlm', 'film'],
    ['e\u0301', 'e'],
    ['光', '?'],
    ['λ ≤ 1, Ω', 'lambda <= 1, ohm'],
  ])('%j is %j', (shown, ascii) => {
    expect(toAscii(shown)).toBe(ascii);
  });
});

describe('quoted input', () => {
  it('is cut beyond forty characters', () => {
    const forty = 'abcdefghij'.repeat(4);
    expect(quoteInput(forty)).toBe(`"${forty}"`);
    expect(printedInput(`${forty}k`)).toBe(`${forty.slice(0, 37)}...`);
  });

  it('shows no control characters, overrides or halves of characters', () => {
    expect(printedInput('a\u001bb\u202ec\ud800d')).toBe('a?b?c?d');
  });
});

describe('a line of glass', () => {
  it('is found by every spelling of it', () => {
    for (const line of SPECTRAL_LINES) expect(findSpectralLine(` ${lineSpelling(line)} `)).toBe(line);
    expect(findSpectralLine('F-prime-line')?.symbol).toBe("F'");
    expect(findSpectralLine('f’ line')?.symbol).toBe("F'");
    expect(findSpectralLine('d-line')?.emitter).toBe('He');
    expect(findSpectralLine('D-line')?.symbol).toBe('D');
  });

  it('is nothing else', () => {
    for (const text of ['q-line', 'xd-line', 'd-lines', 'd', '', 'dline', 'd-line x-line'])
      expect(findSpectralLine(text)).toBeUndefined();
    expect(namesLine(' d-LINE ')).toBe(true);
    expect(namesLine('589 nm')).toBe(false);
  });
});
