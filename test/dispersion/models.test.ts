/** What the models promise beyond agreement with printed values: limits, conditions, independent evaluation of their integrals. */
import { describe, expect, it } from 'vitest';
import type { ModelParameters } from '../../src/dispersion/parameters.ts';
import { bindModel } from '../../src/dispersion/registry.ts';
import { HC_eV_um } from '../../src/dispersion/spectral-variable.ts';
import { waterDensity_kg_per_m3 } from '../../src/dispersion/water-optical.ts';
import * as C from '../../src/num/complex.ts';
import { index, named, permittivity } from './evaluate.ts';
import { ABSORBING_FITS, SILVER_BRENDEL_BORMANN } from './fits/absorbing.ts';
import { IAPWS } from './fits/liquids-and-tables.ts';
import { STATE_FITS } from './fits/thermal-state.ts';
import { TRANSPARENT_FITS } from './fits/transparent.ts';

describe('oscillators', () => {
  const lorentz: ModelParameters = {
    model: 'oscillators',
    unit: 'eV',
    epsInfinity: 1,
    plasma: 1,
    per: 'plasma',
    lorentz: [{ strength: 1, position: 1, damping: 0.1 }],
  };
  const eps = (w: number): C.Complex => permittivity(lorentz, HC_eV_um / w);

  it('obey Kramers and Kronig: Re eps - 1 at w = 0.7 follows from Im eps (identity; J. D. Jackson, 7.10)', () => {
    const w0 = 0.7;
    const f = (w: number): number => w * eps(w).im;
    const f0 = f(w0);
    // The principal value of 1/(w^2 - w0^2) over the half axis is zero: subtracting f0 removes the pole.
    const steps = 200_000;
    let sum = 0;
    for (let i = 0; i < steps; i++) {
      const u = (i + 0.5) / steps;
      const w = u / (1 - u);
      sum += (f(w) - f0) / (w * w - w0 * w0) / (1 - u) ** 2 / steps;
    }
    expect(Math.abs((2 / Math.PI) * sum - 1.9245283018867925)).toBeLessThan(1e-5);
    expect(eps(w0).re - 1).toBeCloseTo(1.9245283018867925, 12);
  });

  it('obey the f-sum rule up to the cut at 300 w0 (Thomas, Reiche, Kuhn)', () => {
    const steps = 400_000;
    let sum = 0;
    for (let i = 0; i < steps; i++) {
      const w = Math.exp(Math.log(1e-3) + ((i + 0.5) / steps) * Math.log(300 / 1e-3));
      sum += w * eps(w).im * w * (Math.log(300 / 1e-3) / steps);
    }
    expect(Math.abs((2 / Math.PI) * sum - 1)).toBeLessThan(1e-3);
  });

  it('tend to the low-frequency conductor: sigma = eps0 wp^2/G', () => {
    const [wp, G] = [72700, 145];
    const drude = named(ABSORBING_FITS, 'silver, Ordal');
    // 2 pi c 100 m^-1 per cm^-1
    const sigma = (8.8541878188e-12 * wp * wp * 2 * Math.PI * 299792458 * 100) / G;
    const conductor: ModelParameters = { model: 'conductor', sigma_S_per_m: sigma };
    const um = 1e7;
    expect(index(drude, um).im / index(conductor, um).im).toBeCloseTo(1, 3);
  });
});

describe('Brendel-Bormann', () => {
  it('is the Gaussian average of Lorentz oscillators, by quadrature of the average itself', () => {
    for (const E of [0.3, 1.1, 3.9, 5.0]) {
      let eps: C.Complex = { re: 1, im: 0 };
      const p = SILVER_BRENDEL_BORMANN;
      const wp2 = p.plasma_eV ** 2;
      const free = { re: E * E, im: E * p.drude.damping_eV };
      eps = C.sub(eps, C.div({ re: p.drude.strength * wp2, im: 0 }, free));
      for (const o of p.oscillators) {
        const h = o.width_eV / 2000;
        for (let i = -16000; i <= 16000; i++) {
          const x = o.position_eV + i * h;
          const weight =
            (Math.exp(-0.5 * (i / 2000) ** 2) / (Math.sqrt(2 * Math.PI) * o.width_eV)) * h * o.strength * wp2;
          eps = C.add(eps, C.div({ re: weight, im: 0 }, { re: x * x - E * E, im: -E * o.damping_eV }));
        }
      }
      const got = permittivity(p, HC_eV_um / E);
      expect(C.abs(C.sub(got, eps)) / C.abs(eps)).toBeLessThan(1e-9);
    }
  });

  it('becomes a Lorentz oscillator as the width vanishes', () => {
    const with_width = (width_eV: number): ModelParameters => ({
      model: 'brendel-bormann',
      plasma_eV: 9,
      drude: { strength: 0.8, damping_eV: 0.05 },
      oscillators: [{ strength: 0.3, position_eV: 4, damping_eV: 0.5, width_eV }],
    });
    const um = HC_eV_um / 3.7;
    expect(C.abs(C.sub(index(with_width(1e-4), um), index(with_width(0), um)))).toBeLessThan(1e-6);
  });
});

