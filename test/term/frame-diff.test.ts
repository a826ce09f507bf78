/**
 * The drawing of frames against a terminal emulator: whatever was on the screen, after the difference is written every
 * cell shows the glyph and the style of the new frame.
 */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseRow } from '../../src/term/cells.ts';
import { UNKNOWN } from '../../src/term/cursor-move.ts';
import { diffFrames, type Pen, unknownRow } from '../../src/term/frame-diff.ts';
import { PLAIN } from '../../src/term/sgr.ts';
import { TerminalModel } from '../helpers/terminal-model.ts';

const COLUMNS = 24;
const ROWS = 6;

interface Token {
  readonly glyph: string;
  readonly width: 1 | 2;
  readonly style: number;
}

/** Styles as a frame writes them (on, off) and as the emulator names them. */
const STYLES = [
  { on: '', off: '', name: '' },
  { on: '\x1b[1m', off: '\x1b[22m', name: 'bold' },
  { on: '\x1b[2m', off: '\x1b[22m', name: 'dim' },
  { on: '\x1b[1;2m', off: '\x1b[22m', name: 'bold dim' },
  { on: '\x1b[7m', off: '\x1b[27m', name: 'inverse' },
  { on: '\x1b[33m', off: '\x1b[39m', name: 'fg3' },
  { on: '\x1b[1m\x1b[96m', off: '\x1b[39m\x1b[22m', name: 'bold fg14' },
  { on: '\x1b[4;31m', off: '\x1b[0m', name: 'underline fg1' },
  { on: '\x1b[44m', off: '\x1b[49m', name: 'bg4' },
  { on: '\x1b[3;38;5;208m', off: '\x1b[m', name: 'italic fg208' },
  { on: '\x1b[9m\x1b[48;2;1;2;3m', off: '\x1b[49m\x1b[29m', name: 'strike bg#66051' },
] as const;

const narrow = fc.constantFrom(
  ' ',
  ' ',
  ' ',
  'a',
  'b',
  '7',
  'λ',
  '₂',
  '│',
  '⣿',
  '\u2800',
  'e\u0301',
  'n\u0303',
  '°',
);
const wide = fc.constantFrom('石', '英', 'か', '한');
const token: fc.Arbitrary<Token> = fc
  .record({
    glyph: fc.constant(''),
    width: fc.constant(1 as const),
    style: fc.oneof({ weight: 3, arbitrary: fc.constant(0) }, fc.nat(STYLES.length - 1)),
  })
  .chain((base) =>
    fc.oneof(
      { weight: 8, arbitrary: narrow.map((glyph) => ({ ...base, glyph })) },
      { weight: 1, arbitrary: wide.map((glyph) => ({ ...base, glyph, width: 2 as const })) },
    ),
  );
/** Lengths beyond the screen's edges test the clipping; rows that fill the screen test its right edge. */
const row = fc.oneof(
  fc.array(token, { maxLength: COLUMNS, size: 'max' }),
  fc.array(token, { minLength: COLUMNS - 2, maxLength: COLUMNS + 3, size: 'max' }),
);
const frame = fc.array(row, { maxLength: ROWS + 2, size: 'max' });
const edit = fc.record({
  y: fc.nat(ROWS),
  x: fc.nat(COLUMNS),
  cells: fc.array(token, { minLength: 1, maxLength: 5 }),
});
const change = fc.oneof(
  {
    weight: 5,
    arbitrary: fc.array(edit, { minLength: 1, maxLength: 4 }).map((edits) => ({ edits, whole: null })),
  },
  { weight: 1, arbitrary: frame.map((whole) => ({ edits: [], whole })) },
);
type Frame = readonly (readonly Token[])[];

function applyChange(
  before: Frame,
  { edits, whole }: { edits: { y: number; x: number; cells: Token[] }[]; whole: Frame | null },
): Frame {
  if (whole !== null) return whole;
  const after = before.map((tokens) => [...tokens]);
  for (const { y, x, cells } of edits) after[y]?.splice(x, cells.length, ...cells);
  return after;
}

/** Neighbours of one style share one pair of sequences in every second frame, and have their own in the others. */
function rowText(tokens: readonly Token[], shared: boolean): string {
  let text = '';
  tokens.forEach(({ glyph, style }, x) => {
    const look = STYLES[style]!;
    const opens = !shared || tokens[x - 1]?.style !== style;
    const closes = !shared || tokens[x + 1]?.style !== style;
    text += (opens ? look.on : '') + glyph + (closes ? look.off : '');
  });
  return text;
}

interface ExpectedCell {
  readonly glyph: string;
  readonly width: number;
  readonly style: string;
}

