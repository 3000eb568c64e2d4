/**
 * Polynomials in Bernstein form on 0 … 1: S(x) = Σ a_i C(n,i) x^i (1−x)^(n−i).
 * Evaluation, derivative and degree elevation are textbook (G. Farin, Curves and Surfaces for CAGD, chapters on Bézier curves).
 */

/** C(n, i). Exact for the orders used here (n up to 12). */
export function binomial(n: number, i: number): number {
  let value = 1;
  for (let k = 1; k <= i; k++) value = (value * (n - i + k)) / k;
  return value;
}

/** The weights times their binomial coefficients, as `evaluateScaled` takes them. */
export function scaledWeights(weights: readonly number[]): Float64Array {
  const n = weights.length - 1;
  return Float64Array.from(weights, (weight, i) => weight * binomial(n, i));
}

/**
 * S(x) by Horner's rule in x/(1−x) or, past the middle, in (1−x)/x: every factor is at most 1, so no digit is lost at either end.
 * @param scaled weights from `scaledWeights`
 * @param x station 0 … 1
 * @param rest 1 − x, passed on its own so that it keeps its digits near the trailing edge
 */
export function evaluateScaled(scaled: Float64Array, x: number, rest: number): number {
  const n = scaled.length - 1;
  let sum: number;
  let power = 1;
  if (x <= rest) {
    const ratio = x / rest;
    sum = scaled[n] ?? 0;
    for (let i = n - 1; i >= 0; i--) {
      sum = sum * ratio + (scaled[i] ?? 0);
      power *= rest;
    }
  } else {
    const ratio = rest / x;
    sum = scaled[0] ?? 0;
    for (let i = 1; i <= n; i++) {
      sum = sum * ratio + (scaled[i] ?? 0);
      power *= x;
    }
  }
  return sum * power;
}

/** Bernstein weights of the derivative with respect to x: n (a_(i+1) − a_i). A constant has the derivative [0]. */
export function derivativeWeights(weights: readonly number[]): number[] {
  const n = weights.length - 1;
  if (n < 1) return [0];
  return Array.from({ length: n }, (_, i) => n * ((weights[i + 1] ?? 0) - (weights[i] ?? 0)));
}

/** The same polynomial written with one more weight: b_i = i/(n+1) a_(i−1) + (1 − i/(n+1)) a_i. */
export function elevate(weights: readonly number[]): number[] {
  const n = weights.length;
  return Array.from({ length: n + 1 }, (_, i) => {
    const share = i / n;
    return share * (weights[i - 1] ?? 0) + (1 - share) * (weights[i] ?? 0);
  });
}

/** The weight lists of the two halves 0 … ½ and ½ … 1 (de Casteljau's scheme). */
export function halve(weights: readonly number[]): { readonly left: number[]; readonly right: number[] } {
  const left: number[] = [];
  const right: number[] = [];
  let row = [...weights];
  while (row.length > 0) {
    left.push(row[0] ?? 0);
    right.unshift(row[row.length - 1] ?? 0);
    row = row.slice(1).map((value, i) => ((row[i] ?? 0) + value) / 2);
  }
  return { left, right };
}
