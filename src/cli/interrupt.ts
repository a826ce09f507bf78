/** Signals that end the program, held back until what is begun is finished. A second one ends it at once. */
import { constants } from 'node:os';

const SIGNALS = ['SIGINT', 'SIGTERM', 'SIGHUP'] as const;

export interface Interrupt {
  readonly interrupted: () => boolean;
  readonly onInterrupt: (wake: () => void) => void;
  /** Ends the program by the signal that came, as if it had not been held back; 128 + its number where it lives on. */
  readonly passOn: () => number;
  /** Signals end the program at once again. */
  readonly release: () => void;
}

export function holdInterrupts(): Interrupt {
  let signal: (typeof SIGNALS)[number] | undefined;
  let wake: () => void = () => undefined;
  const handlers = SIGNALS.map((name) => {
    const handler = (): void => {
      release();
      signal = name;
      wake();
    };
    process.on(name, handler);
    return { name, handler };
  });
  const release = (): void => {
    for (const { name, handler } of handlers) process.off(name, handler);
  };
  return {
    interrupted: () => signal !== undefined,
    onInterrupt(call) {
      wake = call;
    },
    passOn() {
      release();
      if (signal) process.kill(process.pid, signal);
      return 128 + constants.signals[signal ?? 'SIGINT'];
    },
    release,
  };
}
