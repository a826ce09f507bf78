/** Paths of layers, coherence, pulsed beams and crystals as they are typed. */
import { describe, expect, it } from 'vitest';
import type { Answer } from '../../src/answer/answer.ts';
import { run } from './in-process.ts';
import { expectAscii, expectPage } from './page-shape.ts';
import { unknownKeys, validDocument } from './schema.ts';

const words = (line: string): readonly string[] => line.split(' ');

async function answer(line: string): Promise<Answer> {
  const { status, out, err } = await run([...words(line), '--json']);
  expect([status, err], line).toEqual([0, '']);
  const document = validDocument('answer', out);
  expect(unknownKeys('answer', document)).toEqual([]);
  return document as unknown as Answer;
}

const refusal = async (line: string): Promise<readonly [number, string]> => {
  const { status, out, err } = await run(words(line));
  expect(out).toBe('');
  return [status, err];
};

describe('groups of layers', () => {
  it('repeat what stands between 8x: and the colon, groups in groups too', async () => {
    const typed = await answer('air n=2.3@qw n=1.46@qw n=2.3@qw n=1.46@qw n=2.3@hw n-bk7 633nm');
    const grouped = await answer('air 2x: n=2.3@qw n=1.46@qw : n=2.3@hw n-bk7 633nm');
    expect(grouped).toEqual(typed);
    const nested = await answer('air 3x: 2x: n=2.3@qw n=1.46@qw : n=2.3@hw : n-bk7 633nm');
    expect(nested.layers.map((l) => l.medium.n)).toEqual([
      2.3, 1.46, 2.3, 1.46, 2.3, 2.3, 1.46, 2.3, 1.46, 2.3, 2.3, 1.46, 2.3, 1.46, 2.3,
    ]);
    expect((await answer('air 1X: n=2@qw : n=1.5 1um')).layers).toHaveLength(1);
  });

  it('go up to 2000 layers, and no further however they are nested', async () => {
    expect((await answer('air 1000x: n=1.5@10nm n=1.6@10nm : n=1.5 1um')).layers).toHaveLength(2000);
    const [status, err] = await refusal('air 1000x: 1000x: n=1.5@10nm n=1.6@10nm : : n=1.5 1um');
    expect(status).toBe(2);
    expect(err).toMatch(/^halfspace: the path has 2000000 layers, more than 2000; repeat fewer times\n/);
  }, 60_000);

  it.each([
    ['air 8x: n=2@qw n=1.5 1um', 'the group 8x: is not closed'],
    ['air : n=1.5 1um', 'a colon closes no group here'],
    ['air 8x: : n=1.5 1um', 'the group 8x: holds no layer'],
    ['air 0x: n=2@qw : n=1.5 1um', '"0x:" repeats nothing'],
    ['air 8x n=2@qw : n=1.5 1um', '"8x" is no layer; write 8x: before the group and a colon after it'],
    ['air 8x:n=2@qw : n=1.5 1um', 'leave a space after 8x:'],
    ['air 8x: n=2@qw: n=1.5 1um', 'leave a space before the colon'],
    ['air (n=2@qw n=1.4@qw)8 n=1.5 1um', '"(n=2@qw" is no layer; write 8x: LAYER LAYER :'],
    ['8x: n=2@qw : n=1.5 1um', 'stands where the first or the last medium belongs'],
    ['air n=2@qw 8x: 1um', 'stands where the first or the last medium belongs'],
  ])('%j is refused with the right way to write it', async (line, words) => {
    const [status, err] = await refusal(line);
    expect(status).toBe(2);
    expect(err).toContain(words);
  });

  it('finds close names of a mistyped layer', async () => {
    expect((await refusal('air 2x: magnesium-fluorid-film@qw : n-bk7 550nm'))[1]).toMatch(
      /did you mean magnesium-fluoride-film/,
    );
  });

  it('are told once in text, however often they repeat', async () => {
    const { out } = await run(words('air 40x: n=2.3@qw n=1.46@qw : n-bk7 633nm'));
    expectPage(out);
    expect(out).toContain('Air → 40 × (n=2.3 68.804 nm → n=1.46 108.39 nm) → N-BK7');
    expect(out).toContain('1 to 80: 40 times');
    expect(out.split('\n').length).toBeLessThan(60);
  });
});

