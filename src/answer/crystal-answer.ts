/**
 * A uniaxial crystal at a cut: the two waves at the face, walk-off, the retardance of a plate, waveplates.
 *
 * The optic axis lies at the cut angle from the normal, at the azimuth from the plane of incidence. s and p stay apart at
 * normal incidence, with the axis in the plane of incidence (ordinary s, extraordinary p) and with the axis exactly across
 * it (ordinary p, extraordinary s); every other cut mixes them and is refused. Retardance of a plate: 2 pi d (kappa_e -
 * kappa_o)/lambda, the normal parts of both waves, which is (n(theta) - no) d at normal incidence.
 * Sources: those of stack/uniaxial.ts and stack/uniaxial-interface.ts; group index of the extraordinary wave from
 * 1/n^2 = cos^2/no^2 + sin^2/ne^2 at a fixed direction.
 */
import { N } from '../dispersion/evaluator.ts';
import type { CautionNote } from '../medium/caution.ts';
import { type Refusal, refuse } from '../medium/refusal.ts';
import { type Complex, complex } from '../num/complex.ts';
import { StackRefusal } from '../stack/stack-refusal.ts';
import {
  extraordinaryIndex,
  greatestWalkOff,
  walkOffAngle_rad,
  waveplateThickness_m,
} from '../stack/uniaxial.ts';
import {
  type UniaxialInterface,
  type UniaxialWave,
  uniaxialBrewsterAngle_rad,
  uniaxialInterface,
} from '../stack/uniaxial-interface.ts';
import type { UniaxialSides } from './crystal-media.ts';
import type { CrystalAnswer, CrystalWaveAnswer, PlateAnswer, WaveplateAnswer } from './crystal-shape.ts';
import type { MediumSide } from './medium-side.ts';
import type { CrystalCut, Tolerances } from './question.ts';

/** Above this k/n angles inside have no plain meaning. */
const ABSORBING = 1e-3;
const ALIGNED_rad = 1e-9;
const MOST_ORDERS = 5;

export interface CutScene {
  readonly about: string;
  readonly crystal: UniaxialSides;
  /** Index of the transparent medium before the face, and the angle of incidence in it. */
  readonly outsideIndex: number;
  readonly incidenceAngle_rad: number;
  readonly cut: CrystalCut;
  readonly thickness_m: number | null;
  readonly vacuumWavelength_m: number;
  readonly tolerances: Tolerances;
}

export function crystalAnswer(scene: CutScene): CrystalAnswer | Refusal {
  const { crystal, outsideIndex, incidenceAngle_rad, cut, vacuumWavelength_m } = scene;
  const { ordinary, extraordinary } = crystal;
  const no = ordinary.optics.n.re;
  const ne = extraordinary.optics.n.re;
  if (!(no > 0 && ne > 0)) return opaque(crystal.name);
  const absorbing = Math.max(ordinary.optics.n.im / no, extraordinary.optics.n.im / ne) > ABSORBING;
  const face = faceOf(scene, ordinary.optics.n, extraordinary.optics.n);
  if ('refused' in face) return face;
  const real = faceOf(scene, complex(no), complex(ne));
  if ('refused' in real) return real;

  const across = real.p.kind === 'ordinary';
  const normal = incidenceAngle_rad === 0;
  const pick = (kind: UniaxialWave['kind'], of: UniaxialInterface): UniaxialWave =>
    of.s.kind === kind ? of.s : of.p;
  const describe = (kind: UniaxialWave['kind']): CrystalWaveAnswer => {
    const powers = pick(kind, face);
    const ray = pick(kind, real);
    const polarization = normal ? null : powers === face.s ? 's' : 'p';
    return waveAnswer(kind, polarization, powers, absorbing ? null : ray, across, crystal, scene);
  };
  const greatest = greatestWalkOff(no, ne);
  const o = describe('ordinary');
  const e = describe('extraordinary');
  return {
    about: scene.about,
    key: crystal.key,
    name: crystal.name,
    no,
    ne,
    no_uncertainty: ordinary.accuracy,
    ne_uncertainty: extraordinary.accuracy,
    ...birefringence(ordinary, extraordinary),
    opticSign: ne === no ? null : ne > no ? 'positive' : 'negative',
    cutAngle_rad: cut.angle_rad,
    azimuth_rad: cut.azimuth_rad,
    orientation: normal
      ? 'normal-incidence'
      : across
        ? 'axis-across-plane-of-incidence'
        : 'axis-in-plane-of-incidence',
    ordinary: o,
    extraordinary: e,
    brewsterAngle_rad: across
      ? Math.atan(no / outsideIndex)
      : uniaxialBrewsterAngle_rad(outsideIndex, no, ne, cut.angle_rad),
    greatestWalkOff_rad: greatest.walkOff_rad,
    greatestWalkOffAngle_rad: greatest.angle_rad,
    plate: plateAnswer(scene, o, e),
    waveplate:
      cut.retardance_waves === undefined
        ? null
        : waveplateAnswer(
            no,
            extraordinaryIndex(no, ne, cut.angle_rad),
            vacuumWavelength_m,
            cut.retardance_waves,
          ),
  };
}

