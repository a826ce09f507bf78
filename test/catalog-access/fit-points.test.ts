import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fitEntry, tablePoints } from '../../src/catalog/fit-entry.ts';
import { fitPoints, type IndexPoint, isFitFault, type PointFit } from '../../src/catalog/fit-points.ts';
import { solveLeastSquares } from '../../src/catalog/linear-least-squares.ts';
import { readOwnFiles } from '../../src/catalog/own.ts';
import { sellmeierIndex } from '../../src/catalog/sellmeier-fit.ts';
import { verifyMaterials } from '../../src/catalog/verify.ts';
import { JET_LENGTH, N } from '../../src/dispersion/evaluator.ts';
import { bindModel } from '../../src/dispersion/registry.ts';
import { packedSample } from './sample.ts';

/** Fused silica, I. H. Malitson, J. Opt. Soc. Am. 55, 1205 (1965). */
const SILICA = [0.6961663, 0.0684043, 0.4079426, 0.1162414, 0.8974794, 9.896161];

const grid = (from: number, to: number, count: number): number[] =>
  Array.from({ length: count }, (_, i) => from + ((to - from) * i) / (count - 1));

const fitted = (points: readonly IndexPoint[], model: 'sellmeier' | 'cauchy', terms: number): PointFit => {
  const r = fitPoints(points, { model, terms });
  if (isFitFault(r)) throw new Error(`${r.message}; ${r.remedy}`);
  return r;
};

/** Normal deviates from a fixed sequence (a linear congruential generator and the Box-Muller transform). */
function deviates(seed: number): () => number {
  let state = seed;
  const uniform = (): number => {
    state = (state * 1664525 + 1013904223) % 4294967296;
    return (state + 0.5) / 4294967296;
  };
  return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
}

describe('a sellmeier fit', () => {
  it('gives back the coefficients that made the points', () => {
    const points = grid(0.21, 3.7, 60).map((L) => ({ wavelength_um: L, n: sellmeierIndex(SILICA, L) }));
    const fit = fitted(points, 'sellmeier', 3);
    expect(fit.largest_n).toBeLessThan(1e-10);
    for (const [i, c] of fit.coefficients.entries()) expect(c.value / SILICA[i]!).toBeCloseTo(1, 4);
    expect(fit.coefficients.map((c) => c.name)).toEqual(['B1', 'C1_um', 'B2', 'C2_um', 'B3', 'C3_um']);
    expect(fit.warnings).toEqual([]);
  });

  it.each([1, 2])('with fewer terms (%i) fits a narrower range to a few 1e-5', (terms) => {
    const points = grid(0.4, terms === 1 ? 0.7 : 1.6, 30).map((L) => ({
      wavelength_um: L,
      n: sellmeierIndex(SILICA, L),
    }));
    const fit = fitted(points, 'sellmeier', terms);
    expect(fit.largest_n).toBeLessThan(terms === 1 ? 6e-4 : 3e-5);
    expect(fit.freedom).toBe(30 - 2 * terms);
  });

  it('from noisy points stays within the noise, and its uncertainties are honest', () => {
    // Many sets of points with known errors: the spread of each coefficient must agree with the uncertainty stated.
    const noise = 2e-5;
    const pulls = Array.from({ length: 40 }, (_, seed) => {
      const normal = deviates(seed + 1);
      const points = grid(0.4, 2.2, 40).map((L) => ({
        wavelength_um: L,
        n: sellmeierIndex([1.1, 0.1, 0.9, 9], L) + noise * normal(),
        uncertainty_n: noise,
      }));
      const fit = fitted(points, 'sellmeier', 2);
      expect(fit.reducedChiSquared).toBeGreaterThan(0.3);
      expect(fit.reducedChiSquared).toBeLessThan(2);
      return fit.coefficients.slice(0, 2).map((c, i) => (c.value - [1.1, 0.1][i]!) / c.uncertainty!);
    });
    for (const i of [0, 1]) {
      const spread = Math.sqrt(pulls.reduce((s, p) => s + p[i]! ** 2, 0) / pulls.length);
      expect(spread).toBeGreaterThan(0.7);
      expect(spread).toBeLessThan(1.35);
    }
  });

  it('without stated uncertainties takes them from the residuals', () => {
    const normal = deviates(7);
    const points = grid(0.4, 2.2, 200).map((L) => ({
      wavelength_um: L,
      n: sellmeierIndex([1.1, 0.1, 0.9, 9], L) + 1e-5 * normal(),
    }));
    const fit = fitted(points, 'sellmeier', 2);
    expect(fit.deviation_n! / 1e-5).toBeGreaterThan(0.8);
    expect(fit.deviation_n! / 1e-5).toBeLessThan(1.2);
    const weighted = fitted(
      points.map((p) => ({ ...p, uncertainty_n: fit.deviation_n! })),
      'sellmeier',
      2,
    );
    for (const [i, c] of fit.coefficients.entries())
      expect(c.uncertainty! / weighted.coefficients[i]!.uncertainty!).toBeCloseTo(1, 3);
  });

  it('finds the least sum there is, not one near its start', () => {
    // Reference: an independent trust-region search from 240 starts, in another language.
    const points = grid(0.4, 1.6, 30).map((L) => ({ wavelength_um: L, n: sellmeierIndex(SILICA, L) }));
    const fit = fitted(points, 'sellmeier', 2);
    const expected = [1.10364184, 0.09006655, 0.4424087, 7.09297205];
    for (const [i, c] of fit.coefficients.entries()) expect(c.value / expected[i]!).toBeCloseTo(1, 6);
    expect(fit.rms_n / 7.83265e-6).toBeCloseTo(1, 5);
  });

  it('warns of a pole at the edge of the range, and only there', () => {
    const from = (shortest: number, pole: number): readonly string[] => {
      const made = grid(shortest, 1.2, 30).map((L) => ({
        wavelength_um: L,
        n: sellmeierIndex([1.2, 0.1, 0.05, pole], L),
      }));
      return fitted(made, 'sellmeier', 2).warnings.map((w) => w.code);
    };
    expect(from(0.5, 0.49)).toEqual(['pole-in-range']);
    expect(from(0.5, 0.45)).toEqual([]);
  });

  it('is the same for points in any order, and invents nothing where there are as many coefficients as points', () => {
    const points = grid(0.4, 0.7, 6).map((L) => ({
      wavelength_um: L,
      n: Number(sellmeierIndex(SILICA, L).toFixed(5)),
    }));
    const a = fitted(points, 'sellmeier', 2);
    expect(fitted([...points].reverse(), 'sellmeier', 2)).toEqual(a);
    const exact = fitted(points.slice(0, 4), 'sellmeier', 2);
    expect(exact.warnings.map((w) => w.code)).toContain('no-freedom');
    expect(exact.coefficients.every((c) => c.uncertainty === undefined)).toBe(true);
    expect(exact.deviation_n).toBeUndefined();
  });
});

