/** Why a mixture has no index in a state: its table ends before that content or that temperature. */
import type { Fit, Material } from '../catalog/types.ts';
import { isInCompositionTable } from '../dispersion/composition-table.ts';
import type { Conditions } from '../dispersion/evaluator.ts';
import { type Refusal, refuse } from './refusal.ts';

/** Undefined where the table holds the state, and for every other model. No extrapolation leads out of a table. */
export function outsideTable(
  { parameters: p }: Fit,
  { name }: Material,
  conditions: Conditions,
): Refusal | undefined {
  if (p.model !== 'composition-table' || isInCompositionTable(p, conditions)) return undefined;
  const span = (list: readonly number[]): string => `${Math.min(...list)} to ${Math.max(...list)}`;
  return refuse(
    'outside-table',
    3,
    `the table of ${name} covers ${span(p.content_percent)} % (${p.of}) at ${span(p.temperatures_C)} C`,
    'choose a composition and a temperature inside',
  );
}
