/** The index of a material at reference lines as a table an axis, with what the columns mean. */
import type { ReferenceLine } from '../../answer/reference-lines.ts';
import { type LineRow, lineRow } from '../../present/line-rows.ts';
import { columns } from '../../term/columns.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { paragraph } from './page.ts';

export function indexTable(lines: readonly ReferenceLine[], style: NumberStyle): readonly string[] {
  const axes = [...new Set(lines.map((line) => line.axis))];
  const rows = lines.map((line) => ({ axis: line.axis, ...lineRow(line, style) }));
  if (rows.length === 0) return [];
  const parts = (['published', 'k', 'other'] as const).filter((part) => rows.some((row) => row[part] !== ''));
  const heads = [
    { title: 'wave', right: true as const },
    { title: 'n', right: true as const },
    ...parts.map((part) => ({ title: TITLES[part], right: true as const })),
  ];
  return [
    ...axes.flatMap((axis, i) => [
      ...(i === 0 ? [] : ['']),
      `Index${axis === 'isotropic' ? '' : `, ${axis} axis`}`,
      ...columns(
        heads,
        rows
          .filter((row) => row.axis === axis)
          .map((row) => [row.wave, row.n, ...parts.map((part) => row[part])]),
        { ascii: style.ascii },
      ),
    ]),
    ...legend(rows),
  ];
}

const TITLES = { published: 'as published', k: 'k', other: 'other fit' };

function legend(rows: readonly LineRow[]): readonly string[] {
  const any = (holds: (row: LineRow) => boolean): boolean => rows.some(holds);
  const letters = any((row) => /^[A-Za-z]/.test(row.wave));
  const lengths = any((row) => /^\d.*m$/.test(row.wave));
  const parts = [
    'n is relative to vacuum',
    ...(any((row) => row.published !== '') ? ['as published relative to air'] : []),
    ...(any((row) => row.n.includes('('))
      ? ['in parentheses the standard uncertainty of the last digits']
      : []),
    ...(any((row) => row.other !== '') ? ['other fit: n of a second fit less this one'] : []),
    ...(letters ? ['wavelengths with a letter are in air, the others in vacuum'] : []),
    ...(!letters && lengths ? ['wavelengths in vacuum'] : []),
  ];
  return paragraph(parts.join('; '), 2, 0);
}
