import { spawnSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';
import { optionsOf } from '../../src/cli/command-table.ts';
import { manPage } from '../../src/cli/man.ts';
import { optionSpec } from '../../src/cli/options.ts';
import { roffArgument, roffText } from '../../src/cli/roff.ts';

const page = manPage('1.2.3');
const groff = (...options: string[]) =>
  spawnSync('groff', ['-man', ...options], { input: page, encoding: 'utf8' });
const hasGroff = spawnSync('groff', ['--version']).status === 0;

describe('the manual page', () => {
  it('has the sections people look for, in the usual order', () => {
    const sections = [...page.matchAll(/^\.SH (.*)$/gm)].map((match) => match[1]);
    expect(sections).toEqual([
      'NAME',
      'SYNOPSIS',
      'DESCRIPTION',
      'EXAMPLES',
      'OPERANDS',
      'OPTIONS',
      'COMMANDS',
      'CONVENTIONS',
      'EXIT STATUS',
      'ENVIRONMENT',
      'FILES',
      'STANDARDS',
      'BUGS',
    ]);
  });

  it('says which release it belongs to', () => {
    expect(page).toMatch(/^\.TH "HALFSPACE" "1" "" "halfspace 1.2.3" "User Commands"\n/);
  });

  it('has a line that indexes can read', () => {
    expect(page).toContain('.SH NAME\nhalfspace \\- what a wave does');
  });

  it('describes every option of a question', () => {
    for (const key of optionsOf('answer')) {
      const { name } = optionSpec(key);
      expect(page, name).toContain(`\\-\\-${name.replaceAll('-', '\\-')}`);
    }
  });

  it('has no line that roff would take for a request by accident', () => {
    const requests = page.split('\n').filter((line) => /^[.']/.test(line));
    for (const line of requests) expect(line).toMatch(/^\.(TH|SH|SS|PP|TP|B|nf|fi)( |$)/);
    expect(page).toMatch(/^[\x20-\x7e\n]+$/);
  });

  it.runIf(hasGroff)('is formatted without a warning, options as they are typed', () => {
    const { stdout, stderr } = groff('-Tascii', '-ww', '-P-cbou');
    expect(stderr).toBe('');
    expect(stdout).toContain('--air-wavelength');
    expect(stdout).toContain("outside a fit's range");
    expect(stdout).toContain('exp(i(k r - w t))');
    expect(stdout).toContain('1/e^2');
  });
});

describe('roff text', () => {
  it.each<[string, string]>([
    ['a-b', 'a\\-b'],
    ['.start', '\\&.start'],
    ["'start'", '\\(aqstart\\(aq'],
    ['back\\slash', 'back\\eslash'],
    ['1/e^2 ~ `x`', '1/e\\(ha2 \\(ti \\(gax\\(ga'],
  ])('%j', (text, roff) => {
    expect(roffText(text)).toBe(roff);
  });

  it('quotes arguments', () => {
    expect(roffArgument('say "x"')).toBe('"say \\(dqx\\(dq"');
  });
});
