/** Fits of transparent media with fixed coefficients; coefficients as printed by the source in `name`. */
import type { PublishedFit } from './check.ts';

export const TRANSPARENT_FITS: readonly PublishedFit[] = [
  {
    name: 'N-BK7, SCHOTT data sheet: C squared',
    parameters: {
      model: 'sellmeier',
      offset: 1,
      poles: [
        { B: 1.03961212, C_um2: 0.00600069867 },
        { B: 0.231792344, C_um2: 0.0200179144 },
        { B: 1.01046945, C_um2: 103.560653 },
      ],
    },
    source: 'SCHOTT N-BK7 data sheet, line indices; last printed digit',
    tolerance: 5.1e-6,
    values: [
      { um: 0.5875618, n: 1.5168 },
      { um: 0.546074, n: 1.51872 },
      { um: 1.014, n: 1.50731 },
      { um: 1.9701, n: 1.49495 },
    ],
  },
  {
    name: 'fused silica, Malitson 1965: C not squared',
    parameters: {
      model: 'sellmeier',
      offset: 1,
      poles: [
        { B: 0.6961663, C_um: 0.0684043 },
        { B: 0.4079426, C_um: 0.1162414 },
        { B: 0.8974794, C_um: 9.896161 },
      ],
    },
    source: 'Heraeus Suprasil index table (data sheet); last printed digit',
    tolerance: 5.1e-6,
    values: [
      { um: 0.21, n: 1.53836 },
      { um: 0.25, n: 1.50745 },
      { um: 0.28, n: 1.49416 },
      { um: 0.3, n: 1.48779 },
    ],
  },
  {
    name: 'BSC7, HOYA catalogue 2022: polynomial in L^2 and 1/L^2, no poles',
    parameters: {
      model: 'sellmeier',
      offset: 0,
      terms: [
        { c: 2.2702566, power: 0 },
        { c: -0.0091988101, power: 2 },
        { c: 0.011609706, power: -2 },
        { c: -0.000076123911, power: -4 },
        { c: 0.000028558727, power: -6 },
        { c: -0.0000012566486, power: -8 },
      ],
    },
    source: 'nd printed in the HOYA catalogue of July 2022; last printed digit',
    tolerance: 5.1e-6,
    values: [{ um: 0.5875618, n: 1.5168 }],
  },
  {
    name: 'calcite, ordinary, growers: pole without L^2 above, falling L^2 term',
    parameters: {
      model: 'sellmeier',
      offset: 2.69705,
      poles: [{ B: 0.0192064, C_um2: 0.0182, numeratorPower: 0 }],
      terms: [{ c: -0.0151624, power: 2 }],
    },
    source: 'AIP Handbook, 3rd ed., 6b (18 C, from memory); scatter of the fit',
    tolerance: 1.3e-4,
    values: [
      { um: 0.303, n: 1.71959 },
      { um: 0.508, n: 1.66527 },
      { um: 0.533, n: 1.66277 },
      { um: 0.58929, n: 1.65835 },
    ],
  },
  {
    name: 'silver gallium selenide, ordinary, Roberts 1996: fitted exponents',
    parameters: {
      model: 'sellmeier',
      offset: 6.849065,
      poles: [
        { B: 0.417863, C: 0.17808, numeratorPower: 0, polePower: 1.970203 },
        { B: 0.000442, C: 0.889242, numeratorPower: 0, polePower: 0.340086 },
        { B: 1.209374, C: 915.345, numeratorPower: 1.921292, polePower: 1.921292 },
      ],
    },
    source: 'Boyd et al., IEEE J. Quantum Electron. 8, 900 (1972) (from memory); scatter of the fit',
    tolerance: 2.5e-4,
    values: [
      { um: 1, n: 2.7132 },
      { um: 2, n: 2.6376 },
      { um: 3, n: 2.6245 },
      { um: 4, n: 2.6189 },
    ],
  },
  {
    name: 'potassium bromide, Stephens et al. 1953: pole and powers mixed',
    parameters: {
      model: 'sellmeier',
      offset: 2.361323,
      poles: [{ B: 0.0156569, C_um2: 0.0324, numeratorPower: 0 }],
      terms: [
        { c: -0.000311497, power: 2 },
        { c: -5.8613e-8, power: 4 },
        { c: 0.007676, power: -2 },
      ],
    },
    source: 'measured values of the same paper, AIP Handbook, 3rd ed., 6b (from memory)',
    tolerance: 1.5e-5,
    values: [
      { um: 0.404656, n: 1.589752 },
      { um: 0.486133, n: 1.571791 },
      { um: 0.546074, n: 1.563928 },
      { um: 0.643847, n: 1.555858 },
    ],
  },
  {
    name: 'lithium fluoride, Herzberger and Salzberg 1962',
    parameters: {
      model: 'herzberger',
      A: 1.38761,
      B: 0.001796,
      C: -0.000041,
      pole_um2: 0.028,
      terms: [
        { c: -0.0023045, power: 2 },
        { c: -0.00000557, power: 4 },
      ],
    },
    source: 'Tilton and Plyler 1951 (J. Res. NBS 47, 25), 23.6 C (from memory); last printed digit',
    tolerance: 1e-5,
    values: [
      { um: 0.5, n: 1.3943 },
      { um: 0.6, n: 1.39181 },
      { um: 0.7, n: 1.39017 },
      { um: 0.9, n: 1.38797 },
    ],
  },
  {
    name: 'GASIR 1, Umicore catalogue data 2007: Herzberger with L^6',
    parameters: {
      model: 'herzberger',
      A: 2.50730798,
      B: 0.0761612483,
      C: 0.0116256625,
      pole_um2: 0.028,
      terms: [
        { c: -0.000129196515, power: 2 },
        { c: -6.01958096e-8, power: 4 },
        { c: -1.78603241e-10, power: 6 },
      ],
    },
    source: "indices on the maker's data sheet (from memory); last printed digit",
    tolerance: 5.1e-5,
    values: [
      { um: 4, n: 2.51 },
      { um: 10, n: 2.4944 },
    ],
  },
  {
    name: 'toluene, Samoc 2003: Cauchy in nm',
    parameters: {
      model: 'cauchy',
      wavelengthUnit: 'nm',
      terms: [
        { c: 1.474775, power: 0 },
        { c: 6990.31, power: -2 },
        { c: 217760000, power: -4 },
      ],
    },
    source:
      'Riddick, Bunger, Sakano 1986 (n_D, from memory); Kedenburg et al. 2012 fit; scatter between groups',
    tolerance: 2.5e-4,
    values: [
      { um: 0.58929, n: 1.49693 },
      { um: 0.8, n: 1.486355 },
      { um: 1.3, n: 1.479052 },
    ],
  },
  {
    name: 'soda lime float glass, Rubin 1985: n in L^2 and 1/L^2',
    parameters: {
      model: 'cauchy',
      wavelengthUnit: 'um',
      terms: [
        { c: 1.513, power: 0 },
        { c: -0.003169, power: 2 },
        { c: 0.003962, power: -2 },
      ],
    },
    source: "SCHOTT B270, another soda-lime glass, maker's formula",
    tolerance: 6e-4,
    values: [
      { um: 0.48613, n: 1.529297 },
      { um: 0.8521, n: 1.515562 },
      { um: 1.97, n: 1.501908 },
    ],
  },
];
