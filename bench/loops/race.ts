/**
 * Two ways of computing the same numbers, in turns, in one process; prints the ratio of their speeds as JSON. Refuses to compare
 * what does not compute the same.
 */
export interface Contest {
  readonly hand: () => void;
  readonly core: () => void;
  /** The numbers the last call left behind. */
  readonly result: () => Float64Array;
  /** Of one call. */
  readonly evaluations: number;
  /** Calls timed together: half a millisecond or so. */
  readonly repeats: number;
}

export interface Outcome {
  /** Speed of the core over that of the loop by hand; above 1 the core is faster. */
  readonly speed: number;
  readonly millionsPerSecond: number;
}

/**
 * Many short rounds rather than a few long ones: on a busy machine a short one is seldom interrupted, and the median leaves
 * out those that were.
 */
const ROUNDS = 601;
const WARM_UP_ROUNDS = 60;
const CLOSE_ENOUGH = 1e-11;

export function race(contests: Readonly<Record<string, Contest>>): void {
  const outcomes: Record<string, Outcome> = {};
  for (const [name, contest] of Object.entries(contests)) outcomes[name] = run(name, contest);
  process.stdout.write(`${JSON.stringify(outcomes)}\n`);
}

function run(name: string, { hand, core, result, evaluations, repeats }: Contest): Outcome {
  hand();
  const expected = result().slice();
  core();
  for (const [i, value] of result().entries()) {
    const other = expected[i] ?? Number.NaN;
    if (!(Math.abs(value - other) <= CLOSE_ENOUGH * Math.max(1, Math.abs(other)))) {
      throw new Error(`${name}: the two loops differ at ${i}: ${other} by hand, ${value} by the core`);
    }
  }
  const time = (f: () => void): number => {
    const begin = process.hrtime.bigint();
    for (let i = 0; i < repeats; i++) f();
    return Number(process.hrtime.bigint() - begin);
  };
  for (let i = 0; i < WARM_UP_ROUNDS; i++) {
    time(hand);
    time(core);
  }
  const ratios: number[] = [];
  const core_ns: number[] = [];
  for (let i = 0; i < ROUNDS; i++) {
    // In turns, so that neither is always the first.
    const first = i % 2 === 0 ? time(hand) : time(core);
    const second = i % 2 === 0 ? time(core) : time(hand);
    const [h, c] = i % 2 === 0 ? [first, second] : [second, first];
    ratios.push(h / c);
    core_ns.push(c);
  }
  return {
    speed: middle(ratios),
    millionsPerSecond: (1e3 * evaluations * repeats) / middle(core_ns),
  };
}

const middle = (values: number[]): number => values.sort((a, b) => a - b)[values.length >> 1] ?? Number.NaN;