describe('coherence', () => {
  it('by --coherence, or by --linewidth as lambda^2/width in any unit', async () => {
    const given = await answer('vacuum n=1.5@1mm vacuum 1um --coherence 1cm');
    expect(given.stack).toMatchObject({ coherence: 'coherent', coherenceLength_m: 0.01 });
    for (const width of ['0.1nm', '29.9792458GHz', '1cm-1']) {
      const { stack } = await answer(`vacuum n=1.5@1mm vacuum 1um --linewidth ${width}`);
      expect(stack?.coherenceLength_m).toBeCloseTo(0.01, 10);
      expect(stack?.coherenceLengthFrom).toBe('stated');
    }
  });

  it('says which layers were summed as intensities, and on what ground', async () => {
    const { cautions } = await answer('air n=2@qw n=1.5@5mm n=2@qw air 633nm --linewidth 1nm');
    const texts = cautions.filter((c) => c.code === 'coherence').map((c) => c.text);
    expect(texts).toEqual(['layer 2 is summed as intensities: coherence length 401 um as stated']);
  });

  it('contradicts itself when given twice', async () => {
    const [status, err] = await refusal('air n=2@qw n=1.5 633nm --linewidth 1nm --coherence 1mm');
    expect([status, err.split('\n')[0]]).toEqual([
      2,
      'halfspace: --linewidth and --coherence contradict each other; give one of them',
    ]);
  });
});

it('--design-wave fixes quarter waves while the wave moves', async () => {
  const at = (line: string) => answer(`air n=1.38@qw n=1.52 ${line}`);
  const [design, other] = [await at('550nm'), await at('700nm --design-wave 550nm')];
  expect(other.layers[0]?.thickness_m).toBe(design.layers[0]?.thickness_m);
  expect(other.interface.R).toBeGreaterThan(design.interface.R);
});

describe('pulsed beams', () => {
  /** 2 sqrt(ln2/pi): peak power of a gaussian over energy/FWHM. */
  const PEAK = 2 * Math.sqrt(Math.LN2 / Math.PI);
  const window = 'air fused-silica@10mm air 800nm';

  it('know mean power, peak power, fluence, fields and the B-integral', async () => {
    const { energy, pulse, cautions } = await answer(
      `${window} --pulse-energy 1mJ --pulse 100fs --repetition 1kHz --beam 5mm --nonlinear-index 2.7e-16cm2/W`,
    );
    expect(energy?.incidentPower_W).toBeCloseTo(1, 12);
    const p = energy?.pulse;
    expect(p?.peakPower_W).toBeCloseTo((PEAK * 1e-3) / 100e-15, -3);
    const fluence = (2 * 1e-3) / (Math.PI * 2.5e-3 ** 2);
    expect(p?.peakFluence_J_per_m2).toBeCloseTo(fluence, 9);
    const I = (PEAK * fluence) / 100e-15;
    expect((p?.peakIrradiance_W_per_m2 ?? 0) / I).toBeCloseTo(1, 9);
    expect(p?.dutyCycle).toBeCloseTo(1e-10, 20);
    const T1 = 1 - ((1.4533 - 1) / (1.4533 + 1)) ** 2;
    const B = ((2 * Math.PI) / 800e-9) * 2.7e-20 * T1 * I * 0.01;
    expect((energy?.nonlinear?.bIntegral_rad ?? 0) / B).toBeCloseTo(1, 3);
    expect(pulse?.durationOut_s).toBeGreaterThan(100e-15);
    const codes = cautions.map((c) => c.code);
    for (const code of ['self-focusing', 'pulse-train', 'damage-definition', 'laser-hazard']) {
      expect(codes).toContain(code);
    }
  });

  it('any two of energy, rate and mean power give the third', async () => {
    const a = await answer(`${window} --pulse-energy 1nJ --repetition 80MHz`);
    const b = await answer(`${window} --power 80mW --repetition 80MHz`);
    const c = await answer(`${window} --power 80mW --pulse-energy 1nJ`);
    for (const { energy } of [a, b, c]) {
      expect(energy?.incidentPower_W).toBeCloseTo(0.08, 12);
      expect(energy?.pulse?.energy_J).toBeCloseTo(1e-9, 20);
      expect(energy?.pulse?.repetition_Hz).toBeCloseTo(80e6, 3);
      expect(energy?.pulse?.peakPower_W).toBeNull();
    }
  });

  it('a single pulse has no mean power', async () => {
    const { energy } = await answer(`${window} --pulse-energy 1mJ --pulse 8ns --beam 5mm`);
    expect(energy).toMatchObject({ incident: null, incidentPower_W: null, photonFlux_per_s: null });
    expect(energy?.pulse?.fields?.incident.irradiance_W_per_m2).toBeGreaterThan(0);
    expect(energy?.pulse?.photonsPerPulse).toBeGreaterThan(0);
  });

  it('leave a footprint that grows with the angle, and the fluence on the surface falls with it', async () => {
    const { energy } = await answer(`${window} --angle 60 --pulse-energy 1mJ --pulse 8ns --beam 5mm`);
    expect(energy?.footprint?.acrossDiameter_m).toBeCloseTo(5e-3, 12);
    expect(energy?.footprint?.alongDiameter_m).toBeCloseTo(10e-3, 12);
    const { fluenceOnSurface_J_per_m2: onSurface, peakFluence_J_per_m2: across } = energy?.pulse ?? {};
    expect((onSurface ?? 0) / (across ?? 1)).toBeCloseTo(0.5, 12);
  });

  it.each([
    [`${window} --pulse-energy 1mJ --power 2W --repetition 1kHz`, 'is 1 W, but --power is 2 W'],
    [`${window} --power 1W --pulse 100ns --repetition 80MHz`, 'run into each other'],
    [`${window} --repetition 1kHz`, '--repetition says nothing without --power or --pulse-energy'],
    [`${window} --nonlinear-index 1e-20m2/W`, '--nonlinear-index says nothing without --power'],
    [`${window} --power 1W --nonlinear-index 1e-20m2/W`, 'the beam has no width; give --beam too'],
    ['air n-bk7 800nm --irradiance 1W/m2 --nonlinear-index 1e-20m2/W', '--nonlinear-index needs a layer'],
    [
      'air n=2@qw n=1.5@1mm air 800nm --irradiance 1W/m2 --nonlinear-index 1e-20m2/W',
      'layers of 2 media, and --nonlinear-index names none',
    ],
    [`${window} --irradiance 1W/m2 --nonlinear-index 2=1e-20m2/W`, 'there is no layer 2'],
    [`${window} --pulse-energy 1mJ --irradiance 1W/m2`, 'contradict each other'],
  ])('%j is refused', async (line, words) => {
    const [status, err] = await refusal(line);
    expect(status).toBe(2);
    expect(err).toContain(words);
  });
});

