/**
 * Looking at characters one by one. A regular expression is compiled at its first use and again at its second, a tenth of a
 * millisecond each; what every start of the program reads is read without one.
 */

/** True where all characters are printable ASCII, 0x20 to 0x7E; also for the empty text. */
export function isAscii(text: string): boolean {
  for (let i = 0; i < text.length; i++) {
    const code = text.charCodeAt(i);
    if (code < 0x20 || code > 0x7e) return false;
  }
  return true;
}

/** A letter from a to z in either case. */
export function isLetter(code: number): boolean {
  const lower = code | 0x20;
  return lower >= 0x61 && lower <= 0x7a;
}

/** A digit from 0 to 9. */
export function isDigit(code: number): boolean {
  return code >= 0x30 && code <= 0x39;
}

/** The place behind the digits that stand from `at` on; `at` itself where there is none. */
export function skipDigits(text: string, at: number): number {
  let end = at;
  while (isDigit(text.charCodeAt(end))) end++;
  return end;
}

/** The place behind a plus or minus that stands at `at`; `at` itself where there is none. */
export function skipSign(text: string, at: number): number {
  const code = text.charCodeAt(at);
  return code === 0x2b || code === 0x2d ? at + 1 : at;
}
