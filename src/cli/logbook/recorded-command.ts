/**
 * The command line that asks a question again, for its record: long options only, what was given and nothing else, media by
 * their keys, and with it everything that the answer owes to the place it was asked in (own entries, signs).
 * Left out is what only says where the output goes. Run with the same versions it prints the same bytes.
 */
import { resolve } from 'node:path';
import type { IndexedCatalogue } from '../../catalog/entries.ts';
import { ownFolderPath } from '../../catalog/own-folder.ts';
import { isRefusal } from '../../medium/refusal.ts';
import { decideLinear } from '../../term/ability.ts';
import type { Invocation } from '../arguments.ts';
import { isCommandName } from '../command-table.ts';
import type { Context } from '../context.ts';
import { findMedium } from '../find-medium.ts';
import { type OptionKey, optionSpec } from '../options.ts';
import type { GivenOption } from '../read-options.ts';
import { isGroupMark } from '../read-path.ts';

/** Where the output goes, how loud the program is, how it colours what it never writes into a record. */
const LEFT_OUT: readonly OptionKey[] = [
  'log',
  'logFile',
  'output',
  'quiet',
  'color',
  'noColor',
  'noInput',
  'catalog',
];

/** `usesOwn`: a medium of the question is an entry of the person's own. */
export function recordedCommand(
  { operands, given, options }: Invocation,
  context: Pick<Context, 'ascii' | 'env'>,
  catalogue: IndexedCatalogue,
  usesOwn: boolean,
): readonly string[] {
  const words = operands.map((word, i) =>
    i === operands.length - 1 ? word : canonicalWord(word, catalogue),
  );
  const kept = unrepeated(given).filter(
    ({ key, text }) => !LEFT_OUT.includes(key) && !(key === 'svg' && text !== '-'),
  );
  const has = (key: OptionKey): boolean => kept.some((option) => option.key === key);
  const added: GivenOption[] = [];
  if (usesOwn) added.push({ key: 'catalog', text: resolve(options.catalog ?? ownFolderPath(context.env)) });
  // What the locale or a variable decided is said in so many words.
  if (context.ascii && !has('ascii')) added.push({ key: 'ascii' });
  if (has('plot') && !has('linear') && decideLinear(context.env)) added.push({ key: 'linear' });
  const optionWords = [...kept, ...added].flatMap(wordsOf);
  const [first = ''] = words;
  const needsDashes = isCommandName(first) || words.some((word) => word.startsWith('-'));
  return needsDashes
    ? ['halfspace', ...optionWords, '--', ...words]
    : ['halfspace', ...words, ...optionWords];
}

/** A medium by its key, whatever it was called; a thickness and the marks of groups as typed. */
function canonicalWord(word: string, catalogue: IndexedCatalogue): string {
  if (isGroupMark(word)) return word;
  const [name = '', ...thickness] = word.split('@');
  const medium = findMedium(name, catalogue);
  if (isRefusal(medium)) return word;
  const { text } =
    medium.kind === 'literal'
      ? medium
      : { text: medium.material.key + (medium.axis === undefined ? '' : `:${medium.axis}`) };
  return [text, ...thickness].join('@');
}

/** An option that takes one value may be given twice with the same. */
function unrepeated(given: readonly GivenOption[]): readonly GivenOption[] {
  return given.filter(({ key }, i) => {
    const spec = optionSpec(key);
    const mayRepeat = spec.kind === 'value' && spec.repeatable === true;
    return mayRepeat || given.findIndex((other) => other.key === key) === i;
  });
}

function wordsOf({ key, text }: GivenOption): readonly string[] {
  const name = `--${optionSpec(key).name}`;
  if (text === undefined) return [name];
  return text.startsWith('-') || text === '' ? [`${name}=${text}`] : [name, text];
}
