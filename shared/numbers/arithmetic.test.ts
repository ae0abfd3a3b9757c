import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cosineOfDegrees, decimalLogarithm, exponential, naturalLogarithm, power } from './arithmetic.ts';

const near = (ours: number, theirs: number) =>
  expect(Math.abs(ours - theirs)).toBeLessThanOrEqual(4e-15 * Math.max(1, Math.abs(theirs)));

describe('arithmetic that is the same in every engine', () => {
  it('agrees with the engine at hand to the last digits', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-3, max: 1e3, noNaN: true }),
        fc.double({ min: -4, max: 4, noNaN: true }),
        (x, y) => {
          near(power(x, y) / x ** y, 1);
          near(exponential(y), Math.exp(y));
          near(naturalLogarithm(x), Math.log(x));
          near(decimalLogarithm(x), Math.log10(x));
        },
      ),
    );
    for (const degrees of [0, 15, 30, 45, 60, 75])
      near(cosineOfDegrees(degrees), Math.cos((degrees * Math.PI) / 180));
  });

  it('multiplies small whole exponents out and keeps what has no answer without one', () => {
    expect(power(1.1, 3)).toBe(1.1 * 1.1 * 1.1);
    expect(power(2, 0.5)).toBe(Math.SQRT2);
    expect(power(-8, 1 / 3)).toBeNaN();
    expect(power(0, -1)).toBe(Infinity);
    expect(naturalLogarithm(-1)).toBeNaN();
  });

  it('is fixed to the bit: a change here changes stored results and needs a new engine version', () => {
    const bits = (value: number) => new BigUint64Array(Float64Array.of(value).buffer)[0]?.toString(16);
    expect([power(300 / 245, 0.11), exponential(1), naturalLogarithm(10)].map(bits)).toEqual([
      '3ff05c45f9316eab',
      '4005bf0a8b14576a',
      '40026bb1bbb55516',
    ]);
  });
});
