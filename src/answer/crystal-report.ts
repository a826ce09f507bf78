/**
 * What a birefringent crystal is at one wave, without a path around it: principal indices, index and walk-off against the
 * direction, reflectances of its principal faces, waveplates; a uniaxial one also at a stated cut. A biaxial crystal is
 * described along its principal axes alone.
 */
import { axesOf, type FitWave } from '../catalog/choose-fit.ts';
import type { Axis } from '../catalog/types.ts';
import { LOSSY_INCIDENCE } from '../interface/special-angles.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { StackRefusal } from '../stack/stack-refusal.ts';
import { extraordinaryIndex, walkOffAngle_rad } from '../stack/uniaxial.ts';
import { uniaxialBrewsterAngle_rad, uniaxialInterface } from '../stack/uniaxial-interface.ts';
import type { Answer, Caution, MediumAnswer } from './answer.ts';
import { orderCautions, wordCaution } from './caution-text.ts';
import {
  type Birefringence,
  birefringence,
  crystalAnswer,
  groupIndexAt,
  waveplateAnswer,
} from './crystal-answer.ts';
import {
  alongAxis,
  isUncutUniaxial,
  type UniaxialSides,
  uniaxialSides,
  whyNotUniaxial,
} from './crystal-media.ts';
import type { CrystalAnswer, WaveplateAnswer } from './crystal-shape.ts';
import { type MediumSide, mediumSide, type SourceOf } from './medium-side.ts';
import { opticAxisAngle_rad } from './optic-axis.ts';
import type { Question } from './question.ts';
import { bothReferences, waveAnswer } from './wave.ts';

export interface DirectionRow {
  readonly angleToAxis_rad: number;
  readonly n: number;
  readonly groupIndex: number | null;
  readonly walkOff_rad: number;
}

export interface FaceRow {
  readonly axis: 'along-normal' | 'in-plane-of-incidence' | 'across-plane-of-incidence';
  readonly sWave: 'ordinary' | 'extraordinary';
  readonly pWave: 'ordinary' | 'extraordinary';
  readonly Rs: number;
  readonly Rp: number;
  readonly brewsterAngle_rad: number | null;
}

/** A plate between two principal axes, second less first: light runs along the third, or across the optic axis. */
export interface PrincipalPlate extends Birefringence {
  readonly axes: readonly [Axis, Axis];
  readonly retardance_waves: number | null;
  readonly waveplates: readonly WaveplateAnswer[];
}

export interface CrystalReport {
  readonly wave: Answer['wave'];
  readonly incidenceAngle_rad: number;
  readonly from: MediumAnswer;
  readonly kind: 'uniaxial' | 'biaxial';
  readonly key: string | null;
  readonly name: string;
  readonly axes: readonly MediumAnswer[];
  /** Reflectance at normal incidence for light polarized along each principal axis, in the order of `axes`. */
  readonly normalReflectances: readonly number[];
  /** Of biaxial crystals: from z to each optic axis, in the plane of the smallest and the largest index; null otherwise. */
  readonly opticAxisAngle_rad: number | null;
  readonly thickness_m: number | null;
  readonly plates: readonly PrincipalPlate[];
  /** Of uniaxial crystals; empty otherwise. */
  readonly directions: readonly DirectionRow[];
  readonly faces: readonly FaceRow[];
  readonly cut: CrystalAnswer | null;
  readonly cautions: readonly Caution[];
}

const DIRECTIONS_deg = [0, 15, 30, 45, 60, 75, 90];
const PLATES_waves = [0.25, 0.5];

export interface CrystalAsked {
  /** Its `into` is the crystal; layers are not looked at. */
  readonly question: Question;
  readonly thickness_m: number | null;
  readonly retardance_waves: number | null;
}

export function crystalReport(asked: CrystalAsked, sourceOf: SourceOf): CrystalReport | Refusal {
  const { question } = asked;
  const wave = bothReferences(question.wave);
  if (isRefusal(wave)) return wave;
  const from = mediumSide(question.from, wave, question.conditions, question.extrapolate, sourceOf);
  if (isRefusal(from)) return from;
  if (from.optics.n.im > LOSSY_INCIDENCE * from.optics.n.re || from.optics.n.re <= 0) {
    return refuse(
      'lossy-incidence',
      3,
      `${from.name} is no transparent medium in front of a crystal`,
      'name a transparent one, such as air',
    );
  }
  return isUncutUniaxial(question.into)
    ? uniaxialReport(asked, from, wave, sourceOf)
    : biaxialReport(asked, from, wave, sourceOf);
}

function uniaxialReport(
  { question, thickness_m, retardance_waves }: CrystalAsked,
  from: MediumSide,
  wave: FitWave,
  sourceOf: SourceOf,
): CrystalReport | Refusal {
  const { conditions, extrapolate, incidenceAngle_rad, tolerances } = question;
  const crystal = uniaxialSides(question.into, wave, conditions, extrapolate, sourceOf);
  if (isRefusal(crystal)) return crystal;
  const vacuumWavelength_m = wave.vacuum_um * 1e-6;
  const outsideIndex = from.optics.n.re;
  const cut = question.cut
    ? crystalAnswer({
        about: 'into',
        crystal,
        outsideIndex,
        incidenceAngle_rad,
        cut: question.cut,
        thickness_m,
        vacuumWavelength_m,
        tolerances,
      })
    : null;
  if (isRefusal(cut)) return cut;
  const { ordinary, extraordinary } = crystal;
  return {
    ...commonPart([ordinary, extraordinary], from, question, wave, thickness_m),
    kind: 'uniaxial',
    opticAxisAngle_rad: null,
    plates: [principalPlate(ordinary, extraordinary, vacuumWavelength_m, thickness_m, retardance_waves)],
    directions: DIRECTIONS_deg.map((deg) => direction((deg * Math.PI) / 180, crystal, vacuumWavelength_m)),
    faces: faceRows(outsideIndex, crystal, incidenceAngle_rad),
    cut,
  };
}

