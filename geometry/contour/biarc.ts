import type { Point } from '../point.ts';

/** A piece of circle from `a` to `b` by its bulge, the tangent of a quarter of its angle: positive counter-clockwise, 0 straight. */
export interface Arc {
  readonly a: Point;
  readonly b: Point;
  readonly bulge: number;
}

/** Below this bulge an arc over a chord of 1 is lower than 1e-12: a straight piece in double precision. */
const STRAIGHT = 1e-12;
/** Arcs of a pair turn by at most a quarter circle, so that nearest points are unique in a wide neighbourhood. */
const LARGEST_HALF_ANGLE = Math.PI / 4;
const JOINT_STEPS = 60;
const JOINT_ANGLE = 1e-12;
/** A joint keeps this share of the parameter's range from both ends where that bends the pair by no more than {@link SLIGHT_KINK}. */
const JOINT_MARGIN = 0.1;
/** Radians: about 0.06 degrees. */
const SLIGHT_KINK = 1e-3;

const minus = (a: Point, b: Point): Point => ({ x: a.x - b.x, y: a.y - b.y });

/** Signed angle from `u` to `v`, counter-clockwise positive, radians. */
function angleBetween(u: Point, v: Point): number {
  return Math.atan2(u.x * v.y - u.y * v.x, u.x * v.x + u.y * v.y);
}

/**
 * Two tangent arcs from `a` with direction `directionA` to `b` with direction `directionB` whose joint is a point of `curve`.
 *
 * An arc leaves its chord at the tangent-chord angle, half the angle it turns. With h1 that angle at `a` and h2 at `b`, the arcs
 * meet smoothly in the joint Q where the angle from Qb to aQ, plus h1, plus h2, vanishes. At the two ends of the curve
 * that sum takes opposite values, so a root lies between them; it is found by regula falsi (Illinois rule). Where the curve is almost
 * a circle any point will do, and the root may lie at one end; it is then moved inwards, which leaves a kink of at most 0.001 rad.
 *
 * @param curve the curve from `a` (at `from`) to `b` (at `to`)
 * @returns the arcs and the parameter of their joint, or null when an arc would turn by more than a quarter circle
 */
export function biarc(
  curve: (parameter: number) => Point,
  from: number,
  to: number,
  directionA: Point,
  directionB: Point,
): { readonly first: Arc; readonly second: Arc; readonly joint: number } | null {
  const a = curve(from);
  const b = curve(to);
  const kink = (joint: Point) => {
    const first = minus(joint, a);
    const second = minus(b, joint);
    return angleBetween(second, first) + angleBetween(directionA, first) + angleBetween(second, directionB);
  };
  const chord = minus(b, a);
  const kinkAtA = angleBetween(chord, directionB) - angleBetween(directionA, chord);
  const root = jointOf((parameter) => kink(curve(parameter)), from, to, kinkAtA);
  const margin = JOINT_MARGIN * (to - from);
  const inward = Math.min(Math.max(root, from + margin), to - margin);
  const joint = Math.abs(kink(curve(inward))) <= SLIGHT_KINK ? inward : root;
  const q = curve(joint);
  const halfFirst = angleBetween(directionA, minus(q, a));
  const halfSecond = angleBetween(minus(b, q), directionB);
  if (Math.max(Math.abs(halfFirst), Math.abs(halfSecond)) > LARGEST_HALF_ANGLE) return null;
  return {
    first: { a, b: q, bulge: Math.tan(halfFirst / 2) },
    second: { a: q, b, bulge: Math.tan(halfSecond / 2) },
    joint,
  };
}

/** Root of `kink` between the ends, where it is `kinkAtFrom` and its negative; the middle when it vanishes everywhere. */
function jointOf(kink: (parameter: number) => number, from: number, to: number, kinkAtFrom: number): number {
  let [low, high, atLow, atHigh] = [from, to, kinkAtFrom, -kinkAtFrom];
  let middle = (from + to) / 2;
  if (Math.abs(kinkAtFrom) <= JOINT_ANGLE) return middle;
  for (let step = 0; step < JOINT_STEPS; step += 1) {
    const value = kink(middle);
    if (Math.abs(value) <= JOINT_ANGLE) break;
    if (value > 0 === atLow > 0) {
      [low, atLow, atHigh] = [middle, value, atHigh / 2];
    } else {
      [high, atHigh, atLow] = [middle, value, atLow / 2];
    }
    middle = low + (high - low) * (atLow / (atLow - atHigh));
  }
  return middle;
}

/** Height of an arc above its chord. */
export function arcHeight({ a, b, bulge }: Arc): number {
  return (Math.abs(bulge) * Math.hypot(b.x - a.x, b.y - a.y)) / 2;
}

/**
 * Distance from `p` to an arc that turns by at most a quarter circle. Beyond the ends of the chord the distance to the nearer
 * end is taken, which is never too small.
 */
export function arcDistance(p: Point, { a, b, bulge }: Arc): number {
  const [dx, dy] = [b.x - a.x, b.y - a.y];
  const length = Math.hypot(dx, dy);
  if (length === 0) return Math.hypot(p.x - a.x, p.y - a.y);
  const [px, py] = [p.x - (a.x + b.x) / 2, p.y - (a.y + b.y) / 2];
  const along = (px * dx + py * dy) / length;
  const across = (py * dx - px * dy) / length;
  if (Math.abs(along) > length / 2) return Math.hypot(Math.abs(along) - length / 2, across);
  if (Math.abs(bulge) < STRAIGHT) return Math.abs(across);
  // |distance to the centre| - radius, written so that nothing cancels when the radius is large.
  const center = (length * (1 - bulge * bulge)) / (4 * bulge);
  const radius = (length * (1 + bulge * bulge)) / (4 * Math.abs(bulge));
  const power = along * along + across * across - (length * length) / 4 - 2 * across * center;
  return Math.abs(power / (Math.hypot(along, across - center) + radius));
}

/** The points of an arc at which its tangent is level or upright, without its ends. */
export function arcExtremes({ a, b, bulge }: Arc): readonly Point[] {
  if (Math.abs(bulge) < STRAIGHT) return [];
  const factor = (1 - bulge * bulge) / (4 * bulge);
  const [dx, dy] = [b.x - a.x, b.y - a.y];
  const center = { x: (a.x + b.x) / 2 - dy * factor, y: (a.y + b.y) / 2 + dx * factor };
  const radius = (Math.hypot(dx, dy) * (1 + bulge * bulge)) / (4 * Math.abs(bulge));
  const candidates: readonly Point[] = [
    { x: center.x + radius, y: center.y },
    { x: center.x - radius, y: center.y },
    { x: center.x, y: center.y + radius },
    { x: center.x, y: center.y - radius },
  ];
  // The chord parts the circle; a counter-clockwise arc lies on its right.
  return candidates.filter((p) => (dx * (p.y - a.y) - dy * (p.x - a.x)) * bulge < 0);
}
