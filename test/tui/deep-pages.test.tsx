import { afterEach, describe, expect, it } from 'vitest';
import { makeQuestion } from '../../src/answer/question.ts';
import { orderPage } from '../../src/present/order-page.ts';
import { orderReport } from '../../src/selection/order/order-report.ts';
import { answerOf } from '../../src/tui/state.ts';
import { named, vacuumWave } from '../helpers/ask.ts';
import { Stage, type StageOptions } from './helpers/stage.tsx';

let stage: Stage;
const open = (options: StageOptions = {}): Stage => {
  stage = new Stage(options);
  return stage;
};
afterEach(() => stage.end());

describe('coatings for the two media', () => {
  it('stand on a page of their own, and the marked film is put between the media', async () => {
    open({ columns: 80, rows: 24 }).type('F');
    const text = await stage.text();
    expect(text).toMatch(/Coatings between Air and Fused silica/);
    expect(text).toMatch(/ > ?magnesium-fluoride-film +1\.\d+/);
    const report = stage.world.coatings(stage.state.question);
    const best = report && 'singleFilms' in report ? report.singleFilms[0] : undefined;
    stage.type('<enter>');
    expect(stage.state.page).toBeNull();
    expect(stage.state.question.layers).toHaveLength(1);
    expect(stage.state.question.layers[0]?.thickness).toEqual({
      kind: 'length',
      thickness_m: best?.thickness_m,
    });
    expect(answerOf(stage.state)?.stack?.R).toBeCloseTo(best?.R ?? Number.NaN, 9);
    expect(await stage.text()).toContain('between the media now: 1 layer');
    stage.type('u');
    expect(stage.state.question.layers).toEqual([]);
  });

  it('mark by the arrows, down to the pairs and the mirrors, which keep their order', () => {
    open({ columns: 120, rows: 60 }).type('F');
    const report = stage.world.coatings(stage.state.question);
    if (!report || !('singleFilms' in report)) throw new Error('no coatings');
    for (let i = 0; i < report.singleFilms.length; i++) stage.type('j');
    stage.type('<enter>');
    const pair = report.twoLayers[0];
    const keys = stage.state.question.layers.map((l) =>
      l.medium.kind === 'catalogue' ? l.medium.material.key : '',
    );
    expect(keys).toEqual([pair?.outer.key, pair?.inner.key]);
  });

  it('are shown again under the same key and closed by Esc, the focus kept', () => {
    open().type('<tab>');
    const { focus } = stage.state;
    stage.type('F<escape>');
    expect(stage.state.page).toBeNull();
    expect(stage.state.focus).toBe(focus);
    stage.type('FF');
    expect(stage.state.page).toBeNull();
  });
});

describe('the order check of the present path', () => {
  const window = makeQuestion(named('air'), named('sodium-chloride'), {
    ...vacuumWave(10.6e-6),
    text: '10.6 um',
  });

  it('says every remark with its level as a word and as a mark', async () => {
    open({ question: window, columns: 120, rows: 60 }).type('O');
    const text = await stage.text();
    const report = orderReport(stage.world.survey(), [window]);
    if ('remedy' in report) throw new Error(report.message);
    const { sections, headline } = orderPage(report, { ascii: false });
    expect(text).toContain(headline);
    const rows = sections.flatMap((s) => s.rows);
    expect(rows.length).toBeGreaterThan(3);
    const marks = { stop: 'x', look: '!', fine: '-' };
    for (const { level, topic } of rows)
      expect(text).toMatch(new RegExp(`^ \\${marks[level]} ${level} +${topic} `, 'm'));
  });

  it('fits a small screen, every line in reach', async () => {
    open({ question: window, columns: 80, rows: 24 }).type('OG');
    const lines = await stage.lines();
    expect(lines.length).toBeLessThanOrEqual(23);
    expect(lines.join('\n')).toMatch(/\[1\] \S/);
  });
});

describe('the comparison with the media chosen last', () => {
  it('says what to do while nothing was chosen', async () => {
    open().type('V');
    expect(await stage.text()).toContain('nothing to compare yet');
  });

  it('sets up to six media side by side at the present wave', async () => {
    open({ columns: 120, rows: 40 });
    for (const name of [
      'n-bk7',
      'sapphire',
      'calcium fluoride',
      'water',
      'diamond',
      'zinc selenide',
      'germanium',
    ])
      stage.type('i').paste(name).type('<enter>');
    stage.type('w10.6um<enter>').type('<escape>i').paste('zinc selenide').type('<enter>V');
    expect(stage.state.page?.name).toBe('compare');
    const text = await stage.text();
    expect(text).toContain('At 10.6 µm in vacuum');
    for (const key of ['zinc-selenide', 'germanium', 'diamond', 'water', 'calcium-fluoride', 'sapphire'])
      expect(text).toContain(key);
    expect(text).not.toContain('n-bk7');
    expect(text).toMatch(/^ +n +index/m);
  });

  it('keeps its table within the screen', async () => {
    open({ columns: 80, rows: 24 });
    for (const name of ['n-bk7', 'sapphire', 'calcium fluoride', 'water', 'diamond'])
      stage.type('i').paste(name).type('<enter>');
    stage.type('V');
    const before = await stage.text();
    expect(before).toMatch(/diamond +water/);
    stage.type('y');
    const [copied] = stage.effects;
    expect(copied?.kind === 'copy' ? copied.text : '').toMatch(/n-bk7/);
    for (const line of (copied?.kind === 'copy' ? copied.text : '').split('\n'))
      expect([...line].length).toBeLessThanOrEqual(80);
  });
});
