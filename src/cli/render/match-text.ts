/** Media ranked by how little they reflect beside a target, and mixtures that would match it, for people. */
import type { Axis } from '../../catalog/types.ts';
import { howKnown } from '../../present/known.ts';
import { mediumKey } from '../../present/medium-key.ts';
import { indexText } from '../../present/medium-rows.ts';
import { mediumTitle } from '../../present/question-line.ts';
import { conditionsText } from '../../present/source-lines.ts';
import { conditionWords, waveWords } from '../../selection/condition-words.ts';
import type { Criteria } from '../../selection/criteria.ts';
import type { Match, MatchReport } from '../../selection/match-report.ts';
import { MISCIBILITY_BASIS } from '../../selection/miscibility.ts';
import type { MixtureReport } from '../../selection/mixture-report.ts';
import { UNDECIDED_WORDS } from '../../selection/undecided.ts';
import { type Column, columns } from '../../term/columns.ts';
import { CELSIUS } from '../../units/display-unit.ts';
import { formatNumber } from '../../units/format-number.ts';
import { withUnit } from '../../units/format-quantity.ts';
import { formatUncertain } from '../../units/format-uncertain.ts';
import { ASCII, NO_VALUE, type NumberStyle } from '../../units/number-style.ts';
import { legendOf, marksOf } from './material-marks.ts';
import { page, paragraph } from './page.ts';

export function matchText(report: MatchReport, criteria: Criteria, style: NumberStyle): string {
  const { target, wave, matches, mixtures } = report;
  const asked = conditionWords(criteria, style);
  const known = howKnown(target.medium);
  const conditions = conditionsText(target.medium, style);
  const heading = [
    `Media beside ${mediumTitle(target.medium)}, n ${indexText(target.medium, known, style)}`,
    ...(conditions === '' ? [] : [conditions]),
    `at ${waveWords(wave.spec, style)}`,
    ...asked,
  ].join(', ');
  return page(
    [
      ...paragraph(heading),
      '',
      ...(matches.length === 0 ? [nothing(report)] : table(matches, style)),
      '',
      ...paragraph(counted(report)),
      ...(matches.length === 0 ? [] : notes(report)),
      ...(mixtures ? ['', ...mixtureLines(mixtures, style)] : []),
    ],
    style.ascii,
  );
}

function nothing({ within }: MatchReport): string {
  return within === null
    ? 'No medium of the catalogue meets this.'
    : `No medium of the catalogue is within ${within} of it.`;
}

/** Columns of a terminal; a wider table moves closer together. */
const WIDEST = 80;

const COLUMNS: readonly Column[] = [
  { title: 'medium' },
  { title: 'n' },
  { title: 'n - target' },
  { title: 'R', right: true },
  { title: 'dB', right: true },
  { title: 'alike at', right: true },
  { title: '' },
];

function table(matches: readonly Match[], style: NumberStyle): readonly string[] {
  const rows = matches.map((match) => [
    mediumKey(match.facts.key, match.medium.axis as Axis),
    indexText(match.medium, howKnown(match.medium), style),
    differenceText(match),
    ...reflectanceTexts(match),
    temperatureText(match, style),
    marksOf(match.facts, match.medium, match.warming)
      .map((mark) => mark.letter)
      .join(''),
  ]);
  const lines = columns(COLUMNS, rows, { ascii: style.ascii, indent: 0 });
  const fits = lines.every((line) => [...line].length <= WIDEST);
  return fits ? lines : columns(COLUMNS, rows, { ascii: style.ascii, indent: 0, gap: 1 });
}

