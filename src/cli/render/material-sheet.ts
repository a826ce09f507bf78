/** What the sheet of a material is made from, in every form. */
import type { ReferenceLine } from '../../answer/reference-lines.ts';
import { AXIS_ORDER } from '../../catalog/choose-fit.ts';
import type { Axis, Fit, Material, Source } from '../../catalog/types.ts';

export interface MaterialSheet {
  readonly material: Material;
  /** Set where only one axis was asked for. */
  readonly axis: Axis | undefined;
  readonly lines: readonly ReferenceLine[];
  readonly sourceOf: (id: string) => Source | undefined;
  /** Coefficients and every row of absorption too. */
  readonly full: boolean;
}

/** By axis, the recommended ones first, each kind by wavelength. */
export function fitsOf({ material, axis }: MaterialSheet): readonly Fit[] {
  const place = (fit: Fit): readonly number[] => [
    AXIS_ORDER.indexOf(fit.axis),
    fit.recommended ? 0 : 1,
    fit.range_um[0],
  ];
  return material.fits
    .filter((fit) => axis === undefined || fit.axis === axis)
    .map((fit) => ({ fit, at: place(fit) }))
    .sort((a, b) => a.at.map((x, i) => x - (b.at[i] ?? 0)).find((d) => d !== 0) ?? 0)
    .map(({ fit }) => fit);
}
