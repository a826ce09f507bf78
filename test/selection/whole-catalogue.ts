/** The catalogue of this working copy under survey, made once. */
import { catalogueFromSources, readCatalogueSources } from '../../src/catalog/from-sources.ts';
import type { Material } from '../../src/catalog/types.ts';
import { makeSurvey } from '../../src/selection/survey.ts';

export const survey = makeSurvey(catalogueFromSources());

/** With their check values, which the packed catalogue keeps apart. */
export const sources: readonly Material[] = readCatalogueSources().materials;

export const vacuum = (wavelength_m: number, text = `${wavelength_m} m`) => ({
  wavelength_m,
  inAir: false,
  text,
});
export const air = (wavelength_m: number, text = `${wavelength_m} m in air`) => ({
  wavelength_m,
  inAir: true,
  text,
});

export function material(key: string): Material {
  const found = survey.material(key);
  if (!found) throw new Error(`no material ${key}`);
  return found;
}
