/** The record of a material as the catalogue holds it, its index at reference lines and the works behind it, for programs. */
import type { ReferenceLine } from '../../answer/reference-lines.ts';
import { citedSources } from '../../catalog/cited-sources.ts';
import type { Material } from '../../catalog/types.ts';
import { cslItem } from '../../cite/csl.ts';
import { sourceText } from '../../cite/source-text.ts';
import { type DocumentHead, jsonDocument } from './json-document.ts';
import { fitsOf, type MaterialSheet } from './material-sheet.ts';

export function materialJson(sheet: MaterialSheet, head: DocumentHead, ascii: boolean): string {
  const { material, axis, lines, sourceOf } = sheet;
  const { compositeChecks: _, ...record } = material;
  const body = {
    axis: axis ?? null,
    material: { ...record, own: material.own === true, fits: fitsOf(sheet).map(withoutChecks) },
    lines: lines.map(lineRecord),
    sources: citedSources(material, axis).flatMap(({ id }) => {
      const source = sourceOf(id);
      return source ? [{ ...cslItem(source), text: sourceText(source) }] : [];
    }),
  };
  return jsonDocument(head, body, ascii);
}

/** Check values are the self-test's: `halfspace verify --full --json`. */
function withoutChecks({ checks: _, abbe: __, ...fit }: Material['fits'][number]) {
  return fit;
}

function lineRecord({ axis, line, wave, vacuumWavelength_m, medium }: ReferenceLine) {
  const second = medium.fit?.secondOpinion ?? null;
  return {
    axis,
    line,
    vacuumWavelength_m,
    airWavelength_m: wave.inAir ? wave.wavelength_m : null,
    n: medium.n,
    k: medium.k,
    absorptionKnown: medium.absorptionCoefficient_per_m !== null,
    n_published: medium.n_published,
    publishedReference: medium.publishedReference,
    n_uncertainty: medium.n_uncertainty,
    groupIndex: medium.absolute.groupIndex,
    temperature_K: medium.temperature_K,
    fit: medium.fit?.id ?? null,
    secondOpinion: second && { source: second.source.id, n: second.n, difference: second.difference },
  };
}