/** What must be said beside it. */
export function crystalNotes(crystal: CrystalAnswer): readonly CautionNote[] {
  return [{ code: 'crystal-cut', details: { crystal: crystal.name } }];
}

function faceOf(
  { outsideIndex, incidenceAngle_rad, cut, crystal }: CutScene,
  no: Complex,
  ne: Complex,
): UniaxialInterface | Refusal {
  try {
    const axis = { tilt_rad: cut.angle_rad, azimuth_rad: cut.azimuth_rad };
    return uniaxialInterface(outsideIndex, { no, ne }, axis, incidenceAngle_rad);
  } catch (error) {
    if (!(error instanceof StackRefusal)) throw error;
    if (error.code !== 'mixed-polarization') return refuse(error.code, 3, error.message, error.remedy);
    const axis = `${degrees(cut.angle_rad)} from the normal of ${crystal.name} and ${degrees(cut.azimuth_rad)} from the plane of incidence`;
    return refuse(
      error.code,
      2,
      `with the optic axis ${axis}, reflection at ${degrees(incidenceAngle_rad)} mixes s and p`,
      'take normal incidence, --cut-azimuth 0 (axis in the plane of incidence), or --cut-angle 90 --cut-azimuth 90 (axis across it)',
    );
  }
}

const degrees = (angle_rad: number): string => `${Number(((angle_rad * 180) / Math.PI).toPrecision(6))} deg`;

function opaque(name: string): Refusal {
  return refuse(
    'opaque-crystal',
    3,
    `no wave runs in ${name} here`,
    'take a wave for which it is transparent',
  );
}

function waveAnswer(
  kind: UniaxialWave['kind'],
  polarization: CrystalWaveAnswer['polarization'],
  { R, T }: UniaxialWave,
  ray: UniaxialWave | null,
  across: boolean,
  crystal: UniaxialSides,
  { cut, vacuumWavelength_m }: CutScene,
): CrystalWaveAnswer {
  const waveAngle_rad = ray?.waveAngle_rad ?? null;
  const angleToAxis_rad = angleToAxis(cut, waveAngle_rad, across);
  const no = crystal.ordinary.optics.n.re;
  const ne = crystal.extraordinary.optics.n.re;
  const theta_rad = angleToAxis_rad ?? cut.angle_rad;
  return {
    polarization,
    n: kind === 'ordinary' ? no : extraordinaryIndex(no, ne, theta_rad),
    groupIndex:
      kind === 'ordinary'
        ? crystal.ordinary.groupIndex
        : groupIndexAt(theta_rad, crystal, vacuumWavelength_m),
    waveAngle_rad: tidy(waveAngle_rad),
    rayAngle_rad: tidy(ray?.rayAngle_rad ?? null),
    walkOff_rad:
      angleToAxis_rad === null
        ? null
        : kind === 'ordinary'
          ? 0
          : tidy(walkOffAngle_rad(no, ne, angleToAxis_rad)),
    angleToAxis_rad,
    R,
    T,
  };
}

/** Of the line, 0 to pi/2. */
function angleToAxis(cut: CrystalCut, waveAngle_rad: number | null, across: boolean): number | null {
  if (waveAngle_rad === null) return null;
  if (across) return Math.PI / 2;
  const lean = cut.angle_rad * (Math.cos(cut.azimuth_rad) < 0 ? -1 : 1);
  const angle = Math.abs(waveAngle_rad - lean);
  return angle > Math.PI / 2 ? Math.PI - angle : angle;
}

const tidy = (x: number | null): number | null => (x === null ? null : Math.abs(x) < 1e-15 ? 0 : x);

