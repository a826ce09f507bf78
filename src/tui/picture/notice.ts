/**
 * The lines under the picture: why there is no answer, what was done, the first caution, and what the keys act on.
 * A refusal stays until it is mended or taken back; its remedy names the keys that help here.
 */
import type { Refusal } from '../../medium/refusal.ts';
import { cutToWidth } from '../../term/fit-width.ts';
import { isProblem, problemText } from '../../units/problem.ts';
import { toAscii } from '../../units/to-ascii.ts';
import { type ConditionedHits, faultOf, understoodText } from '../conditioned-hits.ts';
import { fieldById } from '../fields/all-fields.ts';
import { conditionsIn, hitsFor, whyNoHit } from '../hits.ts';
import type { ActionId } from '../keys/actions.ts';
import { keyText } from '../keys/key-names.ts';
import { answerOf, fieldOfStop, refusalOf, type State } from '../state.ts';
import type { Role } from '../theme.ts';
import type { World } from '../world.ts';
import { blocksOf } from './blocks.ts';
import { readingText } from './curve-reading.ts';
import type { Item } from './item.ts';
import { wrapText } from './wrap.ts';

export interface NoticeLine {
  /** '!', 'x' or '' at the start of the line. */
  readonly mark: string;
  readonly markRole: Role;
  readonly text: string;
}

interface Part {
  readonly mark: string;
  readonly markRole: Role;
  readonly text: string;
  /** May be cut to one line. */
  readonly isShort: boolean;
  /** Stands at the end of the line and is never cut. */
  readonly tail?: string;
}

const MARK_WIDTH = 2;

export function noticeLines(state: State, world: World, columns: number): readonly NoticeLine[] {
  const ascii = state.preferences.glyphs === 'ascii';
  return noticeParts(state, world).flatMap((part) => {
    const text = ascii ? toAscii(part.text) : part.text;
    const lines = wrapText(text, columns - MARK_WIDTH);
    const first = { mark: part.mark, markRole: part.markRole };
    const tail = part.tail ?? '';
    const room = columns - MARK_WIDTH - tail.length;
    if (part.isShort) return [{ ...first, text: cutToWidth(text, room, ascii ? '...' : '…') + tail }];
    return lines.map((line, i) => (i === 0 ? { ...first, text: line } : { ...first, mark: '', text: line }));
  });
}

function noticeParts(state: State, world: World): readonly Part[] {
  const typing = typingParts(state, world);
  if (typing) return typing;
  const parts: Part[] = [];
  const refusal = refusalOf(state);
  if (refusal) parts.push(refused(refusalText(refusal, world)));
  if (state.message?.tone === 'refused') parts.push(refused(state.message.text));
  else if (state.message) parts.push(said(state.message.text));
  else if (!refusal && !state.page && !state.curve) parts.push(cautionPart(state, world));
  // On a page the keys act on the page, on a curve on the cursor.
  if (!state.page) parts.push(state.curve ? said(readingText(state, world)) : focusPart(state, world));
  return parts;
}

const said = (text: string): Part => ({ mark: '', markRole: 'text', text, isShort: false });
const refused = (text: string): Part => ({ mark: 'x', markRole: 'caution', text, isShort: false });
const hint = (text: string): Part => ({ mark: '', markRole: 'text', text, isShort: true });

function typingParts(state: State, world: World): readonly Part[] | undefined {
  const { entry, search } = state;
  if (entry) {
    const field = fieldById(entry.field);
    const problem = state.message?.tone === 'refused' ? state.message.text : undefined;
    return [problem === undefined ? hint(reading(state, world)) : refused(problem), hint(field.hint)];
  }
  if (search) {
    const text = search.line.text;
    const conditioned = conditionsIn(text, state.question, world);
    if (conditioned) return conditionParts(conditioned);
    const nothing = hitsFor(text, state.recent, state.question, world).length === 0;
    return [
      nothing
        ? refused(problemText(whyNoHit(text, state.question, world)))
        : hint('n and transparency are those at the wave above'),
      hint(text === '' ? CONDITIONS_HINT : fieldById(search.side).hint),
    ];
  }
  return undefined;
}

const CONDITIONS_HINT = 'a name, n=1.5+0.1i, or conditions: n 1.5..1.6 clear 3um..5um class glass not toxic';

/** How many media are left and what was understood; below it what is wrong or missing. */
function conditionParts(hits: ConditionedHits): readonly Part[] {
  const understood = understoodText(hits);
  const fault = faultOf(hits);
  const said = [hits.count, understood].filter((text) => text !== '').join('. ');
  if (!fault) return [{ ...hint(said), isShort: false }];
  return [hint(said), fault.isOpen ? hint(fault.text) : refused(fault.text)];
}

/** How what is typed so far will be understood. */
function reading(state: State, { readLayers }: World): string {
  const { entry, question } = state;
  if (!entry || entry.isFresh || entry.line.text.trim() === '') return '';
  const field = fieldById(entry.field);
  const taken = field.take(entry.line.text, { question, answer: answerOf(state), readLayers });
  if (isProblem(taken)) return '';
  const context = { question: taken, answer: null };
  return `reads: ${[field.label, field.show(context, { ascii: false })].filter((s) => s !== '').join(' ')}`;
}

function refusalText(refusal: Refusal, world: World): string {
  const key = (id: ActionId): string => keyText(world.bindings.keyOf('picture', id) ?? '', true);
  const back = `${key('back')} goes back`;
  if (refusal.code === 'outside-fit-range') {
    return `${refusal.message}; ${key('extrapolate')} extrapolates, ${key('go-wave')} changes the wave, ${back}`;
  }
  return `${refusal.message}; ${refusal.remedy}; ${back}`;
}

function cautionPart(state: State, world: World): Part {
  const cautions = answerOf(state)?.cautions ?? [];
  const [first, ...others] = cautions;
  if (!first) return hint('');
  const key = keyText(world.bindings.keyOf('picture', 'cautions') ?? '', true);
  const isNote = first.level === 'note';
  return {
    mark: isNote ? '' : '!',
    markRole: isNote ? 'note' : first.level,
    text: first.text,
    isShort: true,
    tail: others.length === 0 ? '' : `  ${key} ${others.length} more`,
  };
}

/** What the keys act on, in words. */
function focusPart(state: State, world: World): Part {
  const item = focusItem(state, world);
  if (!item) return hint('');
  const key = (id: ActionId): string => keyText(world.bindings.keyOf('picture', id) ?? '', true);
  const field = fieldOfStop(state.focus);
  if (field === undefined)
    return hint(`${item.describe}: ${key('copy')} copies it, ${key('sources')} shows its source`);
  const { kind, takesWords } = fieldById(field);
  const how =
    kind === 'choice'
      ? 'Space changes it'
      : takesWords
        ? 'type it'
        : `type it or step with ${key('step-up')} ${key('step-down')}`;
  return hint(`${item.describe}; ${how}`);
}

export function focusItem(state: State, world: World): Item | undefined {
  const { wave, conditions, from, interface: surface, into } = blocksOf(state, world);
  const blockItems = [from, surface, into].flatMap((b) => [...b.top, ...b.body, ...b.bottom].flat());
  return [...wave, ...conditions, ...blockItems].find((item) => item.stop === state.focus);
}
