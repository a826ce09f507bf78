/**
 * Reads a row that asks no more than the lean answer gives: numbers without a text in between, and media bound once for all
 * rows that share name and conditions.
 */
import { bindMedium } from '../answer/powers.ts';
import type { Polarization } from '../answer/question.ts';
import { airToVacuum_um, vacuumToAir_um } from '../dispersion/air-index.ts';
import type { Conditions } from '../dispersion/evaluator.ts';
import type { BoundMedium } from '../medium/bound-medium.ts';
import { parseWave } from '../units/parse-wave.ts';
import { isProblem } from '../units/problem.ts';
import { EXPONENT, MANTISSA } from './decimal-bytes.ts';
import type { HeaderColumn } from './header.ts';
import type { LeanRows, LeanSurface } from './lean-answer.ts';
import { angleUnit, type NumberUnit, numberValue, waveUnit } from './number-cell.ts';
import type { OptionCells } from './option-cells.ts';
import type { Asking, RowOptions } from './question-column.ts';
import { type Cells, type RowLayout, splitPath } from './row-layout.ts';

const CONDITIONS = ['temperature_K', 'pressure_Pa', 'humidity', 'co2_ppm', 'salinity_g_per_kg'] as const;

/** Option values that are understood here; others are asked the long way. */
const KNOWN_OPTIONS: ReadonlySet<string> = new Set([
  'angle_rad',
  'polarization',
  'airWavelength',
  'extrapolate',
  ...CONDITIONS,
]);

/** Media and waves kept; more distinct ones than this are read anew. */
const MOST_BOUND = 256;
const MOST_WAVES = 4096;

export const knowsOptions = ({ optionColumns, fixed }: RowLayout): boolean =>
  [...Object.keys(fixed.options), ...optionColumns.map(({ column }) => column.key)].every((key) =>
    KNOWN_OPTIONS.has(key),
  );

/** What rows of nothing but plain numbers consist of. */
export interface PlainColumns {
  readonly waveField: number;
  readonly wave: NumberUnit;
  /** Negative where the angle is fixed. */
  readonly angleField: number;
  readonly angle: NumberUnit | undefined;
  readonly fixedAngle_rad: number;
  readonly inAir: boolean;
}

export class LeanReader {
  readonly surface: LeanSurface = {
    from: undefined,
    into: undefined,
    fromIsLiteral: false,
    polarization: 'unpolarized',
    inAir: false,
  };

  private readonly asking: Asking;
  private readonly layout: RowLayout;
  private readonly options: OptionCells;
  private readonly wave: HeaderColumn | undefined;
  private readonly waveOf: NumberUnit | undefined;
  private readonly angle: HeaderColumn | undefined;
  private readonly angleOf: NumberUnit | undefined;
  private readonly hasPath: boolean;
  private readonly digits = new Float64Array(2);
  private readonly waves = new Map<string, number>();
  private readonly bound = new Map<string, BoundMedium | undefined>();
  private readonly ends: readonly [End, End];
  private conditions: Conditions = {};
  private conditionsKey = '';
  private extrapolate = false;
  private inAir = false;
  private statedAngle_rad = 0;

  constructor(asking: Asking, layout: RowLayout, options: OptionCells) {
    this.asking = asking;
    this.layout = layout;
    this.options = options;
    this.wave = layout.column('wave');
    this.waveOf = this.wave && waveUnit(this.wave.unit);
    this.angle = layout.column('angle_rad');
    this.angleOf = this.angle && angleUnit(this.angle.unit);
    this.hasPath = layout.stated('path');
    const end = (part: 'from' | 'into'): End => ({
      part,
      stated: layout.stated(part),
      text: undefined,
      key: '',
      bound: undefined,
    });
    this.ends = [end('from'), end('into')];
    this.apply(layout.fixed.options);
  }

  /** Reads the row into place `i`; false where it is to be asked the long way. */
  read(cells: Cells, rows: LeanRows, i: number): boolean {
    if (this.layout.optionColumns.length > 0) {
      const plainAngle =
        this.angle !== undefined &&
        this.angleOf !== undefined &&
        cells.decimal(this.angle.field, this.digits);
      const angle_rad = plainAngle
        ? numberValue(this.angleOf!, this.digits[MANTISSA]!, this.digits[EXPONENT]!)
        : Number.NaN;
      const read = this.options.read(cells, plainAngle ? this.angle : undefined);
      if (typeof read !== 'boolean' || (plainAngle && Number.isNaN(angle_rad))) return false;
      if (read) this.apply(this.options.values());
      rows.angle_rad[i] = plainAngle ? angle_rad : this.statedAngle_rad;
    } else rows.angle_rad[i] = this.statedAngle_rad;
    const given_m = this.readWave(cells);
    const um = given_m * 1e6;
    if (!(um > 0)) return false;
    rows.given_m[i] = given_m;
    rows.vacuum_um[i] = this.inAir ? airToVacuum_um(um) : um;
    rows.air_um[i] = this.inAir ? um : vacuumToAir_um(um);
    return this.readMedia(cells);
  }

