import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Invocation, type ParsedArguments, parseArguments } from '../../src/cli/arguments.ts';
import { COMMAND_NAMES } from '../../src/cli/command-table.ts';
import { OPTION_KEYS, optionSpec } from '../../src/cli/options.ts';
import { usageErrorText } from '../../src/cli/usage-error.ts';

const parse = (line: string): ParsedArguments => parseArguments(line === '' ? [] : line.split(' '));

function run(...argv: string[]): Invocation {
  const parsed = parseArguments(argv);
  if (parsed.kind === 'error') throw new Error(parsed.error.message);
  if (parsed.kind !== 'run') throw new Error(parsed.kind);
  return parsed.invocation;
}

function failure(line: string): string {
  const parsed = parse(line);
  return parsed.kind === 'error'
    ? `${parsed.error.code}: ${parsed.error.message}; ${parsed.error.remedy}`
    : parsed.kind;
}

describe('options and operands in any order', () => {
  it.each([
    'air bk7 633nm --angle 45 --pol p --json',
    '--angle 45 --pol p --json air bk7 633nm',
    'air --angle=45 bk7 --pol=p 633nm --json',
    '--json air bk7 --angle=45 --pol p -- 633nm',
    '--json --angle 45 --pol P -- air bk7 633nm',
  ])('%s', (line) => {
    const { command, operands, options } = run(...line.split(' '));
    expect(command).toBe('answer');
    expect(operands).toEqual(['air', 'bk7', '633nm']);
    expect(options).toEqual({ angle_rad: Math.PI / 4, polarization: 'p', json: true });
  });

  it('keeps what was typed, in order, to reproduce the answer', () => {
    expect(run('air', '--pol=p', 'bk7', '--angle', '45', '1um', '-q').given).toEqual([
      { key: 'polarization', text: 'p' },
      { key: 'angle_rad', text: '45' },
      { key: 'quiet' },
    ]);
  });

  it('takes a path of any number of layers', () => {
    expect(run('air', 'mgf2@qw', 'n=2@100nm', 'bk7', '633nm').operands).toHaveLength(5);
  });
});

describe('values that begin with a dash', () => {
  it.each([['--temperature', '-40C'], ['--temperature=-40C'], ['--temperature', '\u221240C']])(
    '%s %s',
    (...option) => {
      expect(run('air', 'bk7', '633nm', ...option).options.temperature_K).toBe(233.15);
    },
  );

  it('negative operands reach the command, which says what is wrong with them', () => {
    expect(run('air', 'bk7', '-633nm').operands).toEqual(['air', 'bk7', '-633nm']);
    expect(run('air', 'bk7', '-.5um').operands[2]).toBe('-.5um');
  });

  it('- is a file name or an operand', () => {
    expect(run('air', 'bk7', '-', '--output', '-')).toMatchObject({
      operands: ['air', 'bk7', '-'],
      options: { output: '-' },
    });
  });

  it('after -- everything is an operand, command names included', () => {
    expect(run('--', 'help', '--json', '1um')).toMatchObject({
      command: 'answer',
      operands: ['help', '--json', '1um'],
    });
  });
});

describe('letters', () => {
  it.each<[string[], object]>([
    [['-q'], { quiet: true }],
    [['-o', 'a.txt'], { output: 'a.txt' }],
    [['-oa.txt'], { output: 'a.txt' }],
    [['-qo', 'a.txt'], { quiet: true, output: 'a.txt' }],
    [['-qoa.txt'], { quiet: true, output: 'a.txt' }],
  ])('%j', (letters, options) => {
    expect(run('air', 'bk7', '1um', ...letters).options).toEqual(options);
  });

  it('every letter belongs to one long option, and -v to none', () => {
    const letters = OPTION_KEYS.map((key) => optionSpec(key).short).filter((letter) => letter !== undefined);
    expect(new Set(letters).size).toBe(letters.length);
    expect(letters).not.toContain('v');
    expect(parse('-v').kind).toBe('error');
  });
});

