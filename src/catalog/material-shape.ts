/**
 * The shape of a catalogue entry and of a bibliography item. `materialShape` is strict, for the catalogue itself;
 * `ownMaterialShape` asks less of a user's own file: what it may leave out is filled in by own.ts.
 */

import { KEY_PATTERN } from './key-pattern.ts';
import { once } from './once.ts';
import { parameterShapes } from './parameter-shapes.ts';
import {
  anything,
  list,
  notNegative,
  number,
  oneOf,
  openRecord,
  positive,
  type RecordShape,
  record,
  type Shape,
  tagged,
  text,
  yesNo,
} from './shape.ts';

/** Types of the CSL data schema 1.0 that a bibliography here may need. */
export const SOURCE_TYPES = [
  'article',
  'article-journal',
  'article-magazine',
  'book',
  'chapter',
  'dataset',
  'document',
  'manuscript',
  'paper-conference',
  'patent',
  'personal_communication',
  'post-weblog',
  'report',
  'software',
  'standard',
  'thesis',
  'webpage',
] as const;

const shapes = once(() => {
  const key = text(
    KEY_PATTERN,
    'a key of lower-case letters, digits and single hyphens, such as "fused-silica"',
  );
  const range = list(positive, 2, 2);

  const thermal = tagged('form', {
    constant: record(
      { form: text(), dn_dT_per_K: number(), range: text() },
      { referenceTemperature_C: number() },
    ),
    dispersive: record({
      form: text(),
      D0: number(),
      D1: number(),
      D2: number(),
      E0: number(),
      E1: number(),
      lambdaTK_um: number(),
      referenceTemperature_C: number(),
      range: text(),
    }),
    'wavelength-polynomial': record(
      {
        form: text(),
        g: list(number(), 1),
        exponents: list(number(), 1),
        scale: number(),
        referenceTemperature_C: number(),
        range: text(),
      },
      { quadratic_per_K: number(), k_per_C: number() },
    ),
    'band-edge': record({
      form: text(),
      a: number(),
      e2: number(),
      G3: number(),
      E0: list(number(), 1),
      E1: list(number(), 1),
      E2: list(number(), 1),
      E3: list(number(), 1),
      referenceTemperature_C: number(),
      range: text(),
    }),
  });

  const checkGroup = record(
    {
      source: text(),
      recalled: yesNo,
      independent: yesNo,
      columns: list(text('^[A-Za-z0-9_]+$', 'a column name such as "wavelength_um"'), 2),
      rows: list(list(number(), 2), 1),
    },
    { conditions: { is: 'map', of: number() }, setAside: text() },
  );

  const axis = oneOf('isotropic', 'ordinary', 'extraordinary', 'x', 'y', 'z');
  const fitBasis = {
    parameters: tagged('model', parameterShapes()),
    range_um: range,
    reference: oneOf('air', 'vacuum'),
    source: text(),
  };
  const fitStatus = {
    id: key,
    axis,
    recommended: yesNo,
    grade: oneOf('A', 'B', 'C'),
    recalled: yesNo,
    checks: list(checkGroup),
  };
  const fitExtras = {
    confirmedRange_um: range,
    temperature_C: number({ min: -273.15 }),
    accuracy_n: notNegative,
    thermal,
    note: text(),
    confirmedBy: text(),
    film: record({ process: text() }, { spread_n: notNegative }),
    contradictedBy: list(anything),
    recommendedRange_um: range,
    estimateBetweenBands: yesNo,
    furtherSources: list(text(), 1),
    abbe: list(
      record({ quantity: oneOf('Vd', 'Ve', 'VD'), published: positive, tolerance: positive, source: text() }),
      1,
    ),
  };

  const compositeCheck = record({
    quantity: oneOf('mean-index', 'optic-angle'),
    source: text(),
    recalled: yesNo,
    columns: list(text(), 3, 3),
    rows: list(list(number(), 3, 3), 1),
  });

  const absorptionBasis = { wavelength_um: positive, source: text() };
  const absorption: Shape = {
    is: 'keyed',
    cases: [
      {
        key: 'alpha_per_cm',
        shape: record({ ...absorptionBasis, alpha_per_cm: notNegative }, { note: text() }),
      },
      { key: 'k', shape: record({ ...absorptionBasis, k: notNegative }, { note: text() }) },
      {
        key: 'internalTransmittance',
        shape: record(
          { ...absorptionBasis, internalTransmittance: number({ min: 0, max: 1 }), thickness_mm: positive },
          { note: text() },
        ),
      },
    ],
  };

  const handling = openRecord(
    {},
    {
      hygroscopic: text(),
      hazard: text(),
      knoop: positive,
      mohs: positive,
      density_g_per_cm3: positive,
      melting_C: number({ min: -273.15 }),
      expansion_1e6_per_K: number(),
      dn_dT_1e6_per_K: number(),
    },
  );

  const materialExtras = {
    formula: text(),
    maker: text(),
    glassCode: text('^[0-9]{6}$', 'six digits in quotes, such as "517642"'),
    transparency_um: range,
    transparencyBasis: text(),
    absorption: list(absorption),
    reflectanceTables: list(anything),
    compositeChecks: list(compositeCheck, 1),
    bandGap: anything,
    handling,
    factsSource: text(),
    note: text(),
  };

  const material: RecordShape = record(
    {
      key,
      name: text(),
      aliases: list(text()),
      class: text(),
      fits: list(record({ ...fitStatus, ...fitBasis }, fitExtras)),
    },
    materialExtras,
  );

  const person = record({ family: text() }, { given: text() });
  const date = record({ 'date-parts': list(list(number({ whole: true }), 1, 3), 1, 2) });

  const source: RecordShape = record(
    { id: text(), type: oneOf(...SOURCE_TYPES) },
    {
      title: text(),
      author: list(
        { is: 'keyed', cases: [{ key: 'literal', shape: record({ literal: text() }) }, { shape: person }] },
        1,
      ),
      issued: date,
      'container-title': text(),
      volume: text(),
      issue: text(),
      page: text(),
      publisher: text(),
      DOI: text('^10\\.[0-9]{4,9}/[^\\sA-Z]+$', 'a bare DOI in lower case, such as "10.1364/josa.55.001205"'),
      URL: text('^https?://\\S+$', 'an http or https address'),
      accessed: date,
      note: text(),
      erratum: text(),
      retraction: text(),
    },
  );

  const ownMaterial: RecordShape = record(
    { key, name: text(), fits: list(record(fitBasis, { ...fitStatus, ...fitExtras }), 1) },
    { ...materialExtras, aliases: list(text()), class: text(), sources: list(source) },
  );
  return { material, ownMaterial, source };
});

/** An entry of the catalogue. */
export const materialShape = (): RecordShape => shapes().material;
/** An entry of a user's own. */
export const ownMaterialShape = (): RecordShape => shapes().ownMaterial;
/** An item of the bibliography. */
export const sourceShape = (): RecordShape => shapes().source;
