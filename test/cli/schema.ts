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

interface Schema {
  readonly $ref?: string;
  readonly anyOf?: readonly Schema[];
  readonly properties?: Readonly<Record<string, Schema>>;
  readonly items?: Schema;
  readonly definitions?: Readonly<Record<string, Schema>>;
}

/** Paths of the keys in a document that its schema does not describe. */
export function unknownKeys(name: string, document: unknown): readonly string[] {
  const root = JSON.parse(readFileSync(`${SCHEMAS}/${name}.schema.json`, 'utf8')) as Schema;
  const resolve = (schema: Schema): readonly Schema[] => {
    const { $ref, anyOf } = schema;
    const referred =
      $ref === undefined ? [] : resolve(root.definitions?.[$ref.replace('#/definitions/', '')] ?? {});
    return [schema, ...referred, ...(anyOf ?? []).flatMap(resolve)];
  };
  const walk = (value: unknown, schema: Schema, path: string): readonly string[] => {
    const forms = resolve(schema);
    if (Array.isArray(value)) {
      const items = forms.find((form) => form.items)?.items;
      return items ? value.flatMap((v) => walk(v, items, `${path}[]`)) : [];
    }
    if (typeof value !== 'object' || value === null) return [];
    const described = forms.find((form) => form.properties)?.properties ?? {};
    return Object.entries(value).flatMap(([key, v]) => {
      const own = described[key];
      return own ? walk(v, own, `${path}.${key}`) : [`${path}.${key}`];
    });
  };
  return [...new Set(walk(document, root, ''))];
}
