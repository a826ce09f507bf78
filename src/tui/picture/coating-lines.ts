/**
 * The page of coatings between the two media, at the wave, angle and polarization of the question. Each design can be put between
 * the media: its thicknesses are those of the row.
 */
import type { CoatingReport, FilmAnswer, MirrorDesign } from '../../answer/coating-shape.ts';
import type { Layer, Question } from '../../answer/question.ts';
import { isRefusal } from '../../medium/refusal.ts';
import { coatHeadline } from '../../present/coat-headline.ts';
import {
  bareText,
  type DesignTable,
  idealText,
  mirrorTable,
  mirrorText,
  neededText,
  noPairText,
  pairTable,
  singleFilmTable,
} from '../../present/coat-page.ts';
import { DATA_END_NOTE, hasOpenBand } from '../../present/coat-rows.ts';
import type { PresentStyle } from '../../present/shown.ts';
import { columns } from '../../term/columns.ts';
import type { World } from '../world.ts';
import { cautionLines } from './caution-lines.ts';
import { laidOut, type PageLine, pageLine } from './page-line.ts';

type LayerOf = (film: FilmAnswer, thickness_m: number) => readonly Layer[];

export function coatingLines(question: Question, style: PresentStyle, world: World): readonly PageLine[] {
  const report = world.coatings(question);
  if (!report) return [pageLine('designing coatings ...')];
  if (isRefusal(report)) return [pageLine(`${report.message}; ${report.remedy}`, 'caution', 'x')];
  const layerOf: LayerOf = (film, thickness_m) => {
    const material = world.material(film.key);
    return material
      ? [{ medium: { kind: 'catalogue', material }, thickness: { kind: 'length', thickness_m } }]
      : [];
  };
  return [
    pageLine(coatHeadline(report, style), 'heading'),
    pageLine(bareText(report, style)),
    pageLine(idealText(report, style)),
    pageLine(''),
    ...singleLines(report, style, layerOf),
    ...pairLines(report, style, layerOf),
    ...(report.mirror ? mirrorLines(report, report.mirror, style, layerOf) : []),
    ...(hasOpenBand(report) ? [pageLine(''), pageLine(DATA_END_NOTE, 'aside')] : []),
    ...(report.skipped.length > 0 ? [pageLine(''), pageLine('Left out', 'heading')] : []),
    ...report.skipped.map(({ key, reason }) => pageLine(`${key}: ${reason}`)),
    ...(report.cautions.length > 0 ? [pageLine(''), pageLine('Cautions', 'heading')] : []),
    ...cautionLines(report.cautions),
  ];
}

function singleLines(report: CoatingReport, style: PresentStyle, layerOf: LayerOf): readonly PageLine[] {
  const table = singleFilmTable(report, style);
  if (!table) return [pageLine('no film of the catalogue reaches this wave')];
  return tableLines(table, style, ({ film, thickness_m }) => layerOf(film, thickness_m));
}

function pairLines(report: CoatingReport, style: PresentStyle, layerOf: LayerOf): readonly PageLine[] {
  const table = pairTable(report, style);
  const none = noPairText(report);
  if (!table) return none === '' ? [] : [pageLine(''), pageLine(none)];
  return [
    pageLine(''),
    ...tableLines(table, style, ({ pair, solution }) => [
      ...layerOf(pair.outer, solution.outerThickness_m),
      ...layerOf(pair.inner, solution.innerThickness_m),
    ]),
  ];
}

function mirrorLines(
  report: CoatingReport,
  mirror: MirrorDesign,
  style: PresentStyle,
  layerOf: LayerOf,
): readonly PageLine[] {
  // Equal layers are one object: the laws work each out once.
  const high = layerOf(mirror.high, mirror.highThickness_m);
  const low = layerOf(mirror.low, mirror.lowThickness_m);
  return [
    pageLine(''),
    pageLine(mirrorText(report, mirror, style), 'heading'),
    ...tableLines(mirrorTable(mirror, style), style, (pairs) => [
      ...Array.from({ length: pairs }, () => [...high, ...low]).flat(),
      ...(mirror.extraHigh ? high : []),
    ]),
    pageLine(neededText(mirror, style)),
  ];
}

function tableLines<Design>(
  { title, heads, rows }: DesignTable<Design>,
  style: PresentStyle,
  layersOf: (design: Design) => readonly Layer[],
): readonly PageLine[] {
  const cells = rows.map((row) => row.cells);
  const [head = '', ...lines] = columns(heads, cells, { ascii: style.ascii, indent: 0, gap: 1 });
  return [
    ...(title === '' ? [] : [pageLine(title, 'heading')]),
    laidOut(head, 'aside'),
    ...lines.map((text, i): PageLine => {
      const row = rows[i];
      return row ? { ...laidOut(text), layers: layersOf(row.design) } : laidOut(text);
    }),
  ];
}