describe('a crystal in a path', () => {
  it('is answered at its cut, beside the path of the ordinary wave', async () => {
    const { crystal, cautions } = await answer(
      'air crystal-quartz@1mm air 532nm --cut-angle 90 --retardance quarter',
    );
    expect(crystal?.about).toBe('layer 1');
    const d = crystal?.waveplate?.zeroOrderThickness_m ?? Number.NaN;
    expect((crystal?.birefringence ?? 0) * d).toBeCloseTo(532e-9 / 4, 20);
    expect(crystal?.plate?.retardance_waves).toBeCloseTo(((crystal?.birefringence ?? 0) * 1e-3) / 532e-9, 9);
    const codes = cautions.map((c) => c.code);
    expect(codes).toContain('crystal-cut');
    expect(codes).not.toContain('axis-assumed');
  });

  it.each([
    ['air n-bk7 633nm --cut-angle 20', 'is isotropic'],
    ['air ktp 633nm --cut-angle 20', 'is biaxial'],
    ['air sapphire:o 633nm --cut-angle 20', 'picks a principal axis already'],
    ['air calcite@1mm sapphire 633nm --cut-angle 20', 'a cut can mean calcite or sapphire'],
    ['air calcite 633nm --angle 30 --cut-angle 40 --cut-azimuth 20', 'mixes s and p'],
    ['air calcite 633nm --retardance half', '--retardance says nothing here without --cut-angle'],
    ['air calcite 633nm --cut-azimuth 20', '--cut-azimuth says nothing without --cut-angle'],
    ['air calcite 633nm --cut-angle 91', 'from 0 to 90 deg'],
  ])('%j is refused', async (line, words) => {
    const [status, err] = await refusal(line);
    expect(status).toBe(2);
    expect(err).toContain(words);
  });
});

describe('every form', () => {
  it.each([
    'air 12x: titanium-dioxide-film@qw silicon-dioxide-film@qw : fused-silica@3mm air 633nm --angle 30',
    'air fused-silica@10mm air 800nm --pulse-energy 1mJ --pulse 100fs --repetition 1kHz --beam 5mm --nonlinear-index 2.7e-20m2/W --angle 45',
    'air magnesium-fluoride-film@qw n-bk7 550nm --power 100W --beam 1mm --tolerance temperature=5C,thickness=2%,nlayer=0.01',
    'air no=1.6584,ne=1.4864@1mm air 589nm --cut-angle 45 --retardance half',
    'vacuum n=1.5@10mm vacuum 1um --coherence 10m --tolerance wave=1nm',
  ])('%s', async (line) => {
    for (const form of [[], ['--markdown'], ['--plain'], ['--csv'], ['--json']]) {
      const { status, out, err } = await run([...words(line), ...form]);
      expect([status, err]).toEqual([0, '']);
      expect(out).not.toMatch(/\bNaN\b|Infinity|undefined|\[object/);
      const { out: ascii } = await run([...words(line), ...form, '--ascii']);
      expectAscii(ascii.replaceAll('\t', ' '));
    }
    expectPage((await run(words(line))).out);
    expect(await answer(line)).toBeDefined();
  });

  it('a wave that runs through fringes is told with its mean', async () => {
    const line = 'vacuum n=1.5@10mm vacuum 1um --coherence 10m --tolerance wave=1nm';
    const { interface: surface } = await answer(line);
    expect(surface.T_mean).toBeCloseTo((2 * 1.5) / (1.5 ** 2 + 1), 2);
    expect(surface.T_uncertaintyFrom).toBe('wavelength');
  });
});
