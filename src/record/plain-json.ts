/**
 * JSON values as types, and the way from any plain object of the program to one of them.
 *
 * `toPlainJson` promises: what it returns is unchanged by JSON text and back. Numbers keep every bit (the shortest text that
 * reads back as the same double, 17 digits where needed); -0 becomes 0; NaN and infinities become null; undefined and
 * functions are left out of objects and become null in lists; typed arrays become lists.
 */
export type JsonValue = string | number | boolean | null | JsonObject | readonly JsonValue[];
export interface JsonObject {
  readonly [key: string]: JsonValue;
}

export function toPlainJson(value: unknown): JsonValue {
  if (typeof value === 'string' || typeof value === 'boolean') return value;
  if (typeof value === 'number') return Number.isFinite(value) ? value + 0 : null;
  if (typeof value !== 'object' || value === null) return null;
  if (Array.isArray(value)) return value.map(toPlainJson);
  if (ArrayBuffer.isView(value) && !(value instanceof DataView))
    return Array.from(value as unknown as ArrayLike<number>, toPlainJson);
  return toPlainObject(value);
}

export function toPlainObject(value: object): JsonObject {
  const entries = Object.entries(value).filter(([, v]) => v !== undefined && typeof v !== 'function');
  return Object.fromEntries(entries.map(([key, v]) => [key, toPlainJson(v)]));
}

export function isJsonObject(value: unknown): value is JsonObject {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** The value at a path of keys, of lists by their numbers; undefined where the path leaves the data. */
export function valueAt(value: JsonValue | undefined, ...path: readonly string[]): JsonValue | undefined {
  let at: JsonValue | undefined = value;
  for (const key of path) {
    if (Array.isArray(at)) at = at[Number(key)] as JsonValue | undefined;
    else if (isJsonObject(at) && Object.hasOwn(at, key)) at = at[key];
    else return undefined;
  }
  return at;
}
