import { describe, expect, it } from 'vitest';
import { derivative, evaluate, rootsWithin, shifted } from './polynomial.ts';

/** Coefficients of the product of (t − root). */
const withRoots = (...roots: number[]) =>
  roots.reduce<number[]>((c, root) => [...c, 0].map((_, i) => (c[i - 1] ?? 0) - root * (c[i] ?? 0)), [1]);

it('evaluates, differentiates and moves the origin', () => {
  const p = [1, -2, 0, 4];
  expect(evaluate(p, 3)).toBe(1 - 6 + 108);
  expect(derivative(p)).toEqual([-2, 0, 12]);
  expect(derivative([5])).toEqual([]);
  const moved = shifted(p, 2);
  for (const t of [-1, 0, 0.5, 3]) expect(evaluate(moved, t)).toBeCloseTo(evaluate(p, t + 2), 12);
  expect(shifted(p, 0)).toEqual(p);
});

describe('roots', () => {
  it.each([
    [[0.5]],
    [[0.25, 1.75]],
    [[0.1, 0.9, 1.9]],
    [[0.2, 0.21, 1.3, 1.99]],
    [[0.3, 0.6, 0.9, 1.2, 1.5]],
  ])('of known places %j', (roots) => {
    const found = rootsWithin(withRoots(...roots), 2);
    expect(found).toHaveLength(roots.length);
    found.forEach((root, i) => expect(root).toBeCloseTo(roots[i] ?? NaN, 10));
  });

  it('outside the stretch, at its ends, and where zero is only touched are left out', () => {
    expect(rootsWithin(withRoots(-1, 3), 2)).toEqual([]);
    expect(rootsWithin(withRoots(0, 2), 2)).toEqual([]);
    expect(rootsWithin(withRoots(1, 1), 2)).toEqual([]);
    expect(rootsWithin([0, 0, 0], 2)).toEqual([]);
    expect(rootsWithin([3], 2)).toEqual([]);
  });

  it('of a quadratic with a small root keep its digits', () => {
    const [small = NaN] = rootsWithin([1e-9, -1, 1e-3], 10);
    // To first order c / b (1 + a c / b²).
    expect(small / (1e-9 * (1 + 1e-12))).toBeCloseTo(1, 14);
  });

  it('of coefficients of any size', () => {
    expect(
      rootsWithin(
        withRoots(0.5, 1.5).map((c) => c * 1e200),
        2,
      ),
    ).toHaveLength(2);
    expect(
      rootsWithin(
        withRoots(0.5, 1.5, 1.7).map((c) => c * 1e-200),
        2,
      ),
    ).toHaveLength(3);
    expect(rootsWithin([1e300, 0, 0, -1e300], 1e10)).toEqual([]);
  });

  it('a trailing coefficient that is only rounding does no harm', () => {
    const [root = NaN] = rootsWithin([-1, 2, 0, 1e-18], 1);
    expect(root).toBeCloseTo(0.5, 14);
  });
});
