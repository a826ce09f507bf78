/**
 * The catalogue's records as the program sees them: one `Material` per file under catalog/materials/, one bibliography of
 * CSL-JSON items. The JSON Schema in catalog/schema/ states the same for people and for other programs.
 * Units are part of every key. Missing means absent, never 0 or -1.
 */
import type { ModelParameters } from '../dispersion/parameters.ts';
import type { ThermalForm } from '../dispersion/thermal-form.ts';

export type Axis = 'isotropic' | 'ordinary' | 'extraordinary' | 'x' | 'y' | 'z';

/** A: coefficients and an independent value both read in a publication; B: one read, one recalled; C: both recalled. */
export type Grade = 'A' | 'B' | 'C';

export type Reference = 'air' | 'vacuum';

/**
 * Published values against which a fit is recomputed, grouped by where they were printed.
 *
 * Columns: `wavelength_um` first; then the states of the medium that vary from row to row (the names of `Conditions` or
 * `temperature_C`, `vapourPressure_Pa`); then the published quantities (`n`, `k`, `R` at normal incidence in air, `eps1`, `eps2`,
 * `lossTangent`, `sigma_S_per_m`, `skinDepth_um`, `resistivity_ohm_m`, `surfaceResistance_ohm`, `alpha_per_cm`, `mu1`,
 * `refractivity_1e6`), each with the greatest difference allowed in `tolerance_` + its name. A set-aside group has no tolerances.
 * n, and the wavelength, are in the fit's own reference.
 */
export interface CheckGroup {
  readonly source: string;
  /** True where the printed value was quoted from memory. */
  readonly recalled: boolean;
  /** Not from the authors of the coefficients. */
  readonly independent: boolean;
  /** What the values were measured at, where it differs from the fit's own conditions. */
  readonly conditions?: Record<string, number>;
  readonly columns: readonly string[];
  readonly rows: readonly (readonly number[])[];
  /** Present where the group documents a limit of the fit instead of testing it; says why. */
  readonly setAside?: string;
}

export interface Fit {
  /** Unique within the material and axis, e.g. "malitson-1965". */
  readonly id: string;
  readonly axis: Axis;
  /** False: kept as a second opinion. */
  readonly recommended: boolean;
  readonly parameters: ModelParameters;
  /** In the fit's own reference. */
  readonly range_um: readonly [number, number];
  /** Narrower range that the check values cover. */
  readonly confirmedRange_um?: readonly [number, number];
  /** Temperature of measurement; absent where the source states none or the model takes one. */
  readonly temperature_C?: number;
  readonly reference: Reference;
  /** Standard uncertainty of n as stated by (or derived from) the source; absent where none is stated. */
  readonly accuracy_n?: number;
  /** Largest disagreement with the published values it is checked against; derived when packing, guides the digits shown where no accuracy is stated. */
  readonly digitsGuide_n?: number;
  /** Change of index with temperature around `temperature_C`; see dispersion/thermal.ts. */
  readonly thermal?: ThermalForm;
  /** Part of the range in which a recommended fit is preferred, where narrower than the range. */
  readonly recommendedRange_um?: readonly [number, number];
  /** True for a curve drawn by this catalogue between two published bands, not published itself: a caution goes with it. */
  readonly estimateBetweenBands?: true;
  /** Key into the bibliography. */
  readonly source: string;
  /** Further keys: the measurement behind a published fit, the handbook a fit was read in. */
  readonly furtherSources?: readonly string[];
  /** Abbe numbers printed for the fit: Vd = (nd - 1)/(nF - nC), Ve = (ne - 1)/(nF' - nC'), VD as Vd with the sodium line. */
  readonly abbe?: readonly AbbeNumber[];
  readonly grade: Grade;
  /** True where the coefficients themselves were quoted from memory. */
  readonly recalled: boolean;
  readonly note?: string;
  readonly confirmedBy?: string;
  /** Films: how the layer was made and by how much n varies with the process. */
  readonly film?: { readonly process: string; readonly spread_n?: number };
  readonly checks: readonly CheckGroup[];
  /** Values printed elsewhere that disagree with this fit; shown, never tested. */
  readonly contradictedBy?: readonly unknown[];
}

export type { ThermalForm };

export interface AbbeNumber {
  readonly quantity: 'Vd' | 'Ve' | 'VD';
  readonly published: number;
  readonly tolerance: number;
  readonly source: string;
}

/** Published values of something that several fits make together, recomputed from the recommended ones. */
export interface CompositeCheck {
  /** `mean-index`: (2 n_o + n_e)/3, compared with a polycrystal. `optic-angle`: from z to an optic axis in the x-z plane, degrees. */
  readonly quantity: 'mean-index' | 'optic-angle';
  readonly source: string;
  readonly recalled: boolean;
  /** `wavelength_um`, then `n` or `angle_deg`, then the tolerance. */
  readonly columns: readonly string[];
  readonly rows: readonly (readonly number[])[];
}

/** Measured absorption beside a real fit: exactly one of the three value columns per row. Interpolated into k. */
export interface AbsorptionRow {
  readonly wavelength_um: number;
  readonly alpha_per_cm?: number;
  readonly k?: number;
  readonly internalTransmittance?: number;
  readonly thickness_mm?: number;
  readonly source: string;
  readonly note?: string;
}

/** Facts for the hand and for the order form; texts are short and end up in cautions. */
export interface Handling {
  readonly hygroscopic?: string;
  readonly hazard?: string;
  readonly knoop?: number;
  readonly mohs?: number;
  readonly density_g_per_cm3?: number;
  readonly melting_C?: number;
  readonly expansion_1e6_per_K?: number;
  readonly dn_dT_1e6_per_K?: number;
  readonly [other: string]: unknown;
}

export interface Material {
  readonly key: string;
  readonly name: string;
  readonly formula?: string;
  readonly aliases: readonly string[];
  readonly class: string;
  readonly maker?: string;
  readonly glassCode?: string;
  readonly fits: readonly Fit[];
  readonly compositeChecks?: readonly CompositeCheck[];
  /** Where the bulk transmits usefully (to about 10 % over a few mm unless the basis says otherwise). */
  readonly transparency_um?: readonly [number, number];
  readonly transparencyBasis?: string;
  readonly absorption?: readonly AbsorptionRow[];
  /** Normal-incidence reflectance in air of real samples that have no optical constants: wavelength_um, R. */
  readonly reflectanceTables?: readonly unknown[];
  readonly bandGap?: unknown;
  readonly handling?: Handling;
  /** Where transparency and handling facts come from. */
  readonly factsSource?: string;
  readonly note?: string;
  /** True for entries from the user's own folder. */
  readonly own?: boolean;
}

/** One CSL-JSON item (citation style language data schema 1.0), the subset used here. */
export interface Source {
  readonly id: string;
  readonly type: string;
  readonly title?: string;
  readonly author?: readonly {
    readonly family?: string;
    readonly given?: string;
    readonly literal?: string;
  }[];
  readonly issued?: { readonly 'date-parts': readonly (readonly number[])[] };
  readonly 'container-title'?: string;
  readonly volume?: string;
  readonly issue?: string;
  readonly page?: string;
  readonly publisher?: string;
  readonly DOI?: string;
  readonly URL?: string;
  readonly accessed?: { readonly 'date-parts': readonly (readonly number[])[] };
  readonly note?: string;
  /** Where the correction of the work was published, and what it changes. */
  readonly erratum?: string;
  /** Where and why the work was withdrawn. */
  readonly retraction?: string;
}
