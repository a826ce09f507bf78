/** `halfspace log rerun`: several records asked again, one after another. */
import type { RecordEntry } from '../../record/logbook.ts';
import type { Context, ExitStatus } from '../context.ts';
import type { OptionValues } from '../options.ts';
import { escaped } from '../render/json-document.ts';
import type { Outlet } from './outlet.ts';
import { type Rerun, rerunRecord } from './rerun-record.ts';
import { rerunEntry, rerunSummary, rerunText } from './rerun-report.ts';

const DIFFERS = 1;

/** Status 0 where every answer is the same; that of the refusal where the only record has no answer any more; else 1. */
export async function rerunRecords(
  records: Iterable<RecordEntry>,
  logbook: string,
  options: OptionValues,
  context: Context,
  outlet: Outlet,
): Promise<ExitStatus> {
  const json = (text: string): string => (options.ascii ? escaped(text) : text);
  if (options.json) outlet.write(json(`${documentStart(logbook, context)},"records":[`));
  const outcomes = new Map<Rerun['outcome'], number>();
  let count = 0;
  let last: Rerun | undefined;
  for (const entry of records) {
    last = await rerunRecord(entry, context, options.catalog);
    outcomes.set(last.outcome, (outcomes.get(last.outcome) ?? 0) + 1);
    const text = options.json
      ? (count === 0 ? '' : ',\n') + json(JSON.stringify(rerunEntry(entry, last)))
      : rerunText(entry, last, options.full === true, context.ascii);
    count += 1;
    if (!outlet.write(text)) break;
  }
  if (options.json) outlet.write(']}\n');
  else if (count > 1) outlet.write(rerunSummary(outcomes));
  if (count === 1 && last?.outcome === 'refused') return last.refusal.exit;
  return count === (outcomes.get('same') ?? 0) ? 0 : DIFFERS;
}

function documentStart(logbook: string, context: Context): string {
  const { hash, date } = context.catalogue();
  return JSON.stringify({ schema: 1, version: context.version, catalogue: { hash, date }, logbook }).slice(
    0,
    -1,
  );
}
