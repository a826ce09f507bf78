import { describe, expect, it } from 'vitest';
import { COMMANDS, type CommandSpec, commandsWith, optionsOf } from '../../src/cli/command-table.ts';
import { loadCommand } from '../../src/cli/load-command.ts';
import { OPTION_KEYS, optionKeyByName, optionSpec } from '../../src/cli/options.ts';

const specs = OPTION_KEYS.map(optionSpec);
const commands: readonly CommandSpec[] = COMMANDS;

describe('the table of options', () => {
  it('has each name once, in lower case, and meanings of one ASCII phrase', () => {
    expect(new Set(specs.map((spec) => spec.name)).size).toBe(specs.length);
    for (const { name, meaning } of specs) {
      expect(name).toMatch(/^[a-z0-9]+(-[a-z0-9]+)*$/);
      expect(meaning).toMatch(/^[\x20-\x7e]+[^.\s]$/);
    }
  });

  it('holds every option of the published command line', () => {
    const published =
      'angle pol air-wavelength temperature pressure humidity co2 salinity composition power beam profile irradiance field tolerance extrapolate json csv markdown plain color no-color ascii quiet output linear catalog strict no-input log help version';
    for (const name of published.split(' ')) expect(optionKeyByName(name), name).toBeDefined();
  });

  it('names options that exist where it says which contradict or need each other, both ways for contradictions', () => {
    for (const spec of specs) {
      if (spec.needs !== undefined) expect(optionKeyByName(spec.needs)).toBeDefined();
      for (const other of spec.excludes ?? []) {
        const key = optionKeyByName(other);
        expect(key, other).toBeDefined();
        expect(key && optionSpec(key).excludes).toContain(spec.name);
      }
    }
  });

  it('has choices that its own parser takes, and defaults too where they are values', () => {
    for (const spec of specs) {
      if (spec.kind !== 'value') continue;
      for (const word of spec.choices ?? []) expect(spec.parse(word)).toBe(word);
      if (spec.fallback !== undefined && !spec.fallback.includes(' ')) {
        expect(spec.parse(spec.fallback), spec.name).not.toMatchObject({ problem: true });
      }
    }
  });

  it('has no option that no command takes', () => {
    for (const key of OPTION_KEYS) expect(commandsWith(key), key).not.toHaveLength(0);
  });
});

describe('the table of commands', () => {
  it('has one unnamed command, names once, and each with a summary and an example', () => {
    expect(commands.filter((command) => command.unnamed)).toHaveLength(1);
    expect(new Set(commands.map((command) => command.name)).size).toBe(commands.length);
    for (const { summary, examples } of commands) {
      expect(summary).toMatch(/^[\x20-\x7e]+[^.\s]$/);
      expect(examples.length).toBeGreaterThan(0);
    }
  });

  it('gives help and version to every command', () => {
    for (const { name } of COMMANDS)
      expect(optionsOf(name)).toEqual(expect.arrayContaining(['help', 'version', 'output']));
  });

  it('loads the code of a command when asked', async () => {
    for (const { name } of COMMANDS) {
      if (name !== 'help') expect((await loadCommand(name)).run, name).toBeTypeOf('function');
    }
  }, 120_000);
});
