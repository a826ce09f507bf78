/** Refractive and group index of several media over one span of wavelengths: where each has data of its own, and nowhere else. */
import type { Conditions } from '../dispersion/evaluator.ts';
import { isCovered, mediumForCurves } from './curve-path.ts';
import { spacedPoints, withPoints } from './curve-points.ts';
import { dispersiveMedia, type IndexCurve, indexCurve } from './index-curve.ts';
import type { SourceOf } from './medium-side.ts';
import type { MediumSpec } from './question.ts';
import { LINEAR_UP_TO, type Span_m, usualSpan } from './wave-curve.ts';

export interface DispersionCurves {
  readonly span_m: Span_m;
  /** One for each medium, in their order, all at the same wavelengths. */
  readonly curves: readonly IndexCurve[];
}

const POINTS = 361;

/**
 * @param waves_m wavelengths in vacuum that are to be among the points
 * @param span_m what to show; else what the condensed media among them cover around these waves
 */
export function dispersionCurves(
  specs: readonly MediumSpec[],
  waves_m: readonly number[],
  conditions: Conditions,
  span_m: Span_m | undefined,
  sourceOf: SourceOf,
): DispersionCurves {
  const asked = { conditions, extrapolate: false };
  const media = specs.map((spec) => mediumForCurves(spec, asked));
  const condensed = dispersiveMedia(media);
  const shown = span_m ?? spanOver(condensed.length > 0 ? condensed : media, waves_m);
  const [low, high] = shown;
  const points = withPoints(spacedPoints(low, high, POINTS, high / low > LINEAR_UP_TO), waves_m);
  return { span_m: shown, curves: media.map((medium) => indexCurve(medium, asked, points, sourceOf)) };
}

/** From the least to the greatest wavelength that any of the media reaches from any of the waves. */
function spanOver(media: Parameters<typeof dispersiveMedia>[0], waves_m: readonly number[]): Span_m {
  const spans = waves_m.flatMap((wavelength_m) =>
    media
      .filter((medium) => isCovered([medium], wavelength_m))
      .map((medium) => usualSpan({ wavelength_m, media: [medium] })),
  );
  if (spans.length === 0) return usualSpan({ wavelength_m: waves_m[0] ?? 0, media });
  return [Math.min(...spans.map(([low]) => low)), Math.max(...spans.map(([, high]) => high))];
}
