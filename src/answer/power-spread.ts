/** The spread of R and T of a question from its uncertain inputs. */
import type { FitWave } from '../catalog/choose-fit.ts';
import { movableInputs, type ThermalSide } from './input-uncertainty.ts';
import { powerOf } from './interface-answer.ts';
import { type Moved, moved, noOffsets } from './moved.ts';
import type { Path } from './path.ts';
import type { Question } from './question.ts';
import type { BothPolarizations } from './surface-power.ts';
import { propagateAll, type Spread } from './uncertainty.ts';

export interface PowerSpread {
  readonly R: Spread | null;
  readonly T: Spread | null;
  /** False where an accuracy that matters is not stated: the spread then guides digits and is no uncertainty. */
  readonly stated: boolean;
}

/** `media`: the first medium, the layers, the last one, each with how it changes with temperature. */
export function powerSpread(
  question: Question,
  wave: FitWave,
  path: Path,
  media: readonly ThermalSide[],
  values: { readonly R: number; readonly T: number | null },
  power: (inputs: Moved) => BothPolarizations,
): PowerSpread {
  const inputs = movableInputs(question, wave, media, path.layers);
  const unmoved = { ...path, incidenceAngle_rad: question.incidenceAngle_rad };
  const at = (shifts: readonly number[]): readonly number[] => {
    const offsets = noOffsets(path.layers.length);
    inputs.forEach((input, i) => {
      const shift = shifts[i] ?? 0;
      if (shift !== 0) input.move(offsets, shift);
    });
    const { R, T } = power(moved(unmoved, offsets));
    return [powerOf(question.polarization, ...R), powerOf(question.polarization, ...T)];
  };
  const [R = null, T = null] = propagateAll([values.R, values.T ?? 0], inputs, at);
  const givenByPerson = Object.keys(question.tolerances).length > 0;
  return {
    R,
    T: values.T === null ? null : T,
    stated: givenByPerson || media.every(({ side }) => side.accuracy !== null),
  };
}
