/**
 * The full-screen program without a terminal: the real catalogue, the real reducer and the real components, drawn by Ink
 * into a stand-in for standard output. Keys are typed as text; chords in angle brackets: `stage.type('a45<enter>')`.
 */
import { EventEmitter } from 'node:events';
import { render } from 'ink';
import { answerQuestion } from '../../../src/answer/answer-question.ts';
import { makeQuestion, type Question } from '../../../src/answer/question.ts';
import { catalogueFromSources } from '../../../src/catalog/from-sources.ts';
import { makeSearch } from '../../../src/catalog/search.ts';
import { isUnread, readLayers } from '../../../src/cli/read-path.ts';
import { answerRecord } from '../../../src/record/answer-record.ts';
import { questionWords } from '../../../src/record/question-words.ts';
import { charKey, type Key, type KeyName, namedKey } from '../../../src/term/key.ts';
import { Charts } from '../../../src/tui/charts.ts';
import { designCoatings } from '../../../src/tui/coating-designs.ts';
import { App } from '../../../src/tui/components/app.tsx';
import { mediumName } from '../../../src/tui/fields/medium-fields.ts';
import { type IndexTable, indexTable } from '../../../src/tui/index-tables.ts';
import { bindKeys } from '../../../src/tui/keys/bindings.ts';
import { MediumFinder } from '../../../src/tui/medium-finder.ts';
import { type Effect, initialState, type Preferences, type State } from '../../../src/tui/state.ts';
import { Store } from '../../../src/tui/store.ts';
import type { World } from '../../../src/tui/world.ts';
import { problem } from '../../../src/units/problem.ts';
import { named, vacuumWave } from '../../helpers/ask.ts';

export interface StageOptions {
  readonly columns?: number;
  readonly rows?: number;
  readonly question?: Question;
  readonly preferences?: Partial<Preferences>;
}

const tables = new Map<string, IndexTable>();
let search: ReturnType<typeof makeSearch> | undefined;

export function testWorld(): World {
  const catalogue = catalogueFromSources();
  search ??= makeSearch(catalogue.entries());
  const designs = new WeakMap<Question, ReturnType<typeof designCoatings>>();
  const finder = new MediumFinder(catalogue);
  const charts = new Charts((id) => catalogue.source(id));
  const find = search;
  return {
    answer: (question) => answerQuestion(question, (id) => catalogue.source(id)),
    search: (text) => find(text).map((hit) => hit.entry),
    find: (criteria, among) => finder.find(criteria, among),
    coatings: (question) => {
      const report = designs.get(question) ?? designCoatings(question, catalogue);
      designs.set(question, report);
      return report;
    },
    survey: () => finder.survey(),
    lookup: (name) => catalogue.lookup(name),
    material: (key) => catalogue.material(key),
    source: (id) => catalogue.source(id),
    chart: (kind, question, answer) => charts.get(kind, question, answer),
    record: (question, answer) =>
      answerRecord(question, answer, {
        time: '2026-03-14T09:26:53+01:00',
        version: '0.1.0',
        catalogue: { hash: catalogue.hash, date: catalogue.date },
        commandWords: questionWords(question),
      }),
    readLayers: (text) => {
      const read = readLayers(text.trim().split(/\s+/), catalogue);
      return isUnread(read) ? problem('not-a-medium', read.refusal.message, read.refusal.remedy) : read;
    },
    opticsOver: (medium, conditions, range_m) => {
      const id = JSON.stringify([mediumName(medium), conditions, range_m]);
      const table = tables.get(id) ?? indexTable(medium, conditions, range_m);
      tables.set(id, table);
      return table;
    },
    bindings: bindKeys().bindings,
  };
}

export function airToSilica(): Question {
  const wave = { ...vacuumWave(632.8e-9), text: '632.8 nm' };
  return makeQuestion(named('air'), named('fused-silica'), wave);
}

export class Stage {
  readonly store: Store;
  readonly effects: Effect[] = [];
  readonly world: World;
  readonly #output: EventEmitter & { columns: number; rows: number };
  readonly #unmount: () => void;
  #frame = '';

  constructor(options: StageOptions = {}) {
    const { columns = 80, rows = 24, question = airToSilica(), preferences = {} } = options;
    this.world = testWorld();
    const look: Preferences = { glyphs: 'braille', colour: false, ...preferences };
    const state = initialState(question, { columns, rows }, look, this.world);
    this.store = new Store(state, this.world, (effect) => this.effects.push(effect));
    this.#output = Object.assign(new EventEmitter(), {
      columns,
      rows,
      isTTY: true,
      write: (text: string): boolean => {
        if (!/^(?:\x1b\[[0-?]*[ -/]*[@-ln-~])*$/.test(text)) this.#frame = text;
        return true;
      },
    });
    const { unmount } = render(<App store={this.store} world={this.world} />, {
      stdout: this.#output as unknown as NodeJS.WriteStream,
      stdin: silentInput(),
      debug: true,
      patchConsole: false,
      exitOnCtrlC: false,
    });
    this.#unmount = unmount;
  }

  get state(): State {
    return this.store.state();
  }

  type(text: string): this {
    for (const key of keysOf(text)) this.store.dispatch({ kind: 'key', key });
    return this;
  }

  paste(text: string): this {
    this.store.dispatch({ kind: 'paste', text });
    return this;
  }

  resize(columns: number, rows: number): this {
    Object.assign(this.#output, { columns, rows });
    this.#output.emit('resize');
    this.store.dispatch({ kind: 'resize', size: { columns, rows } });
    return this;
  }

  /** The frame after React has caught up, styles included. */
  async styled(): Promise<string> {
    await new Promise((resolve) => setImmediate(resolve));
    await new Promise((resolve) => setImmediate(resolve));
    return this.#frame;
  }

  /** The frame as plain lines. */
  async lines(): Promise<string[]> {
    return (await this.styled()).replace(/\x1b\[[0-9;]*m/g, '').split('\n');
  }

  async text(): Promise<string> {
    return (await this.lines()).join('\n');
  }

  end(): void {
    this.#unmount();
  }
}

/** Keys from a text with chords in angle brackets. */
export function keysOf(text: string): Key[] {
  return [...text.matchAll(/<([a-z0-9+-]+)>|(.)/gsu)].map(([, chord, char]) =>
    chord === undefined ? charKey(char ?? '') : keyOfChord(chord),
  );
}

function keyOfChord(chord: string): Key {
  const parts = chord.split('+');
  const base = parts.pop() ?? '';
  const modifiers = {
    ctrl: parts.includes('ctrl'),
    alt: parts.includes('alt'),
    shift: parts.includes('shift'),
  };
  if (base === 'space') return charKey(' ', modifiers);
  return base.length === 1 ? charKey(base, modifiers) : namedKey(base as Exclude<KeyName, 'char'>, modifiers);
}

function silentInput(): NodeJS.ReadStream {
  const input = Object.assign(new EventEmitter(), {
    isTTY: true,
    setRawMode: () => input,
    setEncoding: () => input,
    ref: () => input,
    unref: () => input,
    read: () => null,
  });
  return input as unknown as NodeJS.ReadStream;
}
