/** The beam: a power with a width, an irradiance, or a peak field; or none. */
import type { Beam, Question } from '../../answer/question.ts';
import { JOULE, METRE, VOLT_PER_METRE, WATT, WATT_PER_SQUARE_METRE } from '../../units/display-unit.ts';
import { formatQuantity } from '../../units/format-quantity.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { parseField } from '../../units/parse-field.ts';
import { parseIrradiance } from '../../units/parse-irradiance.ts';
import { parseLength } from '../../units/parse-length.ts';
import { parsePower } from '../../units/parse-power.ts';
import { isProblem, type Problem, problem } from '../../units/problem.ts';
import { quoteInput } from '../../units/quote-input.ts';
import { type Field, isUnset, stepOnLadder, withShownUnit } from './field.ts';

const ASCII = { ascii: true } as const;
const USUAL: Beam = { kind: 'power', power_W: 1e-3, diameter_m: 1e-3, profile: 'gaussian' };

const shortest = (value: number, unit: Parameters<typeof formatQuantity>[1], style: NumberStyle): string =>
  formatQuantity(Number(value.toPrecision(9)), unit, 'shortest', { style });

function strengthText(beam: Beam, style: NumberStyle): string {
  if (beam.kind === 'power') return shortest(beam.power_W, WATT, style);
  if (beam.kind === 'pulse') return shortest(beam.pulse.energy_J, JOULE, style);
  if (beam.kind === 'irradiance') return shortest(beam.irradiance_W_per_m2, WATT_PER_SQUARE_METRE, style);
  return shortest(beam.peakE_V_per_m, VOLT_PER_METRE, style);
}

function takeStrength(typed: string, question: Question): Question | Problem {
  if (isUnset(typed)) return { ...question, beam: undefined };
  const { beam } = question;
  const text = beam ? withShownUnit(typed, strengthText(beam, ASCII)) : typed;
  const power_W = parsePower(text);
  if (!isProblem(power_W)) {
    const width = beam?.kind === 'power' ? beam : { profile: 'gaussian' as const };
    return { ...question, beam: { ...width, kind: 'power', power_W } };
  }
  const irradiance_W_per_m2 = parseIrradiance(text);
  if (!isProblem(irradiance_W_per_m2)) {
    return { ...question, beam: { kind: 'irradiance', irradiance_W_per_m2 } };
  }
  const peakE_V_per_m = parseField(text);
  if (!isProblem(peakE_V_per_m)) return { ...question, beam: { kind: 'field', peakE_V_per_m } };
  if (power_W.code !== 'unit-unknown' && power_W.code !== 'unit-of-another-kind') return power_W;
  return problem(
    power_W.code,
    `${quoteInput(text)} is no beam`,
    'give a power (1mW), an irradiance (1kW/m2), a peak field (100V/m), or none',
  );
}

/** The same beam with its strength multiplied. */
function scaled(beam: Beam, change: (value: number) => number): Beam {
  if (beam.kind === 'power') return { ...beam, power_W: change(beam.power_W) };
  if (beam.kind === 'pulse') {
    return { ...beam, pulse: { ...beam.pulse, energy_J: change(beam.pulse.energy_J) } };
  }
  if (beam.kind === 'irradiance') return { ...beam, irradiance_W_per_m2: change(beam.irradiance_W_per_m2) };
  return { ...beam, peakE_V_per_m: change(beam.peakE_V_per_m) };
}

export const BEAM_FIELD: Field = {
  id: 'beam',
  label: 'beam',
  kind: 'text',
  hint: '1mW, 1kW/m2 (irradiance) or 100V/m (peak field); or none',
  applies: () => true,
  show: ({ question }, style) => (question.beam ? strengthText(question.beam, style) : 'none'),
  draft: ({ question }) => (question.beam ? strengthText(question.beam, ASCII) : ''),
  take: (text, { question }) => takeStrength(text, question),
  step: (count, { question }) => ({
    ...question,
    beam: question.beam ? scaled(question.beam, (value) => stepOnLadder(value, count)) : USUAL,
  }),
};

export const WIDTH_FIELD: Field = {
  id: 'width',
  label: 'diameter',
  kind: 'text',
  hint: '1/e2 of a gaussian, full width of a flat-top: 1mm, 500um',
  applies: ({ question }) => question.beam?.kind === 'power',
  show: ({ question: { beam } }, style) =>
    beam?.kind === 'power' && beam.diameter_m !== undefined
      ? shortest(beam.diameter_m, METRE, style)
      : 'not set',
  draft: ({ question: { beam } }) =>
    beam?.kind === 'power' && beam.diameter_m !== undefined ? shortest(beam.diameter_m, METRE, ASCII) : '',
  take: (text, { question }) => {
    const { beam } = question;
    if (beam?.kind !== 'power') return question;
    const { diameter_m: before, ...powerAlone } = beam;
    if (isUnset(text)) return { ...question, beam: powerAlone };
    const shown = before === undefined ? '1 mm' : shortest(before, METRE, ASCII);
    const diameter_m = parseLength(withShownUnit(text, shown));
    return isProblem(diameter_m) ? diameter_m : { ...question, beam: { ...beam, diameter_m } };
  },
  step: (count, { question }) => {
    const { beam } = question;
    if (beam?.kind !== 'power') return undefined;
    const diameter_m = beam.diameter_m === undefined ? 1e-3 : stepOnLadder(beam.diameter_m, count);
    return { ...question, beam: { ...beam, diameter_m } };
  },
};

export const PROFILE_FIELD: Field = {
  id: 'profile',
  label: '',
  kind: 'choice',
  hint: 'gaussian (twice the mean irradiance on the axis) or flat-top',
  applies: ({ question }) => question.beam?.kind === 'power' && question.beam.diameter_m !== undefined,
  show: ({ question: { beam } }) =>
    beam?.kind === 'power' && beam.profile === 'flat' ? 'flat-top' : 'gaussian',
  draft: ({ question: { beam } }) => (beam?.kind === 'power' ? beam.profile : ''),
  take: (text, { question }) => {
    const word = text.trim().toLowerCase();
    const profile = /^gauss/.test(word) ? 'gaussian' : /^flat/.test(word) ? 'flat' : undefined;
    if (!profile)
      return problem('not-a-choice', `${quoteInput(text)} is no profile`, 'write gaussian or flat');
    return question.beam?.kind === 'power' ? { ...question, beam: { ...question.beam, profile } } : question;
  },
  step: (_, { question }) =>
    question.beam?.kind === 'power'
      ? {
          ...question,
          beam: { ...question.beam, profile: question.beam.profile === 'flat' ? 'gaussian' : 'flat' },
        }
      : undefined,
  pick: (letter, { question }) => {
    const profile = letter === 'g' ? 'gaussian' : letter === 'f' ? 'flat' : undefined;
    return profile && question.beam?.kind === 'power'
      ? { ...question, beam: { ...question.beam, profile } }
      : undefined;
  },
};
