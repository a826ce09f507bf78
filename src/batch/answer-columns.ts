/**
 * What a batch can say about each row: short names for what is asked most, and every key of the flat answer (the header of
 * `--csv` of one question, such as `into.groupIndex`).
 *
 * Numbers are in SI units and of full precision; the short names of angles end in `_deg` and are in degrees.
 */
import { orList } from '../units/parse-choice.ts';
import { quoteInput } from '../units/quote-input.ts';
import { type Asking, type Trouble, trouble } from './question-column.ts';

export interface AnswerColumn {
  /** As asked for: the name of the column in the output. */
  readonly name: string;
  /** Path of the value in the answer. */
  readonly path: readonly string[];
  readonly key: string;
  /** What the value is multiplied with; 1 where it is no number. */
  readonly factor: number;
}

const DEGREES = 180 / Math.PI;

/** Short name, key of the answer, meaning; `_deg` are in degrees. Names with `R_s` for `Rs` are taken too. */
export const SHORT_NAMES: readonly (readonly [name: string, key: string, meaning: string])[] = [
  ['n1', 'from.n', 'index before the surface'],
  ['k1', 'from.k', 'extinction coefficient before the surface'],
  ['n2', 'into.n', 'index beyond it; n is the same'],
  ['k2', 'into.k', 'extinction coefficient beyond it; k is the same'],
  ['R', 'interface.R', 'reflectance for the polarization asked'],
  ['T', 'interface.T', 'transmittance for the polarization asked'],
  ['Rs', 'interface.Rs', 'reflectance, s'],
  ['Rp', 'interface.Rp', 'reflectance, p'],
  ['Ts', 'interface.Ts', 'transmittance, s'],
  ['Tp', 'interface.Tp', 'transmittance, p'],
  ['A', 'stack.A', 'absorptance of all layers'],
  ['uR', 'interface.R_uncertainty', 'standard uncertainty of R'],
  ['uT', 'interface.T_uncertainty', 'standard uncertainty of T'],
  ['u1', 'from.n_uncertainty', 'standard uncertainty of n1'],
  ['u2', 'into.n_uncertainty', 'standard uncertainty of n2'],
  ['refraction_deg', 'interface.refractionAngle_rad', 'angle of refraction; none in total reflection'],
  ['brewster_deg', 'interface.brewsterAngle_rad', 'Brewster angle'],
  ['critical_deg', 'interface.criticalAngle_rad', 'critical angle'],
  ['phase_s_deg', 'interface.phaseRs_rad', 'phase of the reflection, s'],
  ['phase_p_deg', 'interface.phaseRp_rad', 'phase of the reflection, p'],
  ['total', 'interface.totalReflection', 'true in total reflection'],
  ['loss_dB', 'interface.reflectionLoss_dB', 'reflection loss'],
  ['return_dB', 'interface.returnLoss_dB', 'return loss'],
  ['insertion_dB', 'stack.insertionLoss_dB', 'insertion loss of the layers'],
  ['ng1', 'from.groupIndex', 'group index before the surface'],
  ['ng2', 'into.groupIndex', 'group index beyond it; ng is the same'],
  ['gvd1_s2_per_m', 'from.gvd_s2_per_m', 'group-velocity dispersion before the surface'],
  ['gvd2_s2_per_m', 'into.gvd_s2_per_m', 'group-velocity dispersion beyond it'],
  ['lambda2_m', 'into.wavelength_m', 'wavelength beyond the surface'],
  ['alpha2_per_m', 'into.absorptionCoefficient_per_m', 'absorption coefficient beyond it'],
  ['wave_m', 'wave.vacuumWavelength_m', 'vacuum wavelength'],
  ['air_wave_m', 'wave.airWavelength_m', 'wavelength in standard air'],
  ['frequency_Hz', 'wave.frequency_Hz', 'frequency'],
  ['energy_eV', 'wave.photonEnergy_eV', 'photon energy'],
  ['wavenumber_per_m', 'wave.wavenumber_per_m', 'wavenumber, 1/wavelength'],
  ['cautions', 'cautions', 'codes of the cautions, with what they are about'],
];

