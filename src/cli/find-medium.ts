/**
 * From the text a person typed for a medium to the medium: a literal ("n=1.5") or a name of the catalogue. A name that fits
 * nothing or several gives a refusal with the candidates; nothing is ever picked in its place.
 */
import type { MediumSpec } from '../answer/question.ts';
import type { IndexedCatalogue } from '../catalog/entries.ts';
import { type Refusal, refuse } from '../medium/refusal.ts';
import { isLiteralMedium } from '../units/is-literal-medium.ts';
import { parseLiteralMedium } from '../units/parse-literal-medium.ts';
import { isProblem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';

const MOST_CANDIDATES = 5;

/** The medium, or a refusal; `none` with no candidates yet, since finding those loads the search (`suggestMedia`). */
export function findMedium(text: string, catalogue: IndexedCatalogue): MediumSpec | Refusal {
  if (isLiteralMedium(text)) {
    const literal = parseLiteralMedium(text);
    return isProblem(literal)
      ? refuse('bad-literal-medium', 2, literal.message, literal.remedy)
      : { kind: 'literal', literal, text: text.trim() };
  }
  if (text.trim() === '') return refuse('empty-medium', 2, 'a medium is empty', NO_MATCH);
  const lookup = catalogue.lookup(text);
  switch (lookup.kind) {
    case 'one':
      return { kind: 'catalogue', material: lookup.found.material, axis: lookup.found.axis };
    case 'no-such-axis': {
      const { material, axes } = lookup;
      const remedy =
        axes.length === 1 && axes[0] === 'isotropic'
          ? `it is isotropic: write ${material.key}`
          : `write ${axes.map((a) => `${material.key}:${a}`).join(' or ')}`;
      return refuse(
        'no-such-axis',
        2,
        `${material.name} has no axis of that name (${quoteInput(text)})`,
        remedy,
      );
    }
    case 'several': {
      const names = lookup.candidates.map((m) => `${m.key} (${m.name})`);
      return refuse(
        'ambiguous-medium',
        2,
        `${quoteInput(text)} fits several media: ${names.join(', ')}`,
        'name one of them by its key',
        lookup.candidates.map((m) => m.key),
      );
    }
    default:
      return refuse('unknown-medium', 2, `there is no medium ${quoteInput(text)} in the catalogue`, NO_MATCH);
  }
}

const NO_MATCH = 'give a key, name, formula or glass code, or numbers such as n=1.5';

/** Adds the closest names to a refusal of an unknown medium; any other refusal passes through. */
export async function suggestMedia(
  refusal: Refusal,
  text: string,
  catalogue: IndexedCatalogue,
): Promise<Refusal> {
  if (refusal.code !== 'unknown-medium') return refusal;
  const { makeSearch } = await import('../catalog/search.ts');
  const [name = text] = text.split(':');
  const keys = makeSearch(catalogue.entries())(name, MOST_CANDIDATES).map((hit) => hit.entry.key);
  if (keys.length === 0) return refusal;
  return { ...refusal, remedy: `did you mean ${keys.join(', ')}?`, candidates: keys };
}
