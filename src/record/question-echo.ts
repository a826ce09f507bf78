/**
 * The question as plain JSON, every default filled in; a medium is named by its key and axis, or by its numbers. The hash of the
 * catalogue does not cover a person's own entries: those carry the hash of their own content.
 */
import { createHash } from 'node:crypto';
import type { Layer, MediumSpec, Question } from '../answer/question.ts';
import type { Material } from '../catalog/types.ts';
import { type JsonObject, toPlainObject } from './plain-json.ts';

/** What stands for a part that was not stated. */
const NOT_STATED: { readonly [Part in OptionalPart]: null | false } = {
  beam: null,
  designWave: null,
  coherenceLength_m: null,
  pulseDuration_s: null,
  cut: null,
  fieldProfile: false,
};
type OptionalPart = {
  [Part in keyof Question]-?: undefined extends Question[Part] ? Part : never;
}[keyof Question];

export function questionEcho(question: Question): JsonObject {
  const { from, layers, into, ...rest } = question;
  const stated = Object.fromEntries(Object.entries(rest).filter(([, value]) => value !== undefined));
  return toPlainObject({
    from: mediumEcho(from),
    layers: layers.map(layerEcho),
    into: mediumEcho(into),
    ...NOT_STATED,
    ...stated,
  });
}

function mediumEcho(medium: MediumSpec): JsonObject {
  return medium.kind === 'catalogue'
    ? toPlainObject({
        key: medium.material.key,
        axis: medium.axis ?? null,
        own: medium.material.own ?? false,
        ...(medium.material.own ? { ownHash: contentHash(medium.material) } : {}),
      })
    : toPlainObject({ literal: medium.literal, text: medium.text });
}

/** True where a medium of the question is an entry of the person's own. */
export function usesOwnEntries({ from, layers, into }: Question): boolean {
  return [from, ...layers.map(({ medium }) => medium), into].some(
    (medium) => medium.kind === 'catalogue' && medium.material.own === true,
  );
}

const HASH_DIGITS = 12;

function contentHash(material: Material): string {
  return createHash('sha256').update(JSON.stringify(material)).digest('hex').slice(0, HASH_DIGITS);
}

function layerEcho({ medium, thickness, ...rest }: Layer): JsonObject {
  return { medium: mediumEcho(medium), thickness: toPlainObject(thickness), ...toPlainObject(rest) };
}
