import { describe, expect, it } from 'vitest';
import { nonDispersive, stackDispersion } from '../../src/stack/group-delay.ts';
import { platePassage, wedgeNote } from '../../src/stack/tilted-plate.ts';
import { SPEED_OF_LIGHT_m_per_s as c } from '../../src/units/constants.ts';

describe('platePassage', () => {
  it('displaces by d sin (1 - n0 cos/(n cos inside)), nothing at normal incidence', () => {
    const [d, n, angle] = [5e-3, 1.5, 0.9];
    const inside = Math.asin(Math.sin(angle) / n);
    const plate = platePassage(d, 1, n, 1.53, angle, 4e-26);
    expect(plate.refractionAngle_rad).toBeCloseTo(inside, 14);
    expect(plate.lateralDisplacement_m).toBeCloseTo(
      d * Math.sin(angle) * (1 - Math.cos(angle) / (n * Math.cos(inside))),
      15,
    );
    expect(plate.opticalPath_m).toBeCloseTo((n * d) / Math.cos(inside), 15);
    expect(plate.groupDelay_s).toBeCloseTo((1.53 * d) / (c * Math.cos(inside)), 24);
    expect(plate.gdd_s2).toBeCloseTo((4e-26 * d) / Math.cos(inside), 40);
    expect(platePassage(d, 1, n, n, 0).lateralDisplacement_m).toBe(0);
    expect(platePassage(d, 1, n, n, 0).gdd_s2).toBeNull();
  });

  it('adds the optical path that the phase of an index-matched stack shows', () => {
    // Glass in glass-like surroundings: no echoes, so the phase through the layer is k0 n d cos.
    const [d, n, angle, wave] = [3e-6, 1.0001, 0.6, 1e-6];
    const { addedOpticalPath_m } = platePassage(d, 1, n, n, angle);
    const at = (index: number) =>
      stackDispersion(
        {
          incidence: nonDispersive(1),
          layers: [{ ...nonDispersive(index), thickness_m: d }],
          exit: nonDispersive(1),
        },
        wave,
        angle,
      ).s.transmission?.phase_rad ?? Number.NaN;
    expect(((at(n) - at(1)) * wave) / (2 * Math.PI)).toBeCloseTo(addedOpticalPath_m, 12);
  });

  it('refuses total reflection and negative thickness', () => {
    expect(() => platePassage(1e-3, 1.5, 1, 1, 0.9)).toThrow(/no ray/);
    expect(() => platePassage(-1e-3, 1, 1.5, 1.5, 0)).toThrow(/thickness/);
  });
});

describe('wedgeNote', () => {
  it('deviation (n - 1) w, ghosts 2 n w apart, relative to the surroundings', () => {
    const note = wedgeNote(1e-3, 1.5);
    expect(note.deviation_rad).toBeCloseTo(5e-4, 15);
    expect(note.ghostSeparation_rad).toBeCloseTo(3e-3, 15);
    expect(wedgeNote(1e-3, 1.5, 1.5).deviation_rad).toBe(0);
  });

  it('agrees with Snell at both faces for a small wedge', () => {
    const [w, n] = [1e-4, 1.7];
    // Normal to the first face: inside undeviated, second face met at w.
    expect(Math.asin(n * Math.sin(w)) - w).toBeCloseTo(wedgeNote(w, n).deviation_rad, 10);
    // Reflected at the second face by 2 w inside, leaving the first at n 2 w.
    expect(Math.asin(n * Math.sin(2 * w))).toBeCloseTo(wedgeNote(w, n).ghostSeparation_rad, 10);
  });
});
