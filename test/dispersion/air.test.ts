import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  airIndexJet,
  airToVacuum_um,
  standardAirIndex,
  standardAirIndexJet,
  vacuumToAir_um,
} from '../../src/dispersion/air-index.ts';
import { type Conditions, JET_LENGTH } from '../../src/dispersion/evaluator.ts';
import type { ModelParameters } from '../../src/dispersion/parameters.ts';
import { bindModel } from '../../src/dispersion/registry.ts';
import { enhancement, saturationPressure_Pa, vapourPressure_Pa } from '../../src/dispersion/water-vapour.ts';
import { evenly } from '../helpers/evenly.ts';

const CIDDOR: ModelParameters = { model: 'moist-air', form: 'ciddor-1996' };
const BIRCH_DOWNS: ModelParameters = {
  model: 'moist-air',
  form: 'edlen',
  dispersion: [8342.54, 2406147, 130, 15998, 38.9],
  density: [96095.43, 0.601, 0.00972, 0.003661],
  water: [3.7345, 0.0401],
  default_K: 288.15,
  default_Pa: 101325,
};

function refractivity(p: ModelParameters, um: number, conditions: Conditions): number {
  const out = new Float64Array(JET_LENGTH);
  bindModel(p, conditions).evaluate(um, out);
  return ((out[0] as number) - 1) * 1e8;
}

/** t in C, p in Pa, humidity or vapour pressure in Pa, CO2 in ppm, 1e8 (n - 1) at 633 nm: P. E. Ciddor, Appl. Opt. 35, 1566 (1996). */
const TABLES_1_AND_3 = [
  [20, 80000, 0, 21458.0],
  [20, 100000, 0, 26824.4],
  [10, 100000, 0, 27774.7],
  [20, 80000, 0.75, 21394.0],
  // The paper prints 19996.5, a misprint shown by its own column of differences.
  [40, 80000, 0.75, 19896.5],
  [40, 120000, 0.75, 29941.8],
  [50, 120000, 1, 28792.4],
] as const;

const TABLE_2 = [
  [19.526, 102094.8, 1065, 510, 27392.9],
  [19.173, 103006.0, 642, 440, 27685.8],
  [19.188, 102918.8, 706, 450, 27658.7],
  [19.189, 102927.8, 708, 440, 27660.8],
  [19.532, 103603.2, 986, 600, 27802.0],
  [19.534, 103599.2, 951, 610, 27802.2],
] as const;

describe('air after Ciddor 1996', () => {
  it.each(TABLES_1_AND_3)(
    'tables 1 and 3: %d C, %d Pa, humidity %d',
    (t, pressure_Pa, humidity, expected) => {
      const got = refractivity(CIDDOR, 0.633, {
        temperature_K: t + 273.15,
        pressure_Pa,
        humidity,
        co2_ppm: 450,
      });
      expect(Math.abs(got - expected)).toBeLessThan(0.1);
    },
  );

  it.each(TABLE_2)(
    'table 2: %d C, %d Pa, vapour %d Pa, %d ppm',
    (t, pressure_Pa, vapour_Pa, co2_ppm, expected) => {
      const temperature_K = t + 273.15;
      // The table states the pressure of the pure vapour.
      const humidity = vapour_Pa / saturationPressure_Pa(temperature_K);
      const got = refractivity(CIDDOR, 0.633, { temperature_K, pressure_Pa, humidity, co2_ppm });
      expect(Math.abs(got - expected)).toBeLessThan(0.1);
    },
  );

  it('agrees with the formula of Birch and Downs to 0.4e-8 in dry air of 10 to 30 C', () => {
    for (const t of [10, 20, 30]) {
      const conditions = { temperature_K: t + 273.15, pressure_Pa: 101325, humidity: 0 };
      const difference =
        refractivity(CIDDOR, 0.633, conditions) - refractivity(BIRCH_DOWNS, 0.633, conditions);
      expect(Math.abs(difference)).toBeLessThan(0.4);
    }
  });

  it('is the model and the plain function alike', () => {
    const conditions = { temperature_K: 300, pressure_Pa: 95000, humidity: 0.4, co2_ppm: 420 };
    const out = new Float64Array(JET_LENGTH);
    bindModel(CIDDOR, conditions).evaluate(0.7, out);
    for (const [i, part] of airIndexJet(0.7, conditions).entries())
      expect(Math.abs(part - (out[i] as number))).toBeLessThan(4e-16);
    expect(airIndexJet(0.7, {})).toEqual(standardAirIndexJet(0.7));
    expect(bindModel(CIDDOR, {}).used).toEqual({
      temperature_K: 288.15,
      pressure_Pa: 101325,
      humidity: 0,
      co2_ppm: 450,
    });
  });
});

