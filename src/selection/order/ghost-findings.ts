/** Ghost beams and stray power, fringes between the faces, and the wedge that parts them. */
import type { Answer } from '../../answer/answer.ts';
import { computed, type Finding } from './finding.ts';
import { degrees, hertz, length, number, percent, share } from './shown-numbers.ts';
import type { Subject } from './subject.ts';

/** A ghost fainter than this is below what scatter makes. */
const FAINT = 1e-4;
/** Fringes below a hundredth of the power pass for noise. */
const RIPPLE_dB = 0.05;
/** 30 minutes of arc: the wedge that window makers usually offer. From memory. */
const USUAL_WEDGE_rad = (0.5 * Math.PI) / 180;
/** Fringes across the beam that average out. */
const FRINGES = 5;

/** Of a single plate, from the answer's list of beams. */
export function ghostFinding(answer: Answer, power_W: number | null): Finding | null {
  const { window, geometry } = answer;
  if (!window) return surfaceStray(answer, power_W);
  const [direct = 0, ghost = 0] = window.transmittedBeams;
  const [first = 0, second = 0] = window.reflectedBeams;
  const stray = first + second + ghost;
  return {
    topic: 'ghosts',
    level: stray > FAINT ? 'look' : 'fine',
    about: 'part',
    text: `${backWords(geometry.incidenceAngle_rad)} ${share(first, power_W)} from the first face and ${share(second, power_W)} from the second; behind it a first ghost of ${share(ghost, power_W)} beside the direct ${percent(direct)}; block or dump each`,
    source: computed('beams of a plane plate one by one'),
  };
}

const backWords = (angle_rad: number): string =>
  angle_rad === 0 ? 'straight back' : `back at ${degrees(angle_rad, 1)} from the normal`;

function surfaceStray(answer: Answer, power_W: number | null): Finding {
  const { R } = answer.interface;
  const back = share(R, power_W);
  return {
    topic: 'ghosts',
    level: R > FAINT ? 'look' : 'fine',
    about: 'part',
    text: `${backWords(answer.geometry.incidenceAngle_rad)} ${back}: block or dump it`,
    source: computed('reflectance of the whole path'),
  };
}

export function fringeFinding(
  subjects: readonly Subject[],
  answer: Answer,
  beam_m: number | null,
): Finding | null {
  const { window } = answer;
  const [subject] = subjects;
  if (!window || !subject) return null;
  const { ripple_dB, freeSpectralRange_Hz, freeSpectralRange_m } = window.etalon;
  const { n } = subject.medium;
  const ripple = ripple_dB === null ? 'no light comes through' : `up to ${number(ripple_dB)} dB`;
  const spacing =
    freeSpectralRange_Hz === null || freeSpectralRange_m === null
      ? ''
      : ` every ${hertz(freeSpectralRange_Hz)} (${length(freeSpectralRange_m, 3)})`;
  const ghost = window.wedgeGhostSeparation_rad_per_rad * USUAL_WEDGE_rad;
  const turn = window.wedgeDeviation_rad_per_rad * USUAL_WEDGE_rad;
  const across =
    beam_m === null
      ? ''
      : `; ${FRINGES} fringes across the beam need ${degrees((FRINGES * answer.wave.vacuumWavelength_m) / (2 * n * beam_m), 3)} at least`;
  const faint = ripple_dB !== null && ripple_dB < RIPPLE_dB;
  return {
    topic: 'fringes',
    level: faint ? 'fine' : 'look',
    about: 'part',
    text: faint
      ? `parallel faces make fringes of ${ripple} only${spacing}`
      : `parallel faces make fringes of ${ripple}${spacing} for light of a narrower line; a wedge of 30' turns the first ghost by ${degrees(ghost)} and the beam by ${degrees(turn)}${across}`,
    source: computed(
      'Airy function of a plane plate (Born & Wolf 7.6); 30 minutes of arc are common practice',
    ),
  };
}
