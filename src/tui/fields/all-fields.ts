/** Every field of the picture, in the order of Tab. */
import { BEAM_FIELD, PROFILE_FIELD, WIDTH_FIELD } from './beam-fields.ts';
import { CONDITION_FIELDS } from './condition-fields.ts';
import type { Field, FieldId } from './field.ts';
import { ANGLE_FIELD, EXTRAPOLATE_FIELD, POLARIZATION_FIELD, TOLERANCE_FIELD } from './geometry-fields.ts';
import { LAYERS_FIELD } from './layer-field.ts';
import { MEDIUM_FIELDS } from './medium-fields.ts';
import { REFERENCE_FIELD, WAVE_FIELD } from './wave-fields.ts';

export const FIELDS: readonly Field[] = [
  WAVE_FIELD,
  REFERENCE_FIELD,
  ANGLE_FIELD,
  POLARIZATION_FIELD,
  ...CONDITION_FIELDS,
  TOLERANCE_FIELD,
  EXTRAPOLATE_FIELD,
  ...MEDIUM_FIELDS,
  LAYERS_FIELD,
  BEAM_FIELD,
  WIDTH_FIELD,
  PROFILE_FIELD,
];

const BY_ID: ReadonlyMap<FieldId, Field> = new Map(FIELDS.map((field) => [field.id, field]));

export function fieldById(id: FieldId): Field {
  const field = BY_ID.get(id);
  if (!field) throw new RangeError(`no field ${id}`);
  return field;
}
