/** The curves of a plot and the charts made of them. */
import { type AngleCurve, angleCurve } from '../../answer/angle-curve.ts';
import type { Answer } from '../../answer/answer.ts';
import { curvePath } from '../../answer/curve-path.ts';
import { type FieldCurve, fieldCurve } from '../../answer/field-curve.ts';
import { dispersiveMedia, type IndexCurve, indexCurve } from '../../answer/index-curve.ts';
import type { SourceOf } from '../../answer/medium-side.ts';
import type { Question } from '../../answer/question.ts';
import { type WaveCurve, waveCurve } from '../../answer/wave-curve.ts';
import { isRefusal, type Refusal } from '../../medium/refusal.ts';
import { angleChart, fieldChart, indexChart, powerChart } from '../../plot/answer-charts.ts';
import type { Chart } from '../../plot/chart.ts';
import type { PlotRequest } from './read-plot.ts';

export type Curve = AngleCurve | WaveCurve | IndexCurve | FieldCurve;

export interface Plot {
  readonly kind: PlotRequest['kind'];
  readonly curves: readonly Curve[];
  /** One for each curve. */
  readonly charts: readonly Chart[];
  /** What must be said of the curves. */
  readonly notes: readonly string[];
}

/** More panels than this are no help. */
const MOST_MEDIA = 3;
/** An index bends less than the fringes that the points of the powers are for. */
const MOST_INDEX_POINTS = 600;
const TOO_FINE =
  'the fringes of this path are finer than the points of the curve, which shows their beat; narrow --span';

export function plotOf(
  request: PlotRequest,
  question: Question,
  answer: Answer,
  sourceOf: SourceOf,
): Plot | Refusal {
  const { kind } = request;
  if (kind === 'field') {
    const curve = fieldCurve(question, answer, sourceOf);
    if (isRefusal(curve)) return curve;
    return { kind, curves: [curve], charts: [fieldChart(answer, curve)], notes: [] };
  }
  const path = curvePath(question, sourceOf);
  if (isRefusal(path)) return path;
  if (kind === 'angle') {
    const curve = angleCurve(path, answer, request.span_rad);
    const notes = curve.isTooFine ? [TOO_FINE] : [];
    return { kind, curves: [curve], charts: [angleChart(answer, curve)], notes };
  }
  const powers = waveCurve(path, request.span_m);
  const indices = dispersiveMedia(path.media)
    .slice(0, MOST_MEDIA)
    .map((medium) => indexCurve(medium, question, thinned(powers.wavelength_m), sourceOf));
  return {
    kind,
    curves: [powers, ...indices],
    charts: [
      powerChart(answer, powers, request.quantity),
      ...indices.map((curve) => indexChart(answer, curve, powers, request.quantity)),
    ],
    notes: [
      ...(powers.isTooFine ? [TOO_FINE] : []),
      ...(answer.layers.length === 0 && powers.T.some(Number.isFinite) ? ['T = 1 - R at a surface'] : []),
    ],
  };
}

/** Some of the points, evenly chosen; the last one among them. */
function thinned(points: readonly number[]): readonly number[] {
  const step = Math.ceil(points.length / MOST_INDEX_POINTS);
  return points.filter((_, i) => i % step === 0 || i === points.length - 1);
}
