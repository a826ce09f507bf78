/** Coatings for one pair of media: the question of `coat`, answered. Pure; the films at hand come with the question. */
import { LOSSY_INCIDENCE } from '../interface/special-angles.ts';
import { surfaceWave } from '../interface/surface-wave.ts';
import type { CautionNote } from '../medium/caution.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { orderCautions, wordCaution } from './caution-text.ts';
import { mirrorDesign } from './coating-mirror.ts';
import { twoLayerDesigns } from './coating-pairs.ts';
import { type CoatScene, type Film, filmKey, filmsAt, substanceAt } from './coating-scene.ts';
import type { CoatingReport, MirrorDesign, SkippedFilm } from './coating-shape.ts';
import { idealFilm, singleFilmCoatings } from './coating-single.ts';
import { type InSteps, runToEnd } from './in-steps.ts';
import { powerOf } from './interface-answer.ts';
import type { MediumSide, SourceOf } from './medium-side.ts';
import { readEnds } from './path.ts';
import type { MediumSpec, Question } from './question.ts';
import { bothReferences, waveAnswer } from './wave.ts';

export interface CoatAsked {
  /** Its media, wave, geometry and conditions; layers are not looked at. */
  readonly question: Question;
  /** Films to design with. */
  readonly films: readonly MediumSpec[];
  /** Limit of R for bands. */
  readonly limit: number;
  readonly mirror: {
    readonly wanted: number;
    readonly pairs: number | null;
    /** The film of greatest and of least index where absent. */
    readonly high?: MediumSpec | undefined;
    readonly low?: MediumSpec | undefined;
  };
}

export const coatingReport = (asked: CoatAsked, sourceOf: SourceOf): CoatingReport | Refusal =>
  runToEnd(coatingReportInSteps(asked, sourceOf));

/** The same in pieces of a few milliseconds. */
export function* coatingReportInSteps(
  asked: CoatAsked,
  sourceOf: SourceOf,
): InSteps<CoatingReport | Refusal> {
  const { question, limit } = asked;
  const { conditions, extrapolate, incidenceAngle_rad, polarization } = question;
  const wave = bothReferences(question.wave);
  if (isRefusal(wave)) return wave;
  const ends = readEnds(question, wave, sourceOf);
  if (isRefusal(ends)) return ends;
  const { from, into } = ends;
  const unfit = whyNoCoating(from);
  if (unfit) return unfit;

  const vacuumWavelength_m = wave.vacuum_um * 1e-6;
  const at = (spec: Question['from'], side: MediumSide) =>
    substanceAt(spec, side, conditions, extrapolate, vacuumWavelength_m);
  const scene: CoatScene = {
    from,
    into,
    fromAt: at(question.from, from),
    intoAt: at(question.into, into),
    vacuumWavelength_m,
    incidenceAngle_rad,
    polarization,
    tangentialIndex: from.optics.n.re * Math.sin(incidenceAngle_rad),
  };
  const { high, low } = asked.mirror;
  const specs = [...asked.films, ...(high ? [high] : []), ...(low ? [low] : [])];
  const { films, skipped } = yield* filmsAt(
    specs.filter((spec, i) => specs.findIndex((other) => filmKey(other) === filmKey(spec)) === i),
    wave,
    conditions,
    extrapolate,
    scene.tangentialIndex,
    sourceOf,
  );
  const designed = films.filter((f) => asked.films.some((spec) => filmKey(spec) === f.key));
  const mirror = yield* mirrorPart(scene, films, designed, skipped, asked);
  if (isRefusal(mirror)) return mirror;
  const bare = surfaceWave(from.optics, into.optics, incidenceAngle_rad).wave;
  return {
    wave: waveAnswer(wave, question.wave),
    geometry: { incidenceAngle_rad, polarization },
    from: from.answer,
    into: into.answer,
    bare: { R: powerOf(polarization, bare.Rs, bare.Rp), Rs: bare.Rs, Rp: bare.Rp },
    limit,
    ideal: idealFilm(scene),
    singleFilms: yield* singleFilmCoatings(scene, designed, limit),
    twoLayers: yield* twoLayerDesigns(scene, designed, limit),
    mirror,
    skipped,
    cautions: cautionsOf(from, into, films),
  };
}

function whyNoCoating({ name, optics: { n } }: MediumSide): Refusal | undefined {
  return n.im > LOSSY_INCIDENCE * Math.abs(n.re) || n.re <= 0
    ? refuse(
        'lossy-incidence',
        3,
        `${name} absorbs too much to be the medium before a coating`,
        'start in a transparent medium',
      )
    : undefined;
}

/** Null where no two films differ in index. */
function* mirrorPart(
  scene: CoatScene,
  films: readonly Film[],
  designed: readonly Film[],
  skipped: readonly SkippedFilm[],
  { mirror: { high, low, wanted, pairs } }: CoatAsked,
): InSteps<MirrorDesign | null | Refusal> {
  const byIndex = [...designed].sort((a, b) => a.side.optics.n.re - b.side.optics.n.re);
  const pick = (key: string | undefined, otherwise: Film | undefined): Film | Refusal | undefined => {
    if (key === undefined) return otherwise;
    const reason = skipped.find((s) => s.key === key)?.reason;
    return (
      films.find((f) => f.key === key) ??
      refuse(
        'film-not-usable',
        3,
        reason ?? `there is no film ${key}`,
        'name another film, or insist with --extrapolate',
      )
    );
  };
  const H = pick(high && filmKey(high), byIndex.at(-1));
  if (isRefusal(H)) return H;
  const L = pick(low && filmKey(low), byIndex[0]);
  if (isRefusal(L)) return L;
  if (!H || !L) return null;
  if (!(H.side.optics.n.re > L.side.optics.n.re)) {
    return high || low
      ? refuse(
          'no-mirror',
          2,
          `the index of ${H.key} is not above that of ${L.key} here`,
          'name the film of the greater index with --high',
        )
      : null;
  }
  return yield* mirrorDesign(scene, { high: H, low: L, wanted, pairs });
}

const IDEAL_LAYERS: CautionNote = {
  code: 'approximation',
  details: {
    text: 'designs assume even, dense layers of the index stated; scatter, stress, water uptake and durability are not in them',
  },
};

function cautionsOf(from: MediumSide, into: MediumSide, films: readonly Film[]) {
  // The process of each film stands in its own row; what else must be known of one is said here.
  return orderCautions([
    ...from.notes.map((n) => wordCaution(n, 'from', from.name)),
    ...into.notes.map((n) => wordCaution(n, 'into', into.name)),
    ...films.flatMap(({ key, side }) =>
      side.notes
        .filter((n) => n.code !== 'film-process')
        .map((n) => wordCaution(n, key, key))
        .filter((c) => c.level !== 'note'),
    ),
    wordCaution(IDEAL_LAYERS, 'films', ''),
  ]);
}
