/**
 * Why a question is not answered, as data. `exit` is the process status of the one-shot faces: 2 not understood, 3 not
 * covered by the data. `message` says what is wrong, `remedy` what would be right; faces join them with "; ".
 */
export interface Refusal {
  readonly refused: true;
  readonly code: string;
  readonly exit: 2 | 3 | 4;
  readonly message: string;
  readonly remedy: string;
  /** Closest matches, where a name was not found or fits several. */
  readonly candidates?: readonly string[];
}

export function refuse(
  code: string,
  exit: 2 | 3 | 4,
  message: string,
  remedy: string,
  candidates?: readonly string[],
): Refusal {
  return candidates
    ? { refused: true, code, exit, message, remedy, candidates }
    : { refused: true, code, exit, message, remedy };
}

export function isRefusal(x: unknown): x is Refusal {
  return typeof x === 'object' && x !== null && (x as { refused?: unknown }).refused === true;
}
