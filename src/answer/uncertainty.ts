/**
 * Standard uncertainty of a reflectance or transmittance from independent standard uncertainties of its inputs.
 *
 *   u^2 = sum_i [ (df/dx_i)^2 u_i^2 + (1/2) (d2f/dx_i^2)^2 u_i^4 ]
 *
 * Source: JCGM 100:2008 (GUM) 5.1.2 with the second-order term of its note, which carries the case of a reflectance near a
 * zero, where the first order vanishes. Both derivatives come from f at x_i +- u_i, so they are those over the very interval
 * that matters.
 */

export interface UncertainInput {
  /** In words, e.g. "index of N-BK7". */
  readonly name: string;
  readonly standardUncertainty: number;
  /** The result with this input moved by `shift`, all others in place. */
  readonly at: (shift: number) => number;
}

export interface Spread {
  readonly standardUncertainty: number;
  /** Name of the input that contributes most. */
  readonly dominant: string;
}

/** Null where there are no inputs. */
export function propagate(value: number, inputs: readonly UncertainInput[]): Spread | null {
  let variance = 0;
  let largest = -1;
  let dominant = '';
  for (const input of inputs) {
    const u = input.standardUncertainty;
    const up = input.at(u);
    const down = input.at(-u);
    const first = (up - down) / 2;
    const second = up + down - 2 * value;
    const part = first * first + (second * second) / 2;
    variance += part;
    if (part > largest) {
      largest = part;
      dominant = input.name;
    }
  }
  return inputs.length === 0 ? null : { standardUncertainty: Math.sqrt(variance), dominant };
}
