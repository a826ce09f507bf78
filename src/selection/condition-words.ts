/** Criteria in words, one phrase a condition: "n 1.37 to 1.39", "clear 3 um to 5 um", "not toxic". */
import type { WaveSpec } from '../answer/question.ts';
import { CELSIUS, METRE } from '../units/display-unit.ts';
import { formatNumber } from '../units/format-number.ts';
import { formatQuantity, formatRange } from '../units/format-quantity.ts';
import { ASCII, type NumberStyle } from '../units/number-style.ts';
import type { Criteria, RangeMeasure } from './criteria.ts';
import { rangeWords, type ValueRange } from './value-range.ts';

/** "633 nm in vacuum"; a line, a frequency or an energy is given as typed too. */
export function waveWords({ wavelength_m, inAir, text }: WaveSpec, style: NumberStyle = ASCII): string {
  const length = formatQuantity(Number(wavelength_m.toPrecision(9)), METRE, 'shortest', { style });
  const otherwise = /-line$|Hz|eV|-1$|\//iu.test(text) ? `${text}, ` : '';
  return `${otherwise}${length} in ${inAir ? 'air' : 'vacuum'}`;
}

const MEASURE_WORDS: Readonly<Record<RangeMeasure, string>> = {
  n: 'n',
  groupIndex: 'group index',
  gvd_s2_per_m: 'GVD',
  birefringence: 'birefringence',
  abbe: 'V_d',
};

export function measureWords(measure: RangeMeasure, range: ValueRange, style: NumberStyle = ASCII): string {
  if (measure !== 'gvd_s2_per_m') return `${MEASURE_WORDS[measure]} ${rangeWords(range)}`;
  const show = (value: number): string => String(Number((value * 1e27).toPrecision(12)));
  return `${MEASURE_WORDS[measure]} ${rangeWords(range, show)} ${style.ascii ? 'fs2' : 'fs²'}/mm`;
}

export function clearWords([from_m, to_m]: readonly [number, number], style: NumberStyle = ASCII): string {
  const tidy = (x: number): number => Number(x.toPrecision(7));
  if (from_m === to_m) return `clear at ${formatQuantity(tidy(from_m), METRE, 'shortest', { style })}`;
  return `clear ${formatRange([tidy(from_m), tidy(to_m)], METRE, 'shortest', { style })}`;
}

export function lossWords(
  maxLoss: number,
  thickness_m: number | undefined,
  style: NumberStyle = ASCII,
): string {
  const limit = `${formatNumber(Number((maxLoss * 100).toPrecision(6)), 'shortest', style)} %`;
  return thickness_m === undefined
    ? `loss up to ${limit} at one surface`
    : `loss up to ${limit} through ${formatQuantity(thickness_m, METRE, 'shortest', { style })}`;
}

function temperatureWords(temperature_K: number, style: NumberStyle): string {
  const celsius = Number((temperature_K - 273.15).toPrecision(9));
  return `all at ${formatQuantity(celsius, CELSIUS, 'shortest', { style })}`;
}

/** All but the wave, which faces name in a place of its own. */
export function conditionWords(criteria: Criteria, style: NumberStyle = ASCII): readonly string[] {
  const { words, ranges, clear_m, classes, not, maxLoss, thickness_m, temperature_K } = criteria;
  return [
    ...(words.length > 0 ? [words.map((word) => `"${word}"`).join(' ')] : []),
    ...(Object.entries(ranges) as [RangeMeasure, ValueRange][]).map(([m, range]) =>
      measureWords(m, range, style),
    ),
    ...(clear_m ? [clearWords(clear_m, style)] : []),
    ...(maxLoss === undefined ? [] : [lossWords(maxLoss, thickness_m, style)]),
    ...(classes.length > 0 ? [`class ${classes.join(' or ')}`] : []),
    ...not.map((x) => `not ${x.kind === 'class' ? x.text : x.property}`),
    ...(temperature_K === undefined || !criteria.wave ? [] : [temperatureWords(temperature_K, style)]),
  ];
}
