/** The record itself: what is in it, that it survives JSON bit for bit, that its id tells of any change. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { makeQuestion } from '../../src/answer/question.ts';
import { logbookPlace } from '../../src/record/logbook-path.ts';
import { toPlainJson } from '../../src/record/plain-json.ts';
import { describeQuestion, idOfRecord } from '../../src/record/record.ts';
import { isRecord, parseRecordLine, recordLine } from '../../src/record/record-line.ts';
import { isTimeStamp, systemClock, timeStamp } from '../../src/record/time-stamp.ts';
import { ask, DEGREE, named, vacuumWave } from '../helpers/ask.ts';
import { FULL_RECORD } from './full-record.ts';
import { sampleRecord } from './sample-record.ts';

describe('a record', () => {
  it('keeps the answer of a real question to the last bit, through the line and back', () => {
    const media = [named('air'), named('fused-silica'), vacuumWave(632.8e-9)] as const;
    const more = { incidenceAngle_rad: 45 * DEGREE, polarization: 'p' } as const;
    const answer = ask(...media, more);
    const record = sampleRecord('real', { answer, ...describeQuestion(makeQuestion(...media, more)) });
    const parsed = parseRecordLine(recordLine(record));
    if (parsed.kind !== 'record') throw new Error(parsed.kind);
    expect(parsed).toEqual({ kind: 'record', record, altered: false });
    const surface = parsed.record.answer['interface'] as Record<string, unknown>;
    expect(Object.is(surface['Rp'], answer.interface.Rp)).toBe(true);
    expect(Object.is(surface['R_uncertainty'], answer.interface.R_uncertainty)).toBe(true);
    expect(record.question['from']).toEqual({ key: 'air', axis: null, own: false });
    expect(record.question).toMatchObject({ polarization: 'p', extrapolate: false, beam: null, layers: [] });
    expect(record.sources.map((source) => source.doi)).toContain(answer.into.fit?.source.doi);
    expect(new Set(record.sources.map((source) => source.id)).size).toBe(record.sources.length);
  });

  it('names every part of the question in words, also the defaults', () => {
    const silica = named('fused-silica');
    const name = silica.kind === 'catalogue' ? silica.material.name : '';
    const question = makeQuestion(named('air'), silica, vacuumWave(1e-6));
    const rows = describeQuestion(question).asked;
    expect(rows.map((row) => `${row.label}: ${row.text}`)).toEqual([
      'medium of incidence: Air (air)',
      `medium beyond: ${name} (fused-silica)`,
      'wave: 1 µm in vacuum, given as 0.000001 m',
      'angle of incidence: 0°, normal incidence',
      'polarization: unpolarized',
      'conditions: those of the fits',
      'beam: none stated',
      'tolerances: none stated',
      'outside the range of a fit: refused',
    ]);
  });

  it('names what else was stated: layers, pulses, tolerances', () => {
    const glass = { kind: 'literal', literal: { n: { re: 1.5, im: 0 } }, text: 'n=1.5' } as const;
    const question = makeQuestion(glass, glass, vacuumWave(1e-6), {
      layers: [
        { medium: glass, thickness: { kind: 'length', thickness_m: 5e-3 }, nonlinearIndex_m2_per_W: 2.6e-20 },
        { medium: glass, thickness: { kind: 'waves', waves: 0.25 } },
      ],
      beam: {
        kind: 'pulse',
        pulse: { energy_J: 1e-3, duration_s: 3e-14 },
        profile: 'flat',
        diameter_m: 2e-3,
      },
      tolerances: { thickness_m: 1e-9, temperature_K: 0.5 },
      extrapolate: true,
      cut: { angle_rad: Math.PI / 4, azimuth_rad: 0, retardance_waves: 0.25 },
      pulseDuration_s: 3e-14,
      fieldProfile: true,
      coherenceLength_m: 1e-3,
      designWave: vacuumWave(550e-9),
    });
    const texts = describeQuestion(question).asked.map((row) => `${row.label}: ${row.text}`);
    for (const expected of [
      'layer 1: n=1.5, 5 mm, nonlinear index 2.6 × 10⁻²⁰ m²/W',
      'layer 2: n=1.5, 0.25 wavelengths thick',
      'beam: flat-top, diameter 2 mm, pulses of 1 mJ in 30 fs',
      'tolerances: temperature 0.5 K, thickness 1 nm (standard uncertainties)',
      'outside the range of a fit: extrapolated, as asked',
      'cut of the crystal: optic axis 45° from the normal, azimuth 0°, plate of 0.25 waves',
      'pulse through the path: gaussian, 30 fs',
      'field through the layers: point by point',
      'coherence length: 1 mm',
      'design wave: 550 nm in vacuum, given as 5.5e-7 m',
    ])
      expect(texts).toContain(expected);
  });

  it('has an id of its content: the same again, another after any change', () => {
    expect(FULL_RECORD.id).toMatch(/^[0-9a-f]{12}$/);
    expect(idOfRecord(FULL_RECORD)).toBe(FULL_RECORD.id);
    expect(sampleRecord('a').id).toBe(sampleRecord('a').id);
    expect(sampleRecord('a').id).not.toBe(sampleRecord('b').id);
    const line = recordLine(FULL_RECORD);
    for (const [from, to] of [
      ['0.01235(4) %', '0.01236(4) %'],
      ['"R":0.00012345678901234567', '"R":0.00012345678901234570'],
      ['"version":"0.1.0"', '"version":"0.1.1"'],
    ] as const) {
      const changed = line.replace(from, to);
      expect(changed).not.toBe(line);
      expect(parseRecordLine(changed)).toMatchObject({ kind: 'record', altered: true });
    }
  });

  it('is one line in which nothing can steer a terminal', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary' }), (text) => {
        const record = sampleRecord(`${text}\u009b2J\u202e\u2028\n\x1b[2J`);
        const line = recordLine(record);
        expect(line).not.toMatch(/[\x00-\x1f\x7f-\x9f\u2028\u2029\u202a-\u202e]/);
        expect(parseRecordLine(line)).toEqual({ kind: 'record', record, altered: false });
      }),
    );
  });

  it('is not taken for one where a part is missing or of another kind', () => {
    const whole = JSON.parse(recordLine(FULL_RECORD)) as Record<string, unknown>;
    expect(isRecord(whole)).toBe(true);
    // Keys may be added later.
    expect(isRecord({ ...whole, schema: 2, more: {} })).toBe(true);
    for (const key of Object.keys(whole)) {
      for (const wrong of [undefined, null, 7, 'x', [1], [{}], { a: 1 }]) {
        if (key === 'schema' && wrong === 7) continue;
        if (
          ['answer', 'question'].includes(key) &&
          typeof wrong === 'object' &&
          !Array.isArray(wrong) &&
          wrong
        )
          continue;
        if (key === 'command' && wrong === 'x') continue;
        expect([key, wrong, isRecord({ ...whole, [key]: wrong })]).toEqual([key, wrong, false]);
      }
    }
    expect(parseRecordLine('{"schema":1,"id":"12').kind).toBe('unfinished');
    expect(parseRecordLine('# a note').kind).toBe('foreign');
    expect(parseRecordLine('{"a":1}').kind).toBe('foreign');
  });
});

describe('plain JSON', () => {
  it('survives text and back unchanged', () => {
    fc.assert(
      fc.property(fc.anything({ withTypedArray: true, withNullPrototype: true }), (value) => {
        const plain = toPlainJson(value);
        expect(JSON.parse(JSON.stringify(plain))).toEqual(plain);
      }),
    );
    expect(
      toPlainJson([Number.NaN, -0, 1 / 3, undefined, new Float64Array([1, Number.POSITIVE_INFINITY])]),
    ).toEqual([null, 0, 1 / 3, null, [1, null]]);
  });
});

describe('the time of a record', () => {
  it.each([
    [0, 0, '1970-01-01T00:00:00+00:00'],
    [1_773_476_813_999, 60, '2026-03-14T09:26:53+01:00'],
    [1_773_476_813_000, -210, '2026-03-14T04:56:53-03:30'],
    [1_773_476_813_000, 845, '2026-03-14T22:31:53+14:05'],
    [1_767_225_599_000, 60, '2026-01-01T00:59:59+01:00'],
  ])('%d ms with %d min is %s', (sinceEpoch_ms, utcOffset_min, text) => {
    expect(timeStamp({ sinceEpoch_ms, utcOffset_min })).toBe(text);
  });

  it('means the same instant to any reader of RFC 3339', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 4e12 }),
        fc.integer({ min: -14 * 60, max: 14 * 60 }),
        (sinceEpoch_ms, utcOffset_min) => {
          const text = timeStamp({ sinceEpoch_ms, utcOffset_min });
          expect(isTimeStamp(text)).toBe(true);
          expect(Date.parse(text)).toBe(Math.floor(sinceEpoch_ms / 1000) * 1000);
        },
      ),
    );
    const { sinceEpoch_ms, utcOffset_min } = systemClock();
    expect(Math.abs(sinceEpoch_ms - Date.now())).toBeLessThan(5000);
    expect(utcOffset_min).toBe(-new Date().getTimezoneOffset());
  });
});

describe('the place of the logbook', () => {
  it.each([
    [{}, '/home/ada', undefined, '/home/ada/.local/state/halfspace/logbook.jsonl', '/home/ada'],
    [{ XDG_STATE_HOME: '/state' }, '/home/ada', undefined, '/state/halfspace/logbook.jsonl', '/'],
    [
      { XDG_STATE_HOME: 'state' },
      '/home/ada',
      undefined,
      '/home/ada/.local/state/halfspace/logbook.jsonl',
      '/home/ada',
    ],
    [
      { XDG_STATE_HOME: '' },
      '/home/ada',
      undefined,
      '/home/ada/.local/state/halfspace/logbook.jsonl',
      '/home/ada',
    ],
    [{ XDG_STATE_HOME: '/state' }, undefined, undefined, '/state/halfspace/logbook.jsonl', '/'],
    [
      { XDG_STATE_HOME: '/state' },
      '/home/ada',
      'bench/a.jsonl',
      '/work-place/bench/a.jsonl',
      '/work-place/bench',
    ],
    [{}, undefined, '/data/a.jsonl', '/data/a.jsonl', '/data'],
  ])('%j, home %s, given %s: %s', (environment, home, given, expected, base) => {
    expect(logbookPlace(environment, home, given, '/work-place')).toEqual({ file: expected, base });
  });

  it('is refused where there is neither a home nor a name', () => {
    expect(logbookPlace({}, undefined, undefined, '/')).toMatchObject({ code: 'logbook-no-home', exit: 4 });
    expect(logbookPlace({ XDG_STATE_HOME: 'x' }, '', undefined, '/')).toMatchObject({
      code: 'logbook-no-home',
    });
  });
});
