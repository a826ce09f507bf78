/**
 * Why a typed quantity is not understood, as data. `message` says what is wrong, `remedy` what would be right; both are
 * single lines without a full stop, safe to print (no control characters). Faces join them with "; ".
 */
export type ProblemCode =
  | 'empty'
  | 'not-a-number'
  | 'number-too-large'
  | 'unit-missing'
  | 'unit-unknown'
  | 'unit-ambiguous'
  | 'unit-of-another-kind'
  | 'out-of-range'
  | 'gain'
  | 'not-a-choice'
  | 'not-a-medium'
  | 'not-a-tolerance';

export interface Problem {
  readonly problem: true;
  readonly code: ProblemCode;
  readonly message: string;
  readonly remedy: string;
}

export function problem(code: ProblemCode, message: string, remedy: string): Problem {
  return { problem: true, code, message, remedy };
}

export function isProblem(x: unknown): x is Problem {
  return typeof x === 'object' && x !== null && (x as { problem?: unknown }).problem === true;
}

/** The one line shown to a person. */
export function problemText(p: { readonly message: string; readonly remedy: string }): string {
  return `${p.message}; ${p.remedy}`;
}
