/** What is to be drawn, from the options: the kind and the span, in the quantity of the kind. */

import type { Question } from '../../answer/question.ts';
import { bothReferences } from '../../answer/wave.ts';
import { isRefusal, type Refusal, refuse } from '../../medium/refusal.ts';
import { quantityOf, type WaveQuantity } from '../../plot/wave-axis.ts';
import { parseIncidence } from '../../units/parse-angle.ts';
import { parseWave } from '../../units/parse-wave.ts';
import { isProblem } from '../../units/problem.ts';
import type { OptionValues } from '../options.ts';
import type { TypedSpan } from '../plot-options.ts';

type Ends = readonly [number, number];

export type PlotRequest =
  | { readonly kind: 'angle'; readonly span_rad: Ends | undefined }
  | { readonly kind: 'wave'; readonly span_m: Ends | undefined; readonly quantity: WaveQuantity }
  | { readonly kind: 'field' };

/** Undefined where no plot is asked for. */
export function readPlot(options: OptionValues, question: Question): PlotRequest | Refusal | undefined {
  const { plot: kind, span } = options;
  switch (kind) {
    case undefined:
      return undefined;
    case 'angle': {
      const span_rad = span && angleSpan(span);
      return isRefusal(span_rad) ? span_rad : { kind, span_rad };
    }
    case 'wave':
      return readWavePlot(options, question.wave.text);
    case 'field':
      return span === undefined
        ? { kind }
        : refuse(
            'span-not-here',
            2,
            '--span says nothing to --plot field',
            'leave it out: the field is drawn through the whole path',
          );
  }
}

/** @param waveText the wave as typed: a frequency has its axis run along frequencies */
export function readWavePlot(
  { span, airWavelength }: Pick<OptionValues, 'span' | 'airWavelength'>,
  waveText: string,
): Extract<PlotRequest, { kind: 'wave' }> | Refusal {
  const span_m = span && waveSpan(span, airWavelength === true);
  if (isRefusal(span_m)) return span_m;
  return { kind: 'wave', span_m, quantity: quantityOf(span?.high ?? waveText) };
}

function angleSpan({ low, high }: TypedSpan): Ends | Refusal {
  const ends = [withUnitOf(low, high), high].map(parseIncidence);
  const wrong = ends.find(isProblem);
  if (isProblem(wrong)) return refuse('bad-span', 2, `--span: ${wrong.message}`, wrong.remedy);
  return ordered(ends as number[], `${low}..${high}`);
}

/** In vacuum. */
function waveSpan({ low, high }: TypedSpan, inAir: boolean): Ends | Refusal {
  const ends: number[] = [];
  for (const text of [withUnitOf(low, high), high]) {
    const wave = parseWave(text, { airWavelength: inAir });
    if (isProblem(wave)) return refuse('bad-span', 2, `--span: ${wave.message}`, wave.remedy);
    const both = bothReferences(wave);
    if (isRefusal(both)) return both;
    // The wavelength given stays as it is; only one in air is converted.
    ends.push(wave.inAir ? both.vacuum_um * 1e-6 : wave.wavelength_m);
  }
  return ordered(ends, `${low}..${high}`);
}

function ordered([a = 0, b = 0]: readonly number[], typed: string): Ends | Refusal {
  if (a !== b) return a < b ? [a, b] : [b, a];
  return refuse('bad-span', 2, `--span: both ends of ${typed} are the same`, 'write two different ends');
}

/** `8` beside `12GHz` is 8GHz. */
function withUnitOf(low: string, high: string): string {
  const number = /^[-+]?[\d.]+(?:e[-+]?\d+)?$/i;
  const unit = /^[-+]?[\d.]+(?:e[-+]?\d+)?\s*([^\d\s.].*)$/iu.exec(high)?.[1];
  return unit !== undefined && number.test(low) ? low + unit : low;
}
