/** A crystal as one JSON document, and as CSV: a row for each axis, direction, face, wave at the cut and plate, in SI units. */
import type { CrystalReport, PrincipalPlate } from '../../answer/crystal-report.ts';
import type { CrystalAnswer, WaveplateAnswer } from '../../answer/crystal-shape.ts';
import { CONVENTION_NOTES } from '../convention-notes.ts';
import { type CsvValue, csvTable } from './csv-table.ts';
import { type DocumentHead, jsonDocument } from './json-document.ts';

export function crystalJson(report: CrystalReport, head: DocumentHead, ascii: boolean): string {
  return jsonDocument(head, { convention: CONVENTION_NOTES, ...report }, ascii);
}

const COLUMNS = [
  'part',
  'about',
  'angleToAxis_rad',
  'n',
  'n_uncertainty',
  'k',
  'groupIndex',
  'gvd_s2_per_m',
  'walkOff_rad',
  'R',
  'Rs',
  'Rp',
  'brewsterAngle_rad',
  'birefringence',
  'birefringence_uncertainty',
  'thickness_m',
  'retardance_waves',
  'order',
] as const;

type Row = Partial<Readonly<Record<(typeof COLUMNS)[number], CsvValue>>>;

export function crystalCsv(report: CrystalReport, ascii: boolean): string {
  const rows: readonly Row[] = [
    ...report.axes.map((a, i): Row => {
      const { n, k, n_uncertainty } = a;
      const { groupIndex, gvd_s2_per_m } = a.absolute;
      const R = report.normalReflectances[i];
      return { part: 'axis', about: a.axis, n, n_uncertainty, k, groupIndex, gvd_s2_per_m, R };
    }),
    ...report.directions.map((d): Row => ({ part: 'direction', about: 'extraordinary', ...d })),
    ...report.faces.map(({ axis, Rs, Rp, brewsterAngle_rad }): Row => {
      return { part: 'face', about: axis, Rs, Rp, brewsterAngle_rad };
    }),
    ...cutRows(report.cut),
    ...report.plates.flatMap((plate) => plateRows(plate, report.thickness_m)),
  ];
  return csvTable(
    COLUMNS,
    rows.map((row) => COLUMNS.map((name) => row[name])),
    ascii,
  );
}

function cutRows(cut: CrystalAnswer | null): readonly Row[] {
  if (!cut) return [];
  const { birefringence, birefringence_uncertainty, brewsterAngle_rad, plate, waveplate } = cut;
  const waves = (['ordinary', 'extraordinary'] as const).map((about): Row => {
    const { n, groupIndex, walkOff_rad, angleToAxis_rad, R } = cut[about];
    return { part: 'cut', about, angleToAxis_rad, n, groupIndex, walkOff_rad, R };
  });
  return [
    ...waves,
    {
      part: 'cut',
      about: 'plate',
      brewsterAngle_rad,
      birefringence,
      birefringence_uncertainty,
      thickness_m: plate?.thickness_m,
      retardance_waves: plate?.retardance_waves,
    },
    ...(waveplate ? waveplateRows('cut', waveplate) : []),
  ];
}

function plateRows(plate: PrincipalPlate, thickness_m: number | null): readonly Row[] {
  const about = plate.axes.join(' ');
  const { birefringence, birefringence_uncertainty, retardance_waves } = plate;
  return [
    { part: 'plate', about, birefringence, birefringence_uncertainty, thickness_m, retardance_waves },
    ...plate.waveplates.flatMap((w) => waveplateRows(about, w)),
  ];
}

/** The zero order first. */
const waveplateRows = (about: string, plate: WaveplateAnswer): readonly Row[] => [
  {
    part: 'waveplate',
    about,
    retardance_waves: plate.retardance_waves,
    thickness_m: plate.zeroOrderThickness_m,
    order: 0,
  },
  ...plate.orders.map(
    ({ order, thickness_m }): Row => ({
      part: 'waveplate',
      about,
      retardance_waves: plate.retardance_waves,
      thickness_m,
      order,
    }),
  ),
];
