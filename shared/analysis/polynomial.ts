import type { Piece } from './types.ts';

/** Value of a polynomial, lowest power first, by Horner's rule. */
export function evaluate(coefficients: readonly number[], t: number): number {
  let value = 0;
  for (let i = coefficients.length - 1; i >= 0; i -= 1) value = value * t + (coefficients[i] as number);
  return value;
}

/** Derivative of a polynomial, lowest power first. */
export function derivative(coefficients: readonly number[]): number[] {
  return coefficients.slice(1).map((c, i) => c * (i + 1));
}

/**
 * Roots of a polynomial inside (0, length), rising. Between the roots of its derivative a polynomial is
 * monotone, so each such interval with a change of sign holds exactly one root, found by bisection.
 */
export function rootsWithin(coefficients: readonly number[], length: number): number[] {
  let degree = coefficients.length - 1;
  while (degree > 0 && coefficients[degree] === 0) degree -= 1;
  if (degree < 1) return [];
  if (degree === 1) {
    const t = -(coefficients[0] as number) / (coefficients[1] as number);
    return t > 0 && t < length ? [t] : [];
  }
  const trimmed = coefficients.slice(0, degree + 1);
  const turns = [0, ...rootsWithin(derivative(trimmed), length), length];
  const roots: number[] = [];
  for (let i = 0; i + 1 < turns.length; i += 1) {
    const root = bisected(trimmed, turns[i] as number, turns[i + 1] as number);
    if (root !== null && root > 0 && root < length) roots.push(root);
  }
  return roots;
}

function bisected(coefficients: readonly number[], from: number, to: number): number | null {
  let low = from;
  let high = to;
  const atLow = evaluate(coefficients, low);
  const atHigh = evaluate(coefficients, high);
  if (atHigh === 0) return high;
  if (atLow === 0 || atLow > 0 === atHigh > 0) return null;
  for (let i = 0; i < 200; i += 1) {
    const middle = (low + high) / 2;
    if (middle === low || middle === high) break;
    if (evaluate(coefficients, middle) > 0 === atLow > 0) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** Value of a piecewise polynomial at x; where two pieces meet, the one on the side asked for. */
export function valueAt(pieces: readonly Piece[], x: number, side: 'left' | 'right' = 'left'): number {
  const piece =
    side === 'left' ? pieces.find(({ to }) => x <= to) : pieces.find(({ from, to }) => x >= from && x < to);
  const chosen = piece ?? pieces[pieces.length - 1];
  return chosen ? evaluate(chosen.coefficients, x - chosen.from) : 0;
}
