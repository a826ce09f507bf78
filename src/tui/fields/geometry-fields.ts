/** Angle of incidence, polarization, stated tolerances, and the wish to go beyond the data. */
import type { Polarization, Question, Tolerances } from '../../answer/question.ts';
import { DEGREE } from '../../units/display-unit.ts';
import { formatQuantity } from '../../units/format-quantity.ts';
import { parseIncidence } from '../../units/parse-angle.ts';
import { choiceParser } from '../../units/parse-choice.ts';
import { parseTolerances, wavelengthTolerance_m } from '../../units/parse-tolerance.ts';
import { isProblem, type Problem } from '../../units/problem.ts';
import { type Field, isUnset, stepOnGrid } from './field.ts';

const PER_RADIAN = 180 / Math.PI;
const STEEPEST_deg = 89.99;

/** Degrees as a person would write them: at most four decimals. */
export function degreesOf(angle_rad: number): number {
  return Number((angle_rad * PER_RADIAN).toFixed(4));
}

export const ANGLE_FIELD: Field = {
  id: 'angle',
  label: 'angle',
  kind: 'text',
  hint: 'angle from the surface normal: 45, 0.78rad, 30mrad',
  applies: () => true,
  show: ({ question }, style) =>
    formatQuantity(degreesOf(question.incidenceAngle_rad), DEGREE, 'shortest', { style }),
  draft: ({ question }) => String(degreesOf(question.incidenceAngle_rad)),
  take: (text, { question }) => {
    const angle_rad = parseIncidence(text);
    return isProblem(angle_rad) ? angle_rad : { ...question, incidenceAngle_rad: angle_rad };
  },
  step: (count, { question }) => {
    const next = stepOnGrid(question.incidenceAngle_rad * PER_RADIAN, count, 1);
    const degrees = Math.max(0, Math.min(STEEPEST_deg, next));
    return { ...question, incidenceAngle_rad: degrees / PER_RADIAN };
  },
};

const POLARIZATIONS: readonly Polarization[] = ['unpolarized', 's', 'p'];
const parsePolarization = choiceParser('a polarization', POLARIZATIONS);

export const POLARIZATION_FIELD: Field = {
  id: 'polarization',
  label: '',
  kind: 'choice',
  hint: 'polarization: s, p, or unpolarized (the mean; the strip shows s)',
  applies: () => true,
  show: ({ question: { polarization } }) =>
    polarization === 'unpolarized' ? 'unpolarized' : `${polarization} polarized`,
  draft: ({ question }) => question.polarization,
  take: (text, { question }) => {
    const word = parsePolarization(text.replace(/^\s*([sp])[- ]?polari[sz]ed\s*$/i, '$1'));
    return isProblem(word) ? word : { ...question, polarization: word };
  },
  step: (count, { question }) => {
    const at = POLARIZATIONS.indexOf(question.polarization);
    const next = POLARIZATIONS.at((at + (count > 0 ? 1 : -1)) % POLARIZATIONS.length);
    return next && { ...question, polarization: next };
  },
  pick: (letter, { question }) => {
    const polarization = POLARIZATIONS.find((word) => word.startsWith(letter));
    return polarization && { ...question, polarization };
  },
};

function takeTolerances(text: string, question: Question): Question | Problem {
  if (isUnset(text)) return { ...question, tolerances: {} };
  const stated = parseTolerances(text);
  if (isProblem(stated)) return stated;
  const { wave, ...others } = stated;
  const tolerances: Tolerances = wave
    ? { ...others, wavelength_m: wavelengthTolerance_m(wave, question.wave.wavelength_m) }
    : others;
  return { ...question, tolerances };
}

const TOLERANCE_TEXTS: readonly (readonly [keyof Tolerances, (x: number) => string])[] = [
  ['wavelength_m', (x) => `wave=${tidy(x * 1e9)}nm`],
  ['angle_rad', (x) => `angle=${tidy(x * PER_RADIAN)}deg`],
  ['index', (x) => `n=${tidy(x)}`],
  ['indexFrom', (x) => `n1=${tidy(x)}`],
  ['temperature_K', (x) => `temperature=${tidy(x)}K`],
  ['thickness_m', (x) => `thickness=${tidy(x * 1e9)}nm`],
];

const tidy = (x: number): string => String(Number(x.toPrecision(9)));

export function tolerancesText(tolerances: Tolerances): string {
  const parts = TOLERANCE_TEXTS.flatMap(([name, write]) => {
    const value = tolerances[name];
    return value === undefined ? [] : [write(value)];
  });
  return parts.join(',');
}

export const TOLERANCE_FIELD: Field = {
  id: 'tolerance',
  label: 'tolerance',
  kind: 'text',
  takesWords: true,
  hint: 'uncertainties of what you state: wave=1nm,angle=0.5deg,n=1e-4',
  applies: () => true,
  show: ({ question }) => tolerancesText(question.tolerances) || 'none',
  draft: ({ question }) => tolerancesText(question.tolerances),
  take: (text, { question }) => takeTolerances(text, question),
  step: () => undefined,
};

export const EXTRAPOLATE_FIELD: Field = {
  id: 'extrapolate',
  label: 'beyond the fits',
  kind: 'choice',
  hint: 'fits used outside their range: no digit is vouched for there',
  applies: ({ question }) => question.extrapolate,
  show: ({ question }) => (question.extrapolate ? 'extrapolated' : 'refused'),
  draft: ({ question }) => (question.extrapolate ? 'extrapolated' : 'refused'),
  take: (text, { question }) => ({ ...question, extrapolate: /^(?:e|y|on)/i.test(text.trim()) }),
  step: (_, { question }) => ({ ...question, extrapolate: !question.extrapolate }),
};
