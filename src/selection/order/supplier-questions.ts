/** What to write into the request: what every order needs, and what the findings leave open. */
import type { Answer } from '../../answer/answer.ts';
import type { Beam } from '../../answer/question.ts';
import type { Finding } from './finding.ts';
import { degrees, length } from './shown-numbers.ts';
import { isFilm, type Subject } from './subject.ts';

export function supplierQuestions(
  subjects: readonly Subject[],
  answers: readonly Answer[],
  findings: readonly Finding[],
  beam: Beam | undefined,
): readonly string[] {
  // Of a material that cannot be judged there is nothing to ask yet.
  if (answers.length === 0) return [];
  const raised = (topic: Finding['topic']): boolean =>
    findings.some((f) => f.topic === topic && f.level !== 'fine');
  const waves = answers.map((a) => length(a.wave.vacuumWavelength_m, 6)).join(', ');
  const [answer] = answers;
  const angle = answer?.geometry.incidenceAngle_rad ?? 0;
  const polarization = answer?.geometry.polarization ?? 'unpolarized';
  const place = `${waves}, ${angle === 0 ? 'normal incidence' : `${degrees(angle, 1)} from the normal`}${polarization === 'unpolarized' ? '' : `, ${polarization} polarized`}`;
  const names = [...new Set(subjects.map((s) => s.material?.name ?? 'the material'))].join(', ');
  const coated = answers.some((a) => a.layers.some(isFilm));
  return [
    `${names}: grade of the material, and a measured transmittance of a piece as thick, at ${waves}`,
    ...(raised('data') ? ['the index of the melt or of the batch at the wave, with its uncertainty'] : []),
    ...(raised('coating') || coated
      ? [`coating: greatest reflectance a face at ${place}, greatest absorption, materials of the layers`]
      : []),
    ...(raised('crystal') ? ['orientation of the optic axis to the faces, with its tolerance'] : []),
    ...(raised('fringes') ? ['wedge or parallelism, with its tolerance'] : []),
    'clear aperture, thickness tolerance, flatness in transmission over the aperture, surface imperfections (ISO 10110), chamfer',
    ...(beam
      ? ['damage threshold at the wave, pulse length and area, and how it was measured (ISO 21254)']
      : []),
    ...(raised('temperature') ? ['temperature range in use and in transport'] : []),
    ...(raised('humidity') ? ['packing, protective coating, storage life after opening'] : []),
    ...(raised('hazard') ? ['safety data sheet, and whether scrap and broken parts are taken back'] : []),
    ...(raised('handling') ? ['cleaning that the surface and the coating stand'] : []),
  ];
}
