/**
 * The sum of intensities over coherent groups with slabs between them, for one polarization: the recursion behind
 * `mixed-stack.ts`.
 *
 * It runs on |E|^2 of the tangential fields, so that no power is divided by Re y of a lossy slab, and carries 1 - R beside R,
 * taken from the powers absorbed and transmitted: between total reflections the difference would have no digits left.
 */
import { abs2, type Complex } from '../num/complex.ts';
import type { StackFractions } from './coherent-stack.ts';
import {
  isLossless,
  type Layer,
  type LayeredPath,
  type Polarization,
  type Substance,
} from './layered-path.ts';
import {
  exitFlux,
  incidentAdmittance,
  solveStack,
  tangentialReflection,
  tangentialTransmission,
  writeDissipations,
} from './solved-stack.ts';

export interface MixedFractions extends StackFractions {
  /** Reflectance met from the exit side at the conjugate angle. T is the same from both sides. */
  readonly R_back: number | null;
}

/** What a slab does to one pass. */
export interface Slab {
  /** exp(-2 k0 Im kappa d), at any angle. */
  readonly internalTransmittance: number;
  /** 1 less that, to all its digits. */
  readonly internalAbsorptance: number;
}

/** Coherent layers between two media that are each a slab or an end of the path. */
export interface Group {
  readonly above: Substance;
  readonly layers: readonly Layer[];
  /** Index in the path of the first of `layers`; the slab below, if any, follows the last. */
  readonly start: number;
  readonly below: Substance;
}

/** A group met from one side: tangential r, |t|^2, power beyond and dissipated, all for unit |E|^2 of the incident wave. */
interface GroupResponse {
  readonly r: Complex;
  readonly t2: number;
  readonly flux: number;
  readonly dissipated: Float64Array;
  /** Admittance of the medium the wave comes from. */
  readonly y: Complex;
  /** 1 - |r|^2 from the powers above: near total reflection the difference itself would have no digits left. */
  readonly notReflected: number;
}

function respond(
  from: Substance,
  layers: readonly Layer[],
  to: Substance,
  kappa2: Complex,
  k0_rad_per_m: number,
  polarization: Polarization,
): GroupResponse {
  const kernel = solveStack({ incidence: from, layers, exit: to }, k0_rad_per_m, kappa2);
  const dissipated = new Float64Array(layers.length);
  writeDissipations(kernel, polarization, 1, dissipated);
  const r = tangentialReflection(kernel, polarization);
  const flux = exitFlux(kernel, polarization);
  const y = incidentAdmittance(kernel, polarization);
  return {
    r,
    t2: abs2(tangentialTransmission(kernel, polarization)),
    flux,
    dissipated,
    y,
    notReflected: notReflected(sum(dissipated) + flux, r, y),
  };
}

/** 1 - |r|^2 from the net power: that is Re y (1 - |r|^2) + 2 Im y Im r. */
const notReflected = (net: number, r: Complex, y: Complex): number => (net - 2 * y.im * r.im) / y.re;

const sum = (values: ArrayLike<number>): number => Array.from(values).reduce((total, x) => total + x, 0);

/** What happens from group g on, for unit |E|^2 arriving at it from above. */
interface Below {
  readonly reflected: number;
  readonly notReflected: number;
  /** Net power that goes in. */
  readonly power: number;
  readonly dissipated: readonly number[];
  /** In the slab below the group: dissipated, and |E|^2 arriving at the next group. */
  readonly slabDissipated: number;
  readonly onward: number;
}

