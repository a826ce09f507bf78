/**
 * The signs of the picture in the three forms a terminal may be able to show. Each stands for the same thing in all of
 * them and takes one column, so the layout does not depend on the form (arrows alone may be longer).
 */
export interface Glyphs {
  /** The boundary as a line from top to bottom, and where it opens to make room for what belongs to it. */
  readonly rail: string;
  readonly openLeft: string;
  readonly openRight: string;
  readonly openMiddle: string;
  readonly openLine: string;
  /** Where the opened boundary closes to a line again. */
  readonly closeLeft: string;
  readonly closeRight: string;
  readonly closeMiddle: string;
  readonly focus: string;
  readonly caution: string;
  readonly refused: string;
  readonly arrow: string;
  readonly more: string;
  readonly moreBelow: string;
  readonly moreAbove: string;
  /** Left and bottom edges of a curve, and the mark of the present value. */
  readonly axisDown: string;
  readonly axisAlong: string;
  readonly axisCorner: string;
}

export const SCREEN_GLYPHS: Glyphs = {
  rail: '┃',
  openLeft: '┏',
  openRight: '┓',
  openMiddle: '┻',
  openLine: '━',
  closeLeft: '┗',
  closeRight: '┛',
  closeMiddle: '┳',
  focus: '>',
  caution: '!',
  refused: 'x',
  arrow: '→',
  more: '…',
  moreBelow: '↓',
  moreAbove: '↑',
  axisDown: '│',
  axisAlong: '─',
  axisCorner: '└',
};

export const ASCII_GLYPHS: Glyphs = {
  rail: '|',
  openLeft: '+',
  openRight: '+',
  openMiddle: '+',
  openLine: '-',
  closeLeft: '+',
  closeRight: '+',
  closeMiddle: '+',
  focus: '>',
  caution: '!',
  refused: 'x',
  arrow: '->',
  more: '...',
  moreBelow: 'v',
  moreAbove: '^',
  axisDown: '|',
  axisAlong: '-',
  axisCorner: '+',
};
