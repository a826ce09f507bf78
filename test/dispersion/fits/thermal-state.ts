/** Fits whose formula takes temperature, composition, pressure or salinity. */
import { celsius, type PublishedFit } from './check.ts';

const GEHRSITZ = {
  model: 'aluminium-gallium-arsenide',
  default_K: 293.15,
  A_T: [5.9613, 7.178e-4, -9.53e-7],
  A_x: [-16.159, 43.511, -71.317, 57.535, -17.451],
  invC0_x: [50.535, -150.7, -62.209, 797.16, -1125, 503.79],
  E1_T: [4.7171, -3.237e-4, -1.358e-6],
  E1_x: [11.006, -3.08],
  C1_x: [21.5647, 113.74, -122.5, 108.401, -47.318],
  E0_x: [1.1308, 0.1436],
  EG: [1.5192, 1.8, 0.0159, 1.1, 0.0336],
  R_GaAs: [1.55e-3, 7.24e-4],
  R_AlAs: [2.61e-3, 1.331e-3],
  eV_um: 1.239856,
  k_eV_per_K: 8.61708e-5,
} as const;

export const STATE_FITS: readonly PublishedFit[] = [
  {
    name: 'silicon, Frey, Leviton, Madison 2006: polynomials in T',
    parameters: {
      model: 'parametric-sellmeier',
      control: { kind: 'temperature-K', default_K: 295 },
      offset: 1,
      poles: [
        {
          B: [10.4907, -2.0802e-4, 4.21694e-6, -5.82298e-9, 3.44688e-12],
          C_um: [0.299713, -1.14234e-5, 1.67134e-7, -2.51049e-10, 2.32484e-14],
        },
        {
          B: [-1346.61, 29.1664, -0.278724, 1.05939e-3, -1.35089e-6],
          C_um: [-3517.1, 42.3892, -0.357957, 1.17504e-3, -1.13212e-6],
        },
        {
          B: [4.42827e7, -1.76213e6, -76157.5, 678.414, 103.243],
          C_um: [1.714e6, -144984, -6907.44, -39.3699, 23.577],
        },
      ],
    },
    source: 'measured absolute indices of the same paper, table 2',
    tolerance: 1e-5,
    values: [
      { um: 2.5, n: 3.44011 },
      { um: 3, n: 3.4124, conditions: { temperature_K: 150 } },
      { um: 2, n: 3.42508, conditions: { temperature_K: 50 } },
    ],
  },
  {
    name: 'germanium, Barnes and Piltch 1979: squared poles linear in T',
    parameters: {
      model: 'parametric-sellmeier',
      control: { kind: 'temperature-K', default_K: 293.15 },
      offset: [11.05128, -6.04e-3],
      poles: [
        { B: [4.00536, 9.295e-3], C_um2: [0.599034, -5.392e-4] },
        { B: [0.09145, 4.151e-4], C_um2: [3426.5, 1.51408] },
      ],
    },
    source: 'Burnett et al. 2016 (Proc. SPIE 9974), 22 C; scatter between groups',
    tolerance: 1.4e-3,
    values: [
      { um: 2.5, n: 4.06582, conditions: celsius(22) },
      { um: 4, n: 4.02472, conditions: celsius(22) },
      { um: 12, n: 4.00274, conditions: celsius(22) },
    ],
  },
  {
    name: 'lithium niobate, ordinary, Edwards and Lawrence 1984: (t - t0)(t + t0 + 546)',
    parameters: {
      model: 'parametric-sellmeier',
      control: { kind: 'temperature-product', minus_C: 24.5, plus_C: 570.5, default_K: 297.65 },
      offset: [4.9048, 2.1429e-8],
      poles: [{ B: [0.11775, 2.2314e-8], C_um: [0.21802, -2.9671e-8], numeratorPower: 0 }],
      terms: [{ c: -0.027153, power: 2 }],
    },
    source: 'Zelmon, Small, Jundt 1997 fit evaluated at 21 C; scatter between groups',
    tolerance: 1.2e-4,
    values: [
      { um: 0.4358, n: 2.39308, conditions: celsius(21) },
      { um: 1.0642, n: 2.23209, conditions: celsius(21) },
      { um: 1.55, n: 2.21111, conditions: celsius(21) },
    ],
  },
  {
    name: 'polycrystalline alumina, Harris et al.: T^2 - T0^2',
    parameters: {
      model: 'parametric-sellmeier',
      control: { kind: 'temperature-K-squared', reference_K: 295.15, default_K: 295.15 },
      offset: 1,
      poles: [
        { B: [2.07156, 6.273e-8], C_um: [0.091293, -1.9516e-8] },
        { B: 5.62675, C_um: 18.5533 },
      ],
    },
    source: '(2 n_o + n_e)/3 of sapphire, Malitson and Dodge 1972 (from memory)',
    tolerance: 2.5e-4,
    values: [
      { um: 1, n: 1.75305 },
      { um: 2, n: 1.7351 },
      { um: 5, n: 1.62215 },
    ],
  },
  {
    name: 'silica doped with germania, Fleming 1984: linear in composition',
    parameters: {
      model: 'parametric-sellmeier',
      control: { kind: 'composition', default: 0, of: 'GeO2 by amount' },
      offset: 1,
      poles: [
        { B: { at0: 0.6961663, at1: 0.80686642 }, C_um: { at0: 0.0684043, at1: 0.068972606 } },
        { B: { at0: 0.4079426, at1: 0.71815848 }, C_um: { at0: 0.1162414, at1: 0.15396605 } },
        { B: { at0: 0.8974794, at1: 0.85416831 }, C_um: { at0: 9.896161, at1: 11.841931 } },
      ],
    },
    source: 'Heraeus Suprasil index table (pure silica); last printed digit',
    tolerance: 5.1e-6,
    values: [
      { um: 0.58756, n: 1.45846 },
      { um: 1.5, n: 1.44462 },
    ],
  },
  {
    name: 'silicon, Li 1980: exponential of the thermal expansion',
    parameters: {
      model: 'exponential-thermal',
      e: [11.4445, 2.7739e-4, 1.705e-6, -8.1347e-10],
      g: [0.8948, 4.3977e-4, 7.3835e-8],
      xBelow: [-2.1e-4, -4.149e-7, -4.62e-10, 1.482e-11],
      xFrom: [-7.1e-4, 1.887e-6, 1.934e-9, -4.544e-13],
      switch_K: 293,
      default_K: 293.15,
    },
    source: 'Salzberg and Villa 1957, prism, 26 C (from memory); level of the fit',
    tolerance: 2.2e-3,
    values: [
      { um: 1.6606, n: 3.4696 },
      { um: 2.4373, n: 3.4408 },
      { um: 2.7144, n: 3.4358 },
    ],
  },
  {
    name: 'gallium arsenide, Gehrsitz et al. 2000, x = 0',
    parameters: { ...GEHRSITZ, x: 0 },
    source: 'Amorphous Materials Inc., measured prism table',
    tolerance: 1e-3,
    values: [
      { um: 2.5, n: 3.3256 },
      { um: 5, n: 3.301 },
      { um: 8, n: 3.2878 },
    ],
  },
  {
    name: 'aluminium arsenide, Gehrsitz et al. 2000, x = 1',
    parameters: { ...GEHRSITZ, x: 1 },
    source: 'Fern and Onton 1971 (J. Appl. Phys. 42, 3499; from memory)',
    tolerance: 9e-4,
    values: [
      { um: 0.65, n: 3.09439 },
      { um: 0.9, n: 2.97062 },
      { um: 1, n: 2.9474 },
    ],
  },
  {
    name: 'nitrogen, Peck and Khanna 1966',
    parameters: {
      model: 'gas',
      form: 'refractivity',
      reference_K: 273.15,
      reference_Pa: 101325,
      A: 6.8552e-5,
      poles: [{ B: 0.03243157, C_per_um2: 144 }],
    },
    source: 'Kaye and Laby, gases at 589.3 nm, 0 C (from memory); Bates 1984 rescaled; last printed digit',
    tolerance: 5e-7,
    values: [
      { um: 0.5893, n: 1.000298 },
      { um: 0.5, n: 1.0003002045 },
    ],
  },
  {
    name: 'nitrogen, Boerzsoenyi et al. 2008, at 273 K and 1000 mbar, carried to 0 C and 101325 Pa',
    parameters: {
      model: 'gas',
      form: 'sellmeier',
      reference_K: 273,
      reference_Pa: 1e5,
      poles: [
        { B: 0.0003920995, C_um2: 0.00114624 },
        { B: 0.0001880648, C_um2: 0.013476 },
      ],
    },
    source: 'Peck and Khanna 1966 (0.5 um, 1.0003002) and Bates 1984; agreement of the groups',
    tolerance: 2e-7,
    values: [{ um: 0.5, n: 1.0003002, conditions: { temperature_K: 273.15, pressure_Pa: 101325 } }],
  },
  {
    name: 'carbon monoxide, Allen 4th ed.',
    parameters: {
      model: 'gas',
      form: 'cauchy',
      reference_K: 273.15,
      reference_Pa: 101325,
      A: 3.27e-4,
      B_um2: 0.0081,
    },
    source: 'Chronological Scientific Tables, 589.3 nm; last printed digit',
    tolerance: 1e-6,
    values: [{ um: 0.5893, n: 1.000334 }],
  },
];
