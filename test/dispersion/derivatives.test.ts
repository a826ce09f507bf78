/** Every derivative a model writes against the central difference of the one below it. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type BoundModel, JET_LENGTH } from '../../src/dispersion/evaluator.ts';
import { bindModel } from '../../src/dispersion/registry.ts';
import { evenly } from '../helpers/evenly.ts';
import { ABSORBING_FITS } from './fits/absorbing.ts';
import type { PublishedFit } from './fits/check.ts';
import { LIQUIDS_AND_TABLES } from './fits/liquids-and-tables.ts';
import { STATE_FITS } from './fits/thermal-state.ts';
import { TRANSPARENT_FITS } from './fits/transparent.ts';

const EXTRA: readonly PublishedFit[] = [
  {
    name: 'moist air, Ciddor 1996',
    parameters: { model: 'moist-air', form: 'ciddor-1996' },
    source: '',
    tolerance: 0,
    values: [{ um: 0.4, conditions: { humidity: 0.6 } }, { um: 1.6 }],
  },
  {
    name: 'moist air, Boensch and Potulski 1998',
    parameters: {
      model: 'moist-air',
      form: 'edlen',
      dispersion: [8091.37, 2333983, 130, 15518, 38.9],
      co2: { slope: 0.5327, reference: 0.0004 },
      density: [93214.6, 0.5953, 0.009876, 0.003661],
      water: [3.802, 0.0384],
      default_K: 293.15,
      default_Pa: 101325,
    },
    source: '',
    tolerance: 0,
    values: [{ um: 0.4, conditions: { humidity: 0.6 } }, { um: 0.65 }],
  },
  {
    name: 'copper at radio frequencies',
    parameters: { model: 'conductor', sigma_S_per_m: 5.8e7 },
    source: '',
    tolerance: 0,
    values: [{ um: 29979 }, { um: 2.9979e8 }],
  },
  {
    name: 'ferrite rows',
    parameters: {
      model: 'magnetic-table',
      permeability: { f_Hz: [1e5, 2e5, 5e5], mu1: [2157, 2173, 2311], mu2: [14, 23, 81] },
      permittivity: {
        f_Hz: [1e5, 3e5, 1e6],
        eps1: [111251, 92000, 77949],
        sigma_S_per_m: [0.296, 0.5, 1.105],
      },
    },
    source: '',
    tolerance: 0,
    values: [{ um: 2e9 }, { um: 7.3e8 }],
  },
  {
    name: 'table of k and alpha',
    parameters: {
      model: 'table',
      abscissa: 'eV',
      at: [3, 2, 1.5, 1],
      n: { values: [1.5, 1.7, 1.8, 2.1], along: 'E', kind: 'cubic' },
      alpha_per_cm: { values: [1e3, 10, 3, 500], along: 'ln L', kind: 'cubic', of: 'log' },
    },
    source: '',
    tolerance: 0,
    values: [{ um: 0.5 }, { um: 0.71 }, { um: 1.1 }],
  },
  {
    name: 'odd powers of Cauchy',
    parameters: {
      model: 'cauchy',
      wavelengthUnit: 'nm',
      terms: [
        { c: 1.5, power: 0 },
        { c: 6, power: -1 },
        { c: 1e4, power: -2.5 },
      ],
    },
    source: '',
    tolerance: 0,
    values: [{ um: 0.5 }],
  },
];

const FITS = [...TRANSPARENT_FITS, ...STATE_FITS, ...LIQUIDS_AND_TABLES, ...ABSORBING_FITS, ...EXTRA];

function jetAt(model: BoundModel, um: number): Float64Array {
  const out = new Float64Array(JET_LENGTH);
  model.evaluate(um, out);
  return out;
}

/** Fourth-order central difference of part `i` of the jet. */
function difference(model: BoundModel, um: number, h: number, i: number): number {
  const at = (step: number): number => jetAt(model, um + step * h)[i] as number;
  return (8 * (at(1) - at(-1)) - (at(2) - at(-2))) / (12 * h);
}

