/** Losses, forces, polarisation, uncertainty: published values. Each row carries its source; see `check-rows.ts`. */

import { radiationPressure_Pa } from '../../../src/interface/energy.ts';
import { opticsFromIndex } from '../../../src/interface/optics.ts';
import { arg, div, ONE } from '../../../src/num/complex.ts';
import { quarterWaveFilmReflectance } from '../../../src/stack/coating.ts';
import { coherentStack } from '../../../src/stack/coherent-stack.ts';
import { ghostRipple } from '../../../src/stack/etalon.ts';
import { layerFromIndex, substanceFromIndex } from '../../../src/stack/layered-path.ts';
import { mixedStack } from '../../../src/stack/mixed-stack.ts';
import { insertionLoss_dB } from '../../../src/stack/window.ts';
import { checkRows, row } from './check-rows.ts';

const VACUUM = opticsFromIndex(ONE, ONE);
/** On a body in vacuum that lets nothing through; of a beam of one square metre it is the force in newton. */
const pressureOnBlack_Pa = (irradiance_W_per_m2: number, R: number): number =>
  radiationPressure_Pa(VACUUM, VACUUM, ONE, R, 0, 0, irradiance_W_per_m2) ?? Number.NaN;

const deg = Math.PI / 180;
const air = substanceFromIndex(1);
const face = (n: number, k: number, angle_rad: number) =>
  coherentStack({ incidence: air, layers: [], exit: substanceFromIndex(n, k) }, 1e-6, angle_rad);
const between = (n1: number, n2: number) =>
  coherentStack({ incidence: substanceFromIndex(n1), layers: [], exit: substanceFromIndex(n2) }, 1e-6, 0).s;
const loss_dB = (fraction: number): number => insertionLoss_dB(fraction) ?? Number.NaN;
const H = 1e-5;
/** Slope of a reflectance by central difference; what a stack's R answers to a change of n or k. */
const slope = (R: (x: number) => number): number => (R(H) - R(-H)) / (2 * H);

