/**
 * Where the parts of a chart lie in a rectangle of cells. Small rectangles lose their parts in this order: room for labels at the line
 * ends, the title of the x axis, rows for the labels of marks, the heading, the ticks; the curve itself stays to the last cell.
 */
import type { Chart } from './chart.ts';
import { type ChartScale, xScale, yScale } from './chart-scale.ts';
import type { GlyphLevel } from './dot-raster.ts';
import { type Clusters, simpleClusters } from './text-grid.ts';
import { headingRows, legendEntries } from './text-heading.ts';
import { type AxisTexts, axisTexts } from './tick-text.ts';

export interface TextChartOptions {
  readonly width: number;
  readonly height: number;
  /** Braille dots, half blocks (terminals without braille), or the bytes 0x20 to 0x7E. */
  readonly level: GlyphLevel;
  /** A value of x at which a vertical line stands. */
  readonly cursor?: number;
  /** How texts fall into cells; one cell a character where absent. */
  readonly clusters?: Clusters;
}

export interface TextLayout {
  readonly width: number;
  readonly height: number;
  readonly ascii: boolean;
  readonly clusters: Clusters;
  readonly x: ChartScale;
  readonly y: ChartScale;
  readonly xTexts: AxisTexts;
  readonly yTexts: AxisTexts;
  /** The cells of the curves. */
  readonly plot: {
    readonly row: number;
    readonly column: number;
    readonly rows: number;
    readonly columns: number;
  };
  /** Rows of the title and the legend; none where there is no room. */
  readonly headingRows: number;
  /** Rows below the heading for the labels of marks. */
  readonly markRows: number;
  readonly hasYTicks: boolean;
  readonly hasAxisRow: boolean;
  readonly hasTickRow: boolean;
  readonly hasXTitle: boolean;
  /** Columns right of the plot for labels at line ends. */
  readonly endColumns: number;
}

const ROWS_PER_TICK = 4;
const COLUMNS_PER_TICK = 12;
const LEAST_PLOT_COLUMNS = 20;
const WIDEST_END_LABEL = 10;
const LEAST_WITH_HEADING = 5;
/** From this height on a legend that takes more than a row has them. */
const LEAST_WITH_LEGEND_ROWS = 14;
const MOST_HEADING_ROWS = 3;

export function layOut(chart: Chart, options: TextChartOptions): TextLayout {
  const width = wholeCells(options.width);
  const height = wholeCells(options.height);
  const ascii = options.level === 'ascii';
  const clusters = options.clusters ?? simpleClusters;
  const columnsOf = (text: string): number => clusters(text).reduce((sum, cluster) => sum + cluster.width, 0);

  const markRows = (chart.marks ?? []).length === 0 || height < 8 ? 0 : height < 12 ? 1 : 2;
  const hasAxisRow = height >= 3;
  const hasTickRow = height >= 4;
  const hasXTitle = height >= 7;
  const foot = (hasAxisRow ? 1 : 0) + (hasTickRow ? 1 : 0) + (hasXTitle ? 1 : 0);

  const x = xScale(chart);
  const yAxis = (headRows: number) => {
    const row = headRows + markRows;
    const rows = Math.max(0, height - row - foot);
    const tickCount = Math.max(2, Math.round(rows / ROWS_PER_TICK));
    const y = yScale(chart, x, tickCount);
    return { row, rows, y, yTexts: axisTexts(y, tickCount, ascii) };
  };
  const least = height >= LEAST_WITH_HEADING ? 1 : 0;
  const title = yAxis(least).yTexts.title;
  const hasLegend = height >= LEAST_WITH_LEGEND_ROWS && chart.series.length > 1;
  const entries = [title, ...legendEntries(chart, options.level, true)];
  const headRows = hasLegend ? headingRows(entries, width, MOST_HEADING_ROWS, columnsOf).length : least;
  const { row, rows, y, yTexts } = yAxis(headRows);
  const tickColumns = Math.max(0, ...yTexts.ticks.map(({ text }) => columnsOf(text)));
  const hasYTicks = hasAxisRow && width >= tickColumns + 9;
  const column = hasYTicks ? tickColumns + 1 : hasAxisRow && width >= 2 ? 1 : 0;

  const endLabels = chart.series.map(({ label }) => columnsOf(label));
  const widest = Math.max(0, ...endLabels.filter((columns) => columns <= WIDEST_END_LABEL));
  const isRoom = width - column - widest - 1 >= LEAST_PLOT_COLUMNS;
  const endColumns = widest > 0 && isRoom ? widest + 1 : 0;
  const columns = Math.max(0, width - column - endColumns);
  const xTexts = axisTexts(x, Math.max(2, Math.floor(columns / COLUMNS_PER_TICK)), ascii);
  return {
    width,
    height,
    ascii,
    clusters,
    x,
    y,
    xTexts,
    yTexts,
    plot: { row, column, rows, columns },
    headingRows: headRows,
    markRows,
    hasYTicks,
    hasAxisRow,
    hasTickRow,
    hasXTitle,
    endColumns,
  };
}

/** The column of the plot, from 0, that holds a value of x; undefined outside. */
export function plotColumnOf({ x, plot }: TextLayout, value: number): number | undefined {
  const place = x.place(value);
  return place >= 0 && place <= 1 && plot.columns > 0 ? Math.round(place * (plot.columns - 1)) : undefined;
}

/** The row of the plot, from 0 at the top, that holds a value of y; undefined outside. */
export function plotRowOf({ y, plot }: TextLayout, value: number): number | undefined {
  const place = y.place(value);
  return place >= 0 && place <= 1 && plot.rows > 0 ? Math.round((1 - place) * (plot.rows - 1)) : undefined;
}

function wholeCells(cells: number): number {
  return Number.isFinite(cells) ? Math.max(0, Math.min(4096, Math.floor(cells))) : 0;
}
