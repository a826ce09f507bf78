/**
 * Runner for tables of published values: every row is computed, and every bad one is printed with inputs, value got, value
 * wanted and error. A row from memory was recalled, not read in the source when it was written down.
 */
import { expect, it } from 'vitest';

export interface Facts<Inputs> {
  readonly id: string;
  readonly quantity: string;
  readonly inputs: Inputs;
  readonly unit: string;
  readonly wanted: number;
  /** Absolute, in the same unit. */
  readonly tolerance: number;
  readonly toleranceBasis: string;
  readonly source: string;
  readonly kind: 'published' | 'exact' | 'common practice';
  readonly fromMemory: boolean;
  readonly note?: string;
  readonly got: (inputs: Inputs) => number;
}

export interface CheckedRow {
  readonly facts: Omit<Facts<unknown>, 'got'>;
  readonly compute: () => number;
}

/** Keeps the types of a row's inputs for its own formula. */
export function row<const Inputs>(facts: Facts<Inputs>): CheckedRow {
  return { facts, compute: () => facts.got(facts.inputs) };
}

export function checkRows(title: string, rows: readonly CheckedRow[]): void {
  it(`${title}: ${rows.length} published values`, () => {
    const bad = rows.flatMap(({ facts, compute }) => {
      const got = compute();
      const error = Math.abs(got - facts.wanted);
      // Not `error > tolerance`: a NaN is bad too.
      return error <= facts.tolerance ? [] : [describeRow(facts, got, error)];
    });
    expect(bad, bad.join('\n\n')).toEqual([]);
  });
}

function describeRow(facts: CheckedRow['facts'], got: number, error: number): string {
  const { id, quantity, inputs, wanted, unit, tolerance, toleranceBasis, source, fromMemory } = facts;
  return [
    `${id}: ${quantity}`,
    `  inputs ${JSON.stringify(inputs)}`,
    `  got ${got} ${unit}, wanted ${wanted}, error ${error}, tolerance ${tolerance} (${toleranceBasis})`,
    `  ${source}${fromMemory ? ' (from memory)' : ''}`,
  ].join('\n');
}
