/** Terminal charts: whole pictures as agreed on, and dots recomputed from the curve. */
import { describe, expect, it } from 'vitest';
import { brailleChart } from '../../src/plot/braille-chart.ts';
import type { Chart } from '../../src/plot/chart.ts';
import type { TextChartOptions } from '../../src/plot/text-layout.ts';
import { clusters } from '../../src/term/display-width.ts';
import { ANGLE_CHART, INDEX_CHART, reflectances } from './sample-charts.ts';

const drawn = (chart: Chart, options: TextChartOptions): string =>
  brailleChart(chart, options)
    .map((line) => `${line}|`)
    .join('\n');
const axis = { label: '', unit: '', scale: 'linear' } as const;
const bare = (series: Chart['series'], more: Partial<Chart> = {}): Chart => ({
  title: '',
  x: { ...axis, range: [0, 1] },
  y: { ...axis, range: [0, 1] },
  series,
  ...more,
});
/** Two rows and less have no axes: the curve fills them. */
const plotOnly = (
  chart: Chart,
  width: number,
  height: number,
  level: TextChartOptions['level'] = 'braille',
) => brailleChart(chart, { width, height, level });

describe('a chart in cells', () => {
  it('in braille is as agreed', () => {
    expect(
      drawn(ANGLE_CHART, { width: 60, height: 14, level: 'braille', cursor: 30 }),
    ).toMatchInlineSnapshot(`
      "R (%)  ⠒⠒⠒⠒ R_s  ⠒⠒⠒  ⠒⠒⠒ R_p                               |
                                   Brewster 56.31°                |
                                                                  |
      100┤                 │              ┊                 ⢀⠞ R_s|
         │                 │              ┊                ⡠⢫  R_p|
         │                 │              ┊              ⢀⠜⠁⡎     |
         │                 │              ┊            ⣀⠔⠁        |
       50┤                 │              ┊         ⢀⡤⠚⠁  ⡜       |
         │                 │              ┊     ⣀⡤⠔⠊⠁    ⠉        |
         │                 │           ⣀⣀⣀⡤⠤⠴⠒⠊⠉⠁    ⢀⡤⠊          |
        0┤⠤⠤⠤⠤⠤⠤⠤⠤⠤⠤⠤⠤⠴⠒⠒⠶⠶⠶⠒⠒⠶⠶⣒⠚⠉⣉⣉⣉⠉ ⣀⣀⣀  ⣀⣀⣀  ⠴⠒⠂             |
         └┴──────────┴───────────┴──────────┴──────────┴──────    |
          0         20          40         60         80          |
                         angle of incidence (°)                   |"
    `);
  });
  it('in blocks is as agreed', () => {
    expect(drawn(INDEX_CHART, { width: 60, height: 12, level: 'blocks' })).toMatchInlineSnapshot(`
      "n  ░░░ outside the fit                                      |
      1.6┤                                          ░ ░ ░ ░ ░ ░   |
         │█▄                                         ░ ░ ░ ░ ░ ░  |
         │ ▀▀█▄▄                                    ░ ░ ░ ░ ░ ░   |
         │     ▀▀▀▀▀█▄▄▄▄▄▄▄▄▄▄▄▄▄▄                  ░ ░ ░ ░ ░ ░  |
         │                        ▀▀▀▀▀▀▀▀▀▀▀▀█▄▄▄▄ ░ ░ ░ ░ ░ ░   |
      1.4┤                                         ▀▀█▄░ ░ ░ ░ ░  |
         │                                          ░ ░▀█▄░ ░ ░   |
         │                                           ░ ░ ▀▄░ ░ ░ n|
         └┴────────────┴─────────┴─────────┴────────────┴───────  |
         0.2          0.5        1         2            5         |
                          vacuum wavelength (µm)                  |"
    `);
  });
  it('in ASCII is as agreed', () => {
    const marks = [
      { x: 0.5876, label: 'He d' },
      { x: 0.6328, label: 'He-Ne' },
      { x: 1.55, label: 'asked' },
    ];
    expect(
      drawn({ ...INDEX_CHART, marks }, { width: 60, height: 14, level: 'ascii' }),
    ).toMatchInlineSnapshot(`
      "n  /// outside the fit                                      |
                       He d          asked                        |
                         He-Ne                                    |
      1.6+               : :           :            / / / / / /   |
         |**             : :           :             / / / / / /  |
         | *****         : :           :            / / / / / /   |
         |     ********************    :             / / / / / /  |
         |               : :      ******************/ / / / / /   |
      1.4+               : :           :           ***** / / / /  |
         |               : :           :            / /***/ / /   |
         |               : :           :             / / **/ / / n|
         ++------------+---------+---------+------------+-------  |
         0.2          0.5        1         2            5         |
                          vacuum wavelength (um)                  |"
    `);
  });
  it('small is as agreed', () => {
    expect(drawn(ANGLE_CHART, { width: 30, height: 6, level: 'braille' })).toMatchInlineSnapshot(`
      "R (%)  ⠒⠒⠒⠒ R_s  ⠒⠒⠒  ⠒⠒⠒ R_p…|
      100┤             ┊      ⣠⠞ R_s|
       50┤             ┊   ⣀⡤⢞⡵  R_p|
        0┤⣀⣀⣀⣀⡠⣤⣤⣤⠤⠤⣤⣤⣤⠖⠒⣚⣉⠥ ⠈      |
         └┴───────────┴─────────    |
          0          50             |"
    `);
    expect(drawn(ANGLE_CHART, { width: 10, height: 2, level: 'braille' })).toMatchInlineSnapshot(`
      "      ┊ ⢀⡾|
      ⣀⣀⣀⣀⡤⣤⣤⣒⠉⠁|"
    `);
  });
  it('without data shows its axes', () => {
    const empty = {
      ...ANGLE_CHART,
      series: [{ label: 'R', x: [0, 90], y: [Number.NaN, Number.NaN] }],
      marks: [],
    };
    expect(drawn(empty, { width: 40, height: 8, level: 'braille' })).toMatchInlineSnapshot(`
      "R (%)                                   |
      1.0┤                                    |
         │                                    |
      0.5┤                                    |
      0.0┤                                    |
         └┴─────────────────┴───────────────  |
          0                50                 |
                angle of incidence (°)        |"
    `);
  });
});

