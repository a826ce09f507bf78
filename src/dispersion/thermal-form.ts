/**
 * How the index of a fit changes with temperature around the temperature the fit was measured at; applied by `thermal.ts`.
 * dT = T - reference. Fits whose model takes the temperature itself (see `registry.ts`) have no such part.
 */
export type ThermalForm =
  /** n changes by dn_dT dT, in the fit's own reference (air or vacuum). */
  | {
      readonly form: 'constant';
      readonly dn_dT_per_K: number;
      /** The temperature of the fit where absent. */
      readonly referenceTemperature_C?: number;
      readonly range: string;
    }
  /**
   * The form glass makers print; the change of the ABSOLUTE index:
   * (n^2 - 1)/(2 n) [D0 dT + D1 dT^2 + D2 dT^3 + (E0 dT + E1 dT^2)/(L^2 - lambdaTK^2)].
   */
  | {
      readonly form: 'dispersive';
      readonly D0: number;
      readonly D1: number;
      readonly D2: number;
      readonly E0: number;
      readonly E1: number;
      readonly lambdaTK_um: number;
      readonly referenceTemperature_C: number;
      readonly range: string;
    }
  /**
   * scale (sum g_j L^exponent_j) (dT + quadratic_per_K dT^2 + k_per_C (t^2 - t_ref^2)/2); L in um, t in degrees Celsius.
   * In the fit's own reference. `quadratic_per_K` and `k_per_C` are 0 where absent.
   */
  | {
      readonly form: 'wavelength-polynomial';
      readonly g: readonly number[];
      readonly exponents: readonly number[];
      readonly scale: number;
      readonly quadratic_per_K?: number;
      readonly k_per_C?: number;
      readonly referenceTemperature_C: number;
      readonly range: string;
    }
  /**
   * Difference, between t and the reference, of n from
   * n^2 = 1 + (a/pi) ln((E1^2 - E^2)/(E0^2 - E^2)) + (e2/pi) ln((E2^2 - E^2)/(E1^2 - E^2)) + G3/(E3^2 - E^2),
   * E the photon energy in eV, E0 .. E3 polynomials in dT. For semiconductors near the band edge.
   */
  | {
      readonly form: 'band-edge';
      readonly a: number;
      readonly e2: number;
      readonly G3: number;
      readonly E0: readonly number[];
      readonly E1: readonly number[];
      readonly E2: readonly number[];
      readonly E3: readonly number[];
      readonly referenceTemperature_C: number;
      readonly range: string;
    };
