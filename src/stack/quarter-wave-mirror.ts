/**
 * High reflectors of alternating quarter waves, at their design wavelength and normal incidence.
 *
 * Admittance from the substrate out: Y <- n^2/Y at each quarter wave, R = |(n0 - Y)/(n0 + Y)|^2. A pair multiplies Y by
 * (nH/nL)^2 with the high index outermost, by its inverse with the low one; a complex substrate (a metal) is allowed.
 * Stop band: width/nu0 = (4/pi) asin((nH - nL)/(nH + nL)).
 * Sources: Born & Wolf, Principles of Optics, 1.6.5; Macleod, Thin-Film Optical Filters, 5.2.
 */
import { abs2, add, type Complex, div, scale, sub } from '../num/complex.ts';
import { StackRefusal } from './stack-refusal.ts';

export interface QuarterWaveMirror {
  readonly outsideIndex: number;
  readonly high: number;
  readonly low: number;
  readonly substrate: Complex;
  /** Which index the wave meets first. */
  readonly outermost: 'high' | 'low';
  /** One more layer of the outermost kind on the substrate, as in air|(HL)^N H|substrate. */
  readonly extraLayer: boolean;
}

/** Reflectance with a number of pairs; the closed form takes any real number. */
export function quarterWaveMirrorReflectance(mirror: QuarterWaveMirror, pairs: number): number {
  check(mirror);
  if (!(pairs >= 0)) {
    throw new StackRefusal('out-of-range', `${pairs} pairs of layers`, 'the number of pairs is zero or more');
  }
  const Y = scale(baseAdmittance(mirror), pairFactor(mirror) ** pairs);
  const n0: Complex = { re: mirror.outsideIndex, im: 0 };
  if (!Number.isFinite(abs2(Y))) return 1;
  return abs2(div(sub(n0, Y), add(n0, Y)));
}

export interface PairsNeeded {
  /** The real number at which the closed form reaches the reflectance wanted. */
  readonly exact: number;
  /** The whole number that is enough, and the reflectance it gives. */
  readonly pairs: number;
  readonly R: number;
}

/**
 * Pairs needed for a reflectance. With m = |Y| and c = Re Y/|Y|, which pairs leave as it is, R is reached where
 * m^2 - 2 n0 m c (1 + R)/(1 - R) + n0^2 = 0: the larger root with the high index outermost, the smaller with the low.
 * Zero where the substrate alone does it. Refuses R of 1 and more.
 */
export function pairsForReflectance(mirror: QuarterWaveMirror, wanted: number): PairsNeeded {
  check(mirror);
  if (!(wanted > 0 && wanted < 1)) {
    throw new StackRefusal(
      'unreachable-reflectance',
      `no number of pairs gives a reflectance of ${wanted}`,
      'ask for a fraction between 0 and 1',
    );
  }
  const base = baseAdmittance(mirror);
  const size = Math.sqrt(abs2(base));
  const half = (mirror.outsideIndex * (base.re / size) * (1 + wanted)) / (1 - wanted);
  const larger = half + Math.sqrt(Math.max(half * half - mirror.outsideIndex ** 2, 0));
  const reached = mirror.outermost === 'high' ? larger : mirror.outsideIndex ** 2 / larger;
  const bare = quarterWaveMirrorReflectance(mirror, 0) >= wanted;
  const exact = bare ? 0 : Math.log(reached / size) / Math.log(pairFactor(mirror));
  // A whole number lost to rounding in the logarithms would cost a pair.
  let pairs = Math.max(0, Math.ceil(exact - 1e-9));
  while (quarterWaveMirrorReflectance(mirror, pairs) < wanted - 1e-12) pairs++;
  return { exact, pairs, R: quarterWaveMirrorReflectance(mirror, pairs) };
}

export interface StopBand {
  /** Width over centre frequency. */
  readonly relativeWidth: number;
  readonly from_m: number;
  readonly to_m: number;
}

/** The band in which the reflectance of a long stack grows with the number of pairs, around its design wavelength. */
export function stopBand(high: number, low: number, vacuumWavelength_m: number): StopBand {
  checkPair(high, low);
  const relativeWidth = (4 / Math.PI) * Math.asin((high - low) / (high + low));
  return {
    relativeWidth,
    from_m: vacuumWavelength_m / (1 + relativeWidth / 2),
    to_m: vacuumWavelength_m / (1 - relativeWidth / 2),
  };
}

function baseAdmittance({ substrate, high, low, outermost, extraLayer }: QuarterWaveMirror): Complex {
  if (!extraLayer) return substrate;
  const n = outermost === 'high' ? high : low;
  return div({ re: n * n, im: 0 }, substrate);
}

const pairFactor = ({ high, low, outermost }: QuarterWaveMirror): number =>
  outermost === 'high' ? (high / low) ** 2 : (low / high) ** 2;

function check(mirror: QuarterWaveMirror): void {
  checkPair(mirror.high, mirror.low);
  if (!(mirror.outsideIndex > 0 && mirror.substrate.im >= 0 && abs2(mirror.substrate) > 0)) {
    throw new StackRefusal(
      'not-transparent',
      'the medium in front or the substrate has no usable index',
      'give an index above zero in front and a passive substrate',
    );
  }
}

function checkPair(high: number, low: number): void {
  if (!(low > 0 && high > low && Number.isFinite(high))) {
    throw new StackRefusal(
      'out-of-range',
      `${high} and ${low} make no pair of a high and a low index`,
      'give two different real indices, the high one first',
    );
  }
}
