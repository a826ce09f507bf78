/**
 * The text of an unexpected error for the normal screen: one line that can be read, never source code or a stack unless
 * asked for, and no control character that could disturb the terminal.
 */
const MAX_MESSAGE_LENGTH = 500;
const MAX_STACK_LINES = 30;

/**
 * @param error whatever was thrown
 * @param program the program's name
 * @param showStack add the stack (switched on by the environment variable named in the text)
 */
export function errorText(error: unknown, program: string, showStack: boolean): string {
  const message = clean(messageOf(error)) || 'no message';
  const cut = message.length > MAX_MESSAGE_LENGTH ? `${message.slice(0, MAX_MESSAGE_LENGTH)}...` : message;
  const lead = `${program}: unexpected error: ${cut}\n`;
  if (!showStack) return `${lead}Set ${program.toUpperCase()}_DEBUG=1 to see where it happened.\n`;
  const stack = error instanceof Error && typeof error.stack === 'string' ? error.stack : '';
  const frames = stack.split('\n').filter((line) => /^\s+at /.test(line));
  return (
    lead +
    frames
      .slice(0, MAX_STACK_LINES)
      .map((line) => `${clean(line)}\n`)
      .join('')
  );
}

function messageOf(error: unknown): string {
  try {
    return error instanceof Error ? error.message : String(error);
  } catch {
    return 'an error that cannot be shown';
  }
}

const clean = (text: string): string => text.replace(/[\0-\x1f\x7f-\x9f]+/g, ' ').trimEnd();
