/** Does the part transmit there, through its thickness. */
import { materialFacts } from '../material-facts.ts';
import { nearestAbsorption } from './absorption-source.ts';
import type { Finding } from './finding.ts';
import { facts, labelOf } from './finding.ts';
import { length, lengthRange, number, percent, watts } from './shown-numbers.ts';
import type { Subject } from './subject.ts';

/** Less than this through the bulk is no window. */
const OPAQUE = 0.1;
/** A hundredth taken inside matters for calorimetry, and heats under power. */
const NOTICEABLE = 0.01;
/** So close to the limit of its range, a material's transmission depends on the piece. */
const NEAR_LIMIT = 0.15;
/** Ranges of transparency are stated for a few millimetres. */
const THICK_m = 10e-3;
/** From this power on a thousandth of it warms a window. */
const HEATING_W = 1;

type Base = Pick<Finding, 'topic' | 'about'>;

export function transmissionFinding(subject: Subject, wavelength_m: number, power_W: number | null): Finding {
  const { material, medium, layer } = subject;
  const base: Base = { topic: 'transmission', about: labelOf(medium) };
  const source = facts(material?.factsSource ?? null);
  const range = medium.transparency_m;
  if (!layer) {
    const clear = range ? `; transparent from ${lengthRange(range)} by its entry` : '';
    const text = `no thickness is stated, so what the bulk takes is not known${clear}`;
    return { ...base, level: 'look', text, source };
  }
  if (medium.absorptionCoefficient_per_m !== null)
    return knownAbsorption(base, subject, wavelength_m, power_W);
  if (range && material) {
    const basis = materialFacts(material).transparencyBasis;
    const { thickness_m } = layer.answer;
    return { ...base, ...byRange(range, basis, thickness_m, wavelength_m, power_W), source };
  }
  return { ...base, level: 'look', text: `${NO_COEFFICIENT}, and ${NO_RANGE}`, source };
}

const NO_COEFFICIENT = 'no absorption coefficient on file at this wave';
const NO_RANGE = 'no range of transparency on file: ask for a measured curve';

function knownAbsorption(
  base: Base,
  { material, medium, layer }: Subject,
  wavelength_m: number,
  power_W: number | null,
): Finding {
  const source = nearestAbsorption(material, medium, wavelength_m);
  const alpha_per_m = medium.absorptionCoefficient_per_m ?? 0;
  const { thickness_m = 0, internalTransmittance: tau = 1, absorptance = 0 } = layer?.answer ?? {};
  if (alpha_per_m === 0) return { ...base, level: 'fine', text: 'absorbs nothing, as stated', source };
  const heat = power_W !== null ? `; ${watts(absorptance * power_W)} stay inside as heat` : '';
  const mirror = tau < OPAQUE ? ': no window of it; as a mirror see the loss' : '';
  return {
    ...base,
    level: tau < OPAQUE ? 'stop' : 1 - tau > NOTICEABLE ? 'look' : 'fine',
    text: `absorbs ${number(alpha_per_m / 100)} /cm: ${percent(1 - tau)} within ${length(thickness_m)}${heat}${mirror}`,
    source,
  };
}

/** All there is where no coefficient reaches the wave. */
function byRange(
  range: readonly [number, number],
  basis: string,
  thickness_m: number,
  wavelength_m: number,
  power_W: number | null,
): Pick<Finding, 'level' | 'text'> {
  const [shortest, longest] = range;
  if (!isInside(range, wavelength_m)) return { level: 'stop', text: opaqueWords(range, wavelength_m) };
  const near = wavelength_m < shortest * (1 + NEAR_LIMIT) || wavelength_m > longest * (1 - NEAR_LIMIT);
  const hot = power_W !== null && power_W >= HEATING_W;
  const thick = thickness_m > THICK_m;
  const parts = [
    near
      ? `close to a limit of its range of transparency (${lengthRange(range)}): ask for a measured curve`
      : `inside its range of transparency (${lengthRange(range)}, ${basis})`,
    ...(thick ? [`${length(thickness_m)} is thicker than such ranges are meant for`] : []),
    NO_COEFFICIENT,
    ...(hot
      ? [`of ${watts(power_W)} even 0.1 % is ${watts(power_W / 1000)} of heat: ask for the coefficient`]
      : []),
  ];
  return { level: near || thick || hot ? 'look' : 'fine', text: parts.join('; ') };
}

const isInside = ([shortest, longest]: readonly [number, number], wavelength_m: number): boolean =>
  wavelength_m >= shortest * (1 - 1e-9) && wavelength_m <= longest * (1 + 1e-9);

const opaqueWords = (range: readonly [number, number], wavelength_m: number): string =>
  `outside its range of transparency (${lengthRange(range)}): expect it to be opaque; ${othersWords(wavelength_m)}`;

const othersWords = (wavelength_m: number): string =>
  `halfspace find --clear ${Number((wavelength_m * 1e6).toPrecision(7))}um names media that transmit there`;

/** Where the data of the index end before the wave, the range of transparency is all there is. */
export function transmissionWithoutIndex(
  name: string,
  range: readonly [number, number] | null,
  wavelength_m: number,
  factsSource: string | null,
): Finding {
  const base = { topic: 'transmission' as const, about: name, source: facts(factsSource) };
  if (!range) return { ...base, level: 'look', text: NO_RANGE };
  if (!isInside(range, wavelength_m))
    return { ...base, level: 'stop', text: opaqueWords(range, wavelength_m) };
  const text = `inside its range of transparency (${lengthRange(range)}), but its index is not known there`;
  return { ...base, level: 'look', text };
}
