import { describe, expect, it } from 'vitest';
import type { ModelParameters } from '../../src/dispersion/parameters.ts';
import { bindModel, honours, MODELS } from '../../src/dispersion/registry.ts';
import * as C from '../../src/num/complex.ts';
import { index } from './evaluate.ts';
import { ABSORBING_FITS } from './fits/absorbing.ts';
import { LIQUIDS_AND_TABLES } from './fits/liquids-and-tables.ts';
import { STATE_FITS } from './fits/thermal-state.ts';
import { TRANSPARENT_FITS } from './fits/transparent.ts';

describe('conditions', () => {
  const all: readonly ModelParameters[] = [
    ...TRANSPARENT_FITS,
    ...STATE_FITS,
    ...LIQUIDS_AND_TABLES,
    ...ABSORBING_FITS,
  ].map((f) => f.parameters);
  const stated = {
    temperature_K: 303.15,
    pressure_Pa: 90000,
    humidity: 0.3,
    co2_ppm: 700,
    salinity_g_per_kg: 20,
    composition: 0.5,
  } as const;

  it('are honoured as declared: those named change the index and are reported, the others do neither', () => {
    for (const p of all) {
      const names = honours(p);
      const um =
        p.model === 'oscillators' || p.model === 'brendel-bormann'
          ? 0.6
          : p.model === 'water-optical'
            ? 0.5
            : 0.55;
      const radio = ['water-relaxation', 'ice-radio', 'power-law', 'wideband-debye'].includes(p.model);
      const at = radio
        ? 2e5
        : p.model === 'parametric-sellmeier' || p.model === 'exponential-thermal'
          ? 2.5
          : um;
      const plain = index(p, at);
      for (const name of Object.keys(stated) as (keyof typeof stated)[]) {
        const used = bindModel(p, { [name]: stated[name] }).used;
        const changed = index(p, at, { [name]: stated[name] });
        if (names.includes(name)) {
          expect(used[name], p.model).toBe(stated[name]);
          expect(C.abs(C.sub(changed, plain)), `${p.model} ${name}`).toBeGreaterThan(0);
        } else {
          expect(used[name], p.model).toBeUndefined();
          expect(changed).toEqual(plain);
        }
      }
    }
  });

  it('cover every model', () => {
    const tested = new Set<string>(all.map((p) => p.model));
    for (const other of ['constant', 'moist-air', 'radio-air', 'conductor', 'magnetic-table'])
      tested.add(other);
    expect([...tested].sort()).toEqual(Object.keys(MODELS).sort());
  });
});
