/**
 * Recomputes the published values of a check group through `bindModel`, as the program would get them.
 *
 * Conditions that a row states are handed to the model, which uses those it honours; a fit without a temperature of its own is
 * recomputed as it stands, so its tolerance covers the difference. Radio quantities follow from eps = (n + ik)^2/mu:
 * sigma = eps'' w eps0, resistivity = 1/sigma, skin depth = 1/sqrt(pi f mu0 mu' sigma), surface resistance = sqrt(pi f mu0 mu'/sigma).
 */
import type { CheckGroup, Fit } from '../../src/catalog/types.ts';
import type { Conditions } from '../../src/dispersion/evaluator.ts';
import { bindModel } from '../../src/dispersion/registry.ts';
import { saturationPressure_Pa } from '../../src/dispersion/water-vapour.ts';
import {
  SPEED_OF_LIGHT_m_per_s,
  VACUUM_PERMEABILITY_N_per_A2,
  VACUUM_PERMITTIVITY_F_per_m,
} from '../../src/units/constants.ts';

export interface Recomputed {
  readonly wavelength_um: number;
  readonly quantity: string;
  readonly published: number;
  readonly computed: number;
  /** Absent in groups that are set aside. */
  readonly tolerance: number | undefined;
}

export const STATES = new Set([
  'temperature_C',
  'pressure_Pa',
  'vapourPressure_Pa',
  'humidity',
  'co2_ppm',
  'salinity_g_per_kg',
  'composition',
]);

type State = Readonly<Record<string, number>>;

function conditionsOf(state: State): Conditions {
  const temperature_K = state['temperature_C'] === undefined ? undefined : state['temperature_C'] + 273.15;
  const vapour_Pa = state['vapourPressure_Pa'];
  const humidity =
    vapour_Pa === undefined || temperature_K === undefined
      ? state['humidity']
      : vapour_Pa / saturationPressure_Pa(temperature_K);
  return {
    temperature_K,
    pressure_Pa: state['pressure_Pa'],
    humidity,
    co2_ppm: state['co2_ppm'],
    salinity_g_per_kg: state['salinity_g_per_kg'],
    composition: state['composition'],
  };
}

/** n, k and mu' of a fit at one wavelength of its own reference. */
export function indexOf(
  fit: Fit,
  wavelength_um: number,
  state: State = {},
): { readonly n: number; readonly k: number; readonly mu: number } {
  const bound = bindModel(fit.parameters, conditionsOf(state));
  const out = new Float64Array(8);
  bound.evaluate(wavelength_um, out);
  const mu = new Float64Array(2);
  bound.permeability?.(wavelength_um, mu);
  return { n: out[0] as number, k: out[4] as number, mu: bound.permeability ? (mu[0] as number) : 1 };
}

const QUANTITIES: Readonly<
  Record<string, (n: number, k: number, mu: number, wavelength_um: number) => number>
> = (() => {
  const f_Hz = (L: number): number => SPEED_OF_LIGHT_m_per_s / (L * 1e-6);
  const eps1 = (n: number, k: number, mu: number): number => (n * n - k * k) / mu;
  const eps2 = (n: number, k: number, mu: number): number => (2 * n * k) / mu;
  const sigma = (n: number, k: number, mu: number, L: number): number =>
    eps2(n, k, mu) * 2 * Math.PI * f_Hz(L) * VACUUM_PERMITTIVITY_F_per_m;
  const magnetic = (mu: number, L: number): number => Math.PI * f_Hz(L) * VACUUM_PERMEABILITY_N_per_A2 * mu;
  return {
    n: (n) => n,
    k: (_, k) => k,
    R: (n, k) => ((n - 1) ** 2 + k * k) / ((n + 1) ** 2 + k * k),
    eps1,
    eps2,
    lossTangent: (n, k, mu) => eps2(n, k, mu) / eps1(n, k, mu),
    sigma_S_per_m: sigma,
    resistivity_ohm_m: (n, k, mu, L) => 1 / sigma(n, k, mu, L),
    skinDepth_um: (n, k, mu, L) => 1e6 / Math.sqrt(magnetic(mu, L) * sigma(n, k, mu, L)),
    surfaceResistance_ohm: (n, k, mu, L) => Math.sqrt(magnetic(mu, L) / sigma(n, k, mu, L)),
    alpha_per_cm: (_, k, __, L) => (4 * Math.PI * k) / (L * 1e-4),
    mu1: (_, __, mu) => mu,
    refractivity_1e6: (n) => (n - 1) * 1e6,
  };
})();

/** Names a check column may have besides states and tolerances. */
export const QUANTITY_NAMES: ReadonlySet<string> = new Set(Object.keys(QUANTITIES));

export function recompute(fit: Fit, group: CheckGroup): readonly Recomputed[] {
  return group.rows.flatMap((row) => {
    const at = (name: string): number | undefined => {
      const i = group.columns.indexOf(name);
      return i < 0 ? undefined : row[i];
    };
    const state: Record<string, number> = { ...group.conditions };
    for (const name of group.columns) if (STATES.has(name)) state[name] = at(name) as number;
    const wavelength_um = at('wavelength_um') as number;
    const { n, k, mu } = indexOf(fit, wavelength_um, state);
    return group.columns
      .filter((name) => QUANTITY_NAMES.has(name))
      .map((quantity) => ({
        wavelength_um,
        quantity,
        published: at(quantity) as number,
        computed: (QUANTITIES[quantity] as (typeof QUANTITIES)[string])(n, k, mu, wavelength_um),
        tolerance: at(`tolerance_${quantity}`),
      }));
  });
}

export const digits17 = (x: number): string => x.toPrecision(17);
