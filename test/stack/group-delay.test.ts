import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { arg, type Complex, div, mul, sub } from '../../src/num/complex.ts';
import { coherentStack } from '../../src/stack/coherent-stack.ts';
import {
  type DispersivePath,
  type DispersiveSubstance,
  dispersiveFromWavelength,
  nonDispersive,
  stackDispersion,
} from '../../src/stack/group-delay.ts';
import { substanceFromIndex } from '../../src/stack/layered-path.ts';
import { SPEED_OF_LIGHT_m_per_s as c } from '../../src/units/constants.ts';
import { between, logarithmic } from './random-path.ts';

/** n(w) = n + a x + b x^2, x = w/w0 - 1: second-order, so the derivatives given are the whole truth. */
interface Model {
  readonly n: Complex;
  readonly a: Complex;
  readonly b: Complex;
}
const model: fc.Arbitrary<Model> = fc.record({
  n: fc.record({ re: between(1.2, 4), im: fc.oneof(fc.constant(0), logarithmic(1e-6, 1)) }),
  a: fc.record({ re: between(-0.3, 0.5), im: fc.constant(0) }),
  b: fc.record({ re: between(-0.3, 0.5), im: fc.constant(0) }),
});
const incidence: fc.Arbitrary<Model> = fc.record({
  n: fc.record({ re: between(1, 1.5), im: fc.constant(0) }),
  a: fc.record({ re: between(-0.1, 0.1), im: fc.constant(0) }),
  b: fc.record({ re: between(-0.1, 0.1), im: fc.constant(0) }),
});
const at = (m: Model, x: number): { n: number; k: number } => ({
  n: m.n.re + m.a.re * x + m.b.re * x * x,
  k: m.n.im + m.a.im * x + m.b.im * x * x,
});
const dispersive = (m: Model, omega: number): DispersiveSubstance => ({
  n: m.n,
  dn_domega_s: { re: m.a.re / omega, im: m.a.im / omega },
  d2n_domega2_s2: { re: (2 * m.b.re) / omega ** 2, im: (2 * m.b.im) / omega ** 2 },
});

/**
 * Phase slope and curvature of an amplitude a(w/w0 - 1) from central differences of sixth order. The amplitude is
 * differenced, not its phase: near a zero the phase bends too sharply for any step.
 */
function numerical(a: (x: number) => Complex, step: number): { first: number; second: number } {
  const [a3, a2, a1, centre, b1, b2, b3] = [-3, -2, -1, 0, 1, 2, 3].map((i) => a(i * step)) as [
    Complex,
    Complex,
    Complex,
    Complex,
    Complex,
    Complex,
    Complex,
  ];
  const slope = (part: 're' | 'im'): number =>
    (45 * (b1[part] - a1[part]) - 9 * (b2[part] - a2[part]) + b3[part] - a3[part]) / (60 * step);
  const curve = (part: 're' | 'im'): number =>
    (270 * (b1[part] + a1[part]) -
      27 * (b2[part] + a2[part]) +
      2 * (b3[part] + a3[part]) -
      490 * centre[part]) /
    (180 * step * step);
  const logSlope = div({ re: slope('re'), im: slope('im') }, centre);
  const logCurve = sub(div({ re: curve('re'), im: curve('im') }, centre), mul(logSlope, logSlope));
  return { first: logSlope.im, second: logCurve.im };
}

