/** What a design of coatings takes where nothing is stated. */
import type { Material } from '../catalog/types.ts';
import type { CoatAsked } from './coating-report.ts';
import type { Question } from './question.ts';

/** Limit of R for the widths of bands. */
export const BAND_LIMIT = 0.005;
/** Reflectance wanted of a high reflector. */
export const WANTED_REFLECTANCE = 0.995;
/** Class of the catalogue whose materials are designed with. */
export const FILM_CLASS = 'thin film';

/** The design for a question with the films at hand and nothing else stated. */
export function coatAsked(question: Question, films: readonly Material[]): CoatAsked {
  return {
    question,
    films: films.map((material) => ({ kind: 'catalogue', material })),
    limit: BAND_LIMIT,
    mirror: { wanted: WANTED_REFLECTANCE, pairs: null },
  };
}
