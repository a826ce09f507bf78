/**
 * A medium given by its numbers: `n=1.5`, `n=1.5+0.02i`, `n=1.5,k=0.02`, `eps=9.8+0.01i,mu=1.2`, `eps=2.1,tand=0.0003`,
 * `eps=4,sigma=0.01` (S/m); a uniaxial crystal is `no=1.6584,ne=1.4864`. Fields go as exp(i(k r - w t)): imaginary parts >= 0 absorb, and gain is refused.
 * Greek letters (ε, μ, σ, tanδ) are accepted as well.
 */
import type { Complex } from '../num/complex.ts';
import { parseComplex } from './parse-complex.ts';
import { parseConductivity } from './parse-conductivity.ts';
import { parseNumber } from './parse-number.ts';
import { isProblem, type Problem, problem } from './problem.ts';
import { quoteInput } from './quote-input.ts';

/** Either `n`, or `eps` with what goes with it. All relative to vacuum; only what was typed is present. */
export interface TypedMedium {
  /** Of a uniaxial crystal: the ordinary index. */
  readonly n?: Complex;
  /** Extraordinary index of a uniaxial crystal. */
  readonly ne?: Complex;
  readonly eps?: Complex;
  readonly mu?: Complex;
  /** eps'' / eps' */
  readonly lossTangent?: number;
  readonly conductivity_S_per_m?: number;
}

const KEYS = ['n', 'k', 'no', 'ne', 'eps', 'mu', 'tand', 'sigma'] as const;
type Key = (typeof KEYS)[number];

const EXAMPLES =
  'write for example n=1.5, n=1.5+0.02i, eps=9.8+0.01i,mu=1.2, eps=2.1,tand=0.0003 or eps=4,sigma=0.01';
const SIGN =
  'absorption has the plus sign here (fields exp(i(k r - w t)), n + ik with k >= 0); gain is not covered';

export function parseLiteralMedium(text: string): TypedMedium | Problem {
  const values: Partial<Record<Key, string>> = {};
  for (const part of text.split(',')) {
    const [name = '', value, ...more] = part.split('=');
    const key = keyOf(name);
    if (value === undefined && /^\s*\d+\s*$/.test(part) && Object.keys(values).length > 0) {
      return problem(
        'not-a-medium',
        `${quoteInput(text)} has a decimal comma`,
        'write numbers with a point, as in n=1.55',
      );
    }
    if (key === undefined || value === undefined || more.length > 0) {
      return problem('not-a-medium', `${quoteInput(part.trim())} is no property of a medium`, EXAMPLES);
    }
    if (values[key] !== undefined) return problem('not-a-medium', `${key} is given twice`, 'give it once');
    values[key] = value;
  }
  const medium =
    values.no !== undefined || values.ne !== undefined
      ? fromPrincipalIndices(values)
      : values.n === undefined && values.k === undefined
        ? fromPermittivity(values)
        : fromIndex(values);
  return isProblem(medium) ? medium : (beyondReason(medium) ?? medium);
}

/** Far beyond any medium; numbers past these would overflow on their way to an answer. */
const GREATEST = 1e20;
const SMALLEST = 1e-20;

function beyondReason(medium: TypedMedium): Problem | undefined {
  for (const [key, value] of Object.entries(medium) as [string, Complex | number][]) {
    const size = typeof value === 'number' ? value : Math.hypot(value.re, value.im);
    if (size > GREATEST || (typeof value !== 'number' && size < SMALLEST))
      return problem(
        'out-of-range',
        `${NAMES[key] ?? key} is ${size > GREATEST ? 'greater than 1e20' : 'smaller than 1e-20'}`,
        'no medium is: check the exponent',
      );
  }
  return undefined;
}

const NAMES: Readonly<Record<string, string>> = { lossTangent: 'tand', conductivity_S_per_m: 'sigma' };

function keyOf(name: string): Key | undefined {
  const plain = name.trim().normalize('NFKC').toLowerCase();
  const greek: Readonly<Record<string, Key>> = {
    ε: 'eps',
    μ: 'mu',
    σ: 'sigma',
    tanδ: 'tand',
    'tan δ': 'tand',
  };
  return KEYS.find((key) => key === plain) ?? (Object.hasOwn(greek, plain) ? greek[plain] : undefined);
}