describe('Sellmeier', () => {
  it('gives NaN and not a false index where n^2 <= 0', () => {
    const p = TRANSPARENT_FITS[0]?.parameters as ModelParameters;
    expect(index(p, 10.1).re).toBeNaN();
    const model = bindModel(p, {});
    expect(model.index?.(10.1)).toBeNaN();
    expect(model.groupIndex?.(10.1)).toBeNaN();
    const n = new Float64Array(1);
    model.indexBlock?.(Float64Array.of(10.1), 1, n);
    expect(n[0]).toBeNaN();
  });

  it('loses no digit of a strong pole far away: silicon nitride, 40314 L^2/(L^2 - 1239.842^2) (Luke 2015)', () => {
    const [C1, C2] = [0.1353406 ** 2, 1239.842 ** 2];
    const p: ModelParameters = {
      model: 'sellmeier',
      offset: 1,
      poles: [
        { B: 3.0249, C_um2: C1 },
        { B: 40314, C_um2: C2 },
      ],
    };
    for (const L of [0.4, 1.55, 5]) {
      const n = Math.sqrt(1 + (3.0249 * L * L) / (L * L - C1) + (40314 * L * L) / (L * L - C2));
      expect(Math.abs(index(p, L).re - n)).toBeLessThan(1e-15);
    }
  });

  it('follows germania-doped silica to pure germania, Fleming 1984', () => {
    const mixture = named(STATE_FITS, 'silica doped');
    const germania: ModelParameters = {
      model: 'sellmeier',
      offset: 1,
      poles: [
        { B: 0.80686642, C_um: 0.068972606 },
        { B: 0.71815848, C_um: 0.15396605 },
        { B: 0.85416831, C_um: 11.841931 },
      ],
    };
    expect(index(mixture, 1.3, { composition: 1 }).re).toBeCloseTo(index(germania, 1.3).re, 14);
    const third = index(mixture, 1.3, { composition: 0.3 }).re;
    expect(third).toBeGreaterThan(index(mixture, 1.3).re);
    expect(third).toBeLessThan(index(germania, 1.3).re);
  });

  it('warms lithium niobate as published: dn_e/dT about 4e-5 per K, dn_o/dT 5.4e-6 per K at 1.064 um', () => {
    // Edwards and Lawrence 1984; confirmed by the fits of other groups within 20 %.
    const ordinary = named(STATE_FITS, 'lithium niobate, ordinary');
    const slope =
      (index(ordinary, 1.064, { temperature_K: 308.15 }).re -
        index(ordinary, 1.064, { temperature_K: 298.15 }).re) /
      10;
    expect(slope).toBeGreaterThan(5.0e-6);
    expect(slope).toBeLessThan(5.8e-6);
  });
});

describe('gas', () => {
  const nitrogen = named(STATE_FITS, 'nitrogen, Peck');

  it('scales with density: half the pressure, half the refractivity; vacuum at no pressure', () => {
    const full = index(nitrogen, 0.6).re - 1;
    const half = index(nitrogen, 0.6, { pressure_Pa: 101325 / 2 }).re - 1;
    expect(half / full).toBeCloseTo(0.5, 4);
    expect(index(nitrogen, 0.6, { pressure_Pa: 0 }).re).toBe(1);
    const warm = index(nitrogen, 0.6, { temperature_K: 2 * 273.15 }).re - 1;
    expect(warm / full).toBeCloseTo(0.5, 4);
  });

  it('takes the second virial coefficient: B = -10.3 cm^3/mol raises the density at 1 MPa by 0.4 %', () => {
    const real: ModelParameters = { ...nitrogen, secondVirial_cm3_per_mol: -10.3 } as ModelParameters;
    const at = { pressure_Pa: 1e6 };
    const ratio = (index(real, 0.6, at).re - 1) / (index(nitrogen, 0.6, at).re - 1);
    const molar = 1e6 / (8.314462618 * 273.15);
    const expected = (1 + (-10.3e-6 * molar * 101325) / 1e6) / (1 - 10.3e-6 * molar);
    expect(ratio).toBeCloseTo(expected, 5);
  });
});

