/** What belongs to one medium: its name and state, its optical quantities, its source, the field of the beam in it. */
import type { Answer, EnergyAnswer, MediumAnswer } from '../../answer/answer.ts';
import type { Source } from '../../catalog/types.ts';
import { waveEnergyRows } from '../../present/energy-rows.ts';
import { mediumRows } from '../../present/medium-rows.ts';
import type { Shown } from '../../present/shown.ts';
import { PASCAL, PER_CENT } from '../../units/display-unit.ts';
import { formatQuantity } from '../../units/format-quantity.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { celsiusText } from '../fields/condition-fields.ts';
import type { FieldContext } from '../fields/field.ts';
import type { Side } from '../fields/medium-fields.ts';
import { BLANK_ROW, type Block, fieldItems, type Item, type Row, textItem } from './item.ts';
import { shortSource } from './short-source.ts';

export interface HalfContext extends FieldContext {
  readonly side: Side;
  /** The medium by itself: known even where the pair has no answer. */
  readonly medium: MediumAnswer | null;
  readonly vacuumWavelength_m: number | null;
  readonly sourceOf: (id: string) => Source | undefined;
}

export function halfBlock(context: HalfContext, style: NumberStyle): Block {
  const { side, medium } = context;
  const top: Row[] = [
    fieldItems([side], context, style),
    [...fieldItems([`${side}-axis`], context, style), ...stateItems(medium, style)],
  ];
  const body =
    medium && context.vacuumWavelength_m !== null
      ? mediumRows(medium, context.vacuumWavelength_m, style).map((q) => [quantityItem(q, side, medium.name)])
      : [];
  const bottom: Row[] = [sourceRow(context), ...beamRows(context, style)];
  return { top, body, bottom };
}

export function quantityItem(
  shown: Shown,
  place: string,
  of: string,
  role: Item['role'] = 'text',
  chord?: string,
): Item {
  return {
    stop: `${place}:${shown.id}`,
    label: shown.symbol,
    text: shown.text,
    role,
    chord,
    describe: of === '' ? shown.label : `${shown.label}, ${of}`,
    copy: shown.text,
  };
}

/** The conditions the model really used. */
function stateItems(medium: MediumAnswer | null, style: NumberStyle): readonly Item[] {
  if (!medium) return [];
  if (medium.key === null) return [textItem('given by its numbers')];
  const parts = [
    medium.temperature_K === null ? undefined : celsiusText(medium.temperature_K, style),
    medium.pressure_Pa === null
      ? undefined
      : formatQuantity(Number(medium.pressure_Pa.toPrecision(7)), PASCAL, 'shortest', { style }),
    medium.humidity === null || medium.humidity === 0
      ? undefined
      : `${formatQuantity(Number(medium.humidity.toPrecision(4)), PER_CENT, 'shortest', { style })} RH`,
    medium.humidity === 0 ? 'dry' : undefined,
    medium.salinity_g_per_kg === null ? undefined : `${medium.salinity_g_per_kg} g/kg`,
    medium.composition === null ? undefined : `composition ${medium.composition}`,
  ].filter((part) => part !== undefined);
  return parts.length === 0 ? [] : [textItem(parts.join(', '))];
}

function sourceRow({ medium, side, sourceOf }: HalfContext): Row {
  const fit = medium?.fit;
  if (!medium || !fit) return medium ? [textItem('')] : [];
  const name = shortSource(sourceOf(fit.source.id)) ?? fit.id;
  const range = fit.inRange ? '' : ', extrapolated';
  return [
    {
      stop: `${side}:source`,
      label: 'data',
      text: `${name}, grade ${fit.grade}${range}`,
      role: 'text',
      chord: undefined,
      describe: `source and grade of the data of ${medium.name}`,
      copy: fit.source.text,
    },
  ];
}

function beamRows(context: HalfContext, style: NumberStyle): readonly Row[] {
  const { side, answer, question } = context;
  const fields = side === 'from' ? fieldItems(['beam', 'width', 'profile'], context, style) : [];
  const [beam, ...width] = fields;
  const own: readonly Row[] =
    side === 'from' ? [beam ? [beam] : [], ...(width.length > 0 ? [width] : [])] : [];
  // The other half keeps those lines free, so that equal quantities stand side by side.
  const lines = question.beam?.kind === 'power' ? 2 : 1;
  const rows: readonly Row[] = Array.from({ length: lines }, (_, i) => own[i] ?? BLANK_ROW);
  const energy = answer?.energy;
  if (!energy) return rows;
  const wave = side === 'from' ? energy.incident : energy.transmitted;
  return [...rows, ...energyRows(wave, side, answer, style)];
}

function energyRows(
  wave: EnergyAnswer | null,
  side: Side,
  answer: Answer,
  style: NumberStyle,
): readonly Row[] {
  const of = side === 'from' ? `incident in ${answer.from.name}` : `just inside ${answer.into.name}`;
  const items = waveEnergyRows(wave, style).map((q) => quantityItem(q, side, of));
  const rows: Row[] = [];
  for (let i = 0; i < items.length; i += 2) rows.push(items.slice(i, i + 2));
  return rows;
}
