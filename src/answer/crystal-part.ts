/** The crystal part of an answer: finds what the cut of a question means and what stands before it. */
import type { FitWave } from '../catalog/choose-fit.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { crystalAnswer } from './crystal-answer.ts';
import { cutMedium, uniaxialSides } from './crystal-media.ts';
import type { CrystalAnswer } from './crystal-shape.ts';
import type { SourceOf } from './medium-side.ts';
import type { Path } from './path.ts';
import type { CrystalCut, Question } from './question.ts';

export function crystalPart(
  question: Question,
  cut: CrystalCut,
  path: Path,
  wave: FitWave,
  sourceOf: SourceOf,
): CrystalAnswer | Refusal {
  const { conditions, extrapolate, tolerances } = question;
  const meant = cutMedium(question);
  if (isRefusal(meant)) return meant;
  const crystal = uniaxialSides(meant.spec, wave, conditions, extrapolate, sourceOf);
  if (isRefusal(crystal)) return crystal;
  const before = meant.place === 0 ? path.from : (path.layers[meant.place - 1]?.side ?? path.from);
  const sin = (path.from.optics.n.re * Math.sin(question.incidenceAngle_rad)) / before.optics.n.re;
  if (!(before.optics.n.re > 0 && sin < 1)) {
    return refuse(
      'no-wave-at-crystal',
      3,
      `no wave reaches ${crystal.name} through ${before.name} at this angle`,
      'take a smaller angle of incidence',
    );
  }
  const layer = path.layers[meant.place];
  return crystalAnswer({
    about: layer ? `layer ${meant.place + 1}` : 'into',
    crystal,
    outsideIndex: before.optics.n.re,
    incidenceAngle_rad: Math.asin(sin),
    cut,
    thickness_m: layer?.thickness_m ?? null,
    vacuumWavelength_m: wave.vacuum_um * 1e-6,
    tolerances,
  });
}
