/** Birefringence, and which orientation to write into the order. */

import type { FitWave } from '../../catalog/choose-fit.ts';
import { axesOf, inRange } from '../../catalog/choose-fit.ts';
import type { Axis } from '../../catalog/types.ts';
import { greatestWalkOff } from '../../stack/uniaxial.ts';
import { quickMedium } from '../quick-medium.ts';
import type { Survey } from '../survey.ts';
import { computed, type Finding, labelOf, practice } from './finding.ts';
import { degrees, number, signed } from './shown-numbers.ts';
import type { Subject } from './subject.ts';

const CRYSTALLINE = /crystal|semiconductor/;

export function crystalFinding(survey: Survey, subject: Subject, at: FitWave): Finding | null {
  const { material, medium, layer, spec } = subject;
  if (!material) return null;
  const base = { topic: 'crystal' as const, about: labelOf(medium) };
  const axes = axesOf(material).filter((axis) => axis !== 'isotropic');
  if (axes.length === 0) {
    const text = CRYSTALLINE.test(material.class)
      ? 'isotropic in its index: no cut to name; where polarization counts, ask for the stress birefringence in nm/cm'
      : 'isotropic; where polarization counts, ask for the stress birefringence in nm/cm';
    return /glass|crystal|semiconductor|ceramic/.test(material.class)
      ? { ...base, level: 'fine', text, source: practice }
      : null;
  }
  const indices = axes.flatMap((axis) => {
    const n = quickMedium(survey, material, axis, at)?.n;
    return n === undefined ? [] : [[axis, n] as const];
  });
  const named = spec.kind === 'catalogue' && spec.axis ? `; computed for the ${spec.axis} axis` : '';
  const missing = axes.filter((axis) => !material.fits.some((fit) => fit.axis === axis && inRange(fit, at)));
  if (indices.length < axes.length || indices.length < 2) {
    const text = `birefringent, but only the ${axes.filter((a) => !missing.includes(a)).join(', ')} axis is on file at this wave: ask for the cut`;
    return { ...base, level: 'look', text: text + named, source: computed('indices of the axes on file') };
  }
  const values = indices.map(([, n]) => n);
  const spread = Math.max(...values) - Math.min(...values);
  const waves = layer ? (spread * layer.answer.thickness_m) / (at.vacuum_um * 1e-6) : null;
  const retards =
    waves === null
      ? ''
      : `, ${number(waves)} waves of retardance through its thickness with the axis in the face`;
  return {
    ...base,
    level: 'look',
    text: `${cutWords(new Map(indices), spread)}${retards}${named}`,
    source: computed('principal indices at this wave'),
  };
}

function cutWords(indices: ReadonlyMap<Axis, number>, spread: number): string {
  const no = indices.get('ordinary');
  const ne = indices.get('extraordinary');
  if (no === undefined || ne === undefined) {
    return `biaxial, indices ${number(spread)} apart: name the faces by the crystal's axes and the polarization along one of them`;
  }
  const { walkOff_rad } = greatestWalkOff(no, ne);
  return `birefringent, n_e - n_o ${signed(ne - no)}: name the cut; with the optic axis along the beam (c-cut) none of it shows at normal incidence, between the axes the beam walks off by up to ${degrees(Math.abs(walkOff_rad))}`;
}
