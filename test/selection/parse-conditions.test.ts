import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { explainReading, parseConditions } from '../../src/selection/parse-conditions.ts';
import { survey, vacuum } from './whole-catalogue.ts';

const classes = [...new Set(survey.materials.map((m) => m.class))];
const wave = vacuum(633e-9, '633nm');
const read = (text: string) => parseConditions(text, { classes, wave });
const kinds = (text: string) => read(text).parts.map((p) => `${p.kind} ${text.slice(p.from, p.to)}`);

describe('conditions mixed with free text', () => {
  it('reads words and conditions in any order', () => {
    const { criteria, parts, assumedWave } = read(
      'gly n 1.47..1.48 at 589nm class liquid not toxic not metal',
    );
    expect(criteria).toMatchObject({
      words: ['gly'],
      ranges: { n: { from: 1.47, to: 1.48 } },
      classes: ['liquid'],
      not: [
        { kind: 'property', property: 'toxic' },
        { kind: 'class', text: 'metal' },
      ],
      wave: { wavelength_m: 589e-9, inAir: false },
    });
    expect(assumedWave).toBe(false);
    expect(parts.map((p) => p.text)).toEqual([
      'gly',
      'n 1.47 to 1.48',
      'at 589 nm in vacuum',
      'class liquid',
      'not toxic',
      'not metal',
    ]);
  });

  it.each([
    ['n=1.4..1.5', { n: { from: 1.4, to: 1.5 } }],
    ['n:1.4..', { n: { from: 1.4 } }],
    ['n>1.7', { n: { from: 1.7 } }],
    ['n > 1.7 vd <= 30', { n: { from: 1.7 }, abbe: { to: 30 } }],
    [
      'ng 1.4..1.5 gvd ..50 dn 0.1..',
      { groupIndex: { from: 1.4, to: 1.5 }, gvd_s2_per_m: { to: 50e-27 }, birefringence: { from: 0.1 } },
    ],
  ])('takes %s', (text, ranges) => expect(read(text).criteria.ranges).toEqual(ranges));

  it('takes values of several words, up to the next keyword', () => {
    expect(read('clear 3 um .. 5 um').criteria.clear_m).toEqual([3e-6, 5e-6]);
    const { criteria } = read('at 10.6 um class optical glass zinc');
    expect(criteria).toMatchObject({
      classes: ['optical glass'],
      words: ['zinc'],
      wave: { wavelength_m: 10.6e-6 },
    });
  });

  it('uses the wave of the context where a condition needs one and none is typed, and says so', () => {
    expect(read('n 1.3..1.4')).toMatchObject({ assumedWave: true, criteria: { wave } });
    expect(read('class liquid')).toMatchObject({ assumedWave: false });
    expect(read('class liquid').criteria.wave).toBeUndefined();
    expect(explainReading(read('n 1.3..1.4'))).toBe(
      'n 1.3 to 1.4, at 633 nm in vacuum, the wave of the question',
    );
  });

  it('takes nothing of what is still being typed, and explains how it may go on', () => {
    for (const text of ['n 1', 'n 1.37', 'n 1.37..1.3', 'at 63', 'class gl9', 'not tox']) {
      const reading = read(text);
      expect(kinds(text), text).toEqual([`unfinished ${text}`]);
      expect({ ...reading.criteria, wave: undefined }, text).toMatchObject({
        words: [],
        ranges: {},
        classes: [],
        not: [],
      });
      expect(reading.parts[0]?.remedy, text).not.toBe('');
    }
    expect(explainReading(read('at 63'))).toContain('63 what? a wave needs a unit');
  });

  it('counts a lone keyword at the end as a word until something follows it', () => {
    expect(kinds('n')).toEqual(['word n']);
    expect(explainReading(read('n'))).toBe('words: n; go on: n 1.37..1.39');
    expect(kinds('n ')).toEqual(['unfinished n']);
    expect(kinds('zinc at')).toEqual(['word zinc', 'word at']);
    expect(kinds('n-bk7')).toEqual(['word n-bk7']);
  });

  it('takes a lone wave or range for a word, and says which keyword it may have lost', () => {
    expect(read('window 266nm').parts[1]).toMatchObject({
      kind: 'word',
      remedy: 'write at 266nm or clear 266nm',
    });
    expect(read('1.3..1.4').parts[0]).toMatchObject({
      kind: 'word',
      remedy: 'write what it is a range of: n 1.3..1.4',
    });
    expect(read('517642').parts[0]).toEqual({ kind: 'word', from: 0, to: 6, text: '517642' });
  });

  it('reports a mistake in the middle and goes on', () => {
    expect(kinds('n 1.37 gly')).toEqual(['problem n 1.37', 'word gly']);
    expect(kinds('at class liquid')).toEqual(['problem at', 'condition class liquid']);
    expect(kinds('n 1.4..1.5 n 1.6..')).toEqual(['condition n 1.4..1.5', 'problem n 1.6..']);
    expect(read('class xyz ').parts[0]).toMatchObject({ kind: 'problem' });
  });

  it('never throws, covers the text in order, and loses no word', () => {
    const token = fc.oneof(
      fc.constantFrom(
        'n',
        'at',
        'class',
        'not',
        'clear',
        'vd',
        '1.3..1.4',
        '633nm',
        'liquid',
        'toxic',
        '..',
        '<',
        'n=',
        'n>',
      ),
      fc.string({ maxLength: 6 }),
    );
    fc.assert(
      fc.property(fc.array(token, { maxLength: 8 }), (tokens) => {
        const text = tokens.join(' ');
        const { parts } = read(text);
        let end = 0;
        for (const part of parts) {
          expect(text.slice(end, part.from).trim()).toBe('');
          expect(part.to).toBeGreaterThan(part.from);
          end = part.to;
        }
        expect(text.slice(end).trim()).toBe('');
      }),
    );
  });
});
