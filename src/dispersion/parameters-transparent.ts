/** Parameters of the models that give a real index: glasses, crystals, gases, water in the visible. Conventions: see `parameters.ts`. */

/** Single values that hold over the whole range of the fit; n and k, or permittivity, or index with loss tangent. */
export interface ConstantParameters {
  readonly model: 'constant';
  readonly n?: number;
  readonly k?: number;
  /** Re eps_r, in place of n. */
  readonly permittivity?: number;
  /** eps'' / eps'; eps = n^2 (1 + i tan delta) or permittivity (1 + i tan delta). In place of k. */
  readonly lossTangent?: number;
  /** Relative permeability, real; 1 where absent. */
  readonly permeability?: number;
  /** Set where the source prints one value at one wavelength: there are no derivatives then. */
  readonly publishedAt_um?: number;
}

/** B L^m / (L^2 - C_um^2) or B L^m / (L^2 - C_um2) or B L^m / (L^p - C); m = `numeratorPower`, 2 where absent. */
export type Pole =
  | { readonly B: number; readonly C_um: number; readonly numeratorPower?: 0 | 2 }
  | { readonly B: number; readonly C_um2: number; readonly numeratorPower?: 0 | 2 }
  | {
      readonly B: number;
      /** In um^polePower. */
      readonly C: number;
      readonly numeratorPower: number;
      readonly polePower: number;
    };

/** c L^power. */
export interface PowerTerm {
  readonly c: number;
  readonly power: number;
}

/** n^2 = offset + sum of poles + sum of power terms; L in um. `offset` is the whole constant: 1 where the source fits n^2 - 1. */
export interface SellmeierParameters {
  readonly model: 'sellmeier';
  readonly offset: number;
  readonly poles?: readonly Pole[];
  readonly terms?: readonly PowerTerm[];
}

/** n = sum of power terms, L in `wavelengthUnit`. */
export interface CauchyParameters {
  readonly model: 'cauchy';
  readonly wavelengthUnit: 'um' | 'nm';
  readonly terms: readonly PowerTerm[];
}

/** n = A + B Q + C Q^2 + sum of power terms, Q = 1/(L^2 - pole_um2), L in um. */
export interface HerzbergerParameters {
  readonly model: 'herzberger';
  readonly A: number;
  readonly B: number;
  readonly C: number;
  readonly pole_um2: number;
  readonly terms?: readonly PowerTerm[];
}

/** A coefficient that may depend on the control variable X: fixed, polynomial in X, or linear from its value at X = 0 to that at X = 1. */
export type Controlled = number | readonly number[] | { readonly at0: number; readonly at1: number };

export type ControlVariable =
  /** X = T in K. */
  | { readonly kind: 'temperature-K'; readonly default_K: number }
  /** X = T^2 - reference_K^2, T in K. */
  | { readonly kind: 'temperature-K-squared'; readonly reference_K: number; readonly default_K: number }
  /** X = (t - minus_C)(t + plus_C), t in degrees Celsius. */
  | {
      readonly kind: 'temperature-product';
      readonly minus_C: number;
      readonly plus_C: number;
      readonly default_K: number;
    }
  /** X = share of the second constituent, 0 to 1; `of` names it and says whether by amount or by mass. */
  | { readonly kind: 'composition'; readonly default: number; readonly of: string };

export type ControlledPole = {
  readonly B: Controlled;
  readonly numeratorPower?: 0 | 2;
} & ({ readonly C_um: Controlled } | { readonly C_um2: Controlled });

/** A `sellmeier` whose coefficients depend on temperature or composition. */
export interface ParametricSellmeierParameters {
  readonly model: 'parametric-sellmeier';
  readonly control: ControlVariable;
  readonly offset: Controlled;
  readonly poles?: readonly ControlledPole[];
  readonly terms?: readonly { readonly c: Controlled; readonly power: number }[];
}

/** n^2 = e(T) + exp(-3 x(T)) g(T)/L^2; x is `xBelow` below `switch_K` and `xFrom` from there on; T in K, L in um. */
export interface ExponentialThermalParameters {
  readonly model: 'exponential-thermal';
  readonly e: readonly number[];
  readonly g: readonly number[];
  readonly xBelow: readonly number[];
  readonly xFrom: readonly number[];
  readonly switch_K: number;
  readonly default_K: number;
}

