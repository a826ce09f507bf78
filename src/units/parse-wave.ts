/**
 * The wave as a person says it: `633nm`, `0.633um`, `10.6µm`, `474THz`, `10GHz`, `1.96eV`, `15800cm-1`, `1/cm`, `d-line`;
 * a space before the unit is fine. A wavelength stays as given, vacuum or air, to the last bit: converting from air is the
 * business of the air model. Frequency, photon energy and wavenumber always mean the vacuum wavelength; spectral lines
 * are named by their wavelength in standard air.
 */
import { orList } from './parse-choice.ts';
import { parseQuantity, type QuantitySpec } from './parse-quantity.ts';
import { isProblem, type Problem, problem } from './problem.ts';
import { quoteInput } from './quote-input.ts';
import { findSpectralLine, lineSpelling, namesLine, SPECTRAL_LINES } from './spectral-lines.ts';
import { KIND_NAMES, type UnitKind } from './unit.ts';
import { wavelengthFromFrequency, wavelengthFromPhotonEnergy, wavelengthFromWavenumber } from './wave.ts';

/** In which of the five ways the wave was given. */
export type WaveKind = 'wavelength' | 'frequency' | 'photon-energy' | 'wavenumber' | 'line';

export interface TypedWave {
  readonly kind: WaveKind;
  /** As given: in vacuum, or in standard air where `inAir`. */
  readonly wavelength_m: number;
  readonly inAir: boolean;
  /** As typed, without outer space. */
  readonly text: string;
  /** Significant digits typed; undefined for a named line. */
  readonly digits?: number;
}

export interface WaveReading {
  /** The wavelength typed is one in standard air. */
  readonly airWavelength?: boolean;
}

/** The waves covered, as wavelengths in metres. */
export const SHORTEST_WAVE_m = 50e-9;
export const LONGEST_WAVE_m = 1e8;

const EXAMPLES = '633nm, 10.6um, 474THz, 1.96eV, 15800cm-1 or d-line';

export const WAVE_KINDS = [
  'length',
  'frequency',
  'photon-energy',
  'wavenumber',
] as const satisfies readonly UnitKind[];

const SPEC = {
  what: 'a wave',
  kinds: WAVE_KINDS,
  examples: EXAMPLES,
  unitNames: 'nm, um, mm, m, angstrom, Hz to PHz, meV, eV, keV and cm-1',
} satisfies QuantitySpec;

export function parseWave(text: string, reading: WaveReading = {}): TypedWave | Problem {
  const trimmed = text.trim();
  const line = findSpectralLine(trimmed);
  if (line)
    return { kind: 'line', wavelength_m: line.airWavelength_m, inAir: true, text: lineSpelling(line) };
  if (namesLine(trimmed) && /[- ]line$/i.test(trimmed)) {
    const names = SPECTRAL_LINES.map((l) => l.symbol).join(' ');
    return problem(
      'unit-unknown',
      `${quoteInput(trimmed)} is no reference line`,
      `lines are ${names}, as in d-line`,
    );
  }
  const air = trimmed.toLowerCase().includes('air') && /^(.*\p{L})[\s(]+air\)?$/iu.exec(trimmed);
  if (air) return problem('unit-unknown', `${quoteInput(trimmed)} is not a wave`, airRemedy(air[1] ?? ''));
  const quantity = parseQuantity(trimmed, SPEC);
  if (isProblem(quantity)) {
    return quantity.code === 'unit-missing' ? { ...quantity, remedy: unitRemedy(trimmed) } : quantity;
  }
  const { value_SI: value, unit } = quantity;
  const kind: WaveKind = unit.kind === 'length' ? 'wavelength' : unit.kind;
  if (reading.airWavelength && kind !== 'wavelength') {
    const message = `${quoteInput(trimmed)} is ${KIND_NAMES[unit.kind]}, which is the same in air and in vacuum`;
    return problem(
      'unit-of-another-kind',
      message,
      'leave --air-wavelength out, or give the wavelength in air',
    );
  }
  const wavelength_m = value > 0 ? vacuumOrAsGiven(kind, value) : Number.NaN;
  if (!(wavelength_m >= SHORTEST_WAVE_m && wavelength_m <= LONGEST_WAVE_m)) {
    const message = `${quoteInput(trimmed)} is out of range: waves from 50 nm to 100000 km are covered`;
    return problem('out-of-range', message, `write for example ${EXAMPLES}`);
  }
  const inAir = reading.airWavelength === true;
  return { kind, wavelength_m, inAir, text: trimmed, digits: quantity.decimal.digits.length };
}

function vacuumOrAsGiven(kind: WaveKind, value_SI: number): number {
  if (kind === 'frequency') return wavelengthFromFrequency(value_SI);
  if (kind === 'photon-energy') return wavelengthFromPhotonEnergy(value_SI);
  return kind === 'wavenumber' ? wavelengthFromWavenumber(value_SI) : value_SI;
}

/** The bare number with each common unit that makes it a wave covered here. */
function unitRemedy(number: string): string {
  const waves = ['nm', 'um', 'mm', 'GHz', 'THz', 'eV', 'cm-1'].map((unit) => number + unit);
  const covered = waves.filter((wave) => number.length <= 24 && !isProblem(parseWave(wave)));
  return covered.length > 0 ? `write ${orList(covered)}` : `write for example ${EXAMPLES}`;
}

function airRemedy(wave: string): string {
  return `write ${quoteInput(wave.trim()).slice(1, -1)} and add --air-wavelength`;
}
