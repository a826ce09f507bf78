/** The pulse part of the answer: a gaussian pulse through the path, and its peak power where an energy is known. */
import type { CautionNote } from '../medium/caution.ts';
import { peakFluence_J_per_m2 } from '../stack/beam.ts';
import { broadenedDuration_s, peakPower_W, TIME_BANDWIDTH, thirdOrderRatio } from '../stack/pulse.ts';
import type { PulseAnswer } from './answer.ts';
import type { Question } from './question.ts';
import type { StackParts } from './stack-answer.ts';

/** Third order beyond this share of the second distorts a gaussian noticeably. */
const THIRD_ORDER_MATTERS = 1;

export function pulseAnswer(question: Question, parts: StackParts | null): PulseAnswer | null {
  const { beam } = question;
  const wide = beam?.kind === 'power' || beam?.kind === 'pulse' ? beam : undefined;
  const train = wide?.pulse;
  const durationIn_s = question.pulseDuration_s ?? train?.duration_s;
  if (durationIn_s === undefined) return null;
  const dispersed = dispersionOf(parts, question);
  const gdd_s2 = dispersed?.gdd_s2 ?? 0;
  const tod_s3 = dispersed?.tod_s3 ?? null;
  const ratio = tod_s3 === null ? null : thirdOrderRatio(durationIn_s, gdd_s2, tod_s3);
  return {
    durationIn_s,
    durationOut_s: broadenedDuration_s(durationIn_s, gdd_s2),
    gdd_s2,
    tod_s3,
    thirdOrderRatio: ratio !== null && Number.isFinite(ratio) ? ratio : null,
    timeBandwidthProduct: TIME_BANDWIDTH.gaussian,
    peakPower_W: train ? peakPower_W(train.energy_J, durationIn_s, 'gaussian') : null,
    peakFluence_J_per_m2:
      train && wide?.diameter_m !== undefined
        ? peakFluence_J_per_m2(train.energy_J, wide.diameter_m / 2, wide.profile)
        : null,
  };
}

/** GDD and TOD of the whole: of the window where there is one, else of the coherent stack, else of the slabs one by one. */
function dispersionOf(
  parts: StackParts | null,
  question: Question,
): { readonly gdd_s2: number; readonly tod_s3: number | null } | null {
  if (!parts) return null;
  const { window, stack, layers } = parts;
  if (window?.gdd_s2 != null) return { gdd_s2: window.gdd_s2, tod_s3: window.tod_s3 };
  const coherent = question.polarization === 'p' ? stack.transmissionP : stack.transmissionS;
  if (coherent) return { gdd_s2: coherent.gdd_s2, tod_s3: null };
  let gdd_s2 = 0;
  let tod_s3: number | null = 0;
  for (const { medium, thickness_m } of layers) {
    gdd_s2 += (medium.absolute.gvd_s2_per_m ?? 0) * thickness_m;
    const tod: number | null = medium.absolute.tod_s3_per_m;
    tod_s3 = tod === null || tod_s3 === null ? null : tod_s3 + tod * thickness_m;
  }
  return { gdd_s2, tod_s3 };
}

export function pulseNotes(pulse: PulseAnswer): readonly CautionNote[] {
  if (pulse.thirdOrderRatio === null || pulse.thirdOrderRatio < THIRD_ORDER_MATTERS) return [];
  const text =
    'third-order dispersion outweighs the second here: the gaussian broadening is not to be trusted';
  return [{ code: 'approximation', details: { text } }];
}
