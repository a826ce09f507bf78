/** The parts of the answer that belong to a path of layers: the layers, the whole stack, the window, the pulse through it. */
import type { Complex } from '../num/complex.ts';
import { coherentStack } from '../stack/coherent-stack.ts';
import { etalonFringes, etalonSpacing } from '../stack/etalon.ts';
import {
  fieldProfile,
  frontField,
  type StackField,
  solveField,
  stackMaximum,
} from '../stack/field-profile.ts';
import { stackDispersion } from '../stack/group-delay.ts';
import { type MixedFractions, mixedStack } from '../stack/mixed-stack.ts';
import { platePassage, wedgeNote } from '../stack/tilted-plate.ts';
import { insertionLoss_dB, windowFractions } from '../stack/window.ts';
import type { FieldPointAnswer, LayerAnswer, StackAnswer, WindowAnswer } from './answer.ts';
import { coherenceTaken } from './coherence-taken.ts';
import { powerOf } from './interface-answer.ts';
import { dispersivePath, layeredPath, type Path } from './path.ts';
import type { Polarization, Question } from './question.ts';

export interface StackParts {
  readonly layers: readonly LayerAnswer[];
  readonly stack: StackAnswer;
  readonly window: WindowAnswer | null;
  readonly s: MixedFractions;
  readonly p: MixedFractions;
  /** Of a wholly coherent stack. */
  readonly amplitudes: {
    readonly rs: Complex;
    readonly rp: Complex;
    readonly ts: Complex;
    readonly tp: Complex;
  } | null;
}

export function stackParts(path: Path, question: Question, vacuumWavelength_m: number): StackParts {
  const { incidenceAngle_rad: angle_rad, polarization } = question;
  const { length_m: coherenceLength_m, ground } = coherenceTaken(question, vacuumWavelength_m);
  const layered = layeredPath(path);
  const mixed = mixedStack(layered, vacuumWavelength_m, angle_rad, coherenceLength_m);
  const pick = (of: (f: MixedFractions) => number): number => powerOf(polarization, of(mixed.s), of(mixed.p));
  const coherent = mixed.layers.every((l) => l.coherent);
  const exact = coherent ? coherentStack(layered, vacuumWavelength_m, angle_rad) : null;
  const T = pick((f) => f.T);
  const back = mixed.s.R_back === null || mixed.p.R_back === null ? null : pick((f) => f.R_back ?? 0);
  return {
    layers: path.layers.map(({ side, thickness_m }, i) => ({
      medium: side.answer,
      thickness_m,
      opticalThickness_waves: (side.optics.n.re * thickness_m) / vacuumWavelength_m,
      ...pickCoherence(mixed.layers[i]!),
      absorptance: pick((f) => f.layerAbsorptance[i] ?? 0),
    })),
    stack: {
      R: pick((f) => f.R),
      T,
      A: pick((f) => f.A),
      Rs: mixed.s.R,
      Rp: mixed.p.R,
      Ts: mixed.s.T,
      Tp: mixed.p.T,
      R_back: back,
      layerAbsorptance: path.layers.map((_, i) => pick((f) => f.layerAbsorptance[i] ?? 0)),
      insertionLoss_dB: insertionLoss_dB(T),
      coherence: coherent ? 'coherent' : mixed.layers.some((l) => l.coherent) ? 'mixed' : 'incoherent',
      coherenceLength_m,
      coherenceLengthStated: ground === 'stated',
      coherenceLengthFrom: ground,
      ...coherentOnly(path, coherent, vacuumWavelength_m, question),
    },
    window: path.layers.length === 1 ? windowPart(path, vacuumWavelength_m, angle_rad, polarization) : null,
    s: mixed.s,
    p: mixed.p,
    amplitudes: exact && { rs: exact.s.r, rp: exact.p.r, ts: exact.s.t, tp: exact.p.t },
  };
}

const pickCoherence = (l: {
  readonly coherent: boolean;
  readonly roundTripOpticalPath_m: number;
  readonly internalTransmittance: number;
}) => ({
  coherent: l.coherent,
  roundTripOpticalPath_m: l.roundTripOpticalPath_m,
  internalTransmittance: l.internalTransmittance,
});

type CoherentOnly = Pick<
  StackAnswer,
  | 'reflectionS'
  | 'reflectionP'
  | 'transmissionS'
  | 'transmissionP'
  | 'fieldMaximum'
  | 'fieldMaximumBefore'
  | 'fieldProfile'
>;

const NOT_COHERENT: CoherentOnly = {
  reflectionS: null,
  reflectionP: null,
  transmissionS: null,
  transmissionP: null,
  fieldMaximum: null,
  fieldMaximumBefore: null,
  fieldProfile: null,
};

