/** Which works a material's numbers come from, each once, and what each is the source of. Pure. */
import type { Axis, Fit, Material } from './types.ts';

export type SourceUse =
  /** The fit was published there. */
  | { readonly kind: 'fit'; readonly fit: Fit }
  /** The measurement behind the fit, or the handbook it was read in. */
  | { readonly kind: 'behind-fit'; readonly fit: Fit }
  | { readonly kind: 'reflectance' };

export interface CitedSource {
  /** Key into the bibliography. */
  readonly id: string;
  readonly uses: readonly SourceUse[];
}

/** In the order of the fits, the recommended ones first; of one axis only where it is given. */
export function citedSources(material: Material, axis?: Axis): readonly CitedSource[] {
  const cited = new Map<string, SourceUse[]>();
  const add = (id: string, use: SourceUse): void => {
    const known = cited.get(id);
    if (known) known.push(use);
    else cited.set(id, [use]);
  };
  const fits = material.fits.filter((fit) => axis === undefined || fit.axis === axis);
  for (const fit of [...fits.filter((f) => f.recommended), ...fits.filter((f) => !f.recommended)]) {
    add(fit.source, { kind: 'fit', fit });
    for (const id of fit.furtherSources ?? []) add(id, { kind: 'behind-fit', fit });
  }
  for (const table of reflectanceTables(material)) add(table.source, { kind: 'reflectance' });
  return [...cited].map(([id, uses]) => ({ id, uses }));
}

/** Reflectance of real samples in air at normal incidence. */
export interface ReflectanceTable {
  readonly source: string;
  readonly temperature_C?: number;
  readonly quantity: string;
  readonly note?: string;
  readonly wavelength_um: readonly number[];
  readonly R: readonly number[];
}

/** The tables of a material that have the columns they need; an own entry may hold anything in their place. */
export function reflectanceTables(material: Material): readonly ReflectanceTable[] {
  return (material.reflectanceTables ?? []).filter(isReflectanceTable);
}

function isReflectanceTable(table: unknown): table is ReflectanceTable {
  if (typeof table !== 'object' || table === null) return false;
  const {
    source,
    quantity,
    wavelength_um: at,
    R,
  } = table as Partial<Record<keyof ReflectanceTable, unknown>>;
  const numbers = (list: unknown): list is readonly number[] =>
    Array.isArray(list) && list.every((x) => typeof x === 'number' && Number.isFinite(x));
  return (
    typeof source === 'string' &&
    typeof quantity === 'string' &&
    numbers(at) &&
    numbers(R) &&
    at.length === R.length
  );
}

/** Free texts that name where absorption and handling facts come from, each once; they are no items of the bibliography. */
export function factSources(material: Material): {
  readonly absorption: readonly string[];
  readonly facts: string | undefined;
} {
  return {
    absorption: [...new Set((material.absorption ?? []).map((row) => row.source))],
    facts: material.factsSource,
  };
}
