/** The index of a medium and what vouches for it, in words. */
import type { MediumAnswer } from '../../answer/answer.ts';
import { formatNumber } from '../../units/format-number.ts';
import { formatUncertain } from '../../units/format-uncertain.ts';
import { lengthRange } from './shown-numbers.ts';

/** "n 2.40345(10), grade B, data from 0.54 µm to 18.2 µm". */
export function howMuch(medium: MediumAnswer): string {
  const { n, n_uncertainty, n_digitsGuide, fit } = medium;
  if (!fit) return `n ${formatNumber(n, 'shortest')}, as stated`;
  const index = n_uncertainty
    ? formatUncertain(n, n_uncertainty, { significant: 7 })
    : formatNumber(n, {
        decimals: n_digitsGuide ? Math.max(2, Math.min(5, -Math.floor(Math.log10(n_digitsGuide)))) : 3,
      });
  const second = fit.secondOpinion;
  const other =
    second && second.difference !== 0
      ? [
          `a second source differs by ${second.difference < 0 ? '-' : '+'}${formatNumber(Math.abs(second.difference), { significant: 1 })}`,
        ]
      : [];
  const { range_m } = fit;
  const range = range_m[0] === range_m[1] ? 'a single published value' : `data from ${lengthRange(range_m)}`;
  return [`n ${index}`, `grade ${fit.grade}`, range, ...other].join(', ');
}
