import { type Point } from '#geometry/point.ts';
import {
  CST_LIMITS,
  type CstShape,
  type Surface,
  weightStation,
  weightThrough,
  withEqualNoseRadius,
  withNoseRadius,
  withWeight,
} from '#geometry/shapes/cst.ts';
import {
  NACA4_LIMITS,
  type Naca4Shape,
  naca4ThicknessOfNose,
  snapToDigits,
  thickestStation,
} from '#geometry/shapes/naca4.ts';
import { type Shape } from '#geometry/shapes/shape.ts';
import { similarityOf, toChord, toSheet } from '#geometry/shapes/placement.ts';
import { type Edit, type Present } from './present.ts';
import { meanNoseRadius, noseCircle, scaleOf, surfacePoint } from '#client/drawing/section-points.ts';
import { handlePoint } from './handle-points.ts';
import { type HandleId, weightOf } from './handle-ids.ts';
import { type Notice } from './notices.ts';
import { checked } from './validity.ts';

/** A move of a handle: what it makes of the section and where the handle then stands. */
interface Move extends Edit {
  readonly at: Point | null;
}

/** Steps of the arrow keys, in units of `NUDGE`. */
export interface NudgeSteps {
  readonly x: number;
  readonly y: number;
}

/** One arrow key step in fractions of chord; with Shift ten of them. */
const NUDGE = 0.0005;
export const COARSE = 10;

/**
 * Moves a handle of `start` to a point, in fractions of chord. Values stop at their limits and say so; a shape whose
 * surfaces would cross is not made, and the notice says why.
 * @param options.snap Hold the moved values of a 4-digit section to whole digits.
 */
export function moveHandle(start: Present, handle: HandleId, to: Point, options: { snap: boolean }): Move {
  const proposal = propose(start, handle, to, options.snap);
  if (!proposal) return { present: null, notice: null, at: null };
  const result = checked(() => proposal.shape);
  if (result.reason !== undefined)
    return { present: null, notice: { code: 'refused', reason: result.reason }, at: null };
  return {
    present: { ...start, shape: result.shape },
    notice: proposal.notice,
    at: proposal.at ?? handlePoint(result.shape, handle),
  };
}

/** Moves a handle by arrow key steps. */
export function nudgeHandle(present: Present, handle: HandleId, steps: NudgeSteps): Edit {
  const { shape } = present;
  const from = handlePoint(shape, handle);
  if (!from) return { present: null, notice: null };
  if (handle === 'nose') {
    // The handle stands two radii from the nose; a step is one of the radius.
    const { axis } = noseCircle(shape);
    const by = 2 * (steps.x + steps.y) * NUDGE;
    return moveHandle(present, handle, { x: from.x + by * axis.x, y: from.y + by * axis.y }, { snap: false });
  }
  if (handle === 'edge' && shape.kind === 'naca4') return turnEdge(present, shape, steps.x + steps.y);
  if (handle === 'thickness-upper' || handle === 'thickness-lower')
    return nudgeThickness(present, handle, steps);
  const sideways = handle === 'camber' ? steps.x : 0;
  const up = handle === 'camber' ? steps.y : steps.y + steps.x;
  // The gap opens on both sides of the chord line: a step is one of the gap.
  const factor = handle === 'edge' ? 0.5 : 1;
  const to = { x: from.x + sideways * NUDGE, y: from.y + up * NUDGE * factor };
  return moveHandle(present, handle, to, { snap: false });
}

/** Takes the main value of a handle to the end of its range, or as far as the surfaces do not cross. */
export function toLimit(present: Present, handle: HandleId, end: 'smallest' | 'largest'): Edit {
  const { shape } = present;
  const target = limitShape(shape, handle, end);
  if (!target) return { present: null, notice: null };
  const result = checked(() => target);
  if (result.shape) return { present: mirrored({ ...present, shape: result.shape }, handle), notice: null };
  return { present: null, notice: { code: 'refused', reason: result.reason } };
}

interface Proposal {
  readonly shape: Shape;
  readonly notice: Notice | null;
  readonly at?: Point;
}

function propose(start: Present, handle: HandleId, to: Point, snap: boolean): Proposal | null {
  const { shape } = start;
  if (shape.kind === 'naca4') return proposeDigits(shape, handle, to, snap);
  const weight = weightOf(handle);
  if (weight && weight.index < shape[weight.surface].length) return proposeWeight(start, shape, weight, to);
  if (handle === 'nose') return proposeNose(shape, to);
  if (handle === 'edge') return proposeGap(shape, to);
  return null;
}

