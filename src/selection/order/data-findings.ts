/** Are the data good at this wave: range, grade, accuracy, disagreement of sources; for the part and for every film on it. */
import type { Answer, Caution, MediumAnswer } from '../../answer/answer.ts';
import { type Finding, type FindingSource, labelOf } from './finding.ts';
import { howMuch } from './index-words.ts';

/** Cautions about the numbers themselves; the others have topics of their own. */
const ABOUT_DATA: ReadonlySet<string> = new Set([
  'outside-fit-range',
  'range-edge',
  'outside-confirmed-range',
  'estimate-between-bands',
  'film-process',
  'recalled-data',
  'accuracy-not-stated',
  'source-erratum',
  'source-retracted',
  'sources-disagree',
  'contradicted',
  'own-entry',
  'temperature-not-modelled',
  'axis-assumed',
  'no-dispersion',
]);

/** Worth knowing, and no reason to hold an order. */
const HARMLESS: ReadonlySet<string> = new Set([
  'accuracy-not-stated',
  'own-entry',
  'no-dispersion',
  'contradicted',
]);

export function dataFinding(medium: MediumAnswer, answer: Answer): Finding {
  // The answer says each sentence once, however many layers are of the medium: the name at its start tells whose it is.
  const own = answer.cautions.filter((c) => c.text.startsWith(`${medium.name}: `));
  const cautions = own.filter((c) => ABOUT_DATA.has(c.code));
  const beyond = medium.fit?.inRange === false;
  const doubts = cautions.filter((c) => !HARMLESS.has(c.code));
  return {
    topic: 'data',
    level: beyond ? 'stop' : doubts.length > 0 ? 'look' : 'fine',
    about: labelOf(medium),
    text: [howMuch(medium), ...cautions.map((c) => bare(c, medium))].join('; '),
    source: sourceOf(medium),
  };
}

/** Without the name that the finding bears already. */
const bare = ({ text }: Caution, { name }: MediumAnswer): string => text.replace(`${name}: `, '');

export function sourceOf({ fit }: MediumAnswer): FindingSource {
  return fit
    ? { kind: 'publication', text: fit.source.text, doi: fit.source.doi }
    : { kind: 'computed', text: 'numbers as stated in the question', doi: null };
}
