/** The curves of an answer as charts: units, labels, marks, the ranges in which data end. Numbers are converted here, not changed. */
import type { AngleCurve } from '../answer/angle-curve.ts';
import type { Answer } from '../answer/answer.ts';
import type { FieldCurve } from '../answer/field-curve.ts';
import type { IndexCurve } from '../answer/index-curve.ts';
import type { WaveCurve } from '../answer/wave-curve.ts';
import { degreesText } from '../present/interface-rows.ts';
import { mediumTitle } from '../present/question-line.ts';
import { DEGREE, METRE, prefixedSymbol } from '../units/display-unit.ts';
import { columnPrefix, formatQuantity } from '../units/format-quantity.ts';
import { SCREEN } from '../units/number-style.ts';
import type { Chart, ChartMark, ChartSeries } from './chart.ts';
import { type WaveQuantity, waveAxis } from './wave-axis.ts';

const PER_RADIAN = 180 / Math.PI;
/** Absorptance below this is not drawn: a line on the axis says nothing. */
const LEAST_ABSORPTANCE = 5e-4;
/** More faces are not named one by one. */
const MOST_NAMED_FACES = 6;

/** A trace of absorption before the surface can put R a hair above 1; the scale is not to grow for that. */
const HAIR = 1e-4;

/** Below this a power is the rounding of a sum of ones. */
const NOISE = 1e-14;

const percent = (values: readonly number[]): number[] =>
  values.map((x) => (x > 1 && x < 1 + HAIR ? 100 : x < NOISE && x > -HAIR ? 0 : x * 100));

/** "Air → Fused silica", "Air → 16 layers → N-BK7". */
function shortPath({ from, layers, into }: Answer): string {
  const inner = layers.length > 2 ? [`${layers.length} layers`] : layers.map((l) => mediumTitle(l.medium));
  return [mediumTitle(from), ...inner, mediumTitle(into)].join(' → ');
}

const waveText = (answer: Answer): string =>
  formatQuantity(Number(answer.wave.vacuumWavelength_m.toPrecision(6)), METRE, 'shortest');

const degrees = (angle_rad: number): string => degreesText(Number(angle_rad.toPrecision(12)), 2, SCREEN);

/** As it was given. */
const givenDegrees = (angle_rad: number): string =>
  formatQuantity(Number((angle_rad * PER_RADIAN).toPrecision(9)), DEGREE, 'shortest');

const incidenceText = ({ geometry: { incidenceAngle_rad } }: Answer): string =>
  incidenceAngle_rad === 0 ? 'normal incidence' : givenDegrees(incidenceAngle_rad);

export function angleChart(answer: Answer, curve: AngleCurve): Chart {
  const x = curve.angle_rad.map((a) => a * PER_RADIAN);
  const mean = curve.Rs.map((s, i) => (s + (curve.Rp[i] ?? Number.NaN)) / 2);
  return {
    title: `Reflectance of ${shortPath(answer)} at ${waveText(answer)}`,
    x: { label: 'angle of incidence', unit: '°', scale: 'linear', range: [x[0] ?? 0, x.at(-1) ?? 90] },
    y: { label: 'reflectance', unit: '%', scale: 'linear' },
    series: [
      { label: 'R_s', x, y: percent(curve.Rs) },
      { label: 'R_p', x, y: percent(curve.Rp) },
      { label: 'mean', x, y: percent(mean) },
    ],
    marks: angleMarks(answer),
  };
}

function angleMarks({ interface: surface, geometry }: Answer): readonly ChartMark[] {
  const {
    brewsterAngle_rad: brewster,
    pseudoBrewsterAngle_rad: pseudo,
    criticalAngle_rad: critical,
  } = surface;
  const here = geometry.incidenceAngle_rad;
  const mark = (angle_rad: number | null, name: string): readonly ChartMark[] =>
    angle_rad === null ? [] : [{ x: angle_rad * PER_RADIAN, label: `${name} ${degrees(angle_rad)}` }];
  return [
    ...mark(brewster, 'Brewster'),
    ...(brewster === null ? mark(pseudo, 'pseudo-Brewster') : []),
    ...mark(critical, 'critical'),
    ...(here > 0 ? [{ x: here * PER_RADIAN, label: `here ${givenDegrees(here)}` }] : []),
  ];
}

