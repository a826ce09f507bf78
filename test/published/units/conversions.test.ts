/**
 * Published conversions of waves. Tolerance: half a unit of the last printed digit unless a row says otherwise.
 * "Recalled" marks values quoted from memory; "common practice" is what laser and telecom data sheets say.
 */
import { describe, expect, it } from 'vitest';
import { parseWave } from '../../../src/units/parse-wave.ts';
import { isProblem } from '../../../src/units/problem.ts';
import { SPECTRAL_LINES } from '../../../src/units/spectral-lines.ts';
import { frequencyWidthFromWavelengthWidth, waveMeasures } from '../../../src/units/wave.ts';

type Row = readonly [
  quantity: string,
  typed: string,
  measure: (vacuumWavelength_m: number) => number,
  published: number,
  tolerance: number,
  source: string,
];

const nm = (L: number) => L * 1e9;
const fm = (L: number) => L * 1e15;
const eV = (L: number) => waveMeasures(L).photonEnergy_eV;
const THz = (L: number) => waveMeasures(L).frequency_Hz / 1e12;
const BIPM =
  'BIPM recommended values of standard frequencies: Quinn, Metrologia 40, 103 (2003) and later lists; recalled, frequency and wavelength being two printed numbers';

const ROWS: readonly Row[] = [
  ['wavelength of 1 eV in nm', '1eV', nm, 1239.84198, 5e-6, 'CODATA 2022; recalled'],
  ['photon energy at 1 um in eV', '1um', eV, 1.239842, 5e-7, 'CODATA 2022; recalled'],
  ['photon energy at 1064 nm in eV', '1064nm', eV, 1.1653, 5e-5, 'common practice (laser data sheets)'],
  [
    'photon energy at 550 nm in eV',
    '550nm',
    eV,
    2.25,
    5e-3,
    'Wilson & Hawkes, Optoelectronics: an introduction, ex. 5.2 p. 176',
  ],
  ['frequency at 10.6 um in THz', '10.6um', THz, 28.28, 5e-3, 'common practice'],
  ['frequency at 1550 nm in THz', '1550nm', THz, 193.414, 5e-4, 'common practice'],
  [
    'anchor frequency of the DWDM grid, in nm',
    '193.1THz',
    nm,
    1552.52,
    5e-3,
    'ITU-T G.694.1, nominal central frequencies; recalled',
  ],
  ['DWDM channel, in nm', '195.9THz', nm, 1530.33, 5e-3, 'ITU-T G.694.1; recalled'],
  [
    'angular frequency at 800 nm in rad/fs',
    '800nm',
    (L) => waveMeasures(L).angularFrequency_rad_per_s / 1e15,
    2.3546,
    5e-5,
    'common practice (2.355 rad/fs)',
  ],
  [
    'width in GHz of 1 nm at 1550 nm',
    '1550nm',
    (L) => frequencyWidthFromWavelengthWidth(L, 1e-9) / 1e9,
    124.78,
    5e-3,
    'common practice (1 nm is about 125 GHz)',
  ],
  // The frequencies carry fewer digits than their wavelengths deserve at most by 1e-12 relative: 5e-3 fm.
  ['HeNe/I2 R(127) 11-5 in fm', '473612353604000Hz', fm, 632991212.579, 5e-3, BIPM],
  ['Nd:YAG doubled/I2 R(56) 32-0 in fm', '563260223513000Hz', fm, 532245036.104, 5e-3, BIPM],
  ['C2H2 P(16) in fm', '194369569384000Hz', fm, 1542383712.38, 5e-3, BIPM],
  ['HeNe/CH4 F2(2) P(7) in fm', '88376181600180Hz', fm, 3392231397.327, 5e-3, BIPM],
  // Tolerance: the relative standard uncertainty 1.5e-6 stated there.
  ['unstabilised red HeNe in nm', '473.6127THz', nm, 632.9908, 1e-3, 'CIPM Recommendation 2 (2007)'],
];

describe('conversions of waves', () => {
  it.each(ROWS)('%s of %s', (_quantity, typed, measure, published, tolerance) => {
    const wave = parseWave(typed);
    if (isProblem(wave)) throw new Error(wave.message);
    expect(Math.abs(measure(wave.wavelength_m) - published)).toBeLessThanOrEqual(tolerance);
  });
});

/** In nm, two decimals. e, d, F, C: ISO 7944:2024; the others as glass makers' catalogues round them. */
const LINES: readonly (readonly [string, number])[] = [
  ['i', 365.01],
  ['g', 435.83],
  ['F', 486.13],
  ["F'", 479.99],
  ['e', 546.07],
  ['d', 587.56],
  ['D', 589.29],
  ["C'", 643.85],
  ['C', 656.27],
  ['s', 852.11],
];

describe('reference lines', () => {
  it.each(LINES)('%s is %d nm in air', (symbol, published_nm) => {
    const line = SPECTRAL_LINES.find((l) => l.symbol === symbol);
    expect(Math.abs((line?.airWavelength_m ?? 0) * 1e9 - published_nm)).toBeLessThanOrEqual(0.005);
  });
});
