/**
 * The index of air after Ciddor: dispersion of standard dry air and of water vapour, scaled with their densities.
 *
 *   1e8 (n_as - 1) = k1/(k0 - s^2) + k3/(k2 - s^2)                       dry, 15 C, 101325 Pa, 450 ppm CO2
 *   n_axs - 1      = (n_as - 1) [1 + 0.534e-6 (x_c - 450)]               x_c in ppm
 *   1e8 (n_ws - 1) = 1.022 (w0 + w1 s^2 + w2 s^4 + w3 s^6)               pure vapour, 20 C, 1333 Pa
 *   n - 1          = (rho_a/rho_axs)(n_axs - 1) + (rho_w/rho_ws)(n_ws - 1)
 *   rho = p M x/(Z R T),  Z = 1 - (p/T)[a0 + a1 t + a2 t^2 + (b0 + b1 t) x_w + (c0 + c1 t) x_w^2] + (p/T)^2 (d + e x_w^2)
 *
 * s = 1/L in um^-1, L the vacuum wavelength; T in K, t in C, p in Pa; x_w the molar fraction of water vapour.
 * Source: P. E. Ciddor, Appl. Opt. 35, 1566 (1996); compressibility after Davis 1992. Stated for 0.3 to 1.69 um.
 *
 * Special cases: below 0.185 um, where the resonances of the dispersion formula come near, the refractivities keep their value at
 * 0.185 um and their derivatives are zero. Towards long waves they tend to a constant: absorption bands of the air in the
 * infrared change n by less than 1e-7 between the lines and are not described.
 */
import type { Jet } from '../num/jet.ts';
import { compose, constant } from '../num/jet.ts';
import { type SquareForm, taylorInSquare } from './in-square.ts';
import { vapourPressure_Pa } from './water-vapour.ts';

export const CIDDOR_1996 = {
  k: [238.0185, 5792105, 57.362, 167917],
  w: [295.235, 2.6422, -0.03238, 0.004028],
  waterFactor: 1.022,
  co2Slope_per_ppm: 0.534e-6,
  a: [1.58123e-6, -2.9331e-8, 1.1043e-10],
  b: [5.707e-6, -2.051e-8],
  c: [1.9898e-4, -2.376e-6],
  d: 1.83e-11,
  e: -7.65e-9,
  R_J_per_mol_K: 8.31451,
  M_water_kg_per_mol: 0.018015,
} as const;

/** Shortest wavelength at which the dispersion formulas are followed. */
export const SHORTEST_um = 0.185;

const [k0, k1, k2, k3] = CIDDOR_1996.k;
const [w0, w1, w2, w3] = CIDDOR_1996.w;

/** n_as - 1 in x = L^2: k1/(k0 - s^2) = (k1/k0) x/(x - 1/k0). */
export const STANDARD_AIR: SquareForm = {
  offset: 0,
  poles: Float64Array.of(
    (k1 / k0) * 1e-8,
    0,
    1 / k0,
    (k1 / k0 / k0) * 1e-8,
    (k3 / k2) * 1e-8,
    0,
    1 / k2,
    (k3 / k2 / k2) * 1e-8,
  ),
  rising: new Float64Array(0),
  falling: new Float64Array(0),
};

const WATER_VAPOUR: SquareForm = {
  offset: w0 * CIDDOR_1996.waterFactor * 1e-8,
  poles: new Float64Array(0),
  rising: new Float64Array(0),
  falling: Float64Array.of(w1, w2, w3).map((w) => w * CIDDOR_1996.waterFactor * 1e-8),
};

const scratch = new Float64Array(4);

function refractivity(form: SquareForm, vacuum_um: number): Jet {
  const L = Math.max(vacuum_um, SHORTEST_um);
  taylorInSquare(form, L * L, scratch);
  if (L !== vacuum_um) return constant(scratch[0]!);
  return compose(scratch[0]!, scratch[1]!, scratch[2]!, scratch[3]!, [L * L, 2 * L, 1, 0]);
}

/** n - 1 of standard air (15 C, 101325 Pa, dry, 450 ppm CO2) as a jet of the vacuum wavelength. */
export const standardAirRefractivity = (vacuum_um: number): Jet => refractivity(STANDARD_AIR, vacuum_um);

/** n - 1 of water vapour at 20 C and 1333 Pa. */
export const waterVapourRefractivity = (vacuum_um: number): Jet => refractivity(WATER_VAPOUR, vacuum_um);

export interface AirState {
  readonly temperature_K: number;
  readonly pressure_Pa: number;
  /** Relative humidity, 0 to 1. */
  readonly humidity: number;
  readonly co2_ppm: number;
}

export const STANDARD_STATE: AirState = {
  temperature_K: 288.15,
  pressure_Pa: 101_325,
  humidity: 0,
  co2_ppm: 450,
};

/** Molar density p/(Z R T) in mol/m^3 at the molar fraction x of water vapour. */
function molarDensity(temperature_K: number, pressure_Pa: number, x: number): number {
  const { a, b, c, d, e, R_J_per_mol_K } = CIDDOR_1996;
  const t = temperature_K - 273.15;
  const pT = pressure_Pa / temperature_K;
  const first = a[0] + (a[1] + a[2] * t) * t + (b[0] + b[1] * t) * x + (c[0] + c[1] * t) * x * x;
  const Z = 1 - pT * first + pT * pT * (d + e * x * x);
  return pressure_Pa / (Z * R_J_per_mol_K * temperature_K);
}

/** Factors of the standard-air and of the water-vapour refractivity: n - 1 = dry (n_as - 1) + water (n_ws - 1). */
export function densityFactors(state: AirState): { dry: number; water: number } {
  const { temperature_K: T, pressure_Pa: p } = state;
  if (p === 0) return { dry: 0, water: 0 };
  const x = vapourPressure_Pa(T, p, state.humidity) / p;
  // The molar mass of dry air cancels from rho_a/rho_axs, that of water from rho_w/rho_ws.
  const density = molarDensity(T, p, x);
  const co2 = 1 + CIDDOR_1996.co2Slope_per_ppm * (state.co2_ppm - 450);
  return {
    dry: (co2 * density * (1 - x)) / molarDensity(288.15, 101_325, 0),
    water: (density * x) / molarDensity(293.15, 1333, 1),
  };
}
