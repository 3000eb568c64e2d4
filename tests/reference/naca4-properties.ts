/**
 * Properties of 4-digit sections, in powers of the chord. The perimeter leaves out the trailing-edge face; the centroid is measured from the
 * leading end of the mean line.
 * Mark: computed, outside this program, from the formulas of NACA Report 460. Good to the last digit printed.
 */
interface SectionProperties {
  readonly digits: string;
  readonly edge: 'open' | 'closed';
  readonly perimeter: number;
  readonly area: number;
  readonly centroidX: number;
  readonly centroidY: number;
  readonly minX: number;
  readonly maxY: number;
  readonly minY: number;
}

export const SECTION_PROPERTIES: readonly SectionProperties[] = [
  {
    digits: '0009',
    edge: 'closed',
    perimeter: 2.024537,
    area: 0.061279,
    centroidX: 0.417889,
    centroidY: 0,
    minX: 0,
    maxY: 0.045005,
    minY: -0.045005,
  },
  {
    digits: '0012',
    edge: 'closed',
    perimeter: 2.039549,
    area: 0.081706,
    centroidX: 0.417889,
    centroidY: 0,
    minX: 0,
    maxY: 0.060007,
    minY: -0.060007,
  },
  {
    digits: '0012',
    edge: 'open',
    perimeter: 2.039272,
    area: 0.08221,
    centroidX: 0.420435,
    centroidY: 0,
    minX: 0,
    maxY: 0.060017,
    minY: -0.060017,
  },
  {
    digits: '2412',
    edge: 'closed',
    perimeter: 2.041679,
    area: 0.081777,
    centroidX: 0.41776,
    centroidY: 0.015629,
    minX: -0.000078,
    maxY: 0.079201,
    minY: -0.042375,
  },
  {
    digits: '2412',
    edge: 'open',
    perimeter: 2.041402,
    area: 0.082282,
    centroidX: 0.420309,
    centroidY: 0.015586,
    minX: -0.000078,
    maxY: 0.079217,
    minY: -0.042378,
  },
  {
    digits: '6412',
    edge: 'closed',
    perimeter: 2.058565,
    area: 0.082344,
    centroidX: 0.416756,
    centroidY: 0.046767,
    minX: -0.000639,
    maxY: 0.118637,
    minY: -0.020549,
  },
];

/** Leading-edge radius in per cent of chord for thicknesses of 9, 12, 15, 18 %: r = 1.1019 t² (NACA Report 460; mark: read). */
export const NOSE_RADIUS_PERCENT: readonly (readonly [number, number])[] = [
  [9, 0.89],
  [12, 1.59],
  [15, 2.48],
  [18, 3.57],
];

/** Full thickness of the open trailing edge in per cent of chord. Mark: computed. */
export const OPEN_EDGE_PERCENT: readonly (readonly [number, number])[] = [
  [9, 0.189],
  [12, 0.252],
  [15, 0.315],
];
