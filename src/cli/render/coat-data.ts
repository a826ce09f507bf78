/** Coatings as one JSON document, and as CSV: a row a design, lengths in metres, reflectances as fractions. */
import type { CoatingReport } from '../../answer/coating-shape.ts';
import { CONVENTION_NOTES } from '../convention-notes.ts';
import { type CsvValue, csvTable } from './csv-table.ts';
import { type DocumentHead, jsonDocument } from './json-document.ts';

export function coatJson(report: CoatingReport, head: DocumentHead, ascii: boolean): string {
  return jsonDocument(head, { convention: CONVENTION_NOTES, ...report }, ascii);
}

const COLUMNS = [
  'design',
  'outer',
  'inner',
  'pairs',
  'layers',
  'outerThickness_m',
  'innerThickness_m',
  'R',
  'R_low',
  'R_high',
  'band_from_m',
  'band_to_m',
  'band_open_below',
  'band_open_above',
] as const;

export function coatCsv(report: CoatingReport, ascii: boolean): string {
  const { singleFilms, twoLayers, mirror } = report;
  const band = (b: { from_m: number; to_m: number; openBelow: boolean; openAbove: boolean } | null) =>
    b ? [b.from_m, b.to_m, b.openBelow, b.openAbove] : [null, null, null, null];
  const none = [null, null, null, null];
  const rows: (readonly CsvValue[])[] = [
    ['bare', null, null, 0, 0, null, null, report.bare.R, null, null, ...none],
    ...singleFilms.map((f) => [
      'quarter-wave',
      f.film.key,
      null,
      null,
      1,
      f.thickness_m,
      null,
      f.R,
      f.R_low,
      f.R_high,
      ...band(f.band),
    ]),
    ...twoLayers.flatMap((d) =>
      d.solutions.map((s) => [
        'two-layer',
        d.outer.key,
        d.inner.key,
        null,
        2,
        s.outerThickness_m,
        s.innerThickness_m,
        s.R,
        s.R_low,
        s.R_high,
        ...band(s.band),
      ]),
    ),
    ...(mirror?.rows ?? []).map((r) => [
      'reflector',
      mirror?.high.key,
      mirror?.low.key,
      r.pairs,
      r.layers,
      mirror?.highThickness_m,
      mirror?.lowThickness_m,
      r.R,
      r.R_low,
      r.R_high,
      ...none,
    ]),
  ];
  return csvTable(COLUMNS, rows, ascii);
}
