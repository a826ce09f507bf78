/** `halfspace compare ... --plot wave`: the dispersion of the media compared, one line each, in place of the table. */
import { type DispersionCurves, dispersionCurves } from '../../answer/dispersion-curves.ts';
import { isRefusal, type Refusal, refuse } from '../../medium/refusal.ts';
import { dispersionCharts } from '../../plot/dispersion-charts.ts';
import { compareCautions, compareSources, partTitle } from '../../present/compare-page.ts';
import type { PresentStyle } from '../../present/shown.ts';
import type { CompareReport } from '../../selection/compare-report.ts';
import { waveWords } from '../../selection/condition-words.ts';
import type { Survey } from '../../selection/survey.ts';
import type { Context } from '../context.ts';
import type { OptionValues } from '../options.ts';
import { csvTable } from '../render/csv-table.ts';
import { type DocumentHead, jsonDocument } from '../render/json-document.ts';
import { columnsOf } from './plot-data.ts';
import type { PlotPage } from './plot-page.ts';
import { readWavePlot } from './read-plot.ts';
import { writePlot } from './show-plot.ts';

const DATA_END = 'A line ends where the data of its medium end';

/** Why nothing was shown; undefined where it was. */
export function showComparePlot(
  report: CompareReport,
  survey: Survey,
  options: OptionValues,
  context: Context,
  head: DocumentHead,
): Refusal | undefined {
  const { plot } = options;
  if (plot !== 'wave') {
    const message = `--plot ${plot} is a chart of one question, and media are compared over the wave`;
    return refuse('plot-not-here', 2, message, 'write --plot wave');
  }
  const request = readWavePlot(options, report.waves[0]?.spec.text ?? '');
  if (isRefusal(request)) return request;
  const waves_m = report.waves.map(({ at }) => at.vacuum_um * 1e-6);
  // A medium that is compared with itself at another thickness has one line.
  const parts = report.parts.filter(
    (part, i) => report.parts.findIndex((other) => nameOf(other) === nameOf(part)) === i,
  );
  const names = parts.map(nameOf);
  const { temperature_K } = options;
  const shown = dispersionCurves(
    parts.map(({ part }) => part.medium),
    waves_m,
    temperature_K === undefined ? {} : { temperature_K },
    request.span_m,
    survey.sourceOf,
  );
  const charts = dispersionCharts(shown, names, waves_m, request.quantity);
  if (charts.length === 0)
    return refuse('no-dispersion', 3, 'none of the media has data in that span', 'choose another --span');
  const gaps = shown.curves.some(({ n }) => n.some((value) => !Number.isFinite(value)));
  const notes = gaps ? [DATA_END] : [];
  return writePlot(
    {
      pageIn: (style) => pageOf(report, names, charts, notes, style),
      json: (ascii) =>
        jsonDocument(head, { ...data(shown, names, notes), cautions: compareCautions(report) }, ascii),
      csv: (ascii) => csv(shown, ascii),
    },
    head,
    options,
    context,
  );
}

/** "n-bk7": the thickness says nothing to an index. */
const nameOf = (part: CompareReport['parts'][number]): string => partTitle(part).split('@')[0] ?? '';

function pageOf(
  report: CompareReport,
  names: readonly string[],
  charts: PlotPage['charts'],
  notes: readonly string[],
  style: PresentStyle,
): PlotPage {
  const waves = report.waves.map(({ spec }) => waveWords(spec, style)).join(', ');
  return {
    headline: `${names.join(', ')} at ${waves}`,
    charts,
    here: undefined,
    notes,
    cautions: compareCautions(report),
    sources: compareSources(report, style),
  };
}

const data = ({ curves }: DispersionCurves, names: readonly string[], notes: readonly string[]) => ({
  plot: 'dispersion',
  curves: curves.map((curve, i) => ({
    kind: curve.kind,
    medium: names[i] ?? curve.name,
    columns: Object.fromEntries(columnsOf(curve)),
  })),
  notes,
});

/** One table over the wavelength; the media, in the order given, are told apart by their number. */
function csv({ curves }: DispersionCurves, ascii: boolean): string {
  const points = curves[0]?.wavelength_m ?? [];
  const columns = curves.flatMap((curve, i) =>
    columnsOf(curve)
      .slice(1)
      .map(([name, values]) => ({ name: `${name}_${i + 1}`, values })),
  );
  const rows = points.map((at_m, i) => [at_m, ...columns.map(({ values }) => values[i])]);
  return csvTable(['vacuumWavelength_m', ...columns.map(({ name }) => name)], rows, ascii);
}
