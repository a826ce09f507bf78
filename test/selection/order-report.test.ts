import { describe, expect, it } from 'vitest';
import { type Layer, type MediumSpec, makeQuestion, type Question } from '../../src/answer/question.ts';
import { isRefusal } from '../../src/medium/refusal.ts';
import { type Finding, TOPICS, type Topic } from '../../src/selection/order/finding.ts';
import { orderReport } from '../../src/selection/order/order-report.ts';
import { material, survey, vacuum } from './whole-catalogue.ts';

const named = (key: string): MediumSpec => ({ kind: 'catalogue', material: material(key) });
const layer = (key: string, thickness_m: number): Layer => ({
  medium: named(key),
  thickness: { kind: 'length', thickness_m },
});
const quarter = (key: string): Layer => ({ medium: named(key), thickness: { kind: 'waves', waves: 0.25 } });

function order(layers: readonly Layer[], wavelength_m: number, more: Partial<Question> = {}) {
  const question = makeQuestion(named('air'), named('air'), vacuum(wavelength_m), { layers, ...more });
  const report = orderReport(survey, [question]);
  if (isRefusal(report)) throw new Error(report.message);
  const all = [...report.waves.flatMap((w) => w.findings), ...report.general];
  const about = (topic: Topic): Finding | undefined => all.find((f) => f.topic === topic);
  return { report, all, about };
}

const BEAM = { kind: 'power', power_W: 30, diameter_m: 6e-3, profile: 'gaussian' } as const;

