/**
 * Rows of cells in, values of the answer columns out. A row that asks for no more than the lean part of the answer about one
 * surface goes the short way: bare numbers are read from bytes, and media are bound once for all rows that share name and
 * conditions. Any other row, and every row that the short way does not understand, is asked as one question of the one-shot
 * command, so that values, refusals and their words are the same in both.
 */
import type { Answer } from '../answer/answer.ts';
import { bindMedium } from '../answer/powers.ts';
import type { Polarization } from '../answer/question.ts';
import { airToVacuum_um, vacuumToAir_um } from '../dispersion/air-index.ts';
import type { Conditions } from '../dispersion/evaluator.ts';
import type { BoundMedium } from '../medium/bound-medium.ts';
import { isRefusal, type Refusal } from '../medium/refusal.ts';
import { parseNumber } from '../units/parse-number.ts';
import { parseWave, type TypedWave } from '../units/parse-wave.ts';
import { isProblem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import { type AnswerColumn, valueAt } from './answer-columns.ts';
import { EXPONENT, MANTISSA } from './decimal-bytes.ts';
import type { HeaderColumn } from './header.ts';
import { type LeanAnswers, type LeanQuestion, leanAnswers } from './lean-answer.ts';
import { angleCell, type NumberCell, waveCell } from './number-cell.ts';
import { type Asking, type RowOptions, type Trouble, trouble, troubleOf } from './question-column.ts';

/** One row, wherever it comes from. */
export interface Cells {
  /** Without outer blanks; empty where nothing is stated. The same string object while the field does not change. */
  readonly text: (field: number) => string;
  /** Reads the field as `scanDecimal` does; false where it is no plain decimal. */
  readonly decimal: (field: number, out: Float64Array) => boolean;
}

/** What holds for every row. */
export interface FixedParts {
  readonly texts: { readonly [Part in 'from' | 'into' | 'path' | 'wave']?: string | undefined };
  readonly options: RowOptions;
}

/** Option values that the short way knows; others send a row the long way. */
const LEAN_OPTIONS = new Set([
  'angle_rad',
  'polarization',
  'airWavelength',
  'extrapolate',
  'temperature_K',
  'pressure_Pa',
  'humidity',
  'co2_ppm',
  'salinity_g_per_kg',
]);

const CONDITIONS = ['temperature_K', 'pressure_Pa', 'humidity', 'co2_ppm', 'salinity_g_per_kg'] as const;

/** Media bound at a time; more distinct ones than this are bound anew. */
const MOST_BOUND = 256;
const MOST_WAVES = 4096;

type Evaluated = Trouble | undefined;

export class RowAnswers {
  private readonly asking: Asking;
  private readonly columns: readonly AnswerColumn[];
  private readonly fixed: FixedParts;
  private readonly parts = new Map<string, HeaderColumn>();
  private readonly optionColumns: readonly OptionCell[];
  private readonly lean: LeanAnswers | undefined;
  private readonly waveOf: NumberCell | undefined;
  private readonly angleOf: NumberCell | undefined;
  private readonly angleColumn: HeaderColumn | undefined;

  private readonly digits = new Float64Array(2);
  private readonly question: LeanQuestion;
  private conditions: Conditions;
  private conditionsKey = '';
  private extrapolate: boolean;
  private inAir: boolean;
  private readonly waves = new Map<string, TypedWave | undefined>();
  private readonly bound = new Map<string, BoundMedium | undefined>();
  private readonly from: LastMedium = { text: undefined, key: '', bound: undefined, literal: false };
  private readonly into: LastMedium = { text: undefined, key: '', bound: undefined, literal: false };
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
    this.fixed = fixed;
    for (const column of header) this.parts.set(column.column.key, column);
    this.optionColumns = header
      .filter(({ column }) => !['from', 'into', 'path', 'wave'].includes(column.key))
      .map((column) => ({ column, text: undefined, value: undefined, trouble: undefined }));
    const wave = this.parts.get('wave');
    this.waveOf = wave && waveCell(wave.unit);
    this.angleColumn = this.parts.get('angle_rad');
    this.angleOf = this.angleColumn && angleCell(this.angleColumn.unit);
    const { options } = fixed;
    const known =
      !whole &&
      Object.keys(options).every((key) => LEAN_OPTIONS.has(key)) &&
      this.optionColumns.every(({ column }) => LEAN_OPTIONS.has(column.column.key));
    this.lean = known ? leanAnswers(columns) : undefined;
    this.inAir = options['airWavelength'] === true;
    this.extrapolate = options['extrapolate'] === true;
    this.conditions = {};
    this.question = {
      from: undefined,
      into: undefined,
      fromIsLiteral: false,
      vacuum_um: 0,
      air_um: 0,
      angle_rad: (options['angle_rad'] as number | undefined) ?? 0,
      polarization: (options['polarization'] as Polarization | undefined) ?? 'unpolarized',
    };
    this.readConditions();
  }

  /** True where the field is part of the question. */
  reads(field: number): boolean {
    return [...this.parts.values()].some((column) => column.field === field);
  }

  /** What every row would lack. */
  missing(): Trouble | undefined {
    const stated = (part: 'from' | 'into' | 'path' | 'wave'): boolean =>
      this.parts.has(part) || this.fixed.texts[part] !== undefined;
    const lacks = (part: 'from' | 'into' | 'wave', example: string): Trouble =>
      trouble('missing-column', `nothing says what the ${part} is`, `give a column ${part}, or ${example}`);
    const both = [...this.parts.values()].find(
      ({ column: { key } }) =>
        this.fixed.options[key] !== undefined ||
        Object.entries(this.fixed.texts).some(([part, text]) => part === key && text !== undefined),
    );
    if (both) {
      const { name } = both.column;
      return trouble('given-twice', `the ${name} is both an option and a column`, 'keep one of them');
    }
    if (!stated('wave')) return lacks('wave', 'name it with its unit: wave_nm; or give --wave 633nm');
    if (stated('path')) {
      if (!stated('from') && !stated('into')) return undefined;
      return trouble(
        'path-and-ends',
        'path and from or into are both given',
        'give path alone, or from and into',
      );
    }
    if (!stated('from') && (!this.lean || this.lean.needsFrom)) return lacks('from', '--from air');
    if (!stated('into') && (!this.lean || this.lean.needsInto)) return lacks('into', '--into n-bk7');
    return undefined;
  }

  /** Answers the row; `value` then gives what the columns ask. */
  evaluate(cells: Cells): Evaluated | Promise<Evaluated> {
    this.answer = undefined;
    if (this.lean && this.readLean(cells) && this.lean.evaluate(this.question)) return undefined;
    return this.ask(cells);
  }

  /** Value of answer column `i` of the row last answered. */
  value(i: number): string | number | boolean | null {
    if (this.answer) return valueAt(this.answer, this.columns[i]!);
    const value = this.lean?.value(i) ?? Number.NaN;
    return Number.isFinite(value) ? value : null;
  }

  /** The same where it is a number; NaN for anything else. */
  number(i: number): number {
    if (!this.answer && this.lean) return this.lean.value(i);
    const value = this.value(i);
    return typeof value === 'number' ? value : Number.NaN;
  }

  /** The whole answer to the row, where that was asked. */
  get whole(): Answer | undefined {
    return this.answer;
  }

  /** Which media were answered outside the range of their fits. */
  get outside(): string {
    if (!this.answer) return this.lean?.outside(this.question) ?? '';
    const { cautions } = this.answer;
    return cautions.flatMap(({ code, about }) => (code === 'outside-fit-range' ? [about] : [])).join(' ');
  }

  /** Reads the row into `question`; false where it does not fit in there. */
  private readLean(cells: Cells): boolean {
    if (this.optionColumns.length > 0 && !this.readOptions(cells)) return false;
    const length_m = this.readWave(cells);
    if (!(length_m > 0)) return false;
    const { question } = this;
    const um = length_m * 1e6;
    if (this.inAir) {
      question.air_um = um;
      question.vacuum_um = airToVacuum_um(um);
    } else {
      question.vacuum_um = um;
      question.air_um = vacuumToAir_um(um);
    }
    if (this.parts.has('path') || this.fixed.texts.path !== undefined) {
      const ends = splitPath(this.part('path', cells));
      return ends.length === 2 && this.readMedia(ends[0], ends[1]);
    }
    return this.readMedia(this.endText('from', cells), this.endText('into', cells));
  }

  private readMedia(from: string | undefined, into: string | undefined): boolean {
    const { question } = this;
    if (from !== undefined) {
      const bound = this.bind(from, this.from);
      if (!bound) return false;
      question.from = bound;
      question.fromIsLiteral = this.from.literal;
    }
    if (into !== undefined) {
      const bound = this.bind(into, this.into);
      if (!bound) return false;
      question.into = bound;
    }
    return true;
  }

  private bind(text: string, last: LastMedium): BoundMedium | undefined {
    if (last.text === text && last.key === this.conditionsKey) return last.bound;
    const key = `${text}\n${this.conditionsKey}`;
    if (this.bound.size > MOST_BOUND) this.bound.clear();
    let bound = this.bound.get(key);
    if (!bound && !this.bound.has(key)) {
      const spec = this.asking.medium(text);
      bound = spec && bindMedium(spec, this.conditions, this.extrapolate);
      this.bound.set(key, bound);
    }
    last.text = text;
    last.key = this.conditionsKey;
    last.bound = bound;
    last.literal = text.includes('=');
    return bound;
  }

  /** Wavelength as given, in metres; NaN where it is not understood. */
  private readWave(cells: Cells): number {
    const column = this.parts.get('wave');
    if (this.waveOf && column && cells.decimal(column.field, this.digits)) {
      return this.waveOf(this.digits[MANTISSA]!, this.digits[EXPONENT]!);
    }
    const text = this.part('wave', cells) + (column?.unit ?? '');
    let wave = this.waves.get(text);
    if (!wave && !this.waves.has(text)) {
      const read = parseWave(text);
      wave = isProblem(read) ? undefined : read;
      if (this.waves.size > MOST_WAVES) this.waves.clear();
      this.waves.set(text, wave);
    }
    // A spectral line is one in air by itself, and only wavelengths have an air wavelength: the long way knows.
    if (!wave || wave.inAir || (this.inAir && wave.kind !== 'wavelength')) return Number.NaN;
    return wave.wavelength_m;
  }

  /** Option columns of the row; false where one is not understood. */
  private readOptions(cells: Cells): boolean {
    let changed = false;
    for (const cell of this.optionColumns) {
      const { column } = cell;
      if (column === this.angleColumn && this.angleOf && cells.decimal(column.field, this.digits)) {
        const angle_rad = this.angleOf(this.digits[MANTISSA]!, this.digits[EXPONENT]!);
        if (Number.isNaN(angle_rad)) return false;
        this.question.angle_rad = angle_rad;
        continue;
      }
      const text = cells.text(column.field);
      if (text !== cell.text) {
        readOption(cell, text);
        changed = true;
      }
      if (cell.trouble) return false;
      if (column === this.angleColumn) this.question.angle_rad = (cell.value as number | undefined) ?? 0;
    }
    if (changed) this.applyOptions();
    return true;
  }

  private applyOptions(): void {
    const options = this.rowOptions();
    this.question.polarization = (options['polarization'] as Polarization | undefined) ?? 'unpolarized';
    this.inAir = options['airWavelength'] === true;
    this.extrapolate = options['extrapolate'] === true;
    this.readConditions();
  }

  private readConditions(): void {
    const options = this.rowOptions();
    const entries = CONDITIONS.flatMap((key) =>
      options[key] === undefined ? [] : [[key, options[key]] as const],
    );
    this.conditions = Object.fromEntries(entries);
    this.conditionsKey = `${this.extrapolate} ${entries.map((entry) => entry.join('=')).join(' ')}`;
  }

  private rowOptions(): RowOptions {
    const options: Record<string, unknown> = { ...this.fixed.options };
    for (const { column, value } of this.optionColumns) {
      if (value !== undefined) options[column.column.key] = value;
    }
    return options;
  }

  /** The long way: one question of the one-shot command. */
  private ask(cells: Cells): Evaluated | Promise<Evaluated> {
    for (const cell of this.optionColumns) {
      readOption(cell, cells.text(cell.column.field));
      if (cell.trouble) return cell.trouble;
    }
    const operands = this.operands(cells);
    if (!isOperands(operands)) return operands;
    const result = this.asking.answer(operands, this.rowOptions());
    return result instanceof Promise ? result.then((r) => this.keep(r)) : this.keep(result);
  }

  private keep(result: Answer | Refusal): Evaluated {
    if (isRefusal(result)) return troubleOf(result);
    this.answer = result;
    return undefined;
  }

  private operands(cells: Cells): readonly string[] | Trouble {
    const waveColumn = this.parts.get('wave');
    const wave = cellText(this.part('wave', cells), waveColumn);
    if (typeof wave !== 'string') return wave;
    if (this.parts.has('path') || this.fixed.texts.path !== undefined) {
      const path = splitPath(this.part('path', cells));
      if (path.length >= 2) return [...path, wave];
      return trouble(
        'short-path',
        'the path names fewer than two media',
        'write air n-bk7, or air n=1.38@qw n-bk7',
      );
    }
    const from = this.endText('from', cells);
    const into = this.endText('into', cells);
    const empty = from === '' ? 'from' : into === '' ? 'into' : undefined;
    if (empty) return trouble('empty-cell', `${empty} is empty`, 'name the medium');
    // A side that was left out is not asked about: the other one stands in for it.
    return [from ?? into ?? '', into ?? from ?? '', wave];
  }

  private endText(part: 'from' | 'into', cells: Cells): string | undefined {
    return this.parts.has(part) || this.fixed.texts[part] !== undefined ? this.part(part, cells) : undefined;
  }

  private part(part: 'from' | 'into' | 'path' | 'wave', cells: Cells): string {
    const column = this.parts.get(part);
    return column ? cells.text(column.field) : (this.fixed.texts[part] ?? '');
  }
}

