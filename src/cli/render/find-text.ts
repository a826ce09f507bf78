/** The hits of a search as a table for people, with what was left out and why, within 80 columns where the names allow it. */

import { abbeText } from '../../present/abbe-text.ts';
import { howKnown, precisionFor } from '../../present/known.ts';
import { mediumKey } from '../../present/medium-key.ts';
import { indexText } from '../../present/medium-rows.ts';
import { conditionWords, waveWords } from '../../selection/condition-words.ts';
import type { Criteria } from '../../selection/criteria.ts';
import type { FindReport, Hit } from '../../selection/find-report.ts';
import type { SortOrder } from '../../selection/sort-order.ts';
import { UNDECIDED_WORDS } from '../../selection/undecided.ts';
import { type Column, columns } from '../../term/columns.ts';
import { formatNumber } from '../../units/format-number.ts';
import { NO_VALUE, type NumberStyle } from '../../units/number-style.ts';
import { legendOf, marksOf } from './material-marks.ts';
import { page, paragraph } from './page.ts';

interface HitColumn extends Column {
  readonly cell: (hit: Hit, style: NumberStyle) => string;
  /** A line under the table that says what the column holds. */
  readonly note?: string;
}

/** A range of so many wavelengths is that of vacuum. */
const EVERYWHERE = 1e9;

/** Widest table whose columns are all shown; a wider one goes without those that were not asked for. */
const WIDEST = 80;

export function findText(report: FindReport, order: SortOrder, style: NumberStyle): string {
  const { hits, examined, criteria, wave } = report;
  const asked = conditionWords(criteria, style);
  const heading = [...asked, ...(wave ? [`at ${waveWords(wave.spec, style)}`] : [])].join(', ');
  const shown = fitting(columnsFor(criteria, order, hits), hits, style);
  const marks = hits.flatMap((hit) => marksOf(hit.facts, hit.medium, hit.warming));
  const notes = shown.flatMap(({ note }) => (note === undefined ? [] : [note]));
  const table = columns(
    shown,
    hits.map((hit) => shown.map(({ cell }) => cell(hit, style))),
    { ascii: style.ascii, indent: 0 },
  );
  const lines = [
    ...paragraph(heading === '' ? 'All media' : heading),
    '',
    ...(hits.length === 0 ? ['Nothing in the catalogue is known to meet this.'] : table),
    '',
    ...paragraph(`${hits.length} of ${examined} media. ${leftOut(report)}`.trim()),
    ...(hits.length === 0 && criteria.words.length > 0 ? paragraph(WORDS_NOTE) : []),
    ...(hits.length === 0 || notes.length === 0 ? [] : paragraph(`${notes.join('; ')}.`)),
    ...(hits.length === 0 ? [] : paragraph(`Marks: ${legendOf(marks)}.`)),
  ];
  return page(lines, style.ascii);
}

const WORDS_NOTE =
  'Words are looked for in keys, names, aliases, formulas and classes; conditions have keywords, such as n 1.4..1.5 at 633nm or dn 0.1.. (see halfspace find --help).';

function leftOut({ undecided }: FindReport): string {
  if (undecided.length === 0) return '';
  const parts = undecided.map(({ reason, count }) => `${count} with ${UNDECIDED_WORDS[reason]}`);
  return `Left out because the catalogue cannot tell: ${parts.join(', ')}.`;
}

const text = (value: number | null, digits: Parameters<typeof formatNumber>[1], style: NumberStyle): string =>
  formatNumber(value, digits, style);

