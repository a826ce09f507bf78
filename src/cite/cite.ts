/** Sources in the form asked for; each form is a document of its own that ends without a line break. */
import type { Source } from '../catalog/types.ts';
import { bibtexEntry } from './bibtex.ts';
import { cslItem } from './csl.ts';
import { sourceText } from './source-text.ts';

export type CitationForm = 'text' | 'bibtex' | 'csl';

/** Each source once, in the order given. */
export function cite(sources: readonly Source[], form: CitationForm): string {
  const once = [...new Map(sources.map((s) => [s.id, s])).values()];
  switch (form) {
    case 'text':
      return once.map(sourceText).join('\n');
    case 'bibtex':
      return once.map(bibtexEntry).join('\n\n');
    case 'csl':
      return JSON.stringify(once.map(cslItem), null, 2);
  }
}
