/** A question in words, read by the command line: the same question, every number to the last bit. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  type Beam,
  type Layer,
  type MediumSpec,
  makeQuestion,
  type Question,
} from '../../src/answer/question.ts';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { parseArguments } from '../../src/cli/arguments.ts';
import { readQuestion } from '../../src/cli/read-question.ts';
import { isRefusal } from '../../src/medium/refusal.ts';
import { questionWords } from '../../src/record/question-words.ts';
import { index, named } from '../helpers/ask.ts';

function readBack(words: readonly string[]): Question {
  const parsed = parseArguments(words.slice(1));
  if (parsed.kind !== 'run') throw new Error(JSON.stringify(parsed));
  const { operands, options } = parsed.invocation;
  const question = readQuestion(operands, options, catalogueFromSources());
  if (question instanceof Promise || isRefusal(question)) throw new Error(JSON.stringify(question));
  return question;
}

/** What counts: not how wave and literal media were spelled, and no parts that are absent. */
function essence(question: Question): unknown {
  const { wavelength_m, inAir } = question.wave;
  const short = { ...question, wave: { wavelength_m, inAir } };
  return JSON.parse(
    JSON.stringify(short, (key, value: unknown) =>
      key === 'text' ? undefined : key === 'material' ? (value as { key: string }).key : value,
    ),
  );
}

const log = (min: number, max: number) =>
  fc.double({ min: Math.log(min), max: Math.log(max), noNaN: true }).map(Math.exp);
const maybe = <T>(value: fc.Arbitrary<T>) => fc.option(value, { nil: undefined });
const literal = fc
  .tuple(fc.double({ min: 1, max: 4, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }))
  .map(([n, k]): MediumSpec => ({ ...index(n, k), text: `n=${n}+${k}i` }) as MediumSpec);
const medium = fc.oneof(
  fc.constantFrom(
    named('air'),
    named('n-bk7'),
    named('sapphire', 'ordinary'),
    named('sapphire', 'extraordinary'),
  ),
  literal,
);
const thickness: fc.Arbitrary<Layer['thickness']> = fc.oneof(
  log(1e-10, 1).map((thickness_m) => ({ kind: 'length' as const, thickness_m })),
  fc.constantFrom(0.25, 0.5, 0.75, 1.5, 0.3, 0.1).map((waves) => ({ kind: 'waves' as const, waves })),
);
const layer: fc.Arbitrary<Layer> = fc.record({ medium, thickness });
const layers = fc.oneof(
  fc.array(layer, { maxLength: 3 }),
  fc
    .tuple(layer, layer, fc.integer({ min: 3, max: 6 }))
    .map(([a, b, n]) => Array.from({ length: n }, () => [a, b]).flat()),
);
const width = {
  diameter_m: maybe(log(1e-6, 1)),
  profile: fc.constantFrom('gaussian' as const, 'flat' as const),
};
const pulse = fc.record({ energy_J: log(1e-12, 1), duration_s: maybe(log(1e-14, 1e-9)) });
const beam: fc.Arbitrary<Beam> = fc
  .oneof(
    log(1e-9, 1e3).map((irradiance_W_per_m2) => ({ kind: 'irradiance' as const, irradiance_W_per_m2 })),
    log(1e-3, 1e9).map((peakE_V_per_m) => ({ kind: 'field' as const, peakE_V_per_m })),
    fc.record({ kind: fc.constant('power' as const), power_W: log(1e-9, 1e3), ...width }),
    fc.record({ kind: fc.constant('pulse' as const), pulse, ...width }),
    fc
      .record({ kind: fc.constant('power' as const), pulse, rate_Hz: log(1, 1e3), ...width })
      .map(({ rate_Hz, ...b }) => ({
        ...b,
        power_W: b.pulse.energy_J * rate_Hz,
        pulse: { ...b.pulse, repetition_Hz: rate_Hz },
      })),
  )
  .map((b) =>
    // A profile without a width cannot be stated.
    'profile' in b && b.diameter_m === undefined ? { ...b, profile: 'gaussian' as const } : b,
  ) as fc.Arbitrary<Beam>;
