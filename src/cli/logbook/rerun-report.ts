/** What came of asking records again: for people a line a record with its differences below, for programs one document. */
import { comparisonLines } from '../../record/compare-records.ts';
import type { RecordEntry } from '../../record/logbook.ts';
import type { LogRecord } from '../../record/record.ts';
import { harmless } from '../../record/record-parts.ts';
import { recordTitle } from '../../record/record-title.ts';
import type { Rerun } from './rerun-record.ts';

/** A new catalogue moves dozens of values; the first ones tell. */
const MOST_LINES = 12;

/** `full`: every difference. */
export function rerunText(
  { record, altered }: RecordEntry,
  rerun: Rerun,
  full: boolean,
  ascii: boolean,
): string {
  const clean = (text: string): string => harmless(text, { ascii });
  const head = `${record.id}  ${clean(recordTitle(record))}`;
  const lines = [head, ...body(record, rerun, full).map((line) => `  ${clean(line)}`)];
  if (altered && rerun.outcome !== 'differs') lines.push('  but the record was changed after it was kept');
  return `${lines.join('\n')}\n`;
}

function body(record: LogRecord, rerun: Rerun, full: boolean): readonly string[] {
  if (rerun.outcome === 'refused') {
    const { message, remedy } = rerun.refusal;
    return [`no answer now: ${message}; ${remedy}`];
  }
  const lines = comparisonLines(rerun.comparison);
  if (rerun.outcome === 'same') return lines;
  const { differences } = rerun.comparison;
  const shown = full ? differences.length : Math.min(MOST_LINES, differences.length);
  const more = differences.length - shown;
  return [
    `the answer differs from that of ${record.time}`,
    ...lines.slice(0, shown),
    ...(more === 0 ? [] : [`and ${more} more ${more === 1 ? 'value' : 'values'}; --full lists all`]),
    ...lines.slice(differences.length),
  ];
}

/** "12 records: 10 the same, 2 differ"; for more than one. */
export function rerunSummary(reruns: ReadonlyMap<Rerun['outcome'], number>): string {
  const count = (outcome: Rerun['outcome']): number => reruns.get(outcome) ?? 0;
  const all = count('same') + count('differs') + count('refused');
  const parts = [
    `${count('same')} the same`,
    ...(count('differs') === 0
      ? []
      : [`${count('differs')} ${count('differs') === 1 ? 'differs' : 'differ'}`]),
    ...(count('refused') === 0 ? [] : [`${count('refused')} without an answer now`]),
  ];
  return `${all} records: ${parts.join(', ')}\n`;
}

export function rerunEntry({ record, altered }: RecordEntry, rerun: Rerun): object {
  const { id, time } = record;
  const { differences, causes } =
    rerun.outcome === 'refused' ? { differences: [], causes: [] } : rerun.comparison;
  const refusal =
    rerun.outcome === 'refused'
      ? { code: rerun.refusal.code, message: rerun.refusal.message, remedy: rerun.refusal.remedy }
      : null;
  return { id, time, outcome: rerun.outcome, altered, differences, causes, refusal };
}
