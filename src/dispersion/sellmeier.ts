/**
 * Sellmeier and its relatives: n^2 = offset + sum B L^m/(L^p - C) + sum c L^e.
 *
 * One form in many clothes: C printed squared (um^2) or not (um), with or without L^2 in the numerator, an offset in place
 * of 1, extra powers of L (the Schott polynomial is the case without poles), and fitted exponents.
 * L in um, in the fit's own reference. Sources: W. Sellmeier, Ann. Phys. 219, 272 (1871); the coefficients' source is the fit's.
 *
 * Special cases: where n^2 <= 0 (inside a resonance, outside the range of any fit) the parts written are NaN; absorption is
 * not described, k = 0. Odd or fitted exponents take the slower path through jets.
 */
import * as J from '../num/jet.ts';
import type { BoundModel } from './evaluator.ts';
import { type SquareForm, splitEven, taylorInSquare, valueInSquare } from './in-square.ts';
import type { Pole, SellmeierParameters } from './parameters.ts';
import { writeNothing, writeReal } from './write-index.ts';

/** b, a, C, D of `in-square.ts`; undefined for fitted exponents. */
function evenPole(pole: Pole): [number, number, number, number] | undefined {
  if ('polePower' in pole) return undefined;
  const C = 'C_um' in pole ? pole.C_um * pole.C_um : pole.C_um2;
  return pole.numeratorPower === 0 ? [0, pole.B, C, pole.B] : [pole.B, 0, C, pole.B * C];
}

function squareForm(p: SellmeierParameters): SquareForm | undefined {
  const even = splitEven(p.terms ?? []);
  const poles = (p.poles ?? []).map(evenPole);
  if (!even || poles.includes(undefined)) return undefined;
  return { ...even, offset: p.offset + even.offset, poles: Float64Array.from(poles.flatMap((q) => q ?? [])) };
}

export function bindSellmeier(p: SellmeierParameters): BoundModel {
  const form = squareForm(p);
  if (!form) return boundGeneral(p);
  return isShort(form) ? boundThreePoles(form) : boundSquareForm(form);
}

/** Above it the parts of `boundThreePoles` would cancel digits that this keeps. */
const MOST_IN_OFFSET = 16;

function isShort({ poles, rising, falling }: SquareForm): boolean {
  const b = poles.filter((_, i) => i % 4 === 0).reduce((sum, each) => sum + Math.abs(each), 0);
  return poles.length <= 12 && rising.length === 0 && falling.length === 0 && b <= MOST_IN_OFFSET;
}

const common = { used: {}, hasDerivative: true, derivativeOrder: 3, complex: false } as const;

/** Any even form: loops over the poles. */
export function boundSquareForm(form: SquareForm): BoundModel {
  const f = new Float64Array(4);
  return {
    ...common,
    evaluate(wavelength_um, out) {
      const x = wavelength_um * wavelength_um;
      taylorInSquare(form, x, f);
      const n = f[0]! > 0 ? Math.sqrt(f[0]!) : Number.NaN;
      const h = 0.5 / n;
      const n1 = f[1]! * h;
      const n2 = (f[2]! - n1 * n1) * h;
      const n3 = (f[3]! - 2 * n1 * n2) * h;
      out[7] = 0;
      out[0] = n;
      out[1] = 2 * wavelength_um * n1;
      out[2] = 2 * n1 + 8 * x * n2;
      out[3] = 24 * wavelength_um * (n2 + 2 * x * n3);
      out[4] = 0;
      out[5] = 0;
      out[6] = 0;
    },
    index(wavelength_um) {
      const square = valueInSquare(form, wavelength_um * wavelength_um);
      return square > 0 ? Math.sqrt(square) : Number.NaN;
    },
  };
}

/**
 * Up to three poles and an offset, written out: by far the most frequent fit; missing poles have no strength. Each pole is taken
 * apart, (b x + a)/(x - C) = b + D/(x - C), and the b join the offset: half the coefficients to fetch. They stand in one typed
 * array because the compiler keeps numbers captured by a closure boxed, which costs more than the arithmetic.
 */
