/** The built program where its code caches cannot be used: another engine rejects them, and so does damage. */
import { cpSync, mkdtempSync, readdirSync, rmSync, statSync, truncateSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { runBuilt } from '../helpers/built-program.ts';

const dist = fileURLToPath(new URL('../../dist', import.meta.url));
const QUESTION = ['air', 'fused-silica', '632.8nm', '--angle', '45', '--json'];
const SWEEP = ['air', 'n-bk7', '--sweep', 'wave=400nm..700nm:50nm'];

let folder = '';
const caches = (): string[] =>
  readdirSync(folder)
    .filter((name) => name.endsWith('.cache'))
    .map((name) => path.join(folder, name));

beforeAll(() => {
  folder = path.join(mkdtempSync(path.join(os.tmpdir(), 'halfspace-built-')), 'dist');
  cpSync(dist, folder, { recursive: true });
});
afterAll(() => rmSync(path.dirname(folder), { recursive: true }));

async function expectTheSame(): Promise<void> {
  const program = path.join(folder, 'halfspace.js');
  for (const words of [QUESTION, SWEEP]) {
    const want = await runBuilt(words);
    expect(want.status).toBe(0);
    expect(await runBuilt(words, { program })).toEqual(want);
  }
}

describe('the built program answers as ever', () => {
  it('with its code caches', async () => {
    expect(caches().length).toBeGreaterThan(1);
    await expectTheSame();
  });

  it('where they are cut short', async () => {
    for (const cache of caches()) truncateSync(cache, Math.floor(statSync(cache).size / 2));
    await expectTheSame();
  });

  it('where they hold something else', async () => {
    for (const cache of caches()) writeFileSync(cache, 'no code\n'.repeat(10_000));
    await expectTheSame();
  });

  it('where they are empty', async () => {
    for (const cache of caches()) writeFileSync(cache, '');
    await expectTheSame();
  });

  it('where there are none', async () => {
    for (const cache of caches()) rmSync(cache);
    await expectTheSame();
  });
});
