/** A crystal as a headline and tables, for every face that shows them as text. */
import type { MediumAnswer } from '../answer/answer.ts';
import type { CrystalReport, PrincipalPlate } from '../answer/crystal-report.ts';
import { FS2_PER_MM, METRE, PER_CENT } from '../units/display-unit.ts';
import { formatNumber } from '../units/format-number.ts';
import { columnPrefix, formatQuantity } from '../units/format-quantity.ts';
import type { TableHead } from './coat-page.ts';
import { birefringenceText, plateDigits, retardanceName, wavesText } from './crystal-rows.ts';
import { degreesText } from './interface-rows.ts';
import { howKnown, precisionFor } from './known.ts';
import { indexText } from './medium-rows.ts';
import { wavelengthOf } from './question-line.ts';
import type { PresentStyle, Shown } from './shown.ts';
import { conditionsText } from './source-lines.ts';

export interface CrystalTable {
  readonly title: string;
  readonly heads: readonly TableHead[];
  readonly rows: readonly (readonly string[])[];
}

export interface PlateSection {
  readonly title: string;
  readonly facts: readonly Shown[];
  readonly waveplates: CrystalTable | null;
}

const FOUR = { significant: 4 } as const;

export function crystalHeadline(
  { name, kind, wave, incidenceAngle_rad, from }: CrystalReport,
  style: PresentStyle,
): string {
  const angle =
    incidenceAngle_rad === 0
      ? 'normal incidence'
      : `${degreesText(Number(incidenceAngle_rad.toPrecision(12)), 2, style)} from the normal`;
  return `${name}, ${kind} crystal, ${wavelengthOf(wave, style)}, ${angle}, from ${from.name}`;
}

export function axesTable({ axes, normalReflectances }: CrystalReport, style: PresentStyle): CrystalTable {
  const heads: readonly TableHead[] = [
    { title: '' },
    ...axes.map((a): TableHead => ({ title: a.axis, right: true })),
  ];
  const line = (label: string, of: (a: MediumAnswer, i: number) => string): readonly string[] => [
    label,
    ...axes.map(of),
  ];
  const digits = (a: MediumAnswer, value: number | null) => {
    const known = howKnown(a);
    return precisionFor(value, known.uncertainty * 10, 7);
  };
  const rows = [
    line('refractive index n', (a) => indexText(a, howKnown(a), style)),
    ...(axes.some((a) => a.k > 1e-6)
      ? [line('extinction coefficient k', (a) => formatNumber(a.k, FOUR, style))]
      : []),
    line('group index n_g', (a) =>
      formatNumber(a.absolute.groupIndex, digits(a, a.absolute.groupIndex), style),
    ),
    line('GVD', (a) => formatQuantity(a.absolute.gvd_s2_per_m, FS2_PER_MM, { significant: 3 }, { style })),
    line('R at normal incidence', (_, i) =>
      formatQuantity(normalReflectances[i] ?? null, PER_CENT, FOUR, { style }),
    ),
    line('at', (a) => conditionsText(a, style) || '-'),
  ];
  return { title: '', heads, rows };
}

/** Empty for uniaxial crystals. */
export function opticAxesText({ opticAxisAngle_rad: V, kind }: CrystalReport, style: PresentStyle): string {
  if (kind === 'uniaxial' || V === null) return '';
  return `Optic axes ${degreesText(V, 2, style)} from z`;
}

/** Null for biaxial crystals. */
export function directionTable({ directions }: CrystalReport, style: PresentStyle): CrystalTable | null {
  if (directions.length === 0) return null;
  const heads: readonly TableHead[] = [
    { title: 'wave vector to axis', right: true },
    { title: 'n(θ)', right: true },
    { title: 'n_g(θ)', right: true },
    { title: 'walk-off', right: true },
  ];
  const rows = directions.map((d) => [
    degreesText(d.angleToAxis_rad, 0, style),
    formatNumber(d.n, { decimals: 4 }, style),
    formatNumber(d.groupIndex, { decimals: 4 }, style),
    degreesText(d.walkOff_rad, 3, style),
  ]);
  return { title: 'Extraordinary wave (walk-off: positive away from the axis)', heads, rows };
}