interface LastMedium {
  text: string | undefined;
  key: string;
  bound: BoundMedium | undefined;
  literal: boolean;
}

/** An option column with what its last text was worth. */
interface OptionCell {
  readonly column: HeaderColumn;
  text: string | undefined;
  value: unknown;
  trouble: Trouble | undefined;
}

function readOption(cell: OptionCell, text: string): void {
  cell.text = text;
  cell.value = undefined;
  cell.trouble = undefined;
  if (text === '') return;
  const { column } = cell.column;
  const written = cellText(text, cell.column);
  const value = typeof written === 'string' ? column.parse(written) : written;
  if (isProblem(value)) cell.trouble = troubleOf({ ...value, message: `${column.name}: ${value.message}` });
  else if (typeof written !== 'string') cell.trouble = written;
  else cell.value = value;
}

/** The cell with the unit of its column. */
function cellText(text: string, column: HeaderColumn | undefined): string | Trouble {
  if (!column || text === '' || column.unit === '') {
    return text === '' && column
      ? trouble('empty-cell', `${column.column.name} is empty`, 'write a value')
      : text;
  }
  const number = parseNumber(text);
  if (!isProblem(number)) return text + column.unit;
  const { name } = column.column;
  return /^[-+.\d]/.test(text) && number.code === 'not-a-number' && /[^\d.,eE+-]/.test(text)
    ? trouble(
        'not-a-number',
        `${name}: ${quoteInput(text)} is no bare number, but the column is in ${column.unit}`,
        `write the number alone, or name the column ${name} and give each cell its unit`,
      )
    : troubleOf({ ...number, message: `${name}: ${number.message}` });
}

const isOperands = (x: readonly string[] | Trouble): x is readonly string[] => Array.isArray(x);

/** `air mgf2@qw n-bk7`, or `fused silica > air` where names hold blanks. */
function splitPath(text: string): readonly string[] {
  const parts = /[>\u2192]/.test(text) ? text.split(/[>\u2192]/) : text.split(/\s+/);
  return parts.map((part) => part.trim()).filter((part) => part !== '');
}