const ALIASES: Readonly<Record<string, string>> = {
  n: 'n2',
  k: 'k2',
  ng: 'ng2',
  R_s: 'Rs',
  R_p: 'Rp',
  T_s: 'Ts',
  T_p: 'Tp',
};

export const DEFAULT_COLUMNS = [
  'n1',
  'n2',
  'k2',
  'R',
  'T',
  'Rs',
  'Rp',
  'Ts',
  'Tp',
  'refraction_deg',
] as const;

/** The columns of a list such as `n,R,into.groupIndex`; `keys` gives those of the flat answer, asked for only when needed. */
export function answerColumns(
  typed: string,
  keys: () => readonly string[],
  nearest: Asking['nearest'],
): readonly AnswerColumn[] | Trouble {
  const columns: AnswerColumn[] = [];
  for (const name of typed.split(',').map((part) => part.trim())) {
    const column = shortColumn(name) ?? (keys().includes(name) ? column1(name, name) : undefined);
    if (!column) return unknown(name, keys(), nearest);
    if (columns.some((other) => other.name === name)) {
      return trouble('column-twice', `the column ${quoteInput(name)} is asked for twice`, 'ask for it once');
    }
    columns.push(column);
  }
  return columns;
}

function shortColumn(name: string): AnswerColumn | undefined {
  const short = Object.hasOwn(ALIASES, name) ? ALIASES[name] : name;
  const row = SHORT_NAMES.find(([own]) => own === short);
  return row && column1(name, row[1], short?.endsWith('_deg') ? DEGREES : 1);
}

const column1 = (name: string, key: string, factor = 1): AnswerColumn => ({
  name,
  key,
  path: key.split('.'),
  factor,
});

function unknown(name: string, keys: readonly string[], nearest: Asking['nearest']): Trouble {
  const shorts = [...SHORT_NAMES.map(([short]) => short), ...Object.keys(ALIASES)];
  const ends = keys.filter((key) => key.toLowerCase().endsWith(`.${name.toLowerCase()}`));
  const close = [...new Set([...ends, ...nearest(name, [...shorts, ...keys])])].slice(0, 5);
  const message =
    name === '' ? 'an answer column has no name' : `there is no answer column ${quoteInput(name)}`;
  const list = 'halfspace stream --columns list shows all';
  return trouble(
    'unknown-column',
    message,
    close.length > 0 ? `did you mean ${orList(close)}? ${list}` : list,
  );
}

/** The value in a whole answer, or in a part of one; null where there is none. */
export function valueAt(answer: unknown, { path, factor }: AnswerColumn): string | number | boolean | null {
  let value: unknown = answer;
  for (const step of path) {
    if (value === null || typeof value !== 'object') return null;
    value = (value as Readonly<Record<string, unknown>>)[step];
  }
  if (typeof value === 'number') return Number.isFinite(value) ? value * factor : null;
  if (path[0] === 'cautions' && Array.isArray(value)) {
    return value.map(({ about, code }: { about: string; code: string }) => `${about}:${code}`).join(' ');
  }
  return typeof value === 'string' || typeof value === 'boolean' ? value : null;
}

/** Every key of the flat answers given, in order. */
export function keysOf(answers: readonly object[]): readonly string[] {
  const keys = new Set<string>();
  const walk = (value: unknown, path: string): void => {
    if (value !== null && typeof value === 'object') {
      for (const [key, inner] of Object.entries(value)) walk(inner, path === '' ? key : `${path}.${key}`);
    } else keys.add(path);
  };
  for (const answer of answers) {
    for (const [key, value] of Object.entries(answer)) {
      if (key === 'cautions') keys.add(key);
      else walk(value, key);
    }
  }
  return [...keys].filter((key) => ![...keys].some((other) => other.startsWith(`${key}.`)));
}
