/** How numbers are written: for a screen that has the signs, or in the bytes 0x20 to 0x7E. */
export interface NumberStyle {
  readonly ascii: boolean;
}

export const SCREEN: NumberStyle = { ascii: false };
export const ASCII: NumberStyle = { ascii: true };

/** Stands for a value that does not exist; NaN and infinities never reach a person. */
export const NO_VALUE = '-';

const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** 10^power as a factor after a number: ` × 10⁻⁶`, or `e-6`. */
export function timesPowerOfTen(power: number, style: NumberStyle): string {
  return style.ascii ? `e${power}` : ` × 10${superscript(power)}`;
}

/** An integer in superscript figures. */
export function superscript(power: number): string {
  return [...String(power)].map((c) => (c === '-' ? '⁻' : (SUPERSCRIPTS[Number(c)] ?? c))).join('');
}
