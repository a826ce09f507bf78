/** Every file of the catalogue, read once for all tests of its data. */
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Axis, Fit, Material, Source } from '../../src/catalog/types.ts';

export const CATALOG = join(import.meta.dirname, '..', '..', 'catalog');

export interface EntryFile {
  /** File name without folder. */
  readonly file: string;
  readonly text: string;
  readonly material: Material;
}

export const ENTRIES: readonly EntryFile[] = readdirSync(join(CATALOG, 'materials'))
  .filter((file) => file.endsWith('.json'))
  .sort()
  .map((file) => {
    const text = readFileSync(join(CATALOG, 'materials', file), 'utf8');
    return { file, text, material: JSON.parse(text) as Material };
  });

export const BIBLIOGRAPHY_TEXT = readFileSync(join(CATALOG, 'bibliography.json'), 'utf8');
export const BIBLIOGRAPHY = JSON.parse(BIBLIOGRAPHY_TEXT) as readonly Source[];

export interface NamedFit {
  /** "calcite/ordinary/ghosh-1999": for messages and frozen facts. */
  readonly path: string;
  readonly material: Material;
  readonly fit: Fit;
}

export const FITS: readonly NamedFit[] = ENTRIES.flatMap(({ material }) =>
  material.fits.map((fit) => ({ path: `${material.key}/${fit.axis}/${fit.id}`, material, fit })),
);

/** The recommended fit of an axis that reaches a wavelength. */
export function recommended(material: Material, axis: Axis, wavelength_um: number): Fit | undefined {
  return material.fits.find(
    (f) =>
      f.axis === axis &&
      f.recommended &&
      f.range_um[0] <= wavelength_um &&
      f.range_um[1] >= wavelength_um &&
      (f.recommendedRange_um === undefined ||
        (f.recommendedRange_um[0] <= wavelength_um && f.recommendedRange_um[1] >= wavelength_um)),
  );
}
