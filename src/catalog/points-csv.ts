/**
 * Measured indices to be fitted, as a table:
 *   # reference: air          (comments as in an own table; what they state may be stated otherwise)
 *   wavelength_nm,n,u         (or wavelength_um; u is the standard uncertainty of n and may be left out; a column k is passed over)
 *   400,1.532,0.0002
 * Rows may come in any order, and a wavelength may come more than once. Pure.
 */
import type { Fault } from './check-shape.ts';
import { type CsvFacts, fault, numbersOf, readFacts, shorten, splitCsv } from './csv-text.ts';
import type { IndexPoint } from './fit-points.ts';

export interface PointTable {
  readonly points: readonly IndexPoint[];
  readonly facts: Readonly<CsvFacts>;
  /** True where the table has a column k, which a fit of n has no use for. */
  readonly hasExtinction: boolean;
}

const UM_PER: Readonly<Record<string, number>> = { wavelength_um: 1, wavelength_nm: 1e-3 };
const MEASURED = new Set(['n', 'k', 'u']);
/** Further spellings of the column of uncertainties. */
const UNCERTAINTY = new Set(['u', 'u_n', 'uncertainty_n', 'uncertainty']);
const HEADER =
  'a header line such as "wavelength_nm,n" or "wavelength_um,n,u" (u: standard uncertainty of n)';

export function readPoints(text: string): PointTable | readonly Fault[] {
  const { comments, rows } = splitCsv(text);
  const [header, ...data] = rows;
  if (!header) return [fault('', 'has no lines', `begin with ${HEADER}`)];
  const columns = header.fields.map((f) => f.toLowerCase()).map((f) => (UNCERTAINTY.has(f) ? 'u' : f));
  const scale = UM_PER[columns[0] ?? ''];
  const others = columns.slice(1);
  const holds = others[0] === 'n' && others.every((c, i) => MEASURED.has(c) && others.indexOf(c) === i);
  if (scale === undefined || !holds)
    return [fault(`line ${header.line}`, `reads "${shorten(header.fields.join(','))}"`, `must be ${HEADER}`)];

  const faults: Fault[] = [];
  const facts = readFacts(comments, faults);
  const at = columns.indexOf('u');
  const points = data.flatMap((row): readonly IndexPoint[] => {
    const values = numbersOf(row, columns, faults);
    if (!values) return [];
    const [wavelength = Number.NaN, n = Number.NaN] = values;
    const uncertainty_n = values[at];
    // The decimal of 587.5618 nm in um, without the last bits of the product.
    const wavelength_um = Number((wavelength * scale).toPrecision(12));
    return [{ wavelength_um, n, ...(uncertainty_n === undefined ? {} : { uncertainty_n }) }];
  });
  return faults.length > 0 ? faults : { points, facts, hasExtinction: columns.includes('k') };
}

export const isPointTable = (read: PointTable | readonly Fault[]): read is PointTable => 'points' in read;
