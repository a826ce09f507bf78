/**
 * Extinction coefficient from measured absorption rows that stand beside a real fit.
 *
 * alpha = 4 pi k/lambda = -ln(tau)/d; ln(alpha) is interpolated linearly in wavelength between neighbouring rows, alpha
 * itself where one of the two is zero. Outside the rows nothing is known, nor between two rows that lie apart by more than a
 * thousandfold of alpha: an absorption edge stands between them, and no line through it means anything. A row of such a gap
 * still holds for its own wave and its neighbourhood of one per cent. Source of the relations: Born & Wolf 14.1.
 */
import type { AbsorptionRow } from '../catalog/types.ts';
import { type IndexJet, K } from '../dispersion/evaluator.ts';

interface AlphaPoint {
  readonly wavelength_um: number;
  readonly alpha_per_um: number;
}

function alphaOf(row: AbsorptionRow): number | undefined {
  if (row.k !== undefined) return (4 * Math.PI * row.k) / row.wavelength_um;
  if (row.alpha_per_cm !== undefined) return row.alpha_per_cm * 1e-4;
  if (row.internalTransmittance !== undefined && row.internalTransmittance > 0 && row.thickness_mm) {
    return -Math.log(row.internalTransmittance) / (row.thickness_mm * 1e3);
  }
  return undefined;
}

/** Sorted points; several rows at one wavelength (measured on different thicknesses) are averaged. */
function alphaPoints(rows: readonly AbsorptionRow[]): readonly AlphaPoint[] {
  const byWavelength = new Map<number, number[]>();
  for (const row of rows) {
    const alpha = alphaOf(row);
    if (alpha === undefined || !(alpha >= 0)) continue;
    const same = byWavelength.get(row.wavelength_um);
    if (same) same.push(alpha);
    else byWavelength.set(row.wavelength_um, [alpha]);
  }
  return [...byWavelength]
    .map(([wavelength_um, list]) => ({
      wavelength_um,
      alpha_per_um: list.reduce((a, b) => a + b, 0) / list.length,
    }))
    .sort((a, b) => a.wavelength_um - b.wavelength_um);
}

/** Writes k, k', k'' of the interpolant into `out`; false (and nothing written) where the rows do not reach the wave. */
export type AbsorptionInterpolant = (vacuumWavelength_um: number, out: IndexJet) => boolean;

export function bindAbsorption(rows: readonly AbsorptionRow[] | undefined): AbsorptionInterpolant {
  const points = rows ? alphaPoints(rows) : [];
  if (points.length < 2) return () => false;
  return (L, out) => {
    let i = 1;
    while (i < points.length - 1 && points[i]!.wavelength_um < L) i++;
    const a = points[i - 1]!;
    const b = points[i]!;
    if (L < a.wavelength_um * (1 - 1e-9) || L > b.wavelength_um * (1 + 1e-9)) return false;
    const t = (L - a.wavelength_um) / (b.wavelength_um - a.wavelength_um);
    const span = b.wavelength_um - a.wavelength_um;
    if (isGap(a, b)) {
      const near = [a, b].find((row) => Math.abs(L / row.wavelength_um - 1) <= NEIGHBOURHOOD);
      if (near) write(out, L, near.alpha_per_um, 0, 0);
      return near !== undefined;
    }
    let alpha: number;
    let slope: number;
    let curvature: number;
    if (a.alpha_per_um > 0 && b.alpha_per_um > 0) {
      const rate = Math.log(b.alpha_per_um / a.alpha_per_um) / span;
      alpha = a.alpha_per_um * Math.exp(rate * t * span);
      slope = alpha * rate;
      curvature = slope * rate;
    } else {
      alpha = a.alpha_per_um + (b.alpha_per_um - a.alpha_per_um) * t;
      slope = (b.alpha_per_um - a.alpha_per_um) / span;
      curvature = 0;
    }
    write(out, L, alpha, slope, curvature);
    return true;
  };
}

/** Neighbouring rows further apart than this are the two sides of an edge. */
const EDGE = 1000;
/** Laser lines of one name differ by less: 10.59 um is 10.6 um. */
const NEIGHBOURHOOD = 0.01;

/** A row of no absorption is a short way from one of little. */
function isGap(a: AlphaPoint, b: AlphaPoint): boolean {
  if (a.alpha_per_um === 0 || b.alpha_per_um === 0) return false;
  const ratio = b.alpha_per_um / a.alpha_per_um;
  return ratio > EDGE || ratio < 1 / EDGE;
}

/** k = alpha L/(4 pi) and its derivatives by wavelength, of alpha and its slope and curvature. */
function write(out: IndexJet, L: number, alpha_per_um: number, slope: number, curvature: number): void {
  out[K] = (alpha_per_um * L) / (4 * Math.PI);
  out[K + 1] = (alpha_per_um + slope * L) / (4 * Math.PI);
  out[K + 2] = (2 * slope + curvature * L) / (4 * Math.PI);
  out[K + 3] = 0;
}
