import { describe, expect, it } from 'vitest';
import { parseArguments } from '../../src/cli/arguments.ts';
import { type UsageError, usageErrorText } from '../../src/cli/usage-error.ts';

function errorOf(...argv: string[]): UsageError {
  const parsed = parseArguments(argv);
  if (parsed.kind !== 'error') throw new Error(parsed.kind);
  return parsed.error;
}

describe('a usage error', () => {
  it('is one line and where to read more, without the help', () => {
    expect(usageErrorText(errorOf('air', 'bk7', '633nm', '--angel', '45'))).toBe(
      'halfspace: there is no option --angel; did you mean --angle?\nsee halfspace --help\n',
    );
    expect(usageErrorText(errorOf('man', '--jsno'))).toBe(
      'halfspace: there is no option --jsno; did you mean --json?\nsee halfspace man --help\n',
    );
  });

  it('is ASCII where asked', () => {
    const error = errorOf('air', 'bk7', '633nm', '--angle', '45µm');
    expect(usageErrorText(error)).toContain('"45µm" is a length');
    expect(usageErrorText(error, true)).toContain('"45um" is a length');
  });
});
