/**
 * Puts every JSON file of the catalogue into the one layout of `json-layout.ts`. Values are left alone.
 *   npx tsx tools/format-catalog.ts            rewrites what differs and names it
 *   npx tsx tools/format-catalog.ts --check    rewrites nothing; exit status 1 where something differs
 */
import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { layOut } from './json-layout.ts';

const root = join(import.meta.dirname, '..', 'catalog');
const check = process.argv.includes('--check');

const files = [
  join(root, 'bibliography.json'),
  ...readdirSync(join(root, 'materials'))
    .filter((name) => name.endsWith('.json'))
    .sort()
    .map((name) => join(root, 'materials', name)),
];

let different = 0;
for (const file of files) {
  const text = readFileSync(file, 'utf8');
  const wanted = layOut(JSON.parse(text));
  if (text === wanted) continue;
  different++;
  if (check) console.log(`${file}: not in the layout of the catalogue; run npx tsx tools/format-catalog.ts`);
  else writeFileSync(file, wanted);
}
console.log(`${files.length} files, ${different} ${check ? 'differ' : 'rewritten'}`);
if (check && different > 0) process.exitCode = 1;
