import { type Point } from '../point.ts';
import { type Polyline, at, between, polylineOf } from './arrays.ts';
import { verticalCut } from './feature-ends.ts';
import { type PlacedFeature } from './features.ts';

/** What a rib's outline loses or gains between two uprights: the outline's points there give way to these. */
export interface Change {
  readonly surface: 'upper' | 'lower';
  readonly aft: number;
  readonly fore: number;
  /** In the order of the outline: from aft to fore on the upper, from fore to aft on the lower surface. */
  readonly points: readonly Point[];
}

/** A notch for a spar at one station of the span. */
export function notchOf(
  outline: Polyline,
  feature: PlacedFeature,
  share: number,
  fitAllowanceMm: number,
): Change | null {
  if (feature.feature.kind !== 'slot') return null;
  const slot = between(feature.root.outline, feature.tip.outline, share);
  const upper = feature.surface === 'upper';
  const middle = (Math.min(...slot.x) + Math.max(...slot.x)) / 2;
  const half = (Math.max(...slot.x) - Math.min(...slot.x) + fitAllowanceMm) / 2;
  const floor = upper ? Math.min(...slot.y) : Math.max(...slot.y);
  return uprights(outline, upper ? 'upper' : 'lower', middle + half, middle - half, floor);
}

/** A jig tab: the lower surface gives way to a rectangle that reaches down to the board. */
export function tabOf(outline: Polyline, x: number, widthMm: number, boardY: number): Change | null {
  return uprights(outline, 'lower', x + widthMm / 2, x - widthMm / 2, boardY);
}

function uprights(
  outline: Polyline,
  surface: 'upper' | 'lower',
  aft: number,
  fore: number,
  level: number,
): Change | null {
  const [aftCut, foreCut] = [verticalCut(outline, aft), verticalCut(outline, fore)];
  if (!aftCut || !foreCut) return null;
  const y = (cut: { low: number; high: number }) => (surface === 'upper' ? cut.high : cut.low);
  const points = [
    { x: aft, y: y(aftCut) },
    { x: aft, y: level },
    { x: fore, y: level },
    { x: fore, y: y(foreCut) },
  ];
  return { surface, aft, fore, points: surface === 'upper' ? points : points.reverse() };
}

/**
 * The outline with notches and tabs worked in. The upper surface runs from the first point to the foremost one, the lower from there to the end.
 * @param outline closed, counter-clockwise, from the trailing edge over the upper surface
 */
export function withChanges(outline: Polyline, changes: readonly Change[]): Polyline {
  const foremost = outline.x.reduce((best, x, i) => (x < at(outline.x, best) ? i : best), 0);
  const points: Point[] = [];
  const waiting = new Set(changes);
  for (let i = 0; i < outline.x.length; i++) {
    const [x, y] = [at(outline.x, i), at(outline.y, i)];
    const surface = i <= foremost ? 'upper' : 'lower';
    for (const change of ordered(waiting, surface)) {
      const passed = surface === 'upper' ? x < change.aft : x > change.fore;
      if (change.surface !== surface || !passed) continue;
      points.push(...change.points);
      waiting.delete(change);
    }
    const inside = changes.some((of) => of.surface === surface && x > of.fore && x < of.aft);
    if (!inside) points.push({ x, y });
  }
  return polylineOf(points);
}

function ordered(changes: ReadonlySet<Change>, surface: 'upper' | 'lower'): Change[] {
  return [...changes].sort((a, b) => (surface === 'upper' ? b.aft - a.aft : a.fore - b.fore));
}

/** The outline in pieces fore and aft of a strip that goes through it; the outline alone without one. */
export function splitByStrips(
  outline: Polyline,
  strips: readonly { fore: number; aft: number }[],
): Polyline[] {
  const cuts = [...strips].sort((a, b) => a.fore - b.fore);
  const bounds = [-Infinity, ...cuts.flatMap(({ fore, aft }) => [fore, aft]), Infinity];
  const pieces: Polyline[] = [];
  for (let i = 0; i + 1 < bounds.length; i += 2) {
    const piece = clipped(clipped(outline, at(bounds, i), 1), at(bounds, i + 1), -1);
    if (piece.x.length >= 3) pieces.push(piece);
  }
  return pieces;
}

/** The part of a closed outline on one side of an upright (Sutherland & Hodgman, Reentrant polygon clipping, 1974, for one edge). */
function clipped({ x, y }: Polyline, edge: number, side: 1 | -1): Polyline {
  if (!Number.isFinite(edge)) return { x, y };
  const points: Point[] = [];
  for (let i = 0; i < x.length; i++) {
    const k = (i + x.length - 1) % x.length;
    const [ax, ay, bx, by] = [at(x, k), at(y, k), at(x, i), at(y, i)];
    const [aIn, bIn] = [side * (ax - edge) >= 0, side * (bx - edge) >= 0];
    if (aIn !== bIn) points.push({ x: edge, y: ay + ((edge - ax) / (bx - ax)) * (by - ay) });
    if (bIn) points.push({ x: bx, y: by });
  }
  return polylineOf(points);
}

/** The outline without points that follow one another at the same place. */
export function withoutDoubles({ x, y }: Polyline): Polyline {
  const kept = Array.from(x.keys()).filter((i) => {
    const k = (i + x.length - 1) % x.length;
    return Math.hypot(at(x, i) - at(x, k), at(y, i) - at(y, k)) > 1e-6;
  });
  return { x: Float64Array.from(kept, (i) => at(x, i)), y: Float64Array.from(kept, (i) => at(y, i)) };
}
