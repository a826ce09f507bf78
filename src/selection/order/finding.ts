/**
 * One remark on an order before it leaves. Levels:
 *   stop   as it stands the part cannot do its work there, or nothing on file says that it can
 *   look   to be decided, specified or asked before ordering
 *   fine   nothing in the data at hand speaks against it; never a statement that something is safe
 */
export const LEVELS = ['stop', 'look', 'fine'] as const;
export type Level = (typeof LEVELS)[number];

export const TOPICS = [
  'data',
  'transmission',
  'loss',
  'coating',
  'angle',
  'crystal',
  'temperature',
  'ghosts',
  'fringes',
  'beam',
  'humidity',
  'hazard',
  'handling',
] as const;
export type Topic = (typeof TOPICS)[number];

export interface FindingSource {
  /** `publication` of an index, `facts` of the catalogue entry, `computed` from what stands beside it, `practice` of the trade. */
  readonly kind: 'publication' | 'facts' | 'computed' | 'practice';
  readonly text: string;
  readonly doi: string | null;
}

export interface Finding {
  readonly topic: Topic;
  readonly level: Level;
  /** Key of the material it is about (a medium given by its numbers: those), or "part" for the whole. */
  readonly about: string;
  /** The reason, with its numbers. */
  readonly text: string;
  readonly source: FindingSource;
}

/** How findings call a medium. */
export const labelOf = ({ key, name }: { readonly key: string | null; readonly name: string }): string =>
  key ?? name;

export const computed = (text: string): FindingSource => ({ kind: 'computed', text, doi: null });
export const practice: FindingSource = { kind: 'practice', text: 'common practice', doi: null };
export const facts = (text: string | null): FindingSource => ({
  kind: 'facts',
  text: text ?? 'catalogue entry, source not stated',
  doi: null,
});
