/**
 * A catalogue material at one wave and under given conditions: which fit answers, the absolute complex index with its
 * derivatives by vacuum wavelength, permeability, accuracy, a second opinion, and everything that must be said about it.
 * Pure; refuses (as data) where the catalogue does not reach the wave and the question does not insist.
 */
import {
  atEdge,
  axesOf,
  chooseFit,
  defaultAxis,
  type FitWave,
  fitWavelength_um,
  inRange,
} from '../catalog/choose-fit.ts';
import type { Axis, Fit, Material } from '../catalog/types.ts';
import { standardAirIndexJet } from '../dispersion/air-index.ts';
import { type Conditions, type IndexJet, JET_LENGTH, K, N } from '../dispersion/evaluator.ts';
import { bindModel, honours } from '../dispersion/registry.ts';
import { applyThermalForm, describesAbsoluteIndex } from '../dispersion/thermal.ts';
import type { ThermalForm } from '../dispersion/thermal-form.ts';
import { type Optics, opticsFromIndex } from '../interface/optics.ts';
import { type Complex, ONE } from '../num/complex.ts';
import { bindAbsorption } from './absorption.ts';
import { toAbsolute } from './air-reference.ts';
import type { CautionNote } from './caution.ts';
import { fitPreference } from './fit-preference.ts';
import { hazardLevel } from './hazard-level.ts';
import { outsideTable } from './outside-table.ts';
import { isPassiveIndex } from './passive-index.ts';
import { lengthText, rangeText } from './range-text.ts';
import { type Refusal, refuse } from './refusal.ts';

export interface SecondOpinion {
  readonly fit: Fit;
  /** Relative to vacuum. */
  readonly n: number;
  readonly difference: number;
}

export interface MediumAtWave {
  readonly material: Material;
  readonly axis: Axis;
  readonly fit: Fit;
  readonly inRange: boolean;
  readonly optics: Optics;
  /** n, k and derivatives relative to vacuum, by vacuum wavelength in um. */
  readonly jet: IndexJet;
  /**
   * n and derivatives of the printed formula itself, in its own reference, taken at the vacuum wavelength: what published
   * group indices and dispersions are computed from. The same as `jet` where the fit is relative to vacuum.
   */
  readonly formulaJet: IndexJet;
  /** Highest derivative that means something, 0 to 3. */
  readonly derivativeOrder: number;
  readonly nPublished: number;
  /** False where the fit is real and no absorption data reach the wave. */
  readonly absorptionKnown: boolean;
  readonly used: Conditions;
  readonly secondOpinion: SecondOpinion | null;
  readonly notes: readonly CautionNote[];
}

const ZERO_CELSIUS_K = 273.15;

export function mediumAtWave(
  material: Material,
  axis: Axis | undefined,
  wave: FitWave,
  conditions: Conditions,
  extrapolate: boolean,
): MediumAtWave | Refusal {
  const theAxis = axis ?? defaultAxis(material, wave);
  if (!theAxis) return noOpticalConstants(material);
  const choice = chooseFit(material, theAxis, wave, (fit) => fitPreference(fit, material, wave, conditions));
  if (!choice) {
    return refuse(
      'no-such-axis',
      2,
      `${material.name} has no axis "${theAxis}"`,
      `choose one of ${axesOf(material).join(', ')}`,
    );
  }
  if (!choice.inRange && !extrapolate) return outsideRange(material, theAxis, wave);

  const { fit } = choice;
  const outside = outsideTable(fit, material, conditions);
  if (outside) return outside;
  const notes: CautionNote[] = [];
  const state = evaluateFit(fit, material, wave, conditions, notes);
  const jet = state.jet;
  if (!Number.isFinite(jet[N]!)) {
    return refuse(
      'no-index-here',
      3,
      `the fit of ${material.name} gives no index at ${lengthText(wave.vacuum_um)}: it runs into a pole`,
      `stay near its range, ${rangeText(fit.range_um)}`,
    );
  }
  if (!choice.inRange && !isPassiveIndex(jet[N]!, jet[K]!)) {
    return refuse(
      'no-index-here',
      3,
      `the fit of ${material.name}, continued to ${lengthText(wave.vacuum_um)}, gives n = ${jet[N]!.toPrecision(3)}, k = ${jet[K]!.toPrecision(3)}, which no medium has`,
      `stay near its range, ${rangeText(fit.range_um)}`,
    );
  }
  let absorptionKnown = state.complexFit;
  if (!absorptionKnown && jet[N]! > 0) {
    absorptionKnown = material.absorption ? bindAbsorption(material.absorption)(wave.vacuum_um, jet) : false;
  }
  const second = secondOpinion(
    choice.others,
    material,
    wave,
    { ...conditions, ...sharedState(state.used) },
    jet[N]!,
  );
  noteFit(notes, material, fit, theAxis, choice.inRange, wave, axis);
  noteAbsorption(notes, material, fit, wave, jet, absorptionKnown);
  noteDisagreement(notes, fit, second, jet[N]!);
  noteHandling(notes, material);
  if (state.derivativeOrder === 0) notes.push({ code: 'no-dispersion', details: {} });
  return {
    material,
    axis: theAxis,
    fit,
    inRange: choice.inRange,
    optics: opticsFromIndex({ re: jet[N]!, im: jet[K]! }, state.mu),
    jet,
    formulaJet: state.formulaJet,
    derivativeOrder: state.derivativeOrder,
    nPublished: state.nPublished,
    absorptionKnown,
    used: state.used,
    secondOpinion: second,
    notes,
  };
}

