/** From what a person typed for `cite` to the works meant: all those of a medium, or the one of a bibliography id. */
import type { IndexedCatalogue } from '../catalog/entries.ts';
import type { Axis, Material, Source } from '../catalog/types.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { quoteInput } from '../units/quote-input.ts';
import { findMedium, suggestMedia } from './find-medium.ts';
import { nearest } from './nearest.ts';

export type Cited =
  | { readonly kind: 'material'; readonly material: Material; readonly axis: Axis | undefined }
  | { readonly kind: 'source'; readonly source: Source };

export async function findCited(text: string, catalogue: IndexedCatalogue): Promise<Cited | Refusal> {
  const medium = findMedium(text, catalogue);
  if (!isRefusal(medium)) {
    if (medium.kind === 'catalogue')
      return { kind: 'material', material: medium.material, axis: medium.axis };
    return refuse(
      'no-source',
      2,
      `${quoteInput(text)} is a medium given by its numbers and has no source`,
      'name a medium of the catalogue',
    );
  }
  if (medium.code !== 'unknown-medium') return medium;
  const source = catalogue.source(text.trim());
  if (source) return { kind: 'source', source };
  const ids = nearest(text, catalogue.sourceIds());
  if (/\d{4}/.test(text) && ids.length > 0) {
    const message = `${quoteInput(text)} is no medium and no work of the bibliography`;
    return refuse('unknown-source', 2, message, `did you mean ${ids.join(', ')}?`, ids);
  }
  return suggestMedia(medium, text, catalogue);
}
