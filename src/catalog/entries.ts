/**
 * The light index of a catalogue: what lists, search and name resolution need of each material, without its fits.
 */
import type { Catalogue } from './catalogue.ts';
import { axesOf } from './choose-fit.ts';
import type { Axis, Material } from './types.ts';

export interface CatalogueEntry {
  readonly key: string;
  readonly name: string;
  readonly formula?: string;
  readonly aliases: readonly string[];
  readonly class: string;
  readonly glassCode?: string;
  readonly axes: readonly Axis[];
  /** True for entries from the user's own folder. */
  readonly own?: boolean;
}

/** A catalogue that can also list itself cheaply. */
export interface IndexedCatalogue extends Catalogue {
  /** Version of the bundled content, beside its hash and date. */
  readonly version: string;
  /** In the order of the keys, own entries last. Parses no material. */
  entries(): readonly CatalogueEntry[];
  entry(key: string): CatalogueEntry | undefined;
  /** Every spelling whose tight fold is the given one; see names.ts. */
  spellings(tight: string): readonly Spelling[];
  sourceIds(): readonly string[];
}

/** What a spelling is of its material, strongest first; codes rank with aliases. */
export type SpellingKind = 'key' | 'name' | 'alias' | 'code' | 'formula';

/** One way to write one material. */
export interface Spelling {
  readonly tight: string;
  readonly loose: string;
  readonly kind: SpellingKind;
  readonly key: string;
  readonly text: string;
}

export function entryOf(material: Material): CatalogueEntry {
  return {
    key: material.key,
    name: material.name,
    aliases: material.aliases,
    class: material.class,
    axes: axesOf(material),
    ...(material.formula === undefined ? {} : { formula: material.formula }),
    ...(material.glassCode === undefined ? {} : { glassCode: material.glassCode }),
    ...(material.own ? { own: true } : {}),
  };
}
