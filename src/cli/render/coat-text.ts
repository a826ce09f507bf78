/** Coatings as text for people, within 72 columns: single films, V-coats, a high reflector, what was left out, cautions. */
import type { CoatingReport } from '../../answer/coating-shape.ts';
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
import { shellCommandLines } from '../../record/shell-quote.ts';
import { columns } from '../../term/columns.ts';
import { PAGE_WIDTH, page, paragraph } from './page.ts';
import { cautionSection } from './text.ts';

/** The operands as typed, for the lines to try next. */
export interface TypedOperands {
  readonly from: string;
  readonly into: string;
  readonly wave: string;
}

export function coatText(report: CoatingReport, typed: TypedOperands, style: PresentStyle): string {
  return page(
    [
      ...paragraph(coatHeadline(report, style)),
      ...paragraph(bareText(report, style)),
      '',
      ...paragraph(idealText(report, style)),
      '',
      ...singleSection(report, style),
      ...pairSection(report, style),
      ...mirrorSection(report, style),
      ...(hasOpenBand(report) ? ['', ...paragraph(DATA_END_NOTE)] : []),
      ...trySection(report, typed),
      ...skippedSection(report),
      ...cautionSection(report.cautions),
    ],
    style.ascii,
  );
}

function singleSection(report: CoatingReport, style: PresentStyle): readonly string[] {
  const table = singleFilmTable(report, style);
  if (!table) return paragraph('No film reaches this wave: name materials with --films.');
  return [table.title, ...tableLines(table, style)];
}

function pairSection(report: CoatingReport, style: PresentStyle): readonly string[] {
  const table = pairTable(report, style);
  if (table) return ['', table.title, ...tableLines(table, style)];
  const none = noPairText(report);
  return none === '' ? [] : ['', ...paragraph(none)];
}

const tableLines = (
  { heads, rows }: Pick<DesignTable<unknown>, 'heads' | 'rows'>,
  style: PresentStyle,
): readonly string[] =>
  columns(
    heads,
    rows.map((row) => row.cells),
    { ascii: style.ascii, indent: 0, gap: 1 },
  );

function mirrorSection(report: CoatingReport, style: PresentStyle): readonly string[] {
  const { mirror } = report;
  if (!mirror) return [];
  const { heads, rows } = mirrorTable(mirror, style);
  return [
    '',
    ...paragraph(mirrorText(report, mirror, style)),
    ...columns(
      heads,
      rows.map((row) => row.cells),
      { ascii: style.ascii },
    ),
    ...paragraph(neededText(mirror, style)),
  ];
}

/** Lines that ask for the designs as paths. */
function trySection(
  { singleFilms, mirror, geometry }: CoatingReport,
  typed: TypedOperands,
): readonly string[] {
  const [best] = singleFilms;
  if (!best && !mirror?.pairsNeeded) return [];
  const { from, into, wave } = typed;
  const angle =
    geometry.incidenceAngle_rad === 0
      ? []
      : ['--angle', `${Number(((geometry.incidenceAngle_rad * 180) / Math.PI).toPrecision(10))}`];
  const pol = geometry.polarization === 'unpolarized' ? [] : ['--pol', geometry.polarization];
  const lines = (layers: readonly string[]): readonly string[] =>
    shellCommandLines(['halfspace', from, ...layers, into, wave, ...angle, ...pol], PAGE_WIDTH - 2).map(
      (l) => `  ${l}`,
    );
  const needed = mirror?.pairsNeeded;
  return [
    '',
    'To look closer',
    ...(best ? lines([`${best.film.key}@qw`]) : []),
    ...(mirror && needed
      ? lines([
          `${needed.pairs}x:`,
          `${mirror.high.key}@qw`,
          `${mirror.low.key}@qw`,
          ':',
          ...(mirror.extraHigh ? [`${mirror.high.key}@qw`] : []),
        ])
      : []),
  ];
}

function skippedSection({ skipped }: CoatingReport): readonly string[] {
  if (skipped.length === 0) return [];
  return ['', 'Left out', ...skipped.flatMap((s) => paragraph(`${s.key}: ${s.reason}`, 2))];
}
