/**
 * Liquid water and sea water from radio frequencies to the far infrared: relaxations of Debye's form, and ionic conduction.
 *
 *   relaxations:     eps = s(t) + sum D_i [1/(1 - i w tau_i) - 1] + resonances, D_i = a_i exp(-b_i t), tau_i = c_i exp(d_i/(t + tc))
 *   meissner-wentz:  eps = (es - e1)/(1 - i f/f1) + (e1 - ei)/(1 - i f/f2) + ei + i sigma/(w eps0), all functions of t and S
 *   liebe:           the same two terms, es, e1, ei, f1, f2 polynomials in 300/T - 1
 *   klein-swift:     eps = epsInfinity + (es - epsInfinity)/(1 - i w tau) + i sigma/(w eps0), functions of t and S
 *
 * t in C, f in GHz, w in rad/s, S the salinity in g/kg; relative to vacuum, L the vacuum wavelength in um.
 * Sources: W. J. Ellison, J. Phys. Chem. Ref. Data 36, 1 (2007) and D. D. Turner et al., J. Atmos. Oceanic Technol. 33, 33 (2016)
 * (relaxations); T. Meissner, F. J. Wentz, IEEE Trans. Geosci. Remote Sens. 42, 1836 (2004); H. J. Liebe, G. A. Hufford,
 * T. Manabe, Int. J. Infrared Millimeter Waves 12, 659 (1991); L. A. Klein, C. T. Swift, IEEE Trans. Antennas Propag. 25, 104 (1977).
 * Special cases: salinity counts only where the fit describes sea water; the temperature range is the fit's, nothing is clamped.
 */
import * as C from '../num/complex-jet.ts';
import * as J from '../num/jet.ts';
import { polynomial } from '../num/polynomial.ts';
import type { BoundModel, Conditions } from './evaluator.ts';
import { conduction } from './ionic-conduction.ts';
import type { WaterRelaxationParameters } from './parameters.ts';
import { type SalineState, saltFactors } from './sea-salt.ts';
import { frequency_Hz } from './spectral-variable.ts';
import { writePermittivity } from './write-index.ts';

type Form<F extends WaterRelaxationParameters['form']> = Extract<WaterRelaxationParameters, { form: F }>;

/** A relaxation: strength, and relaxation time in s. */
interface Relaxation {
  readonly strength: number;
  readonly tau_s: number;
}

interface Resonance {
  readonly delta: number;
  readonly f_Hz: number;
  readonly tau_s: number;
}

/** What every form comes to at one temperature and salinity. */
interface WaterState {
  /** Static permittivity. */
  readonly es: number;
  readonly relaxations: readonly Relaxation[];
  readonly resonances: readonly Resonance[];
  readonly sigma_S_per_m: number;
}

export function bindWaterRelaxation(p: WaterRelaxationParameters, conditions: Conditions): BoundModel {
  const temperature_K = conditions.temperature_K ?? p.default_K;
  const t = temperature_K - 273.15;
  const salinity = salinityOf(p, conditions);
  const state = stateOf(p, t, temperature_K, salinity ?? 0);
  return {
    used: { temperature_K, ...(salinity === undefined ? {} : { salinity_g_per_kg: salinity }) },
    hasDerivative: true,
    derivativeOrder: 3,
    complex: true,
    evaluate(wavelength_um, out) {
      writePermittivity(out, permittivity(state, wavelength_um));
    },
  };
}

function salinityOf(p: WaterRelaxationParameters, conditions: Conditions): number | undefined {
  if (p.form === 'klein-swift') return conditions.salinity_g_per_kg ?? p.default_g_per_kg;
  if (p.form === 'meissner-wentz' && p.salt) return conditions.salinity_g_per_kg ?? p.salt.default_g_per_kg;
  return undefined;
}

function stateOf(p: WaterRelaxationParameters, t: number, T: number, S: number): WaterState {
  switch (p.form) {
    case 'relaxations':
      return relaxationsState(p, t);
    case 'meissner-wentz':
      return meissnerWentzState(p, t, S);
    case 'liebe':
      return liebeState(p, 300 / T - 1);
    case 'klein-swift':
      return kleinSwiftState(p, t, S);
  }
}

function relaxationsState(p: Form<'relaxations'>, t: number): WaterState {
  return {
    es: polynomial(p.s, t),
    relaxations: p.a.map((a, i) => ({
      strength: a * Math.exp(-p.b[i]! * t),
      tau_s: p.c_s[i]! * Math.exp(p.d_C[i]! / (t + p.tc_C)),
    })),
    resonances: (p.resonances ?? []).map((r) => ({
      delta: polynomial(r.delta, t),
      f_Hz: polynomial(r.f_Hz, t),
      tau_s: polynomial(r.tau_s, t),
    })),
    sigma_S_per_m: 0,
  };
}

