/** Amplitudes and powers of s and p at the surface of a metal, over angles and indices: the core against a loop by hand. */

import { fresnel } from '../../src/interface/fresnel.ts';
import { writeSurface } from '../../src/interface/fresnel-kernel.ts';
import { opticsFromIndex } from '../../src/interface/optics.ts';
import { ONE } from '../../src/num/complex.ts';
import { race } from './race.ts';

const COUNT = 2048;
const angles_rad = Float64Array.from({ length: COUNT }, (_, i) => (1.5 * i) / COUNT);
const n2 = Float64Array.from({ length: COUNT }, (_, i) => 0.2 + i / COUNT);
const k2 = Float64Array.from({ length: COUNT }, (_, i) => 3 + i / COUNT);
const STRIDE = 8;
const out = new Float64Array(COUNT * STRIDE);

/** From vacuum into n + ik, the way one would write it down: cosines, then the four amplitudes' formulas. */
function hand(): void {
  for (let i = 0; i < COUNT; i++) {
    const n = n2[i]!;
    const k = k2[i]!;
    const cos = Math.cos(angles_rad[i]!);
    const sin = Math.sin(angles_rad[i]!);
    const er = n * n - k * k;
    const ei = 2 * n * k;
    const wr = er - sin * sin;
    const m = Math.sqrt(wr * wr + ei * ei);
    let br: number;
    let bi: number;
    if (wr >= 0) {
      br = Math.sqrt((m + wr) / 2);
      bi = br === 0 ? 0 : ei / (2 * br);
    } else {
      bi = Math.sqrt((m - wr) / 2);
      br = ei / (2 * bi);
    }
    const sd = 1 / ((cos + br) * (cos + br) + bi * bi);
    const rsr = ((cos - br) * (cos + br) - bi * bi) * sd;
    const rsi = -2 * cos * bi * sd;
    const ar = er * cos;
    const ai = ei * cos;
    const pr = ar + br;
    const pi = ai + bi;
    const pd = 1 / (pr * pr + pi * pi);
    const rpr = ((ar - br) * pr + (ai - bi) * pi) * pd;
    const rpi = ((ai - bi) * pr - (ar - br) * pi) * pd;
    const o = i * STRIDE;
    out[o] = rsr;
    out[o + 1] = rsi;
    out[o + 2] = rpr;
    out[o + 3] = rpi;
    out[o + 4] = rsr * rsr + rsi * rsi;
    out[o + 5] = rpr * rpr + rpi * rpi;
    out[o + 6] = 4 * cos * br * sd;
    out[o + 7] = 4 * cos * (er * br + ei * bi) * pd;
  }
}

const VACUUM = opticsFromIndex(ONE, ONE);
const sides = Array.from({ length: COUNT }, (_, i) => opticsFromIndex({ re: n2[i]!, im: k2[i]! }, ONE));

function viaRecords(): void {
  for (let i = 0; i < COUNT; i++) {
    const { rs, rp, Rs, Rp, Ts, Tp } = fresnel(VACUUM, sides[i]!, angles_rad[i]!);
    const o = i * STRIDE;
    out[o] = rs.re;
    out[o + 1] = rs.im;
    out[o + 2] = rp.re;
    out[o + 3] = rp.im;
    out[o + 4] = Rs;
    out[o + 5] = Rp;
    out[o + 6] = Ts;
    out[o + 7] = Tp;
  }
}

function viaNumbers(): void {
  for (let i = 0; i < COUNT; i++)
    writeSurface(1, 0, n2[i]!, k2[i]!, Math.cos(angles_rad[i]!), out, i * STRIDE);
}

race({
  numbers: { hand, core: viaNumbers, result: () => out, evaluations: COUNT, repeats: 3 },
  records: { hand, core: viaRecords, result: () => out, evaluations: COUNT, repeats: 1 },
});
