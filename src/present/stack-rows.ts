/** What belongs to a path of layers: each layer on a line, the whole, the window, the pulse. */
import type { Answer, LayerAnswer, StackAnswer, WindowAnswer } from '../answer/answer.ts';
import { DECIBEL, DEGREE, HERTZ, METRE, PER_CENT, SECOND } from '../units/display-unit.ts';
import { formatNumber } from '../units/format-number.ts';
import { formatQuantity } from '../units/format-quantity.ts';
import { howKnown } from './known.ts';
import type { LayerRun } from './layer-runs.ts';
import { complexIndexText } from './medium-rows.ts';
import { mediumTitle } from './question-line.ts';
import { RowList } from './row-list.ts';
import type { PresentStyle, Shown } from './shown.ts';

/** Thinner than this is a film. */
const FILM_waves = 20;

const FOUR = { significant: 4 } as const;
const THREE = { significant: 3 } as const;
const FS2 = { symbol: 'fs²', power: -30 } as const;
const FS3 = { symbol: 'fs³', power: -45 } as const;

/** "99.6 nm (0.2499 waves), coherent, n 1.3800". */
export function layerText(layer: LayerAnswer, style: PresentStyle): string {
  const parts = [
    formatQuantity(layer.thickness_m, METRE, { significant: 5 }, { style }),
    `${formatNumber(layer.opticalThickness_waves, { significant: 5 }, style)} waves`,
    layer.coherent ? 'coherent' : 'summed as intensities',
    `n ${complexIndexText(layer.medium, howKnown(layer.medium), style)}`,
    ...(layer.absorptance > 0 ? [`absorbs ${percent(layer.absorptance, style)}`] : []),
  ];
  return parts.join(', ');
}

export function layerTitle(layer: LayerAnswer, number: number): string {
  return `${number} ${mediumTitle(layer.medium)}`;
}

/** "1 to 16: 8 times". */
export function runTitle({ first, layers, times }: LayerRun): string {
  return `${first} to ${first + layers.length * times - 1}: ${times} times`;
}

const percent = (x: number | null, style: PresentStyle): string =>
  formatQuantity(x, PER_CENT, x === 0 ? 'shortest' : FOUR, { style });

export function stackRows(answer: Answer, style: PresentStyle): readonly Shown[] {
  const { stack } = answer;
  if (!stack) return [];
  const rows = new RowList(style);
  rows.add('A', 'A', 'absorptance of all layers', percent(stack.A, style));
  rows.add(
    'insertionLoss_dB',
    'insertion',
    'insertion loss',
    formatQuantity(stack.insertionLoss_dB, DECIBEL, { decimals: 3 }, { style }),
  );
  if (stack.R_back !== null)
    rows.add('R_back', 'R back', 'reflectance from the far side', percent(stack.R_back, style));
  delayRows(rows, stack, answer.geometry.polarization === 'p', style);
  if (stack.fieldMaximum) {
    const { intensity, position_m, layer } = stack.fieldMaximum;
    const inside = `layer ${layer}, ${formatQuantity(position_m, METRE, FOUR, { style })} deep`;
    const where =
      position_m === 0 ? 'at the first face' : layer > answer.layers.length ? 'at the last face' : inside;
    rows.add(
      'fieldMaximum',
      '|E|²',
      `highest, ${where}`,
      `${formatNumber(intensity, FOUR, style)} × incident`,
    );
  }
  if (stack.fieldMaximumBefore) {
    const { intensity } = stack.fieldMaximumBefore;
    rows.add(
      'fieldMaximumBefore',
      '|E|² front',
      'standing wave before the path',
      `${formatNumber(intensity, FOUR, style)} × incident`,
    );
  }
  return rows.list;
}

function delayRows(rows: RowList, stack: StackAnswer, p: boolean, style: PresentStyle): void {
  const reflection = p ? stack.reflectionP : stack.reflectionS;
  const transmission = p ? stack.transmissionP : stack.transmissionS;
  const time = (x: number): string => formatQuantity(x, SECOND, THREE, { style });
  const gdd = (x: number): string => formatQuantity(x, FS2, THREE, { style });
  if (reflection)
    rows.add(
      'reflectionDelay',
      'τ_r',
      'group delay, reflected',
      `${time(reflection.groupDelay_s)}, ${gdd(reflection.gdd_s2)}`,
    );
  if (transmission)
    rows.add(
      'transmissionDelay',
      'τ_t',
      'group delay, transmitted',
      `${time(transmission.groupDelay_s)}, ${gdd(transmission.gdd_s2)}`,
    );
}