/** Al_x Ga_(1-x) As after Gehrsitz et al.; names as in the file of the model. Arrays over x without constant term start at x^1. */
export interface AluminiumGalliumArsenideParameters {
  readonly model: 'aluminium-gallium-arsenide';
  /** Aluminium fraction, fixed for the material. */
  readonly x: number;
  readonly default_K: number;
  readonly A_T: readonly number[];
  /** x^1 first. */
  readonly A_x: readonly number[];
  readonly invC0_x: readonly number[];
  readonly E1_T: readonly number[];
  /** x^1 first. */
  readonly E1_x: readonly number[];
  readonly C1_x: readonly number[];
  /** x^1 first. */
  readonly E0_x: readonly number[];
  /** Gap at 0 K in eV, then twice (factor, phonon energy in eV). */
  readonly EG: readonly [number, number, number, number, number];
  /** Strength and squared position of the lattice band. */
  readonly R_GaAs: readonly [number, number];
  readonly R_AlAs: readonly [number, number];
  /** eV in one um^-1. */
  readonly eV_um: number;
  readonly k_eV_per_K: number;
}

interface GasState {
  readonly model: 'gas';
  readonly reference_K: number;
  readonly reference_Pa: number;
  /** Second virial coefficient of the density; 0 (ideal gas) where absent. */
  readonly secondVirial_cm3_per_mol?: number;
}

/** A gas at its reference state, scaled with density by Lorentz-Lorenz. s = 1/L in um^-1, L the vacuum wavelength. */
export type GasParameters =
  /** n - 1 = A + sum B/(C_per_um2 - s^2). */
  | (GasState & {
      readonly form: 'refractivity';
      readonly A: number;
      readonly poles: readonly { readonly B: number; readonly C_per_um2: number }[];
    })
  /** n^2 - 1 = sum B L^2/(L^2 - C_um2). */
  | (GasState & {
      readonly form: 'sellmeier';
      readonly poles: readonly { readonly B: number; readonly C_um2: number }[];
    })
  /** n - 1 = A (1 + B_um2/L^2). */
  | (GasState & { readonly form: 'cauchy'; readonly A: number; readonly B_um2: number });

/** Air from temperature, pressure, humidity and CO2. */
export type MoistAirParameters =
  /** The algorithm of Ciddor 1996 with its published coefficients, which stand in `ciddor.ts`. */
  | { readonly model: 'moist-air'; readonly form: 'ciddor-1996' }
  /**
   * 1e8 (n - 1) = a0 + a1/(a2 - s^2) + a3/(a4 - s^2), times [1 + co2 slope (x - x0)], times
   * p/d0 [1 + 1e-8 (d1 - d2 t) p]/(1 + d3 t), minus f (w0 - w1 s^2) 1e-2 (on the scale of 1e8); t in C, p and f in Pa.
   */
  | {
      readonly model: 'moist-air';
      readonly form: 'edlen';
      readonly dispersion: readonly [number, number, number, number, number];
      /** Absent where the form takes no CO2 content. */
      readonly co2?: { readonly slope: number; readonly reference: number };
      readonly density: readonly [number, number, number, number];
      readonly water: readonly [number, number];
      /** State taken where none is given; dry. */
      readonly default_K: number;
      readonly default_Pa: number;
    };

/** n = 1 + 1e-6 (k1 Pd/T + k2 e/T + k3 e/T^2), pressures in hPa, T in K (ITU-R P.453). */
export interface RadioAirParameters {
  readonly model: 'radio-air';
  readonly k1: number;
  readonly k2: number;
  readonly k3: number;
  readonly default_K: number;
  readonly defaultDry_hPa: number;
  readonly defaultVapour_hPa: number;
}

/** Liquid water after IAPWS R9-97: Lorentz-Lorenz with density from temperature at 101325 Pa. */
export interface WaterOpticalParameters {
  readonly model: 'water-optical';
  /** a0 .. a7. */
  readonly a: readonly number[];
  readonly poleUV: number;
  readonly poleIR: number;
  readonly referenceTemperature_K: number;
  readonly referenceDensity_kg_per_m3: number;
  readonly referenceWavelength_um: number;
  readonly default_K: number;
}

/** n = n0 + (n1 + n2 t + n3 t^2) S + n4 t^2 + (n5 + n6 S + n7 t)/l + n8/l^2 + n9/l^3; l in nm, t in C, S in g/kg. */
export interface SeaWaterOpticalParameters {
  readonly model: 'sea-water-optical';
  /** n0 .. n9. */
  readonly n: readonly number[];
  readonly default_K: number;
  readonly default_g_per_kg: number;
}
