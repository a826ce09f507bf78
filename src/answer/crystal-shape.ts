/** The `crystal` part of the answer: a uniaxial crystal at a cut, both of its waves, the plate it makes. */

export interface CrystalWaveAnswer {
  /** Null at normal incidence, where the plane of incidence is free. */
  readonly polarization: 's' | 'p' | null;
  /** Of the wave that runs in the crystal, along its own direction. */
  readonly n: number;
  readonly groupIndex: number | null;
  /** Wave vector and ray, from the normal, signed like the angle of incidence; null in total reflection and in absorbing crystals. */
  readonly waveAngle_rad: number | null;
  readonly rayAngle_rad: number | null;
  /** From wave vector to ray; positive away from the optic axis. */
  readonly walkOff_rad: number | null;
  /** Between wave vector and optic axis. */
  readonly angleToAxis_rad: number | null;
  /** At the face, for the polarization that excites this wave alone. */
  readonly R: number;
  readonly T: number;
}

export interface PlateAnswer {
  readonly thickness_m: number;
  /** Phase of the extraordinary over the ordinary wave, signed. */
  readonly retardance_rad: number;
  readonly retardance_waves: number;
  /** From the accuracies of both fits (taken as independent) and the stated tolerances; null where a fit states none. */
  readonly retardance_uncertainty_waves: number | null;
  /** Between the two rays where they leave, along the surface. */
  readonly walkOffDisplacement_m: number;
}

export interface WaveplateAnswer {
  readonly retardance_waves: number;
  readonly zeroOrderThickness_m: number;
  /** Whole waves more, thinnest first. */
  readonly orders: readonly { readonly order: number; readonly thickness_m: number }[];
}

export interface CrystalAnswer {
  /** "into", "layer 2". */
  readonly about: string;
  readonly key: string | null;
  readonly name: string;
  readonly no: number;
  readonly ne: number;
  readonly no_uncertainty: number | null;
  readonly ne_uncertainty: number | null;
  /** ne - no. */
  readonly birefringence: number;
  readonly birefringence_uncertainty: number | null;
  /** What stands in for it where an accuracy is not stated: for digits only. */
  readonly birefringence_digitsGuide: number;
  readonly opticSign: 'positive' | 'negative' | null;
  readonly cutAngle_rad: number;
  readonly azimuth_rad: number;
  readonly orientation: 'normal-incidence' | 'axis-in-plane-of-incidence' | 'axis-across-plane-of-incidence';
  readonly ordinary: CrystalWaveAnswer;
  readonly extraordinary: CrystalWaveAnswer;
  /** Where R of the p wave vanishes with this cut. */
  readonly brewsterAngle_rad: number | null;
  readonly greatestWalkOff_rad: number;
  readonly greatestWalkOffAngle_rad: number;
  readonly plate: PlateAnswer | null;
  /** For the retardance asked, at this cut and normal incidence; null where none was asked or the cut retards nothing. */
  readonly waveplate: WaveplateAnswer | null;
}
