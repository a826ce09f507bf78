/** `halfspace compare PART PART ... WAVE ...`: media, or plates of them, side by side. */
import { isRefusal } from '../../medium/refusal.ts';
import { compareReport, type Part } from '../../selection/compare-report.ts';
import { makeSurvey } from '../../selection/survey.ts';
import type { Command } from '../context.ts';
import { readPart, splitWaves } from '../read-parts.ts';
import { readWave } from '../read-question.ts';
import { compareCsv, compareJson } from '../render/compare-data.ts';
import { compareMarkdown, compareText } from '../render/compare-text.ts';
import { reportRefusal } from '../report-refusal.ts';

export const run: Command = async ({ operands, options }, context) => {
  const json = options.json === true;
  const catalogue = context.catalogue();
  const split = splitWaves(operands, options);
  if (isRefusal(split)) return reportRefusal(split, context);
  const parts: Part[] = [];
  for (const text of split.media) {
    const part = await readPart(text, catalogue);
    if (isRefusal(part)) return reportRefusal(part, context);
    parts.push(part);
  }
  const { temperature_K } = options;
  const survey = makeSurvey(catalogue);
  const designWave = options.designWave && readWave(options.designWave.text, options);
  if (isRefusal(designWave)) return reportRefusal(designWave, context);
  const report = compareReport(survey, parts, split.waves, { temperature_K }, designWave);
  if (isRefusal(report)) return reportRefusal(report, context);
  const ascii = options.ascii === true;
  const style = { ascii: context.ascii };
  const head = { version: context.version, catalogue: catalogue.hash };
  if (options.plot !== undefined) {
    const { showComparePlot } = await import('../plot/compare-plot.ts');
    const trouble = showComparePlot(report, survey, options, context, head);
    return trouble ? reportRefusal(trouble, context) : 0;
  }
  if (json) context.write(compareJson(report, head, ascii));
  else if (options.csv) context.write(compareCsv(report, ascii));
  else context.write(options.markdown ? compareMarkdown(report, style) : compareText(report, style));
  return 0;
};
