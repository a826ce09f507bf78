/** The full-screen program drawn in full, without a terminal: random keys, pastes and sizes, and a look at each frame. */
import { displayWidth } from '../../src/term/display-width.ts';
import { KeyParser } from '../../src/term/key-parser.ts';
import { Stage } from '../tui/helpers/stage.tsx';
import { keyPieces } from './key-pieces.ts';
import type { Target } from './targets.ts';

const FRAMES_A_SESSION = 200;
const ERROR_SCREEN = /^\s*ERROR\b|^\s+at .+:\d+|^ - .+:\d+:\d+$/m;
/** What a number or a part that is not there would look like. */
const NO_TEXT = /\bNaN\b|\bundefined\b|\[object /;

let stage: Stage | undefined;
let frames = 0;

function check(lines: readonly string[], { columns, rows }: { columns: number; rows: number }): void {
  const text = lines.join('\n');
  if (ERROR_SCREEN.test(text)) throw new Error(`the screen broke:\n${text}`);
  if (NO_TEXT.test(text)) throw new Error(`not a text for people:\n${text}`);
  if (lines.length > rows) throw new Error(`${lines.length} lines on ${rows} rows:\n${text}`);
  const long = lines.find((line) => displayWidth(line) > columns);
  if (long !== undefined) throw new Error(`${displayWidth(long)} of ${columns} columns: ${long}`);
}

export const screen: Target = {
  name: 'frames',
  weight: 0.05,
  make(r) {
    const pieces = keyPieces(r).filter((piece) => !NO_TEXT.test(piece));
    const size = { columns: 1 + r.below(200), rows: 1 + r.below(60) };
    const resizes = r.chance(0.1);
    return {
      input: JSON.stringify([pieces, ...(resizes ? [size] : [])]),
      feed: async () => {
        if (frames++ % FRAMES_A_SESSION === 0) {
          stage?.end();
          stage = new Stage({ columns: 100, rows: 30 });
        }
        const shown = stage as Stage;
        if (resizes) shown.resize(size.columns, size.rows);
        const parser = new KeyParser();
        for (const event of [...pieces.flatMap((piece) => parser.push(piece)), ...parser.expire()])
          shown.store.dispatch(event);
        try {
          check(await shown.lines(), shown.state.size);
        } catch (error) {
          // The next input meets a screen that works.
          frames = 0;
          throw error;
        }
      },
    };
  },
};
