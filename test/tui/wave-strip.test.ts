import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Answer } from '../../src/answer/answer.ts';
import { DotCanvas } from '../../src/tui/dot-canvas.ts';
import { rayField } from '../../src/tui/ray-field.ts';
import { drawWaveStrip } from '../../src/tui/wave-strip.ts';
import { ask, DEGREE, index, vacuumWave } from '../helpers/ask.ts';

type Medium = Parameters<typeof ask>[0];

function between(from: Medium, into: Medium, degrees = 0, polarization: 's' | 'p' = 's'): Answer {
  return ask(from, into, vacuumWave(633e-9), { incidenceAngle_rad: degrees * DEGREE, polarization });
}

/** Distances at which a function crosses zero upwards. */
function risingZeros(f: (x: number) => number, end: number): number[] {
  const zeros: number[] = [];
  const step = 1e-4;
  for (let x = 0; x < end; x += step) if (f(x) < 0 && f(x + step) >= 0) zeros.push(x);
  return zeros;
}

const spacing = (zeros: number[]): number => (zeros.at(-1)! - zeros[0]!) / (zeros.length - 1);

describe('the field along the ray', () => {
  it('has crests a wavelength apart in each medium, at any angle', () => {
    for (const degrees of [0, 30, 60]) {
      const field = rayField(between(index(1.5), index(1.2), degrees * 0.8));
      expect(spacing(risingZeros(field.beyond, 8))).toBeCloseTo(1 / 1.2, 3);
    }
    const alone = rayField(between(index(2), index(2)));
    expect(spacing(risingZeros(alone.before, 4))).toBeCloseTo(1 / 2, 3);
  });

  it('is continuous through the boundary for s', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 4, noNaN: true }),
        fc.double({ min: 1, max: 4, noNaN: true }),
        fc.double({ min: 0, max: 85, noNaN: true }),
        (n1, n2, degrees) => {
          const field = rayField(between(index(n1), index(n2), degrees));
          expect(field.before(0)).toBeCloseTo(field.beyond(0), 9);
        },
      ),
    );
  });

  it('beats as 1 + |r| to 1 - |r| where the reflected wave runs back', () => {
    const answer = between(index(1), index(3));
    const r = Math.sqrt(answer.interface.Rs);
    const field = rayField(answer);
    const largest = (from: number, to: number): number => {
      let most = 0;
      for (let x = from; x < to; x += 1e-3) most = Math.max(most, Math.abs(field.before(x)));
      return most;
    };
    // The instant drawn shows the standing part at its largest: its antinodes reach 1 + r.
    expect(largest(0, 2)).toBeCloseTo(1 + r, 2);
  });

  it('shows a mirror as a standing wave, not as the instant at which that is zero', () => {
    const field = rayField(between(index(1), index(0.01, 30)));
    let most = 0;
    for (let x = 0; x < 1; x += 1e-3) most = Math.max(most, Math.abs(field.before(x)));
    expect(most).toBeGreaterThan(1.9);
    expect(Math.abs(field.before(0))).toBeLessThan(0.1);
  });

  it('does not beat for p at 45 degrees, where the two fields are perpendicular', () => {
    const field = rayField(between(index(1), index(3), 45, 'p'));
    let most = 0;
    for (let x = 0; x < 3; x += 1e-3) most = Math.max(most, Math.abs(field.before(x)));
    expect(most).toBeCloseTo(1, 2);
  });

  it('is damped by an absorbing medium as exp(-2 pi k d)', () => {
    const field = rayField(between(index(1), index(1.5, 0.1)));
    expect(field.depthBeyond).toBeCloseTo(1 / (2 * Math.PI * 0.1), 9);
    expect(field.envelopeBeyond(field.depthBeyond) / field.envelopeBeyond(0)).toBeCloseTo(1 / Math.E, 9);
  });

  it('leaves an evanescent tail without crests in total reflection', () => {
    const answer = between(index(1.5), index(1), 60);
    const field = rayField(answer);
    expect(field.indexBeyond).toBe(0);
    expect(field.depthBeyond).toBeCloseTo(answer.interface.evanescentDepth_m! / 633e-9, 12);
    expect(risingZeros(field.beyond, 3)).toEqual([]);
    expect(Math.abs(field.beyond(2))).toBeLessThan(Math.abs(field.beyond(0.1)));
  });
});

