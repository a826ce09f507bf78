/**
 * The answer, in the very shape and key names of the machine-readable output (schema 1): faces select and round, they never
 * compute. A value that does not exist for the question is null. Keys are only ever added.
 */

import type { CautionCode } from '../medium/caution.ts';
import type { Complex } from '../num/complex.ts';
import type { BeamAnswer } from './beam-answer.ts';
import type { CrystalAnswer } from './crystal-shape.ts';
import type { Polarization } from './question.ts';

export interface Caution {
  readonly code: CautionCode;
  /** What it is about: "from", "into", "layer 1", "interface", "beam", "wave". */
  readonly about: string;
  /** `note`: worth knowing; `caution`: read before relying on the number; `hazard`: someone can be hurt. */
  readonly level: 'note' | 'caution' | 'hazard';
  readonly text: string;
}

export interface SourceLine {
  readonly id: string;
  /** One line: authors, title, where, year. */
  readonly text: string;
  readonly doi: string | null;
}

export interface FitAnswer {
  readonly id: string;
  readonly source: SourceLine;
  /** In the fit's own reference. */
  readonly range_m: readonly [number, number];
  readonly inRange: boolean;
  /** Standard uncertainty of n, null where the source states none. */
  readonly accuracy: number | null;
  readonly model: string;
  readonly grade: 'A' | 'B' | 'C';
  readonly film: { readonly process: string; readonly spread: number | null } | null;
  readonly secondOpinion: null | {
    readonly source: SourceLine;
    readonly n: number;
    /** Second opinion minus this fit, both relative to vacuum. */
    readonly difference: number;
  };
}

export interface MediumAnswer {
  readonly key: string | null;
  readonly name: string;
  readonly axis: string;
  /** Relative to vacuum; exp(-i w t), k >= 0 absorbs. */
  readonly n: number;
  readonly k: number;
  readonly n_published: number;
  readonly publishedReference: 'vacuum' | 'air';
  readonly n_uncertainty: number | null;
  /** Largest disagreement with published values, where no accuracy is stated: guides the digits shown. */
  readonly n_digitsGuide: number | null;
  /** Of the printed formula, in `publishedReference`, as handbooks state it; 0.03 % below the absolute one for fits relative to air. */
  readonly groupIndex: number | null;
  /** c/groupIndex. */
  readonly groupVelocity_m_per_s: number | null;
  readonly gvd_s2_per_m: number | null;
  readonly tod_s3_per_m: number | null;
  /** D = -(lambda/c) n''. */
  readonly dispersion_s_per_m2: number | null;
  /** The same relative to vacuum, the air converted exactly. */
  readonly absolute: {
    readonly groupIndex: number | null;
    readonly groupVelocity_m_per_s: number | null;
    readonly gvd_s2_per_m: number | null;
    readonly tod_s3_per_m: number | null;
  };
  /** Null where no wave advances (Re n = 0). */
  readonly wavelength_m: number | null;
  readonly phaseVelocity_m_per_s: number | null;
  readonly relativePermittivity: Complex;
  readonly relativePermeability: Complex;
  readonly impedance_ohm: Complex;
  readonly lossTangent: number | null;
  /** Null where no absorption data reach the wave. */
  readonly absorptionCoefficient_per_m: number | null;
  /** 1/e of the power. */
  readonly penetrationDepth_m: number | null;
  /** 1/e of the field. */
  readonly skinDepth_m: number | null;
  /** What the model used; null where it takes none. */
  readonly temperature_K: number | null;
  readonly pressure_Pa: number | null;
  readonly humidity: number | null;
  readonly co2_ppm: number | null;
  readonly salinity_g_per_kg: number | null;
  /** Share of the second constituent of a mixture. */
  readonly composition: number | null;
  readonly transparency_m: readonly [number, number] | null;
  readonly own: boolean;
  readonly fit: FitAnswer | null;
}

export interface InterfaceAnswer {
  readonly Rs: number;
  readonly Rp: number;
  readonly R: number;
  readonly Ts: number | null;
  readonly Tp: number | null;
  readonly T: number | null;
  readonly R_uncertainty: number | null;
  /** Input that contributes most to R_uncertainty, in words. */
  readonly R_uncertaintyFrom: string | null;
  /** Mean over the distribution of the inputs, where R bends too much for an expansion; null elsewhere. */
  readonly R_mean: number | null;
  readonly T_uncertainty: number | null;
  readonly T_uncertaintyFrom: string | null;
  readonly T_mean: number | null;
  /** Spread of R and T where an accuracy is not stated and the disagreement with published values stands in: for digits only. */
  readonly R_digitsGuide: number | null;
  readonly T_digitsGuide: number | null;
  /** Amplitudes of the surface, or of a wholly coherent stack; null where layers are summed as intensities. */
  readonly rs: Complex | null;
  readonly rp: Complex | null;
  readonly ts: Complex | null;
  readonly tp: Complex | null;
  readonly phaseRs_rad: number | null;
  readonly phaseRp_rad: number | null;
  readonly refractionAngle_rad: number | null;
  readonly brewsterAngle_rad: number | null;
  /** Angle at which R_s vanishes: magnetic media only. */
  readonly brewsterAngleS_rad: number | null;
  readonly pseudoBrewsterAngle_rad: number | null;
  readonly criticalAngle_rad: number | null;
  readonly totalReflection: boolean;
  readonly evanescentDepth_m: number | null;
  readonly goosHanchenS_m: number | null;
  readonly goosHanchenP_m: number | null;
  readonly reflectionLoss_dB: number | null;
  readonly returnLoss_dB: number | null;
}

