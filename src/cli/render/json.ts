/** The answer as one JSON document, schema 1: SI units, full double precision, null where there is no value. */
import type { Answer } from '../../answer/answer.ts';
import { CONVENTION_NOTES } from '../convention-notes.ts';
import { jsonDocument } from './json-document.ts';

/** What is not finite becomes null; the core already says why in a caution. */
export function renderJson(answer: Answer, version: string, catalogueHash: string, ascii = false): string {
  return jsonDocument(
    { version, catalogue: catalogueHash },
    { convention: CONVENTION_NOTES, ...answer },
    ascii,
  );
}
