/**
 * The points of a sweep as rows of a batch: one variable, or several as a grid, the last one running fastest. Each point is
 * read and answered as a row of a file would be.
 */

import { canonicalUnit } from '../units/canonical-unit.ts';
import { orList } from '../units/parse-choice.ts';
import { isProblem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import type { AnswerColumn } from './answer-columns.ts';
import type { BatchFormat, Step } from './batch-format.ts';
import { EXPONENT, MANTISSA } from './decimal-bytes.ts';
import type { HeaderColumn } from './header.ts';
import { type Asking, type Trouble, trouble, troubleOf } from './question-column.ts';
import { RowAnswers } from './row-answers.ts';
import type { RowForm } from './row-form.ts';
import type { Cells, FixedParts } from './row-layout.ts';
import { MOST_POINTS, pointText, type SweepRange } from './sweep-range.ts';

export interface SweepVariable extends HeaderColumn {
  readonly range: SweepRange;
}

/** The column of what is swept, or what is wrong with its name, its unit or its ends. */
export function sweepVariable(
  range: SweepRange,
  field: number,
  asking: Pick<Asking, 'columns' | 'nearest'>,
): SweepVariable | Trouble {
  const name = range.name.toLowerCase().replaceAll('_', '-');
  const sweepable = asking.columns.filter(({ unitNames }) => unitNames !== '');
  const column = sweepable.find((c) => c.name === name || c.aliases.includes(name));
  if (!column) {
    const names = sweepable.map((c) => c.name);
    const close = asking.nearest(name, names);
    const remedy = close.length > 0 ? `did you mean ${orList(close)}?` : `sweep ${orList(names)}`;
    return trouble('unknown-column', `${quoteInput(range.name)} cannot be swept`, remedy);
  }
  // A bare number is in degrees, and the name of the column is to say so.
  const typed = range.unit === '' && column.key === 'angle_rad' ? 'deg' : plainUnit(range.unit);
  const unit = typed === '' ? '' : column.unit(typed);
  if (unit === undefined) {
    const message = `${quoteInput(range.unit)} is no unit of the ${column.name}`;
    return trouble('bad-column-unit', message, `units are ${column.unitNames}`);
  }
  for (const i of [0, range.points - 1]) {
    const end = column.parse(pointText(range, i) + unit);
    if (isProblem(end)) return troubleOf({ ...end, message: `${column.name}: ${end.message}` });
  }
  return { column, field, unit, range };
}

const plainUnit = (unit: string): string =>
  canonicalUnit(unit).replace('\u00b0C', 'C').replace('\u00b0', 'deg');

/** Name of the column, unit included. */
export const variableName = ({ column, unit }: SweepVariable): string =>
  unit === '' ? column.name : `${column.name}_${unit}`;

export interface SweepSetup {
  readonly asking: Asking;
  readonly variables: readonly SweepVariable[];
  readonly fixed: FixedParts;
  readonly columns: readonly AnswerColumn[];
  readonly form: RowForm;
  readonly whole: boolean;
}

export class SweepBatch implements BatchFormat {
  rows = 0;
  failed = 0;
  slow = false;
  readonly fatal: Trouble | undefined;
  /** Why the first point that was not answered was not. */
  firstTrouble: Trouble | undefined;

  private readonly setup: SweepSetup;
  private readonly answers: RowAnswers;
  private readonly cells: PointCells;
  private readonly points: number;
  private begun = false;

  constructor(setup: SweepSetup) {
    this.setup = setup;
    const { asking, variables, fixed, columns, whole } = setup;
    this.answers = new RowAnswers(asking, variables, fixed, columns, whole);
    this.cells = new PointCells(variables);
    this.points = variables.reduce((count, { range }) => count * range.points, 1);
    this.fatal =
      this.points > MOST_POINTS
        ? trouble(
            'too-many-points',
            `the grid has ${this.points.toPrecision(2)} points, and ${MOST_POINTS} are the most`,
            'take larger steps, or put the rows into halfspace stream',
          )
        : this.answers.fault();
  }

  push(): void {
    // A sweep has no input.
  }

  end(): void {
    // Nor an end of it.
  }

  run(limit: number): Step | Promise<Step> {
    const { setup, cells } = this;
    if (this.fatal) return 'hungry';
    if (!this.begun) {
      this.begun = true;
      setup.form.begin();
    }
    for (let left = limit; left > 0; left--) {
      if (this.rows >= this.points) return 'hungry';
      cells.place(this.rows);
      this.rows++;
      const bad = this.answers.evaluate(cells);
      if (bad instanceof Promise) {
        return bad.then((result) => {
          this.write(result);
          return 'more' as const;
        });
      }
      this.write(bad);
    }
    return 'more';
  }

  private write(bad: Trouble | undefined): void {
    const { form } = this.setup;
    if (bad) {
      this.failed++;
      this.firstTrouble ??= bad;
    }
    this.slow = this.answers.whole !== undefined;
    form.row(this.cells.texts, this.answers, bad);
  }
}

class PointCells implements Cells {
  readonly texts: string[];
  private readonly variables: readonly SweepVariable[];
  private readonly places: number[];

  constructor(variables: readonly SweepVariable[]) {
    this.variables = variables;
    this.places = variables.map(() => -1);
    this.texts = variables.map(() => '');
  }

  /** Moves to point number `row` of the grid. */
  place(row: number): void {
    let rest = row;
    for (let v = this.variables.length - 1; v >= 0; v--) {
      const { range } = this.variables[v]!;
      const i = rest % range.points;
      rest = (rest - i) / range.points;
      if (this.places[v] === i) continue;
      this.places[v] = i;
      this.texts[v] = pointText(range, i);
    }
  }

  text(field: number): string {
    return this.texts[field] ?? '';
  }

  decimal(field: number, out: Float64Array): boolean {
    const { range } = this.variables[field]!;
    const mantissa = range.first + BigInt(this.places[field]!) * range.step;
    if (mantissa >= EXACT || mantissa <= -EXACT) return false;
    out[MANTISSA] = Number(mantissa);
    out[EXPONENT] = range.exponent;
    return true;
  }
}

/** Whole numbers below this are exact as doubles. */
const EXACT = 10n ** 15n;
