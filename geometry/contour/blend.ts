import { type CstShape, type Placement, raiseOrder } from '../shapes/cst.ts';
import { shapeError } from '../shapes/error.ts';
import { percent } from '../shapes/fields.ts';
import { type Naca4Shape } from '../shapes/naca4.ts';
import { type CurvePoint, type Outline, type SurfaceCurve } from '../shapes/outline.ts';
import { type Shape, checkShape } from '../shapes/shape.ts';
import { largestThicknessAndCamber } from './thickness.ts';
import { type AnyShape, type DerivedShape, fitClosely, outlineOfAny } from './to-cst.ts';

/** A shape between two others. */
export interface BlendedShape extends DerivedShape {
  /** 0 the first, 1 the second. */
  readonly ratio: number;
}

/**
 * The shape between two others. Two 4-digit sections with the same trailing edge give the 4-digit section with the values between; two
 * free forms of the same class the free form with the weights between (orders raised to the higher first, which changes nothing): both
 * exactly. Others are blended point by point at equal t and fitted, the residual stated.
 * @param ratio 0 (the first) … 1 (the second)
 * @throws ShapeError for another ratio, or when the result is no valid shape
 */
export function blendShapes(first: AnyShape, second: AnyShape, ratio: number): BlendedShape {
  if (!(ratio >= 0 && ratio <= 1)) throw shapeError('ratio', 'ratio must be between 0 and 1');
  const exact = exactBlend(first, second, ratio);
  if (exact) return { shape: checkShape(exact), residual: 0, ratio };
  const fitted = fitClosely(blendOutlines(outlineOfAny(first), outlineOfAny(second), ratio));
  return { ...fitted, ratio };
}

function exactBlend(first: AnyShape, second: AnyShape, ratio: number): Shape | null {
  if (ratio === 0 && first.kind !== 'measured') return first;
  if (ratio === 1 && second.kind !== 'measured') return second;
  if (first.kind === 'naca4' && second.kind === 'naca4' && first.trailingEdge === second.trailingEdge) {
    return blendFourDigits(first, second, ratio);
  }
  if (first.kind === 'cst' && second.kind === 'cst' && first.n1 === second.n1 && first.n2 === second.n2) {
    return blendFreeForms(first, second, ratio);
  }
  return null;
}

function between(a: number, b: number, ratio: number): number {
  return a === b ? a : (1 - ratio) * a + ratio * b;
}

/** Without camber a section has no camber position: that of the other counts. */
function blendFourDigits(a: Naca4Shape, b: Naca4Shape, ratio: number): Naca4Shape {
  const positionA = a.maxCamber === 0 ? b.maxCamberPosition : a.maxCamberPosition;
  const positionB = b.maxCamber === 0 ? a.maxCamberPosition : b.maxCamberPosition;
  return {
    kind: 'naca4',
    maxCamber: between(a.maxCamber, b.maxCamber, ratio),
    maxCamberPosition: between(positionA, positionB, ratio),
    maxThickness: between(a.maxThickness, b.maxThickness, ratio),
    trailingEdge: a.trailingEdge,
  };
}

const UNPLACED: Placement = { x: 0, y: 0, rotationDeg: 0, scale: 1 };

function blendFreeForms(a: CstShape, b: CstShape, ratio: number): CstShape {
  const weights = (surface: 'upper' | 'lower') => {
    const order = Math.max(a[surface].length, b[surface].length) - 1;
    const [from, to] = [a, b].map((shape) => raiseOrder(shape, surface, order)[surface]);
    return (from ?? []).map((weight, i) => between(weight, to?.[i] ?? 0, ratio));
  };
  const [p, q] = [a.placement ?? UNPLACED, b.placement ?? UNPLACED];
  const placement: Placement = {
    x: between(p.x, q.x, ratio),
    y: between(p.y, q.y, ratio),
    rotationDeg: between(p.rotationDeg, q.rotationDeg, ratio),
    scale: between(p.scale, q.scale, ratio),
  };
  return {
    kind: 'cst',
    upper: weights('upper'),
    lower: weights('lower'),
    n1: a.n1,
    n2: a.n2,
    trailingEdgeGap: between(a.trailingEdgeGap, b.trailingEdgeGap, ratio),
    ...(a.placement || b.placement ? { placement } : {}),
  };
}

/** The outline between two others, point by point at equal t. @param ratio 0 … 1 */
export function blendOutlines(a: Outline, b: Outline, ratio: number): Outline {
  const [upper, lower] = [surfaceBetween(a.upper, b.upper, ratio), surfaceBetween(a.lower, b.lower, ratio)];
  const [u, l] = [upper.at(1), lower.at(1)];
  return {
    upper,
    lower,
    sharp: u.x === l.x && u.y === l.y,
    meanLine(station) {
      const [p, q] = [a.meanLine(station), b.meanLine(station)];
      return { x: between(p.x, q.x, ratio), y: between(p.y, q.y, ratio) };
    },
  };
}

function surfaceBetween(a: SurfaceCurve, b: SurfaceCurve, ratio: number): SurfaceCurve {
  return {
    breaks: [...new Set([...a.breaks, ...b.breaks])].sort((s, t) => s - t),
    at(t) {
      const [p, q] = [a.at(t), b.at(t)];
      return { x: between(p.x, q.x, ratio), y: between(p.y, q.y, ratio) };
    },
    derivatives(t): CurvePoint {
      const [p, q] = [a.derivatives(t), b.derivatives(t)];
      return {
        x: between(p.x, q.x, ratio),
        y: between(p.y, q.y, ratio),
        dx: between(p.dx, q.dx, ratio),
        dy: between(p.dy, q.dy, ratio),
        ddx: between(p.ddx, q.ddx, ratio),
        ddy: between(p.ddy, q.ddy, ratio),
      };
    },
  };
}

const HALVINGS = 50;

/**
 * The shape between two others that has a thickness. Thickness is that measured on the outline; of two 4-digit sections blended by their
 * values it is the value of that name.
 * @param thickness fractions of chord, between those of both shapes
 * @throws ShapeError when it is not, or both are equally thick, or the result is no valid shape
 */
export function blendToThickness(first: AnyShape, second: AnyShape, thickness: number): BlendedShape {
  const at = thicknessAlong(first, second);
  const [from, to] = [at(0), at(1)];
  const [low, high] = [Math.min(from, to), Math.max(from, to)];
  if (!(thickness >= low && thickness <= high)) {
    const range = `between ${percent(low, 3)} % and ${percent(high, 3)} % of chord`;
    throw shapeError('thickness', `thickness must be ${range}, as thick as the two sections`);
  }
  if (from === to) return blendShapes(first, second, 0);
  let [below, above] = from < to ? [0, 1] : [1, 0];
  for (let step = 0; step < HALVINGS; step++) {
    const middle = (below + above) / 2;
    if (at(middle) < thickness) below = middle;
    else above = middle;
  }
  return blendShapes(first, second, above);
}

function thicknessAlong(first: AnyShape, second: AnyShape): (ratio: number) => number {
  if (first.kind === 'naca4' && second.kind === 'naca4' && first.trailingEdge === second.trailingEdge) {
    return (ratio) => between(first.maxThickness, second.maxThickness, ratio);
  }
  const [a, b] = [outlineOfAny(first), outlineOfAny(second)];
  return (ratio) => {
    const exact = exactBlend(first, second, ratio);
    return largestThicknessAndCamber(exact ? outlineOfAny(exact) : blendOutlines(a, b, ratio)).maxThickness;
  };
}
