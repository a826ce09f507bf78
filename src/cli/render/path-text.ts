/** What the text of an answer says beyond one bare surface: the layers, the path as a whole, the beam. */
import type { Answer, LayerAnswer } from '../../answer/answer.ts';
import { beamDetailRows, nonlinearRows, pulsedBeamRows } from '../../present/beam-rows.ts';
import { crystalRows } from '../../present/crystal-rows.ts';
import { beamRows } from '../../present/energy-rows.ts';
import { fieldRows } from '../../present/field-rows.ts';
import { type LayerRun, layerRuns } from '../../present/layer-runs.ts';
import { mediumTitle } from '../../present/question-line.ts';
import type { PresentStyle } from '../../present/shown.ts';
import { layerText, layerTitle, pulseRows, runTitle, windowRows } from '../../present/stack-rows.ts';
import { wrap } from '../../present/wrap.ts';
import { PER_CENT } from '../../units/display-unit.ts';
import { formatQuantity } from '../../units/format-quantity.ts';
import { section, WIDTH } from './text-lines.ts';

export function pathSections(answer: Answer, style: PresentStyle): readonly string[] {
  return [
    ...section('Field through the path', fieldRows(answer, style)),
    ...section('Window', windowRows(answer, style)),
    ...section('Crystal', crystalRows(answer.crystal, style)),
    ...section('Pulse', pulseRows(answer, style)),
  ];
}

export function beamSections(answer: Answer, style: PresentStyle): readonly string[] {
  return [
    ...section('Beam', [...beamRows(answer, style), ...beamDetailRows(answer, style)]),
    ...section('At the peak of the pulse', pulsedBeamRows(answer, style)),
    ...section('Nonlinear phase', nonlinearRows(answer, style)),
  ];
}

export function layerSection(answer: Answer, style: PresentStyle): readonly string[] {
  const one = (layer: LayerAnswer, title: string, indent: number): readonly string[] =>
    [
      ...wrap(title, WIDTH - indent, '  '),
      ...wrap(layerText(layer, style), WIDTH - 2 - indent).map((l) => `  ${l}`),
    ].map((l) => ' '.repeat(indent) + l);
  const lines = layerRuns(answer.layers).flatMap((run) =>
    run.times === 1
      ? run.layers.flatMap((layer, i) => one(layer, layerTitle(layer, run.first + i), 0))
      : [
          runTitle(run) + absorbedText(run, style),
          ...run.layers.flatMap((layer) => one({ ...layer, absorptance: 0 }, mediumTitle(layer.medium), 2)),
        ],
  );
  return ['Layers', ...lines, ''];
}

function absorbedText({ absorptance }: LayerRun, style: PresentStyle): string {
  if (!(absorptance > 0)) return '';
  return `, absorb ${formatQuantity(absorptance, PER_CENT, { significant: 4 }, { style })} together`;
}
