/**
 * What a field of the picture is: something of the question that can be typed, stepped or chosen in place. A field knows
 * how it is shown, read and stepped; it knows nothing of keys, colours or positions.
 */
import type { Answer } from '../../answer/answer.ts';
import type { Layer, Question } from '../../answer/question.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import type { Problem } from '../../units/problem.ts';

export const FIELD_IDS = [
  'wave',
  'reference',
  'angle',
  'polarization',
  'temperature',
  'pressure',
  'humidity',
  'co2',
  'salinity',
  'composition',
  'tolerance',
  'extrapolate',
  'from',
  'from-axis',
  'into',
  'into-axis',
  'layers',
  'beam',
  'width',
  'profile',
] as const;
export type FieldId = (typeof FIELD_IDS)[number];

export interface FieldContext {
  readonly question: Question;
  /** The answer to the question, where it has one. */
  readonly answer: Answer | null;
  /** Reads layers as typed; present where text is taken in. */
  readonly readLayers?: (text: string) => readonly Layer[] | Problem;
}

export interface Field {
  readonly id: FieldId;
  /** The word in front of the value; '' where the value speaks for itself. */
  readonly label: string;
  /** `text`: typed; `choice`: one of a few, changed by a key; `medium`: chosen from the catalogue or typed. */
  readonly kind: 'text' | 'choice' | 'medium';
  /** One line: what it is and how it is written. */
  readonly hint: string;
  /** True where a letter typed on the field begins a text; elsewhere digits do and letters are commands. */
  readonly takesWords?: boolean;
  /** Choices by their initials. */
  readonly pick?: (letter: string, context: FieldContext) => Question | undefined;
  /** False where the field means nothing for the question. */
  readonly applies: (context: FieldContext) => boolean;
  readonly show: (context: FieldContext, style: NumberStyle) => string;
  /** The text that typing starts from. */
  readonly draft: (context: FieldContext) => string;
  /** The question with the typed text taken in, or why not. */
  readonly take: (text: string, context: FieldContext) => Question | Problem;
  /** The question some steps up or down; undefined where there is no step. A tenth of a step is `count` 0.1. */
  readonly step: (count: number, context: FieldContext) => Question | undefined;
}

/** What to write to take a value back to "not stated". */
export const UNSET_WORDS: readonly string[] = ['', 'none', 'auto', 'not set'];

export const isUnset = (text: string): boolean => UNSET_WORDS.includes(text.trim().toLowerCase());

/** A bare number gets the unit the field shows; anything else is returned as it is. */
export function withShownUnit(text: string, shown: string): string {
  if (!/^\s*[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?\s*$/.test(text)) return text;
  const unit = /^\s*[+-]?[\d.]+(?:[eE][+-]?\d+)?\s*(\D.*)$/.exec(shown)?.[1];
  return unit === undefined ? text : `${text.trim()} ${unit.trim()}`;
}

/** Next value on the ladder 1, 2, 5, 10, 20 ... in either direction; fine steps go by 10 %. */
export function stepOnLadder(value: number, count: number): number {
  if (!Number.isInteger(count)) return Number((value * (1 + count)).toPrecision(6));
  let rung = value;
  for (let i = 0; i < Math.abs(count); i++) rung = count > 0 ? rungAbove(rung) : rungBelow(rung);
  return rung;
}

const RUNGS = [1, 2, 5, 10] as const;

function rungAbove(value: number): number {
  const decade = 10 ** Math.floor(Math.log10(value) + 1e-9);
  const next = RUNGS.find((rung) => rung * decade > value * (1 + 1e-9)) ?? 10;
  return Number((next * decade).toPrecision(6));
}

function rungBelow(value: number): number {
  const decade = 10 ** (Math.ceil(Math.log10(value) - 1e-9) - 1);
  const next = RUNGS.findLast((rung) => rung * decade < value * (1 - 1e-9)) ?? 1;
  return Number((next * decade).toPrecision(6));
}

/** The next multiple of the step above or below; several at once for several steps. */
export function stepOnGrid(value: number, count: number, step: number): number {
  const size = step * (Number.isInteger(count) ? 1 : Math.abs(count));
  const steps = Number.isInteger(count) ? count : Math.sign(count);
  const position = value / size;
  const nearest = Math.round(position);
  const onGrid = Math.abs(position - nearest) < 1e-6;
  const start = onGrid ? nearest : steps > 0 ? Math.floor(position) : Math.ceil(position);
  return Number(((start + steps) * size).toPrecision(12));
}
