/**
 * Constants over the whole range of the fit: n and k, or eps' with loss tangent, or n with loss tangent; mu_r beside them.
 *
 *   (n + ik)^2 = m (1 + i tan delta), with m = permittivity mu_r or m = n^2.
 *
 * A record with `n` (and `k`) alone gives just these: n is the index, whatever mu_r. `k: 0` states that nothing is absorbed,
 * an absent k that the source is silent about it. Special case: a value published at one wavelength says nothing about
 * dispersion; its derivatives are written as 0 and `hasDerivative` is false.
 */
import * as C from '../num/complex.ts';
import type { BoundModel } from './evaluator.ts';
import type { ConstantParameters } from './parameters.ts';

export function bindConstant(p: ConstantParameters): BoundModel {
  const index = complexIndex(p);
  const single = p.publishedAt_um !== undefined;
  const mu = p.permeability ?? 1;
  return {
    used: {},
    hasDerivative: !single,
    derivativeOrder: single ? 0 : 3,
    complex: p.k !== undefined || p.lossTangent !== undefined,
    evaluate(_, out) {
      out.fill(0);
      out[0] = index.re;
      out[4] = index.im;
    },
    ...(index.im === 0 ? { index: () => index.re } : {}),
    ...(mu === 1
      ? {}
      : {
          permeability(_: number, out: Float64Array) {
            out[0] = mu;
            out[1] = 0;
          },
        }),
  };
}

function complexIndex(p: ConstantParameters): C.Complex {
  if (p.permittivity === undefined && p.lossTangent === undefined) return { re: p.n ?? 1, im: p.k ?? 0 };
  const square = p.permittivity === undefined ? (p.n ?? 1) ** 2 : p.permittivity * (p.permeability ?? 1);
  return C.sqrtDecaying({ re: square, im: square * (p.lossTangent ?? 0) });
}