/** Two relaxations given by their end values and frequencies. */
function twoRelaxations({ es, e1, ei, f1_GHz, f2_GHz, sigma_S_per_m }: SalineState): WaterState {
  const tau_s = (f_GHz: number): number => 1 / (2e9 * Math.PI * f_GHz);
  return {
    es,
    relaxations: [
      { strength: es - e1, tau_s: tau_s(f1_GHz) },
      { strength: e1 - ei, tau_s: tau_s(f2_GHz) },
    ],
    resonances: [],
    sigma_S_per_m,
  };
}

function meissnerWentzState(p: Form<'meissner-wentz'>, t: number, S: number): WaterState {
  const { a } = p;
  const fresh: SalineState = {
    es: (p.es[0] + p.es[1] * t) / (p.es[2] + t),
    e1: a[0]! + (a[1]! + a[2]! * t) * t,
    f1_GHz: (45 + t) / (a[3]! + (a[4]! + a[5]! * t) * t),
    ei: a[6]! + a[7]! * t,
    f2_GHz: (45 + t) / (a[8]! + (a[9]! + a[10]! * t) * t),
    sigma_S_per_m: 0,
  };
  return twoRelaxations(p.salt && S > 0 ? saltFactors(p.salt, fresh, t, S) : fresh);
}

function liebeState(p: Form<'liebe'>, theta: number): WaterState {
  const es = p.s[0] + p.s[1] * theta;
  const f1_GHz = polynomial(p.g_GHz, theta);
  return twoRelaxations({
    es,
    e1: p.r * es,
    ei: p.i[0] + p.i[1] * theta,
    f1_GHz,
    f2_GHz: p.q * f1_GHz,
    sigma_S_per_m: 0,
  });
}

function kleinSwiftState(p: Form<'klein-swift'>, t: number, S: number): WaterState {
  /** 1 + c0 S t + c1 S + c2 S^2 + c3 S^3 */
  const salted = (c: readonly [number, number, number, number]): number =>
    1 + S * (c[0] * t + c[1] + S * (c[2] + S * c[3]));
  const es = polynomial(p.es, t) * salted(p.a);
  const d = 25 - t;
  const beta = polynomial(p.beta0, d) - S * polynomial(p.beta1, d);
  return {
    es,
    relaxations: [{ strength: es - p.epsInfinity, tau_s: polynomial(p.tau_s, t) * salted(p.b) }],
    resonances: [],
    sigma_S_per_m: S * polynomial(p.sigma25, S) * Math.exp(-d * beta),
  };
}

function permittivity(state: WaterState, wavelength_um: number): C.ComplexJet {
  const f = frequency_Hz(wavelength_um);
  const w = J.scale(f, 2 * Math.PI);
  let eps = C.constant({ re: state.es, im: 0 });
  for (const { strength, tau_s } of state.relaxations) {
    // strength [1/(1 - i x) - 1] = strength (i x - x^2)/(1 + x^2), x = w tau: no cancellation at low frequency.
    const x = J.scale(w, tau_s);
    const x2 = J.mul(x, x);
    const factor = J.scale(J.reciprocal(J.shift(x2, 1)), strength);
    eps = C.add(eps, C.complexJet(J.neg(J.mul(x2, factor)), J.mul(x, factor)));
  }
  for (const r of state.resonances) eps = C.add(eps, resonance(r, f));
  if (state.sigma_S_per_m !== 0) eps = C.add(eps, conduction(state.sigma_S_per_m, wavelength_um));
  return eps;
}

/**
 * eps'  = -(2 pi tau)^2 (D/2) [f (fr + f)/(1 + (2 pi tau (fr + f))^2) - f (fr - f)/(1 + (2 pi tau (fr - f))^2)]
 * eps'' = pi f tau D [1/(1 + (2 pi tau (fr + f))^2) + 1/(1 + (2 pi tau (fr - f))^2)]
 */
function resonance({ delta, f_Hz, tau_s }: Resonance, f: J.Jet): C.ComplexJet {
  const turn = 2 * Math.PI * tau_s;
  const above = J.shift(f, f_Hz);
  const below = J.shift(J.neg(f), f_Hz);
  const lorentzian = (distance: J.Jet): J.Jet => {
    const x = J.scale(distance, turn);
    return J.reciprocal(J.shift(J.mul(x, x), 1));
  };
  const up = lorentzian(above);
  const down = lorentzian(below);
  const difference = J.sub(J.mul(above, up), J.mul(below, down));
  return C.complexJet(
    J.scale(J.mul(f, difference), (-turn * turn * delta) / 2),
    J.scale(J.mul(f, J.add(up, down)), (turn * delta) / 2),
  );
}
