/** Everything an answer shows, part by part under its heading: what a record keeps of it. */
import type { Answer, MediumAnswer } from '../answer/answer.ts';
import { crystalRows } from './crystal-rows.ts';
import { beamRows, waveEnergyRows } from './energy-rows.ts';
import { interfaceRows } from './interface-rows.ts';
import { mediumRows } from './medium-rows.ts';
import { mediumTitle } from './question-line.ts';
import type { PresentStyle, Shown } from './shown.ts';
import { conditionsText } from './source-lines.ts';
import { layerText, layerTitle, pulseRows, stackRows, windowRows } from './stack-rows.ts';

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
    { title: 'Layers', rows: layers.map((_, i) => layerRow(answer, i, style)) },
    { title: 'Crystal', rows: crystalRows(answer.crystal, style) },
    { title: 'Window', rows: windowRows(answer, style) },
    { title: 'Pulse', rows: pulseRows(answer, style) },
    { title: 'Beam', rows: beamRows(answer, style) },
  ];
  return sections.filter(({ rows }) => rows.length > 0);
}

function titled(medium: MediumAnswer, style: PresentStyle): string {
  const conditions = conditionsText(medium, style);
  return conditions === '' ? mediumTitle(medium) : `${mediumTitle(medium)} (${conditions})`;
}

function layerRow({ layers }: Answer, i: number, style: PresentStyle): Shown {
  const layer = layers[i] as Answer['layers'][number];
  return { id: `layer_${i + 1}`, symbol: '', label: layerTitle(layer, i + 1), text: layerText(layer, style) };
}
