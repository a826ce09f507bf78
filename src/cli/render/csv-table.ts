/** Records as comma-separated values under a header line (RFC 4180, LF): units in the names, full precision, no value empty. */
import { toAscii } from '../../units/to-ascii.ts';
import { field } from './csv.ts';

export type CsvValue = string | number | boolean | null | undefined;

export function csvTable(
  names: readonly string[],
  records: readonly (readonly CsvValue[])[],
  ascii = false,
): string {
  const written = (value: CsvValue): string => field(ascii ? toAscii(cell(value)) : cell(value));
  return [names, ...records].map((record) => `${record.map(written).join(',')}\n`).join('');
}

function cell(value: CsvValue): string {
  if (value === null || value === undefined) return '';
  return typeof value === 'number' && !Number.isFinite(value) ? '' : String(value);
}
