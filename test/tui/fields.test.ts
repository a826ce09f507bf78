import { describe, expect, it } from 'vitest';
import type { Question } from '../../src/answer/question.ts';
import { fieldById } from '../../src/tui/fields/all-fields.ts';
import { type FieldId, stepOnGrid, stepOnLadder, withShownUnit } from '../../src/tui/fields/field.ts';
import { isProblem } from '../../src/units/problem.ts';
import { named } from '../helpers/ask.ts';
import { airToSilica } from './helpers/stage.tsx';

const SCREEN = { ascii: false };

function take(id: FieldId, text: string, question = airToSilica()): Question | string {
  const taken = fieldById(id).take(text, { question, answer: null });
  return isProblem(taken) ? `${taken.message}; ${taken.remedy}` : taken;
}

/** How the field shows what was typed; the refusal where it cannot be read. */
function shown(id: FieldId, text: string, question = airToSilica()): string {
  const taken = take(id, text, question);
  return typeof taken === 'string' ? taken : fieldById(id).show({ question: taken, answer: null }, SCREEN);
}

function stepped(id: FieldId, count: number, question = airToSilica()): string {
  const field = fieldById(id);
  const next = field.step(count, { question, answer: null });
  return next ? field.show({ question: next, answer: null }, SCREEN) : 'no step';
}

const withField = (id: FieldId, text: string, question = airToSilica()): Question => {
  const taken = take(id, text, question);
  if (typeof taken === 'string') throw new Error(taken);
  return taken;
};

describe('typing', () => {
  it.each<[FieldId, string, string]>([
    ['wave', '10.6um', '10.6 µm'],
    ['wave', '474 THz', '474 THz'],
    ['wave', '15800cm-1', '15800 cm⁻¹'],
    ['wave', 'd-line', 'd-line'],
    ['wave', '633', '633 nm'],
    ['angle', '45', '45°'],
    ['angle', '0.5rad', '28.6479°'],
    ['polarization', 'p', 'p polarized'],
    ['polarization', 's-polarized', 's polarized'],
    ['polarization', 'unpolarized', 'unpolarized'],
    ['temperature', '25C', '25 °C'],
    ['temperature', '25', '25 °C'],
    ['temperature', '', 'auto'],
    ['temperature', 'auto', 'auto'],
    ['pressure', '1bar', '100 kPa'],
    ['humidity', '50%', '50 %'],
    ['humidity', '0.5', '50 %'],
    ['co2', '420', '420 × 10⁻⁶'],
    ['tolerance', 'wave=1nm,n=1e-4', 'wave=1nm,n=0.0001'],
    ['tolerance', 'none', 'none'],
    ['beam', '5mW', '5 mW'],
    ['beam', '1kW/m2', '1 kW/m²'],
    ['beam', '100V/m', '100 V/m'],
    ['beam', 'none', 'none'],
    ['from', 'n=1.5+0.1i', 'n=1.5+0.1i'],
  ])('%s takes "%s" as %s', (id, text, expected) => {
    expect(shown(id, text)).toBe(expected);
  });

  it.each<[FieldId, string, RegExp]>([
    ['wave', '633xx', /"xx" is no unit of a wave; units are/],
    ['wave', '20C', /is a temperature, not a wave/],
    ['angle', '95', /no angle of incidence.*from the surface normal/],
    ['angle', '1,5', /did you mean|decimal|point/],
    ['temperature', '-300C', /above absolute zero/],
    ['humidity', '50', /from 0 to 1/],
    ['beam', '5xx', /is no beam; give a power/],
    ['beam', '5', /needs a unit/],
    ['from', 'n=1.5-1i', /gain/],
    ['polarization', 'x', /write unpolarized, s or p/],
  ])('%s refuses "%s" with a remedy', (id, text, message) => {
    expect(shown(id, text)).toMatch(message);
  });

  it('reads a bare wavelength in the unit the field shows', () => {
    expect(shown('wave', '12', withField('wave', '10.6um'))).toBe('12 µm');
    expect(shown('wave', '480', withField('wave', '474THz'))).toBe('480 THz');
  });

  it('keeps a wavelength in air one in air, and forgets that for a frequency', () => {
    const inAir = withField('reference', 'air');
    expect(inAir.wave.inAir).toBe(true);
    expect(withField('wave', '589nm', inAir).wave).toMatchObject({ inAir: true, wavelength_m: 589e-9 });
    expect(withField('wave', '474THz', inAir).wave.inAir).toBe(false);
  });

  it('keeps the width of a beam when its power changes, and drops it for an irradiance', () => {
    const beam = withField('width', '2mm', withField('beam', '1mW'));
    expect(withField('beam', '3mW', beam).beam).toMatchObject({ power_W: 3e-3, diameter_m: 2e-3 });
    expect(withField('beam', '1W/m2', beam).beam).toEqual({ kind: 'irradiance', irradiance_W_per_m2: 1 });
  });
});

