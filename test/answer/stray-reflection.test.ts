import { describe, expect, it } from 'vitest';
import type { Beam } from '../../src/answer/question.ts';
import { ask, index, vacuumWave } from '../helpers/ask.ts';

const strayText = (beam: Beam): string | undefined =>
  ask(index(1), index(1.5), vacuumWave(633e-9), { beam }).cautions.find(
    ({ code }) => code === 'stray-reflection',
  )?.text;

/** A surface of n = 1.5 reflects 4 % (Hecht, Optics, 4.6.3). */
describe('the power of a stray reflection is told in a unit that reads well', () => {
  it.each<[Beam, string]>([
    [{ kind: 'power', power_W: 1e-3, profile: 'gaussian' }, '40 uW'],
    [{ kind: 'power', power_W: 25e-6, profile: 'gaussian' }, '1.0 uW'],
    [{ kind: 'power', power_W: 3e-7, profile: 'gaussian' }, '12 nW'],
    [{ kind: 'power', power_W: 5, profile: 'gaussian' }, '0.20 W'],
    [{ kind: 'power', power_W: 5e4, profile: 'gaussian' }, '2.0 kW'],
    [{ kind: 'irradiance', irradiance_W_per_m2: 1e3 }, '40 W/m2'],
    [{ kind: 'pulse', pulse: { energy_J: 2e-3, duration_s: 1e-8 }, profile: 'gaussian' }, '80 uJ per pulse'],
  ])('%j: %s', (beam, power) => {
    expect(strayText(beam)).toBe(
      `stray reflection: treat ${power} at 0.0 deg from the normal as part of the beam: block or dump it`,
    );
  });
});
