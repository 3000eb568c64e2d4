import { type Point } from '#geometry/point.ts';
import { fitCst } from '#geometry/contour/fitting.ts';
import {
  type CstShape,
  lowerOrder,
  raiseOrder,
  type Surface,
  withEqualNoseRadius,
} from '#geometry/shapes/cst.ts';
import { ShapeError } from '#geometry/shapes/error.ts';
import { NACA4_LIMITS, type Naca4Shape } from '#geometry/shapes/naca4.ts';
import { outlineOf, type Shape } from '#geometry/shapes/shape.ts';
import { type Outline } from '#geometry/shapes/outline.ts';
import { thicknessDistribution } from '#client/drawing/distribution.ts';
import { drawSection } from '#client/drawing/section-drawing.ts';
import { type Edit, type Present } from './present.ts';
import { type Notice } from './notices.ts';
import { checked, reasonOf } from './validity.ts';

const NOTHING: Edit = { present: null, notice: null };

/** Turns a 4-digit section into a free-form one that lies where it lay. */
export function convertToFreeForm(present: Present, order: number): Edit {
  if (present.shape.kind === 'cst') return NOTHING;
  const source = outlineOf(present.shape);
  return attempt(present, () => {
    const fit = fitCst(source, { orderUpper: order, orderLower: order });
    return {
      shape: fit.shape,
      notice: { code: 'converted', order, residual: fit.residual.largest, rotationDeg: fit.rotationDeg },
    };
  });
}

/**
 * The nearest 4-digit section by the thickness and camber of the outline where it lies on the sheet, to a hundredth of a
 * per cent. (Measured from its own nose, the camber of a turned outline would come out different.)
 */
export function convertToDigits(present: Present): Edit {
  if (present.shape.kind === 'naca4') return NOTHING;
  const drawing = drawSection(present.shape);
  const { outline, measures } = drawing;
  const crest = crestOf(thicknessDistribution(drawing).camber);
  const maxCamber = nearest(crest.y, NACA4_LIMITS.maxCamber);
  const shape: Naca4Shape = {
    kind: 'naca4',
    maxCamber,
    maxCamberPosition: maxCamber === 0 ? 0 : nearest(crest.x, NACA4_LIMITS.maxCamberPosition),
    maxThickness: nearest(measures.maxThickness, NACA4_LIMITS.maxThickness),
    trailingEdge: outline.sharp ? 'closed' : 'open',
  };
  return attempt(present, () => ({
    shape,
    notice: { code: 'digits-taken', deviation: largestShift(outline, outlineOf(shape)) },
  }));
}

/** The highest point of a curve: of the parabola through its highest sample and the samples beside it. */
function crestOf(points: readonly Point[]): Point {
  const top = points.reduce((best, point, i) => (point.y > (points[best]?.y ?? -Infinity) ? i : best), 0);
  const [a, b, c] = [points[top - 1], points[top], points[top + 1]];
  if (!b) return { x: 0, y: 0 };
  if (!a || !c) return b;
  const rising = (b.y - a.y) / (b.x - a.x);
  const falling = (c.y - b.y) / (c.x - b.x);
  const bend = (falling - rising) / (c.x - a.x);
  if (bend >= 0) return b;
  const x = Math.min(c.x, Math.max(a.x, (a.x + b.x) / 2 - rising / (2 * bend)));
  return { x, y: b.y + (x - b.x) * (rising + bend * (x - a.x)) };
}

/** The nearest accepted value in hundredths of a per cent. */
function nearest(value: number, { min, max }: { readonly min: number; readonly max: number }): number {
  return Math.min(max, Math.max(min, Math.round(value * 1e4) / 1e4));
}

/** Sets the order of one surface or both: raised without change, lowered by least squares. */
export function withOrder(present: Present, surface: Surface | 'both', order: number): Edit {
  const { shape } = present;
  if (shape.kind !== 'cst') return NOTHING;
  const surfaces: readonly Surface[] = surface === 'both' ? ['upper', 'lower'] : [surface];
  return attempt(present, () => {
    let next: CstShape = shape;
    let residual = 0;
    for (const each of surfaces) {
      if (next[each].length - 1 <= order) next = raiseOrder(next, each, order);
      else {
        const lowered = lowerOrder(next, each, order);
        next = lowered.shape;
        residual = Math.max(residual, lowered.residual);
      }
    }
    const notice: Notice =
      residual > 0 ? { code: 'order-lowered', order, residual } : { code: 'order-raised', order };
    return { shape: next, notice };
  });
}

/** Opens or closes the trailing edge of a 4-digit section; closes that of a free-form section. */
export function withEdge(present: Present, trailingEdge: 'open' | 'closed'): Edit {
  const { shape } = present;
  if (shape.kind === 'naca4')
    return { present: { ...present, shape: { ...shape, trailingEdge } }, notice: null };
  if (trailingEdge === 'open') return NOTHING;
  return attempt(present, () => ({ shape: { ...shape, trailingEdgeGap: 0 }, notice: null }));
}

/** Keeps the nose radius equal on both sides: the lower one follows the upper one from now on. */
export function withEqualNose(present: Present, on: boolean): Edit {
  const { shape } = present;
  if (shape.kind !== 'cst') return NOTHING;
  if (!on) return { present: { ...present, equalNose: false }, notice: null };
  const edit = attempt(present, () => ({ shape: withEqualNoseRadius(shape), notice: null }));
  return edit.present ? { ...edit, present: { ...edit.present, equalNose: true } } : edit;
}

function attempt(present: Present, make: () => { shape: Shape; notice: Notice | null }): Edit {
  try {
    const made = make();
    const result = checked(() => made.shape);
    if (result.shape) return { present: { ...present, shape: result.shape }, notice: made.notice };
    return { present: null, notice: { code: 'refused', reason: result.reason } };
  } catch (error) {
    if (!(error instanceof ShapeError)) throw error;
    return { present: null, notice: { code: 'refused', reason: reasonOf(error) } };
  }
}

const SHIFT_POINTS = 200;

/** Largest distance of one outline from another, from points of the first to the chords between points of the second. */
function largestShift(before: Outline, after: Outline): number {
  const along = (outline: Outline) => [
    ...Array.from({ length: SHIFT_POINTS }, (_, i) => outline.upper.at(1 - i / SHIFT_POINTS)),
    ...Array.from({ length: SHIFT_POINTS + 1 }, (_, i) => outline.lower.at(i / SHIFT_POINTS)),
  ];
  const chords = along(before);
  return Math.max(...along(after).map((point) => distanceToPolyline(point, chords)));
}

function distanceToPolyline(point: Point, chords: readonly Point[]): number {
  let nearest = Infinity;
  for (let i = 1; i < chords.length; i++) {
    const [a, b] = [chords[i - 1], chords[i]];
    if (!a || !b) continue;
    const [dx, dy] = [b.x - a.x, b.y - a.y];
    const square = dx * dx + dy * dy;
    const along = square === 0 ? 0 : ((point.x - a.x) * dx + (point.y - a.y) * dy) / square;
    const share = Math.min(1, Math.max(0, along));
    nearest = Math.min(nearest, Math.hypot(a.x + share * dx - point.x, a.y + share * dy - point.y));
  }
  return nearest;
}