interface FitState {
  readonly jet: IndexJet;
  readonly formulaJet: IndexJet;
  readonly mu: Complex;
  /** Highest derivative that means something, 0 to 3. */
  readonly derivativeOrder: number;
  readonly nPublished: number;
  /** The fit itself gives k, or is exact. */
  readonly complexFit: boolean;
  readonly used: Conditions;
}

/** Absolute index of one fit at one wave; temperature by the model itself, by the fit's thermal form, or with a note that neither can. */
function evaluateFit(
  fit: Fit,
  material: Material,
  wave: FitWave,
  conditions: Conditions,
  notes: CautionNote[],
): FitState {
  const bound = bindModel(fit.parameters, conditions);
  const L = fitWavelength_um(fit, wave);
  const own = new Float64Array(JET_LENGTH);
  bound.evaluate(L, own);
  const takesTemperature = honours(fit.parameters).includes('temperature_K');
  const asked_K = conditions.temperature_K;
  const fit_K = fit.temperature_C === undefined ? undefined : fit.temperature_C + ZERO_CELSIUS_K;
  let temperature_K = bound.used.temperature_K ?? fit_K;

  const warmTo_K = !takesTemperature && asked_K !== undefined && asked_K !== fit_K ? asked_K : undefined;
  const thermal = warmTo_K === undefined ? undefined : thermalForm(fit, material);
  const warm = (wavelength_um: number, index: IndexJet, absolute: boolean): void => {
    if (warmTo_K !== undefined && thermal && describesAbsoluteIndex(thermal) === absolute) {
      applyThermalForm(thermal, fit_K ?? warmTo_K, warmTo_K, wavelength_um, index);
    }
  };
  warm(L, own, false);
  let nPublished = own[N]!;
  let jet = own;
  let formulaJet = own;
  if (fit.reference === 'air') {
    jet = new Float64Array(JET_LENGTH);
    toAbsolute(own, wave.vacuum_um, standardAirIndexJet(wave.vacuum_um), jet);
    formulaJet = new Float64Array(JET_LENGTH);
    bound.evaluate(wave.vacuum_um, formulaJet);
    warm(wave.vacuum_um, formulaJet, false);
    warm(wave.vacuum_um, formulaJet, true);
  }
  if (warmTo_K !== undefined && thermal) {
    if (describesAbsoluteIndex(thermal)) {
      const before = jet[N]!;
      warm(wave.vacuum_um, jet, true);
      nPublished += jet[N]! - before;
    }
    temperature_K = warmTo_K;
    if (thermal.form === 'constant') {
      notes.push({
        code: 'temperature-first-order',
        details: { dn_dT: thermal.dn_dT_per_K, range: thermal.range },
      });
    }
  } else if (warmTo_K !== undefined && fit.accuracy_n !== 0) {
    const fit_C = fit.temperature_C ?? 'not stated';
    notes.push({ code: 'temperature-not-modelled', details: { asked_C: warmTo_K - ZERO_CELSIUS_K, fit_C } });
  }
  for (const name of ['pressure_Pa', 'humidity', 'co2_ppm', 'salinity_g_per_kg'] as const) {
    const asked = conditions[name];
    if (asked === undefined || bound.used[name] !== undefined) continue;
    const compresses = name === 'pressure_Pa' && material.class === 'liquid';
    if (compresses ? Math.abs(asked - ATMOSPHERE_Pa) > BAROMETER_Pa : isFluidCondition(fit, name)) {
      notes.push({ code: 'condition-not-used', details: { condition: name } });
    }
  }
  const mu = new Float64Array(2);
  if (bound.permeability) bound.permeability(L, mu);
  return {
    jet,
    formulaJet,
    mu: bound.permeability ? { re: mu[0]!, im: mu[1]! } : ONE,
    derivativeOrder: bound.hasDerivative ? bound.derivativeOrder : 0,
    nPublished,
    complexFit: bound.complex,
    used: { ...bound.used, temperature_K },
  };
}

