/**
 * cos(sqrt w) and sin(sqrt w)/sqrt w as functions of w with their frequency derivatives: entire functions of w, so a layer
 * at its critical angle (w = 0) is an ordinary point. Both come divided by exp(|Im sqrt w|) where that is large.
 *
 *   C' = -S/2,  S' = (C - S)/(2 w),  S'' = -(S + 6 S')/(4 w)
 *
 * Below |w| = 1/2 the power series is used: the quotients would cancel there.
 */
import { abs, add, type Complex, complex, div, mul, scale, sqrtDecaying, sub } from '../num/complex.ts';
import { atCentre, compose, type FrequencySeries } from './frequency-series.ts';

export interface LayerFunctions {
  readonly cosine: FrequencySeries;
  readonly sinc: FrequencySeries;
  /** The constant factor exp(-Im sqrt w) both are multiplied by. */
  readonly decay: number;
}

export function cosineAndSinc(w: FrequencySeries): LayerFunctions {
  return abs(atCentre(w)) < 0.5 ? bySeries(w) : byQuotient(w);
}

function byQuotient(w: FrequencySeries): LayerFunctions {
  const value = atCentre(w);
  const D = sqrtDecaying(value);
  const sinh = -Math.expm1(-2 * D.im) / 2;
  const cosh = 1 - sinh;
  const sin = Math.sin(D.re);
  const cos = Math.cos(D.re);
  const C = complex(cos * cosh, -sin * sinh);
  const S = div(complex(sin * cosh, cos * sinh), D);
  const dS = div(sub(C, S), scale(value, 2));
  const d2S = div(add(S, scale(dS, 6)), scale(value, -4));
  return assemble(w, C, S, dS, d2S, Math.exp(-D.im));
}

function bySeries(w: FrequencySeries): LayerFunctions {
  const value = atCentre(w);
  let C = complex(0);
  let S = complex(0);
  let dS = complex(0);
  let d2S = complex(0);
  // term = (-1)^k w^(k-2)/(2 k + 1)! from k = 2 on; the lower ones by hand.
  let power = complex(1);
  let factorial = 120;
  for (let k = 2; k <= 12; k++) {
    const sign = k % 2 ? -1 : 1;
    const term = scale(power, sign / factorial);
    d2S = add(d2S, scale(term, k * (k - 1)));
    power = mul(power, value);
    dS = add(dS, scale(mul(term, value), k));
    const full = mul(mul(term, value), value);
    S = add(S, full);
    C = add(C, scale(full, 2 * k + 1));
    factorial *= (2 * k + 2) * (2 * k + 3);
  }
  S = add(S, sub(complex(1), scale(value, 1 / 6)));
  C = add(C, sub(complex(1), scale(value, 1 / 2)));
  dS = add(dS, complex(-1 / 6));
  return assemble(w, C, S, dS, d2S, 1);
}

function assemble(
  w: FrequencySeries,
  C: Complex,
  S: Complex,
  dS: Complex,
  d2S: Complex,
  decay: number,
): LayerFunctions {
  return {
    cosine: compose(w, C, scale(S, -0.5), scale(dS, -0.5)),
    sinc: compose(w, S, dS, d2S),
    decay,
  };
}
