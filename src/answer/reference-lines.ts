/**
 * A medium at the waves people quote an index for: the lines of optical glass (wavelengths in air), common lasers (in
 * vacuum) and round radio frequencies, as far as a fit reaches. Pure.
 */
import { axesOf } from '../catalog/choose-fit.ts';
import type { Axis, Material } from '../catalog/types.ts';
import { isRefusal } from '../medium/refusal.ts';
import { shiftDecimal } from '../num/shift-decimal.ts';
import { SPEED_OF_LIGHT_m_per_s } from '../units/constants.ts';
import { SPECTRAL_LINES } from '../units/spectral-lines.ts';
import type { MediumAnswer } from './answer.ts';
import { mediumSide, type SourceOf } from './medium-side.ts';
import type { WaveSpec } from './question.ts';
import { bothReferences, waveAnswer } from './wave.ts';

export interface ReferenceLine {
  readonly axis: Axis;
  /** Letter of a line of optical glass; null for all other waves. */
  readonly line: string | null;
  readonly wave: WaveSpec;
  readonly vacuumWavelength_m: number;
  readonly medium: MediumAnswer;
}

interface NamedWave extends WaveSpec {
  readonly line: string | null;
}

const GLASS_LINES = ['i', 'g', 'F', 'd', 'C', 't'];

/** ArF, KrF, HeCd and HeNe, Nd, telecommunication, Er:YAG, HeNe, CO, CO2 lasers; two round ones. */
const LASERS_um = [0.19337, 0.2484, 0.6328, 1.064, 1.55, 2.94, 3.3922, 5, 10.6, 20];
const FREQUENCIES_Hz = [1e12, 100e9, 10e9, 1e9, 1e6];

const WAVES: readonly NamedWave[] = [
  ...SPECTRAL_LINES.filter(({ symbol }) => GLASS_LINES.includes(symbol)).map(
    ({ symbol, airWavelength_m }): NamedWave => ({
      line: symbol,
      wavelength_m: airWavelength_m,
      inAir: true,
      text: `${symbol}-line`,
    }),
  ),
  ...LASERS_um.map(
    (um): NamedWave => ({
      line: null,
      wavelength_m: shiftDecimal(um, -6),
      inAir: false,
      text: `${um}um`,
    }),
  ),
  ...FREQUENCIES_Hz.map(
    (f_Hz): NamedWave => ({
      line: null,
      wavelength_m: SPEED_OF_LIGHT_m_per_s / f_Hz,
      inAir: false,
      text: `${f_Hz}Hz`,
    }),
  ),
].sort((a, b) => a.wavelength_m - b.wavelength_m);

/** By axis, then by wavelength; under the fits' own conditions. Of one axis only where it is given. */
export function referenceLines(
  material: Material,
  sourceOf: SourceOf,
  axis?: Axis,
): readonly ReferenceLine[] {
  const axes = axis === undefined ? axesOf(material) : [axis];
  return axes.flatMap((theAxis) =>
    WAVES.flatMap(({ line, ...wave }): readonly ReferenceLine[] => {
      const both = bothReferences(wave);
      if (isRefusal(both)) return [];
      const side = mediumSide({ kind: 'catalogue', material, axis: theAxis }, both, {}, false, sourceOf);
      if (isRefusal(side)) return [];
      return [
        {
          axis: theAxis,
          line,
          wave,
          vacuumWavelength_m: waveAnswer(both, wave).vacuumWavelength_m,
          medium: side.answer,
        },
      ];
    }),
  );
}
