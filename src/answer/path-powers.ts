/**
 * Where the answer's powers come from where there are layers: the whole path; also at moved inputs, for the uncertainty.
 * Refusals of the laws become refusals of the answer here.
 */
import { reflectionLoss_dB, returnLoss_dB } from '../interface/losses.ts';
import type { CautionNote } from '../medium/caution.ts';
import { lengthText } from '../medium/range-text.ts';
import { type Refusal, refuse } from '../medium/refusal.ts';
import { arg, complex } from '../num/complex.ts';
import { coherentStack } from '../stack/coherent-stack.ts';
import { mixedStack } from '../stack/mixed-stack.ts';
import { StackRefusal } from '../stack/stack-refusal.ts';
import { ASSUMED_COHERENCE_waves } from './coherence-taken.ts';
import { type InterfaceParts, powerOf } from './interface-answer.ts';
import type { Moved } from './moved.ts';
import type { Path } from './path.ts';
import type { Polarization, Question } from './question.ts';
import { type StackParts, stackParts } from './stack-answer.ts';
import type { BothPolarizations } from './surface-power.ts';

export function solvePath(path: Path, question: Question, vacuumWavelength_m: number): StackParts | Refusal {
  try {
    return stackParts(path, question, vacuumWavelength_m);
  } catch (error) {
    if (error instanceof StackRefusal) return refuse(error.code, 3, error.message, error.remedy);
    throw error;
  }
}

/** The path's powers at moved inputs; which layers are coherent stays as it was answered. */
export function pathPower(
  parts: StackParts,
  vacuumWavelength_m: number,
): (inputs: Moved) => BothPolarizations {
  const { coherence, coherenceLength_m } = parts.stack;
  return ({ from, into, angle_rad, shift_um, layers }) => {
    const wavelength_m = vacuumWavelength_m + shift_um * 1e-6;
    const path = {
      incidence: { eps: complex((from.n.re * from.n.re) / from.mu.re), mu: complex(from.mu.re) },
      layers: layers.map(({ optics: { eps, mu }, thickness_m }, i) => ({
        eps,
        mu,
        thickness_m,
        coherent: parts.layers[i]?.coherent,
      })),
      exit: { eps: into.eps, mu: into.mu },
    };
    const { s, p } =
      coherence === 'coherent'
        ? coherentStack(path, wavelength_m, angle_rad)
        : mixedStack(path, wavelength_m, angle_rad, coherenceLength_m);
    return { R: [s.R, p.R], T: [s.T, p.T] };
  };
}

type Surface = InterfaceParts['answer'];

/** The interface part of the answer for a path: powers, amplitudes and losses of the whole; angles of a bare surface fall away. */
export function pathSurface(bare: Surface, parts: StackParts, polarization: Polarization): Surface {
  const { s, p, amplitudes, stack } = parts;
  const R = powerOf(polarization, s.R, p.R);
  return {
    ...bare,
    Rs: s.R,
    Rp: p.R,
    R,
    Ts: s.T,
    Tp: p.T,
    T: stack.T,
    rs: amplitudes?.rs ?? null,
    rp: amplitudes?.rp ?? null,
    ts: amplitudes?.ts ?? null,
    tp: amplitudes?.tp ?? null,
    phaseRs_rad: amplitudes && s.R > 1e-31 ? arg(amplitudes.rs) : null,
    phaseRp_rad: amplitudes && p.R > 1e-31 ? arg(amplitudes.rp) : null,
    brewsterAngle_rad: null,
    brewsterAngleS_rad: null,
    pseudoBrewsterAngle_rad: null,
    evanescentDepth_m: bare.evanescentDepth_m,
    goosHanchenS_m: null,
    goosHanchenP_m: null,
    reflectionLoss_dB: reflectionLoss_dB(R),
    returnLoss_dB: returnLoss_dB(R),
  };
}

/** Which layers were summed as intensities, and on what ground. */
export function pathNotes({ stack, layers }: StackParts): readonly CautionNote[] {
  const length = lengthText(stack.coherenceLength_m * 1e6, 3);
  const grounds = {
    stated: `coherence length ${length} as stated`,
    pulse: `coherence length taken as ${length}, that of the pulse`,
    assumed: `coherence length taken as ${length} (${ASSUMED_COHERENCE_waves} wavelengths; state --linewidth or --coherence)`,
  };
  const ground = grounds[stack.coherenceLengthFrom];
  const numbers = layers.flatMap((l, i) => (l.coherent ? [] : [i + 1]));
  if (numbers.length === 0)
    return [{ code: 'coherence', details: { text: `all layers coherent: ${ground}` } }];
  const which = numbers.length === 1 ? `layer ${numbers[0]} is` : `layers ${numbers.join(', ')} are`;
  return [
    { code: 'coherence', details: { text: `${which} summed as intensities: ${ground}` } },
    { code: 'coherent-sum-not-included', details: {} },
  ];
}
