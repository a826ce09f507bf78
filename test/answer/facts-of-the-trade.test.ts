/** Facts every textbook and bench takes for granted; source of each: common practice. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ask, DEGREE, index, permittivity, vacuumWave } from '../helpers/ask.ts';

const c = 299_792_458;
const n = fc.double({ min: 1, max: 5, noNaN: true });
const eps = fc.double({ min: 0.5, max: 80, noNaN: true });
const mu = fc.double({ min: 0.5, max: 10, noNaN: true });
const wavelength = fc.double({ min: 50e-9, max: 1e3, noNaN: true }).map(vacuumWave);
const close = (a: number, b: number, relative = 1e-12) =>
  expect(Math.abs(a - b)).toBeLessThanOrEqual(relative * Math.abs(b));

describe('facts of the trade (common practice)', () => {
  it('frequency is the same on both sides; wavelength and phase speed shrink by n', () => {
    fc.assert(
      fc.property(n, n, wavelength, (n1, n2, wave) => {
        const a = ask(index(n1), index(n2), wave);
        close(a.from.wavelength_m! * n1, a.wave.vacuumWavelength_m);
        close(a.into.wavelength_m! * n2, a.wave.vacuumWavelength_m);
        close(a.from.phaseVelocity_m_per_s! / a.from.wavelength_m!, a.wave.frequency_Hz);
        close(a.into.phaseVelocity_m_per_s! / a.into.wavelength_m!, a.wave.frequency_Hz);
      }),
    );
  });

  it('n = sqrt(eps_r) in non-magnetic media, sqrt(eps_r mu_r) in general; Z = Z0 sqrt(mu_r/eps_r)', () => {
    fc.assert(
      fc.property(eps, mu, (e, m) => {
        close(ask(index(1), permittivity(e), vacuumWave(1e-6)).into.n, Math.sqrt(e));
        const medium = ask(index(1), permittivity(e, 0, m), vacuumWave(1e-6)).into;
        close(medium.n, Math.sqrt(e * m));
        close(medium.impedance_ohm.re, 376.730313412 * Math.sqrt(m / e));
      }),
    );
  });

  it('B0 = E0/v; intensity = 1/2 eps v E0^2; energy density times group speed is the intensity', () => {
    fc.assert(
      fc.property(n, fc.double({ min: 1e-3, max: 1e12, noNaN: true }), (n1, I) => {
        const a = ask(index(n1), index(1.5), vacuumWave(1e-6), {
          beam: { kind: 'irradiance', irradiance_W_per_m2: I },
        });
        for (const [side, wave] of [
          [a.from, a.energy!.incident!],
          [a.into, a.energy!.transmitted!],
        ] as const) {
          close(wave.peakB_T, wave.peakE_V_per_m / side.phaseVelocity_m_per_s!);
          const epsilon = side.relativePermittivity.re * 8.8541878188e-12;
          close(
            wave.irradiance_W_per_m2,
            0.5 * epsilon * side.phaseVelocity_m_per_s! * wave.peakE_V_per_m ** 2,
            1e-9,
          );
          close(wave.energyDensity_J_per_m3! * side.groupVelocity_m_per_s!, wave.irradiance_W_per_m2);
        }
      }),
    );
  });

  it('energy flows on: what arrives on a unit of surface leaves it, at any angle and polarization', () => {
    fc.assert(
      fc.property(
        n,
        n,
        fc.double({ min: 0, max: 89, noNaN: true }),
        fc.constantFrom('s', 'p', 'unpolarized' as const),
        (n1, n2, deg, polarization) => {
          const a = ask(index(n1), index(n2), vacuumWave(1e-6), {
            incidenceAngle_rad: deg * DEGREE,
            polarization: polarization as 's',
            beam: { kind: 'irradiance', irradiance_W_per_m2: 1 },
          });
          fc.pre(!a.interface.totalReflection && Math.cos(a.interface.refractionAngle_rad!) > 1e-3);
          const arriving = Math.cos(deg * DEGREE);
          const leaving =
            a.energy!.reflected!.irradiance_W_per_m2 * arriving +
            a.energy!.transmitted!.irradiance_W_per_m2 * Math.cos(a.interface.refractionAngle_rad!);
          close(leaving, arriving, 1e-9);
        },
      ),
    );
  });

  it('swapping the media keeps T at normal incidence', () => {
    fc.assert(
      fc.property(n, n, (n1, n2) => {
        const there = ask(index(n1), index(n2), vacuumWave(1e-6)).interface.T!;
        close(ask(index(n2), index(n1), vacuumWave(1e-6)).interface.T!, there);
      }),
    );
  });

  it('a literal medium does not disperse: group index is n, GVD is 0, no fit', () => {
    const { into } = ask(index(1), index(1.7), vacuumWave(5e-7));
    expect(into.groupIndex).toBe(1.7);
    expect(into.gvd_s2_per_m).toBe(0);
    expect(into.fit).toBeNull();
    expect(into.groupVelocity_m_per_s).toBe(c / 1.7);
  });

  it('a perfect match reflects nothing and says why the return loss is missing', () => {
    const a = ask(index(1.5), index(1.5), vacuumWave(5e-7));
    expect(a.interface.R).toBe(0);
    expect(a.interface.returnLoss_dB).toBeNull();
    expect(a.cautions.map((x) => x.code)).toContain('infinite-value');
  });

  it('in total reflection R = 1, T = 0, no refraction angle, and a finite tail', () => {
    const a = ask(index(1.5), index(1), vacuumWave(1e-6), { incidenceAngle_rad: 60 * DEGREE });
    expect(a.interface.totalReflection).toBe(true);
    expect(a.interface.R).toBeCloseTo(1, 14);
    expect(a.interface.T).toBe(0);
    expect(a.interface.refractionAngle_rad).toBeNull();
    expect(a.interface.evanescentDepth_m).toBeGreaterThan(0);
    expect(a.interface.criticalAngle_rad).toBeCloseTo(Math.asin(1 / 1.5), 14);
  });
});
