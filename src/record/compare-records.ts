/**
 * An old record against the same question asked again: which values differ, by how much, and what may have caused it. Every value
 * of the old answer counts, to the last bit; keys that a later version has added do not.
 */
import { isJsonObject, type JsonValue, valueAt } from './plain-json.ts';
import { idOfRecord, type LogRecord } from './record.ts';

export interface Difference {
  /** "interface.Rp". */
  readonly path: string;
  /** Undefined where that side has no such value. */
  readonly before: JsonValue | undefined;
  readonly now: JsonValue | undefined;
  /** (now - before)/|before| for numbers, null where there is none. */
  readonly relativeChange: number | null;
}

/**
 * `record-altered`: the old record was changed after it was kept; `question`: it is not the same question; `own-entry`: an
 * entry of one's own has other content; `version` and `catalogue`: another program or other data; `rounding`: only last bits
 * differ, as between two machines; `unexplained`: nothing of all that, so the program or the machine is to be doubted.
 */
export type CauseCode =
  | 'record-altered'
  | 'question'
  | 'own-entry'
  | 'version'
  | 'catalogue'
  | 'rounding'
  | 'unexplained';

export interface Cause {
  readonly code: CauseCode;
  readonly text: string;
}

export interface Comparison {
  readonly same: boolean;
  readonly differences: readonly Difference[];
  /** Empty where nothing differs. */
  readonly causes: readonly Cause[];
}

const ROUNDING = 1e-11;

export function compareRecords(before: LogRecord, now: LogRecord): Comparison {
  const differences = differencesOf(before.answer, now.answer, '');
  if (differences.length === 0) return { same: true, differences, causes: [] };
  const causes = statedCauses(before, now);
  if (causes.length > 0) return { same: false, differences, causes };
  const onlyLastBits = differences.every(
    ({ relativeChange }) => relativeChange !== null && Math.abs(relativeChange) < ROUNDING,
  );
  const cause: Cause = onlyLastBits
    ? { code: 'rounding', text: 'only last bits differ, as they may between two machines' }
    : {
        code: 'unexplained',
        text: 'version, catalogue and question are the same; one of the two answers is wrong',
      };
  return { same: false, differences, causes: [cause] };
}

function statedCauses(before: LogRecord, now: LogRecord): readonly Cause[] {
  const causes: Cause[] = [];
  if (idOfRecord(before) !== before.id)
    causes.push({ code: 'record-altered', text: `record ${before.id} was changed after it was kept` });
  const differing = differencesOf(before.question, now.question, '').map(({ path }) => path);
  const question = differing.filter((path) => !isOwnHash(path));
  if (question.length > 0)
    causes.push({ code: 'question', text: `the questions differ in ${question.join(', ')}` });
  for (const path of differing.filter(isOwnHash)) {
    const key = valueAt(before.question, ...path.split('.').slice(0, -1), 'key');
    causes.push({
      code: 'own-entry',
      text: `your own entry ${String(key)} has other content now than then`,
    });
  }
  if (before.program.version !== now.program.version)
    causes.push({
      code: 'version',
      text: `version ${before.program.version} then, ${now.program.version} now`,
    });
  if (before.catalogue.hash !== now.catalogue.hash)
    causes.push({ code: 'catalogue', text: `catalogue ${nameOf(before)} then, ${nameOf(now)} now` });
  return causes;
}

const isOwnHash = (path: string): boolean => path.endsWith('.ownHash');

const nameOf = ({ catalogue }: LogRecord): string => `${catalogue.hash} of ${catalogue.date}`;

/** The comparison in lines: what differs, then why. */
export function comparisonLines({ same, differences, causes }: Comparison): readonly string[] {
  if (same) return ['the answer is the same, to the last bit'];
  return [
    ...differences.map(({ path, before, now, relativeChange }) => {
      const change = relativeChange === null ? '' : ` (${signed(relativeChange)} relative)`;
      return `${path}: ${valueText(before)} then, ${valueText(now)} now${change}`;
    }),
    ...causes.map(({ text }) => `cause: ${text}`),
  ];
}

function differencesOf(
  before: JsonValue | undefined,
  now: JsonValue | undefined,
  path: string,
): readonly Difference[] {
  if (isTree(before) && isTree(now) && Array.isArray(before) === Array.isArray(now)) {
    const [a, b] = [childrenOf(before), childrenOf(now)];
    const keys = Array.isArray(before) ? new Set([...a.keys(), ...b.keys()]) : a.keys();
    return [...keys].flatMap((key) =>
      differencesOf(a.get(key), b.get(key), path === '' ? key : `${path}.${key}`),
    );
  }
  if (before === now) return [];
  const isChange = typeof before === 'number' && typeof now === 'number' && before !== 0;
  return [{ path, before, now, relativeChange: isChange ? (now - before) / Math.abs(before) : null }];
}

type Tree = Extract<JsonValue, object>;
const isTree = (value: JsonValue | undefined): value is Tree => typeof value === 'object' && value !== null;

function childrenOf(tree: Tree): ReadonlyMap<string, JsonValue> {
  return new Map(
    isJsonObject(tree) ? Object.entries(tree) : tree.map((value, i) => [String(i), value] as const),
  );
}

function signed(value: number): string {
  return `${value < 0 ? '-' : '+'}${Math.abs(value).toPrecision(2)}`;
}

function valueText(value: JsonValue | undefined): string {
  return value === undefined ? 'absent' : typeof value === 'string' ? `"${value}"` : JSON.stringify(value);
}
