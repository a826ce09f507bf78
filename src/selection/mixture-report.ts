/** Pairs of liquids of which a mixture would have the target's index: an estimate, the least touchy mixtures first. */
import { type MediumSide, mediumSide } from '../answer/medium-side.ts';
import type { FitWave } from '../catalog/choose-fit.ts';
import { isRefusal } from '../medium/refusal.ts';
import type { Candidate } from './candidate.ts';
import { indexSpread } from './index-spread.ts';
import { type MaterialFacts, materialFacts } from './material-facts.ts';
import { mixes } from './miscibility.ts';
import { mixtureIndex, shareFor } from './mixture.ts';
import type { Survey } from './survey.ts';

export interface Constituent {
  readonly facts: MaterialFacts;
  readonly n: number;
  readonly temperature_K: number | null;
  /** By volume before mixing. */
  readonly share: number;
}

export interface Mixture {
  readonly low: Constituent;
  readonly high: Constituent;
  /** Change of n for one hundredth more of the denser one, by volume. */
  readonly dn_perPercent: number;
  /** What the uncertainty of the two indices alone makes of n; the rule itself is worse. */
  readonly n_uncertainty: number;
}

export interface MixtureReport {
  /** At most `SHOWN`. */
  readonly mixtures: readonly Mixture[];
  readonly possible: number;
  /** Pairs that bracket the index but part, or of whose mixing nothing is known. */
  readonly notKnownToMix: number;
  /** True where the target absorbs or is no index a liquid mixture has. */
  readonly outOfReach: boolean;
}

const SHOWN = 8;
/** A target above this k/n is no medium to be matched by a clear liquid. */
const ABSORBING = 1e-3;

export function mixtureReport(
  survey: Survey,
  target: MediumSide,
  candidates: readonly Candidate[],
  at: FitWave,
  temperature_K: number | undefined,
): MixtureReport {
  const { n } = target.optics;
  if (n.im > ABSORBING * n.re) return { mixtures: [], possible: 0, notKnownToMix: 0, outOfReach: true };
  const liquids = candidates
    .filter(({ material }) => material.class === 'liquid')
    .flatMap((candidate) => {
      const { material, axis } = candidate;
      const side = mediumSide(
        { kind: 'catalogue', material, axis },
        at,
        { temperature_K },
        false,
        survey.sourceOf,
      );
      return isRefusal(side) || side.optics.n.im > ABSORBING * side.optics.n.re ? [] : [{ material, side }];
    })
    .sort((a, b) => a.side.optics.n.re - b.side.optics.n.re);
  const mixtures: Mixture[] = [];
  let notKnownToMix = 0;
  for (const low of liquids) {
    for (const high of liquids) {
      const [n1, n2] = [low.side.optics.n.re, high.side.optics.n.re];
      if (!(n1 < n.re && n.re < n2)) continue;
      const share = shareFor(n2, n1, n.re);
      if (share === null) continue;
      if (!mixes(low.material.key, high.material.key)) {
        notKnownToMix++;
        continue;
      }
      mixtures.push({
        low: constituent(low, 1 - share),
        high: constituent(high, share),
        dn_perPercent: slopePerPercent(n2, n1, share),
        n_uncertainty: Math.hypot(
          (1 - share) * indexSpread(low.side.answer),
          share * indexSpread(high.side.answer),
        ),
      });
    }
  }
  mixtures.sort((a, b) => a.dn_perPercent - b.dn_perPercent);
  return {
    mixtures: mixtures.slice(0, SHOWN),
    possible: mixtures.length,
    notKnownToMix,
    outOfReach: false,
  };
}

const constituent = (
  { material, side }: { readonly material: Candidate['material']; readonly side: MediumSide },
  share: number,
): Constituent => ({
  facts: materialFacts(material),
  n: side.optics.n.re,
  temperature_K: side.answer.temperature_K,
  share,
});

/** Central difference over one hundredth, inside 0 to 1. */
function slopePerPercent(n2: number, n1: number, share: number): number {
  const [a, b] = [Math.max(0, share - 0.005), Math.min(1, share + 0.005)];
  return ((mixtureIndex(n2, n1, b) - mixtureIndex(n2, n1, a)) / (b - a)) * 0.01;
}
