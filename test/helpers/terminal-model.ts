/**
 * A terminal without a window: @xterm/headless behind the few questions tests ask. It also keeps what the emulator
 * does not tell: whether the cursor is shown.
 */
import xterm from '@xterm/headless';

export interface ModelCell {
  readonly glyph: string;
  /** 2 for the left half of a wide glyph, 0 for its right half. */
  readonly width: number;
  /** SGR attributes in a canonical form, '' for the default style. */
  readonly style: string;
}

export class TerminalModel {
  readonly #terminal: xterm.Terminal;
  #cursorShown = true;

  constructor(columns: number, rows: number) {
    this.#terminal = new xterm.Terminal({ cols: columns, rows, allowProposedApi: true, scrollback: 1000 });
    const watch = (shown: boolean) => (parameters: (number | number[])[]) => {
      if (parameters.includes(25)) this.#cursorShown = shown;
      return false;
    };
    this.#terminal.parser.registerCsiHandler({ prefix: '?', final: 'h' }, watch(true));
    this.#terminal.parser.registerCsiHandler({ prefix: '?', final: 'l' }, watch(false));
  }

  /** Feeds bytes; resolves when the emulator has taken them in. */
  write(data: string | Uint8Array): Promise<void> {
    return new Promise((resolve) => this.#terminal.write(data, resolve));
  }

  resize(columns: number, rows: number): void {
    this.#terminal.resize(columns, rows);
  }

  get columns(): number {
    return this.#terminal.cols;
  }

  get rows(): number {
    return this.#terminal.rows;
  }

  /** The visible rows as text, without trailing blanks. */
  lines(): string[] {
    // A row may hold cells beyond the edge after the screen was made narrower.
    const text = (y: number): string => this.#line(y)?.translateToString(true, 0, this.columns) ?? '';
    return Array.from({ length: this.rows }, (_, y) => text(y).trimEnd());
  }

  /** The visible rows as one text, without empty rows at the end. */
  text(): string {
    return this.lines().join('\n').trimEnd();
  }

  /** Lines that have left the screen at the top of the normal buffer. */
  scrollback(): string[] {
    const buffer = this.#terminal.buffer.normal;
    return Array.from({ length: buffer.baseY }, (_, y) => buffer.getLine(y)?.translateToString(true) ?? '');
  }

  cell(x: number, y: number): ModelCell {
    const cell = this.#line(y)?.getCell(x);
    if (cell === undefined) return { glyph: ' ', width: 1, style: '' };
    const style: string[] = [];
    if (cell.isBold()) style.push('bold');
    if (cell.isDim()) style.push('dim');
    if (cell.isItalic()) style.push('italic');
    if (cell.isUnderline()) style.push('underline');
    if (cell.isInverse()) style.push('inverse');
    if (cell.isStrikethrough()) style.push('strike');
    if (!cell.isFgDefault()) style.push(`fg${cell.isFgRGB() ? '#' : ''}${cell.getFgColor()}`);
    if (!cell.isBgDefault()) style.push(`bg${cell.isBgRGB() ? '#' : ''}${cell.getBgColor()}`);
    const width = cell.getWidth();
    return { glyph: cell.getChars() || (width === 0 ? '' : ' '), width, style: style.join(' ') };
  }

  get cursor(): { x: number; y: number; shown: boolean } {
    const { cursorX, cursorY } = this.#terminal.buffer.active;
    return { x: cursorX, y: cursorY, shown: this.#cursorShown };
  }

  /** The modes a full-screen program may leave behind. */
  modes(): { alternateScreen: boolean; cursorShown: boolean; bracketedPaste: boolean; autowrap: boolean } {
    const { bracketedPasteMode, wraparoundMode } = this.#terminal.modes;
    return {
      alternateScreen: this.#terminal.buffer.active.type === 'alternate',
      cursorShown: this.#cursorShown,
      bracketedPaste: bracketedPasteMode,
      autowrap: wraparoundMode,
    };
  }

  #line(y: number): xterm.IBufferLine | undefined {
    const buffer = this.#terminal.buffer.active;
    return buffer.getLine(buffer.baseY + y);
  }
}
