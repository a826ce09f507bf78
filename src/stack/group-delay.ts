/**
 * Phase, group delay and group-delay dispersion of a coherent stack on reflection and transmission, exact: the first two
 * frequency derivatives of every index go through the characteristic matrices as truncated Taylor series.
 *
 *   tau = d(arg r)/dw,  GDD = d^2(arg r)/dw^2      (fields exp(i(k r - w t)); likewise for t)
 *
 * at a fixed angle of incidence. r refers to the first interface, t to the first interface and the surface of the exit
 * medium, at the same lateral place; signs as in `coherent-stack.ts`.
 * Source: Macleod, Thin-Film Optical Filters (phase and dispersion); matrices as in `stack-kernel.ts`.
 *
 * Special cases, null: an amplitude that is zero or underflows has no phase; at the critical angle of the exit medium the
 * derivatives do not exist.
 */
import { abs, arg, type Complex, complex, div, mul, ONE, sub } from '../num/complex.ts';
import { SPEED_OF_LIGHT_m_per_s } from '../units/constants.ts';
import {
  atCentre,
  constant,
  type FrequencySeries,
  firstOf,
  fromDerivatives,
  linear,
  minus,
  negative,
  over,
  plus,
  scaled,
  secondOf,
  squareRoot,
  times,
  timesMinusI,
} from './frequency-series.ts';
import { cosineAndSinc } from './layer-functions.ts';
import { checkPath, type Polarization, substanceFromIndex } from './layered-path.ts';

/** Complex index n + ik and its derivatives by the angular frequency; permeability taken as constant, 1 if absent. */
export interface DispersiveSubstance {
  readonly n: Complex;
  readonly dn_domega_s: Complex;
  readonly d2n_domega2_s2: Complex;
  readonly mu?: Complex | undefined;
}

export interface DispersiveLayer extends DispersiveSubstance {
  readonly thickness_m: number;
}

export interface DispersivePath {
  readonly incidence: DispersiveSubstance;
  readonly layers: readonly DispersiveLayer[];
  readonly exit: DispersiveSubstance;
}

export interface PhaseDispersion {
  readonly phase_rad: number;
  readonly groupDelay_s: number;
  readonly gdd_s2: number;
}

export interface StackDispersion {
  readonly reflection: PhaseDispersion | null;
  readonly transmission: PhaseDispersion | null;
}

/** A medium whose index does not depend on frequency. */
export const nonDispersive = (n: number, k = 0): DispersiveSubstance => ({
  n: complex(n, k),
  dn_domega_s: complex(0),
  d2n_domega2_s2: complex(0),
});

/**
 * Derivatives by wavelength turned into derivatives by angular frequency: with u = lambda^2/(2 pi c),
 * dn/dw = -u n', d2n/dw2 = u^2 (n'' + 2 n'/lambda).
 */
export function dispersiveFromWavelength(
  n: Complex,
  dn_dlambda_per_m: Complex,
  d2n_dlambda2_per_m2: Complex,
  vacuumWavelength_m: number,
): DispersiveSubstance {
  const u = vacuumWavelength_m ** 2 / (2 * Math.PI * SPEED_OF_LIGHT_m_per_s);
  const curve = (part: 're' | 'im'): number =>
    u * u * (d2n_dlambda2_per_m2[part] + (2 * dn_dlambda_per_m[part]) / vacuumWavelength_m);
  return {
    n,
    dn_domega_s: { re: -u * dn_dlambda_per_m.re, im: -u * dn_dlambda_per_m.im },
    d2n_domega2_s2: { re: curve('re'), im: curve('im') },
  };
}

/** Throws `StackRefusal` as `coherentStack` does. */
export function stackDispersion(
  path: DispersivePath,
  vacuumWavelength_m: number,
  incidenceAngle_rad: number,
): Readonly<Record<Polarization, StackDispersion>> {
  const plain = (x: DispersiveSubstance) => substanceFromIndex(x.n.re, x.n.im, x.mu ?? ONE);
  checkPath(
    {
      incidence: plain(path.incidence),
      layers: path.layers.map((layer) => ({ ...plain(layer), thickness_m: layer.thickness_m })),
      exit: plain(path.exit),
    },
    vacuumWavelength_m,
    incidenceAngle_rad,
  );
  const omega_rad_per_s = (2 * Math.PI * SPEED_OF_LIGHT_m_per_s) / vacuumWavelength_m;
  const n0 = indexSeries(path.incidence);
  const kappa0 = scaled(n0, Math.cos(incidenceAngle_rad));
  const incident: IncidentWave = { kappa: kappa0, kappa2: times(kappa0, kappa0), n2: times(n0, n0) };
  // A layer object that occurs several times is worked out once.
  const known = new Map<DispersiveLayer, CrossedLayer>();
  const layers = [...path.layers].reverse().map((layer) => {
    const seen = known.get(layer) ?? crossed(layer, incident, omega_rad_per_s);
    known.set(layer, seen);
    return seen;
  });
  return {
    s: dispersionOf('s', path, incident, layers),
    p: dispersionOf('p', path, incident, layers),
  };
}

