/** The hits of a search for programs: JSON and CSV, SI units, full precision; null with a reason beside it where there is no value. */
import type { WaveSpec } from '../../answer/question.ts';
import { waveAnswer } from '../../answer/wave.ts';
import type { FitWave } from '../../catalog/choose-fit.ts';
import type { FindReport, Hit } from '../../selection/find-report.ts';
import type { SortOrder } from '../../selection/sort-order.ts';
import { UNDECIDED_WORDS } from '../../selection/undecided.ts';
import { csvTable } from './csv-table.ts';
import { type DocumentHead, jsonDocument } from './json-document.ts';

export function findJson(report: FindReport, order: SortOrder, head: DocumentHead, ascii: boolean): string {
  const { criteria, wave, examined, hits, undecided } = report;
  const { ranges, clear_m, classes, not, words, maxLoss, thickness_m, temperature_K } = criteria;
  return jsonDocument(
    head,
    {
      find: {
        words,
        ranges,
        clear_m: clear_m ?? null,
        classes,
        not: not.map((x) => (x.kind === 'class' ? x.text : x.property)),
        maxLoss: maxLoss ?? null,
        thickness_m: thickness_m ?? null,
        temperature_K: temperature_K ?? null,
        sort: `${order.descending ? '-' : ''}${order.key}`,
      },
      wave: wave && waveData(wave.spec, wave.at),
      examined,
      matched: hits.length,
      undecided: undecided.map(({ reason, count }) => ({ reason, text: UNDECIDED_WORDS[reason], count })),
      hits: hits.map(hitData),
    },
    ascii,
  );
}

export const waveData = (spec: WaveSpec, at: FitWave) => {
  const { vacuumWavelength_m, airWavelength_m, givenInAir } = waveAnswer(at, spec);
  return { vacuumWavelength_m, airWavelength_m, givenInAir };
};

function hitData(hit: Hit) {
  const { facts, axis, alsoAxes, medium, reasons } = hit;
  return {
    key: facts.key,
    name: facts.name,
    class: facts.class,
    axis,
    alsoAxes,
    n: medium?.n ?? null,
    k: medium?.k ?? null,
    n_uncertainty: medium?.n_uncertainty ?? null,
    temperature_K: medium?.temperature_K ?? null,
    warming: hit.warming,
    groupIndex: medium?.groupIndex ?? null,
    gvd_s2_per_m: medium?.gvd_s2_per_m ?? null,
    birefringence: hit.birefringence,
    n_d: hit.n_d,
    n_e: hit.n_e,
    Vd: hit.Vd,
    Ve: hit.Ve,
    surfaceReflectance: hit.surfaceReflectance,
    loss: hit.loss,
    lossIncludesAbsorption: hit.absorptionKnown,
    transparency_m: facts.transparency_m,
    hygroscopic: facts.hygroscopic,
    hazardLevel: facts.hazardLevel,
    hazard: facts.hazard,
    knoop: facts.knoop,
    density_kg_per_m3: facts.density_kg_per_m3,
    grade: medium?.fit?.grade ?? null,
    source: medium?.fit?.source ?? null,
    reasons,
  };
}

export function findCsv({ hits }: FindReport, ascii: boolean): string {
  const rows = hits.map((hit) => {
    const { alsoAxes, transparency_m, source, reasons: _, ...rest } = hitData(hit);
    return {
      ...rest,
      alsoAxes: alsoAxes.join(' '),
      transparencyFrom_m: transparency_m?.[0] ?? null,
      transparencyTo_m: transparency_m?.[1] ?? null,
      source: source?.id ?? null,
    };
  });
  return csvTable(
    NAMES,
    rows.map((row) => NAMES.map((name) => row[name])),
    ascii,
  );
}

const NAMES = [
  'key',
  'name',
  'class',
  'axis',
  'alsoAxes',
  'n',
  'k',
  'n_uncertainty',
  'groupIndex',
  'gvd_s2_per_m',
  'birefringence',
  'n_d',
  'n_e',
  'Vd',
  'Ve',
  'surfaceReflectance',
  'loss',
  'lossIncludesAbsorption',
  'transparencyFrom_m',
  'transparencyTo_m',
  'hygroscopic',
  'hazardLevel',
  'hazard',
  'knoop',
  'density_kg_per_m3',
  'grade',
  'source',
  'temperature_K',
  'warming',
] as const;
