/**
 * The answer as text for people, within 72 columns: the question as understood, the two media side by side, the interface,
 * the beam, cautions, sources. No escape codes.
 */
import type { Answer, Caution, MediumAnswer } from '../../answer/answer.ts';
import { waveEnergyRows } from '../../present/energy-rows.ts';
import { interfaceRows } from '../../present/interface-rows.ts';
import { mediumRows } from '../../present/medium-rows.ts';
import { pairRows } from '../../present/pair-rows.ts';
import { mediumTitle, questionLine, waveAliases } from '../../present/question-line.ts';
import type { PresentStyle } from '../../present/shown.ts';
import { conditionsText, fitLine, GRADE_WORDS } from '../../present/source-lines.ts';
import { spreadRows } from '../../present/spread-rows.ts';
import { stackRows } from '../../present/stack-rows.ts';
import { wrap } from '../../present/wrap.ts';
import { toAscii } from '../../units/to-ascii.ts';
import { beamSections, layerSection, pathSections } from './path-text.ts';
import { length, oneValue, pad, WIDTH } from './text-lines.ts';

export function renderText(answer: Answer, style: PresentStyle): string {
  const layered = answer.layers.length > 0;
  const lines = [
    ...wrap(questionLine(answer, style), WIDTH, '  '),
    ...wrap(waveAliases(answer, style).join(', '), WIDTH),
    '',
    ...mediaTable(answer, style),
    '',
    ...(layered ? layerSection(answer, style) : []),
    layered ? 'Path' : 'Interface',
    ...[
      ...interfaceRows(answer, style),
      ...spreadRows(answer, style),
      ...(layered ? stackRows(answer, style) : []),
    ].flatMap(oneValue),
    ...(layered || answer.crystal || answer.pulse ? pathSections(answer, style) : []),
    ...(answer.energy ? beamSections(answer, style) : []),
    ...cautionSection(answer.cautions),
    ...sourceSection(answer, style),
  ];
  const text = lines.map((l) => l.trimEnd()).join('\n');
  return `${style.ascii ? text.split('\n').map(toAscii).join('\n') : text}\n`;
}

function mediaTable(answer: Answer, style: PresentStyle): readonly string[] {
  const lambda = answer.wave.vacuumWavelength_m;
  const { energy } = answer;
  const left = [
    ...mediumRows(answer.from, lambda, style),
    ...(energy ? waveEnergyRows(energy.incident, style) : []),
  ];
  const right = [
    ...mediumRows(answer.into, lambda, style),
    ...(energy ? waveEnergyRows(energy.transmitted, style) : []),
  ];
  const rows = pairRows(left, right);
  const symbol = 1 + Math.max(...rows.map((r) => length(r.symbol)));
  const head = symbol + 1 + Math.max(...rows.map((r) => length(r.label)));
  const value = Math.floor((WIDTH - head) / 2);
  return [
    ...sideBySide(title(answer.from, style), title(answer.into, style), head, value),
    ...rows.flatMap((r) => {
      const name = pad(pad(r.symbol, symbol) + r.label, head);
      const row = `${name}${pad(r.left, value)}${length(r.left) >= value ? ' ' : ''}${r.right}`;
      // A long complex value takes a line of its own rather than losing digits.
      return length(row) <= WIDTH
        ? [row]
        : [name + r.left, ' '.repeat(head) + r.right.padStart(WIDTH - head)];
    }),
  ];
}

function title(medium: MediumAnswer, style: PresentStyle): string {
  const conditions = conditionsText(medium, style);
  return conditions === '' ? mediumTitle(medium) : `${mediumTitle(medium)} (${conditions})`;
}

function sideBySide(a: string, b: string, head: number, value: number): readonly string[] {
  const left = wrap(a, value - 1);
  const right = wrap(b, value);
  const count = Math.max(left.length, right.length);
  return Array.from(
    { length: count },
    (_, i) => ' '.repeat(head) + pad(left[i] ?? '', value) + (right[i] ?? ''),
  );
}

const MARK: Readonly<Record<Caution['level'], string>> = { hazard: '!! ', caution: '!  ', note: '-  ' };

export function cautionSection(cautions: readonly Caution[]): readonly string[] {
  if (cautions.length === 0) return [];
  return ['', 'Cautions', ...cautions.flatMap((c) => wrap(`${MARK[c.level]}${c.text}`, WIDTH, '   '))];
}

function sourceSection(answer: Answer, style: PresentStyle): readonly string[] {
  const media = [answer.from, ...answer.layers.map((l) => l.medium), answer.into];
  const lines = media.flatMap((m) => fitLine(m, style));
  const unique = lines.filter((l, i) => lines.indexOf(l) === i);
  if (unique.length === 0) return [];
  const grades = media.flatMap((m) => (m.fit ? [m.fit.grade] : []));
  const legend = [...new Set(grades)].sort().map((g) => `grade ${g}: ${GRADE_WORDS[g]}`);
  return [
    '',
    'Sources',
    ...unique.flatMap((l) => wrap(l, WIDTH, '  ')),
    ...wrap(`Parentheses: standard uncertainty in the last digits. ${legend.join('; ')}.`, WIDTH, '  '),
  ];
}
