/** Small made-up catalogues for tests of look-up and packing; the numbers mean nothing. */

import type { IndexedCatalogue } from '../../src/catalog/entries.ts';
import { packCatalogue } from '../../src/catalog/pack.ts';
import { openPacked } from '../../src/catalog/packed.ts';
import type { Axis, Fit, Material, Source } from '../../src/catalog/types.ts';

export const sampleSource: Source = {
  id: 'doe-1999',
  type: 'article-journal',
  title: 'Index of Al2O3 and µ-glass',
  author: [{ family: 'Doe', given: 'J.' }],
  issued: { 'date-parts': [[1999]] },
};

export function sampleFit(axis: Axis = 'isotropic', id = 'doe-1999'): Fit {
  return {
    id,
    axis,
    recommended: true,
    parameters: { model: 'constant', n: 1.5 },
    range_um: [0.3, 2],
    reference: 'air',
    accuracy_n: 1e-5,
    source: 'doe-1999',
    grade: 'B',
    recalled: false,
    checks: [
      {
        source: 'doe-1999',
        recalled: false,
        independent: false,
        columns: ['wavelength_um', 'n', 'tolerance_n'],
        rows: [[0.5, 1.5, 1e-6]],
      },
    ],
  };
}

export function sampleMaterial(over: Partial<Material> & { readonly key: string }): Material {
  return {
    name: over.key,
    aliases: [],
    class: 'test class',
    fits: [sampleFit()],
    ...over,
  };
}

export const sampleMaterials: readonly Material[] = [
  sampleMaterial({
    key: 'fused-silica',
    name: 'Fused silica, UV grade',
    formula: 'SiO2',
    aliases: ['silica glass'],
  }),
  sampleMaterial({
    key: 'crystal-quartz',
    name: 'Crystal quartz',
    formula: 'SiO2',
    aliases: ['quartz', 'α-quartz'],
    fits: [sampleFit('ordinary'), sampleFit('extraordinary')],
  }),
  sampleMaterial({ key: 'silicon-dioxide-film', name: 'Silica film', formula: 'SiO2', class: 'thin film' }),
  sampleMaterial({
    key: 'n-bk7',
    name: 'N-BK7, borosilicate crown',
    formula: 'glass',
    aliases: ['BK7'],
    glassCode: '517642',
  }),
  sampleMaterial({ key: 'bk7', name: 'BK7, borosilicate crown', formula: 'glass', glassCode: '517642' }),
  sampleMaterial({ key: 'silicon', name: 'Silicon', formula: 'Si', aliases: ['c-Si'] }),
  sampleMaterial({ key: 'caesium-iodide', name: 'Caesium iodide', formula: 'CsI' }),
  sampleMaterial({ key: 'carbon-monoxide', name: 'Carbon monoxide', formula: 'CO' }),
  sampleMaterial({ key: 'cobalt', name: 'Cobalt', formula: 'Co' }),
  sampleMaterial({ key: 'magnesium-oxide', name: 'Magnesium oxide', formula: 'MgO' }),
  sampleMaterial({
    key: 'lithium-niobate-mgo',
    name: 'Lithium niobate, 5 mol % MgO',
    formula: 'MgO:LiNbO3',
    aliases: ['MgO:LN'],
    fits: [sampleFit('ordinary'), sampleFit('extraordinary')],
  }),
  sampleMaterial({
    key: 'ktp',
    name: 'Potassium titanyl phosphate',
    formula: 'KTiOPO4',
    fits: [sampleFit('z'), sampleFit('x'), sampleFit('y')],
  }),
  sampleMaterial({ key: 'deuterated-kdp', name: 'Potassium dideuterium phosphate', aliases: ['KD*P'] }),
  sampleMaterial({ key: 'water', name: 'Water', formula: 'H2O', aliases: ['pure water'] }),
];

export function packedSample(materials: readonly Material[] = sampleMaterials): IndexedCatalogue {
  const input = { version: '9', date: '2026-01-02', materials, sources: [sampleSource] };
  return openPacked(packCatalogue(input).catalogue);
}
