/** A wavelength range in words with a prefix that suits it: "0.21 um to 3.71 um", "3 mm to 299.8 m". Plain ASCII; faces may dress the micro sign. */
export function rangeText([lo_um, hi_um]: readonly [number, number]): string {
  return `${lengthText(lo_um)} to ${lengthText(hi_um)}`;
}

const UNITS: readonly (readonly [string, number])[] = [
  ['km', 1e9],
  ['m', 1e6],
  ['mm', 1e3],
  ['um', 1],
  ['nm', 1e-3],
];

export function lengthText(um: number, digits = 7): string {
  // 0.21 um reads better than 210 nm beside 3.71 um, so nm starts below 0.1 um.
  const [unit, size] = UNITS.find(([, s]) => um >= (s === 1 ? 0.1 : s)) ?? ['nm', 1e-3];
  return `${Number((um / size).toPrecision(digits))} ${unit}`;
}
