/** A crystal as Markdown: a heading, a table for each part, cautions and sources as lists. */
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
import { toAscii } from '../../units/to-ascii.ts';
import { markdownCell, markdownTable } from './markdown-table.ts';

export function crystalMarkdown(report: CrystalReport, style: PresentStyle): string {
  const opticAxes = opticAxesText(report, style);
  const sources = new Set(report.axes.flatMap((a) => fitLine(a, style)));
  const lines = [
    `### ${markdownCell(crystalHeadline(report, style))}`,
    '',
    ...tableLines(axesTable(report, style)),
    ...(opticAxes === '' ? [] : [opticAxes, '']),
    ...tableLines(directionTable(report, style)),
    ...tableLines(faceTable(report, style)),
    ...factLines('Cut', crystalRows(report.cut, style)),
    ...plateSections(report, style).flatMap(({ title, facts, waveplates }) => [
      ...factLines(title, facts),
      ...tableLines(waveplates),
    ]),
    ...report.cautions.map((c) => `- **${c.level}** ${c.text}`),
    ...(report.cautions.length > 0 && sources.size > 0 ? [''] : []),
    ...[...sources].map((source) => `- ${source.trim()}`),
  ];
  return `${(style.ascii ? lines.map(toAscii) : lines).join('\n').trimEnd()}\n`;
}

function tableLines(table: CrystalTable | null): readonly string[] {
  if (!table) return [];
  const { title, heads, rows } = table;
  return [
    ...(title === '' ? [] : [markdownCell(title), '']),
    ...markdownTable(
      heads.map((h) => h.title),
      rows,
    ),
  ];
}

const factLines = (title: string, facts: readonly Shown[]): readonly string[] =>
  markdownTable(
    [title, ''],
    facts.map(({ label, text }) => [label, text]),
  );
