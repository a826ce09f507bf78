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
import { type BoundFit, bestFit, bindFit, reaches, type Waves } from './bound-fit.ts';
import { fitPreference } from './fit-preference.ts';
import { type LiteralMedium, literalOptics } from './literal.ts';
import { mediumAtWave } from './optics-at.ts';
import { outsideTable } from './outside-table.ts';
import { isPassiveIndex } from './passive-index.ts';
import { isRefusal, type Refusal } from './refusal.ts';

/** What `indexAt` found. */
export const REFUSED = 0;
export const INSIDE = 1;
/** Answered outside the range of every fit, as the question insisted. */
export const EXTRAPOLATED = 2;
export type Reach = typeof REFUSED | typeof INSIDE | typeof EXTRAPOLATED;

export interface BoundMedium {
  /** Writes n and k of wave `i`, relative to vacuum, into `out[at]` and `out[at + 1]`; nothing useful where it refuses. */
  readonly indexAt: (waves: Waves, i: number, out: Float64Array, at: number) => Reach;
  /** n alone of the first waves, up to `count` or the first it refuses; how many. */
  readonly indexBlock: (waves: Waves, count: number, n: Float64Array) => number;
  /** What `indexAt` would find, but for a pole of the formula at the very wave. */
  readonly reachAt: (waves: Waves, i: number) => Reach;
  /** All that the laws of an interface need; undefined where the question would be refused. */
  readonly opticsAt: (waves: Waves, i: number) => Optics | undefined;
  /** Why `indexAt` refused. */
  readonly refusalAt: (wave: FitWave) => Refusal | undefined;
}

export function bindLiteral(literal: LiteralMedium): BoundMedium {
  const opticsAt = ({ vacuum_um }: Waves, i: number): Optics => literalOptics(literal, vacuum_um[i]! * 1e-6);
  const indexAt: BoundMedium['indexAt'] = (waves, i, out, at) => {
    const { n } = opticsAt(waves, i);
    out[at] = n.re;
    out[at + 1] = n.im;
    return INSIDE;
  };
  return {
    opticsAt,
    indexAt,
    indexBlock(waves, count, n) {
      for (let i = 0; i < count; i++) n[i] = opticsAt(waves, i).n.re;
      return count;
    },
    reachAt: () => INSIDE,
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
    .map((a) => material.fits.filter((fit) => fit.axis === a && !outsideTable(fit, material, conditions)))
    .filter((fits) => fits.length > 0)
    .map((fits) => fits.map((fit) => bindFit(fit, material, conditions)));
  const all = axes.flat();

  /** The axis that is meant when none is named is the first that has a fit at the wave. */
  const inside = (waves: Waves, i: number): BoundFit | undefined => {
    for (let a = 0; a < axes.length; a++) {
      const best = bestFit(axes[a]!, waves, i);
      if (best) return best;
    }
    return undefined;
  };
  const nearest = ({ vacuum_um, air_um }: Waves, i: number): BoundFit | undefined => {
    const first = axes[0]?.[0]?.fit.axis;
    const wave: FitWave = { vacuum_um: vacuum_um[i]!, air_um: air_um[i]! };
    const choice =
      first && chooseFit(material, first, wave, (fit) => fitPreference(fit, material, wave, conditions));
    return choice && all.find((c) => c.fit === choice.fit);
  };

  const mu = new Float64Array(2);
  const index = new Float64Array(2);
  const indexAt: BoundMedium['indexAt'] = (waves, i, out, at) => {
    const within = inside(waves, i);
    const used = within ?? (extrapolate ? nearest(waves, i) : undefined);
    if (!used) return REFUSED;
    used.evaluate(waves, i, out, at);
    if (!Number.isFinite(out[at]!)) return REFUSED;
    if (within) return INSIDE;
    return isPassiveIndex(out[at]!, out[at + 1]!) ? EXTRAPOLATED : REFUSED;
  };
  const [only] = all;
  return {
    indexAt,
    indexBlock(waves, count, n) {
      let answered = 0;
      if (only && all.length === 1) {
        while (answered < count && reaches(only, waves, answered)) answered++;
        only.indexBlock(waves, answered, n);
        for (let i = 0; i < answered; i++) if (!Number.isFinite(n[i]!)) return i;
        if (answered > 0 || !extrapolate) return answered;
      }
      for (; answered < count; answered++) {
        if (indexAt(waves, answered, index, 0) === REFUSED) break;
        n[answered] = index[0]!;
      }
      return answered;
    },
    reachAt(waves, i) {
      for (let f = 0; f < all.length; f++) if (reaches(all[f]!, waves, i)) return INSIDE;
      return extrapolate && axes.length > 0 ? EXTRAPOLATED : REFUSED;
    },
    opticsAt(waves, i) {
      const within = inside(waves, i);
      const used = within ?? (extrapolate ? nearest(waves, i) : undefined);
      if (!used) return undefined;
      used.evaluate(waves, i, index, 0);
      if (!Number.isFinite(index[0]!) || !(within || isPassiveIndex(index[0]!, index[1]!))) return undefined;
      const n = { re: index[0]!, im: index[1]! };
      const { permeability } = used.model();
      if (!permeability) return opticsFromIndex(n, ONE);
      permeability(used.inAir ? waves.air_um[i]! : waves.vacuum_um[i]!, mu);
      return opticsFromIndex(n, { re: mu[0]!, im: mu[1]! });
    },
    refusalAt(wave) {
      const medium = mediumAtWave(material, axis, wave, conditions, extrapolate);
      return isRefusal(medium) ? medium : undefined;
    },
  };
}