describe('the strip', () => {
  const size = { before: 39, beyond: 40, rows: 4 };

  it('has the size asked for in every style', () => {
    for (const style of ['braille', 'blocks', 'ascii'] as const) {
      const strip = drawWaveStrip(between(index(1), index(1.5), 30), size, style);
      expect(strip.before.map((row) => row.length)).toEqual([39, 39, 39, 39]);
      expect(strip.beyond.map((row) => row.length)).toEqual([40, 40, 40, 40]);
    }
  });

  it('draws with the characters of its style alone', () => {
    const all = (style: 'braille' | 'blocks' | 'ascii'): string => {
      const strip = drawWaveStrip(between(index(1), index(1.5), 30), size, style);
      return [...strip.before, ...strip.beyond].join('');
    };
    expect(all('braille')).toMatch(/^[ \u2801-\u28ff]+$/);
    expect(all('blocks')).toMatch(/^[ ▀▄█]+$/);
    expect(all('ascii')).toMatch(/^[\x20-\x7e]+$/);
  });

  it('shows crests as far apart as the wavelengths say', () => {
    const strip = drawWaveStrip(between(index(1), index(2)), { before: 60, beyond: 60, rows: 4 }, 'braille');
    const crests = (rows: readonly string[]): number => rows[0]!.trim().split(/ {2,}/).length;
    // Twice as many crests in the same width; the height differs, so the first row may miss none on either side.
    const top = (rows: readonly string[]): number =>
      Math.max(...rows.map((row) => row.trim().split(/ {2,}/).length));
    expect(top(strip.beyond)).toBeGreaterThan(1.7 * crests(strip.before));
  });

  it('is empty beyond a mirror and full before it', () => {
    const strip = drawWaveStrip(between(index(1), index(0.05, 40)), size, 'braille');
    expect(strip.beyond.join('').trim()).toBe('');
    expect(strip.before.join('').trim()).not.toBe('');
  });

  it('copes with any passive pair', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.05, max: 300, noNaN: true }),
        fc.double({ min: 0, max: 300, noNaN: true }),
        fc.double({ min: 0, max: 89.9, noNaN: true }),
        fc.constantFrom('s' as const, 'p' as const),
        (n, k, degrees, polarization) => {
          const strip = drawWaveStrip(between(index(1), index(n, k), degrees, polarization), size, 'braille');
          expect(strip.before).toHaveLength(4);
          expect(strip.beyond.join('')).toHaveLength(160);
        },
      ),
    );
  });
});

describe('the canvas of dots', () => {
  it('sets the braille dots of the cell by column and row', () => {
    const canvas = new DotCanvas(1, 1, 'braille');
    canvas.set(0, 0);
    canvas.set(1, 3);
    expect(canvas.rows()).toEqual([String.fromCharCode(0x2800 + 0x01 + 0x80)]);
  });

  it('draws halves of blocks and thirds of ASCII cells', () => {
    const blocks = new DotCanvas(3, 1, 'blocks');
    blocks.set(0, 0);
    blocks.set(1, 1);
    blocks.vertical(2, 0, 1);
    expect(blocks.rows()).toEqual(['▀▄█']);
    const ascii = new DotCanvas(4, 1, 'ascii');
    ascii.set(0, 0);
    ascii.set(1, 1);
    ascii.set(2, 2);
    ascii.vertical(3, 2, 0);
    expect(ascii.rows()).toEqual(["'-.|"]);
  });

  it('ignores dots outside', () => {
    const canvas = new DotCanvas(2, 2, 'braille');
    for (const [x, y] of [
      [-1, 0],
      [0, -1],
      [4, 0],
      [0, 8],
    ] as const)
      canvas.set(x, y);
    canvas.vertical(1, -50, -10);
    expect(canvas.rows().join('').trim()).toBe('');
  });
});
