/** Coatings as text for people, within 72 columns: single films, V-coats, a high reflector, what was left out, cautions. */
import type { CoatingReport, MirrorDesign } from '../../answer/coating-shape.ts';
import { coatHeadline } from '../../present/coat-headline.ts';
import {
  bandCell,
  DATA_END_NOTE,
  hasOpenBand,
  indexCell,
  lengthCell,
  lengthPrefix,
  percentCell,
  rangeCell,
} from '../../present/coat-rows.ts';
import type { PresentStyle } from '../../present/shown.ts';
import { shellCommandLines } from '../../record/shell-quote.ts';
import { formatNumber } from '../../units/format-number.ts';
import { columns } from './columns.ts';
import { PAGE_WIDTH, page, paragraph } from './page.ts';
import { cautionSection } from './text.ts';

/** The operands as typed, for the lines to try next. */
export interface TypedOperands {
  readonly from: string;
  readonly into: string;
  readonly wave: string;
}

/** Designs shown; the other forms hold them all. */
const SHOWN_PAIRS = 5;

export function coatText(report: CoatingReport, typed: TypedOperands, style: PresentStyle): string {
  return page(
    [
      ...paragraph(coatHeadline(report, style)),
      ...paragraph(`Bare surface: R ${percentCell(report.bare.R, style)} %`),
      '',
      ...idealSection(report, style),
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

function idealSection(report: CoatingReport, style: PresentStyle): readonly string[] {
  const { ideal } = report;
  if (!ideal)
    return [...paragraph('The substrate absorbs or reflects totally: no ideal film, no V-coat.'), ''];
  if (ideal.n === null || ideal.thickness_m === null) {
    return [...paragraph('No film index removes the reflection at this angle.'), ''];
  }
  const prefix = lengthPrefix(report);
  const n = formatNumber(ideal.n, { decimals: 4 }, style);
  const d = lengthCell(ideal.thickness_m, prefix, style);
  return [
    ...paragraph(
      `Ideal single film: index ${n}, ${d} ${prefix.shown}m thick, leaves R ${percentCell(ideal.R, style)} %`,
    ),
    '',
  ];
}

function singleSection(report: CoatingReport, style: PresentStyle): readonly string[] {
  const { singleFilms, limit } = report;
  if (singleFilms.length === 0) return paragraph('No film reaches this wave: name materials with --films.');
  const prefix = lengthPrefix(report);
  const unit = `${prefix.shown}m`;
  return [
    'One film, a quarter wave (spread: of its index by the process)',
    ...columns(
      [
        { title: 'film' },
        { title: 'n', right: true },
        { title: unit, right: true },
        { title: 'R %', right: true },
        { title: 'R over spread', right: true },
        { title: `R<${percentCell(limit, style)}, ${unit}`, right: true },
      ],
      singleFilms.map((f) => [
        f.film.key,
        indexCell(f, style),
        lengthCell(f.thickness_m, prefix, style),
        percentCell(f.R, style),
        rangeCell(f, style),
        bandCell(f.band, prefix, style),
      ]),
      { ascii: style.ascii, indent: 0, gap: 1 },
    ),
  ];
}

function pairSection(report: CoatingReport, style: PresentStyle): readonly string[] {
  const { twoLayers, singleFilms, ideal, limit } = report;
  if (twoLayers.length === 0) {
    return ideal && singleFilms.length > 1
      ? ['', ...paragraph('No two of these films remove the reflection together.')]
      : [];
  }
  const prefix = lengthPrefix(report);
  const unit = `${prefix.shown}m`;
  const shown = twoLayers.slice(0, SHOWN_PAIRS);
  const rows = shown.flatMap((d) =>
    d.solutions.map((s, i) => [
      i === 0 ? `${d.outer.key} on` : `  ${d.inner.key}`,
      lengthCell(s.outerThickness_m, prefix, style),
      lengthCell(s.innerThickness_m, prefix, style),
      percentCell(s.R, style),
      s.R_high === null ? '-' : percentCell(s.R_high, style),
      bandCell(s.band, prefix, style),
    ]),
  );
  return [
    '',
    'Two layers, outer on inner: both solutions, broadest pairs first',
    ...columns(
      [
        { title: 'films' },
        { title: `outer ${unit}`, right: true },
        { title: `inner ${unit}`, right: true },
        { title: 'R %', right: true },
        { title: 'up to', right: true },
        { title: `R<${percentCell(limit, style)}, ${unit}`, right: true },
      ],
      rows,
      { ascii: style.ascii, indent: 0, gap: 1 },
    ),
  ];
}

function mirrorSection(report: CoatingReport, style: PresentStyle): readonly string[] {
  const { mirror } = report;
  if (!mirror) return [];
  const prefix = lengthPrefix(report);
  const unit = `${prefix.shown}m`;
  const thick = (x: number): string => `${lengthCell(x, prefix, style)} ${unit}`;
  const { stopBand } = mirror;
  const stop = stopBand
    ? `; stop band ${lengthCell(stopBand.from_m, prefix, style)} ${unit} to ${lengthCell(stopBand.to_m, prefix, style)} ${unit}`
    : '; no stop band for p at this angle';
  return [
    '',
    ...paragraph(
      `High reflector: H ${mirror.high.key} ${thick(mirror.highThickness_m)}, L ${mirror.low.key} ${thick(mirror.lowThickness_m)}, (HL)^N${mirror.extraHigh ? ' H' : ''} from outside in${stop}`,
    ),
    ...columns(
      [
        { title: 'pairs', right: true },
        { title: 'layers', right: true },
        { title: 'R %', right: true },
        { title: 'with the spread of both films', right: true },
      ],
      mirror.rows.map((r) => [
        String(r.pairs),
        String(r.layers),
        percentCell(r.R, style),
        rangeCell(r, style),
      ]),
      { ascii: style.ascii },
    ),
    ...paragraph(neededText(mirror, style)),
  ];
}

function neededText({ wanted, pairsNeeded, extraHigh }: MirrorDesign, style: PresentStyle): string {
  const R = `R ${percentCell(wanted, style)} %`;
  if (!pairsNeeded) return `${R} is not reached: these films absorb too much, or differ too little.`;
  const layers = `${pairsNeeded.layers} layers${extraHigh ? ', the last H included' : ''}`;
  return `${R} needs ${pairsNeeded.pairs} pairs (${layers}): R ${percentCell(pairsNeeded.R, style)} %.`;
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
