import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  fieldOfIrradiance,
  irradianceOfField,
  meanEnergy,
  photonFlux_per_s,
  planeWaveEnergy,
  radiationPressure_Pa,
  transmittedEnergy,
} from '../../src/interface/energy.ts';
import { fresnel } from '../../src/interface/fresnel.ts';
import { type Optics, opticsFromIndex } from '../../src/interface/optics.ts';
import {
  abs,
  abs2,
  add,
  type Complex,
  complex,
  conj,
  div,
  mul,
  ONE,
  scale,
  sub,
} from '../../src/num/complex.ts';
import { SPEED_OF_LIGHT_m_per_s as c, VACUUM_IMPEDANCE_ohm as Z0 } from '../../src/units/constants.ts';
import {
  absorbing,
  incidence,
  losslessDielectric,
  losslessMagnetic,
  passiveMagnetic,
} from './arbitrary-media.ts';

const VACUUM = opticsFromIndex(ONE, ONE);
const GLASS = opticsFromIndex(complex(1.5), ONE);
const near = (got: number, wanted: number, relative = 1e-9) =>
  expect(Math.abs(got - wanted)).toBeLessThanOrEqual(relative * Math.abs(wanted));

describe('plane wave', () => {
  it('of one kilowatt per square metre in vacuum: 868 V/m and 2.9 uT (sunlight in textbooks, from memory)', () => {
    const wave = planeWaveEnergy(VACUUM, 1, 1000);
    expect(wave.peakE_V_per_m).toBeCloseTo(868.0, 1);
    expect(wave.peakB_T * 1e6).toBeCloseTo(2.895, 3);
    // u = eps0 E^2/2, the mean of electric and magnetic halves (Jackson 7.1).
    near(wave.energyDensity_J_per_m3 ?? 0, 8.8541878128e-12 * wave.peakE_V_per_m ** 2 * 0.5);
    expect(wave.irradiance_W_per_m2).toBe(1000);
  });

  it('has E less by sqrt n and B more by sqrt n in glass, and an energy density with the group index', () => {
    const outside = planeWaveEnergy(VACUUM, 1, 1000);
    const inside = planeWaveEnergy(GLASS, 1.6, 1000);
    near(inside.peakE_V_per_m, outside.peakE_V_per_m / Math.sqrt(1.5));
    near(inside.peakB_T, outside.peakB_T * Math.sqrt(1.5));
    near(inside.energyDensity_J_per_m3 ?? 0, (outside.energyDensity_J_per_m3 ?? 0) * 1.6);
  });

  it('irradiance and field undo each other', () => {
    fc.assert(
      fc.property(fc.oneof(losslessMagnetic, absorbing), (side) => {
        near(irradianceOfField(side, fieldOfIrradiance(side, 7)), 7);
      }),
    );
  });

  it('has no energy density without a group index, nor where k/n exceeds a thousandth, whatever the sign of n', () => {
    const density = (n: Complex, groupIndex: number | null) =>
      planeWaveEnergy(opticsFromIndex(n, ONE), groupIndex, 1).energyDensity_J_per_m3;
    expect(density(complex(1.5), null)).toBeNull();
    expect(density(complex(1.5, 0.0016), 1.5)).toBeNull();
    expect(density(complex(1.5, 0.0014), 1.5)).not.toBeNull();
    expect(density(complex(-1.5, 0.0014), 1.5)).not.toBeNull();
    expect(density(complex(1, 0.001), 1)).not.toBeNull();
  });
});

describe('transmitted wave', () => {
  it('below the critical angle is a plane wave with the power that Fresnel gives it', () => {
    fc.assert(
      fc.property(losslessMagnetic, losslessMagnetic, incidence, (from, into, angle_rad) => {
        const sin2 = (from.n.re / into.n.re) * Math.sin(angle_rad);
        fc.pre(sin2 < 0.99 && angle_rad < 1.5);
        const wave = fresnel(from, into, angle_rad);
        const E = 12;
        const area = Math.cos(angle_rad) / Math.sqrt(1 - sin2 * sin2);
        for (const [polarization, T] of [
          ['s', wave.Ts],
          ['p', wave.Tp],
        ] as const) {
          const wanted = planeWaveEnergy(into, 1.7, irradianceOfField(from, E) * T * area);
          const got = transmittedEnergy(into, 1.7, wave, polarization, E);
          near(got.irradiance_W_per_m2, wanted.irradiance_W_per_m2);
          near(got.peakE_V_per_m, wanted.peakE_V_per_m);
          near(got.peakB_T, wanted.peakB_T);
          near(got.energyDensity_J_per_m3 ?? 0, wanted.energyDensity_J_per_m3 ?? 1);
        }
      }),
    );
  });

  // Jackson 7.3: tangential E and H, normal D and B are continuous; the fields in front are incident plus reflected wave.
  const anyFar: fc.Arbitrary<Optics> = fc.oneof(losslessMagnetic, absorbing, passiveMagnetic);
  it('has at the surface the fields that continuity asks for, total reflection and absorbers included', () => {
    fc.assert(
      fc.property(losslessDielectric, anyFar, incidence, (from, into, angle_rad) => {
        const wave = fresnel(from, into, angle_rad);
        fc.pre(abs(wave.ts) > 1e-4 && abs(wave.tp) > 1e-4);
        const n1 = from.n.re;
        const cos = Math.cos(angle_rad);
        const sin = Math.sin(angle_rad);
        const flow = (E: Complex, H: Complex) => mul(E, conj(H)).re / (2 * Z0);
        const E = 3;

        const Ey = scale(add(ONE, wave.rs), E);
        const Hx = scale(sub(ONE, wave.rs), n1 * cos * E);
        const Hz = div(scale(Ey, n1 * sin), into.mu);
        const s = transmittedEnergy(into, null, wave, 's', E);
        near(s.peakE_V_per_m, abs(Ey), 1e-6);
        near(s.peakB_T, (abs(into.mu) * Math.sqrt(abs2(Hx) + abs2(Hz))) / c, 1e-6);
        near(s.irradiance_W_per_m2, Math.hypot(flow(Ey, Hx), flow(Ey, Hz)), 1e-6);

        const Hy = scale(add(ONE, wave.rp), n1 * E);
        const Ex = scale(sub(ONE, wave.rp), cos * E);
        const Ez = div(scale(Hy, n1 * sin), into.eps);
        const p = transmittedEnergy(into, null, wave, 'p', E);
        near(p.peakE_V_per_m, Math.sqrt(abs2(Ex) + abs2(Ez)), 1e-6);
        near(p.peakB_T, (abs(into.mu) * abs(Hy)) / c, 1e-6);
        near(p.irradiance_W_per_m2, Math.hypot(flow(Ex, Hy), flow(Ez, Hy)), 1e-6);
      }),
    );
  });

  it('has no energy density where it is evanescent', () => {
    const beyond = (angle_deg: number) =>
      transmittedEnergy(VACUUM, 1, fresnel(GLASS, VACUUM, (angle_deg * Math.PI) / 180), 'p', 1);
    expect(beyond(60).energyDensity_J_per_m3).toBeNull();
    expect(beyond(40).energyDensity_J_per_m3).not.toBeNull();
  });
});

