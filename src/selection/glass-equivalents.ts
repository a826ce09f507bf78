/**
 * Glasses that may stand in for one: by n_d and V_d, each difference measured by the usual tolerance of a melt (0.0005 in
 * n_d, 0.8 % in V_d, as makers deliver from stock; common practice). What else differs (index away from the d line,
 * transmittance, temperature, chemistry) is for the person to look at; indices at further lines are given for that. Pure.
 */
import type { Material } from '../catalog/types.ts';
import { airToVacuum_um } from '../dispersion/air-index.ts';
import { SPECTRAL_LINES } from '../units/spectral-lines.ts';
import { abbeNumbers } from './abbe-numbers.ts';
import { indexOf, quickMedium } from './quick-medium.ts';
import type { Survey } from './survey.ts';
import { type ValueRange, within } from './value-range.ts';

export const MELT_n_d = 0.0005;
/** Relative. */
export const MELT_Vd = 0.008;

/** Blue, near infrared, and beyond the telecommunication band: where glasses of one code part. Wavelengths in air. */
export const FURTHER_LINES: readonly { readonly label: string; readonly airWavelength_m: number }[] = [
  { label: 'g', airWavelength_m: lineOf('g') },
  { label: 't', airWavelength_m: lineOf('t') },
  // Mercury, as glass catalogues print it.
  { label: '1529.6 nm', airWavelength_m: 1529.582e-9 },
];

function lineOf(symbol: string): number {
  return SPECTRAL_LINES.find((line) => line.symbol === symbol)?.airWavelength_m ?? Number.NaN;
}

/** A glass by what its name is chosen for. Indices are relative to air at wavelengths in air. */
export interface GlassPlace {
  readonly n_d: number;
  readonly Vd: number;
  /** At FURTHER_LINES; null where the fit does not reach, or only a code is known. */
  readonly further: readonly (number | null)[];
}

export interface Equivalent {
  readonly material: Material;
  readonly place: GlassPlace;
  /** Of this glass less the one sought. */
  readonly difference: GlassPlace;
  /** Length of the difference in tolerances of a melt. */
  readonly distance: number;
  readonly withinMelt: boolean;
}

export interface EquivalentQuery {
  /** Left out, whatever they are. */
  readonly except: (material: Material) => boolean;
  /** Greatest difference of n_d; the `limit` nearest where absent. */
  readonly within_n_d?: number | undefined;
  readonly Vd?: ValueRange | undefined;
  readonly limit: number;
}

/** Undefined where the medium has no n_d or no V_d: a crystal, a film, an absorber, or no data at the lines. */
export function glassPlace(survey: Survey, material: Material): GlassPlace | undefined {
  const { n_d, Vd } = abbeNumbers(survey, material, 'isotropic');
  if (n_d === null || Vd === null) return undefined;
  const further = FURTHER_LINES.map(({ airWavelength_m }) => {
    const air_um = Number((airWavelength_m * 1e6).toPrecision(9));
    const wave = { air_um, vacuum_um: airToVacuum_um(air_um) };
    const medium = quickMedium(survey, material, 'isotropic', wave);
    return medium ? indexOf(medium.fit, medium.bound, wave) / (wave.vacuum_um / wave.air_um) : null;
  });
  return { n_d, Vd, further };
}

/** Codes give n_d - 1 in thousandths without the figure of 1: from here down it was left out, since no glass is so low. */
const LOWEST_THOUSANDTHS = 300;

/** The n_d and V_d that a code of six digits stands for: 517642 is 1.517 and 64.2, 001291 is 2.001 and 29.1. */
export function placeOfCode(code: string): GlassPlace {
  const thousandths = Number(code.slice(0, 3));
  return {
    n_d: (thousandths + (thousandths < LOWEST_THOUSANDTHS ? 2000 : 1000)) / 1000,
    Vd: Number(code.slice(3, 6)) / 10,
    further: FURTHER_LINES.map(() => null),
  };
}

/** The optical glasses of the catalogue, the nearest first; equals in the order of their keys. */
export function glassEquivalents(
  survey: Survey,
  sought: GlassPlace,
  { except, within_n_d, Vd, limit }: EquivalentQuery,
): readonly Equivalent[] {
  const found = survey.materials.flatMap((material): readonly Equivalent[] => {
    if (material.class !== OPTICAL_GLASS || except(material)) return [];
    const place = glassPlace(survey, material);
    return place ? [compare(material, place, sought)] : [];
  });
  const asked = found.filter(
    ({ place, difference }) =>
      (within_n_d === undefined || within({ from: -within_n_d, to: within_n_d }, difference.n_d)) &&
      (Vd === undefined || within(Vd, place.Vd)),
  );
  const sorted = asked.sort((a, b) => a.distance - b.distance || (a.material.key < b.material.key ? -1 : 1));
  return within_n_d === undefined ? sorted.slice(0, limit) : sorted;
}

export const OPTICAL_GLASS = 'optical glass';

export function compare(material: Material, place: GlassPlace, sought: GlassPlace): Equivalent {
  const difference: GlassPlace = {
    n_d: place.n_d - sought.n_d,
    Vd: place.Vd - sought.Vd,
    further: place.further.map((n, i) => {
      const other = sought.further[i] ?? null;
      return n === null || other === null ? null : n - other;
    }),
  };
  const byMelt = [difference.n_d / MELT_n_d, difference.Vd / (MELT_Vd * sought.Vd)] as const;
  return {
    material,
    place,
    difference,
    distance: Math.hypot(...byMelt),
    withinMelt: byMelt.every((part) => Math.abs(part) <= 1),
  };
}

/** Makers of the optical glasses in the catalogue, each once, in alphabetical order. */
export function glassMakers(survey: Survey): readonly string[] {
  const makers = survey.materials.flatMap((m) => (m.class === OPTICAL_GLASS && m.maker ? [m.maker] : []));
  return [...new Set(makers)].sort();
}
