/** The curve that is open, over the whole width. */
import { isRefusal } from '../../medium/refusal.ts';
import { brailleChart } from '../../plot/braille-chart.ts';
import { chartOptions, curveRows, openChart } from '../picture/curve-reading.ts';
import { sceneOf } from '../picture/scene.ts';
import { BLANK_LINE, lineOfSpans, penOf, span } from '../view/pen.ts';
import { Lines } from './lines.tsx';
import type { ScreenProps } from './screen.tsx';

export function CurveChart({ state, world }: ScreenProps) {
  const { plan } = sceneOf(state, world);
  const pen = penOf(state);
  const chart = openChart(state, world);
  const drawn = chart && !isRefusal(chart) ? brailleChart(chart, chartOptions(state, chart, plan)) : [];
  const lines = Array.from({ length: curveRows(plan) }, (_, i) => {
    const line = drawn[i];
    return line === undefined ? BLANK_LINE : lineOfSpans([span(` ${line}`)], plan.columns, pen) || BLANK_LINE;
  });
  return <Lines text={lines.join('\n')} />;
}