/** n_g = n - lambda dn/dlambda, dn/dlambda = n^3 (cos^2 no'/no^3 + sin^2 ne'/ne^3). */
export function groupIndexAt(
  theta_rad: number,
  { ordinary, extraordinary }: UniaxialSides,
  vacuumWavelength_m: number,
): number | null {
  if (ordinary.groupIndex === null || extraordinary.groupIndex === null) return null;
  const [no, ne] = [ordinary.optics.n.re, extraordinary.optics.n.re];
  const n = extraordinaryIndex(no, ne, theta_rad);
  const slope = (side: MediumSide): number => side.jet[N + 1]! * 1e6;
  const [c2, s2] = [Math.cos(theta_rad) ** 2, Math.sin(theta_rad) ** 2];
  const dn = n ** 3 * ((c2 * slope(ordinary)) / no ** 3 + (s2 * slope(extraordinary)) / ne ** 3);
  return n - vacuumWavelength_m * dn;
}

function plateAnswer(
  { thickness_m, vacuumWavelength_m, crystal, tolerances }: CutScene,
  o: CrystalWaveAnswer,
  e: CrystalWaveAnswer,
): PlateAnswer | null {
  if (thickness_m === null || o.waveAngle_rad === null || e.waveAngle_rad === null) return null;
  const difference = e.n * Math.cos(e.waveAngle_rad) - o.n * Math.cos(o.waveAngle_rad);
  const waves = (difference * thickness_m) / vacuumWavelength_m;
  const rays = Math.tan(e.rayAngle_rad ?? 0) - Math.tan(o.rayAngle_rad ?? 0);
  return {
    thickness_m,
    retardance_rad: 2 * Math.PI * waves,
    retardance_waves: waves,
    retardance_uncertainty_waves: retardanceUncertainty(
      difference,
      thickness_m,
      vacuumWavelength_m,
      crystal,
      tolerances,
    ),
    walkOffDisplacement_m: Math.abs(thickness_m * rays) < 1e-20 ? 0 : thickness_m * rays,
  };
}

/** Both indices, the thickness, and the wave through 1/lambda (its effect on the indices is smaller and left out). */
function retardanceUncertainty(
  difference: number,
  thickness_m: number,
  vacuumWavelength_m: number,
  { ordinary, extraordinary }: UniaxialSides,
  tolerances: Tolerances,
): number | null {
  if (ordinary.accuracy === null || extraordinary.accuracy === null) return null;
  const waves = (difference * thickness_m) / vacuumWavelength_m;
  const thickness = Math.hypot(tolerances.thickness_m ?? 0, (tolerances.thicknessShare ?? 0) * thickness_m);
  return Math.hypot(
    (Math.hypot(ordinary.accuracy, extraordinary.accuracy) * thickness_m) / vacuumWavelength_m,
    (difference * thickness) / vacuumWavelength_m,
    (waves * (tolerances.wavelength_m ?? 0)) / vacuumWavelength_m,
  );
}

export interface Birefringence {
  readonly birefringence: number;
  readonly birefringence_uncertainty: number | null;
  readonly birefringence_digitsGuide: number;
}

/** Without a stated accuracy, the disagreement with published values, else a few units of the fourth decimal. */
const UNKNOWN_INDEX = 2e-4;

/** n of b less n of a, their fits taken as independent. */
export function birefringence(a: MediumSide, b: MediumSide): Birefringence {
  const guide = (side: MediumSide): number => side.accuracy ?? side.answer.n_digitsGuide ?? UNKNOWN_INDEX;
  return {
    birefringence: b.optics.n.re - a.optics.n.re,
    birefringence_uncertainty:
      a.accuracy === null || b.accuracy === null ? null : Math.hypot(a.accuracy, b.accuracy),
    birefringence_digitsGuide: Math.hypot(guide(a), guide(b)),
  };
}

/** Thicknesses for a retardance at normal incidence; null where the two waves run alike. */
export function waveplateAnswer(
  slow: number,
  fast: number,
  vacuumWavelength_m: number,
  waves: number,
): WaveplateAnswer | null {
  if (Math.abs(slow - fast) < ALIGNED_rad) return null;
  const thickness = (order: number): number =>
    waveplateThickness_m(slow, fast, vacuumWavelength_m, waves, order);
  return {
    retardance_waves: waves,
    zeroOrderThickness_m: thickness(0),
    orders: Array.from({ length: MOST_ORDERS }, (_, i) => ({ order: i + 1, thickness_m: thickness(i + 1) })),
  };
}
