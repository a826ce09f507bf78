/**
 * Reflection and transmission at the face of a uniaxial crystal, absorbing ones included, in the orientations in which s and
 * p do not mix: axis in the plane of incidence (along the normal, in the surface, or tilted between), or perpendicular to
 * it. At normal incidence every orientation qualifies.
 *
 * Axis in the plane of incidence, at psi from the normal: s is the ordinary, p the extraordinary wave,
 *   y_s = sqrt(no^2 - q^2),  y_p = no ne/sqrt(eps_zz - q^2),  eps_zz = ne^2 cos^2 psi + no^2 sin^2 psi
 * which is eps_x/kappa, kappa^2 = eps_x (1 - q^2/eps_z) in the two principal cases. Axis perpendicular to the plane: s is
 * extraordinary, y_s = sqrt(ne^2 - q^2); p ordinary, y_p = no^2/sqrt(no^2 - q^2). r and t as in `coherent-stack.ts`.
 * Sources: Born & Wolf, Principles of Optics, 15; Azzam & Bashara, Ellipsometry and Polarized Light, 4.7; J. Lekner,
 * J. Phys.: Condens. Matter 3, 6121 (1991).
 */
import { abs2, type Complex, complex, div, mul, neg, scale, sqrtDecaying, sub } from '../num/complex.ts';
import { StackRefusal } from './stack-refusal.ts';

export interface UniaxialCrystal {
  /** Principal indices n + ik. */
  readonly no: Complex;
  readonly ne: Complex;
}

/**
 * Direction of the optic axis, taken pointing into the crystal: its angle to the surface normal, and the angle between the
 * plane of incidence and the plane that holds axis and normal. With azimuth 0 a positive tilt leans the axis towards +x,
 * the way the wave travels along the surface.
 */
export interface AxisDirection {
  readonly tilt_rad: number;
  readonly azimuth_rad: number;
}

export interface UniaxialWave {
  readonly kind: 'ordinary' | 'extraordinary';
  /** Reflected over incident E; sign as `coherentStack` (r_p = -r_s at normal incidence of an isotropic medium). */
  readonly r: Complex;
  readonly R: number;
  readonly T: number;
  /** Of wave vector and of ray inside, signed like the angle of incidence; null in total reflection and in absorbing crystals. */
  readonly waveAngle_rad: number | null;
  readonly rayAngle_rad: number | null;
}

export interface UniaxialInterface {
  readonly s: UniaxialWave;
  readonly p: UniaxialWave;
}

/** Deviations from a plane below this, in rad, count as rounding of the angles given. */
const ALIGNED_rad = 1e-9;

/** From a transparent medium of index n1 onto the crystal. Throws `StackRefusal`, `mixed-polarization` among others. */
export function uniaxialInterface(
  outsideIndex: number,
  crystal: UniaxialCrystal,
  axis: AxisDirection,
  incidenceAngle_rad: number,
): UniaxialInterface {
  check(outsideIndex, crystal, incidenceAngle_rad);
  const q = outsideIndex * Math.sin(incidenceAngle_rad);
  const cos = Math.cos(incidenceAngle_rad);
  const eo = mul(crystal.no, crystal.no);
  const ee = mul(crystal.ne, crystal.ne);
  const product = mul(crystal.no, crystal.ne);
  const y1s = outsideIndex * cos;
  const y1p = outsideIndex / cos;
  const root = (eps: Complex): Complex => sqrtDecaying(sub(eps, complex(q * q)));
  const lossless = crystal.no.im === 0 && crystal.ne.im === 0;

  if (orientation(axis, incidenceAngle_rad) === 'across') {
    const ordinary = root(eo);
    const extraordinary = root(ee);
    return {
      s: wave('extraordinary', 's', y1s, extraordinary, isotropicAngles(extraordinary, q, lossless)),
      p: wave('ordinary', 'p', y1p, div(eo, ordinary), isotropicAngles(ordinary, q, lossless)),
    };
  }
  // Signed lean of the axis in the plane of incidence.
  const lean = axis.tilt_rad * (Math.cos(axis.azimuth_rad) < 0 ? -1 : 1);
  const [s2, c2, sc] = [Math.sin(lean) ** 2, Math.cos(lean) ** 2, Math.sin(lean) * Math.cos(lean)];
  const ezz = complex(ee.re * c2 + eo.re * s2, ee.im * c2 + eo.im * s2);
  const exz = scale(sub(ee, eo), sc);
  const along = root(ezz);
  const ordinary = root(eo);
  const yp = div(product, along);
  return {
    s: wave('ordinary', 's', y1s, ordinary, isotropicAngles(ordinary, q, lossless)),
    p: wave('extraordinary', 'p', y1p, yp, leaningAngles(product, along, ezz, exz, yp, q, lossless)),
  };
}

