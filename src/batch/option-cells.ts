/** The option columns of a batch: cells parsed as the option of the name would be, each distinct text once in a row. */
import { isProblem } from '../units/problem.ts';
import type { HeaderColumn } from './header.ts';
import { type RowOptions, type Trouble, troubleOf } from './question-column.ts';
import { type Cells, type RowLayout, withUnit } from './row-layout.ts';

interface OptionCell {
  readonly column: HeaderColumn;
  text: string | undefined;
  value: unknown;
  trouble: Trouble | undefined;
}

export class OptionCells {
  private readonly cells: readonly OptionCell[];
  private readonly fixed: RowOptions;

  constructor({ optionColumns, fixed }: RowLayout) {
    this.fixed = fixed.options;
    this.cells = optionColumns.map((column) => ({
      column,
      text: undefined,
      value: undefined,
      trouble: undefined,
    }));
  }

  /** Reads every option of the row but those of `apart`: what is wrong with the first bad one, true where any has changed. */
  read(row: Cells, apart?: HeaderColumn): Trouble | boolean {
    let changed = false;
    for (const cell of this.cells) {
      if (cell.column === apart) continue;
      const text = row.text(cell.column.field);
      if (text !== cell.text) {
        readCell(cell, text);
        changed = true;
      }
      if (cell.trouble) return cell.trouble;
    }
    return changed;
  }

  /** The options of the row last read, with the fixed ones. */
  values(): RowOptions {
    const values: Record<string, unknown> = { ...this.fixed };
    for (const { column, value } of this.cells) {
      if (value !== undefined) values[column.column.key] = value;
    }
    return values;
  }
}

function readCell(cell: OptionCell, text: string): void {
  cell.text = text;
  cell.value = undefined;
  cell.trouble = undefined;
  if (text === '') return;
  const { column } = cell.column;
  const written = withUnit(text, cell.column);
  if (typeof written !== 'string') {
    cell.trouble = written;
    return;
  }
  const value = column.parse(written);
  if (isProblem(value)) cell.trouble = troubleOf({ ...value, message: `${column.name}: ${value.message}` });
  else cell.value = value;
}
