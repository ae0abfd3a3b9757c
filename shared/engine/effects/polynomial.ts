/*
 * Polynomials kept in a flat array: `terms` coefficients from `at`, lowest power first. No allocation,
 * since these run for every piece of every combination.
 */

/** Value at t. */
export function valueOf(coefficients: Float64Array, at: number, terms: number, t: number): number {
  let value = coefficients[at + terms - 1] as number;
  for (let i = at + terms - 2; i >= at; i -= 1) value = value * t + (coefficients[i] as number);
  return value;
}

/** Value of the derivative at t. */
export function slopeOf(coefficients: Float64Array, at: number, terms: number, t: number): number {
  let value = 0;
  for (let k = terms - 1; k >= 1; k -= 1) value = value * t + k * (coefficients[at + k] as number);
  return value;
}

/** Writes p(t + by) over p(t), in place. */
export function shift(coefficients: Float64Array, at: number, terms: number, by: number): void {
  if (by === 0) return;
  for (let i = 0; i < terms - 1; i += 1) {
    for (let k = terms - 2; k >= i; k -= 1) {
      coefficients[at + k] = (coefficients[at + k] as number) + by * (coefficients[at + k + 1] as number);
    }
  }
}

const MOST_TERMS = 6;
/** Derivatives of the polynomial at work, one row per order. */
const derivatives = new Float64Array(MOST_TERMS * MOST_TERMS);
const found = [new Float64Array(MOST_TERMS), new Float64Array(MOST_TERMS)] as const;

/**
 * Roots inside (0, length), rising, written to `into`; returns how many. Between two roots of its
 * derivative a polynomial is monotone, so each change of sign there is one root and is bracketed; roots
 * where it only touches zero are left out.
 */
export function rootsWithin(
  coefficients: Float64Array,
  at: number,
  terms: number,
  length: number,
  into: Float64Array,
): number {
  let top = terms - 1;
  while (top > 0 && (coefficients[at + top] as number) === 0) top -= 1;
  if (top === 0) return 0;
  if (top === 1) {
    const t = -(coefficients[at] as number) / (coefficients[at + 1] as number);
    if (!(t > 0 && t < length)) return 0;
    into[0] = t;
    return 1;
  }
  for (let i = 0; i <= top; i += 1) derivatives[i] = coefficients[at + i] as number;
  for (let order = 1; order < top; order += 1) {
    for (let i = 0; i <= top - order; i += 1) {
      derivatives[order * MOST_TERMS + i] =
        (i + 1) * (derivatives[(order - 1) * MOST_TERMS + i + 1] as number);
    }
  }
  let count = 0;
  let critical: Float64Array = found[0];
  for (let degree = 1; degree <= top; degree += 1) {
    const target = degree === top ? into : found[degree % 2 === 0 ? 0 : 1];
    count = changesOfSign((top - degree) * MOST_TERMS, degree + 1, length, critical, count, target);
    critical = target;
  }
  return count;
}

function changesOfSign(
  at: number,
  terms: number,
  length: number,
  critical: Float64Array,
  criticals: number,
  into: Float64Array,
): number {
  let count = 0;
  let from = 0;
  let valueFrom = valueOf(derivatives, at, terms, 0);
  for (let i = 0; i <= criticals; i += 1) {
    const to = i < criticals ? (critical[i] as number) : length;
    const valueTo = valueOf(derivatives, at, terms, to);
    if (valueFrom < 0 !== valueTo < 0 && valueFrom !== 0 && valueTo !== 0) {
      into[count] = bracketed(at, terms, from, to, valueFrom, valueTo);
      count += 1;
    } else if (valueTo === 0 && i < criticals && valueFrom !== 0) {
      into[count] = to;
      count += 1;
    }
    from = to;
    valueFrom = valueTo;
  }
  return count;
}

/** Newton's method kept inside the bracket; halves it where Newton would leave. */
function bracketed(at: number, terms: number, a: number, b: number, valueA: number, valueB: number): number {
  if (terms === 2) return -(derivatives[at] as number) / (derivatives[at + 1] as number);
  let low = a;
  let high = b;
  let x = a - (valueA * (b - a)) / (valueB - valueA);
  for (let i = 0; i < 80; i += 1) {
    const value = valueOf(derivatives, at, terms, x);
    if (value === 0) return x;
    if (value < 0 === valueA < 0) low = x;
    else high = x;
    const next = x - value / slopeOf(derivatives, at, terms, x);
    const inside = next > low && next < high;
    const following = inside ? next : (low + high) / 2;
    if (Math.abs(following - x) <= 4e-16 * Math.abs(b)) return following;
    x = following;
  }
  return x;
}
