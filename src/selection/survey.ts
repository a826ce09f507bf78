/**
 * The whole catalogue made ready for passes over all of it: every material parsed once, every fit bound once at its own
 * reference conditions. A survey is a cache and nothing else; equal questions to it give equal answers.
 */
import type { IndexedCatalogue } from '../catalog/entries.ts';
import type { Fit, Material, Source } from '../catalog/types.ts';
import type { BoundModel } from '../dispersion/evaluator.ts';
import { bindModel } from '../dispersion/registry.ts';
import { type AbsorptionInterpolant, bindAbsorption } from '../medium/absorption.ts';

export interface Survey {
  /** In the order of the catalogue. */
  readonly materials: readonly Material[];
  /** Of the materials, each once. */
  readonly classes: readonly string[];
  readonly material: (key: string) => Material | undefined;
  readonly bind: (fit: Fit) => BoundModel;
  readonly absorption: (material: Material) => AbsorptionInterpolant;
  readonly sourceOf: (id: string) => Source | undefined;
}

export function makeSurvey(catalogue: Pick<IndexedCatalogue, 'keys' | 'material' | 'source'>): Survey {
  const models = new Map<Fit, BoundModel>();
  const absorptions = new Map<Material, AbsorptionInterpolant>();
  const materials = catalogue.keys().flatMap((key) => catalogue.material(key) ?? []);
  return {
    materials,
    classes: [...new Set(materials.map((material) => material.class))],
    material: (key) => catalogue.material(key),
    bind: (fit) => remembered(models, fit, () => bindModel(fit.parameters, {})),
    absorption: (material) => remembered(absorptions, material, () => bindAbsorption(material.absorption)),
    sourceOf: (id) => catalogue.source(id),
  };
}

function remembered<Key, Value>(made: Map<Key, Value>, key: Key, make: () => Value): Value {
  const known = made.get(key);
  if (known !== undefined) return known;
  const value = make();
  made.set(key, value);
  return value;
}
