/** Several charts below each other as one standalone SVG file; one caption under all of them. */
import type { Chart } from './chart.ts';
import { type SvgOptions, type SvgPanel, svgChart, svgPanel } from './svg-chart.ts';
import { escapeXml } from './svg-text.ts';

/** Of every panel behind the first. */
const LOWER_HEIGHT_px = 360;

export function svgPage(
  charts: readonly Chart[],
  options: Omit<SvgOptions, 'height_px' | 'id'> = {},
): string {
  const [first] = charts;
  if (!first) throw new RangeError('a page needs a chart');
  if (charts.length === 1) return svgChart(first, options);
  const { caption = [], ...size } = options;
  const panels: SvgPanel[] = [];
  let top = 0;
  for (const [i, chart] of charts.entries()) {
    const isLast = i === charts.length - 1;
    const own: SvgOptions = {
      ...size,
      id: `chart${i + 1}`,
      ...(i === 0 ? {} : { height_px: LOWER_HEIGHT_px }),
      ...(isLast ? { caption } : {}),
    };
    const panel = svgPanel(chart, own, top);
    panels.push(panel);
    top += panel.height;
  }
  const width = Math.max(...panels.map((panel) => panel.width));
  const parts = [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${top}" viewBox="0 0 ${width} ${top}">`,
    `<title>${escapeXml(first.title)}</title>`,
    ...panels.map(({ markup }) => markup),
    '</svg>',
  ];
  return `${parts.join('\n')}\n`;
}
