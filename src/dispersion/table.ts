/**
 * Tabulated n, and k or alpha where the medium absorbs, as printed; each column with the interpolation its source asks for.
 *
 * A column is interpolated as a value, as a square (n^2) or as a logarithm (k, alpha) against a coordinate u(L): the wavelength,
 * its square, 1/L^2, ln L or the photon energy. The derivatives are those of the interpolant, through u(L):
 * straight lines give a meaningful first derivative inside a piece, splines two (see `num/interpolate.ts`).
 * k = alpha L/(4 pi). L in um, in the fit's own reference. Source: the fit's.
 *
 * Special cases: outside the rows the end piece continues. A logarithmic column cannot hold values <= 0. A column of one row is
 * constant. Columns at further temperatures change n linearly with temperature; where a row lacks such a value, the nearest
 * row that has one gives the change.
 */
import {
  cubic,
  type Interpolant,
  linear,
  pieceAt,
  quadratic,
  TableError,
  taylorAt,
} from '../num/interpolate.ts';
import * as J from '../num/jet.ts';
import type { BoundModel, Conditions } from './evaluator.ts';
import type { Along, TableColumn, TableParameters } from './parameters.ts';
import { HC_eV_um } from './spectral-variable.ts';
import { writeComplex, writeReal } from './write-index.ts';

type Column = (L: J.Jet) => J.Jet;

const KINDS = { linear, quadratic, cubic } as const;

export function bindTable(p: TableParameters, conditions: Conditions): BoundModel {
  const at_um = wavelengths_um(p);
  const { values, temperature_K } = atTemperature(p, conditions);
  const n = column(at_um, { ...p.n, values });
  const absorption = p.k ?? p.alpha_per_cm;
  const rows = absorption && column(at_um, absorption);
  const k: Column | undefined =
    rows && (p.k ? rows : (L) => J.scale(J.mul(rows(L), L), 1e-4 / (4 * Math.PI)));
  return {
    used: temperature_K === undefined ? {} : { temperature_K },
    hasDerivative: at_um.length > 1,
    derivativeOrder: at_um.length < 2 ? 0 : p.n.kind === 'linear' ? 1 : 2,
    complex: k !== undefined,
    evaluate(wavelength_um, out) {
      const L = J.variable(wavelength_um);
      if (k) writeComplex(out, n(L), k(L));
      else writeReal(out, n(L));
    },
  };
}

/** The places of the rows in um, in the printed order. */
function wavelengths_um(p: TableParameters): readonly number[] {
  if (p.abscissa === 'um') return p.at;
  return p.at.map((a) => (p.abscissa === 'nm' ? a / 1e3 : HC_eV_um / a));
}

/** u(L). */
function coordinate(along: Along, L: J.Jet): J.Jet {
  switch (along) {
    case 'L':
      return L;
    case 'L^2':
      return J.mul(L, L);
    case 'L^-2':
      return J.pow(L, -2);
    case 'ln L':
      return J.log(L);
    case 'E':
      return J.scale(J.reciprocal(L), HC_eV_um);
  }
}

function column(at_um: readonly number[], c: TableColumn): Column {
  const { below } = c;
  if (!below) return piecewise(at_um, c, c.along);
  if (c.kind !== 'linear') throw new TableError('two coordinates in one column need straight lines');
  const lower = piecewise(at_um, c, below.along);
  const upper = piecewise(at_um, c, c.along);
  return (L) => (L[0] <= below.upTo_um ? lower(L) : upper(L));
}

function piecewise(at_um: readonly number[], c: TableColumn, along: Along): Column {
  const of = c.of ?? 'value';
  const value = (v: number): number => (of === 'log' ? Math.log(v) : of === 'square' ? v * v : v);
  if (of === 'log' && c.values.some((v) => v <= 0))
    throw new TableError('a column interpolated in its logarithm needs values above 0');
  if (at_um.length !== c.values.length)
    throw new TableError(
      `a table needs one value per place: ${at_um.length} places, ${c.values.length} values`,
    );
  const rows = at_um.map((um, i) => ({ u: coordinate(along, J.constant(um))[0], v: value(c.values[i]!) }));
  if (rows.length > 1 && rows[1]!.u < rows[0]!.u) rows.reverse();
  const f: Interpolant = KINDS[c.kind](
    rows.map((r) => r.u),
    rows.map((r) => r.v),
  );
  return (L) => {
    const u = coordinate(along, L);
    const y = J.compose(...taylorAt(f, u[0]), u);
    return of === 'log' ? J.exp(y) : of === 'square' ? J.sqrt(y) : y;
  };
}

/** The values of n at the temperature asked for. */
function atTemperature(
  p: TableParameters,
  conditions: Conditions,
): { values: readonly number[]; temperature_K?: number } {
  const { warmer } = p;
  if (!warmer || warmer.columns.length === 0) return { values: p.n.values };
  const temperature_K = conditions.temperature_K ?? warmer.temperature_C + 273.15;
  const t = temperature_K - 273.15;
  const changes = warmer.columns.map(({ temperature_C, n }) => ({
    temperature_C,
    change: filled(n.map((v, i) => (v === null ? null : v - p.n.values[i]!))),
  }));
  const columns = [{ temperature_C: warmer.temperature_C, change: p.n.values.map(() => 0) }, ...changes].sort(
    (a, b) => a.temperature_C - b.temperature_C,
  );
  const temperatures = Float64Array.from(columns.map((c) => c.temperature_C));
  const piece = pieceAt(temperatures, t);
  const cold = columns[piece]!;
  const warm = columns[piece + 1]!;
  const share = (t - cold.temperature_C) / (warm.temperature_C - cold.temperature_C);
  const values = p.n.values.map((v, i) => v + cold.change[i]! + share * (warm.change[i]! - cold.change[i]!));
  return { values, temperature_K };
}

/** Empty places take the value of the nearest filled one. */
function filled(column: readonly (number | null)[]): readonly number[] {
  return column.map((_, i) => {
    for (let distance = 0; distance < column.length; distance++) {
      const near = column[i - distance] ?? column[i + distance];
      if (near !== null && near !== undefined) return near;
    }
    throw new TableError('a column of a table holds no value');
  });
}