describe('water', () => {
  it('has the density of Tanaka 2001 (values of the paper, kg/m^3) and joins Kell 1975 smoothly', () => {
    const published = [
      [0, 999.8428],
      [10, 999.7027],
      [20, 998.2067],
      [25, 997.047],
      [30, 995.6488],
      [40, 992.2152],
    ] as const;
    for (const [t, rho] of published)
      expect(Math.abs(waterDensity_kg_per_m3(t + 273.15) - rho)).toBeLessThan(6e-5);
    for (const t of [0, 40])
      expect(
        Math.abs(waterDensity_kg_per_m3(t + 273.15 - 1e-6) - waterDensity_kg_per_m3(t + 273.15 + 1e-6)),
      ).toBeLessThan(4e-3);
    // Supercooled, 998.117 kg/m^3 at -10 C (CRC Handbook; from memory).
    expect(waterDensity_kg_per_m3(263.15)).toBeCloseTo(998.12, 1);
  });

  it('changes with temperature as the release says: dn/dT -0.90e-4 at 20 C, -1.06e-4 at 25 C per K at 0.589 um', () => {
    const slope = (t: number): number =>
      (index(IAPWS, 0.589, { temperature_K: t + 273.65 }).re -
        index(IAPWS, 0.589, { temperature_K: t + 272.65 }).re) /
      1;
    expect(slope(20) * 1e4).toBeCloseTo(-0.9, 1);
    expect(slope(25) * 1e4).toBeCloseTo(-1.06, 1);
  });

  it('conducts as sea water should: 4.2914 S/m at S = 35, 15 C (PSS-78)', () => {
    const sea = named(ABSORBING_FITS, 'sea water, Meissner');
    const um = 2.99792458e12;
    const eps2 = permittivity(sea, um, { temperature_K: 288.15, salinity_g_per_kg: 35 }).im;
    const sigma = eps2 * 8.8541878188e-12 * 2 * Math.PI * 100;
    expect(Math.abs(sigma - 4.2914)).toBeLessThan(1e-3);
  });

  it('knows no salt where the fit describes fresh water', () => {
    const fresh = named(ABSORBING_FITS, 'water, Liebe');
    expect(index(fresh, 3e4, { salinity_g_per_kg: 35 })).toEqual(index(fresh, 3e4));
  });
});

describe('conductor', () => {
  it('has the skin depth of the textbook: copper 0.66 um at 10 GHz (D. M. Pozar, appendix F; from memory)', () => {
    const um = 29979.2458;
    const k = index({ model: 'conductor', sigma_S_per_m: 5.813e7 }, um).im;
    expect(um / (2 * Math.PI * k)).toBeCloseTo(0.66, 2);
  });

  it('carries its permeability: mu-metal, delta = 1/sqrt(pi f mu0 mu_r sigma)', () => {
    const p: ModelParameters = { model: 'conductor', sigma_S_per_m: 1.8e6, permeability: 27300 };
    const f = 50;
    const um = 2.99792458e14 / f;
    const depth_m = (um * 1e-6) / (2 * Math.PI * index(p, um).im);
    expect(depth_m / (1 / Math.sqrt(Math.PI * f * 1.25663706127e-6 * 27300 * 1.8e6))).toBeCloseTo(1, 9);
    const mu = new Float64Array(2);
    bindModel(p, {}).permeability?.(um, mu);
    expect([...mu]).toEqual([27300, 0]);
  });
});

describe('constant', () => {
  it('turns loss tangent and permeability into n + ik', () => {
    const eps = { re: 2.08, im: 2.08 * 4e-4 };
    expect(permittivity({ model: 'constant', permittivity: 2.08, lossTangent: 4e-4 }, 1e4).im).toBeCloseTo(
      eps.im,
      15,
    );
    expect(permittivity({ model: 'constant', n: 1.43855, lossTangent: 5.3e-4 }, 1e4).re).toBeCloseTo(
      1.43855 ** 2,
      14,
    );
    expect(index({ model: 'constant', permittivity: 4, permeability: 9 }, 1).re).toBe(6);
    expect(index({ model: 'constant', n: 0.2, k: 3.4 }, 1)).toEqual({ re: 0.2, im: 3.4 });
  });

  it('has no derivative where one value is published', () => {
    const single = bindModel({ model: 'constant', n: 1.477, publishedAt_um: 0.5893 }, {});
    expect([single.hasDerivative, single.derivativeOrder, single.complex]).toEqual([false, 0, false]);
    expect(bindModel({ model: 'constant', n: 1, k: 0 }, {}).complex).toBe(true);
  });
});
