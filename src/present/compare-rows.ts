/** The comparison as rows of shown texts, one cell a part, the best value of a row marked with a star. */
import type { MediumAnswer } from '../answer/answer.ts';
import { isRefusal } from '../medium/refusal.ts';
import { bestOf, type Direction } from '../selection/best-values.ts';
import type { ComparedPart, ComparedWave, CompareReport, PartAtWave } from '../selection/compare-report.ts';
import { DEGREE, METRE, PER_CENT } from '../units/display-unit.ts';
import { formatNumber } from '../units/format-number.ts';
import { formatQuantity } from '../units/format-quantity.ts';
import { ASCII, NO_VALUE, type NumberStyle } from '../units/number-style.ts';
import { abbeText } from './abbe-text.ts';
import { howKnown, precisionFor } from './known.ts';
import { indexText } from './medium-rows.ts';

export interface CompareRow {
  readonly symbol: string;
  readonly label: string;
  /** In the order of the parts. */
  readonly cells: readonly string[];
}

interface Quantity<Column> {
  readonly symbol: string;
  readonly label: string;
  readonly text: (column: Column, style: NumberStyle) => string;
  /** What is compared, where one value is better than another. */
  readonly rank?: readonly [(column: Column) => number | null, Direction];
}

const starred = (text: string, best: boolean): string => (best ? `${text} *` : text);

/** Of one wave; a part without data has a dash everywhere. */
export function waveRows({ columns }: ComparedWave, style: NumberStyle): readonly CompareRow[] {
  const facesDiffer = columns.some((c) => !isRefusal(c) && c.backReflectance !== c.surfaceReflectance);
  return WAVE_QUANTITIES.filter((quantity) => facesDiffer || quantity !== BACK_SURFACE)
    .map(({ symbol, label, text, rank }) => {
      const best = rank
        ? bestOf(
            columns.map((c) => (isRefusal(c) ? null : rank[0](c))),
            rank[1],
          )
        : [];
      const cells = columns.map((c, i) =>
        isRefusal(c) ? NO_VALUE : starred(text(c, style), best[i] === true),
      );
      return { symbol, label, cells };
    })
    .filter(({ cells }) => cells.some((cell) => cell !== NO_VALUE));
}

/** What does not depend on the wave. */
export function factRows({ parts }: CompareReport, style: NumberStyle): readonly CompareRow[] {
  return FACT_QUANTITIES.map(({ symbol, label, text, rank }) => {
    const best = rank ? bestOf(parts.map(rank[0]), rank[1]) : [];
    return { symbol, label, cells: parts.map((p, i) => starred(text(p, style), best[i] === true)) };
  }).filter(({ cells }) => cells.some((cell) => cell !== NO_VALUE));
}

const share = (medium: MediumAnswer): number => howKnown(medium).uncertainty / Math.abs(medium.n || 1);

/** R of a bare surface moves with n: dR = 4 (n - 1)/(n + 1)^3 dn; that of a coated one with its films. */
const surfaceDigits = (R: number, { medium }: PartAtWave, ofFilms: number | null) => {
  const spread = (4 * Math.abs(medium.n - 1) * howKnown(medium).uncertainty) / (medium.n + 1) ** 3;
  return precisionFor(R, ofFilms ?? spread, 4);
};

const percent = (
  value: number | null,
  digits: Parameters<typeof formatNumber>[1],
  style: NumberStyle,
): string => formatQuantity(value, PER_CENT, digits, { style });

/** 1 - T of a plate to the place where its surfaces are known, at most four digits. */
const LOSS_DIGITS = { significant: 4 } as const;

/** Shown where it differs from the front. */
const BACK_SURFACE: Quantity<PartAtWave> = {
  symbol: 'R',
  label: 'back surface',
  text: (column, style) => {
    const { backReflectance: R, backR_uncertainty: u } = column;
    return percent(R, surfaceDigits(R, column, u), style);
  },
};

