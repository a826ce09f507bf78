/**
 * Facts for the hand and for the order form, each with its unit, in the order in which they bite: what harms people, what
 * harms the part, then figures. Facts with no row of their own are shown under the name that the entry gives them.
 */
import type { Material } from '../catalog/types.ts';
import { formatNumber } from '../units/format-number.ts';
import { FACTS } from './handling-facts.ts';
import { RowList } from './row-list.ts';
import type { PresentStyle, Shown } from './shown.ts';

export function handlingRows(material: Material, style: PresentStyle): readonly Shown[] {
  const { handling } = material;
  if (!handling) return [];
  const rows = new RowList(style);
  for (const { label, text, keys } of FACTS) {
    const shown = text(handling, style);
    if (shown !== undefined) rows.add(keys[0] ?? label, '', label, shown);
  }
  const known = new Set(FACTS.flatMap(({ keys }) => keys));
  for (const [key, value] of Object.entries(handling)) {
    if (!known.has(key)) rows.add(key, '', key, otherText(value, style));
  }
  return rows.list;
}

/** Gap, its edge as a wavelength, and where two photons are absorbed. */
export function bandGapText(material: Material, style: PresentStyle): string | undefined {
  const gap = material.bandGap as Readonly<Record<string, unknown>> | undefined;
  if (typeof gap !== 'object' || gap === null) return undefined;
  const part = (key: string, words: (text: string) => string): readonly string[] => {
    const value = gap[key];
    if (typeof value !== 'number') return [];
    return [words(formatNumber(value, 'shortest', style))];
  };
  const kind = typeof gap['kind'] === 'string' ? `, ${gap['kind']}` : '';
  const parts = [
    ...part('energy_eV', (text) => `${text} eV${kind}`),
    ...part('edge_um', (text) => `edge at ${text} µm`),
    ...part('twoPhotonBelow_um', (text) => `two-photon absorption below ${text} µm`),
  ];
  return parts.length === 0 ? undefined : parts.join('; ');
}

function otherText(value: unknown, style: PresentStyle): string {
  if (typeof value === 'number') return formatNumber(value, 'shortest', style);
  return typeof value === 'string' ? value : JSON.stringify(value);
}
