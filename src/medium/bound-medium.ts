/**
 * A medium fixed to its conditions, for many waves in turn: the index alone, without cautions, second opinions and sources.
 *
 * The same fit answers as in `optics-at.ts`, and n and k are bit for bit the numbers it gives: the models are evaluated in the
 * same way and combined in the same order. Choosing and evaluating costs no allocation. Where the question would be refused
 * `indexAt` says so and `refusalAt` gives the words.
 */
import { AXIS_ORDER, chooseFit, type FitWave } from '../catalog/choose-fit.ts';
import type { Axis, Material } from '../catalog/types.ts';
import type { Conditions } from '../dispersion/evaluator.ts';
import { type Optics, opticsFromIndex } from '../interface/optics.ts';
import { ONE } from '../num/complex.ts';
import { type BoundFit, bestFit, bindFit, reaches } from './bound-fit.ts';
import { fitPreference } from './fit-preference.ts';
import { type LiteralMedium, literalOptics } from './literal.ts';
import { mediumAtWave } from './optics-at.ts';
import { isPassiveIndex } from './passive-index.ts';
import { isRefusal, type Refusal } from './refusal.ts';

/** What `indexAt` found. */
export const REFUSED = 0;
export const INSIDE = 1;
/** Answered outside the range of every fit, as the question insisted. */
export const EXTRAPOLATED = 2;
export type Reach = typeof REFUSED | typeof INSIDE | typeof EXTRAPOLATED;

export interface BoundMedium {
  /** Writes n and k relative to vacuum into `out[at]` and `out[at + 1]`; nothing useful where it refuses. */
  readonly indexAt: (vacuum_um: number, air_um: number, out: Float64Array, at: number) => Reach;
  /** What `indexAt` would find, but for a pole of the formula at the very wave. */
  readonly reachAt: (vacuum_um: number, air_um: number) => Reach;
  /** All that the laws of an interface need; undefined where the question would be refused. */
  readonly opticsAt: (vacuum_um: number, air_um: number) => Optics | undefined;
  /** Why `indexAt` refused. */
  readonly refusalAt: (wave: FitWave) => Refusal | undefined;
}

export function bindLiteral(literal: LiteralMedium): BoundMedium {
  const opticsAt = (vacuum_um: number): Optics => literalOptics(literal, vacuum_um * 1e-6);
  return {
    opticsAt,
    reachAt: () => INSIDE,
    indexAt(vacuum_um, _air_um, out, at) {
      const { n } = opticsAt(vacuum_um);
      out[at] = n.re;
      out[at + 1] = n.im;
      return INSIDE;
    },
    refusalAt: () => undefined,
  };
}

export function bindMaterial(
  material: Material,
  axis: Axis | undefined,
  conditions: Conditions,
  extrapolate: boolean,
): BoundMedium {
  const axes = (axis ? [axis] : AXIS_ORDER)
    .map((a) => material.fits.filter((fit) => fit.axis === a))
    .filter((fits) => fits.length > 0)
    .map((fits) => fits.map((fit) => bindFit(fit, material, conditions)));
  const all = axes.flat();

  /** The axis that is meant when none is named is the first that has a fit at the wave. */
  const choose = (vacuum_um: number, air_um: number): BoundFit | undefined => {
    for (const fits of axes) {
      const best = bestFit(fits, vacuum_um, air_um);
      if (best) return best;
    }
    return undefined;
  };
  const nearest = (wave: FitWave): BoundFit | undefined => {
    const first = axes[0]?.[0]?.fit.axis;
    const choice =
      first && chooseFit(material, first, wave, (fit) => fitPreference(fit, material, wave, conditions));
    return choice && all.find((c) => c.fit === choice.fit);
  };
  const mu = new Float64Array(2);
  const index = new Float64Array(2);
  return {
    indexAt(vacuum_um, air_um, out, at) {
      const inside = choose(vacuum_um, air_um);
      const used = inside ?? (extrapolate ? nearest({ vacuum_um, air_um }) : undefined);
      if (!used) return REFUSED;
      used.evaluate(vacuum_um, air_um, out, at);
      if (!Number.isFinite(out[at]!)) return REFUSED;
      if (inside) return INSIDE;
      return isPassiveIndex(out[at]!, out[at + 1]!) ? EXTRAPOLATED : REFUSED;
    },
    reachAt(vacuum_um, air_um) {
      if (axes.some((fits) => fits.some((fit) => reaches(fit, vacuum_um, air_um)))) return INSIDE;
      return extrapolate && axes.length > 0 ? EXTRAPOLATED : REFUSED;
    },
    opticsAt(vacuum_um, air_um) {
      const inside = choose(vacuum_um, air_um);
      const used = inside ?? (extrapolate ? nearest({ vacuum_um, air_um }) : undefined);
      if (!used) return undefined;
      used.evaluate(vacuum_um, air_um, index, 0);
      if (!Number.isFinite(index[0]!) || !(inside || isPassiveIndex(index[0]!, index[1]!))) return undefined;
      const n = { re: index[0]!, im: index[1]! };
      const { permeability } = used.model();
      if (!permeability) return opticsFromIndex(n, ONE);
      permeability(used.inAir ? air_um : vacuum_um, mu);
      return opticsFromIndex(n, { re: mu[0]!, im: mu[1]! });
    },
    refusalAt(wave) {
      const medium = mediumAtWave(material, axis, wave, conditions, extrapolate);
      return isRefusal(medium) ? medium : undefined;
    },
  };
}
