/** Changes of the question that belong to no single field. */
import type { Question, Tolerances } from '../../answer/question.ts';

export function setAngle(question: Question, incidenceAngle_rad: number): Question {
  return { ...question, incidenceAngle_rad };
}

/** The wave comes from the other side: media, layers and the tolerances of the indices change places. */
export function swapMedia(question: Question): Question {
  const { index, indexFrom, ...others } = question.tolerances;
  const tolerances: Tolerances = {
    ...others,
    ...(index === undefined ? {} : { indexFrom: index }),
    ...(indexFrom === undefined ? {} : { index: indexFrom }),
  };
  return {
    ...question,
    from: question.into,
    into: question.from,
    layers: [...question.layers].reverse(),
    tolerances,
  };
}
