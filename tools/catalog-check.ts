/**
 * `npm run catalog`: everything a change of catalog/ has to pass, and what it changes against the last commit.
 * Faults make the exit status 1; notes are for a person to judge.
 */
import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { basename, dirname, join, relative } from 'node:path';
import { checkMaterial } from '../src/catalog/check-material.ts';
import { checkShape, type Fault } from '../src/catalog/check-shape.ts';
import { checkValues } from '../src/catalog/check-values.ts';
import { CATALOG_FOLDER, materialFiles } from '../src/catalog/from-sources.ts';
import { materialShape, sourceShape } from '../src/catalog/material-shape.ts';
import { list } from '../src/catalog/shape.ts';
import type { Material, Source } from '../src/catalog/types.ts';
import { toleranceUsed, verifyMaterials } from '../src/catalog/verify.ts';
import { describeChange } from './catalog-diff.ts';
import { sharedNames, swappedAxes, swappedColumns } from './catalog-lint.ts';

const root = dirname(CATALOG_FOLDER);
const faults: string[] = [];
const say = (file: string, { path, message, remedy }: Fault): void => {
  faults.push(`${relative(root, file)}${path === '' ? '' : `: ${path}`} ${message}; ${remedy}`);
};

function readJson(file: string): unknown {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch (error) {
    say(file, { path: '', message: `is not JSON (${(error as Error).message})`, remedy: 'correct it there' });
    return undefined;
  }
}

const bibliographyFile = join(CATALOG_FOLDER, 'bibliography.json');
const bibliography = readJson(bibliographyFile);
for (const fault of checkShape(bibliography, list(sourceShape(), 1))) say(bibliographyFile, fault);
const sources = (Array.isArray(bibliography) ? bibliography : []) as readonly Source[];
const ids = new Set<string>();
for (const { id } of sources) {
  if (ids.has(id))
    say(bibliographyFile, { path: '', message: `holds the id "${id}" twice`, remedy: 'keep one' });
  ids.add(id);
}

const materials: Material[] = [];
for (const file of materialFiles()) {
  const value = readJson(file);
  if (value === undefined) continue;
  const shapeFaults = checkShape(value, materialShape());
  for (const fault of shapeFaults) say(file, fault);
  if (shapeFaults.length > 0) continue;
  const material = value as Material;
  const name = basename(file, '.json');
  if (material.key !== name)
    say(file, {
      path: 'key',
      message: `is "${material.key}"`,
      remedy: `must be the name of the file, "${name}"`,
    });
  const inner = checkMaterial(material, (id) => ids.has(id));
  for (const fault of inner) say(file, fault);
  if (inner.length === 0) materials.push(material);
}

const report = verifyMaterials(materials);
for (const v of report.failures)
  faults.push(
    `${v.key}: fit ${v.fit} (${v.axis}) gives ${v.quantity} = ${v.computed.toPrecision(8)}` +
      `${v.wavelength_um === undefined ? '' : ` at ${v.wavelength_um} um`}; "${v.source}" prints ${v.published} (tolerance ${v.tolerance})`,
  );

const used = new Set(
  materials.flatMap((m) => m.fits.flatMap((f) => [f.source, ...(f.furtherSources ?? [])])),
);
const everything = JSON.stringify(materials);
const notes = [
  ...swappedColumns(report.values),
  ...materials.flatMap((m) => swappedAxes(m, checkValues(m))),
  ...sharedNames(materials),
  ...[...ids]
    .filter((id) => !used.has(id) && !everything.includes(JSON.stringify(id)))
    .map((id) => ({ key: id, message: 'is in the bibliography and nothing uses it' })),
];

console.log(`${report.materials} materials, ${report.fits} fits, ${sources.length} sources`);
console.log(`${report.passed} of ${report.tested} published values met, ${report.setAside} set aside`);
for (const [grade, { tested, worst }] of Object.entries(report.grades))
  if (worst)
    console.log(
      `  grade ${grade}: ${tested} values; the tightest uses ${(toleranceUsed(worst) * 100).toFixed(0)} % of its tolerance (${worst.key}, ${worst.quantity})`,
    );
printChanges();
for (const { key, message } of notes) console.log(`note: ${key} ${message}`);
for (const fault of faults) console.error(`fault: ${fault}`);
console.log(`${faults.length} faults, ${notes.length} notes`);
if (faults.length > 0) process.exitCode = 1;

function printChanges(): void {
  let changed: readonly string[];
  try {
    const diff = git('diff', '--name-only', 'HEAD', '--', 'catalog');
    const fresh = git('ls-files', '--others', '--exclude-standard', '--', 'catalog');
    changed = `${diff}\n${fresh}`.split('\n').filter((file) => file !== '');
  } catch {
    console.log('no git here: changes against the last commit not shown');
    return;
  }
  console.log(changed.length === 0 ? 'unchanged since the last commit' : 'changed since the last commit:');
  for (const file of changed) {
    const [before, after] = [
      parse(() => git('show', `HEAD:${file}`)),
      parse(() => readFileSync(join(root, file), 'utf8')),
    ];
    const isMaterial =
      file.startsWith('catalog/materials/') && [before, after].every((v) => v === undefined || hasFits(v));
    const lines = isMaterial
      ? describeChange(before as Material | undefined, after as Material | undefined)
      : [];
    if (isMaterial && lines.length === 0) console.log(`  ${file}: layout only`);
    else if (!isMaterial) console.log(`  ${file}`);
    for (const line of lines) console.log(`  ${basename(file, '.json')}: ${line}`);
  }
}

function hasFits(value: unknown): boolean {
  return typeof value === 'object' && value !== null && 'fits' in value && Array.isArray(value.fits);
}

function parse(read: () => string): unknown {
  try {
    return JSON.parse(read());
  } catch {
    return undefined;
  }
}

function git(...args: readonly string[]): string {
  return execFileSync('git', args, { cwd: root, encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'] });
}