describe('help and version win over everything', () => {
  it.each<[string, ParsedArguments]>([
    ['--help', { kind: 'help' }],
    ['-h', { kind: 'help' }],
    ['help', { kind: 'help' }],
    ['help man', { kind: 'help', topic: 'man' }],
    ['help man and more', { kind: 'help', topic: 'man' }],
    ['man --help', { kind: 'help', topic: 'man' }],
    ['--help man', { kind: 'help', topic: 'man' }],
    ['man -qh', { kind: 'help', topic: 'man' }],
    ['air bk7 --frobnicate --angle 95 --help', { kind: 'help' }],
    ['help --help', { kind: 'help' }],
    ['--version', { kind: 'version' }],
    ['-V', { kind: 'version' }],
    ['air --json -V', { kind: 'version' }],
    ['--version --help', { kind: 'help' }],
  ])('%s', (line, parsed) => {
    expect(parse(line)).toEqual(parsed);
  });
});

describe('no operands', () => {
  it('is the full-screen program', () => {
    expect(parse('')).toEqual({ kind: 'screen', options: {} });
    expect(parse('--linear --ascii --color never')).toEqual({
      kind: 'screen',
      options: { linear: true, ascii: true, color: 'never' },
    });
  });

  it.each(['--json', '--no-input'])('is a mistake where an option asks for an answer: %s', (option) => {
    expect(failure(option)).toBe('missing-operand: FROM, INTO, WAVE missing; write halfspace FROM INTO WAVE');
  });
});

describe('what is not understood is refused with what would be right', () => {
  it.each<[string, string]>([
    ['air bk7 633nm --angel 45', 'unknown-option: there is no option --angel; did you mean --angle?'],
    ['air bk7 633nm --temp 25C', 'unknown-option: there is no option --temp; did you mean --temperature?'],
    ['air bk7 633nm -v', 'unknown-option: there is no option -v; did you mean -V?'],
    [
      'air bk7 633nm -p s',
      'unknown-option: there is no option -p; did you mean --pol, --pressure, --pairs, --power or --profile?',
    ],
    [
      'air bk7 633nm -Z',
      'unknown-option: there is no option -Z; an operand that begins with - goes after --',
    ],
    ['air bk7 633nm --ang=45', 'unknown-option: there is no option --ang; did you mean --angle?'],
    ['air bk7 633nm -angle 45', 'unknown-option: there is no option -angle; did you mean --angle?'],
    [
      'air bk7 633nm --xyzzy',
      'unknown-option: there is no option --xyzzy; an operand that begins with - goes after --',
    ],
    [
      'air bk7 633nm --angle',
      'missing-value: --angle needs a value; write --angle ANGLE (angle of incidence, from the surface normal; degrees, or with a unit: 0.78rad, 30mrad)',
    ],
    [
      'air bk7 633nm --output --json',
      'missing-value: --output needs a value; write --output FILE (write to FILE instead of standard output; - is standard output)',
    ],
    [
      'air bk7 633nm --output -- x',
      'missing-value: --output needs a value; write --output FILE (write to FILE instead of standard output; - is standard output)',
    ],
    [
      'air bk7 633nm --json=yes',
      'unexpected-value: --json takes no value, but "yes" is given; write --json alone',
    ],
    [
      'air bk7 633nm --angle=',
      "bad-value: --angle: an angle is missing; write for example 45, 45deg, 0.78rad, 30mrad or 30'",
    ],
    [
      'air bk7 633nm --angle 95',
      'bad-value: --angle: "95" is no angle of incidence: it is counted from the surface normal, 0 <= angle < 90 deg; write for example 45deg; a grazing angle of 5 deg is written 85deg',
    ],
    [
      'air bk7 633nm --pol unpolarised',
      'bad-value: --pol: "unpolarised" is not a polarization; write s, p or unpolarized',
    ],
    [
      'air bk7 633nm --output=',
      'bad-value: --output: the name is empty or holds a null character; write a path such as answer.json',
    ],
    [
      'air bk7 633nm --angle 45 --angle 50',
      'given-twice: --angle is given as "45" and as "50"; give it once',
    ],
    [
      'air bk7 633nm --json --csv',
      'options-conflict: --json and --csv contradict each other; give one of them',
    ],
    [
      'air bk7 633nm --no-color --color always',
      'options-conflict: --no-color and --color contradict each other; give one of them',
    ],
    [
      'air bk7 633nm --power 1W --field 1V/m',
      'options-conflict: --power and --field contradict each other; give one of them',
    ],
    [
      'air bk7 633nm --beam 1mm',
      'option-needs: --beam says nothing without --power or --pulse-energy; give --power or --pulse-energy too',
    ],
    ['man --names x', 'option-not-here: halfspace man takes no --names; it belongs to completion'],
    ['man bk7', 'extra-operand: "bk7" is one operand too many; halfspace man takes no operands'],
    [
      'completion bash zsh',
      'extra-operand: "zsh" is one operand too many; halfspace completion takes SHELL only',
    ],
    ['air bk7', 'missing-operand: WAVE missing; write halfspace FROM INTO WAVE'],
    ['completon', 'missing-operand: INTO, WAVE missing; did you mean the command completion?'],
    ['hepl', 'missing-operand: INTO, WAVE missing; did you mean the command help?'],
    ['help mann', 'unknown-command: there is no command "mann"; did you mean man?'],
    ['help xyzzy', `unknown-command: there is no command "xyzzy"; commands are ${COMMAND_NAMES.join(', ')}`],
  ])('%s', (line, message) => {
    expect(failure(line)).toBe(message);
  });

  it('the same flag or the same value twice is no contradiction', () => {
    expect(run('air', 'bk7', '1um', '--ascii', '--ascii', '--pol', 's', '--pol=s').options).toEqual({
      ascii: true,
      polarization: 's',
    });
  });
});

