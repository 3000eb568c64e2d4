/**
 * Dense systems of equations by elimination with partial pivoting (Golub & Van Loan, Matrix Computations, §3.2 and §3.4), rows one after
 * the other in one array. Four pivots are eliminated in one pass over the remaining rows: the passes over memory, not the arithmetic, set
 * the time.
 */
const BLOCK = 4;

/** A square matrix that is factored in place and then solves for any right-hand sides. */
export class DenseMatrix {
  readonly size: number;
  /** Row by row; after factorise the factors L and U, the unit diagonal of L not stored. */
  readonly values: Float64Array;
  private readonly pivots: Int32Array;

  constructor(size: number) {
    this.size = size;
    this.values = new Float64Array(size * size);
    this.pivots = new Int32Array(size);
  }

  /** Replaces the values by their factors; false when the matrix is singular to working precision or not finite. */
  factorise(): boolean {
    const { values: a, size: n, pivots } = this;
    for (let k = 0; k < n; k += BLOCK) {
      const end = Math.min(k + BLOCK, n);
      if (!factorColumns(a, n, k, end, pivots)) return false;
      if (end - k === BLOCK) updateByFour(a, n, k);
    }
    return true;
  }

  /** Solves with the factors. @param b size × columns, row by row; overwritten by the solutions */
  solve(b: Float64Array, columns: number): void {
    const { values: a, size: n, pivots } = this;
    for (let k = 0; k < n; k++) {
      const row = pivots[k] ?? k;
      if (row === k) continue;
      for (let c = 0; c < columns; c++) {
        const value = b[row * columns + c] ?? 0;
        b[row * columns + c] = b[k * columns + c] ?? 0;
        b[k * columns + c] = value;
      }
    }
    if (columns === 1) {
      solveOne(a, n, b);
      return;
    }
    for (let i = 1; i < n; i++) subtractRows(a, n, b, columns, i, 0, i);
    for (let i = n - 1; i >= 0; i--) {
      subtractRows(a, n, b, columns, i, i + 1, n);
      const inverse = 1 / (a[i * n + i] ?? 1);
      for (let c = 0; c < columns; c++) b[i * columns + c] = (b[i * columns + c] ?? 0) * inverse;
    }
  }
}

/** Factors columns k … end − 1 of all rows below, and carries the rows k … end − 1 to the right of them. */
function factorColumns(a: Float64Array, n: number, k: number, end: number, pivots: Int32Array): boolean {
  for (let p = k; p < end; p++) {
    const row = largestBelow(a, n, p);
    pivots[p] = row;
    const pivot = a[row * n + p] ?? 0;
    if (!(Math.abs(pivot) > 1e-300) || !Number.isFinite(pivot)) return false;
    if (row !== p) exchangeRows(a, n, row, p);
    const inverse = 1 / pivot;
    for (let i = p + 1; i < n; i++) {
      const factor = (a[i * n + p] ?? 0) * inverse;
      a[i * n + p] = factor;
      if (factor === 0) continue;
      for (let j = p + 1; j < end; j++) a[i * n + j] = (a[i * n + j] ?? 0) - factor * (a[p * n + j] ?? 0);
    }
  }
  for (let i = k + 1; i < end; i++) {
    for (let p = k; p < i; p++) {
      const factor = a[i * n + p] ?? 0;
      for (let j = end; j < n; j++) a[i * n + j] = (a[i * n + j] ?? 0) - factor * (a[p * n + j] ?? 0);
    }
  }
  return true;
}

function largestBelow(a: Float64Array, n: number, p: number): number {
  let row = p;
  let largest = -1;
  for (let i = p; i < n; i++) {
    const size = Math.abs(a[i * n + p] ?? 0);
    if (size > largest) [largest, row] = [size, i];
  }
  return row;
}

function exchangeRows(a: Float64Array, n: number, i: number, k: number): void {
  for (let j = 0; j < n; j++) {
    const value = a[i * n + j] ?? 0;
    a[i * n + j] = a[k * n + j] ?? 0;
    a[k * n + j] = value;
  }
}

/** Takes four factored rows from all rows below them. */
function updateByFour(a: Float64Array, n: number, k: number): void {
  const from = k + BLOCK;
  const [r0, r1, r2, r3] = [k * n, (k + 1) * n, (k + 2) * n, (k + 3) * n];
  for (let i = from; i < n; i++) {
    const row = i * n;
    const f0 = a[row + k] ?? 0;
    const f1 = a[row + k + 1] ?? 0;
    const f2 = a[row + k + 2] ?? 0;
    const f3 = a[row + k + 3] ?? 0;
    for (let j = from; j < n; j++) {
      a[row + j] =
        (a[row + j] ?? 0) -
        (f0 * (a[r0 + j] ?? 0) + f1 * (a[r1 + j] ?? 0) + f2 * (a[r2 + j] ?? 0) + f3 * (a[r3 + j] ?? 0));
    }
  }
}

/** b_i −= Σ a_ik b_k for k = from … to − 1, two rows in one pass. */
function subtractRows(
  a: Float64Array,
  n: number,
  b: Float64Array,
  columns: number,
  i: number,
  from: number,
  to: number,
): void {
  const target = i * columns;
  let k = from;
  for (; k + 3 < to; k += 4) {
    const f0 = a[i * n + k] ?? 0;
    const f1 = a[i * n + k + 1] ?? 0;
    const f2 = a[i * n + k + 2] ?? 0;
    const f3 = a[i * n + k + 3] ?? 0;
    const [s0, s1, s2, s3] = [k * columns, (k + 1) * columns, (k + 2) * columns, (k + 3) * columns];
    for (let c = 0; c < columns; c++) {
      b[target + c] =
        (b[target + c] ?? 0) -
        (f0 * (b[s0 + c] ?? 0) + f1 * (b[s1 + c] ?? 0) + f2 * (b[s2 + c] ?? 0) + f3 * (b[s3 + c] ?? 0));
    }
  }
  for (; k < to; k++) {
    const factor = a[i * n + k] ?? 0;
    const source = k * columns;
    for (let c = 0; c < columns; c++) b[target + c] = (b[target + c] ?? 0) - factor * (b[source + c] ?? 0);
  }
}

function solveOne(a: Float64Array, n: number, b: Float64Array): void {
  for (let i = 1; i < n; i++) {
    let sum = b[i] ?? 0;
    for (let k = 0; k < i; k++) sum -= (a[i * n + k] ?? 0) * (b[k] ?? 0);
    b[i] = sum;
  }
  for (let i = n - 1; i >= 0; i--) {
    let sum = b[i] ?? 0;
    for (let k = i + 1; k < n; k++) sum -= (a[i * n + k] ?? 0) * (b[k] ?? 0);
    b[i] = sum / (a[i * n + i] ?? 1);
  }
}
