/**
 * From an index relative to standard air, as a function of the air wavelength, to the absolute index as a function of the
 * vacuum wavelength: n_abs(L) = n_rel(L/n_air(L)) n_air(L), with derivatives up to the third by the chain and product rules
 * (Faa di Bruno). k is scaled the same way. Air means standard air (15 C, 101325 Pa, dry, 450 ppm CO2): at 20 C the
 * factor differs by 5e-6, below the stated accuracy of nearly every fit printed relative to air.
 */
import { type IndexJet, JET_LENGTH } from '../dispersion/evaluator.ts';

/** A function value with its first three derivatives. */
type Taylor3 = readonly [number, number, number, number];

/** `relative`: jet by air wavelength; `air`: n_air and three derivatives by vacuum wavelength, um. Writes into `out`. */
export function toAbsolute(
  relative: IndexJet,
  vacuumWavelength_um: number,
  air: Taylor3,
  out: IndexJet,
): void {
  const inner = airWavelength(vacuumWavelength_um, air);
  for (let part = 0; part < JET_LENGTH; part += 4) {
    const f = compose(relative[part]!, relative[part + 1]!, relative[part + 2]!, relative[part + 3]!, inner);
    out[part] = f[0] * air[0];
    out[part + 1] = f[1] * air[0] + f[0] * air[1];
    out[part + 2] = f[2] * air[0] + 2 * f[1] * air[1] + f[0] * air[2];
    out[part + 3] = f[3] * air[0] + 3 * f[2] * air[1] + 3 * f[1] * air[2] + f[0] * air[3];
  }
}

/** L/n_air(L) and its derivatives. */
function airWavelength(L: number, [n, n1, n2, n3]: Taylor3): Taylor3 {
  const r = 1 / n;
  const r1 = -n1 * r * r;
  const r2 = -n2 * r * r + 2 * n1 * n1 * r ** 3;
  const r3 = -n3 * r * r + 6 * n1 * n2 * r ** 3 - 6 * n1 ** 3 * r ** 4;
  return [L * r, r + L * r1, 2 * r1 + L * r2, 3 * r2 + L * r3];
}

function compose(f: number, f1: number, f2: number, f3: number, [, g1, g2, g3]: Taylor3): Taylor3 {
  return [f, f1 * g1, f2 * g1 * g1 + f1 * g2, f3 * g1 ** 3 + 3 * f2 * g1 * g2 + f1 * g3];
}
