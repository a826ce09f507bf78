/**
 * One JSON document in one line: schema and version first, full double precision, null where there is no value. NaN and
 * infinities never get in. With `ascii` all else is escaped, which loses nothing.
 */
export interface DocumentHead {
  readonly version: string;
  /** Hash of the catalogue, where the document rests on it. */
  readonly catalogue?: string;
}

export function jsonDocument(head: DocumentHead, body: object, ascii = false): string {
  const text = JSON.stringify({ schema: 1, ...head, ...body }, finite);
  return `${ascii ? escaped(text) : text}\n`;
}

/** A value that is not finite becomes null, a complex one as a whole. */
export function finite(_: string, value: unknown): unknown {
  if (typeof value === 'number') return Number.isFinite(value) ? value : null;
  return isComplex(value) && !(Number.isFinite(value.re) && Number.isFinite(value.im)) ? null : value;
}

const isComplex = (value: unknown): value is { readonly re: number; readonly im: number } =>
  typeof value === 'object' && value !== null && 're' in value && 'im' in value;

/** The same document in the bytes 0x20 to 0x7E. */
export function escaped(json: string): string {
  return json.replace(/[^\x20-\x7e\n]/g, (unit) => `\\u${unit.charCodeAt(0).toString(16).padStart(4, '0')}`);
}
