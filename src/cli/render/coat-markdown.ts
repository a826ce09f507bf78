/** Coatings as Markdown: a heading, one table for each kind of design, cautions as a list. */
import type { CoatingReport } from '../../answer/coating-shape.ts';
import { coatHeadline } from '../../present/coat-headline.ts';
import { bareText, type DesignTable, mirrorTable, singleFilmTable } from '../../present/coat-page.ts';
import {
  bandCell,
  DATA_END_NOTE,
  hasOpenBand,
  lengthCell,
  lengthPrefix,
  percentCell,
  rangeCell,
} from '../../present/coat-rows.ts';
import type { PresentStyle } from '../../present/shown.ts';
import { formatNumber } from '../../units/format-number.ts';
import { toAscii } from '../../units/to-ascii.ts';
import { markdownCell, markdownTable } from './markdown-table.ts';

export function coatMarkdown(report: CoatingReport, style: PresentStyle): string {
  const prefix = lengthPrefix(report);
  const unit = `${prefix.shown}m`;
  const { ideal, twoLayers, mirror, limit, cautions } = report;
  const below = `R < ${percentCell(limit, style)} % (${unit})`;
  const idealText =
    ideal?.n != null && ideal.thickness_m !== null
      ? [
          `Ideal single film: n ${formatNumber(ideal.n, { decimals: 4 }, style)}, ${lengthCell(ideal.thickness_m, prefix, style)} ${unit}, R ${percentCell(ideal.R, style)} %`,
          '',
        ]
      : [];
  const lines = [
    `### ${markdownCell(coatHeadline(report, style))}`,
    '',
    bareText(report, style),
    '',
    ...idealText,
    ...markdownTable(
      ['film', 'n', `quarter wave (${unit})`, 'R (%)', 'R over the spread (%)', below],
      cellsOf(singleFilmTable(report, style)),
    ),
    ...markdownTable(
      ['outer', 'inner', `outer (${unit})`, `inner (${unit})`, 'R (%)', 'R over the spread (%)', below],
      twoLayers.flatMap((d) =>
        d.solutions.map((s) => [
          d.outer.key,
          d.inner.key,
          lengthCell(s.outerThickness_m, prefix, style),
          lengthCell(s.innerThickness_m, prefix, style),
          percentCell(s.R, style),
          rangeCell(s, style),
          bandCell(s.band, prefix, style),
        ]),
      ),
    ),
    ...(mirror
      ? [
          `High reflector: H ${mirror.high.key} ${lengthCell(mirror.highThickness_m, prefix, style)} ${unit}, L ${mirror.low.key} ${lengthCell(mirror.lowThickness_m, prefix, style)} ${unit}`,
          '',
          ...markdownTable(
            ['pairs', 'layers', 'R (%)', 'R over the spread (%)'],
            cellsOf(mirrorTable(mirror, style)),
          ),
        ]
      : []),
    ...(hasOpenBand(report) ? [DATA_END_NOTE.replace('*', '\\*'), ''] : []),
    ...cautions.map((c) => `- **${c.level}** ${c.text}`),
  ];
  return `${(style.ascii ? lines.map(toAscii) : lines).join('\n').trimEnd()}\n`;
}

const cellsOf = (designs: DesignTable<unknown> | null): readonly (readonly string[])[] =>
  designs?.rows.map((row) => row.cells) ?? [];
