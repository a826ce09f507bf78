/**
 * A program that keeps records until it is ended: `FILE NAME COUNT [LARGE_EVERY]`. It writes the id of a record to its
 * output after the record is confirmed, or "refused CODE" and ends. Every LARGE_EVERY-th record spans many pages, so that
 * a kill has a chance to cut the write itself.
 */
import { writeSync } from 'node:fs';
import { isRefusal } from '../../src/medium/refusal.ts';
import { keepRecord } from '../../src/record/logbook.ts';
import { sampleRecord } from './sample-record.ts';

const [file = '', name = '', count = '0', largeEvery = '0'] = process.argv.slice(2);
for (let i = 0; i < Number(count); i++) {
  const isLarge = Number(largeEvery) > 0 && i % Number(largeEvery) === 4;
  const record = sampleRecord(`${name} ${i} ${'x'.repeat(isLarge ? 150_000 : 37 * (i % 60))}`);
  const outcome = keepRecord({ file, base: '/' }, record);
  if (isRefusal(outcome)) {
    writeSync(1, `refused ${outcome.exit} ${outcome.code}: ${outcome.message}; ${outcome.remedy}\n`);
    break;
  }
  writeSync(1, `${record.id}\n`);
}
