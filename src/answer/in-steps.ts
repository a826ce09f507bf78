/** Work that takes longer than a key may wait, cut into short steps: who runs it may look after other things between them. */

/** Each `yield` is a place to pause; the result comes with the last step. */
export type InSteps<Result> = Generator<undefined, Result, undefined>;

/** All steps at once. */
export function runToEnd<Result>(steps: InSteps<Result>): Result {
  for (;;) {
    const step = steps.next();
    if (step.done) return step.value;
  }
}
