/** One quantity a line, tab between name and value, never wrapped or cut: for grep and cut. */
import type { Answer } from '../../answer/answer.ts';
import { beamDetailRows, nonlinearRows, pulsedBeamRows } from '../../present/beam-rows.ts';
import { crystalRows } from '../../present/crystal-rows.ts';
import { beamRows, waveEnergyRows } from '../../present/energy-rows.ts';
import { fieldRows } from '../../present/field-rows.ts';
import { interfaceRows } from '../../present/interface-rows.ts';
import { mediumRows } from '../../present/medium-rows.ts';
import { mediumTitle, questionLine } from '../../present/question-line.ts';
import type { PresentStyle, Shown } from '../../present/shown.ts';
import { fitLine } from '../../present/source-lines.ts';
import { spreadRows } from '../../present/spread-rows.ts';
import { layerText, pulseRows, stackRows, windowRows } from '../../present/stack-rows.ts';
import { toAscii } from '../../units/to-ascii.ts';

export function renderPlain(answer: Answer, style: PresentStyle): string {
  const lambda = answer.wave.vacuumWavelength_m;
  const part = (name: string, rows: readonly Shown[]): readonly string[] =>
    rows.map((r) => `${name}.${r.id}\t${r.text}\t${r.label}`);
  const lines = [
    `question\t${questionLine(answer, style)}`,
    ...part('from', mediumRows(answer.from, lambda, style)),
    ...part('into', mediumRows(answer.into, lambda, style)),
    ...answer.layers.map((l, i) => `layer.${i + 1}\t${layerText(l, style)}\t${mediumTitle(l.medium)}`),
    ...part('interface', interfaceRows(answer, style)),
    ...part('spread', spreadRows(answer, style)),
    ...part('stack', stackRows(answer, style)),
    ...part('field', fieldRows(answer, style)),
    ...part('window', windowRows(answer, style)),
    ...part('crystal', crystalRows(answer.crystal, style)),
    ...part('pulse', pulseRows(answer, style)),
    ...part('incident', waveEnergyRows(answer.energy?.incident ?? null, style)),
    ...part('transmitted', waveEnergyRows(answer.energy?.transmitted ?? null, style)),
    ...part('beam', [...beamRows(answer, style), ...beamDetailRows(answer, style)]),
    ...part('peak', [...pulsedBeamRows(answer, style), ...nonlinearRows(answer, style)]),
    ...answer.cautions.map((c) => `caution.${c.code}\t${c.about}\t${c.text}`),
    ...[answer.from, ...answer.layers.map((l) => l.medium), answer.into].flatMap((m) =>
      fitLine(m, style).map((l) => `source\t${l.trim()}`),
    ),
  ];
  return `${(style.ascii ? lines.map((l) => l.split('\t').map(toAscii).join('\t')) : lines).join('\n')}\n`;
}
