import type { Curves } from '#shared/engine/types.ts';

/** One curve to draw, or the two edges of an envelope; values at `curves.x`. */
export interface Band {
  most: readonly number[];
  least: readonly number[];
}

export type Diagram = 'V' | 'M' | 'w';

/**
 * The band of a diagram for one combination, or the envelope of all. A single combination's band lies
 * between the curve and zero, so that the same area is filled in both cases.
 */
export function bandOf(curves: Curves, diagram: Diagram, combination: string | null): Band {
  const one = combination === null ? undefined : curves.byCombination[combination];
  if (!one) return curves.envelope[diagram];
  const values = one[diagram];
  return { most: values.map((v) => Math.max(v, 0)), least: values.map((v) => Math.min(v, 0)) };
}

/** Index of the sample nearest to a place; curves are sampled left to right. */
export function nearestSample(xs: readonly number[], x: number): number {
  let best = 0;
  let distance = Infinity;
  xs.forEach((sample, index) => {
    const d = Math.abs(sample - x);
    if (d < distance) {
      distance = d;
      best = index;
    }
  });
  return best;
}

/** What the cross-hair reads at a sample: the value of larger size of the two edges. */
export function readAt(band: Band, index: number): number {
  const most = band.most[index] ?? 0;
  const least = band.least[index] ?? 0;
  return Math.abs(most) >= Math.abs(least) ? most : least;
}

/** Range of a band, always holding zero and never empty. */
export function extentOf(band: Band): [number, number] {
  const low = Math.min(0, ...band.least);
  const high = Math.max(0, ...band.most);
  return low === high ? [-1, 1] : [low, high];
}

/**
 * Vertical places for labels that would overlap: keeps their order and pushes each down until it
 * clears the one above by `gap`.
 */
export function spreadLabels(wanted: readonly number[], gap: number): number[] {
  const order = wanted.map((y, index) => ({ y, index })).sort((a, b) => a.y - b.y);
  let last = -Infinity;
  const placed = new Array<number>(wanted.length).fill(0);
  for (const { y, index } of order) {
    last = Math.max(y, last + gap);
    placed[index] = last;
  }
  return placed;
}
