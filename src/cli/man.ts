/** The manual page, halfspace(1), made from the same tables as help; roff with the man macros. */
import { type CommandSpec, commandSpec, namedCommands, optionsOf, UNNAMED_COMMAND } from './command-table.ts';
import { CONVENTION_NOTES } from './convention-notes.ts';
import { ENVIRONMENT } from './environment.ts';
import { EXIT_STATUSES } from './exit-status.ts';
import { BUGS, GROUP_TITLES } from './help.ts';
import type { OptionGroup } from './option-spec.ts';
import { optionMeaning, optionTerm, usageLine } from './option-text.ts';
import { OPTION_KEYS, type OptionKey, optionSpec } from './options.ts';
import { roffArgument, roffText } from './roff.ts';

const DESCRIPTION = [
  'Tells what a wave does at the interface between two media: index, speeds and wavelength in each, reflection and transmission, the angles where reflection vanishes or becomes total, fields and irradiance on both sides, each number with its source and to the digits the source supports.',
  'Without operands the full-screen program starts, if standard input and output are a terminal.',
];

const FILES: readonly (readonly [string, string])[] = [
  ['$XDG_CONFIG_HOME/halfspace/', 'settings'],
  [
    '$XDG_STATE_HOME/halfspace/',
    'the logbook: a file of JSON lines that only grows. On a network file system let the programs of one machine write one logbook: from several machines at once, records can overwrite each other',
  ],
];

const STANDARDS =
  'Options follow the utility syntax guidelines of POSIX.1-2017 (XBD 12.2), with long options. Units and their writing: SI Brochure, 9th edition; quantities and symbols: ISO 80000-6 and -7; uncertainty: JCGM 100:2008 (GUM); reference lines: ISO 7944; time stamps: RFC 3339; folders: XDG Base Directory Specification.';

export function manPage(version: string): string {
  const commands = namedCommands();
  const answer = commandSpec(UNNAMED_COMMAND);
  const title = ['HALFSPACE', '1', '', `halfspace ${version}`, 'User Commands'];
  const lines = [
    `.TH ${title.map(roffArgument).join(' ')}`,
    '.SH NAME',
    roffText(`halfspace - ${answer.summary}`),
    '.SH SYNOPSIS',
    '.nf',
    ...['halfspace', usageLine(answer), ...commands.map(usageLine)].map(roffText),
    '.fi',
    '.SH DESCRIPTION',
    ...paragraphs(DESCRIPTION),
    '.SH EXAMPLES',
    ...answer.examples.flatMap(({ line, meaning }) => tagged(`halfspace ${line}`, meaning)),
    '.SH OPERANDS',
    ...answer.operands.flatMap(({ name, meaning }) => tagged(name, meaning)),
    '.SH OPTIONS',
    ...optionGroups(optionsOf(UNNAMED_COMMAND)),
    '.SH COMMANDS',
    ...commands.flatMap(commandEntry),
    '.SH CONVENTIONS',
    ...paragraphs(CONVENTION_NOTES),
    '.SH EXIT STATUS',
    ...EXIT_STATUSES.flatMap(([status, meaning]) => tagged(status, meaning)),
    '.SH ENVIRONMENT',
    ...ENVIRONMENT.flatMap(([names, meaning]) => tagged(names, meaning)),
    '.SH FILES',
    ...FILES.flatMap(([file, meaning]) => tagged(file, meaning)),
    '.SH STANDARDS',
    roffText(STANDARDS),
    '.SH BUGS',
    roffText(BUGS),
  ];
  return `${lines.join('\n')}\n`;
}

function paragraphs(texts: readonly string[]): string[] {
  return texts.flatMap((text) => ['.PP', roffText(text)]);
}

function tagged(term: string, text: string): string[] {
  return ['.TP', `.B ${roffText(term)}`, roffText(text)];
}

function optionGroups(keys: readonly OptionKey[]): string[] {
  const specs = OPTION_KEYS.filter((key) => keys.includes(key))
    .map(optionSpec)
    .filter((spec) => !spec.hidden);
  return (Object.keys(GROUP_TITLES) as OptionGroup[]).flatMap((group) => {
    const own = specs.filter((spec) => spec.group === group);
    const entries = own.flatMap((spec) => tagged(optionTerm(spec), optionMeaning(spec)));
    return own.length > 0 ? [`.SS ${GROUP_TITLES[group]}`, ...entries] : [];
  });
}

function commandEntry(spec: CommandSpec): string[] {
  const own = spec.options.map(optionSpec).filter((option) => !option.hidden);
  const options = own.length > 0 ? [`Takes ${own.map((option) => `--${option.name}`).join(', ')}.`] : [];
  const operands = spec.operands.map(({ name, meaning }) => `${name}: ${meaning}.`);
  return tagged(usageLine(spec), [`${spec.summary}.`, ...operands, ...options].join(' '));
}
