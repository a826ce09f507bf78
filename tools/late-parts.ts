/**
 * Keeps out of the first script what most questions never run. Each late part is a script of its own, loaded at the first
 * call of one of its functions: in the first script stands, for each function, one that loads the part and passes the call on.
 * The sources know nothing of it. What the parts share with the first script (numbers, units) is in both; that is why only
 * functions can be taken from a late module, never a value or a class, and why none keeps state that matters.
 */
import path from 'node:path';
import { type BuildOptions, build, type Metafile, type Plugin } from 'esbuild';

export interface LatePart {
  readonly name: string;
  /** Files or folders of src/, the latter with a slash at the end. */
  readonly modules: readonly string[];
  /** Command lines that fill its code cache. */
  readonly lines: readonly (readonly string[])[];
}

export const LATE_PARTS: readonly LatePart[] = [
  {
    name: 'late-path',
    modules: [
      'stack/',
      'answer/beam-notes.ts',
      'answer/coherence-taken.ts',
      'answer/crystal-answer.ts',
      'answer/crystal-part.ts',
      'answer/energy-answer.ts',
      'answer/path-fields.ts',
      'answer/path-powers.ts',
      'answer/pulse-answer.ts',
      'answer/stack-answer.ts',
      'answer/wave-fields.ts',
      'cli/render/path-text.ts',
      'present/energy-rows.ts',
      'present/stack-rows.ts',
    ],
    lines: [
      ['air', 'magnesium-fluoride-film@99.6nm', 'n-bk7', '550nm'],
      ['air', 'fused-silica@3mm', 'air', '1064nm', '--power', '1W', '--beam', '1mm'],
    ],
  },
  {
    name: 'late-arguments',
    modules: ['cli/arguments.ts', 'cli/usage-error.ts'],
    lines: [
      ['air', 'n-bk7', '633nm', '--angle', '45', '--pol', 'p'],
      ['--json', 'vacuum', 'gold', '633nm'],
    ],
  },
  {
    name: 'late-own',
    modules: ['catalog/own.ts'],
    lines: [['--catalog', '{own}', 'air', 'fused-silica', '633nm']],
  },
  {
    name: 'late-words',
    modules: [
      'batch/sweep-range.ts',
      'cli/misplaced-operand.ts',
      'cli/render/csv.ts',
      'cli/render/markdown.ts',
      'cli/render/plain.ts',
      'cli/save-file.ts',
      'selection/parse-exclusion.ts',
      'units/parse-literal-medium.ts',
      'units/parse-nonlinear-index.ts',
      'units/parse-tolerance.ts',
    ],
    lines: [
      ['--csv', 'n=1.5', 'n=1.6,k=0.1', '633nm', '--tolerance', 'n=1e-4,wave=1nm'],
      ['--markdown', 'air', 'eps=4,sigma=1S/m', '1GHz'],
      ['--plain', 'air', 'n=1.5', '633nm'],
    ],
  },
  {
    // Laws of media that few questions name.
    name: 'late-media',
    modules: [
      'dispersion/aluminium-gallium-arsenide.ts',
      'dispersion/brendel-bormann.ts',
      'dispersion/composition-table.ts',
      'dispersion/exponential-thermal.ts',
      'dispersion/ice-radio.ts',
      'dispersion/magnetic-table.ts',
      'dispersion/radio-air.ts',
      'dispersion/sea-water-optical.ts',
      'dispersion/water-optical.ts',
      'dispersion/water-relaxation.ts',
      'dispersion/wideband-debye.ts',
    ],
    lines: [
      ['air', 'water', '589nm'],
      ['air', 'water', '10GHz'],
      ['air', 'gold', '633nm'],
      ['air', 'titanium', '633nm'],
    ],
  },
];

const isWithin = (file: string, modules: readonly string[]): boolean =>
  modules.some((m) => (m.endsWith('/') ? file.startsWith(m) : file === m));

/** What each late part is made of: its modules that are imported from without, by the name they have in the part. */
export type LateModules = Map<LatePart, Map<string, string>>;

/**
 * Puts functions that load the part in place of the modules of late parts, and notes which they are.
 * @param src the folder of the sources
 */
export function callLate(src: string, met: LateModules): Plugin {
  const partOf = (file: string): LatePart | undefined => {
    const name = path.relative(src, file).replaceAll(path.sep, '/');
    return LATE_PARTS.find((part) => isWithin(name, part.modules));
  };
  return {
    name: 'late-parts',
    setup(b) {
      b.onResolve({ filter: /^\./ }, (args) => {
        if (args.kind !== 'import-statement') return undefined;
        const file = path.resolve(args.resolveDir, args.path);
        return partOf(file) ? { path: file, namespace: 'late-part' } : undefined;
      });
      b.onLoad({ filter: /.*/, namespace: 'late-part' }, async ({ path: file }) => {
        const part = partOf(file) as LatePart;
        const modules = met.get(part) ?? new Map<string, string>();
        met.set(part, modules);
        const key = modules.get(file) ?? `m${modules.size}`;
        modules.set(file, key);
        const functions = Object.entries((await import(file)) as Record<string, unknown>).filter(
          ([, value]) => typeof value === 'function' && !/^class\b/.test(String(value)),
        );
        const calls = functions.map(
          ([name]) =>
            `export const ${name} = (...given) => loadNow('${part.name}').${key}.${name}(...given);`,
        );
        return { contents: calls.join('\n') };
      });
    },
  };
}

/** Builds the late parts that were met, as scripts. */
export async function buildLateParts(
  script: BuildOptions,
  src: string,
  met: LateModules,
): Promise<Metafile[]> {
  const { outdir = '', ...others } = script;
  const made: Metafile[] = [];
  for (const [part, modules] of met) {
    const contents = [...modules].map(([file, key]) => `export * as ${key} from ${JSON.stringify(file)};`);
    const { metafile } = await build({
      ...others,
      stdin: { contents: contents.join('\n'), resolveDir: src, sourcefile: part.name },
      outfile: path.join(outdir, `${part.name}.js`),
    });
    if (metafile) made.push(metafile);
  }
  return made;
}
