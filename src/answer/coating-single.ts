/** One film as a quarter wave: the ideal index, and every film at hand ranked by what it leaves of the reflection. */

import { fresnel } from '../interface/fresnel.ts';
import { opticsFromIndex } from '../interface/optics.ts';
import { complex, ONE } from '../num/complex.ts';
import { idealFilmIndexAt, normalIndex } from '../stack/oblique-film.ts';
import { bandBelow, type CoatScene, type Film, rangeOverSpread, reflectances } from './coating-scene.ts';
import type { FilmAnswer, IdealFilm, SingleFilmCoating } from './coating-shape.ts';
import type { InSteps } from './in-steps.ts';
import { powerOf } from './interface-answer.ts';

/** A substrate absorbing more than this, k over n, has no ideal film of a real index. */
export const CLEAR_SUBSTRATE = 0.01;

export function filmAnswer({ key, name, side, spread }: Film): FilmAnswer {
  const { n } = side.optics;
  return { key, name, n: n.re, k: n.im, spread, process: side.answer.fit?.film?.process ?? null };
}

export function quarterWave_m(scene: CoatScene, n: number): number {
  return scene.vacuumWavelength_m / (4 * normalIndex(n, scene.tangentialIndex));
}

export function* singleFilmCoatings(
  scene: CoatScene,
  films: readonly Film[],
  limit: number,
): InSteps<readonly SingleFilmCoating[]> {
  const found: SingleFilmCoating[] = [];
  for (const film of films) {
    found.push(singleFilmCoating(scene, film, limit));
    yield;
  }
  return found.sort((a, b) => a.R - b.R);
}

function singleFilmCoating(scene: CoatScene, film: Film, limit: number): SingleFilmCoating {
  const thickness_m = quarterWave_m(scene, film.side.optics.n.re);
  const layers = [{ film, thickness_m }];
  const { s, p } = reflectances(scene, layers);
  return {
    film: filmAnswer(film),
    thickness_m,
    R: powerOf(scene.polarization, s, p),
    Rs: s,
    Rp: p,
    ...rangeOverSpread(scene, layers),
    band: bandBelow(scene, layers, limit),
  };
}

/** Null on a substrate that absorbs or reflects totally. */
export function idealFilm(scene: CoatScene): IdealFilm | null {
  const n0 = scene.from.optics.n.re;
  const { n } = scene.into.optics;
  const q = scene.tangentialIndex;
  if (n.im > CLEAR_SUBSTRATE * n.re || !(normalIndex(n.re, q) > 0)) return null;
  const n_s = idealFilmIndexAt(n0, n.re, q, 's');
  const n_p = idealFilmIndexAt(n0, n.re, q, 'p');
  const R = (index: number): number => filmReflectance(scene, index);
  const best =
    scene.polarization === 's'
      ? n_s
      : scene.polarization === 'p'
        ? n_p
        : q === 0
          ? n_s
          : leastBetween(R, Math.min(n_s ?? n_p ?? n0, n_p ?? n_s ?? n0), Math.max(n_s ?? n0, n_p ?? n0));
  return {
    n: best,
    n_s,
    n_p,
    thickness_m: best === null ? null : quarterWave_m(scene, best),
    R: best === null ? null : R(best),
  };
}

/** A quarter wave of an index that no material need have: amplitudes of its two faces in antiphase. */
function filmReflectance(
  { from, into, incidenceAngle_rad, tangentialIndex, polarization }: CoatScene,
  index: number,
): number {
  const film = opticsFromIndex(complex(index), ONE);
  const inside_rad = Math.asin(tangentialIndex / index);
  const outer = fresnel(from.optics, film, incidenceAngle_rad);
  const inner = fresnel(film, into.optics, inside_rad);
  const combined = (a: number, b: number): number => ((a - b) / (1 - a * b)) ** 2;
  return powerOf(polarization, combined(outer.rs.re, inner.rs.re), combined(outer.rp.re, inner.rp.re));
}

/** Golden section; f has one minimum between the indices that are ideal for s and for p. */
function leastBetween(f: (x: number) => number, from: number, to: number): number {
  const golden = (Math.sqrt(5) - 1) / 2;
  let [low, high] = [from, to];
  for (let i = 0; i < 60; i++) {
    const [a, b] = [high - golden * (high - low), low + golden * (high - low)];
    if (f(a) <= f(b)) high = b;
    else low = a;
  }
  return (low + high) / 2;
}