describe('other forms of air', () => {
  it('Birch and Downs dispersion at 500 nm: 27897.3e-8 (Morton, ApJS 130, 403 (2000), formula)', () => {
    const dispersion: ModelParameters = {
      model: 'gas',
      form: 'refractivity',
      reference_K: 288.15,
      reference_Pa: 101325,
      A: 8.34254e-5,
      poles: [
        { B: 2.406147e-2, C_per_um2: 130 },
        { B: 1.5998e-4, C_per_um2: 38.9 },
      ],
    };
    expect(Math.abs(refractivity(dispersion, 0.5, {}) - 27897.3)).toBeLessThan(0.06);
    // With its density formula the reference state is not met exactly: 0.2e-8.
    expect(Math.abs(refractivity(BIRCH_DOWNS, 0.5, {}) - 27897.3)).toBeLessThan(0.2);
  });

  it('radio refractivity: 288.15 dry at 0 C (Essen and Froome 1951), 315 at the reference surface (ITU-R P.453), from memory', () => {
    const radio: ModelParameters = {
      model: 'radio-air',
      k1: 77.6,
      k2: 72,
      k3: 3.75e5,
      default_K: 288.15,
      defaultDry_hPa: 1003.3,
      defaultVapour_hPa: 9.97,
    };
    const N = (conditions: Conditions): number => refractivity(radio, 1e4, conditions) / 100;
    expect(Math.abs(N({ temperature_K: 273.15, pressure_Pa: 101325, humidity: 0 }) - 288.15)).toBeLessThan(
      0.3,
    );
    // The stated accuracy of the formula is 0.5 %; N0 is a rounded global mean.
    expect(Math.abs(N({}) - 315)).toBeLessThan(3);
    expect(bindModel(radio, {}).used.humidity).toBeCloseTo(0.58, 2);
  });

  it('vapour pressure: 2339.3 Pa at 20 C, 611.2 Pa at 0 C (Wexler 1976; from memory)', () => {
    expect(saturationPressure_Pa(293.15)).toBeCloseTo(2339.2, -0.5);
    expect(saturationPressure_Pa(273.15)).toBeCloseTo(611.2, -0.5);
    expect(enhancement(293.15, 101325)).toBeCloseTo(1.00403, 4);
    expect(vapourPressure_Pa(293.15, 101325, 0)).toBe(0);
  });
});

/** nm in vacuum and in standard air: Weber (ed.), Handbook of Optical Materials (CRC 2003), sec. 6.3; the table truncates to 1 pm. */
const HELIUM_PAIRS = [
  [546.226, 546.074],
  [577.12, 576.959],
  [579.227, 579.065],
  [644.025, 643.847],
] as const;

/** Angstrom in vacuum and in standard air: SDSS DR7 table of lines (from memory); last printed digit. */
const SDSS_PAIRS = [
  [4862.721, 4861.363, 0.0016],
  [4960.295, 4958.911, 0.0016],
  [5008.239, 5006.843, 0.0016],
  [6564.614, 6562.801, 0.0016],
  [6718.29, 6716.44, 0.007],
] as const;

describe('wavelengths in vacuum and in standard air', () => {
  it.each(HELIUM_PAIRS)('%d nm in vacuum is %d nm in air', (vacuum, air) => {
    expect(Math.abs(vacuumToAir_um(vacuum / 1e3) * 1e3 - air)).toBeLessThan(0.0016);
    expect(Math.abs(airToVacuum_um(air / 1e3) * 1e3 - vacuum)).toBeLessThan(0.0016);
  });

  it.each(SDSS_PAIRS)('%d A in vacuum is %d A in air', (vacuum, air, tolerance) => {
    expect(Math.abs(vacuumToAir_um(vacuum / 1e4) * 1e4 - air)).toBeLessThan(tolerance);
  });

  it('6056.125 A in air is 6057.8019 A in vacuum (worked example of an astronomy library, Ciddor 1996)', () => {
    expect(Math.abs(airToVacuum_um(0.6056125) * 1e4 - 6057.8019)).toBeLessThan(1e-4);
  });

  it('undo each other to machine precision anywhere', () => {
    fc.assert(
      fc.property(evenly(-2, 7), (exponent) => {
        const um = 10 ** exponent;
        expect(Math.abs(airToVacuum_um(vacuumToAir_um(um)) / um - 1)).toBeLessThan(5e-16);
        expect(Math.abs(vacuumToAir_um(airToVacuum_um(um)) / um - 1)).toBeLessThan(5e-16);
      }),
    );
  });
});

describe('standard air outside the range of the formula', () => {
  it('stays finite, above 1 and below 1.0005 from 1 nm to 10 m', () => {
    for (let exponent = -3; exponent <= 7; exponent += 0.01) {
      const [n, ...derivatives] = standardAirIndexJet(10 ** exponent);
      expect(n).toBeGreaterThan(1.00027);
      expect(n).toBeLessThan(1.0005);
      for (const d of derivatives) expect(Number.isFinite(d)).toBe(true);
    }
  });

  it('is constant below 0.185 um and continuous there', () => {
    const edge = standardAirIndex(0.185);
    expect(standardAirIndexJet(0.1)).toEqual([edge, 0, 0, 0]);
    expect(standardAirIndexJet(0.1849999999)[0]).toBe(edge);
    expect(Math.abs(standardAirIndex(0.1850000001) - edge)).toBeLessThan(1e-12);
  });

  it('has the derivatives of its own values', () => {
    for (const um of [0.2, 0.5, 1.5, 10]) {
      const h = um * 1e-3;
      const jet = standardAirIndexJet(um);
      for (const order of [1, 2, 3] as const) {
        const at = (step: number): number => standardAirIndexJet(um + step * h)[order - 1] as number;
        const want = (8 * (at(1) - at(-1)) - (at(2) - at(-2))) / (12 * h);
        expect(Math.abs(jet[order] - want)).toBeLessThan(1e-6 * Math.abs(want) + 1e-15 / h);
      }
    }
  });
});
