/**
 * A question as plain JSON and back, to be found again at the next start. Media are kept by key and axis or by their numbers.
 * Reading never trusts the text: a part that does not hold is named and left out. The wish to extrapolate is not kept: it
 * is meant for one question.
 */
import {
  type Beam,
  type Layer,
  type MediumSpec,
  makeQuestion,
  type Question,
  type Tolerances,
} from '../../answer/question.ts';
import { axesOf } from '../../catalog/choose-fit.ts';
import type { Material } from '../../catalog/types.ts';
import type { Conditions } from '../../dispersion/evaluator.ts';
import { parseWave } from '../../units/parse-wave.ts';
import { isProblem, type Problem, problemText } from '../../units/problem.ts';
import { layersText } from '../fields/layer-field.ts';
import { readLiteral } from '../fields/medium-fields.ts';

type Plain = Readonly<Record<string, unknown>>;
type MaterialOf = (key: string) => Material | undefined;
type ReadLayers = (text: string) => readonly Layer[] | Problem;

export function plainQuestion(question: Question): Plain {
  const { wave, incidenceAngle_rad, polarization, conditions, tolerances, beam } = question;
  return {
    from: plainMedium(question.from),
    into: plainMedium(question.into),
    wave: { text: wave.text, inAir: wave.inAir },
    incidenceAngle_rad,
    polarization,
    conditions,
    tolerances,
    ...(beam ? { beam } : {}),
    ...(question.layers.length > 0 ? { layers: layersText(question.layers) } : {}),
  };
}

function plainMedium(medium: MediumSpec): Plain {
  if (medium.kind === 'literal') return { numbers: medium.text };
  return { key: medium.material.key, ...(medium.axis ? { axis: medium.axis } : {}) };
}

export interface ReadQuestion {
  readonly question: Question;
  readonly problems: readonly string[];
}

/** @param fallback gives every part that is missing or does not hold */
export function readQuestion(
  value: unknown,
  fallback: Question,
  materialOf: MaterialOf,
  readLayers?: ReadLayers,
): ReadQuestion {
  const problems: string[] = [];
  if (!isRecord(value)) return { question: fallback, problems: ['last is no object'] };
  const part = <T>(name: string, read: (v: unknown) => T | undefined, otherwise: T): T => {
    if (value[name] === undefined) return otherwise;
    const found = read(value[name]);
    if (found === undefined) problems.push(`last.${name} is not understood`);
    return found ?? otherwise;
  };
  const question = makeQuestion(
    part('from', (v) => readMedium(v, materialOf), fallback.from),
    part('into', (v) => readMedium(v, materialOf), fallback.into),
    part('wave', (v) => readWave(v, problems), fallback.wave),
    {
      incidenceAngle_rad: part('incidenceAngle_rad', readAngle, fallback.incidenceAngle_rad),
      polarization: part('polarization', readPolarization, fallback.polarization),
      conditions: part('conditions', (v) => readNumbers(v, CONDITION_NAMES) as Conditions | undefined, {}),
      tolerances: part('tolerances', (v) => readNumbers(v, TOLERANCE_NAMES) as Tolerances | undefined, {}),
      beam: part<Beam | undefined>('beam', readBeam, undefined),
      layers: part('layers', (v) => readPath(v, readLayers), []),
    },
  );
  return { question, problems };
}

function readPath(value: unknown, readLayers: ReadLayers | undefined): readonly Layer[] | undefined {
  if (typeof value !== 'string' || !readLayers) return undefined;
  const layers = readLayers(value);
  return isProblem(layers) ? undefined : layers;
}

export function isRecord(value: unknown): value is Plain {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

const CONDITION_NAMES = [
  'temperature_K',
  'pressure_Pa',
  'humidity',
  'co2_ppm',
  'salinity_g_per_kg',
  'composition',
] as const satisfies readonly (keyof Conditions)[];
const TOLERANCE_NAMES = [
  'wavelength_m',
  'angle_rad',
  'index',
  'indexFrom',
  'temperature_K',
  'thickness_m',
] as const satisfies readonly (keyof Tolerances)[];

function readMedium(value: unknown, materialOf: MaterialOf): MediumSpec | undefined {
  if (!isRecord(value)) return undefined;
  if (typeof value['numbers'] === 'string') {
    const literal = readLiteral(value['numbers']);
    return literal === undefined || isProblem(literal) ? undefined : literal;
  }
  const material = typeof value['key'] === 'string' ? materialOf(value['key']) : undefined;
  if (!material) return undefined;
  const axis = axesOf(material).find((a) => a === value['axis']);
  return axis ? { kind: 'catalogue', material, axis } : { kind: 'catalogue', material };
}

function readWave(value: unknown, problems: string[]): Question['wave'] | undefined {
  if (!isRecord(value) || typeof value['text'] !== 'string') return undefined;
  const isLine = /[- ]line$/i.test(value['text']);
  const wave = parseWave(value['text'], { airWavelength: value['inAir'] === true && !isLine });
  if (isProblem(wave)) {
    problems.push(`last.wave: ${problemText(wave)}`);
    return undefined;
  }
  return { wavelength_m: wave.wavelength_m, inAir: wave.inAir, text: wave.text };
}

const isNumber = (value: unknown): value is number => typeof value === 'number' && Number.isFinite(value);
const isPositive = (value: unknown): value is number => isNumber(value) && value > 0;

function readAngle(value: unknown): number | undefined {
  return isNumber(value) && value >= 0 && value < Math.PI / 2 ? value : undefined;
}

function readPolarization(value: unknown): Question['polarization'] | undefined {
  return value === 's' || value === 'p' || value === 'unpolarized' ? value : undefined;
}

/** Known names with numbers that are not negative; undefined where anything else is found. */
function readNumbers(value: unknown, names: readonly string[]): Readonly<Record<string, number>> | undefined {
  if (!isRecord(value)) return undefined;
  const entries = Object.entries(value);
  const isFine = entries.every(([name, v]) => names.includes(name) && isNumber(v) && v >= 0);
  return isFine ? (Object.fromEntries(entries) as Record<string, number>) : undefined;
}

function readBeam(value: unknown): Beam | undefined {
  if (!isRecord(value)) return undefined;
  const { kind, irradiance_W_per_m2, peakE_V_per_m, power_W, diameter_m, profile } = value;
  if (kind === 'irradiance' && isPositive(irradiance_W_per_m2)) return { kind, irradiance_W_per_m2 };
  if (kind === 'field' && isPositive(peakE_V_per_m)) return { kind, peakE_V_per_m };
  if (kind !== 'power' || !isPositive(power_W) || (profile !== 'gaussian' && profile !== 'flat'))
    return undefined;
  if (diameter_m === undefined) return { kind, power_W, profile };
  return isPositive(diameter_m) ? { kind, power_W, profile, diameter_m } : undefined;
}
