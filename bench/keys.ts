/** Key presses in the full-screen program: how soon the frame is there, how many bytes it takes, how many writes. */
import { mkdtempSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { type Line, median, percentile } from './figure.ts';
import { ENVIRONMENT, HOME, PROGRAM, ROOT } from './program.ts';
import { type Pressed, Screen } from './screen.ts';

/**
 * A stretch of ordinary use: angles, polarization, a wave typed, media searched, pages opened and left, a layer and a power
 * typed, a curve read off.
 */
const ORDINARY = [
  ...['a', '4', '5', '\r', 'p', 'p', 'p', '+', '+', '+', '-', '-'],
  ...['w', '1', '0', '6', '4', '\r', '+', '+', '-', '\x1b[C', '\x1b[C', '\x1b[D'],
  ...['i', 'g', 'e', 'r', '\x1b[B', '\r', 'f', 'w', 'a', 't', 'e', 'r', '\r'],
  ...['?', '\x1b', 'd', '\x1b', 's', '\x1b[B', '\x1b[B', '\x1b[A', '\x1b', '\t', '\t', '\x1b'],
  ...[
    'm',
    'n',
    '=',
    '1',
    '\x1b',
    'b',
    '1',
    '0',
    'm',
    'W',
    '\x1b',
    'r',
    '\x1b[C',
    '\x1b[C',
    '\x1b[D',
    '\x1b',
    'x',
    'x',
  ],
];

const ESCAPE = '\x1b';
const HELD = 'held 56 ms for the rest of a torn sequence';

type Key = Pressed & { readonly key: string };

export async function keyPresses(repeats: number): Promise<readonly Line[]> {
  const sizes = [
    [80, 24],
    [120, 40],
  ] as const;
  const lines: Line[] = [];
  for (const [columns, rows] of sizes) {
    const pressed = await session(columns, rows, repeats);
    const size = `${columns}x${rows}`;
    // A lone Esc is held until it is sure that it begins no other key: a time of its own, and no time of drawing.
    const ms = pressed.filter((p) => p.key !== ESCAPE).map((p) => p.ms);
    const escape_ms = pressed.filter((p) => p.key === ESCAPE).map((p) => p.ms);
    const ratios = pressed.filter((p) => p.changedCells > 0).map((p) => p.bytes / p.leastBytes);
    const worst = pressed.reduce((a, b) => (b.bytes / b.leastBytes > a.bytes / a.leastBytes ? b : a));
    lines.push(
      { name: `key to frame, median, ${size}`, value: median(ms), unit: 'ms' },
      {
        name: `key to frame, 99 of 100, ${size}`,
        value: percentile(ms, 99),
        unit: 'ms',
        target: { atMost: 16 },
        note: `${ms.length} keys`,
      },
      { name: `Esc to frame, 99 of 100, ${size}`, value: percentile(escape_ms, 99), unit: 'ms', note: HELD },
      { name: `bytes of a key, median, ${size}`, value: median(ratios), unit: 'x least change' },
      {
        name: `bytes of a key, worst, ${size}`,
        value: Math.max(...ratios),
        unit: 'x least change',
        target: { atMost: 2 },
        note: `${worst.bytes} bytes for ${worst.changedCells} cells`,
      },
      {
        name: `screens erased after the first frame, ${size}`,
        value: pressed.filter((p) => /\x1b\[[23]J/.test(p.text)).length,
        unit: 'of all keys',
        target: { atMost: 0 },
      },
    );
  }
  return [...lines, ...(await oneDigit()), ...(await writes())];
}

async function open(columns: number, rows: number, args: readonly string[] = []): Promise<Screen> {
  const screen = new Screen([...args, PROGRAM], { columns, rows, env: ENVIRONMENT });
  await screen.sight('keys');
  await screen.settle(400);
  return screen;
}

async function close(screen: Screen): Promise<void> {
  screen.type('\x03');
  await screen.exited;
}

async function session(columns: number, rows: number, repeats: number): Promise<readonly Key[]> {
  const screen = await open(columns, rows);
  const all: Key[] = [];
  // The first time through warms the program up, as the first minute of use does.
  for (let i = 0; i <= repeats; i++) {
    for (const key of ORDINARY) {
      const pressed = await screen.press(key);
      if (pressed && i > 0) all.push({ ...pressed, key });
    }
  }
  await close(screen);
  return all;
}

/** A digit typed where a digit stood. */
async function oneDigit(): Promise<readonly Line[]> {
  const screen = await open(80, 24);
  for (const key of ['w', '6', '3', '3']) await screen.press(key);
  await screen.press('\x7f');
  const taken: Pressed[] = [];
  for (const digit of ['1', '2', '4', '5', '6', '7', '8', '9']) {
    const pressed = await screen.press(`\x7f${digit}`);
    if (pressed) taken.push(pressed);
  }
  await close(screen);
  const cells = taken.map((p) => p.changedCells);
  return [
    {
      name: 'bytes for one changed digit',
      value: Math.max(...taken.map((p) => p.bytes)),
      unit: 'bytes',
      target: { atMost: 24 },
      note: `${Math.min(...cells)} to ${Math.max(...cells)} cells`,
    },
  ];
}

/** Counted inside the program, since a terminal shows bytes and not how many calls brought them. */
async function writes(): Promise<readonly Line[]> {
  const report = path.join(mkdtempSync(path.join(HOME, 'writes-')), 'writes');
  const counter = path.join(ROOT, 'bench', 'count-writes.cjs');
  const screen = new Screen(['--require', counter, PROGRAM], {
    columns: 80,
    rows: 24,
    env: { ...ENVIRONMENT, HALFSPACE_WRITES: report },
  });
  await screen.sight('keys');
  await screen.settle(400);
  const count = (): number => readFileSync(report, 'utf8').length;
  const perKey: number[] = [];
  for (const key of ORDINARY) {
    const before = count();
    const pressed = await screen.press(key);
    if (pressed) perKey.push(count() - before);
  }
  await close(screen);
  return [
    {
      name: 'writes of a key, most',
      value: Math.max(...perKey),
      unit: 'writes',
      target: { atMost: 1 },
      note: `${perKey.filter((n) => n > 1).length} of ${perKey.length} keys take more than one`,
    },
  ];
}
