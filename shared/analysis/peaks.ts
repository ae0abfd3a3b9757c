import { nodesOf, piecesBetween } from './pieces.ts';
import { derivative, evaluate, rootsWithin } from './polynomial.ts';
import type { Beam, Peak, Piece } from './types.ts';

/** The largest and the smallest value of an effect, with their places. */
export interface Peaks {
  most: Peak;
  least: Peak;
}

/**
 * The largest and the smallest value of a piecewise polynomial and their places, from the roots of its
 * derivative and both sides of each jump. Of equal values the leftmost place is given.
 */
export function peaks(pieces: readonly Piece[]): Peaks {
  let most: Peak = { x: 0, value: -Infinity };
  let least: Peak = { x: 0, value: Infinity };
  for (const { from, to, coefficients } of pieces) {
    const length = to - from;
    for (const t of [0, ...rootsWithin(derivative(coefficients), length), length]) {
      const value = evaluate(coefficients, t);
      const x = t === length ? to : from + t;
      if (value > most.value) most = { x, value };
      if (value < least.value) least = { x, value };
    }
  }
  return { most, least };
}

/** Peaks of an effect within each span, both sides of its supports included. */
export function peakPerSpan(pieces: readonly Piece[], spans: readonly number[]): Peaks[] {
  const nodes = nodesOf(spans);
  return spans.map((_, i) => peaks(piecesBetween(pieces, nodes[i] as number, nodes[i + 1] as number)));
}

/**
 * Largest deflection of each span by size, its sign kept (downwards positive). Supports don't settle, so
 * that of a span is relative to its supports and that of an overhang relative to its one support.
 */
export function spanDeflections(deflection: readonly Piece[], { spans }: Pick<Beam, 'spans'>): Peak[] {
  return peakPerSpan(deflection, spans).map(({ most, least }) =>
    Math.abs(least.value) > Math.abs(most.value) ? least : most,
  );
}
