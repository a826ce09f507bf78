/**
 * The layers between the two media, written as on a command line: `magnesium-fluoride-film@qw`, several after each other,
 * groups as `8x: A@qw B@qw :`. Names are those of the catalogue or numbers such as n=1.38.
 */
import type { Layer, LayerThickness, MediumSpec } from '../../answer/question.ts';
import { METRE } from '../../units/display-unit.ts';
import { formatQuantity } from '../../units/format-quantity.ts';
import { isProblem, problem } from '../../units/problem.ts';
import { type Field, isUnset } from './field.ts';
import { mediumName } from './medium-fields.ts';

export const LAYERS_FIELD: Field = {
  id: 'layers',
  label: 'layers',
  kind: 'text',
  takesWords: true,
  hint: 'between the media: magnesium-fluoride-film@qw, n=2.1@60nm, 8x: A@qw B@qw :  none takes them out',
  applies: () => true,
  show: ({ question }, style) => {
    const { layers } = question;
    if (layers.length === 0) return 'none';
    if (layers.length > 3) return `${layers.length} layers`;
    return layers
      .map((l) => `${mediumName(l.medium)} ${thicknessText(l.thickness, style.ascii)}`)
      .join(' + ');
  },
  draft: ({ question }) => layersText(question.layers),
  take: (text, { question, readLayers }) => {
    if (isUnset(text)) return { ...question, layers: [] };
    if (!readLayers) return problem('not-a-medium', 'layers cannot be read here', 'leave them out');
    const layers = readLayers(text);
    return isProblem(layers) ? layers : { ...question, layers };
  },
  step: () => undefined,
};

/** What reads back as the same layers. */
export function layersText(layers: readonly Layer[]): string {
  return layers
    .map((l) => `${spelling(l.medium)}@${thicknessText(l.thickness, true).replace(' ', '')}`)
    .join(' ');
}

function spelling(medium: MediumSpec): string {
  if (medium.kind === 'literal') return medium.text.replaceAll(' ', '');
  return medium.axis ? `${medium.material.key}:${medium.axis}` : medium.material.key;
}

function thicknessText(thickness: LayerThickness, ascii: boolean): string {
  if (thickness.kind === 'waves')
    return `${Number((thickness.waves * 4).toPrecision(9))}qw`.replace(/^1qw$/, 'qw');
  return formatQuantity(Number(thickness.thickness_m.toPrecision(9)), METRE, 'shortest', {
    style: { ascii },
  });
}
