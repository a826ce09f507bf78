/** The axis that a wave runs along: the wavelength in vacuum or, where the person thinks in it, the frequency. */
import type { Answer } from '../answer/answer.ts';
import { SPEED_OF_LIGHT_m_per_s as c } from '../units/constants.ts';
import { HERTZ, METRE, prefixedSymbol } from '../units/display-unit.ts';
import { columnPrefix, formatQuantity } from '../units/format-quantity.ts';
import type { ChartAxis, ChartMark } from './chart.ts';

export type WaveQuantity = 'wavelength' | 'frequency';

export interface WaveAxis {
  readonly chart: ChartAxis;
  readonly shown: (wavelength_m: number) => number;
  /** At a wave, named by it. */
  readonly at: (wavelength_m: number) => ChartMark;
  /** Where the question stands. */
  readonly mark: (answer: Answer) => ChartMark;
}

/** Wider spans than this ratio are shown by equal ratios. */
const LINEAR_UP_TO = 4;

export function waveAxis(span_m: readonly [number, number], quantity: WaveQuantity): WaveAxis {
  const isFrequency = quantity === 'frequency';
  const unit = isFrequency ? HERTZ : METRE;
  const si = (wavelength_m: number): number => (isFrequency ? c / wavelength_m : wavelength_m);
  const prefix = columnPrefix(span_m.map(si), unit);
  // Positive powers of ten are exact, negative ones are not.
  const shown = (wavelength_m: number): number =>
    prefix.power < 0 ? si(wavelength_m) * 10 ** -prefix.power : si(wavelength_m) / 10 ** prefix.power;
  const [low, high] = span_m;
  const at = (wavelength_m: number): ChartMark => ({
    x: shown(wavelength_m),
    label: formatQuantity(Number(si(wavelength_m).toPrecision(6)), unit, 'shortest'),
  });
  return {
    chart: {
      label: isFrequency ? 'frequency' : 'wavelength in vacuum',
      unit: prefixedSymbol(unit, prefix),
      scale: high / low > LINEAR_UP_TO ? 'log' : 'linear',
      range: [shown(low), shown(high)],
    },
    shown,
    at,
    mark: ({ wave: { vacuumWavelength_m } }) => {
      const { x, label } = at(vacuumWavelength_m);
      return { x, label: `here ${label}` };
    },
  };
}

/** Frequency where a wave is typed as one. */
export function quantityOf(typed: string): WaveQuantity {
  return /hz\s*$/i.test(typed) ? 'frequency' : 'wavelength';
}
