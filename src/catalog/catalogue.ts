/**
 * What the rest of the program may ask of a catalogue, wherever its bytes came from (the packed file, the user's own
 * folder, a literal object in a test).
 */
import type { Axis, Material, Source } from './types.ts';

/** A name as resolved: the material and, where the name said so ("sapphire:o"), the axis. */
export interface NamedMaterial {
  readonly material: Material;
  readonly axis?: Axis;
}

export type Lookup =
  | { readonly kind: 'one'; readonly found: NamedMaterial }
  | { readonly kind: 'several'; readonly candidates: readonly Material[] }
  | { readonly kind: 'no-such-axis'; readonly material: Material; readonly axes: readonly Axis[] }
  | { readonly kind: 'none' };

export interface Catalogue {
  /** Hex digest of the content, short form. */
  readonly hash: string;
  /** Date of the catalogue's content, ISO 8601. */
  readonly date: string;
  readonly size: number;
  /** Exact resolution of KEY, name, alias, formula or glass code, any case, with optional ":axis". Never fuzzy, never the first of several. */
  lookup(name: string): Lookup;
  /** Parses at most this one material. */
  material(key: string): Material | undefined;
  keys(): readonly string[];
  source(id: string): Source | undefined;
}
