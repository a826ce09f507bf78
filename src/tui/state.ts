/**
 * The state of the full-screen program: plain data, changed only by `update`. What is on screen follows from it and from
 * the world (world.ts) alone.
 */
import type { Answer } from '../answer/answer.ts';
import type { Question } from '../answer/question.ts';
import { isRefusal, type Refusal } from '../medium/refusal.ts';
import type { LogRecord } from '../record/record.ts';
import type { GlyphLevel } from '../term/ability.ts';
import type { ScreenSize } from '../term/cell-writer.ts';
import type { CurveKind } from './charts.ts';
import type { FieldId } from './fields/field.ts';
import type { Side } from './fields/medium-fields.ts';
import type { Line } from './line-edit.ts';
import type { World } from './world.ts';

/**
 * Where the keys act: a field ("field:angle") or a result ("into:groupIndex", "interface:R", "wave:1"). Names are stable:
 * a stop that is not on screen for a while is found again when it comes back.
 */
export type StopId = string;

export const fieldStop = (id: FieldId): StopId => `field:${id}`;

export function fieldOfStop(stop: StopId): FieldId | undefined {
  return stop.startsWith('field:') ? (stop.slice(6) as FieldId) : undefined;
}

/** A value being typed. */
export interface Entry {
  readonly field: FieldId;
  readonly line: Line;
  /** Nothing was typed yet: the first character replaces what stands there. */
  readonly isFresh: boolean;
}

/** The list of media open in a half. */
export interface Search {
  readonly side: Side;
  readonly line: Line;
  readonly selected: number;
  /** First row shown. */
  readonly top: number;
}

export type PageName = 'sources' | 'cautions' | 'keys' | 'copied' | 'coatings' | 'order' | 'compare';

export interface Page {
  readonly name: PageName;
  readonly top: number;
  /** What the keys page is narrowed to; null where nothing is being typed. */
  readonly filter: Line | null;
  readonly isFiltering: boolean;
  /** The line marked on a page that offers some; null before the mark was moved. */
  readonly selected: number | null;
}

export interface Message {
  /** `said`: done; `refused`: not done, and why. */
  readonly tone: 'said' | 'refused';
  readonly text: string;
}

export interface Preferences {
  readonly glyphs: GlyphLevel;
  readonly colour: boolean;
}

export interface State {
  readonly size: ScreenSize;
  readonly question: Question;
  readonly outcome: Answer | Refusal;
  /** The last question that had an answer: where Esc goes back to. */
  readonly answered: Question;
  readonly past: readonly Question[];
  readonly future: readonly Question[];
  readonly focus: StopId;
  /** Where the focus was before it stepped onto a field that takes words: it goes back there afterwards. */
  readonly cameFrom: StopId;
  /** The part of the picture the focus was in last: the half a list opens in, the part a small screen shows. */
  readonly place: 'from' | 'interface' | 'into';
  readonly entry: Entry | null;
  readonly search: Search | null;
  readonly page: Page | null;
  /** The curve that is open, and the value of x its cursor stands at; null: where the question stands. */
  readonly curve: { readonly kind: CurveKind; readonly cursor: number | null } | null;
  readonly message: Message | null;
  /** Text sent to the clipboard last, so that it can be seen and taken by hand. */
  readonly copied: string | null;
  /** Keys of media chosen, latest first. */
  readonly recent: readonly string[];
  readonly preferences: Preferences;
}

/** What the outside world has to do after an update. */
export type Effect =
  | { readonly kind: 'copy'; readonly text: string }
  /** Put it into the logbook and say what came of that. */
  | { readonly kind: 'keep'; readonly record: LogRecord }
  | { readonly kind: 'quit'; readonly status: number }
  | { readonly kind: 'suspend' }
  | { readonly kind: 'redraw' };

export interface Updated {
  readonly state: State;
  readonly effects: readonly Effect[];
}

export const FIRST_FOCUS: StopId = fieldStop('angle');

export function initialState(
  question: Question,
  size: ScreenSize,
  preferences: Preferences,
  world: World,
  recent: readonly string[] = [],
): State {
  return {
    size,
    question,
    outcome: world.answer(question),
    answered: question,
    past: [],
    future: [],
    focus: FIRST_FOCUS,
    cameFrom: FIRST_FOCUS,
    place: 'interface',
    entry: null,
    search: null,
    page: null,
    curve: null,
    message: null,
    copied: null,
    recent,
    preferences,
  };
}

/** The answer on screen; null while the question has none. */
export function answerOf(state: State): Answer | null {
  return isRefusal(state.outcome) ? null : state.outcome;
}

export function refusalOf(state: State): Refusal | null {
  return isRefusal(state.outcome) ? state.outcome : null;
}

const LONGEST_PAST = 200;

/** Puts another question. It stays even where it has no answer: Esc goes back to the last one that had. */
export function askAnew(state: State, question: Question, world: World): State {
  if (question === state.question) return state;
  return settle(
    { ...state, past: [...state.past, state.question].slice(-LONGEST_PAST), future: [] },
    question,
    world,
  );
}

export function undo(state: State, world: World): State {
  const question = state.past.at(-1);
  if (!question) return { ...state, message: { tone: 'said', text: 'nothing to undo' } };
  const future = [...state.future, state.question];
  return settle({ ...state, past: state.past.slice(0, -1), future }, question, world);
}

export function redo(state: State, world: World): State {
  const question = state.future.at(-1);
  if (!question) return { ...state, message: { tone: 'said', text: 'nothing to do again' } };
  const past = [...state.past, state.question];
  return settle({ ...state, past, future: state.future.slice(0, -1) }, question, world);
}

function settle(state: State, question: Question, world: World): State {
  const outcome = world.answer(question);
  const answered = isRefusal(outcome) ? state.answered : question;
  return { ...state, question, outcome, answered, message: null };
}
