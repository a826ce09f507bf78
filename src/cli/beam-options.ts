/** Rows of the table of options (options.ts) that state a path of layers and a beam. */
import { choiceParser } from '../units/parse-choice.ts';
import { parseEnergy } from '../units/parse-energy.ts';
import { parseField } from '../units/parse-field.ts';
import { parseIrradiance } from '../units/parse-irradiance.ts';
import { parseLength } from '../units/parse-length.ts';
import { parseLinewidth } from '../units/parse-linewidth.ts';
import { parseNonlinearIndex } from '../units/parse-nonlinear-index.ts';
import { parsePower } from '../units/parse-power.ts';
import { parseRate } from '../units/parse-rate.ts';
import { parseTime } from '../units/parse-time.ts';
import { parseWave } from '../units/parse-wave.ts';
import { choice, flag, type OptionSpec, value } from './option-spec.ts';

const PROFILES = ['gaussian', 'flat'] as const;

export const PATH_OPTION_ROWS = {
  designWave: value({
    name: 'design-wave',
    placeholder: 'WAVE',
    meaning: 'the wave for which qw and hw are meant',
    fallback: 'the WAVE given, the first of several',
    group: 'path',
    parse: (text: string) => parseWave(text),
  }),
  coherenceLength_m: value({
    name: 'coherence',
    placeholder: 'LENGTH',
    meaning: 'coherence length of the light; layers with a round trip over half of it add as intensities',
    fallback: '1000 wavelengths, or that of the pulse',
    group: 'path',
    parse: parseLength,
    excludes: ['linewidth'],
  }),
  linewidth: value({
    name: 'linewidth',
    placeholder: 'WIDTH',
    meaning: 'spectral width instead, such as 0.1nm or 2MHz: the coherence length is lambda^2/width',
    group: 'path',
    parse: parseLinewidth,
    excludes: ['coherence'],
  }),
  fieldProfile: flag({
    name: 'field-profile',
    meaning: 'the field through the layers too, point by point (coherent paths)',
    group: 'path',
  }),
} as const satisfies Readonly<Record<string, OptionSpec>>;

export const BEAM_OPTION_ROWS = {
  power_W: value({
    name: 'power',
    placeholder: 'POWER',
    meaning: 'power of the beam, such as 5mW or 10dBm; the mean one of a pulsed beam',
    group: 'beam',
    parse: parsePower,
    excludes: ['irradiance', 'field'],
  }),
  beamDiameter_m: value({
    name: 'beam',
    placeholder: 'DIAMETER',
    meaning: 'beam diameter: 1/e^2 of the irradiance for a gaussian beam, full width for a flat one',
    group: 'beam',
    parse: parseLength,
    needsOneOf: ['power', 'pulse-energy'],
  }),
  profile: choice({
    name: 'profile',
    choices: PROFILES,
    meaning: 'profile of the beam; the irradiance stated is the one on the axis',
    fallback: 'gaussian',
    group: 'beam',
    parse: choiceParser('a beam profile', PROFILES),
    needs: 'beam',
  }),
  irradiance_W_per_m2: value({
    name: 'irradiance',
    placeholder: 'IRRADIANCE',
    meaning: 'irradiance instead of power and diameter, such as 1kW/m2 or 5W/cm2',
    group: 'beam',
    parse: parseIrradiance,
    excludes: ['power', 'field', 'pulse-energy'],
  }),
  field_V_per_m: value({
    name: 'field',
    placeholder: 'FIELD',
    meaning: 'peak electric field instead of power and diameter, such as 100V/m',
    group: 'beam',
    parse: parseField,
    excludes: ['power', 'irradiance', 'pulse-energy'],
  }),
  pulseDuration_s: value({
    name: 'pulse',
    placeholder: 'DURATION',
    meaning: 'duration of a gaussian pulse (FWHM), such as 100fs or 8ns',
    group: 'beam',
    parse: parseTime,
  }),
  pulseEnergy_J: value({
    name: 'pulse-energy',
    placeholder: 'ENERGY',
    meaning: 'energy of one pulse, such as 1mJ or 3nJ',
    group: 'beam',
    parse: parseEnergy,
    excludes: ['irradiance', 'field'],
  }),
  repetition_Hz: value({
    name: 'repetition',
    placeholder: 'RATE',
    meaning: 'pulses per second, such as 80MHz or 10Hz; with energy or mean power it gives the other',
    group: 'beam',
    parse: parseRate,
    needsOneOf: ['power', 'pulse-energy'],
  }),
  nonlinearIndex: value({
    name: 'nonlinear-index',
    placeholder: 'N2',
    meaning:
      'n2 of the layer for the B-integral, such as 2.7e-20m2/W or 2.7e-16cm2/W; of layer 2 among several: 2=2.7e-20m2/W',
    group: 'beam',
    parse: parseNonlinearIndex,
    needsOneOf: ['power', 'pulse-energy', 'irradiance', 'field'],
  }),
} as const satisfies Readonly<Record<string, OptionSpec>>;
