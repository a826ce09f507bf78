/** The index of a medium at reference lines, rounded as everywhere: n with its uncertainty, as published, k, second opinion. */
import type { ReferenceLine } from '../answer/reference-lines.ts';
import { SPEED_OF_LIGHT_m_per_s } from '../units/constants.ts';
import { HERTZ, METRE } from '../units/display-unit.ts';
import { formatNumber } from '../units/format-number.ts';
import { formatQuantity } from '../units/format-quantity.ts';
import { howKnown, precisionFor } from './known.ts';
import { indexText } from './medium-rows.ts';
import type { PresentStyle } from './shown.ts';

export interface LineRow {
  /** "d 587.5618 nm", "10 GHz"; a wavelength in air for a line with a letter, else in vacuum. */
  readonly wave: string;
  readonly n: string;
  /** In the fit's own reference; empty where that is the vacuum. */
  readonly published: string;
  /** Empty where it is 0. */
  readonly k: string;
  /** How far a second fit is off; empty where there is none. */
  readonly other: string;
}

/** More digits of k than tables print are noise. */
const K_DIGITS = 4;
const MOST_DIGITS = 8;
/** From here on the reference waves are round frequencies. */
const RADIO_FROM_m = 1e-4;

export function lineRow({ line, wave, medium }: ReferenceLine, style: PresentStyle): LineRow {
  const length = waveText(wave.wavelength_m, style);
  const known = howKnown(medium);
  const second = medium.fit?.secondOpinion ?? null;
  return {
    wave: line === null ? length : `${line} ${length}`,
    n: indexText(medium, known, style),
    published:
      medium.publishedReference === 'air'
        ? formatNumber(
            medium.n_published,
            precisionFor(medium.n_published, known.uncertainty, MOST_DIGITS),
            style,
          )
        : '',
    k: medium.k > 0 ? formatNumber(medium.k, { significant: K_DIGITS }, style) : '',
    other: second === null ? '' : signedDifference(second.difference, style),
  };
}

function waveText(wavelength_m: number, style: PresentStyle): string {
  return wavelength_m < RADIO_FROM_m
    ? formatQuantity(Number(wavelength_m.toPrecision(7)), METRE, 'shortest', { style })
    : formatQuantity(Number((SPEED_OF_LIGHT_m_per_s / wavelength_m).toPrecision(7)), HERTZ, 'shortest', {
        style,
      });
}

function signedDifference(difference: number, style: PresentStyle): string {
  if (difference === 0) return '0';
  return `${difference < 0 ? '-' : '+'}${formatNumber(Math.abs(difference), { significant: 2 }, style)}`;
}
