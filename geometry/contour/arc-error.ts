import { type SurfaceCurve } from '../shapes/outline.ts';
import { safeguardedRoot } from './roots.ts';

/** Steps in which a surface is searched for changes from convex to hollow; its knots and their middles are looked at as well. */
const STEPS = 256;
const T_TOLERANCE = 1e-9;

/** Distance in t at which both sides of a break are looked at. */
const BESIDE = 1e-9;

/**
 * Where the surface changes from convex to hollow or back: values of t, ascending, inside 0 … 1. A break whose corner turns against the
 * bend of the parts beside it is such a change in itself.
 */
export function inflectionsOf(surface: SurfaceCurve): number[] {
  const found: number[] = [];
  let before = 0.5 / STEPS;
  let sign = bendSign(surface, before);
  for (const t of scanOf(surface)) {
    const atBreak = surface.breaks.includes(t);
    const next = bendSign(surface, atBreak ? t - BESIDE : t);
    if (next !== 0 && sign !== 0 && next !== sign) found.push(signChange(surface, before, t, sign));
    if (next !== 0) [sign, before] = [next, t];
    if (!atBreak) continue;
    const after = bendSign(surface, t + BESIDE);
    if (after !== sign || cornerSign(surface, t) === -sign) found.push(t);
    [sign, before] = [after, t + BESIDE];
  }
  return found;
}

/** Sense in which the tangent turns from one side of a break to the other; 0 for a corner below rounding. */
function cornerSign(surface: SurfaceCurve, t: number): number {
  const [a, b] = [surface.derivatives(t - BESIDE), surface.derivatives(t + BESIDE)];
  const turn = (a.dx * b.dy - a.dy * b.dx) / (a.dx * b.dx + a.dy * b.dy);
  return Math.abs(turn) < 1e-7 ? 0 : Math.sign(turn);
}

function scanOf(surface: SurfaceCurve): number[] {
  const steps = Array.from({ length: STEPS - 1 }, (_, i) => (i + 1) / STEPS);
  const knots = surface.knots ?? [];
  const middles = knots.map((t, i) => (t + (knots[i + 1] ?? 1)) / 2);
  return [...steps, ...knots, ...middles, ...surface.breaks].sort((a, b) => a - b);
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

/** A chord of a surface: from a point, in a direction of unit length. */
interface Chord {
  readonly x: number;
  readonly y: number;
  readonly along: readonly [number, number];
}

/**
 * Largest distance of an arc from its chord, in fractions of chord. The distance is stationary where the tangent is parallel to the
 * chord; within a piece without inflection or break the tangent turns one way, so there is at most one such place, found by safeguarded
 * Newton. A break is a corner, where the distance may be largest too.
 * Infinite when the arc turns by a right angle or more against its chord: no segment stands for such an arc.
 * @param turns inflections of the whole surface, see inflectionsOf; its breaks are looked up
 */
export function arcError(surface: SurfaceCurve, from: number, to: number, turns: readonly number[]): number {
  const start = surface.at(from);
  const end = surface.at(to);
  const [dx, dy] = [end.x - start.x, end.y - start.y];
  const length = Math.sqrt(dx * dx + dy * dy);
  const chord: Chord = { x: start.x, y: start.y, along: [dx / length, dy / length] };
  const inner = Math.max(BESIDE, ENTER * (to - from));
  const inside = (t: number) => t > from + 2 * inner && t < to - 2 * inner;
  let largest = 0;
  let piece = from + inner;
  for (const t of surface.breaks.filter(inside)) {
    largest = Math.max(
      largest,
      smoothError(surface, chord, piece, t - BESIDE, turns),
      heightOf(surface, chord, t).distance,
    );
    piece = t + BESIDE;
  }
  return Math.max(largest, smoothError(surface, chord, piece, to - inner, turns));
}

interface Height {
  readonly distance: number;
  /** Rate at which the distance (with its sign) changes with t, and the rate of that. */
  readonly value: number;
  readonly slope: number;
  /** Rate at which the arc proceeds along the chord. */
  readonly advance: number;
}

function heightOf(surface: SurfaceCurve, { x, y, along: [cx, cy] }: Chord, t: number): Height {
  const point = surface.derivatives(t);
  return {
    distance: Math.abs(cx * (point.y - y) - cy * (point.x - x)),
    value: cx * point.dy - cy * point.dx,
    slope: cx * point.ddy - cy * point.ddx,
    advance: point.dx * cx + point.dy * cy,
  };
}

/** The largest stationary distance within a part without break. */
function smoothError(
  surface: SurfaceCurve,
  chord: Chord,
  from: number,
  to: number,
  turns: readonly number[],
): number {
  let largest = 0;
  let [a, atA] = [from, heightOf(surface, chord, from)];
  if (atA.advance <= 0) return Infinity;
  for (const b of [...turns.filter((t) => t > from && t < to), to]) {
    const atB = heightOf(surface, chord, b);
    if (atB.advance <= 0) return Infinity;
    if (atA.value * atB.value < 0) {
      const [low, high] = atA.value < 0 ? [a, b] : [b, a];
      const root = safeguardedRoot(
        (t) => heightOf(surface, chord, t),
        low,
        high,
        (a + b) / 2,
        (to - from) * 1e-5,
      );
      largest = Math.max(largest, heightOf(surface, chord, root).distance);
    }
    [a, atA] = [b, atB];
  }
  return largest;
}

/**
 * Where a surface that would be a single segment is best divided in two: the parameter, of 255, with the smallest larger error. The point of
 * greatest distance will not do: on an S-shaped surface a segment through it may lie farther off than the undivided one.
 */
export function bestDivision(surface: SurfaceCurve, turns: readonly number[]): number {
  let [best, smallest] = [0.5, Infinity];
  for (let i = 1; i < STEPS; i++) {
    const t = i / STEPS;
    const error = Math.max(arcError(surface, 0, t, turns), arcError(surface, t, 1, turns));
    if (error < smallest) [best, smallest] = [t, error];
  }
  return best;
}
