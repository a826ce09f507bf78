/**
 * What a fit stores: one record per dispersion model, told apart by `model`. Coefficients stand as the source prints them
 * (squared or unsquared poles, nm or um, eV or 1/cm); signs that a source writes in front of a coefficient go into its value.
 * Names that carry a unit end in it; `um2` is um^2, `per_um2` is um^-2. All arrays of polynomial coefficients start with the
 * constant term. The file beside this one named after the model states its equation, source and special cases.
 *
 * A model that honours the temperature (see `registry.ts`) holds it in its own formula: such a fit has no `thermal` part.
 * Tables of mere reflectance are no fits: they have no optical constants and stand in `Material.reflectanceTables`.
 */

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

/**
 * eps = epsInfinity - S0/(w (w + i G0)) + sum S_j/(w_j^2 - w^2 - i w G_j), all energies in `unit`.
 * Drude: S0 = strength * plasma^2. Lorentz: S_j = strength * plasma^2 (`per: 'plasma'`) or strength * w_j^2 (`per: 'resonance'`).
 */
export interface OscillatorParameters {
  readonly model: 'oscillators';
  readonly unit: 'eV' | 'per_cm';
  readonly epsInfinity: number;
  /** Plasma energy or wavenumber; needed by `drude` and by `per: 'plasma'`. */
  readonly plasma?: number;
  readonly drude?: { readonly strength: number; readonly damping: number };
  readonly per?: 'plasma' | 'resonance';
  readonly lorentz?: readonly {
    readonly strength: number;
    readonly position: number;
    readonly damping: number;
  }[];
}

/** Drude term plus Lorentz oscillators broadened by a Gaussian of standard deviation `width`; all in eV. */
export interface BrendelBormannParameters {
  readonly model: 'brendel-bormann';
  readonly plasma_eV: number;
  readonly drude: { readonly strength: number; readonly damping_eV: number };
  readonly oscillators: readonly {
    readonly strength: number;
    readonly position_eV: number;
    readonly damping_eV: number;
    readonly width_eV: number;
  }[];
}

/** Water and sea water from radio frequencies to the far infrared; t in C, f in GHz unless a name says otherwise. */
export type WaterRelaxationParameters =
  /** Static permittivity s(t), relaxations a exp(-b t) with tau = c exp(d/(t + tc)), optional resonances (polynomials in t). */
  | {
      readonly model: 'water-relaxation';
      readonly form: 'relaxations';
      readonly s: readonly number[];
      readonly a: readonly number[];
      readonly b: readonly number[];
      readonly c_s: readonly number[];
      readonly d_C: readonly number[];
      readonly tc_C: number;
      readonly resonances?: readonly {
        readonly delta: readonly number[];
        readonly f_Hz: readonly number[];
        readonly tau_s: readonly number[];
      }[];
      readonly default_K: number;
    }
  /** Two relaxations after Meissner and Wentz; `salt` for sea water. */
  | {
      readonly model: 'water-relaxation';
      readonly form: 'meissner-wentz';
      readonly es: readonly [number, number, number];
      /** a0 .. a10. */
      readonly a: readonly number[];
      readonly salt?: {
        /** b0 .. b12. */
        readonly b: readonly number[];
        readonly s35: readonly number[];
        /** r0 .. r4. */
        readonly r: readonly number[];
        /** p0 .. p4. */
        readonly a0: readonly number[];
        /** q0 .. q2. */
        readonly a1: readonly number[];
        readonly default_g_per_kg: number;
      };
      readonly default_K: number;
    }
  /** Two relaxations after Liebe, Hufford and Manabe, polynomials in 300/T - 1. */
  | {
      readonly model: 'water-relaxation';
      readonly form: 'liebe';
      readonly s: readonly [number, number];
      readonly r: number;
      readonly i: readonly [number, number];
      readonly g_GHz: readonly [number, number, number];
      readonly q: number;
      readonly default_K: number;
    }
  /** One relaxation and ionic conduction after Klein and Swift. */
  | {
      readonly model: 'water-relaxation';
      readonly form: 'klein-swift';
      readonly epsInfinity: number;
      readonly es: readonly number[];
      readonly a: readonly [number, number, number, number];
      readonly tau_s: readonly number[];
      readonly b: readonly [number, number, number, number];
      readonly beta0: readonly number[];
      readonly beta1: readonly number[];
      readonly sigma25: readonly number[];
      readonly default_K: number;
      readonly default_g_per_kg: number;
    };

/** eps = epsInfinity + deltaEps/(m2 - m1) log10[(10^m2 - i w)/(10^m1 - i w)] + i sigma/(w eps0), w in rad/s. */
export interface WidebandDebyeParameters {
  readonly model: 'wideband-debye';
  readonly epsInfinity: number;
  readonly deltaEps: number;
  readonly m1: number;
  readonly m2: number;
  readonly sigma_S_per_m: number;
}

