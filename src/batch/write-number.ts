/**
 * A double as text, written straight into bytes: the shortest decimal that reads back as the same double, character for
 * character what `String(x)` gives, several times faster for the sizes that fill a table (about 1e-4 to 1e6).
 *
 * How: x = I + f with 0 <= f < 1. f is exact in three limbs of 26 bits, and multiplying by a power of ten moves whole groups
 * of digits out of it, exactly. With k digits out, a decimal lies as near to x as half the distance to the next double (then
 * it reads back as x) where the rest r or 1 - r is below u = 10^k 2^-(F+1), F the number of fraction bits of x. Groups are
 * taken while u is small; then digit by digit up to the first k for which this holds, which is the shortest. The nearer of
 * two candidates wins, the even one of two equally near.
 *
 * Special cases, left to `String`: zero, numbers outside that range, powers of two (their lower neighbour is nearer).
 */
const LIMB = 2 ** 26;
const PER_LIMB = 2 ** -26;
const PER_LIMB2 = 2 ** -52;
const PER_LIMB3 = 2 ** -78;

/** Binary exponents of the numbers written here: 2^-13 <= |x| < 2^21. */
const LOWEST = -13;
const HIGHEST = 20;

const bits = new Float64Array(1);
const halves = new Uint32Array(bits.buffer);
/** The half of a double that holds sign and exponent. */
const HIGH = new Uint8Array(Uint32Array.of(1).buffer)[0] === 1 ? 1 : 0;
const LOW = 1 - HIGH;

const POWERS_OF_TEN = Float64Array.from({ length: 20 }, (_, k) => 10 ** k);
/** By number of fraction bits: the digits taken in groups, three fewer than always suffice, and u after them. */
const GROUPED = new Uint8Array(80);
const REACH = new Float64Array(80);
for (let F = 52 - HIGHEST; F <= 52 - LOWEST; F++) {
  GROUPED[F] = Math.ceil(F * Math.log10(2)) - 3;
  REACH[F] = 10 ** GROUPED[F]! * 2 ** -(F + 1);
}

/** Room that the longest text of a number takes. */
export const LONGEST_NUMBER = 26;

/** Writes x into `out` from `at` on; the place behind it. `out` has room for `LONGEST_NUMBER` bytes; x is finite. */
export function writeShortest(x: number, out: Uint8Array, at: number): number {
  bits[0] = x;
  const high = halves[HIGH]!;
  const exponent = ((high >>> 20) & 0x7ff) - 1023;
  if (exponent < LOWEST || exponent > HIGHEST || ((high & 0xfffff) === 0 && halves[LOW] === 0)) {
    return writeText(String(x), out, at);
  }
  let o = at;
  let positive = x;
  if (x < 0) {
    positive = -x;
    out[o++] = 45;
  }
  let whole = Math.floor(positive);
  let f = positive - whole;
  if (f === 0) return writeWhole(whole, out, o);

  const F = 52 - exponent;
  const grouped = GROUPED[F]!;
  // The fraction in limbs, then its digits in groups of at most seven: `first` and `second` full, `third` the rest.
  f *= LIMB;
  let a = Math.floor(f);
  f = (f - a) * LIMB;
  let b = Math.floor(f);
  let c = (f - b) * LIMB;
  let first = 0;
  let second = 0;
  let third = 0;
  for (let left = grouped, group = 0; left > 0; group++) {
    const digits = Math.min(left, 7);
    left -= digits;
    const power = POWERS_OF_TEN[digits]!;
    let carry = 0;
    if (c !== 0) {
      c *= power;
      carry = Math.floor(c * PER_LIMB);
      c -= carry * LIMB;
    }
    b = b * power + carry;
    carry = Math.floor(b * PER_LIMB);
    b -= carry * LIMB;
    a = a * power + carry;
    const out7 = Math.floor(a * PER_LIMB);
    a -= out7 * LIMB;
    if (group === 0) first = out7;
    else if (group === 1) second = out7;
    else third = out7;
  }
  // At most 50 bits are left: exact from here on.
  let r = a * PER_LIMB + b * PER_LIMB2 + c * PER_LIMB3;
  let u = REACH[F]!;
  let tail = 0;
  let tailDigits = 0;
  while (r >= u && 1 - r >= u) {
    r *= 10;
    const digit = Math.floor(r);
    r -= digit;
    tail = tail * 10 + digit;
    tailDigits++;
    u *= 10;
  }
  const down = r < u;
  const up = 1 - r < u;
  if (up && (!down || r > 0.5 || (r === 0.5 && tail % 2 === 1))) tail++;

  const inFirst = Math.min(grouped, 7);
  const inSecond = grouped > 14 ? 7 : grouped - inFirst;
  const inThird = grouped - inFirst - inSecond;
  // Rounding may fill a group: carry it on. An empty group is always full.
  if (tail >= POWERS_OF_TEN[tailDigits]!) {
    tail = 0;
    if (++third === POWERS_OF_TEN[inThird]) {
      third = 0;
      if (++second === POWERS_OF_TEN[inSecond]) {
        second = 0;
        if (++first === POWERS_OF_TEN[inFirst]) {
          first = 0;
          whole++;
        }
      }
    }
  }
  o = writeWhole(whole, out, o);
  out[o++] = 46;
  const point = o;
  o = writeDigits(first, inFirst, out, o);
  o = writeDigits(second, inSecond, out, o);
  o = writeDigits(third, inThird, out, o);
  o = writeDigits(tail, tailDigits, out, o);
  while (o > point && out[o - 1] === 48) o--;
  return o === point ? point - 1 : o;
}

/** A whole number below 2^31. */
function writeWhole(whole: number, out: Uint8Array, at: number): number {
  if (whole < 10) {
    out[at] = 48 + whole;
    return at + 1;
  }
  let digits = 2;
  while (whole >= POWERS_OF_TEN[digits]!) digits++;
  return writeDigits(whole, digits, out, at);
}

/** The two digits of every number below 100. */
const PAIRS = Uint8Array.from(
  { length: 200 },
  (_, i) => 48 + (i % 2 === 0 ? Math.floor(i / 20) : (i >> 1) % 10),
);

/** `digits` digits with leading zeros, of a whole number below 2^31. */
function writeDigits(value: number, digits: number, out: Uint8Array, at: number): number {
  let rest = value | 0;
  let i = at + digits - 1;
  for (; i > at; i -= 2) {
    const hundredth = (rest / 100) | 0;
    const pair = (rest - hundredth * 100) << 1;
    out[i] = PAIRS[pair + 1]!;
    out[i - 1] = PAIRS[pair]!;
    rest = hundredth;
  }
  if (i === at) out[i] = 48 + rest;
  return at + digits;
}

/** ASCII text. */
export function writeText(text: string, out: Uint8Array, at: number): number {
  for (let i = 0; i < text.length; i++) out[at + i] = text.charCodeAt(i);
  return at + text.length;
}
