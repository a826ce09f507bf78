/** Forms of a few lines: constants, contents against temperature, carbon dioxide and vapour in short forms of air; which conditions count. */
import { describe, expect, it } from 'vitest';
import { isInCompositionTable } from '../../src/dispersion/composition-table.ts';
import { JET_LENGTH } from '../../src/dispersion/evaluator.ts';
import type { CompositionTableParameters, ModelParameters } from '../../src/dispersion/parameters.ts';
import { bindModel, honours } from '../../src/dispersion/registry.ts';
import { vapourPressure_Pa } from '../../src/dispersion/water-vapour.ts';
import { index } from './evaluate.ts';

describe('a constant', () => {
  it('is the index given, whatever the permeability', () => {
    expect(index({ model: 'constant', n: 1.5, k: 0.2, permeability: 4 }, 1)).toEqual({ re: 1.5, im: 0.2 });
    expect(bindModel({ model: 'constant', n: 1.5 }, {}).index?.(1)).toBe(1.5);
    expect(bindModel({ model: 'constant', n: 1.5, k: 0.2 }, {}).index).toBeUndefined();
  });

  // (n + ik)^2 = eps mu (1 + i tan delta); Pozar, Microwave Engineering, 1.3.
  it('follows from permittivity, permeability and loss tangent', () => {
    const n = index({ model: 'constant', permittivity: 4, permeability: 2, lossTangent: 0.1 }, 1);
    expect(n.re ** 2 - n.im ** 2).toBeCloseTo(8, 13);
    expect(2 * n.re * n.im).toBeCloseTo(0.8, 13);
    const m = index({ model: 'constant', n: 3, lossTangent: 0.1 }, 1);
    expect(m.re ** 2 - m.im ** 2).toBeCloseTo(9, 13);
    expect(2 * m.re * m.im).toBeCloseTo(0.9, 13);
    expect(index({ model: 'constant', permittivity: 4 }, 1)).toEqual({ re: 2, im: 0 });
  });

  it('hands on its permeability where it has one', () => {
    const mu = new Float64Array(8);
    const bound = bindModel({ model: 'constant', n: 1.5, permeability: 4 }, {});
    bound.permeability?.(1, mu);
    expect([mu[0], mu[1]]).toEqual([4, 0]);
    expect(bindModel({ model: 'constant', n: 1.5 }, {}).permeability).toBeUndefined();
  });

  it('published at one wavelength has no derivative, and absorbs where k or a loss is stated', () => {
    expect(bindModel({ model: 'constant', n: 1.5, publishedAt_um: 0.6 }, {})).toMatchObject({
      hasDerivative: false,
      derivativeOrder: 0,
      complex: false,
    });
    expect(bindModel({ model: 'constant', n: 1.5, k: 0 }, {})).toMatchObject({
      hasDerivative: true,
      complex: true,
    });
    expect(bindModel({ model: 'constant', n: 1.5, lossTangent: 0.1 }, {}).complex).toBe(true);
  });
});

describe('contents against temperature (invented numbers)', () => {
  const table: CompositionTableParameters = {
    model: 'composition-table',
    content_percent: [0, 20, 40],
    temperatures_C: [10, 30],
    n: [
      [1.33, 1.32],
      [1.37, 1.35],
      [1.41, 1.4],
    ],
    default_K: 293.15,
    defaultComposition: 0,
    publishedAt_um: 0.589,
    of: 'solute',
  };
  const at = (percent: number, t_C: number) =>
    index(table, 0.6, { composition: percent / 100, temperature_K: 273.15 + t_C }).re;

  it('is linear in both between the places', () => {
    expect(at(20, 10)).toBeCloseTo(1.37, 12);
    expect(at(10, 30)).toBeCloseTo(1.335, 12);
    expect(at(30, 20)).toBeCloseTo((1.39 + 1.375) / 2, 12);
    expect(index(table, 0.6).re).toBeCloseTo(1.325, 12);
    expect(bindModel(table, {})).toMatchObject({ hasDerivative: false, derivativeOrder: 0, complex: false });
  });

  it('says nothing outside, in either direction', () => {
    for (const [percent, t_C] of [
      [-1, 20],
      [41, 20],
      [20, 9],
      [20, 31],
    ] as const) {
      expect(at(percent, t_C)).toBeNaN();
      const conditions = { composition: percent / 100, temperature_K: 273.15 + t_C };
      expect(isInCompositionTable(table, conditions)).toBe(false);
    }
    expect(isInCompositionTable(table, { composition: 0.4, temperature_K: 303.15 })).toBe(true);
    expect(isInCompositionTable(table, { composition: 0, temperature_K: 283.15 })).toBe(true);
  });

  it('needs one row per content and one place per temperature', () => {
    const wrong = /one row per content and one place per temperature/;
    expect(() => bindModel({ ...table, n: table.n.slice(1) }, {})).toThrow(wrong);
    expect(() => bindModel({ ...table, n: [[1.33, 1.32], [1.37], [1.41, 1.4]] }, {})).toThrow(wrong);
  });
});