describe('derivatives', () => {
  it.each(FITS)('$name', (fit) => {
    for (const value of fit.values) {
      // Off the printed place, where a table has its rows.
      const um = value.um * 1.0123;
      const model = bindModel(fit.parameters, value.conditions ?? {});
      const written = jetAt(model, um);
      const h = um * 1e-4;
      for (const part of [0, 4]) {
        for (const order of [1, 2, 3]) {
          const below = written[part + order - 1] as number;
          const got = written[part + order] as number;
          const want = difference(model, um, h, part + order - 1);
          // Rounding of the difference: 1e-16 of the lower derivative over the step.
          const rounding = (3e-15 * Math.abs(below)) / h;
          expect(Math.abs(got - want)).toBeLessThanOrEqual(1e-6 * Math.abs(want) + rounding);
        }
      }
    }
  });

  it('of a Sellmeier fit hold for any poles outside the band', () => {
    const pole = fc.record({
      B: evenly(0.1, 2),
      C_um2: fc.oneof(evenly(0.001, 0.04), evenly(40, 400)),
      numeratorPower: fc.constantFrom<0 | 2>(0, 2),
    });
    const term = fc.record({
      c: evenly(-1e-3, 1e-3),
      power: fc.constantFrom(-8, -6, -4, -2, 2, 4, -1, 1.5),
    });
    fc.assert(
      fc.property(
        fc.array(pole, { minLength: 1, maxLength: 5 }),
        fc.array(term, { maxLength: 4 }),
        evenly(0.6, 3),
        (poles, terms, um) => {
          const model = bindModel({ model: 'sellmeier', offset: 2.5, poles, terms }, {});
          const written = jetAt(model, um);
          fc.pre(Number.isFinite(written[0]) && (written[0] as number) > 1);
          for (const order of [1, 2, 3]) {
            const want = difference(model, um, 1e-3 * um, order - 1);
            const room = 1e-6 * (Math.abs(want) + Math.abs(written[order - 1] as number));
            expect(Math.abs((written[order] as number) - want)).toBeLessThanOrEqual(room);
          }
        },
      ),
    );
  });
});

describe('cheap paths', () => {
  it.each(FITS)('$name', (fit) => {
    for (const value of fit.values) {
      const model = bindModel(fit.parameters, value.conditions ?? {});
      const full = jetAt(model, value.um);
      if (model.index) {
        expect(full[4]).toBe(0);
        expect(Math.abs(model.index(value.um) - (full[0] as number))).toBeLessThan(4e-15);
      }
      if (model.indexBlock) {
        const n = new Float64Array(3).fill(-1);
        model.indexBlock(Float64Array.of(value.um, value.um * 1.01, value.um), 2, n);
        expect([...n]).toEqual([full[0], jetAt(model, value.um * 1.01)[0], -1]);
      }
      if (model.groupIndex) {
        const want = (full[0] as number) - value.um * (full[1] as number);
        expect(Math.abs(model.groupIndex(value.um) - want)).toBeLessThan(4e-15 * Math.abs(want));
      }
      if (model.evaluateFirst) {
        const first = new Float64Array(JET_LENGTH).fill(Number.NaN);
        model.evaluateFirst(value.um, first);
        for (const i of [0, 1, 4, 5])
          expect(Math.abs((first[i] as number) - (full[i] as number))).toBeLessThan(
            4e-15 * Math.max(1, Math.abs(full[i] as number)),
          );
      }
    }
  });

  it('exist for the forms that batches run through', () => {
    const glass = TRANSPARENT_FITS[0] as PublishedFit;
    const model = bindModel(glass.parameters, {});
    expect(model.index).toBeDefined();
    expect(model.evaluateFirst).toBeDefined();
    expect(model.indexBlock).toBeDefined();
    expect(model.groupIndex).toBeDefined();
  });
});
