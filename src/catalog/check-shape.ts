/**
 * Checks a value against a shape and says, for each fault, where it is (a JSON path such as `fits[0].parameters.poles[1].B`),
 * what is wrong and what would be right. Total: any value may come in, it never throws, and it looks at every field
 * rather than stopping at the first fault (but stops after MAX_FAULTS).
 */
import type { RecordShape, Shape } from './shape.ts';

export interface Fault {
  /** JSON path from the root of the document; empty for the document itself. */
  readonly path: string;
  readonly message: string;
  readonly remedy: string;
}

/** A file with more faults than this is not worth listing to the end. */
const MAX_FAULTS = 20;

export function checkShape(value: unknown, shape: Shape, path = ''): readonly Fault[] {
  const faults: Fault[] = [];
  for (const fault of faultsOf(value, shape, path)) {
    faults.push(fault);
    if (faults.length === MAX_FAULTS) break;
  }
  return faults;
}

function* faultsOf(value: unknown, shape: Shape, path: string): Generator<Fault> {
  if (shape.is === 'anything') return;
  if (!sameType(value, shape)) {
    yield { path, message: `is ${describe(value)}`, remedy: `must be ${typeText(shape)}` };
    return;
  }
  if (typeof value === 'number') yield* numberFaults(value, shape, path);
  else if (typeof value === 'string') yield* textFaults(value, shape, path);
  else if (Array.isArray(value)) yield* listFaults(value, shape, path);
  else if (isRecord(value)) yield* recordFaults(value, shape, path);
}

function* numberFaults(value: number, shape: Shape, path: string): Generator<Fault> {
  if (shape.is === 'either') yield* faultsOf(value, alternative(value, shape.of), path);
  if (shape.is !== 'number') return;
  const inside =
    Number.isFinite(value) &&
    value >= (shape.min ?? -Infinity) &&
    value <= (shape.max ?? Infinity) &&
    (shape.above === undefined || value > shape.above) &&
    (!shape.whole || Number.isInteger(value));
  if (!inside) yield { path, message: `is ${value}`, remedy: `must be ${typeText(shape)}` };
}

function* textFaults(value: string, shape: Shape, path: string): Generator<Fault> {
  if (shape.is === 'either') yield* faultsOf(value, alternative(value, shape.of), path);
  if (shape.is !== 'text') return;
  if (/[\p{Cc}\u2028\u2029]/u.test(value))
    yield { path, message: 'holds a control character', remedy: 'remove it' };
  else if (value.trim() === '')
    yield { path, message: 'is empty', remedy: 'fill it in, or leave the key out where it may be missing' };
  else if (shape.pattern !== undefined && !new RegExp(shape.pattern, 'u').test(value))
    yield { path, message: `is ${describe(value)}`, remedy: `must be ${typeText(shape)}` };
}

function* listFaults(value: readonly unknown[], shape: Shape, path: string): Generator<Fault> {
  if (shape.is === 'either') yield* faultsOf(value, alternative(value, shape.of), path);
  if (shape.is !== 'list') return;
  const { min = 0, max = Infinity } = shape;
  if (value.length < min || value.length > max) {
    const count = min === max ? `${min}` : max === Infinity ? `${min} or more` : `${min} to ${max}`;
    yield { path, message: `has ${value.length} items`, remedy: `must have ${count}` };
  }
  for (const [i, item] of value.entries()) yield* faultsOf(item, shape.of, `${path}[${i}]`);
}

function* recordFaults(value: Record<string, unknown>, shape: Shape, path: string): Generator<Fault> {
  switch (shape.is) {
    case 'record':
      yield* fieldFaults(value, shape, path);
      return;
    case 'map':
      for (const [key, item] of Object.entries(value)) yield* faultsOf(item, shape.of, join(path, key));
      return;
    case 'tagged': {
      const tag = value[shape.by];
      const chosen =
        typeof tag === 'string' && Object.hasOwn(shape.cases, tag) ? shape.cases[tag] : undefined;
      if (chosen) yield* faultsOf(value, chosen, path);
      else
        yield {
          path: join(path, shape.by),
          message: `is ${describe(tag)}`,
          remedy: `must be one of ${Object.keys(shape.cases).join(', ')}`,
        };
      return;
    }
    case 'keyed': {
      const chosen = shape.cases.find((c) => c.key === undefined || Object.hasOwn(value, c.key));
      if (chosen) yield* faultsOf(value, chosen.shape, path);
      else {
        const keys = shape.cases.map((c) => c.key).join(', ');
        yield {
          path,
          message: 'lacks the key that says which kind it is',
          remedy: `must have one of ${keys}`,
        };
      }
      return;
    }
    case 'either':
      yield* faultsOf(value, alternative(value, shape.of), path);
      return;
  }
}

