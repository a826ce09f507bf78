/** The layers of src/ as DEVELOPERS.md states them: who may import whom, which folders are pure, how long a file may be. */
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';

const root = path.join(path.dirname(fileURLToPath(import.meta.url)), '..', 'src');

const MAY_IMPORT: Readonly<Record<string, readonly string[]>> = {
  num: [],
  units: ['num'],
  dispersion: ['units', 'num'],
  interface: ['units', 'num'],
  catalog: ['dispersion', 'units', 'num', 'interface'],
  cite: ['catalog', 'num'],
  medium: ['interface', 'catalog', 'dispersion', 'units', 'num'],
  stack: ['interface', 'units', 'num'],
  answer: ['cite', 'medium', 'stack', 'interface', 'catalog', 'dispersion', 'units', 'num'],
  selection: ['answer', 'cite', 'medium', 'stack', 'interface', 'catalog', 'dispersion', 'units', 'num'],
  present: ['selection', 'answer', 'cite', 'medium', 'stack', 'catalog', 'dispersion', 'units', 'num'],
  batch: ['present', 'answer', 'medium', 'interface', 'catalog', 'dispersion', 'units', 'num'],
  plot: ['present', 'answer', 'units', 'num'],
  record: ['present', 'answer', 'cite', 'medium', 'catalog', 'dispersion', 'units', 'num'],
  term: ['units'],
};
const BELOW_FACES = [...Object.keys(MAY_IMPORT)];
const FACES = ['cli', 'tui'];

/** No files, no process, no clock, no randomness. */
const PURE = [
  'num',
  'units',
  'dispersion',
  'interface',
  'stack',
  'medium',
  'cite',
  'answer',
  'selection',
  'present',
  'plot',
];

const LONGEST = 400;

interface SourceFile {
  readonly name: string;
  readonly folder: string;
  readonly text: string;
  readonly imports: readonly string[];
}

const files: readonly SourceFile[] = (readdirSync(root, { recursive: true }) as string[])
  .filter((name) => /\.tsx?$/.test(name))
  .map((name) => {
    const text = readFileSync(path.join(root, name), 'utf8');
    const imports = [...text.matchAll(/(?:from|import)\s*\(?\s*'([^']+)'/g)].map((m) => m[1] ?? '');
    return { name, folder: folderOf(name), text, imports };
  });

function folderOf(name: string): string {
  const [first = ''] = name.split(path.sep);
  return first.includes('.') ? 'main' : first;
}

/** Folder of src/ that a relative import leads to; undefined for packages. */
function targetFolder(file: SourceFile, specifier: string): string | undefined {
  if (!specifier.startsWith('.')) return undefined;
  return folderOf(path.relative(root, path.resolve(root, path.dirname(file.name), specifier)));
}

describe('architecture', () => {
  it('finds the sources', () => expect(files.length).toBeGreaterThan(150));

  it('has every folder in the list of layers', () => {
    const known = new Set([...BELOW_FACES, ...FACES, 'main']);
    expect([...new Set(files.map((f) => f.folder))].filter((f) => !known.has(f))).toEqual([]);
  });

  it('imports only downwards', () => {
    const wrong = files.flatMap((file) => {
      const allowed =
        file.folder === 'main'
          ? [...BELOW_FACES, ...FACES]
          : FACES.includes(file.folder)
            ? BELOW_FACES
            : (MAY_IMPORT[file.folder] ?? []);
      return file.imports.flatMap((specifier) => {
        const target = targetFolder(file, specifier);
        return target === undefined || target === file.folder || allowed.includes(target)
          ? []
          : [`${file.name} imports ${specifier}: ${file.folder} may import ${allowed.join(', ')}`];
      });
    });
    expect(wrong).toEqual([]);
  });

  it('keeps react and ink inside the full-screen program', () => {
    const wrong = files.filter(
      (f) => f.folder !== 'tui' && f.imports.some((i) => /^(react|ink)(\/|$)/.test(i)),
    );
    expect(wrong.map((f) => f.name)).toEqual([]);
  });

  it('keeps the pure folders pure', () => {
    const impure =
      /from 'node:(fs|child_process|os|net|http|tty|process)'|\bprocess\.|\bnew Date\(|\bDate\.now|Math\.random|performance\.now/;
    const wrong = files.filter((f) => PURE.includes(f.folder) && impure.test(withoutComments(f.text)));
    expect(wrong.map((f) => f.name)).toEqual([]);
  });

  it('never reaches for the network', () => {
    const wrong = files.filter((f) =>
      /from 'node:(net|http|https|http2|dgram|dns|tls)'|\bfetch\(/.test(withoutComments(f.text)),
    );
    expect(wrong.map((f) => f.name)).toEqual([]);
  });

  it(`keeps files below ${LONGEST} lines`, () => {
    const long = files
      .map((f) => [f.name, f.text.split('\n').length] as const)
      .filter(([, n]) => n > LONGEST);
    expect(long).toEqual([]);
  });
});

function withoutComments(text: string): string {
  return text.replace(/\/\*[\s\S]*?\*\//g, '').replace(/(^|[^:])\/\/.*$/gm, '$1');
}