/** eps' = a f^b, sigma = c f^d in S/m, f in GHz (ITU-R P.2040). */
export interface PowerLawParameters {
  readonly model: 'power-law';
  readonly a: number;
  readonly b: number;
  readonly c: number;
  readonly d: number;
}

/** eps = permittivity + i sigma/(w eps0), mu = permeability; both 1 where absent. */
export interface ConductorParameters {
  readonly model: 'conductor';
  readonly sigma_S_per_m: number;
  readonly permittivity?: number;
  readonly permeability?: number;
}

interface IceRadioCommon {
  readonly model: 'ice-radio';
  /** e0, e1 of eps' = e0 + e1 t. */
  readonly e: readonly [number, number];
  /** a0 (GHz), a1 (GHz), a2. */
  readonly alpha: readonly [number, number, number];
  readonly default_K: number;
}

/** Ice at radio frequencies: eps'' = alpha/f + beta f, f in GHz. */
export type IceRadioParameters =
  | (IceRadioCommon & {
      readonly form: 'maetzler';
      readonly B1: number;
      readonly B2: number;
      readonly b_K: number;
      readonly db: readonly [number, number];
    })
  | (IceRadioCommon & { readonly form: 'hufford'; readonly h: readonly [number, number, number, number] });

/** The coordinate in which a column is interpolated; L in um, E the photon energy in eV. */
export type Along = 'L' | 'L^2' | 'L^-2' | 'ln L' | 'E';

export interface TableColumn {
  readonly values: readonly number[];
  readonly along: Along;
  /** Other coordinate for wavelengths up to `upTo_um` (kind `linear` only). */
  readonly below?: { readonly upTo_um: number; readonly along: Along };
  /** `cubic`: twice continuously differentiable spline; `quadratic`: one parabola through exactly three rows. */
  readonly kind: 'linear' | 'quadratic' | 'cubic';
  /** What is interpolated: the value (where absent), its square or its logarithm. */
  readonly of?: 'value' | 'square' | 'log';
}

/** Printed rows. `k` or `alpha_per_cm` (k = alpha L/(4 pi)) where the medium absorbs. */
export interface TableParameters {
  readonly model: 'table';
  readonly abscissa: 'um' | 'nm' | 'eV';
  /** Strictly monotone, rising or falling, as printed. */
  readonly at: readonly number[];
  readonly n: TableColumn;
  readonly k?: TableColumn;
  readonly alpha_per_cm?: TableColumn;
  /**
   * Further columns of n at other temperatures; linear in between and beyond. `n` itself holds at `temperature_C`.
   * `null` where the source leaves the place empty: the nearest filled row gives the change with temperature.
   */
  readonly warmer?: {
    readonly temperature_C: number;
    readonly columns: readonly { readonly temperature_C: number; readonly n: readonly (number | null)[] }[];
  };
}

/** mu = mu1 + i mu2 linear in log f; eps' and sigma linear in log-log; eps = eps' + i sigma/(w eps0). */
export interface MagneticTableParameters {
  readonly model: 'magnetic-table';
  readonly permeability: {
    readonly f_Hz: readonly number[];
    readonly mu1: readonly number[];
    readonly mu2: readonly number[];
  };
  readonly permittivity: {
    readonly f_Hz: readonly number[];
    readonly eps1: readonly number[];
    readonly sigma_S_per_m: readonly number[];
  };
}

/** n of a solution at one wavelength, linear in content and in temperature between the printed places; `null` where empty. */
export interface CompositionTableParameters {
  readonly model: 'composition-table';
  readonly publishedAt_um: number;
  /** Rising; in percent by mass. */
  readonly content_percent: readonly number[];
  /** Rising. */
  readonly temperatures_C: readonly number[];
  /** One row per content, one place per temperature. */
  readonly n: readonly (readonly (number | null)[])[];
  /** Taken where no composition is stated; 0 to 1. */
  readonly defaultComposition: number;
  readonly default_K: number;
  /** Names the dissolved constituent. */
  readonly of: string;
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

export type ModelParameters =
  | ConstantParameters
  | SellmeierParameters
  | CauchyParameters
  | HerzbergerParameters
  | ParametricSellmeierParameters
  | ExponentialThermalParameters
  | AluminiumGalliumArsenideParameters
  | GasParameters
  | MoistAirParameters
  | RadioAirParameters
  | OscillatorParameters
  | BrendelBormannParameters
  | WaterRelaxationParameters
  | WidebandDebyeParameters
  | PowerLawParameters
  | ConductorParameters
  | IceRadioParameters
  | TableParameters
  | MagneticTableParameters
  | CompositionTableParameters
  | WaterOpticalParameters
  | SeaWaterOpticalParameters;

export type ModelName = ModelParameters['model'];
