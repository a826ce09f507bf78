/** The `energy` part of the answer: what a stated beam carries, on both sides, in every layer and at the peak of a pulse. */

/** Just before or just after the boundary. */
export interface EnergyAnswer {
  readonly irradiance_W_per_m2: number;
  readonly peakE_V_per_m: number;
  readonly peakB_T: number;
  readonly energyDensity_J_per_m3: number | null;
}

/** What a tilted surface sees of the beam. */
export interface FootprintAnswer {
  /** Diameter across the plane of incidence, and along the surface in it. */
  readonly acrossDiameter_m: number;
  readonly alongDiameter_m: number;
  /** Power per area of the surface, at the centre: irradiance times cos. Null without a mean power. */
  readonly irradianceOnSurface_W_per_m2: number | null;
}

/** Greatest field somewhere. */
export interface FieldMaximumAnswer {
  readonly peakE_V_per_m: number;
  /** |E|^2 over that of the incident wave. */
  readonly intensity: number;
  /** Behind the first face; negative in front of it. */
  readonly position_m: number;
}

export interface LayerFieldAnswer {
  /** From 1. */
  readonly layer: number;
  /** Standing wave of a coherent path; elsewhere the wave that enters the layer, at its front face. */
  readonly peakE_V_per_m: number | null;
  readonly intensity: number | null;
  readonly position_m: number | null;
  /** Of the wave that enters, across its own direction; null in coherent layers without n2 and where no wave propagates. */
  readonly enteringIrradiance_W_per_m2: number | null;
}

/** The fields for one strength of the incident wave. */
export interface FieldsAnswer {
  readonly incident: EnergyAnswer;
  readonly reflected: EnergyAnswer;
  readonly transmitted: EnergyAnswer | null;
  readonly layers: readonly LayerFieldAnswer[];
  /** In the layers and at the last face, wholly coherent paths only. */
  readonly fieldMaximum: (FieldMaximumAnswer & { readonly layer: number }) | null;
  /** Of the standing wave before the first face; null where the first medium absorbs or a layer is summed as intensities. */
  readonly fieldMaximumBefore: FieldMaximumAnswer | null;
}

/** A pulsed beam: one pulse and the train; fields are those at the peak of the pulse, on the axis of the beam. */
export interface PulsedBeamAnswer {
  readonly energy_J: number;
  readonly duration_s: number | null;
  readonly repetition_Hz: number | null;
  readonly averagePower_W: number | null;
  readonly dutyCycle: number | null;
  /** Gaussian in time: 0.9394 energy/FWHM. */
  readonly peakPower_W: number | null;
  readonly peakIrradiance_W_per_m2: number | null;
  /** At the centre, across the beam; and on the surface, times cos. */
  readonly peakFluence_J_per_m2: number | null;
  readonly fluenceOnSurface_J_per_m2: number | null;
  readonly reflectedEnergy_J: number;
  readonly transmittedEnergy_J: number | null;
  readonly photonsPerPulse: number;
  readonly fields: FieldsAnswer | null;
}

/** B = (2 pi/lambda) times the integral of n2 I along the ray, on the axis, at the peak of the pulse. */
export interface NonlinearAnswer {
  readonly bIntegral_rad: number;
  readonly layers: readonly {
    readonly layer: number;
    readonly nonlinearIndex_m2_per_W: number;
    readonly rayLength_m: number;
    readonly bIntegral_rad: number;
  }[];
}

export interface BeamAnswer {
  /** Mean over a train of pulses; null without an irradiance. */
  readonly incident: EnergyAnswer | null;
  readonly reflected: EnergyAnswer | null;
  readonly transmitted: EnergyAnswer | null;
  readonly radiationPressure_Pa: number | null;
  readonly photonFlux_per_s: number | null;
  readonly incidentPower_W: number | null;
  readonly reflectedPower_W: number | null;
  readonly transmittedPower_W: number | null;
  readonly layers: readonly LayerFieldAnswer[];
  readonly fieldMaximum: FieldsAnswer['fieldMaximum'];
  readonly fieldMaximumBefore: FieldsAnswer['fieldMaximumBefore'];
  readonly footprint: FootprintAnswer | null;
  readonly pulse: PulsedBeamAnswer | null;
  readonly nonlinear: NonlinearAnswer | null;
}