export type { EnergyAnswer } from './beam-answer.ts';

/** A layer of the path, in the order the wave meets them. */
export interface LayerAnswer {
  readonly medium: MediumAnswer;
  readonly thickness_m: number;
  /** Optical thickness n d over the vacuum wavelength. */
  readonly opticalThickness_waves: number;
  readonly coherent: boolean;
  /** 2 n d cos(theta inside). */
  readonly roundTripOpticalPath_m: number;
  /** One pass, oblique path included. */
  readonly internalTransmittance: number;
  /** Share of the incident power, for the asked polarization. */
  readonly absorptance: number;
}

export interface DelayAnswer {
  readonly phase_rad: number;
  readonly groupDelay_s: number;
  readonly gdd_s2: number;
}

/** The whole path; R, T, A for the asked polarization. */
export interface StackAnswer {
  readonly R: number;
  readonly T: number;
  readonly A: number;
  readonly Rs: number;
  readonly Rp: number;
  readonly Ts: number;
  readonly Tp: number;
  /** Seen from the far side at the conjugate angle. */
  readonly R_back: number | null;
  readonly layerAbsorptance: readonly number[];
  readonly insertionLoss_dB: number | null;
  readonly coherence: 'coherent' | 'incoherent' | 'mixed';
  readonly coherenceLength_m: number;
  /** False where the length is the program's own assumption. */
  readonly coherenceLengthStated: boolean;
  /** "pulse": the transform limit of the stated pulse, where it is shorter than what is assumed. */
  readonly coherenceLengthFrom: 'stated' | 'pulse' | 'assumed';
  /** Null where any layer is summed as intensities. */
  readonly reflectionS: DelayAnswer | null;
  readonly reflectionP: DelayAnswer | null;
  readonly transmissionS: DelayAnswer | null;
  readonly transmissionP: DelayAnswer | null;
  /** Largest |E|^2 over that of the incident wave, and where: metres behind the first face (before it: negative). */
  readonly fieldMaximum: null | {
    readonly intensity: number;
    readonly position_m: number;
    readonly layer: number;
  };
  readonly fieldMaximumBefore: null | {
    readonly intensity: number;
    readonly position_m: number;
    readonly period_m: number;
  };
  /** Where asked for and the path is coherent; of s for unpolarized light. */
  readonly fieldProfile: readonly FieldPointAnswer[] | null;
}

export interface FieldPointAnswer {
  /** Behind the first face; negative in front of it. */
  readonly position_m: number;
  /** 0 in front, then the layers, one more behind the last. */
  readonly layer: number;
  /** |E|^2 over that of the incident wave. */
  readonly intensity: number;
  /** Share of the incident power absorbed per length. */
  readonly absorbed_per_m: number;
}

/** One plate with two faces. */
export interface WindowAnswer {
  readonly R1: number;
  readonly R2: number;
  readonly internalTransmittance: number;
  /** 1 - T, the ghosts included in T. */
  readonly totalLoss: number;
  readonly insertionLoss_dB: number | null;
  /** Shares of the incident power: the direct beam, then the ghosts. */
  readonly transmittedBeams: readonly number[];
  readonly reflectedBeams: readonly number[];
  readonly opticalPath_m: number;
  readonly groupDelay_s: number | null;
  readonly gdd_s2: number | null;
  readonly tod_s3: number | null;
  readonly lateralDisplacement_m: number;
  readonly etalon: {
    readonly finesse: number;
    readonly finesseFromWidth: number | null;
    readonly coefficientOfFinesse: number;
    readonly T_max: number;
    readonly T_min: number;
    readonly contrast: number | null;
    readonly ripple_dB: number | null;
    readonly freeSpectralRange_Hz: number | null;
    readonly freeSpectralRange_m: number | null;
  };
  /** Per rad of wedge, near normal incidence. */
  readonly wedgeDeviation_rad_per_rad: number;
  readonly wedgeGhostSeparation_rad_per_rad: number;
}

export interface PulseAnswer {
  readonly durationIn_s: number;
  readonly durationOut_s: number;
  readonly gdd_s2: number;
  readonly tod_s3: number | null;
  /** Above 1 the gaussian result is not to be trusted. */
  readonly thirdOrderRatio: number | null;
  readonly timeBandwidthProduct: number;
  readonly peakPower_W: number | null;
  readonly peakFluence_J_per_m2: number | null;
}

export interface Answer {
  readonly wave: {
    readonly vacuumWavelength_m: number;
    readonly airWavelength_m: number;
    readonly givenInAir: boolean;
    readonly frequency_Hz: number;
    readonly photonEnergy_eV: number;
    readonly wavenumber_per_m: number;
    readonly angularFrequency_rad_per_s: number;
  };
  readonly geometry: { readonly incidenceAngle_rad: number; readonly polarization: Polarization };
  readonly from: MediumAnswer;
  readonly into: MediumAnswer;
  /** Between the two; empty for a single surface. */
  readonly layers: readonly LayerAnswer[];
  /** Of the surface, or of the whole path where there are layers. */
  readonly interface: InterfaceAnswer;
  readonly stack: StackAnswer | null;
  readonly window: WindowAnswer | null;
  readonly pulse: PulseAnswer | null;
  /** With a stated cut. */
  readonly crystal: CrystalAnswer | null;
  /** With a stated beam. */
  readonly energy: BeamAnswer | null;
  readonly cautions: readonly Caution[];
}
