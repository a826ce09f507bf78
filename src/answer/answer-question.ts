/**
 * The one pure function: a question in, an answer (or a refusal that says why not) out. No I/O, no clock, no state; the same
 * question gives the same answer, digit for digit, on every face.
 */

import type { FitWave } from '../catalog/choose-fit.ts';
import { LOSSY_INCIDENCE } from '../interface/special-angles.ts';
import type { CautionNote } from '../medium/caution.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import type { Answer } from './answer.ts';
import { collectCautions } from './collect-cautions.ts';
import { crystalNotes } from './crystal-answer.ts';
import { crystalPart } from './crystal-part.ts';
import { type EnergyParts, energyParts } from './energy-answer.ts';
import { indexUncertainty, type ThermalSide } from './input-uncertainty.ts';
import { interfaceParts } from './interface-answer.ts';
import type { MediumSide, SourceOf } from './medium-side.ts';
import { type Path, readEnds, readPath } from './path.ts';
import { type PathFields, pathFields, surfaceFields } from './path-fields.ts';
import { pathNotes, pathPower, pathSurface, solvePath } from './path-powers.ts';
import { powerSpread } from './power-spread.ts';
import { pulseAnswer, pulseNotes } from './pulse-answer.ts';
import type { MediumSpec, Question } from './question.ts';
import { spreadNotes, uncertaintyPart } from './spread-answer.ts';
import { surfacePower } from './surface-power.ts';
import { thermalSlope } from './thermal-slope.ts';
import { bothReferences, waveAnswer } from './wave.ts';

export function answerQuestion(question: Question, sourceOf: SourceOf): Answer | Refusal {
  const wave = bothReferences(question.wave);
  if (isRefusal(wave)) return wave;
  const { incidenceAngle_rad, polarization } = question;
  const ends = readEnds(question, wave, sourceOf);
  if (isRefusal(ends)) return ends;
  const { from, into } = ends;
  if (from.optics.n.re === 0) {
    return refuse(
      'no-incident-wave',
      2,
      `no wave propagates in ${from.name}`,
      'swap the media, or name another first medium',
    );
  }

  const vacuumWavelength_m = wave.vacuum_um * 1e-6;
  const first = interfaceParts(from, into, incidenceAngle_rad, polarization, vacuumWavelength_m);
  const path = readPath(question, wave, ends, sourceOf);
  if (isRefusal(path)) return path;
  const parts = path.layers.length > 0 ? solvePath(path, question, vacuumWavelength_m) : null;
  if (isRefusal(parts)) return parts;
  const surface = parts ? pathSurface(first.answer, parts, polarization) : first.answer;

  const crystal = question.cut ? crystalPart(question, question.cut, path, wave, sourceOf) : null;
  if (isRefusal(crystal)) return crystal;
  const media = thermalSides(path, question, wave, sourceOf);
  const power = parts ? pathPower(parts, vacuumWavelength_m) : surfacePower;
  const spread = powerSpread(question, wave, path, media, surface, power);
  const powers = {
    R: surface.R,
    T: surface.T,
    surface: parts ? null : first.wave,
    kappa2: first.wave.kappa2,
  };
  const pulsed = question.pulseDuration_s !== undefined || question.beam !== undefined;
  const pulse = pulsed ? pulseAnswer(question, parts) : null;
  const fields = (): PathFields =>
    parts
      ? pathFields(path, question, parts, vacuumWavelength_m)
      : surfaceFields(from, into, question, vacuumWavelength_m);
  const energy: EnergyParts | null = question.beam
    ? energyParts(
        question,
        question.beam,
        { from, into, powers, fields: fields(), polarization, angle_rad: incidenceAngle_rad },
        vacuumWavelength_m,
        pulse ? pulse.durationOut_s / pulse.durationIn_s : 1,
      )
    : null;

  const nUncertainty = (i: number, stated: number | undefined): number | null =>
    indexUncertainty(media[i] as ThermalSide, question, stated);

  return {
    wave: waveAnswer(wave, question.wave),
    geometry: { incidenceAngle_rad, polarization },
    from: { ...from.answer, n_uncertainty: nUncertainty(0, question.tolerances.indexFrom) },
    into: { ...into.answer, n_uncertainty: nUncertainty(media.length - 1, question.tolerances.index) },
    layers: (parts?.layers ?? []).map((layer, i) => ({
      ...layer,
      medium: { ...layer.medium, n_uncertainty: nUncertainty(i + 1, question.tolerances.indexLayers) },
    })),
    interface: { ...surface, ...uncertaintyPart(spread) },
    stack: parts?.stack ?? null,
    window: parts?.window ?? null,
    pulse,
    crystal,
    energy: energy?.answer ?? null,
    cautions: collectCautions({
      question,
      media,
      crystal,
      interfaceNotes: [
        ...surfaceNotes(from, surface),
        ...(parts ? pathNotes(parts) : []),
        ...(pulse ? pulseNotes(pulse) : []),
        ...spreadNotes(spread, surface),
        ...(crystal ? crystalNotes(crystal) : []),
      ],
      beamNotes: energy?.notes ?? [],
    }),
  };
}

/** The first medium, the layers, the last one; how they change with temperature where that matters. */
function thermalSides(
  path: Path,
  question: Question,
  wave: FitWave,
  sourceOf: SourceOf,
): readonly ThermalSide[] {
  const sides = [path.from, ...path.layers.map((l) => l.side), path.into];
  if (!question.tolerances.temperature_K) return sides.map((side) => ({ side, slope: null }));
  const specs: readonly MediumSpec[] = [
    question.from,
    ...question.layers.map((l) => l.medium),
    question.into,
  ];
  const known = new Map<MediumSpec, ThermalSide['slope']>();
  return sides.map((side, i) => {
    const spec = specs[i] as MediumSpec;
    if (!known.has(spec)) known.set(spec, thermalSlope(spec, side, question, wave, sourceOf));
    return { side, slope: known.get(spec) ?? null };
  });
}

function surfaceNotes(
  from: MediumSide,
  surface: {
    readonly R: number;
    readonly returnLoss_dB: number | null;
    readonly reflectionLoss_dB: number | null;
    readonly totalReflection: boolean;
    readonly T: number | null;
  },
): readonly CautionNote[] {
  const notes: CautionNote[] = [];
  if (from.optics.n.im > LOSSY_INCIDENCE * Math.abs(from.optics.n.re))
    notes.push({ code: 'lossy-incidence', details: {} });
  if (surface.R === 0) notes.push({ code: 'infinite-value', details: { quantity: 'the return loss' } });
  if (surface.R >= 1 && surface.T !== null)
    notes.push({ code: 'infinite-value', details: { quantity: 'the reflection loss' } });
  return notes;
}
