/**
 * `npm run new-material -- KEY "Name" [--model sellmeier] [--class "optical glass"] [--formula SiO2]`: writes a
 * file under catalog/materials/ with every key an entry needs. What has to be filled in is null, so `npm run catalog` lists
 * it until it is.
 */
import { existsSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { parseArgs } from 'node:util';
import { foldTight } from '../src/catalog/fold.ts';
import { CATALOG_FOLDER, catalogueFromSources } from '../src/catalog/from-sources.ts';
import { KEY_PATTERN } from '../src/catalog/key-pattern.ts';
import { parameterShapes } from '../src/catalog/parameter-shapes.ts';
import type { Shape } from '../src/catalog/shape.ts';
import type { ModelName } from '../src/dispersion/parameters.ts';
import { layOut } from './json-layout.ts';

export interface NewMaterial {
  readonly key: string;
  readonly name: string;
  readonly model: string;
  readonly class?: string | undefined;
  readonly formula?: string | undefined;
}

/** The entry with null for whatever only the publication can say. Throws an Error that says what is wrong with the request. */
export function blankEntry(request: NewMaterial): Readonly<Record<string, unknown>> {
  const { key, name, model } = request;
  if (!new RegExp(KEY_PATTERN).test(key))
    throw new Error(`the key "${key}" must be lower-case letters, digits and single hyphens`);
  const shapes = parameterShapes();
  if (!Object.hasOwn(shapes, model))
    throw new Error(`no model "${model}"; there are ${Object.keys(shapes).join(', ')}`);
  return {
    key,
    name,
    ...(request.formula === undefined ? {} : { formula: request.formula }),
    aliases: [],
    class: request.class ?? null,
    fits: [
      {
        id: null,
        axis: 'isotropic',
        recommended: true,
        parameters: { ...(blank(shapes[model as ModelName]) as object), model },
        range_um: [null, null],
        temperature_C: null,
        reference: null,
        accuracy_n: null,
        source: null,
        grade: null,
        recalled: false,
        checks: [
          {
            source: null,
            recalled: false,
            independent: true,
            columns: ['wavelength_um', 'n', 'tolerance_n'],
            rows: [[null, null, null]],
          },
        ],
      },
    ],
  };
}

/** The least value of a shape with null in place of numbers and texts. */
function blank(shape: Shape): unknown {
  switch (shape.is) {
    case 'record':
      return Object.fromEntries(
        Object.entries({ ...shape.needs, ...usual(shape.may) }).map(([k, v]) => [k, blank(v)]),
      );
    case 'list':
      return Array.from({ length: Math.max(shape.min ?? 0, 1) }, () => blank(shape.of));
    case 'keyed':
      return shape.cases[0] ? blank(shape.cases[0].shape) : null;
    case 'tagged': {
      const [first] = Object.entries(shape.cases);
      return first ? { ...(blank(first[1]) as object), [shape.by]: first[0] } : null;
    }
    case 'either':
      return shape.of[0] ? blank(shape.of[0]) : null;
    default:
      return null;
  }
}

/** Of what a model may hold, what nearly every fit of it does. */
function usual(may: Readonly<Record<string, Shape>>): Readonly<Record<string, Shape>> {
  return Object.fromEntries(Object.entries(may).filter(([k]) => k === 'poles' || k === 'lorentz'));
}

function main(): void {
  const { values, positionals } = parseArgs({
    allowPositionals: true,
    options: { model: { type: 'string' }, class: { type: 'string' }, formula: { type: 'string' } },
  });
  const [key, name] = positionals;
  if (key === undefined || name === undefined)
    throw new Error('usage: npm run new-material -- KEY "Name" [--model M] [--class C] [--formula F]');
  const entry = blankEntry({ key, name, ...values, model: values.model ?? 'sellmeier' });
  const file = join(CATALOG_FOLDER, 'materials', `${key}.json`);
  if (existsSync(file)) throw new Error(`${file} exists already`);
  const [taken] = catalogueFromSources().spellings(foldTight(key));
  if (taken) throw new Error(`"${key}" is a ${taken.kind} of ${taken.key} already; choose another key`);
  writeFileSync(file, layOut(entry as Parameters<typeof layOut>[0]));
  console.log(`wrote ${file}`);
  console.log('fill in every null from the publication, or delete the line where it states nothing;');
  console.log('add the work to catalog/bibliography.json; then run npm run catalog until it finds no fault');
}

if (process.argv[1] !== undefined && resolve(process.argv[1]) === fileURLToPath(import.meta.url)) {
  try {
    main();
  } catch (error) {
    console.error(error instanceof Error ? error.message : String(error));
    process.exitCode = 1;
  }
}
