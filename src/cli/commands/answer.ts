/** `halfspace FROM [LAYER@THICKNESS ...] INTO WAVE`: one answer, in the form asked for. */
import type { Answer } from '../../answer/answer.ts';
import { answerQuestion } from '../../answer/answer-question.ts';
import type { Question } from '../../answer/question.ts';
import type { IndexedCatalogue } from '../../catalog/entries.ts';
import { isRefusal } from '../../medium/refusal.ts';
import type { Invocation } from '../arguments.ts';
import type { Command, Context, ExitStatus } from '../context.ts';
import type { OptionValues } from '../options.ts';
import { readQuestion } from '../read-question.ts';
import { renderCsv } from '../render/csv.ts';
import { renderJson } from '../render/json.ts';
import { renderMarkdown } from '../render/markdown.ts';
import { renderPlain } from '../render/plain.ts';
import { renderText } from '../render/text.ts';
import { reportRefusal } from '../report-refusal.ts';

/** Only the search for close names is asynchronous: an answer costs no turn of the event loop. */
export const run: Command = (invocation, context) => {
  const { operands, options } = invocation;
  if (options.sweeps || options.columns !== undefined || options.digits !== undefined) {
    return import('./sweep.ts').then((sweep) => sweep.run(invocation, context));
  }
  const catalogue = context.catalogue();
  const question = readQuestion(operands, options, catalogue);
  if (question instanceof Promise) return question.then((refusal) => reportRefusal(refusal, context));
  if (isRefusal(question)) return reportRefusal(question, context);
  const answer = answerQuestion(question, (id) => catalogue.source(id));
  if (isRefusal(answer)) return reportRefusal(answer, context);
  if (options.plot !== undefined) return showPlotAndKeep(question, answer, invocation, context, catalogue);
  context.write(renderAnswer(answer, options, context, catalogue.hash));
  return keepIfAsked(question, answer, invocation, context);
};

function keepIfAsked(
  question: Question,
  answer: Answer,
  invocation: Invocation,
  context: Context,
): ExitStatus | Promise<ExitStatus> {
  const { options } = invocation;
  // A caution changes the status only under --strict.
  const status = options.strict && answer.cautions.some((c) => c.level !== 'note') ? 1 : 0;
  if (!options.log && options.logFile === undefined) return status;
  return import('../logbook/keep-answer.ts').then(
    ({ keepAnswer }) => keepAnswer(question, answer, invocation, context) || status,
  );
}

async function showPlotAndKeep(
  question: Question,
  answer: Answer,
  invocation: Invocation,
  context: Context,
  catalogue: IndexedCatalogue,
): Promise<ExitStatus> {
  const { options } = invocation;
  const { showPlot } = await import('../plot/show-plot.ts');
  const trouble = showPlot(question, answer, options, context, catalogue);
  if (trouble) return reportRefusal(trouble, context);
  return keepIfAsked(question, answer, invocation, context);
}

export function renderAnswer(
  answer: Answer,
  options: OptionValues,
  context: Pick<Context, 'ascii' | 'version'>,
  catalogueHash: string,
): string {
  const style = { ascii: context.ascii };
  const ascii = options.ascii === true;
  if (options.json) return renderJson(answer, context.version, catalogueHash, ascii);
  if (options.csv) return renderCsv(answer, ascii);
  if (options.markdown) return renderMarkdown(answer, style);
  if (options.plain) return renderPlain(answer, style);
  return renderText(answer, style);
}
