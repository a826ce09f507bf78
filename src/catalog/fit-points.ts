/**
 * Least-squares fits of a dispersion formula to measured indices:
 *   sellmeier  n^2 = 1 + sum B_i L^2/(L^2 - C_i^2), 1 to 4 terms
 *   cauchy     n = c_0 + c_1/L^2 + c_2/L^4 ..., 2 to 5 terms
 * L in um, in the reference of the points. Pure: the same points give the same result on every machine and in every run.
 *
 * Uncertainties are standard uncertainties from the covariance of the fit: (J^T W J)^-1 where every point states its own
 * uncertainty, else that times the variance of the residuals. They describe the points, not the material.
 */
import type { CauchyParameters, SellmeierParameters } from '../dispersion/parameters.ts';
import { solveLeastSquares } from './linear-least-squares.ts';
import { fitSellmeier, sellmeierGradient, sellmeierIndex } from './sellmeier-fit.ts';

export interface IndexPoint {
  readonly wavelength_um: number;
  readonly n: number;
  /** Standard uncertainty of n; used only if every point has one. */
  readonly uncertainty_n?: number;
}

export interface FitRequest {
  readonly model: 'sellmeier' | 'cauchy';
  readonly terms: number;
}

/** Why there is no fit, for a person. */
export interface FitFault {
  readonly message: string;
  readonly remedy: string;
}

export interface FittedCoefficient {
  /** B1, C1_um, B2 ... or c0, c1_um2, c2_um4 ... */
  readonly name: string;
  readonly value: number;
  /** Absent where there are no more points than coefficients. */
  readonly uncertainty?: number;
}

export interface FittedPoint extends IndexPoint {
  readonly fitted_n: number;
  /** Measured minus fitted. */
  readonly residual_n: number;
}

export type FitWarning =
  /** A pole lies inside the range of the points or within 5 % of it: the formula runs away there. */
  | { readonly code: 'pole-in-range'; readonly pole_um: number }
  /** A negative strength: no physical resonance; extrapolation is worthless. */
  | { readonly code: 'negative-strength'; readonly coefficient: string }
  /** As many coefficients as points: the residuals say nothing. */
  | { readonly code: 'no-freedom' }
  /** A coefficient is smaller than twice its uncertainty: fewer terms would do. */
  | { readonly code: 'undetermined'; readonly coefficient: string };

export interface PointFit {
  readonly parameters: SellmeierParameters | CauchyParameters;
  readonly coefficients: readonly FittedCoefficient[];
  /** Covariance of the coefficients in their order; absent as their uncertainties are. */
  readonly covariance?: readonly (readonly number[])[];
  readonly points: readonly FittedPoint[];
  readonly range_um: readonly [number, number];
  /** Points minus coefficients. */
  readonly freedom: number;
  /** Root of the mean square residual. */
  readonly rms_n: number;
  readonly largest_n: number;
  /** Standard deviation of the residuals, with the freedom as divisor; absent where that is 0. */
  readonly deviation_n?: number;
  /** Chi squared by freedom; present where the points state their uncertainties and there is freedom. */
  readonly reducedChiSquared?: number;
  readonly warnings: readonly FitWarning[];
}

/** Fewest and most terms of each formula. */
export const FIT_TERMS = { sellmeier: [1, 4], cauchy: [2, 5] } as const;

export function fitPoints(points: readonly IndexPoint[], request: FitRequest): PointFit | FitFault {
  const fault = faultOf(points, request);
  if (fault) return fault;
  const sorted = [...points].sort((a, b) => a.wavelength_um - b.wavelength_um);
  const weighted = sorted.every((p) => p.uncertainty_n !== undefined);
  const sigma = sorted.map((p) => (weighted ? (p.uncertainty_n ?? 1) : 1));
  const solution =
    request.model === 'cauchy'
      ? fitCauchy(sorted, sigma, request.terms)
      : fitSellmeier(sorted, sigma, request.terms);
  if (!solution)
    return {
      message: `a ${request.model} formula of ${request.terms} terms cannot be determined from these points`,
      remedy: 'use fewer terms, or points over a wider range',
    };
  return report(sorted, sigma, weighted, request, solution);
}

export const isFitFault = (result: PointFit | FitFault): result is FitFault => 'remedy' in result;

function faultOf(points: readonly IndexPoint[], { model, terms }: FitRequest): FitFault | undefined {
  const [fewest, most] = FIT_TERMS[model];
  if (!Number.isInteger(terms) || terms < fewest || terms > most)
    return { message: `${terms} terms`, remedy: `a ${model} fit takes ${fewest} to ${most} terms` };
  const bad = points.find(
    (p) =>
      !(p.wavelength_um > 0 && Number.isFinite(p.wavelength_um)) ||
      !(p.n > 0 && Number.isFinite(p.n)) ||
      !((p.uncertainty_n ?? 1) > 0),
  );
  if (bad)
    return {
      message: `the point ${bad.wavelength_um} um, n = ${bad.n} is no measurement`,
      remedy: 'wavelength, n and uncertainty must be numbers above 0',
    };
  const below = model === 'sellmeier' ? points.find((p) => p.n <= 1) : undefined;
  if (below)
    return {
      message: `n = ${below.n} at ${below.wavelength_um} um is not above 1`,
      remedy: 'a sellmeier fit describes transparent media with n > 1; try cauchy',
    };
  const distinct = new Set(points.map((p) => p.wavelength_um)).size;
  const needed = model === 'sellmeier' ? 2 * terms : terms;
  if (distinct < needed)
    return {
      message: `${distinct} distinct wavelengths for ${needed} coefficients`,
      remedy: `give at least ${needed} points, or use fewer terms`,
    };
  return undefined;
}