/** The fit's own form, else the single dn/dT among the handling facts. Both need to know the temperature of the fit. */
export function thermalForm(fit: Fit, material: Material): ThermalForm | undefined {
  if (fit.thermal || fit.temperature_C === undefined) return fit.thermal;
  const slope = material.handling?.dn_dT_1e6_per_K;
  return slope === undefined
    ? undefined
    : { form: 'constant', dn_dT_per_K: slope * 1e-6, range: 'near room temperature' };
}

const ATMOSPHERE_Pa = 101_325;
/** Half an atmosphere moves the index of a liquid by some 1e-5, more than weather does by far. */
const BAROMETER_Pa = 50_000;

/** Pressure, humidity and salinity mean something for fluids alone: a solid beside the air they describe needs no remark. */
function isFluidCondition(fit: Fit, name: string): boolean {
  const model = fit.parameters.model;
  if (model === 'gas')
    return name === 'humidity' || name === 'co2_ppm' ? false : name !== 'salinity_g_per_kg';
  if (model === 'moist-air' || model === 'radio-air') return name !== 'salinity_g_per_kg';
  if (model === 'water-relaxation' || model === 'sea-water-optical') return name === 'salinity_g_per_kg';
  return false;
}

/** A second opinion holds for the same state of a fluid: the one the answering fit used. */
function sharedState(used: Conditions): Conditions {
  return Object.fromEntries(
    Object.entries(used).filter(([name, value]) => name !== 'composition' && value !== undefined),
  );
}

function secondOpinion(
  others: readonly Fit[],
  material: Material,
  wave: FitWave,
  conditions: Conditions,
  n: number,
): SecondOpinion | null {
  const fit = others[0];
  if (!fit) return null;
  const other = evaluateFit(fit, material, wave, conditions, []).jet[N]!;
  return Number.isFinite(other) ? { fit, n: other, difference: other - n } : null;
}

function noteFit(
  notes: CautionNote[],
  material: Material,
  fit: Fit,
  axis: Axis,
  reached: boolean,
  wave: FitWave,
  asked: Axis | undefined,
): void {
  if (!reached) {
    notes.push({ code: 'outside-fit-range', details: { range: rangeText(fit.range_um) } });
  } else if (atEdge(fit, wave)) {
    notes.push({ code: 'range-edge', details: { range: rangeText(fit.range_um) } });
  } else if (fit.confirmedRange_um) {
    const l = fitWavelength_um(fit, wave);
    if (l < fit.confirmedRange_um[0] * (1 - 1e-3) || l > fit.confirmedRange_um[1] * (1 + 1e-3)) {
      notes.push({ code: 'outside-confirmed-range', details: { range: rangeText(fit.confirmedRange_um) } });
    }
  }
  if (fit.estimateBetweenBands) notes.push({ code: 'estimate-between-bands', details: {} });
  if (!asked && axis !== 'isotropic') {
    notes.push({
      code: 'axis-assumed',
      details: {
        axis,
        others: axesOf(material)
          .filter((a) => a !== axis)
          .join(', '),
      },
    });
  }
  const exact = fit.accuracy_n === 0;
  if (fit.grade === 'C' && !exact && !fit.estimateBetweenBands)
    notes.push({ code: 'recalled-data', details: {} });
  if (fit.accuracy_n === undefined) notes.push({ code: 'accuracy-not-stated', details: {} });
  if (fit.film) {
    notes.push({
      code: 'film-process',
      details: { process: fit.film.process, ...(fit.film.spread_n ? { spread: fit.film.spread_n } : {}) },
    });
  } else if (material.class === 'thin film')
    notes.push({ code: 'film-process', details: { process: 'not stated' } });
  if (fit.contradictedBy?.length)
    notes.push({ code: 'contradicted', details: { count: fit.contradictedBy.length } });
  if (material.own) notes.push({ code: 'own-entry', details: {} });
}

