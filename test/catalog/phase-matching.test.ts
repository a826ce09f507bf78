/**
 * Phase matching of frequency doubling and mixing, computed from the fits of the catalogue alone, against published angles and
 * grating periods. These depend on differences of index in the fourth decimal: an exchanged pair of axes, a coefficient of another
 * axis or a wrong wavelength unit cannot pass. Uniaxial: 1/n(theta)^2 = cos^2/n_o^2 + sin^2/n_e^2.
 *
 * Published: V. G. Dmitriev, G. G. Gurzadyan, D. N. Nikogosyan, Handbook of Nonlinear Optical Crystals (experimental angles,
 * spread of authors), makers' data and papers on poled crystals; all from memory.
 */
import { describe, expect, it } from 'vitest';
import type { Axis, Fit } from '../../src/catalog/types.ts';
import { ENTRIES, recommended } from './catalog-files.ts';
import { indexOf } from './fit-index.ts';

type N = (axis: Axis, wavelength_um: number) => number;

/** Index by axis: of the recommended fits, or of the fit of the given id; each followed a little beyond its range if need be. */
function indices(key: string, id?: string, temperature_C?: number): N {
  const m = ENTRIES.find((e) => e.material.key === key)?.material;
  if (!m) throw new Error(`no entry ${key}`);
  return (axis, L) => {
    const fit: Fit | undefined = id
      ? m.fits.find((f) => f.axis === axis && f.id === id)
      : (recommended(m, axis, L) ?? m.fits.find((f) => f.axis === axis && f.recommended));
    if (!fit) throw new Error(`${key} has no ${axis} fit`);
    return indexOf(fit, L, temperature_C === undefined ? {} : { temperature_K: temperature_C + 273.15 }).n;
  };
}

const tilted = (a: number, b: number, angle: number): number =>
  1 / Math.sqrt((Math.cos(angle) / a) ** 2 + (Math.sin(angle) / b) ** 2);

/** The angle in degrees at which `mismatch` vanishes; NaN where it does not change sign between 0 and 90 degrees. */
function angle_deg(mismatch: (angle: number) => number): number {
  let low = 1e-6;
  let high = Math.PI / 2 - 1e-6;
  if (mismatch(low) * mismatch(high) > 0) return Number.NaN;
  for (let i = 0; i < 80; i++) {
    const middle = (low + high) / 2;
    if (mismatch(low) * mismatch(middle) <= 0) high = middle;
    else low = middle;
  }
  return (low * 180) / Math.PI;
}

const sum = (a: number, b: number): number => 1 / (1 / a + 1 / b);

/** Two waves of one polarization into the other: ooe in negative, eeo in positive uniaxial crystals. */
function typeOne(n: N, a: number, b: number, sense: 'ooe' | 'eeo' = 'ooe'): number {
  const c = sum(a, b);
  const extraordinary = (L: number, t: number): number => tilted(n('ordinary', L), n('extraordinary', L), t);
  return angle_deg((t) =>
    sense === 'ooe'
      ? n('ordinary', a) / a + n('ordinary', b) / b - extraordinary(c, t) / c
      : extraordinary(a, t) / a + extraordinary(b, t) / b - n('ordinary', c) / c,
  );
}

/** One wave of each polarization, the first extraordinary, into an extraordinary one. */
function typeTwo(n: N, a: number, b: number): number {
  const c = sum(a, b);
  const extraordinary = (L: number, t: number): number => tilted(n('ordinary', L), n('extraordinary', L), t);
  return angle_deg((t) => extraordinary(a, t) / a + n('ordinary', b) / b - extraordinary(c, t) / c);
}

/** Biaxial, in the x-y plane at phi from x: the wave polarized in the plane sees x and y, the other one z. */
const inXY = (n: N, L: number, phi: number): number => tilted(n('y', L), n('x', L), phi);

/** First-order period of a poled crystal for doubling, in um. */
const period_um = (n: N, axis: Axis, L: number): number => L / 2 / (n(axis, L / 2) - n(axis, L));

interface Row {
  readonly what: string;
  readonly published: readonly [number, number];
  /** Beyond the published spread: 3e-4 of birefringence moves most angles by less than this. */
  readonly slack: number;
  readonly computed: () => number;
}

const nd = 1.0642;
const green = nd / 2;
const bbo = indices('beta-barium-borate');
const clbo = indices('caesium-lithium-borate');
const kdp = indices('potassium-dihydrogen-phosphate');
const dkdp = indices('deuterated-kdp');
const iodate = indices('lithium-iodate');
const agse = indices('silver-gallium-selenide');
const zgp = indices('zinc-germanium-phosphide');
const ktp = indices('potassium-titanyl-phosphate');
const lbo = indices('lithium-triborate');
const niobate = indices('potassium-niobate');

