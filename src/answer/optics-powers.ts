/**
 * The powers of a path of which the media's optics are at hand, and nothing else: for curves, which ask for hundreds of them.
 * The laws are those of the answer: one surface by Fresnel, layers as amplitudes or as intensities.
 */
import type { Optics } from '../interface/optics.ts';
import { complex } from '../num/complex.ts';
import { coherentStack } from '../stack/coherent-stack.ts';
import { mixedStack } from '../stack/mixed-stack.ts';
import { StackRefusal } from '../stack/stack-refusal.ts';
import { surfacePowers } from './powers.ts';

export interface OpticsPath {
  readonly from: Optics;
  readonly layers: readonly OpticsLayer[];
  readonly into: Optics;
  /** Decides over layers that do not say themselves. */
  readonly coherenceLength_m: number;
}

export interface OpticsLayer {
  readonly optics: Optics;
  readonly thickness_m: number;
  readonly coherent?: boolean | undefined;
}

/** Power fractions of both polarizations. */
export interface BothPowers {
  readonly Rs: number;
  readonly Rp: number;
  /** Null where the medium of incidence absorbs too much for them to mean anything. */
  readonly Ts: number | null;
  readonly Tp: number | null;
}

/** The furthest an angle goes: grazing itself is the limit of what comes before it. */
const GRAZING_rad = Math.PI / 2 - 1e-9;

/** Null where the laws have no answer for these media. The weak absorption of the first medium of a path is left out. */
export function opticsPowers(path: OpticsPath, wavelength_m: number, angle_rad: number): BothPowers | null {
  const { from, layers, into, coherenceLength_m } = path;
  if (!(from.n.re > 0)) return null;
  const angle = Math.min(angle_rad, GRAZING_rad);
  if (layers.length === 0) return surfacePowers(from, into, angle, 'unpolarized');
  const layered = {
    incidence: { eps: complex((from.n.re * from.n.re) / from.mu.re), mu: complex(from.mu.re) },
    layers: layers.map(({ optics: { eps, mu }, thickness_m, coherent }) => ({
      eps,
      mu,
      thickness_m,
      coherent,
    })),
    exit: { eps: into.eps, mu: into.mu },
  };
  try {
    const { s, p } = layers.every(({ coherent }) => coherent === true)
      ? coherentStack(layered, wavelength_m, angle)
      : mixedStack(layered, wavelength_m, angle, coherenceLength_m);
    return { Rs: s.R, Rp: p.R, Ts: s.T, Tp: p.T };
  } catch (error) {
    if (error instanceof StackRefusal) return null;
    throw error;
  }
}