checkRows('Losses, forces, polarisation, uncertainty', [
  row({
    id: 'db-senior',
    quantity: 'insertion loss of one glass/air interface, n=1.5',
    inputs: { n1: 1.5, n2: 1 },
    unit: 'dB',
    wanted: 0.18,
    tolerance: 0.005,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'Senior ex. 5.1 p. 220 (0.18 dB each)',
    kind: 'published',
    fromMemory: false,
    got: ({ n1, n2 }) => loss_dB(between(n1, n2).T),
  }),
  row({
    id: 'db-keiser',
    quantity: 'loss GaAs 3.6 -> silica 1.48',
    inputs: { n1: 3.6, n2: 1.48 },
    unit: 'dB',
    wanted: 0.83,
    tolerance: 0.005,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'Keiser ex. 5.3 p. 194',
    kind: 'published',
    fromMemory: false,
    got: ({ n1, n2 }) => loss_dB(between(n1, n2).T),
  }),
  row({
    id: 'db-apc',
    quantity: 'return loss of a fibre end n=1.4682 in air',
    inputs: { n1: 1.4682, n2: 1 },
    unit: 'dB',
    wanted: 14.4,
    tolerance: 0.06,
    toleranceBasis: 'widened: practice value',
    source: 'common practice: open fibre end about -14.4 to -14.7 dB',
    kind: 'common practice',
    fromMemory: true,
    got: ({ n1, n2 }) => loss_dB(between(n1, n2).R),
  }),
  row({
    id: 'db-ghost-30',
    quantity: 'peak of the ripple caused by a -30 dB ghost (in phase)',
    inputs: { ghost_dB: -30 },
    unit: 'dB',
    wanted: 0.27,
    tolerance: 0.005,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'antenna-range practice: -30 dB echo = +0.27/-0.28 dB',
    kind: 'common practice',
    fromMemory: true,
    got: ({ ghost_dB }) => ghostRipple(10 ** (ghost_dB / 10)).inPhase_dB,
  }),
  row({
    id: 'db-ar',
    quantity: 'return loss of a MgF2-coated crown surface, 1.26 %',
    inputs: { n_film: 1.38, n_sub: 1.52 },
    unit: 'dB',
    wanted: 19.0,
    tolerance: 0.05,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'from Smith ch. 11 exercise 1',
    kind: 'published',
    fromMemory: false,
    got: ({ n_film, n_sub }) => loss_dB(quarterWaveFilmReflectance(1, n_film, n_sub)),
  }),
  row({
    id: 'rp-1361-abs',
    quantity: 'pressure of 1361 W/m^2, absorbed',
    inputs: { I_W_m2: 1361, R: 0 },
    unit: 'uPa',
    wanted: 4.54,
    tolerance: 0.005,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'solar constant 1361 W/m^2 (4.54 uPa)',
    kind: 'published',
    fromMemory: true,
    got: ({ I_W_m2, R }) => pressureOnBlack_Pa(I_W_m2, R) * 1e6,
  }),
  row({
    id: 'rp-1370',
    quantity: 'pressure of 1370 W/m^2, absorbed',
    inputs: { I_W_m2: 1370, R: 0 },
    unit: 'uPa',
    wanted: 4.6,
    tolerance: 0.05,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'encyclopaedia article',
    kind: 'published',
    fromMemory: false,
    got: ({ I_W_m2, R }) => pressureOnBlack_Pa(I_W_m2, R) * 1e6,
  }),
  row({
    id: 'rp-1400',
    quantity: 'pressure of 1400 W/m^2, absorbed',
    inputs: { I_W_m2: 1400, R: 0 },
    unit: 'uPa',
    wanted: 4.7,
    tolerance: 0.05,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'Halliday & Resnick problem, 1.4 kW/m^2',
    kind: 'published',
    fromMemory: false,
    got: ({ I_W_m2, R }) => pressureOnBlack_Pa(I_W_m2, R) * 1e6,
  }),
  row({
    id: 'rp-1W',
    quantity: 'force of 1 W absorbed',
    inputs: { P_W: 1, R: 0 },
    unit: 'nN',
    wanted: 3.336,
    tolerance: 0.0005,
    toleranceBasis: 'numerical or printed digits',
    source: 'common practice (3.3 nN/W)',
    kind: 'exact',
    fromMemory: true,
    got: ({ P_W, R }) => pressureOnBlack_Pa(P_W, R) * 1e9,
  }),
  row({
    id: 'pol-45',
    quantity: 'degree of polarisation by reflection at 45 deg, n=1.5',
    inputs: { n2: 1.5, angle_deg: 45 },
    unit: '%',
    wanted: 83.15,
    tolerance: 0.005,
    toleranceBasis: 'numerical or printed digits',
    source: '(Rs-Rp)/(Rs+Rp) = (1-Rs)/(1+Rs) at 45 deg',
    kind: 'exact',
    fromMemory: true,
    got: ({ n2, angle_deg }) => {
      const { s, p } = face(n2, 0, angle_deg * deg);
      return (100 * (s.R - p.R)) / (s.R + p.R);
    },
  }),
  row({
    id: 'pol-plate-10',
    quantity: 'same, 10 plates',
    inputs: { n: 1.5, plates: 10 },
    unit: '1',
    wanted: 0.6345177664974619,
    tolerance: 1e-9,
    toleranceBasis: 'numerical or printed digits',
    source: 'Jenkins & White formula',
    kind: 'exact',
    fromMemory: true,
    got: ({ n, plates }) => {
      const layers = Array.from({ length: 2 * plates - 1 }, (_, i) => ({
        ...layerFromIndex(1e-3, i % 2 ? 1 : n),
        coherent: false,
      }));
      const { s, p } = mixedStack({ incidence: air, layers, exit: air }, 5e-7, Math.atan(n), 0);
      return (p.T - s.T) / (p.T + s.T);
    },
  }),
  row({
    id: 'ell-diel',
    quantity: 'Delta of a bare dielectric below Brewster',
    inputs: { n2: 1.5, angle_deg: 50 },
    unit: 'deg',
    wanted: 180.0,
    tolerance: 1e-9,
    toleranceBasis: 'numerical or printed digits',
    source: 'Azzam & Bashara sign (Nebraska convention)',
    kind: 'exact',
    fromMemory: true,
    got: ({ n2, angle_deg }) => {
      const { s, p } = face(n2, 0, angle_deg * deg);
      return Math.abs(arg(div(p.r, s.r))) / deg;
    },
  }),
  row({
    id: 'ell-inv',
    quantity: 'n from psi, Delta (pseudo-dielectric function round trip), n=3.87+0.02i at 70 deg',
    inputs: { n: 3.87, k: 0.02, angle_deg: 70 },
    unit: '1',
    wanted: 3.87,
    tolerance: 1e-9,
    toleranceBasis: 'numerical or printed digits',
    source: 'Azzam & Bashara eq. 4.33',
    kind: 'exact',
    fromMemory: true,
    got: ({ n, k, angle_deg }) => {
      // <eps> = sin^2 (1 + tan^2 ((1 - rho)/(1 + rho))^2), n the real part of its root.
      const { s, p } = face(n, k, angle_deg * deg);
      const rho = div(p.r, s.r);
      const x = div({ re: 1 - rho.re, im: -rho.im }, { re: 1 + rho.re, im: rho.im });
      const [sin2, tan2] = [Math.sin(angle_deg * deg) ** 2, Math.tan(angle_deg * deg) ** 2];
      const re = sin2 * (1 + tan2 * (x.re * x.re - x.im * x.im));
      const im = sin2 * tan2 * 2 * x.re * x.im;
      return Math.sqrt((Math.hypot(re, im) + re) / 2);
    },
  }),
  row({
    id: 'ell-si-del',
    quantity: 'Delta of bare silicon 3.87 - 0.02i in the e^{+iwt} convention of ellipsometer makers',
    inputs: { n: 3.87, k: 0.02, angle_deg: 70 },
    unit: 'deg',
    wanted: 179.2,
    tolerance: 0.3,
    toleranceBasis: 'widened: optical constants of silicon not given to enough digits',
    source: "Tompkins, A User's Guide to Ellipsometry (about 179.2 deg)",
    kind: 'common practice',
    fromMemory: true,
    note: 'this sheet uses e^{-iwt}, n + ik: arg(r_p/r_s) = 360 deg - Delta(maker)',
    got: ({ n, k, angle_deg }) => {
      const { s, p } = face(n, k, angle_deg * deg);
      return (360 - arg(div(p.r, s.r)) / deg) % 360;
    },
  }),
  row({
    id: 'unc-dRdn',
    quantity: 'dR/dn at normal incidence, n=1.5',
    inputs: { n2: 1.5 },
    unit: '1',
    wanted: 0.128,
    tolerance: 1e-9,
    toleranceBasis: 'numerical or printed digits',
    source: '4(n-1)/(n+1)^3',
    kind: 'exact',
    fromMemory: true,
    got: ({ n2 }) => slope((x) => face(n2 + x, 0, 0).s.R),
  }),
  row({
    id: 'unc-rel',
    quantity: 'relative uncertainty of R for u(n)=1e-4 at n=1.5',
    inputs: { n2: 1.5, u_n: 0.0001 },
    unit: '%',
    wanted: 0.032,
    tolerance: 1e-6,
    toleranceBasis: 'numerical or printed digits',
    source: 'propagation',
    kind: 'exact',
    fromMemory: true,
    got: ({ n2, u_n }) => (100 * slope((x) => face(n2 + x, 0, 0).s.R) * u_n) / face(n2, 0, 0).s.R,
  }),
  row({
    id: 'unc-analytic-n',
    quantity: 'dR_p/dn of 0.3+3.2i at 0.8 rad: closed form against finite difference',
    inputs: { n2: '0.3+3.2i', angle_rad: 0.8, pol: 'p' },
    unit: '1',
    wanted: -0.4202557826245687,
    tolerance: 1e-7,
    toleranceBasis: 'numerical or printed digits',
    source: 'closed form S13',
    kind: 'exact',
    fromMemory: true,
    got: ({ angle_rad }) => slope((x) => face(0.3 + x, 3.2, angle_rad).p.R),
  }),
  row({
    id: 'unc-analytic-k',
    quantity: 'dR_p/dk, same',
    inputs: { n2: '0.3+3.2i', angle_rad: 0.8, pol: 'p' },
    unit: '1',
    wanted: 0.0702595461532409,
    tolerance: 1e-7,
    toleranceBasis: 'numerical or printed digits',
    source: 'closed form S13',
    kind: 'exact',
    fromMemory: true,
    got: ({ angle_rad }) => slope((x) => face(0.3, 3.2 + x, angle_rad).p.R),
  }),
]);
