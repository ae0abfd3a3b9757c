import type { Effects, Piece } from '#shared/analysis/types.ts';
import { shift, valueOf } from './polynomial.ts';

/** Coefficients kept per piece: loads vary at most linearly. */
export const SHEAR_TERMS = 3;
export const MOMENT_TERMS = 4;
export const DEFLECTION_TERMS = 6;

/** Effects of one case of loading, all on the same pieces. */
export interface GridCase {
  shear: Float64Array;
  moment: Float64Array;
  deflection: Float64Array;
  /** Per node, normal to the member, upwards. */
  reactions: readonly number[];
}

/** Common pieces of all cases of a member, so that superposition is a weighted sum of numbers. */
export interface Grid {
  /** Boundaries of the pieces, rising; pieces never cross a node. */
  breaks: Float64Array;
  /** First piece of each span, and one past the last. */
  firstOfSpan: Int32Array;
  cases: readonly GridCase[];
}

/** Brings the effects of several cases onto common pieces. Nodes are the places of the supports. */
export function toGrid(nodes: readonly number[], effects: readonly Effects[]): Grid {
  const kept = breaksOf(nodes, effects);
  const breaks = new Float64Array(kept.length);
  for (let i = 0; i < kept.length; i += 1) breaks[i] = kept[i] as number;
  const firstOfSpan = new Int32Array(nodes.length);
  for (let i = 0; i < nodes.length; i += 1) firstOfSpan[i] = kept.indexOf(nodes[i] as number);
  return { breaks, firstOfSpan, cases: effects.map((each) => gridCase(breaks, each)) };
}

/** Every boundary of a piece in any case, once each; those that fall on a node are the node's place. */
function breaksOf(nodes: readonly number[], effects: readonly Effects[]): readonly number[] {
  const spans = nodes.length - 1;
  if (effects.every(({ moment }) => moment.length === spans)) return nodes;
  const tolerance = (nodes[spans] as number) * 1e-12;
  const places = [...nodes];
  for (const { moment } of effects) for (const { from } of moment) places.push(from);
  places.sort((a, b) => a - b);
  const kept: number[] = [];
  for (const x of places) {
    const last = kept[kept.length - 1];
    if (last === undefined || x - last > tolerance) kept.push(onNode(nodes, x, tolerance));
  }
  return kept;
}

function onNode(nodes: readonly number[], x: number, tolerance: number): number {
  for (const node of nodes) if (Math.abs(node - x) <= tolerance) return node;
  return x;
}

function gridCase(breaks: Float64Array, { shear, moment, deflection, reactions }: Effects): GridCase {
  return {
    shear: spread(breaks, shear, SHEAR_TERMS),
    moment: spread(breaks, moment, MOMENT_TERMS),
    deflection: spread(breaks, deflection, DEFLECTION_TERMS),
    reactions,
  };
}

/** The polynomial of each piece, written about the start of that piece. */
function spread(breaks: Float64Array, pieces: readonly Piece[], terms: number): Float64Array {
  const out = new Float64Array((breaks.length - 1) * terms);
  let at = 0;
  for (let k = 0; k < breaks.length - 1; k += 1) {
    const from = breaks[k] as number;
    const middle = (from + (breaks[k + 1] as number)) / 2;
    while (at < pieces.length - 1 && middle > (pieces[at] as Piece).to) at += 1;
    const piece = pieces[at] as Piece;
    const { coefficients } = piece;
    for (let i = 0; i < terms && i < coefficients.length; i += 1) {
      out[k * terms + i] = coefficients[i] as number;
    }
    shift(out, k * terms, terms, from - piece.from);
  }
  return out;
}

/** Adds a multiple of one set of coefficients to another. */
export function addTo(sum: Float64Array, coefficients: Float64Array, factor: number): void {
  for (let i = 0; i < coefficients.length; i += 1) {
    sum[i] = (sum[i] as number) + factor * (coefficients[i] as number);
  }
}

/** Value of coefficients of a piece at a place of the member. */
export function valueAt(
  grid: Grid,
  coefficients: Float64Array,
  terms: number,
  piece: number,
  x: number,
): number {
  return valueOf(coefficients, piece * terms, terms, x - (grid.breaks[piece] as number));
}

/** The piece that holds a place; at a boundary the one on the side asked for. */
export function pieceAt(grid: Grid, x: number, side: 'left' | 'right'): number {
  const { breaks } = grid;
  const last = breaks.length - 2;
  for (let k = 0; k <= last; k += 1) {
    const end = breaks[k + 1] as number;
    if (side === 'left' ? x <= end : x < end) return k;
  }
  return last;
}
