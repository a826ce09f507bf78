/** `--plot`: a chart in place of the numbers, in the form asked for; `--svg` keeps it as a picture too. */
import type { Answer } from '../../answer/answer.ts';
import type { Question } from '../../answer/question.ts';
import type { IndexedCatalogue } from '../../catalog/entries.ts';
import { isRefusal, type Refusal } from '../../medium/refusal.ts';
import { decideGlyphs, decideLinear } from '../../term/ability.ts';
import type { Context } from '../context.ts';
import type { OptionValues } from '../options.ts';
import { saveFile } from '../save-file.ts';
import { plotOf } from './plot-curves.ts';
import { plotCsv, plotJson } from './plot-data.ts';
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
  const style = { ascii: context.ascii };

  const { svg } = options;
  if (svg !== undefined) {
    const picture = plotSvg(answer, plot, head);
    if (svg === '-') {
      context.print(picture);
      return undefined;
    }
    const trouble = saveFile(svg, picture, { replace: true });
    if (trouble) return trouble;
  }
  if (options.json) context.write(plotJson(answer, plot, head, options.ascii === true));
  else if (options.csv) context.write(plotCsv(plot, context.ascii));
  else if (options.markdown) context.write(plotMarkdown(answer, plot, style));
  else if (options.plain) context.write(plotPlain(answer, plot, style));
  else {
    const isLinear = decideLinear(context.env, options.linear === true);
    const level = context.ascii ? 'ascii' : decideGlyphs(context.env);
    context.write(plotText(answer, plot, isLinear ? undefined : level, style));
  }
  return undefined;
}