function fromPrincipalIndices(values: Partial<Record<Key, string>>): TypedMedium | Problem {
  const { no, ne, ...others } = values;
  const [other] = Object.keys(others);
  if (other !== undefined || no === undefined || ne === undefined) {
    const wrong =
      other === undefined ? 'one principal index is missing' : `no, ne and ${other} are given together`;
    return problem(
      'not-a-medium',
      wrong,
      'give a uniaxial crystal by both of its indices: no=1.658,ne=1.486',
    );
  }
  const ordinary = fromIndex({ n: no });
  if (isProblem(ordinary)) return ordinary;
  const extraordinary = fromIndex({ n: ne });
  if (isProblem(extraordinary)) return extraordinary;
  return { ...ordinary, ...(extraordinary.n && { ne: extraordinary.n }) };
}

function fromIndex(values: Partial<Record<Key, string>>): TypedMedium | Problem {
  const other = KEYS.find((key) => key !== 'n' && key !== 'k' && values[key] !== undefined);
  if (other)
    return problem(
      'not-a-medium',
      `n and ${other} are given together`,
      'give the index alone, or eps and mu',
    );
  if (values.n === undefined)
    return problem('not-a-medium', 'k is given without n', 'write n=1.5,k=0.02 or n=1.5+0.02i');
  const n = parseComplex(values.n);
  if (isProblem(n)) return n;
  const k = values.k === undefined ? n.im : parseNumber(values.k);
  if (isProblem(k)) return k;
  if (values.k !== undefined && n.im !== 0)
    return problem('not-a-medium', 'k is given twice', 'give it once');
  if (k < 0) return problem('gain', `k is ${k}, which is gain`, SIGN);
  if (n.re < 0)
    return problem(
      'out-of-range',
      `n is ${n.re}`,
      'a negative index needs both eps and mu negative: eps=-1,mu=-1',
    );
  if (n.re === 0 && k === 0)
    return problem('out-of-range', 'n is 0', 'no wave exists there; give n or k above 0');
  return { n: { re: n.re, im: k } };
}

function fromPermittivity(values: Partial<Record<Key, string>>): TypedMedium | Problem {
  if (values.eps === undefined) return problem('not-a-medium', 'neither n nor eps is given', EXAMPLES);
  const eps = passive('eps', values.eps);
  if (isProblem(eps)) return eps;
  const mu = values.mu === undefined ? undefined : passive('mu', values.mu);
  if (isProblem(mu)) return mu;
  const lossTangent = values.tand === undefined ? undefined : parseNumber(values.tand);
  if (isProblem(lossTangent)) return lossTangent;
  const conductivity_S_per_m = values.sigma === undefined ? undefined : parseConductivity(values.sigma);
  if (isProblem(conductivity_S_per_m)) {
    return conductivity_S_per_m.code === 'out-of-range' ? gain('sigma') : conductivity_S_per_m;
  }
  if (lossTangent !== undefined) {
    if (lossTangent < 0) return gain('tand');
    if (eps.im !== 0 || conductivity_S_per_m !== undefined) {
      const twice = eps.im !== 0 ? 'the imaginary part of eps' : 'sigma';
      return problem('not-a-medium', `tand and ${twice} both state the loss`, 'give one of them');
    }
    if (eps.re <= 0)
      return problem(
        'out-of-range',
        'tand needs eps above 0',
        'write eps=-10+1i for a negative permittivity',
      );
  }
  return {
    eps,
    ...(mu && { mu }),
    ...(lossTangent !== undefined && { lossTangent }),
    ...(conductivity_S_per_m !== undefined && { conductivity_S_per_m }),
  };
}

function passive(key: 'eps' | 'mu', text: string): Complex | Problem {
  const z = parseComplex(text);
  if (isProblem(z)) return z;
  if (z.im < 0) return problem('gain', `the imaginary part of ${key} is ${z.im}, which is gain`, SIGN);
  if (z.re === 0 && z.im === 0)
    return problem('out-of-range', `${key} is 0`, 'no wave exists there; give another value');
  return z;
}

function gain(key: string): Problem {
  return problem('gain', `${key} is negative, which is gain`, SIGN);
}
