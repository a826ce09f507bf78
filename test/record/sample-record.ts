/** Records for tests: small ones made of anything, and one as the program makes it. */
import { type LogRecord, makeRecord, type RecordInput } from '../../src/record/record.ts';

export const CATALOGUE = { hash: '0123456789ab', date: '2026-02-01' };

export function sampleRecord(note: string, more: Partial<RecordInput> = {}): LogRecord {
  return makeRecord({
    time: '2026-03-14T09:26:53+01:00',
    version: '0.1.0',
    catalogue: CATALOGUE,
    commandWords: ['halfspace', 'air', 'n=1.5', '633nm'],
    question: { note },
    asked: [{ about: '', symbol: '', label: 'note', text: note }],
    answer: { third: 1 / 3 },
    rows: [],
    cautions: [],
    ...more,
  });
}
