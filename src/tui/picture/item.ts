/**
 * The parts the picture is made of, before anything is placed: an item is a field, a result, or a piece of text. Blocks are
 * what belongs to one medium or to the surface: a fixed top and bottom, and a body that scrolls where room is short.
 */
import type { NumberStyle } from '../../units/number-style.ts';
import { fieldById } from '../fields/all-fields.ts';
import type { FieldContext, FieldId } from '../fields/field.ts';
import { fieldStop, type StopId } from '../state.ts';
import type { Role } from '../theme.ts';

export interface Item {
  /** Absent for text that nothing can be done with. */
  readonly stop?: StopId;
  readonly label: string;
  readonly text: string;
  readonly role: Role;
  /** Chord shown at the end of the row: the key that goes there. */
  readonly chord?: string | undefined;
  /** In words, for the line that explains what the keys act on. */
  readonly describe: string;
  /** What copying it gives; '' where there is nothing to copy. */
  readonly copy: string;
  /** May be left out where room is short. */
  readonly optional?: boolean;
}

export type Row = readonly Item[];

export interface Block {
  readonly top: readonly Row[];
  readonly body: readonly Row[];
  readonly bottom: readonly Row[];
}

export const BLANK_ROW: Row = [];

export function textItem(text: string, role: Role = 'text'): Item {
  return { label: '', text, role, describe: '', copy: '' };
}

export function fieldItem(id: FieldId, context: FieldContext, style: NumberStyle): Item {
  const field = fieldById(id);
  const text = field.show(context, style);
  return {
    stop: fieldStop(id),
    label: field.label,
    text,
    role: 'field',
    describe: field.hint,
    copy: text,
  };
}

/** Items of those ids that mean something for the question. */
export function fieldItems(
  ids: readonly FieldId[],
  context: FieldContext,
  style: NumberStyle,
): readonly Item[] {
  return ids.filter((id) => fieldById(id).applies(context)).map((id) => fieldItem(id, context, style));
}
