/** Curves in the full-screen program: opened at any size, switched, read off with a cursor, asked at. */
import { afterEach, describe, expect, it } from 'vitest';
import { displayWidth } from '../../src/term/display-width.ts';
import { CURVE_KINDS } from '../../src/tui/charts.ts';
import { beginSession, reply } from '../../src/tui/linear/session.ts';
import { readingText } from '../../src/tui/picture/curve-reading.ts';
import { Stage } from './helpers/stage.tsx';

let stage: Stage;
afterEach(() => stage.end());

const open = (options: ConstructorParameters<typeof Stage>[0] = {}): Stage => {
  stage = new Stage(options);
  return stage;
};
const reading = (): string => readingText(stage.state, stage.world);
const BRAILLE = /[\u2801-\u28ff]/;

describe('a curve', () => {
  it.each([
    [40, 12],
    [80, 24],
    [100, 30],
    [140, 50],
    [200, 60],
  ])('is drawn at %i x %i, every kind in turn, within the screen', async (columns, rows) => {
    open({ columns, rows }).type('r');
    for (const kind of CURVE_KINDS) {
      expect(stage.state.curve?.kind).toBe(kind);
      const lines = await stage.lines();
      expect(lines.length).toBeLessThanOrEqual(rows - 1);
      for (const line of lines) expect(displayWidth(line), line).toBeLessThanOrEqual(columns);
      expect(lines.join('\n')).toMatch(BRAILLE);
      expect(lines.join('\n')).not.toMatch(/NaN|undefined|Infinity/);
      stage.type('r');
    }
    expect(stage.state.curve?.kind).toBe('angle');
    stage.type('<escape>');
    expect(stage.state.curve).toBeNull();
  });

  it('leaves the numbers in sight where there is room for both', async () => {
    const text = await open({ columns: 120, rows: 50 }).type('r').text();
    expect(text).toContain('Fused silica');
    expect(text).toContain('angle of incidence (°)');
    const small = await open({ columns: 80, rows: 24 }).type('r').text();
    expect(small).toContain('angle of incidence (°)');
  });

  it('is in ASCII where the screen is', async () => {
    const text = await open({ preferences: { glyphs: 'ascii' } })
      .type('r')
      .text();
    expect(text).toMatch(/^[\x20-\x7e\n]*$/);
    expect(text).toContain('angle of incidence (deg)');
  });
});

describe('the cursor', () => {
  it('starts where the question stands, and reads off its very numbers', async () => {
    open().type('a45<enter>r');
    const { Rs = 0, Rp = 0 } = answerOfStage().interface;
    expect(reading()).toMatch(/^angle of incidence 45°: R_s /);
    const [, s = '', p = ''] = /R_s ([\d.]+) %, R_p ([\d.]+) %/.exec(reading()) ?? [];
    expect(Number(s)).toBeCloseTo(Rs * 100, 3);
    expect(Number(p)).toBeCloseTo(Rp * 100, 3);
    expect(await stage.text()).toContain('angle of incidence 45°: R_s');
  });

  it('moves by columns, by tens and to the ends, and stays inside', () => {
    open().type('r');
    const at = (): number => stage.state.curve?.cursor ?? Number.NaN;
    stage.type('<right>');
    const one = at();
    stage.type('<right><right>');
    expect(at()).toBeGreaterThan(one);
    stage.type('<page-down>');
    const ten = at();
    stage.type('<page-up>');
    expect(at()).toBeLessThan(ten);
    stage.type('<end>');
    expect(at()).toBeCloseTo(90, 0);
    stage.type('<right><page-down>');
    expect(at()).toBeCloseTo(90, 0);
    stage.type('<home><left>');
    expect(at()).toBe(0);
    expect(reading()).toMatch(/^angle of incidence 0°: /);
  });

  it('asks at the angle or the wave it stands at on Enter, and Esc and undo go back', () => {
    open().type('r<page-down><page-down>');
    const angle = stage.state.curve?.cursor ?? 0;
    stage.type('<enter>');
    expect((stage.state.question.incidenceAngle_rad * 180) / Math.PI).toBeCloseTo(angle, 9);
    expect(stage.state.curve).toEqual({ kind: 'angle', cursor: null });
    stage.type('r<home>');
    const wave = stage.state.curve?.cursor ?? 0;
    stage.type('<enter>');
    expect(stage.state.question.wave.wavelength_m * 1e6).toBeCloseTo(wave, 9);
    expect(answerOfStage().wave.vacuumWavelength_m).toBe(stage.state.question.wave.wavelength_m);
    stage.type('<escape>uu');
    expect(stage.state.question.incidenceAngle_rad).toBe(0);
    expect(stage.state.question.wave.wavelength_m).toBe(632.8e-9);
  });

  it('has nothing to ask at in a field, and says where no field stands', async () => {
    open().type('rrrr<enter>');
    expect(await stage.text()).toContain('nothing to ask at a depth');
    stage.end();
    open().type('mfused-silica@5mm<enter>').type('<escape>').type('rrrr');
    expect(reading()).toContain('summed as intensities');
    expect(await stage.text()).not.toMatch(BRAILLE);
  });

  it('is copied and logged', () => {
    open().type('r<right>y');
    expect(stage.effects.at(-1)).toEqual({ kind: 'copy', text: reading() });
    stage.type('l');
    expect(stage.effects.at(-1)?.kind).toBe('keep');
  });
});

describe('a curve that cannot be', () => {
  it('is not opened without an answer', async () => {
    open().type('w20um<enter>r');
    expect(stage.state.curve).toBeNull();
    expect(await stage.text()).toContain('no answer to draw a curve of');
  });

  it('shows its keys on ?, and the curve again behind them', async () => {
    open().type('r?');
    expect(await stage.text()).toContain('ask at the angle or the wave under the cursor');
    stage.type('?');
    expect(stage.state.curve?.kind).toBe('angle');
    expect(await stage.text()).toMatch(BRAILLE);
  });
});

describe('the linear layout', () => {
  it('tells curves in sentences and tables', () => {
    open();
    const { lines } = reply(beginSession(stage.state).session, 'curves', stage.world);
    expect(
      lines.some((line) => /^Reflectance of .* over angle of incidence from 0° to 90°: /.test(line)),
    ).toBe(true);
    expect(lines.filter((line) => /^angle of incidence [\d.]+°: R_s /.test(line)).length).toBeGreaterThan(6);
    expect(lines.filter((line) => /^wavelength in vacuum [\d.]+ µm: R /.test(line)).length).toBeGreaterThan(
      6,
    );
  });
});

function answerOfStage() {
  const { outcome } = stage.state;
  if ('refused' in outcome) throw new Error(outcome.message);
  return outcome;
}
