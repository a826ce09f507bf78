/** The wave strip with the boundary in it, and the line below in which the boundary opens. */
import type { Answer } from '../../answer/answer.ts';
import type { DotStyle } from '../dot-canvas.ts';
import { boundaryColumn, type Plan } from '../picture/plan.ts';
import { drawWaveStrip } from '../wave-strip.ts';
import { lineOfSpans, type Pen, span } from './pen.ts';

export function stripView(answer: Answer | null, plan: Plan, style: DotStyle, pen: Pen): readonly string[] {
  const boundary = boundaryColumn(plan);
  const before = boundary;
  const beyond = plan.columns - boundary - 1;
  const blank = { before: [], beyond: [] };
  const strip = answer ? drawWaveStrip(answer, { before, beyond, rows: plan.strip }, style) : blank;
  return Array.from({ length: plan.strip }, (_, y) =>
    lineOfSpans(
      [
        span((strip.before[y] ?? '').padEnd(before), 'wave-from'),
        span(pen.glyphs.rail, 'boundary'),
        span(strip.beyond[y] ?? '', 'wave-into'),
      ],
      plan.columns,
      pen,
    ),
  );
}

/** `┏━━━┻━━━┓`: the boundary widens so that what belongs to it finds room inside. */
export function openingView(plan: Plan, pen: Pen): string {
  const { openLeft, openMiddle, openRight } = pen.glyphs;
  return widenedBoundary(plan, pen, [openLeft, openMiddle, openRight]);
}

/** `┗━━━┳━━━┛`: it closes to a line again above the curves. */
export function closingView(plan: Plan, pen: Pen): string {
  const { closeLeft, closeMiddle, closeRight } = pen.glyphs;
  return widenedBoundary(plan, pen, [closeLeft, closeMiddle, closeRight]);
}

function widenedBoundary(
  plan: Plan,
  pen: Pen,
  [left, middle, right]: readonly [string, string, string],
): string {
  const toMiddle = boundaryColumn(plan) - plan.left - 1;
  const line = (length: number): string => pen.glyphs.openLine.repeat(length);
  const boundary = left + line(toMiddle) + middle + line(plan.middle - toMiddle - 1) + right;
  return lineOfSpans([span(' '.repeat(plan.left)), span(boundary, 'boundary')], plan.columns, pen);
}
