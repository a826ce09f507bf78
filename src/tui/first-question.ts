/** The question of a first start: a common pair at a common laser line, so that the picture explains itself. */
import { type MediumSpec, makeQuestion, type Question } from '../answer/question.ts';
import type { Material } from '../catalog/types.ts';
import { readLiteral } from './fields/medium-fields.ts';

const WAVE: Question['wave'] = { wavelength_m: 632.8e-9, inAir: false, text: '632.8 nm' };

export function firstQuestion(materialOf: (key: string) => Material | undefined): Question {
  const medium = (key: string, numbers: string): MediumSpec => {
    const material = materialOf(key);
    if (material) return { kind: 'catalogue', material };
    // A catalogue without them: the numbers alone.
    return readLiteral(numbers) as MediumSpec;
  };
  return makeQuestion(medium('air', 'n=1.00028'), medium('fused-silica', 'n=1.457'), WAVE);
}