const MEDIUM: HitColumn = {
  title: 'medium',
  cell: ({ facts, axis, medium }) => (medium ? mediumKey(facts.key, axis) : facts.key),
};
const INDEX: HitColumn = {
  title: 'n',
  cell: ({ medium }, style) => (medium ? indexText(medium, howKnown(medium), style) : NO_VALUE),
  note: 'n: relative to vacuum, standard uncertainty in parentheses',
};
const GROUP_INDEX: HitColumn = {
  title: 'n_g',
  cell: ({ medium }, style) => {
    if (!medium) return NO_VALUE;
    const slope = precisionFor(medium.groupIndex, howKnown(medium).uncertainty * 10, 6);
    return text(medium.groupIndex, slope, style);
  },
  note: 'n_g: group index, in the reference of the source',
};
const GVD: HitColumn = {
  title: 'GVD',
  right: true,
  cell: ({ medium }, style) =>
    text(medium?.gvd_s2_per_m == null ? null : medium.gvd_s2_per_m * 1e27, { significant: 3 }, style),
  note: 'GVD in fs²/mm',
};
const BIREFRINGENCE: HitColumn = {
  title: 'dn',
  right: true,
  cell: ({ birefringence }, style) => text(birefringence, { decimals: 4 }, style),
  note: 'dn: n_e - n_o, or n_z - n_x',
};
const INDEX_D: HitColumn = {
  title: 'n_d',
  cell: ({ n_d, n_digitsGuide }, style) => text(n_d, precisionFor(n_d, n_digitsGuide ?? 0, 6), style),
  note: 'n_d: relative to air',
};
const ABBE: HitColumn = {
  title: 'V_d',
  right: true,
  cell: ({ Vd, V_digitsGuide }, style) => abbeText(Vd, V_digitsGuide, style),
};
const LOSS_OF_SURFACE = 'loss: reflectance of one bare surface in air, normal incidence';
const lossColumn = ({ thickness_m }: Criteria): HitColumn => ({
  title: 'loss, %',
  right: true,
  cell: ({ loss, absorptionKnown }, style) => {
    const mark = thickness_m !== undefined && absorptionKnown === false ? '+' : ' ';
    return loss === null ? `${NO_VALUE} ` : `${text(loss * 100, { decimals: 2 }, style)}${mark}`;
  },
  note:
    thickness_m === undefined
      ? LOSS_OF_SURFACE
      : 'loss: both bare surfaces of a plate in air and the absorption between them; + means surfaces alone, the absorption at this wave not being on file',
});
const HARDNESS: HitColumn = {
  title: 'Knoop',
  right: true,
  cell: ({ facts }, style) => text(facts.knoop, 'shortest', style),
};
const DENSITY: HitColumn = {
  title: 'g/cm3',
  right: true,
  cell: ({ facts }, style) =>
    text(facts.density_kg_per_m3 === null ? null : facts.density_kg_per_m3 / 1000, { significant: 3 }, style),
};
const CLASS: HitColumn = { title: 'class', cell: ({ facts }) => facts.class };
const CLEAR: HitColumn = {
  title: 'clear, µm',
  cell: ({ facts }, style) => {
    if (!facts.transparency_m) return NO_VALUE;
    if (facts.transparency_m[1] > EVERYWHERE * facts.transparency_m[0]) return 'all waves';
    const [lo, hi] = facts.transparency_m.map((x) =>
      text(Number((x * 1e6).toPrecision(6)), 'shortest', style),
    );
    return `${lo} to ${hi}`;
  },
};
const MARKS: HitColumn = {
  title: '',
  cell: ({ facts, medium, warming }) =>
    marksOf(facts, medium, warming)
      .map((mark) => mark.letter)
      .join(''),
};

/** What was asked for, then what every buyer looks at. */
function columnsFor(criteria: Criteria, order: SortOrder, hits: readonly Hit[]): readonly HitColumn[] {
  const { ranges, wave, maxLoss, clear_m, classes } = criteria;
  const is = (...keys: readonly string[]): boolean => keys.includes(order.key);
  return [
    MEDIUM,
    ...(wave ? [INDEX] : []),
    ...(maxLoss !== undefined || (wave && is('loss')) ? [lossColumn(criteria)] : []),
    ...(ranges.groupIndex || (wave && is('group-index')) ? [GROUP_INDEX] : []),
    ...(ranges.gvd_s2_per_m || (wave && is('gvd')) ? [GVD] : []),
    ...(ranges.birefringence || (wave && is('birefringence')) ? [BIREFRINGENCE] : []),
    ...(ranges.abbe || is('abbe') ? [...(wave ? [] : [INDEX_D]), ABBE] : []),
    ...(is('hardness') ? [HARDNESS] : []),
    ...(is('density') ? [DENSITY] : []),
    ...(clear_m ? [CLEAR] : [OPTIONAL_CLEAR]),
    ...(new Set(hits.map((h) => h.facts.class)).size > 1 && classes.length !== 1 ? [OPTIONAL_CLASS] : []),
    MARKS,
  ];
}

const OPTIONAL_CLEAR: HitColumn = { ...CLEAR };
const OPTIONAL_CLASS: HitColumn = { ...CLASS };

function fitting(
  wanted: readonly HitColumn[],
  hits: readonly Hit[],
  style: NumberStyle,
): readonly HitColumn[] {
  const widthOf = (list: readonly HitColumn[]): number =>
    columns(
      list,
      hits.map((hit) => list.map(({ cell }) => cell(hit, style))),
      { ascii: style.ascii, indent: 0 },
    ).reduce((most, line) => Math.max(most, [...line].length), 0);
  return [OPTIONAL_CLASS, OPTIONAL_CLEAR].reduce(
    (list, column) => (widthOf(list) > WIDEST ? list.filter((c) => c !== column) : list),
    wanted,
  );
}
