/** What a stated beam carries: in each medium, and at the interface. */
import type { Answer, EnergyAnswer } from '../answer/answer.ts';
import {
  JOULE_PER_CUBIC_METRE,
  PASCAL,
  TESLA,
  VOLT_PER_METRE,
  WATT,
  WATT_PER_SQUARE_METRE,
} from '../units/display-unit.ts';
import { formatNumber } from '../units/format-number.ts';
import { formatQuantity } from '../units/format-quantity.ts';
import { RowList } from './row-list.ts';
import type { PresentStyle, Shown } from './shown.ts';

/** A beam's power and width are rarely known better. */
const DIGITS = { significant: 4 } as const;

export function waveEnergyRows(wave: EnergyAnswer | null, style: PresentStyle): readonly Shown[] {
  if (!wave) return [];
  const rows = new RowList(style);
  const show = (value: number | null, unit: Parameters<typeof formatQuantity>[1]): string =>
    formatQuantity(value, unit, DIGITS, { style });
  rows.add('irradiance_W_per_m2', 'I', 'irradiance', show(wave.irradiance_W_per_m2, WATT_PER_SQUARE_METRE));
  rows.add('peakE_V_per_m', 'E', 'electric field, peak', show(wave.peakE_V_per_m, VOLT_PER_METRE));
  rows.add('peakB_T', 'B', 'flux density, peak', show(wave.peakB_T, TESLA));
  rows.add(
    'energyDensity_J_per_m3',
    'u',
    'energy density, mean',
    show(wave.energyDensity_J_per_m3, JOULE_PER_CUBIC_METRE),
  );
  return rows.list;
}

export function beamRows(answer: Answer, style: PresentStyle): readonly Shown[] {
  const { energy } = answer;
  if (!energy) return [];
  const rows = new RowList(style);
  const watt = (x: number | null): string => formatQuantity(x, WATT, DIGITS, { style });
  if (energy.incidentPower_W !== null) {
    rows.add('reflectedPower_W', 'reflected', 'reflected power', watt(energy.reflectedPower_W));
    rows.add('transmittedPower_W', 'crossing', 'power across the surface', watt(energy.transmittedPower_W));
    rows.add(
      'photonFlux_per_s',
      'photons',
      'photon flux',
      `${formatNumber(energy.photonFlux_per_s, DIGITS, style)} /s`,
    );
  }
  if (energy.reflected) {
    const back = formatQuantity(energy.reflected.irradiance_W_per_m2, WATT_PER_SQUARE_METRE, DIGITS, {
      style,
    });
    rows.add('reflectedIrradiance_W_per_m2', 'I_r', 'reflected irradiance', back);
  }
  rows.add(
    'radiationPressure_Pa',
    'pressure',
    'radiation pressure, normal',
    formatQuantity(energy.radiationPressure_Pa, PASCAL, DIGITS, { style }),
  );
  return rows.list;
}
