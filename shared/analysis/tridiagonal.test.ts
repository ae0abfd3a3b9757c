import { expect, it } from 'vitest';
import { factorise } from './tridiagonal.ts';

it('solves for several right-hand sides', () => {
  const system = factorise(Float64Array.of(2, 4, 3), Float64Array.of(1, -1, 0));
  for (const x of [
    [1, 2, 3],
    [-4, 0, 0.5],
  ]) {
    const [a = NaN, b = NaN, c = NaN] = x;
    const rhs = Float64Array.of(2 * a + b, a + 4 * b - c, -b + 3 * c);
    system?.solve(rhs);
    rhs.forEach((value, i) => expect(value).toBeCloseTo(x[i] ?? NaN, 13));
  }
});

it('refuses what is singular, indefinite, or no number', () => {
  expect(factorise(Float64Array.of(1, 1), Float64Array.of(1, 0))).toBeNull();
  expect(factorise(Float64Array.of(1, 1), Float64Array.of(2, 0))).toBeNull();
  expect(factorise(Float64Array.of(1, NaN), Float64Array.of(0, 0))).toBeNull();
});
