import { derivative, evaluate, rootsWithin } from './polynomial.ts';
import type { Peak, Piece } from './types.ts';

/** The largest and the smallest value of a piecewise polynomial and their places, from exact roots. */
export function peaks(pieces: readonly Piece[]): { most: Peak; least: Peak } {
  let most: Peak = { x: 0, value: -Infinity };
  let least: Peak = { x: 0, value: Infinity };
  for (const { from, to, coefficients } of pieces) {
    const length = to - from;
    for (const t of [0, ...rootsWithin(derivative(coefficients), length), length]) {
      const value = evaluate(coefficients, t);
      if (value > most.value) most = { x: from + t, value };
      if (value < least.value) least = { x: from + t, value };
    }
  }
  return { most, least };
}

/** The pieces that lie between two places; pieces never cross a support. */
export function piecesBetween(pieces: readonly Piece[], from: number, to: number): Piece[] {
  const trace = (to - from) * 1e-9;
  return pieces.filter((piece) => piece.from >= from - trace && piece.to <= to + trace);
}
