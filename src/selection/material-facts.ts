/** The facts of an entry that a buyer asks for first, with null where nothing is on file. */

import type { Material } from '../catalog/types.ts';
import { type HazardLevel, hazardLevel } from '../medium/hazard-level.ts';
import { shiftDecimal } from '../num/shift-decimal.ts';

export interface MaterialFacts {
  readonly key: string;
  readonly name: string;
  readonly class: string;
  readonly formula: string | null;
  /** Where the bulk transmits usefully, vacuum wavelengths. */
  readonly transparency_m: readonly [number, number] | null;
  /** What that range means, in words. */
  readonly transparencyBasis: string;
  /** "no", "slightly" or "yes". */
  readonly hygroscopic: string | null;
  readonly hazardLevel: HazardLevel;
  readonly hazard: string | null;
  readonly care: string | null;
  /** Knoop number, kgf/mm^2. */
  readonly knoop: number | null;
  readonly density_kg_per_m3: number | null;
  readonly expansion_per_K: number | null;
  readonly solubility_g_per_100g: number | null;
  /** Where transparency and handling facts come from. */
  readonly factsSource: string | null;
}

const USUAL_BASIS = 'about 10 % left at its limits over a few mm';

export function materialFacts(material: Material): MaterialFacts {
  const { transparency_um, handling = {} } = material;
  return {
    key: material.key,
    name: material.name,
    class: material.class,
    formula: material.formula ?? null,
    transparency_m: transparency_um
      ? [shiftDecimal(transparency_um[0], -6), shiftDecimal(transparency_um[1], -6)]
      : null,
    transparencyBasis: material.transparencyBasis ?? USUAL_BASIS,
    hygroscopic: handling.hygroscopic ?? null,
    hazardLevel: hazardLevel(material),
    hazard: hazardLevel(material) === 'none-on-file' ? null : (handling.hazard ?? null),
    care: textOf(handling['care']),
    knoop: handling.knoop ?? null,
    density_kg_per_m3: scaled(handling.density_g_per_cm3, 3),
    expansion_per_K: scaled(handling.expansion_1e6_per_K, -6),
    solubility_g_per_100g: numberOf(handling['solubility_g_per_100g']),
    factsSource: material.factsSource ?? null,
  };
}

const scaled = (value: number | undefined, power: number): number | null =>
  value === undefined ? null : shiftDecimal(value, power);

const textOf = (value: unknown): string | null => (typeof value === 'string' ? value : null);
const numberOf = (value: unknown): number | null => (typeof value === 'number' ? value : null);
