/** A fit to measured points for people: coefficients with their uncertainties, how well they hold, doubts, residuals. */
import type { FittedCoefficient, FittedPoint, PointFit } from '../../catalog/fit-points.ts';
import type { Reference } from '../../catalog/types.ts';
import { lengthColumn, lengthRange } from '../../present/length-text.ts';
import { modelWords } from '../../present/model-words.ts';
import type { GlyphLevel } from '../../term/ability.ts';
import { type Column, columns } from '../../term/columns.ts';
import { formatNumber } from '../../units/format-number.ts';
import { formatUncertain } from '../../units/format-uncertain.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { signed } from './checked-number.ts';
import { fitWarningTexts } from './fit-warning.ts';
import { labelled, page, paragraph } from './page.ts';
import { residualChart } from './residual-chart.ts';

export interface FitFacts {
  readonly reference: Reference;
  /** False where nobody said so. */
  readonly referenceStated: boolean;
  readonly temperature_C: number | undefined;
}

export interface FitPage {
  readonly fit: PointFit;
  readonly facts: FitFacts;
  /** What becomes of the entry: where it was written, or how to have it written. */
  readonly entryLine: string;
  /** Undefined: no chart, as for screen readers. */
  readonly chart: GlyphLevel | undefined;
}

export function fitText({ fit, facts, entryLine, chart }: FitPage, style: NumberStyle): string {
  const plot = chart === undefined ? [] : residualChart(fit.points, chart);
  return page(
    [
      ...paragraph(
        `${modelWords(fit.parameters)}, fitted to ${fit.points.length} points, ${lengthRange(fit.range_um, style)}`,
      ),
      ...paragraph(conditions(facts, style), 2),
      '',
      formula(fit, style),
      ...coefficients(fit.coefficients, style),
      '',
      'Quality',
      ...quality(fit, style),
      ...(fit.warnings.length === 0
        ? []
        : ['', 'Doubts', ...fitWarningTexts(fit.warnings, style).flatMap((w) => paragraph(`!  ${w}`, 0, 3))]),
      ...(plot.length === 0 ? [] : ['', ...plot]),
      '',
      ...residuals(fit.points, style),
      '',
      ...paragraph(entryLine),
    ],
    style.ascii,
  );
}

function conditions({ reference, referenceStated, temperature_C }: FitFacts, style: NumberStyle): string {
  const where = reference === 'air' ? 'relative to air' : 'in vacuum';
  return [
    `index and wavelength ${where}${referenceStated ? '' : ' (assumed; --reference says otherwise)'}`,
    temperature_C === undefined
      ? 'temperature not stated'
      : `${formatNumber(Number(temperature_C.toFixed(6)), 'shortest', style)} °C`,
  ].join('; ');
}

function formula({ parameters }: PointFit, { ascii }: NumberStyle): string {
  if (parameters.model === 'cauchy')
    return ascii
      ? 'n = c0 + c1/lambda^2 + c2/lambda^4 ..., lambda in um'
      : 'n = c0 + c1/λ² + c2/λ⁴ ..., λ in µm';
  return ascii
    ? 'n^2 = 1 + sum of B lambda^2/(lambda^2 - C^2), lambda in um'
    : 'n² = 1 + sum of B λ²/(λ² - C²), λ in µm';
}

const COEFFICIENT_HEADS: readonly Column[] = [
  { title: 'coefficient' },
  { title: 'value', right: true },
  { title: 'unit' },
  { title: 'to copy', right: true },
];

function coefficients(list: readonly FittedCoefficient[], style: NumberStyle): readonly string[] {
  const rows = list.map(({ name, value, uncertainty }) => {
    const [symbol = name, unit = ''] = name.split('_');
    return [
      symbol,
      roundedText(value, uncertainty, style),
      unitText(unit),
      String(Number(value.toPrecision(12))),
    ];
  });
  return [
    ...columns(COEFFICIENT_HEADS, rows, { ascii: style.ascii }),
    ...paragraph(
      list.some((c) => c.uncertainty !== undefined)
        ? 'in parentheses the standard uncertainty of the last digits; coefficients hang together, so compute with those of the last column'
        : 'compute with the last column: the terms cancel',
      2,
      0,
    ),
  ];
}

/** A value that its uncertainty exceeds keeps two digits, so that it can be seen. */
function roundedText(value: number, uncertainty: number | undefined, style: NumberStyle): string {
  if (uncertainty === undefined || uncertainty < Math.abs(value))
    return formatUncertain(value, uncertainty ?? null, { significant: 6 }, style);
  const two = (x: number): string => formatNumber(x, { significant: 2 }, style);
  return `${two(value)} ± ${two(uncertainty)}`;
}

/** `um4` as `µm⁴`. */
const unitText = (unit: string): string =>
  unit.replace('um', 'µm').replace(/\d/g, (figure) => '⁰¹²³⁴⁵⁶⁷⁸⁹'[Number(figure)] ?? figure);

function quality(fit: PointFit, style: NumberStyle): readonly string[] {
  const two = (x: number): string => formatNumber(x, { significant: 2 }, style);
  const { deviation_n, reducedChiSquared, freedom } = fit;
  return [
    ...labelled('rms residual', two(fit.rms_n), 24),
    ...labelled('largest residual', two(fit.largest_n), 24),
    ...labelled('degrees of freedom', String(freedom), 24),
    ...labelled(
      'deviation',
      deviation_n === undefined ? undefined : `${two(deviation_n)} (standard deviation of a point)`,
      24,
    ),
    ...labelled(
      'chi² by freedom',
      reducedChiSquared === undefined ? undefined : `${two(reducedChiSquared)}${chiWords(reducedChiSquared)}`,
      24,
    ),
  ];
}

function chiWords(reduced: number): string {
  if (reduced > 3) return ' (the points scatter more than they state: more terms, or larger uncertainties)';
  return reduced < 0.3 ? ' (the points scatter less than they state)' : '';
}

const RESIDUAL_HEADS: readonly Column[] = [
  { title: 'wavelength', right: true },
  { title: 'n', right: true },
  { title: 'fitted', right: true },
  { title: 'residual', right: true },
];

function residuals(points: readonly FittedPoint[], style: NumberStyle): readonly string[] {
  const at = lengthColumn(
    points.map((p) => p.wavelength_um),
    style,
  );
  const weighted = points.every((p) => p.uncertainty_n !== undefined);
  const smallest = Math.min(...points.map((p) => Math.abs(p.residual_n)).filter((r) => r > 0), 1e-3);
  const decimals = Math.min(9, Math.max(4, 1 - Math.floor(Math.log10(smallest))));
  const rows = points.map((p, i) => [
    at[i] ?? '',
    formatNumber(p.n, 'shortest', style),
    formatNumber(p.fitted_n, { decimals }, style),
    signed(p.residual_n, { ascii: true }),
    ...(weighted ? [formatNumber(p.residual_n / (p.uncertainty_n ?? 1), { decimals: 1 }, style)] : []),
  ]);
  const heads = weighted ? [...RESIDUAL_HEADS, { title: 'by its u', right: true as const }] : RESIDUAL_HEADS;
  return ['Points', ...columns(heads, rows, { ascii: style.ascii })];
}
