/**
 * Packs catalog/ into dist/catalog.dat and dist/checks.dat; run by the build and by hand with `tsx tools/pack-catalog.ts`.
 */
import { mkdirSync, writeFileSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { readCatalogueSources } from '../src/catalog/from-sources.ts';
import { packCatalogue } from '../src/catalog/pack.ts';
import { CATALOGUE_FILE, CHECKS_FILE } from '../src/catalog/packed-header.ts';

export interface PackReport {
  readonly materials: number;
  readonly sources: number;
  readonly hash: string;
  readonly catalogueBytes: number;
  readonly checksBytes: number;
}

/** Reads the sources under `root`, writes both files into `outFolder` (made if missing). */
export function writePackedCatalogue(root: string, outFolder: string): PackReport {
  const input = readCatalogueSources(join(root, 'catalog'));
  const packed = packCatalogue(input);
  mkdirSync(outFolder, { recursive: true });
  writeFileSync(join(outFolder, CATALOGUE_FILE), packed.catalogue);
  writeFileSync(join(outFolder, CHECKS_FILE), packed.checks);
  return {
    materials: input.materials.length,
    sources: input.sources.length,
    hash: packed.hash,
    catalogueBytes: packed.catalogue.length,
    checksBytes: packed.checks.length,
  };
}

if (process.argv[1] !== undefined && resolve(process.argv[1]) === fileURLToPath(import.meta.url)) {
  const root = join(dirname(fileURLToPath(import.meta.url)), '..');
  const r = writePackedCatalogue(root, process.argv[2] ?? join(root, 'dist'));
  console.log(
    `catalogue ${r.hash}: ${r.materials} materials, ${r.sources} sources, ` +
      `${r.catalogueBytes} bytes and ${r.checksBytes} bytes of check values`,
  );
}
