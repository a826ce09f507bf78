/**
 * What the list says beside each medium: its index and how far light gets in it, at the wave and under the conditions of
 * the question. Media that have no data there say so; nothing is extrapolated for a list.
 */
import type { MediumAnswer } from '../../answer/answer.ts';
import { mediumSide } from '../../answer/medium-side.ts';
import type { Question } from '../../answer/question.ts';
import { bothReferences } from '../../answer/wave.ts';
import { isRefusal } from '../../medium/refusal.ts';
import { howKnown } from '../../present/known.ts';
import { indexText } from '../../present/medium-rows.ts';
import { lastPlace } from '../../units/digits.ts';
import { METRE } from '../../units/display-unit.ts';
import { formatNumber } from '../../units/format-number.ts';
import { formatQuantity, formatRange } from '../../units/format-quantity.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { type Hit, mediumOfHit } from '../hits.ts';
import type { World } from '../world.ts';

export interface HitFacts {
  readonly name: string;
  /** Index to four decimals at most; '' where there is none. */
  readonly index: string;
  /** "clear", "1/e 13 nm", "absorbs", "no data". */
  readonly transparency: string;
  /** More about the marked one, the numbers first: there is room for a few lines. */
  readonly details: readonly string[];
}

const MOST_DECIMALS = 4;
/** From this depth on a part of some millimetres counts as clear. */
const CLEAR_FROM_m = 0.1;

const made = new WeakMap<Question, Map<string, HitFacts>>();

export function hitFacts(hit: Hit, question: Question, world: World, style: NumberStyle): HitFacts {
  const id = `${style.ascii}/${hit.kind === 'literal' ? 'literal' : `${hit.entry.key}:${hit.axis ?? ''}`}`;
  const known = made.get(question) ?? new Map<string, HitFacts>();
  made.set(question, known);
  let facts = hit.kind === 'literal' ? undefined : known.get(id);
  if (!facts) {
    facts = makeFacts(hit, question, world, style);
    known.set(id, facts);
  }
  return facts;
}

function makeFacts(hit: Hit, question: Question, world: World, style: NumberStyle): HitFacts {
  const medium = mediumOfHit(hit, question, world);
  const wave = bothReferences(question.wave);
  const name = hit.kind === 'literal' ? 'by its numbers' : hit.entry.name;
  const about = hit.kind === 'entry' ? [aboutEntry(hit)] : [];
  if (!medium || isRefusal(wave)) return { name, index: '', transparency: 'no data', details: about };
  const side = mediumSide(medium, wave, question.conditions, false, (id) => world.source(id));
  if (isRefusal(side)) return { name, index: '', transparency: 'no data', details: [side.message, ...about] };
  const { answer } = side;
  return {
    name,
    index: shortIndex(answer, style),
    transparency: transparencyText(answer, wave.vacuum_um * 1e-6, style),
    details: [detailText(answer, style), ...about],
  };
}

function aboutEntry(hit: Hit & { readonly kind: 'entry' }): string {
  const { name, formula, class: kind, axes } = hit.entry;
  const crystal = axes.length > 1 ? `axes ${axes.map((axis) => axis[0]).join(', ')}` : undefined;
  return [name, formula, kind, crystal].filter((part) => part !== undefined).join(', ');
}

function shortIndex(medium: MediumAnswer, style: NumberStyle): string {
  const place = lastPlace(howKnown(medium).uncertainty);
  const decimals = place === undefined ? MOST_DECIMALS : Math.max(0, Math.min(MOST_DECIMALS, -place));
  return formatNumber(medium.n, { decimals }, style);
}

function transparencyText(medium: MediumAnswer, vacuumWavelength_m: number, style: NumberStyle): string {
  const depth = medium.penetrationDepth_m;
  if (depth !== null && depth < CLEAR_FROM_m) {
    return `1/e ${formatQuantity(depth, METRE, { significant: 2 }, { style })}`;
  }
  const range = medium.transparency_m;
  if (range) return vacuumWavelength_m >= range[0] && vacuumWavelength_m <= range[1] ? 'clear' : 'absorbs';
  return medium.absorptionCoefficient_per_m === null ? 'not known' : 'clear';
}

function detailText(medium: MediumAnswer, style: NumberStyle): string {
  const n = `n = ${indexText(medium, howKnown(medium), style)}`;
  const k = medium.k > 0 ? `k = ${formatNumber(medium.k, { significant: 3 }, style)}` : undefined;
  const range = medium.transparency_m
    ? `clear ${formatRange(medium.transparency_m, METRE, 'shortest', { style })}`
    : undefined;
  return [n, k, range].filter((part) => part !== undefined).join(', ');
}
