/**
 * Records as CSV (RFC 4180 quoting, lines ended by a single newline): a header, then one row a record, always the same columns.
 * Numbers are exact; a cell is empty where the answer has no such value. Columns are only ever added, at the end.
 */
import type { JsonValue } from './plain-json.ts';
import { valueAt } from './plain-json.ts';
import type { LogRecord } from './record.ts';
import { mediumName } from './record-title.ts';

type Column = readonly [name: string, value: (record: LogRecord) => JsonValue | undefined];

const inAnswer =
  (...path: readonly string[]) =>
  (record: LogRecord): JsonValue | undefined =>
    valueAt(record.answer, ...path);
const inQuestion =
  (...path: readonly string[]) =>
  (record: LogRecord): JsonValue | undefined =>
    valueAt(record.question, ...path);

const COLUMNS: readonly Column[] = [
  ['id', (record) => record.id],
  ['time', (record) => record.time],
  ['version', (record) => record.program.version],
  ['catalogue_date', (record) => record.catalogue.date],
  ['catalogue_hash', (record) => record.catalogue.hash],
  ['from', (record) => mediumName(record.question['from'])],
  ['layers', (record) => layersText(record.question['layers'])],
  ['into', (record) => mediumName(record.question['into'])],
  ['wave', inQuestion('wave', 'text')],
  ['vacuumWavelength_m', inAnswer('wave', 'vacuumWavelength_m')],
  ['incidenceAngle_rad', inAnswer('geometry', 'incidenceAngle_rad')],
  ['polarization', inAnswer('geometry', 'polarization')],
  ['from_n', inAnswer('from', 'n')],
  ['from_n_uncertainty', inAnswer('from', 'n_uncertainty')],
  ['from_k', inAnswer('from', 'k')],
  ['from_temperature_K', inAnswer('from', 'temperature_K')],
  ['into_n', inAnswer('into', 'n')],
  ['into_n_uncertainty', inAnswer('into', 'n_uncertainty')],
  ['into_k', inAnswer('into', 'k')],
  ['into_temperature_K', inAnswer('into', 'temperature_K')],
  ['Rs', inAnswer('interface', 'Rs')],
  ['Rp', inAnswer('interface', 'Rp')],
  ['R', inAnswer('interface', 'R')],
  ['R_uncertainty', inAnswer('interface', 'R_uncertainty')],
  ['Ts', inAnswer('interface', 'Ts')],
  ['Tp', inAnswer('interface', 'Tp')],
  ['T', inAnswer('interface', 'T')],
  ['T_uncertainty', inAnswer('interface', 'T_uncertainty')],
  ['refractionAngle_rad', inAnswer('interface', 'refractionAngle_rad')],
  ['brewsterAngle_rad', inAnswer('interface', 'brewsterAngle_rad')],
  ['criticalAngle_rad', inAnswer('interface', 'criticalAngle_rad')],
  ['cautions', (record) => [...new Set(record.cautions.map(({ code }) => code))].join(' ')],
  ['sources', (record) => record.sources.map(({ id, doi }) => doi ?? id).join(' ')],
  ['command', (record) => record.command],
];

export function recordsCsv(records: Iterable<LogRecord>): string {
  let csv = recordCsvHeader();
  for (const record of records) csv += recordCsvRow(record);
  return csv;
}

/** The names of the columns, with the newline. */
export function recordCsvHeader(): string {
  return `${COLUMNS.map(([name]) => name).join(',')}\n`;
}

/** One record, with the newline. */
export function recordCsvRow(record: LogRecord): string {
  return `${COLUMNS.map(([, value]) => cell(value(record))).join(',')}\n`;
}

function cell(value: JsonValue | undefined): string {
  const text = typeof value === 'string' || typeof value === 'number' ? String(value) : '';
  return /[",\r\n]|^\s|\s$/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

/** "magnesium-fluoride 1.15e-7 m; n=2.1 0.25 waves". */
function layersText(layers: JsonValue | undefined): string {
  if (!Array.isArray(layers)) return '';
  return layers
    .map((layer: JsonValue) => {
      const length_m = valueAt(layer, 'thickness', 'thickness_m');
      const waves = valueAt(layer, 'thickness', 'waves');
      const size =
        typeof length_m === 'number' ? ` ${length_m} m` : typeof waves === 'number' ? ` ${waves} waves` : '';
      return mediumName(valueAt(layer, 'medium')) + size;
    })
    .join('; ');
}
