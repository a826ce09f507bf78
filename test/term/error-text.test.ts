import { describe, expect, it } from 'vitest';
import { errorText } from '../../src/term/error-text.ts';

describe('the text of an unexpected error', () => {
  it('is its message and how to learn more', () => {
    expect(errorText(new Error('no such row'), 'halfspace', false)).toBe(
      'halfspace: unexpected error: no such row\nSet HALFSPACE_DEBUG=1 to see where it happened.\n',
    );
  });

  it.each([
    ['a text', 'a text'],
    [undefined, 'undefined'],
    [{ toString: () => 'an object' }, 'an object'],
    [Object.create(null), 'an error that cannot be shown'],
    [new Error(''), 'no message'],
  ])('of %s', (error, message) => {
    expect(errorText(error, 'halfspace', false)).toContain(`unexpected error: ${message}\n`);
  });

  it('is one line of limited length without control characters', () => {
    const error = new Error(`first\nsecond\x1b[2J\u009b31m ${'x'.repeat(9000)}`);
    const [line = '', hint, rest] = errorText(error, 'halfspace', false).split('\n');
    expect(line).toMatch(/^halfspace: unexpected error: first second \[2J 31m x+\.\.\.$/);
    expect(line.length).toBeLessThan(600);
    expect(hint).toContain('HALFSPACE_DEBUG');
    expect(rest).toBe('');
  });

  it('has the stack where it is asked for, without source lines', () => {
    const error = new Error('message');
    error.stack = `file:///x.js:1\nvar minified=${'y'.repeat(3000)}\n\nError: message\n    at here (x.js:1:2)\n    at there (x.js:3:4)`;
    expect(errorText(error, 'halfspace', true)).toBe(
      'halfspace: unexpected error: message\n    at here (x.js:1:2)\n    at there (x.js:3:4)\n',
    );
    expect(errorText('no error', 'halfspace', true)).toBe('halfspace: unexpected error: no error\n');
  });
});
