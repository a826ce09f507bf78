/** The works behind a medium for people: each with its id, its reference and what it is the source of. */
import { type CitedSource, citedSources, factSources, type SourceUse } from '../../catalog/cited-sources.ts';
import type { Fit, Source } from '../../catalog/types.ts';
import { sourceText } from '../../cite/source-text.ts';
import { lengthRange } from '../../present/length-text.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import type { Cited } from '../find-cited.ts';
import { page, paragraph } from './page.ts';

type SourceOf = (id: string) => Source | undefined;

export function citeText(cited: readonly Cited[], sourceOf: SourceOf, style: NumberStyle): string {
  const shown = new Set<string>();
  const sections = cited.map((one) =>
    one.kind === 'source' ? sourceLines(one.source, shown) : materialLines(one, sourceOf, shown, style),
  );
  return page(
    sections.flatMap((lines, i) => (i === 0 ? lines : ['', ...lines])),
    style.ascii,
  );
}

function sourceLines(source: Source, shown: Set<string>): readonly string[] {
  if (shown.has(source.id)) return [`${source.id}: above`];
  shown.add(source.id);
  return [source.id, ...paragraph(sourceText(source), 2, 0)];
}

function materialLines(
  { material, axis }: Cited & { readonly kind: 'material' },
  sourceOf: SourceOf,
  shown: Set<string>,
  style: NumberStyle,
): readonly string[] {
  const sources = citedSources(material, axis);
  const { absorption, facts } = factSources(material);
  const asWell = [
    ...absorption.map((text) => `absorption: ${text}`),
    ...(facts === undefined ? [] : [`facts for handling: ${facts}`]),
  ];
  const name = `${material.name}${axis === undefined || axis === 'isotropic' ? '' : `, ${axis}`} [${material.key}]`;
  return [
    ...paragraph(name),
    ...sources.flatMap((one) => ['', ...citedLines(one, sourceOf(one.id), shown, style)]),
    ...(sources.length === 0 ? ['', 'no work of the bibliography'] : []),
    ...(asWell.length === 0 ? [] : ['', 'Read elsewhere', ...asWell.flatMap((text) => paragraph(text, 2))]),
  ];
}

function citedLines(
  { id, uses }: CitedSource,
  source: Source | undefined,
  shown: Set<string>,
  style: NumberStyle,
): readonly string[] {
  const lines = source ? sourceLines(source, shown) : [`${id} (not in the bibliography)`];
  return [...lines, ...uses.flatMap((use) => paragraph(`- ${useText(use, style)}`, 2))];
}

export function useText(use: SourceUse, style: NumberStyle): string {
  switch (use.kind) {
    case 'fit':
      return fitText(use.fit, style);
    case 'behind-fit':
      return `behind ${fitText(use.fit, style)}`;
    case 'reflectance':
      return 'reflectance of samples in air';
  }
}

const fitText = ({ axis, id, range_um, recommended }: Fit, style: NumberStyle): string =>
  [
    `fit ${id}`,
    ...(axis === 'isotropic' ? [] : [`${axis} axis`]),
    lengthRange(range_um, style),
    recommended ? 'recommended' : 'second opinion',
  ].join(', ');
