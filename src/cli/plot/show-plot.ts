/** `--plot`: a chart in place of the numbers, in the form asked for; `--svg` keeps it as a picture too. */
import type { Answer } from '../../answer/answer.ts';
import type { Question } from '../../answer/question.ts';
import type { IndexedCatalogue } from '../../catalog/entries.ts';
import { isRefusal, type Refusal } from '../../medium/refusal.ts';
import type { PresentStyle } from '../../present/shown.ts';
import { decideGlyphs, decideLinear } from '../../term/ability.ts';
import { SCREEN } from '../../units/number-style.ts';
import type { Context } from '../context.ts';
import type { OptionValues } from '../options.ts';
import type { DocumentHead } from '../render/json-document.ts';
import { saveFile } from '../save-file.ts';
import { plotOf } from './plot-curves.ts';
import { plotCsv, plotJson } from './plot-data.ts';
import { type PlotPage, pageOfAnswer } from './plot-page.ts';
import { plotSvg } from './plot-svg.ts';
import { plotMarkdown, plotPlain, plotText } from './plot-text.ts';
import { readPlot } from './read-plot.ts';

/** Why nothing was shown; undefined where it was. */
export function showPlot(
  question: Question,
  answer: Answer,
  options: OptionValues,
  context: Context,
  catalogue: IndexedCatalogue,
): Refusal | undefined {
  const request = readPlot(options, question);
  if (isRefusal(request) || !request) return request;
  const plot = plotOf(request, question, answer, (id) => catalogue.source(id));
  if (isRefusal(plot)) return plot;
  const head = { version: context.version, catalogue: catalogue.hash };
  return writePlot(
    {
      pageIn: (style) => pageOfAnswer(answer, plot, style),
      json: (ascii) => plotJson(answer, plot, head, ascii),
      csv: (ascii) => plotCsv(plot.curves, ascii),
    },
    head,
    options,
    context,
  );
}

/** A plot in all of its forms. */
export interface PlotForms {
  readonly pageIn: (style: PresentStyle) => PlotPage;
  readonly json: (ascii: boolean) => string;
  readonly csv: (ascii: boolean) => string;
}

/** The form asked for, and the picture where one is asked for too; why nothing was shown, undefined where it was. */
export function writePlot(
  forms: PlotForms,
  head: DocumentHead,
  options: OptionValues,
  context: Context,
): Refusal | undefined {
  const { svg } = options;
  if (svg !== undefined) {
    const picture = plotSvg(forms.pageIn(SCREEN), head);
    if (svg === '-') {
      context.print(picture);
      return undefined;
    }
    const trouble = saveFile(svg, picture, { replace: true });
    if (trouble) return trouble;
  }
  const style = { ascii: context.ascii };
  const page = (): PlotPage => forms.pageIn(style);
  if (options.json) context.write(forms.json(options.ascii === true));
  else if (options.csv) context.write(forms.csv(context.ascii));
  else if (options.markdown) context.write(plotMarkdown(page(), style));
  else if (options.plain) context.write(plotPlain(page(), style));
  else {
    const isLinear = decideLinear(context.env, options.linear === true);
    const level = context.ascii ? 'ascii' : decideGlyphs(context.env);
    context.write(plotText(page(), isLinear ? undefined : level, style));
  }
  return undefined;
}
