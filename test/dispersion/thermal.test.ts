import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { JET_LENGTH } from '../../src/dispersion/evaluator.ts';
import { bindModel } from '../../src/dispersion/registry.ts';
import { applyThermalForm, describesAbsoluteIndex } from '../../src/dispersion/thermal.ts';
import type { ThermalForm } from '../../src/dispersion/thermal-form.ts';
import { evenly } from '../helpers/evenly.ts';
import { TRANSPARENT_FITS } from './fits/transparent.ts';

const BK7 = TRANSPARENT_FITS[0]!.parameters;
const BK7_THERMAL: ThermalForm = {
  form: 'dispersive',
  D0: 1.86e-6,
  D1: 1.31e-8,
  D2: -1.37e-11,
  E0: 4.34e-7,
  E1: 6.27e-10,
  lambdaTK_um: 0.17,
  referenceTemperature_C: 20,
  range: '-100 to 140 C',
};
/** Magnesium-doped lithium niobate, ordinary: g(L) 1e-5 (dT + k (t^2 - 400)/2). */
const NIOBATE: ThermalForm = {
  form: 'wavelength-polynomial',
  g: [0.4519, -2.1143, 4.0283, -2.9264, 1.0908],
  exponents: [-4, -3, -2, -1, 0],
  scale: 1e-5,
  k_per_C: 0.00216,
  referenceTemperature_C: 20,
  range: '20 to 150 C',
};
/** Lithium triborate, x: (a L + b) 1e-6 (dT + c dT^2). */
const TRIBORATE: ThermalForm = {
  form: 'wavelength-polynomial',
  g: [-3.76, 2.3],
  exponents: [1, 0],
  scale: 1e-6,
  quadratic_per_K: 0.02913,
  referenceTemperature_C: 20,
  range: '20 to 190 C',
};
/** Gallium arsenide, Skauli et al. 2003. */
const ARSENIDE: ThermalForm = {
  form: 'band-edge',
  a: 0.689578,
  e2: 12.999386,
  G3: 0.00218176,
  E0: [1.425, -3.7164e-4, -7.497e-7],
  E1: [2.400356, -5.1458e-4],
  E2: [7.691979, -4.6545e-4],
  E3: [0.034303, 1.136e-5],
  referenceTemperature_C: 22,
  range: '22 to 95 C',
};
const CONSTANT: ThermalForm = { form: 'constant', dn_dT_per_K: -1.66e-5, range: '20 to 80 C' };

function warmed(form: ThermalForm, from_C: number, to_C: number, um: number): Float64Array {
  const jet = new Float64Array(JET_LENGTH);
  bindModel(BK7, {}).evaluate(um, jet);
  applyThermalForm(form, from_C + 273.15, to_C + 273.15, um, jet);
  return jet;
}

