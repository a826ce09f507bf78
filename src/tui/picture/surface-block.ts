/** What belongs to the surface: the two angles, R and T first, losses, special angles, phases, powers. */
import type { LayerAnswer } from '../../answer/answer.ts';
import { beamRows } from '../../present/energy-rows.ts';
import { degreesText, interfaceRows } from '../../present/interface-rows.ts';
import type { Shown } from '../../present/shown.ts';
import { layerText, layerTitle, pulseRows, stackRows, windowRows } from '../../present/stack-rows.ts';
import { METRE } from '../../units/display-unit.ts';
import { formatQuantity } from '../../units/format-quantity.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import type { FieldContext } from '../fields/field.ts';
import type { ActionId } from '../keys/actions.ts';
import type { Bindings } from '../keys/bindings.ts';
import { quantityItem } from './half-block.ts';
import { BLANK_ROW, type Block, fieldItems, type Item, type Row, textItem } from './item.ts';

const FIRST: readonly string[] = ['R', 'T'];
/** Said by the line of the two angles. */
const IN_TITLE: readonly string[] = ['refractionAngle_rad'];
/** Special angles come before the losses: a person turns towards them. */
const ORDER: readonly string[] = [
  'brewsterAngle_rad',
  'pseudoBrewsterAngle_rad',
  'criticalAngle_rad',
  'returnLoss_dB',
  'reflectionLoss_dB',
  'evanescentDepth_m',
];

/** What becomes of the beam, kept in sight. */
const MAIN_BEAM: readonly string[] = ['reflectedPower_W', 'transmittedPower_W'];

const KEYS: Readonly<Record<string, ActionId>> = {
  brewsterAngle_rad: 'brewster',
  pseudoBrewsterAngle_rad: 'brewster',
  criticalAngle_rad: 'critical',
};

export function surfaceBlock(context: FieldContext, bindings: Bindings, style: NumberStyle): Block {
  const { answer } = context;
  if (!answer) {
    return {
      top: [[textItem('no answer', 'caution')], fieldItems(['layers'], context, style)],
      body: [],
      bottom: [],
    };
  }
  const shown = interfaceRows(answer, style);
  const item = (id: string) => shown.filter((q) => q.id === id);
  const first = FIRST.flatMap(item).map((q) => [quantityItem(q, 'interface', '', 'result')]);
  const { polarization } = answer.geometry;
  // The reflectance asked for stands on top already.
  const known = [...FIRST, ...IN_TITLE, ...ORDER, `R${polarization}`];
  const rest = [...ORDER.flatMap(item), ...shown.filter((q) => !known.includes(q.id))];
  const beam = beamRows(answer, style);
  const path = [...stackRows(answer, style), ...windowRows(answer, style), ...pulseRows(answer, style)];
  const isMain = (q: Shown): boolean => MAIN_BEAM.includes(q.id);
  const beamItem = (q: Shown): Row => [quantityItem(q, 'interface', 'of the stated beam')];
  return {
    top: [[textItem(anglesText(answer, style))], BLANK_ROW, ...first, fieldItems(['layers'], context, style)],
    body: [
      ...answer.layers.slice(0, MOST_LAYERS_LISTED).map((layer, i) => [layerItem(layer, i, style)]),
      ...rest.map((q) => [quantityItem(q, 'interface', '', 'text', keyOf(q, bindings))]),
      ...path.map((q) => [quantityItem(q, 'interface', 'of the whole path')]),
      ...beam.filter((q) => !isMain(q)).map(beamItem),
    ],
    bottom: beam.filter(isMain).map(beamItem),
  };
}

/** A coating of many layers would push everything else out of sight. */
const MOST_LAYERS_LISTED = 8;

function layerItem(layer: LayerAnswer, index: number, style: NumberStyle): Item {
  const thickness = formatQuantity(layer.thickness_m, METRE, { significant: 4 }, { style });
  return {
    stop: `interface:layer-${index + 1}`,
    label: String(index + 1),
    text: `${thickness} ${layer.medium.name}`,
    role: 'text',
    describe: `layer ${layerTitle(layer, index + 1)}: ${layerText(layer, style)}`,
    copy: layerText(layer, style),
  };
}

function keyOf(q: Shown, bindings: Bindings): string | undefined {
  const action = KEYS[q.id];
  return action !== undefined && q.text !== 'none' ? bindings.keyOf('picture', action) : undefined;
}

function anglesText(answer: NonNullable<FieldContext['answer']>, style: NumberStyle): string {
  const { incidenceAngle_rad } = answer.geometry;
  if (answer.interface.totalReflection) return 'total reflection';
  const incidence = degreesText(incidenceAngle_rad, 2, style);
  const refraction = degreesText(answer.interface.refractionAngle_rad, 2, style);
  return `${incidence} ${style.ascii ? '->' : '→'} ${refraction}`;
}
