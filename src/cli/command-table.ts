/**
 * The one table of commands. To add one: add its row here, write `commands/<name>.ts` exporting `run`, and register it in
 * load-command.ts. Help, man page, completions and the argument parser follow by themselves.
 */

import { DESIGN_COMMANDS } from './design-commands.ts';
import { LOG_COMMANDS } from './log-commands.ts';
import { OPTION_KEYS, type OptionKey, optionSpec } from './options.ts';
import { SELECTION_COMMANDS } from './selection-commands.ts';

export interface OperandSpec {
  /** In help: `FROM`. */
  readonly name: string;
  /** One phrase without a full stop, ASCII. */
  readonly meaning: string;
  readonly optional?: true;
  /** May be repeated. */
  readonly many?: true;
  /** The wave, which is left out where it is swept. */
  readonly unlessSwept?: true;
  readonly completes?: 'medium' | 'command' | 'file' | readonly string[];
}

export interface Example {
  /** Without the program's name. */
  readonly line: string;
  readonly meaning: string;
}

export interface CommandSpec {
  readonly name: string;
  /** The command run where none is named. */
  readonly unnamed?: true;
  /** One phrase without a full stop, ASCII. */
  readonly summary: string;
  readonly operands: readonly OperandSpec[];
  /** Beside those taken everywhere. */
  readonly options: readonly OptionKey[];
  readonly examples: readonly Example[];
  readonly hidden?: true;
}

/** Option sets for rows to spread. */
export const QUESTION_OPTIONS = [
  'angle_rad',
  'polarization',
  'airWavelength',
  'temperature_K',
  'pressure_Pa',
  'humidity',
  'co2_ppm',
  'salinity_g_per_kg',
  'composition',
  'tolerances',
  'extrapolate',
  'catalog',
] as const satisfies readonly OptionKey[];

export const BEAM_OPTIONS = [
  'power_W',
  'beamDiameter_m',
  'profile',
  'irradiance_W_per_m2',
  'field_V_per_m',
  'pulseDuration_s',
  'pulseEnergy_J',
  'repetition_Hz',
  'nonlinearIndex',
] as const satisfies readonly OptionKey[];

/** Of paths of layers. */
export const PATH_OPTIONS = [
  'designWave',
  'coherenceLength_m',
  'linewidth',
  'fieldProfile',
  'cutAngle_rad',
  'cutAzimuth_rad',
  'retardance_waves',
] as const satisfies readonly OptionKey[];

export const FORM_OPTIONS = ['json', 'csv', 'markdown', 'plain'] as const satisfies readonly OptionKey[];

/** Options that start the full-screen program where no operand is given. */
export const SCREEN_OPTIONS = [
  'quiet',
  'color',
  'noColor',
  'ascii',
  'linear',
  'catalog',
  'logFile',
] as const satisfies readonly OptionKey[];

const MEDIUM =
  'a key, name, alias, formula or glass code, any case; KEY:AXIS for a crystal axis; or numbers: n=1.5, n=1.5+0.02i, no=1.658,ne=1.486, eps=9.8, eps=2.1,tand=0.0003, eps=4,sigma=0.01';

