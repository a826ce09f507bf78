/** The question as plain JSON, every default filled in; a medium is named by its key and axis, or by its numbers. */
import type { Layer, MediumSpec, Question } from '../answer/question.ts';
import { type JsonObject, toPlainObject } from './plain-json.ts';

export function questionEcho(question: Question): JsonObject {
  const { from, layers, into, wave, beam, designWave, coherenceLength_m, ...rest } = question;
  return toPlainObject({
    from: mediumEcho(from),
    layers: layers.map(layerEcho),
    into: mediumEcho(into),
    wave,
    ...rest,
    beam: beam ?? null,
    designWave: designWave ?? null,
    coherenceLength_m: coherenceLength_m ?? null,
  });
}

function mediumEcho(medium: MediumSpec): JsonObject {
  return medium.kind === 'catalogue'
    ? toPlainObject({
        key: medium.material.key,
        axis: medium.axis ?? null,
        own: medium.material.own ?? false,
      })
    : toPlainObject({ literal: medium.literal, text: medium.text });
}

function layerEcho({ medium, thickness, ...rest }: Layer): JsonObject {
  return { medium: mediumEcho(medium), thickness: toPlainObject(thickness), ...toPlainObject(rest) };
}
