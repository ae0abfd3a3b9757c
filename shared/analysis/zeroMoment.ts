import { pieceAt } from './pieces.ts';
import { evaluate, rootsWithin } from './polynomial.ts';
import type { Piece } from './types.ts';

/** Next to the moment at hand, less than this share of it is the rounding of a zero. */
const TRACE = 1e-9;

/**
 * Distance between the points of zero moment on the two sides of a place: the length over which the moment
 * keeps the sign it has there. A side without one counts to the end of the member. 0 where there is no moment.
 */
export function zeroMomentLength(moment: readonly Piece[], x: number): number {
  const left = pieceAt(moment, x, 'left');
  const right = pieceAt(moment, x, 'right');
  const values = [valueIn(moment[left], x), valueIn(moment[right], x)] as const;
  const [value, piece] = Math.abs(values[0]) >= Math.abs(values[1]) ? [values[0], left] : [values[1], right];
  if (value === 0) return 0;
  return zeroTowards(moment, piece, x, value, 1) - zeroTowards(moment, piece, x, value, -1);
}

function zeroTowards(
  moment: readonly Piece[],
  first: number,
  x: number,
  value: number,
  step: 1 | -1,
): number {
  const trace = Math.abs(value) * TRACE;
  let end = x;
  for (let i = first; i >= 0 && i < moment.length; i += step) {
    const piece = moment[i] as Piece;
    const start = step > 0 ? piece.from : piece.to;
    // A couple makes the moment jump to zero or over it.
    if (i !== first && valueIn(piece, start) * Math.sign(value) <= trace) return start;
    const roots = rootsWithin(piece.coefficients, piece.to - piece.from).map((t) => piece.from + t);
    const root = step > 0 ? roots.find((each) => each > x) : roots.findLast((each) => each < x);
    if (root !== undefined) return root;
    end = step > 0 ? piece.to : piece.from;
    if (end !== x && valueIn(piece, end) * Math.sign(value) <= trace) return end;
  }
  return end;
}

function valueIn(piece: Piece | undefined, x: number): number {
  return piece ? evaluate(piece.coefficients, x - piece.from) : 0;
}
