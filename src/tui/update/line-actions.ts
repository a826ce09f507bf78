/** The actions that edit a line of text. */
import type { ActionId } from '../keys/actions.ts';
import { editLine, type Line, type LineCommand } from '../line-edit.ts';

const COMMANDS: Readonly<Partial<Record<ActionId, LineCommand>>> = {
  'cursor-left': 'left',
  'cursor-right': 'right',
  'word-left': 'word-left',
  'word-right': 'word-right',
  'line-start': 'start',
  'line-end': 'end',
  'delete-back': 'delete-back',
  'delete-forward': 'delete-forward',
  'kill-word-back': 'kill-word-back',
  'kill-word-forward': 'kill-word-forward',
  'kill-to-start': 'kill-to-start',
  'kill-to-end': 'kill-to-end',
  yank: 'yank',
};

/** The edited line; undefined for an action that is no editing. */
export function applyLineAction(line: Line, action: ActionId): Line | undefined {
  const command = COMMANDS[action];
  return command && editLine(line, command);
}
