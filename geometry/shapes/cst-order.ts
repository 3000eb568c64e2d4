import { elevate, evaluateScaled, scaledWeights } from './bernstein.ts';
import { CST_LIMITS, type CstShape, type Surface } from './cst-schema.ts';
import { type Surfaces, weightInfluence } from './cst-weights.ts';
import { shapeError } from './error.ts';
import { leastSquares } from './least-squares.ts';
import { stationOf } from './outline.ts';

/** Number of cosine-spaced stations on which a surface is fitted. */
export const FIT_STATIONS = 201;

function surfacesOf(surfaces: Surfaces): readonly Surface[] {
  return surfaces === 'both' ? ['upper', 'lower'] : [surfaces];
}

/**
 * Raises the order of a surface without changing its shape (degree elevation, repeated). A surface that has the order stays.
 * @param order up to 12
 * @throws ShapeError when the order is out of range or below the present one
 */
export function raiseOrder(shape: CstShape, surfaces: Surfaces, order: number): CstShape {
  checkOrder(order);
  let result = shape;
  for (const surface of surfacesOf(surfaces)) {
    let weights = shape[surface];
    if (weights.length - 1 > order) {
      throw shapeError(
        surface,
        `the ${surface} surface already has order ${weights.length - 1}, above ${order}`,
      );
    }
    while (weights.length - 1 < order) weights = elevate(weights);
    result = { ...result, [surface]: weights };
  }
  return result;
}

/**
 * Lowers the order of a surface by least squares of its ordinates on 201 cosine stations. A surface of that order or less stays.
 * @param order 2 or more
 * @returns the shape and the largest change of an ordinate on those stations, in fractions of the shape's chord
 * @throws ShapeError when the order is out of range
 */
export function lowerOrder(
  shape: CstShape,
  surfaces: Surfaces,
  order: number,
): { readonly shape: CstShape; readonly residual: number } {
  checkOrder(order);
  let result = shape;
  let residual = 0;
  for (const surface of surfacesOf(surfaces)) {
    if (shape[surface].length - 1 <= order) continue;
    const stations = Float64Array.from({ length: FIT_STATIONS }, (_, j) => stationOf(j / (FIT_STATIONS - 1)));
    const target = stations.map(
      (x) => classValue(shape, x) * evaluateScaled(scaledWeights(shape[surface]), x, 1 - x),
    );
    const weights = fitWeights(shape, order, stations, target);
    const scaled = scaledWeights(weights);
    stations.forEach((x, j) => {
      const fitted = classValue(shape, x) * evaluateScaled(scaled, x, 1 - x);
      residual = Math.max(residual, Math.abs(fitted - (target[j] ?? 0)));
    });
    result = { ...result, [surface]: weights };
  }
  return { shape: result, residual };
}

function classValue(shape: Pick<CstShape, 'n1' | 'n2'>, x: number): number {
  return Math.pow(x, shape.n1) * Math.pow(1 - x, shape.n2);
}

/**
 * Bernstein weights of one surface by linear least squares of ordinates (the trailing-edge term already taken out), unweighted:
 * dividing by the class function would let both ends outweigh the rest (Kulfan 2008 on fitting; practice).
 * @param order 2 … 12
 * @param stations strictly ascending, 0 … 1, at least order + 3 of them
 * @throws ShapeError when the stations do not determine the weights
 */
export function fitWeights(
  { n1, n2 }: Pick<CstShape, 'n1' | 'n2'>,
  order: number,
  stations: Float64Array,
  ordinates: Float64Array,
): number[] {
  checkOrder(order);
  const weights = new Array<number>(order + 1).fill(0);
  const unit: CstShape = { kind: 'cst', upper: weights, lower: weights, trailingEdgeGap: 0, n1, n2 };
  const columns = weights.map((_, i) => stations.map((x) => weightInfluence(unit, 'upper', i, x)));
  const solution = leastSquares(columns, ordinates);
  if (!solution)
    throw shapeError('', `${stations.length} stations do not determine a surface of order ${order}`);
  return solution;
}

function checkOrder(order: number): void {
  const { min, max } = CST_LIMITS.order;
  if (!Number.isInteger(order) || order < min || order > max) {
    throw shapeError('order', `order must be a whole number between ${min} and ${max}`);
  }
}
