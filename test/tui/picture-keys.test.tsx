import { afterEach, describe, expect, it } from 'vitest';
import { makeQuestion } from '../../src/answer/question.ts';
import { displayWidth } from '../../src/term/display-width.ts';
import { fullLines } from '../../src/tui/picture/pages.ts';
import { answerOf, refusalOf } from '../../src/tui/state.ts';
import { index, named, vacuumWave } from '../helpers/ask.ts';
import { Stage, type StageOptions } from './helpers/stage.tsx';

let stage: Stage;
const open = (options: StageOptions = {}): Stage => {
  stage = new Stage(options);
  return stage;
};
afterEach(() => stage.end());

const degrees = (): number => (stage.state.question.incidenceAngle_rad * 180) / Math.PI;
const mediumOf = (side: 'from' | 'into'): string => {
  const medium = stage.state.question[side];
  return medium.kind === 'literal' ? medium.text : medium.material.key;
};
/** Presses a key until something holds; fails where it never does. */
function press(key: string, until: () => boolean): void {
  for (let i = 0; i < 60 && !until(); i++) stage.type(key);
  expect(until()).toBe(true);
}
const noticeOf = async (): Promise<string> => (await stage.lines()).slice(-4, -1).join(' ');

describe('the first question', () => {
  it('is answered by typing an angle and turning the polarization', async () => {
    open().type('45<enter>pp');
    expect(degrees()).toBeCloseTo(45, 12);
    expect(stage.state.question.polarization).toBe('p');
    expect(await stage.text()).toMatch(/R_p +0\.6702\d\(\d+\) %/);
  });

  it('is put with two names, an angle and a polarization', () => {
    open({
      question: makeQuestion(named('vacuum'), named('germanium'), { ...vacuumWave(4e-6), text: '4 um' }),
    });
    stage.type('fair<enter>i').paste('fused silica').type('<enter>a45<enter>pp');
    expect([mediumOf('from'), mediumOf('into')]).toEqual(['air', 'fused-silica']);
    expect(degrees()).toBeCloseTo(45, 12);
    expect(stage.state.question.polarization).toBe('p');
  });
});

describe('typing a value', () => {
  it('replaces what stands there, and keeps it on Esc', () => {
    open().type('a30<escape>');
    expect(degrees()).toBe(0);
    expect(stage.state.entry).toBeNull();
    stage.type('a30<enter>');
    expect(degrees()).toBeCloseTo(30, 12);
  });

  it('edits what stands there once the cursor moves', () => {
    open().type('w<left><left><left><backspace>9<enter>');
    expect(stage.state.question.wave.text).toBe('632.9 nm');
  });

  it('takes every printable key as text', () => {
    open().type('wq?/j+!');
    expect(stage.state.entry?.line.text).toBe('q?/j+!');
  });

  it('keeps what cannot be read, says why and what would be right', async () => {
    open().type('w633xx<enter>');
    expect(stage.state.entry?.line.text).toBe('633xx');
    expect(stage.state.question.wave.text).toBe('632.8 nm');
    expect(await noticeOf()).toMatch(/x "xx" is no unit of a wave; units are nm, um/);
    stage.type('<backspace><backspace><enter>');
    expect(stage.state.question.wave.text).toBe('633 nm');
  });

  it('says how it reads what is typed so far', async () => {
    open().type('w1064');
    expect(await noticeOf()).toContain('reads: wave 1064 nm');
  });

  it('goes on to the next value with Tab', () => {
    open().type('w500<tab>');
    expect(stage.state.question.wave.text).toBe('500 nm');
    expect(stage.state.focus).toBe('field:reference');
  });

  it('deletes backwards by 0x7f and 0x08 alike', () => {
    open().type('a12<backspace>');
    expect(stage.state.entry?.line.text).toBe('1');
  });

  it('takes a paste as text: no command, no submission', () => {
    open().type('w').paste('532nm\r');
    expect(stage.state.entry?.line.text).toBe('532nm');
    expect(stage.state.question.wave.text).toBe('632.8 nm');
  });

  it('never lets a paste in the picture act as commands', () => {
    open().type('<tab>').paste('xqB');
    expect(mediumOf('from')).toBe('air');
    expect(stage.effects).toEqual([]);
  });
});

