/**
 * What a person typed, made fit for a one-line message: control characters (and so escape sequences), bidirectional
 * overrides and unpaired surrogates become `?`, long text is cut.
 */
const LONGEST = 40;
export function printedInput(text: string): string {
  const clean = text.slice(0, 4 * LONGEST).replace(/[\p{Cc}\p{Cf}\p{Cs}\p{Co}\p{Zl}\p{Zp}]/gu, '?');
  const characters = [...clean];
  return characters.length > LONGEST ? `${characters.slice(0, LONGEST - 3).join('')}...` : clean;
}

/** The same in quotes. */
export const quoteInput = (text: string): string => `"${printedInput(text)}"`;
