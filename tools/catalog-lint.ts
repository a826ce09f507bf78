/** What looks wrong in the catalogue without breaking a rule: swapped columns or axes, names that several entries share. Pure. */
import type { CheckedValue } from '../src/catalog/check-values.ts';
import { bindFit, NO_STATE, opticsOf } from '../src/catalog/fit-optics.ts';
import { spellingsOf } from '../src/catalog/names.ts';
import type { Fit, Material } from '../src/catalog/types.ts';

export interface LintNote {
  readonly key: string;
  readonly message: string;
}

/** Values of n and k that agree better with each other's columns. */
export function swappedColumns(values: readonly CheckedValue[]): readonly LintNote[] {
  const rows = new Map<string, { n?: CheckedValue; k?: CheckedValue }>();
  for (const v of values) {
    if (v.quantity !== 'n' && v.quantity !== 'k') continue;
    const id = [v.key, v.axis, v.fit, v.source, v.wavelength_um].join('|');
    const row = rows.get(id) ?? {};
    row[v.quantity] = v;
    rows.set(id, row);
  }
  const notes: LintNote[] = [];
  for (const { n, k } of rows.values()) {
    if (!n || !k) continue;
    const straight = Math.abs(n.computed - n.published) + Math.abs(k.computed - k.published);
    const crossed = Math.abs(n.computed - k.published) + Math.abs(k.computed - n.published);
    if (crossed < straight / 3)
      notes.push({
        key: n.key,
        message: `n and k look swapped at ${n.wavelength_um} um in fit ${n.fit} or in "${n.source}"`,
      });
  }
  return notes;
}

/** Check groups of one axis that agree better with a fit of another, and second opinions that side with another axis. */
export function swappedAxes(material: Material, values: readonly CheckedValue[]): readonly LintNote[] {
  const crystal = material.fits.filter((f) => f.axis !== 'isotropic');
  const notes: LintNote[] = [];
  const groups = new Map<string, CheckedValue[]>();
  for (const v of values) {
    if (v.quantity !== 'n' || v.tolerance === undefined || v.axis === 'several') continue;
    const id = [v.axis, v.fit, v.source].join('|');
    groups.set(id, [...(groups.get(id) ?? []), v]);
  }
  for (const group of groups.values()) {
    const [first] = group;
    if (!first) continue;
    for (const other of crystal.filter((f) => f.axis !== first.axis && f.recommended)) {
      const inside = group.filter((v) => covers(other, v.wavelength_um));
      const closer = inside.filter((v) => {
        const there = Math.abs(indexOf(other, v.wavelength_um ?? Number.NaN) - v.published);
        return there < Math.abs(v.computed - v.published) / 3;
      });
      if (inside.length > 0 && closer.length > inside.length / 2)
        notes.push({
          key: material.key,
          message: `"${first.source}" stands under the ${first.axis} axis and agrees with the ${other.axis} one`,
        });
    }
  }
  for (const second of crystal.filter((f) => !f.recommended)) {
    const distance = (to: Fit): number | undefined => {
      const lo = Math.max(second.range_um[0], to.range_um[0]);
      const hi = Math.min(second.range_um[1], to.range_um[1]);
      if (lo > hi) return undefined;
      const middle_um = Math.sqrt(lo * hi);
      return Math.abs(indexOf(second, middle_um) - indexOf(to, middle_um));
    };
    const nearest = (axisMatches: boolean): number =>
      Math.min(
        ...crystal
          .filter((f) => f.recommended && (f.axis === second.axis) === axisMatches)
          .map((f) => distance(f) ?? Number.POSITIVE_INFINITY),
      );
    const own = nearest(true);
    if (Number.isFinite(own) && nearest(false) < own / 3)
      notes.push({
        key: material.key,
        message: `fit ${second.id} stands under the ${second.axis} axis and agrees with another`,
      });
  }
  return notes;
}

const covers = (fit: Fit, wavelength_um = Number.NaN): boolean =>
  wavelength_um >= fit.range_um[0] && wavelength_um <= fit.range_um[1];

const indexOf = (fit: Fit, wavelength_um: number): number =>
  opticsOf(fit, wavelength_um, bindFit(fit, NO_STATE)).n;

/** Names and aliases (glass codes and formulas are shared by nature) that two entries claim, in any spelling. */
export function sharedNames(materials: readonly Material[]): readonly LintNote[] {
  const owners = new Map<string, Map<string, string>>();
  for (const material of materials)
    for (const s of spellingsOf(material)) {
      // An alias that repeats the code is a code.
      if (s.kind === 'formula' || s.kind === 'code' || /^\d{6}$/.test(s.tight)) continue;
      const of = owners.get(s.tight) ?? new Map<string, string>();
      if (!of.has(s.key)) of.set(s.key, `${s.kind} "${s.text}" of ${s.key}`);
      owners.set(s.tight, of);
    }
  return [...owners.values()]
    .filter((of) => of.size > 1)
    .map((of) => ({
      key: [...of.keys()].join(' and '),
      message: `share a name: ${[...of.values()].join(', ')}`,
    }));
}
