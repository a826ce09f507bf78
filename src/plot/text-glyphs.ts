/** The characters of a chart beside its dots, for each level; those of the blocks level are in the fonts of text consoles. */
import type { GlyphLevel } from './dot-raster.ts';

type ByLevel = Readonly<Record<GlyphLevel, string>>;

export const HATCH: ByLevel = { braille: '⠌', blocks: '░', ascii: '/' };
export const MARK_LINE: ByLevel = { braille: '┊', blocks: '│', ascii: ':' };
export const CURSOR_LINE: ByLevel = { braille: '│', blocks: '║', ascii: '|' };

export interface AxisGlyphs {
  readonly vertical: string;
  readonly verticalTick: string;
  readonly corner: string;
  readonly horizontal: string;
  readonly horizontalTick: string;
  readonly cutOff: string;
}

export function axisGlyphs(ascii: boolean): AxisGlyphs {
  return ascii
    ? { vertical: '|', verticalTick: '+', corner: '+', horizontal: '-', horizontalTick: '+', cutOff: '...' }
    : { vertical: '│', verticalTick: '┤', corner: '└', horizontal: '─', horizontalTick: '┴', cutOff: '…' };
}
