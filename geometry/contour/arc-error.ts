import { type CurvePoint, type SurfaceCurve } from '../shapes/outline.ts';
import { safeguardedRoot } from './roots.ts';

/** Steps in which a surface is searched for changes from convex to hollow. */
const STEPS = 256;
const T_TOLERANCE = 1e-9;

/** Where the surface changes from convex to hollow or back: values of t, ascending, inside 0 … 1. A jump of the curvature counts when its sign changes. */
export function inflectionsOf(surface: SurfaceCurve): number[] {
  const found: number[] = [];
  let before = 0;
  let sign = bendSign(surface, 0.5 / STEPS);
  for (const t of scanOf(surface)) {
    const next = bendSign(surface, t);
    if (next !== 0 && sign !== 0 && next !== sign) found.push(signChange(surface, before, t, sign));
    if (next !== 0) {
      sign = next;
      before = t;
    }
  }
  return found;
}

function scanOf(surface: SurfaceCurve): number[] {
  const steps = Array.from({ length: STEPS - 1 }, (_, i) => (i + 1) / STEPS);
  return [...steps, ...surface.breaks].sort((a, b) => a - b);
}

function bendSign(surface: SurfaceCurve, t: number): number {
  const { dx, dy, ddx, ddy } = surface.derivatives(t);
  return Math.sign(dx * ddy - dy * ddx);
}

function signChange(surface: SurfaceCurve, from: number, to: number, signBefore: number): number {
  let [low, high] = [from, to];
  while (high - low > T_TOLERANCE) {
    const middle = (low + high) / 2;
    if (bendSign(surface, middle) === signBefore) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** Share of an arc by which its ends are entered to learn on which side of the chord it starts. */
const ENTER = 1e-6;

/**
 * Largest distance of an arc from its chord, in fractions of chord. The distance is stationary where the tangent is parallel to the
 * chord; within a piece without inflection the tangent turns one way, so there is at most one such place, found by safeguarded Newton.
 * Infinite when the arc turns by a right angle or more against its chord: no segment stands for such an arc.
 * @param inflections of the whole surface, see inflectionsOf
 */
export function arcError(
  surface: SurfaceCurve,
  from: number,
  to: number,
  inflections: readonly number[],
): number {
  const start = surface.at(from);
  const end = surface.at(to);
  const [cx, cy] = [end.x - start.x, end.y - start.y];
  const length = Math.sqrt(cx * cx + cy * cy);
  const height = (t: number) => {
    const point = surface.derivatives(t);
    return {
      along: point.dx * cx + point.dy * cy,
      value: (cx * point.dy - cy * point.dx) / length,
      slope: (cx * point.ddy - cy * point.ddx) / length,
      distance: Math.abs(cx * (point.y - start.y) - cy * (point.x - start.x)) / length,
    };
  };
  const inner = ENTER * (to - from);
  const places = [from + inner, ...inflections.filter((t) => t > from + inner && t < to - inner), to - inner];
  const ends = places.map(height);
  if (ends.some(({ along }) => along <= 0)) return Infinity;
  let largest = 0;
  for (let i = 1; i < places.length; i++) {
    const [a, b] = [places[i - 1] ?? from, places[i] ?? to];
    const [atA, atB] = [ends[i - 1]?.value ?? 0, ends[i]?.value ?? 0];
    if (atA * atB >= 0) continue;
    const [low, high] = atA < 0 ? [a, b] : [b, a];
    const root = safeguardedRoot(height, low, high, (a + b) / 2, (to - from) * 1e-5);
    largest = Math.max(largest, height(root).distance);
  }
  return largest;
}

/** The point of greatest distance from the chord of a surface taken as one arc, for a surface that would be a single segment. */
export function farthestParameter(surface: SurfaceCurve): number {
  const [start, end] = [surface.at(0), surface.at(1)];
  let [best, largest] = [0.5, -1];
  for (let i = 1; i < STEPS; i++) {
    const point: Pick<CurvePoint, 'x' | 'y'> = surface.at(i / STEPS);
    const distance = Math.abs(
      (end.x - start.x) * (point.y - start.y) - (end.y - start.y) * (point.x - start.x),
    );
    if (distance > largest) [best, largest] = [i / STEPS, distance];
  }
  return best;
}
