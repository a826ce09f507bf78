/** `halfspace crystal [FROM] CRYSTAL WAVE`: a birefringent crystal at one wave, at a cut where one is stated. */
import { crystalReport } from '../../answer/crystal-report.ts';
import { makeQuestion } from '../../answer/question.ts';
import { isRefusal } from '../../medium/refusal.ts';
import type { Command } from '../context.ts';
import { findMedium, suggestMedia } from '../find-medium.ts';
import { questionOptions, readWave } from '../read-question.ts';
import { crystalCsv, crystalJson } from '../render/crystal-data.ts';
import { crystalMarkdown } from '../render/crystal-markdown.ts';
import { crystalText } from '../render/crystal-text.ts';
import { reportRefusal } from '../report-refusal.ts';

const OUTSIDE = 'air';

export const run: Command = async ({ operands, options }, context) => {
  const catalogue = context.catalogue();
  const [waveText = '', crystalName = '', outsideName = OUTSIDE] = operands.toReversed();
  const wave = readWave(waveText, options);
  if (isRefusal(wave)) return reportRefusal(wave, context);
  const into = findMedium(crystalName, catalogue);
  if (isRefusal(into)) {
    return reportRefusal(await suggestMedia(into, crystalName, catalogue), context);
  }
  const from = findMedium(outsideName, catalogue);
  if (isRefusal(from)) {
    return reportRefusal(await suggestMedia(from, outsideName, catalogue), context);
  }
  const stated = questionOptions(options, wave);
  if (isRefusal(stated)) return reportRefusal(stated, context);
  const asked = {
    question: makeQuestion(from, into, wave, stated),
    thickness_m: options.thickness_m ?? null,
    retardance_waves: options.retardance_waves ?? null,
  };
  const report = crystalReport(asked, (id) => catalogue.source(id));
  if (isRefusal(report)) return reportRefusal(report, context);
  const head = { version: context.version, catalogue: catalogue.hash };
  const style = { ascii: context.ascii };
  if (options.json) context.write(crystalJson(report, head, options.ascii === true));
  else if (options.csv) context.write(crystalCsv(report, options.ascii === true));
  else if (options.markdown) context.write(crystalMarkdown(report, style));
  else context.write(crystalText(report, style));
  return options.strict && report.cautions.some((c) => c.level !== 'note') ? 1 : 0;
};
