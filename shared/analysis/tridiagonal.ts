/** A factorised symmetric tridiagonal matrix, to be solved for many right-hand sides. */
export interface Tridiagonal {
  /** Solves in place: the right-hand side becomes the solution. */
  solve: (rhs: Float64Array) => void;
}

/** What is left of a diagonal entry after elimination; less of it means that many digits are lost. */
const LEAST_PIVOT = 1e-9;

/**
 * LDLᵀ factorisation without pivoting, sound for a positive definite matrix.
 *
 * @param diagonal Entries (i, i).
 * @param beside Entries (i, i + 1).
 * @returns Null where the matrix is not positive definite, or so nearly not that the solution would be noise.
 */
export function factorise(diagonal: Float64Array, beside: Float64Array): Tridiagonal | null {
  const n = diagonal.length;
  const pivots = Float64Array.from(diagonal);
  const factors = new Float64Array(n);
  for (let i = 0; i < n; i += 1) {
    const pivot = pivots[i] as number;
    if (!(pivot > LEAST_PIVOT * (diagonal[i] as number))) return null;
    if (i + 1 === n) break;
    const factor = (beside[i] as number) / pivot;
    factors[i] = factor;
    pivots[i + 1] = (pivots[i + 1] as number) - factor * (beside[i] as number);
  }
  return { solve: (rhs) => substitute(pivots, factors, rhs) };
}

function substitute(pivots: Float64Array, factors: Float64Array, rhs: Float64Array): void {
  const n = pivots.length;
  for (let i = 0; i + 1 < n; i += 1) {
    rhs[i + 1] = (rhs[i + 1] as number) - (factors[i] as number) * (rhs[i] as number);
  }
  for (let i = n - 1; i >= 0; i -= 1) {
    const above = i + 1 < n ? (factors[i] as number) * (rhs[i + 1] as number) : 0;
    rhs[i] = (rhs[i] as number) / (pivots[i] as number) - above;
  }
}
