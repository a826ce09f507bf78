/** The page of the order check of the present path: every remark with its level as a word and as a mark. */
import type { Question } from '../../answer/question.ts';
import { isRefusal, type Refusal } from '../../medium/refusal.ts';
import { type OrderRow, orderPage } from '../../present/order-page.ts';
import { wrap } from '../../present/wrap.ts';
import type { Level } from '../../selection/order/finding.ts';
import { type OrderReport, orderReport } from '../../selection/order/order-report.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import type { Role } from '../theme.ts';
import type { World } from '../world.ts';
import { cautionLines } from './caution-lines.ts';
import { laidOut, type PageLine, pageLine } from './page-line.ts';

const MARKS: Readonly<Record<Level, readonly [string, Role]>> = {
  stop: ['x', 'hazard'],
  look: ['!', 'caution'],
  fine: ['-', 'note'],
};

const made = new WeakMap<Question, OrderReport | Refusal>();

export function orderLines(
  question: Question,
  style: NumberStyle,
  world: World,
  width: number,
): readonly PageLine[] {
  const report = made.get(question) ?? orderReport(world.survey(), [question]);
  made.set(question, report);
  if (isRefusal(report)) return [pageLine(`${report.message}; ${report.remedy}`, 'caution', 'x')];
  const { headline, circumstances, summary, sections, sources } = orderPage(report, style);
  const { askSupplier, beamCautions } = report;
  const list = (title: string, lines: readonly PageLine[]): readonly PageLine[] =>
    lines.length === 0 ? [] : [pageLine(''), pageLine(title, 'heading'), ...lines];
  return [
    pageLine(headline, 'heading'),
    pageLine(circumstances),
    pageLine(''),
    pageLine(summary),
    ...sections.flatMap(({ title, rows }) =>
      list(
        title,
        rows.flatMap((row) => rowLines(row, width)),
      ),
    ),
    ...list(
      'Ask the supplier',
      askSupplier.map((text) => pageLine(text, 'text', '-')),
    ),
    ...list('Cautions', cautionLines(beamCautions)),
    ...list(
      'Sources',
      sources.map((text, i) => pageLine(`[${i + 1}] ${text}`)),
    ),
  ];
}

const LEVEL_COLUMN = 6;
const TEXT_COLUMN = 20;
/** Narrower, the remark stands below its level. */
const WIDE_FROM = 55;

function rowLines({ level, topic, text, source }: OrderRow, width: number): readonly PageLine[] {
  const [mark, role] = MARKS[level];
  const body = `${text} [${source}]`;
  if (width < WIDE_FROM) return [pageLine(`${level}, ${topic}: ${body}`, role, mark)];
  const [first = '', ...rest] = wrap(body, width - TEXT_COLUMN - MARK_WIDTH);
  const head = (level.padEnd(LEVEL_COLUMN) + topic).padEnd(TEXT_COLUMN);
  return [
    laidOut(head + first, role, mark),
    ...rest.map((line) => laidOut(' '.repeat(TEXT_COLUMN + MARK_WIDTH) + line)),
  ];
}

/** A marked line begins a column further in. */
const MARK_WIDTH = 1;
