/** The measured absorption beside a material's real fits: what is covered, and every row on request. */
import type { AbsorptionRow, Material } from '../catalog/types.ts';
import { formatNumber } from '../units/format-number.ts';
import { lengthAt, lengthRange } from './length-text.ts';
import type { PresentStyle } from './shown.ts';

/** "21 measured values, 0.3 µm to 2.5 µm"; undefined where there are none. */
export function absorptionCoverage(material: Material, style: PresentStyle): string | undefined {
  const rows = material.absorption ?? [];
  if (rows.length === 0) return undefined;
  const at = rows.map((row) => row.wavelength_um);
  const range = lengthRange([Math.min(...at), Math.max(...at)], style);
  return rows.length === 1 ? `one measured value, at ${range}` : `${rows.length} measured values, ${range}`;
}

export interface AbsorptionText {
  readonly wavelength: string;
  readonly value: string;
  readonly source: string;
  readonly note: string | undefined;
}

export function absorptionTexts(material: Material, style: PresentStyle): readonly AbsorptionText[] {
  return (material.absorption ?? []).map((row) => ({
    wavelength: lengthAt(row.wavelength_um, style),
    value: valueText(row, style),
    source: row.source,
    note: row.note,
  }));
}

function valueText(row: AbsorptionRow, style: PresentStyle): string {
  const number = (x: number): string => formatNumber(x, 'shortest', style);
  if (row.k !== undefined) return `k ${number(row.k)}`;
  if (row.alpha_per_cm !== undefined) return `α ${number(row.alpha_per_cm)} cm⁻¹`;
  const over = row.thickness_mm === undefined ? '' : ` over ${number(row.thickness_mm)} mm`;
  return row.internalTransmittance === undefined
    ? ''
    : `internal transmittance ${number(row.internalTransmittance)}${over}`;
}
