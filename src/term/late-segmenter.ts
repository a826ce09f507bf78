/**
 * Stands in for `Intl.Segmenter` in the built screen: made when a text is first taken apart and not when a module is loaded,
 * since making one takes as long as a tenth of a start and most frames need none.
 */
export class LateSegmenter {
  readonly #locales: Intl.LocalesArgument;
  readonly #options: Intl.SegmenterOptions | undefined;
  #made: Intl.Segmenter | undefined;

  constructor(locales?: Intl.LocalesArgument, options?: Intl.SegmenterOptions) {
    this.#locales = locales;
    this.#options = options;
  }

  segment(text: string): Intl.Segments {
    // By way of the global object: the bundler puts this class in place of the plain name.
    this.#made ??= new globalThis.Intl.Segmenter(this.#locales, this.#options);
    return this.#made.segment(text);
  }
}
