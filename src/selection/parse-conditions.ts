/**
 * Free text mixed with conditions, as typed into a search box: `gly n 1.47..1.48 at 589nm class liquid not toxic`.
 *
 *   at WAVE   n RANGE   ng RANGE   gvd RANGE (fs2/mm)   dn RANGE (birefringence)   vd RANGE   clear SPAN or WAVE
 *   loss FRACTION   thick LENGTH   class WORDS   not hygroscopic, toxic, hazardous or a class
 *
 * Everything else is a word to look for. `n=1.4..`, `n:1.4..`, `n>1.4` and `n <1.5` mean the same as `n 1.4..` and `n ..1.5`.
 * The reading says what it made of every part. What is still being typed (the last part, no space after it) is `unfinished` and
 * no problem yet; a lone keyword there is also a word, since it may be the beginning of a name.
 */
import type { WaveSpec } from '../answer/question.ts';
import { parseWave } from '../units/parse-wave.ts';
import { isProblem, type Problem, problem } from '../units/problem.ts';
import { waveWords } from './condition-words.ts';
import { CONDITIONS, type ConditionKind, conditionNamed } from './conditions.ts';
import { type Criteria, conditionWithoutWave, NO_CRITERIA } from './criteria.ts';

export interface ReadPart {
  readonly kind: 'condition' | 'word' | 'unfinished' | 'problem';
  /** Its place in the text. */
  readonly from: number;
  readonly to: number;
  /** What was understood, or what is wrong. */
  readonly text: string;
  /** What would be right; for a lone keyword how it may go on. */
  readonly remedy?: string;
}

export interface ConditionReading {
  readonly criteria: Criteria;
  readonly parts: readonly ReadPart[];
  /** True where the criteria hold at the wave of the context and none was typed. */
  readonly assumedWave: boolean;
}

export interface ReadingContext {
  /** Classes of the catalogue. */
  readonly classes: readonly string[];
  /** Where conditions hold that need a wave, if none is typed. */
  readonly wave?: WaveSpec;
}

interface Token {
  readonly text: string;
  readonly from: number;
  readonly to: number;
}

/** No value spans more words than "3 um .. 5 um". */
const MOST_WORDS = 5;

export function parseConditions(text: string, context: ReadingContext): ConditionReading {
  const tokens = tokensOf(text);
  const parts: ReadPart[] = [];
  let criteria: Criteria = NO_CRITERIA;
  for (let i = 0; i < tokens.length; ) {
    const token = tokens[i] as Token;
    const read = readCondition(tokens, i, text, criteria, context);
    if (read) {
      parts.push(read.part);
      criteria = read.criteria;
      i = read.next;
    } else {
      const remedy = keywordFor(token.text);
      const { from, to } = token;
      parts.push({ kind: 'word', from, to, text: token.text, ...(remedy && { remedy }) });
      criteria = { ...criteria, words: [...criteria.words, token.text] };
      i++;
    }
  }
  const assumedWave = conditionWithoutWave(criteria) !== undefined && context.wave !== undefined;
  return {
    criteria: assumedWave && context.wave ? { ...criteria, wave: context.wave } : criteria,
    parts,
    assumedWave,
  };
}

/** What a wave or a range that stands alone was probably meant for; it is looked for as a word all the same. */
function keywordFor(text: string): string | undefined {
  if (!/\d/.test(text)) return undefined;
  if (!isProblem(parseWave(text))) return `write at ${text} or clear ${text}`;
  return /^[\d.]+\.\.[\d.]*$/.test(text) ? `write what it is a range of: n ${text}` : undefined;
}

function tokensOf(text: string): readonly Token[] {
  return [...text.matchAll(/\S+/g)].map((m) => ({
    text: m[0],
    from: m.index,
    to: m.index + m[0].length,
  }));
}

interface ReadCondition {
  readonly part: ReadPart;
  readonly criteria: Criteria;
  readonly next: number;
}

