import { afterEach, describe, expect, it } from 'vitest';
import { conditionsIn, hitsFor } from '../../src/tui/hits.ts';
import { Stage, testWorld } from './helpers/stage.tsx';

let stage: Stage;
afterEach(() => stage.end());

const keys = (): string[] =>
  hitsFor(stage.state.search?.line.text ?? '', [], stage.state.question, stage.world)
    .slice()
    .flatMap((h) => (h.kind === 'entry' ? [h.entry.key] : []));
const noticeOf = async (): Promise<string> => (await stage.lines()).slice(-4, -1).join(' ');

describe('conditions beside the name of a medium', () => {
  it('narrow the list, and say how many are left and what was understood', async () => {
    stage = new Stage({ columns: 120, rows: 40 });
    stage.type('i').paste('glass n 1.5..1.53 clear 400nm..2um not toxic');
    const found = keys();
    expect(found).toContain('n-bk7');
    expect(found).not.toContain('fused-silica');
    const total = stage.world.survey().materials.length;
    const text = await noticeOf();
    expect(text).toContain(`${found.length} of ${total}`);
    expect(text).toContain('n 1.5 to 1.53, clear 0.4 um to 2 um, not toxic; words: glass');
    expect(await stage.text()).toMatch(/>\S.* 1\.5[0-3]\d\d clear/);
  });

  it('are the same as those of the search command: in order of the index, and none outside the range', () => {
    stage = new Stage();
    stage.type('i').paste('n 3..4.1 at 10um');
    const wave = conditionsIn('n 3..4.1 at 10um', stage.state.question, stage.world);
    const indices = (wave?.found ?? []).map(({ candidate }) => candidate.n);
    expect(indices.length).toBeGreaterThan(2);
    expect(indices).toEqual([...indices].sort((a, b) => Number(a) - Number(b)));
    for (const n of indices) expect(Number(n) >= 3 && Number(n) <= 4.1).toBe(true);
    expect(keys()).toContain('germanium');
  });

  it('counts what the catalogue cannot tell, with the reason', async () => {
    stage = new Stage();
    stage.type('i').paste('n 1.3..1.4');
    expect(await noticeOf()).toMatch(/\d+ of \d+; \d+ left out: no data at 632\.8 nm/);
  });

  it('say what is wrong and what would be right while the rest holds', async () => {
    stage = new Stage();
    stage.type('i').paste('n 1.5 class liquid ');
    const text = await noticeOf();
    expect(text).toMatch(/x .*"1\.5" is one value and no range; write 1\.5\.\. or \.\.1\.5/);
    expect(text).toContain('class liquid');
    expect(keys()).toContain('water');
    expect(keys()).not.toContain('germanium');
  });

  it('show how a keyword may go on, and are no mistake while being typed', async () => {
    stage = new Stage();
    stage.type('i').paste('class liquid n ');
    const text = await noticeOf();
    expect(text).toContain('go on: n 1.37..1.39');
    expect(text).not.toContain(' x ');
  });

  it('leave names and numbers what they are', () => {
    stage = new Stage();
    for (const text of ['n-bk7', 'n', 'n=1.5', 'n=1.5+', 'glass'])
      expect(conditionsIn(text, stage.state.question, testWorld()), text).toBeUndefined();
    expect(conditionsIn('n=1.5..1.6', stage.state.question, testWorld())?.found.length).toBeGreaterThan(0);
  });

  it('take the marked medium with the axis that meets them', () => {
    stage = new Stage();
    stage.type('i').paste('calcite n 1.4..1.5').type('<enter>');
    const { into } = stage.state.question;
    expect(into).toMatchObject({ kind: 'catalogue', axis: 'extraordinary', material: { key: 'calcite' } });
  });

  it('say so where nothing is left', async () => {
    stage = new Stage();
    stage.type('i').paste('n 9..9.1 class gas').type('<enter>');
    expect(stage.state.search).not.toBeNull();
    expect(await noticeOf()).toMatch(/0 of \d+/);
  });
});
