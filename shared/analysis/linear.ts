/** A factorised square matrix, to be solved for many right-hand sides. */
export interface Factorised {
  solve: (rhs: Float64Array) => Float64Array;
}

/**
 * LU factorisation with row pivoting of a dense matrix in row-major order. Systems here are small: two
 * unknowns a node. Null for a matrix that is singular to working precision.
 */
export function factorise(matrix: Float64Array, n: number): Factorised | null {
  const lu = Float64Array.from(matrix);
  const order = Int32Array.from({ length: n }, (_, i) => i);
  const at = (row: number, column: number) => lu[row * n + column] as number;
  let largest = 0;
  for (const value of lu) largest = Math.max(largest, Math.abs(value));
  for (let k = 0; k < n; k += 1) {
    let pivot = k;
    for (let i = k + 1; i < n; i += 1) if (Math.abs(at(i, k)) > Math.abs(at(pivot, k))) pivot = i;
    if (!(Math.abs(at(pivot, k)) > largest * 1e-14)) return null;
    if (pivot !== k) {
      for (let j = 0; j < n; j += 1) {
        const held = at(k, j);
        lu[k * n + j] = at(pivot, j);
        lu[pivot * n + j] = held;
      }
      const held = order[k] as number;
      order[k] = order[pivot] as number;
      order[pivot] = held;
    }
    for (let i = k + 1; i < n; i += 1) {
      const factor = at(i, k) / at(k, k);
      if (factor === 0) continue;
      lu[i * n + k] = factor;
      for (let j = k + 1; j < n; j += 1) lu[i * n + j] = at(i, j) - factor * at(k, j);
    }
  }
  return { solve: (rhs) => substituted(lu, order, n, rhs) };
}

function substituted(lu: Float64Array, order: Int32Array, n: number, rhs: Float64Array): Float64Array {
  const x = new Float64Array(n);
  for (let i = 0; i < n; i += 1) {
    let sum = rhs[order[i] as number] as number;
    for (let j = 0; j < i; j += 1) sum -= (lu[i * n + j] as number) * (x[j] as number);
    x[i] = sum;
  }
  for (let i = n - 1; i >= 0; i -= 1) {
    let sum = x[i] as number;
    for (let j = i + 1; j < n; j += 1) sum -= (lu[i * n + j] as number) * (x[j] as number);
    x[i] = sum / (lu[i * n + i] as number);
  }
  return x;
}
