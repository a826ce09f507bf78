/** A crystal as text for people, within 72 columns: principal axes, directions, faces, cut, plates, cautions, sources. */
import type { MediumAnswer } from '../../answer/answer.ts';
import type { CrystalReport, PrincipalPlate } from '../../answer/crystal-report.ts';
import {
  birefringenceText,
  crystalRows,
  plateDigits,
  retardanceName,
  wavesText,
} from '../../present/crystal-rows.ts';
import { degreesText } from '../../present/interface-rows.ts';
import { howKnown, precisionFor } from '../../present/known.ts';
import { indexText } from '../../present/medium-rows.ts';
import { wavelengthOf } from '../../present/question-line.ts';
import type { PresentStyle, Shown } from '../../present/shown.ts';
import { conditionsText, fitLine } from '../../present/source-lines.ts';
import { type Column, columns } from '../../term/columns.ts';
import { FS2_PER_MM, METRE, PER_CENT } from '../../units/display-unit.ts';
import { formatNumber } from '../../units/format-number.ts';
import { columnPrefix, formatQuantity } from '../../units/format-quantity.ts';
import { page, paragraph } from './page.ts';
import { cautionSection } from './text.ts';

const FOUR = { significant: 4 } as const;
const LABEL = 40;

export function crystalText(report: CrystalReport, style: PresentStyle): string {
  return page(
    [
      ...paragraph(headline(report, style)),
      '',
      ...axesTable(report, style),
      ...opticAxes(report, style),
      ...directionTable(report, style),
      ...faceTable(report, style),
      ...section('Cut', crystalRows(report.cut, style)),
      ...plateSections(report, style),
      ...cautionSection(report.cautions),
      ...sources(report, style),
    ],
    style.ascii,
  );
}

function headline(
  { name, kind, wave, incidenceAngle_rad, from }: CrystalReport,
  style: PresentStyle,
): string {
  const angle =
    incidenceAngle_rad === 0
      ? 'normal incidence'
      : `${degreesText(Number(incidenceAngle_rad.toPrecision(12)), 2, style)} from the normal`;
  return `${name}, ${kind} crystal, ${wavelengthOf(wave, style)}, ${angle}, from ${from.name}`;
}

function axesTable({ axes, normalReflectances }: CrystalReport, style: PresentStyle): readonly string[] {
  const heads: readonly Column[] = [
    { title: '' },
    ...axes.map((a): Column => ({ title: a.axis, right: true })),
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
  return columns(heads, rows, { ascii: style.ascii });
}

function opticAxes({ opticAxisAngle_rad: V, kind }: CrystalReport, style: PresentStyle): readonly string[] {
  if (kind === 'uniaxial' || V === null) return [];
  return ['', ...paragraph(`Optic axes ${degreesText(V, 2, style)} from z`, 2)];
}

function directionTable({ directions }: CrystalReport, style: PresentStyle): readonly string[] {
  if (directions.length === 0) return [];
  const heads: readonly Column[] = [
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
  return [
    '',
    'Extraordinary wave (walk-off: positive away from the axis)',
    ...columns(heads, rows, { ascii: style.ascii }),
  ];
}

const AXIS_WORDS = {
  'along-normal': 'along the normal',
  'in-plane-of-incidence': 'in the surface and plane of incidence',
  'across-plane-of-incidence': 'in the surface, across that plane',
} as const;

function faceTable({ faces, incidenceAngle_rad }: CrystalReport, style: PresentStyle): readonly string[] {
  if (faces.length === 0) return [];
  const heads: readonly Column[] = [
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
  return [
    '',
    `Faces at ${angle} (o, e: the wave that s or p excites)`,
    ...columns(heads, rows, { ascii: style.ascii }),
  ];
}

function plateSections(report: CrystalReport, style: PresentStyle): readonly string[] {
  const { plates, thickness_m, kind } = report;
  return plates.flatMap((plate) => {
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
    return [...section(title, facts), ...waveplateTable(plate, style)];
  });
}

/** One line for each retardance, thicknesses by whole waves more. */
function waveplateTable(plate: PrincipalPlate, style: PresentStyle): readonly string[] {
  const [first] = plate.waveplates;
  if (!first) return [];
  const all = plate.waveplates.flatMap((w) => [
    w.zeroOrderThickness_m,
    ...w.orders.map((o) => o.thickness_m),
  ]);
  const prefix = columnPrefix(all, METRE);
  const length = (x: number): string => {
    const text = formatQuantity(x, METRE, plateDigits(x, plate), { style, prefix });
    return text.slice(0, text.lastIndexOf(' '));
  };
  const heads: readonly Column[] = [
    { title: `${prefix.shown}m, order` },
    { title: '0', right: true },
    ...first.orders.map((o): Column => ({ title: String(o.order), right: true })),
  ];
  const rows = plate.waveplates.map((w) => [
    retardanceName(w.retardance_waves, style),
    length(w.zeroOrderThickness_m),
    ...w.orders.map((o) => length(o.thickness_m)),
  ]);
  return columns(heads, rows, { ascii: style.ascii });
}

function section(title: string, rows: readonly Shown[]): readonly string[] {
  if (rows.length === 0) return [];
  return ['', title, ...rows.map((r) => `  ${r.label.padEnd(LABEL)} ${r.text}`)];
}

function sources({ axes }: CrystalReport, style: PresentStyle): readonly string[] {
  const lines = unique(axes.flatMap((a) => fitLine(a, style)));
  return lines.length === 0 ? [] : ['', 'Sources', ...lines.flatMap((line) => paragraph(line))];
}

const unique = (lines: readonly string[]): readonly string[] => [...new Set(lines)];