describe('thermal forms', () => {
  it.each([
    [1.06, -40, -20, 0.3],
    [0.546074, -40, -20, 0.8],
    [0.4358343, -40, -20, 1.2],
    [1.06, 20, 40, 1.1],
    [0.546074, 20, 40, 1.6],
    [0.4358343, 20, 40, 2.1],
    [1.06, 60, 80, 1.5],
    [0.546074, 60, 80, 2.1],
    [0.4358343, 60, 80, 2.7],
  ])(
    'N-BK7 at %d um, %d to %d C: absolute dn/dT %d e-6 per K (SCHOTT data sheet; from memory)',
    (um, a, b, expected) => {
      const slope =
        ((warmed(BK7_THERMAL, 20, b, um)[0]! - warmed(BK7_THERMAL, 20, a, um)[0]!) / (b - a)) * 1e6;
      expect(Math.abs(slope - expected)).toBeLessThan(0.051);
    },
  );

  it('follow their equations', () => {
    const n = warmed(CONSTANT, 20, 20, 0.8)[0]!;
    expect(warmed(CONSTANT, 20, 70, 0.8)[0]! - n).toBeCloseTo(-1.66e-5 * 50, 14);
    const L = 0.8;
    const g = 0.4519 / L ** 4 - 2.1143 / L ** 3 + 4.0283 / L ** 2 - 2.9264 / L + 1.0908;
    expect(warmed(NIOBATE, 20, 120, L)[0]! - n).toBeCloseTo(
      g * 1e-5 * (100 + (0.00216 * (120 ** 2 - 400)) / 2),
      14,
    );
    expect(warmed(TRIBORATE, 20, 150, L)[0]! - n).toBeCloseTo(
      (-3.76 * L + 2.3) * 1e-6 * (130 + 0.02913 * 130 ** 2),
      14,
    );
  });

  it('of glass makers count from their own reference, whatever the temperature of the fit', () => {
    const plain = new Float64Array(JET_LENGTH);
    bindModel(BK7, {}).evaluate(0.5, plain);
    const n = plain[0]!;
    const change = (t: number): number => {
      const dT = t - 20;
      const fixed = 1.86e-6 * dT + 1.31e-8 * dT ** 2 - 1.37e-11 * dT ** 3;
      const resonant = (4.34e-7 * dT + 6.27e-10 * dT ** 2) / (0.5 ** 2 - 0.17 ** 2);
      return ((n * n - 1) / (2 * n)) * (fixed + resonant);
    };
    for (const [from, to] of [
      [20, 140],
      [22, -80],
      [25, 120],
      [-30, 90],
    ] as const)
      expect(warmed(BK7_THERMAL, from, to, 0.5)[0]! - n).toBeCloseTo(change(to) - change(from), 14);
  });

  it('gallium arsenide: dn/dT 2.3e-4 per K at 1.55 um, 2.0e-4 at 10.6 um (Skauli et al. 2003)', () => {
    for (const [um, expected] of [
      [1.55, 2.3e-4],
      [10.6, 2.0e-4],
    ] as const) {
      const slope = warmed(ARSENIDE, 22, 23, um)[0]! - warmed(ARSENIDE, 22, 22, um)[0]!;
      expect(Math.abs(slope - expected)).toBeLessThan(0.1e-4);
    }
  });

  it('change nothing at the temperature of the fit and add up over steps', () => {
    const temperature = evenly(-60, 120);
    fc.assert(
      fc.property(temperature, temperature, fc.constantFrom(NIOBATE, TRIBORATE, CONSTANT), (a, b, form) => {
        const plain = warmed(form, a, a, 0.9);
        const direct = warmed(form, a, b, 0.9)[0]! - plain[0]!;
        const back = warmed(form, b, a, 0.9)[0]! - plain[0]!;
        expect(direct + back).toBeCloseTo(0, 14);
      }),
    );
    for (const form of [BK7_THERMAL, NIOBATE, TRIBORATE, ARSENIDE, CONSTANT]) {
      const jet = new Float64Array(JET_LENGTH);
      bindModel(BK7, {}).evaluate(0.9, jet);
      for (const [i, x] of warmed(form, 22, 22, 0.9).entries()) expect(x).toBeCloseTo(jet[i]!, 14);
    }
  });

  it('keep the derivatives exact', () => {
    for (const form of [BK7_THERMAL, NIOBATE, TRIBORATE, ARSENIDE, CONSTANT]) {
      const um = form === ARSENIDE ? 1.7 : 0.9;
      const h = um * 1e-3;
      const jet = warmed(form, 20, 75, um);
      for (const order of [1, 2, 3]) {
        const at = (step: number): number => warmed(form, 20, 75, um + step * h)[order - 1]!;
        const want = (8 * (at(1) - at(-1)) - (at(2) - at(-2))) / (12 * h);
        expect(Math.abs(jet[order]! - want)).toBeLessThan(1e-6 * Math.abs(want) + 3e-15 / h);
      }
    }
  });

  it('of glass makers describe the absolute index, the others that of the fit', () => {
    expect([BK7_THERMAL, NIOBATE, ARSENIDE, CONSTANT].map(describesAbsoluteIndex)).toEqual([
      true,
      false,
      false,
      false,
    ]);
  });
});
