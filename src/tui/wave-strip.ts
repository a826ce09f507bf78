/**
 * The wave strip: the field along the ray, drawn to scale in dots. One scale serves both media, so crest spacings compare
 * as the wavelengths do; heights compare as the field amplitudes do. Where crests are too close for the dots the wave is a
 * filled band; where the field has died away nothing is drawn.
 */
import type { Answer } from '../answer/answer.ts';
import { DotCanvas, type DotStyle } from './dot-canvas.ts';
import { type RayField, rayField } from './ray-field.ts';

export interface StripSize {
  /** Columns before and beyond the boundary. */
  readonly before: number;
  readonly beyond: number;
  readonly rows: number;
}

export interface WaveStrip {
  readonly before: readonly string[];
  readonly beyond: readonly string[];
}

/** Columns between the crests of the longer wave, and the fewest between those of the shorter one. */
const LONG_CREST_columns = 12;
const SHORT_CREST_columns = 2.5;
/** Smallest amplitude that fills the strip: weak waves look weak, and a pure incident wave has room above it. */
const FULL_HEIGHT = 1.25;

export function drawWaveStrip(answer: Answer, size: StripSize, style: DotStyle): WaveStrip {
  const field = rayField(answer);
  const before = new DotCanvas(size.before, size.rows, style);
  const beyond = new DotCanvas(size.beyond, size.rows, style);
  const columns = columnsPerWavelength(field, size.before);
  const full = Math.max(FULL_HEIGHT, Math.min(field.peak, 2.5));
  const perDot = size.before > 0 ? size.before / before.width / columns : 0;
  drawSide(before, full, (x) => field.before((before.width - x) * perDot));
  const smallest = (full / Math.max(1, beyond.height - 1)) * 0.75;
  drawSide(
    beyond,
    full,
    (x) => field.beyond(x * perDot),
    (x) => field.envelopeBeyond(x * perDot) > smallest,
  );
  return { before: before.rows(), beyond: beyond.rows() };
}

/** Columns of one vacuum wavelength. */
function columnsPerWavelength(field: RayField, room: number): number {
  const indices = [field.indexBefore];
  const crests = field.depthBeyond * field.indexBeyond;
  // A wave that is gone within a third of its own length shows no crests to leave room for.
  if (field.indexBeyond > 0 && crests > 1 / 3) indices.push(field.indexBeyond);
  const wide = LONG_CREST_columns * Math.min(...indices);
  const needed = SHORT_CREST_columns * Math.max(...indices);
  return Math.min(Math.max(wide, needed), Math.max(1, room) * field.indexBefore);
}

/** Fills each dot column from the lowest to the highest value the field takes in it. */
function drawSide(
  canvas: DotCanvas,
  full: number,
  valueAt: (x: number) => number,
  isVisible: (x: number) => boolean = () => true,
): void {
  const middle = (canvas.height - 1) / 2;
  const y = (value: number): number => Math.round(middle - Math.max(-1, Math.min(1, value / full)) * middle);
  const steps = 4;
  for (let x = 0; x < canvas.width; x++) {
    if (!isVisible(x)) continue;
    let low = Number.POSITIVE_INFINITY;
    let high = Number.NEGATIVE_INFINITY;
    for (let i = 0; i <= steps; i++) {
      const at = y(valueAt(x + i / steps));
      low = Math.min(low, at);
      high = Math.max(high, at);
    }
    canvas.vertical(x, low, high);
  }
}
