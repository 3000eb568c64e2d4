import { CST_LIMITS, type CstShape, cstOutline, raiseOrder } from '../shapes/cst.ts';
import { shapeError } from '../shapes/error.ts';
import { percent } from '../shapes/fields.ts';
import { type Naca4Shape, naca4Outline } from '../shapes/naca4.ts';
import { checkShape } from '../shapes/shape.ts';
import { largestThicknessAndCamber } from './thickness.ts';
import { type AnyShape, type DerivedCst, type DerivedShape, toCst } from './to-cst.ts';

/**
 * The shape with its thickness scaled to a value, the mean line kept; the trailing-edge gap scales with it. A 4-digit section takes the
 * value as its own and stays one, a free form is scaled exactly, a measured contour is fitted first.
 * @param thickness fractions of chord, above 0
 * @throws ShapeError when the value is out of range or the result is no valid shape
 */
export function withThickness(shape: AnyShape, thickness: number): DerivedShape {
  if (!(thickness > 0 && Number.isFinite(thickness))) {
    throw shapeError('thickness', 'thickness must be above 0 % of chord');
  }
  if (shape.kind === 'naca4') return exactly({ ...shape, maxThickness: thickness });
  const source = toCst(shape);
  const present = largestThicknessAndCamber(cstOutline(source.shape)).maxThickness;
  return scaled(source, thickness / present, 1);
}

/** Less camber than this, in fractions of chord, is none: there is no line to scale. */
const NO_CAMBER = 1e-6;

/**
 * The shape with its camber scaled to a value, the thickness kept. A 4-digit section takes the value as its own and stays one, a free form
 * is scaled exactly, a measured contour is fitted first.
 * @param camber fractions of chord, positive upwards; 0 makes the section symmetric
 * @throws ShapeError when the shape has no camber that could be scaled, or the result is no valid shape
 */
export function withCamber(shape: AnyShape, camber: number): DerivedShape {
  if (!Number.isFinite(camber)) throw shapeError('camber', 'camber must be a number in % of chord');
  if (shape.kind === 'naca4') {
    if (shape.maxCamber === 0 && camber !== 0) throw noCamber();
    return exactly({ ...shape, maxCamber: camber });
  }
  const source = toCst(shape);
  const present = largestThicknessAndCamber(cstOutline(source.shape)).maxCamber;
  if (Math.abs(present) < NO_CAMBER) {
    if (camber === 0) return source;
    throw noCamber();
  }
  return scaled(source, 1, camber / present);
}

function noCamber() {
  return shapeError('camber', 'the section has no camber that could be scaled');
}

function exactly(shape: Naca4Shape | CstShape): DerivedShape {
  return { shape: checkShape(shape), residual: 0 };
}

/**
 * A free form with its thickness and its camber each scaled: with equal orders, the weights of the mean line are half their sum and those
 * of the half-thickness half their difference.
 */
function scaled({ shape, residual }: DerivedCst, thickness: number, camber: number): DerivedShape {
  const raised = raiseOrder(shape, 'both', Math.max(shape.upper.length, shape.lower.length) - 1);
  const mean = raised.upper.map((weight, i) => (camber * (weight + (raised.lower[i] ?? 0))) / 2);
  const half = raised.upper.map((weight, i) => (thickness * (weight - (raised.lower[i] ?? 0))) / 2);
  const result: CstShape = {
    ...raised,
    upper: mean.map((value, i) => value + (half[i] ?? 0)),
    lower: mean.map((value, i) => value - (half[i] ?? 0)),
    trailingEdgeGap: shape.trailingEdgeGap * thickness,
  };
  const grown = Math.max(1, thickness, Math.abs(camber));
  return { shape: checkShape(result), residual: residual * grown };
}

/** Gaps that differ by less, in fractions of chord, are the same. */
const SAME_GAP = 1e-9;

/**
 * The shape with its trailing edge opened or closed to a gap: each surface is moved by a wedge that grows evenly from nothing at the nose
 * (common practice). A free form takes the gap exactly. A 4-digit section stays one when the gap is nothing or that of its open trailing
 * edge; else it is fitted by a free form first.
 * @param gapMm 0 or more
 * @param chordMm the chord it is measured at, above 0
 * @throws ShapeError when the gap is out of range or the result is no valid shape
 */
export function withTrailingEdgeGap(shape: AnyShape, gapMm: number, chordMm: number): DerivedShape {
  const { max } = CST_LIMITS.trailingEdgeGap;
  if (!(chordMm > 0 && Number.isFinite(chordMm))) throw shapeError('chordMm', 'chordMm must be above 0');
  if (!(gapMm >= 0 && gapMm <= max * chordMm)) {
    const most = Number((max * chordMm).toFixed(3));
    throw shapeError('gapMm', `gapMm must be between 0 and ${most} mm, ${percent(max)} % of the chord`);
  }
  const gap = gapMm / chordMm;
  if (shape.kind === 'naca4') {
    if (gap < SAME_GAP) return exactly({ ...shape, trailingEdge: 'closed' });
    if (Math.abs(gap - openGap(shape)) < SAME_GAP) return exactly({ ...shape, trailingEdge: 'open' });
  }
  const { shape: free, residual } = toCst(shape);
  const own = gap / (free.placement?.scale ?? 1);
  return { shape: checkShape({ ...free, trailingEdgeGap: own }), residual };
}

/** The gap of a 4-digit section with the open trailing edge. */
function openGap(shape: Naca4Shape): number {
  const { upper, lower } = naca4Outline({ ...shape, trailingEdge: 'open' });
  const [u, l] = [upper.at(1), lower.at(1)];
  return Math.hypot(u.x - l.x, u.y - l.y);
}
