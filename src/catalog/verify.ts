/** The self-test: every published value of the catalogue recomputed, counted and ranked. Pure. */
import { type CheckedValue, checkValues, passes } from './check-values.ts';
import type { IndexedCatalogue } from './entries.ts';
import type { MaterialChecks } from './pack.ts';
import type { Grade, Material } from './types.ts';

export interface VerifyReport {
  readonly materials: number;
  readonly fits: number;
  /** Values tested against a tolerance. */
  readonly tested: number;
  readonly passed: number;
  /** Values that document a limit of a fit: recomputed, but not judged. */
  readonly setAside: number;
  /** Per grade: how many were tested, and the one that comes closest to its tolerance or exceeds it most. */
  readonly grades: Readonly<Record<Grade, { readonly tested: number; readonly worst?: CheckedValue }>>;
  readonly failures: readonly CheckedValue[];
  readonly values: readonly CheckedValue[];
}

/** @param materials with their check values, as `withCheckValues` or the sources give them. */
export function verifyMaterials(materials: Iterable<Material>): VerifyReport {
  const values: CheckedValue[] = [];
  let count = 0;
  let fits = 0;
  for (const material of materials) {
    count++;
    fits += material.fits.length;
    values.push(...checkValues(material));
  }
  const tested = values.filter((v) => v.tolerance !== undefined);
  const failures = tested.filter((v) => !passes(v));
  const ofGrade = (grade: Grade) => {
    const mine = tested.filter((v) => v.grade === grade);
    const [worst] = [...mine].sort((a, b) => toleranceUsed(b) - toleranceUsed(a));
    return worst ? { tested: mine.length, worst } : { tested: 0 };
  };
  return {
    materials: count,
    fits,
    tested: tested.length,
    passed: tested.length - failures.length,
    setAside: values.length - tested.length,
    grades: { A: ofGrade('A'), B: ofGrade('B'), C: ofGrade('C') },
    failures,
    values,
  };
}

/** Difference as a share of the tolerance; infinite where nothing could be computed or a tolerance of 0 is missed. */
export function toleranceUsed(value: CheckedValue): number {
  const difference = Math.abs(value.computed - value.published);
  if (difference === 0) return 0;
  const used = difference / (value.tolerance ?? Number.POSITIVE_INFINITY);
  return Number.isNaN(used) ? Number.POSITIVE_INFINITY : used;
}

/**
 * The materials of a catalogue with the check values of the second packed file laid back into them, one at a time.
 * @param checkLines the text of that file: one JSON document a line (see pack.ts).
 */
export function* withCheckValues(catalogue: IndexedCatalogue, checkLines: string): Generator<Material> {
  for (const line of checkLines.split('\n')) {
    if (line === '') continue;
    const checks = JSON.parse(line) as MaterialChecks;
    const material = catalogue.material(checks.key);
    if (material) yield restoreChecks(material, checks);
  }
}

function restoreChecks(material: Material, { checks, abbe, composite }: MaterialChecks): Material {
  const fits = material.fits.map((fit) => {
    const id = `${fit.axis}/${fit.id}`;
    const numbers = abbe?.[id];
    return { ...fit, checks: checks[id] ?? [], ...(numbers ? { abbe: numbers } : {}) };
  });
  return { ...material, fits, ...(composite ? { compositeChecks: composite } : {}) };
}
