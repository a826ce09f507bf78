/** What the part takes of the beam, face by face and in all, and what a single-layer coating would save. */
import type { Answer } from '../../answer/answer.ts';
import { insertionLoss_dB, slabFractions } from '../../stack/window.ts';
import type { Survey } from '../survey.ts';
import { type CoatingChoice, coatingChoice, type FilmChoice } from './coating-choice.ts';
import { computed, type Finding, labelOf } from './finding.ts';
import { length, number, percent, watts } from './shown-numbers.ts';
import { type Face, faceFractions, type Subject } from './subject.ts';

/** A loss below this is hardly worth a coating run. */
const WORTH = 0.01;
const FRESNEL = 'Fresnel reflection, all orders summed as intensities (Stokes 1862)';

export function lossFinding(subjects: readonly Subject[], answer: Answer, power_W: number | null): Finding {
  const T = answer.stack?.T ?? answer.interface.T;
  const lost = T === null ? answer.interface.R : 1 - T;
  const faces =
    subjects.length === 1 ? subjects.flatMap((s) => ownFaces(s, answer)) : boundaries(subjects, answer);
  const ofBeam = power_W === null ? '' : `, ${watts(lost * power_W)} of ${watts(power_W)}`;
  const inAll = `${percent(lost, 4)} in all${ofBeam}`;
  const loss_dB = insertionLoss_dB(1 - lost);
  const decibels = loss_dB === null ? '' : ` (${number(loss_dB)} dB)`;
  return {
    topic: 'loss',
    level: lost > WORTH ? 'look' : 'fine',
    about: 'part',
    text: `reflected: ${faces.join(', ')}; lost ${inAll}${decibels}`,
    source: computed(FRESNEL),
  };
}

function ownFaces({ medium, front, back }: Subject, answer: Answer): readonly string[] {
  const text = (side: string, face: Face | null): readonly string[] => {
    if (!face) return [];
    const beside = face.isOuter ? '' : ` beside ${labelOf(face.outside)}`;
    const coated = face.films.length > 0 ? ', coated,' : '';
    return [`${side} face${beside}${coated} ${percent(faceFractions(face, medium, answer).R, 4)}`];
  };
  return [...text('front', front), ...text('back', back)];
}

/** Of several parts in a row: each kind of boundary once. */
function boundaries(subjects: readonly Subject[], answer: Answer): readonly string[] {
  const texts = new Map<string, string>();
  for (const { medium, front, back } of subjects) {
    for (const face of [front, back]) {
      if (!face) continue;
      const coated = face.films.length > 0 ? ', coated' : '';
      const pair = [labelOf(face.outside), labelOf(medium)].sort().join(' and ') + coated;
      texts.set(pair, `${percent(faceFractions(face, medium, answer).R, 4)} between ${pair}`);
    }
  }
  return [...texts.values()];
}

/** Of the bare faces towards a gas. */
export function coatingFindings(
  survey: Survey,
  subjects: readonly Subject[],
  answer: Answer,
): readonly Finding[] {
  return subjects.flatMap((subject) => {
    const bare = [subject.front, subject.back].filter(
      (face): face is Face => face?.isOuter === true && face.films.length === 0,
    );
    const [face] = bare;
    if (!face) return coatedFinding(subject, answer);
    const choice = coatingChoice(survey, face, subject.medium, answer);
    if (!choice) return [];
    return [suggestion(choice, bare, subject)];
  });
}

function suggestion(choice: CoatingChoice, bare: readonly Face[], subject: Subject): Finding {
  const { bareR, idealIndex, idealThickness_m, films } = choice;
  const base = { topic: 'coating' as const, about: labelOf(subject.medium) };
  if (bareR < WORTH / 2) {
    return {
      ...base,
      level: 'fine',
      text: `a bare face reflects ${percent(bareR)}: a single layer has little to save`,
      source: computed('Fresnel reflection'),
    };
  }
  const [best, second] = films;
  const ideal = `ideal single layer at normal incidence: index ${number(idealIndex, 4)}, ${length(idealThickness_m)} thick`;
  const source = computed('quarter-wave film, coherent sum; film indices depend on the process');
  const ask =
    'ask the coater for what can be had at this wave and angle (halfspace coat tries films you name)';
  if (!best)
    return {
      ...base,
      level: 'look',
      text: `${ideal}; no film on file has data at this wave: ${ask}`,
      source,
    };
  const left = best.R + best.A;
  if (left >= bareR) {
    return {
      ...base,
      level: 'look',
      text: `${ideal}; no film on file lowers the reflection here: ${ask}`,
      source,
    };
  }
  const saved = bare.length === 2 ? savedByBoth(bareR, best, subject) : bareR - left;
  const faces = bare.length === 2 ? 'on both faces' : 'on one face';
  const also = second && second.R + second.A < bareR ? `; next ${filmText(second)}` : '';
  return {
    ...base,
    level: saved > WORTH ? 'look' : 'fine',
    text: `best on file ${filmText(best)}: ${faces} it saves ${percent(saved)} of the beam${also}; ${ideal}; two layers and more: halfspace coat`,
    source,
  };
}

const filmText = ({ material, medium, thickness_m, R, A }: FilmChoice): string =>
  `${material.key} (n ${number(medium.n)}, ${length(thickness_m, 3)}), leaving ${percent(R + A, 2)} a face`;

/** Both faces coated alike. */
function savedByBoth(bareR: number, { R, A }: FilmChoice, { layer }: Subject): number {
  const tau = layer?.answer.internalTransmittance ?? 1;
  const coated = slabFractions(R, R, tau).T * (1 - A) ** 2;
  return coated - slabFractions(bareR, bareR, tau).T;
}

/** What films on the path do already. */
function coatedFinding(subject: Subject, answer: Answer): readonly Finding[] {
  const faces = [subject.front, subject.back].filter(
    (face): face is Face => face !== null && face.films.length > 0,
  );
  return faces.map((face) => {
    const coated = faceFractions(face, subject.medium, answer);
    const bare = faceFractions(face, subject.medium, answer, []);
    const left = coated.R + coated.A;
    const names = face.films
      .map((film) => `${labelOf(film.medium)} ${length(film.thickness_m, 3)}`)
      .join(' + ');
    return {
      topic: 'coating',
      level: left < bare.R ? 'fine' : 'look',
      about: labelOf(subject.medium),
      text: `${names} leaves ${percent(left)} at the face to ${labelOf(face.outside)}, ${percent(bare.R)} bare`,
      source: computed('coherent sum over the films as stated'),
    };
  });
}
