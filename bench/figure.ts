/** One measured figure, its target, and how both are printed. Times are never figures by themselves: they are ratios of one run. */
export interface Target {
  /** Neither more nor, with `atLeast`, less than this. */
  readonly atMost?: number;
  readonly atLeast?: number;
  /** What may still pass; the target itself where absent. */
  readonly atWorst?: number;
}

export interface Figure {
  readonly name: string;
  readonly value: number;
  /** `x node -e 0`, `bytes`, `ms`: what stands behind the value. */
  readonly unit: string;
  readonly target?: Target;
  /** How it was come by; what it was measured against. */
  readonly note?: string;
}

/** Something that could not be measured, and why. */
export interface Missing {
  readonly name: string;
  readonly missing: string;
}

export type Line = Figure | Missing;

export type Verdict = 'met' | 'tolerable' | 'missed' | '';

export const isMissing = (line: Line): line is Missing => 'missing' in line;

export function verdict({ value, target }: Figure): Verdict {
  if (!target) return '';
  const { atMost, atLeast, atWorst } = target;
  if (atMost !== undefined) {
    return value <= atMost ? 'met' : value <= (atWorst ?? atMost) ? 'tolerable' : 'missed';
  }
  if (atLeast !== undefined) {
    return value >= atLeast ? 'met' : value >= (atWorst ?? atLeast) ? 'tolerable' : 'missed';
  }
  return '';
}

export function figureText(line: Line): string {
  if (isMissing(line)) return `${line.name.padEnd(NAME_WIDTH)} ${'-'.padStart(VALUE_WIDTH)}  ${line.missing}`;
  const { name, value, unit, note } = line;
  const shown = Math.abs(value) >= 100 ? value.toFixed(0) : value.toPrecision(3);
  const target = targetText(line);
  const rest = [unit.padEnd(UNIT_WIDTH), target.padEnd(TARGET_WIDTH), note ?? ''].join('  ').trimEnd();
  return `${name.padEnd(NAME_WIDTH)} ${shown.padStart(VALUE_WIDTH)}  ${rest}`;
}

const NAME_WIDTH = 42;
const VALUE_WIDTH = 7;
const UNIT_WIDTH = 20;
const TARGET_WIDTH = 16;

function targetText(figure: Figure): string {
  const { target } = figure;
  if (!target) return '';
  const bound = target.atMost === undefined ? `>= ${target.atLeast}` : `<= ${target.atMost}`;
  return `${bound} ${verdict(figure)}`;
}

/** Middle value; the mean of the two middle ones for an even count. */
export const median = (values: readonly number[]): number => percentile(values, 50);

/** By linear interpolation between the neighbours. */
export function percentile(values: readonly number[], percent: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  const at = ((sorted.length - 1) * percent) / 100;
  const below = Math.floor(at);
  const low = sorted[below] ?? Number.NaN;
  const high = sorted[below + 1] ?? low;
  return low + (high - low) * (at - below);
}