/** Faces, ghosts and fringes of a plate; a coherent film is no window to a person, though the answer holds the numbers. */
export function windowRows(answer: Answer, style: PresentStyle): readonly Shown[] {
  const { window } = answer;
  if (!window || (answer.layers[0]?.opticalThickness_waves ?? 0) < FILM_waves) return [];
  const rows = new RowList(style);
  const length = (x: number | null): string => formatQuantity(x, METRE, FOUR, { style });
  rows.add(
    'faces',
    'R1, R2',
    'reflectance of the faces',
    `${percent(window.R1, style)}, ${percent(window.R2, style)}`,
  );
  rows.add(
    'internalTransmittance',
    'τ_i',
    'internal transmittance',
    percent(window.internalTransmittance, style),
  );
  rows.add('totalLoss', 'loss', 'total loss', percent(window.totalLoss, style));
  rows.add(
    'windowLoss_dB',
    '',
    'insertion loss',
    formatQuantity(window.insertionLoss_dB, DECIBEL, { decimals: 3 }, { style }),
  );
  rows.add('ghost', 'ghost', 'first ghost behind', percent(window.transmittedBeams[1] ?? null, style));
  rows.add(
    'secondReflection',
    '2nd face',
    'back, second face',
    percent(window.reflectedBeams[1] ?? null, style),
  );
  rows.add('opticalPath_m', 'n d', 'optical path', length(window.opticalPath_m));
  if (window.groupDelay_s !== null)
    rows.add(
      'groupDelay_s',
      'τ',
      'group delay',
      formatQuantity(window.groupDelay_s, SECOND, FOUR, { style }),
    );
  if (window.gdd_s2 !== null)
    rows.add('gdd_s2', 'GDD', 'group-delay dispersion', formatQuantity(window.gdd_s2, FS2, THREE, { style }));
  if (window.tod_s3 !== null)
    rows.add('tod_s3', 'TOD', 'third-order dispersion', formatQuantity(window.tod_s3, FS3, THREE, { style }));
  if (window.lateralDisplacement_m > 0)
    rows.add('lateralDisplacement_m', 'shift', 'lateral displacement', length(window.lateralDisplacement_m));
  etalonRows(rows, window, style);
  return rows.list;
}

function etalonRows(
  rows: RowList,
  { etalon, wedgeGhostSeparation_rad_per_rad: split }: WindowAnswer,
  style: PresentStyle,
): void {
  const range = `${percent(etalon.T_min, style)} to ${percent(etalon.T_max, style)}`;
  rows.add('etalonRange', 'etalon T', 'if the faces interfere', range);
  rows.add(
    'ripple_dB',
    'ripple',
    'fringe contrast',
    formatQuantity(etalon.ripple_dB, DECIBEL, THREE, { style }),
  );
  rows.add('finesse', 'finesse', 'finesse', formatNumber(etalon.finesse, THREE, style));
  rows.add(
    'freeSpectralRange_Hz',
    'FSR',
    'free spectral range',
    formatQuantity(etalon.freeSpectralRange_Hz, HERTZ, FOUR, { style }),
  );
  const perDegree = formatQuantity(split, DEGREE, { decimals: 2 }, { style });
  rows.add('wedge', 'wedge', 'ghost tilt per 1° of wedge', perDegree);
}

export function pulseRows(answer: Answer, style: PresentStyle): readonly Shown[] {
  const { pulse } = answer;
  if (!pulse) return [];
  const rows = new RowList(style);
  const time = (x: number): string => formatQuantity(x, SECOND, FOUR, { style });
  rows.add(
    'durationOut_s',
    'FWHM',
    'gaussian pulse, in and out',
    `${time(pulse.durationIn_s)} → ${time(pulse.durationOut_s)}`,
  );
  rows.add('pulseGdd_s2', 'GDD', 'of the whole path', formatQuantity(pulse.gdd_s2, FS2, THREE, { style }));
  return rows.list;
}
