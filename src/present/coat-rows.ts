/** Designs of coatings as cells of text: the digits of `coat`, for every face. */
import type {
  CoatingReport,
  MirrorRow,
  SingleFilmCoating,
  TwoLayerSolution,
} from '../answer/coating-shape.ts';
import type { LowReflectanceBand } from '../stack/coating.ts';
import { METRE } from '../units/display-unit.ts';
import { formatNumber } from '../units/format-number.ts';
import { columnPrefix, formatQuantity } from '../units/format-quantity.ts';
import { formatUncertain } from '../units/format-uncertain.ts';
import type { SiPrefix } from '../units/si-prefix.ts';
import type { PresentStyle } from './shown.ts';

/** Marks an end of a band at which the data of a medium end. */
export const DATA_END = '*';
export const DATA_END_NOTE = '* the data of a medium end here: the band may go on';

/** One unit for all lengths of a report: that of the wave. */
export function lengthPrefix(report: CoatingReport): SiPrefix {
  return columnPrefix([report.wave.vacuumWavelength_m], METRE);
}

/** Without its unit, four digits. */
export function lengthCell(value_m: number, prefix: SiPrefix, style: PresentStyle, digits = 4): string {
  const text = formatQuantity(value_m, METRE, { significant: digits }, { style, prefix });
  return text.slice(0, text.lastIndexOf(' '));
}

/** In per cent without the sign: two decimals, more where nearly nothing or nearly everything is reflected. */
export function percentCell(R: number | null, style: PresentStyle): string {
  if (R === null) return '-';
  const percent = 100 * R;
  if (percent > 99) {
    // As many decimals as show what is missing to 100 with two digits.
    const missing = Math.max(100 - percent, 1e-7);
    return formatNumber(percent, { decimals: Math.max(2, 1 - Math.floor(Math.log10(missing))) }, style);
  }
  if (percent < 5e-4) return '0.00';
  return formatNumber(percent, { decimals: percent < 0.1 ? 3 : 2 }, style);
}

export function indexCell({ film }: SingleFilmCoating, style: PresentStyle): string {
  return formatUncertain(film.n, film.spread || null, { significant: 4 }, style);
}

/** "498 to 622", its ends marked where data end; "550 only" where data are of that wave alone. */
export function bandCell(band: LowReflectanceBand | null, prefix: SiPrefix, style: PresentStyle): string {
  if (!band) return '-';
  if (band.from_m === band.to_m) return `${lengthCell(band.from_m, prefix, style, 3)} only${DATA_END}`;
  const low = `${band.openBelow ? DATA_END : ''}${lengthCell(band.from_m, prefix, style, 3)}`;
  return `${low} to ${lengthCell(band.to_m, prefix, style, 3)}${band.openAbove ? DATA_END : ''}`;
}

export const hasOpenBand = (report: CoatingReport): boolean =>
  [
    ...report.singleFilms.map((f) => f.band),
    ...report.twoLayers.flatMap((d) => d.solutions.map((s) => s.band)),
  ].some((b) => b && (b.openBelow || b.openAbove));

/** "1.11 to 1.43". */
export function rangeCell(
  { R_low, R_high }: Pick<TwoLayerSolution | MirrorRow, 'R_low' | 'R_high'>,
  style: PresentStyle,
): string {
  if (R_low === null || R_high === null) return '-';
  const [low, high] = [percentCell(R_low, style), percentCell(R_high, style)];
  return low === high ? low : `${low} to ${high}`;
}
