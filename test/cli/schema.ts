/** Validates documents against the schemas that the program publishes. */
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { Ajv, type ValidateFunction } from 'ajv';

const SCHEMAS = fileURLToPath(new URL('../../src/cli/schemas', import.meta.url));
const known = new Map<string, ValidateFunction>();

function validator(name: string): ValidateFunction {
  let validate = known.get(name);
  if (!validate) {
    const schema = JSON.parse(readFileSync(`${SCHEMAS}/${name}.schema.json`, 'utf8')) as object;
    validate = new Ajv({ allErrors: true, strict: true, allowUnionTypes: true }).compile(schema);
    known.set(name, validate);
  }
  return validate;
}

/** What is wrong with a document; empty where it holds. */
export function faultsOf(name: string, document: unknown): readonly string[] {
  const validate = validator(name);
  if (validate(document)) return [];
  return (validate.errors ?? []).map(
    (e) => `${e.instancePath} ${e.message ?? ''} ${JSON.stringify(e.params)}`,
  );
}

/** Parses the one document of a text and checks it. */
export function validDocument(name: string, text: string): Record<string, unknown> {
  const document = JSON.parse(text) as Record<string, unknown>;
  const faults = faultsOf(name, document);
  if (faults.length > 0) throw new Error(`${name}: ${faults.slice(0, 5).join('; ')}`);
  return document;
}
