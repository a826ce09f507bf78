/** `halfspace cite MEDIUM ...`: the works behind the numbers, each once: for people, as BibTeX, as CSL-JSON, as JSON with their uses. */
import { citedSources, factSources } from '../../catalog/cited-sources.ts';
import type { IndexedCatalogue } from '../../catalog/entries.ts';
import type { Source } from '../../catalog/types.ts';
import { cite } from '../../cite/cite.ts';
import { cslItem } from '../../cite/csl.ts';
import { sourceText } from '../../cite/source-text.ts';
import { isRefusal } from '../../medium/refusal.ts';
import { toAscii } from '../../units/to-ascii.ts';
import type { Command } from '../context.ts';
import { type Cited, findCited } from '../find-cited.ts';
import { citeText, useText } from '../render/cite-text.ts';
import { escaped, jsonDocument } from '../render/json-document.ts';
import { reportRefusal } from '../report-refusal.ts';

export const run: Command = async ({ operands, options }, context) => {
  const catalogue = context.catalogue();
  const ascii = options.ascii === true;
  const cited: Cited[] = [];
  for (const text of operands) {
    const one = await findCited(text, catalogue);
    if (isRefusal(one)) return reportRefusal(one, context);
    cited.push(one);
  }
  const works = worksOf(cited, catalogue);
  if (options.bibtex) context.write(works.length === 0 ? '' : `${cite(works, 'bibtex')}\n`);
  else if (options.csl) context.write(`${ascii ? escaped(cite(works, 'csl')) : cite(works, 'csl')}\n`);
  else if (options.json) {
    const head = { version: context.version, catalogue: catalogue.hash };
    context.write(jsonDocument(head, citeBody(cited, works), ascii));
  } else if (options.plain) {
    const lines = works.map((w) => `${w.id}\t${context.ascii ? toAscii(sourceText(w)) : sourceText(w)}\n`);
    context.write(lines.join(''));
  } else context.write(citeText(cited, (id) => catalogue.source(id), { ascii: context.ascii }));
  return 0;
};

/** Each work once, in the order in which the media name them. */
function worksOf(cited: readonly Cited[], catalogue: IndexedCatalogue): readonly Source[] {
  const all = cited.flatMap((one) =>
    one.kind === 'source'
      ? [one.source]
      : citedSources(one.material, one.axis).flatMap(({ id }) => catalogue.source(id) ?? []),
  );
  return [...new Map(all.map((work) => [work.id, work])).values()];
}

function citeBody(cited: readonly Cited[], works: readonly Source[]) {
  const media = cited.flatMap((one) => (one.kind === 'material' ? [one] : []));
  return {
    media: media.map(({ material, axis }) => {
      const { absorption, facts } = factSources(material);
      return {
        key: material.key,
        name: material.name,
        axis: axis ?? null,
        sources: citedSources(material, axis).map(({ id, uses }) => ({
          id,
          uses: uses.map((use) => useText(use, { ascii: true })),
          fits: [...new Set(uses.flatMap((use) => ('fit' in use ? [use.fit.id] : [])))],
        })),
        absorptionSources: absorption,
        factsSource: facts ?? null,
      };
    }),
    sources: works.map((work) => ({ ...cslItem(work), text: sourceText(work) })),
  };
}
