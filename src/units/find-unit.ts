/**
 * Which unit a spelling means. The exact spelling wins; another case is accepted where only one unit of the kinds asked
 * can be meant (`ghz`, `NM`), so mHz and MHz, meV and MeV, mm and Mm are never taken for one another.
 */
import { canonicalUnit } from './canonical-unit.ts';
import type { Unit, UnitKind, UnitOf } from './unit.ts';
import { UNITS } from './unit-table.ts';

export type UnitLookup<Kind extends UnitKind> =
  | { readonly found: 'one'; readonly unit: UnitOf<Kind> }
  | { readonly found: 'several'; readonly readings: readonly Unit[] }
  | { readonly found: 'other-kind'; readonly unit: Unit }
  | { readonly found: 'none' };

let bySpelling: Map<string, Unit[]> | undefined;

/** Units by lower-case spelling, made at first use. */
function spellings(lower: string): readonly Unit[] {
  if (!bySpelling) {
    bySpelling = new Map();
    for (const unit of UNITS) {
      const key = unit.symbol.toLowerCase();
      const same = bySpelling.get(key);
      if (same) same.push(unit);
      else bySpelling.set(key, [unit]);
    }
  }
  return bySpelling.get(lower) ?? [];
}

export function findUnit<Kind extends UnitKind>(text: string, kinds: readonly Kind[]): UnitLookup<Kind> {
  const symbol = canonicalUnit(text);
  const all = spellings(symbol.toLowerCase());
  const own = all.filter((unit): unit is UnitOf<Kind> => kinds.some((kind) => kind === unit.kind));
  const exact = own.find((unit) => unit.symbol === symbol);
  const twin = exact && own.find((unit) => unit.symbol === exact.mistakenFor);
  if (exact) return twin ? { found: 'several', readings: [twin, exact] } : { found: 'one', unit: exact };
  const [first, second] = own;
  if (first) return second ? { found: 'several', readings: own } : { found: 'one', unit: first };
  const foreign = all.find((unit) => unit.symbol === symbol) ?? all[0];
  return foreign ? { found: 'other-kind', unit: foreign } : { found: 'none' };
}