describe('stepping', () => {
  it('moves the angle by one, ten and a tenth of a degree', () => {
    open().type('+++-');
    expect(degrees()).toBeCloseTo(2, 12);
    stage.type('<page-up>');
    expect(degrees()).toBeCloseTo(12, 12);
    stage.type('>');
    expect(degrees()).toBeCloseTo(12.1, 12);
  });

  it('moves three times for three keys in one burst', () => {
    open().type('jjj');
    const burst = stage.state.focus;
    stage.end();
    open().type('j').type('j').type('j');
    expect(stage.state.focus).toBe(burst);
  });

  it('goes to the Brewster and the critical angle by one key', () => {
    open().type('B');
    expect(degrees()).toBeCloseTo(55.54, 2);
    expect(answerOf(stage.state)?.interface.Rp).toBeLessThan(1e-12);
    stage.type('xC');
    expect(degrees()).toBeCloseTo(43.34, 2);
  });

  it('says that there is no critical angle where there is none', async () => {
    open().type('C');
    expect(degrees()).toBe(0);
    expect(await noticeOf()).toContain('no critical angle');
  });

  it('picks a choice by its initial where the focus is', () => {
    open().type('<tab>p');
    expect(stage.state.question.polarization).toBe('p');
    stage.type('s');
    expect(stage.state.question.polarization).toBe('s');
    expect(stage.state.page).toBeNull();
  });

  it('swaps the sides and back', () => {
    open().type('x');
    expect([mediumOf('from'), mediumOf('into')]).toEqual(['fused-silica', 'air']);
    stage.type('x');
    expect([mediumOf('from'), mediumOf('into')]).toEqual(['air', 'fused-silica']);
  });

  it('flips the axis of a crystal', () => {
    open({ question: makeQuestion(named('air'), named('calcite', 'ordinary'), vacuumWave(589e-9)) });
    const n = () => answerOf(stage.state)?.into.n ?? 0;
    const ordinary = n();
    stage.type('o');
    expect(n()).toBeLessThan(ordinary - 0.1);
  });

  it('undoes and does again', () => {
    open().type('45<enter>u');
    expect(degrees()).toBe(0);
    stage.type('<ctrl+r>');
    expect(degrees()).toBeCloseTo(45, 12);
  });
});

describe('choosing a medium', () => {
  it('opens the list inside the half, the other half in sight', async () => {
    open().type('igerman');
    const lines = await stage.lines();
    const list = lines.filter((line) => line.includes('Germanium'));
    expect(list.length).toBeGreaterThan(0);
    for (const line of list) expect(line.lastIndexOf('┃')).toBeLessThan(line.indexOf('Germanium'));
    expect(lines.some((line) => line.startsWith(' from Air'))).toBe(true);
  });

  it('shows index and transparency at the present wave beside each hit', async () => {
    open().type('ifused silica');
    expect(await stage.text()).toMatch(/>Fused sili\S* +1\.457\d clear/);
    stage.type('<escape>w10.6um<enter>Ei').paste('germanium');
    expect(await stage.text()).toMatch(/Germanium +4\.00\d+ /);
  });

  it('takes the marked one with Enter and goes back to where the focus was', () => {
    open().type('igermanium<enter>');
    expect(mediumOf('into')).toBe('germanium');
    expect(stage.state.focus).toBe('field:angle');
    expect(stage.state.recent[0]).toBe('germanium');
  });

  it('moves the mark by arrows and Ctrl-N, and a page at a time', () => {
    open().type('i<down><ctrl+n><up>');
    expect(stage.state.search?.selected).toBe(1);
    stage.type('<page-down>');
    expect(stage.state.search?.selected).toBeGreaterThan(5);
  });

  it('keeps the mark in sight and the list in place', async () => {
    open().type('i');
    for (let i = 0; i < 40; i++) stage.type('<down>');
    expect(await stage.text()).toMatch(/41 of \d+/);
  });

  it('takes numbers as a medium', () => {
    open().type('in=1.5+0.1i<enter>');
    expect(mediumOf('into')).toBe('n=1.5+0.1i');
    expect(answerOf(stage.state)?.into.k).toBe(0.1);
  });

  it('says why numbers are no medium, and keeps them', async () => {
    open().type('in=1.5-0.1i<enter>');
    expect(stage.state.search?.line.text).toBe('n=1.5-0.1i');
    expect(await noticeOf()).toMatch(/gain/);
    expect(mediumOf('into')).toBe('fused-silica');
  });

  it('says that a name is unknown, and keeps it', async () => {
    open().type('iqqqxyz<enter>');
    expect(stage.state.search?.line.text).toBe('qqqxyz');
    expect(await noticeOf()).toContain('no medium matches "qqqxyz"');
  });

  it('starts by typing on a medium reached with Tab, and Esc leaves it', () => {
    open();
    press('<tab>', () => stage.state.focus === 'field:into');
    stage.type('bk7');
    expect(stage.state.search).toMatchObject({ side: 'into', line: { text: 'bk7' } });
    stage.type('<escape>');
    expect(stage.state.focus).not.toBe('field:into');
    expect(mediumOf('into')).toBe('fused-silica');
  });

  it('takes an axis with the name', () => {
    open().type('isapphire:e<enter>');
    expect(stage.state.question.into).toMatchObject({ axis: 'extraordinary' });
  });
});

