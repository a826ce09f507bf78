/**
 * Where a long result goes piece by piece: straight to standard output, so that memory stays small and a reader that has seen
 * enough (`| head`) ends the work, or whole into the file of `--output`.
 */
import type { Context } from '../context.ts';

const PIECE = 1 << 14;

export class Outlet {
  readonly #context: Context;
  readonly #toFile: boolean;
  readonly #pieces: string[] = [];
  #waiting = '';
  #isOpen = true;

  constructor(context: Context, output: string | undefined) {
    this.#context = context;
    this.#toFile = output !== undefined && output !== '-';
  }

  /** False where nobody reads on. */
  write(text: string): boolean {
    this.#waiting += text;
    if (this.#waiting.length >= PIECE) this.#pass();
    return this.#isOpen;
  }

  end(): void {
    this.#pass();
    if (this.#toFile) this.#context.write(this.#pieces.join(''));
  }

  #pass(): void {
    const text = this.#waiting;
    this.#waiting = '';
    if (this.#toFile) this.#pieces.push(text);
    else if (this.#isOpen && text !== '') this.#isOpen = this.#context.print(text);
  }
}
