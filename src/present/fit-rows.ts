/** One fit of a material: what it is, where it holds, how good it is, where it comes from. */
import type { Fit, Material, Source } from '../catalog/types.ts';
import { sourceText } from '../cite/source-text.ts';
import { formatNumber } from '../units/format-number.ts';
import { lengthRange } from './length-text.ts';
import { modelWords, thermalWords } from './model-words.ts';
import { RowList } from './row-list.ts';
import type { PresentStyle, Shown } from './shown.ts';
import { GRADE_WORDS } from './source-lines.ts';

type SourceOf = (id: string) => Source | undefined;

/** "malitson-1965, ordinary axis, recommended". */
export function fitTitle(fit: Fit): string {
  return [
    fit.id,
    ...(fit.axis === 'isotropic' ? [] : [`${fit.axis} axis`]),
    fit.recommended ? 'recommended' : 'second opinion',
    ...(fit.estimateBetweenBands ? ['an estimate between two published bands'] : []),
  ].join(', ');
}

export function fitRows(
  fit: Fit,
  material: Material,
  sourceOf: SourceOf,
  style: PresentStyle,
): readonly Shown[] {
  const rows = new RowList(style);
  const add = (id: string, label: string, text: string | undefined): void => {
    if (text !== undefined && text !== '') rows.add(id, '', label, text);
  };
  const range = (part: readonly [number, number] | undefined): string | undefined =>
    part && lengthRange(part, style);
  add('model', 'form', modelWords(fit.parameters));
  add('range_um', 'range', range(fit.range_um));
  add('confirmedRange_um', 'confirmed over', range(fit.confirmedRange_um));
  add('recommendedRange_um', 'preferred over', range(fit.recommendedRange_um));
  add(
    'reference',
    'reference',
    fit.reference === 'air' ? 'index and wavelength relative to air' : 'index and wavelength in vacuum',
  );
  add('temperature_C', 'measured at', temperatureText(fit.temperature_C, style));
  add('accuracy_n', 'accuracy of n', accuracyText(fit, style));
  add('thermal', 'thermal', thermalWords(fit, material, style));
  add('film', 'film', filmText(fit, style));
  add('grade', `grade ${fit.grade}`, GRADE_WORDS[fit.grade]);
  add('source', 'source', sourceOfFit(fit.source, sourceOf));
  for (const id of fit.furtherSources ?? []) add('furtherSources', 'and', sourceOfFit(id, sourceOf));
  add('confirmedBy', 'confirmed by', fit.confirmedBy);
  add('note', 'note', fit.note);
  for (const text of contradictions(fit.contradictedBy ?? [], style))
    add('contradictedBy', 'elsewhere', text);
  return rows.list;
}

const temperatureText = (temperature_C: number | undefined, style: PresentStyle): string | undefined =>
  temperature_C === undefined ? undefined : `${formatNumber(temperature_C, 'shortest', style)} °C`;

function accuracyText(fit: Fit, style: PresentStyle): string {
  if (fit.accuracy_n === 0) return 'exact';
  if (fit.accuracy_n !== undefined) return formatNumber(fit.accuracy_n, 'shortest', style);
  if (fit.digitsGuide_n === undefined) return 'not stated';
  return `not stated; differs from published values by up to ${formatNumber(fit.digitsGuide_n, { significant: 2 }, style)}`;
}

function filmText({ film }: Fit, style: PresentStyle): string | undefined {
  if (!film) return undefined;
  const spread = film.spread_n;
  return spread === undefined
    ? film.process
    : `${film.process}; n varies by ${formatNumber(spread, 'shortest', style)} with the process`;
}

function sourceOfFit(id: string, sourceOf: SourceOf): string {
  const source = sourceOf(id);
  return source ? sourceText(source) : id;
}

/** Printed values that disagree are free records: their numbers, then who says so and why; those of one source together. */
function contradictions(records: readonly unknown[], style: PresentStyle): readonly string[] {
  const numbersOf = new Map<string, string[]>();
  for (const value of records) {
    if (typeof value !== 'object' || value === null) continue;
    const record = value as Readonly<Record<string, unknown>>;
    const said = ['source', 'note']
      .flatMap((k) => (typeof record[k] === 'string' ? [record[k]] : []))
      .join('; ');
    numbersOf.set(said, [...(numbersOf.get(said) ?? []), numbersText(record, style)]);
  }
  return [...numbersOf].map(([said, numbers]) => [...numbers, said].filter((part) => part !== '').join('; '));
}

function numbersText(record: Readonly<Record<string, unknown>>, style: PresentStyle): string {
  const { wavelength_um: at, quantity, published } = record;
  const { wavelength_um: _, ...named } = record;
  const figures = typeof quantity === 'string' ? { [quantity]: published } : named;
  const numbers = Object.entries(figures).flatMap(([name, x]) =>
    typeof x === 'number' ? [`${name} ${formatNumber(x, 'shortest', style)}`] : [],
  );
  return `${numbers.join(', ')}${typeof at === 'number' ? ` at ${formatNumber(at, 'shortest', style)} µm` : ''}`;
}
