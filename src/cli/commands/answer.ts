/** `halfspace FROM [LAYER@THICKNESS ...] INTO WAVE`: one answer, in the form asked for. */
import type { Answer } from '../../answer/answer.ts';
import { answerQuestion } from '../../answer/answer-question.ts';
import { isRefusal } from '../../medium/refusal.ts';
import type { Command, Context } from '../context.ts';
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
  const catalogue = context.catalogue();
  const question = readQuestion(operands, options, catalogue);
  const json = options.json === true;
  if (question instanceof Promise) return question.then((refusal) => reportRefusal(refusal, json, context));
  if (isRefusal(question)) return reportRefusal(question, json, context);
  const answer = answerQuestion(question, (id) => catalogue.source(id));
  if (isRefusal(answer)) return reportRefusal(answer, json, context);
  context.write(renderAnswer(answer, options, context, catalogue.hash));
  // A caution changes the status only under --strict.
  const status = options.strict && answer.cautions.some((c) => c.level !== 'note') ? 1 : 0;
  if (!options.log && options.logFile === undefined) return status;
  return import('../logbook/keep-answer.ts').then(
    ({ keepAnswer }) => keepAnswer(question, answer, invocation, context) || status,
  );
};

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
