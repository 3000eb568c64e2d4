/**
 * Solves min |A c − b| by Householder reflections (Golub & Van Loan, Matrix Computations, section on least squares by QR).
 * @param columns the columns of A, each as long as `target` and no fewer rows than columns; not changed
 * @param target b; not changed
 * @returns the coefficients c, or null when the columns are linearly dependent to rounding
 */
export function leastSquares(columns: readonly Float64Array[], target: Float64Array): number[] | null {
  const rows = target.length;
  const a = columns.map((column) => Float64Array.from(column));
  const b = Float64Array.from(target);
  const diagonal: number[] = [];
  const largest = Math.max(...a.map((column) => Math.hypot(...column)));
  for (let k = 0; k < a.length; k++) {
    const column = a[k];
    if (!column || rows < a.length) return null;
    const norm = Math.hypot(...column.subarray(k));
    if (!(norm > largest * 1e-14)) return null;
    const head = column[k] ?? 0;
    const alpha = head > 0 ? -norm : norm;
    column[k] = head - alpha;
    diagonal.push(alpha);
    const beta = -alpha * (head - alpha);
    for (const other of [...a.slice(k + 1), b]) reflect(column, other, k, beta);
  }
  return backSubstitute(a, diagonal, b);
}

/** Applies I − v vᵀ/β to `other`, v being `column` from row k down. */
function reflect(column: Float64Array, other: Float64Array, k: number, beta: number): void {
  let dot = 0;
  for (let i = k; i < column.length; i++) dot += (column[i] ?? 0) * (other[i] ?? 0);
  const factor = dot / beta;
  for (let i = k; i < column.length; i++) other[i] = (other[i] ?? 0) - factor * (column[i] ?? 0);
}

function backSubstitute(a: readonly Float64Array[], diagonal: readonly number[], b: Float64Array): number[] {
  const solution = new Array<number>(a.length).fill(0);
  for (let k = a.length - 1; k >= 0; k--) {
    let sum = b[k] ?? 0;
    for (let j = k + 1; j < a.length; j++) sum -= (a[j]?.[k] ?? 0) * (solution[j] ?? 0);
    solution[k] = sum / (diagonal[k] ?? 1);
  }
  return solution;
}
