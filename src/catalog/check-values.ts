/**
 * Recomputes the published values that an entry carries: every row of every check group, the Abbe numbers of its fits, and
 * what several fits make together. Pure; the self-test of the program, the test-suite and the catalogue tool all use it.
 */
import { standardAirIndex } from '../dispersion/air-index.ts';
import { SPECTRAL_LINES } from '../units/spectral-lines.ts';
import { bindFit, NO_STATE, opticsOf, QUANTITIES, STATES } from './fit-optics.ts';
import type { Axis, CheckGroup, Fit, Grade, Material } from './types.ts';

/** One published number and what the program makes of it. */
export interface CheckedValue {
  readonly key: string;
  readonly axis: Axis | 'several';
  readonly fit: string;
  readonly grade: Grade;
  readonly source: string;
  /** The published value was quoted from memory. */
  readonly recalled: boolean;
  readonly independent: boolean;
  /** Column name, which carries the unit: n, k, R, eps1, skinDepth_um, Vd ... */
  readonly quantity: string;
  /** Absent for Abbe numbers. */
  readonly wavelength_um?: number;
  readonly published: number;
  readonly computed: number;
  /** Absent where the value documents a limit of the fit: it is then neither passed nor failed. */
  readonly tolerance?: number;
  readonly setAside?: string;
}

/** True unless a tolerance is stated and exceeded (or nothing could be computed). */
export function passes(value: CheckedValue): boolean {
  if (value.tolerance === undefined) return true;
  // A tolerance given to the last printed digit must not fail by the rounding of a double.
  const slack = 1e-12 * Math.max(1, Math.abs(value.published));
  return Math.abs(value.computed - value.published) <= value.tolerance + slack;
}

/** All check values of a material whose fits carry their `checks`. */
export function checkValues(material: Material): readonly CheckedValue[] {
  return [
    ...material.fits.flatMap((fit) => [
      ...fit.checks.flatMap((group) => checkGroup(material.key, fit, group)),
      ...abbeNumbers(material.key, fit),
    ]),
    ...compositeValues(material),
  ];
}

function checkGroup(key: string, fit: Fit, group: CheckGroup): readonly CheckedValue[] {
  const column = new Map(group.columns.map((name, i) => [name, i]));
  const quantities = group.columns.filter((name) => Object.hasOwn(QUANTITIES, name));
  const common = {
    key,
    axis: fit.axis,
    fit: fit.id,
    grade: fit.grade,
    source: group.source,
    recalled: group.recalled,
    independent: group.independent,
    ...(group.setAside === undefined ? {} : { setAside: group.setAside }),
  };
  // Rows of one state share the bound model: tables build their splines once.
  const varies = group.columns.some((name) => STATES.has(name));
  const shared = varies ? undefined : bindFit(fit, (name) => group.conditions?.[name]);
  return group.rows.flatMap((row) => {
    const cell = (name: string): number | undefined => {
      const i = column.get(name);
      return i === undefined ? undefined : row[i];
    };
    const wavelength_um = cell('wavelength_um') ?? Number.NaN;
    const state = (name: string): number | undefined => cell(name) ?? group.conditions?.[name];
    const optics = opticsOf(fit, wavelength_um, shared ?? bindFit(fit, state));
    return quantities.flatMap((quantity) => {
      const published = cell(quantity);
      const tolerance = cell(`tolerance_${quantity}`);
      if (published === undefined) return [];
      return [
        {
          ...common,
          quantity,
          wavelength_um,
          published,
          computed: QUANTITIES[quantity]?.(optics) ?? Number.NaN,
          ...(tolerance === undefined || group.setAside !== undefined ? {} : { tolerance }),
        },
      ];
    });
  });
}

/** Lines of the Abbe numbers: middle, blue, red. */
const ABBE_LINES: Readonly<Record<string, readonly [string, string, string]>> = {
  Vd: ['d', 'F', 'C'],
  Ve: ['e', "F'", "C'"],
  VD: ['D', 'F', 'C'],
};

function abbeNumbers(key: string, fit: Fit): readonly CheckedValue[] {
  if (!fit.abbe) return [];
  const n = (symbol: string): number => {
    const air_um = (SPECTRAL_LINES.find((l) => l.symbol === symbol)?.airWavelength_m ?? Number.NaN) * 1e6;
    const wavelength_um = fit.reference === 'air' ? air_um : air_um * standardAirIndex(air_um);
    return opticsOf(fit, wavelength_um, bindFit(fit, NO_STATE)).nInAir;
  };
  return fit.abbe.map(({ quantity, published, tolerance, source }) => {
    const [middle, blue, red] = ABBE_LINES[quantity] ?? ['', '', ''];
    return {
      key,
      axis: fit.axis,
      fit: fit.id,
      grade: fit.grade,
      source,
      recalled: false,
      independent: false,
      quantity,
      published,
      computed: (n(middle) - 1) / (n(blue) - n(red)),
      tolerance,
    };
  });
}

function compositeValues(material: Material): readonly CheckedValue[] {
  return (material.compositeChecks ?? []).flatMap((check) =>
    check.rows.map(([wavelength_um = Number.NaN, published = Number.NaN, tolerance = Number.NaN]) => {
      const fits: Fit[] = [];
      const n = (axis: Axis): number => {
        const fit = material.fits.find((f) => f.axis === axis && f.recommended && covers(f, wavelength_um));
        if (!fit) return Number.NaN;
        fits.push(fit);
        return opticsOf(fit, wavelength_um, bindFit(fit, NO_STATE)).n;
      };
      const computed =
        check.quantity === 'mean-index'
          ? (2 * n('ordinary') + n('extraordinary')) / 3
          : opticAngle_deg(n('x'), n('y'), n('z'));
      return {
        key: material.key,
        axis: 'several' as const,
        fit: fits.map((f) => f.id).join(' + '),
        // A chain is as strong as its weakest link; grades run A, B, C.
        grade:
          fits
            .map((f) => f.grade)
            .sort()
            .at(-1) ?? 'C',
        source: check.source,
        recalled: check.recalled,
        independent: true,
        quantity: check.quantity,
        wavelength_um,
        published,
        computed,
        tolerance,
      };
    }),
  );
}

const covers = (fit: Fit, wavelength_um: number): boolean =>
  wavelength_um >= fit.range_um[0] && wavelength_um <= fit.range_um[1];

/** Angle from z to an optic axis in the x-z plane of a biaxial crystal with n_x < n_y < n_z (M. Born, E. Wolf, Principles of Optics, sec. 15.3). */
function opticAngle_deg(nx: number, ny: number, nz: number): number {
  const tan = (nz / nx) * Math.sqrt((ny * ny - nx * nx) / (nz * nz - ny * ny));
  return (Math.atan(tan) * 180) / Math.PI;
}
