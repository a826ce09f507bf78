/** Feeds the targets and collects what broke: the input, and the seed that makes it again. */
import { Random } from './random.ts';
import { TARGETS, type Target } from './targets.ts';

export interface Finding {
  readonly target: string;
  readonly seed: number;
  readonly input: string;
  readonly message: string;
}

export interface Fed {
  readonly counts: Readonly<Record<string, number>>;
  readonly slowest_ms: number;
  readonly findings: readonly Finding[];
}

/** An input that takes longer hangs. */
export const HANG_ms = 1000;

export interface Budget {
  /** Inputs in all, spread by the weights of the targets. */
  readonly inputs: number;
  /** Stops after so many findings of one target. */
  readonly findings?: number;
}

export async function fuzz(seed: number, budget: Budget, targets: readonly Target[] = TARGETS): Promise<Fed> {
  const counts: Record<string, number> = {};
  const findings: Finding[] = [];
  const most = budget.findings ?? 5;
  let slowest_ms = 0;
  for (const target of targets) {
    const inputs = Math.ceil(budget.inputs * target.weight);
    let found = 0;
    for (let i = 0; i < inputs && found < most; i++) {
      const own = (seed * 1_000_003 + i) >>> 0;
      const { input, feed } = target.make(new Random(own));
      const begin = cpu_ms();
      let message: string | undefined;
      try {
        await feed();
      } catch (error) {
        message = error instanceof Error ? (error.stack ?? error.message) : String(error);
      }
      // Processor time: a machine busy with other work is no hang.
      const taken_ms = cpu_ms() - begin;
      slowest_ms = Math.max(slowest_ms, taken_ms);
      if (message === undefined && taken_ms > HANG_ms && i > 0) message = `took ${taken_ms.toFixed(0)} ms`;
      if (message !== undefined) {
        found++;
        findings.push({ target: target.name, seed: own, input, message });
      }
      counts[target.name] = i + 1;
    }
  }
  return { counts, slowest_ms, findings };
}

function cpu_ms(): number {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1000;
}
