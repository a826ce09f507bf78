/**
 * Fills the examples of README.md with what the built program prints: every block that begins with "$ halfspace". With
 * --check it only says whether they are current.
 */
import { spawnSync } from 'node:child_process';
import { readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

const root = path.dirname(path.dirname(fileURLToPath(import.meta.url)));
const file = path.join(root, 'README.md');
const program = path.join(root, 'dist', 'halfspace.js');

function output(command) {
  const shell = command.replace(/^halfspace/, `"${process.execPath}" "${program}"`);
  const env = { ...process.env, LC_ALL: 'C.UTF-8', XDG_DATA_HOME: '/nonexistent', NO_COLOR: '1' };
  const run = spawnSync('sh', ['-c', `${shell} 2>&1`], { encoding: 'utf8', env });
  return run.stdout.trimEnd();
}

const before = readFileSync(file, 'utf8');
const after = before.replace(
  /```\n\$ (halfspace[^\n]*)\n[\s\S]*?```/g,
  (_, command) => `\`\`\`\n$ ${command}\n${output(command)}\n\`\`\``,
);
if (process.argv.includes('--check')) {
  if (after !== before) {
    console.error('README.md: an example is not what the program prints now; run node tools/readme.mjs');
    process.exitCode = 1;
  }
} else writeFileSync(file, after);