function noteAbsorption(
  notes: CautionNote[],
  material: Material,
  fit: Fit,
  wave: FitWave,
  jet: IndexJet,
  known: boolean,
): void {
  if (fit.parameters.model === 'constant' && fit.accuracy_n === 0) return;
  const k = jet[K]!;
  const depth_m = k > 0 ? (wave.vacuum_um * 1e-6) / (4 * Math.PI * k) : Number.POSITIVE_INFINITY;
  if (known) {
    if (depth_m < 10e-3 && material.class !== 'metal')
      notes.push({ code: 'absorbs-here', details: { depth_m } });
    return;
  }
  // A gas is told by its fits alone: its bands are lines, not a range.
  if (material.class === 'gas') return;
  const t = material.transparency_um;
  if (t && (wave.vacuum_um < t[0] || wave.vacuum_um > t[1])) {
    notes.push({ code: 'absorbs-here', details: { range: rangeText(t) } });
  } else notes.push({ code: 'absorption-not-known', details: {} });
}

function noteDisagreement(notes: CautionNote[], fit: Fit, second: SecondOpinion | null, n: number): void {
  if (!second) return;
  const own = fit.accuracy_n ?? 1e-3 * n;
  const other = second.fit.accuracy_n ?? 1e-3 * n;
  if (Math.abs(second.difference) > 3 * Math.hypot(own, other)) {
    notes.push({ code: 'sources-disagree', details: { difference: second.difference } });
  }
}

function noteHandling(notes: CautionNote[], material: Material): void {
  const { hygroscopic, hazard } = material.handling ?? {};
  if (hygroscopic && hygroscopic !== 'no')
    notes.push({ code: 'hygroscopic', details: { degree: hygroscopic } });
  const level = hazardLevel(material);
  if (hazard && level !== 'none-on-file')
    notes.push({ code: level === 'toxic' ? 'toxic' : 'hazardous-material', details: { hazard } });
}

function outsideRange(material: Material, axis: Axis, wave: FitWave): Refusal {
  const fits = material.fits.filter((f) => f.axis === axis && !inRange(f, wave));
  const ranges = mergeRanges(fits.map((f) => f.range_um))
    .map(rangeText)
    .join(' and ');
  const which = axis === 'isotropic' ? '' : `, ${axis} axis,`;
  const measured = (material.reflectanceTables?.length ?? 0) > 0;
  return refuse(
    'outside-fit-range',
    3,
    `${material.name}${which} has no data at ${lengthText(wave.vacuum_um)}: its fits cover ${ranges}`,
    measured
      ? `choose a wave inside, add --extrapolate to insist, or read reflectance measured in air with halfspace material ${material.key}`
      : 'choose a wave inside, or add --extrapolate to insist',
  );
}

function mergeRanges(ranges: readonly (readonly [number, number])[]): readonly (readonly [number, number])[] {
  const merged: [number, number][] = [];
  for (const [lo, hi] of [...ranges].sort((a, b) => a[0] - b[0])) {
    const last = merged.at(-1);
    if (last && lo <= last[1]) last[1] = Math.max(last[1], hi);
    else merged.push([lo, hi]);
  }
  return merged;
}

function noOpticalConstants(material: Material): Refusal {
  return refuse(
    'no-optical-constants',
    3,
    `${material.name} has no optical constants in the catalogue, only reflectance measured in air`,
    'read it with `halfspace material`, or state n and k yourself, e.g. n=2.4+3.4i',
  );
}
