/** Glasses that may stand in for one, for programs: JSON, or one CSV record a glass. */
import {
  type Equivalent,
  FURTHER_LINES,
  type GlassPlace,
  MELT_n_d,
  MELT_Vd,
} from '../../selection/glass-equivalents.ts';
import { csvTable } from './csv-table.ts';
import type { EquivalentPage } from './equivalent-text.ts';
import { type DocumentHead, jsonDocument } from './json-document.ts';

export function equivalentJson(
  { sought, carriers, others }: EquivalentPage,
  head: DocumentHead,
  ascii: boolean,
): string {
  const material = sought.kind === 'glass' ? sought.material : null;
  const body = {
    sought: {
      key: material?.key ?? null,
      name: material?.name ?? null,
      maker: material?.maker ?? null,
      glassCode: sought.kind === 'code' ? sought.code : (material?.glassCode ?? null),
      ...placeRecord(sought.place),
    },
    meltTolerance: { n_d: MELT_n_d, Vd_relative: MELT_Vd },
    bearers: sought.kind === 'code' ? carriers.map(record) : null,
    glasses: others.map(record),
  };
  return jsonDocument(head, body, ascii);
}

const placeRecord = ({ n_d, Vd, further }: GlassPlace) => ({
  n_d,
  Vd,
  lines: FURTHER_LINES.map(({ airWavelength_m }, i) => ({ airWavelength_m, n: further[i] ?? null })),
});

function record({ material, place, difference, distance, withinMelt }: Equivalent) {
  return {
    key: material.key,
    name: material.name,
    maker: material.maker ?? null,
    glassCode: material.glassCode ?? null,
    n_d: place.n_d,
    Vd: place.Vd,
    n_d_difference: difference.n_d,
    Vd_difference: difference.Vd,
    distance_melts: distance,
    withinMelt,
    lines: FURTHER_LINES.map(({ airWavelength_m }, i) => ({
      airWavelength_m,
      n: place.further[i] ?? null,
      difference: difference.further[i] ?? null,
    })),
  };
}

export function equivalentCsv({ carriers, others }: EquivalentPage, ascii: boolean): string {
  const rows = [...carriers, ...others].map(record);
  const names = [
    'key',
    'name',
    'maker',
    'glassCode',
    'n_d',
    'Vd',
    'n_d_difference',
    'Vd_difference',
    'distance_melts',
    'withinMelt',
    ...FURTHER_LINES.flatMap(({ airWavelength_m }) => {
      const nm = String(Number((airWavelength_m * 1e9).toPrecision(8)));
      return [`n_${nm}nm`, `n_${nm}nm_difference`];
    }),
  ];
  return csvTable(
    names,
    rows.map(({ lines, ...rest }) => [...Object.values(rest), ...lines.flatMap((l) => [l.n, l.difference])]),
    ascii,
  );
}