const WAVE_QUANTITIES: readonly Quantity<PartAtWave>[] = [
  { symbol: 'n', label: 'index', text: ({ medium }, style) => indexText(medium, howKnown(medium), style) },
  {
    symbol: 'k',
    label: 'extinction',
    text: ({ medium: { k } }) => (k > 0 ? formatNumber(k, { significant: 3 }, ASCII) : NO_VALUE),
  },
  {
    symbol: 'n_g',
    label: 'group index',
    text: ({ medium }, style) =>
      formatNumber(
        medium.groupIndex,
        precisionFor(medium.groupIndex, howKnown(medium).uncertainty * 10, 6),
        style,
      ),
  },
  {
    symbol: 'GVD',
    label: 'fs²/mm',
    text: ({ medium: { gvd_s2_per_m: gvd } }) =>
      formatNumber(gvd === null ? null : gvd * 1e27, { significant: 3 }, ASCII),
  },
  {
    symbol: 'λ',
    label: 'inside',
    text: ({ medium }, style) => {
      const λ = medium.wavelength_m;
      return formatQuantity(λ, METRE, precisionFor(λ, Math.abs(λ ?? 0) * share(medium), 6), { style });
    },
  },
  {
    symbol: 'R',
    label: 'one surface',
    text: (column, style) =>
      percent(
        column.surfaceReflectance,
        surfaceDigits(column.surfaceReflectance, column, column.R_uncertainty),
        style,
      ),
    rank: [({ surfaceReflectance }) => surfaceReflectance, 'least'],
  },
  BACK_SURFACE,
  {
    symbol: 'τ',
    label: 'internal',
    text: ({ internalTransmittance }, style) => percent(internalTransmittance, LOSS_DIGITS, style),
    rank: [({ internalTransmittance }) => internalTransmittance, 'most'],
  },
  {
    symbol: 'loss',
    label: 'of the part',
    text: ({ loss, surfacesOnly, R_uncertainty, backR_uncertainty }, style) => {
      const spread = Math.hypot(R_uncertainty ?? 0, backR_uncertainty ?? 0);
      const digits = spread === 0 ? LOSS_DIGITS : precisionFor(loss, spread, 4);
      return percent(loss, digits, style) + (surfacesOnly ? ' +' : '');
    },
    rank: [({ loss }) => loss, 'least'],
  },
  {
    symbol: 'Brewster',
    label: '',
    text: ({ brewsterAngle_rad: a }, style) =>
      formatQuantity(a === null ? null : (a * 180) / Math.PI, DEGREE, { decimals: 2 }, { style }),
  },
  {
    symbol: 'dn/dT',
    label: '1e-6 /K',
    text: ({ dn_dT_per_K: slope }) =>
      formatNumber(slope === null ? null : slope * 1e6, { significant: 3 }, ASCII),
    rank: [({ dn_dT_per_K }) => (dn_dT_per_K === null ? null : Math.abs(dn_dT_per_K)), 'least'],
  },
];

const DRYNESS: Readonly<Record<string, number>> = { no: 0, slightly: 1, yes: 2 };

const FACT_QUANTITIES: readonly Quantity<ComparedPart>[] = [
  {
    symbol: 'clear',
    label: 'µm, on file',
    text: ({ facts }, style) => {
      const ends = facts?.transparency_m?.map((x) => formatNumber(tidy(x * 1e6), 'shortest', style));
      return ends ? ends.join(' to ') : NO_VALUE;
    },
  },
  {
    symbol: 'V_d',
    label: 'Abbe number',
    text: ({ abbe }, style) => abbeText(abbe?.Vd ?? null, abbe?.V_digitsGuide ?? null, style).trimEnd(),
  },
  {
    symbol: 'V_e',
    label: 'Abbe number',
    text: ({ abbe }, style) => abbeText(abbe?.Ve ?? null, abbe?.V_digitsGuide ?? null, style).trimEnd(),
  },
  {
    symbol: 'Knoop',
    label: 'hardness',
    text: ({ facts }, style) => formatNumber(facts?.knoop ?? null, 'shortest', style),
    rank: [({ facts }) => facts?.knoop ?? null, 'most'],
  },
  {
    symbol: '',
    label: 'hygroscopic',
    text: ({ facts }) => facts?.hygroscopic ?? NO_VALUE,
    rank: [({ facts }) => DRYNESS[facts?.hygroscopic ?? ''] ?? null, 'least'],
  },
  {
    symbol: '',
    label: 'hazard',
    text: ({ facts }) => (facts ? HAZARD_WORDS[facts.hazardLevel] : NO_VALUE),
  },
];

const HAZARD_WORDS = { 'none-on-file': 'none on file', hazardous: 'see below', toxic: 'TOXIC' } as const;

const tidy = (x: number): number => Number(x.toPrecision(6));
