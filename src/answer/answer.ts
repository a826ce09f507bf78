/**
 * The answer, in the very shape and key names of the machine-readable output (schema 1): faces select and round, they never
 * compute. A value that does not exist for the question is null. Keys are only ever added.
 */

import type { CautionCode } from '../medium/caution.ts';
import type { Complex } from '../num/complex.ts';
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
  readonly T_uncertainty: number | null;
  /** Spread of R and T where an accuracy is not stated and the disagreement with published values stands in: for digits only. */
  readonly R_digitsGuide: number | null;
  readonly T_digitsGuide: number | null;
  readonly rs: Complex;
  readonly rp: Complex;
  readonly ts: Complex;
  readonly tp: Complex;
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

export interface EnergyAnswer {
  readonly irradiance_W_per_m2: number;
  readonly peakE_V_per_m: number;
  readonly peakB_T: number;
  readonly energyDensity_J_per_m3: number | null;
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
  readonly interface: InterfaceAnswer;
  readonly energy: null | {
    readonly incident: EnergyAnswer | null;
    readonly reflected: EnergyAnswer | null;
    readonly transmitted: EnergyAnswer | null;
    readonly radiationPressure_Pa: number | null;
    readonly photonFlux_per_s: number | null;
    readonly incidentPower_W: number | null;
    readonly reflectedPower_W: number | null;
    readonly transmittedPower_W: number | null;
  };
  readonly cautions: readonly Caution[];
}
