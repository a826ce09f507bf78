/** A fit to measured points as a file for the folder of own entries, its points kept as check values. Pure. */
import type { TableParameters } from '../dispersion/parameters.ts';
import type { IndexPoint, PointFit } from './fit-points.ts';
import type { Reference } from './types.ts';

export interface FitEntryFacts {
  readonly key: string;
  readonly name: string;
  readonly reference: Reference;
  readonly temperature_C?: number;
  /** Who measured what, where and when: it becomes the source of the fit. */
  readonly source: string;
}

/** The entry, ready for JSON.stringify; own.ts reads it back without a fault. */
export function fitEntry(fit: PointFit, facts: FitEntryFacts): Readonly<Record<string, unknown>> {
  const sourceId = `${facts.key}-points`;
  const accuracy_n = roundUp(Math.max(fit.deviation_n ?? 0, meanUncertainty(fit.points)));
  // Each point may differ by twice what the worst does: coefficients below are rounded.
  const tolerance_n = roundUp(Math.max(2 * fit.largest_n, 1e-9));
  const terms = fit.coefficients.length;
  return {
    key: facts.key,
    name: facts.name,
    fits: [
      {
        id: 'fit',
        parameters: rounded(fit.parameters),
        range_um: fit.range_um,
        reference: facts.reference,
        ...(facts.temperature_C === undefined ? {} : { temperature_C: facts.temperature_C }),
        ...(accuracy_n > 0 ? { accuracy_n } : {}),
        source: sourceId,
        note: `Least-squares fit of ${terms} coefficients to ${fit.points.length} points; largest residual ${fit.largest_n.toExponential(1)}.`,
        checks: [
          {
            source: facts.source,
            recalled: false,
            independent: false,
            columns: ['wavelength_um', 'n', 'tolerance_n'],
            rows: fit.points.map((p) => [p.wavelength_um, p.n, tolerance_n]),
          },
        ],
      },
    ],
    sources: [{ id: sourceId, type: 'dataset', title: facts.source }],
  };
}

/** The points of a table as own-csv.ts reads it. */
export function tablePoints(table: TableParameters): readonly IndexPoint[] {
  const scale = table.abscissa === 'nm' ? 1e-3 : 1;
  return table.at.map((at, i) => ({ wavelength_um: at * scale, n: table.n.values[i] ?? Number.NaN }));
}

function meanUncertainty(points: readonly IndexPoint[]): number {
  const stated = points.map((p) => p.uncertainty_n ?? 0);
  return Math.sqrt(stated.reduce((sum, u) => sum + u * u, 0) / points.length);
}

/** Two significant digits, never below the value. */
function roundUp(x: number): number {
  if (x === 0) return 0;
  const unit = 10 ** (Math.floor(Math.log10(x)) - 1);
  return Number((Math.ceil(x / unit - 1e-9) * unit).toPrecision(2));
}

/** Coefficients to twelve digits: the terms of a formula cancel, so fewer would cost some of the index. */
function rounded<T>(value: T): T {
  if (typeof value === 'number') return Number(value.toPrecision(12)) as T;
  if (Array.isArray(value)) return value.map(rounded) as T;
  if (typeof value === 'object' && value !== null)
    return Object.fromEntries(Object.entries(value).map(([k, v]) => [k, rounded(v)])) as T;
  return value;
}