describe('a question without an answer', () => {
  it('stays on the screen with its reason and the keys that help', async () => {
    open().type('igermanium<enter>');
    expect(refusalOf(stage.state)).toBeNull();
    stage.type('w200nm<enter>');
    expect(refusalOf(stage.state)?.code).toBe('outside-fit-range');
    const notice = (await stage.lines()).slice(-6).join(' ');
    expect(notice).toMatch(/has no data at/);
    expect(notice).toMatch(/E extrapolates, w changes the wave, Esc goes back/);
    expect(await stage.text()).toMatch(/into +Germanium/);
  });

  it('is answered by extrapolation, which the screen goes on saying', async () => {
    open().type('igermanium<enter>w100nm<enter>E');
    expect(refusalOf(stage.state)).toBeNull();
    expect(await stage.text()).toContain('extrapolated');
  });

  it('gives way to the last one that had an answer', () => {
    open().type('w100nm<enter><escape>');
    expect(stage.state.question.wave.text).toBe('632.8 nm');
    expect(refusalOf(stage.state)).toBeNull();
  });

  it('can be left by mending it: another wave for another medium', () => {
    open().type('w10.6um<enter>');
    expect(refusalOf(stage.state)).not.toBeNull();
    stage.type('igermanium<enter>');
    expect(refusalOf(stage.state)).toBeNull();
    expect(answerOf(stage.state)?.into.n).toBeCloseTo(4, 1);
  });

  it('still shows the medium that has data', async () => {
    open().type('w5um<enter>');
    expect(refusalOf(stage.state)).not.toBeNull();
    expect(await stage.text()).toMatch(/\n n {4}1\.0002\d+.*┃ +┃/);
  });
});

describe('the beam', () => {
  it('takes a power and a diameter, and shows the field on both sides', async () => {
    open().type('b1mW<tab>1mm<enter>');
    const text = await stage.text();
    expect(text).toMatch(/I +2\.546 kW\/m²/);
    expect(text).toMatch(/reflected 34\.\d+ µW/);
  });
});

describe('moving about', () => {
  it('reaches every field with Tab and comes back to the first', () => {
    open();
    const seen = new Set<string>();
    for (let i = 0; i < 40; i++) {
      seen.add(stage.state.focus);
      stage.type('<tab>');
    }
    for (const id of ['wave', 'reference', 'angle', 'polarization', 'temperature', 'from', 'into', 'beam'])
      expect([...seen]).toContain(`field:${id}`);
  });

  it('goes from half to half over the surface with the arrows', () => {
    open().type('<tab><tab>');
    press('<down>', () => stage.state.focus.startsWith('field:from'));
    const places = [stage.state.place];
    for (const key of ['<down><down><right>', '<right>', '<left>', '<left>']) {
      stage.type(key);
      places.push(stage.state.place);
    }
    expect(places).toEqual(['from', 'interface', 'into', 'interface', 'from']);
    stage.type('<home><up>');
    expect(stage.state.focus).toMatch(/^field:(?:temperature|pressure)/);
  });

  it('scrolls to results out of sight and says how many there are', async () => {
    open({ rows: 20 }).type('<down><down>');
    expect(await stage.text()).toMatch(/\d↓/);
    const before = await stage.text();
    stage.type('<end><up>');
    expect(await stage.text()).toMatch(/\d↑/);
    expect(before).not.toMatch(/\d↑/);
  });

  it('explains what it is on', async () => {
    open({ question: makeQuestion(index(1), index(1.5), vacuumWave(633e-9)) }).type('<down><down>');
    press('<left>', () => stage.state.place === 'from');
    press('<right>', () => stage.state.place === 'interface');
    stage.type('<home>');
    press('<down>', () => stage.state.focus === 'interface:R');
    expect(await noticeOf()).toMatch(/reflectance: y copies it, s shows its source/);
  });
});

