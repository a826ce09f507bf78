/** What a beam does beyond its irradiance: footprint, standing waves, the field in each layer, pulses, the B-integral. */
import type { Answer } from '../answer/answer.ts';
import type { FieldMaximumAnswer, FieldsAnswer, LayerFieldAnswer } from '../answer/beam-answer.ts';
import {
  type DisplayUnit,
  HERTZ,
  JOULE,
  METRE,
  VOLT_PER_METRE,
  WATT,
  WATT_PER_SQUARE_METRE,
} from '../units/display-unit.ts';
import { formatNumber } from '../units/format-number.ts';
import { formatQuantity } from '../units/format-quantity.ts';
import { RowList } from './row-list.ts';
import type { PresentStyle, Shown } from './shown.ts';

/** A beam's power and width are rarely known better. */
const FOUR = { significant: 4 } as const;
const THREE = { significant: 3 } as const;
/** More layers are in the machine-readable forms alone. */
const MOST_LAYERS = 8;

const JOULE_PER_SQUARE_CM: DisplayUnit = { symbol: 'J/cm²', power: 4, prefixes: 'num k' };
const WATT_PER_SQUARE_CM: DisplayUnit = { symbol: 'W/cm²', power: 4, prefixes: 'num kMGTP' };

type Show = (value: number | null, unit: DisplayUnit) => string;

/** Of the mean power, or of a stated irradiance or field. */
export function beamDetailRows({ energy, geometry }: Answer, style: PresentStyle): readonly Shown[] {
  if (!energy) return [];
  const rows = new RowList(style);
  const show: Show = (value, unit) => formatQuantity(value, unit, FOUR, { style });
  const { footprint, incident } = energy;
  if (footprint && geometry.incidenceAngle_rad > 0) {
    const size = `${show(footprint.acrossDiameter_m, METRE)} × ${show(footprint.alongDiameter_m, METRE)}`;
    rows.add('footprint', 'footprint', 'of the beam on the surface', size);
    rows.add(
      'irradianceOnSurface_W_per_m2',
      'I cos θ',
      'irradiance on the surface',
      show(footprint.irradianceOnSurface_W_per_m2, WATT_PER_SQUARE_METRE),
    );
  }
  if (incident) fieldRows(rows, energy, show, style);
  return rows.list;
}

/** At the peak of the pulse, on the axis of the beam. */
export function pulsedBeamRows({ energy, geometry }: Answer, style: PresentStyle): readonly Shown[] {
  const pulse = energy?.pulse;
  if (!pulse) return [];
  const rows = new RowList(style);
  const show: Show = (value, unit) => formatQuantity(value, unit, FOUR, { style });
  rows.add('energy_J', 'E_p', 'energy of one pulse', show(pulse.energy_J, JOULE));
  if (pulse.repetition_Hz !== null) {
    rows.add('repetition_Hz', 'f', 'repetition rate', show(pulse.repetition_Hz, HERTZ));
    rows.add('averagePower_W', 'P', 'mean power', show(pulse.averagePower_W, WATT));
  }
  if (pulse.peakPower_W !== null)
    rows.add('peakPower_W', 'P peak', 'peak power', show(pulse.peakPower_W, WATT));
  if (pulse.peakFluence_J_per_m2 !== null) {
    rows.add(
      'peakFluence_J_per_m2',
      'F',
      'fluence, on the axis',
      show(pulse.peakFluence_J_per_m2, JOULE_PER_SQUARE_CM),
    );
    if (geometry.incidenceAngle_rad > 0) {
      const onSurface = show(pulse.fluenceOnSurface_J_per_m2, JOULE_PER_SQUARE_CM);
      rows.add('fluenceOnSurface_J_per_m2', 'F cos θ', 'fluence on the surface', onSurface);
    }
  }
  if (pulse.peakIrradiance_W_per_m2 !== null) {
    const I = show(pulse.peakIrradiance_W_per_m2, WATT_PER_SQUARE_CM);
    rows.add('peakIrradiance_W_per_m2', 'I peak', 'peak irradiance', I);
  }
  rows.add('reflectedEnergy_J', 'back', 'energy reflected', show(pulse.reflectedEnergy_J, JOULE));
  if (pulse.transmittedEnergy_J !== null) {
    rows.add('transmittedEnergy_J', 'through', 'energy across', show(pulse.transmittedEnergy_J, JOULE));
  }
  if (pulse.fields) {
    rows.add(
      'peakE_V_per_m',
      'E',
      'field, incident',
      show(pulse.fields.incident.peakE_V_per_m, VOLT_PER_METRE),
    );
    fieldRows(rows, pulse.fields, show, style);
    if (pulse.fields.transmitted) {
      const E = show(pulse.fields.transmitted.peakE_V_per_m, VOLT_PER_METRE);
      rows.add('transmittedE_V_per_m', 'E behind', 'field, transmitted', E);
    }
  }
  return rows.list;
}

export function nonlinearRows({ energy }: Answer, style: PresentStyle): readonly Shown[] {
  const nonlinear = energy?.nonlinear;
  if (!nonlinear) return [];
  const rows = new RowList(style);
  const radians = (x: number): string => `${formatNumber(x, THREE, style)} rad`;
  rows.add('bIntegral_rad', 'B', 'B-integral, on the axis', radians(nonlinear.bIntegral_rad));
  if (nonlinear.layers.length > 1) {
    for (const l of nonlinear.layers.slice(0, MOST_LAYERS)) {
      rows.add(`bIntegral_rad_${l.layer}`, `B ${l.layer}`, `of layer ${l.layer}`, radians(l.bIntegral_rad));
    }
  }
  return rows.list;
}

function fieldRows(
  rows: RowList,
  fields: Pick<FieldsAnswer, 'layers' | 'fieldMaximum' | 'fieldMaximumBefore'>,
  show: Show,
  style: PresentStyle,
): void {
  const field = ({ peakE_V_per_m, intensity }: FieldMaximumAnswer): string =>
    `${show(peakE_V_per_m, VOLT_PER_METRE)} (${formatNumber(Math.sqrt(intensity), THREE, style)} E)`;
  if (fields.fieldMaximumBefore) {
    rows.add(
      'fieldMaximumBefore',
      'E front',
      'standing wave before the surface',
      field(fields.fieldMaximumBefore),
    );
  }
  if (fields.fieldMaximum) {
    const { layer } = fields.fieldMaximum;
    const place = layer > fields.layers.length ? 'at the last face' : `in layer ${layer}`;
    rows.add('fieldMaximum', 'E max', `highest field, ${place}`, field(fields.fieldMaximum));
  }
  for (const l of fields.layers.slice(0, MOST_LAYERS)) layerRow(rows, l, show);
}

function layerRow(rows: RowList, layer: LayerFieldAnswer, show: Show): void {
  if (layer.peakE_V_per_m === null) return;
  const label = layer.enteringIrradiance_W_per_m2 === null ? 'highest in layer' : 'entering layer';
  rows.add(
    `layerField_${layer.layer}`,
    `E ${layer.layer}`,
    `${label} ${layer.layer}`,
    show(layer.peakE_V_per_m, VOLT_PER_METRE),
  );
}
