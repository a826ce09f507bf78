/** What the beam asks of the part: aperture, irradiance, angle. */
import type { Answer } from '../../answer/answer.ts';
import type { Beam } from '../../answer/question.ts';
import { brewsterAngles } from '../../interface/special-angles.ts';
import { apertureTransmittance, footprint } from '../../stack/beam.ts';
import { computed, type Finding, labelOf, practice } from './finding.ts';
import { degrees, irradiance, length, percent } from './shown-numbers.ts';
import { type Subject, substanceOf } from './subject.ts';

/** Clear aperture over the 1/e^2 diameter at which hardly anything is cut off a gaussian. */
const ROOM = 1.5;
/** So near the Brewster angle the reflection of p is nothing to speak of. */
const NEAR_BREWSTER_rad = (1 * Math.PI) / 180;
/** Less than this through, with all of it reflected, is total reflection. */
const NOTHING = 1e-6;
/** From this angle on s and p differ by more than a few hundredths of their reflectance. */
const OBLIQUE_rad = (15 * Math.PI) / 180;

export function beamFinding(answer: Answer, beam: Beam | undefined): Finding {
  const base = { topic: 'beam' as const, about: 'part' };
  const diameter_m = beam && 'profile' in beam ? beam.diameter_m : undefined;
  if (!beam) {
    return {
      ...base,
      level: 'look',
      text: 'no beam is stated: with --power and --beam this page adds powers, apertures and irradiances; damage thresholds hold for the wave, pulse and area they were measured with',
      source: practice,
    };
  }
  const I = answer.energy?.incident?.irradiance_W_per_m2 ?? null;
  const peak =
    I === null
      ? ''
      : `${irradiance(I)} on the axis: ask for the damage threshold at this wave, with its pulse length or continuous, and its area (ISO 21254)`;
  if (diameter_m === undefined) {
    const text = peak === '' ? 'no diameter is stated: irradiance and aperture are open' : peak;
    return { ...base, level: 'look', text, source: practice };
  }
  const { acrossRadius_m, alongRadius_m } = footprint(diameter_m / 2, answer.geometry.incidenceAngle_rad);
  const sides = (room: number): string => {
    const [across, along] = [2 * room * acrossRadius_m, 2 * room * alongRadius_m].map((x) => length(x, 3));
    return across === along ? `${across}` : `${across} by ${along}`;
  };
  const profile = beam && 'profile' in beam ? beam.profile : 'gaussian';
  const through = apertureTransmittance((ROOM * diameter_m) / 2, diameter_m / 2, profile);
  const aperture =
    profile === 'gaussian'
      ? `a clear aperture of ${sides(ROOM)} passes ${percent(through)} of a gaussian; more keeps edge diffraction away`
      : `the beam covers ${sides(1)}`;
  return {
    ...base,
    level: 'look',
    text: [peak, aperture].filter((t) => t !== '').join('; '),
    source: computed('beam formulas (Siegman, Lasers, 17)'),
  };
}

/** Nothing at normal incidence. */
export function angleFinding(subject: Subject, answer: Answer): Finding | null {
  const { incidenceAngle_rad: angle, polarization } = answer.geometry;
  if (angle === 0) return null;
  const base = { topic: 'angle' as const, about: labelOf(subject.medium) };
  const through = answer.stack?.T ?? answer.interface.T;
  if (
    answer.interface.totalReflection ||
    (answer.interface.R > 1 - NOTHING && through !== null && through < NOTHING)
  ) {
    return {
      ...base,
      level: 'stop',
      text: 'the wave is totally reflected at this angle: nothing comes through',
      source: computed('Snell'),
    };
  }
  const { outside, films } = subject.front;
  const bare = films.length === 0;
  const from = opticsOf(outside);
  const brewster = bare ? brewsterAngles(from, opticsOf(subject.medium)).p : null;
  const shift = answer.window
    ? `; the beam comes out ${length(answer.window.lateralDisplacement_m, 3)} aside`
    : '';
  const { Rs, Rp } = answer.interface;
  const both = `in all s reflects ${percent(Rs)}, p ${percent(Rp)}`;
  const at = brewster === null ? '' : `; Brewster angle ${degrees(brewster)}`;
  if (polarization === 'p' && brewster !== null && Math.abs(angle - brewster) < NEAR_BREWSTER_rad) {
    return {
      ...base,
      level: 'fine',
      text: `at the Brewster angle (${degrees(brewster)}): ${both}; no coating needed for p, and the plane of polarization must be kept${shift}`,
      source: computed('Fresnel reflection'),
    };
  }
  const open = polarization === 'unpolarized' && angle > OBLIQUE_rad;
  return {
    ...base,
    level: open ? 'look' : 'fine',
    text: `${both}${open ? ': name the polarization in the order' : ''}${at}${shift}`,
    source: computed('Fresnel reflection'),
  };
}

const opticsOf = (medium: Subject['medium']) => ({
  ...substanceOf(medium),
  n: { re: medium.n, im: medium.k },
});
