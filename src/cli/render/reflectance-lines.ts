/** Measured reflectance of real samples, wavelength and R in per cent, read down the columns. */
import type { ReflectanceTable } from '../../catalog/cited-sources.ts';
import type { Source } from '../../catalog/types.ts';
import { sourceText } from '../../cite/source-text.ts';
import { lengthColumn } from '../../present/length-text.ts';
import { columns } from '../../term/columns.ts';
import { formatNumber } from '../../units/format-number.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { labelled, paragraph } from './page.ts';

const SIDE_BY_SIDE = 3;

export function reflectanceLines(
  table: ReflectanceTable,
  source: Source | undefined,
  style: NumberStyle,
): readonly string[] {
  const at = lengthColumn(table.wavelength_um, style);
  const cells = at.map((wavelength, i) => [
    wavelength,
    `${formatNumber((table.R[i] ?? Number.NaN) * 100, { decimals: 1 }, style)} %`,
  ]);
  const height = Math.ceil(cells.length / SIDE_BY_SIDE);
  const rows = Array.from({ length: height }, (_, row) =>
    Array.from({ length: SIDE_BY_SIDE }, (__, column) => cells[column * height + row] ?? ['', '']).flat(),
  );
  const heads = Array.from({ length: SIDE_BY_SIDE }, () => [
    { title: 'wavelength', right: true as const },
    { title: 'R', right: true as const },
  ]).flat();
  const temperature =
    table.temperature_C === undefined ? '' : `, ${formatNumber(table.temperature_C, 'shortest', style)} °C`;
  return [
    ...paragraph(`Reflectance of real samples: ${table.quantity}${temperature}`),
    ...columns(heads, rows, { ascii: style.ascii, gap: 3 }),
    ...labelled('source', source ? sourceText(source) : table.source),
    ...labelled('note', table.note),
  ];
}
