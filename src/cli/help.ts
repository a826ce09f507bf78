/**
 * Help, made from the tables: examples first, then use, operands, options; at most 80 columns, plain ASCII, so that it
 * reads the same in any terminal and can be searched.
 */
import {
  type CommandName,
  type CommandSpec,
  commandSpec,
  type Example,
  namedCommands,
  optionsOf,
  UNNAMED_COMMAND,
} from './command-table.ts';
import { CONVENTION_NOTES } from './convention-notes.ts';
import { ENVIRONMENT } from './environment.ts';
import { EXIT_STATUSES } from './exit-status.ts';
import type { OptionGroup } from './option-spec.ts';
import { optionMeaning, optionTerm, usageLine } from './option-text.ts';
import { optionSpec } from './options.ts';
import { definition, wrapText } from './wrap-text.ts';

const WIDTH = 80;
const COLUMN = 26;

export const GROUP_TITLES: Readonly<Record<OptionGroup, string>> = {
  question: 'The question',
  path: 'Paths of layers',
  crystal: 'Crystals',
  coating: 'The coating',
  beam: 'The beam',
  selection: 'Choosing',
  fit: 'The fit',
  batch: 'Many questions',
  form: 'Form of the answer',
  output: 'Output',
  general: 'General',
};

/** Said where help ends and on the man page. */
export const BUGS =
  'Report a wrong number with its command line, the source that says otherwise and the output of halfspace --version, in the issue list of the place you got halfspace from.';

/** Help for one command, or for the program as a whole. */
export function helpText(topic?: CommandName): string {
  const lines = topic === undefined || topic === UNNAMED_COMMAND ? programHelp() : commandHelp(topic);
  return `${lines.join('\n')}\n`;
}

function programHelp(): string[] {
  const answer = commandSpec(UNNAMED_COMMAND);
  const commands = namedCommands();
  return [
    ...wrapText(`halfspace: ${answer.summary}, offline, every number with its source.`, WIDTH),
    ...section('Examples', examples(answer.examples)),
    ...section('Use', ['  halfspace', `  ${usageLine(answer)}`, '  halfspace COMMAND [options]']),
    '  Without operands the full-screen program starts.',
    ...section('Operands', operands(answer)),
    ...options(UNNAMED_COMMAND),
    ...section(
      'Commands',
      commands.flatMap((spec) => definition(spec.name, spec.summary, COLUMN, WIDTH)),
    ),
    '  halfspace help COMMAND tells more about one.',
    ...section('Conventions', CONVENTION_NOTES.flatMap(paragraph)),
    ...section('Exit status', pairs(EXIT_STATUSES)),
    ...section('Environment', pairs(ENVIRONMENT)),
    ...section('Bugs', paragraph(BUGS)),
  ];
}

function commandHelp(name: CommandName): string[] {
  const spec = commandSpec(name);
  return [
    ...wrapText(`halfspace ${name}: ${spec.summary}.`, WIDTH),
    ...section('Examples', examples(spec.examples)),
    ...section(
      'Use',
      wrapText(usageLine(spec), WIDTH - 2, '    ').map((line) => `  ${line}`),
    ),
    ...(spec.operands.length > 0 ? section('Operands', operands(spec)) : []),
    ...options(name),
    ...section('Exit status', pairs(EXIT_STATUSES)),
    '',
    '  halfspace --help tells about conventions, environment and bugs.',
  ];
}

function section(title: string, body: readonly string[]): string[] {
  return ['', title, ...body];
}

function paragraph(text: string): string[] {
  return wrapText(text, WIDTH - 2).map((line) => `  ${line}`);
}

function pairs(rows: readonly (readonly [string, string])[]): string[] {
  return rows.flatMap(([term, meaning]) => definition(term, meaning, COLUMN, WIDTH));
}

/** The meaning under the line, so that the line can be copied whole. */
function examples(rows: readonly Example[]): string[] {
  return rows.flatMap(({ line, meaning }) => [`  halfspace ${line}`, `      ${meaning}`]);
}

function operands(spec: CommandSpec): string[] {
  return spec.operands.flatMap(({ name, meaning }) => definition(name, meaning, COLUMN, WIDTH));
}

function options(name: CommandName): string[] {
  const specs = optionsOf(name)
    .map(optionSpec)
    .filter((spec) => !spec.hidden);
  return (Object.keys(GROUP_TITLES) as OptionGroup[]).flatMap((group) => {
    const own = specs.filter((spec) => spec.group === group);
    const rows = own.flatMap((spec) => definition(optionTerm(spec), optionMeaning(spec), COLUMN, WIDTH));
    return own.length > 0 ? section(GROUP_TITLES[group], rows) : [];
  });
}
