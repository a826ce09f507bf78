/** What every text for people keeps to. */
import { expect } from 'vitest';
import { displayWidth } from '../../src/term/display-width.ts';

export function expectPage(text: string, width = 72): void {
  expect(text.endsWith('\n')).toBe(true);
  expect(text.endsWith('\n\n')).toBe(false);
  expect(text).not.toMatch(/NaN|Infinity|undefined|\[object|[ \t]\n/);
  expect(text).not.toMatch(/[\x00-\x09\x0b-\x1f\x7f-\x9f]/);
  for (const line of text.split('\n')) expect(displayWidth(line), line).toBeLessThanOrEqual(width);
}

export function expectAscii(text: string): void {
  expect(text).toMatch(/^[\x20-\x7e\n]*$/);
}
