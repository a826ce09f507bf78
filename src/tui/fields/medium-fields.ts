/** The two media and, for crystals, the axis the field lies along. */
import type { MediumSpec, Question } from '../../answer/question.ts';
import { axesOf } from '../../catalog/choose-fit.ts';
import type { Axis } from '../../catalog/types.ts';
import { isLiteralMedium } from '../../units/is-literal-medium.ts';
import { parseLiteralMedium } from '../../units/parse-literal-medium.ts';
import { isProblem, type Problem, problem } from '../../units/problem.ts';
import { quoteInput } from '../../units/quote-input.ts';
import { toAscii } from '../../units/to-ascii.ts';
import type { Field } from './field.ts';

export type Side = 'from' | 'into';

/** "Fused silica", or the numbers of a literal medium. */
export function mediumName(medium: MediumSpec): string {
  return medium.kind === 'literal' ? medium.text : medium.material.name;
}

/** A medium by its numbers: the one kind a field reads itself; names need the catalogue. */
export function readLiteral(text: string): MediumSpec | Problem | undefined {
  if (!isLiteralMedium(text)) return undefined;
  const literal = parseLiteralMedium(text);
  return isProblem(literal) ? literal : { kind: 'literal', literal, text: text.trim() };
}

export function setMedium(question: Question, side: Side, medium: MediumSpec): Question {
  return { ...question, [side]: medium };
}

/** The axis in force: the one named, else the first the material is described for. */
export function axisOf(medium: MediumSpec): Axis | undefined {
  return medium.kind === 'catalogue' ? (medium.axis ?? axesOf(medium.material)[0]) : undefined;
}

const LABELS: Readonly<Record<Side, string>> = { from: 'from', into: 'into' };
const WHERE: Readonly<Record<Side, string>> = {
  from: 'the medium the wave comes from',
  into: 'the medium the wave goes into',
};

const mediumField = (side: Side): Field => ({
  id: side,
  label: LABELS[side],
  kind: 'medium',
  takesWords: true,
  hint: `${WHERE[side]}: a name, a formula, or n=1.5+0.1i`,
  applies: () => true,
  show: ({ question }, style) => {
    const name = mediumName(question[side]);
    return style.ascii ? toAscii(name) : name;
  },
  draft: ({ question }) => (question[side].kind === 'literal' ? question[side].text : ''),
  take: (text, { question }) => {
    const literal = readLiteral(text);
    if (literal === undefined)
      return problem('not-a-medium', `${quoteInput(text)} is no medium`, 'choose one from the list');
    return isProblem(literal) ? literal : setMedium(question, side, literal);
  },
  step: () => undefined,
});

const axisField = (side: Side): Field => ({
  id: `${side}-axis`,
  label: 'axis',
  kind: 'choice',
  hint: 'crystal axis the electric field lies along',
  applies: ({ question }) => {
    const medium = question[side];
    return medium.kind === 'catalogue' && axesOf(medium.material).length > 1;
  },
  show: ({ question }) => axisOf(question[side]) ?? '',
  draft: ({ question }) => axisOf(question[side]) ?? '',
  take: (text, { question }) => {
    const medium = question[side];
    if (medium.kind === 'literal') return question;
    const axes = axesOf(medium.material);
    const word = text.trim().toLowerCase();
    const axis = axes.find((a) => a === word) ?? axes.find((a) => a.startsWith(word));
    if (!axis)
      return problem('not-a-choice', `${quoteInput(text)} is no axis here`, `write ${axes.join(' or ')}`);
    return setMedium(question, side, { ...medium, axis });
  },
  step: (count, { question }) => {
    const medium = question[side];
    if (medium.kind === 'literal') return undefined;
    const axes = axesOf(medium.material);
    const at = axes.indexOf(axisOf(medium) ?? 'isotropic');
    const axis = axes.at((at + (count > 0 ? 1 : -1)) % axes.length);
    return axis && setMedium(question, side, { ...medium, axis });
  },
  pick: (letter, { question }) => {
    const medium = question[side];
    if (medium.kind === 'literal') return undefined;
    const axis = axesOf(medium.material).find((a) => a.startsWith(letter));
    return axis && setMedium(question, side, { ...medium, axis });
  },
});

export const MEDIUM_FIELDS: readonly Field[] = [
  mediumField('from'),
  axisField('from'),
  mediumField('into'),
  axisField('into'),
];
