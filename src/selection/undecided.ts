/** Why the catalogue cannot say whether a material meets a condition. Such a material is left out and counted, never guessed. */
export const UNDECIDED_WORDS = {
  'no-data-at-wave': 'no data at this wave',
  'no-transparency-on-file': 'no transparency range on file',
  'absorption-not-known': 'absorption at this wave not known',
  'no-dispersion': 'single values or straight lines: no such derivative',
  'abbe-lines-not-reached': 'no fit that gives an Abbe number',
  'one-axis-on-file': 'one crystal axis only on file at this wave',
  'not-on-file': 'the fact is not on file',
} as const;

export type UndecidedReason = keyof typeof UNDECIDED_WORDS;

export interface Undecided {
  readonly undecided: UndecidedReason;
}

export const undecided = (reason: UndecidedReason): Undecided => ({ undecided: reason });

export const isUndecided = (x: unknown): x is Undecided =>
  typeof x === 'object' && x !== null && 'undecided' in x;
