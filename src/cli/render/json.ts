/** The answer as one JSON document, schema 1: SI units, full double precision, null where there is no value. */
import type { Answer } from '../../answer/answer.ts';
import { CONVENTION_NOTES } from '../convention-notes.ts';

export function renderJson(answer: Answer, version: string, catalogueHash: string): string {
  const document = { schema: 1, version, catalogue: catalogueHash, convention: CONVENTION_NOTES, ...answer };
  return `${JSON.stringify(document, finite)}\n`;
}

/** A value that is not finite becomes null here and never NaN; the core already says why in a caution. */
function finite(_: string, value: unknown): unknown {
  return typeof value === 'number' && !Number.isFinite(value) ? null : value;
}
