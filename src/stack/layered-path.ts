/**
 * A layered path: plane parallel layers between a medium of incidence and an exit medium, each given by its relative
 * permittivity and permeability at one wave. Convention: exp(i(k r - w t)), so eps'' >= 0 and mu'' >= 0 absorb.
 *
 * The checks here are the gate of this folder: what passes them is passive, finite and has an incident wave.
 */
import { abs2, type Complex, div, mul } from '../num/complex.ts';
import { StackRefusal } from './stack-refusal.ts';

export type Polarization = 's' | 'p';

/** Relative permittivity and permeability of a homogeneous isotropic medium. */
export interface Substance {
  readonly eps: Complex;
  readonly mu: Complex;
}

export interface Layer extends Substance {
  readonly thickness_m: number;
  /** Forces the coherent (true) or the intensity sum (false) in `mixed-stack.ts`; decided there where absent. */
  readonly coherent?: boolean | undefined;
}

export interface LayeredPath {
  readonly incidence: Substance;
  /** In the order the wave meets them. */
  readonly layers: readonly Layer[];
  readonly exit: Substance;
}

/** Substance of complex refractive index n + ik: eps = n^2/mu. */
export function substanceFromIndex(n: number, k = 0, mu: Complex = { re: 1, im: 0 }): Substance {
  return { eps: div({ re: (n - k) * (n + k), im: 2 * n * k }, mu), mu };
}

export function layerFromIndex(thickness_m: number, n: number, k = 0): Layer {
  return { ...substanceFromIndex(n, k), thickness_m };
}

/** The same path met from the other end. */
export function reversedPath(path: LayeredPath): LayeredPath {
  return { incidence: path.exit, layers: [...path.layers].reverse(), exit: path.incidence };
}

/** True where neither the electric nor the magnetic response absorbs. */
export const isLossless = (x: Substance): boolean => x.eps.im === 0 && x.mu.im === 0;

/** Squared refractive index eps mu. */
export const indexSquared = (x: Substance): Complex => mul(x.eps, x.mu);

/**
 * Refuses what the laws of this folder do not cover: numbers that are not finite, negative thickness, gain, a vanishing
 * permittivity or permeability, a medium of incidence that absorbs or carries no wave, angles outside 0 to 90 degrees.
 */
export function checkPath(path: LayeredPath, vacuumWavelength_m: number, incidenceAngle_rad: number): void {
  checkWave(vacuumWavelength_m, incidenceAngle_rad);
  checkIncidence(path.incidence);
  checkSubstance(path.exit, 'the exit medium');
  path.layers.forEach((layer, i) => {
    const name = `layer ${i + 1}`;
    checkSubstance(layer, name);
    checkThickness(layer.thickness_m, name);
  });
}

export function checkWave(vacuumWavelength_m: number, incidenceAngle_rad: number): void {
  if (!(vacuumWavelength_m > 0 && Number.isFinite(vacuumWavelength_m))) {
    throw new StackRefusal(
      'wavelength-not-positive',
      `a vacuum wavelength of ${vacuumWavelength_m} m means no wave`,
      'give a wavelength above zero',
    );
  }
  if (!(incidenceAngle_rad >= 0 && incidenceAngle_rad <= Math.PI / 2)) {
    throw new StackRefusal(
      'angle-out-of-range',
      `an angle of incidence of ${incidenceAngle_rad} rad is not between the normal and grazing`,
      'angles run from 0 (along the normal) to 90 degrees (grazing)',
    );
  }
}

export function checkThickness(thickness_m: number, name: string): void {
  if (!Number.isFinite(thickness_m)) {
    throw new StackRefusal('not-finite', `the thickness of ${name} is not a finite number`, 'give a length');
  }
  if (thickness_m < 0) {
    throw new StackRefusal(
      'negative-thickness',
      `the thickness of ${name} is negative`,
      'a thickness is zero or more',
    );
  }
}

export function checkSubstance(x: Substance, name: string): void {
  for (const part of [x.eps.re, x.eps.im, x.mu.re, x.mu.im]) {
    if (!Number.isFinite(part)) {
      throw new StackRefusal(
        'not-finite',
        `permittivity or permeability of ${name} is not a finite number`,
        'give finite values',
      );
    }
  }
  if (x.eps.im < 0 || x.mu.im < 0) {
    throw new StackRefusal(
      'gain-medium',
      `${name} amplifies (negative imaginary part)`,
      'only passive media: k, eps" and mu" are zero or more with exp(-i w t)',
    );
  }
  if (abs2(x.eps) === 0 || abs2(x.mu) === 0) {
    throw new StackRefusal(
      'zero-permittivity',
      `permittivity or permeability of ${name} is exactly zero`,
      'give it its loss, however small',
    );
  }
}

export function checkIncidence(x: Substance): void {
  const name = 'the medium of incidence';
  checkSubstance(x, name);
  if (!isLossless(x)) {
    throw new StackRefusal(
      'lossy-incidence',
      `${name} absorbs, so incident and reflected power cannot be told apart`,
      'start the path in a medium without absorption, or neglect its k',
    );
  }
  if (indexSquared(x).re <= 0) {
    throw new StackRefusal(
      'no-incident-wave',
      `${name} carries no wave (permittivity and permeability of opposite sign)`,
      'start the path in a transparent medium',
    );
  }
}
