/** Matches and mixtures for programs: JSON and CSV, SI units, full precision. */
import type { Match, MatchReport } from '../../selection/match-report.ts';
import { MISCIBILITY_BASIS } from '../../selection/miscibility.ts';
import type { Constituent } from '../../selection/mixture-report.ts';
import { UNDECIDED_WORDS } from '../../selection/undecided.ts';
import { csvTable } from './csv-table.ts';
import { waveData } from './find-data.ts';
import { type DocumentHead, jsonDocument } from './json-document.ts';

export function matchJson(report: MatchReport, head: DocumentHead, ascii: boolean): string {
  const { target, wave, within, matches, ranked, examined, undecided, mixtures } = report;
  const { medium, slope, warming } = target;
  return jsonDocument(
    head,
    {
      target: {
        key: medium.key,
        name: medium.name,
        axis: medium.axis,
        n: medium.n,
        k: medium.k,
        n_uncertainty: medium.n_uncertainty,
        temperature_K: medium.temperature_K,
        warming,
        dn_dT_per_K: slope?.dn_dT_per_K ?? null,
        source: medium.fit?.source ?? null,
      },
      wave: waveData(wave.spec, wave.at),
      within,
      examined,
      ranked,
      undecided: undecided.map(({ reason, count }) => ({ reason, text: UNDECIDED_WORDS[reason], count })),
      matches: matches.map(matchData),
      mixtures: mixtures && {
        rule: 'Lorentz-Lorenz, volume fractions before mixing',
        estimate: true,
        miscibilityBasis: MISCIBILITY_BASIS,
        caution: 'the rule may miss n by several 1e-3; whether the two mix must be tried',
        possible: mixtures.possible,
        notKnownToMix: mixtures.notKnownToMix,
        targetOutOfReach: mixtures.outOfReach,
        list: mixtures.mixtures.map(({ low, high, dn_perPercent, n_uncertainty }) => ({
          constituents: [high, low].map(constituentData),
          dn_perPercent,
          n_uncertaintyOfConstituents: n_uncertainty,
        })),
      },
    },
    ascii,
  );
}

function matchData(match: Match) {
  const { facts, medium, thermal } = match;
  return {
    key: facts.key,
    name: facts.name,
    class: facts.class,
    axis: medium.axis,
    n: medium.n,
    k: medium.k,
    n_uncertainty: medium.n_uncertainty,
    difference: match.difference,
    difference_uncertainty: match.difference_uncertainty,
    resolved: match.resolved,
    R: match.R,
    R_upTo: match.R_upTo,
    returnLoss_dB: match.returnLoss_dB,
    dn_dT_per_K: match.dn_dT_per_K,
    matchTemperature_K: thermal?.temperature_K ?? null,
    matchTemperature_uncertainty_K: thermal?.uncertainty_K ?? null,
    matchTemperatureBothSlopesKnown: thermal?.bothSlopesKnown ?? null,
    temperature_K: medium.temperature_K,
    warming: match.warming,
    hygroscopic: facts.hygroscopic,
    hazardLevel: facts.hazardLevel,
    hazard: facts.hazard,
    grade: medium.fit?.grade ?? null,
    source: medium.fit?.source ?? null,
  };
}

const constituentData = ({ facts, n, temperature_K, share }: Constituent) => ({
  key: facts.key,
  name: facts.name,
  volumeFraction: share,
  n,
  temperature_K,
  hazardLevel: facts.hazardLevel,
  hazard: facts.hazard,
});

const NAMES = [
  'key',
  'name',
  'class',
  'axis',
  'n',
  'k',
  'n_uncertainty',
  'difference',
  'difference_uncertainty',
  'resolved',
  'R',
  'R_upTo',
  'returnLoss_dB',
  'dn_dT_per_K',
  'matchTemperature_K',
  'matchTemperature_uncertainty_K',
  'matchTemperatureBothSlopesKnown',
  'temperature_K',
  'hygroscopic',
  'hazardLevel',
  'hazard',
  'grade',
  'warming',
] as const;

export function matchCsv({ matches }: MatchReport, ascii: boolean): string {
  const rows = matches.map(matchData).map((row) => [...NAMES.map((name) => row[name]), row.source?.id]);
  return csvTable([...NAMES, 'source'], rows, ascii);
}
