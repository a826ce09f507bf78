/**
 * Writes catalog/schema/*.schema.json (JSON Schema, draft 2020-12) from the shapes in src/catalog. A test fails when a
 * committed schema differs from what this makes; run `tsx tools/catalog-schema.ts` then.
 */
import { writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { CATALOG_FOLDER } from '../src/catalog/from-sources.ts';
import { materialShape, ownMaterialShape, sourceShape } from '../src/catalog/material-shape.ts';
import { parameterShapes } from '../src/catalog/parameter-shapes.ts';
import { list, type RecordShape, type Shape } from '../src/catalog/shape.ts';

type Json = { readonly [key: string]: unknown };

export interface SchemaFile {
  readonly name: string;
  readonly schema: Json;
}

/** The three schema files. */
export function schemaFiles(): readonly SchemaFile[] {
  const models = Object.fromEntries(
    Object.entries(parameterShapes()).map(([model, shape]) => [`parameters-${model}`, toSchema(shape)]),
  );
  const file = (
    name: string,
    title: string,
    description: string,
    shape: Shape,
    $defs?: Json,
  ): SchemaFile => ({
    name,
    schema: {
      $schema: 'https://json-schema.org/draft/2020-12/schema',
      title,
      description,
      ...toSchema(shape),
      ...($defs ? { $defs } : {}),
    },
  });
  const units =
    'The unit is part of every key that carries one; a value that is not known is left out, never 0 or -1. ';
  return [
    file(
      'material.schema.json',
      'Catalogue entry',
      `${units}Strict: every entry under catalog/materials/ follows it.`,
      materialShape(),
      models,
    ),
    file(
      'own-material.schema.json',
      'Own entry',
      `${units}For files of a user's own folder, which may leave more out and may bring their sources along.`,
      ownMaterialShape(),
      models,
    ),
    file(
      'bibliography.schema.json',
      'Bibliography',
      'CSL-JSON items (citation style language data schema 1.0), the subset used here.',
      list(sourceShape(), 1),
    ),
  ];
}

/** JSON Schema of a shape. Models become references, so that the file stays readable. */
export function toSchema(shape: Shape): Json {
  switch (shape.is) {
    case 'anything':
      return {};
    case 'null':
      return { type: 'null' };
    case 'boolean':
      return { type: 'boolean' };
    case 'number':
      return defined({
        type: shape.whole ? 'integer' : 'number',
        minimum: shape.min,
        exclusiveMinimum: shape.above,
        maximum: shape.max,
      });
    case 'text':
      return defined({ type: 'string', pattern: shape.pattern ?? '\\S', description: shape.means });
    case 'one-of':
      return { enum: shape.values };
    case 'list':
      return defined({
        type: 'array',
        items: toSchema(shape.of),
        minItems: shape.min || undefined,
        maxItems: shape.max,
      });
    case 'record':
      return recordSchema(shape);
    case 'map':
      return { type: 'object', additionalProperties: toSchema(shape.of) };
    case 'tagged':
      return {
        type: 'object',
        required: [shape.by],
        properties: { [shape.by]: { enum: Object.keys(shape.cases) } },
        allOf: Object.entries(shape.cases).map(([tag, inner]) => ({
          if: { properties: { [shape.by]: { const: tag } } },
          // biome-ignore lint/suspicious/noThenProperty: "then" is a keyword of JSON Schema
          then: shape.by === 'model' ? { $ref: `#/$defs/parameters-${tag}` } : toSchema(inner),
        })),
      };
    case 'keyed':
      return { anyOf: shape.cases.map((c) => toSchema(c.shape)) };
    case 'either':
      return { anyOf: shape.of.map(toSchema) };
  }
}

function recordSchema(shape: RecordShape): Json {
  const properties = Object.fromEntries(
    [...Object.entries(shape.needs), ...Object.entries(shape.may)].map(([k, v]) => [k, toSchema(v)]),
  );
  const required = Object.keys(shape.needs);
  return defined({
    type: 'object',
    required: required.length > 0 ? required : undefined,
    properties,
    additionalProperties: shape.open ? undefined : false,
  });
}

const defined = (fields: Json): Json =>
  Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== undefined));

/** The text of a schema file. */
export const schemaText = (schema: Json): string => `${JSON.stringify(schema, null, 2)}\n`;

if (process.argv[1] !== undefined && resolve(process.argv[1]) === fileURLToPath(import.meta.url)) {
  for (const { name, schema } of schemaFiles()) {
    writeFileSync(join(CATALOG_FOLDER, 'schema', name), schemaText(schema));
    console.log(`wrote catalog/schema/${name}`);
  }
}