function boundThreePoles({ poles, offset }: SquareForm): BoundModel {
  const c = Float64Array.of(offset, 0, -1, 0, -1, 0, -1);
  for (let i = 0; i < poles.length / 4; i++) {
    c[0]! += poles[4 * i]!;
    c[2 * i + 1] = poles[4 * i + 3]!;
    c[2 * i + 2] = poles[4 * i + 2]!;
  }
  return {
    ...common,
    evaluate(wavelength_um, out) {
      const x = wavelength_um * wavelength_um;
      const r1 = 1 / (x - c[2]!);
      const r2 = 1 / (x - c[4]!);
      const r3 = 1 / (x - c[6]!);
      const f1 = c[1]! * r1;
      const f2 = c[3]! * r2;
      const f3 = c[5]! * r3;
      const square = c[0]! + f1 + f2 + f3;
      const p1 = f1 * r1;
      const p2 = f2 * r2;
      const p3 = f3 * r3;
      const q1 = p1 * r1;
      const q2 = p2 * r2;
      const q3 = p3 * r3;
      const n = square > 0 ? Math.sqrt(square) : Number.NaN;
      const h = 0.5 / n;
      const n1 = -(p1 + p2 + p3) * h;
      const n2 = (q1 + q2 + q3 - n1 * n1) * h;
      const n3 = -(q1 * r1 + q2 * r2 + q3 * r3 + 2 * n1 * n2) * h;
      out[7] = 0;
      out[0] = n;
      out[1] = 2 * wavelength_um * n1;
      out[2] = 2 * n1 + 8 * x * n2;
      out[3] = 24 * wavelength_um * (n2 + 2 * x * n3);
      out[4] = 0;
      out[5] = 0;
      out[6] = 0;
    },
    evaluateFirst(wavelength_um, out) {
      const x = wavelength_um * wavelength_um;
      const r1 = 1 / (x - c[2]!);
      const r2 = 1 / (x - c[4]!);
      const r3 = 1 / (x - c[6]!);
      const f1 = c[1]! * r1;
      const f2 = c[3]! * r2;
      const f3 = c[5]! * r3;
      const square = c[0]! + f1 + f2 + f3;
      const n = square > 0 ? Math.sqrt(square) : Number.NaN;
      out[5] = 0;
      out[0] = n;
      out[1] = (-wavelength_um * (f1 * r1 + f2 * r2 + f3 * r3)) / n;
      out[4] = 0;
    },
    index(wavelength_um) {
      const x = wavelength_um * wavelength_um;
      const square = c[0]! + c[1]! / (x - c[2]!) + c[3]! / (x - c[4]!) + c[5]! / (x - c[6]!);
      return square > 0 ? Math.sqrt(square) : Number.NaN;
    },
    groupIndex(wavelength_um) {
      const x = wavelength_um * wavelength_um;
      const r1 = 1 / (x - c[2]!);
      const r2 = 1 / (x - c[4]!);
      const r3 = 1 / (x - c[6]!);
      const f1 = c[1]! * r1;
      const f2 = c[3]! * r2;
      const f3 = c[5]! * r3;
      const square = c[0]! + f1 + f2 + f3;
      return (square + x * (f1 * r1 + f2 * r2 + f3 * r3)) / Math.sqrt(square);
    },
    indexBlock(wavelengths_um, count, n) {
      const S = c[0]!;
      const D1 = c[1]!;
      const C1 = c[2]!;
      const D2 = c[3]!;
      const C2 = c[4]!;
      const D3 = c[5]!;
      const C3 = c[6]!;
      for (let i = 0; i < count; i++) {
        const L = wavelengths_um[i]!;
        const x = L * L;
        const square = S + D1 * (1 / (x - C1)) + D2 * (1 / (x - C2)) + D3 * (1 / (x - C3));
        n[i] = square > 0 ? Math.sqrt(square) : Number.NaN;
      }
    },
  };
}

function boundGeneral(p: SellmeierParameters): BoundModel {
  return {
    ...common,
    evaluate(wavelength_um, out) {
      const L = J.variable(wavelength_um);
      let square = J.constant(p.offset);
      for (const pole of p.poles ?? []) square = J.add(square, generalPole(pole, L));
      for (const { c, power } of p.terms ?? []) square = J.add(square, J.scale(J.pow(L, power), c));
      if (square[0] > 0) writeReal(out, J.sqrt(square));
      else writeNothing(out);
    },
  };
}

function generalPole(pole: Pole, L: J.Jet): J.Jet {
  const power = 'polePower' in pole ? pole.polePower : 2;
  const C = 'polePower' in pole ? pole.C : 'C_um' in pole ? pole.C_um * pole.C_um : pole.C_um2;
  const over = J.scale(J.pow(L, pole.numeratorPower ?? 2), pole.B);
  return J.div(over, J.shift(J.pow(L, power), -C));
}
