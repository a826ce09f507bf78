/** An old record against the same question asked again: which values differ and what is named as the cause. */
import { describe, expect, it } from 'vitest';
import { compareRecords, comparisonLines } from '../../src/record/compare-records.ts';
import type { RecordInput } from '../../src/record/record.ts';
import { sampleRecord } from './sample-record.ts';

const record = (answer: object, more: Partial<RecordInput> = {}) => sampleRecord('x', { answer, ...more });
const ANSWER = {
  from: { n: 1, k: 0 },
  interface: { R: 0.04, T: 0.96, brewsterAngle_rad: null },
  cautions: ['a'],
};
const changed = { ...ANSWER, interface: { R: 0.0404, T: 0.96, brewsterAngle_rad: 0.98 }, cautions: [] };

describe('comparing two answers', () => {
  it('finds no difference where there is none, whatever else changed', () => {
    const later = record(ANSWER, { time: '2027-03-14T09:26:53Z', version: '0.2.0' });
    expect(compareRecords(record(ANSWER), later)).toEqual({ same: true, differences: [], causes: [] });
    expect(comparisonLines(compareRecords(record(ANSWER), later))).toEqual([
      'the answer is the same, to the last bit',
    ]);
  });

  it('counts no key that a later version has added, but a caution more and a key less', () => {
    const more = { ...ANSWER, interface: { ...ANSWER.interface, loss_dB: 0.2 }, further: null };
    expect(compareRecords(record(ANSWER), record(more)).same).toBe(true);
    expect(compareRecords(record(more), record(ANSWER)).differences.map(({ path }) => path)).toEqual([
      'interface.loss_dB',
      'further',
    ]);
    const cautious = compareRecords(record(ANSWER), record({ ...ANSWER, cautions: ['a', 'b'] }));
    expect(cautious.differences).toEqual([
      { path: 'cautions.1', before: undefined, now: 'b', relativeChange: null },
    ]);
  });

  it('lists every value that differs, with the relative change of numbers', () => {
    const { same, differences } = compareRecords(record(ANSWER), record(changed, { version: '0.2.0' }));
    expect(same).toBe(false);
    expect(differences).toEqual([
      { path: 'interface.R', before: 0.04, now: 0.0404, relativeChange: expect.closeTo(0.01, 12) as number },
      { path: 'interface.brewsterAngle_rad', before: null, now: 0.98, relativeChange: null },
      { path: 'cautions.0', before: 'a', now: undefined, relativeChange: null },
    ]);
  });

  it('names the version, the catalogue, the question and a changed record as causes', () => {
    const other = record(changed, {
      version: '0.2.0',
      catalogue: { hash: 'ffffffffffff', date: '2027-01-01' },
      question: { note: 'y' },
    });
    const altered = { ...record(ANSWER), time: '2020-01-01T00:00:00Z' };
    const codes = (...pair: Parameters<typeof compareRecords>) =>
      compareRecords(...pair).causes.map((c) => c.code);
    expect(codes(altered, other)).toEqual(['record-altered', 'question', 'version', 'catalogue']);
    expect(codes(record(ANSWER), record(changed, { version: '0.2.0' }))).toEqual(['version']);
    expect(codes(record(ANSWER), record(changed))).toEqual(['unexplained']);
    const lastBit = { ...ANSWER, interface: { ...ANSWER.interface, R: 0.04 + 2 ** -57 } };
    expect(lastBit.interface.R).not.toBe(0.04);
    expect(codes(record(ANSWER), record(lastBit))).toEqual(['rounding']);
  });

  it('says it in lines', () => {
    const other = record(changed, { catalogue: { hash: 'ffffffffffff', date: '2027-01-01' } });
    expect(comparisonLines(compareRecords(record(ANSWER), other))).toEqual([
      'interface.R: 0.04 then, 0.0404 now (+0.010 relative)',
      'interface.brewsterAngle_rad: null then, 0.98 now',
      'cautions.0: "a" then, absent now',
      'cause: catalogue 0123456789ab of 2026-02-01 then, ffffffffffff of 2027-01-01 now',
    ]);
  });
});
