/** The parts of an answer as plain lines of text, "label = value" (for the clipboard, and read aloud in the linear layout). */
import type { Answer, MediumAnswer } from '../../answer/answer.ts';
import { beamRows, waveEnergyRows } from '../../present/energy-rows.ts';
import { interfaceRows } from '../../present/interface-rows.ts';
import { mediumRows } from '../../present/medium-rows.ts';
import type { Shown } from '../../present/shown.ts';
import type { NumberStyle } from '../../units/number-style.ts';

const line = (q: Shown): string => `${q.symbol} = ${q.text}`;

/** R and T alone, with their names. */
export function resultText(answer: Answer, style: NumberStyle): string {
  return interfaceRows(answer, style)
    .filter((q) => q.id === 'R' || q.id === 'T')
    .map(line)
    .join(', ');
}

export function surfaceLines(answer: Answer, style: NumberStyle): readonly string[] {
  return [...interfaceRows(answer, style), ...beamRows(answer, style)].map((q) => `${q.label}: ${line(q)}`);
}

export function mediumLines(medium: MediumAnswer, answer: Answer, style: NumberStyle): readonly string[] {
  const energy = medium === answer.from ? answer.energy?.incident : answer.energy?.transmitted;
  return [
    ...mediumRows(medium, answer.wave.vacuumWavelength_m, style),
    ...waveEnergyRows(energy ?? null, style),
  ].map((q) => `${q.label}: ${line(q)}`);
}

export function sourceLine(medium: MediumAnswer): string {
  return medium.fit ? medium.fit.source.text : 'given by its numbers';
}
