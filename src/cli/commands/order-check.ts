/** `halfspace order-check FROM [LAYER@THICKNESS ...] INTO WAVE ...`: what to settle before a part is ordered. */
import type { Question } from '../../answer/question.ts';
import { isRefusal } from '../../medium/refusal.ts';
import { orderReport } from '../../selection/order/order-report.ts';
import { makeSurvey } from '../../selection/survey.ts';
import type { Command } from '../context.ts';
import { splitWaves } from '../read-parts.ts';
import { readQuestion } from '../read-question.ts';
import { orderJson } from '../render/order-json.ts';
import { orderMarkdown, orderText } from '../render/order-text.ts';
import { reportRefusal } from '../report-refusal.ts';

export const run: Command = async ({ operands, options }, context) => {
  const json = options.json === true;
  const catalogue = context.catalogue();
  const split = splitWaves(operands, options);
  if (isRefusal(split)) return reportRefusal(split, context);
  const questions: Question[] = [];
  for (const wave of operands.slice(split.media.length)) {
    const question = await readQuestion([...split.media, wave], options, catalogue);
    if (isRefusal(question)) return reportRefusal(question, context);
    // The films of a part are made once, for the first wave if for no other.
    const designWave = question.designWave ?? split.waves[0];
    questions.push({ ...question, designWave });
  }
  const report = orderReport(makeSurvey(catalogue), questions);
  if (isRefusal(report)) return reportRefusal(report, context);
  const style = { ascii: context.ascii };
  if (json) {
    const head = { version: context.version, catalogue: catalogue.hash };
    context.write(orderJson(report, head, options.ascii === true));
  } else context.write(options.markdown ? orderMarkdown(report, style) : orderText(report, style));
  return 0;
};
