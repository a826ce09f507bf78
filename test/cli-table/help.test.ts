import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { parseArguments } from '../../src/cli/arguments.ts';
import { COMMAND_NAMES, COMMANDS, namedCommands, optionsOf } from '../../src/cli/command-table.ts';
import { ENVIRONMENT } from '../../src/cli/environment.ts';
import { EXIT_STATUSES } from '../../src/cli/exit-status.ts';
import { helpText } from '../../src/cli/help.ts';
import { optionSpec } from '../../src/cli/options.ts';
import { definition, wrapText } from '../../src/cli/wrap-text.ts';

const topics = [undefined, ...COMMAND_NAMES];

describe('help', () => {
  it.each(topics)('of %s fits 80 columns of printable ASCII and ends with one newline', (topic) => {
    const text = helpText(topic);
    expect(text).toMatch(/^[\x20-\x7e\n]+[^\n]\n$/);
    for (const line of text.split('\n')) {
      expect(line.length, line).toBeLessThanOrEqual(80);
      expect(line, line).not.toMatch(/\s$/);
    }
  });

  it.each(topics)('of %s begins with examples, then use, then options', (topic) => {
    const titles = helpText(topic)
      .split('\n')
      .filter((line) => /^[A-Z]/.test(line));
    expect(titles.slice(0, 2)).toEqual(['Examples', 'Use']);
    expect(titles.indexOf('General')).toBeGreaterThan(1);
    expect(titles).toContain('Exit status');
  });

  it.each(COMMAND_NAMES)('of %s shows every option it takes, with its meaning, and no hidden one', (name) => {
    const text = helpText(name).replace(/\s+/g, ' ');
    for (const key of optionsOf(name)) {
      const spec = optionSpec(key);
      expect(text.includes(`--${spec.name} `), spec.name).toBe(!spec.hidden);
      expect(text.includes(spec.meaning), spec.name).toBe(!spec.hidden);
    }
  });

  it('of the program names commands, conventions, statuses, environment and a place for bugs', () => {
    const text = helpText();
    for (const { name, summary } of namedCommands())
      expect(text).toMatch(new RegExp(`^  ${name} +${summary}$`, 'm'));
    for (const [status] of EXIT_STATUSES) expect(text).toContain(`\n  ${status} `);
    for (const [names] of ENVIRONMENT) expect(text).toContain(`\n  ${names}`);
    expect(text).toContain('exp(i(k r - w t))');
    expect(text).toContain('\nBugs\n');
  });

  it('names every environment variable that the sources read', () => {
    const root = fileURLToPath(new URL('../../src', import.meta.url));
    const sources = readdirSync(root, { recursive: true, encoding: 'utf8' }).filter((f) => /\.tsx?$/.test(f));
    const read = sources.flatMap((file) =>
      [
        ...readFileSync(join(root, file), 'utf8').matchAll(
          /(?<!delete )\benv(?:ironment)?(?:\.|\[')([A-Z][A-Z_]+)/g,
        ),
      ].map(([, name = '']) => name),
    );
    expect(read.length).toBeGreaterThan(15);
    const listed = ENVIRONMENT.flatMap(([names]) => names.split(', '));
    expect([...new Set(read)].filter((name) => !listed.includes(name))).toEqual([]);
    for (const name of listed) expect(helpText()).toContain(name);
  });

  it('gives examples that the parser takes as the command they belong to', () => {
    for (const { name, examples } of COMMANDS) {
      for (const { line } of examples) {
        const parsed = parseArguments(line.replace(/ [>|] .*/, '').split(' '));
        expect(helpText(name)).toContain(`  halfspace ${line}\n`);
        expect(parsed.kind === 'run' ? parsed.invocation.command : parsed.kind, line).toBe(name);
      }
    }
  });
});

describe('wrapping', () => {
  it('breaks at spaces, indents later lines and leaves long words whole', () => {
    expect(wrapText('one two three', 8, '  ')).toEqual(['one two', '  three']);
    expect(wrapText('a extraordinarily b', 6)).toEqual(['a', 'extraordinarily', 'b']);
    expect(wrapText('one\u00a0two three', 8)).toEqual(['one two', 'three']);
    expect(wrapText('', 8)).toEqual([]);
  });

  it('sets a term beside its meaning, or above it where the term is long', () => {
    expect(definition('-a', 'first second', 8, 16)).toEqual(['  -a    first', '        second']);
    expect(definition('--along', 'first', 8, 16)).toEqual(['  --along', '        first']);
  });
});
