/**
 * Rows of cells in, values of the answer columns out. A row that asks for no more than the lean part of the answer about one
 * surface goes the short way. Any other row, and every row that the short way does not understand, is asked as one question
 * of the one-shot command, so that values, refusals and their words are the same in both.
 */
import type { Answer } from '../answer/answer.ts';
import { isRefusal, type Refusal } from '../medium/refusal.ts';
import { type AnswerColumn, valueAt } from './answer-columns.ts';
import type { HeaderColumn } from './header.ts';
import { type LeanAnswers, leanAnswers, makeRows } from './lean-answer.ts';
import { knowsOptions, LeanReader } from './lean-reader.ts';
import { OptionCells } from './option-cells.ts';
import { type Asking, type Trouble, troubleOf } from './question-column.ts';
import { type Cells, type FixedParts, RowLayout } from './row-layout.ts';

type Evaluated = Trouble | undefined;

export class RowAnswers {
  readonly layout: RowLayout;
  /** The short way, where every row may take it. */
  readonly lean: { readonly answers: LeanAnswers; readonly reader: LeanReader } | undefined;

  private readonly asking: Asking;
  private readonly columns: readonly AnswerColumn[];
  private readonly options: OptionCells;
  private readonly one = makeRows(1);
  private answer: Answer | undefined;

  constructor(
    asking: Asking,
    header: readonly HeaderColumn[],
    fixed: FixedParts,
    columns: readonly AnswerColumn[],
    /** The whole answer is wanted besides. */
    whole = false,
  ) {
    this.asking = asking;
    this.columns = columns;
    this.layout = new RowLayout(header, fixed);
    this.options = new OptionCells(this.layout);
    const answers = whole || !knowsOptions(this.layout) ? undefined : leanAnswers(columns);
    this.lean = answers && { answers, reader: new LeanReader(asking, this.layout, this.options) };
  }

  /** What every row would lack. */
  fault(): Trouble | undefined {
    const answers = this.lean?.answers;
    return this.layout.fault({ from: answers?.needsFrom ?? true, into: answers?.needsInto ?? true });
  }

  /** Answers the row; `value` then gives what the columns ask. */
  evaluate(cells: Cells): Evaluated | Promise<Evaluated> {
    this.answer = undefined;
    const { lean, one } = this;
    if (lean?.reader.read(cells, one, 0) && lean.answers.evaluate(lean.reader.surface, one, 0))
      return undefined;
    return this.ask(cells);
  }

  /** Value of answer column `i` of the row last answered. */
  value(i: number): string | number | boolean | null {
    if (this.answer || !this.lean) return valueAt(this.answer, this.columns[i]!);
    const value = this.lean.answers.valuesOf(this.one, i)[0]! * this.columns[i]!.factor;
    return Number.isFinite(value) ? value : null;
  }

  /** The whole answer to the row, where that was asked. */
  get whole(): Answer | undefined {
    return this.answer;
  }

  /** Which media were answered outside the range of their fits. */
  get outside(): string {
    const { answer, lean } = this;
    if (answer) {
      const outside = answer.cautions.filter(({ code }) => code === 'outside-fit-range');
      return outside.map(({ about }) => about).join(' ');
    }
    return lean?.answers.outside(lean.reader.surface, this.one, 0) ?? '';
  }

  private ask(cells: Cells): Evaluated | Promise<Evaluated> {
    const read = this.options.read(cells);
    if (typeof read !== 'boolean') return read;
    const operands = this.layout.operands(cells);
    if ('code' in operands) return operands;
    const result = this.asking.answer(operands, this.options.values());
    return result instanceof Promise ? result.then((r) => this.keep(r)) : this.keep(result);
  }

  private keep(result: Answer | Refusal): Evaluated {
    if (isRefusal(result)) return troubleOf(result);
    this.answer = result;
    return undefined;
  }
}