describe('the dots of a curve', () => {
  it('stand where the curve is', () => {
    const [width, height] = [70, 24];
    const angle = { ...ANGLE_CHART, marks: [], series: ANGLE_CHART.series.slice(0, 1) };
    const lines = brailleChart(angle, { width, height, level: 'braille' });
    // Four columns for the tick labels and the axis, four for the label at the end; heading above, three rows below.
    const [left, columns, top, rows] = [4, 62, 1, 20];
    for (let column = 0; column < columns; column++) {
      for (let half = 0; half < 2; half++) {
        const place = (2 * column + half) / (2 * columns - 1);
        const expected = (1 - reflectances(90 * place).s / 100) * (4 * rows - 1);
        const dotRows: number[] = [];
        for (let row = 0; row < rows; row++) {
          const bits = (lines[top + row]?.codePointAt(left + column) ?? 0x20) - 0x2800;
          if (bits < 0) continue;
          for (let dot = 0; dot < 4; dot++) if (bits & bit(half, dot)) dotRows.push(4 * row + dot);
        }
        expect(dotRows.length).toBeGreaterThan(0);
        const slope = Math.abs(reflectances(90 * place).s - reflectances(90 * Math.max(0, place - 0.01)).s);
        const room = 1 + slope * 0.01 * 4 * rows;
        expect(Math.min(...dotRows.map((dotRow) => Math.abs(dotRow - expected)))).toBeLessThanOrEqual(
          0.51 + 0.2 * room,
        );
        for (const dotRow of dotRows) expect(Math.abs(dotRow - expected)).toBeLessThanOrEqual(1 + room);
      }
    }
  });

  it('reach from corner to corner and no further', () => {
    expect(plotOnly(bare([{ label: '', x: [0, 1], y: [0, 1] }]), 2, 1)).toEqual(['⡠⠊']);
    expect(plotOnly(bare([{ label: '', x: [0, 1], y: [1, 0] }]), 2, 1)).toEqual(['⠑⢄']);
    expect(plotOnly(bare([{ label: '', x: [-9, 11], y: [-9, 11] }]), 2, 1)).toEqual(['⡠⠊']);
    expect(plotOnly(bare([{ label: '', x: [0, 1], y: [5, 6] }]), 4, 2)).toEqual(['    ', '    ']);
    expect(plotOnly(bare([{ label: '', x: [0, 1], y: [0, 1] }]), 2, 2, 'blocks')).toEqual(
      [' █', '█ '].map(String),
    );
    expect(plotOnly(bare([{ label: '', x: [0, 1], y: [0, 1] }]), 2, 2, 'ascii')).toEqual([' *', '* ']);
  });

  it('stop at gaps', () => {
    const y = [0.5, 0.5, Number.NaN, Number.POSITIVE_INFINITY, 0.5, 0.5];
    const [line] = plotOnly(bare([{ label: '', x: [0, 0.2, 0.4, 0.6, 0.8, 1], y }]), 11, 1, 'ascii');
    expect(line).toBe('***     ***');
  });

  it('show a single point, also the only one of a chart', () => {
    const single = { title: '', x: axis, y: axis, series: [{ label: 'a', x: [3], y: [7] }] };
    expect(brailleChart(single, { width: 3, height: 1, level: 'braille' }).join('')).toMatch(
      /[\u2801-\u28ff]/,
    );
    const lines = brailleChart(single, { width: 40, height: 12, level: 'ascii' });
    expect(lines.filter((line) => line.includes('*')).length).toBe(1);
  });

  it('draw a flat series as one level line', () => {
    const flat = { title: '', x: axis, y: axis, series: [{ label: '', x: [0, 1, 2], y: [1.5, 1.5, 1.5] }] };
    const lines = brailleChart(flat, { width: 40, height: 12, level: 'ascii' });
    const rows = lines.filter((line) => line.includes('**'));
    expect(rows.length).toBe(1);
    expect(rows[0]).toMatch(/\*{30,}/);
  });

  it('differ from series to series without colour', () => {
    const x = Array.from({ length: 100 }, (_, i) => i / 99);
    const at = (count: number, level: TextChartOptions['level']): string[] =>
      Array.from({ length: count }, (_, i) => {
        const others = Array.from({ length: i }, () => ({ label: 'hidden', x: [], y: [] }));
        const [line = ''] = plotOnly(bare([...others, { label: '', x, y: x.map(() => 0.5) }]), 40, 1, level);
        return line;
      });
    for (const level of ['braille', 'blocks', 'ascii'] as const) expect(new Set(at(8, level)).size).toBe(8);
  });
});

