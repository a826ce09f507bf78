/**
 * The quantities that check values are printed in, from one fit at one wavelength and one state of the medium.
 *
 * From n, k and mu: R at normal incidence in standard air; eps = (n + ik)^2/mu; conductivity w eps0 eps''; resistivity
 * Re(1/sigma) with sigma = -i w eps0 (eps - 1), which for free carriers is the direct-current one at any frequency; skin depth
 * L/(2 pi k), 1/e of the field; surface resistance Re(Z0 mu/(n + ik)).
 */
import { standardAirIndex } from '../dispersion/air-index.ts';
import { type BoundModel, type Conditions, JET_LENGTH, K, N } from '../dispersion/evaluator.ts';
import { bindModel, honours } from '../dispersion/registry.ts';
import { applyThermalForm } from '../dispersion/thermal.ts';
import { vapourPressure_Pa } from '../dispersion/water-vapour.ts';
import { type Complex, complex, div, mul, scale, sub } from '../num/complex.ts';
import {
  SPEED_OF_LIGHT_m_per_s,
  VACUUM_IMPEDANCE_ohm,
  VACUUM_PERMITTIVITY_F_per_m,
} from '../units/constants.ts';
import type { Fit } from './types.ts';

export interface FitOptics {
  readonly wavelength_um: number;
  /** In the fit's own reference. */
  readonly n: number;
  readonly k: number;
  /** Relative to standard air. */
  readonly nInAir: number;
  readonly mu: Complex;
}

/** By column name. */
export const QUANTITIES: Readonly<Record<string, (o: FitOptics) => number>> = {
  n: (o) => o.n,
  k: (o) => o.k,
  R: ({ nInAir: n, k }) => ((n - 1) ** 2 + k * k) / ((n + 1) ** 2 + k * k),
  eps1: (o) => permittivity(o).re,
  eps2: (o) => permittivity(o).im,
  lossTangent: (o) => permittivity(o).im / permittivity(o).re,
  sigma_S_per_m: (o) => omegaEps0(o) * permittivity(o).im,
  resistivity_ohm_m: (o) => {
    const sigma = mul(complex(0, -omegaEps0(o)), sub(permittivity(o), complex(1)));
    return div(complex(1), sigma).re;
  },
  skinDepth_um: (o) => o.wavelength_um / (2 * Math.PI * o.k),
  surfaceResistance_ohm: (o) => scale(div(o.mu, complex(o.n, o.k)), VACUUM_IMPEDANCE_ohm).re,
  alpha_per_cm: (o) => (4 * Math.PI * o.k * 1e4) / o.wavelength_um,
  mu1: (o) => o.mu.re,
  mu2: (o) => o.mu.im,
  refractivity_1e6: (o) => (o.n - 1) * 1e6,
};

const permittivity = (o: FitOptics): Complex => div(mul(complex(o.n, o.k), complex(o.n, o.k)), o.mu);

const omegaEps0 = (o: FitOptics): number =>
  ((2 * Math.PI * SPEED_OF_LIGHT_m_per_s) / (o.wavelength_um * 1e-6)) * VACUUM_PERMITTIVITY_F_per_m;

const ZERO_CELSIUS_K = 273.15;

/** Reads the state of the medium that a check was measured at. */
export type State = (name: string) => number | undefined;

export const NO_STATE: State = () => undefined;

/** Columns that give the state of the medium. */
export const STATES: ReadonlySet<string> = new Set([
  'temperature_C',
  'temperature_K',
  'pressure_Pa',
  'vapourPressure_Pa',
  'humidity',
  'co2_ppm',
  'salinity_g_per_kg',
  'composition',
]);

export interface BoundFit {
  readonly model: BoundModel;
  readonly conditions: Conditions;
}

/** Fixes a fit to a state of the medium. */
export function bindFit(fit: Fit, state: State): BoundFit {
  const conditions = conditionsOf(state);
  return { model: bindModel(fit.parameters, conditions), conditions };
}

export function opticsOf(fit: Fit, wavelength_um: number, { model, conditions }: BoundFit): FitOptics {
  const jet = new Float64Array(JET_LENGTH);
  model.evaluate(wavelength_um, jet);
  const n = warmed(fit, wavelength_um, jet, conditions);
  return {
    wavelength_um,
    n,
    k: jet[K] ?? Number.NaN,
    nInAir: fit.reference === 'air' ? n : n / standardAirIndex(wavelength_um),
    mu: permeability(model, wavelength_um),
  };
}

function conditionsOf(state: State): Conditions {
  const temperature_C = state('temperature_C');
  const temperature_K = temperature_C === undefined ? state('temperature_K') : temperature_C + ZERO_CELSIUS_K;
  const pressure_Pa = state('pressure_Pa');
  const vapour_Pa = state('vapourPressure_Pa');
  const humidity =
    vapour_Pa !== undefined && temperature_K !== undefined
      ? vapour_Pa / vapourPressure_Pa(temperature_K, pressure_Pa ?? 101325, 1)
      : state('humidity');
  return {
    temperature_K,
    pressure_Pa,
    humidity,
    co2_ppm: state('co2_ppm'),
    salinity_g_per_kg: state('salinity_g_per_kg'),
    composition: state('composition'),
  };
}

/** n in the fit's reference, carried to the temperature of the check where the fit has a thermal form for that. */
function warmed(fit: Fit, wavelength_um: number, jet: Float64Array, conditions: Conditions): number {
  const n = jet[N] ?? Number.NaN;
  const { temperature_K } = conditions;
  const { thermal, temperature_C } = fit;
  if (!thermal || temperature_C === undefined || temperature_K === undefined) return n;
  if (honours(fit.parameters).includes('temperature_K')) return n;
  // The form of glass makers describes the absolute index.
  const air = thermal.form === 'dispersive' && fit.reference === 'air' ? standardAirIndex(wavelength_um) : 1;
  const work = new Float64Array(JET_LENGTH);
  work[N] = n * air;
  applyThermalForm(thermal, temperature_C + ZERO_CELSIUS_K, temperature_K, wavelength_um * air, work);
  return (work[N] ?? Number.NaN) / air;
}

function permeability(bound: BoundModel, wavelength_um: number): Complex {
  if (!bound.permeability) return complex(1);
  const mu = new Float64Array(2);
  bound.permeability(wavelength_um, mu);
  return complex(mu[0] ?? Number.NaN, mu[1] ?? Number.NaN);
}