/** Normal wave vector over k0, its square, and the squared index, in the medium of incidence. */
interface IncidentWave {
  readonly kappa: FrequencySeries;
  readonly kappa2: FrequencySeries;
  readonly n2: FrequencySeries;
}

/** What a layer needs, with -i sin/kappa as `turn`. */
interface CrossedLayer {
  readonly cosine: FrequencySeries;
  readonly turnZ: Readonly<Record<Polarization, FrequencySeries>>;
  readonly turnY: Readonly<Record<Polarization, FrequencySeries>>;
  readonly decay: number;
}

function crossed(layer: DispersiveLayer, incident: IncidentWave, omega_rad_per_s: number): CrossedLayer {
  const kappa2 = kappaSquared(layer, incident);
  const k0d = linear(omega_rad_per_s, layer.thickness_m / SPEED_OF_LIGHT_m_per_s);
  const { cosine, sinc, decay } = cosineAndSinc(times(times(k0d, k0d), kappa2));
  const turn = timesMinusI(times(k0d, sinc));
  const eps = epsilon(layer);
  const permeability = mu(layer);
  return {
    cosine,
    turnZ: { s: times(permeability, turn), p: times(over(kappa2, eps), turn) },
    turnY: { s: times(over(kappa2, permeability), turn), p: times(eps, turn) },
    decay,
  };
}

function dispersionOf(
  polarization: Polarization,
  path: DispersivePath,
  incident: IncidentWave,
  layersUpwards: readonly CrossedLayer[],
): StackDispersion {
  const s = polarization === 's';
  const kappaExit = decayingRoot(kappaSquared(path.exit, incident), path.exit);
  let E = s ? constant(ONE) : over(kappaExit, epsilon(path.exit));
  let H = s ? over(kappaExit, mu(path.exit)) : constant(ONE);
  let transmitted = 1;
  for (const { cosine, turnZ, turnY, decay } of layersUpwards) {
    const nextE = plus(times(cosine, E), times(turnZ[polarization], H));
    const nextH = plus(times(cosine, H), times(turnY[polarization], E));
    // A constant factor changes no phase; this one keeps the numbers in range.
    const size = 1 / (abs(atCentre(nextE)) + abs(atCentre(nextH)));
    E = scaled(nextE, size);
    H = scaled(nextH, size);
    transmitted *= decay * size;
  }
  const u = s ? incident.kappa : epsilon(path.incidence);
  const first = times(u, E);
  const second = times(s ? mu(path.incidence) : incident.kappa, H);
  const sum = plus(first, second);
  const r = over(minus(first, second), sum);
  const into = over(u, sum);
  const fieldPerH = over(mu(path.exit), forwardIndex(path.exit));
  return {
    reflection: phaseDispersion(s ? r : negative(r)),
    transmission: transmitted === 0 ? null : phaseDispersion(s ? into : times(into, fieldPerH)),
  };
}

const indexSeries = (x: DispersiveSubstance): FrequencySeries =>
  fromDerivatives(x.n, x.dn_domega_s, x.d2n_domega2_s2);

const mu = (x: DispersiveSubstance): FrequencySeries => constant(x.mu ?? ONE);

function epsilon(x: DispersiveSubstance): FrequencySeries {
  const n = indexSeries(x);
  return x.mu ? over(times(n, n), mu(x)) : times(n, n);
}

/** n^2 - n0^2 + kappa0^2: near grazing incidence n^2 - q^2 would cancel. */
function kappaSquared(x: DispersiveSubstance, incident: IncidentWave): FrequencySeries {
  const n = indexSeries(x);
  return plus(minus(times(n, n), incident.n2), incident.kappa2);
}

/** Index with Im >= 0 as given; backward in a doubly negative medium, where a positive n was written down. */
function forwardIndex(x: DispersiveSubstance): FrequencySeries {
  const n = indexSeries(x);
  return x.n.im === 0 && (x.mu?.re ?? 1) < 0 && x.n.re > 0 ? negative(n) : n;
}

function decayingRoot(w: FrequencySeries, x: DispersiveSubstance): FrequencySeries {
  const root = squareRoot(w);
  const backward = root.im === 0 && (x.mu?.re ?? 1) < 0;
  return root.im < 0 || backward ? negative(root) : root;
}

/** (ln a)' = a'/a, (ln a)'' = a''/a - (a'/a)^2; the imaginary parts are those of the phase. */
function phaseDispersion(a: FrequencySeries): PhaseDispersion | null {
  const value = atCentre(a);
  const slope = div(firstOf(a), value);
  const curvature = sub(div(secondOf(a), value), mul(slope, slope));
  const result = { phase_rad: arg(value), groupDelay_s: slope.im, gdd_s2: curvature.im };
  return abs(value) > 0 && Number.isFinite(result.groupDelay_s) && Number.isFinite(result.gdd_s2)
    ? result
    : null;
}
