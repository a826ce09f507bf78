/** Typing a value into a field of the picture. What cannot be read stays in the field, with the reason below. */
import { isProblem, problemText } from '../../units/problem.ts';
import { fieldById } from '../fields/all-fields.ts';
import type { FieldId } from '../fields/field.ts';
import type { ActionId } from '../keys/actions.ts';
import { EMPTY_LINE, insertText, type Line, lineOf, pasteText } from '../line-edit.ts';
import { focusOn, leaveWords, moveToField } from '../moves.ts';
import { answerOf, askAnew, type Entry, fieldStop, type State } from '../state.ts';
import type { World } from '../world.ts';
import { applyLineAction } from './line-actions.ts';

/** Opens a text field with what stands in it; the first character typed replaces that. */
export function openEntry(state: State, field: FieldId, world: World): State {
  const context = { question: state.question, answer: answerOf(state) };
  const draft = fieldById(field).draft(context);
  const entry: Entry = { field, line: lineOf(draft), isFresh: true };
  return { ...focusOn(state, fieldStop(field), world), entry, message: null };
}

export function typeInEntry(state: State, character: string): State {
  return withLine(state, (line) => insertText(line, character));
}

export function pasteInEntry(state: State, text: string): State {
  return withLine(state, (line) => pasteText(line, text));
}

/** Text goes into an empty line where nothing was typed yet. */
function withLine(state: State, change: (line: Line) => Line): State {
  const { entry } = state;
  if (!entry) return state;
  const line = change(entry.isFresh ? EMPTY_LINE : entry.line);
  return { ...state, entry: { ...entry, line, isFresh: false }, message: null };
}

export function actInEntry(state: State, action: ActionId, world: World): State {
  const { entry } = state;
  if (!entry) return state;
  if (action === 'cancel') return leaveWords({ ...state, entry: null, message: null }, world);
  if (action === 'take') {
    const taken = take(state, entry, world);
    return taken.entry ? taken : leaveWords(taken, world);
  }
  if (action === 'take-next' || action === 'take-previous') {
    const taken = take(state, entry, world);
    return taken.entry ? taken : moveToField(taken, action === 'take-next' ? 1 : -1, world);
  }
  const line = applyLineAction(entry.line, action);
  if (!line) return state;
  // Deleting at once means: not what stands here.
  const erases = entry.isFresh && (action === 'delete-back' || action === 'delete-forward');
  return {
    ...state,
    entry: { ...entry, line: erases ? EMPTY_LINE : line, isFresh: false },
    message: null,
  };
}

function take(state: State, entry: Entry, world: World): State {
  if (entry.isFresh) return { ...state, entry: null, message: null };
  const { readLayers } = world;
  const context = { question: state.question, answer: answerOf(state), readLayers };
  const question = fieldById(entry.field).take(entry.line.text, context);
  if (isProblem(question)) {
    return { ...state, message: { tone: 'refused', text: problemText(question) } };
  }
  return askAnew({ ...state, entry: null, message: null }, question, world);
}
