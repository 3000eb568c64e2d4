import { type Point } from '../point.ts';
import { binomial } from './bernstein.ts';
import { ordinateAt } from './cst-outline.ts';
import { type CstShape, type Surface } from './cst-schema.ts';
import { shapeError } from './error.ts';
import { similarityOf, toChord } from './placement.ts';

/** Which surfaces a change is for. */
export type Surfaces = Surface | 'both';

/** Smallest influence of a weight at a station through which it can still be solved. Below, the weight would be meaninglessly large. */
const LEAST_INFLUENCE = 1e-9;

/** The shape with weight `index` of a surface replaced. */
export function withWeight(shape: CstShape, surface: Surface, index: number, weight: number): CstShape {
  checkIndex(shape, surface, index);
  return { ...shape, [surface]: shape[surface].map((old, i) => (i === index ? weight : old)) };
}

/** +1 for the upper, −1 for the lower surface, whose weights and angles are mirrored. */
function sideOf(surface: Surface): 1 | -1 {
  return surface === 'upper' ? 1 : -1;
}

function each(
  shape: CstShape,
  surfaces: Surfaces,
  change: (shape: CstShape, surface: Surface) => CstShape,
): CstShape {
  return surfaces === 'both' ? change(change(shape, 'upper'), 'lower') : change(shape, surfaces);
}

/**
 * Nose radius of a surface in fractions of the shape's chord: R = A₀²/2 for n1 = 0.5 (Kulfan 2008: A₀ = sqrt(2 R)).
 * A larger n1 makes a pointed nose, whose radius is 0.
 */
export function noseRadiusOf(shape: CstShape, surface: Surface): number {
  const first = shape[surface][0] ?? 0;
  return shape.n1 === 0.5 ? (first * first) / 2 : 0;
}

/**
 * Sets the nose radius through the first weight, ±sqrt(2 R).
 * @param radius fractions of the shape's chord, 0 or more
 * @throws ShapeError for a negative or non-finite radius, or when n1 is not 0.5 (the nose is then not round)
 */
export function withNoseRadius(shape: CstShape, surfaces: Surfaces, radius: number): CstShape {
  if (!(radius >= 0 && Number.isFinite(radius)))
    throw shapeError('noseRadius', 'noseRadius must be 0 or more');
  if (shape.n1 !== 0.5)
    throw shapeError('n1', 'the nose is round, with a radius to set, only when n1 is 0.5');
  return each(shape, surfaces, (old, surface) =>
    withWeight(old, surface, 0, sideOf(surface) * Math.sqrt(2 * radius)),
  );
}

/** The lower surface's nose radius made that of the upper: A₀ lower = −A₀ upper. */
export function withEqualNoseRadius(shape: CstShape): CstShape {
  return withWeight(shape, 'lower', 0, -(shape.upper[0] ?? 0));
}

/**
 * Boat-tail angle of a surface in degrees: its slope towards the chord at the trailing edge, positive when it closes.
 * For n2 = 1, A_n = tan β + gap/2 (Kulfan 2008). For n2 > 1 the weights no longer reach the trailing edge and the surface leaves
 * along the gap's wedge; for n2 < 1 it ends square to the chord.
 */
export function boatTailAngleDegOf(shape: CstShape, surface: Surface): number {
  const halfGap = shape.trailingEdgeGap / 2;
  const last = sideOf(surface) * (shape[surface].at(-1) ?? 0);
  if (shape.n2 < 1) return last === 0 ? degrees(Math.atan(-halfGap)) : Math.sign(last) * 90;
  return degrees(Math.atan(shape.n2 === 1 ? last - halfGap : -halfGap));
}

/**
 * Sets the boat-tail angle through the last weight.
 * @param deg degrees, between −90 and 90 (both excluded)
 * @throws ShapeError for another angle, or when n2 is not 1
 */
export function withBoatTailAngleDeg(shape: CstShape, surfaces: Surfaces, deg: number): CstShape {
  if (!(Math.abs(deg) < 90))
    throw shapeError('boatTailAngleDeg', 'boatTailAngleDeg must be between -90 and 90 degrees');
  if (shape.n2 !== 1) throw shapeError('n2', 'the boat-tail angle follows the last weight only when n2 is 1');
  const weight = Math.tan((deg * Math.PI) / 180) + shape.trailingEdgeGap / 2;
  return each(shape, surfaces, (old, surface) =>
    withWeight(old, surface, old[surface].length - 1, sideOf(surface) * weight),
  );
}

function degrees(radians: number): number {
  return (radians * 180) / Math.PI;
}

/** How much the ordinate at a station (0 … 1) moves when weight `index` moves by 1: x^n1 (1−x)^n2 times its Bernstein polynomial. */
export function weightInfluence(shape: CstShape, surface: Surface, index: number, station: number): number {
  const n = shape[surface].length - 1;
  return (
    binomial(n, index) * Math.pow(station, shape.n1 + index) * Math.pow(1 - station, shape.n2 + n - index)
  );
}

/**
 * The station (0 … 1, both excluded) where a weight has its largest influence, where its handle sits: the maximum of
 * x^(n1+i) (1−x)^(n2+n−i) lies at (n1+i)/(n1+n2+n). Derived here by setting the logarithmic derivative to zero.
 * @throws ShapeError when the surface has no such weight
 */
export function weightStation(shape: CstShape, surface: Surface, index: number): number {
  checkIndex(shape, surface, index);
  return (shape.n1 + index) / (shape.n1 + shape.n2 + shape[surface].length - 1);
}

/**
 * Solves one weight so that the surface passes exactly through a point of the sheet, at that point's own station. The other weights
 * stay. The weight may come out beyond CST_LIMITS when the point is far away: the caller checks the result with checkShape.
 * @throws ShapeError when the point does not lie between nose and trailing edge, or so near to an end that the weight cannot move it there
 */
export function weightThrough(shape: CstShape, surface: Surface, index: number, point: Point): CstShape {
  checkIndex(shape, surface, index);
  const local = toChord(similarityOf(shape.placement), point);
  if (!(Number.isFinite(local.y) && local.x > 0 && local.x < 1)) {
    throw shapeError('point', 'the point must lie between nose and trailing edge');
  }
  const influence = weightInfluence(shape, surface, index, local.x);
  if (influence < LEAST_INFLUENCE) {
    throw shapeError(
      'point',
      `weight ${index} of the ${surface} surface cannot move the surface at this station`,
    );
  }
  const without = ordinateAt(withWeight(shape, surface, index, 0), surface, local.x);
  return withWeight(shape, surface, index, (local.y - without) / influence);
}

function checkIndex(shape: CstShape, surface: Surface, index: number): void {
  if (!Number.isInteger(index) || index < 0 || index >= shape[surface].length) {
    throw shapeError(
      `${surface}.${index}`,
      `the ${surface} surface has weights 0 to ${shape[surface].length - 1}`,
    );
  }
}
