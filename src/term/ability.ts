/**
 * What the terminal can do, decided from environment variables and facts about the streams. Pure: the caller passes
 * the environment and what it knows of the streams, and applies the decision.
 * Everywhere an empty variable counts as unset.
 */
export type Environment = Readonly<Record<string, string | undefined>>;

export type ColorChoice = 'auto' | 'always' | 'never';

/** Which characters may be drawn: dots of braille, half blocks, or bytes 0x20 to 0x7E only. */
export type GlyphLevel = 'braille' | 'blocks' | 'ascii';

export interface ColorFacts {
  /** The value of `--color`. */
  readonly flag?: ColorChoice | undefined;
  /** The value from the user's configuration. */
  readonly configured?: ColorChoice | undefined;
  readonly env: Environment;
  /** Whether the stream to be coloured is a terminal. */
  readonly isTTY: boolean;
}

/**
 * Whether to write colours: the flag decides, else the configuration, else NO_COLOR, else FORCE_COLOR
 * ('0' and 'false' force it off), else TERM=dumb, else whether the stream is a terminal.
 * Bold and inverse are not colours and stay.
 */
export function decideColor({ flag, configured, env, isTTY }: ColorFacts): boolean {
  for (const choice of [flag, configured]) {
    if (choice === 'always') return true;
    if (choice === 'never') return false;
  }
  if (env['NO_COLOR']) return false;
  if (env['FORCE_COLOR']) return env['FORCE_COLOR'] !== '0' && env['FORCE_COLOR'] !== 'false';
  return env['TERM'] !== 'dumb' && isTTY;
}

/**
 * The richest characters the terminal can be trusted with: ASCII unless the locale (LC_ALL, else LC_CTYPE, else LANG)
 * is a UTF-8 one; blocks on the Linux console, whose fonts lack braille; else braille.
 * @param override what the user asked for; it always wins
 */
export function decideGlyphs(env: Environment, override?: GlyphLevel | undefined): GlyphLevel {
  if (override !== undefined) return override;
  const locale = env['LC_ALL'] || env['LC_CTYPE'] || env['LANG'] || '';
  const charset = locale.toLowerCase();
  if (!charset.includes('utf-8') && !charset.includes('utf8')) return 'ascii';
  return env['TERM'] === 'linux' ? 'blocks' : 'braille';
}

/** The size of the screen: what the stream says, else COLUMNS and LINES, else 80 x 24. Each dimension on its own. */
export function decideSize(
  stream: { readonly columns?: number | undefined; readonly rows?: number | undefined },
  env: Environment,
): { columns: number; rows: number } {
  return {
    columns: firstSize(stream.columns, env['COLUMNS'], 80),
    rows: firstSize(stream.rows, env['LINES'], 24),
  };
}

function firstSize(fromStream: number | undefined, fromEnv: string | undefined, otherwise: number): number {
  if (fromStream !== undefined && fromStream > 0) return fromStream;
  return /^[1-9]\d{0,4}$/.test(fromEnv ?? '') ? Number(fromEnv) : otherwise;
}

export interface FullScreenFacts {
  readonly env: Environment;
  readonly stdinIsTTY: boolean;
  readonly stdoutIsTTY: boolean;
  /** A command that answers one question, to be named where the full-screen program cannot start. */
  readonly oneShotExample: string;
}

/** Whether the full-screen program may start; the sentence to print where it may not. */
export function decideFullScreen(
  facts: FullScreenFacts,
): { readonly allowed: true } | { readonly allowed: false; readonly sentence: string } {
  const { env, stdinIsTTY, stdoutIsTTY, oneShotExample } = facts;
  const refuse = (why: string) => ({
    allowed: false as const,
    sentence: `the full-screen program ${why}; ask one question at a time instead, as in: ${oneShotExample}`,
  });
  if (!stdinIsTTY && !stdoutIsTTY)
    return refuse('needs a terminal, and neither standard input nor output is one');
  if (!stdinIsTTY) return refuse('needs a terminal to read keys from, and standard input is not one');
  if (!stdoutIsTTY) return refuse('needs a terminal to draw on, and standard output is not one');
  if (env['TERM'] === 'dumb') return refuse('cannot place the cursor on a terminal of type "dumb"');
  return { allowed: true };
}

/**
 * Whether to show append-only plain lines instead of a picture, for screen readers: HALFSPACE_ACCESSIBLE or
 * ACCESSIBLE (anything but '0' and 'false'), or INK_SCREEN_READER=true, or the flag.
 */
export function decideLinear(env: Environment, flag = false): boolean {
  const isOn = (value: string | undefined): boolean => Boolean(value) && value !== '0' && value !== 'false';
  return (
    flag ||
    isOn(env['HALFSPACE_ACCESSIBLE']) ||
    isOn(env['ACCESSIBLE']) ||
    env['INK_SCREEN_READER'] === 'true'
  );
}

/**
 * Takes the marks of continuous integration out of an environment, in place. Ink reads them when it is imported, and
 * then draws nothing until the end and does not follow changes of size: wrong for a person at a real terminal.
 */
export function forgetContinuousIntegration(env: Record<string, string | undefined>): void {
  delete env['CI'];
  delete env['CONTINUOUS_INTEGRATION'];
}