/** R of a surface, of which T is the rest; R, T and what is absorbed of a path. */
export function powerChart(answer: Answer, curve: WaveCurve, quantity: WaveQuantity): Chart {
  const axis = waveAxis(curve.span_m, quantity);
  const x = curve.wavelength_m.map(axis.shown);
  const { polarization } = answer.geometry;
  const suffix = polarization === 'unpolarized' ? '' : `_${polarization}`;
  const one = (name: string, values: readonly number[]): ChartSeries => ({
    label: name + suffix,
    x,
    y: percent(values),
  });
  const A = curve.R.map((R, i) => 1 - R - (curve.T[i] ?? Number.NaN));
  const isPath = answer.layers.length > 0;
  const absorbs = isPath && A.some((value) => value > LEAST_ABSORPTANCE);
  return {
    title: `${isPath ? 'Powers' : 'Reflectance'} of ${shortPath(answer)} at ${incidenceText(answer)}`,
    x: axis.chart,
    y: { label: isPath ? 'share of the incident power' : 'reflectance', unit: '%', scale: 'linear' },
    series: [one('R', curve.R), ...(isPath ? [one('T', curve.T)] : []), ...(absorbs ? [one('A', A)] : [])],
    marks: [axis.mark(answer)],
    hatched: curve.outside.map(({ name, from_m, to_m }) => ({
      from: axis.shown(from_m),
      to: axis.shown(to_m),
      label: `outside data: ${name}`,
    })),
  };
}

export function indexChart(
  answer: Answer,
  curve: IndexCurve,
  powers: WaveCurve,
  quantity: WaveQuantity,
): Chart {
  const axis = waveAxis(powers.span_m, quantity);
  const x = curve.wavelength_m.map(axis.shown);
  const largest = (values: readonly number[]): number => Math.max(0, ...values.filter(Number.isFinite));
  const hasExtinction = largest(curve.k) > 1e-3 * largest(curve.n);
  const hasGroupIndex = curve.groupIndex.some(Number.isFinite);
  return {
    title: `Indices of ${curve.name}`,
    x: axis.chart,
    y: { label: `index of ${curve.name}`, unit: '', scale: 'linear', digits: 5 },
    series: [
      { label: 'n', x, y: curve.n },
      ...(hasGroupIndex ? [{ label: 'n_g', x, y: curve.groupIndex }] : []),
      ...(hasExtinction ? [{ label: 'k', x, y: curve.k }] : []),
    ],
    marks: [axis.mark(answer)],
    hatched: powers.outside
      .filter(({ name }) => name === curve.name)
      .map(({ name, from_m, to_m }) => ({
        from: axis.shown(from_m),
        to: axis.shown(to_m),
        label: `outside data: ${name}`,
      })),
  };
}

export function fieldChart(answer: Answer, curve: FieldCurve): Chart {
  const prefix = columnPrefix(curve.position_m, METRE);
  const shown = (position_m: number): number => position_m * 10 ** -prefix.power;
  const x = curve.position_m.map(shown);
  const { faces } = curve;
  const last = faces.length - 1;
  const named =
    faces.length <= MOST_NAMED_FACES
      ? faces
      : [
          { ...faces[0], position_m: 0, name: 'first face' },
          { position_m: faces[last]?.position_m ?? 0, name: 'last face' },
        ];
  const series: ChartSeries[] = [];
  const isOne = curve.s !== null && answer.geometry.incidenceAngle_rad === 0;
  if (curve.s) series.push({ label: isOne ? 's, p' : 's', x, y: curve.s });
  if (curve.p && !isOne) series.push({ label: 'p', x, y: curve.p });
  return {
    title: `Field through ${shortPath(answer)} at ${waveText(answer)}, ${incidenceText(answer)}`,
    x: { label: 'depth behind the first face', unit: prefixedSymbol(METRE, prefix), scale: 'linear' },
    y: { label: '|E|² over that of the incident wave', unit: '', scale: 'linear' },
    series,
    marks: named.map(({ position_m, name }) => ({ x: shown(position_m), label: name })),
  };
}
