/**
 * Runner for tables of published values asked as a script asks them: a command line with --json, and what is read from the
 * document. Every bad row is printed with its line, value got, value wanted and error. A row from memory was recalled, not
 * read in the source when it was written down.
 */
import { expect, it } from 'vitest';
import type { Answer } from '../../../src/answer/answer.ts';
import type { CoatingReport } from '../../../src/answer/coating-shape.ts';
import { run } from '../../cli/in-process.ts';

export interface OneShotRow {
  readonly id: string;
  readonly quantity: string;
  readonly unit: string;
  readonly wanted: number;
  /** Absolute, in the same unit. */
  readonly tolerance: number;
  readonly toleranceBasis: string;
  readonly source: string;
  readonly kind: 'published' | 'exact' | 'common practice';
  readonly fromMemory: boolean;
  readonly note?: string;
  readonly got: (ask: Ask) => Promise<number>;
}

export interface Ask {
  /** `halfspace LINE --json`. */
  readonly answer: (line: string) => Promise<Answer>;
  readonly coat: (line: string) => Promise<CoatingReport>;
}

async function document(line: string): Promise<unknown> {
  const { status, out, err } = await run([...line.split(' '), '--json']);
  if (status !== 0) throw new Error(`${line}: ${err}`);
  return JSON.parse(out);
}

const ask: Ask = {
  answer: async (line) => (await document(line)) as Answer,
  coat: async (line) => (await document(`coat ${line}`)) as CoatingReport,
};

/** A number that must be there; NaN otherwise, which no tolerance takes. */
export const number = (value: number | null | undefined): number => value ?? Number.NaN;

export function checkOneShot(title: string, rows: readonly OneShotRow[]): void {
  it(`${title}: ${rows.length} published values by the command line`, async () => {
    const bad: string[] = [];
    for (const row of rows) {
      const got = await row.got(ask);
      const error = Math.abs(got - row.wanted);
      // Not `error > tolerance`: a NaN is bad too.
      if (error <= row.tolerance) continue;
      bad.push(
        `${row.id}: ${row.quantity}\n  got ${got} ${row.unit}, wanted ${row.wanted}, error ${error}, tolerance ${row.tolerance} (${row.toleranceBasis})\n  ${row.source}${row.fromMemory ? ' (from memory)' : ''}`,
      );
    }
    expect(bad, bad.join('\n\n')).toEqual([]);
  });
}
