/** Paths of layers through the answer: energy is kept, and known paths come out. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Layer } from '../../src/answer/question.ts';
import { ask, DEGREE, index, named, tryAsk, vacuumWave } from '../helpers/ask.ts';

const film = (n: number, k: number, thickness_m: number): Layer => ({
  medium: index(n, k),
  thickness: { kind: 'length', thickness_m },
});
const quarter = (n: number, waves = 0.25): Layer => ({
  medium: index(n),
  thickness: { kind: 'waves', waves },
});

const anyLayer = fc
  .record({
    n: fc.double({ min: 0.1, max: 5, noNaN: true }),
    k: fc.oneof(fc.constant(0), fc.double({ min: 1e-9, max: 5, noNaN: true })),
    thickness_m: fc.double({ min: -10, max: -2.5, noNaN: true }).map((x) => 10 ** x),
  })
  .map(({ n, k, thickness_m }) => film(n, k, thickness_m));

describe('energy of a path', () => {
  it('R, T and the absorptances of the layers make 1, coherent or not, at any angle and polarization', () => {
    fc.assert(
      fc.property(
        fc.array(anyLayer, { minLength: 1, maxLength: 6 }),
        fc.double({ min: 0, max: 89, noNaN: true }),
        fc.constantFrom('s', 'p', 'unpolarized' as const),
        fc.double({ min: -6, max: 1, noNaN: true }),
        fc.double({ min: 1, max: 3, noNaN: true }),
        (layers, deg, polarization, coherence, exit) => {
          const a = ask(index(1), index(exit), vacuumWave(1e-6), {
            layers,
            incidenceAngle_rad: deg * DEGREE,
            polarization: polarization as 's',
            coherenceLength_m: 10 ** coherence,
          });
          const { stack } = a;
          if (!stack) throw new Error('no stack');
          const absorbed = stack.layerAbsorptance.reduce((sum, x) => sum + x, 0);
          expect(Math.abs(stack.R + stack.T + absorbed - 1)).toBeLessThan(1e-9);
          expect(a.interface.R).toBe(stack.R);
          expect(a.interface.T).toBe(stack.T);
          for (const [i, layer] of a.layers.entries()) {
            expect(layer.absorptance).toBe(stack.layerAbsorptance[i]);
            expect(layer.absorptance).toBeGreaterThan(-1e-9);
          }
        },
      ),
    );
  });

  it('keeps the power of a beam: what is reflected, transmitted and absorbed is what came', () => {
    const a = ask(index(1), index(1.5), vacuumWave(1e-6), {
      layers: [film(2, 0.1, 3e-7), film(1.4, 0, 2e-3)],
      beam: { kind: 'power', power_W: 3, diameter_m: 1e-3, profile: 'gaussian' },
    });
    const absorbed_W = 3 * (a.stack?.A ?? Number.NaN);
    const { reflectedPower_W, transmittedPower_W } = a.energy!;
    expect(reflectedPower_W! + transmittedPower_W! + absorbed_W).toBeCloseTo(3, 12);
  });
});

describe('coherence', () => {
  const window = [film(1.5, 0, 1e-3)];
  const of = (more: Parameters<typeof ask>[3]) =>
    ask(index(1), index(1), vacuumWave(1e-6), { layers: window, ...more }).stack!;

  it('comes from what is stated, else from the pulse, else from an assumption that is named', () => {
    expect(of({ coherenceLength_m: 1 })).toMatchObject({
      coherence: 'coherent',
      coherenceLengthFrom: 'stated',
    });
    expect(of({})).toMatchObject({ coherence: 'incoherent', coherenceLengthFrom: 'assumed' });
    const short = of({ pulseDuration_s: 100e-15 });
    expect(short.coherenceLengthFrom).toBe('pulse');
    expect(short.coherenceLength_m).toBeCloseTo((299_792_458 * 100e-15) / 0.441271, 9);
    // A long pulse says nothing about its line.
    expect(of({ pulseDuration_s: 10e-9 }).coherenceLengthFrom).toBe('assumed');
  });

  it('an incoherent window has T = 2n/(n^2 + 1)', () => {
    expect(of({}).T).toBeCloseTo((2 * 1.5) / (1.5 ** 2 + 1), 12);
  });
});

describe('the field', () => {
  it('has its profile where asked: continuous in s, the incident standing wave in front, absorption that adds up', () => {
    const a = ask(index(1), index(1.5), vacuumWave(1e-6), {
      layers: [film(2, 0.2, 3e-7), film(1.4, 0, 2e-7)],
      polarization: 's',
      incidenceAngle_rad: 30 * DEGREE,
      fieldProfile: true,
    });
    const points = a.stack?.fieldProfile ?? [];
    const highest = Math.max(...points.filter((p) => p.layer > 0).map((p) => p.intensity));
    expect(highest).toBeLessThanOrEqual(a.stack!.fieldMaximum!.intensity + 1e-12);
    expect(highest).toBeGreaterThan(0.999 * a.stack!.fieldMaximum!.intensity);
    const inFirst = points.filter((p) => p.layer === 1);
    const absorbed = inFirst
      .slice(1)
      .reduce(
        (sum, p, i) =>
          sum +
          ((p.absorbed_per_m + inFirst[i]!.absorbed_per_m) / 2) * (p.position_m - inFirst[i]!.position_m),
        0,
      );
    expect(absorbed / a.layers[0]!.absorptance).toBeCloseTo(1, 3);
    for (const [i, p] of points.entries()) {
      const next = points[i + 1];
      if (next && next.layer !== p.layer) expect(next.intensity).toBeCloseTo(p.intensity, 9);
    }
  });

  it('is null where layers add as intensities, and where nobody asked', () => {
    const layers = [film(1.5, 0, 1e-3)];
    const a = ask(index(1), index(1), vacuumWave(1e-6), { layers, fieldProfile: true });
    expect(a.stack!.fieldProfile).toBeNull();
    const b = ask(index(1), index(1), vacuumWave(1e-6), { layers: [film(1.5, 0, 1e-7)] });
    expect(b.stack!.fieldProfile).toBeNull();
  });

  it('in front of a surface stands at (1 + |r|)^2 times the incident intensity', () => {
    const beam = { kind: 'irradiance', irradiance_W_per_m2: 1 } as const;
    const a = ask(index(1), index(3), vacuumWave(1e-6), { beam });
    expect(a.energy!.fieldMaximumBefore!.intensity).toBeCloseTo(1.5 ** 2, 12);
    expect(a.energy!.fieldMaximumBefore!.peakE_V_per_m / a.energy!.incident!.peakE_V_per_m).toBeCloseTo(
      1.5,
      12,
    );
  });

  it('that enters a window is that of the refracted beam: (1 - R1) I cos/cos inside, within the first layer', () => {
    const a = ask(index(1), index(1), vacuumWave(1e-6), {
      layers: [film(1.5, 0, 5e-3)],
      incidenceAngle_rad: 40 * DEGREE,
      polarization: 'p',
      beam: { kind: 'irradiance', irradiance_W_per_m2: 1000 },
    });
    const inside = Math.asin(Math.sin(40 * DEGREE) / 1.5);
    const T1 = 1 - a.window!.R1;
    const [layer] = a.energy!.layers;
    expect(layer!.enteringIrradiance_W_per_m2).toBeCloseTo(
      (1000 * T1 * Math.cos(40 * DEGREE)) / Math.cos(inside),
      9,
    );
  });
});

describe('layers by parts of a wave', () => {
  it('are meant at the design wave and at the angle of the question', () => {
    const at = (wave: number, more: Parameters<typeof ask>[3] = {}) =>
      ask(index(1), index(1.5), vacuumWave(wave), { layers: [quarter(1.38)], ...more }).layers[0]!
        .thickness_m;
    expect(at(552e-9)).toBeCloseTo(100e-9, 16);
    expect(at(700e-9, { designWave: vacuumWave(552e-9) })).toBeCloseTo(100e-9, 16);
    const oblique = at(552e-9, { incidenceAngle_rad: 45 * DEGREE });
    expect(oblique).toBeCloseTo(552e-9 / (4 * Math.sqrt(1.38 ** 2 - 0.5)), 16);
  });

  it('a half wave is absent', () => {
    const bare = ask(index(1), index(1.52), vacuumWave(5e-7)).interface.R;
    const coated = ask(index(1), index(1.52), vacuumWave(5e-7), { layers: [quarter(2.1, 0.5)] }).interface.R;
    expect(coated).toBeCloseTo(bare, 14);
  });
});

describe('what is refused', () => {
  it('a path that starts in an absorbing medium, with what would be right', () => {
    const refused = tryAsk(index(1.5, 0.1), index(1), vacuumWave(1e-6), { layers: [film(2, 0, 1e-7)] });
    expect(refused).toMatchObject({ refused: true, code: 'lossy-incidence', exit: 3 });
  });

  it('a quarter wave where no wave runs', () => {
    const refused = tryAsk(index(1.5), index(1.5), vacuumWave(1e-6), {
      layers: [quarter(1)],
      incidenceAngle_rad: 60 * DEGREE,
    });
    expect(refused).toMatchObject({ code: 'no-wave-in-layer', exit: 2 });
  });
});

describe('temperature as a tolerance', () => {
  it('moves R by dR/dn dn/dT u(T), with dn/dT as the catalogue has it', () => {
    const silica = named('fused-silica');
    const wave = vacuumWave(633e-9);
    const n = (temperature_K: number) =>
      ask(index(1), silica, wave, { conditions: { temperature_K } }).into.n;
    const slope = (n(303.15) - n(283.15)) / 20;
    const u = 5;
    const a = ask(index(1), silica, wave, { tolerances: { temperature_K: u } });
    const fit = a.into.fit!.accuracy!;
    expect(a.into.n_uncertainty! / Math.hypot(fit, slope * u)).toBeCloseTo(1, 2);
    const dR_dn = (4 * (a.into.n - 1)) / (a.into.n + 1) ** 3;
    expect(a.interface.R_uncertainty! / (dR_dn * Math.hypot(fit, slope * u))).toBeCloseTo(1, 2);
    expect(a.interface.R_uncertaintyFrom).toBe('temperature');
    expect(a.interface.T_uncertaintyFrom).toBe('temperature');
  });

  it('leaves media given by their numbers as they are', () => {
    const a = ask(index(1), index(1.5), vacuumWave(1e-6), { tolerances: { temperature_K: 5 } });
    expect(a.interface.R_uncertainty ?? 0).toBe(0);
    expect(a.cautions.map((c) => c.code)).not.toContain('tolerance-incomplete');
  });
});

describe('a thick coherent etalon within its tolerances', () => {
  it('is sampled: mean and spread are those of the fringes', () => {
    const layers = [film(1.5, 0, 1e-3)];
    const a = ask(index(1), index(1), vacuumWave(1e-6), {
      layers,
      coherenceLength_m: 10,
      tolerances: { wavelength_m: 5e-9 },
    });
    const averaged = ask(index(1), index(1), vacuumWave(1e-6), { layers, coherenceLength_m: 1e-6 });
    expect(a.interface.T_mean).toBeCloseTo(averaged.interface.T!, 2);
    // Airy fringes of F: mean 1/sqrt(1+F), mean square (1 + F/2)/(1 + F)^1.5.
    const F = (4 * 0.04) / 0.96 ** 2;
    const deviation = Math.sqrt((1 + F / 2) / (1 + F) ** 1.5 - 1 / (1 + F));
    expect(a.interface.T_uncertainty! / deviation).toBeCloseTo(1, 1);
    expect(a.interface.T_uncertaintyFrom).toBe('wavelength');
  });
});

describe('many layers', () => {
  it('independent thicknesses give the same spread moved one by one and in sets', () => {
    const pairs = (count: number) =>
      Array.from({ length: count }, () => [quarter(2.3), quarter(1.46)]).flat();
    const at = (count: number) =>
      ask(index(1), index(1.5), vacuumWave(700e-9), {
        layers: pairs(count),
        designWave: vacuumWave(633e-9),
        tolerances: { thickness_m: 1e-10 },
      }).interface;
    // At the edge of the stop band R follows every layer; one pair more than moved singly changes it little.
    const single = at(24);
    const sets = at(25);
    expect(single.R_uncertaintyFrom).toBe('thickness');
    expect(sets.R_uncertainty!).toBeGreaterThan(0);
    expect(Math.log(sets.R_uncertainty! / single.R_uncertainty!)).toBeLessThan(1.5);
  });
});

describe('radiation pressure on a path', () => {
  const c = 299_792_458;
  const pressure = (layers: readonly Layer[], deg: number, into = index(1)) => {
    const a = ask(index(1), into, vacuumWave(1e-6), {
      layers,
      incidenceAngle_rad: deg * DEGREE,
      beam: { kind: 'irradiance', irradiance_W_per_m2: c },
    });
    return { ...a.interface, pressure_Pa: a.energy?.radiationPressure_Pa };
  };

  it('of a body in vacuum is (I/c) cos^2 (1 + R - T), coherent or not', () => {
    for (const layers of [
      [film(1.5, 0, 1e-7)],
      [film(1.5, 1e-4, 5e-3)],
      [quarter(2.1), film(0.2, 3, 2e-8)],
    ]) {
      for (const deg of [0, 40]) {
        const { R, T, pressure_Pa } = pressure(layers, deg);
        expect(pressure_Pa).toBeCloseTo(Math.cos(deg * DEGREE) ** 2 * (1 + R - T!), 13);
      }
    }
  });

  it('of an ideal quarter wave pulls by the whole step of momentum: 1 - n', () => {
    expect(pressure([quarter(Math.sqrt(1.5))], 0, index(1.5)).pressure_Pa).toBeCloseTo(1 - 1.5, 12);
  });
});
