/**
 * How grave the hazard is that a material's handling facts name. `none-on-file` means that nothing is written down, which is
 * no statement about the material.
 */
import type { Material } from '../catalog/types.ts';

export type HazardLevel = 'none-on-file' | 'hazardous' | 'toxic';

const TOXIC: readonly string[] = [
  ...['toxic', 'poison', 'carcino', 'explosive', 'corrosive', 'lead ', 'lead-', 'arsen', 'cadmium', 'selen'],
  ...['tellur', 'thall', 'beryll', 'barium compound', 'mercury'],
];

/** How the facts begin where nothing grave is on file. */
const BENIGN: readonly string[] = ['none known', 'low'];

export function hazardLevel(material: Material): HazardLevel {
  const hazard = material.handling?.hazard?.toLowerCase();
  if (!hazard || BENIGN.some((start) => hazard.startsWith(start))) return 'none-on-file';
  return TOXIC.some((word) => hazard.includes(word)) ? 'toxic' : 'hazardous';
}