/**
 * Brewster angle for p with the axis in the plane of incidence at `tilt_rad` from the normal (0: along it, pi/2: in the
 * surface); the sense of the tilt does not matter. sin^2 = (no^2 ne^2 - n1^2 eps_zz)/(no^2 ne^2 - n1^4); null where there is none.
 */
export function uniaxialBrewsterAngle_rad(
  outsideIndex: number,
  no: number,
  ne: number,
  tilt_rad: number,
): number | null {
  const product = (no * ne) ** 2;
  const ezz = (ne * Math.cos(tilt_rad)) ** 2 + (no * Math.sin(tilt_rad)) ** 2;
  const sin2 = (product - outsideIndex ** 2 * ezz) / (product - outsideIndex ** 4);
  return sin2 > 0 && sin2 < 1 ? Math.asin(Math.sqrt(sin2)) : null;
}

function orientation(
  { tilt_rad, azimuth_rad }: AxisDirection,
  incidenceAngle_rad: number,
): 'in-plane' | 'across' {
  const leaning = Math.abs(Math.sin(tilt_rad));
  const outOfPlane = leaning * Math.abs(Math.sin(azimuth_rad));
  // At normal incidence the plane of incidence is free: take it through the axis.
  if (incidenceAngle_rad === 0 || outOfPlane < ALIGNED_rad) return 'in-plane';
  const acrossBy = Math.max(Math.abs(Math.cos(tilt_rad)), leaning * Math.abs(Math.cos(azimuth_rad)));
  if (acrossBy < ALIGNED_rad) return 'across';
  throw new StackRefusal(
    'mixed-polarization',
    'with the optic axis out of the plane of incidence, reflection mixes s and p',
    'turn the axis into the plane of incidence or exactly perpendicular to it, or take normal incidence',
  );
}

interface InnerAngles {
  readonly waveAngle_rad: number | null;
  readonly rayAngle_rad: number | null;
}

const NO_ANGLES: InnerAngles = { waveAngle_rad: null, rayAngle_rad: null };

function isotropicAngles(kappa: Complex, q: number, lossless: boolean): InnerAngles {
  if (!lossless || kappa.re === 0) return NO_ANGLES;
  const angle = Math.atan2(q, kappa.re);
  return { waveAngle_rad: angle, rayAngle_rad: angle };
}

/** kappa = (no ne sqrt(eps_zz - q^2) - eps_xz q)/eps_zz; ray along (E x H): tan = (q y + eps_xz)/eps_zz. */
function leaningAngles(
  product: Complex,
  along: Complex,
  ezz: Complex,
  exz: Complex,
  yp: Complex,
  q: number,
  lossless: boolean,
): InnerAngles {
  if (!lossless || along.re === 0) return NO_ANGLES;
  const kappa = (product.re * along.re - exz.re * q) / ezz.re;
  // Poynting vector: S_x/S_z = -E_z/E_x with eps_zz E_z = -q H - eps_xz E_x and H = y E_x.
  return {
    waveAngle_rad: Math.atan2(q, kappa),
    rayAngle_rad: Math.atan((q * yp.re + exz.re) / ezz.re),
  };
}

function wave(
  kind: UniaxialWave['kind'],
  polarization: 's' | 'p',
  y1: number,
  y2: Complex,
  angles: InnerAngles,
): UniaxialWave {
  const sum = complex(y1 + y2.re, y2.im);
  const r = div(complex(y1 - y2.re, -y2.im), sum);
  return {
    kind,
    r: polarization === 's' ? r : neg(r),
    R: abs2(r),
    T: (4 * y1 * y2.re) / abs2(sum),
    ...angles,
  };
}

function check(outsideIndex: number, { no, ne }: UniaxialCrystal, incidenceAngle_rad: number): void {
  if (!(incidenceAngle_rad >= 0 && incidenceAngle_rad < Math.PI / 2)) {
    throw new StackRefusal(
      'angle-out-of-range',
      `an angle of incidence of ${incidenceAngle_rad} rad`,
      'angles run from 0 to below 90 degrees',
    );
  }
  if (!(outsideIndex > 0 && no.re > 0 && ne.re > 0)) {
    throw new StackRefusal(
      'not-transparent',
      'an index of the medium in front or of the crystal is not above zero',
      'give positive real parts of the indices',
    );
  }
  if (no.im < 0 || ne.im < 0) {
    throw new StackRefusal('gain-medium', 'the crystal amplifies', 'k is zero or more with exp(-i w t)');
  }
}