/** What the screen must show, from the tokens alone. */
function expectedRow(tokens: readonly Token[]): ExpectedCell[] {
  const cells: ExpectedCell[] = [];
  for (const { glyph, width, style } of tokens) {
    if (cells.length >= COLUMNS) break;
    const name = STYLES[style]!.name;
    if (glyph === ' ' || glyph === '\u2800' || cells.length + width > COLUMNS)
      cells.push({ glyph: ' ', width: 1, style: name });
    else {
      cells.push({ glyph, width, style: name });
      if (width === 2) cells.push({ glyph: '', width: 0, style: name });
    }
  }
  while (cells.length < COLUMNS) cells.push({ glyph: ' ', width: 1, style: '' });
  return cells;
}

const SHOWS_ON_BLANK = /underline|inverse|strike|bg/;

function differences(model: TerminalModel, frameNow: Frame): string[] {
  const found: string[] = [];
  for (let y = 0; y < ROWS; y++) {
    expectedRow(frameNow[y] ?? []).forEach((expected, x) => {
      const cell = model.cell(x, y);
      const ignoresStyle =
        expected.width === 0 || (expected.glyph === ' ' && !SHOWS_ON_BLANK.test(expected.style));
      const sameStyle = ignoresStyle
        ? !SHOWS_ON_BLANK.test(cell.style) || expected.width === 0
        : cell.style === expected.style;
      if (cell.glyph !== expected.glyph || cell.width !== expected.width || !sameStyle)
        found.push(`${x},${y}: ${JSON.stringify(cell)} instead of ${JSON.stringify(expected)}`);
    });
  }
  return found;
}

/** One plain comparison: thousands of frames are checked. */
function expectShown(model: TerminalModel, wanted: Frame): void {
  const wrong = [
    ...differences(model, wanted),
    ...model.scrollback().map((line) => `scrolled away: ${line}`),
  ];
  if (wrong.length > 0) throw new Error(wrong.join('\n'));
}

const parse = (frameNow: Frame, shared: boolean) =>
  frameNow.slice(0, ROWS).map((tokens) => parseRow(rowText(tokens, shared), COLUMNS));

describe('frame differences on a terminal', () => {
  it('shows exactly the new frame after every difference', async () => {
    let drawn = 0;
    await fc.assert(
      fc.asyncProperty(
        frame,
        fc.array(change, { minLength: 8, maxLength: 14 }),
        fc.boolean(),
        async (first, changes, autowrap) => {
          const model = new TerminalModel(COLUMNS, ROWS);
          await model.write(autowrap ? '' : '\x1b[?7l');
          const pen: Pen = { x: 0, y: 0, style: PLAIN };
          let shown = parse(first, true);
          let current: Frame = first;
          await model.write(diffFrames([], shown, pen, COLUMNS));
          expectShown(model, current);
          for (const [index, step] of changes.entries()) {
            current = applyChange(current, step);
            const next = parse(current, index % 2 === 0);
            await model.write(diffFrames(shown, next, pen, COLUMNS));
            shown = next;
            drawn++;
            expectShown(model, current);
          }
        },
      ),
      { numRuns: 180 },
    );
    expect(drawn).toBeGreaterThan(1500);
  });

  it('shows exactly the frame after a repaint over garbage', async () => {
    const garbage = fc.array(fc.constantFrom('x', '石', '\r\n', '\x1b[41m', '\x1b[1m', '\x1b[3;7H'), {
      maxLength: 60,
    });
    await fc.assert(
      fc.asyncProperty(frame, garbage, async (wanted, rubbish) => {
        const model = new TerminalModel(COLUMNS, ROWS);
        await model.write(`\x1b[?1049h${rubbish.join('')}`);
        const pen: Pen = { x: UNKNOWN, y: UNKNOWN, style: PLAIN };
        const unknown = new Array(ROWS).fill(unknownRow(COLUMNS));
        await model.write(`\x1b[m${diffFrames(unknown, parse(wanted, true), pen, COLUMNS)}`);
        expectShown(model, wanted);
      }),
      { numRuns: 150 },
    );
  });

  it('writes nothing for an equal frame, whatever its sequences', () => {
    fc.assert(
      fc.property(frame, (same) => {
        const pen: Pen = { x: 3, y: 2, style: PLAIN };
        expect(diffFrames(parse(same, true), parse(same, false), pen, COLUMNS)).toBe('');
      }),
    );
  });

  it('keeps the neighbours right when the terminal measures a glyph otherwise', async () => {
    // The emulator shows these in one column, the layout counts two, and the other way round for the last one.
    for (const glyph of ['👍', '⚠️', '🇫🇷', '☰', '\u1100\u1161', 'क्षि', '\u3248']) {
      const model = new TerminalModel(COLUMNS, ROWS);
      await model.write('\x1b[?7l');
      const pen: Pen = { x: 0, y: 0, style: PLAIN };
      const frames = [
        `ab${glyph}cd`,
        `aB${glyph}cd`,
        `aB${glyph}cD`,
        `${glyph}aBcD`,
        'aBcD',
        `aBcD${' '.repeat(18)}${glyph}`,
        `a${glyph}cd`,
        // The same row with another such glyph: only this one changes, and it may cover more than its own cell.
        'a\u3249cd',
        'a\u324acd',
        'x',
      ];
      let shown: ReturnType<typeof parseRow>[] = [];
      for (const text of frames) {
        const next = [parseRow(text, COLUMNS), parseRow('below', COLUMNS)];
        await model.write(diffFrames(shown, next, pen, COLUMNS));
        shown = next;
        next[0]!.glyphs.forEach((expected, x) => {
          if (/^[a-zA-Z]$/.test(expected)) expect(model.cell(x, 0).glyph).toBe(expected);
        });
        const letters = model.lines()[0]!.replace(/[^a-zA-Z]/g, '');
        expect(letters).toBe(text.replace(/[^a-zA-Z]/g, ''));
        expect(model.lines()[1]).toBe('below');
      }
    }
  });
});