function proposeDigits(shape: Naca4Shape, handle: HandleId, to: Point, snap: boolean): Proposal | null {
  if (handle === 'camber') {
    const camber = held(to.y, NACA4_LIMITS.maxCamber, 'Camber');
    const position = held(to.x, NACA4_LIMITS.maxCamberPosition, 'Camber position');
    const free = { ...shape, maxCamber: camber.value, maxCamberPosition: position.value };
    const { maxCamber, maxCamberPosition } = snap ? snapToDigits(free) : free;
    return { shape: { ...shape, maxCamber, maxCamberPosition }, notice: camber.notice ?? position.notice };
  }
  if (handle === 'edge') return null;
  const wanted = handle === 'nose' ? thicknessByNose(shape, to) : thicknessBySurface(shape, handle, to);
  const thickness = held(wanted, NACA4_LIMITS.maxThickness, 'Thickness');
  const free = { ...shape, maxThickness: thickness.value };
  const { maxThickness } = snap ? snapToDigits(free) : free;
  const follows: Notice | null = handle === 'nose' ? { code: 'nose-follows-thickness', maxThickness } : null;
  return { shape: { ...shape, maxThickness }, notice: thickness.notice ?? follows };
}

/** The nose circle reaches to the point along its axis. */
function thicknessByNose(shape: Naca4Shape, to: Point): number {
  const { nose, axis } = noseCircle(shape);
  const radius = ((to.x - nose.x) * axis.x + (to.y - nose.y) * axis.y) / 2;
  return naca4ThicknessOfNose(radius);
}

/** Ordinates laid off the mean line grow in proportion to the thickness: the point is taken square to the mean line. */
function thicknessBySurface(shape: Naca4Shape, handle: HandleId, to: Point): number {
  const upper = surfacePoint(shape, 'upper', thickestStation(shape));
  const lower = surfacePoint(shape, 'lower', thickestStation(shape));
  const on = handle === 'thickness-lower' ? lower : upper;
  const middle = { x: (upper.x + lower.x) / 2, y: (upper.y + lower.y) / 2 };
  const unit = { x: (on.x - middle.x) / shape.maxThickness, y: (on.y - middle.y) / shape.maxThickness };
  return ((to.x - middle.x) * unit.x + (to.y - middle.y) * unit.y) / (unit.x ** 2 + unit.y ** 2);
}

/**
 * The surface goes exactly through the point. Along the chord the point is held to the reach of the weight, half way to
 * the handles beside it, where its influence is large enough to be steered by hand.
 */
function proposeWeight(
  start: Present,
  shape: CstShape,
  weight: { surface: Surface; index: number },
  to: Point,
): Proposal {
  const { surface, index } = weight;
  const frame = similarityOf(shape.placement);
  const local = toChord(frame, to);
  const reach = weightReach(shape, surface, index);
  const station = Math.min(reach.to, Math.max(reach.from, local.x));
  const moved = weightThrough(shape, surface, index, toSheet(frame, station, local.y));
  const name = `Weight ${index} of the ${surface} surface`;
  const held0 = held(moved[surface][index] ?? 0, CST_LIMITS[surface], name, plainNumber);
  const single = withWeight(shape, surface, index, held0.value);
  const next = mirrored({ ...start, shape: single }, `${surface}-${index}`);
  return { shape: next.shape, notice: held0.notice, at: surfacePoint(next.shape, surface, station) };
}

/** The stations between which a weight is steered: half way to the handles on either side. */
export function weightReach(shape: CstShape, surface: Surface, index: number): { from: number; to: number } {
  const last = shape[surface].length - 1;
  const own = weightStation(shape, surface, index);
  const before = index > 0 ? weightStation(shape, surface, index - 1) : 0;
  const after = index < last ? weightStation(shape, surface, index + 1) : 1;
  return { from: (own + before) / 2, to: (own + after) / 2 };
}

function proposeNose(shape: CstShape, to: Point): Proposal | null {
  const { nose, axis } = noseCircle(shape);
  const wanted = ((to.x - nose.x) * axis.x + (to.y - nose.y) * axis.y) / 2 / scaleOf(shape);
  const largest = Math.min(CST_LIMITS.upper.max, -CST_LIMITS.lower.min) ** 2 / 2;
  const radius = held(wanted, { min: SMALLEST_NOSE_RADIUS, max: largest }, 'Nose radius');
  if (shape.n1 !== 0.5)
    return {
      shape,
      notice: { code: 'refused', reason: 'The nose is round only with a nose exponent of 0.5.' },
    };
  return { shape: withNoseRadiusInProportion(shape, radius.value), notice: radius.notice };
}

