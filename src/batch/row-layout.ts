/** Where the parts of a row's question stand: in a column of its own, or fixed for all rows. */
import { parseNumber } from '../units/parse-number.ts';
import { isProblem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import type { HeaderColumn } from './header.ts';
import { type RowOptions, type Trouble, trouble, troubleOf } from './question-column.ts';

/** One row, wherever it comes from. */
export interface Cells {
  /** Without outer blanks; empty where nothing is stated. The same string object while the field does not change. */
  readonly text: (field: number) => string;
  /** Reads the field as `scanDecimal` does; false where it is no plain decimal. */
  readonly decimal: (field: number, out: Float64Array) => boolean;
}

const PARTS = ['from', 'into', 'path', 'wave'] as const;
export type Part = (typeof PARTS)[number];

/** What holds for every row. */
export interface FixedParts {
  readonly texts: { readonly [P in Part]?: string | undefined };
  readonly options: RowOptions;
}

export class RowLayout {
  readonly fixed: FixedParts;
  /** The columns that are options. */
  readonly optionColumns: readonly HeaderColumn[];
  private readonly parts: ReadonlyMap<string, HeaderColumn>;
  private readonly fields: ReadonlySet<number>;

  constructor(header: readonly HeaderColumn[], fixed: FixedParts) {
    this.fixed = fixed;
    this.parts = new Map(header.map((column) => [column.column.key, column]));
    this.fields = new Set(header.map(({ field }) => field));
    this.optionColumns = header.filter(({ column }) => !PARTS.some((part) => part === column.key));
  }

  column(key: string): HeaderColumn | undefined {
    return this.parts.get(key);
  }

  /** True where the field is part of the question. */
  reads(field: number): boolean {
    return this.fields.has(field);
  }

  stated(part: Part): boolean {
    return this.parts.has(part) || this.fixed.texts[part] !== undefined;
  }

  /** What the row says, or what is fixed; empty where nothing is stated. */
  text(part: Part, cells: Cells): string {
    const column = this.parts.get(part);
    return column ? cells.text(column.field) : (this.fixed.texts[part] ?? '');
  }

  /** The media of the path and the wave, as operands of the command line; a side left out is not asked about. */
  operands(cells: Cells): readonly string[] | Trouble {
    const wave = withUnit(this.text('wave', cells), this.parts.get('wave'));
    if (typeof wave !== 'string') return wave;
    if (this.stated('path')) {
      const path = splitPath(this.text('path', cells));
      if (path.length >= 2) return [...path, wave];
      const remedy = 'write air n-bk7, or air n=1.38@qw n-bk7';
      return trouble('short-path', 'the path names fewer than two media', remedy);
    }
    const from = this.stated('from') ? this.text('from', cells) : undefined;
    const into = this.stated('into') ? this.text('into', cells) : undefined;
    const empty = from === '' ? 'from' : into === '' ? 'into' : undefined;
    if (empty) return trouble('empty-cell', `${empty} is empty`, 'name the medium');
    return [from ?? into ?? '', into ?? from ?? '', wave];
  }

  /** What every row would lack, or have twice; `needs` tells the sides that a column of answers asks about. */
  fault(needs: { readonly from: boolean; readonly into: boolean }): Trouble | undefined {
    const { options, texts } = this.fixed;
    for (const [key, { column }] of this.parts) {
      if (options[key] === undefined && PARTS.every((part) => part !== key || texts[part] === undefined))
        continue;
      return trouble('given-twice', `the ${column.name} is both an option and a column`, 'keep one of them');
    }
    if (!this.stated('wave')) return lacks('wave', 'name it with its unit: wave_nm; or give --wave 633nm');
    if (this.stated('path')) {
      if (!this.stated('from') && !this.stated('into')) return undefined;
      const both = 'path and from or into are both given';
      return trouble('path-and-ends', both, 'give path alone, or from and into');
    }
    if (!this.stated('from') && needs.from) return lacks('from', '--from air');
    if (!this.stated('into') && needs.into) return lacks('into', '--into n-bk7');
    return undefined;
  }
}

const lacks = (part: Part, example: string): Trouble =>
  trouble('missing-column', `nothing says what the ${part} is`, `give a column ${part}, or ${example}`);

/** The text of a cell with the unit of its column behind it. */
export function withUnit(text: string, column: HeaderColumn | undefined): string | Trouble {
  if (!column) return text;
  const { name } = column.column;
  if (text === '') return trouble('empty-cell', `${name} is empty`, 'write a value');
  if (column.unit === '') return text;
  const number = parseNumber(text);
  if (!isProblem(number)) return text + column.unit;
  const bringsUnit = /^[-+.\d]/.test(text) && /[^\d.,eE+-]/.test(text);
  if (!bringsUnit) return troubleOf({ ...number, message: `${name}: ${number.message}` });
  return trouble(
    'not-a-number',
    `${name}: ${quoteInput(text)} is no bare number, but the column is in ${column.unit}`,
    `write the number alone, or name the column ${name} and give each cell its unit`,
  );
}

/** `air mgf2@qw n-bk7`, or `fused silica > air` where names hold blanks. */
export function splitPath(text: string): readonly string[] {
  const parts = /[>\u2192]/.test(text) ? text.split(/[>\u2192]/) : text.split(/\s+/);
  return parts.map((part) => part.trim()).filter((part) => part !== '');
}
