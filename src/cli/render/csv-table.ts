/** Records as comma-separated values under a header line (RFC 4180, LF): units in the names, full precision, no value empty. */
import { toAscii } from '../../units/to-ascii.ts';
import { field } from './csv.ts';

export type CsvValue = string | number | boolean | null | undefined;

export function csvTable(
  names: readonly string[],
  records: readonly (readonly CsvValue[])[],
  ascii = false,
): string {
  const lines = [names, ...records].map((record) => record.map(cell).map(field).join(','));
  const shown = ascii ? lines.map(toAscii) : lines;
  return shown.map((line) => `${line}\n`).join('');
}

function cell(value: CsvValue): string {
  if (value === null || value === undefined) return '';
  return typeof value === 'number' && !Number.isFinite(value) ? '' : String(value);
}
