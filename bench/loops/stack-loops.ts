/** A mirror of 60 layers over 2,000 waves, s and p: `scanStack` against a characteristic-matrix loop by hand. */
import { scanStack, substanceScanFromIndex } from '../../src/stack/stack-scan.ts';
import { race } from './race.ts';

const LAYERS = 60;
/** Of 2,000 between 450 and 950 nm, two hundred at a time: a call over all of them is seldom left in peace. */
const WAVES = 200;
const wavelength_m = Float64Array.from({ length: WAVES }, (_, i) => 600e-9 + 0.25e-9 * i);
const angle_rad = Float64Array.of(0.5);
/** Air, two materials with a little dispersion, a glass. */
const high = wavelength_m.map((L) => 2.2 + 2e-14 / (L * L));
const low = wavelength_m.map((L) => 1.45 + 3e-15 / (L * L));
const n0 = Float64Array.of(1);
const n3 = Float64Array.of(1.52);
const thickness_m = Array.from({ length: LAYERS }, (_, j) =>
  j % 2 === 0 ? 633e-9 / 4 / 2.25 : 633e-9 / 4 / 1.46,
);
const scan = {
  vacuumWavelength_m: wavelength_m,
  incidenceAngle_rad: angle_rad,
  substances: [n0, high, low, n3].map((n) => substanceScanFromIndex(n)),
  incidence: 0,
  exit: 3,
  layerSubstance: Array.from({ length: LAYERS }, (_, j) => 1 + (j % 2)),
  thickness_m,
};
const out = new Float64Array(4 * WAVES);

function hand(): void {
  const q = Math.sin(angle_rad[0]!);
  for (let i = 0; i < WAVES; i++) {
    const L = wavelength_m[i]!;
    const k0 = (2 * Math.PI) / L;
    for (let side = 0; side < 2; side++) {
      const nExit = n3[0]!;
      const cosExit = Math.sqrt(nExit * nExit - q * q);
      const yExit = side === 0 ? cosExit : (nExit * nExit) / cosExit;
      let er = 1;
      let ei = 0;
      let hr = yExit;
      let hi = 0;
      for (let j = LAYERS - 1; j >= 0; j--) {
        const n = j % 2 === 0 ? high[i]! : low[i]!;
        const kappa = Math.sqrt(n * n - q * q);
        const y = side === 0 ? kappa : (n * n) / kappa;
        const phase = k0 * kappa * thickness_m[j]!;
        const c = Math.cos(phase);
        const s = Math.sin(phase);
        const nextEr = c * er + (s * hi) / y;
        const nextEi = c * ei - (s * hr) / y;
        hr = c * hr + s * y * ei;
        hi = c * hi - s * y * er;
        // The new E is stored last: both lines above need the old one.
        er = nextEr;
        ei = nextEi;
      }
      const cos = Math.sqrt(1 - q * q);
      const y0 = side === 0 ? cos : 1 / cos;
      const ar = y0 * er + hr;
      const ai = y0 * ei + hi;
      const br = y0 * er - hr;
      const bi = y0 * ei - hi;
      const d = 1 / (ar * ar + ai * ai);
      out[side * WAVES + i] = (br * br + bi * bi) * d;
      out[(2 + side) * WAVES + i] = 4 * y0 * yExit * d;
    }
  }
}

function core(): void {
  const { s, p } = scanStack(scan);
  out.set(s.R, 0);
  out.set(p.R, WAVES);
  out.set(s.T, 2 * WAVES);
  out.set(p.T, 3 * WAVES);
}

race({ stack: { hand, core, result: () => out, evaluations: LAYERS * WAVES * 2, repeats: 1 } });
