import { evaluate } from './polynomial.ts';
import type { Piece } from './types.ts';

/** The side of a place from which an effect is looked at; they differ where it jumps. */
export type Side = 'left' | 'right';

/** Value of a piecewise polynomial at x; where two pieces meet, of the one on the side asked for. */
export function valueAt(pieces: readonly Piece[], x: number, side: Side = 'left'): number {
  const piece = pieces[pieceAt(pieces, x, side)];
  return piece ? evaluate(piece.coefficients, x - piece.from) : 0;
}

/** Number of the piece that holds x, on the side asked for; the nearest one for x off the member. */
export function pieceAt(pieces: readonly Piece[], x: number, side: Side): number {
  const last = pieces.length - 1;
  for (let i = 0; i < last; i += 1) {
    const { to } = pieces[i] as Piece;
    if (side === 'left' ? x <= to : x < to) return i;
  }
  return last;
}

/** The pieces of one span. Pieces never cross a node, so each lies in one span only. */
export function piecesBetween(pieces: readonly Piece[], from: number, to: number): Piece[] {
  return pieces.filter((piece) => {
    const middle = (piece.from + piece.to) / 2;
    return middle > from && middle < to;
  });
}

/** Places of the nodes of a member, from its span lengths. */
export function nodesOf(spans: readonly number[]): number[] {
  const nodes = [0];
  for (const length of spans) nodes.push((nodes[nodes.length - 1] as number) + length);
  return nodes;
}