function biaxialReport(
  { question, thickness_m, retardance_waves }: CrystalAsked,
  from: MediumSide,
  wave: FitWave,
  sourceOf: SourceOf,
): CrystalReport | Refusal {
  const { into, conditions, extrapolate, cut } = question;
  const axes = into.kind === 'catalogue' && into.axis === undefined ? axesOf(into.material) : [];
  const biaxial = (['x', 'y', 'z'] as const).filter((a) => axes.includes(a));
  if (biaxial.length < 3 || cut) return whyNotUniaxial(into) ?? refuse('no-cut', 2, 'no crystal', 'name one');
  const sides: MediumSide[] = [];
  for (const axis of biaxial) {
    const side = mediumSide(alongAxis(into, axis), wave, conditions, extrapolate, sourceOf);
    if (isRefusal(side)) return side;
    sides.push(side);
  }
  const vacuumWavelength_m = wave.vacuum_um * 1e-6;
  const [x, y, z] = sides as [MediumSide, MediumSide, MediumSide];
  const plate = (a: MediumSide, b: MediumSide): PrincipalPlate =>
    principalPlate(a, b, vacuumWavelength_m, thickness_m, retardance_waves);
  return {
    ...commonPart(sides, from, question, wave, thickness_m),
    kind: 'biaxial',
    opticAxisAngle_rad: opticAxisAngle_rad(x.optics.n.re, y.optics.n.re, z.optics.n.re),
    plates: [plate(y, z), plate(x, z), plate(x, y)],
    directions: [],
    faces: [],
    cut: null,
  };
}

function commonPart(
  sides: readonly MediumSide[],
  from: MediumSide,
  question: Question,
  wave: FitWave,
  thickness_m: number | null,
) {
  const outside = from.optics.n.re;
  const [first] = sides;
  const notes = [...sides, from].flatMap((side) =>
    side.notes
      .filter((n) => n.code !== 'axis-assumed')
      .map((n) => wordCaution(n, side === from ? 'from' : 'crystal', side.name)),
  );
  return {
    wave: waveAnswer(wave, question.wave),
    incidenceAngle_rad: question.incidenceAngle_rad,
    from: from.answer,
    key: first?.answer.key ?? null,
    name: first?.name ?? '',
    axes: sides.map((s) => s.answer),
    normalReflectances: sides.map(({ optics: { n } }) => {
      const below = (n.re - outside) ** 2 + n.im ** 2;
      return below / ((n.re + outside) ** 2 + n.im ** 2);
    }),
    thickness_m,
    cautions: orderCautions(notes),
  };
}

function principalPlate(
  a: MediumSide,
  b: MediumSide,
  vacuumWavelength_m: number,
  thickness_m: number | null,
  retardance_waves: number | null,
): PrincipalPlate {
  const [na, nb] = [a.optics.n.re, b.optics.n.re];
  const wanted = retardance_waves === null ? PLATES_waves : [retardance_waves];
  return {
    axes: [a.answer.axis as Axis, b.answer.axis as Axis],
    ...birefringence(a, b),
    retardance_waves: thickness_m === null ? null : ((nb - na) * thickness_m) / vacuumWavelength_m,
    waveplates: wanted.flatMap((waves) => waveplateAnswer(na, nb, vacuumWavelength_m, waves) ?? []),
  };
}

function direction(theta_rad: number, crystal: UniaxialSides, vacuumWavelength_m: number): DirectionRow {
  const no = crystal.ordinary.optics.n.re;
  const ne = crystal.extraordinary.optics.n.re;
  const ends = theta_rad === 0 || Math.abs(theta_rad - Math.PI / 2) < 1e-12;
  return {
    angleToAxis_rad: theta_rad,
    n: extraordinaryIndex(no, ne, theta_rad),
    groupIndex: groupIndexAt(theta_rad, crystal, vacuumWavelength_m),
    walkOff_rad: ends ? 0 : walkOffAngle_rad(no, ne, theta_rad),
  };
}

/** The three principal orientations; empty where the crystal is no transparent one. */
function faceRows(
  outsideIndex: number,
  { ordinary, extraordinary }: UniaxialSides,
  incidenceAngle_rad: number,
): readonly FaceRow[] {
  const [no, ne] = [ordinary.optics.n, extraordinary.optics.n];
  const quarter = Math.PI / 2;
  const orientations = [
    ['along-normal', 0, 0],
    ['in-plane-of-incidence', quarter, 0],
    ['across-plane-of-incidence', quarter, quarter],
  ] as const;
  // At normal incidence the last two are one face turned by 90 degrees: told apart a hair off the normal.
  const angle_rad = Math.max(incidenceAngle_rad, 1e-9);
  try {
    return orientations.map(([axis, tilt_rad, azimuth_rad]): FaceRow => {
      const { s, p } = uniaxialInterface(outsideIndex, { no, ne }, { tilt_rad, azimuth_rad }, angle_rad);
      return {
        axis,
        sWave: s.kind,
        pWave: p.kind,
        Rs: s.R,
        Rp: p.R,
        brewsterAngle_rad:
          azimuth_rad > 0
            ? Math.atan(no.re / outsideIndex)
            : uniaxialBrewsterAngle_rad(outsideIndex, no.re, ne.re, tilt_rad),
      };
    });
  } catch (error) {
    if (error instanceof StackRefusal) return [];
    throw error;
  }
}
