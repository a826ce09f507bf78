/** `halfspace man`: the manual page in roff on standard output. */
import type { Command } from '../context.ts';
import { manPage } from '../man.ts';

export const run: Command = (_invocation, context) => {
  context.write(manPage(context.version));
  return 0;
};
