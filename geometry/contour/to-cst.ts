import { CST_LIMITS, type CstShape } from '../shapes/cst.ts';
import { ShapeError, shapeError } from '../shapes/error.ts';
import { type MeasuredShape, measuredOutline } from '../shapes/measured.ts';
import { type Outline } from '../shapes/outline.ts';
import { type Shape, outlineOf } from '../shapes/shape.ts';
import { fitCst } from './fitting.ts';

/** A shape of any kind, a contour kept as points among them. */
export type AnyShape = Shape | MeasuredShape;

/** The outline of a valid shape of any kind. */
export function outlineOfAny(shape: AnyShape): Outline {
  return shape.kind === 'measured' ? measuredOutline(shape) : outlineOf(shape);
}

/** A shape made from others, and how exactly. */
export interface DerivedShape {
  readonly shape: Shape;
  /** Largest distance of the shape from what was asked for, square to the contour, fractions of chord; 0 when it is exact. */
  readonly residual: number;
}

/** A free-form shape made from another, and how exactly. */
export interface DerivedCst extends DerivedShape {
  readonly shape: CstShape;
}

/** A fit this close needs no higher order: 0.02 mm on a chord of 200 mm. */
const CLOSE = 1e-4;
const LOWEST_ORDER = 6;

/**
 * A free-form shape for an outline: the lowest order from 6 on that comes within 0.01 % of chord, else the order that comes nearest.
 * @throws ShapeError when no order gives a valid shape
 */
export function fitClosely(outline: Outline): DerivedCst {
  let best: DerivedCst | null = null;
  let refusal: ShapeError | null = null;
  for (let order = LOWEST_ORDER; order <= CST_LIMITS.order.max; order++) {
    try {
      const { shape, residual } = fitCst(outline, { orderUpper: order, orderLower: order });
      if (!best || residual.largest < best.residual) best = { shape, residual: residual.largest };
      if (best.residual <= CLOSE) return best;
    } catch (error) {
      if (!(error instanceof ShapeError)) throw error;
      refusal ??= error;
    }
  }
  if (best) return best;
  throw refusal ?? shapeError('', 'the outline cannot be fitted by a free form');
}

/** The shape as a free form: itself when it is one, else the close fit of its outline. @throws ShapeError when it cannot be fitted */
export function toCst(shape: AnyShape): DerivedCst {
  return shape.kind === 'cst' ? { shape, residual: 0 } : fitClosely(outlineOfAny(shape));
}
