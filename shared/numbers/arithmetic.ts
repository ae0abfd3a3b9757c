import stdCosd from '@stdlib/math-base-special-cosd';
import stdExp from '@stdlib/math-base-special-exp';
import stdLn from '@stdlib/math-base-special-ln';
import stdLog10 from '@stdlib/math-base-special-log10';
import stdPow from '@stdlib/math-base-special-pow';

/*
 * ECMAScript leaves the last digit of powers, exponentials, logarithms and cosines to each engine, and
 * engines differ. A result has to have the same bytes everywhere and in ten years, so these come from
 * stdlib's ports of FreeBSD's msun, which use nothing but the exact operations of IEEE 754. (The square root
 * is exact by that standard.)
 */

/** Largest whole exponent that is multiplied out. */
const multiplied = 8;

/** A power; small whole exponents are multiplied out, a half is the square root. */
export function power(base: number, exponent: number): number {
  if (exponent === 0.5 && base >= 0) return Math.sqrt(base);
  if (Number.isInteger(exponent) && exponent >= 1 && exponent <= multiplied) {
    let product = base;
    for (let i = 1; i < exponent; i += 1) product *= base;
    return product;
  }
  return stdPow(base, exponent);
}

export const exponential = (value: number): number => stdExp(value);
export const naturalLogarithm = (value: number): number => stdLn(value);
export const decimalLogarithm = (value: number): number => stdLog10(value);
/** Cosine of an angle in degrees. */
export const cosineOfDegrees = (degrees: number): number => stdCosd(degrees);
