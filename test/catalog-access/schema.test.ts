import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { Ajv2020 } from 'ajv/dist/2020.js';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkShape } from '../../src/catalog/check-shape.ts';
import { CATALOG_FOLDER, readCatalogueSources } from '../../src/catalog/from-sources.ts';
import { materialShape, sourceShape } from '../../src/catalog/material-shape.ts';
import { list } from '../../src/catalog/shape.ts';
import { schemaFiles, schemaText } from '../../tools/catalog-schema.ts';
import { damagedJson } from './mutate.ts';

const sources = readCatalogueSources();
// The members "properties" under "allOf" repeat what the surrounding schema says, which strict mode takes for a slip.
const ajv = new Ajv2020({ strict: true, strictRequired: false, strictTypes: false, allErrors: false });
const validators = new Map<string, ReturnType<typeof ajv.compile>>();
const validate = (name: string, value: unknown): string => {
  const known = validators.get(name);
  const validator = known ?? ajv.compile(schemaFiles().find((f) => f.name === name)?.schema ?? false);
  validators.set(name, validator);
  return validator(value) ? '' : ajv.errorsText(validator.errors);
};

describe('the schema files', () => {
  it.each(schemaFiles().map((f) => [f.name, f.schema] as const))(
    '%s is what the shapes make',
    (name, schema) => {
      expect(readFileSync(join(CATALOG_FOLDER, 'schema', name), 'utf8')).toBe(schemaText(schema));
    },
  );

  it.each(sources.materials.map((m) => [m.key, m] as const))('%s follows it', (_, material) => {
    expect(validate('material.schema.json', material)).toBe('');
  });

  it.each(schemaFiles().map((f) => [f.name, f.schema] as const))('%s is a schema', (_, schema) => {
    expect(ajv.validateSchema(schema)).toBe(true);
  });

  it('the bibliography follows it', () => {
    expect(validate('bibliography.schema.json', sources.sources)).toBe('');
  });
});

describe('the hand-written check', () => {
  it('accepts every entry', () => {
    for (const m of sources.materials) expect([m.key, checkShape(m, materialShape())]).toEqual([m.key, []]);
    expect(checkShape(sources.sources, list(sourceShape(), 1))).toEqual([]);
  });

  it('and the schema agree about damaged entries', () => {
    // A few entries that between them use most models.
    const keys = [
      'fused-silica',
      'silicon',
      'water',
      'air',
      'gold',
      'calcite',
      'n-bk7',
      'ptfe',
      'sea-water',
      'sucrose-solution',
    ];
    const some = sources.materials.filter((m) => keys.includes(m.key));
    expect(some.length).toBeGreaterThan(5);
    fc.assert(
      fc.property(fc.constantFrom(...some).chain(damagedJson), (damaged) => {
        const text = JSON.stringify(damaged);
        // Control characters are refused by the check alone; the schema has no say about the terminal.
        fc.pre(!/\\u00[01]|\\u007f|\\u2028|\\u2029|\\[bfnrt]/.test(text));
        const parsed: unknown = JSON.parse(text);
        const faults = checkShape(parsed, materialShape());
        expect(faults.length === 0).toBe(validate('material.schema.json', parsed) === '');
      }),
      { numRuns: 400 },
    );
  });
});
