/**
 * `npm run fuzz`: a hundred thousand random inputs or more, then sessions of random bytes in a real pseudo-terminal.
 *
 *   npm run fuzz -- --inputs 500000 --seed 7
 */
import { existsSync } from 'node:fs';
import { parseArgs } from 'node:util';
import { fuzz } from './fuzz.ts';
import { terminalSessions } from './terminal-sessions.ts';

const { values } = parseArgs({
  options: {
    inputs: { type: 'string', default: '100000' },
    seed: { type: 'string', default: String(Date.now() % 1_000_000) },
    sessions: { type: 'string', default: '10' },
  },
});
const seed = Number(values.seed);
const { counts, slowest_ms, findings } = await fuzz(seed, { inputs: Number(values.inputs) });
const lines = Object.entries(counts).map(([name, count]) => `${String(count).padStart(8)}  ${name}`);
const sum = Object.values(counts).reduce((a, b) => a + b, 0);
process.stdout.write(
  `${lines.join('\n')}\n${String(sum).padStart(8)}  in all, seed ${seed}; slowest ${slowest_ms.toFixed(0)} ms\n`,
);
for (const { target, seed: own, input, message } of findings) {
  process.stdout.write(`\n${target}, seed ${own}: ${input}\n${message}\n`);
}
const program = new URL('../../dist/halfspace.js', import.meta.url).pathname;
const broken = existsSync(program) ? await terminalSessions(program, seed, Number(values.sessions)) : [];
for (const text of broken) process.stdout.write(`\n${text}\n`);
process.stdout.write(`${findings.length + broken.length} findings\n`);
process.exit(findings.length + broken.length > 0 ? 1 : 0);
