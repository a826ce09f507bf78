/** Optical fits of water and solutions, and tables. */
import { celsius, type PublishedFit } from './check.ts';

export const IAPWS: PublishedFit['parameters'] = {
  model: 'water-optical',
  a: [
    0.244257733, 0.00974634476, -0.00373234996, 0.000268678472, 0.0015892057, 0.00245934259, 0.90070492,
    -0.0166626219,
  ],
  poleUV: 0.229202,
  poleIR: 5.432937,
  referenceTemperature_K: 273.15,
  referenceDensity_kg_per_m3: 1000,
  referenceWavelength_um: 0.589,
  default_K: 293.15,
};

export const LIQUIDS_AND_TABLES: readonly PublishedFit[] = [
  {
    name: 'water, IAPWS R9-97',
    parameters: IAPWS,
    source: 'IAPWS R9-97, table 3 (0 C, 0.1 MPa); last printed digit',
    tolerance: 5.1e-7,
    values: [
      { um: 0.2265, n: 1.394527, conditions: celsius(0) },
      { um: 0.589, n: 1.334344, conditions: celsius(0) },
      { um: 1.01398, n: 1.326135, conditions: celsius(0) },
    ],
  },
  {
    name: 'sea water, Quan and Fry 1995',
    parameters: {
      model: 'sea-water-optical',
      n: [1.31405, 1.779e-4, -1.05e-6, 1.6e-8, -2.02e-6, 15.868, 0.01155, -0.00423, -4382, 1.1455e6],
      default_K: 293.15,
      default_g_per_kg: 35,
    },
    source: 'IAPWS R9-97 divided by n of air (S = 0); McNeil, Opt. Eng. 16, 177 (1977) (S = 35, from memory)',
    tolerance: 1.5e-4,
    values: [
      { um: 0.4, n: 1.343186, conditions: { ...celsius(20), salinity_g_per_kg: 0 } },
      { um: 0.7, n: 1.330159, conditions: { ...celsius(20), salinity_g_per_kg: 0 } },
      { um: 0.58926, n: 1.339378 },
    ],
  },
  {
    name: 'isooctane, Marsh (ed.) 1987: columns at three temperatures',
    parameters: {
      model: 'table',
      abscissa: 'um',
      at: [0.43583, 0.48613, 0.50157, 0.54607, 0.58926, 0.65628, 0.66781],
      n: {
        values: [1.40029, 1.39639, 1.39544, 1.39316, 1.39145, 1.38945, 1.38916],
        along: 'L^-2',
        kind: 'linear',
      },
      warmer: {
        temperature_C: 20,
        columns: [
          { temperature_C: 25, n: [1.39776, 1.39389, 1.39294, 1.39068, 1.38898, 1.38698, 1.3867] },
          { temperature_C: 30, n: [1.39523, 1.39138, 1.39044, 1.3882, 1.3865, 1.38452, 1.38424] },
        ],
      },
    },
    source: 'handbook sodium-line index at 20 C (from memory); same table at 25 and 30 C',
    tolerance: 6e-5,
    values: [
      { um: 0.58926, n: 1.3915 },
      { um: 0.58926, n: 1.38898, conditions: celsius(25) },
      { um: 0.58926, n: 1.3865, conditions: celsius(30) },
    ],
  },
  {
    name: 'multispectral zinc sulphide, Cleartran data sheet: cubic of n^2 in 1/L^2',
    parameters: {
      model: 'table',
      abscissa: 'um',
      at: [
        0.4047, 0.4358, 0.4678, 0.48, 0.5086, 0.5461, 0.5876, 0.6438, 0.6678, 0.7065, 0.78, 0.7948, 0.8521,
        0.8943, 1.014, 1.1287, 1.5296, 2.0581, 3, 3.5, 4, 4.5, 5, 8, 9, 10, 11.25, 12, 13,
      ],
      n: {
        values: [
          2.54515, 2.48918, 2.44915, 2.43691, 2.41279, 2.38838, 2.36789, 2.34731, 2.34033, 2.33073, 2.31669,
          2.31438, 2.30659, 2.30183, 2.29165, 2.28485, 2.27191, 2.26442, 2.25772, 2.25498, 2.25231, 2.24955,
          2.24661, 2.22334, 2.2129, 2.20084, 2.18317, 2.17101, 2.15252,
        ],
        along: 'L^-2',
        kind: 'cubic',
        of: 'square',
      },
    },
    source:
      'Debenham 1984 formula (Appl. Opt. 23, 2238; from memory), between and at rows; scatter of the melts',
    tolerance: 3.7e-4,
    values: [
      { um: 0.5461, n: 2.38842 },
      { um: 1.014, n: 2.29147 },
      { um: 8, n: 2.22336 },
      { um: 12, n: 2.17086 },
    ],
  },
  {
    name: 'ULE 7972, Corning data sheet: parabola in 1/L^2',
    parameters: {
      model: 'table',
      abscissa: 'um',
      at: [0.48613, 0.58929, 0.65627],
      n: { values: [1.4892, 1.4828, 1.4801], along: 'L^-2', kind: 'quadratic' },
    },
    source: 'line indices of the data sheet (from memory); the rows themselves',
    tolerance: 1e-12,
    values: [
      { um: 0.48613, n: 1.4892 },
      { um: 0.58929, n: 1.4828 },
      { um: 0.65627, n: 1.4801 },
    ],
  },
  {
    name: 'silver bromide, data sheet: 1/L^2 up to 9.926 um, L^2 beyond',
    parameters: {
      model: 'table',
      abscissa: 'um',
      at: [0.391, 0.477, 0.496, 0.55, 0.6, 0.65, 0.781, 9.926, 12.66],
      n: {
        values: [2.416, 2.33, 2.313, 2.27, 2.25, 2.24, 2.205, 2.167, 2.162],
        along: 'L^2',
        below: { upTo_um: 9.926, along: 'L^-2' },
        kind: 'linear',
      },
    },
    source: 'index at 10 um of the data sheet; handbook sodium-line index (from memory)',
    tolerance: 9e-4,
    values: [
      { um: 10, n: 2.167 },
      { um: 0.5893, n: 2.253 },
    ],
  },
  {
    name: 'glucose syrup, ISO 1743:1973',
    parameters: {
      model: 'composition-table',
      publishedAt_um: 0.5893,
      content_percent: [0, 20, 40, 60, 66],
      temperatures_C: [20, 30, 45, 60],
      n: [
        [1.33299, 1.33194, 1.32985, 1.32725],
        [1.36534, 1.36402, 1.36161, 1.35877],
        [1.40319, 1.40163, 1.39894, 1.39592],
        [1.44767, 1.44588, 1.44296, 1.43981],
        [1.46251, 1.46066, null, 1.4545],
      ],
      defaultComposition: 0.2,
      default_K: 293.15,
      of: 'dry matter by mass',
    },
    source: 'pure water, IAPWS R9-97 at the D line (0 %, from memory); printed rows of the standard',
    tolerance: 1.1e-5,
    values: [
      { um: 0.5893, n: 1.33299, conditions: { ...celsius(20), composition: 0 } },
      { um: 0.5893, n: 1.32985, conditions: { ...celsius(45), composition: 0 } },
      { um: 0.5893, n: 1.36534 },
      { um: 0.5893, n: 1.44588, conditions: { ...celsius(30), composition: 0.6 } },
    ],
  },
];
