/** Parameters of the models that give a complex permittivity: metals, water and ice at radio frequencies, building materials. Conventions: see `parameters.ts`. */

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