/** `slabs` tells what every layer of the path would do as a slab; `kappa2` is the squared normal wave vector over k0 in a medium. */
export function sumIntensities(
  path: LayeredPath,
  groups: readonly Group[],
  asSlab: readonly Slab[],
  kappa2: (x: Substance) => Complex,
  k0_rad_per_m: number,
  polarization: Polarization,
): MixedFractions {
  const down = groups.map((g) =>
    respond(g.above, g.layers, g.below, kappa2(g.above), k0_rad_per_m, polarization),
  );
  const up = groups.map((g) =>
    respond(g.below, [...g.layers].reverse(), g.above, kappa2(g.below), k0_rad_per_m, polarization),
  );
  // The slab below each group; none below the last.
  const slabs = groups.map((g) => asSlab[g.start + g.layers.length]);

  // From the exit up: each group together with all that lies below it.
  const below: Below[] = [];
  for (let g = groups.length - 1; g >= 0; g--) {
    const next = below[g + 1];
    const slab = slabs[g];
    below[g] =
      next && slab
        ? withSlab(down[g] as GroupResponse, up[g] as GroupResponse, slab, next, down[g + 1] as GroupResponse)
        : alone(down[g] as GroupResponse);
  }

  // From the incidence down: what arrives where, over the incident power.
  const first = below[0] as Below;
  const incident = (down[0] as GroupResponse).y.re;
  const layerAbsorptance: number[] = new Array(path.layers.length).fill(0);
  let arriving = 1 / incident;
  let T = 0;
  groups.forEach((group, g) => {
    const here = below[g] as Below;
    here.dissipated.forEach((power, j) => {
      layerAbsorptance[group.start + j] = arriving * power;
    });
    if (slabs[g]) {
      layerAbsorptance[group.start + group.layers.length] = isLossless(group.below)
        ? 0
        : arriving * here.slabDissipated;
    } else {
      T = arriving * (down[g] as GroupResponse).flux;
    }
    arriving *= here.onward;
  });
  return {
    R: first.reflected,
    T,
    A: sum(layerAbsorptance),
    layerAbsorptance,
    R_back: carriesWave(path.exit, kappa2(path.exit)) ? reflectanceFromBelow(down, up, slabs) : null,
  };
}

function alone({ r, flux, dissipated, notReflected }: GroupResponse): Below {
  return {
    reflected: abs2(r),
    notReflected,
    power: sum(dissipated) + flux,
    dissipated: [...dissipated],
    slabDissipated: 0,
    onward: 0,
  };
}

function withSlab(
  down: GroupResponse,
  up: GroupResponse,
  slab: Slab,
  next: Below,
  nextGroup: GroupResponse,
): Below {
  const tau = slab.internalTransmittance;
  const entering = down.t2 * roundTripGain(up.notReflected, slab, next.notReflected);
  const leavingBottom = entering * tau * next.reflected;
  const leavingTop = leavingBottom * tau;
  // What forward and backward wave exchange near the faces of a lossy slab: only a wave and its own reflection beat.
  const beating = up.r.im * leavingTop + nextGroup.r.im * entering * tau;
  const slabDissipated =
    up.y.re * slab.internalAbsorptance * (entering + leavingBottom) - 2 * up.y.im * beating;
  const count = down.dissipated.length;
  const dissipated = Array.from(
    down.dissipated,
    (power, j) => power + leavingTop * (up.dissipated[count - 1 - j] as number),
  );
  const power = sum(dissipated) + slabDissipated + entering * tau * next.power;
  return {
    reflected: abs2(down.r) + up.t2 * leavingTop,
    notReflected: notReflected(power, down.r, down.y),
    power,
    dissipated,
    slabDissipated,
    onward: entering * tau,
  };
}

/**
 * 1/(1 - R_above tau^2 R_below), from what is lost in a round trip rather than from what is kept. Zero where nothing is lost
 * at all: then nothing gets in either.
 */
function roundTripGain(lostAbove: number, slab: Slab, lostBelow: number): number {
  const lostInside = slab.internalAbsorptance * (1 + slab.internalTransmittance);
  const lostBeyond = lostInside + (1 - lostInside) * lostBelow;
  const lost = lostAbove + (1 - lostAbove) * lostBeyond;
  return lost > 0 ? 1 / lost : 0;
}

function reflectanceFromBelow(
  down: readonly GroupResponse[],
  up: readonly GroupResponse[],
  slabs: readonly (Slab | undefined)[],
): number {
  let above = 0;
  let lostAbove = 1;
  up.forEach(({ r, t2, notReflected }, g) => {
    const forth = down[g] as GroupResponse;
    const slab = slabs[g - 1];
    if (!slab) {
      above = abs2(r);
      lostAbove = notReflected;
      return;
    }
    const gain = roundTripGain(forth.notReflected, slab, lostAbove);
    const returned = t2 * forth.t2 * slab.internalTransmittance ** 2 * above * gain;
    above = abs2(r) + returned;
    lostAbove = notReflected - returned;
  });
  return above;
}

const carriesWave = (x: Substance, kappa2: Complex): boolean => isLossless(x) && kappa2.re > 0;
