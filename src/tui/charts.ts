/** The curves of a question as charts: over the angle, over the wave, the indices, the field. The same as on the command line. */
import { angleCurve } from '../answer/angle-curve.ts';
import type { Answer } from '../answer/answer.ts';
import { curvePath } from '../answer/curve-path.ts';
import { fieldCurve } from '../answer/field-curve.ts';
import { dispersiveMedia, indexCurve } from '../answer/index-curve.ts';
import type { SourceOf } from '../answer/medium-side.ts';
import type { Question } from '../answer/question.ts';
import { waveCurve } from '../answer/wave-curve.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { angleChart, fieldChart, indexChart, powerChart } from '../plot/answer-charts.ts';
import type { Chart } from '../plot/chart.ts';
import { quantityOf } from '../plot/wave-axis.ts';

export const CURVE_KINDS = ['angle', 'wave', 'index', 'field'] as const;
export type CurveKind = (typeof CURVE_KINDS)[number];

/** A screen has no more dots than this, and a key must not wait. */
const LIMITS = { least: 241, most: 1500 } as const;
const INDEX_POINTS = 61;

export function chartOf(
  kind: CurveKind,
  question: Question,
  answer: Answer,
  sourceOf: SourceOf,
): Chart | Refusal {
  if (kind === 'field') {
    const curve = fieldCurve(question, answer, sourceOf);
    return isRefusal(curve) ? curve : fieldChart(answer, curve);
  }
  const path = curvePath(question, sourceOf);
  if (isRefusal(path)) return path;
  if (kind === 'angle') return angleChart(answer, angleCurve(path, answer, undefined, LIMITS));
  const powers = waveCurve(path, undefined, LIMITS);
  const quantity = quantityOf(question.wave.text);
  if (kind === 'wave') return powerChart(answer, powers, quantity);
  const media = dispersiveMedia(path.media);
  const medium = media.find(({ spec }) => spec === question.into) ?? media[0];
  if (!medium) {
    return refuse(
      'no-dispersion',
      3,
      'no dispersion is known of these media',
      'choose a solid or a liquid of the catalogue',
    );
  }
  const step = Math.ceil(powers.wavelength_m.length / INDEX_POINTS);
  const waves = powers.wavelength_m.filter((_, i) => i % step === 0 || i === powers.wavelength_m.length - 1);
  return indexChart(answer, indexCurve(medium, question, waves, sourceOf), powers, quantity);
}

/** Where the question itself stands on the axis of its chart. */
export function ownPlace(kind: CurveKind, answer: Answer, chart: Chart): number {
  if (kind === 'angle') return (answer.geometry.incidenceAngle_rad * 180) / Math.PI;
  return kind === 'field' ? 0 : (chart.marks?.find(({ label }) => label.startsWith('here'))?.x ?? 0);
}

/** Keeps the charts of each answer while it is on screen: moving the cursor works nothing out. */
export class Charts {
  readonly #known = new WeakMap<Answer, Map<CurveKind, Chart | Refusal>>();
  readonly #sourceOf: SourceOf;

  constructor(sourceOf: SourceOf) {
    this.#sourceOf = sourceOf;
  }

  get(kind: CurveKind, question: Question, answer: Answer): Chart | Refusal {
    const ofAnswer = this.#known.get(answer) ?? new Map<CurveKind, Chart | Refusal>();
    this.#known.set(answer, ofAnswer);
    const chart = ofAnswer.get(kind) ?? chartOf(kind, question, answer, this.#sourceOf);
    ofAnswer.set(kind, chart);
    return chart;
  }
}