describe('stepping', () => {
  it.each<[FieldId, number, string]>([
    ['angle', 1, '1°'],
    ['angle', 10, '10°'],
    ['angle', 0.1, '0.1°'],
    ['angle', -1, '0°'],
    ['wave', 1, '632.9 nm'],
    ['wave', -10, '631.8 nm'],
    ['wave', 0.1, '632.81 nm'],
    ['polarization', 1, 's polarized'],
    ['polarization', -1, 'p polarized'],
    ['reference', 1, 'in air'],
    ['temperature', 1, '21 °C'],
    ['pressure', -1, '101 kPa'],
    ['beam', 1, '1 mW'],
  ])('%s by %d gives %s', (id, count, expected) => {
    expect(stepped(id, count)).toBe(expected);
  });

  it('never reaches grazing incidence', () => {
    expect(stepped('angle', 1, withField('angle', '89.5'))).toBe('89.99°');
  });

  it('goes from any angle to the next whole degree', () => {
    const brewster = withField('angle', '55.54');
    expect(stepped('angle', 1, brewster)).toBe('56°');
    expect(stepped('angle', -1, brewster)).toBe('55°');
  });

  it('steps a named line as the wavelength it stands for', () => {
    expect(stepped('wave', 1, withField('wave', 'd-line'))).toBe('587.57 nm');
  });

  it('turns a crystal through its axes and back', () => {
    const crystal = { ...airToSilica(), into: named('sapphire') };
    const axis = fieldById('into-axis');
    const once = axis.step(1, { question: crystal, answer: null })!;
    const twice = axis.step(1, { question: once, answer: null })!;
    expect(axis.show({ question: once, answer: null }, SCREEN)).toBe('extraordinary');
    expect(axis.show({ question: twice, answer: null }, SCREEN)).toBe('ordinary');
    expect(axis.applies({ question: airToSilica(), answer: null })).toBe(false);
  });
});

it('shows the conditions that a medium of the question takes', () => {
  const applies = (id: FieldId, question: Question) => fieldById(id).applies({ question, answer: null });
  expect(applies('humidity', airToSilica())).toBe(true);
  const dry = { ...airToSilica(), from: named('vacuum') };
  expect(applies('humidity', dry)).toBe(false);
  expect(applies('temperature', dry)).toBe(true);
  expect(applies('width', airToSilica())).toBe(false);
});

it.each([
  [1, 1, 2],
  [2, 1, 5],
  [5, 1, 10],
  [0.001, -1, 0.0005],
  [3, 1, 5],
  [3, -1, 2],
  [1, 0.1, 1.1],
  [1, 3, 10],
])('goes on the ladder 1, 2, 5 from %d by %d to %d', (from, count, to) => {
  expect(stepOnLadder(from, count)).toBeCloseTo(to, 12);
});

it.each([
  [45, 1, 1, 46],
  [45.5, 1, 1, 46],
  [45.5, -1, 1, 45],
  [45, 0.1, 1, 45.1],
  [0.3, -0.1, 1, 0.2],
])('goes on a grid from %d by %d of %d to %d', (from, count, step, to) => {
  expect(stepOnGrid(from, count, step)).toBe(to);
});

it('adds the unit shown to a bare number alone', () => {
  expect(withShownUnit('633', '632.8 nm')).toBe('633 nm');
  expect(withShownUnit(' 1e3 ', '5 mW')).toBe('1e3 mW');
  expect(withShownUnit('633um', '632.8 nm')).toBe('633um');
  expect(withShownUnit('633', 'none')).toBe('633');
});
