/**
 * The question: a path of media, a wave, a geometry, conditions, optionally a beam and tolerances. Plain data, SI units.
 * Everything a face lets a person change is a field here; defaults are filled in by `defaultQuestion`.
 */
import type { Axis, Material } from '../catalog/types.ts';
import type { Conditions } from '../dispersion/evaluator.ts';
import type { LiteralMedium } from '../medium/literal.ts';

export type MediumSpec =
  | { readonly kind: 'catalogue'; readonly material: Material; readonly axis?: Axis | undefined }
  | { readonly kind: 'literal'; readonly literal: LiteralMedium; readonly text: string };

export interface Layer {
  readonly medium: MediumSpec;
  readonly thickness: LayerThickness;
  /** n2 of n = n0 + n2 I, where the person gave it. */
  readonly nonlinearIndex_m2_per_W?: number;
}

/** A length, or a part of the wavelength in the layer at the design wave and the angle there. */
export type LayerThickness =
  | { readonly kind: 'length'; readonly thickness_m: number }
  | { readonly kind: 'waves'; readonly waves: number };

export interface WaveSpec {
  /** The wavelength as given, in metres; in standard air if `inAir`. */
  readonly wavelength_m: number;
  readonly inAir: boolean;
  /** As typed, for the echo. */
  readonly text: string;
}

export type Polarization = 's' | 'p' | 'unpolarized';

export type Beam =
  | {
      readonly kind: 'power';
      readonly power_W: number;
      /** 1/e^2 diameter of a gaussian, full diameter of a flat-top; without it only powers are known. */
      readonly diameter_m?: number;
      readonly profile: 'gaussian' | 'flat';
      readonly pulse?: PulseTrain;
    }
  /** Pulses of known energy but unknown rate: there is no average power. */
  | {
      readonly kind: 'pulse';
      readonly pulse: PulseTrain;
      readonly diameter_m?: number;
      readonly profile: 'gaussian' | 'flat';
    }
  | { readonly kind: 'irradiance'; readonly irradiance_W_per_m2: number }
  | { readonly kind: 'field'; readonly peakE_V_per_m: number };

/** Energy and duration (FWHM) of one pulse; without a duration only fluences are known. */
export interface PulseTrain {
  readonly energy_J: number;
  readonly duration_s?: number;
  readonly repetition_Hz?: number;
}

/** How the one uniaxial crystal of the path is cut, and what plate is wanted of it. */
export interface CrystalCut {
  /** Between the surface normal and the optic axis, 0 to pi/2. */
  readonly angle_rad: number;
  /** Between the plane of incidence and the plane that holds normal and axis. */
  readonly azimuth_rad: number;
  /** Retardance of the waveplate wanted, in waves. */
  readonly retardance_waves?: number;
}

/** Standard uncertainties stated by the person asking. `index` and `extinction` belong to the medium beyond the interface, `indexFrom` to the medium of incidence. */
export interface Tolerances {
  readonly wavelength_m?: number;
  readonly angle_rad?: number;
  readonly index?: number;
  readonly indexFrom?: number;
  /** Of each layer's medium, beside the accuracy of its fit. */
  readonly indexLayers?: number;
  readonly temperature_K?: number;
  /** Of each layer, independent of the others: a length, and a share of its thickness. */
  readonly thickness_m?: number;
  readonly thicknessShare?: number;
}

export interface Question {
  readonly from: MediumSpec;
  readonly layers: readonly Layer[];
  readonly into: MediumSpec;
  readonly wave: WaveSpec;
  readonly incidenceAngle_rad: number;
  readonly polarization: Polarization;
  readonly conditions: Conditions;
  readonly beam?: Beam | undefined;
  readonly tolerances: Tolerances;
  readonly extrapolate: boolean;
  /** Wave for which `@qw`, `@hw` are meant; the wave asked where absent. */
  readonly designWave?: WaveSpec | undefined;
  /** Layers whose round trip is longer than half of this are summed as intensities. */
  readonly coherenceLength_m?: number | undefined;
  /** Duration (FWHM of the intensity) of a gaussian pulse that passes the path. */
  readonly pulseDuration_s?: number | undefined;
  readonly cut?: CrystalCut | undefined;
  /** Asks for the field through the layers, point by point. */
  readonly fieldProfile?: boolean | undefined;
}

/** A question with every default in place: normal incidence, unpolarized, no beam. */
export function makeQuestion(
  from: MediumSpec,
  into: MediumSpec,
  wave: WaveSpec,
  more: Partial<Omit<Question, 'from' | 'into' | 'wave'>> = {},
): Question {
  return {
    from,
    layers: [],
    into,
    wave,
    incidenceAngle_rad: 0,
    polarization: 'unpolarized',
    conditions: {},
    tolerances: {},
    extrapolate: false,
    ...more,
  };
}