function* fieldFaults(value: Record<string, unknown>, shape: RecordShape, path: string): Generator<Fault> {
  for (const [key, inner] of Object.entries(shape.needs)) {
    if (Object.hasOwn(value, key)) yield* faultsOf(value[key], inner, join(path, key));
    else yield { path: join(path, key), message: 'is missing', remedy: `add it: ${typeText(inner)}` };
  }
  for (const [key, inner] of Object.entries(shape.may))
    if (Object.hasOwn(value, key)) yield* faultsOf(value[key], inner, join(path, key));
  if (shape.open) return;
  const known = [...Object.keys(shape.needs), ...Object.keys(shape.may)];
  for (const key of Object.keys(value)) {
    if (known.includes(key)) continue;
    const remedy = nearest(key, known) ?? `known keys are ${known.join(', ')}`;
    yield { path: join(path, key), message: 'is not a known key', remedy };
  }
}

/** The first alternative of the value's type; there is one, since `sameType` held for the whole. */
const alternative = (value: unknown, shapes: readonly Shape[]): Shape =>
  shapes.find((s) => sameType(value, s)) ?? { is: 'anything' };

/** A hint where a key differs from a known one only in case, separators or unit. */
function nearest(key: string, known: readonly string[]): string | undefined {
  const bare = (s: string): string => s.toLowerCase().replace(/[^a-z0-9]/g, '');
  const typed = bare(key);
  const hit = known.find((k) => bare(k) === typed || (typed.length > 2 && bare(k).startsWith(typed)));
  return hit ? `did you mean ${hit}?` : undefined;
}

const isRecord = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

const join = (path: string, key: string): string => {
  const step = /^[\w-]+$/.test(key) ? key : JSON.stringify(key);
  return path === '' ? step : `${path}.${step}`;
};

function sameType(value: unknown, shape: Shape): boolean {
  switch (shape.is) {
    case 'null':
      return value === null;
    case 'number':
      return typeof value === 'number';
    case 'text':
      return typeof value === 'string';
    case 'boolean':
      return typeof value === 'boolean';
    case 'list':
      return Array.isArray(value);
    case 'one-of':
      return shape.values.includes(value as string);
    case 'anything':
      return true;
    case 'either':
      return shape.of.some((s) => sameType(value, s));
    default:
      return isRecord(value);
  }
}

function typeText(shape: Shape): string {
  switch (shape.is) {
    case 'number':
      return `a ${limitText(shape)}`;
    case 'text':
      return shape.means ?? 'a text in quotes';
    case 'boolean':
      return 'true or false';
    case 'null':
      return 'null';
    case 'one-of':
      return `one of ${shape.values.join(', ')}`;
    case 'list':
      return 'a list in brackets';
    case 'either':
      return shape.of.map(typeText).join(' or ');
    default:
      return 'an object in braces';
  }
}

function limitText(shape: Shape & { is: 'number' }): string {
  const limits = [
    shape.above === undefined ? '' : ` above ${shape.above}`,
    shape.min === undefined ? '' : ` of at least ${shape.min}`,
    shape.max === undefined ? '' : ` of at most ${shape.max}`,
  ].join('');
  return `${shape.whole ? 'whole ' : ''}number${limits}`;
}

/** A value in a few words, for messages. */
function describe(value: unknown): string {
  if (value === null) return 'null';
  if (value === undefined) return 'missing';
  if (Array.isArray(value)) return 'a list';
  if (typeof value === 'string') {
    const shown = value.length > 40 ? `${value.slice(0, 40)}...` : value;
    return `the text ${JSON.stringify(shown)}`;
  }
  return typeof value === 'object' ? 'an object' : String(value);
}
