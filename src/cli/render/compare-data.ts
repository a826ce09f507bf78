/** The comparison for programs: JSON, one object a part with one entry a wave; CSV, one record for each part at each wave. */
import type { Layer } from '../../answer/question.ts';
import { isRefusal, type Refusal } from '../../medium/refusal.ts';
import type { ComparedPart, CompareReport, PartAtWave } from '../../selection/compare-report.ts';
import { csvTable } from './csv-table.ts';
import { waveData } from './find-data.ts';
import { type DocumentHead, jsonDocument } from './json-document.ts';

export function compareJson(report: CompareReport, head: DocumentHead, ascii: boolean): string {
  const { parts, waves, design } = report;
  return jsonDocument(
    head,
    {
      waves: waves.map(({ spec, at }) => waveData(spec, at)),
      designWave: parts.some(({ part }) => part.coating) ? waveData(design.spec, design.at) : null,
      parts: parts.map((part, i) => ({
        ...partData(part),
        atWave: waves.map(({ columns }) => columnData(columns[i] as PartAtWave | Refusal)),
      })),
    },
    ascii,
  );
}

function partData({ part, axis, facts, abbe }: ComparedPart) {
  return {
    text: part.text,
    key: facts?.key ?? null,
    name: facts?.name ?? part.text,
    class: facts?.class ?? null,
    axis,
    thickness_m: part.thickness_m,
    coating: part.coating
      ? { front: part.coating.front.map(filmData), back: part.coating.back.map(filmData) }
      : null,
    transparency_m: facts?.transparency_m ?? null,
    Vd: abbe?.Vd ?? null,
    Ve: abbe?.Ve ?? null,
    knoop: facts?.knoop ?? null,
    hygroscopic: facts?.hygroscopic ?? null,
    hazardLevel: facts?.hazardLevel ?? null,
    hazard: facts?.hazard ?? null,
    care: facts?.care ?? null,
  };
}

const filmData = ({ medium, thickness }: Layer) => ({
  key: medium.kind === 'literal' ? null : medium.material.key,
  text: medium.kind === 'literal' ? medium.text : medium.material.name,
  thickness_m: thickness.kind === 'length' ? thickness.thickness_m : null,
  thickness_waves: thickness.kind === 'waves' ? thickness.waves : null,
});

/** `reason` says why every number is null, or why a loss holds no absorption. */
function columnData(column: PartAtWave | Refusal) {
  if (isRefusal(column)) return { ...NOTHING, reason: column.message };
  const { medium } = column;
  return {
    n: medium.n,
    k: medium.k,
    n_uncertainty: medium.n_uncertainty,
    groupIndex: medium.groupIndex,
    gvd_s2_per_m: medium.gvd_s2_per_m,
    wavelength_m: medium.wavelength_m,
    surfaceReflectance: column.surfaceReflectance,
    backReflectance: column.backReflectance,
    surfaceReflectance_uncertainty: column.R_uncertainty,
    backReflectance_uncertainty: column.backR_uncertainty,
    internalTransmittance: column.internalTransmittance,
    loss: column.loss,
    lossIncludesAbsorption: column.loss === null ? null : !column.surfacesOnly,
    brewsterAngle_rad: column.brewsterAngle_rad,
    dn_dT_per_K: column.dn_dT_per_K,
    temperature_K: medium.temperature_K,
    source: medium.fit?.source ?? null,
    cautions: column.cautions.map(({ code, level, text }) => ({ code, level, text })),
    reason: column.surfacesOnly
      ? 'absorption at this wave is not on file: the loss is that of the surfaces'
      : null,
  };
}

const NOTHING = {
  n: null,
  k: null,
  n_uncertainty: null,
  groupIndex: null,
  gvd_s2_per_m: null,
  wavelength_m: null,
  surfaceReflectance: null,
  backReflectance: null,
  surfaceReflectance_uncertainty: null,
  backReflectance_uncertainty: null,
  internalTransmittance: null,
  loss: null,
  lossIncludesAbsorption: null,
  brewsterAngle_rad: null,
  dn_dT_per_K: null,
  temperature_K: null,
  source: null,
  cautions: [],
};

const PART_NAMES = [
  'text',
  'key',
  'name',
  'class',
  'axis',
  'thickness_m',
  'Vd',
  'Ve',
  'knoop',
  'hygroscopic',
  'hazardLevel',
  'hazard',
] as const;
const WAVE_NAMES = [
  'n',
  'k',
  'n_uncertainty',
  'groupIndex',
  'gvd_s2_per_m',
  'wavelength_m',
  'surfaceReflectance',
  'internalTransmittance',
  'loss',
  'lossIncludesAbsorption',
  'brewsterAngle_rad',
  'dn_dT_per_K',
  'temperature_K',
  'reason',
] as const;

export function compareCsv({ parts, waves }: CompareReport, ascii: boolean): string {
  const records = waves.flatMap(({ spec, at, columns }) =>
    parts.map((part, i) => {
      const data = partData(part);
      const column = columnData(columns[i] as PartAtWave | Refusal);
      return [
        waveData(spec, at).vacuumWavelength_m,
        ...PART_NAMES.map((name) => data[name]),
        data.transparency_m?.[0],
        data.transparency_m?.[1],
        ...WAVE_NAMES.map((name) => column[name]),
        column.source?.id,
        column.backReflectance,
      ];
    }),
  );
  const names = [
    'vacuumWavelength_m',
    ...PART_NAMES,
    'transparencyFrom_m',
    'transparencyTo_m',
    ...WAVE_NAMES.map((name) => (name === 'wavelength_m' ? 'wavelengthInside_m' : name)),
    'source',
    'backReflectance',
  ];
  return csvTable(names, records, ascii);
}
