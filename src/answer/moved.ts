/** A question's media, angle, wave and thicknesses moved off the values given, for the uncertainty of what follows from them. */
import { K, N } from '../dispersion/evaluator.ts';
import { type Optics, opticsFromIndex } from '../interface/optics.ts';
import type { MediumSide } from './medium-side.ts';
import type { PathLayer } from './path.ts';

/** What is added to the inputs. Positions of media run along the path: the first medium, the layers, the last one. */
export interface Offsets {
  readonly n: Float64Array;
  readonly k: Float64Array;
  /** Of each layer. */
  readonly thickness_m: Float64Array;
  wavelength_um: number;
  angle_rad: number;
}

export interface Moved {
  readonly from: Optics;
  readonly into: Optics;
  readonly angle_rad: number;
  /** Shift of the vacuum wavelength, um. */
  readonly shift_um: number;
  readonly layers: readonly { readonly optics: Optics; readonly thickness_m: number }[];
}

export interface Unmoved {
  readonly from: MediumSide;
  readonly layers: readonly PathLayer[];
  readonly into: MediumSide;
  readonly incidenceAngle_rad: number;
}

export function noOffsets(layerCount: number): Offsets {
  return {
    n: new Float64Array(layerCount + 2),
    k: new Float64Array(layerCount + 2),
    thickness_m: new Float64Array(layerCount),
    wavelength_um: 0,
    angle_rad: 0,
  };
}

export function moved({ from, layers, into, incidenceAngle_rad }: Unmoved, offsets: Offsets): Moved {
  const { n, k, thickness_m, wavelength_um } = offsets;
  const optics = (side: MediumSide, i: number): Optics =>
    movedOptics(side, n[i] ?? 0, k[i] ?? 0, wavelength_um);
  return {
    from: optics(from, 0),
    into: optics(into, layers.length + 1),
    // |angle|: a beam tilted past the normal comes from the other side. Grazing is the far limit.
    angle_rad: Math.min(Math.abs(incidenceAngle_rad + offsets.angle_rad), Math.PI / 2 - 1e-9),
    shift_um: wavelength_um,
    layers: layers.map((layer, i) => ({
      optics: optics(layer.side, i + 1),
      thickness_m: Math.max(0, layer.thickness_m + (thickness_m[i] ?? 0)),
    })),
  };
}

/** However far it is moved, this much of n is left. */
const LEAST_SHARE = 1e-6;

/** The medium with its index moved: by offsets of n and k, and along its dispersion by a shift of wavelength. */
export function movedOptics(side: MediumSide, dn: number, dk: number, shift_um: number): Optics {
  if (dn === 0 && dk === 0 && shift_um === 0) return side.optics;
  const { optics, jet } = side;
  const moved = optics.n.re + jet[N + 1]! * shift_um + dn;
  // The uncertainty of a metal may exceed its n; past zero the wave would run backwards and the metal amplify.
  const n = optics.n.re > 0 ? Math.max(LEAST_SHARE * optics.n.re, moved) : moved;
  const k = Math.max(0, optics.n.im + jet[K + 1]! * shift_um + dk);
  return opticsFromIndex({ re: n, im: k }, optics.mu);
}
