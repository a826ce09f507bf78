/**
 * One layout for the catalogue's JSON files, so that a change of a value is a change of a line: what fits on a line stands on it,
 * long lists of numbers, texts or table rows are filled up line by line, everything else goes one item to a line.
 */
const WIDTH = 130;
const STEP = '  ';

type Json = null | boolean | number | string | readonly Json[] | { readonly [key: string]: Json };

/** The text of a whole file, with a line feed at the end. The document itself is always spread out. */
export function layOut(document: Json): string {
  return `${spread(document, '')}\n`;
}

function write(value: Json, indent: string, room: number): string {
  const flat = inline(value);
  return flat.length <= room ? flat : spread(value, indent);
}

function spread(value: Json, indent: string): string {
  const inner = indent + STEP;
  if (isList(value)) {
    if (value.length === 0) return '[]';
    if (value.every((v) => isScalar(v) || isRow(v))) return fill(value, indent);
    const items = value.map((v) => inner + write(v, inner, WIDTH - inner.length));
    return `[\n${items.join(',\n')}\n${indent}]`;
  }
  if (!isRecord(value)) return inline(value);
  const items = Object.entries(value).map(([key, v]) => {
    const head = `${inner}${JSON.stringify(key)}: `;
    return head + write(v, inner, WIDTH - head.length - 1);
  });
  return items.length === 0 ? '{}' : `{\n${items.join(',\n')}\n${indent}}`;
}

/** As many items to a line as it holds. */
function fill(items: readonly Json[], indent: string): string {
  const inner = indent + STEP;
  const lines: string[] = [];
  let line = '';
  for (const item of items) {
    const text = inline(item);
    if (line !== '' && inner.length + line.length + text.length + 3 > WIDTH) {
      lines.push(line);
      line = '';
    }
    line += (line === '' ? '' : ', ') + text;
  }
  lines.push(line);
  return `[\n${lines.map((l) => inner + l).join(',\n')}\n${indent}]`;
}

function inline(value: Json): string {
  if (isList(value)) return `[${value.map(inline).join(', ')}]`;
  if (!isRecord(value)) return JSON.stringify(value);
  const items = Object.entries(value).map(([key, v]) => `${JSON.stringify(key)}: ${inline(v)}`);
  return items.length === 0 ? '{}' : `{ ${items.join(', ')} }`;
}

const isList = (value: Json): value is readonly Json[] => Array.isArray(value);
const isScalar = (value: Json): boolean => value === null || typeof value !== 'object';
const isRow = (value: Json): boolean => isList(value) && value.every(isScalar);
const isRecord = (value: Json): value is { readonly [key: string]: Json } =>
  value !== null && typeof value === 'object' && !Array.isArray(value);