const AXIS_WORDS = {
  'along-normal': 'along the normal',
  'in-plane-of-incidence': 'in the surface and plane of incidence',
  'across-plane-of-incidence': 'in the surface, across that plane',
} as const;

/** Null for biaxial crystals. */
export function faceTable(
  { faces, incidenceAngle_rad }: CrystalReport,
  style: PresentStyle,
): CrystalTable | null {
  if (faces.length === 0) return null;
  const heads: readonly TableHead[] = [
    { title: 'optic axis' },
    { title: 'R_s', right: true },
    { title: 'R_p', right: true },
    { title: 'Brewster', right: true },
  ];
  const share = (x: number, kind: 'ordinary' | 'extraordinary'): string =>
    `${formatQuantity(x, PER_CENT, FOUR, { style })} ${kind[0]}`;
  const rows = faces.map((f) => [
    AXIS_WORDS[f.axis],
    share(f.Rs, f.sWave),
    share(f.Rp, f.pWave),
    degreesText(f.brewsterAngle_rad, 2, style),
  ]);
  const angle = degreesText(Number(incidenceAngle_rad.toPrecision(12)), 2, style);
  return { title: `Faces at ${angle} (o, e: the wave that s or p excites)`, heads, rows };
}

/** The plates between principal axes, with their facts and the thicknesses of waveplates. */
export function plateSections(report: CrystalReport, style: PresentStyle): readonly PlateSection[] {
  const { plates, thickness_m, kind } = report;
  return plates.map((plate): PlateSection => {
    const [a, b] = plate.axes;
    const title =
      kind === 'uniaxial' ? 'Plates with the optic axis in the surface' : `Plates between ${a} and ${b}`;
    const facts: Shown[] = [
      {
        id: 'birefringence',
        symbol: '',
        label: `birefringence n_${b[0]} - n_${a[0]}`,
        text: birefringenceText(plate, style),
      },
    ];
    if (plate.retardance_waves !== null && thickness_m !== null) {
      const u =
        plate.birefringence_uncertainty === null
          ? null
          : (plate.birefringence_uncertainty * thickness_m) / report.wave.vacuumWavelength_m;
      facts.push({
        id: 'retardance_waves',
        symbol: '',
        label: `retardance of ${formatQuantity(thickness_m, METRE, 'shortest', { style })}`,
        text: wavesText(plate.retardance_waves, u, plate, style),
      });
    }
    return { title, facts, waveplates: waveplateTable(plate, style) };
  });
}

/** One line for each retardance, thicknesses by whole waves more. */
function waveplateTable(plate: PrincipalPlate, style: PresentStyle): CrystalTable | null {
  const [first] = plate.waveplates;
  if (!first) return null;
  const all = plate.waveplates.flatMap((w) => [
    w.zeroOrderThickness_m,
    ...w.orders.map((o) => o.thickness_m),
  ]);
  const prefix = columnPrefix(all, METRE);
  const length = (x: number): string => {
    const text = formatQuantity(x, METRE, plateDigits(x, plate), { style, prefix });
    return text.slice(0, text.lastIndexOf(' '));
  };
  const heads: readonly TableHead[] = [
    { title: `${prefix.shown}m, order` },
    { title: '0', right: true },
    ...first.orders.map((o): TableHead => ({ title: String(o.order), right: true })),
  ];
  const rows = plate.waveplates.map((w) => [
    retardanceName(w.retardance_waves, style),
    length(w.zeroOrderThickness_m),
    ...w.orders.map((o) => length(o.thickness_m)),
  ]);
  return { title: '', heads, rows };
}
