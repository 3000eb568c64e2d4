import { fitCst } from '#geometry/contour/fitting.ts';
import { measure } from '#geometry/contour/measures.ts';
import { type CstShape, lowerOrder, raiseOrder, withEqualNoseRadius } from '#geometry/shapes/cst.ts';
import { ShapeError } from '#geometry/shapes/error.ts';
import { NACA4_LIMITS, type Naca4Shape } from '#geometry/shapes/naca4.ts';
import { outlineOf, type Shape } from '#geometry/shapes/shape.ts';
import { type Outline } from '#geometry/shapes/outline.ts';
import { type Edit, type Present } from './present.ts';
import { type Surface } from './handle-ids.ts';
import { type Notice } from './notices.ts';
import { checked, sentence } from './validity.ts';

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

/** The nearest 4-digit section by the measured thickness and camber, to a hundredth of a per cent. */
export function convertToDigits(present: Present): Edit {
  if (present.shape.kind === 'naca4') return NOTHING;
  const outline = outlineOf(present.shape);
  const measures = measure(outline);
  const round = (value: number) => Math.round(value * 1e4) / 1e4;
  const within = (value: number, { min, max }: { min: number; max: number }) =>
    Math.min(max, Math.max(min, round(value)));
  const maxCamber = within(measures.maxCamber, NACA4_LIMITS.maxCamber);
  const shape: Naca4Shape = {
    kind: 'naca4',
    maxCamber,
    maxCamberPosition:
      maxCamber === 0 ? 0 : within(measures.maxCamberPosition, NACA4_LIMITS.maxCamberPosition),
    maxThickness: within(measures.maxThickness, NACA4_LIMITS.maxThickness),
    trailingEdge: outline.sharp ? 'closed' : 'open',
  };
  return attempt(present, () => ({
    shape,
    notice: { code: 'digits-taken', deviation: largestShift(outline, outlineOf(shape)) },
  }));
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
    return {
      present: null,
      notice: { code: 'refused', reason: sentence(error.issues[0]?.message ?? error.message) },
    };
  }
}

/** Largest distance between points of the same station of two outlines, an upper bound of how far the outline moved. */
function largestShift(before: Outline, after: Outline): number {
  let largest = 0;
  for (let i = 0; i <= 200; i++) {
    const t = i / 200;
    for (const surface of ['upper', 'lower'] as const) {
      const a = before[surface].at(t);
      const b = after[surface].at(t);
      largest = Math.max(largest, Math.hypot(a.x - b.x, a.y - b.y));
    }
  }
  return largest;
}
