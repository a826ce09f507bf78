/** What keys do while nothing is being typed: moving about, stepping values, asking another question. */
import { axesOf } from '../../catalog/choose-fit.ts';
import { recordText } from '../../record/record-text.ts';
import { fieldById } from '../fields/all-fields.ts';
import type { FieldId } from '../fields/field.ts';
import type { Side } from '../fields/medium-fields.ts';
import type { ActionId } from '../keys/actions.ts';
import { insertText } from '../line-edit.ts';
import { leaveWords, moveFocus, moveToEnd, moveToField } from '../moves.ts';
import { focusItem } from '../picture/notice.ts';
import { pageText } from '../picture/pages.ts';
import { resultText } from '../picture/record-text.ts';
import {
  answerOf,
  askAnew,
  fieldOfStop,
  type PageName,
  redo,
  refusalOf,
  type State,
  type Updated,
  undo,
} from '../state.ts';
import type { World } from '../world.ts';
import { setAngle, swapMedia } from './question-changes.ts';
import { openCurve } from './update-curve.ts';
import { openEntry, typeInEntry } from './update-entry.ts';
import { openPage } from './update-page.ts';
import { openSearch } from './update-search.ts';

const BIG_STEP = 10;
const FINE_STEP = 0.1;

type Act = (state: State, world: World) => State;

const ACTS: Readonly<Partial<Record<ActionId, Act>>> = {
  up: (s, w) => moveFocus(quiet(s), 'up', w),
  down: (s, w) => moveFocus(quiet(s), 'down', w),
  left: (s, w) => moveFocus(quiet(s), 'left', w),
  right: (s, w) => moveFocus(quiet(s), 'right', w),
  first: (s, w) => moveToEnd(quiet(s), 'first', w),
  last: (s, w) => moveToEnd(quiet(s), 'last', w),
  'next-field': (s, w) => moveToField(quiet(s), 1, w),
  'previous-field': (s, w) => moveToField(quiet(s), -1, w),
  'step-up': (s, w) => step(s, 1, w),
  'step-down': (s, w) => step(s, -1, w),
  'page-up': (s, w) => step(s, BIG_STEP, w),
  'page-down': (s, w) => step(s, -BIG_STEP, w),
  'fine-up': (s, w) => step(s, FINE_STEP, w),
  'fine-down': (s, w) => step(s, -FINE_STEP, w),
  open,
  unset,
  undo,
  redo,
  'go-from': (s, w) => openSearch(s, 'from', w),
  'go-into': (s, w) => openSearch(s, 'into', w),
  search: (s, w) => openSearch(s, s.place === 'from' ? 'from' : 'into', w),
  'go-wave': (s, w) => openEntry(s, 'wave', w),
  'go-angle': (s, w) => openEntry(s, 'angle', w),
  'go-beam': (s, w) => openEntry(s, 'beam', w),
  'go-conditions': (s, w) => openEntry(s, 'temperature', w),
  'go-tolerance': (s, w) => openEntry(s, 'tolerance', w),
  'go-layers': (s, w) => openEntry(s, 'layers', w),
  polarization: (s, w) => stepField(s, 'polarization', 1, w),
  reference: (s, w) =>
    fieldById('reference').applies({ question: s.question, answer: answerOf(s) })
      ? stepField(s, 'reference', 1, w)
      : refuse(s, 'vacuum or air matters for wavelengths only; this wave is the same in both'),
  swap: (s, w) => askAnew(s, swapMedia(s.question), w),
  axis: nextAxis,
  brewster: toBrewster,
  critical: toCritical,
  extrapolate: (s, w) => askAnew(s, { ...s.question, extrapolate: !s.question.extrapolate }, w),
  sources: (s) => openPage(s, 'sources'),
  cautions: (s) => openPage(s, 'cautions'),
  coatings: (s) => openPage(s, 'coatings'),
  'order-check': (s) => openPage(s, 'order'),
  compare: (s) => openPage(s, 'compare'),
  help: (s) => openPage(s, 'keys'),
  dots: nextGlyphs,
  curves: openCurve,
  back: (s, w) => (refusalOf(s) ? askAnew(s, s.answered, w) : leaveWords(quiet(s), w)),
};

export function actInPicture(state: State, action: ActionId, world: World): Updated {
  if (action === 'quit') return { state, effects: [{ kind: 'quit', status: 0 }] };
  if (action === 'copy' || action === 'copy-record') return copy(state, action, world);
  if (action === 'log') return keep(state, world);
  const act = ACTS[action];
  return { state: act ? act(state, world) : state, effects: [] };
}

/**
 * A character that belongs to the field under the focus before it is a command: a letter on a field that takes words, the
 * initial of a choice.
 */
export function typeOnField(state: State, character: string, world: World): State | undefined {
  const id = fieldOfStop(state.focus);
  if (id === undefined) return undefined;
  const field = fieldById(id);
  if (field.takesWords && /[\p{L}\p{N}]/u.test(character)) return beginTyping(state, id, character, world);
  const picked = field.pick?.(character, { question: state.question, answer: answerOf(state) });
  return picked && askAnew(quiet(state), picked, world);
}

