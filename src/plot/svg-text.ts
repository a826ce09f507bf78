/** Text and numbers for SVG: escaped, indices lowered, widths estimated since no font is at hand. */

/** Text for an element or an attribute; characters that XML 1.0 does not allow become U+FFFD. */
export function escapeXml(text: string): string {
  return text
    .replace(/[^\t\n\r\u0020-\ud7ff\ue000-\ufffd\u{10000}-\u{10ffff}]/gu, '\ufffd')
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;')
    .replaceAll("'", '&#39;');
}

/** A label as it is printed: "R_s" with its index small and low. */
export function labelMarkup(label: string, size_px: number): string {
  const drop_px = size_px * 0.25;
  return label
    .split(/(?<=(?<![\p{L}\d])\p{L})_(\p{L}{1,3})(?![\p{L}\d])/u)
    .map((part, i) => {
      const text = escapeXml(part);
      if (i % 2 === 1)
        return `<tspan dy="${decimal(drop_px)}" font-size="${decimal(size_px * 0.75)}">${text}</tspan>`;
      return i > 0 && text !== '' ? `<tspan dy="${decimal(-drop_px)}">${text}</tspan>` : text;
    })
    .join('');
}

/** Coordinates to a hundredth, without an exponent and without -0. */
export function decimal(value: number): string {
  return String(Math.round(value * 100) / 100 + 0);
}

/** About as wide as a sans-serif font sets it: 0.56 of its size a character, wide characters twice that. */
export function estimatedWidth(text: string, size_px: number): number {
  let units = 0;
  for (const character of text) units += (character.codePointAt(0) ?? 0) >= 0x2e80 ? 1.1 : 0.56;
  return units * size_px;
}

/** Lines of at most so many pixels, broken at spaces; longer words are left whole. */
export function brokenText(text: string, width_px: number, size_px: number): readonly string[] {
  const lines: string[] = [];
  for (const word of text.split(/\s+/)) {
    const last = lines.at(-1);
    if (last !== undefined && estimatedWidth(`${last} ${word}`, size_px) <= width_px)
      lines[lines.length - 1] = `${last} ${word}`;
    else if (word !== '') lines.push(word);
  }
  return lines;
}
