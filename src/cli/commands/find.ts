/** `halfspace find [CONDITION ...]`: the media of the catalogue that meet conditions, and how many could not be judged. */
import { isRefusal } from '../../medium/refusal.ts';
import { findReport } from '../../selection/find-report.ts';
import { defaultOrder } from '../../selection/sort-found.ts';
import { makeSurvey } from '../../selection/survey.ts';
import type { Command } from '../context.ts';
import { readCriteria } from '../read-criteria.ts';
import { findCsv, findJson } from '../render/find-data.ts';
import { findText } from '../render/find-text.ts';
import { reportRefusal } from '../report-refusal.ts';

export const run: Command = ({ operands, options }, context) => {
  const json = options.json === true;
  const catalogue = context.catalogue();
  const criteria = readCriteria(operands, options, catalogue);
  if (isRefusal(criteria)) return reportRefusal(criteria, context);
  const order = options.sort ?? defaultOrder(criteria);
  const report = findReport(makeSurvey(catalogue), criteria, order);
  if (isRefusal(report)) return reportRefusal(report, context);
  const ascii = options.ascii === true;
  if (json) {
    context.write(findJson(report, order, { version: context.version, catalogue: catalogue.hash }, ascii));
  } else {
    context.write(options.csv ? findCsv(report, ascii) : findText(report, order, { ascii: context.ascii }));
  }
  return 0;
};
