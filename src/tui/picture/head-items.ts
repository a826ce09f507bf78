/** What stands above the picture: the wave with its other names, the geometry, the conditions of the bench. */
import { waveAliases, wavelengthText } from '../../present/question-line.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import type { FieldContext } from '../fields/field.ts';
import { isGivenAsWavelength } from '../fields/wave-fields.ts';
import { fieldItems, type Item } from './item.ts';

export function waveItems(context: FieldContext, style: NumberStyle): readonly Item[] {
  return [
    ...fieldItems(['wave', 'reference'], context, style),
    ...aliasItems(context, style),
    ...fieldItems(['angle', 'polarization'], context, style),
  ];
}

export function conditionItems(context: FieldContext, style: NumberStyle): readonly Item[] {
  return fieldItems(
    ['temperature', 'pressure', 'humidity', 'co2', 'salinity', 'composition', 'tolerance', 'extrapolate'],
    context,
    style,
  );
}

/** The same wave in the units it was not given in. */
function aliasItems({ question, answer }: FieldContext, style: NumberStyle): readonly Item[] {
  if (!answer) return [];
  const given = question.wave.text;
  const isWavelength = isGivenAsWavelength(question.wave);
  const texts = [
    ...(isWavelength ? [] : [wavelengthText(answer, style)]),
    ...waveAliases(answer, style),
  ].filter((text) => isWavelength || !sameUnit(text, given));
  return texts.map((text, i) => ({
    stop: `wave:${i}`,
    label: '',
    text,
    role: 'text',
    describe: `the same wave: ${aliasName(text)}`,
    copy: text,
    optional: true,
  }));
}

const sameUnit = (a: string, b: string): boolean => unitKind(a) === unitKind(b);

function unitKind(text: string): string {
  return /Hz$/i.test(text) ? 'frequency' : /eV$/i.test(text) ? 'photon energy' : 'wavelength';
}

function aliasName(text: string): string {
  if (/Hz$/.test(text)) return 'frequency';
  return /eV$/.test(text) ? 'photon energy' : 'wavelength';
}
