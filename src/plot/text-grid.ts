/** A rectangle of terminal cells to write texts into; what does not fit is cut. Unwritten cells are spaces. */

/** A piece of text that takes whole cells. */
export interface TextCluster {
  readonly text: string;
  readonly width: number;
}

/** Cuts a text into clusters. Callers with wide characters in their labels hand in a measure of their own. */
export type Clusters = (text: string) => readonly TextCluster[];

/** One cell a character; combining marks join the character before, and are left out where there is none. */
export const simpleClusters: Clusters = (text) => {
  const out: TextCluster[] = [];
  for (const character of text) {
    const before = out.at(-1);
    if (!/^[\p{M}\u200d]$/u.test(character)) out.push({ text: character, width: 1 });
    else if (before) out[out.length - 1] = { text: before.text + character, width: before.width };
  }
  return out;
};

export class TextGrid {
  readonly width: number;
  readonly height: number;
  private readonly cells: string[][];
  private readonly clusters: Clusters;

  constructor(width: number, height: number, clusters: Clusters) {
    this.width = width;
    this.height = height;
    this.clusters = clusters;
    this.cells = Array.from({ length: height }, () => new Array<string>(width).fill(' '));
  }

  /** Writes from a cell to the right, up to the column `end`. */
  write(row: number, column: number, text: string, end = this.width): void {
    const cells = this.cells[row];
    if (!cells) return;
    let at = column;
    for (const { text: cluster, width } of this.clusters(text)) {
      if (width === 0) continue;
      if (at + width > Math.min(end, this.width)) break;
      if (at >= 0) {
        cells[at] = cluster;
        // The cells that a wide character covers hold nothing of their own.
        for (let i = 1; i < width; i++) cells[at + i] = '';
      }
      at += width;
    }
  }

  isBlank(row: number, column: number): boolean {
    return this.cells[row]?.[column] === ' ';
  }

  columnsOf(text: string): number {
    return this.clusters(text).reduce((sum, { width }) => sum + width, 0);
  }

  lines(): string[] {
    return this.cells.map((cells) => cells.join(''));
  }
}
