/** The curve that is open: its chart, how much room it has, what the cursor reads off. */
import { isRefusal, type Refusal } from '../../medium/refusal.ts';
import type { Chart } from '../../plot/chart.ts';
import { DEFAULT_DIGITS } from '../../plot/chart.ts';
import { readOff } from '../../plot/series-read-off.ts';
import type { TextChartOptions } from '../../plot/text-layout.ts';
import { valueText } from '../../plot/tick-text.ts';
import { clusters } from '../../term/display-width.ts';
import { toAscii } from '../../units/to-ascii.ts';
import { ownPlace } from '../charts.ts';
import { answerOf, type State } from '../state.ts';
import type { World } from '../world.ts';
import type { Plan } from './plan.ts';

/** The chart; a refusal where there is none; undefined where no curve is open or nothing is answered. */
export function openChart(state: State, world: World): Chart | Refusal | undefined {
  const answer = answerOf(state);
  return state.curve && answer ? world.chart(state.curve.kind, state.question, answer) : undefined;
}

/** The value of x under the cursor: where the question stands, until the cursor is moved. */
export function cursorPlace(state: State, chart: Chart): number {
  const answer = answerOf(state);
  if (!state.curve || !answer) return 0;
  return state.curve.cursor ?? ownPlace(state.curve.kind, answer, chart);
}

/** Below the numbers where there is room for both, else in their place. */
export function curveRows(plan: Plan): number {
  return plan.curve > 0 ? plan.curve : plan.strip + plan.joint + plan.body;
}

export function chartOptions(state: State, chart: Chart, plan: Plan): TextChartOptions {
  return {
    width: plan.columns - 2,
    height: curveRows(plan),
    level: state.preferences.glyphs,
    cursor: cursorPlace(state, chart),
    clusters: (text) => [...clusters(text)],
  };
}

/** "angle of incidence 45°: R_s 8.244 %, R_p 0.6796 %, mean 4.462 %"; why there is no curve, where there is none. */
export function readingText(state: State, world: World): string {
  const chart = openChart(state, world);
  if (!chart) return '';
  if (isRefusal(chart)) return `${chart.message}; ${chart.remedy}`;
  const ascii = state.preferences.glyphs === 'ascii';
  const x = cursorPlace(state, chart);
  const values = chart.series.map((series) => {
    const y = valueText(readOff(chart, series, x), chart.y, chart.y.digits ?? DEFAULT_DIGITS, ascii);
    return `${series.label} ${y}`;
  });
  const outside = (chart.hatched ?? [])
    .filter(({ from, to }) => x >= Math.min(from, to) && x <= Math.max(from, to))
    .map(({ label }) => label);
  const at = valueText(Number(x.toPrecision(9)), chart.x, 'shortest', ascii);
  const text = `${chart.x.label} ${at}: ${[...values, ...outside].join(', ')}`;
  return ascii ? toAscii(text) : text;
}