describe('mean of two polarizations', () => {
  const a = { irradiance_W_per_m2: 1, peakE_V_per_m: 1, peakB_T: 2, energyDensity_J_per_m3: 5 };
  const b = { irradiance_W_per_m2: 3, peakE_V_per_m: 7, peakB_T: 14, energyDensity_J_per_m3: 6 };

  it('adds powers, and fields as the root of the mean square', () => {
    expect(meanEnergy(a, b)).toEqual({
      irradiance_W_per_m2: 2,
      peakE_V_per_m: 5,
      peakB_T: 10,
      energyDensity_J_per_m3: 5.5,
    });
  });

  it('has an energy density only where both have', () => {
    const without = { ...a, energyDensity_J_per_m3: null };
    expect(meanEnergy(without, b).energyDensity_J_per_m3).toBeNull();
    expect(meanEnergy(b, without).energyDensity_J_per_m3).toBeNull();
  });
});

describe('radiation pressure', () => {
  const deg = Math.PI / 180;

  // 1361 W/m^2: 4.54 uPa on a black sheet, 9.08 uPa on a mirror (the figures of every text on solar sails; from memory).
  it('of sunlight on a mirror, upright and at 60 degrees', () => {
    expect((radiationPressure_Pa(VACUUM, VACUUM, ONE, 1, 0, 0, 1361) ?? 0) * 1e6).toBeCloseTo(9.08, 2);
    expect((radiationPressure_Pa(VACUUM, VACUUM, ONE, 1, 0, 60 * deg, 1361) ?? 0) * 1e6).toBeCloseTo(
      9.08 / 4,
      2,
    );
  });

  it('on what lets everything through is none', () => {
    expect(radiationPressure_Pa(VACUUM, VACUUM, ONE, 0, 1, 0, 1361)).toBe(0);
  });

  // Ashkin & Dziedzic, Phys. Rev. Lett. 30, 139 (1973): light entering water pulls the surface outward, 2 (n - 1)/(n + 1) I/c.
  it('pulls a surface of water outward, light coming or leaving', () => {
    const water = opticsFromIndex(complex(1.33), ONE);
    const pressure = (from: Optics, into: Optics) => {
      const { kappa2, Rs, Ts } = fresnel(from, into, 0);
      return radiationPressure_Pa(from, into, kappa2, Rs, Ts, 0, c) ?? 0;
    };
    near(pressure(VACUUM, water), (-2 * 0.33) / 2.33);
    near(pressure(water, VACUUM), (2 * 1.33 * 0.33) / 2.33);
  });

  it('is not given into an absorber at oblique incidence', () => {
    const metal = opticsFromIndex(complex(0.2, 3), ONE);
    const kappa = complex(0.2, 3);
    expect(radiationPressure_Pa(VACUUM, metal, kappa, 0.9, 0.1, 10 * deg, 1)).toBeNull();
    expect(radiationPressure_Pa(VACUUM, metal, kappa, 0.9, 0.1, 0, 1)).not.toBeNull();
    const nearlyClear = opticsFromIndex(complex(-1.5, 0.001), ONE);
    expect(radiationPressure_Pa(VACUUM, nearlyClear, ONE, 0.5, 0.5, 10 * deg, 1)).not.toBeNull();
  });
});

// P lambda/(h c): a milliwatt of the red helium-neon line is 3.19e15 photons a second (common practice).
it('a milliwatt at 632.8 nm is 3.19e15 photons a second', () => {
  expect(photonFlux_per_s(1e-3, 632.8e-9) / 1e15).toBeCloseTo(3.186, 3);
});
