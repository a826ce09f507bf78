import { describe, expect, it } from 'vitest';
import { canonicalUnit } from '../../src/units/canonical-unit.ts';
import { decimalOf } from '../../src/units/decimal.ts';
import { findUnit } from '../../src/units/find-unit.ts';
import { allUnits } from '../../src/units/unit-table.ts';

const UNITS = allUnits();

describe('the table of units', () => {
  it('has no spelling twice, and each in its canonical form', () => {
    const symbols = UNITS.map((unit) => unit.symbol);
    expect(new Set(symbols).size).toBe(symbols.length);
    for (const symbol of symbols) expect(canonicalUnit(symbol)).toBe(symbol);
  });

  it('has no two kinds that differ only by case, so a wrong case cannot change the kind', () => {
    const kindOf = new Map<string, string>();
    for (const unit of UNITS) {
      const lower = unit.symbol.toLowerCase();
      expect(kindOf.get(lower) ?? unit.kind, unit.symbol).toBe(unit.kind);
      kindOf.set(lower, unit.kind);
    }
  });

  it('finds each unit by its exact spelling, but for those nearly always meant otherwise', () => {
    for (const unit of UNITS) {
      const lookup = findUnit(unit.symbol, [unit.kind]);
      if (unit.mistakenFor === undefined) expect(lookup).toEqual({ found: 'one', unit });
      else
        expect(lookup).toMatchObject({
          found: 'several',
          readings: [{ symbol: unit.mistakenFor }, { symbol: unit.symbol }],
        });
    }
  });

  it('scales units of the same name alike and prefixes by their power', () => {
    const value = (symbol: string) => UNITS.find((unit) => unit.symbol === symbol)?.toSI(decimalOf(7));
    expect(value('nm')).toBe(7e-9);
    expect(value('um')).toBe(value('micron'));
    expect(value('Å')).toBe(7e-10);
    expect(value('cm-1')).toBe(700);
    expect(value('/cm')).toBe(value('1/cm'));
    expect(value('mW/cm2')).toBe(70);
    expect(value('kV/mm')).toBe(7e6);
    expect(value('mS/cm')).toBe(0.7);
  });
});

describe('spellings of one unit', () => {
  it.each<[string, string]>([
    ['W/m²', 'W/m2'],
    ['W / m^2', 'W/m2'],
    ['W·m⁻²', 'W/m2'],
    ['W m-2', 'W/m2'],
    ['W*m**-2', 'W/m2'],
    ['V m⁻¹', 'V/m'],
    ['cm⁻¹', 'cm-1'],
    ['cm^-1', 'cm-1'],
    ['cm −1', 'cm-1'],
    ['\u00b5m', 'um'],
    ['\u03bcm', 'um'],
    ['\u212b', '\u00c5'],
    ['° C', '°C'],
    ['ºC', '°C'],
    ['℃', '°C'],
    ['\u212a', 'K'],
    ['″', "''"],
    ['㎚', 'nm'],
  ])('%j is %j', (typed, canonical) => {
    expect(canonicalUnit(typed)).toBe(canonical);
  });
});
