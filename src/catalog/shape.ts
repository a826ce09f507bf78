/**
 * A small language for the shape of JSON records, read two ways: by `check-shape.ts`, which checks values at run time and
 * says what would be right, and by the tool that writes the JSON Schema files. So both always agree.
 */
export type Shape =
  | NumberShape
  | TextShape
  | { readonly is: 'boolean' }
  | { readonly is: 'null' }
  /** One of these strings or numbers. */
  | { readonly is: 'one-of'; readonly values: readonly (string | number)[] }
  | ListShape
  | RecordShape
  /** Records with any keys and values of one shape. */
  | { readonly is: 'map'; readonly of: Shape }
  /** Records told apart by the string under `by`. */
  | { readonly is: 'tagged'; readonly by: string; readonly cases: Readonly<Record<string, Shape>> }
  /** Records told apart by a key only they have; the last case needs no key and is taken where none is there. */
  | { readonly is: 'keyed'; readonly cases: readonly { readonly key?: string; readonly shape: Shape }[] }
  /** A value whose type (number, list, record, null) says which shape applies. */
  | { readonly is: 'either'; readonly of: readonly Shape[] }
  | { readonly is: 'anything' };

export interface NumberShape {
  readonly is: 'number';
  readonly min?: number;
  readonly above?: number;
  readonly max?: number;
  readonly whole?: boolean;
}

export interface TextShape {
  readonly is: 'text';
  readonly pattern?: string;
  /** The pattern in words. */
  readonly means?: string;
}

export interface ListShape {
  readonly is: 'list';
  readonly of: Shape;
  readonly min?: number;
  readonly max?: number;
}

export interface RecordShape {
  readonly is: 'record';
  readonly needs: Readonly<Record<string, Shape>>;
  readonly may: Readonly<Record<string, Shape>>;
  /** True where keys beyond these are welcome. */
  readonly open?: boolean;
}

export const number = (limits: Omit<NumberShape, 'is'> = {}): NumberShape => ({ is: 'number', ...limits });
export const positive: NumberShape = { is: 'number', above: 0 };
export const notNegative: NumberShape = { is: 'number', min: 0 };
export const text = (pattern?: string, means?: string): TextShape => ({
  is: 'text',
  ...(pattern === undefined ? {} : { pattern }),
  ...(means === undefined ? {} : { means }),
});
export const yesNo: Shape = { is: 'boolean' };
export const oneOf = (...values: (string | number)[]): Shape => ({ is: 'one-of', values });
export const list = (of: Shape, min = 0, max?: number): ListShape => ({
  is: 'list',
  of,
  min,
  ...(max === undefined ? {} : { max }),
});
export const numbers = (count: number): ListShape => list(number(), count, count);
export const record = (
  needs: Readonly<Record<string, Shape>>,
  may: Readonly<Record<string, Shape>> = {},
): RecordShape => ({ is: 'record', needs, may });
export const openRecord = (
  needs: Readonly<Record<string, Shape>>,
  may: Readonly<Record<string, Shape>> = {},
): RecordShape => ({ is: 'record', needs, may, open: true });
export const tagged = (by: string, cases: Readonly<Record<string, Shape>>): Shape => ({
  is: 'tagged',
  by,
  cases,
});
export const either = (...of: Shape[]): Shape => ({ is: 'either', of });
export const nothing: Shape = { is: 'null' };
export const anything: Shape = { is: 'anything' };
