/** What the writer and the reader of the packed catalogue agree on. */
import type { Axis } from './types.ts';

/** Starts the file; the digit is the version of the layout. */
export const MAGIC = 'halfspace-catalogue 1 ';

export type SectionName = 'names' | 'entries' | 'sources' | 'records';

export interface PackedHeader {
  readonly version: string;
  readonly date: string;
  readonly hash: string;
  readonly materials: number;
  readonly sources: number;
  /** Offset from the end of the header line, and length, in bytes. */
  readonly sections: Readonly<Record<SectionName, readonly [number, number]>>;
}

/** One letter an axis in the entry lines. */
export const AXIS_LETTERS: Readonly<Record<Axis, string>> = {
  isotropic: 'i',
  ordinary: 'o',
  extraordinary: 'e',
  x: 'x',
  y: 'y',
  z: 'z',
};

/** Names of the two packed files, beside the program. */
export const CATALOGUE_FILE = 'catalog.dat';
export const CHECKS_FILE = 'checks.dat';
