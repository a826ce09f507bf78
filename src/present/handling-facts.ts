/** The facts of handling that have a row of their own: which keys of the entry they take up and how they read. */
import type { Handling } from '../catalog/types.ts';
import { formatNumber } from '../units/format-number.ts';
import type { PresentStyle } from './shown.ts';

type Text = (handling: Handling, style: PresentStyle) => string | undefined;

interface Fact {
  readonly label: string;
  readonly text: Text;
  /** Keys that the text takes up. */
  readonly keys: readonly string[];
}

const words =
  (key: string): Text =>
  (handling) => {
    const value = handling[key];
    return typeof value === 'string' ? value : undefined;
  };

const figure =
  (key: string, unit: string): Text =>
  (handling, style) => {
    const value = handling[key];
    if (typeof value !== 'number') return undefined;
    const text = formatNumber(value, 'shortest', style);
    return unit === '' ? text : `${text} ${unit}`;
  };

/** Multiples of 1e-6 per kelvin: "7.1 × 10⁻⁶ /K". */
const perKelvin = (value: unknown, style: PresentStyle): string | undefined => {
  if (typeof value !== 'number') return undefined;
  const factor = style.ascii ? 'e-6' : ' × 10⁻⁶';
  return `${formatNumber(value, 'shortest', style)}${factor} /K`;
};

const fact = (label: string, key: string, unit: string): Fact => ({
  label,
  text: figure(key, unit),
  keys: [key],
});

const EXPANSION_AXES: readonly (readonly [key: string, axis: string])[] = [
  ['expansionParallel_1e6_per_K', 'along the axis'],
  ['expansionPerpendicular_1e6_per_K', 'across it'],
  ['expansionX_1e6_per_K', 'along x'],
  ['expansionY_1e6_per_K', 'along y'],
  ['expansionZ_1e6_per_K', 'along z'],
];

const expansionText: Text = (h, style) => {
  const one = perKelvin(h['expansion_1e6_per_K'], style);
  const range = h['expansionRange_C'];
  const conditions = typeof range === 'string' ? ` (${range} °C)` : '';
  const spread = perKelvin(h['expansionTolerance_1e6_per_K'], style);
  const parts = [
    ...(one === undefined ? [] : [`${one}${spread === undefined ? '' : ` within ${spread}`}${conditions}`]),
    ...EXPANSION_AXES.flatMap(([key, axis]) => {
      const text = perKelvin(h[key], style);
      return text === undefined ? [] : [`${text} ${axis}`];
    }),
  ];
  return parts.length === 0 ? undefined : parts.join('; ');
};

const slopeText: Text = (h, style) => {
  const one = perKelvin(h['dn_dT_1e6_per_K'], style);
  const other = perKelvin(h['dn_dTExtraordinary_1e6_per_K'], style);
  if (one === undefined && other === undefined) return undefined;
  const at = h['dn_dTAt_um'];
  const kind = h['dn_dTKind'];
  const conditions = [
    ...(typeof at === 'number' ? [`at ${formatNumber(at, 'shortest', style)} µm`] : []),
    ...(typeof kind === 'string' ? [kind] : []),
  ];
  const values = [one, ...(other === undefined ? [] : [`${other} extraordinary`])].filter(
    (t) => t !== undefined,
  );
  return [values.join('; '), ...conditions].join(', ');
};

const meltingText: Text = (h, style) => {
  const note = h['meltingNote'];
  const parts = [figure('melting_C', '°C')(h, style), typeof note === 'string' ? note : undefined];
  const known = parts.filter((t) => t !== undefined);
  return known.length === 0 ? undefined : known.join(', ');
};

/** Classes that glass makers print, named by the last letters of their key: `acid_SR`. */
const classesText: Text = (h) => {
  const classes = h['resistanceClasses'];
  if (typeof classes !== 'object' || classes === null) return undefined;
  return Object.entries(classes)
    .map(([key, value]) => {
      const [name = key, letters] = key.split('_');
      return `${name}${letters === undefined ? '' : ` ${letters}`} ${String(value)}`;
    })
    .join(', ');
};

/** In the order in which they bite: what harms people, what harms the part, then figures. */
export const FACTS: readonly Fact[] = [
  { label: 'hazard', text: words('hazard'), keys: ['hazard'] },
  { label: 'humidity', text: (h) => humidityText(h), keys: ['hygroscopic'] },
  { label: 'care', text: words('care'), keys: ['care'] },
  fact('solubility', 'solubility_g_per_100g', 'g in 100 g of water'),
  { label: 'resistance', text: classesText, keys: ['resistanceClasses'] },
  fact('density', 'density_g_per_cm3', 'g/cm³'),
  fact('hardness, Knoop', 'knoop', ''),
  fact('hardness, Mohs', 'mohs', ''),
  fact("Young's modulus", 'youngsModulus_GPa', 'GPa'),
  {
    label: 'expansion',
    text: expansionText,
    keys: [
      'expansion_1e6_per_K',
      'expansionRange_C',
      'expansionTolerance_1e6_per_K',
      ...EXPANSION_AXES.map(([key]) => key),
    ],
  },
  {
    label: 'expansion, volume',
    text: (h, style) => perKelvin(h['volumeExpansion_1e6_per_K'], style),
    keys: ['volumeExpansion_1e6_per_K'],
  },
  {
    label: 'dn/dT',
    text: slopeText,
    keys: ['dn_dT_1e6_per_K', 'dn_dTExtraordinary_1e6_per_K', 'dn_dTAt_um', 'dn_dTKind'],
  },
  { label: 'melts at', text: meltingText, keys: ['melting_C', 'meltingNote'] },
  fact('boils at', 'boiling_C', '°C'),
  fact('softens at', 'softening_C', '°C'),
  fact('glass transition', 'glassTransition_C', '°C'),
  fact('decomposes at', 'decomposes_C', '°C'),
  fact('changes phase at', 'transition_C', '°C'),
  {
    label: 'keep below',
    text: (h, style) => {
      const limit = figure('thermalLimit_C', '°C')(h, style);
      const reason = h['thermalLimitReason'];
      return limit === undefined || typeof reason !== 'string' ? limit : `${limit}: ${reason}`;
    },
    keys: ['thermalLimit_C', 'thermalLimitReason'],
  },
];

/** The entries say "no", "slightly", "yes" or more. */
function humidityText(handling: Handling): string | undefined {
  switch (handling.hygroscopic) {
    case 'no':
      return 'not hygroscopic';
    case 'yes':
      return 'hygroscopic';
    case 'slightly':
      return 'slightly hygroscopic';
    default:
      return handling.hygroscopic;
  }
}
