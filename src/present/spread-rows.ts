/** What the uncertainty of R and T comes from most, and their means where they bend too much for an expansion. */
import type { Answer } from '../answer/answer.ts';
import { PER_CENT } from '../units/display-unit.ts';
import { formatQuantity } from '../units/format-quantity.ts';
import { RowList } from './row-list.ts';
import type { PresentStyle, Shown } from './shown.ts';

const THREE = { significant: 3 } as const;

export function spreadRows({ interface: surface }: Answer, style: PresentStyle): readonly Shown[] {
  const rows = new RowList(style);
  const { R_uncertainty, R_uncertaintyFrom, T_uncertainty, T_uncertaintyFrom, R_mean, T_mean } = surface;
  const mean = (x: number): string => formatQuantity(x, PER_CENT, THREE, { style });
  if (R_mean !== null) rows.add('R_mean', 'R mean', 'over the uncertainties', mean(R_mean));
  if (T_mean !== null) rows.add('T_mean', 'T mean', 'over the uncertainties', mean(T_mean));
  const ofR = R_uncertainty ? R_uncertaintyFrom : null;
  const ofT = T_uncertainty ? T_uncertaintyFrom : null;
  if (ofR !== null && (ofT === ofR || ofT === null)) {
    rows.add('R_uncertaintyFrom', 'u(R)', 'input that matters most', ofR);
  } else {
    if (ofR !== null) rows.add('R_uncertaintyFrom', 'u(R)', 'input that matters most to R', ofR);
    if (ofT !== null) rows.add('T_uncertaintyFrom', 'u(T)', 'input that matters most to T', ofT);
  }
  return rows.list;
}
