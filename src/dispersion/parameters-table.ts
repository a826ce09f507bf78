/** Parameters of the models that interpolate printed rows. Conventions: see `parameters.ts`. */

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
