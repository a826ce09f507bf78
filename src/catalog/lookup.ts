/** From a resolved name to the records: the `lookup` of every catalogue. Parses the materials it returns and no others. */
import type { Lookup } from './catalogue.ts';
import type { NameSource } from './names.ts';
import { resolveName } from './names.ts';
import type { Material } from './types.ts';

export interface MaterialSource extends NameSource {
  material(key: string): Material | undefined;
}

export function lookupIn(name: string, catalogue: MaterialSource): Lookup {
  const resolved = resolveName(name, catalogue);
  switch (resolved.kind) {
    case 'none':
      return resolved;
    case 'several':
      return {
        kind: 'several',
        candidates: resolved.keys.flatMap((key) => catalogue.material(key) ?? []),
      };
    case 'no-such-axis': {
      const material = catalogue.material(resolved.key);
      return material ? { kind: 'no-such-axis', material, axes: resolved.axes } : { kind: 'none' };
    }
    case 'one': {
      const material = catalogue.material(resolved.key);
      if (!material) return { kind: 'none' };
      return {
        kind: 'one',
        found: resolved.axis ? { material, axis: resolved.axis } : { material },
      };
    }
  }
}
