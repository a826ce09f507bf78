import { describe, expect, it } from 'vitest';
import { SCREEN_GLYPHS } from '../../src/tui/glyphs.ts';
import { PLAIN_THEME } from '../../src/tui/theme.ts';
import { curveView } from '../../src/tui/view/curve-view.ts';

const pen = { theme: PLAIN_THEME, glyphs: SCREEN_GLYPHS, focus: null, entry: null };

const axis = (x: number, columns = 60): string => {
  const present = { x, text: '632.8 nm' };
  const plot = { title: 'R', curves: [], ends: ['550.0 nm', '1.690 µm'] as const, present, top: 1 };
  return curveView(plot, columns, 8, 'braille', pen).at(-1) ?? '';
};

describe('the line of the axis', () => {
  it('names both ends where there is room', () => {
    expect(axis(0.5)).toMatch(/^ *└ 550\.0 nm ─+ 632\.8 nm ─+ 1\.690 µm$/);
  });

  it('leaves out the end that the value asked for stands on, and never cuts a number', () => {
    for (let i = 0; i <= 200; i++) {
      const numbers = axis(i / 200).match(/[\d.]+ .m/g) ?? [];
      expect(numbers).toContain('632.8 nm');
      for (const number of numbers) expect(['550.0 nm', '632.8 nm', '1.690 µm']).toContain(number);
    }
    expect(axis(0.1)).not.toContain('550');
    expect(axis(1)).not.toContain('1.690');
  });
});
