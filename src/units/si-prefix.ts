/** The SI prefixes in use at a bench, by the letter typed (`u` for micro) and the one shown (U+00B5). */
export interface SiPrefix {
  readonly typed: string;
  readonly shown: string;
  readonly name: string;
  readonly power: number;
}

const prefix = (typed: string, name: string, power: number, shown = typed): SiPrefix => ({
  typed,
  shown,
  name,
  power,
});

export const NO_PREFIX: SiPrefix = prefix('', '', 0);

export const SI_PREFIXES: readonly SiPrefix[] = [
  prefix('a', 'atto', -18),
  prefix('f', 'femto', -15),
  prefix('p', 'pico', -12),
  prefix('n', 'nano', -9),
  prefix('u', 'micro', -6, '\u00b5'),
  prefix('m', 'milli', -3),
  NO_PREFIX,
  prefix('k', 'kilo', 3),
  prefix('M', 'mega', 6),
  prefix('G', 'giga', 9),
  prefix('T', 'tera', 12),
  prefix('P', 'peta', 15),
];
