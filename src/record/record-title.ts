/** A record on one line, for lists: its question as short as it can be said, and its one result. */
import { DEGREE, METRE } from '../units/display-unit.ts';
import { formatQuantity } from '../units/format-quantity.ts';
import { isJsonObject, type JsonValue, valueAt } from './plain-json.ts';
import type { LogRecord, RecordRow } from './record.ts';

/** More layers than this are counted, not named. */
const MOST_NAMED = 3;

/** "air → fused-silica, 633nm, 45°, p"; the command where the question is of another kind. */
export function recordTitle({ question, command }: LogRecord): string {
  const { from, layers, into, wave, incidenceAngle_rad, polarization } = question;
  if (!isJsonObject(from) || !isJsonObject(into) || typeof incidenceAngle_rad !== 'number') return command;
  const inner = Array.isArray(layers) ? layers : [];
  const between = inner.length > MOST_NAMED ? [`${inner.length} layers`] : inner.map(layerName);
  const degrees = Number(((incidenceAngle_rad * 180) / Math.PI).toPrecision(12));
  return [
    [mediumName(from), ...between, mediumName(into)].join(' → '),
    waveName(wave),
    formatQuantity(degrees, DEGREE, 'shortest'),
    typeof polarization === 'string' ? polarization : '',
  ]
    .filter((part) => part !== '')
    .join(', ');
}

/** The row of R, "R_p = 0.677(4) %"; empty where the record has none. */
export function recordResult({ rows }: LogRecord): string {
  const row: RecordRow | undefined = rows.find(({ symbol }) => /^R(?:_[sp])?$/.test(symbol));
  return row ? `${row.symbol} = ${row.text}` : '';
}

/** "sapphire:ordinary", or a literal medium as typed. */
export function mediumName(medium: JsonValue | undefined): string {
  if (!isJsonObject(medium)) return '';
  const { key, axis, text } = medium;
  if (typeof key !== 'string') return typeof text === 'string' ? text : '';
  return typeof axis === 'string' && axis !== 'isotropic' ? `${key}:${axis}` : key;
}

function layerName(layer: JsonValue): string {
  const length_m = valueAt(layer, 'thickness', 'thickness_m');
  const waves = valueAt(layer, 'thickness', 'waves');
  const size =
    typeof length_m === 'number'
      ? ` ${lengthText(length_m)}`
      : typeof waves === 'number'
        ? ` ${waves} waves`
        : '';
  return mediumName(valueAt(layer, 'medium')) + size;
}

function waveName(wave: JsonValue | undefined): string {
  const text = valueAt(wave, 'text');
  const wavelength_m = valueAt(wave, 'wavelength_m');
  const inAir = valueAt(wave, 'inAir') === true ? ' in air' : '';
  if (typeof text === 'string' && text !== '') return text + inAir;
  return typeof wavelength_m === 'number' ? lengthText(wavelength_m) + inAir : '';
}

const lengthText = (length_m: number): string =>
  formatQuantity(Number(length_m.toPrecision(12)), METRE, 'shortest');
