/** Where an absorption coefficient comes from: the fit itself where it gives k, else the nearest measured row. */
import type { MediumAnswer } from '../../answer/answer.ts';
import type { Material } from '../../catalog/types.ts';
import { sourceOf } from './data-findings.ts';
import { type FindingSource, facts } from './finding.ts';
import { length } from './shown-numbers.ts';

export function nearestAbsorption(
  material: Material | null,
  medium: MediumAnswer,
  wavelength_m: number,
): FindingSource {
  const rows = material?.absorption ?? [];
  const um = wavelength_m * 1e6;
  const covered = rows.some((r) => r.wavelength_um <= um) && rows.some((r) => r.wavelength_um >= um);
  if (!covered) return sourceOf(medium);
  const nearest = rows.reduce((best, row) =>
    Math.abs(Math.log(row.wavelength_um / um)) < Math.abs(Math.log(best.wavelength_um / um)) ? row : best,
  );
  return facts(
    `absorption measured at ${length(nearest.wavelength_um * 1e-6)} and around: ${nearest.source}`,
  );
}
