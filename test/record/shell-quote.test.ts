/** Quoted words come back from a real shell as they were, on one line or over several, also from the forms of a record. */
import { spawnSync } from 'node:child_process';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { recordMarkdown } from '../../src/record/record-markdown.ts';
import { recordText } from '../../src/record/record-text.ts';
import { quoteForShell, shellCommand, shellCommandLines } from '../../src/record/shell-quote.ts';
import { FULL_RECORD } from './full-record.ts';
import { sampleRecord } from './sample-record.ts';

/** The words that `sh` makes of commands; each command starts with `show`, which prints its words. */
function wordsFromShell(commands: readonly string[]): string[][] {
  const show = `show() { printf '%s\\036' "$@"; printf '\\035'; }`;
  const run = spawnSync('sh', ['-c', [show, ...commands].join('\n')], {
    encoding: 'utf8',
    maxBuffer: 2 ** 26,
  });
  expect(run.stderr).toBe('');
  return run.stdout
    .split('\x1d')
    .slice(0, -1)
    .map((words) => words.split('\x1e').slice(0, -1));
}

const word = fc
  .oneof(
    fc.string({ unit: 'binary', maxLength: 12 }),
    fc.string({
      unit: fc.constantFrom(...` \t\n'"\\$\`!*?[]{}()<>|&;~#=%-a0µ`),
      maxLength: 12,
    }),
  )
  .map((text) => text.replace(/[\0\x1d\x1e\p{Cs}]/gu, ''));

describe('quoting for a shell', () => {
  it('comes back from sh word for word', () => {
    const commands = fc.sample(fc.array(word, { minLength: 1, maxLength: 8 }), 400);
    const single = commands.map((words) => `show ${shellCommand(words)}`);
    expect(wordsFromShell(single)).toEqual(commands);
    const broken = commands.map((words) => shellCommandLines(['show', ...words], 20).join('\n'));
    expect(wordsFromShell(broken)).toEqual(commands);
  });

  it('leaves harmless words bare and quotes the rest', () => {
    expect(shellCommand(['halfspace', 'sapphire:o', 'n=1.5', '633nm', '--temperature', '-40'])).toBe(
      'halfspace sapphire:o n=1.5 633nm --temperature -40',
    );
    expect(['', "it's", 'a b', '~', '=x', 'eps=9.8+0.01i,mu=1.2', '10.6µm', 'a*'].map(quoteForShell)).toEqual(
      ["''", "'it'\\''s'", "'a b'", "'~'", "'=x'", 'eps=9.8+0.01i,mu=1.2', "'10.6µm'", "'a*'"],
    );
    expect(() => quoteForShell('a\0b')).toThrow(RangeError);
  });

  it('breaks a long command between words, within the width', () => {
    const words = ['halfspace', 'air', 'fused-silica', '632.8nm', '--angle', '45deg', '--pol', 'p'];
    const lines = shellCommandLines(words, 30);
    expect(lines).toEqual(['halfspace air fused-silica \\', '    632.8nm --angle 45deg \\', '    --pol p']);
  });

  it('works as pasted from the text and from the Markdown form', () => {
    const named = [FULL_RECORD, sampleRecord('x')].map((record) => ({
      ...record,
      commandWords: ['show', ...record.commandWords],
    }));
    for (const record of named) {
      const text = recordText(record);
      const fromText = text.slice(text.indexOf('To ask again\n') + 13);
      const fromMarkdown = recordMarkdown(record).replace(/^.*```sh\n|```\n$/gs, '');
      expect(wordsFromShell([fromText, fromMarkdown])).toEqual([
        record.commandWords.slice(1),
        record.commandWords.slice(1),
      ]);
    }
  });
});
