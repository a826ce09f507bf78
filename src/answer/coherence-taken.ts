/**
 * The coherence length a path is answered with, and where it comes from: stated by the person; else that of a gaussian pulse
 * of the stated duration, c FWHM/0.4413 (its transform-limited bandwidth), where it is shorter than what is assumed; else
 * 1000 wavelengths, light of a relative width of 1/1000: films are coherent then, windows are not.
 */
import { TIME_BANDWIDTH } from '../stack/pulse.ts';
import { SPEED_OF_LIGHT_m_per_s } from '../units/constants.ts';
import type { Question } from './question.ts';

export const ASSUMED_COHERENCE_waves = 1000;

export interface CoherenceTaken {
  readonly length_m: number;
  readonly ground: 'stated' | 'pulse' | 'assumed';
}

export function coherenceTaken(question: Question, vacuumWavelength_m: number): CoherenceTaken {
  if (question.coherenceLength_m !== undefined) {
    return { length_m: question.coherenceLength_m, ground: 'stated' };
  }
  const assumed_m = ASSUMED_COHERENCE_waves * vacuumWavelength_m;
  const { beam, pulseDuration_s } = question;
  const train = beam?.kind === 'power' || beam?.kind === 'pulse' ? beam.pulse : undefined;
  const duration_s = pulseDuration_s ?? train?.duration_s;
  const ofPulse_m =
    duration_s === undefined
      ? Number.POSITIVE_INFINITY
      : (SPEED_OF_LIGHT_m_per_s * duration_s) / TIME_BANDWIDTH.gaussian;
  return ofPulse_m < assumed_m
    ? { length_m: ofPulse_m, ground: 'pulse' }
    : { length_m: assumed_m, ground: 'assumed' };
}
