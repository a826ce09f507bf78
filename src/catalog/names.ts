/**
 * Which material a typed name means. Exact, never fuzzy, never the first of several:
 *   1. spellings that agree in the loose form beat those that agree only in the tight form ("CsI" is caesium iodide,
 *      although "c-Si", an alias of silicon, folds to the same letters);
 *   2. among these a key beats a name, a name an alias or glass code, an alias or code a formula;
 *   3. if several materials share a formula but for its case, the one typed exactly ("CO" against "Co"), since case means
 *      something in formulas and in nothing else;
 *   4. else all of them are reported.
 * A trailing ":axis" picks a crystal axis. The whole text is tried first, since names may hold a colon ("MgO:LiNbO3").
 * Where the name alone fits several materials, the axis may leave one ("SiO2:o").
 */
import type { CatalogueEntry, Spelling, SpellingKind } from './entries.ts';
import { foldLoose, foldTight } from './fold.ts';
import type { Axis, Material } from './types.ts';

export type Resolution =
  | { readonly kind: 'one'; readonly key: string; readonly axis?: Axis }
  | { readonly kind: 'several'; readonly keys: readonly string[] }
  | { readonly kind: 'no-such-axis'; readonly key: string; readonly axes: readonly Axis[] }
  | { readonly kind: 'none' };

/** What resolution needs of a catalogue. */
export interface NameSource {
  spellings(tight: string): readonly Spelling[];
  entry(key: string): CatalogueEntry | undefined;
}

/** Strength of a spelling, 0 the strongest. */
export const SPELLING_RANK: Readonly<Record<SpellingKind, number>> = {
  key: 0,
  name: 1,
  alias: 2,
  code: 2,
  formula: 3,
};

const AXIS_NAMES: Readonly<Record<string, Axis>> = {
  o: 'ordinary',
  ordinary: 'ordinary',
  e: 'extraordinary',
  extraordinary: 'extraordinary',
  x: 'x',
  y: 'y',
  z: 'z',
  iso: 'isotropic',
  isotropic: 'isotropic',
};

/** The axis a person means by `o`, `e`, `x`, `ordinary` ... in any case; undefined if none. */
export function parseAxis(text: string): Axis | undefined {
  const name = text.trim().toLowerCase();
  return Object.hasOwn(AXIS_NAMES, name) ? AXIS_NAMES[name] : undefined;
}

export function resolveName(text: string, source: NameSource): Resolution {
  const whole = matches(text, source);
  if (whole.length > 0) return oneOrSeveral(whole);
  const colon = text.lastIndexOf(':');
  if (colon < 0) return { kind: 'none' };
  const keys = matches(text.slice(0, colon), source);
  if (keys.length === 0) return { kind: 'none' };
  const axis = parseAxis(text.slice(colon + 1));
  const fitting = axis ? keys.filter((key) => source.entry(key)?.axes.includes(axis)) : [];
  const [only, second] = fitting;
  if (axis && only !== undefined && second === undefined) return { kind: 'one', key: only, axis };
  if (fitting.length > 1) return { kind: 'several', keys: inOrder(fitting, source) };
  const [key] = keys;
  if (keys.length > 1 || key === undefined) return { kind: 'several', keys: inOrder(keys, source) };
  return { kind: 'no-such-axis', key, axes: source.entry(key)?.axes ?? [] };

  function oneOrSeveral(found: readonly string[]): Resolution {
    const [first] = found;
    return found.length === 1 && first !== undefined
      ? { kind: 'one', key: first }
      : { kind: 'several', keys: inOrder(found, source) };
  }
}

/** Keys of the materials meant, by rules 1 to 3 above. */
function matches(text: string, source: NameSource): readonly string[] {
  const tight = foldTight(text);
  if (tight === '') return [];
  const all = source.spellings(tight);
  if (all.length === 0) return [];
  const loose = foldLoose(text);
  const close = all.filter((s) => s.loose === loose);
  const pool = close.length > 0 ? close : all;
  const best = Math.min(...pool.map((s) => SPELLING_RANK[s.kind]));
  const ranked = pool.filter((s) => SPELLING_RANK[s.kind] === best);
  const keys = distinct(ranked);
  if (keys.length < 2 || best !== SPELLING_RANK.formula) return keys;
  const typed = text.trim().normalize('NFKC');
  const asTyped = distinct(ranked.filter((s) => s.text.normalize('NFKC') === typed));
  return asTyped.length === 1 ? asTyped : keys;
}

const distinct = (spellings: readonly Spelling[]): readonly string[] => [
  ...new Set(spellings.map((s) => s.key)),
];

/** Bulk materials before thin films (what a bare formula means more often), then by key. */
function inOrder(keys: readonly string[], source: NameSource): readonly string[] {
  const film = (key: string) => (source.entry(key)?.class === 'thin film' ? 1 : 0);
  return [...keys].sort((a, b) => film(a) - film(b) || (a < b ? -1 : a > b ? 1 : 0));
}

/** A chemical formula names an element; words such as "glass" or "mixture" in its place name nothing. */
const FORMULA = /[A-Z]/;

/** All spellings of one material, each tight fold and kind once. */
export function spellingsOf(
  material: Pick<Material, 'key' | 'name' | 'aliases' | 'formula' | 'glassCode'>,
): Spelling[] {
  const out: Spelling[] = [];
  const seen = new Set<string>();
  const add = (text: string, kind: SpellingKind): void => {
    const tight = foldTight(text);
    if (tight === '') return;
    const id = `${SPELLING_RANK[kind]}\t${text}`;
    if (seen.has(id)) return;
    seen.add(id);
    out.push({ tight, loose: foldLoose(text), kind, key: material.key, text });
  };
  add(material.key, 'key');
  add(material.name, 'name');
  for (const alias of material.aliases) add(alias, 'alias');
  if (material.glassCode !== undefined) add(material.glassCode, 'code');
  if (material.formula !== undefined && FORMULA.test(material.formula)) add(material.formula, 'formula');
  return out;
}
