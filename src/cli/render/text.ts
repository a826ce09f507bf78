/**
 * The answer as text for people, within 72 columns: the question as understood, the two media side by side, the interface,
 * the beam, cautions, sources. No escape codes.
 */
import type { Answer, Caution, LayerAnswer, MediumAnswer } from '../../answer/answer.ts';
import { beamDetailRows, nonlinearRows, pulsedBeamRows } from '../../present/beam-rows.ts';
import { crystalRows } from '../../present/crystal-rows.ts';
import { beamRows, waveEnergyRows } from '../../present/energy-rows.ts';
import { fieldRows } from '../../present/field-rows.ts';
import { interfaceRows } from '../../present/interface-rows.ts';
import { type LayerRun, layerRuns } from '../../present/layer-runs.ts';
import { mediumRows } from '../../present/medium-rows.ts';
import { pairRows } from '../../present/pair-rows.ts';
import { mediumTitle, questionLine, waveAliases } from '../../present/question-line.ts';
import type { PresentStyle, Shown } from '../../present/shown.ts';
import { conditionsText, fitLine, GRADE_WORDS } from '../../present/source-lines.ts';
import { spreadRows } from '../../present/spread-rows.ts';
import {
  layerText,
  layerTitle,
  pulseRows,
  runTitle,
  stackRows,
  windowRows,
} from '../../present/stack-rows.ts';
import { wrap } from '../../present/wrap.ts';
import { PER_CENT } from '../../units/display-unit.ts';
import { formatQuantity } from '../../units/format-quantity.ts';
import { toAscii } from '../../units/to-ascii.ts';

const WIDTH = 72;

export function renderText(answer: Answer, style: PresentStyle): string {
  const lines = [
    ...wrap(questionLine(answer, style), WIDTH, '  '),
    ...wrap(waveAliases(answer, style).join(', '), WIDTH),
    '',
    ...mediaTable(answer, style),
    '',
    ...layerSection(answer, style),
    answer.layers.length > 0 ? 'Path' : 'Interface',
    ...[...interfaceRows(answer, style), ...spreadRows(answer, style), ...stackRows(answer, style)].flatMap(
      oneValue,
    ),
    ...section('Field through the path', fieldRows(answer, style)),
    ...section('Window', windowRows(answer, style)),
    ...section('Crystal', crystalRows(answer.crystal, style)),
    ...section('Pulse', pulseRows(answer, style)),
    ...section('Beam', [...beamRows(answer, style), ...beamDetailRows(answer, style)]),
    ...section('At the peak of the pulse', pulsedBeamRows(answer, style)),
    ...section('Nonlinear phase', nonlinearRows(answer, style)),
    ...cautionSection(answer.cautions),
    ...sourceSection(answer, style),
  ];
  const text = lines.map((l) => l.trimEnd()).join('\n');
  return `${style.ascii ? text.split('\n').map(toAscii).join('\n') : text}\n`;
}

const length = (text: string): number => [...text].length;
const pad = (text: string, width: number): string => text + ' '.repeat(Math.max(0, width - length(text)));

function mediaTable(answer: Answer, style: PresentStyle): readonly string[] {
  const lambda = answer.wave.vacuumWavelength_m;
  const left = [
    ...mediumRows(answer.from, lambda, style),
    ...waveEnergyRows(answer.energy?.incident ?? null, style),
  ];
  const right = [
    ...mediumRows(answer.into, lambda, style),
    ...waveEnergyRows(answer.energy?.transmitted ?? null, style),
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

const LABEL_AT = 38;

/** Symbol, value, label; a label that has no room beside a long value stands below it. */
function oneValue({ symbol, text, label }: Shown): readonly string[] {
  const head = pad(`  ${symbol}`, 17);
  const value = `${head} ${text}`;
  const beside = `${pad(value, LABEL_AT - 1)} ${label}`;
  if (length(beside) <= WIDTH) return [beside];
  return [value, ...wrap(label, WIDTH - LABEL_AT).map((line) => ' '.repeat(LABEL_AT) + line)];
}

function section(title: string, rows: readonly Shown[]): readonly string[] {
  return rows.length === 0 ? [] : ['', title, ...rows.flatMap(oneValue)];
}

function layerSection(answer: Answer, style: PresentStyle): readonly string[] {
  if (answer.layers.length === 0) return [];
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
