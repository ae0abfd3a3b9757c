/** Value of a polynomial, lowest power first, by Horner's rule. */
export function evaluate(coefficients: readonly number[], t: number): number {
  let value = 0;
  for (let i = coefficients.length - 1; i >= 0; i -= 1) value = value * t + (coefficients[i] as number);
  return value;
}

/** Derivative of a polynomial, lowest power first. */
export function derivative(coefficients: readonly number[]): number[] {
  const slopes: number[] = [];
  for (let i = 1; i < coefficients.length; i += 1) slopes.push(i * (coefficients[i] as number));
  return slopes;
}

/** The same polynomial written about another origin: p(t + by), by repeated synthetic division. */
export function shifted(coefficients: readonly number[], by: number): number[] {
  const out = [...coefficients];
  if (by === 0) return out;
  for (let i = 0; i + 1 < out.length; i += 1) {
    for (let k = out.length - 2; k >= i; k -= 1) {
      out[k] = (out[k] as number) + by * (out[k + 1] as number);
    }
  }
  return out;
}

/**
 * Places inside (0, length) where a polynomial changes sign, rising. Closed forms up to the second degree;
 * above it the roots of the derivative bound stretches where the polynomial is monotone, so that a change of
 * sign there brackets exactly one root. Where it only touches zero is left out.
 */
export function rootsWithin(coefficients: readonly number[], length: number): number[] {
  // Over the whole stretch as unit, and the largest coefficient as 1, nothing overflows.
  let power = 1;
  const scaled = coefficients.map((c) => {
    const value = c * power;
    power *= length;
    return value;
  });
  const largest = Math.max(...scaled.map(Math.abs));
  if (!(largest > 0 && Number.isFinite(largest))) return [];
  return unitRoots(scaled.map((c) => c / largest)).map((u) => u * length);
}

/** Changes of sign inside (0, 1). */
function unitRoots(coefficients: readonly number[]): number[] {
  let degree = coefficients.length - 1;
  while (degree > 0 && coefficients[degree] === 0) degree -= 1;
  if (degree < 1) return [];
  const [c = 0, b = 0, a = 0] = coefficients;
  if (degree === 1) return inside(-c / b);
  if (degree === 2) return quadraticRoots(a, b, c);
  const trimmed = coefficients.slice(0, degree + 1);
  const slopes = derivative(trimmed);
  const turns = [0, ...unitRoots(slopes), 1];
  const roots: number[] = [];
  for (let i = 0; i + 1 < turns.length; i += 1) {
    const high = turns[i + 1] as number;
    const root = bracketed(trimmed, slopes, turns[i] as number, high);
    if (root !== null && root > 0 && root < 1) roots.push(root);
  }
  return roots;
}

function inside(u: number): number[] {
  return u > 0 && u < 1 ? [u] : [];
}

/** The form that never subtracts two nearly equal numbers. */
function quadraticRoots(a: number, b: number, c: number): number[] {
  const discriminant = b * b - 4 * a * c;
  if (!(discriminant > 0)) return [];
  const q = -(b + (b < 0 ? -1 : 1) * Math.sqrt(discriminant)) / 2;
  const roots = [...inside(q / a), ...inside(c / q)];
  return roots.sort((x, y) => x - y);
}

/** Newton's steps, held inside a bracket that shrinks; a half step wherever Newton would leave it. */
function bracketed(
  coefficients: readonly number[],
  slopes: readonly number[],
  from: number,
  to: number,
): number | null {
  let low = from;
  let high = to;
  const atLow = evaluate(coefficients, low);
  const atHigh = evaluate(coefficients, high);
  if (atHigh === 0) return high;
  if (atLow === 0 || atLow > 0 === atHigh > 0) return null;
  let u = (low + high) / 2;
  for (let step = 0; step < 100; step += 1) {
    const value = evaluate(coefficients, u);
    if (value === 0) return u;
    if (value > 0 === atLow > 0) low = u;
    else high = u;
    const newton = u - value / evaluate(slopes, u);
    const next = newton > low && newton < high ? newton : (low + high) / 2;
    if (Math.abs(next - u) <= Number.EPSILON * Math.abs(u)) return next;
    u = next;
  }
  return u;
}
