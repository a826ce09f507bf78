import { afterEach, describe, expect, it } from 'vitest';
import { isRefusal } from '../../src/medium/refusal.ts';
import { Stage } from './helpers/stage.tsx';

let stage: Stage;
afterEach(() => stage.end());

describe('layers between the halves', () => {
  it('are typed in the middle, answered as a path, listed, and taken out again', async () => {
    stage = new Stage({ columns: 120, rows: 40 });
    expect(await stage.text()).toMatch(/layers +none/);
    stage.type('mmagnesium-fluoride-film@qw n=2.1@60nm<enter>');
    const { question, outcome } = stage.state;
    expect(question.layers).toHaveLength(2);
    expect(isRefusal(outcome) ? 0 : outcome.layers.length).toBe(2);
    const text = await stage.text();
    expect(text).toMatch(/1 +11\d\.\d+ nm Magnesium/);
    expect(text).toMatch(/2 +60\.00 nm n=2\.1/);
    stage.type('mnone<enter>');
    expect(stage.state.question.layers).toEqual([]);
  });

  it('keep what was typed where a layer is not understood, and say what would be right', async () => {
    stage = new Stage({ columns: 120, rows: 40 });
    stage.type('mmagnesium-fluoride-film<enter>');
    expect(stage.state.entry?.line.text).toBe('magnesium-fluoride-film');
    expect(await stage.text()).toMatch(/has no thickness/);
  });
});