/** A character that is no command starts typing where the focus takes text. */
export function typeInPicture(state: State, character: string, world: World): State {
  const field = fieldOfStop(state.focus);
  if (field === undefined || (character !== '' && !/[\d.,]/.test(character))) return state;
  return fieldById(field).kind === 'choice' ? state : beginTyping(state, field, character, world);
}

function beginTyping(state: State, field: FieldId, character: string, world: World): State {
  if (fieldById(field).kind === 'medium') {
    const opened = openSearch(state, field as Side, world);
    const search = opened.search && { ...opened.search, line: insertText(opened.search.line, character) };
    return { ...opened, search };
  }
  const opened = openEntry(state, field, world);
  return character === '' ? opened : typeInEntry(opened, character);
}

const quiet = (state: State): State => (state.message ? { ...state, message: null } : state);
const refuse = (state: State, text: string): State => ({ ...state, message: { tone: 'refused', text } });

function open(state: State, world: World): State {
  const id = fieldOfStop(state.focus);
  if (id === undefined) return openPage(state, 'sources');
  const { kind } = fieldById(id);
  if (kind === 'medium') return openSearch(state, id as Side, world);
  return kind === 'choice' ? step(state, 1, world) : openEntry(state, id, world);
}

function step(state: State, count: number, world: World): State {
  const id = fieldOfStop(state.focus);
  if (id === undefined) return refuse(state, 'this is a result: change the wave, the angle or the media');
  return stepField(state, id, count, world);
}

/** Steps a field wherever the focus is: one may turn the polarization while reading R. */
function stepField(state: State, id: FieldId, count: number, world: World): State {
  const question = fieldById(id).step(count, { question: state.question, answer: answerOf(state) });
  return question ? askAnew(state, question, world) : state;
}

function unset(state: State, world: World): State {
  const id = fieldOfStop(state.focus);
  if (id === undefined || fieldById(id).kind !== 'text') return state;
  const question = fieldById(id).take('', { question: state.question, answer: answerOf(state) });
  return 'problem' in question
    ? refuse(state, 'this value cannot be left out')
    : askAnew(state, question, world);
}

function nextAxis(state: State, world: World): State {
  const isCrystal = (side: Side): boolean => {
    const medium = state.question[side];
    return medium.kind === 'catalogue' && axesOf(medium.material).length > 1;
  };
  const order: readonly Side[] = state.place === 'from' ? ['from', 'into'] : ['into', 'from'];
  const side = order.find(isCrystal);
  return side
    ? stepField(state, `${side}-axis`, 1, world)
    : refuse(state, 'neither medium is a crystal with several axes here');
}

function toBrewster(state: State, world: World): State {
  const surface = answerOf(state)?.interface;
  const angle_rad = surface?.brewsterAngle_rad ?? surface?.pseudoBrewsterAngle_rad ?? null;
  return angle_rad === null
    ? refuse(state, 'there is no Brewster angle for these media')
    : askAnew(state, setAngle(state.question, angle_rad), world);
}

function toCritical(state: State, world: World): State {
  const angle_rad = answerOf(state)?.interface.criticalAngle_rad ?? null;
  return angle_rad === null
    ? refuse(state, 'there is no critical angle: the second medium is the denser one; swap them for one')
    : askAnew(state, setAngle(state.question, angle_rad), world);
}

function nextGlyphs(state: State): State {
  const levels = ['braille', 'blocks', 'ascii'] as const;
  const { preferences } = state;
  const glyphs = levels[(levels.indexOf(preferences.glyphs) + 1) % levels.length] ?? 'ascii';
  return {
    ...state,
    preferences: { ...preferences, glyphs },
    message: { tone: 'said', text: `drawn with ${glyphs}` },
  };
}

/** What came of it is said by the one who keeps it. */
function keep(state: State, world: World): Updated {
  const answer = answerOf(state);
  if (!answer) return { state: refuse(state, 'there is no answer to keep yet'), effects: [] };
  return {
    state: quiet(state),
    effects: [{ kind: 'keep', record: world.record(state.question, answer) }],
  };
}

/** Pages that are copied as they stand. */
const REPORTS: readonly PageName[] = ['coatings', 'order', 'compare'];

/** The value under the focus, or R and T where that is no result; the whole answer on demand. */
function copy(state: State, action: 'copy' | 'copy-record', world: World): Updated {
  const answer = answerOf(state);
  if (!answer) return { state: refuse(state, 'there is no answer to copy yet'), effects: [] };
  const style = { ascii: state.preferences.glyphs === 'ascii' };
  const isResult = fieldOfStop(state.focus) === undefined;
  const item = isResult && !state.page ? focusItem(state, world) : undefined;
  const isWhole = action === 'copy-record' || state.page !== null;
  const page = state.page && REPORTS.includes(state.page.name) ? state.page : undefined;
  const text = page
    ? pageText(state, page, world)
    : isWhole
      ? recordText(world.record(state.question, answer), style).trimEnd()
      : item
        ? item.copy
        : resultText(answer, style);
  const shown = isWhole ? openPage({ ...state, copied: text }, 'copied') : state;
  return {
    state: {
      ...shown,
      copied: text,
      message: { tone: 'said', text: isWhole ? 'copied:' : `copied: ${text}` },
    },
    effects: [{ kind: 'copy', text }],
  };
}
