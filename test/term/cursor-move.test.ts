import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cursorMove, UNKNOWN } from '../../src/term/cursor-move.ts';
import { TerminalModel } from '../helpers/terminal-model.ts';

describe('cursor moves', () => {
  it.each([
    [{ x: 4, y: 4 }, { x: 4, y: 4 }, ''],
    [{ x: 4, y: 4 }, { x: 0, y: 0 }, '\x1b[H'],
    [{ x: 4, y: 4 }, { x: 0, y: 4 }, '\r'],
    [{ x: 4, y: 4 }, { x: 0, y: 5 }, '\x1bE'],
    [{ x: 4, y: 4 }, { x: 5, y: 4 }, '\x1b[C'],
    [{ x: 4, y: 4 }, { x: 2, y: 4 }, '\b\b'],
    [{ x: 24, y: 4 }, { x: 12, y: 4 }, '\x1b[13G'],
    [{ x: 4, y: 14 }, { x: 4, y: 12 }, '\x1b[2A'],
    [{ x: 4, y: 14 }, { x: 9, y: 11 }, '\x1b[12;10H'],
    [{ x: UNKNOWN, y: 4 }, { x: 9, y: 4 }, '\x1b[10G'],
    [{ x: UNKNOWN, y: 4 }, { x: 0, y: 5 }, '\x1bE'],
    [{ x: UNKNOWN, y: UNKNOWN }, { x: 9, y: 0 }, '\x1b[;10H'],
  ])('from %j to %j', (from, to, sequence) => {
    expect(cursorMove(from, to)).toBe(sequence);
  });

  it('lead there from everywhere, also from the position after the last column', async () => {
    const model = new TerminalModel(12, 7);
    const position = fc.record({ x: fc.nat(11), y: fc.nat(6) });
    await fc.assert(
      fc.asyncProperty(position, position, fc.boolean(), async (from, to, fromEdge) => {
        const start = fromEdge ? { x: UNKNOWN, y: from.y } : from;
        await model.write(fromEdge ? `\x1b[${from.y + 1};12Hx` : `\x1b[${from.y + 1};${from.x + 1}H`);
        const move = cursorMove(start, to);
        await model.write(move);
        expect({ x: model.cursor.x, y: model.cursor.y }).toEqual(to);
        expect(move.length).toBeLessThanOrEqual(7);
        expect(model.scrollback()).toEqual([]);
      }),
      { numRuns: 250 },
    );
  });
});
