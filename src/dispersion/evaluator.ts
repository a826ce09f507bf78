/**
 * The contract of every dispersion model.
 *
 * A model turns the parameters of a fit and the present conditions into an `Evaluator`: a closure that writes the complex
 * refractive index and its exact derivatives with respect to wavelength into a caller-owned array. No allocation per call,
 * so the same closure serves one answer and a million batch rows.
 *
 * Convention: fields exp(i(k r - w t)), n + ik, k >= 0 absorbs. The wavelength is in micrometres and in the fit's own
 * reference (vacuum wavelength for fits relative to vacuum, air wavelength for fits relative to air).
 */

/** Layout of the array an evaluator writes: n, n', n'', n''', k, k', k'', k''' (derivatives by wavelength in um). */
export const JET_LENGTH = 8;
export const N = 0;
export const K = 4;
/** n, dn/dL, d2n/dL2, d3n/dL3, k, dk/dL, d2k/dL2, d3k/dL3; L in um. */
export type IndexJet = Float64Array;

export type Evaluator = (wavelength_um: number, out: IndexJet) => void;

/** Conditions a question may state; `undefined` means "not stated": the model then uses its own reference condition. */
export interface Conditions {
  readonly temperature_K?: number | undefined;
  readonly pressure_Pa?: number | undefined;
  /** Relative humidity, 0 to 1. */
  readonly humidity?: number | undefined;
  /** CO2 content of air, in 1e-6 by volume. */
  readonly co2_ppm?: number | undefined;
  /** g of salt per kg of sea water. */
  readonly salinity_g_per_kg?: number | undefined;
  /** Share of the second constituent of a mixture, 0 to 1; by amount or by mass as the fit says. */
  readonly composition?: number | undefined;
}

export type ConditionName = keyof Conditions;

/** What binding a fit to conditions gives. */
export interface BoundModel {
  /** Where a fit has no index (n^2 <= 0 outside its range) the parts written are NaN. */
  readonly evaluate: Evaluator;
  /** Only n, only for models whose k is zero: the cheap path for searches. The value `evaluate` writes, to rounding. */
  readonly index?: (wavelength_um: number) => number;
  /** n of the first `count` wavelengths, for models whose k is zero: the numbers `evaluate` writes, to the last bit. */
  readonly indexBlock?: (wavelengths_um: Float64Array, count: number, n: Float64Array) => void;
  /** n - L dn/dL of what `evaluate` writes, to rounding, for models whose k is zero; not finite where n^2 <= 0. */
  readonly groupIndex?: (wavelength_um: number) => number;
  /** Writes n, dn/dL, k, dk/dL alone and leaves the higher derivatives untouched: the cheap path of batches. */
  readonly evaluateFirst?: Evaluator;
  /** Writes Re mu_r, Im mu_r into the two-element array; absent where mu_r = 1. n of `evaluate` is sqrt(eps mu) then. */
  readonly permeability?: (wavelength_um: number, out: Float64Array) => void;
  /** Conditions the model really used (filled in with its defaults), so that the answer can state them. */
  readonly used: Conditions;
  /** False where the derivatives written are not defined (single published value): the answer then says null. */
  readonly hasDerivative: boolean;
  /**
   * The highest derivative that means something: 3 for formulas, 2 for tables under a cubic spline, 1 under straight lines,
   * 0 for a single value. Higher ones are written, but they describe the interpolant and not the medium.
   */
  readonly derivativeOrder: 0 | 1 | 2 | 3;
  /** True where the fit gives k (or says that it is zero), false where it is silent about absorption. */
  readonly complex: boolean;
}
