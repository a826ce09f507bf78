/** `halfspace log`: the logbook. One action a file in ../logbook; here it is decided which, and what is said of the file. */
import { isRefusal, type Refusal, refuse } from '../../medium/refusal.ts';
import { findRecord, type RecordEntry } from '../../record/logbook.ts';
import { placeOfLogbook } from '../../record/logbook-place.ts';
import { harmless } from '../../record/record-parts.ts';
import { toAscii } from '../../units/to-ascii.ts';
import type { Invocation } from '../arguments.ts';
import type { Command, Context, ExitStatus } from '../context.ts';
import { listRecords } from '../logbook/list-records.ts';
import { type LogAction, type LogActionName, readLogAction } from '../logbook/log-action.ts';
import { Outlet } from '../logbook/outlet.ts';
import { emptyLogbook, Reading } from '../logbook/reading.ts';
import { oneRecord, recordForm } from '../logbook/record-forms.ts';
import { rerunRecords } from '../logbook/rerun-records.ts';
import type { OptionKey, OptionValues } from '../options.ts';
import { optionSpec } from '../options.ts';
import { reportRefusal } from '../report-refusal.ts';

const LAST = 'last';

type Form = 'json' | 'csv' | 'markdown' | 'latex' | 'plain';

const FORMS: Readonly<Record<LogActionName, readonly Form[]>> = {
  list: ['json', 'csv', 'plain'],
  search: ['json', 'csv', 'plain'],
  show: ['json', 'csv', 'markdown', 'latex'],
  last: ['json', 'csv', 'markdown', 'latex'],
  export: ['json', 'csv', 'markdown', 'latex'],
  rerun: ['json'],
};

export const run: Command = async (invocation, context) => {
  const { operands, options } = invocation;
  const action = readLogAction(operands);
  if (isRefusal(action)) return reportRefusal(action, context);
  const form = formRefusal(action, options);
  if (form) return reportRefusal(form, context);
  const place = placeOfLogbook(context.env, options.logFile);
  if (isRefusal(place)) return reportRefusal(place, context);
  const reading = new Reading(place.file);
  const outlet = new Outlet(context, options.output);
  const status = await act(action, reading, outlet, invocation, context);
  if (isRefusal(status)) return reportRefusal(status, context);
  outlet.end();
  if (!options.quiet) for (const note of reading.notes(context.ascii)) say(note, context);
  return reading.trouble ? reportRefusal(reading.trouble, context) : status;
};

async function act(
  action: LogAction,
  reading: Reading,
  outlet: Outlet,
  { options }: Invocation,
  context: Context,
): Promise<ExitStatus | Refusal> {
  const head = { version: context.version, logbook: reading.file };
  const { ascii } = context;
  switch (action.name) {
    case 'list':
    case 'search': {
      const words = action.name === 'search' ? action.words : undefined;
      const count = listRecords(reading, words, options, head, ascii, outlet);
      if (count === 0 && !options.quiet) say(nothingListed(action, reading), context);
      return 0;
    }
    case 'show':
    case 'last': {
      const entry = recordWith(action.name === 'show' ? action.id : LAST, reading);
      if (isRefusal(entry)) return entry;
      if (entry.altered) say(alteredNote(entry), context);
      outlet.write(oneRecord(entry.record, options, head, ascii));
      return 0;
    }
    case 'export': {
      const chosen = action.ids.length === 0 ? undefined : findAll(action.ids, reading);
      if (isRefusal(chosen)) return chosen;
      const { before, one, between, after } = recordForm(options, head, ascii);
      outlet.write(before);
      let isFirst = true;
      for (const entry of chosen ?? reading.records('oldest-first')) {
        if (entry.altered) say(alteredNote(entry), context);
        if (!outlet.write((isFirst ? '' : between) + one(entry.record))) return 0;
        isFirst = false;
      }
      outlet.write(after);
      if (isFirst && !options.quiet && !reading.trouble) say(emptyLogbook(reading.file).message, context);
      return 0;
    }
    case 'rerun': {
      const chosen = action.ids.length === 0 ? undefined : findAll(action.ids, reading);
      if (isRefusal(chosen)) return chosen;
      return rerunRecords(chosen ?? reading.records('oldest-first'), reading.file, options, context, outlet);
    }
  }
}

/** In the order asked for. */
function findAll(ids: readonly string[], reading: Reading): readonly RecordEntry[] | Refusal {
  const found: RecordEntry[] = [];
  for (const id of ids) {
    const entry = recordWith(id, reading);
    if (isRefusal(entry)) return entry;
    found.push(entry);
  }
  return found;
}

/** `last` in place of an id is the newest one. */
function recordWith(id: string, reading: Reading): RecordEntry | Refusal {
  if (id !== LAST) return findRecord(reading.entries('newest-first'), id);
  const newest = reading.records('newest-first').next();
  return newest.done ? (reading.trouble ?? emptyLogbook(reading.file)) : newest.value;
}

function formRefusal({ name }: LogAction, options: OptionValues): Refusal | undefined {
  const all: readonly OptionKey[] = ['json', 'csv', 'markdown', 'latex', 'plain'];
  const forms: readonly OptionKey[] = FORMS[name];
  const wrong = all.find((key) => options[key] === true && !forms.includes(key));
  if (wrong === undefined) return undefined;
  const names = forms.map((key) => `--${optionSpec(key).name}`).join(', ');
  return refuse(
    'form-not-here',
    2,
    `log ${name} takes no --${optionSpec(wrong).name}`,
    `its forms are text and ${names}`,
  );
}

function nothingListed(action: LogAction, reading: Reading): string {
  if (action.name === 'search' && !reading.isEmpty) return 'no record holds all of these words';
  const { message, remedy } = emptyLogbook(reading.file);
  return `${message}; ${remedy}`;
}

const alteredNote = ({ record }: RecordEntry): string =>
  `record ${record.id} was changed after it was kept: it no longer fits its id`;

function say(note: string, context: Context): void {
  const clean = harmless(note, { ascii: context.ascii });
  context.warn(`halfspace: ${context.ascii ? toAscii(clean) : clean}\n`);
}