describe('bytes of a difference', () => {
  const bytes = (before: string, after: string, y = 11): number => {
    const pad = new Array<string>(y).fill('');
    const rows = (text: string) => [...pad, text].map((line) => parseRow(line, 100));
    const pen: Pen = { x: 40, y: 3, style: PLAIN };
    return Buffer.byteLength(diffFrames(rows(before), rows(after), pen, 100));
  };

  it.each([
    ['a plain digit', `${' '.repeat(50)}1.4585`, `${' '.repeat(50)}1.4586`, 10],
    ['a bold digit', `${' '.repeat(50)}\x1b[1m1.4585\x1b[22m`, `${' '.repeat(50)}\x1b[1m1.4586\x1b[22m`, 14],
    [
      'a coloured digit',
      `${' '.repeat(50)}\x1b[1;33m1.4585\x1b[m`,
      `${' '.repeat(50)}\x1b[1;33m1.4586\x1b[m`,
      17,
    ],
    ['two digits close together', `${' '.repeat(50)}1.4585`, `${' '.repeat(50)}2.4586`, 14],
    [
      'two digits with a coloured one between',
      `${' '.repeat(50)}1\x1b[31m2\x1b[m3`,
      `${' '.repeat(50)}4\x1b[31m2\x1b[m5`,
      13,
    ],
    ['two digits far apart', `1${' '.repeat(50)}1`, `2${' '.repeat(50)}2`, 12],
    [
      'a letter typed before the cursor of a field',
      `${' '.repeat(94)}\x1b[4mfuse\x1b[4;7m \x1b[m`,
      `${' '.repeat(94)}\x1b[4mfused\x1b[4;7m \x1b[m`,
      18,
    ],
    ['an emptied row', 'x'.repeat(80), '', 8],
    ['a shortened row', 'x'.repeat(80), 'x'.repeat(40), 9],
    ['nothing', 'same', 'same', 0],
  ])('%s', (_, before, after, limit) => {
    expect(bytes(before, after)).toBeLessThanOrEqual(limit);
  });

  it('stays within twice the changed cells plus eight per run, for text of one style', () => {
    const letters = fc.string({
      unit: fc.constantFrom('a', 'b', ' ', 'λ', '⣿'),
      minLength: 0,
      maxLength: 100,
    });
    fc.assert(
      fc.property(
        fc.array(letters, { maxLength: 30 }),
        fc.array(letters, { maxLength: 30 }),
        (before, after) => {
          const old = before.map((line) => parseRow(line, 100));
          const next = after.map((line) => parseRow(line, 100));
          let budget = 0;
          for (let y = 0; y < Math.max(old.length, next.length); y++) {
            let inRun = false;
            for (let x = 0; x < 100; x++) {
              const glyph = next[y]?.glyphs[x] ?? ' ';
              const isChanged = glyph !== (old[y]?.glyphs[x] ?? ' ');
              if (isChanged) budget += Buffer.byteLength(glyph) + (inRun ? 0 : 8);
              inRun = isChanged;
            }
          }
          const pen: Pen = { x: 0, y: 0, style: PLAIN };
          expect(Buffer.byteLength(diffFrames(old, next, pen, 100))).toBeLessThanOrEqual(2 * budget);
        },
      ),
      { numRuns: 300 },
    );
  });
});
