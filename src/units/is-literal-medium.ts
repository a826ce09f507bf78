/** Catalogue names hold no `=`, so one is enough to tell. */
export function isLiteralMedium(text: string): boolean {
  return text.includes('=');
}