describe('marks and hatched ranges', () => {
  it('fill only the columns of the range, in blank cells', () => {
    const chart = bare([{ label: '', x: [0, 1], y: [0, 0] }], {
      hatched: [{ from: 0.75, to: 9, label: 'out' }],
    });
    const lines = plotOnly(chart, 9, 2, 'ascii');
    expect(lines).toEqual(['      / /', '*********']);
  });

  it('put a mark and the cursor into their columns, behind the curve', () => {
    const chart = bare([{ label: '', x: [0, 1], y: [0, 0] }], {
      marks: [
        { x: 0.5, label: 'm' },
        { x: 7, label: 'far' },
      ],
    });
    const options = { width: 9, height: 2, level: 'ascii', cursor: 1 } as const;
    expect(brailleChart(chart, options)).toEqual(['    :   |', '*********']);
  });

  it('name every mark, in the rows above or in the heading', () => {
    const marks = ['Brewster', 'critical', 'asked', 'principal'].map((label, i) => ({
      x: 41 + i / 4,
      label,
    }));
    const text = brailleChart({ ...ANGLE_CHART, marks }, { width: 90, height: 20, level: 'braille' });
    for (const { label } of marks) expect(text.slice(0, 3).join('\n')).toContain(label);
  });
});

describe('texts of several widths', () => {
  it('keep the columns where the caller measures wide characters', () => {
    const wide = {
      ...ANGLE_CHART,
      y: { ...ANGLE_CHART.y, label: '反射率' },
      series: [{ label: '石英', x: [0, 90], y: [1, 2] }],
    };
    const lines = brailleChart(wide, { width: 50, height: 12, level: 'braille', clusters });
    const widths = lines.map((line) => clusters(line).reduce((sum, { width }) => sum + width, 0));
    expect(widths).toEqual(new Array(12).fill(50));
    expect(lines.join('\n')).toContain('石英');
  });

  it('gives a long legend as many rows as it needs, and cuts it in a low chart', () => {
    const series = ['the first medium', 'the second medium', 'the third medium', 'the fourth medium'].map(
      (label, i) => ({ label, x: [0, 1], y: [i, i + 1] }),
    );
    const chart: Chart = {
      title: 'many',
      x: { label: 'x', unit: '', scale: 'linear' },
      y: { label: 'index', unit: '', scale: 'linear' },
      series,
    };
    for (const level of ['braille', 'blocks', 'ascii'] as const) {
      const tall = brailleChart(chart, { width: 60, height: 20, level });
      expect(tall).toHaveLength(20);
      for (const { label } of series) expect(tall.slice(0, 3).join('\n')).toContain(label);
      const low = brailleChart(chart, { width: 60, height: 12, level });
      expect(low[0]?.trimEnd()).toMatch(/(?:…|\.\.\.)$/);
      expect(low[1]).not.toContain('medium');
    }
  });
});

function bit(column: number, row: number): number {
  return row === 3 ? 0x40 << column : 1 << (row + 3 * column);
}
