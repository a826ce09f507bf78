/**
 * What a mistyped word may have been meant for: the candidates that begin with it, then those a few typing slips away (one
 * in three letters, at least one), nearest first. Case and outer dashes are ignored.
 */
import { editDistance } from './edit-distance.ts';

export const MOST_CANDIDATES = 5;

/** Words longer than this are not typing slips of anything. */
const LONGEST = 40;

export function nearest(word: string, candidates: readonly string[]): readonly string[] {
  const typed = bare(word);
  if (typed === '' || typed.length > LONGEST) return [];
  return candidates
    .map((candidate) => ({ candidate, rank: rank(typed, bare(candidate)) }))
    .filter(({ rank: r }) => r <= Math.max(1, Math.floor(typed.length / 3)))
    .sort((a, b) => a.rank - b.rank || (a.candidate < b.candidate ? -1 : 1))
    .slice(0, MOST_CANDIDATES)
    .map(({ candidate }) => candidate);
}

/** 0 for a beginning of at least two letters, else the count of slips. */
function rank(typed: string, candidate: string): number {
  return typed.length > 1 && candidate.startsWith(typed) ? 0 : editDistance(typed, candidate);
}

function bare(word: string): string {
  return word.replace(/^-+/, '').toLowerCase();
}
