/**
 * Index and group index of a glass: the core's closures against the plainest loop that does the same arithmetic. Several kinds
 * of model are used first, so that the compiler cannot take the only one it has seen for granted.
 */

import type { ModelParameters } from '../../src/dispersion/parameters.ts';
import { bindModel } from '../../src/dispersion/registry.ts';
import { race } from './race.ts';

/** N-BK7, coefficients of its maker's data sheet. */
const BK7: ModelParameters = {
  model: 'sellmeier',
  offset: 1,
  poles: [
    { B: 1.03961212, C_um2: 0.00600069867 },
    { B: 0.231792344, C_um2: 0.0200179144 },
    { B: 1.01046945, C_um2: 103.560653 },
  ],
} as ModelParameters;
const OTHERS: readonly ModelParameters[] = [
  { model: 'sellmeier', offset: 2.1, poles: [{ B: 0.9, C_um2: 0.012 }], terms: [{ c: -0.01, power: 2 }] },
  { model: 'constant', n: 1.33, k: 0 },
  {
    model: 'sellmeier',
    offset: 1,
    poles: [
      { B: 1.2, C_um2: 0.01 },
      { B: 0.9, C_um2: 90 },
    ],
  },
] as unknown as readonly ModelParameters[];

/** As many at a time as a batch evaluates; a long first call would be compiled before all of it had been seen. */
const COUNT = 512;
const REPEATS = 40;
const waves_um = Float64Array.from({ length: COUNT }, (_, i) => 0.4 + (1.2 * i) / COUNT);
const results = new Float64Array(COUNT);

const bound = bindModel(BK7, {});
for (const other of OTHERS) {
  const { evaluate, index, groupIndex, indexBlock } = bindModel(other, {});
  const jet = new Float64Array(8);
  for (let i = 0; i < 20_000; i++) {
    const L = waves_um[i % COUNT]!;
    evaluate(L, jet);
    index?.(L);
    groupIndex?.(L);
    if (i % 100 === 0) indexBlock?.(waves_um, 100, results);
  }
}

function handIndex(): void {
  const B1 = 1.03961212;
  const B2 = 0.231792344;
  const B3 = 1.01046945;
  const C1 = 0.00600069867;
  const C2 = 0.0200179144;
  const C3 = 103.560653;
  for (let i = 0; i < COUNT; i++) {
    const L = waves_um[i]!;
    const x = L * L;
    results[i] = Math.sqrt(1 + (B1 * x) / (x - C1) + (B2 * x) / (x - C2) + (B3 * x) / (x - C3));
  }
}

function coreIndices(): void {
  const { indexBlock } = bound;
  if (!indexBlock) throw new Error('this fit has no short way to the n of many waves');
  indexBlock(waves_um, COUNT, results);
}

function coreIndex(): void {
  const { index } = bound;
  if (!index) throw new Error('this fit has no short way to n');
  for (let i = 0; i < COUNT; i++) results[i] = index(waves_um[i]!);
}

function handGroupIndex(): void {
  const B1 = 1.03961212;
  const B2 = 0.231792344;
  const B3 = 1.01046945;
  const C1 = 0.00600069867;
  const C2 = 0.0200179144;
  const C3 = 103.560653;
  for (let i = 0; i < COUNT; i++) {
    const L = waves_um[i]!;
    const x = L * L;
    const r1 = 1 / (x - C1);
    const r2 = 1 / (x - C2);
    const r3 = 1 / (x - C3);
    const n = Math.sqrt(1 + B1 * x * r1 + B2 * x * r2 + B3 * x * r3);
    const slope = (-L * (B1 * C1 * r1 * r1 + B2 * C2 * r2 * r2 + B3 * C3 * r3 * r3)) / n;
    results[i] = n - L * slope;
  }
}

function coreGroupIndex(): void {
  const { groupIndex } = bound;
  if (!groupIndex) throw new Error('this fit has no short way to the group index');
  for (let i = 0; i < COUNT; i++) results[i] = groupIndex(waves_um[i]!);
}

const common = { result: () => results, evaluations: COUNT, repeats: REPEATS };
race({
  indices: { hand: handIndex, core: coreIndices, ...common },
  index: { hand: handIndex, core: coreIndex, ...common },
  groupIndex: { hand: handGroupIndex, core: coreGroupIndex, ...common },
});
