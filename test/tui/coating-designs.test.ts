import { describe, expect, it } from 'vitest';
import { makeQuestion } from '../../src/answer/question.ts';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { CoatingDesigns, designCoatings } from '../../src/tui/coating-designs.ts';
import { named, vacuumWave } from '../helpers/ask.ts';

const catalogue = catalogueFromSources();
const question = (wavelength_m: number) =>
  makeQuestion(named('air'), named('n-bk7'), vacuumWave(wavelength_m));

describe('coatings while keys are looked after', () => {
  it('are designed in pieces, with turns of the loop between them, to the same end', async () => {
    const asked = question(550e-9);
    let turns = 0;
    const counter = setInterval(() => turns++, 0);
    await new Promise<void>((resolve) => {
      const designs = new CoatingDesigns(catalogue, () => {
        expect(designs.get(asked)).toEqual(designCoatings(asked, catalogue));
        resolve();
      });
      expect(designs.get(asked)).toBeUndefined();
    });
    clearInterval(counter);
    expect(turns).toBeGreaterThan(5);
  });

  it('of the last question asked come first; those before are taken up when asked again', async () => {
    const [before, now] = [question(550e-9), question(633e-9)];
    let ready = (): void => undefined;
    const designs = new CoatingDesigns(catalogue, () => ready());
    const nextReady = (): Promise<void> => new Promise((resolve) => (ready = resolve));
    expect(designs.get(before)).toBeUndefined();
    expect(designs.get(now)).toBeUndefined();
    await nextReady();
    expect(designs.get(now)).toMatchObject({ wave: { vacuumWavelength_m: 633e-9 } });
    expect(designs.get(before)).toBeUndefined();
    await nextReady();
    expect(designs.get(before)).toMatchObject({ wave: { vacuumWavelength_m: 550e-9 } });
    designs.stop();
  });
});
