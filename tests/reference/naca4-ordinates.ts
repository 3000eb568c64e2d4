/**
 * Published ordinates of 4-digit sections, in per cent of chord.
 * Source: Abbott, von Doenhoff & Stivers, NACA Report 824 (1945), basic thickness forms; Jacobs, Ward & Pinkerton, NACA Report 460 (1933),
 * ordinates of the cambered sections, repeated in Report 824.
 * Mark: from memory. The thickness forms agree with the open polynomial to 0.00055, which is rounding. The cambered columns carry two
 * decimals and were partly rounded by hand; they agree to 0.026.
 */

/** Thickness of each column of THICKNESS_FORMS in per cent of chord. */
export const THICKNESS_COLUMNS = [6, 9, 12, 15, 18] as const;

/** Station, then the half-thickness of 0006, 0009, 0012, 0015, 0018; open trailing edge. */
export const THICKNESS_FORMS: readonly (readonly [number, number, number, number, number, number])[] = [
  [1.25, 0.947, 1.42, 1.894, 2.367, 2.841],
  [2.5, 1.307, 1.961, 2.615, 3.268, 3.922],
  [5, 1.777, 2.666, 3.555, 4.443, 5.332],
  [7.5, 2.1, 3.15, 4.2, 5.25, 6.3],
  [10, 2.341, 3.512, 4.683, 5.853, 7.024],
  [15, 2.673, 4.009, 5.345, 6.682, 8.018],
  [20, 2.869, 4.303, 5.737, 7.172, 8.606],
  [25, 2.971, 4.456, 5.941, 7.427, 8.912],
  [30, 3.001, 4.501, 6.002, 7.502, 9.003],
  [40, 2.902, 4.352, 5.803, 7.254, 8.705],
  [50, 2.647, 3.971, 5.294, 6.617, 7.941],
  [60, 2.282, 3.423, 4.563, 5.704, 6.845],
  [70, 1.832, 2.748, 3.664, 4.58, 5.496],
  [80, 1.312, 1.967, 2.623, 3.279, 3.935],
  [90, 0.724, 1.086, 1.448, 1.81, 2.172],
  [95, 0.403, 0.605, 0.807, 1.008, 1.21],
  [100, 0.063, 0.095, 0.126, 0.158, 0.189],
];

/** Station, upper ordinate, lower ordinate. */
type CamberedRow = readonly [number, number, number];

export const ORDINATES_2412: readonly CamberedRow[] = [
  [1.25, 2.15, -1.65],
  [2.5, 2.99, -2.27],
  [5, 4.13, -3.01],
  [7.5, 4.96, -3.46],
  [10, 5.63, -3.75],
  [15, 6.61, -4.1],
  [20, 7.26, -4.23],
  [25, 7.67, -4.22],
  [30, 7.88, -4.12],
  [40, 7.8, -3.8],
  [50, 7.24, -3.34],
  [60, 6.36, -2.76],
  [70, 5.18, -2.14],
  [80, 3.75, -1.5],
  [90, 2.08, -0.82],
  [95, 1.14, -0.48],
];

export const ORDINATES_4412: readonly CamberedRow[] = [
  [1.25, 2.44, -1.43],
  [2.5, 3.39, -1.95],
  [5, 4.73, -2.49],
  [7.5, 5.76, -2.74],
  [10, 6.59, -2.86],
  [15, 7.89, -2.88],
  [20, 8.8, -2.74],
  [25, 9.41, -2.5],
  [30, 9.76, -2.26],
  [40, 9.8, -1.8],
  [50, 9.19, -1.4],
  [60, 8.14, -1.0],
  [70, 6.69, -0.65],
  [80, 4.89, -0.39],
  [90, 2.71, -0.22],
  [95, 1.47, -0.16],
];