/** A hundredth of a per cent of chord: below, the handle could not be found again. */
export const SMALLEST_NOSE_RADIUS = 0.0001;

/** Sets the mean nose radius and keeps the ratio of both surfaces' radii. */
export function withNoseRadiusInProportion(shape: CstShape, radius: number): CstShape {
  const now = meanNoseRadius(shape);
  if (now <= 0) return withNoseRadius(shape, 'both', radius);
  const factor = Math.sqrt(radius / now);
  const upper = (shape.upper[0] ?? 0) * factor;
  const lower = (shape.lower[0] ?? 0) * factor;
  return withWeight(withWeight(shape, 'upper', 0, upper), 'lower', 0, lower);
}

function proposeGap(shape: CstShape, to: Point): Proposal {
  const local = toChord(similarityOf(shape.placement), to);
  const gap = held(2 * local.y, CST_LIMITS.trailingEdgeGap, 'Trailing-edge gap');
  return { shape: { ...shape, trailingEdgeGap: gap.value }, notice: gap.notice };
}

function nudgeThickness(
  present: Present,
  handle: 'thickness-upper' | 'thickness-lower',
  steps: NudgeSteps,
): Edit {
  const { shape } = present;
  if (shape.kind !== 'naca4') return { present: null, notice: null };
  const outward = handle === 'thickness-upper' ? steps.y : -steps.y;
  const thickness = held(
    shape.maxThickness + (outward + steps.x) * NUDGE,
    NACA4_LIMITS.maxThickness,
    'Thickness',
  );
  const result = checked(() => ({ ...shape, maxThickness: thickness.value }));
  if (result.shape) return { present: { ...present, shape: result.shape }, notice: thickness.notice };
  return { present: null, notice: { code: 'refused', reason: result.reason } };
}

function turnEdge(present: Present, shape: Naca4Shape, direction: number): Edit {
  const trailingEdge = direction > 0 ? 'open' : 'closed';
  return { present: { ...present, shape: { ...shape, trailingEdge } }, notice: null };
}

function limitShape(shape: Shape, handle: HandleId, end: 'smallest' | 'largest'): Shape | null {
  const of = (range: { min: number; max: number }) => (end === 'smallest' ? range.min : range.max);
  if (shape.kind === 'naca4') {
    if (handle === 'camber') {
      const maxCamberPosition = handlePoint(shape, 'camber')?.x ?? shape.maxCamberPosition;
      return { ...shape, maxCamber: of(NACA4_LIMITS.maxCamber), maxCamberPosition };
    }
    if (handle === 'edge') return { ...shape, trailingEdge: end === 'largest' ? 'open' : 'closed' };
    return { ...shape, maxThickness: of(NACA4_LIMITS.maxThickness) };
  }
  const weight = weightOf(handle);
  if (weight && weight.index < shape[weight.surface].length) {
    return withWeight(shape, weight.surface, weight.index, of(CST_LIMITS[weight.surface]));
  }
  if (handle === 'edge') return { ...shape, trailingEdgeGap: of(CST_LIMITS.trailingEdgeGap) };
  if (handle !== 'nose' || shape.n1 !== 0.5) return null;
  return withNoseRadiusInProportion(
    shape,
    end === 'smallest' ? SMALLEST_NOSE_RADIUS : CST_LIMITS.upper.max ** 2 / 2,
  );
}

/** With equal nose radii, the first weight of the other surface follows the one that moved. */
export function mirrored(present: Present, moved: HandleId): Present {
  const { shape } = present;
  if (!present.equalNose || shape.kind !== 'cst') return present;
  if (moved === 'lower-0')
    return { ...present, shape: withWeight(shape, 'upper', 0, -(shape.lower[0] ?? 0)) };
  return { ...present, shape: withEqualNoseRadius(shape) };
}

function held(
  value: number,
  range: { readonly min: number; readonly max: number },
  quantity: string,
  words: (value: number) => string = percentOfChord,
): { value: number; notice: Notice | null } {
  if (value >= range.min && value <= range.max) return { value, notice: null };
  const limit = value > range.max ? range.max : range.min;
  return { value: limit, notice: { code: 'limit', quantity, limit: words(limit) } };
}

const percentOfChord = (value: number) => `${Number((value * 100).toFixed(4))} % of chord`;
const plainNumber = (value: number) => String(value);

/** The edge of a 4-digit section is a switch; every other handle is a slider. */
export function isSwitch(shape: Shape, handle: HandleId): boolean {
  return shape.kind === 'naca4' && handle === 'edge';
}