function fitCauchy(
  points: readonly IndexPoint[],
  sigma: readonly number[],
  terms: number,
): readonly number[] | undefined {
  const rows = points.map((p, i) => cauchyGradient(p.wavelength_um, terms).map((g) => g / (sigma[i] ?? 1)));
  return solveLeastSquares(
    rows,
    points.map((p, i) => p.n / (sigma[i] ?? 1)),
  )?.solution;
}

const cauchyGradient = (wavelength_um: number, terms: number): readonly number[] =>
  Array.from({ length: terms }, (_, i) => wavelength_um ** (-2 * i));

function report(
  points: readonly IndexPoint[],
  sigma: readonly number[],
  weighted: boolean,
  { model, terms }: FitRequest,
  values: readonly number[],
): PointFit {
  const cauchy = model === 'cauchy';
  const gradient = (L: number): readonly number[] =>
    cauchy ? cauchyGradient(L, terms) : sellmeierGradient(values, L);
  const index = (L: number): number =>
    cauchy ? gradient(L).reduce((n, g, i) => n + g * (values[i] ?? 0), 0) : sellmeierIndex(values, L);
  const fitted = points.map((p) => {
    const fitted_n = index(p.wavelength_um);
    return { ...p, fitted_n, residual_n: p.n - fitted_n };
  });
  const freedom = points.length - values.length;
  const squares = fitted.reduce((sum, p) => sum + p.residual_n ** 2, 0);
  const chiSquared = fitted.reduce((sum, p, i) => sum + (p.residual_n / (sigma[i] ?? 1)) ** 2, 0);
  const rows = points.map((p, i) => gradient(p.wavelength_um).map((g) => g / (sigma[i] ?? 1)));
  const normal = solveLeastSquares(
    rows,
    points.map(() => 0),
  )?.inverseNormal;
  const variance = weighted ? 1 : freedom > 0 ? chiSquared / freedom : undefined;
  const covariance =
    normal && variance !== undefined ? normal.map((row) => row.map((x) => x * variance)) : undefined;
  const coefficients = values.map((value, i): FittedCoefficient => {
    const spread = covariance?.[i]?.[i];
    const name = cauchy
      ? cauchyName(i)
      : `${i % 2 === 0 ? 'B' : 'C'}${Math.floor(i / 2) + 1}${i % 2 === 0 ? '' : '_um'}`;
    return spread === undefined ? { name, value } : { name, value, uncertainty: Math.sqrt(spread) };
  });
  const range_um = [points[0]?.wavelength_um ?? 0, points.at(-1)?.wavelength_um ?? 0] as const;
  return {
    parameters: cauchy ? cauchyParameters(values) : sellmeierParameters(values),
    coefficients,
    ...(covariance ? { covariance } : {}),
    points: fitted,
    range_um,
    freedom,
    rms_n: Math.sqrt(squares / points.length),
    largest_n: Math.max(...fitted.map((p) => Math.abs(p.residual_n))),
    ...(freedom > 0 ? { deviation_n: Math.sqrt(squares / freedom) } : {}),
    ...(freedom > 0 && weighted ? { reducedChiSquared: chiSquared / freedom } : {}),
    warnings: [...warningsOf(coefficients, range_um, freedom, cauchy)],
  };
}

const cauchyName = (i: number): string => (i === 0 ? 'c0' : `c${i}_um${2 * i}`);

const cauchyParameters = (values: readonly number[]): CauchyParameters => ({
  model: 'cauchy',
  wavelengthUnit: 'um',
  terms: values.map((c, i) => ({ c, power: i === 0 ? 0 : -2 * i })),
});

const sellmeierParameters = (values: readonly number[]): SellmeierParameters => ({
  model: 'sellmeier',
  offset: 1,
  poles: values.flatMap((B, i) => (i % 2 === 0 ? [{ B, C_um: values[i + 1] ?? 0 }] : [])),
});

function* warningsOf(
  coefficients: readonly FittedCoefficient[],
  [lo, hi]: readonly [number, number],
  freedom: number,
  cauchy: boolean,
): Generator<FitWarning> {
  for (const { name, value, uncertainty } of coefficients) {
    if (!cauchy && name.startsWith('C') && value > lo * 0.95 && value < hi * 1.05)
      yield { code: 'pole-in-range', pole_um: value };
    if (!cauchy && name.startsWith('B') && value < 0) yield { code: 'negative-strength', coefficient: name };
    if (uncertainty !== undefined && Math.abs(value) < 2 * uncertainty)
      yield { code: 'undetermined', coefficient: name };
  }
  if (freedom === 0) yield { code: 'no-freedom' };
}
