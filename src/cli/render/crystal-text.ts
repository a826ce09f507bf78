/** A crystal as text for people, within 72 columns: principal axes, directions, faces, cut, plates, cautions, sources. */
import type { CrystalReport } from '../../answer/crystal-report.ts';
import { crystalRows } from '../../present/crystal-rows.ts';
import {
  axesTable,
  type CrystalTable,
  crystalHeadline,
  directionTable,
  faceTable,
  opticAxesText,
  plateSections,
} from '../../present/crystal-tables.ts';
import type { PresentStyle, Shown } from '../../present/shown.ts';
import { fitLine } from '../../present/source-lines.ts';
import { columns } from '../../term/columns.ts';
import { page, paragraph } from './page.ts';
import { cautionSection } from './text.ts';

const LABEL = 40;

export function crystalText(report: CrystalReport, style: PresentStyle): string {
  const opticAxes = opticAxesText(report, style);
  return page(
    [
      ...paragraph(crystalHeadline(report, style)),
      '',
      ...tableLines(axesTable(report, style), style),
      ...(opticAxes === '' ? [] : ['', ...paragraph(opticAxes, 2)]),
      ...titledTable(directionTable(report, style), style),
      ...titledTable(faceTable(report, style), style),
      ...section('Cut', crystalRows(report.cut, style)),
      ...plateSections(report, style).flatMap(({ title, facts, waveplates }) => [
        ...section(title, facts),
        ...(waveplates ? tableLines(waveplates, style) : []),
      ]),
      ...cautionSection(report.cautions),
      ...sources(report, style),
    ],
    style.ascii,
  );
}

const tableLines = ({ heads, rows }: CrystalTable, style: PresentStyle): readonly string[] =>
  columns(heads, rows, { ascii: style.ascii });

const titledTable = (table: CrystalTable | null, style: PresentStyle): readonly string[] =>
  table ? ['', table.title, ...tableLines(table, style)] : [];

function section(title: string, rows: readonly Shown[]): readonly string[] {
  if (rows.length === 0) return [];
  return ['', title, ...rows.map((r) => `  ${r.label.padEnd(LABEL)} ${r.text}`)];
}

function sources({ axes }: CrystalReport, style: PresentStyle): readonly string[] {
  const lines = unique(axes.flatMap((a) => fitLine(a, style)));
  return lines.length === 0 ? [] : ['', 'Sources', ...lines.flatMap((line) => paragraph(line))];
}

const unique = (lines: readonly string[]): readonly string[] => [...new Set(lines)];
