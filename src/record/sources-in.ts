/** The publications that an answer names, wherever they stand in it, each once, in the order met. */
import type { SourceLine } from '../answer/answer.ts';
import type { JsonValue } from './plain-json.ts';
import { isJsonObject } from './plain-json.ts';

export function sourcesIn(answer: JsonValue): readonly SourceLine[] {
  const found = new Map<string, SourceLine>();
  const look = (value: JsonValue): void => {
    if (Array.isArray(value)) value.forEach(look);
    if (!isJsonObject(value)) return;
    const { id, text, doi } = value;
    if (typeof id === 'string' && typeof text === 'string' && (typeof doi === 'string' || doi === null)) {
      if (!found.has(id)) found.set(id, { id, text, doi });
    } else Object.values(value).forEach(look);
  };
  look(answer);
  return [...found.values()];
}
