/**
 * The number of the line at which a text stops being JSON. Of many faults the engine's own message tells no position, so the text
 * is tried up to each line end: no token runs over one, so what is sound so far breaks off at the very end of the piece.
 * @returns 1 for the first line; the last line that holds anything where only the end is missing, 0 where the text is JSON.
 */
export function brokenJsonLine(text: string): number {
  const lines = text.trimEnd().split('\n');
  let piece = '';
  for (const [i, line] of lines.entries()) {
    const isLast = i === lines.length - 1;
    piece += isLast ? line : `${line}\n`;
    const fault = faultOf(piece);
    if (fault === undefined ? isLast : !breaksOff(fault, piece)) return fault === undefined ? 0 : i + 1;
  }
  return lines.length;
}

function faultOf(piece: string): string | undefined {
  try {
    JSON.parse(piece);
    return undefined;
  } catch (error) {
    return error instanceof Error ? error.message : '';
  }
}

function breaksOff(fault: string, piece: string): boolean {
  const position = /position (\d+)/.exec(fault)?.[1];
  return fault.includes('end of JSON input') || (position !== undefined && Number(position) >= piece.length);
}
