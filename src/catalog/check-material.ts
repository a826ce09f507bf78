/**
 * What a shape cannot say about an entry: that lists belong together, that ranges have a width, that sources exist and
 * that each fit can be evaluated over its range. The entry must have passed its shape check.
 */
import { JET_LENGTH, K, N } from '../dispersion/evaluator.ts';
import { bindModel } from '../dispersion/registry.ts';
import { parameterFaults } from './check-parameters.ts';
import type { Fault } from './check-shape.ts';
import { QUANTITIES, STATES } from './fit-optics.ts';
import type { Fit, Material } from './types.ts';

/** @param hasSource whether the bibliography has an item of this id. */
export function checkMaterial(material: Material, hasSource: (id: string) => boolean): readonly Fault[] {
  return [...materialFaults(material, hasSource)];
}

function* materialFaults(material: Material, hasSource: (id: string) => boolean): Generator<Fault> {
  if (material.fits.length === 0 && (material.reflectanceTables ?? []).length === 0)
    yield { path: 'fits', message: 'is empty', remedy: 'give at least one fit' };
  yield* rangeFaults(material.transparency_um, 'transparency_um');
  const seen = new Set<string>();
  for (const [i, fit] of material.fits.entries()) {
    const path = `fits[${i}]`;
    const id = `${fit.axis}/${fit.id}`;
    if (seen.has(id))
      yield {
        path: `${path}.id`,
        message: `"${fit.id}" is used twice for the axis ${fit.axis}`,
        remedy: 'choose another',
      };
    seen.add(id);
    for (const [place, id] of sourcesOf(fit))
      if (!hasSource(id))
        yield {
          path: `${path}.${place}`,
          message: `"${id}" is not in the bibliography`,
          remedy: 'add the item or correct the id',
        };
    yield* rangeFaults(fit.range_um, `${path}.range_um`);
    yield* rangeFaults(fit.confirmedRange_um, `${path}.confirmedRange_um`);
    yield* rangeFaults(fit.recommendedRange_um, `${path}.recommendedRange_um`);
    yield* checkRowFaults(fit, path);
    yield* thermalFaults(fit, path);
    const inner = parameterFaults(fit.parameters, `${path}.parameters`);
    yield* inner;
    if (inner.length === 0) yield* evaluationFaults(fit, path);
  }
}

const sourcesOf = (fit: Fit): readonly (readonly [string, string])[] => [
  ['source', fit.source],
  ...(fit.furtherSources ?? []).map((id, i) => [`furtherSources[${i}]`, id] as const),
];

function* rangeFaults(range: readonly [number, number] | undefined, path: string): Generator<Fault> {
  if (range && range[0] > range[1])
    yield {
      path,
      message: `runs from ${range[0]} down to ${range[1]}`,
      remedy: 'state the shorter wavelength first',
    };
}

function* checkRowFaults(fit: Fit, path: string): Generator<Fault> {
  for (const [g, group] of fit.checks.entries()) {
    for (const [c, name] of group.columns.entries()) {
      const known = Object.hasOwn(QUANTITIES, name.replace(/^tolerance_/, '')) || STATES.has(name);
      if (!known && name !== 'wavelength_um')
        yield {
          path: `${path}.checks[${g}].columns[${c}]`,
          message: `is "${name}", which cannot be recomputed`,
          remedy: `known are wavelength_um, ${Object.keys(QUANTITIES).join(', ')}, each with its tolerance_, and states`,
        };
    }
    for (const [r, row] of group.rows.entries())
      if (row.length !== group.columns.length)
        yield {
          path: `${path}.checks[${g}].rows[${r}]`,
          message: `has ${row.length} values`,
          remedy: `must have ${group.columns.length}, one a column`,
        };
  }
}

function* thermalFaults(fit: Fit, path: string): Generator<Fault> {
  const t = fit.thermal;
  if (t?.form === 'wavelength-polynomial' && t.g.length !== t.exponents.length)
    yield {
      path: `${path}.thermal.exponents`,
      message: `has ${t.exponents.length} values`,
      remedy: `must have ${t.g.length}, as g has`,
    };
}

/** Evaluates the fit at both ends of its range and in its middle: n must be a positive number there, k not negative. */
function* evaluationFaults(fit: Fit, path: string): Generator<Fault> {
  const [lo, hi] = fit.range_um;
  const jet = new Float64Array(JET_LENGTH);
  try {
    const bound = bindModel(fit.parameters, {});
    for (const wavelength_um of [lo, Math.sqrt(lo * hi), hi]) {
      bound.evaluate(wavelength_um, jet);
      const n = jet[N] ?? Number.NaN;
      const k = jet[K] ?? Number.NaN;
      if (n > 0 && Number.isFinite(n) && k >= 0 && Number.isFinite(k)) continue;
      const got = Number.isFinite(n) && Number.isFinite(k) ? `n = ${n}, k = ${k}` : 'no index';
      yield {
        path: `${path}.parameters`,
        message: `gives ${got} at ${Number(wavelength_um.toPrecision(6))} um`,
        remedy: 'check coefficients, units and signs, or narrow range_um',
      };
      return;
    }
  } catch (error) {
    yield {
      path: `${path}.parameters`,
      message: `cannot be evaluated (${error instanceof Error ? error.message : String(error)})`,
      remedy: 'check the coefficients against the description of the model',
    };
  }
}
