/**
 * How each role of text looks. Roles, not colours, are what the rest of the program names.
 * Promises: only the terminal's own foreground colours are used, never a background; everything that must be read is in
 * the default colour; taking all colours out (`PLAIN_THEME`) loses nothing, since marks, bold, underline and inverse stay.
 */
export type Role =
  | 'text'
  /** What may be read and may be missed. */
  | 'aside'
  /** A value that can be changed. */
  | 'field'
  /** The one thing the keys act on. */
  | 'focus'
  | 'cursor'
  /** The numbers people come for. */
  | 'result'
  | 'heading'
  | 'key'
  | 'boundary'
  | 'wave-from'
  | 'wave-into'
  | 'curve'
  | 'curve-other'
  | 'marker'
  | 'note'
  | 'caution'
  | 'hazard';

export interface Look {
  readonly color?: TerminalColour;
  readonly bold?: true;
  readonly underline?: true;
  readonly inverse?: true;
}

const COLOURS = ['black', 'red', 'green', 'yellow', 'blue', 'magenta', 'cyan', 'white'] as const;
export type TerminalColour = (typeof COLOURS)[number];

export type Theme = Readonly<Record<Role, Look>>;

export const PLAIN_THEME: Theme = {
  text: {},
  aside: {},
  field: { underline: true },
  focus: { inverse: true },
  // As underlined as the text it stands in: a letter typed before it costs one switch less.
  cursor: { underline: true, inverse: true },
  result: { bold: true },
  heading: { bold: true },
  key: { bold: true },
  boundary: {},
  'wave-from': {},
  'wave-into': {},
  curve: {},
  'curve-other': {},
  marker: { bold: true },
  note: {},
  caution: { bold: true },
  hazard: { bold: true, inverse: true },
};

export const COLOUR_THEME: Theme = {
  ...PLAIN_THEME,
  'wave-from': { color: 'cyan' },
  'wave-into': { color: 'magenta' },
  curve: { color: 'cyan' },
  'curve-other': { color: 'magenta' },
  caution: { bold: true, color: 'yellow' },
  hazard: { bold: true, inverse: true, color: 'yellow' },
};

/** The text in the look of its role, back to the default style at its end. */
export function paint(text: string, look: Look): string {
  const codes = lookCodes(look);
  return codes === '' || text === '' ? text : `\x1b[${codes}m${text}\x1b[0m`;
}

const known = new Map<Look, string>();

function lookCodes(look: Look): string {
  let codes = known.get(look);
  if (codes === undefined) {
    codes = [
      look.bold ? 1 : 0,
      look.underline ? 4 : 0,
      look.inverse ? 7 : 0,
      look.color ? 30 + COLOURS.indexOf(look.color) : 0,
    ]
      .filter((code) => code > 0)
      .join(';');
    known.set(look, codes);
  }
  return codes;
}