function coherentOnly(
  path: Path,
  coherent: boolean,
  vacuumWavelength_m: number,
  { incidenceAngle_rad: angle_rad, polarization, fieldProfile: profileWanted }: Question,
): CoherentOnly {
  if (!coherent) return NOT_COHERENT;
  const delays = stackDispersion(dispersivePath(path, vacuumWavelength_m), vacuumWavelength_m, angle_rad);
  // Unpolarized: the field of s, whose maximum is never below that of the mean by more than the factor stated for p.
  const field = solveField(
    layeredPath(path),
    vacuumWavelength_m,
    angle_rad,
    polarization === 'p' ? 'p' : 's',
  );
  const inside = stackMaximum(field);
  const before = frontField(field);
  return {
    reflectionS: delays.s.reflection,
    reflectionP: delays.p.reflection,
    transmissionS: delays.s.transmission,
    transmissionP: delays.p.transmission,
    fieldMaximum: {
      intensity: inside.intensity,
      position_m: nearFace(inside.position_m, vacuumWavelength_m),
      layer: inside.region + 1,
    },
    fieldMaximumBefore: before,
    fieldProfile: profileWanted ? profileOf(field, before.period_m) : null,
  };
}

/** Enough points for a smooth curve of a few layers; never fewer than five a layer. */
const PROFILE_POINTS = 400;

/** From one fringe before the first face to as much behind the last. */
function profileOf(field: StackField, margin_m: number): readonly FieldPointAnswer[] {
  const samples = Math.max(5, Math.min(49, Math.ceil(PROFILE_POINTS / (field.kernel.layerCount + 2))));
  const points = fieldProfile(field, { samples, front_m: margin_m, behind_m: margin_m });
  return points.map(({ position_m, region, intensity, absorbed_per_m }) => ({
    position_m,
    layer: region + 1,
    intensity,
    absorbed_per_m,
  }));
}

/** The search for the maximum ends a rounding away from a face. */
const nearFace = (position_m: number, vacuumWavelength_m: number): number =>
  Math.abs(position_m) < 1e-6 * vacuumWavelength_m ? 0 : position_m;

/** Null where no ray passes the plate (total reflection at its first face, or a metal). */
function windowPart(
  path: Path,
  vacuumWavelength_m: number,
  angle_rad: number,
  polarization: Polarization,
): WindowAnswer | null {
  const layer = path.layers[0]!;
  const { n } = layer.side.optics;
  const n0 = path.from.optics.n.re;
  const absorbing = n.im > 0.01 * n.re;
  if (absorbing || n0 * Math.sin(angle_rad) >= n.re) return null;
  const layered = layeredPath(path);
  const plate = layered.layers[0]!;
  const result = windowFractions(
    layered.incidence,
    plate,
    layer.thickness_m,
    layered.exit,
    vacuumWavelength_m,
    angle_rad,
  );
  const pick = (of: (f: (typeof result)['s']) => number): number =>
    powerOf(polarization, of(result.s), of(result.p));
  const R1 = pick((f) => f.R1);
  const R2 = pick((f) => f.R2);
  const tau = pick((f) => f.internalTransmittance);
  const T = pick((f) => f.T);
  const { groupIndex } = layer.side;
  const { gvd_s2_per_m, tod_s3_per_m } = layer.side.answer.absolute;
  const passage = platePassage(layer.thickness_m, n0, n.re, groupIndex ?? n.re, angle_rad, gvd_s2_per_m);
  const fringes = etalonFringes({ R1, R2, internalTransmittance: tau });
  const q = n0 * Math.sin(angle_rad);
  const spacing =
    groupIndex === null
      ? null
      : etalonSpacing(layer.thickness_m, n.re, groupIndex, q, vacuumWavelength_m, fringes.finesseFromWidth);
  const wedge = wedgeNote(1, n.re, n0);
  const beams = (of: (f: (typeof result)['s']) => readonly number[]): readonly number[] =>
    of(result.s).map((x, i) => powerOf(polarization, x, of(result.p)[i] ?? 0));
  return {
    R1,
    R2,
    internalTransmittance: tau,
    totalLoss: 1 - T,
    insertionLoss_dB: insertionLoss_dB(T),
    transmittedBeams: beams((f) => f.transmittedBeams),
    reflectedBeams: beams((f) => f.reflectedBeams),
    opticalPath_m: passage.opticalPath_m,
    groupDelay_s: groupIndex === null ? null : passage.groupDelay_s,
    gdd_s2: passage.gdd_s2,
    tod_s3: tod_s3_per_m === null ? null : tod_s3_per_m * passage.path_m,
    lateralDisplacement_m: passage.lateralDisplacement_m,
    etalon: {
      ...fringes,
      freeSpectralRange_Hz: spacing?.freeSpectralRange_Hz ?? null,
      freeSpectralRange_m: spacing?.freeSpectralRange_m ?? null,
    },
    wedgeDeviation_rad_per_rad: wedge.deviation_rad,
    wedgeGhostSeparation_rad_per_rad: wedge.ghostSeparation_rad,
  };
}
