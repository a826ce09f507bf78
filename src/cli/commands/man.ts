/** `halfspace man`: the manual page in roff on standard output. */
import type { Invocation } from '../arguments.ts';
import type { CommandIo } from '../command-io.ts';
import { manPage } from '../man.ts';

export function run(_invocation: Invocation, io: CommandIo): number {
  io.out(manPage(io.program));
  return 0;
}
