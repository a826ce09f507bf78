/**
 * Reference lines of optical glass, by letter; wavelengths in standard air. e, d, F, C, F', C' are the lines of ISO 7944;
 * the digits beyond its two decimals and the other lines are those that glass catalogues print (r is helium, s caesium,
 * t mercury). As waves they are written `d-line`, `F'-line` (or `F-prime-line`, which no shell needs quoted).
 */
export interface SpectralLine {
  /** `F'` with an ASCII apostrophe. */
  readonly symbol: string;
  readonly emitter: string;
  readonly airWavelength_m: number;
}

const line = (symbol: string, airWavelength_m: number, emitter: string): SpectralLine => ({
  symbol,
  emitter,
  airWavelength_m,
});

export const SPECTRAL_LINES: readonly SpectralLine[] = [
  line('i', 365.0146e-9, 'Hg'),
  line('h', 404.6561e-9, 'Hg'),
  line('g', 435.8343e-9, 'Hg'),
  line("F'", 479.9914e-9, 'Cd'),
  line('F', 486.1327e-9, 'H'),
  line('e', 546.074e-9, 'Hg'),
  line('d', 587.5618e-9, 'He'),
  line('D', 589.2938e-9, 'Na, centre of the doublet'),
  line("C'", 643.8469e-9, 'Cd'),
  line('C', 656.2725e-9, 'H'),
  line('r', 706.5188e-9, 'He'),
  line('s', 852.11e-9, 'Cs'),
  line('t', 1013.98e-9, 'Hg'),
];

/** How a line is typed as a wave. */
export function lineSpelling(lineOf: SpectralLine): string {
  return `${lineOf.symbol}-line`;
}

/** Whether the text ends in the word that all names of lines end in; anything else is a wave in figures. */
export const namesLine = (text: string): boolean => text.trim().toLowerCase().endsWith('line');

/** The line typed; undefined if the text names none. Case matters for d and D only. */
export function findSpectralLine(text: string): SpectralLine | undefined {
  if (!namesLine(text)) return undefined;
  const parts = /^(\p{L})(['\u2032\u2019]|-prime)?[- ]line$/iu.exec(text.trim());
  if (!parts) return undefined;
  const symbol = (parts[1] ?? '') + (parts[2] === undefined ? '' : "'");
  const exact = SPECTRAL_LINES.find((l) => l.symbol === symbol);
  return exact ?? SPECTRAL_LINES.find((l) => l.symbol.toLowerCase() === symbol.toLowerCase());
}