describe('group delay', () => {
  it('equals the numerical derivative of the phase, and so does the dispersion', () => {
    fc.assert(
      fc.property(
        incidence,
        fc.array(fc.tuple(model, logarithmic(1e-9, 1e-6)), { maxLength: 8 }),
        model,
        logarithmic(3e-7, 3e-6),
        between(0, 1.3),
        (from, layers, exit, wave, angle) => {
          // At the critical angle of the exit medium the derivative does not exist, and near it differences fail.
          fc.pre(Math.abs((from.n.re * Math.sin(angle)) / exit.n.re - 1) > 0.05);
          const omega = (2 * Math.PI * c) / wave;
          const path: DispersivePath = {
            incidence: dispersive(from, omega),
            layers: layers.map(([m, thickness_m]) => ({ ...dispersive(m, omega), thickness_m })),
            exit: dispersive(exit, omega),
          };
          const plain = (m: Model, x: number) => substanceFromIndex(at(m, x).n, at(m, x).k);
          const amplitudes = (x: number) =>
            coherentStack(
              {
                incidence: plain(from, x),
                layers: layers.map(([m, thickness_m]) => ({ ...plain(m, x), thickness_m })),
                exit: plain(exit, x),
              },
              wave / (1 + x),
              angle,
            );
          const exact = stackDispersion(path, wave, angle);
          // Radians of phase in the stack: the scale on which r and t vary with w/w0.
          const radians =
            1 +
            layers.reduce((sum, [m, thickness_m]) => sum + (2 * Math.PI * m.n.re * thickness_m) / wave, 0);
          for (const side of ['s', 'p'] as const) {
            const now = amplitudes(0)[side];
            for (const [which, amplitude, power] of [
              ['reflection', 'r', now.R],
              ['transmission', 't', now.T],
            ] as const) {
              if (power < 1e-3) continue;
              const difference = numerical((x) => amplitudes(x)[side][amplitude], 0.003 / radians);
              const result = exact[side][which];
              expect(result).not.toBeNull();
              if (!result) continue;
              expect(Math.cos(result.phase_rad - arg(now[amplitude]))).toBeCloseTo(1, 15);
              expect(Math.abs(result.groupDelay_s * omega - difference.first) / radians).toBeLessThan(1e-6);
              expect(Math.abs(result.gdd_s2 * omega ** 2 - difference.second) / radians ** 2).toBeLessThan(
                1e-5,
              );
            }
          }
        },
      ),
      { numRuns: 300 },
    );
  });

  it('through a homogeneous piece of glass is n_g L/c, its dispersion beta2 L', () => {
    const wave = 8e-7;
    const omega = (2 * Math.PI * c) / wave;
    const glass = dispersive(
      { n: { re: 1.5, im: 0 }, a: { re: 0.02, im: 0 }, b: { re: 0.01, im: 0 } },
      omega,
    );
    const thickness_m = 1e-3;
    const { transmission, reflection } = stackDispersion(
      { incidence: glass, layers: [{ ...glass, thickness_m }], exit: glass },
      wave,
      0,
    ).s;
    const groupIndex = 1.5 + 0.02;
    const beta2 = (2 * 0.02 + 2 * 0.01) / omega / c;
    expect(transmission?.groupDelay_s).toBeCloseTo((groupIndex * thickness_m) / c, 24);
    expect((transmission?.gdd_s2 ?? 0) / (beta2 * thickness_m)).toBeCloseTo(1, 9);
    expect(reflection).toBeNull();
  });

  it('of a quarter-wave mirror with the high index outermost, at its centre: 1/(2 nu (nH - nL))', () => {
    // Limit of many pairs, air in front: Garmire, Appl. Opt. 42, 5442 (2003) (from memory).
    const wave = 1.064e-6;
    const [nH, nL] = [2.25, 1.45];
    const layers = Array.from({ length: 81 }, (_, i) => {
      const n = i % 2 ? nL : nH;
      return { ...nonDispersive(n), thickness_m: wave / (4 * n) };
    });
    const { reflection } = stackDispersion(
      { incidence: nonDispersive(1), layers, exit: nonDispersive(1.5) },
      wave,
      0,
    ).s;
    expect((reflection?.groupDelay_s ?? 0) / (1 / ((2 * c * (nH - nL)) / wave))).toBeCloseTo(1, 10);
    expect(Math.abs(reflection?.gdd_s2 ?? 1)).toBeLessThan(1e-43);
  });

  it('crosses the critical angle of a layer without loss of digits', () => {
    const glass = nonDispersive(2);
    const gap = { ...nonDispersive(1), thickness_m: 3e-7 };
    const at = (angle: number) =>
      stackDispersion({ incidence: glass, layers: [gap], exit: glass }, 5e-7, angle);
    const critical = Math.asin(0.5);
    for (const side of ['s', 'p'] as const) {
      const here = at(critical)[side].transmission?.groupDelay_s ?? Number.NaN;
      const below = at(critical - 1e-6)[side].transmission?.groupDelay_s ?? Number.NaN;
      const above = at(critical + 1e-6)[side].transmission?.groupDelay_s ?? Number.NaN;
      expect(here / ((below + above) / 2)).toBeCloseTo(1, 9);
    }
  });

  it('is null where nothing comes through or back', () => {
    const air = nonDispersive(1);
    const metal = { ...nonDispersive(0.1, 4), thickness_m: 1e-2 };
    const { s } = stackDispersion({ incidence: air, layers: [metal], exit: air }, 5e-7, 0.2);
    expect(s.transmission).toBeNull();
    expect(s.reflection).not.toBeNull();
    expect(stackDispersion({ incidence: air, layers: [], exit: air }, 5e-7, 0.2).p.reflection).toBeNull();
  });
});

describe('dispersiveFromWavelength', () => {
  it('agrees with differences of n(2 pi c/w)', () => {
    const n = (wave: number): number => 1.45 + 3e-15 / wave ** 2;
    const wave = 6e-7;
    const omega = (2 * Math.PI * c) / wave;
    const first = -6e-15 / wave ** 3;
    const second = 18e-15 / wave ** 4;
    const got = dispersiveFromWavelength(
      { re: n(wave), im: 0 },
      { re: first, im: 0 },
      { re: second, im: 0 },
      wave,
    );
    const h = omega * 1e-4;
    const at = (w: number): number => n((2 * Math.PI * c) / w);
    expect(got.dn_domega_s.re / ((at(omega + h) - at(omega - h)) / (2 * h))).toBeCloseTo(1, 7);
    expect(got.d2n_domega2_s2.re / ((at(omega + h) - 2 * at(omega) + at(omega - h)) / h ** 2)).toBeCloseTo(
      1,
      5,
    );
  });
});
