/** What a person most likely meant by an operand that is the value of an option: `air fused-silica 633nm 45deg p`. */
import type { Refusal } from '../medium/refusal.ts';
import { parseIncidence } from '../units/parse-angle.ts';
import { parseWave } from '../units/parse-wave.ts';
import { isProblem } from '../units/problem.ts';

/** The refusal with the options named as remedy, where operands look like an angle or a polarization. */
export function nameOptions(refusal: Refusal, operands: readonly string[]): Refusal {
  const waveAt = operands.findIndex((text) => !isProblem(parseWave(text)));
  const options = operands.flatMap((operand, i) => {
    const text = operand.trim();
    const isBehindWave = waveAt >= 0 && i > waveAt;
    // Without a unit a number among the media is a name mistyped, and as the last operand a wave without its unit.
    if (!isBehindWave && !/(deg|degrees?|°|rad)$/i.test(text)) return [];
    if (/^[sp]$/i.test(text)) return [`--pol ${text.toLowerCase()}`];
    return isProblem(parseIncidence(text)) ? [] : [`--angle ${text}`];
  });
  if (options.length === 0) return refusal;
  return { ...refusal, remedy: `write ${options.join(' ')} in its place; the wave is the last operand` };
}
