/** The sheet of a material as Markdown: the same rows as the text, in tables. */
import { reflectanceTables } from '../../catalog/cited-sources.ts';
import { sourceText } from '../../cite/source-text.ts';
import { absorptionCoverage, absorptionTexts } from '../../present/absorption-rows.ts';
import { fitRows, fitTitle } from '../../present/fit-rows.ts';
import { bandGapText, handlingRows } from '../../present/handling-rows.ts';
import { lengthColumn, lengthRange } from '../../present/length-text.ts';
import { lineRow } from '../../present/line-rows.ts';
import { formatNumber } from '../../units/format-number.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { toAscii } from '../../units/to-ascii.ts';
import { coefficientRows } from './coefficients.ts';
import { fitsOf, type MaterialSheet } from './material-sheet.ts';

type Row = readonly string[];

export function materialMarkdown(sheet: MaterialSheet, style: NumberStyle): string {
  const { material, lines, sourceOf, full } = sheet;
  const pairs = (rows: readonly { readonly label: string; readonly text: string }[]): readonly Row[] =>
    rows.map(({ label, text }) => [label, text]);
  const stated = (label: string, text: string | undefined): readonly Row[] =>
    text === undefined || text === '' ? [] : [[label, text]];
  const blocks = [
    [`### ${cell(material.name)}`],
    table(
      ['', ''],
      [
        ['key', `\`${material.key}\``],
        ...stated('formula', material.formula),
        ...stated('also called', material.aliases.join(', ')),
        ['class', material.class],
        ...stated('maker', material.maker),
        ...stated('glass code', material.glassCode),
        ...stated('transparent', material.transparency_um && lengthRange(material.transparency_um, style)),
        ...stated('absorption', absorptionCoverage(material, style)),
        ...stated('band gap', bandGapText(material, style)),
        ...pairs(handlingRows(material, style)),
        ...stated('source of these', material.factsSource),
        ...stated('note', material.note),
      ],
    ),
    lines.length === 0
      ? []
      : table(
          ['axis', 'wavelength', 'n (vacuum)', 'n as published (air)', 'k', 'other fit'],
          lines.map((line) => {
            const row = lineRow(line, style);
            return [line.axis, row.wave, row.n, row.published, row.k, row.other];
          }),
        ),
    ...fitsOf(sheet).map((fit) => [
      `#### ${cell(`Fit ${fitTitle(fit)}`)}`,
      '',
      ...table(
        ['', ''],
        [...pairs(fitRows(fit, material, sourceOf, style)), ...(full ? coefficientRows(fit.parameters) : [])],
      ),
    ]),
    full && material.absorption
      ? table(
          ['wavelength', 'absorption', 'source', 'note'],
          absorptionTexts(material, style).map((a) => [a.wavelength, a.value, a.source, a.note ?? '']),
        )
      : [],
    ...reflectanceTables(material).map((one) => {
      const at = lengthColumn(one.wavelength_um, style);
      const source = sourceOf(one.source);
      return [
        ...table(
          ['wavelength', `R (${one.quantity})`],
          at.map((w, i) => [w, `${formatNumber((one.R[i] ?? Number.NaN) * 100, { decimals: 1 }, style)} %`]),
        ),
        '',
        `Source: ${source ? sourceText(source) : one.source}. ${one.note ?? ''}`.trim(),
      ];
    }),
  ];
  const text = blocks
    .filter((block) => block.length > 0)
    .map((block) => block.map((line) => (style.ascii ? toAscii(line) : line)).join('\n'))
    .join('\n\n');
  return `${text}\n`;
}

const table = (heads: Row, rows: readonly Row[]): readonly string[] => [
  line(heads),
  line(heads.map(() => '---')),
  ...rows.map(line),
];

const line = (cells: Row): string => `| ${cells.map(cell).join(' | ')} |`;
const cell = (text: string): string => text.replaceAll('|', '\\|');