describe('order check', () => {
  it('finds little against a zinc selenide window for a carbon dioxide laser but its surfaces, its hazard, its softness', () => {
    const { about, report } = order([layer('zinc-selenide', 3e-3)], 10.6e-6, { beam: BEAM });
    expect(about('data')?.level).toBe('fine');
    expect(about('transmission')).toMatchObject({ level: 'fine', source: { kind: 'facts' } });
    // Two surfaces of n = 2.4028: T = 2 n/(n^2 + 1) = 0.7094 (Hecht, Optics, 4.6 with all orders), 29 % are lost.
    expect(about('loss')).toMatchObject({ level: 'look' });
    expect(about('loss')?.text).toMatch(/29\.0\d % in all, 8\.7\d W of 30\.0 W/);
    expect(about('hazard')).toMatchObject({ level: 'look' });
    expect(about('handling')?.text).toContain('soft');
    expect(about('humidity')?.level).toBe('fine');
    // sqrt(2.4035 * 1.0003) = 1.5505.
    expect(about('coating')?.text).toContain('index 1.551');
    expect(report.counts.stop).toBe(0);
    expect(report.beamCautions.map((c) => c.code)).toContain('laser-hazard');
    expect(report.askSupplier.join(' ')).toContain('ISO 21254');
  });

  it('stops silica at 10.6 um, and names where to look instead', () => {
    const { all, report } = order([layer('fused-silica', 5e-3)], 10.6e-6);
    const stops = all.filter((f) => f.level === 'stop').map((f) => f.topic);
    expect(stops).toEqual(['data', 'transmission']);
    expect(all.find((f) => f.topic === 'transmission')?.text).toContain('halfspace find --clear 10.6um');
    expect(report.askSupplier).toEqual([]);
  });

  it('warns of water at rock salt, and never suggests a wet tissue', () => {
    const { about } = order([layer('sodium-chloride', 5e-3)], 10.6e-6);
    expect(about('humidity')).toMatchObject({ level: 'look' });
    expect(about('humidity')?.text).toContain('35.9 g');
    expect(about('handling')?.text).toContain('water-free');
  });

  it('chooses magnesium fluoride for crown glass, the classic single layer (Macleod, Thin-Film Optical Filters)', () => {
    const { about } = order([layer('n-bk7', 3e-3)], 633e-9);
    expect(about('coating')).toMatchObject({ level: 'look' });
    expect(about('coating')?.text).toMatch(
      /^best on file magnesium-fluoride-film \(n 1\.38, 115 nm\), leaving 1\.3 % a face/,
    );
  });

  it('sees a coating that is there already', () => {
    const { about, all } = order(
      [quarter('magnesium-fluoride-film'), layer('n-bk7', 3e-3), quarter('magnesium-fluoride-film')],
      633e-9,
    );
    // Quarter wave of 1.379 on 1.5155: ((1.0003 * 1.5155 - 1.379^2)/(1.0003 * 1.5155 + 1.379^2))^2 = 1.27 %.
    expect(about('coating')).toMatchObject({ level: 'fine', about: 'n-bk7' });
    expect(about('coating')?.text).toMatch(/leaves 1\.27 % at the face to air, 4\.19 % bare/);
    expect(all.filter((f) => f.topic === 'coating')).toHaveLength(1);
    expect(all.filter((f) => f.topic === 'data' && f.about === 'magnesium-fluoride-film')).toHaveLength(1);
  });

  it('lets a Brewster window alone', () => {
    const angle = (67.4 * Math.PI) / 180;
    const { about } = order([layer('zinc-selenide', 3e-3)], 10.6e-6, {
      incidenceAngle_rad: angle,
      polarization: 'p',
      beam: BEAM,
    });
    expect(about('angle')).toMatchObject({ level: 'fine' });
    expect(about('angle')?.text).toContain('Brewster angle (67.4');
    expect(about('loss')?.level).toBe('fine');
    expect(about('coating')?.level).toBe('fine');
    // 6 mm over cos 67.4 degrees is 15.6 mm; half as much again for the aperture.
    expect(about('beam')?.text).toContain('9 mm by 23.4 mm');
  });

  it('asks for the cut of a birefringent crystal', () => {
    const { about, report } = order([layer('sapphire', 2e-3)], 532e-9);
    expect(about('crystal')).toMatchObject({ level: 'look' });
    expect(about('crystal')?.text).toMatch(/n_e - n_o -0\.0081/);
    expect(about('data')?.text).toContain('ordinary axis assumed');
    expect(report.askSupplier.join(' ')).toContain('optic axis');
    expect(order([layer('n-bk7', 2e-3)], 532e-9).about('crystal')?.level).toBe('fine');
  });

  it('repeats the temperature limit of germanium', () => {
    expect(order([layer('germanium', 3e-3)], 10.6e-6).about('temperature')).toMatchObject({ level: 'look' });
    expect(order([layer('germanium', 3e-3)], 10.6e-6).about('temperature')?.text).toContain('80 °C');
  });

  it('judges every wave by itself', () => {
    const layers = [layer('fused-silica', 5e-3)];
    const at = (w: number) => makeQuestion(named('air'), named('air'), vacuum(w), { layers });
    const report = orderReport(survey, [at(633e-9), at(10.6e-6)]);
    if (isRefusal(report)) throw new Error(report.message);
    expect(report.waves.map((w) => w.answer !== null)).toEqual([true, false]);
    expect(report.waves[0]?.findings.some((f) => f.level === 'stop')).toBe(false);
    expect(report.waves[1]?.findings.some((f) => f.level === 'stop')).toBe(true);
  });

  it('stops at total reflection', () => {
    const question = makeQuestion(named('n-bk7'), named('air'), vacuum(633e-9), {
      layers: [layer('n-bk7', 1e-3)],
      incidenceAngle_rad: (60 * Math.PI) / 180,
    });
    const report = orderReport(survey, [question]);
    if (isRefusal(report)) throw new Error(report.message);
    expect(report.waves[0]?.findings.find((f) => f.topic === 'angle')?.level).toBe('stop');
  });

  it('gives every finding a reason with a source, calls nothing safe, and holds for every third medium of the catalogue', () => {
    for (const m of survey.materials.filter((_, i) => i % 3 === 0)) {
      const wavelength_m = Math.max(0.06, m.fits[0]?.range_um[0] ?? 0.6) * 1.01e-6;
      const { all } = order([layer(m.key, 2e-3)], wavelength_m, { beam: BEAM, incidenceAngle_rad: 0.3 });
      for (const { text, source, topic, about } of all) {
        expect(text, m.key).not.toMatch(/NaN|Infinity|undefined|null/);
        expect(text, m.key).not.toMatch(/\bsafe\b/i);
        expect(source.text, m.key).not.toBe('');
        expect(TOPICS).toContain(topic);
        expect(about).not.toBe('');
      }
    }
  }, 60_000);
});
