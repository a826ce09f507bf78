import fc from 'fast-check';
import { afterEach, describe, expect, it } from 'vitest';
import { makeQuestion } from '../../src/answer/question.ts';
import { displayWidth } from '../../src/term/display-width.ts';
import { named, vacuumWave } from '../helpers/ask.ts';
import { keysOf, Stage, type StageOptions } from './helpers/stage.tsx';

let stage: Stage | undefined;
const open = (options: StageOptions = {}): Stage => {
  stage = new Stage(options);
  return stage;
};
afterEach(() => stage?.end());

/** What holds for every frame of every state at every size. */
function checkFrame(lines: readonly string[], columns: number, rows: number): void {
  expect(lines.length).toBeLessThanOrEqual(Math.max(1, rows - 1));
  for (const line of lines) expect(displayWidth(line), line).toBeLessThanOrEqual(columns);
}

function checkText(lines: readonly string[]): void {
  expect(lines.join('\n')).not.toMatch(/\p{Emoji_Presentation}|\ufe0f/u);
  expect(lines.join('\n')).not.toMatch(/NaN|undefined|Infinity|\[object|(?<!\d)-0(?![.\d])/);
}

const SIZES = [
  [80, 24],
  [40, 12],
  [120, 40],
  [200, 60],
  [20, 5],
] as const;

const STATES: readonly (readonly [string, string])[] = [
  ['the first question', ''],
  ['an angle', 'a60<enter>'],
  ['a value being typed', 'w633'],
  ['a value refused', 'w633xx<enter>'],
  ['the list of media', 'i'],
  ['hits', 'isil'],
  ['no hits', 'iqqqq<enter>'],
  ['total reflection', 'xa60<enter>'],
  ['a metal', 'igold<enter>'],
  ['a beam', 'b1mW<tab>1mm<enter>'],
  ['no answer', 'w50nm<enter>'],
  ['sources', 's'],
  ['cautions', '!'],
  ['keys', '?'],
  ['keys searched', '?/angle<enter>'],
  ['a copy', 'y'],
  ['a whole copy', 'Y'],
  ['grazing incidence', 'a89.9<enter>p'],
];

describe.each(SIZES)('at %d x %d', (columns, rows) => {
  // Large frames take long to lay out; what differs between the states shows at the small sizes.
  const states = columns > 100 ? STATES.filter((_, i) => i % 4 === 0) : STATES;

  it('keeps within the screen whatever is shown', async () => {
    for (const [, keys] of states) {
      const lines = await open({ columns, rows }).type(keys).lines();
      checkFrame(lines, columns, rows);
      checkText(lines);
      stage!.end();
    }
  });

  it('writes ASCII alone where the terminal has no more', async () => {
    for (const [name, keys] of states) {
      open({ columns, rows, preferences: { glyphs: 'ascii' } }).type(keys);
      const text = await stage!.text();
      expect(text, name).toMatch(/^[\x20-\x7e\n]*$/);
      checkFrame(text.split('\n'), columns, rows);
      stage!.end();
    }
  });
});

describe('the picture', () => {
  it('is laid out as the physics: wave above, halves beside, boundary between', async () => {
    const lines = await open().lines();
    expect(lines).toHaveLength(23);
    expect(lines[0]).toMatch(/^ wave 632\.8 nm {2}in vacuum {2}473\.75\d+ THz {2}1\.959\d+ eV >angle 0°/);
    const boundary = lines[2]!.indexOf('┃');
    for (const line of lines.slice(2, 6)) expect(line.indexOf('┃')).toBe(boundary);
    expect(lines[6]!.indexOf('┻')).toBe(boundary);
    const rails = [lines[6]!.indexOf('┏'), lines[6]!.indexOf('┓')];
    for (const line of lines.slice(7, 20))
      expect([line.indexOf('┃'), line.lastIndexOf('┃')], line).toEqual(rails);
    expect(lines[7]).toMatch(/^ from Air +┃ .*→.* +┃ into Fused silica/);
    expect(lines[22]).toContain('? keys');
  });

  it('names R and T within the surface, in bold', async () => {
    const styled = await open({ preferences: { colour: false } }).styled();
    expect(styled).toMatch(/\x1b\[1mR\x1b\[22m +\x1b\[1m3\.4598/);
  });

  it('is the same without colour', async () => {
    const plain = await open({ preferences: { colour: false } }).lines();
    stage!.end();
    const coloured = await open({ preferences: { colour: true } }).lines();
    expect(coloured).toEqual(plain);
  });

  it('uses the colours of the terminal in the foreground alone, neither black nor white nor dim', async () => {
    open({ columns: 120, rows: 40, preferences: { colour: true } });
    for (const keys of ['', '!', '<escape>w50nm<enter>']) {
      const codes = [...(await stage!.type(keys).styled()).matchAll(/\x1b\[([\d;]*)m/g)].flatMap((m) =>
        (m[1] ?? '').split(';').map(Number),
      );
      for (const code of codes)
        expect([0, 1, 4, 7, 22, 24, 27, 39].includes(code) || (code > 30 && code < 37)).toBe(true);
    }
  });

  it('marks the focus by a sign, not by a style alone', async () => {
    expect((await open().type('<tab>').lines())[0]).toContain('>unpolarized');
  });

  it('shows curves below on a large screen, the boundary going on between them', async () => {
    const lines = await open({ columns: 120, rows: 40 }).lines();
    const closing = lines.findIndex((line) => line.includes('┳'));
    expect(closing).toBeGreaterThan(20);
    expect(lines[closing + 1]).toContain('R over the angle of incidence');
    expect(lines[closing + 1]).toContain('R over the vacuum wavelength');
    const boundary = lines[closing]!.indexOf('┳');
    expect(lines[closing + 3]!.charAt(boundary)).toBe('┃');
  });

  it('shows one part at a time on a small screen, and the others with the arrows', async () => {
    open({ columns: 40, rows: 12 });
    expect(await stage!.text()).toMatch(/\n Air ┃>surface ┃ Fused silic/);
    expect(await stage!.text()).toMatch(/\n R +3\.4598/);
    stage!.type('<down><down><right>');
    expect(await stage!.text()).toMatch(/\n Air ┃ surface ┃>Fused silic/);
    expect(await stage!.text()).toMatch(/\n.n +1\.457/);
    stage!.type('<left><left>');
    expect(await stage!.text()).toMatch(/\n>Air ┃/);
  });

  it('asks for room in one line where there is none, and comes back', async () => {
    open({ columns: 39, rows: 12 });
    expect(await stage!.lines()).toEqual(['halfspace needs 40 x 12 (now 39 x 12)']);
    expect(await stage!.resize(80, 24).text()).toContain('into Fused silica');
    expect((await stage!.resize(20, 5).lines())[0]).toBe('halfspace needs 40 x');
  });

  it('equals a fresh start after any resize', async () => {
    open({ columns: 120, rows: 40 }).type('a30<enter>p');
    for (const [columns, rows] of [...SIZES, [80, 24] as const]) {
      const after = await stage!.resize(columns, rows).lines();
      const fresh = new Stage({ columns, rows }).type('a30<enter>p');
      expect(after).toEqual(await fresh.lines());
      fresh.end();
    }
  });

  it('never cuts a number', async () => {
    const question = makeQuestion(named('air'), named('germanium'), vacuumWave(700e-9));
    for (const [columns, rows] of SIZES) {
      const text = await open({ columns, rows, question }).type('a60<enter>').text();
      expect(text).not.toMatch(/\d…|\d\.\.\.(?!\d)/);
      stage!.end();
    }
  });

  it('puts the list of media over its own half alone', async () => {
    const before = await open().lines();
    const during = await stage!.type('i').lines();
    const rail = before[7]!.lastIndexOf('┃');
    for (let y = 7; y < 20; y++) expect(during[y]!.slice(0, rail)).toBe(before[y]!.slice(0, rail));
  });
});

describe('the footer', () => {
  it('shows at most six keys, that of all keys among them, at every size and in every state', async () => {
    for (const columns of [40, 80]) {
      for (const [name, keys] of STATES) {
        const lines = await open({ columns, rows: 24 }).type(keys).lines();
        const footer = lines.at(-1) ?? '';
        expect(footer, name).toMatch(/\? keys$/);
        expect(footer.trim().split(/ {2,}/).length, footer).toBeLessThanOrEqual(6);
        stage!.end();
      }
    }
  });
});

it('survives any keys at any size', async () => {
  open();
  const key = fc.constantFrom(
    ...'fiwapx/oBCvbctE+-=_<>uyYs!djkhlgGq?0129.n'.split(''),
    ...['<tab>', '<shift+tab>', '<enter>', '<escape>', '<up>', '<down>', '<left>', '<right>', '<backspace>'],
    ...[
      '<page-up>',
      '<page-down>',
      '<home>',
      '<end>',
      '<space>',
      '<ctrl+u>',
      '<ctrl+w>',
      '<alt+b>',
      '<ctrl+r>',
    ],
  );
  const size = fc.tuple(fc.integer({ min: 1, max: 140 }), fc.integer({ min: 1, max: 50 }));
  await fc.assert(
    fc.asyncProperty(fc.array(key, { maxLength: 12 }), size, async (keys, [columns, rows]) => {
      stage!.resize(columns, rows).type(keys.join(''));
      checkFrame(await stage!.lines(), columns, rows);
    }),
    { numRuns: 60 },
  );
}, 60_000);

it.each([
  [1, 1],
  [400, 200],
  [400, 1],
  [1, 200],
  [40, 200],
  [400, 12],
])('draws at %d x %d', async (columns, rows) => {
  checkFrame(await open({ columns, rows }).lines(), columns, rows);
});

it('reads the chords of this test as keys', () => {
  expect(keysOf('a<enter><shift+tab><ctrl+u>').map((k) => k.name)).toEqual(['char', 'enter', 'tab', 'char']);
});
