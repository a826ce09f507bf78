/** Where the numbers of a medium come from, and how far they hold. */
import type { MediumAnswer } from '../../answer/answer.ts';
import { doiAddress } from '../../cite/source-text.ts';
import { mediumTitle } from '../../present/question-line.ts';
import { METRE } from '../../units/display-unit.ts';
import { formatNumber } from '../../units/format-number.ts';
import { formatRange } from '../../units/format-quantity.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { type PageLine, pageLine } from './page-line.ts';

const GRADES = {
  A: 'A: coefficients and an independent value read in print',
  B: 'B: one of coefficients and check value read in print',
  C: 'C: coefficients and check value from memory',
} as const;

export function sourceLines(medium: MediumAnswer, style: NumberStyle): readonly PageLine[] {
  const title = pageLine(mediumTitle(medium), 'heading');
  const { fit } = medium;
  if (!fit) return [title, pageLine('given by its numbers: exact, without dispersion'), pageLine('')];
  const lines = [
    title,
    pageLine(fit.source.text),
    ...(fit.source.doi && !fit.source.text.includes(fit.source.doi)
      ? [pageLine(doiAddress(fit.source.doi))]
      : []),
    pageLine(`model: ${fit.model}, relative to ${medium.publishedReference}`),
    pageLine(
      `range: ${formatRange(fit.range_m, METRE, 'shortest', { style })}${fit.inRange ? '' : ' (left)'}`,
    ),
    pageLine(`accuracy of n: ${accuracyText(medium, style)}`),
    pageLine(`grade ${GRADES[fit.grade]}`),
  ];
  const second = fit.secondOpinion;
  if (second) {
    const difference = formatNumber(second.difference, { significant: 2 }, style);
    lines.push(
      pageLine(`second opinion: ${second.source.text}`),
      pageLine(`it differs by ${difference} in n`),
    );
  }
  if (fit.film) {
    const spread = fit.film.spread === null ? '' : `; n varies by ${fit.film.spread} with the process`;
    lines.push(pageLine(`film made by ${fit.film.process}${spread}`));
  }
  return [...lines, pageLine('')];
}

function accuracyText(medium: MediumAnswer, style: NumberStyle): string {
  const { fit, n_digitsGuide: guide } = medium;
  if (fit?.accuracy === 0) return 'exact';
  if (fit && fit.accuracy !== null) {
    return `${formatNumber(fit.accuracy, { significant: 2 }, style)} (standard uncertainty, in parentheses)`;
  }
  if (guide === null) return 'not stated';
  return `not stated; agrees with published values to ${formatNumber(guide, { significant: 1 }, style)}`;
}
