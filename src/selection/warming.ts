/** How an index was brought to a temperature asked for, as far as a list of media has to say. */
import type { CautionNote } from '../medium/caution.ts';

/**
 * none: nothing to say (no temperature asked, or a fit that follows it); first-order: by a single dn/dT; not-modelled: the
 * index is that at the temperature of the fit.
 */
export type Warming = 'none' | 'first-order' | 'not-modelled';

export function warmingOf(notes: readonly CautionNote[]): Warming {
  const has = (code: CautionNote['code']): boolean => notes.some((note) => note.code === code);
  if (has('temperature-not-modelled')) return 'not-modelled';
  return has('temperature-first-order') ? 'first-order' : 'none';
}
