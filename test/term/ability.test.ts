import { describe, expect, it } from 'vitest';
import {
  decideColor,
  decideFullScreen,
  decideGlyphs,
  decideLinear,
  decideSize,
  forgetContinuousIntegration,
} from '../../src/term/ability.ts';

describe('colour', () => {
  const on = { isTTY: true };
  const off = { isTTY: false };
  it.each([
    ['a terminal', { ...on, env: {} }, true],
    ['a pipe', { ...off, env: {} }, false],
    ['NO_COLOR', { ...on, env: { NO_COLOR: '1' } }, false],
    ['NO_COLOR=0 is set too', { ...on, env: { NO_COLOR: '0' } }, false],
    ['an empty NO_COLOR', { ...on, env: { NO_COLOR: '' } }, true],
    ['FORCE_COLOR on a pipe', { ...off, env: { FORCE_COLOR: '1' } }, true],
    ['FORCE_COLOR=0', { ...on, env: { FORCE_COLOR: '0' } }, false],
    ['FORCE_COLOR=false', { ...on, env: { FORCE_COLOR: 'false' } }, false],
    ['an empty FORCE_COLOR', { ...off, env: { FORCE_COLOR: '' } }, false],
    ['NO_COLOR against FORCE_COLOR', { ...on, env: { NO_COLOR: '1', FORCE_COLOR: '1' } }, false],
    ['a dumb terminal', { ...on, env: { TERM: 'dumb' } }, false],
    ['FORCE_COLOR on a dumb terminal', { ...on, env: { TERM: 'dumb', FORCE_COLOR: '1' } }, true],
    ['the flag against NO_COLOR', { ...off, env: { NO_COLOR: '1' }, flag: 'always' }, true],
    ['the flag against FORCE_COLOR', { ...on, env: { FORCE_COLOR: '1' }, flag: 'never' }, false],
    ['the configuration against NO_COLOR', { ...on, env: { NO_COLOR: '1' }, configured: 'always' }, true],
    ['the flag against the configuration', { ...on, env: {}, flag: 'never', configured: 'always' }, false],
    ['a flag that leaves it open', { ...on, env: {}, flag: 'auto', configured: 'never' }, false],
    ['all open', { ...on, env: {}, flag: 'auto', configured: 'auto' }, true],
  ] as const)('%s', (_, facts, expected) => {
    expect(decideColor(facts)).toBe(expected);
  });
});

describe('glyphs', () => {
  it.each([
    [{ LANG: 'en_GB.UTF-8' }, 'braille'],
    [{ LANG: 'de_DE.utf8' }, 'braille'],
    [{ LANG: 'C.UTF-8', TERM: 'linux' }, 'blocks'],
    [{ LANG: 'C' }, 'ascii'],
    [{}, 'ascii'],
    [{ LC_ALL: 'C', LANG: 'en_GB.UTF-8' }, 'ascii'],
    [{ LC_ALL: '', LC_CTYPE: 'en_GB.UTF-8', LANG: 'C' }, 'braille'],
    [{ LC_CTYPE: 'POSIX', LANG: 'en_GB.UTF-8' }, 'ascii'],
    [{ LANG: 'en_GB.ISO-8859-1', TERM: 'linux' }, 'ascii'],
  ] as const)('%j gives %s', (env, level) => {
    expect(decideGlyphs(env)).toBe(level);
  });

  it('are what the user asked for', () => {
    expect(decideGlyphs({ LANG: 'en_GB.UTF-8' }, 'ascii')).toBe('ascii');
    expect(decideGlyphs({ LANG: 'C' }, 'braille')).toBe('braille');
  });
});

describe('size', () => {
  it.each([
    [{ columns: 100, rows: 30 }, { COLUMNS: '60', LINES: '10' }, 100, 30],
    [{}, { COLUMNS: '60', LINES: '10' }, 60, 10],
    [{ columns: 0, rows: 0 }, {}, 80, 24],
    [{}, {}, 80, 24],
    [{ columns: 120 }, { LINES: '50' }, 120, 50],
    [{}, { COLUMNS: '-5', LINES: 'many' }, 80, 24],
    [{}, { COLUMNS: '0', LINES: '1e3' }, 80, 24],
  ])('of %j with %j', (stream, env, columns, rows) => {
    expect(decideSize(stream, env)).toEqual({ columns, rows });
  });
});

describe('the full-screen program', () => {
  const decide = (stdinIsTTY: boolean, stdoutIsTTY: boolean, env = {}) =>
    decideFullScreen({ env, stdinIsTTY, stdoutIsTTY, oneShotExample: 'halfspace air water 633nm' });

  it('starts at a terminal, also where CI is set', () => {
    expect(decide(true, true, { TERM: 'xterm-256color' })).toEqual({ allowed: true });
    expect(decide(true, true, { CI: 'true' })).toEqual({ allowed: true });
  });

  it.each([
    [false, true, {}, /standard input is not one/],
    [true, false, {}, /standard output is not one/],
    [false, false, {}, /neither standard input nor output/],
    [true, true, { TERM: 'dumb' }, /"dumb"/],
  ])('does not start with input %s, output %s, %j', (stdin, stdout, env, sentence) => {
    const decision = decide(stdin, stdout, env);
    expect(decision).toMatchObject({ allowed: false, sentence: expect.stringMatching(sentence) });
    expect(decision).toMatchObject({ sentence: expect.stringContaining('halfspace air water 633nm') });
  });

  it('is not told of continuous integration', () => {
    const env = { CI: 'true', CONTINUOUS_INTEGRATION: '1', TERM: 'xterm' };
    forgetContinuousIntegration(env);
    expect(env).toEqual({ TERM: 'xterm' });
  });
});

describe('plain lines for screen readers', () => {
  it.each([
    [{}, false, false],
    [{}, true, true],
    [{ ACCESSIBLE: '1' }, false, true],
    [{ ACCESSIBLE: '0' }, false, false],
    [{ ACCESSIBLE: 'false' }, false, false],
    [{ ACCESSIBLE: '' }, false, false],
    [{ HALFSPACE_ACCESSIBLE: 'yes' }, false, true],
    [{ INK_SCREEN_READER: 'true' }, false, true],
    [{ INK_SCREEN_READER: '1' }, false, false],
  ])('%j, flag %s: %s', (env, flag, expected) => {
    expect(decideLinear(env, flag)).toBe(expected);
  });
});
