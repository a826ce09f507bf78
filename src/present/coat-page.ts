/** Designs of coatings as sentences and tables, for every face that shows them as text. */
import type {
  CoatingReport,
  MirrorDesign,
  SingleFilmCoating,
  TwoLayerDesign,
  TwoLayerSolution,
} from '../answer/coating-shape.ts';
import { formatNumber } from '../units/format-number.ts';
import { bandCell, indexCell, lengthCell, lengthPrefix, percentCell, rangeCell } from './coat-rows.ts';
import type { PresentStyle } from './shown.ts';

export interface TableHead {
  readonly title: string;
  /** Compared from its end, as numbers are. */
  readonly right?: true;
}

export interface DesignTable<Design> {
  readonly title: string;
  readonly heads: readonly TableHead[];
  readonly rows: readonly { readonly design: Design; readonly cells: readonly string[] }[];
}

/** What a text has room for; the data forms hold all. */
const SHOWN_PAIRS = 5;

const number = (title: string): TableHead => ({ title, right: true });
const unitOf = (report: CoatingReport): string => `${lengthPrefix(report).shown}m`;
const bandHead = (report: CoatingReport, style: PresentStyle): TableHead =>
  number(`R<${percentCell(report.limit, style)}, ${unitOf(report)}`);

export function bareText({ bare }: CoatingReport, style: PresentStyle): string {
  return `Bare surface: R ${percentCell(bare.R, style)} %`;
}

export function idealText(report: CoatingReport, style: PresentStyle): string {
  const { ideal } = report;
  if (!ideal) return 'The substrate absorbs or reflects totally: no ideal film, no V-coat.';
  if (ideal.n === null || ideal.thickness_m === null)
    return 'No film index removes the reflection at this angle.';
  const n = formatNumber(ideal.n, { decimals: 4 }, style);
  const d = lengthCell(ideal.thickness_m, lengthPrefix(report), style);
  return `Ideal single film: index ${n}, ${d} ${unitOf(report)} thick, leaves R ${percentCell(ideal.R, style)} %`;
}

/** Null where no film reaches the wave. */
export function singleFilmTable(
  report: CoatingReport,
  style: PresentStyle,
): DesignTable<SingleFilmCoating> | null {
  if (report.singleFilms.length === 0) return null;
  const prefix = lengthPrefix(report);
  return {
    title: 'One film, a quarter wave (spread: of its index by the process)',
    heads: [
      { title: 'film' },
      number('n'),
      number(unitOf(report)),
      number('R %'),
      number('R over spread'),
      bandHead(report, style),
    ],
    rows: report.singleFilms.map((f) => ({
      design: f,
      cells: [
        f.film.key,
        indexCell(f, style),
        lengthCell(f.thickness_m, prefix, style),
        percentCell(f.R, style),
        rangeCell(f, style),
        bandCell(f.band, prefix, style),
      ],
    })),
  };
}

export interface TwoLayerChoice {
  readonly pair: TwoLayerDesign;
  readonly solution: TwoLayerSolution;
}

/** The broadest pairs, a row for each solution; null where there is none. */
export function pairTable(report: CoatingReport, style: PresentStyle): DesignTable<TwoLayerChoice> | null {
  if (report.twoLayers.length === 0) return null;
  const prefix = lengthPrefix(report);
  return {
    title: 'Two layers, outer on inner: both solutions, broadest pairs first',
    heads: [
      { title: 'films' },
      number(`outer ${unitOf(report)}`),
      number(`inner ${unitOf(report)}`),
      number('R %'),
      number('up to'),
      bandHead(report, style),
    ],
    rows: report.twoLayers.slice(0, SHOWN_PAIRS).flatMap((pair) =>
      pair.solutions.map((solution, i) => ({
        design: { pair, solution },
        cells: [
          i === 0 ? `${pair.outer.key} on` : `  ${pair.inner.key}`,
          lengthCell(solution.outerThickness_m, prefix, style),
          lengthCell(solution.innerThickness_m, prefix, style),
          percentCell(solution.R, style),
          solution.R_high === null ? '-' : percentCell(solution.R_high, style),
          bandCell(solution.band, prefix, style),
        ],
      })),
    ),
  };
}

/** Why there is no pair, where there might have been one; '' where there is nothing to say. */
export function noPairText({ twoLayers, ideal, singleFilms }: CoatingReport): string {
  return twoLayers.length === 0 && ideal && singleFilms.length > 1
    ? 'No two of these films remove the reflection together.'
    : '';
}

export function mirrorText(report: CoatingReport, mirror: MirrorDesign, style: PresentStyle): string {
  const prefix = lengthPrefix(report);
  const thick = (x: number): string => `${lengthCell(x, prefix, style)} ${unitOf(report)}`;
  const { stopBand } = mirror;
  const stop = stopBand
    ? `; stop band ${thick(stopBand.from_m)} to ${thick(stopBand.to_m)}`
    : '; no stop band for p at this angle';
  return `High reflector: H ${mirror.high.key} ${thick(mirror.highThickness_m)}, L ${mirror.low.key} ${thick(mirror.lowThickness_m)}, (HL)^N${mirror.extraHigh ? ' H' : ''} from outside in${stop}`;
}

export function mirrorTable(mirror: MirrorDesign, style: PresentStyle): DesignTable<number> {
  return {
    title: '',
    heads: [number('pairs'), number('layers'), number('R %'), number('with the spread of both films')],
    rows: mirror.rows.map((r) => ({
      design: r.pairs,
      cells: [String(r.pairs), String(r.layers), percentCell(r.R, style), rangeCell(r, style)],
    })),
  };
}

export function neededText({ wanted, pairsNeeded, extraHigh }: MirrorDesign, style: PresentStyle): string {
  const R = `R ${percentCell(wanted, style)} %`;
  if (!pairsNeeded) return `${R} is not reached: these films absorb too much, or differ too little.`;
  const layers = `${pairsNeeded.layers} layers${extraHigh ? ', the last H included' : ''}`;
  return `${R} needs ${pairsNeeded.pairs} pairs (${layers}): R ${percentCell(pairsNeeded.R, style)} %.`;
}
