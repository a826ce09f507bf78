/** Random choices that a seed repeats (mulberry32, public domain), and the pieces that inputs are made of. */
export class Random {
  #state: number;

  constructor(seed: number) {
    this.#state = seed >>> 0;
  }

  /** In [0, 1). */
  next(): number {
    this.#state = (this.#state + 0x6d2b79f5) >>> 0;
    let t = this.#state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  }

  /** 0 to n - 1. */
  below(n: number): number {
    return Math.floor(this.next() * n);
  }

  chance(probability: number): boolean {
    return this.next() < probability;
  }

  pick<T>(from: readonly T[]): T {
    return from[this.below(from.length)] as T;
  }

  /** `least` to `most` of what `make` gives. */
  many<T>(least: number, most: number, make: () => T): T[] {
    return Array.from({ length: least + this.below(most - least + 1) }, make);
  }

  /** A text with one to three random changes: characters dropped, doubled, swapped for strange ones. */
  damaged(text: string): string {
    let result = text;
    for (let i = this.below(3); i >= 0; i--) {
      const at = this.below(result.length + 1);
      const before = result.slice(0, at);
      const after = result.slice(at);
      result = this.pick([
        () => before + after.slice(1 + this.below(4)),
        () => before + after.slice(0, 3) + after,
        () => before + this.pick(STRANGE) + after,
        () => before + this.pick(STRANGE) + after.slice(1),
        () => before,
      ])();
    }
    return result;
  }

  number(): string {
    return this.pick([
      () => String(this.below(2000)),
      () => (this.next() * 10 ** (this.below(8) - 3)).toPrecision(1 + this.below(6)),
      () => String((this.next() - 0.5) * 10 ** (this.below(600) - 300)),
      () => this.pick(NUMBERS),
    ])();
  }

  bytes(length: number): Buffer {
    return Buffer.from(Array.from({ length }, () => this.below(256)));
  }
}

const NUMBERS = [
  '0',
  '-0',
  '-1',
  '1e999',
  '-1e999',
  '5e-324',
  '1e308',
  'NaN',
  'Infinity',
  '0x10',
  '1_000',
  '1,5',
  '٣',
  '.',
  '',
  '1e',
  '+5',
  '−3',
];
const STRANGE = [
  '\0',
  '\x1b[2J',
  '\u202e',
  '\ud800',
  '😀',
  'é',
  '½',
  '"',
  "'",
  '\\',
  '\n',
  '\r',
  '\t',
  ',',
  ';',
  '=',
  '@',
  ':',
  '..',
  '%',
  '±',
  '(',
  ')',
  '-',
  '--',
  '\ufeff',
  '\u2028',
  'µ',
  'μ',
  'Å',
  '°',
];
