import fc from 'fast-check';
import * as mathjs from 'mathjs';
import { describe, expect, it } from 'vitest';
import * as C from '../../src/num/complex.ts';
import { evenly } from '../helpers/evenly.ts';

const part = fc.oneof(evenly(-10, 10), fc.constantFrom(0, 1, -1, 2, -3));
const any = fc.record({ re: part, im: part });
const nonZero = any.filter((z) => Math.hypot(z.re, z.im) > 1e-3);
const theirs = (z: C.Complex) => mathjs.complex(z.re, z.im);

function close(got: C.Complex, wanted: C.Complex, relative = 1e-12): void {
  const size = Math.max(Math.hypot(wanted.re, wanted.im), 1e-300);
  expect(Math.hypot(got.re - wanted.re, got.im - wanted.im)).toBeLessThanOrEqual(relative * size);
}

describe('complex numbers agree with mathjs', () => {
  it('on sums, products, quotients and moduli', () => {
    fc.assert(
      fc.property(any, nonZero, (a, b) => {
        close(C.add(a, b), mathjs.add(theirs(a), theirs(b)) as C.Complex);
        close(C.sub(a, b), mathjs.subtract(theirs(a), theirs(b)) as C.Complex);
        close(C.mul(a, b), mathjs.multiply(theirs(a), theirs(b)) as C.Complex);
        close(C.div(a, b), mathjs.divide(theirs(a), theirs(b)) as C.Complex);
        expect(C.abs(a)).toBeCloseTo(mathjs.abs(theirs(a)), 10);
        expect(C.abs2(a)).toBeCloseTo(mathjs.abs(theirs(a)) ** 2, 10);
        expect(C.arg(b)).toBeCloseTo(mathjs.arg(theirs(b)), 12);
        close(C.conj(a), mathjs.conj(theirs(a)), 0);
        close(C.neg(a), mathjs.unaryMinus(theirs(a)) as C.Complex, 0);
      }),
    );
  });

  it('on roots, exponentials and logarithms', () => {
    fc.assert(
      fc.property(nonZero, (a) => {
        close(C.sqrt(a), mathjs.sqrt(theirs(a)) as C.Complex, 1e-7);
        close(C.exp(a), mathjs.exp(theirs(a)) as C.Complex);
        expect(C.log(a).re).toBeCloseTo((mathjs.log(theirs(a)) as C.Complex).re, 12);
        expect(C.log(a).im).toBeCloseTo((mathjs.log(theirs(a)) as C.Complex).im, 12);
      }),
    );
  });
});

describe('division', () => {
  // R. L. Smith, Comm. ACM 5, 435 (1962): the scaling is there so that nothing overflows or vanishes on the way.
  it.each<[C.Complex, C.Complex, C.Complex]>([
    [C.complex(1e300, 1e300), C.complex(1e300, 1e300), C.ONE],
    [C.complex(1e300, 2e300), C.complex(2e300, 4e300), C.complex(0.5)],
    [C.complex(1e-300, 2e-300), C.complex(2e-300, 4e-300), C.complex(0.5)],
    [C.complex(3e-300, 1e-300), C.complex(-1e-300, 3e-300), C.complex(0, -1)],
    [C.complex(1, 2), C.complex(2), C.complex(0.5, 1)],
    [C.complex(1, 2), C.complex(0, 2), C.complex(1, -0.5)],
  ])('%j / %j', (a, b, wanted) => {
    close(C.div(a, b), wanted, 1e-15);
  });
});

describe('square root', () => {
  it.each<[number, number, number, number]>([
    [4, 0, 2, 0],
    [4, -0, 2, 0],
    [-4, 0, 0, 2],
    [-4, -0, 0, 2],
    [0, 0, 0, 0],
    [0, 2, 1, 1],
    [0, -2, 1, -1],
    [-3, 4, 1, 2],
    [-3, -4, 1, -2],
    [3, -4, 2, -1],
  ])('of %d + %di', (re, im, wantedRe, wantedIm) => {
    close(C.sqrt(C.complex(re, im)), C.complex(wantedRe, wantedIm), 1e-15);
  });

  it('loses no digit of a part far smaller than the other: sqrt(1 + 2 i e) = 1 + i e, sqrt(-1 + 2 i e) = e + i', () => {
    expect(C.sqrt(C.complex(1, 2e-12)).im).toBeCloseTo(1e-12, 26);
    expect(C.sqrt(C.complex(-1, 2e-12)).re).toBeCloseTo(1e-12, 26);
    expect(C.sqrt(C.complex(-1, -2e-12)).re).toBeCloseTo(1e-12, 26);
    expect(C.sqrt(C.complex(-1, -2e-12)).im).toBe(-1);
  });

  it('of passive kind decays, and runs forward where it does not fade', () => {
    close(C.sqrtDecaying(C.complex(3, -4)), C.complex(-2, 1), 1e-15);
    close(C.sqrtDecaying(C.complex(3, 4)), C.complex(2, 1), 1e-15);
    close(C.sqrtDecaying(C.complex(9, 0)), C.complex(3, 0), 0);
    close(C.sqrtDecaying(C.complex(9, -0)), C.complex(3, 0), 0);
  });
});
