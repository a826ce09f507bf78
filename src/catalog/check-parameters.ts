/**
 * Relations between the parameters of a model that their shape cannot state: lists of one length, tables that rise or fall
 * steadily, one way of stating a thing and not two. The parameters must have passed their shape check.
 */
import type {
  CompositionTableParameters,
  MagneticTableParameters,
  ModelParameters,
  OscillatorParameters,
  TableColumn,
  TableParameters,
  WaterRelaxationParameters,
} from '../dispersion/parameters.ts';
import type { Fault } from './check-shape.ts';

export function parameterFaults(p: ModelParameters, path: string): readonly Fault[] {
  switch (p.model) {
    case 'constant':
      return [
        ...exactlyOne(p, ['n', 'permittivity'], path),
        ...(p.k !== undefined && p.lossTangent !== undefined
          ? [fault(`${path}.lossTangent`, 'stands beside k', 'give one of the two')]
          : []),
      ];
    case 'sellmeier':
    case 'parametric-sellmeier':
      return (p.poles ?? []).length + (p.terms ?? []).length > 0 || p.model === 'sellmeier'
        ? []
        : [fault(path, 'has neither poles nor terms', 'give at least one')];
    case 'table':
      return [...tableFaults(p, path)];
    case 'magnetic-table':
      return [...magneticFaults(p, path)];
    case 'composition-table':
      return [...compositionFaults(p, path)];
    case 'oscillators':
      return [...oscillatorFaults(p, path)];
    case 'water-relaxation':
      return [...relaxationFaults(p, path)];
    default:
      return [];
  }
}

const fault = (path: string, message: string, remedy: string): Fault => ({ path, message, remedy });

function exactlyOne(p: object, keys: readonly string[], path: string): readonly Fault[] {
  const given = keys.filter((key) => Object.hasOwn(p, key));
  if (given.length === 1) return [];
  const message = given.length === 0 ? `has none of ${keys.join(', ')}` : `has both ${given.join(' and ')}`;
  return [fault(path, message, `give one of ${keys.join(', ')}`)];
}

/** +1 rising, -1 falling, else the index of the first value out of order. */
function direction(values: readonly number[]): { readonly steady: boolean; readonly at: number } {
  const sign = Math.sign((values[1] ?? 0) - (values[0] ?? 0));
  const at = values.findIndex((v, i) => i > 0 && Math.sign(v - (values[i - 1] ?? v)) !== (sign || 1));
  return { steady: at < 0, at };
}

function* steady(values: readonly number[], path: string): Generator<Fault> {
  const { steady: ok, at } = direction(values);
  if (!ok)
    yield fault(
      `${path}[${at}]`,
      `is ${values[at]} after ${values[at - 1]}`,
      'values must rise steadily or fall steadily',
    );
}

function* rising(values: readonly number[], path: string): Generator<Fault> {
  const at = values.findIndex((v, i) => i > 0 && v <= (values[i - 1] ?? v));
  if (at > 0) yield fault(`${path}[${at}]`, `is ${values[at]} after ${values[at - 1]}`, 'values must rise');
}

function* length(values: readonly unknown[], wanted: number, path: string, like: string): Generator<Fault> {
  if (values.length !== wanted)
    yield fault(path, `has ${values.length} values`, `must have ${wanted}, as ${like} has`);
}

function* tableFaults(p: TableParameters, path: string): Generator<Fault> {
  yield* steady(p.at, `${path}.at`);
  for (const key of ['n', 'k', 'alpha_per_cm'] as const) {
    const column = p[key];
    if (column) yield* columnFaults(column, p.at.length, `${path}.${key}`, key !== 'n');
  }
  if (p.k && p.alpha_per_cm) yield fault(`${path}.alpha_per_cm`, 'stands beside k', 'give one of the two');
  for (const [i, warm] of (p.warmer?.columns ?? []).entries())
    yield* length(warm.n, p.at.length, `${path}.warmer.columns[${i}].n`, '"at"');
}

function* columnFaults(c: TableColumn, count: number, path: string, loss: boolean): Generator<Fault> {
  yield* length(c.values, count, `${path}.values`, '"at"');
  if (c.kind === 'quadratic' && count !== 3)
    yield fault(`${path}.kind`, `is quadratic over ${count} rows`, 'a quadratic column takes exactly 3 rows');
  if (c.kind === 'cubic' && count < 3)
    yield fault(`${path}.kind`, `is cubic over ${count} rows`, 'use linear, or give 3 rows or more');
  if (c.below && c.kind !== 'linear')
    yield fault(
      `${path}.below`,
      `stands in a ${c.kind} column`,
      'only linear columns may change their coordinate',
    );
  const low = c.values.findIndex((v) => (c.of === 'log' || !loss ? v <= 0 : v < 0));
  if (low >= 0)
    yield fault(
      `${path}.values[${low}]`,
      `is ${c.values[low]}`,
      loss && c.of !== 'log'
        ? 'absorption is 0 or more (fields vary as exp(-i w t), so n + ik with k >= 0 absorbs)'
        : 'must be above 0',
    );
}

function* magneticFaults(p: MagneticTableParameters, path: string): Generator<Fault> {
  const { permeability: mu, permittivity: eps } = p;
  yield* rising(mu.f_Hz, `${path}.permeability.f_Hz`);
  yield* length(mu.mu1, mu.f_Hz.length, `${path}.permeability.mu1`, 'f_Hz');
  yield* length(mu.mu2, mu.f_Hz.length, `${path}.permeability.mu2`, 'f_Hz');
  yield* rising(eps.f_Hz, `${path}.permittivity.f_Hz`);
  yield* length(eps.eps1, eps.f_Hz.length, `${path}.permittivity.eps1`, 'f_Hz');
  yield* length(eps.sigma_S_per_m, eps.f_Hz.length, `${path}.permittivity.sigma_S_per_m`, 'f_Hz');
}

function* compositionFaults(p: CompositionTableParameters, path: string): Generator<Fault> {
  yield* rising(p.content_percent, `${path}.content_percent`);
  yield* rising(p.temperatures_C, `${path}.temperatures_C`);
  yield* length(p.n, p.content_percent.length, `${path}.n`, 'content_percent');
  for (const [i, row] of p.n.entries())
    yield* length(row, p.temperatures_C.length, `${path}.n[${i}]`, 'temperatures_C');
}

function* oscillatorFaults(p: OscillatorParameters, path: string): Generator<Fault> {
  if (p.plasma === undefined && (p.drude || p.per === 'plasma'))
    yield fault(`${path}.plasma`, 'is missing', 'add the plasma energy that the strengths refer to');
  if (p.lorentz && p.lorentz.length > 0 && p.per === undefined)
    yield fault(`${path}.per`, 'is missing', 'say whether strengths are "per" plasma or resonance');
}

function* relaxationFaults(p: WaterRelaxationParameters, path: string): Generator<Fault> {
  if (p.form !== 'relaxations') return;
  for (const key of ['b', 'c_s', 'd_C'] as const) yield* length(p[key], p.a.length, `${path}.${key}`, '"a"');
}
