/** `MEDIUM`, `MEDIUM@THICKNESS` and the waves behind them, for commands that compare. */
import type { WaveSpec } from '../answer/question.ts';
import type { IndexedCatalogue } from '../catalog/entries.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import type { Part } from '../selection/compare-report.ts';
import { parseThickness } from '../units/parse-thickness.ts';
import { parseWave } from '../units/parse-wave.ts';
import { isProblem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import { findMedium, suggestMedia } from './find-medium.ts';
import type { OptionValues } from './options.ts';
import { readWave } from './read-question.ts';

/** The operands that are waves stand last; at least one does, or the refusal says so. */
export function splitWaves(
  operands: readonly string[],
  options: OptionValues,
): { readonly media: readonly string[]; readonly waves: readonly WaveSpec[] } | Refusal {
  const notWave = (text: string): boolean => isProblem(parseWave(text));
  let first = operands.length;
  while (first > 0 && !notWave(operands[first - 1] ?? '')) first--;
  if (first === operands.length) {
    const last = operands.at(-1) ?? '';
    const read = readWave(last, options);
    // Where it begins like a wave, what is wrong with it is worth more than that there is none.
    if (isRefusal(read) && /^[\d.]/.test(last) && !/@/.test(last)) return read;
    return refuse(
      'wave-missing',
      2,
      'a wave is missing behind the media',
      'write one or more, such as 633nm 10.6um',
    );
  }
  const waves: WaveSpec[] = [];
  for (const text of operands.slice(first)) {
    const wave = readWave(text, options);
    if (isRefusal(wave)) return wave;
    waves.push(wave);
  }
  return { media: operands.slice(0, first), waves };
}

export async function readPart(text: string, catalogue: IndexedCatalogue): Promise<Part | Refusal> {
  const [name = '', size, ...more] = text.split('@');
  if (more.length > 0) {
    return refuse(
      'bad-thickness',
      2,
      `${quoteInput(text)} has two thicknesses`,
      `write ${name}@THICKNESS, such as ${name}@3mm`,
    );
  }
  const medium = findMedium(name, catalogue);
  if (isRefusal(medium)) return suggestMedia(medium, name, catalogue);
  if (size === undefined) return { medium, text: name, thickness_m: null };
  const thickness = parseThickness(size);
  if (isProblem(thickness)) return refuse('bad-thickness', 2, thickness.message, thickness.remedy);
  if (thickness.kind === 'waves') {
    return refuse(
      'bad-thickness',
      2,
      `${quoteInput(text)} is a film, and parts are compared as plates`,
      `give a length: ${name}@3mm`,
    );
  }
  return { medium, text, thickness_m: thickness.thickness_m };
}
