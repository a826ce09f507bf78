/** The self-test for people: how many values agree, the worst of each grade, failures; with `full` every value by its source. */
import { type CheckedValue, passes } from '../../catalog/check-values.ts';
import type { Grade } from '../../catalog/types.ts';
import { toleranceUsed, type VerifyReport } from '../../catalog/verify.ts';
import { lengthAt, lengthColumn } from '../../present/length-text.ts';
import { GRADE_WORDS } from '../../present/source-lines.ts';
import { type Column, columns } from '../../term/columns.ts';
import { formatNumber } from '../../units/format-number.ts';
import { ASCII, type NumberStyle } from '../../units/number-style.ts';
import { checkedTexts } from './checked-number.ts';
import { page, paragraph } from './page.ts';
import { quantitySymbol } from './quantity-symbol.ts';

export interface VerifyHead {
  readonly catalogueVersion: string;
  readonly catalogueDate: string;
  readonly catalogueHash: string;
  readonly seconds: number;
}

const GRADES: readonly Grade[] = ['A', 'B', 'C'];

export function verifyText(
  report: VerifyReport,
  head: VerifyHead,
  full: boolean,
  style: NumberStyle,
): string {
  const { tested, passed, setAside, materials, fits, failures } = report;
  const verdict =
    failures.length === 0
      ? `All ${tested} published values agree within their tolerances.`
      : `${passed} of ${tested} published values agree; ${failures.length} do NOT:`;
  return page(
    [
      `Catalogue ${head.catalogueVersion} of ${head.catalogueDate}, ${head.catalogueHash}`,
      ...paragraph(
        `${fits} fits of ${materials} materials recomputed on this machine in ${formatNumber(head.seconds, { significant: 2 }, style)} s`,
      ),
      '',
      verdict,
      ...failures.flatMap((value) => valueLines(value, style)),
      ...paragraph(
        `${setAside} further values document a limit of a fit; they are recomputed, not judged.`,
        0,
        0,
      ),
      '',
      'Closest to its tolerance, by grade',
      ...GRADES.flatMap((grade) => gradeLines(report, grade, style)),
      ...(full
        ? ['', ...everyValue(report.values, style)]
        : ['', 'halfspace verify --full lists every value with its source.']),
    ],
    style.ascii,
  );
}

function gradeLines(report: VerifyReport, grade: Grade, style: NumberStyle): readonly string[] {
  const { tested, worst } = report.grades[grade];
  const title = paragraph(`${grade}  ${tested} values; ${GRADE_WORDS[grade]}`, 2, 3);
  return worst ? [...title, ...valueLines(worst, style, 5)] : title;
}

/** One value in words, for the few that deserve them. */
function valueLines(value: CheckedValue, style: NumberStyle, indent = 2): readonly string[] {
  const texts = checkedTexts(value, style);
  const share = toleranceUsed(value);
  const used = Number.isFinite(share) ? `, ${Math.round(share * 100)} % of it used` : '';
  return [
    ...paragraph(
      `${subject(value)}${value.wavelength_um === undefined ? '' : ` at ${lengthAt(value.wavelength_um, style)}`}: ${quantitySymbol(value.quantity)} ${texts.published} published, ${texts.computed} computed; tolerance ${texts.tolerance}${used}`,
      indent,
    ),
    ...paragraph(`source: ${value.source}`, indent + 2),
  ];
}

const subject = ({ key, axis, fit }: CheckedValue): string =>
  `${key}${axis === 'isotropic' ? '' : `, ${axis}`}, ${fit}`;

const HEADS: readonly Column[] = [
  { title: 'wavelength', right: true },
  { title: 'quantity' },
  { title: 'published', right: true },
  { title: 'computed', right: true },
  { title: 'off by', right: true },
  { title: 'allowed', right: true },
];

/** Values under the fit and the source that they belong to, in the order of the catalogue. */
function everyValue(values: readonly CheckedValue[], style: NumberStyle): readonly string[] {
  const groups: { readonly title: string; readonly values: CheckedValue[] }[] = [];
  for (const value of values) {
    const title = `${subject(value)} [grade ${value.grade}]\n${value.source}${value.recalled ? ' (recalled)' : ''}${value.setAside === undefined ? '' : `; not judged: ${value.setAside}`}`;
    const last = groups.at(-1);
    if (last?.title === title) last.values.push(value);
    else groups.push({ title, values: [value] });
  }
  return groups.flatMap(({ title, values: rows }) => {
    const [fit = '', source = ''] = title.split('\n');
    return [
      ...paragraph(fit),
      ...paragraph(source, 2),
      ...columns(HEADS, rowsOf(rows, style), { ascii: style.ascii }),
      '',
    ];
  });
}

function rowsOf(values: readonly CheckedValue[], style: NumberStyle): readonly (readonly string[])[] {
  const wavelengths = values.map((v) => v.wavelength_um ?? Number.NaN);
  const at = lengthColumn(wavelengths, style);
  return values.map((value, i) => {
    // Short powers of ten: six columns have to fit.
    const { published, computed, difference, tolerance } = checkedTexts(value, ASCII);
    const judged = value.tolerance === undefined ? '-' : `${tolerance}${passes(value) ? '' : ' FAILS'}`;
    return [at[i] ?? '', quantitySymbol(value.quantity), published, computed, difference, judged];
  });
}
