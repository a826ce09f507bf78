/**
 * The one place where cautions get their words. Every face shows these sentences; none adds its own. Nothing here ever calls
 * anything safe. Hazard lines defer to the laser safety officer, the applicable standard and local rules.
 */
import type { CautionCode, CautionNote } from '../medium/caution.ts';
import { lengthText } from '../medium/range-text.ts';
import type { Caution } from './answer.ts';

type Details = CautionNote['details'];
type Wording = readonly [Caution['level'], (d: Details, subject: string) => string];

const signed = (x: number): string => `${x < 0 ? '-' : '+'}${Math.abs(x).toExponential(1)}`;

const WORDING: Readonly<Record<CautionCode, Wording>> = {
  'outside-fit-range': [
    'caution',
    (d, s) =>
      `${s}: outside the fit's range (${d['range']}): extrapolated at your request, no digit is vouched for`,
  ],
  'source-erratum': [
    'caution',
    (d, s) => `${s}: its source has an erratum (${d['notice']}); see whether it concerns this number`,
  ],
  'source-retracted': [
    'caution',
    (d, s) => `${s}: its source was retracted (${d['notice']}); do not rely on this number`,
  ],
  'range-edge': ['note', (d, s) => `${s}: at the very edge of the fit's range (${d['range']})`],
  'outside-confirmed-range': [
    'note',
    (d, s) =>
      `${s}: inside the published range, but independent values confirm the fit only over ${d['range']}`,
  ],
  'absorbs-here': [
    'caution',
    (d, s) =>
      typeof d['depth_m'] === 'number'
        ? `${s}: absorbs here: the power falls to 1/e within ${lengthText(d['depth_m'] * 1e6, 2)}`
        : `${s}: outside its transparency range (${d['range']}): expect strong absorption, not in these numbers`,
  ],
  'absorption-not-known': ['note', (_, s) => `${s}: no absorption data reach this wave; k is taken as 0`],
  'estimate-between-bands': [
    'caution',
    (_, s) =>
      `${s}: estimate between the optical and the radio formula; molecular absorption bands are not in it`,
  ],
  'film-process': [
    'caution',
    (d, s) =>
      `${s}: index of a film depends on its deposition (here: ${d['process']})${d['spread'] ? `; spread about ${d['spread']}` : ''}`,
  ],
  hygroscopic: [
    'caution',
    (d, s) => `${s}: hygroscopic (${d['degree']}): figures hold for fresh, dry, polished surfaces`,
  ],
  toxic: ['hazard', (d, s) => `${s}: ${d['hazard']}; follow the safety data sheet and local rules`],
  'hazardous-material': [
    'caution',
    (d, s) => `${s}: ${d['hazard']}; follow the safety data sheet and local rules`,
  ],
  'recalled-data': [
    'caution',
    (_, s) =>
      `${s}: grade C: coefficients and check values were both recalled; verify against the publication`,
  ],
  'accuracy-not-stated': ['note', (_, s) => `${s}: accuracy not stated by the source`],
  'sources-disagree': [
    'caution',
    (d, s) => `${s}: two sources disagree by ${signed(Number(d['difference']))} in n, more than they state`,
  ],
  contradicted: [
    'note',
    (d, s) =>
      d['count'] === 1
        ? `${s}: a printed value elsewhere disagrees with this fit`
        : `${s}: ${d['count']} printed values elsewhere disagree with this fit`,
  ],
  'own-entry': ['note', (_, s) => `${s}: from your own catalogue folder, not from the bundled catalogue`],
  'temperature-not-modelled': [
    'caution',
    (d, s) =>
      `${s}: no thermal data: the index is that at ${typeof d['fit_C'] === 'number' ? `${d['fit_C']} C` : 'an unstated temperature'}, not at ${round(d['asked_C'])} C`,
  ],
  'temperature-first-order': [
    'caution',
    (d, s) =>
      `${s}: temperature by a single dn/dT of ${Number(d['dn_dT']).toPrecision(3)} per K (${d['range']}): first order`,
  ],
  'condition-not-used': [
    'note',
    (d, s) => `${s}: this model takes no ${String(d['condition']).replace(/_.*/, '')}; it was not used`,
  ],
  'no-dispersion': ['note', (_, s) => `${s}: a single published value: no group index, no dispersion`],
  'lossy-incidence': [
    'caution',
    () =>
      'the medium of incidence absorbs: R is |r|^2 at the surface and no fraction of power; incident and reflected wave interfere',
  ],
  'coherent-sum-not-included': ['note', () => 'interference between the surfaces is not included'],
  'no-reflection': ['note', () => 'the two media are alike for this wave: nothing is reflected'],
  'infinite-value': ['note', (d) => `${d['quantity']} has no finite value here and is given as null`],
  'momentum-convention': [
    'note',
    () =>
      'radiation pressure in Minkowski bookkeeping: the split of momentum between field and matter is a convention',
  ],
  'laser-hazard': [
    'hazard',
    () =>
      'powers and irradiances here are no laser classification; ask the laser safety officer, the applicable standard (IEC 60825-1, ANSI Z136.1) and local rules',
  ],
  'stray-reflection': [
    'hazard',
    (d) =>
      `stray reflection: treat ${d['power']} at ${d['angle']} from the normal as part of the beam: block or dump it`,
  ],
  'invisible-beam': [
    'hazard',
    () => 'invisible wavelength: no blink reflex; a visible pilot beam is reflected differently',
  ],
  'rf-exposure': [
    'hazard',
    () =>
      'field strengths near people: compare with ICNIRP 2020 or IEEE C95.1 and local rules; near fields are not plane waves',
  ],
  'damage-definition': [
    'caution',
    () =>
      'damage thresholds need the definition of area and pulse length (ISO 21254); fields inside coatings can exceed the incident one',
  ],
  'pulse-train': [
    'hazard',
    () =>
      'exposure and damage limits of pulses depend on energy, duration and number in the train: compare single pulse, train and mean with the applicable standard',
  ],
  'ideal-surface': [
    'note',
    () => 'smooth, clean, plane surfaces assumed; for a hazard analysis take the larger reflectance',
  ],
  'axis-assumed': [
    'caution',
    (d, s) => `${s}: ${d['axis']} axis assumed (also: ${d['others']}); name it as KEY:AXIS`,
  ],
  'crystal-cut': [
    'note',
    (d) =>
      `${d['crystal']}: index, R, T and path above are those of the ordinary wave; the crystal part has both waves`,
  ],
  'near-critical': [
    'note',
    () => 'close to the critical angle: a real beam spreads over it; shifts and R hold for a plane wave only',
  ],
  'tolerance-incomplete': [
    'caution',
    (_, s) => `${s}: no thermal data: the temperature tolerance leaves its index as it is`,
  ],
  approximation: ['caution', (d) => String(d['text'])],
  coherence: ['note', (d) => String(d['text'])],
  'self-focusing': [
    'caution',
    (d) => `B-integral ${d['radians']} rad: above about 1 rad the beam's phase front suffers`,
  ],
};

const round = (x: string | number | undefined): string =>
  typeof x === 'number' ? String(Number(x.toFixed(2))) : String(x);

/** `about` is the machine-readable place, `subject` what a person reads at the start of the sentence. */
export function wordCaution(note: CautionNote, about: string, subject: string): Caution {
  const [level, sentence] = WORDING[note.code];
  return { code: note.code, about, level, text: sentence(note.details, subject) };
}

const LEVELS: readonly Caution['level'][] = ['hazard', 'caution', 'note'];

/** Hazards first, then cautions, then notes; the same sentence once. */
export function orderCautions(cautions: readonly Caution[]): readonly Caution[] {
  const seen = new Set<string>();
  return [...cautions]
    .sort((a, b) => LEVELS.indexOf(a.level) - LEVELS.indexOf(b.level))
    .filter((c) => !seen.has(c.text) && seen.add(c.text));
}
