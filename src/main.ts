/**
 * Entry of the program: picks the face from the arguments and the terminal. The only place, with src/term, that touches the
 * process, and the only one that sets the exit status. One question is answered without loading anything else.
 */
import { isatty } from 'node:tty';
import type { IndexedCatalogue } from './catalog/entries.ts';
import { CatalogueFileError, loadCatalogue } from './catalog/load.ts';
import { problemText as ownProblemText } from './catalog/own.ts';
import { type Invocation, parseArguments } from './cli/arguments.ts';
import { run as runAnswer } from './cli/commands/answer.ts';
import type { Context } from './cli/context.ts';
import { loadCommand } from './cli/load-command.ts';
import type { OptionValues } from './cli/options.ts';
import { plainQuestion } from './cli/plain-question.ts';
import { readLayers } from './cli/read-path.ts';
import { saveFile } from './cli/save-file.ts';
import { usageErrorText } from './cli/usage-error.ts';
import { writeOut } from './cli/write-out.ts';
import { decideFullScreen, decideGlyphs } from './term/ability.ts';

/** Filled in by the build; run from the sources, the version is that of no release. */
declare const HALFSPACE_VERSION: string | undefined;
const VERSION = typeof HALFSPACE_VERSION === 'string' ? HALFSPACE_VERSION : '0.0.0';

const FILE_TROUBLE = 4;
const NOT_UNDERSTOOD = 2;

/** The catalogue or a file cannot be read or written. */
class FileTrouble extends Error {}

function makeContext(options: OptionValues): Context {
  const known = new Map<string | undefined, IndexedCatalogue>();
  const quiet = options.quiet === true;
  const { env } = process;
  const catalogue = (ownFolder = options.catalog): IndexedCatalogue => {
    const loaded = known.get(ownFolder);
    if (loaded) return loaded;
    try {
      const { catalogue: opened, problems } = loadCatalogue({ ownFolder, env });
      if (!quiet) for (const p of problems) writeOut(2, `halfspace: ${ownProblemText(p)}\n`);
      known.set(ownFolder, opened);
      return opened;
    } catch (error) {
      if (error instanceof CatalogueFileError) throw new FileTrouble(`${error.message}; ${error.remedy}`);
      throw error;
    }
  };
  return {
    write: (text) => writeResult(text, options.output),
    print: (text) => writeOut(1, text),
    warn: (text) => void writeOut(2, text),
    version: VERSION,
    env,
    get stdinIsTTY() {
      return isatty(0);
    },
    get stdoutIsTTY() {
      return isatty(1);
    },
    get stderrIsTTY() {
      return isatty(2);
    },
    ascii: options.ascii === true || decideGlyphs(env) === 'ascii',
    catalogue,
    clock: () => {
      const now = new Date();
      return { now_ms: now.getTime(), offset_min: -now.getTimezoneOffset() };
    },
  };
}

function writeResult(text: string, file: string | undefined): void {
  if (file === undefined || file === '-') {
    writeOut(1, text);
    return;
  }
  const trouble = saveFile(file, text, { replace: true });
  if (trouble) throw new FileTrouble(`${trouble.message}; ${trouble.remedy}`);
}

function runCommand(invocation: Invocation, context: Context): number | Promise<number> {
  if (invocation.command === 'answer') return runAnswer(invocation, context);
  const { command } = invocation;
  return loadCommand(command).then((module) => module.run(invocation, context));
}

async function showHelp(topic: Parameters<typeof import('./cli/help.ts').helpText>[0]): Promise<number> {
  const { helpText } = await import('./cli/help.ts');
  writeOut(1, helpText(topic));
  return 0;
}

function showVersion(context: Context): number {
  const catalogue = context.catalogue();
  context.write(
    `halfspace ${VERSION}\ncatalogue ${catalogue.version}, ${catalogue.date}, ${catalogue.hash}\n`,
  );
  return 0;
}

const EXAMPLE = 'halfspace air fused-silica 633nm';

function openScreen(options: OptionValues, context: Context): number | Promise<number> {
  const { env, stdinIsTTY, stdoutIsTTY } = context;
  const decision = decideFullScreen({ env, stdinIsTTY, stdoutIsTTY, oneShotExample: EXAMPLE });
  if (!decision.allowed) {
    context.warn(`halfspace: ${decision.sentence}\nsee halfspace --help\n`);
    return NOT_UNDERSTOOD;
  }
  return import('./tui/main.tsx').then(({ runTui }) => runTui(options, { ...context, readLayers }));
}

function dispatch(): number | Promise<number> {
  const argv = process.argv.slice(2);
  if (argv.length === 0) return openScreen({}, makeContext({}));
  const plain = plainQuestion(argv);
  if (plain) return runCommand(plain, makeContext({}));
  const parsed = parseArguments(argv);
  switch (parsed.kind) {
    case 'error': {
      const ascii = decideGlyphs(process.env) === 'ascii';
      writeOut(2, usageErrorText(parsed.error, ascii));
      return NOT_UNDERSTOOD;
    }
    case 'help':
      return showHelp(parsed.topic);
    case 'version':
      return showVersion(makeContext({}));
    case 'screen':
      return openScreen(parsed.options, makeContext(parsed.options));
    case 'run':
      return runCommand(parsed.invocation, makeContext(parsed.invocation.options));
  }
}

/** No stack trace reaches a person unless asked for with HALFSPACE_DEBUG. */
function reportCrash(error: unknown): number {
  if (error instanceof FileTrouble) {
    writeOut(2, `halfspace: ${error.message}\n`);
    return FILE_TROUBLE;
  }
  const { code, syscall } = error as NodeJS.ErrnoException;
  if (syscall === 'write') {
    const why = code === 'ENOSPC' ? 'the disk is full' : String(code);
    writeOut(2, `halfspace: the answer cannot be written (${why}); make room, or write it elsewhere\n`);
    return FILE_TROUBLE;
  }
  const message = error instanceof Error ? error.message : String(error);
  const detail = process.env['HALFSPACE_DEBUG'] && error instanceof Error ? `${error.stack}\n` : '';
  writeOut(2, `halfspace: internal error: ${message}; please report it with the command you gave\n${detail}`);
  return 1;
}

try {
  const status = dispatch();
  // All is written by then (write-out.ts): nothing is gained by collecting garbage and taking the engine down in order.
  if (typeof status === 'number') process.exit(status);
  else status.then((s) => (process.exitCode = s)).catch((e: unknown) => (process.exitCode = reportCrash(e)));
} catch (error) {
  process.exitCode = reportCrash(error);
}
