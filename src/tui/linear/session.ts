/**
 * The linear layout as a conversation of lines: what was asked last, a line typed, and what to say next. Pure.
 * At every point a number picks from what was read out last, a word is a command or a value, an empty line keeps what is.
 */
import type { MediumSpec } from '../../answer/question.ts';
import type { LogRecord } from '../../record/record.ts';
import { isProblem, problemText } from '../../units/problem.ts';
import type { Field } from '../fields/field.ts';
import { type Side, setMedium } from '../fields/medium-fields.ts';
import { type Hit, hitsFor, latestFirst, mediumOfHit, whyNoHit } from '../hits.ts';
import { askAnew, type State } from '../state.ts';
import type { World } from '../world.ts';
import { COMMANDS } from './commands.ts';
import { contextOf, fieldLines, fieldsOf, hitLines, spokenName, summaryLines } from './linear-lines.ts';

export type Asking =
  | { readonly kind: 'command' }
  | { readonly kind: 'value'; readonly field: Field }
  | { readonly kind: 'medium'; readonly side: Side; readonly hits: readonly Hit[] };

export interface Session {
  readonly state: State;
  readonly asking: Asking;
}

export interface Reply {
  readonly session: Session;
  readonly lines: readonly string[];
  /** To be put into the logbook. */
  readonly keep?: LogRecord;
  /** The conversation is over. */
  readonly isOver?: boolean;
}

const COMMAND: Asking = { kind: 'command' };
const MOST_CHOICES = 9;

export function beginSession(state: State): Reply {
  return {
    session: { state, asking: COMMAND },
    lines: [
      'halfspace, linear layout. Type a number or a word, then Enter; help lists the words, quit ends.',
      ...(state.message ? [state.message.text] : []),
      ...summaryLines(state),
      ...fieldLines(state),
    ],
  };
}

/** What stands in front of the line being typed. */
export function promptOf({ asking }: Session): string {
  if (asking.kind === 'command') return 'change or command: ';
  if (asking.kind === 'value') return `${spokenName(asking.field)}: `;
  return `${asking.side === 'from' ? 'first' : 'second'} medium: `;
}

export function reply(session: Session, typed: string, world: World): Reply {
  const text = typed.trim();
  const { asking, state } = session;
  if (asking.kind === 'value') return takeValue(state, asking.field, text, world);
  if (asking.kind === 'medium') return takeMedium(state, asking, text, world);
  return takeCommand(state, text, world);
}

const say = (state: State, lines: readonly string[], asking: Asking = COMMAND): Reply => ({
  session: { state, asking },
  lines,
});

function takeCommand(state: State, text: string, world: World): Reply {
  if (text === '') return say(state, summaryLines(state));
  const fields = fieldsOf(state);
  const numbered = /^\d+$/.test(text) ? fields[Number(text) - 1] : undefined;
  if (numbered) return askFor(state, numbered, world);
  const [word = '', ...rest] = text.split(/\s+/);
  const command = COMMANDS.find((c) => c.words.includes(word));
  if (command) {
    if (command.words.includes('quit')) return { ...say(state, ['bye']), isOver: true };
    const done = command.run(state, world);
    return { ...say(done.state, done.lines), ...(done.keep && { keep: done.keep }) };
  }
  const named = fields.find((f) => f.id === word || f.label === word);
  if (named) {
    const value = rest.join(' ');
    if (value === '') return askFor(state, named, world);
    if (named.kind === 'medium') return lookForMedium(state, named.id as Side, value, world);
    return takeValue(state, named, value, world);
  }
  return say(state, [`"${text}" is no number of the list and no word known here; help lists the words`]);
}

function askFor(state: State, field: Field, world: World): Reply {
  const now = field.show(contextOf(state), { ascii: state.preferences.glyphs === 'ascii' });
  const lines = [`${spokenName(field)} is ${now}; ${field.hint}; an empty line keeps it`];
  if (field.kind === 'medium') {
    return say(state, lines, { kind: 'medium', side: field.id as Side, hits: [] });
  }
  if (field.kind === 'choice') {
    const question = field.step(1, contextOf(state));
    return question ? changed(state, field, askAnew(state, question, world)) : say(state, lines);
  }
  return say(state, lines, { kind: 'value', field });
}

function takeValue(state: State, field: Field, text: string, world: World): Reply {
  if (text === '') return say(state, [`${spokenName(field)} kept`]);
  const { readLayers } = world;
  const question = field.take(text, { ...contextOf(state), readLayers });
  if (isProblem(question)) {
    // A word instead of a value: the person has something else in mind.
    if (COMMANDS.some((c) => c.words.includes(text) && text.length > 1))
      return takeCommand(state, text, world);
    return say(state, [problemText(question)], { kind: 'value', field });
  }
  return changed(state, field, askAnew(state, question, world));
}

/** Every change is said, with what it does to R and T. */
function changed(before: State, field: Field, state: State): Reply {
  if (state === before) return say(state, [`${spokenName(field)} is as before`]);
  const text = field.show(contextOf(state), { ascii: state.preferences.glyphs === 'ascii' });
  return say(state, [`${spokenName(field)} = ${text}`, ...summaryLines(state)]);
}

function takeMedium(
  state: State,
  asking: Extract<Asking, { kind: 'medium' }>,
  text: string,
  world: World,
): Reply {
  if (text === '') return say(state, ['medium kept']);
  const picked = /^\d$/.test(text) ? asking.hits[Number(text) - 1] : undefined;
  if (picked) return choose(state, asking.side, mediumOfHit(picked, state.question, world), world);
  return lookForMedium(state, asking.side, text, world);
}

/** One exact name is taken at once; several are read out. */
function lookForMedium(state: State, side: Side, text: string, world: World): Reply {
  const hits = hitsFor(text, state.recent, state.question, world).slice(0, MOST_CHOICES);
  const [first] = hits;
  if (!first)
    return say(state, [problemText(whyNoHit(text, state.question, world))], {
      kind: 'medium',
      side,
      hits: [],
    });
  const isExact = first.kind === 'literal' || hits.length === 1 || world.lookup(text).kind === 'one';
  if (isExact) return choose(state, side, mediumOfHit(first, state.question, world), world);
  return say(state, [...hitLines(hits, state, world), 'type a number, or another name'], {
    kind: 'medium',
    side,
    hits,
  });
}

function choose(state: State, side: Side, medium: MediumSpec | undefined, world: World): Reply {
  const field = fieldsOf(state).find((f) => f.id === side);
  if (!medium || !field) return say(state, ['this medium cannot be read']);
  const recent = medium.kind === 'catalogue' ? latestFirst(state.recent, medium.material.key) : state.recent;
  const asked = askAnew(state, setMedium(state.question, side, medium), world);
  return changed(state, field, asked === state ? state : { ...asked, recent });
}
