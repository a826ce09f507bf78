import { spawnSync } from 'node:child_process';
import { chmodSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Invocation } from '../../src/cli/arguments.ts';
import { namedCommands } from '../../src/cli/command-table.ts';
import { run } from '../../src/cli/commands/completion.ts';
import { completionScript, SHELLS } from '../../src/cli/completion.ts';
import { allOptions, optionsOfCommand, spellings } from '../../src/cli/completion-words.ts';
import type { Context } from '../../src/cli/context.ts';

const KEYS = ['air', 'fused-silica', 'sapphire', 'silicon'];
const everyOption = optionsOfCommand('answer').flatMap(spellings);
const ofMan = optionsOfCommand('man').flatMap(spellings);
const commandNames = namedCommands().map((command) => command.name);
const has = (shell: string): boolean => spawnSync(shell, ['--version']).status === 0;

let folder = '';
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'completion-'));
  // Stands in for the program: answers `completion --names PREFIX` and nothing else.
  const program = join(folder, 'halfspace');
  writeFileSync(
    program,
    `#!/bin/sh\n[ "$1 $2" = "completion --names" ] && printf '%s\\n' ${KEYS.join(' ')} | grep "^$3"\n`,
  );
  chmodSync(program, 0o755);
  for (const shell of SHELLS) writeFileSync(join(folder, `script.${shell}`), completionScript(shell));
  mkdirSync(join(folder, 'files', 'folder'), { recursive: true });
  writeFileSync(join(folder, 'files', 'two words.json'), '');
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

function shell(name: string, args: readonly string[]): string[] {
  const env = {
    ...process.env,
    PATH: `${folder}:${process.env['PATH'] ?? ''}`,
    HOME: folder,
    XDG_CONFIG_HOME: folder,
  };
  const { stdout, stderr } = spawnSync(name, args, { encoding: 'utf8', cwd: join(folder, 'files'), env });
  expect(stderr).toBe('');
  return stdout.split('\n').filter((line) => line !== '');
}

type Row = [line: string, offered: readonly string[]];

const ROWS: Row[] = [
  ['halfspace s', [...commandNames.filter((name) => name.startsWith('s')), 'sapphire', 'silicon']],
  ['halfspace he', ['help']],
  ['halfspace air fu', ['fused-silica']],
  ['halfspace air --angle 45 fu', ['fused-silica']],
  ['halfspace --po', ['--pol', '--power']],
  ['halfspace --pol ', ['s', 'p', 'unpolarized']],
  ['halfspace air --color n', ['never']],
  ['halfspace --angle ', []],
  ['halfspace completion ', ['bash', 'zsh', 'fish']],
  ['halfspace -q completion z', ['zsh']],
  ['halfspace help compl', ['completion']],
  ['halfspace man x', []],
];

describe('bash', () => {
  const complete = (line: string) =>
    shell('bash', [
      '--norc',
      '-c',
      'source "$1"; COMP_LINE=$2 COMP_POINT=${#2}; _halfspace; printf "%s\\n" "${COMPREPLY[@]}"',
      'bash',
      join(folder, 'script.bash'),
      line,
    ]);

  it.each<Row>([
    ...ROWS,
    ['halfspace -', everyOption],
    ['halfspace man -', ofMan],
    ['halfspace --pol=u', ['unpolarized']],
    ['halfspace ', commandNames],
    ['halfspace -o two', ['two words.json']],
    ['halfspace --catalog=f', ['folder']],
  ])('%j', (line, offered) => {
    expect(complete(line)).toEqual(offered);
  });

  it('registers itself for the program', () => {
    const line = shell('bash', [
      '--norc',
      '-c',
      'source "$1"; complete -p halfspace',
      'bash',
      join(folder, 'script.bash'),
    ]);
    expect(line).toEqual(['complete -F _halfspace halfspace']);
  });
});

describe.runIf(has('zsh'))('zsh', () => {
  // The functions of zsh's completion system, replaced by ones that print what they are given.
  const stubs = `
    compdef() { :; }
    compset() { cur=\${cur#*=}; }
    compadd() { shift; print -rl -- \${(M)@:#$cur*}; }
    _message() { :; }
    _files() { print -r -- "files $*"; }
    _describe() { [[ $1 == -o ]] && shift; local w; for w in \${(P)2}; do [[ $w == $cur* ]] && print -r -- \${w%%:*}; done; }
    source "$1"
    words=(\${(s: :)2}); [[ $2 == *' ' ]] && words+=(''); CURRENT=\${#words}; cur=\${words[CURRENT]}
    _halfspace || true`;
  const complete = (line: string) =>
    shell('zsh', ['-f', '-c', stubs, 'zsh', join(folder, 'script.zsh'), line]);

  it.each<Row>([
    ...ROWS,
    ['halfspace -', everyOption],
    ['halfspace man -', ofMan],
    ['halfspace --pol=u', ['unpolarized']],
    ['halfspace ', commandNames],
    ['halfspace -o two', ['files ']],
    ['halfspace --catalog f', ['files -/']],
  ])('%j', (line, offered) => {
    expect(complete(line)).toEqual(offered);
  });
});

describe.runIf(has('fish'))('fish', () => {
  const complete = (line: string) =>
    shell('fish', [
      '--no-config',
      '-c',
      'source $argv[1]; complete -C $argv[2]',
      join(folder, 'script.fish'),
      line,
    ]).map((row) => row.replace(/\t.*/, '').replaceAll('\\', ''));

  it.each<Row>([
    ...ROWS,
    [
      'halfspace --',
      allOptions()
        .filter((spec) => everyOption.includes(`--${spec.name}`))
        .map((spec) => `--${spec.name}`),
    ],
    ['halfspace man --', optionsOfCommand('man').map((spec) => `--${spec.name}`)],
    ['halfspace --pol=u', ['--pol=unpolarized']],
    ['halfspace ', [...commandNames, ...KEYS]],
    ['halfspace -o two', ['two words.json']],
  ])('%j', (line, offered) => {
    expect(complete(line).toSorted()).toEqual(offered.toSorted());
  });
});

describe('the completion command', () => {
  async function outcome(operands: readonly string[], options: Invocation['options'] = {}) {
    const written = { out: '', err: '' };
    const context = {
      ascii: false,
      write: (text: string) => {
        written.out += text;
      },
      warn: (text: string) => {
        written.err += text;
      },
      catalogue: () => ({ keys: () => KEYS }),
    };
    // The command touches nothing else of its context.
    const invocation = { command: 'completion', operands, options, given: [] } as const;
    const status = await run(invocation, context as unknown as Context);
    return { status, ...written };
  }

  it.each(SHELLS)('prints the script of %s', async (name) => {
    expect(await outcome([name])).toEqual({ status: 0, out: completionScript(name), err: '' });
  });

  it('lists the keys that begin with a prefix, any case', async () => {
    expect(await outcome([], { names: 'S' })).toEqual({ status: 0, out: 'sapphire\nsilicon\n', err: '' });
    expect(await outcome([], { names: 'zz' })).toEqual({ status: 0, out: '', err: '' });
  });

  it('refuses other shells', async () => {
    const see = '\nsee halfspace completion --help\n';
    expect(await outcome(['tcsh'])).toEqual({
      status: 2,
      out: '',
      err: `halfspace: "tcsh" is not a shell known here; write bash, zsh or fish${see}`,
    });
    expect(await outcome([])).toEqual({
      status: 2,
      out: '',
      err: `halfspace: SHELL missing; write bash, zsh or fish${see}`,
    });
  });
});