/** The condition that begins at a token; undefined where that is a word. */
function readCondition(
  tokens: readonly Token[],
  at: number,
  text: string,
  criteria: Criteria,
  context: ReadingContext,
): ReadCondition | undefined {
  const token = tokens[at] as Token;
  const [, name = '', joint = '', rest = ''] =
    /^(\p{L}[\p{L}-]*?)([=:]|(?=[<>≤≥])|$)(.*)$/u.exec(token.text) ?? [];
  const condition = conditionNamed(name);
  if (!condition) return undefined;
  const more = joint === '' && rest === '' ? [] : [rest].filter((r) => r !== '');
  const followers = followersOf(tokens, at);
  const values = [...more, ...followers.map((t) => t.text)].slice(0, MOST_WORDS);
  const lengths = values.map((_, i) => i + 1).reverse();
  const ended = (taken: number): number => at + 1 + Math.max(0, taken - more.length);
  const endOf = (next: number): number => tokens[next - 1]?.to ?? token.to;
  for (const count of lengths) {
    const value = condition.read(values.slice(0, count).join(' '), context);
    if (isProblem(value)) continue;
    const next = ended(count);
    const place = { from: token.from, to: endOf(next) };
    const twice = condition.once && condition.isGiven(criteria);
    if (twice) {
      const part = {
        kind: 'problem' as const,
        ...place,
        text: `${condition.name} is given twice`,
        remedy: 'give it once',
      };
      return { part, criteria, next };
    }
    const changed = value.into(criteria);
    return { part: { kind: 'condition', ...place, text: value.words }, criteria: changed, next };
  }
  return unread(condition, tokens, at, values, ended, text, criteria, context);
}

/** Tokens up to the next keyword. */
function followersOf(tokens: readonly Token[], at: number): readonly Token[] {
  const rest = tokens.slice(at + 1);
  const stop = rest.findIndex((t, i) => i > 0 && conditionNamed(t.text) !== undefined);
  const first = rest[0];
  if (first && conditionNamed(first.text) !== undefined) return [];
  return stop < 0 ? rest : rest.slice(0, stop);
}

/** A keyword whose value is missing or not understood. */
function unread(
  condition: ConditionKind,
  tokens: readonly Token[],
  at: number,
  values: readonly string[],
  ended: (taken: number) => number,
  text: string,
  criteria: Criteria,
  context: ReadingContext,
): ReadCondition {
  const token = tokens[at] as Token;
  const atEnd = (to: number): boolean => text.slice(to).trim() === '';
  if (values.length === 0) {
    const remedy = `go on: ${condition.example}`;
    const lone = token.to === text.length && token.text === condition.name;
    const place = { from: token.from, to: token.to };
    return lone
      ? {
          part: { kind: 'word', ...place, text: token.text, remedy },
          criteria: { ...criteria, words: [...criteria.words, token.text] },
          next: at + 1,
        }
      : {
          part: { kind: atEnd(token.to) ? 'unfinished' : 'problem', ...place, text: condition.means, remedy },
          criteria,
          next: at + 1,
        };
  }
  const why = problemOf(condition, values[0] ?? '', context);
  const next = ended(1);
  const to = tokens[next - 1]?.to ?? token.to;
  return {
    part: {
      kind: to === text.length ? 'unfinished' : 'problem',
      from: token.from,
      to,
      text: why.message,
      remedy: why.remedy,
    },
    criteria,
    next,
  };
}

function problemOf(condition: ConditionKind, value: string, context: ReadingContext): Problem {
  const read = condition.read(value, context);
  return isProblem(read) ? read : problem('empty', condition.means, condition.example);
}

/** The keywords, for help and completion. */
export const CONDITION_NAMES: readonly string[] = CONDITIONS.map((c) => c.name);

/** One line that says what was understood so far: "n 1.37 to 1.39, class liquid, at 633 nm in vacuum; words: gly". */
export function explainReading({ criteria, parts, assumedWave }: ConditionReading): string {
  const said = parts.filter((p) => p.kind === 'condition').map((p) => p.text);
  const words = parts.filter((p) => p.kind === 'word').map((p) => p.text);
  const hint = parts.findLast((p) => p.kind !== 'condition' && p.remedy !== undefined);
  const wave =
    assumedWave && criteria.wave ? [`at ${waveWords(criteria.wave)}, the wave of the question`] : [];
  const sentences = [
    [...said, ...wave].join(', '),
    words.length > 0 ? `words: ${words.join(' ')}` : '',
    hint ? (hint.kind === 'word' ? (hint.remedy ?? '') : `${hint.text}: ${hint.remedy ?? ''}`) : '',
  ];
  return sentences.filter((s) => s !== '').join('; ');
}
