/**
 * The one pure function: a question in, an answer (or a refusal that says why not) out. No I/O, no clock, no state; the same
 * question gives the same answer, digit for digit, on every face.
 */
import type { CautionNote } from '../medium/caution.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import type { Answer, Caution } from './answer.ts';
import { orderCautions, wordCaution } from './caution-text.ts';
import { type EnergyParts, energyParts } from './energy-answer.ts';
import { indexUncertainty, powerSpread } from './input-uncertainty.ts';
import { interfaceParts, LOSSY_INCIDENCE, powerOf } from './interface-answer.ts';
import { type MediumSide, mediumSide, type SourceOf } from './medium-side.ts';
import { type Path, readPath } from './path.ts';
import { type PathFields, pathFields, surfaceFields } from './path-fields.ts';
import { pathNotes, pathPower, pathSurface, solvePath, surfacePower } from './path-powers.ts';
import { pulseAnswer, pulseNotes } from './pulse-answer.ts';
import type { Question } from './question.ts';
import { bothReferences, waveAnswer } from './wave.ts';

export function answerQuestion(question: Question, sourceOf: SourceOf): Answer | Refusal {
  const wave = bothReferences(question.wave);
  if (isRefusal(wave)) return wave;
  const { conditions, extrapolate, incidenceAngle_rad, polarization } = question;
  const from = mediumSide(question.from, wave, conditions, extrapolate, sourceOf);
  if (isRefusal(from)) return from;
  const into = mediumSide(question.into, wave, conditions, extrapolate, sourceOf);
  if (isRefusal(into)) return into;
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
  const path = question.layers.length > 0 ? readPath(question, wave, from, into, sourceOf) : null;
  if (isRefusal(path)) return path;
  const parts = path && solvePath(path, question, vacuumWavelength_m);
  if (isRefusal(parts)) return parts;
  const surface = parts ? pathSurface(first.answer, parts, polarization) : first.answer;

  const layerSides = path?.layers.map((l) => l.side) ?? [];
  const spread = powerSpread(question, wave, from, into, layerSides);
  const power = path ? pathPower(path, question, vacuumWavelength_m) : surfacePower;
  const reflected = spread.of(surface.R, (moved) => powerOf(polarization, ...power(moved).R));
  const crossing =
    surface.T === null ? null : spread.of(surface.T, (moved) => powerOf(polarization, ...power(moved).T));
  const powers = { R: surface.R, T: surface.T, surface: parts ? null : first.wave };
  const pulse = pulseAnswer(question, parts);
  const fields = (): PathFields =>
    path && parts
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

  return {
    wave: waveAnswer(wave, question.wave.inAir),
    geometry: { incidenceAngle_rad, polarization },
    from: { ...from.answer, n_uncertainty: indexUncertainty(from, question, 'from') },
    into: { ...into.answer, n_uncertainty: indexUncertainty(into, question, 'into') },
    layers: parts?.layers ?? [],
    interface: {
      ...surface,
      R_uncertainty: spread.stated ? (reflected?.standardUncertainty ?? null) : null,
      R_uncertaintyFrom: spread.stated ? (reflected?.dominant ?? null) : null,
      T_uncertainty: spread.stated ? (crossing?.standardUncertainty ?? null) : null,
      R_digitsGuide: reflected?.standardUncertainty ?? null,
      T_digitsGuide: crossing?.standardUncertainty ?? null,
    },
    stack: parts?.stack ?? null,
    window: parts?.window ?? null,
    pulse,
    energy: energy?.answer ?? null,
    cautions: collectCautions(
      from,
      into,
      path,
      [...surfaceNotes(from, surface), ...(parts ? pathNotes(parts) : []), ...pulseNotes(pulse)],
      energy?.notes ?? [],
    ),
  };
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
  if (surface.R >= 1) notes.push({ code: 'infinite-value', details: { quantity: 'the reflection loss' } });
  return notes;
}

function collectCautions(
  from: MediumSide,
  into: MediumSide,
  path: Path | null,
  surface: readonly CautionNote[],
  beam: readonly CautionNote[],
): readonly Caution[] {
  const layers = (path?.layers ?? []).flatMap(({ side }, i) =>
    side.notes.map((n) => wordCaution(n, `layer ${i + 1}`, side.name)),
  );
  return orderCautions([
    ...from.notes.map((n) => wordCaution(n, 'from', from.name)),
    ...layers,
    ...into.notes.map((n) => wordCaution(n, 'into', into.name)),
    ...surface.map((n) => wordCaution(n, 'interface', 'interface')),
    ...beam.map((n) => wordCaution(n, 'beam', 'beam')),
  ]);
}