  /** How rows can be read in bulk; undefined where anything but wave and angle may change from row to row. */
  plain(): PlainColumns | undefined {
    const { layout, wave, waveOf, angle, angleOf } = this;
    if (!wave || !waveOf || layout.column('from') || layout.column('into') || layout.column('path'))
      return undefined;
    if (layout.optionColumns.some((column) => column !== angle) || (angle && !angleOf)) return undefined;
    return {
      waveField: wave.field,
      wave: waveOf,
      angleField: angle?.field ?? -1,
      angle: angleOf,
      fixedAngle_rad: this.statedAngle_rad,
      inAir: this.inAir,
    };
  }

  private apply(options: RowOptions): void {
    this.surface.polarization = (options['polarization'] as Polarization | undefined) ?? 'unpolarized';
    this.statedAngle_rad = (options['angle_rad'] as number | undefined) ?? 0;
    this.inAir = options['airWavelength'] === true;
    this.surface.inAir = this.inAir;
    this.extrapolate = options['extrapolate'] === true;
    const stated = CONDITIONS.filter((key) => options[key] !== undefined);
    this.conditions = Object.fromEntries(stated.map((key) => [key, options[key]]));
    this.conditionsKey = [this.extrapolate, ...stated.map((key) => `${key}=${options[key]}`)].join(' ');
  }

  /** Wavelength as given, in metres; NaN where it is not understood, or needs more than a number to be. */
  private readWave(cells: Cells): number {
    const { wave, waveOf } = this;
    if (wave && waveOf && cells.decimal(wave.field, this.digits)) {
      return numberValue(waveOf, this.digits[MANTISSA]!, this.digits[EXPONENT]!);
    }
    const text = this.layout.text('wave', cells) + (wave?.unit ?? '');
    const key = this.inAir ? `${text} air` : text;
    let length_m = this.waves.get(key);
    if (length_m === undefined) {
      const read = parseWave(text, { airWavelength: this.inAir });
      // A spectral line is in air by itself.
      length_m = isProblem(read) || read.inAir !== this.inAir ? Number.NaN : read.wavelength_m;
      if (this.waves.size >= MOST_WAVES) this.waves.clear();
      this.waves.set(key, length_m);
    }
    return length_m;
  }

  private readMedia(cells: Cells): boolean {
    const [from, into] = this.ends;
    if (this.hasPath) {
      const path = splitPath(this.layout.text('path', cells));
      if (path.length !== 2) return false;
      from.stated = true;
      into.stated = true;
      return this.bind(path[0] ?? '', from) && this.bind(path[1] ?? '', into) && this.place();
    }
    return (
      (!from.stated || this.bind(this.layout.text('from', cells), from)) &&
      (!into.stated || this.bind(this.layout.text('into', cells), into)) &&
      this.place()
    );
  }

  private place(): true {
    const [from, into] = this.ends;
    this.surface.from = from.bound;
    this.surface.into = into.bound;
    this.surface.fromIsLiteral = from.text?.includes('=') === true;
    return true;
  }

  private bind(text: string, end: End): boolean {
    if (end.text === text && end.key === this.conditionsKey) return end.bound !== undefined;
    const key = `${text}\n${this.conditionsKey}`;
    let bound = this.bound.get(key);
    if (!bound && !this.bound.has(key)) {
      const spec = this.asking.medium(text);
      bound = spec && bindMedium(spec, this.conditions, this.extrapolate);
      if (this.bound.size >= MOST_BOUND) this.bound.clear();
      this.bound.set(key, bound);
    }
    end.text = text;
    end.key = this.conditionsKey;
    end.bound = bound;
    return bound !== undefined;
  }
}

/** One end of the path, as last read. */
interface End {
  readonly part: 'from' | 'into';
  stated: boolean;
  text: string | undefined;
  key: string;
  bound: BoundMedium | undefined;
}

/** Both references of the first wavelengths in metres, as the answer makes them. */
export function putWaves(rows: LeanRows, count: number, inAir: boolean): void {
  const { vacuum_um, air_um, given_m } = rows;
  for (let i = 0; i < count; i++) {
    const um = given_m[i]! * 1e6;
    vacuum_um[i] = inAir ? airToVacuum_um(um) : um;
    air_um[i] = inAir ? um : vacuumToAir_um(um);
  }
}
