/**
 * Whether waves from the two faces of a layer still interfere, from the coherence length of the light.
 *
 * Over a band of width dlambda the fringe phase runs through 2 pi (round trip)/(coherence length): at one coherence length
 * the band holds a whole fringe and its average is the sum of intensities; far below it the fringe stands. The switch is
 * made at half, where a rectangular band leaves a visibility of 2/pi; from a tenth to one the truth lies in between
 * (`partial`). Source: Born & Wolf, Principles of Optics, 7.5.8 and 10.7; the thresholds are this program's.
 */

/** Coherence length lambda^2/dlambda, as an optical path; infinite for a vanishing width. */
export function coherenceLength_m(vacuumWavelength_m: number, spectralWidth_m: number): number {
  return vacuumWavelength_m ** 2 / spectralWidth_m;
}

export type Coherence = 'coherent' | 'partial' | 'incoherent';

/** True where the layer is to be treated as coherent: round trip up to half the coherence length. */
export function isCoherent(roundTripOpticalPath_m: number, coherenceLength_m: number): boolean {
  return roundTripOpticalPath_m <= coherenceLength_m / 2;
}

/** How good that treatment is. */
export function coherenceOf(roundTripOpticalPath_m: number, coherenceLength_m: number): Coherence {
  if (roundTripOpticalPath_m <= coherenceLength_m / 10) return 'coherent';
  return roundTripOpticalPath_m < coherenceLength_m ? 'partial' : 'incoherent';
}
