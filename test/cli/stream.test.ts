import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { SHORT_NAMES } from '../../src/batch/answer-columns.ts';
import { COMMANDS } from '../../src/cli/command-table.ts';
import { run } from './in-process.ts';
import { faultsOf, unknownKeys } from './schema.ts';

let folder = '';
beforeAll(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'halfspace-stream-'));
});
afterAll(() => rmSync(folder, { recursive: true }));

/** The lines of a batch, each as its schema has it. */
async function lines(args: readonly string[]): Promise<readonly Record<string, unknown>[]> {
  const file = path.join(folder, 'answers.jsonl');
  await run([...args, '--json', '--quiet', '-o', file]);
  const rows = readFileSync(file, 'utf8').trimEnd().split('\n');
  return rows.map((text) => {
    const row = JSON.parse(text) as Record<string, unknown>;
    expect(faultsOf('stream', row), text).toEqual([]);
    return row;
  });
}

function questions(...rows: readonly object[]): string {
  const file = path.join(folder, 'questions.jsonl');
  writeFileSync(file, rows.map((row) => `${JSON.stringify(row)}\n`).join(''));
  return file;
}

describe('schemas', () => {
  it('exist for every command that prints JSON', () => {
    const schemaOf = (name: string): string =>
      fileURLToPath(new URL(`../../src/cli/schemas/${name}.schema.json`, import.meta.url));
    const printing = COMMANDS.filter(({ options }) => (options as readonly string[]).includes('json'));
    expect(printing.length).toBeGreaterThan(10);
    expect(printing.map((c) => c.name).filter((name) => !existsSync(schemaOf(name)))).toEqual([]);
  });

  it('describe every line of a stream: answers by every short name, errors with their place', async () => {
    const names = SHORT_NAMES.map(([name]) => name);
    const file = questions(
      { from: 'air', into: 'n-bk7', wave: '550nm' },
      { from: 'n-bk7', into: 'air', wave: '550nm', angle_deg: 60 },
      { path: 'air magnesium-fluoride-film@qw n-bk7', wave: '550nm' },
      { from: 'air', into: 'nothing', wave: '550nm' },
    );
    const [plain, total, film, bad, ...more] = await lines(['stream', file, '--columns', names.join(',')]);
    expect(more).toEqual([]);
    expect(unknownKeys('stream', plain)).toEqual(['.from', '.into', '.wave']);
    expect([plain?.['total'], total?.['total'], total?.['R'], film?.['A']]).toEqual([false, true, 1, 0]);
    expect(bad?.['error']).toMatchObject({ line: 4, code: 'unknown-medium' });
    expect(names.map((name) => bad?.[name])).toEqual(names.map(() => null));
  });

  it('describe the whole answer in a line', async () => {
    const file = questions({ path: 'air fused-silica@2mm air', wave: '1064nm', power_mW: 5, beam_mm: 1 });
    const [row] = await lines(['stream', file, '--full']);
    const answer = row?.['answer'] as Record<string, unknown>;
    expect(faultsOf('answer', { schema: 1, version: '0.1.0', ...answer })).toEqual([]);
    expect(answer).toMatchObject({ window: { R1: expect.any(Number) }, energy: { incidentPower_W: 5e-3 } });
  });

  it('describe every line of a sweep', async () => {
    const rows = await lines([
      'air',
      'n-bk7',
      '--sweep',
      'wave=400nm..500nm:50nm',
      '--sweep',
      'angle=0..60:30',
    ]);
    expect(rows.map((row) => [row['wave_nm'], row['angle_deg']])).toHaveLength(9);
    const { out } = await run(['air', 'n-bk7', '450nm', '--angle', '30', '--json']);
    const one = JSON.parse(out) as { interface: { R: number } };
    expect(rows[4]?.['R']).toBe(one.interface.R);
  });
});
