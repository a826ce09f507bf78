/** What a change of temperature does to the wave that has passed, and what heat the beam leaves. */
import type { FitWave } from '../../catalog/choose-fit.ts';
import type { Axis } from '../../catalog/types.ts';
import { thermalSlope } from '../thermal-slope.ts';
import { computed, type Finding, facts, labelOf } from './finding.ts';
import { length, number, perKelvin, watts } from './shown-numbers.ts';
import type { Subject } from './subject.ts';

/** Optics in a room see steps of this size. */
const STEP_K = 10;
/** Past a quarter of a wave an interferometer or a focus notices. */
const NOTICED_waves = 0.25;
const PER_MILLION = 1e-6;

export function temperatureFinding(subject: Subject, at: FitWave, power_W: number | null): Finding | null {
  const { material, medium, layer } = subject;
  if (!material) return null;
  const base = { topic: 'temperature' as const, about: labelOf(medium) };
  const limit = limitWords(material.handling?.['thermalLimit_C'], material.handling?.['thermalLimitReason']);
  const slope = thermalSlope(material, medium.axis as Axis, at);
  if (!slope) {
    return {
      ...base,
      level: 'look',
      text: `no dn/dT on file: ask, if the part warms up${limit}`,
      source: facts(material.factsSource ?? null),
    };
  }
  const text = [
    `dn/dT ${perKelvin(slope.dn_dT_per_K)}${slope.isSingleValue ? ' (one figure for all waves)' : ''}`,
  ];
  let level: Finding['level'] = limit === '' ? 'fine' : 'look';
  const heat_W = layer && power_W !== null ? layer.answer.absorptance * power_W : 0;
  if (layer) {
    const expansion = (material.handling?.expansion_1e6_per_K ?? 0) * PER_MILLION;
    const wavelength_m = at.vacuum_um * 1e-6;
    const waves =
      (layer.answer.thickness_m * STEP_K * (slope.dn_dT_per_K + (medium.n - 1) * expansion)) / wavelength_m;
    text.push(
      `${STEP_K} K change the optical path through ${length(layer.answer.thickness_m)} by ${number(Math.abs(waves), 2)} waves`,
    );
    if (Math.abs(waves) > NOTICED_waves) level = 'look';
    if (heat_W > 0) {
      text.push(`the ${watts(heat_W)} left inside make a thermal lens: mount it so that the heat gets out`);
      if (heat_W > LENS_W) level = 'look';
    }
  }
  return {
    ...base,
    level,
    text: text.join('; ') + limit,
    source: computed(
      slope.isSingleValue
        ? 'dn/dT of the entry; expansion of the entry'
        : 'thermal form of the fit; expansion of the entry',
    ),
  };
}

/** Heat below this is lost in the air. */
const LENS_W = 0.1;

function limitWords(limit_C: unknown, reason: unknown): string {
  if (typeof limit_C !== 'number') return '';
  return `; keep it below ${limit_C} °C${typeof reason === 'string' ? `: ${reason}` : ''}`;
}
