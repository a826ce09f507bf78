/** Rows per second of the stream command, against awk computing the same column and against `wc -l`, on the same file. */
import { spawnSync } from 'node:child_process';
import { existsSync, openSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import type { Line } from './figure.ts';
import { ENVIRONMENT, HOME, isInstalled, PROGRAM } from './program.ts';
import { compare } from './rounds.ts';

const ROWS = 1_000_000;

/** The index of fused silica (Malitson 1965) behind each row, as an awk program. */
const AWK = `BEGIN { FS = OFS = "," } NR == 1 { print $0, "n"; next } {
  x = $1 * $1 / 1e6
  print $0, sprintf("%.6f", sqrt(1 + 0.6961663 * x / (x - 0.0684043 ^ 2) + 0.4079426 * x / (x - 0.1162414 ^ 2) + 0.8974794 * x / (x - 9.896161 ^ 2)))
}`;

export const STREAM = ['stream', '--from', 'vacuum', '--into', 'fused-silica', '--columns', 'n2'];

/** A file of as many waves, written where it is not there yet. */
export function wavesFile(): string {
  const file = path.join(HOME, 'waves.csv');
  if (existsSync(file)) return file;
  const rows = Array.from({ length: ROWS }, (_, i) => (400 + (i * 1200) / ROWS).toFixed(4));
  writeFileSync(file, `wave_nm\n${rows.join('\n')}\n`);
  return file;
}

export async function batch(rounds: number): Promise<readonly Line[]> {
  const file = wavesFile();

  const time = (command: string, args: readonly string[]): number => {
    const begin = process.hrtime.bigint();
    const input = openSync(file, 'r');
    const output = openSync(path.join(HOME, 'out.csv'), 'w');
    const { status, stderr } = spawnSync(command, args, { env: ENVIRONMENT, stdio: [input, output, 'pipe'] });
    if (status !== 0) throw new Error(`${command} ${args.join(' ')}: ${stderr.toString()}`);
    return Number(process.hrtime.bigint() - begin) / 1e6;
  };
  const program = (): number => time(process.execPath, [PROGRAM, ...STREAM]);
  const trouble = firstTrouble(program);
  if (trouble !== undefined) return [{ name: 'rows of a batch', missing: trouble }];
  const lines = readFileSync(path.join(HOME, 'out.csv'), 'utf8').trimEnd().split('\n').length;
  if (lines !== ROWS + 1) throw new Error(`stream wrote ${lines} lines for ${ROWS} rows and a header`);

  const lines_: Line[] = [];
  for (const [name, args, target] of [
    ['mawk', [AWK], 1.2],
    ['gawk', [AWK], 2],
    ['wc', ['-l'], undefined],
  ] as const) {
    const figure = `rows of a batch a second, against ${name}`;
    if (!isInstalled(name)) {
      lines_.push({ name: figure, missing: `${name} is not installed` });
      continue;
    }
    const { other } = await compare(rounds, program, { other: () => time(name, args) });
    lines_.push({
      name: figure,
      value: other.ratio,
      unit: `x ${name}`,
      ...(target === undefined ? {} : { target: { atLeast: target } }),
      note: `one column, ${ROWS} rows`,
    });
  }
  return lines_;
}

/** Undefined where the command runs; else why there is nothing to measure. */
function firstTrouble(program: () => number): string | undefined {
  try {
    program();
    return undefined;
  } catch (error) {
    const text = error instanceof Error ? error.message : String(error);
    const isUnknown =
      spawnSync(process.execPath, [PROGRAM, 'help', 'stream'], { env: ENVIRONMENT }).status !== 0;
    if (isUnknown) return 'the stream command is not there yet';
    throw new Error(text);
  }
}