describe('a cauchy fit', () => {
  it('is exact for points of its form, with the textbook uncertainty of a straight line', () => {
    const points = grid(0.4, 1, 12).map((L) => ({
      wavelength_um: L,
      n: 1.5 + 0.004 / L ** 2,
      uncertainty_n: 1e-4,
    }));
    const fit = fitted(points, 'cauchy', 2);
    expect(fit.coefficients[0]!.value).toBeCloseTo(1.5, 12);
    expect(fit.coefficients[1]).toMatchObject({ name: 'c1_um2' });
    expect(fit.coefficients[1]!.value).toBeCloseTo(0.004, 12);
    // Slope of y against x with equal errors s: s / sqrt(sum (x - mean)^2).
    const x = points.map((p) => p.wavelength_um ** -2);
    const mean = x.reduce((s, v) => s + v, 0) / x.length;
    const slope = 1e-4 / Math.sqrt(x.reduce((s, v) => s + (v - mean) ** 2, 0));
    expect(fit.coefficients[1]!.uncertainty! / slope).toBeCloseTo(1, 9);
  });

  it('says which coefficients the points do not determine', () => {
    const normal = deviates(3);
    const points = grid(0.5, 0.7, 10).map((L) => ({
      wavelength_um: L,
      n: 1.5 + 0.004 / L ** 2 + 1e-3 * normal(),
    }));
    expect(fitted(points, 'cauchy', 4).warnings.map((w) => w.code)).toContain('undetermined');
  });

  it('weighs points by their uncertainty', () => {
    const points = [0.4, 0.5, 0.6, 0.7].map((L, i) => ({
      wavelength_um: L,
      n: 1.5 + 0.004 / L ** 2 + (i === 2 ? 0.01 : 0),
      uncertainty_n: i === 2 ? 1 : 1e-6,
    }));
    expect(fitted(points, 'cauchy', 2).coefficients[0]!.value).toBeCloseTo(1.5, 6);
  });
});

