/** The conditions of the search language: their keywords, how each value is read, and what it adds to the criteria. */
import { parseFraction } from '../units/parse-fraction.ts';
import { parseLength } from '../units/parse-length.ts';
import { parseWave } from '../units/parse-wave.ts';
import { isProblem, type Problem, problem } from '../units/problem.ts';
import { clearWords, lossWords, measureWords, waveWords } from './condition-words.ts';
import type { Criteria, RangeMeasure } from './criteria.ts';
import { parseClass, parseExclusion } from './parse-exclusion.ts';
import {
  ABBE_RANGE,
  BIREFRINGENCE_RANGE,
  GROUP_INDEX_RANGE,
  GVD_RANGE,
  INDEX_RANGE,
  parseRange,
  parseSpan,
  type RangeSpec,
} from './parse-range.ts';

export interface ReadValue {
  /** As understood. */
  readonly words: string;
  readonly into: (criteria: Criteria) => Criteria;
}

export interface ConditionKind {
  /** The keyword. */
  readonly name: string;
  readonly alsoNamed: readonly string[];
  /** What is to be typed behind it. */
  readonly means: string;
  readonly example: string;
  /** May stand once only; the others add up. */
  readonly once: boolean;
  readonly isGiven: (criteria: Criteria) => boolean;
  readonly read: (text: string, context: { readonly classes: readonly string[] }) => ReadValue | Problem;
}

function ranged(
  name: string,
  alsoNamed: readonly string[],
  measure: RangeMeasure,
  spec: RangeSpec,
  example: string,
): ConditionKind {
  return {
    name,
    alsoNamed,
    means: spec.what,
    example,
    once: true,
    isGiven: ({ ranges }) => ranges[measure] !== undefined,
    read(text) {
      const range = parseRange(asRange(text), spec);
      if (isProblem(range)) return range;
      return {
        words: measureWords(measure, range),
        into: (c) => ({ ...c, ranges: { ...c.ranges, [measure]: range } }),
      };
    },
  };
}

/** `>1.4` is `1.4..`, `<=1.5` is `..1.5`. */
function asRange(text: string): string {
  const parts = /^(>=?|<=?|≥|≤)\s*(.+)$/u.exec(text.trim());
  if (!parts) return text;
  return /^[>≥]/u.test(parts[1] ?? '') ? `${parts[2]}..` : `..${parts[2]}`;
}

export const CONDITIONS: readonly ConditionKind[] = [
  {
    name: 'at',
    alsoNamed: [],
    means: 'the wave',
    example: 'at 633nm',
    once: true,
    isGiven: ({ wave }) => wave !== undefined,
    read(text) {
      const wave = parseWave(text);
      if (isProblem(wave)) return wave;
      return { words: `at ${waveWords(wave)}`, into: (c) => ({ ...c, wave }) };
    },
  },
  ranged('n', ['index'], 'n', INDEX_RANGE, 'n 1.37..1.39'),
  ranged('ng', ['group-index'], 'groupIndex', GROUP_INDEX_RANGE, 'ng 1.4..1.5'),
  ranged('gvd', [], 'gvd_s2_per_m', GVD_RANGE, 'gvd ..50'),
  ranged('dn', ['birefringence'], 'birefringence', BIREFRINGENCE_RANGE, 'dn 0.1..'),
  ranged('vd', ['abbe'], 'abbe', ABBE_RANGE, 'vd 60..70'),
  {
    name: 'clear',
    alsoNamed: [],
    means: 'a span or a wave to be transparent at',
    example: 'clear 3um..5um',
    once: true,
    isGiven: ({ clear_m }) => clear_m !== undefined,
    read(text) {
      const clear_m = parseSpan(text);
      if (isProblem(clear_m)) return clear_m;
      return { words: clearWords(clear_m), into: (c) => ({ ...c, clear_m }) };
    },
  },
  {
    name: 'loss',
    alsoNamed: ['max-loss'],
    means: 'the greatest loss allowed',
    example: 'loss 10%',
    once: true,
    isGiven: ({ maxLoss }) => maxLoss !== undefined,
    read(text) {
      const maxLoss = parseFraction(text.replace(/^\s*(?:<=?|≤)\s*/u, ''));
      if (isProblem(maxLoss)) return maxLoss;
      return {
        words: lossWords(maxLoss, undefined).replace(/ at one surface$/, ''),
        into: (c) => ({ ...c, maxLoss }),
      };
    },
  },
  {
    name: 'thick',
    alsoNamed: ['thickness'],
    means: 'the thickness that the loss is meant for',
    example: 'thick 5mm',
    once: true,
    isGiven: ({ thickness_m }) => thickness_m !== undefined,
    read(text) {
      const thickness_m = parseLength(text);
      if (isProblem(thickness_m)) return thickness_m;
      return { words: `${text.trim()} thick`, into: (c) => ({ ...c, thickness_m }) };
    },
  },
  {
    name: 'class',
    alsoNamed: [],
    means: 'a class of media',
    example: 'class liquid',
    once: false,
    isGiven: ({ classes }) => classes.length > 0,
    read(text, { classes }) {
      const word = parseClass(text, classes);
      if (isProblem(word)) return word;
      return { words: `class ${word}`, into: (c) => ({ ...c, classes: [...c.classes, word] }) };
    },
  },
  {
    name: 'not',
    alsoNamed: [],
    means: 'what is to be left out',
    example: 'not toxic',
    once: false,
    isGiven: ({ not }) => not.length > 0,
    read(text, { classes }) {
      if (/\s/.test(text.trim()) && !classes.some((c) => c === text.trim().toLowerCase())) {
        return problem('not-a-choice', `"${text}" is more than one thing`, 'write not before each');
      }
      const exclusion = parseExclusion(text, classes);
      if (isProblem(exclusion)) return exclusion;
      return { words: `not ${text.trim()}`, into: (c) => ({ ...c, not: [...c.not, exclusion] }) };
    },
  },
];

export function conditionNamed(text: string): ConditionKind | undefined {
  const name = text.toLowerCase();
  return CONDITIONS.find((c) => c.name === name || c.alsoNamed.includes(name));
}
