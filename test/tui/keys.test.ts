import { describe, expect, it } from 'vitest';
import type { CommandName } from '../../src/cli/command-table.ts';
import { ACTION_IDS, ACTIONS, type ActionId, CONTEXTS, type Context } from '../../src/tui/keys/actions.ts';
import { bindKeys, clashesOf, isPrintable } from '../../src/tui/keys/bindings.ts';
import { keyText } from '../../src/tui/keys/key-names.ts';

describe('the table of keys', () => {
  it('gives no key two meanings', () => {
    expect(clashesOf(ACTIONS)).toEqual([]);
  });

  it('has a row for every action, with a label and a help line', () => {
    for (const id of ACTION_IDS) {
      const rows = ACTIONS.filter((a) => a.id === id);
      expect(rows.length, id).toBeGreaterThan(0);
      for (const { keys, label, help } of rows) {
        expect(keys.length, id).toBeGreaterThan(0);
        expect(label, id).not.toBe('');
        expect(help, id).not.toBe('');
      }
    }
  });

  it('binds no printable key where text is typed', () => {
    for (const action of ACTIONS) {
      if (!action.contexts.some((c) => c === 'entry' || c === 'search')) continue;
      expect(action.keys.filter(isPrintable), action.id).toEqual([]);
    }
  });

  it('needs no function key, no bracket and no Alt alone', () => {
    for (const { id, keys } of ACTIONS) {
      const plain = keys.filter((k) => !/^(?:alt\+|f\d)/.test(k) && !/[[\]{}]/.test(k));
      const editing = ['word-left', 'word-right', 'kill-word-forward'].includes(id);
      expect(plain.length > 0 || editing, id).toBe(true);
    }
  });

  it('leaves Ctrl-B to terminal multiplexers, and Ctrl-A but where text is typed', () => {
    expect(ACTIONS.flatMap((a) => a.keys)).not.toContain('ctrl+b');
    const beside = ACTIONS.filter((a) => a.contexts.every((c) => c !== 'entry' && c !== 'search'));
    expect(beside.flatMap((a) => a.keys)).not.toContain('ctrl+a');
  });

  it.each<[ActionId, CommandName]>([
    ['search', 'find'],
    ['sources', 'cite'],
    ['coatings', 'coat'],
    ['order-check', 'order-check'],
    ['compare', 'compare'],
    ['log', 'log'],
    ['copy-record', 'log'],
  ])('names the command that does the same as %s: %s', (id, command) => {
    const { help = '' } = ACTIONS.find((a) => a.id === id && a.contexts.includes('picture')) ?? {};
    expect(help).toContain(`halfspace ${command}`);
  });

  it.each<[Context, string, string]>([
    ['picture', 'k', 'up'],
    ['picture', 'ctrl+n', 'down'],
    ['page', 'G', 'last'],
    ['page', 'n', 'down'],
    ['page', 'N', 'up'],
    ['page', 'ctrl+u', 'page-up'],
    ['page', 'alt+v', 'page-up'],
    ['search', 'ctrl+v', 'page-down'],
    ['entry', 'ctrl+a', 'line-start'],
    ['entry', 'ctrl+u', 'kill-to-start'],
    ['entry', 'escape', 'cancel'],
    ['picture', 'q', 'quit'],
    ['page', 'q', 'back'],
    ['search', 'ctrl+c', 'interrupt'],
  ])('in %s means by %s: %s', (context, chord, action) => {
    expect(bindKeys().bindings.actionOf(context, chord)).toBe(action);
  });
});

describe('remapping', () => {
  it('puts the keys of the user in place of the own ones', () => {
    const { bindings, problems } = bindKeys({ swap: ['X', 'f5'] });
    expect(problems).toEqual([]);
    expect(bindings.actionOf('picture', 'X')).toBe('swap');
    expect(bindings.actionOf('picture', 'x')).toBeUndefined();
    expect(bindings.keyOf('picture', 'swap')).toBe('X');
  });

  it('names a clash and keeps the old key', () => {
    const { bindings, problems } = bindKeys({ swap: ['q'] });
    expect(problems).toEqual(['keys.swap: "q" already means quit; give quit another key first']);
    expect(bindings.actionOf('picture', 'x')).toBe('swap');
    expect(bindings.actionOf('picture', 'q')).toBe('quit');
  });

  it('lets two actions change places in the order of the table', () => {
    const { bindings, problems } = bindKeys({ swap: ['S'], sources: ['x'] });
    expect(problems).toEqual([]);
    expect(bindings.actionOf('picture', 'x')).toBe('sources');
    expect(bindings.actionOf('picture', 'S')).toBe('swap');
  });

  it.each([
    [{ swap: ['shift+'] }, /"shift\+" is no key/],
    [{ swap: [] }, /names no key/],
    [{ interrupt: ['x'] }, /cannot be changed/],
  ])('names what is wrong with %j', (keys, message) => {
    const { problems } = bindKeys(keys);
    expect(problems).toHaveLength(1);
    expect(problems[0]).toMatch(message);
  });

  it('never lets a printable key into a text field', () => {
    const { bindings } = bindKeys({ up: ['u', 'ctrl+p'] });
    for (const context of CONTEXTS.filter((c) => c === 'search' || c === 'entry'))
      expect(bindings.actionOf(context, 'u')).toBeUndefined();
  });
});

it.each([
  ['ctrl+u', 'Ctrl-U'],
  ['shift+tab', 'Shift-Tab'],
  ['page-down', 'PgDn'],
  ['G', 'G'],
  ['alt+b', 'Alt-b'],
  ['+', '+'],
])('writes %s as %s', (chord, text) => {
  expect(keyText(chord, false)).toBe(text);
});

it('writes arrows in words where the terminal has no signs for them', () => {
  expect(keyText('up', false)).toBe('↑');
  expect(keyText('up', true)).toBe('up');
});
