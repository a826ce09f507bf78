/**
 * One material on one axis, under the criteria's wave, measured only as far as it is asked. A measure is a number, or the reason
 * why the catalogue has none.
 */
import { type FitWave, inRange } from '../catalog/choose-fit.ts';
import type { Axis, Material } from '../catalog/types.ts';
import type { Optics } from '../interface/optics.ts';
import { abbeVd } from './abbe-numbers.ts';
import { airAround, plateFractions, surfaceReflectance } from './plate-loss.ts';
import {
  type QuickMedium,
  type QuickOptics,
  quickGroupIndex,
  quickGvd_s2_per_m,
  quickMedium,
  quickOptics,
} from './quick-medium.ts';
import type { Survey } from './survey.ts';
import { type Undecided, undecided } from './undecided.ts';

export interface Loss {
  /** Of the incident power. */
  readonly fraction: number;
  /** False: absorption at the wave is not on file, though the wave lies in the transparency range: surfaces only. */
  readonly absorptionKnown: boolean;
}

export class Candidate {
  readonly material: Material;
  readonly axis: Axis;
  readonly wave: FitWave | undefined;
  /** Undefined: each fit at the temperature it holds for. */
  readonly temperature_K: number | undefined;
  private readonly survey: Survey;
  private quick: QuickMedium | undefined | null = null;
  private matter: QuickOptics | undefined;
  private spread: number | Undecided | undefined;
  private dispersion: number | Undecided | undefined;

  constructor(
    survey: Survey,
    material: Material,
    axis: Axis,
    wave: FitWave | undefined,
    temperature_K?: number,
  ) {
    this.survey = survey;
    this.material = material;
    this.axis = axis;
    this.wave = wave;
    this.temperature_K = temperature_K;
  }

  /** Undefined where no data reach the wave, or no wave is given. */
  get medium(): QuickMedium | undefined {
    if (this.quick === null) {
      this.quick = this.wave && this.measure(this.axis, this.wave);
    }
    return this.quick;
  }

  private measure(axis: Axis, wave: FitWave): QuickMedium | undefined {
    return quickMedium(this.survey, this.material, axis, wave, this.temperature_K);
  }

  private get known(): QuickOptics | undefined {
    if (!this.medium) return undefined;
    this.matter ??= quickOptics(this.survey, this.medium);
    return this.matter;
  }

  /** Undefined where no data reach the wave. */
  get optics(): Optics | undefined {
    return this.known?.optics;
  }

  /** The same material and wave on another axis. */
  onAxis(axis: Axis): Candidate {
    return new Candidate(this.survey, this.material, axis, this.wave, this.temperature_K);
  }

  get n(): number | Undecided {
    return this.medium?.n ?? undecided('no-data-at-wave');
  }

  get groupIndex(): number | Undecided {
    if (!this.medium) return undecided('no-data-at-wave');
    return quickGroupIndex(this.medium) ?? undecided('no-dispersion');
  }

  get gvd_s2_per_m(): number | Undecided {
    if (!this.medium) return undecided('no-data-at-wave');
    return quickGvd_s2_per_m(this.medium) ?? undecided('no-dispersion');
  }

  get abbe(): number | Undecided {
    this.dispersion ??= abbeVd(this.survey, this.material, this.axis) ?? undecided('abbe-lines-not-reached');
    return this.dispersion;
  }

  /** n_e - n_o, or n_z - n_x; 0 for an isotropic medium. Needs every axis at the wave. */
  get birefringence(): number | Undecided {
    this.spread ??= this.measureBirefringence();
    return this.spread;
  }

  private measureBirefringence(): number | Undecided {
    const { wave, material } = this;
    if (!wave) return undecided('no-data-at-wave');
    const at = (axis: Axis): number | undefined => this.measure(axis, wave)?.n;
    const reached = new Set(material.fits.filter((fit) => inRange(fit, wave)).map((fit) => fit.axis));
    if (reached.size === 0) return undecided('no-data-at-wave');
    if (reached.has('isotropic')) return 0;
    const [low, high] =
      reached.has('x') || reached.has('z') ? [at('x'), at('z')] : [at('ordinary'), at('extraordinary')];
    return low === undefined || high === undefined ? undecided('one-axis-on-file') : high - low;
  }

  /** Reflectance of one surface in air. */
  get surface(): number | Undecided {
    if (!this.known || !this.wave) return undecided('no-data-at-wave');
    return surfaceReflectance(airAround(this.survey, this.wave), this.known.optics);
  }

  /** Of a plate where a thickness is given, else of one surface. */
  loss(thickness_m: number | undefined): Loss | Undecided {
    const { known, wave } = this;
    if (!known || !wave) return undecided('no-data-at-wave');
    const air = airAround(this.survey, wave);
    const { absorptionKnown } = known;
    if (thickness_m === undefined)
      return { fraction: surfaceReflectance(air, known.optics), absorptionKnown };
    if (!absorptionKnown && !this.isClear([wave.vacuum_um * 1e-6, wave.vacuum_um * 1e-6])) {
      return undecided('absorption-not-known');
    }
    return { fraction: lossOf(air, known.optics, thickness_m, wave), absorptionKnown };
  }

  /** Whether the transparency range on file covers the span; undefined where there is none on file. */
  isClear([from_m, to_m]: readonly [number, number]): boolean | undefined {
    const range = this.material.transparency_um;
    // The ends are printed numbers: the last bit of a conversion does not count.
    return range && range[0] * 1e-6 <= from_m * (1 + 1e-9) && to_m * (1 - 1e-9) <= range[1] * 1e-6;
  }
}

const lossOf = (air: Optics, inside: Optics, thickness_m: number, wave: FitWave): number =>
  plateFractions(air, inside, thickness_m, wave.vacuum_um * 1e-6).loss;
