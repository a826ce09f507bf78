/** One command line for every command of the table; a command without one is an error of the types. */
import type { CommandName } from '../../src/cli/command-table.ts';

/** The file oil.csv that the line of `fit` reads. */
export const POINTS = 'wavelength_nm,n\n400,1.47\n500,1.462\n600,1.458\n700,1.455\n';
const ROWS = 'from,into,wave_nm\nair,n-bk7,633\n';

/** A line for each command, so that each part of the program is loaded. */
export const LINES: Readonly<Record<CommandName, readonly string[]>> = {
  answer: ['air', 'fused-silica', '632.8nm', '--angle', '45'],
  cite: ['cite', 'fused-silica', '--bibtex'],
  material: ['material', 'n-bk7'],
  equivalent: ['equivalent', 'n-bk7'],
  find: ['find', 'n 1.5..1.52', 'at', '633nm'],
  match: ['match', 'n-bk7', '--at', '589nm', '--class', 'liquid'],
  compare: ['compare', 'n-bk7', 'fused-silica', '633nm'],
  'order-check': ['order-check', 'air', 'zinc-selenide@3mm', 'air', '10.6um'],
  fit: ['fit', 'oil.csv', '--model', 'cauchy', '--terms', '2'],
  coat: ['coat', 'air', 'n-bk7', '550nm'],
  crystal: ['crystal', 'air', 'calcite', '633nm', '--angle', '30'],
  stream: ['stream'],
  config: ['config'],
  log: ['log'],
  verify: ['verify'],
  help: ['help', 'coat'],
  completion: ['completion', 'bash'],
  man: ['man'],
};
/** What the line reads from standard input. */
export const INPUT: Readonly<Partial<Record<CommandName, string>>> = { stream: ROWS };