describe('no abbreviation of any option or command is accepted', () => {
  const names = OPTION_KEYS.map((key) => optionSpec(key).name);
  it('of an option', () => {
    for (const name of names) {
      for (let length = 1; length < name.length; length++) {
        const short = name.slice(0, length);
        if (names.includes(short)) continue;
        expect(parseArguments(['air', 'bk7', '1um', `--${short}`]), short).toMatchObject({
          kind: 'error',
          error: { code: 'unknown-option' },
        });
      }
    }
  });

  it('of a command', () => {
    for (const name of COMMAND_NAMES) {
      expect(run(name.slice(0, -1), 'bk7', '1um').command).toBe('answer');
    }
  });
});

describe('any command line', () => {
  it('is parsed without a throw, errors in three printable lines at most', () => {
    const word = fc.oneof(
      fc.string({ unit: 'binary', maxLength: 20 }),
      fc.constantFrom(
        'air',
        '633nm',
        '--',
        '-',
        '-5',
        'help',
        'man',
        'completion',
        '__proto__',
        '--__proto__',
        '--constructor=1',
      ),
      fc.constantFrom(...OPTION_KEYS.map((key) => `--${optionSpec(key).name}`)),
      fc
        .tuple(fc.constantFrom(...OPTION_KEYS), fc.string({ maxLength: 8 }))
        .map(([key, text]) => `--${optionSpec(key).name}=${text}`),
    );
    fc.assert(
      fc.property(fc.array(word, { maxLength: 8 }), (argv) => {
        const parsed = parseArguments(argv);
        if (parsed.kind !== 'error') return;
        const text = usageErrorText(parsed.error);
        expect(text).toMatch(/^halfspace: [^\n]+; [^\n]+\n[^\n]+\n$/);
        expect(text.replaceAll('\n', '')).not.toMatch(/[\p{Cc}\p{Cs}]/u);
        expect(parsed.error.candidates.length).toBeLessThanOrEqual(5);
      }),
      { numRuns: 3000 },
    );
  });
});
