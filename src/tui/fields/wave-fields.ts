/** The wave: its value in any unit, and whether a wavelength is meant in vacuum or in air. */
import type { Question, WaveSpec } from '../../answer/question.ts';
import { scanNumber } from '../../units/parse-number.ts';
import { parseWave, type TypedWave } from '../../units/parse-wave.ts';
import { isProblem, type Problem, problem } from '../../units/problem.ts';
import { toAscii } from '../../units/to-ascii.ts';
import { type Field, type FieldContext, withShownUnit } from './field.ts';

function typed(wave: WaveSpec): TypedWave | undefined {
  const reading = parseWave(wave.text, { airWavelength: wave.inAir && !isLine(wave.text) });
  return isProblem(reading) ? undefined : reading;
}

const isLine = (text: string): boolean => /[- ]line$/i.test(text);

/** True where "in vacuum" or "in air" means something: the wave was given as a wavelength. */
export function isGivenAsWavelength(wave: WaveSpec): boolean {
  const kind = typed(wave)?.kind;
  return kind === 'wavelength' || kind === 'line';
}

/** "633nm" -> "633 nm", "10.6um" -> "10.6 µm", "15800cm-1" -> "15800 cm⁻¹". */
export function waveText(text: string, ascii: boolean): string {
  const scanned = scanNumber(text);
  if (isProblem(scanned)) return text;
  const unit = scanned.rest
    .trim()
    .replace(/^[u\u03bc](?=m$)/, '\u00b5')
    .replace(/^(?:1\/cm|cm-1|cm\^-1)$/, 'cm\u207b\u00b9');
  const pretty = `${scanned.numberText} ${unit}`;
  return ascii ? toAscii(pretty) : pretty;
}

function takeWave(text: string, { question }: FieldContext): Question | Problem {
  const full = withShownUnit(text, waveText(question.wave.text, true));
  const inAir = question.wave.inAir && isGivenAsWavelength(question.wave) && !isLine(question.wave.text);
  const reading = parseWave(full, { airWavelength: inAir });
  const wave =
    isProblem(reading) && reading.code === 'unit-of-another-kind' && inAir ? parseWave(full) : reading;
  if (isProblem(wave)) return plainRemedy(wave);
  return {
    ...question,
    wave: { wavelength_m: wave.wavelength_m, inAir: wave.inAir, text: waveText(wave.text, true) },
  };
}

/** The parser words its remedies for a command line; here a key does what an option does there. */
function plainRemedy(p: Problem): Problem {
  return p.remedy.includes('--air-wavelength')
    ? problem(p.code, p.message, 'write the number and unit alone, then choose "in air" beside it')
    : p;
}

/** A step of one in the last digit written; a named line becomes its wavelength first. */
function stepWave(count: number, context: FieldContext): Question | undefined {
  const { question } = context;
  const scanned = scanNumber(question.wave.text);
  if (isProblem(scanned)) return stepFromLine(count, context);
  const decimals = decimalsOf(scanned.numberText) + (Number.isInteger(count) ? 0 : 1);
  const places = Math.max(0, decimals);
  const change = Math.round(Number.isInteger(count) ? count : Math.sign(count)) * 10 ** -decimals;
  const next = takeWave(`${(scanned.value + change).toFixed(places)}${scanned.rest}`, context);
  return isProblem(next) ? undefined : next;
}

function decimalsOf(numberText: string): number {
  const [mantissa = '', exponent = '0'] = numberText.toLowerCase().split('e');
  return (mantissa.split('.')[1]?.length ?? 0) - Number(exponent);
}

function stepFromLine(count: number, context: FieldContext): Question | undefined {
  const { wave } = context.question;
  const nm = (wave.wavelength_m * 1e9).toFixed(2);
  const asLength = { ...context.question, wave: { ...wave, text: `${nm} nm` } };
  return stepWave(count, { ...context, question: asLength });
}

export const WAVE_FIELD: Field = {
  id: 'wave',
  label: 'wave',
  kind: 'text',
  hint: 'any unit: 633nm, 10.6um, 474THz, 1.96eV, 15800cm-1, d-line',
  applies: () => true,
  show: ({ question }, style) => waveText(question.wave.text, style.ascii),
  draft: ({ question }) => question.wave.text,
  take: takeWave,
  step: stepWave,
};

function setReference(inAir: boolean, { question }: FieldContext): Question | Problem {
  const { wave } = question;
  if (isLine(wave.text)) {
    return problem(
      'unit-of-another-kind',
      `${wave.text} is named by its wavelength in air`,
      'type a wavelength to state another',
    );
  }
  return { ...question, wave: { ...wave, inAir } };
}

export const REFERENCE_FIELD: Field = {
  id: 'reference',
  label: '',
  kind: 'choice',
  hint: 'the wavelength given is one in vacuum or in standard air',
  applies: ({ question }) => isGivenAsWavelength(question.wave),
  show: ({ question }) => (question.wave.inAir ? 'in air' : 'in vacuum'),
  draft: ({ question }) => (question.wave.inAir ? 'air' : 'vacuum'),
  take: (text, context) => {
    const word = text.trim().toLowerCase().replace(/^in /, '');
    if (word === 'air' || word === 'vacuum') return setReference(word === 'air', context);
    return problem('not-a-choice', `"${text}" is no reference of a wavelength`, 'write vacuum or air');
  },
  step: (_, context) => {
    const next = setReference(!context.question.wave.inAir, context);
    return isProblem(next) ? undefined : next;
  },
  pick: (letter, context) => {
    if (letter !== 'a' && letter !== 'v') return undefined;
    const next = setReference(letter === 'a', context);
    return isProblem(next) ? undefined : next;
  },
};
