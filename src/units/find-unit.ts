/**
 * Which unit a spelling means. The exact spelling wins; another case is accepted where only one unit of the kinds asked
 * can be meant (`ghz`, `NM`), so mHz and MHz, meV and MeV, mm and Mm are never taken for one another.
 */
import { canonicalUnit } from './canonical-unit.ts';
import type { Unit, UnitKind, UnitOf } from './unit.ts';
import { allUnits, unitsOf } from './unit-table.ts';

export type UnitLookup<Kind extends UnitKind> =
  | { readonly found: 'one'; readonly unit: UnitOf<Kind> }
  | { readonly found: 'several'; readonly readings: readonly Unit[] }
  | { readonly found: 'other-kind'; readonly unit: Unit }
  | { readonly found: 'none' };

export function findUnit<Kind extends UnitKind>(text: string, kinds: readonly Kind[]): UnitLookup<Kind> {
  const symbol = canonicalUnit(text);
  const own = kinds.flatMap((kind) => unitsOf(kind) as readonly UnitOf<Kind>[]);
  const exact = own.find((unit) => unit.symbol === symbol);
  const twin = exact?.mistakenFor && own.find((unit) => unit.symbol === exact.mistakenFor);
  if (exact) return twin ? { found: 'several', readings: [twin, exact] } : { found: 'one', unit: exact };
  const lower = symbol.toLowerCase();
  const inAnyCase = (unit: Unit): boolean => unit.symbol.toLowerCase() === lower;
  const near = own.filter(inAnyCase);
  const [first, second] = near;
  if (first) return second ? { found: 'several', readings: near } : { found: 'one', unit: first };
  const others = allUnits().filter(inAnyCase);
  const foreign = others.find((unit) => unit.symbol === symbol) ?? others[0];
  return foreign ? { found: 'other-kind', unit: foreign } : { found: 'none' };
}