describe('short form of moist air', () => {
  /** The form of G. Boensch, E. Potulski, Metrologia 35, 133 (1998), eqs. 6 to 9; coefficients from memory. */
  const air: ModelParameters = {
    model: 'moist-air',
    form: 'edlen',
    dispersion: [8091.37, 2333983, 130, 15518, 38.9],
    density: [93214.6, 0.5953, 0.009876, 0.003661],
    water: [3.802, 0.0384],
    co2: { slope: 0.5327, reference: 0.0004 },
    default_K: 293.15,
    default_Pa: 101325,
  };
  const refractivity = (um: number, conditions = {}) => index(air, um, conditions).re - 1;

  it('grows with carbon dioxide by 0.53 of its fraction, from 400 ppm on', () => {
    expect(refractivity(0.6328, { co2_ppm: 400 })).toBe(refractivity(0.6328));
    expect(refractivity(0.6328, { co2_ppm: 1400 }) / refractivity(0.6328)).toBeCloseTo(1 + 0.5327e-3, 9);
  });

  it('falls with vapour by (3.802 - 0.0384/L^2) 1e-10 per pascal, less in the blue', () => {
    const f_Pa = vapourPressure_Pa(293.15, 101325, 0.5);
    for (const um of [0.4, 0.6328, 1]) {
      const fall = refractivity(um) - refractivity(um, { humidity: 0.5 });
      expect(fall / (f_Pa * 1e-10)).toBeCloseTo(3.802 - 0.0384 / um ** 2, 3);
    }
  });

  it('stays at its value for 0.185 um below that', () => {
    expect(refractivity(0.15)).toBe(refractivity(0.185));
    expect(refractivity(0.19)).toBeLessThan(refractivity(0.185));
  });

  it('states what it was evaluated at', () => {
    const state = { temperature_K: 300, pressure_Pa: 9e4, humidity: 0.3, co2_ppm: 500 };
    expect(bindModel(air, state).used).toEqual(state);
    expect(bindModel(air, {}).used.co2_ppm).toBeCloseTo(400, 10);
    const { co2: _, ...plain } = air;
    expect(bindModel(plain as ModelParameters, {}).used).toEqual({
      temperature_K: 293.15,
      pressure_Pa: 101325,
      humidity: 0,
    });
    const out = new Float64Array(JET_LENGTH);
    bindModel(plain as ModelParameters, {}).evaluate(0.6328, out);
    expect(out[0]).toBe(index(air, 0.6328).re);
  });

  it('honours carbon dioxide where it knows it', () => {
    const three = ['temperature_K', 'pressure_Pa', 'humidity'];
    const { co2: _, ...plain } = air;
    expect(honours(air)).toEqual([...three, 'co2_ppm']);
    expect(honours(plain as ModelParameters)).toEqual(three);
    expect(honours({ model: 'moist-air', form: 'ciddor-1996' })).toEqual([...three, 'co2_ppm']);
    expect(honours({ model: 'constant', n: 1 })).toEqual([]);
  });
});

describe('what a table knows of itself (invented numbers)', () => {
  const n = { kind: 'linear', along: 'L', values: [1.5, 1.4, 1.3] } as const;
  const plain: ModelParameters = { model: 'table', abscissa: 'um', at: [1, 2, 3], n };

  it('has derivatives as its pieces have, none from one row, and absorbs where it has a column for that', () => {
    expect(bindModel(plain, {})).toMatchObject({
      used: {},
      hasDerivative: true,
      derivativeOrder: 1,
      complex: false,
    });
    const cubic: ModelParameters = { ...plain, n: { ...n, kind: 'cubic' } };
    expect(bindModel(cubic, {}).derivativeOrder).toBe(2);
    const single: ModelParameters = { model: 'table', abscissa: 'um', at: [1], n: { ...n, values: [1.5] } };
    expect(bindModel(single, {})).toMatchObject({ hasDerivative: false, derivativeOrder: 0 });
    expect(bindModel({ ...plain, k: { ...n, values: [0, 0, 0] } }, {}).complex).toBe(true);
  });

  it('takes an empty place of a warmer column from the nearest filled row, in either direction', () => {
    const warm: ModelParameters = {
      ...plain,
      warmer: {
        temperature_C: 20,
        columns: [
          { temperature_C: 40, n: [null, 1.38, null] },
          { temperature_C: 0, n: [1.51, null, null] },
        ],
      },
    };
    const at = (um: number, t_C: number) => index(warm, um, { temperature_K: 273.15 + t_C }).re;
    expect(at(1, 40)).toBeCloseTo(1.48, 12);
    expect(at(3, 40)).toBeCloseTo(1.28, 12);
    expect(at(3, 30)).toBeCloseTo(1.29, 12);
    expect(at(3, 0)).toBeCloseTo(1.31, 12);
    expect(at(2, 20)).toBeCloseTo(1.4, 12);
    expect(honours(warm)).toEqual(['temperature_K']);
    expect(honours(plain)).toEqual([]);
    const empty: ModelParameters = {
      ...plain,
      warmer: { temperature_C: 20, columns: [{ temperature_C: 40, n: [null, null, null] }] },
    };
    expect(() => bindModel(empty, {})).toThrow('a column of a table holds no value');
  });
});
