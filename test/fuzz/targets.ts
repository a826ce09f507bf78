/**
 * What is fed with random inputs. Each target takes one input and throws where the program would have broken a promise: no
 * exception, no stack trace, no NaN or Infinity in JSON, an exit status that is documented, words with every failure.
 */
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { answerColumns, DEFAULT_COLUMNS, keysOf } from '../../src/batch/answer-columns.ts';
import { ByteWriter } from '../../src/batch/byte-writer.ts';
import { CsvBatch } from '../../src/batch/csv-batch.ts';
import { JsonBatch } from '../../src/batch/json-batch.ts';
import type { FixedParts } from '../../src/batch/row-layout.ts';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { readOwnFiles, withOwn } from '../../src/catalog/own.ts';
import { makeAsking, sampleAnswers } from '../../src/cli/asking.ts';
import { COMMANDS, optionsOf } from '../../src/cli/command-table.ts';
import { optionSpec } from '../../src/cli/options.ts';
import { explainReading, parseConditions } from '../../src/selection/parse-conditions.ts';
import { KeyParser } from '../../src/term/key-parser.ts';
import { initialState, type State } from '../../src/tui/state.ts';
import { type Event, update } from '../../src/tui/update/update.ts';
import { parseLiteralMedium } from '../../src/units/parse-literal-medium.ts';
import { parseWave } from '../../src/units/parse-wave.ts';
import { isProblem } from '../../src/units/problem.ts';
import { run } from '../cli/in-process.ts';
import { airToSilica, testWorld } from '../tui/helpers/stage.tsx';
import { keyPieces } from './key-pieces.ts';
import type { Random } from './random.ts';
import { screen } from './screen-target.ts';
import { batchTable, commandLine, conditions, KEYS, medium, valueText, wave } from './texts.ts';

export interface Target {
  readonly name: string;
  /** Share of all inputs. */
  readonly weight: number;
  /** Makes one input and feeds it; gives it as text for the report. */
  readonly make: (r: Random) => { readonly input: string; readonly feed: () => void | Promise<void> };
}

const catalogue = catalogueFromSources();
const STATUSES: ReadonlySet<number> = new Set([0, 1, 2, 3, 4]);
const STACK_TRACE = /^\s+at .+:\d+:\d+\)?$/m;

function fail(message: string): never {
  throw new Error(message);
}

function checkText(text: string): void {
  if (STACK_TRACE.test(text)) fail(`a stack trace: ${text}`);
  if (text.includes('internal error')) fail(text);
}

function checkJson(text: string): void {
  const check = (value: unknown): void => {
    // What JSON cannot hold becomes null or a word; words are looked for.
    if (value === 'NaN' || value === 'Infinity' || value === '-Infinity') fail(`${value} in JSON: ${text}`);
    if (typeof value === 'number' && !Number.isFinite(value)) fail(`a number without end in JSON: ${text}`);
    if (typeof value === 'object' && value !== null) Object.values(value).forEach(check);
  };
  check(JSON.parse(text));
}

/** Rows go to a descriptor, past the streams that are caught. */
const ROWS_FILE = path.join(mkdtempSync(path.join(os.tmpdir(), 'halfspace-fuzz-')), 'rows');
const isTable = (args: readonly string[]): boolean =>
  args.some((a) => /^--(?:sweep|columns|digits)(?:=|$)/.test(a));
function takeRows(): string {
  if (!existsSync(ROWS_FILE)) return '';
  const rows = readFileSync(ROWS_FILE, 'utf8');
  rmSync(ROWS_FILE);
  return rows;
}