/** Powers of ten in ASCII: a raised figure may be two columns wide in some terminals, and more columns follow. */
function differenceText({ difference, difference_uncertainty: u }: Match): string {
  const size = formatUncertain(Math.abs(difference), u, { significant: 3 }, ASCII);
  // Rounded away, a difference has no sign.
  const sign = /^[0.]+(\(|$)/.test(size) ? ' ' : difference < 0 ? '-' : '+';
  return sign + size;
}

function reflectanceTexts({ R, R_upTo, resolved, returnLoss_dB }: Match): readonly [string, string] {
  const shown = resolved ? R : R_upTo;
  const dB = resolved ? returnLoss_dB : R_upTo > 0 ? -10 * Math.log10(R_upTo) : null;
  const mark = (sign: string): string => (resolved ? '' : sign);
  return [
    `${mark('<')}${shown.toExponential(1)}`,
    dB === null ? NO_VALUE : `${mark('>')}${formatNumber(dB, { decimals: 1 }, ASCII)}`,
  ];
}

function temperatureText({ thermal }: Match, style: NumberStyle): string {
  if (!thermal) return `${NO_VALUE} `;
  const celsius = formatNumber(thermal.temperature_K - 273.15, { decimals: 0 }, style);
  const u = Math.round(thermal.uncertainty_K);
  const text = withUnit(u < 2 ? celsius : `${celsius}(${u})`, CELSIUS.symbol, style);
  return `${text}${thermal.bothSlopesKnown ? ' ' : '*'}`;
}

function counted(report: MatchReport): string {
  const { matches, ranked, examined, undecided } = report;
  const left = undecided.map(
    ({ reason, count }) => `${count} of ${examined} media left out: ${UNDECIDED_WORDS[reason]}`,
  );
  return [`${matches.length} of ${ranked} ranked by R`, ...left].join('; ') + '.';
}

function notes(report: MatchReport): readonly string[] {
  const { matches } = report;
  const marks = matches.flatMap((match) => marksOf(match.facts, match.medium, match.warming));
  const thermal = matches.some((m) => m.thermal);
  const assumed = matches.some((m) => m.thermal && !m.thermal.bothSlopesKnown);
  return [
    ...paragraph(
      'R: reflectance of the interface at normal incidence, target to medium; dB: return loss. < and > where the difference is smaller than its uncertainty.',
    ),
    ...(thermal
      ? paragraph(
          `alike at: temperature of both at which the indices meet, by dn/dT near room temperature: first order${assumed ? '; * dn/dT of one of the two is not on file and counts as 0' : ''}.`,
        )
      : []),
    ...paragraph(`Marks: ${legendOf(marks)}.`),
  ];
}

function mixtureLines(report: MixtureReport, style: NumberStyle): readonly string[] {
  if (report.outOfReach) return paragraph('The target absorbs: no clear mixture matches it.');
  const { mixtures, possible, notKnownToMix } = report;
  const left =
    notKnownToMix === 0
      ? ''
      : ` ${notKnownToMix} further pairs bracket the index but part, or nothing is known of their mixing.`;
  if (mixtures.length === 0)
    return paragraph(`No two liquids that are known to mix bracket the index.${left}`);
  const percent = (share: number): string => `${formatNumber(share * 100, { decimals: 1 }, ASCII)} %`;
  const rows = mixtures.map(({ low, high, dn_perPercent }) => [
    high.facts.key,
    percent(high.share),
    low.facts.key,
    percent(low.share),
    formatNumber(dn_perPercent, { significant: 2 }, ASCII),
    [...new Set([high, low].flatMap((c) => marksOf(c.facts, null)).map((m) => m.letter))].join(''),
  ]);
  const heads: readonly Column[] = [
    { title: 'mixture of' },
    { title: '', right: true },
    { title: 'and' },
    { title: '', right: true },
    { title: 'dn per 1 %', right: true },
    { title: '' },
  ];
  const marks = mixtures.flatMap(({ low, high }) => [low, high].flatMap((c) => marksOf(c.facts, null)));
  return [
    ...columns(heads, rows, { ascii: style.ascii, indent: 0 }),
    '',
    ...paragraph(
      `Estimate: shares by volume before mixing, rule of Lorentz and Lorenz; it may miss n by several 1e-3, so adjust while measuring. Whether the two mix is ${MISCIBILITY_BASIS}: try a little first, mind heat and vapour. ${mixtures.length} of ${possible} mixtures, the least touchy first.${left}`,
    ),
    ...paragraph(`Marks: ${legendOf(marks)}.`),
  ];
}
