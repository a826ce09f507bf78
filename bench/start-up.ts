/** From the command to the answer, and from the command to the first frame of the full-screen program. */
import type { Line } from './figure.ts';
import { ENVIRONMENT, PROGRAM, timeNode } from './program.ts';
import { compare } from './rounds.ts';
import { Screen } from './screen.ts';

const BARE = 'x node -e 0';

/** Stands in the last line of a live frame, and not in what is drawn while the program loads. */
const LAST_LINE = 'keys';

export async function startUp(rounds: number): Promise<readonly Line[]> {
  const run =
    (...args: string[]) =>
    () =>
      timeNode([PROGRAM, ...args]);
  const once = await compare(rounds, () => timeNode(['-e', '0']), {
    text: run('air', 'fused-silica', '632.8nm'),
    oblique: run('air', 'n-bk7', '633nm', '--angle', '45', '--pol', 'p'),
    json: run('--json', 'vacuum', 'gold', '633nm'),
    film: run('air', 'magnesium-fluoride-film@qw', 'n-bk7', '550nm'),
    version: run('--version'),
    help: run('--help'),
  });
  const oneShot = { atMost: 1.15, atWorst: 1.25 };
  const screen = await compare(
    Math.ceil(rounds / 2),
    () => firstSight(['-e', 'console.log("here")'], 'here'),
    {
      skeleton: () => firstSight([PROGRAM], '\x1b[?25l'),
      live: () => firstSight([PROGRAM], LAST_LINE),
    },
  );
  return [
    { name: 'one-shot, text', value: once.text.ratio, unit: BARE, target: oneShot },
    { name: 'one-shot, 45 degrees, p', value: once.oblique.ratio, unit: BARE, target: oneShot },
    { name: 'one-shot, JSON, a metal', value: once.json.ratio, unit: BARE, target: oneShot },
    { name: 'one-shot, a film', value: once.film.ratio, unit: BARE },
    { name: '--version', value: once.version.ratio, unit: BARE, target: oneShot },
    { name: '--help', value: once.help.ratio, unit: BARE },
    {
      name: 'screen taken over',
      value: screen.skeleton.ratio,
      unit: 'x node, one line',
      target: { atMost: 1.15, atWorst: 1.25 },
    },
    { name: 'first live frame', value: screen.live.ratio, unit: 'x node, one line', target: { atMost: 2.8 } },
  ];
}

/** Milliseconds from the start of Node in a pseudo-terminal until a text arrives from it. */
async function firstSight(args: readonly string[], text: string): Promise<number> {
  const screen = new Screen(args, { columns: 80, rows: 24, env: ENVIRONMENT });
  const taken_ms = await screen.sight(text);
  screen.end();
  await screen.exited;
  return taken_ms;
}