const question: fc.Arbitrary<Question> = fc
  .record({
    from: medium,
    into: medium,
    layers,
    wavelength_m: log(60e-9, 1e6),
    inAir: fc.boolean(),
    incidenceAngle_rad: fc.oneof(fc.constant(0), fc.double({ min: 0, max: 1.57, noNaN: true })),
    polarization: fc.constantFrom('s' as const, 'p' as const, 'unpolarized' as const),
    conditions: fc.record({
      temperature_K: maybe(fc.double({ min: 1, max: 2000, noNaN: true })),
      pressure_Pa: maybe(log(1, 1e7)),
      humidity: maybe(fc.double({ min: 0, max: 1, noNaN: true })),
      co2_ppm: maybe(fc.double({ min: 0, max: 1e6, noNaN: true })),
      salinity_g_per_kg: maybe(fc.double({ min: 0, max: 300, noNaN: true })),
      composition: maybe(fc.double({ min: 0, max: 1, noNaN: true })),
    }),
    tolerances: fc.record({
      wavelength_m: maybe(log(1e-15, 1e-3)),
      angle_rad: maybe(log(1e-6, 0.1)),
      index: maybe(log(1e-8, 0.1)),
      indexFrom: maybe(log(1e-8, 0.1)),
      indexLayers: maybe(log(1e-8, 0.1)),
      temperature_K: maybe(log(1e-3, 10)),
      thickness_m: maybe(log(1e-12, 1e-3)),
    }),
    beam: maybe(beam),
    extrapolate: fc.boolean(),
    coherenceLength_m: maybe(log(1e-9, 10)),
    cut: maybe(
      fc.record({
        angle_rad: fc.double({ min: 0, max: Math.PI / 2, noNaN: true }),
        azimuth_rad: fc.constantFrom(0, Math.PI / 2, 0.3),
        retardance_waves: maybe(fc.constantFrom(0.25, 0.5, 0.3)),
      }),
    ),
    fieldProfile: maybe(fc.constant(true)),
  })
  .map(({ from, into, wavelength_m, inAir, ...more }) => {
    const b = more.beam;
    const pulseDuration_s = b && 'pulse' in b ? b.pulse?.duration_s : undefined;
    const wave = { wavelength_m, inAir, text: '' };
    return makeQuestion(from, into, wave, { ...more, pulseDuration_s } as Partial<Question>);
  });

describe('the words of a question', () => {
  it('read back as the same question', () => {
    fc.assert(
      fc.property(question, (asked) => {
        const { cut, ...read } = essence(readBack(questionWords(asked))) as { cut?: object };
        const { cut: wanted, ...expected } = essence(asked) as { cut?: object };
        expect(read).toEqual(expected);
        if (wanted) expect(cut).toMatchObject(wanted);
      }),
      { numRuns: 500 },
    );
  });

  it('are those that a person would write', () => {
    const wave = { wavelength_m: 632.8e-9, inAir: false, text: '632.8 nm' };
    const film: Layer = {
      medium: named('magnesium-fluoride-film'),
      thickness: { kind: 'waves', waves: 0.25 },
    };
    const plain = makeQuestion(named('air'), named('fused-silica'), wave);
    expect(questionWords(plain).join(' ')).toBe('halfspace air fused-silica 632.8nm');
    const more: Partial<Question> = {
      incidenceAngle_rad: (45 * Math.PI) / 180,
      polarization: 'p',
      conditions: { temperature_K: 298.15 },
      beam: { kind: 'power', power_W: 5e-3, diameter_m: 1e-3, profile: 'gaussian' },
      tolerances: { wavelength_m: 1e-9, thicknessShare: 0.01 },
      layers: [film],
    };
    expect(questionWords({ ...plain, ...more }).join(' ')).toBe(
      'halfspace air magnesium-fluoride-film@qw fused-silica 632.8nm --angle 45deg --pol p --temperature=25C --power 5mW --beam 1mm --tolerance wave=1nm,thickness=1%',
    );
    const inAir = { ...wave, inAir: true };
    expect(questionWords({ ...plain, wave: inAir })).toContain('--air-wavelength');
    const line = { wavelength_m: 587.5618e-9, inAir: true, text: 'd-line' };
    expect(questionWords({ ...plain, wave: line }).join(' ')).toBe('halfspace air fused-silica d-line');
  });
});
