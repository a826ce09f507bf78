import { setTimeout as sleep } from 'node:timers/promises';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { CellWriter, MIN_FRAME_GAP_MS } from '../../src/term/cell-writer.ts';
import { RecordedOutput } from '../helpers/recorded-output.ts';
import { TerminalModel } from '../helpers/terminal-model.ts';

function start(columns = 100, rows = 30): { out: RecordedOutput; writer: CellWriter } {
  const out = new RecordedOutput(columns, rows);
  return { out, writer: new CellWriter(out, out.size) };
}

/** A picture of the size and mix of a full-screen program: a list, numbers, a braille curve between frame lines. */
function picture({ digit = 5, selected = 3, phase = 0, rows = 29 } = {}): string {
  const lines: string[] = [];
  for (let y = 0; y < rows; y++) {
    const mark = y === selected ? '\x1b[7m> ' : '  ';
    const name = `${mark}medium ${String(y).padStart(2)}   n = 1.45${y}${y === 6 ? digit : 0}`.padEnd(
      y === selected ? 42 : 38,
    );
    let curve = '';
    for (let x = 0; x < 50; x++) {
      const height = Math.round((Math.sin(x / 4 + phase) * rows) / 3 + rows / 2);
      curve += height === y ? '\x1b[36m⠒\x1b[39m' : '\u2800';
    }
    lines.push(`${name}${y === selected ? '\x1b[27m' : ''} │ λ ${curve}`);
  }
  return lines.join('\n');
}

/** What a screen shows of a frame: drawn on a screen with room for all of it, then cut. */
const screenOf = async (frame: string, columns: number, rows: number): Promise<string> => {
  const model = new TerminalModel(200, 60);
  await model.write(frame.replaceAll('\u2800', ' ').replaceAll('\n', '\r\n'));
  const lines = model.lines().slice(0, rows);
  return lines
    .map((line) => line.slice(0, columns).trimEnd())
    .join('\n')
    .trimEnd();
};

