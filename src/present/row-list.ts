/** Collects the rows of one part of the answer, in order. */
import { toAscii } from '../units/to-ascii.ts';
import type { PresentStyle, Shown } from './shown.ts';

export class RowList {
  readonly list: Shown[] = [];
  private readonly style: PresentStyle;
  constructor(style: PresentStyle) {
    this.style = style;
  }
  add(id: string, symbol: string, label: string, text: string): void {
    this.list.push({ id, symbol: this.style.ascii ? toAscii(symbol) : symbol, label, text });
  }
}