describe('points that make no fit are refused with the remedy', () => {
  it.each([
    [
      { model: 'sellmeier', terms: 3 },
      [0.4, 0.5, 0.6, 0.7, 0.8],
      /5 distinct wavelengths for 6 coefficients; give at least 6/,
    ],
    [{ model: 'sellmeier', terms: 0 }, [0.4], /0 terms; a sellmeier fit takes 1 to 4 terms/],
    [{ model: 'cauchy', terms: 2.5 }, [0.4], /a cauchy fit takes 2 to 5 terms/],
    [{ model: 'cauchy', terms: 2 }, [0.4, 0.4], /1 distinct wavelengths for 2/],
    [{ model: 'cauchy', terms: 2 }, [0.4, -1], /the point -1 um, n = 1.5 is no measurement/],
  ] as const)('%o', (request, wavelengths, expected) => {
    const r = fitPoints(
      wavelengths.map((wavelength_um) => ({ wavelength_um, n: 1.5 })),
      request,
    );
    expect(isFitFault(r) && `${r.message}; ${r.remedy}`).toMatch(expected);
  });

  it('an index of a metal is not for a sellmeier formula', () => {
    const r = fitPoints(
      grid(1, 2, 9).map((L) => ({ wavelength_um: L, n: 0.1 * L })),
      { model: 'sellmeier', terms: 1 },
    );
    expect(isFitFault(r) && r.message).toMatch(/is not above 1/);
  });

  it('whatever the points, the result is a fit of finite numbers or a fault', () => {
    const point = fc.record({
      wavelength_um: fc.double({ min: -1, max: 1e3 }),
      n: fc.double({ min: -1, max: 10 }),
    });
    fc.assert(
      fc.property(
        fc.array(point, { maxLength: 12 }),
        fc.record({
          model: fc.constantFrom('sellmeier' as const, 'cauchy' as const),
          terms: fc.integer({ min: 0, max: 3 }),
        }),
        (points, request) => {
          const r = fitPoints(points, request);
          if (isFitFault(r)) expect(r.remedy).not.toBe('');
          else for (const c of r.coefficients) expect(Number.isFinite(c.value)).toBe(true);
        },
      ),
      { numRuns: 150 },
    );
  });
});

describe('the entry made of a fit', () => {
  const points = grid(0.4, 0.9, 25).map((L) => ({
    wavelength_um: L,
    n: Number(sellmeierIndex(SILICA, L).toFixed(5)),
  }));
  const facts = {
    key: 'my-melt',
    name: 'My melt',
    reference: 'air',
    temperature_C: 21.5,
    source: 'Notebook 3, page 12',
  } as const;

  it.each([
    ['sellmeier', 2],
    ['sellmeier', 3],
    ['cauchy', 4],
  ] as const)('%s %i is read back without a fault and meets its own points', (model, terms) => {
    const fit = fitted(points, model, terms);
    const text = JSON.stringify(fitEntry(fit, facts), null, 2);
    const own = readOwnFiles([{ path: 'my-melt.json', name: 'my-melt.json', text }], packedSample());
    expect(own.problems).toEqual([]);
    const report = verifyMaterials(own.materials);
    expect([report.tested, report.failures]).toEqual([25, []]);
    const jet = new Float64Array(JET_LENGTH);
    bindModel(own.materials[0]!.fits[0]!.parameters, {}).evaluate(0.5876, jet);
    expect(jet[N]).toBeCloseTo(sellmeierIndex(SILICA, 0.5876), 4);
  });

  it('takes its points from a table', () => {
    const csv = `wavelength_nm,n\n${points.map((p) => `${p.wavelength_um * 1e3},${p.n}`).join('\n')}\n`;
    const own = readOwnFiles([{ path: 'm.csv', name: 'm.csv', text: csv }], packedSample());
    const table = own.materials[0]!.fits[0]!.parameters;
    if (table.model !== 'table') throw new Error('not a table');
    const again = tablePoints(table);
    for (const [i, p] of again.entries()) {
      expect(p.wavelength_um).toBeCloseTo(points[i]!.wavelength_um, 12);
      expect(p.n).toBe(points[i]!.n);
    }
  });
});

describe('linear least squares', () => {
  it('solves what has an exact solution and refuses dependent columns', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -5, max: 5, noNaN: true }), { minLength: 3, maxLength: 3 }),
        (x) => {
          const rows = [0, 1, 2, 3, 4].map((t) => [1, t, t * t]);
          const b = rows.map((row) => row.reduce((s, a, i) => s + a * x[i]!, 0));
          const r = solveLeastSquares(rows, b);
          for (const [i, v] of x.entries()) expect(r!.solution[i]).toBeCloseTo(v, 9);
        },
      ),
    );
    expect(
      solveLeastSquares(
        [
          [1, 2],
          [2, 4],
          [3, 6],
        ],
        [1, 2, 3],
      ),
    ).toBeUndefined();
    expect(solveLeastSquares([[1, 2]], [1])).toBeUndefined();
    expect(solveLeastSquares([], [])).toBeUndefined();
  });
  it('gives the inverse of the normal matrix', () => {
    const r = solveLeastSquares(
      [
        [1, 0],
        [1, 1],
        [1, 2],
      ],
      [0, 0, 0],
    );
    // (A^T A) = [[3, 3], [3, 5]], inverse [[5, -3], [-3, 3]]/6.
    expect(r!.inverseNormal.flat().map((x) => Math.round(x * 6e9) / 1e9)).toEqual([5, -3, -3, 3]);
  });
});