describe('pages', () => {
  it('opens the sources in their halves with one key, and closes them with the same', async () => {
    open().type('s');
    const text = await stage.text();
    expect(text).toContain('Ciddor');
    expect(text).toContain('Malitson');
    expect(text).toMatch(/R +3\.4598/);
    stage.type('s');
    expect(stage.state.page).toBeNull();
  });

  it('shows the keys in force and finds one by a word', async () => {
    open().type('?');
    expect(await stage.text()).toContain('choose the medium the wave comes from');
    stage.type('/swap');
    expect((await stage.lines()).filter((l) => l.includes('swap the two media'))).toHaveLength(1);
    stage.type('<enter>');
    expect(stage.state.page?.filter?.text).toBe('swap');
    stage.type('<escape>');
    expect(stage.state.page?.filter).toBeNull();
    stage.type('<escape>');
    expect(stage.state.page).toBeNull();
  });

  it.each([40, 80, 119, 120, 160])(
    'wraps what a key does to %i columns, each further line below the first, nothing cut or run together',
    (columns) => {
      open({ columns, rows: 40 }).type('?');
      const page = stage.state.page;
      const lines = page ? fullLines(stage.state, page, stage.world, columns) : [];
      for (const { text, right } of lines) {
        expect(displayWidth(text + (right?.text ?? ''))).toBeLessThanOrEqual(columns - 3);
        // Where lines stand side by side there is a gap, and the right one begins at the same column everywhere.
        if (right) expect([text.endsWith('  '), displayWidth(text)]).toEqual([true, (columns - 3 + 2) >> 1]);
      }
      expect(lines.some(({ right }) => right !== undefined)).toBe(columns >= 120);
      const texts = [...lines.map((l) => l.text), ...lines.map((l) => l.right?.text ?? '')];
      const words = texts.join(' ').replace(/\s+/g, ' ');
      for (const { help } of stage.world.bindings.actions) expect(words).toContain(help);
    },
  );

  it('goes back with q, Esc, h, Left and Backspace, and never ends the program', () => {
    for (const key of ['q', '<escape>', 'h', '<left>', '<backspace>']) {
      open().type(`!${key}`);
      expect(stage.state.page).toBeNull();
      expect(stage.effects).toEqual([]);
      stage.end();
    }
    open();
  });

  it('goes to the next and the previous line found by n and N', () => {
    open({ rows: 12 }).type('?/the<enter>');
    const tops = ['n', 'n', 'N', 'N', 'N'].map((key) => stage.type(key).state.page?.top);
    expect(tops).toEqual([1, 2, 1, 0, 0]);
    expect(stage.state.page?.filter?.text).toBe('the');
  });

  it('keeps its place over changes of size, and gives the picture back as it was', () => {
    const atStart = open({ rows: 14 }).state.focus;
    const { focus, place } = stage.type('<down><down><down>').state;
    expect(focus).not.toBe(atStart);
    stage.type('?<down><down><down>').resize(70, 16).resize(90, 14);
    expect(stage.state.page?.top).toBe(3);
    stage.type('<escape>');
    expect([stage.state.focus, stage.state.place]).toEqual([focus, place]);
  });

  it('scrolls to its end and no further', async () => {
    open().type('?G');
    const end = stage.state.page?.top ?? 0;
    stage.type('<down><page-down>');
    expect(stage.state.page?.top).toBe(end);
    expect(end).toBeGreaterThan(0);
    stage.type('g');
    expect(stage.state.page?.top).toBe(0);
  });
});

describe('copying', () => {
  it('copies R and T, and shows what was copied', async () => {
    open().type('y');
    const [effect] = stage.effects;
    expect(effect).toMatchObject({ kind: 'copy' });
    const text = effect?.kind === 'copy' ? effect.text : '';
    expect(text).toMatch(/^R = 3\.4598\d+\(\d+\) %, T = 96\.54\d+\(\d+\) %$/);
    expect(await noticeOf()).toContain(text);
  });

  it('copies the value under the focus with its unit', () => {
    open().type('<down><down><right><right>');
    expect(stage.state.place).toBe('into');
    stage.type('<home>');
    press('<down>', () => stage.state.focus === 'into:wavelength_m');
    stage.type('y');
    expect(stage.effects).toEqual([{ kind: 'copy', text: '434.190 nm' }]);
  });

  it('copies the whole answer and shows all of it', async () => {
    open().type('Y');
    const [effect] = stage.effects;
    const text = effect?.kind === 'copy' ? effect.text : '';
    expect(text).toMatch(/^halfspace record [0-9a-f]{12}, /);
    expect(text).toContain('Malitson');
    expect(text).toContain('halfspace air fused-silica 632.8nm');
    expect(await stage.text()).toContain('halfspace record ');
  });
});

describe('leaving', () => {
  it('quits with q at the top and with Ctrl-C from anywhere', () => {
    open().type('q');
    expect(stage.effects).toEqual([{ kind: 'quit', status: 0 }]);
    for (const before of ['', 'w12', 'ifu', '?', 's']) {
      stage.end();
      open().type(`${before}<ctrl+c>`);
      expect(stage.effects).toEqual([{ kind: 'quit', status: 130 }]);
    }
  });

  it('never quits with Esc', () => {
    open().type('<escape><escape><escape>');
    expect(stage.effects).toEqual([]);
  });

  it('suspends and redraws', () => {
    open().type('<ctrl+z><ctrl+l>');
    expect(stage.effects).toEqual([{ kind: 'suspend' }, { kind: 'redraw' }]);
  });
});
