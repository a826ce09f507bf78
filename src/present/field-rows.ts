/** The field through a path, a line a layer: |E|^2 over that of the incident wave at the faces and where it is greatest. */
import type { Answer, FieldPointAnswer } from '../answer/answer.ts';
import { formatNumber } from '../units/format-number.ts';
import { RowList } from './row-list.ts';
import type { PresentStyle, Shown } from './shown.ts';

const THREE = { significant: 3 } as const;
/** More layers are in the machine-readable forms alone. */
const MOST_LAYERS = 24;

export function fieldRows({ stack, layers }: Answer, style: PresentStyle): readonly Shown[] {
  const profile = stack?.fieldProfile;
  if (!profile || layers.length > MOST_LAYERS) return [];
  const rows = new RowList(style);
  const behind = layers.length + 1;
  const names = ['before', ...layers.map((_, i) => `layer ${i + 1}`), 'behind'];
  for (const [layer, name] of names.entries()) {
    const points = profile.filter((p) => p.layer === layer);
    const [first] = points;
    const last = points.at(-1);
    if (!first || !last) continue;
    const value = ({ intensity }: FieldPointAnswer): string => formatNumber(intensity, THREE, style);
    const greatest = points.reduce((a, b) => (b.intensity > a.intensity ? b : a));
    const faces =
      layer === behind ? value(first) : layer === 0 ? value(last) : `${value(first)} to ${value(last)}`;
    rows.add(`field_${layer}`, name, `|E|² at its faces, at most ${value(greatest)}`, faces);
  }
  return rows.list;
}
