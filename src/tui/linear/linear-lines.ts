/**
 * What the linear layout says, as plain lines: "label = value", no box, no drawing, nothing that means something by its place
 * alone. Numbers are those of every other face.
 */
import type { Answer } from '../../answer/answer.ts';
import { isRefusal } from '../../medium/refusal.ts';
import { chartSentence, chartTableLines } from '../../plot/chart-sentence.ts';
import { beamRows, waveEnergyRows } from '../../present/energy-rows.ts';
import { interfaceRows } from '../../present/interface-rows.ts';
import { mediumRows } from '../../present/medium-rows.ts';
import { mediumTitle, questionLine } from '../../present/question-line.ts';
import type { Shown } from '../../present/shown.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { toAscii } from '../../units/to-ascii.ts';
import { FIELDS } from '../fields/all-fields.ts';
import type { Field } from '../fields/field.ts';
import type { Side } from '../fields/medium-fields.ts';
import type { Hit } from '../hits.ts';
import { hitFacts } from '../picture/hit-facts.ts';
import { sourceLines } from '../picture/source-lines.ts';
import { answerOf, refusalOf, type State } from '../state.ts';
import type { World } from '../world.ts';

/** Words for fields whose value speaks for itself on a picture. */
const SPOKEN: Readonly<Record<string, string>> = {
  from: 'first medium',
  into: 'second medium',
  'from-axis': 'axis of the first medium',
  'into-axis': 'axis of the second medium',
  reference: 'wavelength meant',
  angle: 'angle of incidence',
  polarization: 'polarization',
  profile: 'profile of the beam',
  width: 'diameter of the beam',
};

export const spokenName = (field: Field): string => SPOKEN[field.id] ?? field.label;

const styleOf = (state: State): NumberStyle => ({ ascii: state.preferences.glyphs === 'ascii' });

function spoken(state: State, lines: readonly string[]): readonly string[] {
  return styleOf(state).ascii ? lines.map(toAscii) : lines;
}

const line = (q: Shown): string => `${q.label} = ${q.text}`;

/** The question in a line, R and T, and how many cautions there are; or why there is no answer. */
export function summaryLines(state: State): readonly string[] {
  const answer = answerOf(state);
  const refusal = refusalOf(state);
  if (!answer) return refusal ? [`no answer: ${refusal.message}; ${refusal.remedy}`] : [];
  const style = styleOf(state);
  const results = interfaceRows(answer, style).filter((q) => q.id === 'R' || q.id === 'T');
  const count = answer.cautions.length;
  const cautions = count === 0 ? [] : [`${count} caution${count === 1 ? '' : 's'}: say cautions to hear`];
  return spoken(state, [questionLine(answer, style).replace('→', 'to'), ...results.map(line), ...cautions]);
}

/** Everything that can be changed, numbered. */
export function fieldLines(state: State): readonly string[] {
  const style = styleOf(state);
  const context = contextOf(state);
  return spoken(
    state,
    fieldsOf(state).map((field, i) => `${i + 1} ${spokenName(field)} = ${field.show(context, style)}`),
  );
}

export const contextOf = (state: State) => ({ question: state.question, answer: answerOf(state) });

export function fieldsOf(state: State): readonly Field[] {
  return FIELDS.filter((field) => field.applies(contextOf(state)));
}

export function surfaceLines(state: State): readonly string[] {
  return withAnswer(state, (answer, style) =>
    [...interfaceRows(answer, style), ...beamRows(answer, style)].map(line),
  );
}

export function mediumLines(state: State, side: Side): readonly string[] {
  return withAnswer(state, (answer, style) => {
    const wave = side === 'from' ? answer.energy?.incident : answer.energy?.transmitted;
    const rows = [
      ...mediumRows(answer[side], answer.wave.vacuumWavelength_m, style),
      ...waveEnergyRows(wave ?? null, style),
    ];
    return [mediumTitle(answer[side]), ...rows.map(line)];
  });
}

export function sourcesSpoken(state: State): readonly string[] {
  return withAnswer(state, (answer, style) =>
    [...sourceLines(answer.from, style), ...sourceLines(answer.into, style)]
      .map((l) => l.text)
      .filter((text) => text !== ''),
  );
}

export function cautionsSpoken(state: State): readonly string[] {
  return withAnswer(state, (answer) =>
    answer.cautions.length === 0 ? ['no cautions'] : answer.cautions.map((c) => `${c.level}: ${c.text}`),
  );
}

/** The curves over the angle and over the wave, each as a sentence and a table; why not, where there is none. */
export function curvesSpoken(state: State, world: World): readonly string[] {
  return withAnswer(state, (answer, { ascii }) =>
    (['angle', 'wave'] as const).flatMap((kind) => {
      const chart = world.chart(kind, state.question, answer);
      return isRefusal(chart)
        ? [`${chart.message}; ${chart.remedy}`]
        : [chartSentence(chart, ascii), ...chartTableLines(chart, ascii)];
    }),
  );
}

/** A page of the picture in words. */
export function pageWords(
  words: (state: State, style: NumberStyle, world: World) => readonly string[],
  state: State,
  world: World,
): readonly string[] {
  const lines = words(state, styleOf(state), world).filter((text) => text.trim() !== '');
  // An arrow is a sign to the eye alone.
  return spoken(
    state,
    lines.map((text) => text.trim().replaceAll(' → ', ' to ')),
  );
}

function withAnswer(
  state: State,
  make: (answer: Answer, style: NumberStyle) => readonly string[],
): readonly string[] {
  const answer = answerOf(state);
  return answer ? spoken(state, make(answer, styleOf(state))) : summaryLines(state);
}

/** Media to choose from, numbered, with what the list of the picture says. */
export function hitLines(hits: readonly Hit[], state: State, world: World): readonly string[] {
  const style = styleOf(state);
  return spoken(
    state,
    hits.map((hit, i) => {
      const facts = hitFacts(hit, state.question, world, style);
      const index = facts.index === '' ? '' : `, n = ${facts.index}`;
      return `${i + 1} ${facts.name}${index}, ${facts.transparency}`;
    }),
  );
}
