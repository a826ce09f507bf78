/** From what a person typed for `equivalent` to the glass sought: a name of the catalogue, or a code of six digits. */
import type { IndexedCatalogue } from '../catalog/entries.ts';
import type { Material } from '../catalog/types.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { type GlassPlace, glassMakers, glassPlace, placeOfCode } from '../selection/glass-equivalents.ts';
import type { Survey } from '../selection/survey.ts';
import { quoteInput } from '../units/quote-input.ts';
import { findMedium, suggestMedia } from './find-medium.ts';

export type SoughtGlass =
  | { readonly kind: 'glass'; readonly material: Material; readonly place: GlassPlace }
  /** `carriers`: the glasses of the catalogue that bear the code. */
  | {
      readonly kind: 'code';
      readonly code: string;
      readonly carriers: readonly Material[];
      readonly place: GlassPlace;
    };

/** Six digits; makers add three of the density after a point, which says nothing about the index. */
const CODE = /^(\d{6})(\.\d{3})?$/;

export async function findGlass(
  text: string,
  catalogue: IndexedCatalogue,
  survey: Survey,
): Promise<SoughtGlass | Refusal> {
  const [, code] = CODE.exec(text.trim()) ?? [];
  if (code !== undefined) {
    const carriers = survey.materials.filter((m) => m.glassCode === code);
    return { kind: 'code', code, carriers, place: placeOfCode(code) };
  }
  const medium = findMedium(text, catalogue);
  if (isRefusal(medium)) return suggestMedia(medium, text, catalogue);
  if (medium.kind === 'literal') {
    return refuse(
      'no-glass',
      2,
      `${quoteInput(text)} is a medium given by its numbers`,
      'name a glass or write its code, such as 517642 for n_d = 1.517, V_d = 64.2',
    );
  }
  const { material } = medium;
  const place = glassPlace(survey, material);
  if (place) return { kind: 'glass', material, place };
  return refuse(
    'no-abbe-number',
    3,
    `${material.name} has no n_d and V_d: one isotropic fit must reach the lines F, d and C without absorption`,
    'name a glass; halfspace match finds media of an index at any wave',
  );
}

/** The makers meant; a refusal naming them all where none is. */
export function findMakers(text: string, survey: Survey): readonly string[] | Refusal {
  const typed = text.toLowerCase();
  const makers = glassMakers(survey);
  const meant = makers.filter((maker) =>
    maker
      .toLowerCase()
      .split(/\s+/)
      .some((word) => word.startsWith(typed)),
  );
  if (meant.length > 0) return meant;
  return refuse(
    'unknown-maker',
    2,
    `no optical glass here is by ${quoteInput(text)}`,
    `makers are ${makers.join(', ')}`,
    makers,
  );
}
