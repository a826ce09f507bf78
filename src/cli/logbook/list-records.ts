/** `halfspace log list` and `log search`: a record a line, the newest first. */
import { type RecordEntry, searchRecords } from '../../record/logbook.ts';
import { valueAt } from '../../record/plain-json.ts';
import { recordCsvHeader, recordCsvRow } from '../../record/record-csv.ts';
import { harmless } from '../../record/record-parts.ts';
import { recordResult, recordTitle } from '../../record/record-title.ts';
import type { OptionValues } from '../options.ts';
import { escaped } from '../render/json-document.ts';
import type { Outlet } from './outlet.ts';
import type { Reading } from './reading.ts';
import type { FormHead } from './record-forms.ts';

const ALTERED = '(changed after it was kept)';
/** Room for "R_p = 0.0677(14) %". */
const RESULT_WIDTH = 19;

/** Words narrow the list down to records that hold all of them. Returns how many were written. */
export function listRecords(
  reading: Reading,
  words: string | undefined,
  options: OptionValues,
  head: FormHead,
  ascii: boolean,
  outlet: Outlet,
): number {
  const found =
    words === undefined
      ? reading.records('newest-first')
      : reading.only(searchRecords(reading.entries('newest-first'), words));
  let count = 0;
  if (options.json) outlet.write(`${jsonStart(head)},"entries":[`);
  if (options.csv) outlet.write(recordCsvHeader());
  for (const entry of found) {
    const text = options.json
      ? (count === 0 ? '' : ',\n') + jsonEntry(entry, options.ascii === true)
      : options.csv
        ? recordCsvRow(entry.record)
        : `${options.plain ? tabbedLine(entry, ascii) : listLine(entry, ascii)}\n`;
    count += 1;
    if (!outlet.write(text)) return count;
  }
  if (options.json) outlet.write(']}\n');
  return count;
}

/** "2026-03-14T09:26:53+01:00  3f09ab12cd34  R = 3.4794(4) %     air → n-bk7, 633nm, 0°, unpolarized" */
export function listLine({ record, altered }: RecordEntry, ascii: boolean): string {
  const clean = (text: string): string => harmless(text, { ascii });
  const result = clean(recordResult(record)).padEnd(RESULT_WIDTH);
  const parts = [record.time, record.id, result, clean(recordTitle(record)), ...(altered ? [ALTERED] : [])];
  return parts.join('  ').trimEnd();
}

/** The same for `cut`. */
function tabbedLine({ record, altered }: RecordEntry, ascii: boolean): string {
  const clean = (text: string): string => harmless(text, { ascii });
  return [
    record.time,
    record.id,
    altered ? 'altered' : 'as kept',
    clean(recordResult(record)),
    clean(recordTitle(record)),
  ].join('\t');
}

const jsonStart = (head: FormHead): string => JSON.stringify({ schema: 1, ...head }).slice(0, -1);

function jsonEntry({ record, altered }: RecordEntry, ascii: boolean): string {
  const R = valueAt(record.answer, 'interface', 'R');
  const text = JSON.stringify({
    id: record.id,
    time: record.time,
    title: recordTitle(record),
    R: typeof R === 'number' ? R : null,
    result: recordResult(record),
    altered,
    command: record.command,
  });
  return ascii ? escaped(text) : text;
}
