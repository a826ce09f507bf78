/** The exit statuses of the program, for help and man page; main.ts sets them. */
export const EXIT_STATUSES: readonly (readonly [status: string, meaning: string])[] = [
  ['0', 'answered'],
  ['1', 'anything else, such as a caution with --strict'],
  ['2', 'not understood: unknown or ambiguous medium, bad unit, impossible angle'],
  ['3', 'not covered by the data, such as a wave outside the range of a fit'],
  ['4', 'a file cannot be read or written'],
  ['129, 130, 143', 'ended by the signal HUP, INT or TERM'],
];