const commands: Target = {
  name: 'command lines',
  weight: 0.06,
  make(r) {
    const args = commandLine(r);
    return {
      input: JSON.stringify(args),
      feed: async () => {
        const { status, out: told, err } = await run([...args, ...(isTable(args) ? ['-o', ROWS_FILE] : [])]);
        const out = told + takeRows();
        if (!STATUSES.has(status)) fail(`status ${status}`);
        checkText(out);
        checkText(err);
        if (status >= 2 && err.trim() === '' && out.trim() === '') fail(`status ${status} without a word`);
        if (args.includes('--json')) {
          for (const text of isTable(args) ? out.split('\n') : [out])
            if (text.startsWith('{')) checkJson(text);
        }
        if (
          !args.includes('--json') &&
          /\b(?:NaN|undefined|\[object)/.test(out.replaceAll(args.join('|'), ''))
        ) {
          if (!args.some((a) => /NaN|undefined|object/.test(a))) fail(`not a text for people: ${out}`);
        }
      },
    };
  },
};

const own: Target = {
  name: "entries of one's own",
  weight: 0.1,
  make(r) {
    const key = r.pick(KEYS);
    const material = catalogue.material(key);
    const renamed = { ...material, key: `own-${key}`, name: 'Own', aliases: [], formula: undefined };
    const isJson = r.chance(0.6);
    const text = isJson
      ? r.damaged(damagedValues(r, JSON.stringify(renamed)))
      : r.damaged(
          `# key: own-a\n# name: Own\nwavelength_um,n,k\n${r.many(1, 6, () => `${r.number()},${r.number()},${r.number()}`).join('\n')}\n`,
        );
    return {
      input: text,
      feed: () => {
        const files = [{ path: isJson ? 'a.json' : 'a.csv', name: isJson ? 'a.json' : 'a.csv', text }];
        const read = readOwnFiles(files, catalogue);
        for (const p of read.problems) checkText(`${p.message} ${p.remedy}`);
        if (read.materials.length > 0) withOwn(catalogue, read).lookup('own');
      },
    };
  },
};

/** Some numbers of a JSON text replaced by others. */
const damagedValues = (r: Random, json: string): string =>
  json.replace(/-?\d+(?:\.\d+)?(?:e[+-]?\d+)?/gi, (n) => (r.chance(0.03) ? r.number() || '0' : n));

const asking = makeAsking(catalogue);
const columns = (() => {
  const made = answerColumns(DEFAULT_COLUMNS.join(','), () => keysOf(sampleAnswers(asking)), asking.nearest);
  return 'code' in made ? fail(made.message) : made;
})();

const NOTHING_FIXED: FixedParts = { texts: {}, options: {} };

const batches: Target = {
  name: 'batches',
  weight: 0.05,
  make(r) {
    const isJson = r.chance(0.3);
    const bytes = isJson
      ? Buffer.from(
          r
            .many(1, 4, () => r.damaged(JSON.stringify({ from: medium(r), into: medium(r), wave: wave(r) })))
            .join('\n'),
        )
      : r.chance(0.05)
        ? r.bytes(200)
        : Buffer.from(batchTable(r));
    const cut = r.below(bytes.length + 1);
    return {
      input: bytes.toString('latin1'),
      feed: async () => {
        const writer = new ByteWriter();
        const setup = {
          asking,
          fixed: NOTHING_FIXED,
          columns,
          writer,
          marksOutside: false,
          whole: false,
          wording: (text: string) => text,
          passedOn: () => {},
        };
        const format = isJson ? new JsonBatch(setup) : new CsvBatch(setup);
        for (const chunk of [bytes.subarray(0, cut), bytes.subarray(cut)]) {
          format.push(chunk);
          for (let i = 0; i < 50 && !format.fatal && (await format.run(64)) === 'more'; i++);
        }
        format.end();
        for (let i = 0; i < 50 && !format.fatal && (await format.run(64)) === 'more'; i++);
        const out = Buffer.from(writer.take()).toString('utf8');
        checkText(out);
        if (isJson) for (const line of out.split('\n')) if (line.startsWith('{')) checkJson(line);
      },
    };
  },
};
const classes = [...new Set(catalogue.entries().map((e) => e.class))];
const search: Target = {
  name: 'conditions of a search',
  weight: 0.12,
  make(r) {
    const text = conditions(r);
    return {
      input: text,
      feed: () => {
        const reading = parseConditions(text, { classes });
        for (const { from, to } of reading.parts) {
          if (!(from >= 0 && to <= text.length && from <= to))
            fail(`a part from ${from} to ${to} of ${text.length}`);
        }
        checkText(explainReading(reading));
      },
    };
  },
};

/** Every reader of a value of the command line, waves and media among them. */
const READERS: readonly (readonly [string, (text: string) => unknown])[] = [
  ['wave', parseWave],
  ['medium', parseLiteralMedium],
  ['layers', (text) => world.readLayers(text)],
  ...[...new Set(COMMANDS.flatMap(({ name }) => optionsOf(name)))].flatMap((key) => {
    const { name, ...spec } = optionSpec(key);
    return 'parse' in spec ? [[`--${name}`, spec.parse as (text: string) => unknown] as const] : [];
  }),
];

function checkNumbers(value: unknown, depth = 0): void {
  if (Number.isNaN(value)) fail('a NaN');
  if (typeof value === 'object' && value !== null && depth < 4)
    for (const part of Object.values(value)) checkNumbers(part, depth + 1);
}

const values: Target = {
  name: 'values',
  weight: 0.15,
  make(r) {
    const [reader, read] = r.pick(READERS);
    const text = valueText(r, reader);
    return {
      input: `${reader}: ${text}`,
      feed: () => {
        const value = read(text);
        if (!isProblem(value)) return checkNumbers(value);
        checkText(`${value.message} ${value.remedy}`);
        if (value.message.trim() === '' || value.remedy.trim() === '') fail('a problem without words');
        if (
          /[\n\r]|\bNaN\b|\bundefined\b/.test(`${value.message} ${value.remedy}`) &&
          !/NaN|undefined/.test(text)
        )
          fail(`not one line for people: ${value.message}; ${value.remedy}`);
      },
    };
  },
};

const names: Target = {
  name: 'names of media',
  weight: 0.05,
  make(r) {
    const text = r.chance(0.3) ? r.damaged(medium(r)) : medium(r);
    return { input: text, feed: () => void [catalogue.lookup(text), world.search(text)] };
  },
};

const world = testWorld();
/** One state goes on from input to input, as in a long session; each input is some keys, glued or torn. */
let session: State = freshSession();
let steps = 0;
function freshSession(): State {
  return initialState(airToSilica(), { columns: 80, rows: 24 }, { glyphs: 'braille', colour: false }, world);
}

const keys: Target = {
  name: 'keys',
  weight: 0.42,
  make(r) {
    const pieces = keyPieces(r);
    const size = { columns: 1 + r.below(200), rows: 1 + r.below(60) };
    const resizes = r.chance(0.02);
    return {
      input: JSON.stringify(pieces),
      feed: () => {
        if (++steps % 500 === 0) session = freshSession();
        const parser = new KeyParser();
        const events: Event[] = resizes ? [{ kind: 'resize', size }] : [];
        for (const piece of pieces) events.push(...parser.push(piece));
        events.push(...parser.expire());
        for (const event of events) {
          if (event.kind === 'key' && event.key.name === 'char' && [...(event.key.char ?? '')].length !== 1)
            fail(`a key of ${event.key.char?.length} characters`);
          session = update(session, event, world).state;
        }
        if (parser.hold_ms !== null && parser.hold_ms > 5000)
          fail(`input held back for ${parser.hold_ms} ms`);
      },
    };
  },
};

export const TARGETS: readonly Target[] = [keys, screen, values, names, search, own, commands, batches];
