/** A medium as it can be typed again: "zinc-selenide", "sapphire:o". */
import type { Axis } from '../catalog/types.ts';

const LETTERS: Readonly<Record<Axis, string>> = {
  isotropic: '',
  ordinary: ':o',
  extraordinary: ':e',
  x: ':x',
  y: ':y',
  z: ':z',
};

export const mediumKey = (key: string, axis: Axis): string => key + LETTERS[axis];