describe('frames on the terminal', () => {
  it('costs few bytes per key: a digit, the selection, the curve', async () => {
    const { out, writer } = start();
    const cost: Record<string, number> = {};
    const draw = async (name: string, frame: string): Promise<void> => {
      const from = out.writes.length;
      await sleep(MIN_FRAME_GAP_MS + 4);
      writer.draw(frame);
      expect(out.writes.length - from).toBe(1);
      cost[name] = out.bytesSince(from);
      await out.settled();
      expect(out.model.text()).toBe(await screenOf(frame, 100, 30));
    };
    await draw('first', picture());
    await draw('digit', picture({ digit: 6 }));
    await draw('selection', picture({ digit: 6, selected: 4 }));
    await draw('curve', picture({ digit: 6, selected: 4, phase: 0.3 }));
    expect(cost['first']).toBeLessThanOrEqual(3000);
    expect(cost['digit']).toBeLessThanOrEqual(12);
    expect(cost['selection']).toBeLessThanOrEqual(140);
    // 50 columns, of which most move: at most 100 cells of 3 bytes or a space, in at most 100 runs.
    expect(cost['curve']).toBeLessThanOrEqual(1300);
  });

  it('never erases a line, the screen or the scrollback, and draws large changes in one piece', async () => {
    const { out, writer } = start();
    await out.model.write('\x1b[?1049h\x1b[?7l');
    for (let i = 0; i < 12; i++) {
      writer.draw(picture({ digit: i % 10, selected: i, phase: i, rows: i % 2 === 0 ? 30 : 12 }));
      await sleep(MIN_FRAME_GAP_MS + 2);
    }
    out.resize(60, 20);
    await sleep(60);
    writer.repaint();
    await sleep(30);
    const all = out.writes.join('');
    expect(all).not.toMatch(/\x1b\[[23]J|\x1b\[2K/);
    expect(all.match(/\x1b\[0?J/g)).toHaveLength(1);
    for (const write of out.writes) {
      const isLarge = write.length > 600;
      expect(write.startsWith('\x1b[?2026h') && write.endsWith('\x1b[?2026l')).toBe(isLarge);
    }
    expect(out.model.scrollback()).toEqual([]);
  });

  it('shows a wider, a narrower, a taller and a shorter screen as a fresh start would', async () => {
    const { out, writer } = start(80, 24);
    await out.model.write('\x1b[?1049h\x1b[?7l');
    writer.draw(picture());
    for (const [columns, rows] of [
      [100, 30],
      [50, 30],
      [50, 12],
      [90, 12],
      [7, 3],
      [1, 1],
      [80, 24],
    ] as const) {
      out.resize(columns, rows);
      await sleep(60);
      await out.settled();
      expect(out.model.text()).toBe(await screenOf(picture(), columns, rows));
    }
  });

  it('repaints everything, whatever stands on the screen', async () => {
    const { out, writer } = start(60, 12);
    writer.draw(picture());
    await out.settled();
    const before = out.model.lines();
    await out.model.write('\x1b[3;3H\x1b[41mrubbish from elsewhere\x1b[10;1Hmore\r\n\n\n');
    expect(out.model.lines()).not.toEqual(before);
    writer.repaint();
    await sleep(40);
    await out.settled();
    expect(out.model.lines()).toEqual(before);
  });

  it('places the cursor after each frame, and hides it again', async () => {
    const { out, writer } = start(60, 12);
    writer.draw('name: \nrest');
    await out.settled();
    expect(out.model.cursor.shown).toBe(false);
    await sleep(20);
    writer.setCursor({ column: 6, row: 0 });
    await out.settled();
    expect(out.model.cursor).toEqual({ x: 6, y: 0, shown: true });
    await sleep(20);
    writer.setCursor({ column: 7, row: 0 });
    writer.draw('name: a\nREST');
    await sleep(20);
    await out.settled();
    expect(out.model.cursor).toEqual({ x: 7, y: 0, shown: true });
    expect(out.model.text()).toBe('name: a\nREST');
    writer.setCursor({ column: 99, row: 99 });
    await sleep(20);
    await out.settled();
    expect(out.model.cursor).toEqual({ x: 59, y: 11, shown: true });
    writer.setCursor(null);
    await sleep(20);
    await out.settled();
    expect(out.model.cursor.shown).toBe(false);
  });

  it('ends below the picture in the default style and writes no more', async () => {
    const { out, writer } = start(20, 5);
    writer.draw('\x1b[1;7mlast');
    writer.finish();
    writer.finish();
    writer.draw('after the end');
    writer.repaint();
    out.emit('resize');
    await sleep(60);
    await out.settled();
    expect(out.writes).toHaveLength(2);
    expect(out.listenerCount('resize') + out.listenerCount('drain')).toBe(0);
    await out.model.write('prompt');
    expect(out.model.lines().at(-1)).toBe('prompt');
    expect(out.model.cell(0, 4).style).toBe('');
  });

  it('leaves the terminal alone when nothing was ever drawn', async () => {
    const { out, writer } = start();
    writer.repaint();
    await sleep(30);
    writer.finish();
    expect(out.writes).toEqual([]);
  });
});

describe('the time of a frame', () => {
  beforeEach(() => {
    vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout', 'performance'] });
  });
  afterEach(() => {
    vi.useRealTimers();
  });

  it('is now for the first of a burst, then at most once per gap, and the last frame is drawn', () => {
    const { out, writer } = start(40, 4);
    for (let i = 0; i < 100; i++) {
      writer.draw(`frame ${i}`);
      if (i === 0) expect(out.writes).toHaveLength(1);
      vi.advanceTimersByTime(2);
    }
    vi.advanceTimersByTime(100);
    expect(out.writes.length).toBeGreaterThan(9);
    expect(out.writes.length).toBeLessThanOrEqual(2 + 200 / MIN_FRAME_GAP_MS);
    expect(out.writes.at(-1)).toContain('9');
    const count = out.writes.length;
    vi.advanceTimersByTime(60_000);
    expect(out.writes).toHaveLength(count);
    writer.draw('frame 99');
    vi.advanceTimersByTime(100);
    expect(out.writes).toHaveLength(count);
    writer.draw('frame 98');
    expect(out.writes).toHaveLength(count + 1);
  });

  it('waits while the terminal does not read, and then draws the newest frame only', () => {
    const { out, writer } = start(40, 4);
    out.accepts = false;
    writer.draw('one');
    vi.advanceTimersByTime(50);
    writer.draw('two');
    vi.advanceTimersByTime(50);
    writer.draw('three');
    vi.advanceTimersByTime(50);
    expect(out.writes).toHaveLength(1);
    out.accepts = true;
    out.emit('drain');
    expect(out.writes).toHaveLength(2);
    expect(out.writes.at(-1)).toContain('three');
  });

  it('is never while drawing is paused; a repaint ends the pause', () => {
    const { out, writer } = start(40, 4);
    writer.draw('one');
    writer.draw('two');
    writer.pause();
    writer.draw('three');
    out.emit('resize');
    vi.advanceTimersByTime(200);
    expect(out.writes).toHaveLength(1);
    writer.repaint();
    vi.advanceTimersByTime(20);
    expect(out.writes).toHaveLength(2);
    expect(out.writes.at(-1)).toContain('three');
  });

  it('comes once when a change of size and a repaint fall together', () => {
    const { out, writer } = start(40, 4);
    writer.draw('one');
    vi.advanceTimersByTime(100);
    writer.repaint();
    out.emit('resize');
    writer.draw('two');
    vi.advanceTimersByTime(100);
    expect(out.writes).toHaveLength(2);
  });
});

describe('the stand-in for Ink', () => {
  it('has the size of the screen and reports its changes', () => {
    const { out, writer } = start(80, 24);
    const heard = vi.fn();
    writer.stream.on('resize', heard);
    expect(writer.stream.isTTY).toBe(true);
    out.resize(120, 40);
    expect(heard).toHaveBeenCalledTimes(1);
    expect([writer.stream.columns, writer.stream.rows]).toEqual([120, 40]);
    writer.stream.off('resize', heard);
    out.resize(80, 24);
    expect(heard).toHaveBeenCalledTimes(1);
    writer.finish();
  });

  it('takes frames and drops what is none', async () => {
    const { out, writer } = start(80, 24);
    for (const text of ['', '\x1b[?25l', '\x1b[?25h', '\x1b[?2026h', '\x1b[2K\x1b[1A\x1b[G'])
      writer.stream.write(text);
    expect(out.writes).toEqual([]);
    writer.stream.write('\x1b[1mframe\x1b[22m');
    await out.settled();
    expect(out.model.text()).toBe('frame');
    writer.stream.write(Buffer.from('bytes λ'));
    await sleep(20);
    await out.settled();
    expect(out.model.text()).toBe('bytes λ');
  });

  it('calls back after a write', async () => {
    const { writer } = start(80, 24);
    await new Promise<void>((resolve) => writer.stream.write('frame', () => resolve()));
    await new Promise<void>((resolve) => writer.stream.write('', 'utf8', () => resolve()));
  });
});
