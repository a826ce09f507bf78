/** Everything an answer shows, part by part under its heading: what a record keeps of it. */
import type { Answer, MediumAnswer } from '../answer/answer.ts';
import { beamDetailRows, nonlinearRows, pulsedBeamRows } from './beam-rows.ts';
import { crystalRows } from './crystal-rows.ts';
import { beamRows, waveEnergyRows } from './energy-rows.ts';
import { interfaceRows } from './interface-rows.ts';
import { type LayerRun, layerRuns } from './layer-runs.ts';
import { mediumRows } from './medium-rows.ts';
import { mediumTitle } from './question-line.ts';
import type { PresentStyle, Shown } from './shown.ts';
import { conditionsText } from './source-lines.ts';
import { layerText, layerTitle, pulseRows, runTitle, stackRows, windowRows } from './stack-rows.ts';

export interface AnswerSection {
  readonly title: string;
  readonly rows: readonly Shown[];
}

/** In the order of reading: what the surface does, the media, the layers, the parts that only some questions have. */
export function answerSections(answer: Answer, style: PresentStyle): readonly AnswerSection[] {
  const { from, into, layers, energy, wave } = answer;
  const medium = (m: MediumAnswer): readonly Shown[] => mediumRows(m, wave.vacuumWavelength_m, style);
  const sections: readonly AnswerSection[] = [
    {
      title: layers.length > 0 ? 'Path' : 'Interface',
      rows: [...interfaceRows(answer, style), ...stackRows(answer, style)],
    },
    {
      title: `Medium of incidence: ${titled(from, style)}`,
      rows: [...medium(from), ...waveEnergyRows(energy?.incident ?? null, style)],
    },
    {
      title: `Medium beyond: ${titled(into, style)}`,
      rows: [...medium(into), ...waveEnergyRows(energy?.transmitted ?? null, style)],
    },
    { title: 'Layers', rows: layerRuns(layers).flatMap((run) => layerRows(run, style)) },
    { title: 'Crystal', rows: crystalRows(answer.crystal, style) },
    { title: 'Window', rows: windowRows(answer, style) },
    { title: 'Pulse', rows: pulseRows(answer, style) },
    { title: 'Beam', rows: [...beamRows(answer, style), ...beamDetailRows(answer, style)] },
    { title: 'At the peak of the pulse', rows: pulsedBeamRows(answer, style) },
    { title: 'Nonlinear phase', rows: nonlinearRows(answer, style) },
  ];
  return sections.filter(({ rows }) => rows.length > 0);
}

function titled(medium: MediumAnswer, style: PresentStyle): string {
  const conditions = conditionsText(medium, style);
  return conditions === '' ? mediumTitle(medium) : `${mediumTitle(medium)} (${conditions})`;
}

/** A group that repeats is told once, its title in front. */
function layerRows(run: LayerRun, style: PresentStyle): readonly Shown[] {
  if (run.times > 1) {
    const inside = run.layers.map((layer) => layerText({ ...layer, absorptance: 0 }, style));
    const names = run.layers.map(({ medium }, i) => `${mediumTitle(medium)} ${inside[i] ?? ''}`);
    return [{ id: `layer_${run.first}`, symbol: '', label: runTitle(run), text: names.join('; ') }];
  }
  return run.layers.map((layer, i) => ({
    id: `layer_${run.first + i}`,
    symbol: '',
    label: layerTitle(layer, run.first + i),
    text: layerText(layer, style),
  }));
}