const ROWS: readonly Row[] = [
  { what: 'BBO, 1064 to 532 nm', published: [22.7, 22.9], slack: 0.2, computed: () => typeOne(bbo, nd, nd) },
  {
    what: 'BBO, type two, 1064 to 532 nm',
    published: [32.4, 32.9],
    slack: 0.3,
    computed: () => typeTwo(bbo, nd, nd),
  },
  {
    what: 'BBO, 532 to 266 nm',
    published: [47.3, 48],
    slack: 0.2,
    computed: () => typeOne(bbo, green, green),
  },
  {
    what: 'BBO, 1064 + 532 nm',
    published: [31.1, 31.4],
    slack: 0.2,
    computed: () => typeOne(bbo, nd, green),
  },
  {
    what: 'CLBO, 1064 to 532 nm',
    published: [28.7, 29.4],
    slack: 0.2,
    computed: () => typeOne(clbo, nd, nd),
  },
  {
    what: 'CLBO, 532 to 266 nm',
    published: [61.6, 62],
    slack: 0.4,
    computed: () => typeOne(clbo, green, green),
  },
  { what: 'KDP, 1064 to 532 nm', published: [41, 41.2], slack: 0.2, computed: () => typeOne(kdp, nd, nd) },
  {
    what: 'KDP, type two, 1064 to 532 nm',
    published: [59, 59.4],
    slack: 0.2,
    computed: () => typeTwo(kdp, nd, nd),
  },
  {
    what: 'KDP, 694 to 347 nm',
    published: [50.4, 50.6],
    slack: 0.2,
    computed: () => typeOne(kdp, 0.6943, 0.6943),
  },
  {
    what: 'KD*P, 1064 to 532 nm',
    published: [36.5, 36.7],
    slack: 0.2,
    computed: () => typeOne(dkdp, nd, nd),
  },
  { what: 'KD*P, type two', published: [53.5, 53.9], slack: 0.2, computed: () => typeTwo(dkdp, nd, nd) },
  {
    what: 'LiIO3, 1064 to 532 nm',
    published: [29.4, 30.2],
    slack: 0.2,
    computed: () => typeOne(iodate, nd, nd),
  },
  {
    what: 'AgGaSe2, 10.6 to 5.3 um',
    published: [53, 57.5],
    slack: 0.5,
    computed: () => typeOne(agse, 10.6, 10.6),
  },
  {
    what: 'ZnGeP2, 5.3 to 2.65 um',
    published: [47, 47.8],
    slack: 0.5,
    computed: () => typeOne(zgp, 5.3, 5.3, 'eeo'),
  },
  {
    what: 'KTP, type two in the x-y plane, 1064 to 532 nm',
    published: [23.2, 25.2],
    slack: 0.3,
    computed: () =>
      angle_deg((phi) => (inXY(ktp, nd, phi) + ktp('z', nd)) / nd - inXY(ktp, green, phi) / green),
  },
  {
    what: 'LBO, type one in the x-y plane, 1064 to 532 nm',
    published: [11.3, 11.6],
    slack: 0.5,
    computed: () => angle_deg((phi) => (2 * lbo('z', nd)) / nd - inXY(lbo, green, phi) / green),
  },
  {
    what: 'KTP, grating period of z-z-z doubling of 1064 nm',
    published: [9, 9],
    slack: 0.1,
    computed: () => period_um(ktp, 'z', nd),
  },
  {
    what: 'LiNbO3 with 5 % MgO, grating period of e-e-e doubling of 1064 nm',
    published: [6.9, 6.96],
    slack: 0.05,
    computed: () => period_um(indices('lithium-niobate-mgo', 'umemura-2014'), 'extraordinary', nd),
  },
  {
    what: 'LiTaO3, stoichiometric, grating period of e-e-e doubling of 1064 nm',
    published: [7.97, 7.97],
    slack: 0.08,
    computed: () => period_um(indices('lithium-tantalate-stoichiometric'), 'extraordinary', nd),
  },
  {
    what: 'LiNbO3, congruent at 25 C, grating period of the oscillator 1064 to 1550 + 3394 nm',
    published: [29.5, 30],
    slack: 0.15,
    computed: () => {
      const n = indices('lithium-niobate-congruent', 'jundt-1997', 25);
      const signal = 1.55;
      const idler = 1 / (1 / 1.064 - 1 / signal);
      const e: Axis = 'extraordinary';
      return 1 / (n(e, 1.064) / 1.064 - n(e, signal) / signal - n(e, idler) / idler);
    },
  },
  {
    what: 'KNbO3 (x, y, z = c, a, b), wavelength doubled without angle along a: n_b = n_c',
    published: [0.857, 0.86],
    slack: 0.002,
    computed: () => noncritical(niobate, 'z', 'x'),
  },
  {
    what: 'KNbO3 (x, y, z = c, a, b), wavelength doubled without angle along b: n_a = n_c',
    published: [0.982, 0.986],
    slack: 0.002,
    computed: () => noncritical(niobate, 'y', 'x'),
  },
];

/** Fundamental at which n of one axis equals that of another axis at half the wavelength, between 0.82 and 1.1 um. */
function noncritical(n: N, fundamental: Axis, harmonic: Axis): number {
  let low = 0.82;
  let high = 1.1;
  const mismatch = (L: number): number => n(fundamental, L) - n(harmonic, L / 2);
  if (mismatch(low) * mismatch(high) > 0) return Number.NaN;
  for (let i = 0; i < 60; i++) {
    const middle = (low + high) / 2;
    if (mismatch(low) * mismatch(middle) <= 0) high = middle;
    else low = middle;
  }
  return low;
}

describe('phase matching', () => {
  it.each(ROWS)('$what', ({ published, slack, computed }) => {
    const value = computed();
    expect(value).toBeGreaterThan(published[0] - slack);
    expect(value).toBeLessThan(published[1] + slack);
  });
});
