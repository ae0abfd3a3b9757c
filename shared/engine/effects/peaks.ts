import { DEFLECTION_TERMS, type Grid, MOMENT_TERMS } from './grid.ts';
import { rootsWithin, valueOf } from './polynomial.ts';

/** A place on the grid with the value found there. */
export interface GridPeak {
  x: number;
  piece: number;
  value: number;
}

const roots = new Float64Array(6);
const slopes = new Float64Array(DEFLECTION_TERMS);

/** Largest and smallest moment of a span, its ends included; written into the two peaks given. */
export function momentPeaks(
  grid: Grid,
  moment: Float64Array,
  span: number,
  most: GridPeak,
  least: GridPeak,
): void {
  most.value = -Infinity;
  least.value = Infinity;
  eachExtreme(grid, moment, MOMENT_TERMS, span, (value, x, piece) => {
    if (value > most.value) put(most, value, x, piece);
    if (value < least.value) put(least, value, x, piece);
  });
}

/** Largest deflection of a span by size, its sign kept. */
export function deflectionPeak(grid: Grid, deflection: Float64Array, span: number, peak: GridPeak): void {
  peak.value = 0;
  peak.x = -1;
  eachExtreme(grid, deflection, DEFLECTION_TERMS, span, (value, x, piece) => {
    if (peak.x < 0 || Math.abs(value) > Math.abs(peak.value)) put(peak, value, x, piece);
  });
}

function put(peak: GridPeak, value: number, x: number, piece: number): void {
  peak.value = value;
  peak.x = x;
  peak.piece = piece;
}

/** Visits the ends of each piece and the places between where the tangent is level. */
function eachExtreme(
  grid: Grid,
  coefficients: Float64Array,
  terms: number,
  span: number,
  visit: (value: number, x: number, piece: number) => void,
): void {
  const { breaks, firstOfSpan } = grid;
  const end = firstOfSpan[span + 1] as number;
  for (let piece = firstOfSpan[span] as number; piece < end; piece += 1) {
    const at = piece * terms;
    const from = breaks[piece] as number;
    const to = breaks[piece + 1] as number;
    const length = to - from;
    visit(coefficients[at] as number, from, piece);
    for (let i = 1; i < terms; i += 1) slopes[i - 1] = i * (coefficients[at + i] as number);
    const count = rootsWithin(slopes, 0, terms - 1, length, roots);
    for (let i = 0; i < count; i += 1) {
      const t = roots[i] as number;
      visit(valueOf(coefficients, at, terms, t), from + t, piece);
    }
    visit(valueOf(coefficients, at, terms, length), to, piece);
  }
}

/**
 * Distance between the points of zero moment on either side of a place, or up to the ends of the member
 * where the moment keeps its sign.
 */
export function zeroMomentLength(grid: Grid, moment: Float64Array, piece: number, x: number): number {
  return zeroTo(grid, moment, piece, x, 1) - zeroTo(grid, moment, piece, x, -1);
}

function zeroTo(grid: Grid, moment: Float64Array, piece: number, x: number, step: 1 | -1): number {
  const { breaks } = grid;
  const valueIn = (k: number, place: number) =>
    valueOf(moment, k * MOMENT_TERMS, MOMENT_TERMS, place - (breaks[k] as number));
  const here = valueIn(piece, x);
  for (let k = piece; k >= 0 && k < breaks.length - 1; k += step) {
    const from = breaks[k] as number;
    const to = breaks[k + 1] as number;
    const [start, end] = step > 0 ? [from, to] : [to, from];
    // A couple makes the moment jump over zero.
    if (k !== piece && valueIn(k, start) * here < 0) return start;
    const count = rootsWithin(moment, k * MOMENT_TERMS, MOMENT_TERMS, to - from, roots);
    for (let i = 0; i < count; i += 1) {
      const root = from + (roots[step > 0 ? i : count - 1 - i] as number);
      if (step > 0 ? root > x : root < x) return root;
    }
    // Rounding leaves a trace of moment where it is zero, as at the support of an overhang without load.
    if (Math.abs(valueIn(k, end)) <= Math.abs(here) * 1e-9) return end;
  }
  return step > 0 ? (breaks[breaks.length - 1] as number) : 0;
}
