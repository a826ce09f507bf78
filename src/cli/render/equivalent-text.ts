/** Glasses that may stand in for one, as a table: n_d, V_d and how far n is off there and at further lines, in units of 1e-5. */
import type { Material } from '../../catalog/types.ts';
import {
  compare,
  type Equivalent,
  FURTHER_LINES,
  type GlassPlace,
  MELT_n_d,
  MELT_Vd,
} from '../../selection/glass-equivalents.ts';
import { type Column, columns } from '../../term/columns.ts';
import { displayWidth } from '../../term/display-width.ts';
import { formatNumber } from '../../units/format-number.ts';
import { NO_VALUE, type NumberStyle } from '../../units/number-style.ts';
import type { SoughtGlass } from '../find-glass.ts';
import { PAGE_WIDTH, page, paragraph } from './page.ts';

export interface EquivalentPage {
  readonly sought: SoughtGlass;
  /** Those that bear the code sought. */
  readonly carriers: readonly Equivalent[];
  readonly others: readonly Equivalent[];
  /** Which glasses `others` were taken from: "other makers", "SCHOTT AG". */
  readonly from: string;
}

export function equivalentText(
  { sought, carriers, others, from }: EquivalentPage,
  style: NumberStyle,
): string {
  const { place } = sought;
  const table = (list: readonly Equivalent[]): readonly string[] => {
    const rows = list.map((one) => rowOf(one, place, style));
    const drawn = (gap: number) => columns(heads(place), rows, { ascii: style.ascii, indent: 0, gap });
    const wide = drawn(2);
    return wide.every((line) => displayWidth(line) <= PAGE_WIDTH) ? wide : drawn(1);
  };
  const all = [...carriers, ...others];
  return page(
    [
      ...title(sought, carriers.length, style),
      ...(carriers.length === 0 ? [] : ['', ...table(carriers)]),
      '',
      ...paragraph(
        others.length === 0 ? `No glass of ${from} is as near as asked.` : `Nearest glasses of ${from}`,
      ),
      ...(others.length === 0 ? [] : table(others)),
      ...(all.length === 0 ? [] : ['', ...legend(all, place, style)]),
    ],
    style.ascii,
  );
}

function title(sought: SoughtGlass, carriers: number, style: NumberStyle): readonly string[] {
  const { n_d, Vd, further } = sought.place;
  if (sought.kind === 'code') {
    const bear =
      carriers === 1 ? 'one glass of the catalogue bears it' : `${carriers} glasses of the catalogue bear it`;
    return paragraph(
      `Code ${sought.code}: n_d ${formatNumber(n_d, { decimals: 3 }, style)}, V_d ${formatNumber(Vd, { decimals: 1 }, style)}; ${carriers === 0 ? 'no glass of the catalogue bears it' : bear}`,
    );
  }
  const { material } = sought;
  const lines = FURTHER_LINES.flatMap(({ label }, i) => {
    const n = further[i] ?? null;
    return n === null ? [] : [`n ${formatNumber(n, { decimals: 5 }, style)} at ${label}`];
  });
  return [
    ...paragraph(`${material.name}${material.maker === undefined ? '' : `, ${material.maker}`}`),
    ...paragraph(
      [
        `n_d ${formatNumber(n_d, { decimals: 5 }, style)}`,
        `V_d ${formatNumber(Vd, { decimals: 2 }, style)}`,
        ...lines,
      ].join(', '),
      2,
      0,
    ),
  ];
}

/** Columns of further lines only where the glass sought has an index there. */
const furtherShown = (place: GlassPlace): readonly number[] =>
  FURTHER_LINES.flatMap((_, i) => ((place.further[i] ?? null) === null ? [] : [i]));

function heads(place: GlassPlace): readonly Column[] {
  return [
    { title: '  glass' },
    { title: 'maker' },
    { title: 'code' },
    { title: 'n_d', right: true },
    { title: 'V_d', right: true },
    { title: 'Δn_d', right: true },
    { title: 'ΔV_d', right: true },
    ...furtherShown(place).map((i) => ({ title: `Δn ${SHORT[i] ?? ''}`, right: true as const })),
  ];
}

const SHORT = ['g', 't', '1.53'];

function rowOf(
  { material, place, difference, withinMelt }: Equivalent,
  sought: GlassPlace,
  style: NumberStyle,
): readonly string[] {
  return [
    `${withinMelt ? '*' : ' '} ${material.key}`,
    shortMaker(material),
    material.glassCode ?? NO_VALUE,
    formatNumber(place.n_d, { decimals: 5 }, style),
    formatNumber(place.Vd, { decimals: 2 }, style),
    fifths(difference.n_d, style),
    signedDecimals(difference.Vd, 2, style),
    ...furtherShown(sought).map((i) => fifths(difference.further[i] ?? null, style)),
  ];
}

const shortMaker = ({ maker }: Material): string => maker?.split(' ')[0] ?? NO_VALUE;

/** In units of 1e-5, the last place that makers print. */
const fifths = (difference: number | null, style: NumberStyle): string =>
  difference === null ? NO_VALUE : signedDecimals(difference * 1e5, 0, style);

function signedDecimals(x: number, decimals: number, style: NumberStyle): string {
  const text = formatNumber(Math.abs(x), { decimals }, style);
  if (/^[0.]+$/.test(text)) return text;
  return `${x < 0 ? '-' : '+'}${text}`;
}

function legend(all: readonly Equivalent[], place: GlassPlace, style: NumberStyle): readonly string[] {
  const melt = `${formatNumber(MELT_n_d, 'shortest', style)} in n_d and ${formatNumber(MELT_Vd * 100, 'shortest', style)} % in V_d`;
  const lines = furtherShown(place).length === 0 ? '' : ' (g 435.8 nm, t 1014 nm, 1529.6 nm)';
  return [
    ...paragraph(
      `Indices relative to air; differences of n in 1e-5${lines}, of this glass less the one sought.${all.some((e) => e.withinMelt) ? ` * within ${melt}, the usual tolerance of a melt.` : ` None is within ${melt}, the usual tolerance of a melt.`}`,
      0,
      0,
    ),
    ...paragraph(
      'Not compared: transmittance, dn/dT, expansion, chemistry, price. halfspace material KEY tells them.',
      0,
      0,
    ),
  ];
}

/** The glasses that bear a code, compared with what it stands for. */
export function carriersOf(
  carriers: readonly { readonly material: Material; readonly place: GlassPlace }[],
  sought: GlassPlace,
): readonly Equivalent[] {
  return carriers
    .map(({ material, place }) => compare(material, place, sought))
    .sort((a, b) => a.distance - b.distance);
}
