import fc from 'fast-check';
import { expect, it } from 'vitest';
import { boundaryColumn, planScreen } from '../../src/tui/picture/plan.ts';

const needs = { head: 2, notice: 2, body: 16 };
const size = fc.record({ columns: fc.integer({ min: 1, max: 400 }), rows: fc.integer({ min: 1, max: 200 }) });

it('never uses the last line of the terminal, and never more columns than there are', () => {
  fc.assert(
    fc.property(
      size,
      fc.integer({ min: 1, max: 6 }),
      fc.integer({ min: 1, max: 9 }),
      fc.integer({ min: 5, max: 40 }),
      (screen, head, notice, body) => {
        const plan = planScreen(screen, { head, notice, body });
        if (plan.kind === 'none') return;
        const lines =
          plan.head + plan.strip + plan.joint + plan.body + plan.curve + plan.notice + plan.footer;
        expect(lines).toBeLessThanOrEqual(screen.rows - 1);
        expect(Math.min(plan.head, plan.strip, plan.body, plan.curve, plan.notice)).toBeGreaterThanOrEqual(0);
        expect(plan.body).toBeGreaterThanOrEqual(3);
        if (plan.kind === 'full') {
          expect(plan.left + plan.middle + plan.right + 2).toBe(screen.columns);
          expect(Math.abs(plan.left - plan.right)).toBeLessThanOrEqual(1);
          expect(boundaryColumn(plan)).toBeGreaterThan(plan.left);
          expect(boundaryColumn(plan)).toBeLessThanOrEqual(plan.left + plan.middle);
        }
      },
    ),
  );
});

it.each([
  [80, 24, 'full'],
  [72, 20, 'full'],
  [71, 24, 'single'],
  [40, 12, 'single'],
  [39, 12, 'none'],
  [40, 11, 'none'],
  [200, 60, 'full'],
  [1, 1, 'none'],
])('at %d x %d the picture is %s', (columns, rows, kind) => {
  expect(planScreen({ columns, rows }, needs).kind).toBe(kind);
});

it('shows curves where there is room for everything else', () => {
  expect(planScreen({ columns: 80, rows: 24 }, needs).curve).toBe(0);
  expect(planScreen({ columns: 120, rows: 40 }, needs).curve).toBeGreaterThanOrEqual(8);
});

it('gives a longer notice room from the halves', () => {
  const short = planScreen({ columns: 80, rows: 24 }, needs);
  const long = planScreen({ columns: 80, rows: 24 }, { ...needs, notice: 4 });
  expect(long.notice).toBe(4);
  expect(long.body).toBe(short.body - 2);
});
