/**
 * Least-squares CST fits of 4-digit sections: ordinates on 201 cosine stations, n1 = 0.5, n2 = 1, trailing-edge term taken out, no weights.
 * Residuals are the largest ordinate differences ahead of and behind 20 % of chord, fractions of chord.
 * Mark: computed, outside this program. Weights to 1e-4 (0012) and 1e-3 (cambered), residuals to 10 %.
 */

/** 0012, half-thickness. */
export const FITS_0012: readonly {
  readonly edge: 'open' | 'closed';
  readonly order: number;
  readonly ahead: number;
  readonly behind: number;
  readonly weights: readonly number[];
}[] = [
  {
    edge: 'open',
    order: 4,
    ahead: 2.25e-4,
    behind: 7.4e-5,
    weights: [0.170651, 0.153056, 0.151898, 0.132991, 0.143512],
  },
  {
    edge: 'open',
    order: 5,
    ahead: 1.74e-4,
    behind: 5.9e-5,
    weights: [0.171537, 0.152734, 0.160811, 0.133471, 0.143546, 0.139671],
  },
  {
    edge: 'open',
    order: 6,
    ahead: 1.37e-4,
    behind: 3.5e-5,
    weights: [0.172271, 0.152198, 0.167659, 0.132149, 0.151821, 0.13336, 0.143341],
  },
  {
    edge: 'open',
    order: 8,
    ahead: 9.0e-5,
    behind: 2.3e-5,
    weights: [0.173367, 0.151175, 0.178674, 0.122436, 0.179103, 0.11717, 0.154797, 0.133696, 0.143075],
  },
  {
    edge: 'closed',
    order: 4,
    ahead: 2.21e-4,
    behind: 7.2e-5,
    weights: [0.170786, 0.154003, 0.15312, 0.135467, 0.147245],
  },
  {
    edge: 'closed',
    order: 6,
    ahead: 1.34e-4,
    behind: 3.4e-5,
    weights: [0.172372, 0.153018, 0.168372, 0.133895, 0.153677, 0.136302, 0.147086],
  },
];

/** Cambered sections, closed edge, after the chord is referenced to the nose farthest from the trailing edge. Residuals by order: ahead, behind. */
export const FITS_CAMBERED: readonly {
  readonly digits: string;
  readonly noseX: number;
  readonly noseY: number;
  readonly slopeDeg: number;
  readonly surface: 'upper' | 'lower';
  readonly residuals: Readonly<Record<4 | 6 | 8, readonly [number, number]>>;
}[] = [
  {
    digits: '2412',
    noseX: -0.000078,
    noseY: 0.001585,
    slopeDeg: -0.0908,
    surface: 'upper',
    residuals: { 4: [8.1e-5, 0.0001], 6: [9e-5, 9e-5], 8: [2.4e-5, 3.2e-5] },
  },
  {
    digits: '2412',
    noseX: -0.000078,
    noseY: 0.001585,
    slopeDeg: -0.0908,
    surface: 'lower',
    residuals: { 4: [0.00051, 0.00017], 6: [0.00034, 0.00015], 8: [0.00019, 3.9e-5] },
  },
  {
    digits: '4412',
    noseX: -0.0003,
    noseY: 0.003086,
    slopeDeg: -0.1768,
    surface: 'upper',
    residuals: { 4: [0.00038, 0.00018], 6: [0.00031, 0.00021], 8: [0.00014, 6e-5] },
  },
  {
    digits: '4412',
    noseX: -0.0003,
    noseY: 0.003086,
    slopeDeg: -0.1768,
    surface: 'lower',
    residuals: { 4: [0.00076, 0.00028], 6: [0.00053, 0.00027], 8: [0.00026, 6.4e-5] },
  },
  {
    digits: '4415',
    noseX: -0.000467,
    noseY: 0.004832,
    slopeDeg: -0.2767,
    surface: 'upper',
    residuals: { 4: [0.00032, 0.00018], 6: [0.00027, 0.00019], 8: [0.00011, 5.8e-5] },
  },
  {
    digits: '4415',
    noseX: -0.000467,
    noseY: 0.004832,
    slopeDeg: -0.2767,
    surface: 'lower',
    residuals: { 4: [0.00075, 0.00028], 6: [0.00052, 0.00028], 8: [0.00024, 6.2e-5] },
  },
  {
    digits: '6412',
    noseX: -0.000639,
    noseY: 0.00447,
    slopeDeg: -0.2559,
    surface: 'upper',
    residuals: { 4: [0.00068, 0.00028], 6: [0.00052, 0.00032], 8: [0.00025, 8.7e-5] },
  },
  {
    digits: '6412',
    noseX: -0.000639,
    noseY: 0.00447,
    slopeDeg: -0.2559,
    surface: 'lower',
    residuals: { 4: [0.00099, 0.00038], 6: [0.00071, 0.0004], 8: [0.00032, 9.8e-5] },
  },
];

/** Weights of order 6 after the same normalisation. */
export const WEIGHTS_CAMBERED: readonly {
  readonly digits: string;
  readonly upper: readonly number[];
  readonly lower: readonly number[];
}[] = [
  {
    digits: '2412',
    upper: [0.17969, 0.20756, 0.20776, 0.20064, 0.19699, 0.20693, 0.21078],
    lower: [-0.16629, -0.09926, -0.12755, -0.06822, -0.10969, -0.06618, -0.08393],
  },
  {
    digits: '4412',
    upper: [0.18858, 0.2625, 0.24667, 0.26765, 0.24041, 0.27776, 0.27515],
    lower: [-0.16112, -0.04655, -0.08459, -0.00415, -0.06449, 0.00325, -0.02118],
  },
];

/** sqrt(x)(1 − x), the shape when every weight is 1, at x = 0.1, 0.2 … 0.9. Mark: computed. */
export const UNIT_SHAPE = [
  0.284605, 0.357771, 0.383406, 0.379473, 0.353553, 0.309839, 0.250998, 0.178885, 0.094868,
] as const;