export const COMMANDS = [
  {
    name: 'answer',
    unnamed: true,
    summary: 'what a wave does at the interface between two media',
    operands: [
      { name: 'FROM', meaning: `medium of incidence: ${MEDIUM}`, completes: 'medium' },
      {
        name: 'LAYER',
        meaning:
          'a layer between them, MEDIUM@THICKNESS: magnesium-fluoride@100nm, n=1.38@qw (a quarter wave), hw (a half); 8x: LAYER LAYER : repeats the layers between 8x: and the colon',
        optional: true,
        many: true,
        completes: 'medium',
      },
      { name: 'INTO', meaning: 'medium beyond', completes: 'medium' },
      {
        name: 'WAVE',
        meaning: '633nm, 10.6um, 474THz, 10GHz, 1.96eV, 15800cm-1, d-line',
        unlessSwept: true,
      },
    ],
    options: [
      ...QUESTION_OPTIONS,
      ...PATH_OPTIONS,
      ...BEAM_OPTIONS,
      ...FORM_OPTIONS,
      'sweeps',
      'columns',
      'digits',
      'plot',
      'span',
      'svg',
      'log',
      'logFile',
      'strict',
    ],
    examples: [
      { line: 'air fused-silica 633nm', meaning: 'normal incidence, one answer as text' },
      { line: 'air sapphire:o 1064nm --angle 45 --pol p', meaning: 'ordinary ray, p polarization' },
      { line: 'water n=1.38+0.001i 474THz --json', meaning: 'a medium by its numbers, for a script' },
      { line: 'vacuum eps=9.8,tand=0.0003 10GHz', meaning: 'a radio wave' },
      { line: 'air znse 10.6um --power 30W --beam 6mm', meaning: 'fields and irradiance too' },
      { line: 'air magnesium-fluoride-film@qw n-bk7 550nm', meaning: 'a quarter-wave film' },
      { line: 'air fused-silica@5mm air 800nm --pulse 30fs', meaning: 'a window, and what a pulse suffers' },
      { line: 'air 8x: n=2.3@qw n=1.46@qw : n-bk7 633nm', meaning: 'a mirror of eight pairs' },
      { line: 'air n-bk7 --sweep wave=400nm..700nm:5nm', meaning: 'a table over the wave, as CSV' },
      { line: 'n-bk7 air 633nm --plot angle', meaning: 'a chart: R_s and R_p over the angle' },
    ],
  },
  {
    name: 'cite',
    summary: 'the works behind the numbers of a medium',
    operands: [
      {
        name: 'MEDIUM',
        meaning: 'media as in a question, or ids of works',
        many: true,
        completes: 'medium',
      },
    ],
    options: ['text', 'bibtex', 'csl', 'json', 'plain', 'catalog'],
    examples: [
      { line: 'cite fused-silica', meaning: 'every work, and which fit it is the source of' },
      { line: 'cite sapphire:o air --bibtex -o media.bib', meaning: 'one axis of a crystal, and air' },
      { line: 'cite malitson-1965-interspecimen --csl', meaning: 'one work, for a reference manager' },
    ],
  },
  {
    name: 'material',
    summary: 'all the catalogue holds of one material',
    operands: [
      {
        name: 'NAME',
        meaning: 'as in a question; the words of a name need no quotation marks',
        many: true,
        completes: 'medium',
      },
    ],
    options: ['full', 'json', 'markdown', 'catalog'],
    examples: [
      { line: 'material fused-silica', meaning: 'names, index at known lines, fits, sources, handling' },
      { line: 'material stainless-steel', meaning: 'reflectance of samples that have no optical constants' },
      { line: 'material n-bk7 --full', meaning: 'coefficients and every row of absorption too' },
    ],
  },
  {
    name: 'equivalent',
    summary: 'glasses that may stand in for one',
    operands: [
      {
        name: 'GLASS',
        meaning: 'a name, or a code of six digits: 517642 is n_d 1.517, V_d 64.2',
        many: true,
        completes: 'medium',
      },
    ],
    options: ['maker', 'within', 'abbeRange', 'json', 'csv', 'catalog'],
    examples: [
      { line: 'equivalent n-bk7', meaning: 'the nearest glasses of other makers' },
      { line: 'equivalent 517642', meaning: 'the glasses that bear the code, and their neighbours' },
      {
        line: 'equivalent n-sf11 --maker ohara --within 0.002',
        meaning: 'all of one maker with n_d so near',
      },
    ],
  },
  {
    name: 'fit',
    summary: 'a dispersion formula fitted to measured indices',
    operands: [
      {
        name: 'FILE',
        meaning:
          'table with a header line: wavelength_nm or wavelength_um, n, and u (standard uncertainty of n) where it is known; - is standard input',
        completes: 'file',
      },
    ],
    options: [
      'model',
      'terms',
      'reference',
      'temperature_K',
      'key',
      'entryName',
      'entrySource',
      'force',
      'json',
      'strict',
      'catalog',
    ],
    examples: [
      { line: 'fit oil.csv --model cauchy --terms 3', meaning: 'coefficients, residuals, doubts' },
      {
        line: 'fit oil.csv --terms 2 --temperature 25C -o my-oil.json',
        meaning: 'the entry to FILE, what is said of it to standard output',
      },
      { line: 'fit oil.csv --key my-oil -o - > my-oil.json', meaning: 'the entry alone' },
    ],
  },
  {
    name: 'stream',
    summary: 'a question a row: CSV or JSON lines in, answers out',
    operands: [
      {
        name: 'FILE',
        meaning:
          'CSV with a header that names the columns: from, into or path, wave_nm or wave, and any option of a question: angle_deg, pol, temperature_C, power_mW; - is standard input',
        optional: true,
        many: true,
        completes: 'file',
      },
    ],
    options: [
      'fixedFrom',
      'fixedInto',
      'fixedPath',
      'fixedWave',
      'columns',
      'digits',
      ...QUESTION_OPTIONS,
      ...PATH_OPTIONS,
      ...BEAM_OPTIONS,
      'json',
      'csv',
      'full',
    ],
    examples: [
      { line: 'stream questions.csv > answers.csv', meaning: 'each row with its answers behind it' },
      { line: 'stream --from air --into n-bk7 --columns n,R < waves.csv', meaning: 'only the wave varies' },
      { line: 'stream --json < questions.jsonl', meaning: 'one JSON object a line, in and out' },
      { line: 'stream --columns list', meaning: 'every column of answers with its meaning' },
    ],
  },
  {
    name: 'verify',
    summary: 'every published value of the catalogue, recomputed',
    operands: [],
    options: ['full', 'json', 'csv', 'catalog'],
    examples: [
      { line: 'verify', meaning: 'how many agree, and the worst of each grade; status 1 if one does not' },
      { line: 'verify --full', meaning: 'every value beside its source' },
      { line: 'verify --csv -o checks.csv', meaning: 'the same for a spreadsheet' },
    ],
  },
  ...SELECTION_COMMANDS,
  ...LOG_COMMANDS,
  ...DESIGN_COMMANDS,
  {
    name: 'config',
    summary: 'each setting, its value and where that comes from',
    operands: [],
    options: ['json', 'catalog'],
    examples: [{ line: 'config', meaning: 'settings in force, and where files are' }],
  },
  {
    name: 'help',
    summary: 'help for the program or for one command',
    operands: [{ name: 'COMMAND', meaning: 'the command to explain', optional: true, completes: 'command' }],
    options: [],
    examples: [{ line: 'help completion', meaning: 'help for one command' }],
  },
  {
    name: 'completion',
    summary: 'completions for a shell, to be sourced by it',
    operands: [
      { name: 'SHELL', meaning: 'bash, zsh or fish', optional: true, completes: ['bash', 'zsh', 'fish'] },
    ],
    options: ['names', 'catalog'],
    examples: [
      { line: 'completion bash > halfspace.bash', meaning: 'for bash; source the file in ~/.bashrc' },
      { line: 'completion zsh > _halfspace', meaning: 'for zsh; put the file in a folder of fpath' },
      { line: 'completion fish > halfspace.fish', meaning: 'for fish; put it in ~/.config/fish/completions' },
    ],
  },
  {
    name: 'man',
    summary: 'the manual page, in roff',
    operands: [],
    options: [],
    examples: [{ line: 'man | man -l -', meaning: 'read it' }],
  },
] as const satisfies readonly CommandSpec[];

export type CommandName = (typeof COMMANDS)[number]['name'];

export const COMMAND_NAMES: readonly CommandName[] = COMMANDS.map((command) => command.name);

export const UNNAMED_COMMAND: CommandName = 'answer';

export function isCommandName(text: string): text is CommandName {
  return COMMAND_NAMES.some((name) => name === text);
}

export function commandSpec(name: CommandName): CommandSpec {
  const found: CommandSpec | undefined = COMMANDS.find((command) => command.name === name);
  if (!found) throw new RangeError(`no row for the command ${name}`);
  return found;
}

/** The commands that are listed: all but the unnamed and the hidden ones. */
export function namedCommands(): readonly CommandSpec[] {
  const all: readonly CommandSpec[] = COMMANDS;
  return all.filter((command) => !command.unnamed && !command.hidden);
}

/** Every option the command takes, in the order of the table of options. */
export function optionsOf(name: CommandName): readonly OptionKey[] {
  const own = commandSpec(name).options;
  return OPTION_KEYS.filter((key) => optionSpec(key).everywhere === true || own.includes(key));
}

/** Commands that take the option. */
export function commandsWith(key: OptionKey): readonly CommandName[] {
  return COMMAND_NAMES.filter((name) => optionsOf(name).includes(key));
}
