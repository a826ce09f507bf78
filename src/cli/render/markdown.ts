/** The answer as Markdown: a heading, one table for the media, one for the interface, cautions and sources as lists. */
import type { Answer } from '../../answer/answer.ts';
import { beamDetailRows, nonlinearRows, pulsedBeamRows } from '../../present/beam-rows.ts';
import { crystalRows } from '../../present/crystal-rows.ts';
import { beamRows, waveEnergyRows } from '../../present/energy-rows.ts';
import { fieldRows } from '../../present/field-rows.ts';
import { interfaceRows } from '../../present/interface-rows.ts';
import { mediumRows } from '../../present/medium-rows.ts';
import { pairRows } from '../../present/pair-rows.ts';
import { mediumTitle, questionLine, waveAliases } from '../../present/question-line.ts';
import type { PresentStyle } from '../../present/shown.ts';
import { conditionsText, fitLine } from '../../present/source-lines.ts';
import { spreadRows } from '../../present/spread-rows.ts';
import { layerText, layerTitle, pulseRows, stackRows, windowRows } from '../../present/stack-rows.ts';
import { toAscii } from '../../units/to-ascii.ts';

export function renderMarkdown(answer: Answer, style: PresentStyle): string {
  const lambda = answer.wave.vacuumWavelength_m;
  const { from, into, energy, layers } = answer;
  const title = (m: Answer['from']): string => {
    const conditions = conditionsText(m, style);
    return conditions === '' ? mediumTitle(m) : `${mediumTitle(m)} (${conditions})`;
  };
  const pairs = pairRows(
    [...mediumRows(from, lambda, style), ...waveEnergyRows(energy?.incident ?? null, style)],
    [...mediumRows(into, lambda, style), ...waveEnergyRows(energy?.transmitted ?? null, style)],
  );
  const lines = [
    `### ${cell(questionLine(answer, style))}`,
    '',
    waveAliases(answer, style).join(', '),
    '',
    row(['', ...[title(from), title(into)].map(cell)]),
    row(['---', '---', '---']),
    ...pairs.map((p) => row([`${p.label} ${p.symbol}`, p.left, p.right].map(cell))),
    '',
    row(['interface', '']),
    row(['---', '---']),
    ...layers.map((l, i) => row([`layer ${layerTitle(l, i + 1)}`, layerText(l, style)].map(cell))),
    ...[
      ...interfaceRows(answer, style),
      ...spreadRows(answer, style),
      ...stackRows(answer, style),
      ...fieldRows(answer, style),
      ...windowRows(answer, style),
      ...crystalRows(answer.crystal, style),
      ...pulseRows(answer, style),
      ...beamRows(answer, style),
      ...beamDetailRows(answer, style),
      ...pulsedBeamRows(answer, style),
      ...nonlinearRows(answer, style),
    ].map((r) => row([`${r.label} ${r.symbol}`, r.text].map(cell))),
    ...(answer.cautions.length > 0 ? ['', ...answer.cautions.map((c) => `- **${c.level}** ${c.text}`)] : []),
    '',
    ...[...new Set([from, ...layers.map((l) => l.medium), into].flatMap((m) => fitLine(m, style)))].map(
      (l) => `- ${l.trim()}`,
    ),
  ];
  return `${(style.ascii ? lines.map(toAscii) : lines).join('\n').trimEnd()}\n`;
}

const row = (cells: readonly string[]): string => `| ${cells.join(' | ')} |`;
const cell = (text: string): string => text.replaceAll('|', '\\|');
