import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { clusters, displayWidth } from '../../src/term/display-width.ts';
import { IndexTables, indexTable } from '../../src/tui/index-tables.ts';
import { arrangeBlock, compactBlock } from '../../src/tui/picture/arrange.ts';
import { flowItems, itemWidth } from '../../src/tui/picture/flow.ts';
import { type Block, type Item, textItem } from '../../src/tui/picture/item.ts';
import { wrapText } from '../../src/tui/picture/wrap.ts';
import { angleCurves } from '../../src/tui/reflectance-curves.ts';
import { placeOfWavelength, TABLE_POINTS, waveCurve, wavelengthAt } from '../../src/tui/wave-curve.ts';
import { ask, DEGREE, index, named, vacuumWave } from '../helpers/ask.ts';
import { airToSilica, testWorld } from './helpers/stage.tsx';

const item = (id: number, optional = false): Item => ({
  ...textItem(`value ${id}`),
  stop: `field:${id}`,
  label: 'n',
  optional,
});
const block = (top: number, body: number, bottom: number): Block => {
  const rows = (count: number, from: number) => Array.from({ length: count }, (_, i) => [item(from + i)]);
  return { top: rows(top, 0), body: rows(body, 100), bottom: rows(bottom, 200) };
};

describe('breaking text into lines', () => {
  it('keeps every word and no line longer than asked, but for a single character that is', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme' }), fc.integer({ min: 2, max: 60 }), (text, columns) => {
        const lines = wrapText(text, columns);
        for (const line of lines) {
          if ([...clusters(line)].length > 1) expect(displayWidth(line)).toBeLessThanOrEqual(columns);
        }
        const bare = (s: string): string => s.replace(/\s+/g, '');
        expect(bare(lines.join(''))).toBe(bare(text));
      }),
    );
  });

  it('cuts an address after a slash', () => {
    expect(wrapText('https://doi.org/10.1364/josa.55.001205', 26)).toEqual([
      'https://doi.org/10.1364/',
      'josa.55.001205',
    ]);
  });
});

describe('items side by side', () => {
  it('fill lines without passing the edge', () => {
    const items = Array.from({ length: 9 }, (_, i) => item(i));
    for (const row of flowItems(items, 40)) {
      const width = row.reduce((sum, i) => sum + itemWidth(i) + 2, 0);
      expect(width).toBeLessThanOrEqual(40);
    }
    expect(flowItems(items, 40).flat()).toEqual(items);
  });

  it('leave the optional ones out before they take another line', () => {
    const items = [item(1), item(2, true), item(3, true), item(4)];
    expect(flowItems(items, 40).flat()).toEqual([items[0], items[1], items[3]]);
  });
});

describe('a block in few lines', () => {
  it('keeps its top and bottom and scrolls its body to the focus', () => {
    const arranged = arrangeBlock(block(2, 10, 1), 7, 40, 'field:107');
    expect(arranged.rows).toHaveLength(7);
    expect(arranged.rows.flat().map((i) => i.stop)).toEqual([
      'field:0',
      'field:1',
      'field:104',
      'field:105',
      'field:106',
      'field:107',
      'field:200',
    ]);
    expect([arranged.hiddenAbove, arranged.hiddenBelow]).toEqual([4, 2]);
  });

  it('starts at its top while the focus is elsewhere', () => {
    expect(arrangeBlock(block(1, 5, 0), 3, 40, 'field:999').hiddenAbove).toBe(0);
  });

  it('is filled with blank lines where it is short', () => {
    expect(arrangeBlock(block(1, 1, 1), 6, 40, '').rows.map((row) => row.length)).toEqual([1, 1, 0, 0, 0, 1]);
  });

  it('puts what does not fit side by side below each other', () => {
    const wide: Block = { top: [], body: [[item(1), item(2)]], bottom: [] };
    expect(arrangeBlock(wide, 2, 40, '').rows.map((row) => row.length)).toEqual([2, 0]);
    expect(arrangeBlock(wide, 2, 18, '').rows.map((row) => row.length)).toEqual([1, 1]);
  });

  it('loses its blank lines on a small screen, and its bottom scrolls', () => {
    const compact = compactBlock({
      top: [[item(1)], []],
      body: [[item(2)]],
      bottom: [[textItem('')], [item(3)]],
    });
    expect(compact.top).toHaveLength(1);
    expect(compact.body.flat().map((i) => i.stop)).toEqual(['field:2', 'field:3']);
    expect(compact.bottom).toEqual([]);
  });
});

describe('the curves', () => {
  const world = testWorld();

  it('show at the angle of the question what the answer says', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 89, noNaN: true }), (degrees) => {
        const answer = ask(index(1), index(1.7, 0.3), vacuumWave(633e-9), {
          incidenceAngle_rad: degrees * DEGREE,
        });
        const [s, p] = angleCurves(answer);
        expect(s?.valueAt(degrees / 90)).toBeCloseTo(answer.interface.Rs, 9);
        expect(p?.valueAt(degrees / 90)).toBeCloseTo(answer.interface.Rp, 9);
      }),
    );
  });

  it('show at the wave of the question what the answer says, within the straight lines between points', () => {
    const question = { ...airToSilica(), incidenceAngle_rad: 0.5, polarization: 's' as const };
    const answer = ask(question.from, question.into, question.wave, question);
    const found = waveCurve(question, answer, world);
    if (!found) throw new Error('no curve');
    const x = placeOfWavelength(found.range_m, 632.8e-9);
    expect(found.curve.valueAt(x)).toBeCloseTo(answer.interface.R, 4);
  });

  it('have no spectrum between media given by their numbers', () => {
    const answer = ask(index(1), index(1.5), vacuumWave(633e-9));
    expect(waveCurve({ ...airToSilica(), from: index(1), into: index(1.5) }, answer, world)).toBeNull();
  });

  it('go along the axis in equal ratios', () => {
    const range = [1e-7, 1e-5] as const;
    expect(wavelengthAt(range, 0.5)).toBeCloseTo(1e-6, 15);
    expect(placeOfWavelength(range, wavelengthAt(range, 0.3))).toBeCloseTo(0.3, 12);
  });
});

describe('tables made in the background', () => {
  const range = [4e-7, 8e-7] as const;

  it('come when they are done, and are those made at once', async () => {
    let ready = () => {};
    const done = new Promise<void>((resolve) => {
      ready = resolve;
    });
    const tables = new IndexTables(() => ready());
    expect(tables.get(named('bk7'), {}, range)).toBeUndefined();
    await done;
    const table = tables.get(named('bk7'), {}, range);
    expect(table).toHaveLength(TABLE_POINTS);
    expect(table).toEqual(indexTable(named('bk7'), {}, range));
    tables.stop();
  });

  it('hold nothing where a medium has no data', () => {
    const table = indexTable(named('bk7'), {}, [1e-7, 1e-6]);
    expect(table[0]).toBeNull();
    expect(table.at(-1)?.n.re).toBeCloseTo(1.507, 2);
  });

  it('are not gone on with once stopped', async () => {
    let calls = 0;
    const tables = new IndexTables(() => calls++);
    tables.get(named('bk7'), {}, range);
    tables.stop();
    await new Promise((resolve) => setTimeout(resolve, 150));
    expect(calls).toBe(0);
  });
});
