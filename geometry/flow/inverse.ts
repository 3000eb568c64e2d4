/** A 3 × 3 matrix and its inverse by cofactors; its own room serves again and again. */
export class SmallMatrix {
  /** Row by row. */
  readonly values = new Float64Array(9);
  readonly inverse = new Float64Array(9);

  /** Sets the inverse; false when the matrix is singular or not finite. */
  invert(): boolean {
    const { values: m, inverse: out } = this;
    const [a, b, c] = [m[0] ?? 0, m[1] ?? 0, m[2] ?? 0];
    const [d, e, f] = [m[3] ?? 0, m[4] ?? 0, m[5] ?? 0];
    const [g, h, k] = [m[6] ?? 0, m[7] ?? 0, m[8] ?? 0];
    const [p, q, r] = [e * k - f * h, f * g - d * k, d * h - e * g];
    const scale = 1 / (a * p + b * q + c * r);
    if (!Number.isFinite(scale)) return false;
    out[0] = p * scale;
    out[1] = (c * h - b * k) * scale;
    out[2] = (b * f - c * e) * scale;
    out[3] = q * scale;
    out[4] = (a * k - c * g) * scale;
    out[5] = (c * d - a * f) * scale;
    out[6] = r * scale;
    out[7] = (b * g - a * h) * scale;
    out[8] = (a * e - b * d) * scale;
    return true;
  }
}
