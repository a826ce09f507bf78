/** One letter for what a buyer must not overlook, and a legend of the letters used. Never a statement that something is safe. */
import type { MediumAnswer } from '../../answer/answer.ts';
import type { MaterialFacts } from '../../selection/material-facts.ts';
import type { Warming } from '../../selection/warming.ts';

export interface Mark {
  readonly letter: string;
  readonly meaning: string;
}

const MARKS = {
  toxic: { letter: 'T', meaning: 'toxic' },
  hazardous: { letter: 'H', meaning: 'another hazard on file' },
  yes: { letter: 'W', meaning: 'takes up water' },
  slightly: { letter: 'w', meaning: 'takes up water slightly' },
  film: { letter: 'F', meaning: 'film: the index depends on the process' },
  recalled: { letter: 'C', meaning: 'recalled data, to be verified (grade C)' },
  'first-order': { letter: '1', meaning: 'brought to the temperature by a single dn/dT: first order' },
  'not-modelled': { letter: '0', meaning: 'no thermal data: n is that at the temperature of the fit' },
} as const satisfies Readonly<Record<string, Mark>>;

export function marksOf(
  facts: MaterialFacts,
  medium: MediumAnswer | null,
  warming: Warming = 'none',
): readonly Mark[] {
  const fit = medium?.fit;
  return [
    ...(facts.hazardLevel === 'toxic' ? [MARKS.toxic] : []),
    ...(facts.hazardLevel === 'hazardous' ? [MARKS.hazardous] : []),
    ...(facts.hygroscopic === 'yes' ? [MARKS.yes] : []),
    ...(facts.hygroscopic === 'slightly' ? [MARKS.slightly] : []),
    ...(facts.class === 'thin film' ? [MARKS.film] : []),
    ...(fit?.grade === 'C' && fit.accuracy !== 0 ? [MARKS.recalled] : []),
    ...(warming === 'none' ? [] : [MARKS[warming]]),
  ];
}

/** "T toxic; W takes up water; no mark is no statement of safety". */
export function legendOf(used: readonly Mark[]): string {
  const all = Object.values(MARKS).filter((mark) => used.some((u) => u.letter === mark.letter));
  return [
    ...all.map((mark) => `${mark.letter} ${mark.meaning}`),
    'a line without a hazard mark is no statement of safety',
  ].join('; ');
}
