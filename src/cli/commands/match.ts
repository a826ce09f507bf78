/** `halfspace match TARGET [CONDITION ...] --at WAVE`: which medium beside the target reflects least; with --mix which mixture. */
import { isRefusal, refuse } from '../../medium/refusal.ts';
import { matchReport } from '../../selection/match-report.ts';
import { makeSurvey } from '../../selection/survey.ts';
import type { Command } from '../context.ts';
import { findMedium, suggestMedia } from '../find-medium.ts';
import { readCriteria } from '../read-criteria.ts';
import { matchCsv, matchJson } from '../render/match-data.ts';
import { matchText } from '../render/match-text.ts';
import { reportRefusal } from '../report-refusal.ts';

export const run: Command = async ({ operands, options }, context) => {
  const json = options.json === true;
  const catalogue = context.catalogue();
  const [name = '', ...conditions] = operands;
  const target = findMedium(name, catalogue);
  if (isRefusal(target)) return reportRefusal(await suggestMedia(target, name, catalogue), context);
  const criteria = readCriteria(conditions, options, catalogue);
  if (isRefusal(criteria)) return reportRefusal(criteria, context);
  const { wave } = criteria;
  if (!wave) {
    const remedy = 'give it: --at 589nm, --at 10.6um or --at d-line';
    return reportRefusal(
      refuse('wave-missing', 2, 'media match at a wave, and none is given', remedy),
      context,
    );
  }
  const { within, mix } = options;
  const report = matchReport(makeSurvey(catalogue), { target, wave, within, mix: mix === true, criteria });
  if (isRefusal(report)) return reportRefusal(report, context);
  const ascii = options.ascii === true;
  if (json) {
    context.write(matchJson(report, { version: context.version, catalogue: catalogue.hash }, ascii));
  } else {
    context.write(
      options.csv ? matchCsv(report, ascii) : matchText(report, criteria, { ascii: context.ascii }),
    );
  }
  return 0;
};
