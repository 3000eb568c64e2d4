import { contourPoints } from '#geometry/contour/contour.ts';
import { sampleCosine } from '#geometry/contour/sampling.ts';
import { type SourcePoint } from '#geometry/imports/chains.ts';
import { ImportRefusal } from '#geometry/imports/refusal.ts';
import { type Point } from '#geometry/point.ts';
import { type Outline } from '#geometry/shapes/outline.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { naca4 } from '#tests/geometry/shapes/samples.ts';

export const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);

/** The points of an outline, trailing edge → nose → trailing edge, a sharp trailing edge at both ends. */
export function pointsOf(outline: Outline, pointsPerSurface = 20): Point[] {
  const points = contourPoints(sampleCosine(outline, pointsPerSurface));
  return outline.sharp ? [...points, points[0]!] : points;
}

/** 2412 with a sharp trailing edge: 39 points, the nose is the twentieth. */
export const SHARP = pointsOf(outlineOf(naca4('2412')));
export const OPEN = pointsOf(outlineOf(naca4('2412', 'open')));

export const listed = (points: readonly Point[]): string => points.map(({ x, y }) => `${x} ${y}`).join('\n');

export const numbered = (points: readonly Point[]): SourcePoint[] =>
  points.map(({ x, y }, i) => ({ x, y, line: i + 1 }));

/** The refusal that a call ends in. */
export function refusalOf(call: () => unknown): ImportRefusal {
  try {
    call();
  } catch (error) {
    if (error instanceof ImportRefusal) return error;
    throw error;
  }
  throw new Error('Nothing was refused.');
}

/** Largest distance between points in the same places of two lists. */
export function largestShift(
  found: { readonly x: readonly number[]; readonly y: readonly number[] },
  expected: readonly Point[],
): number {
  if (found.x.length !== expected.length) return Infinity;
  return Math.max(...expected.map(({ x, y }, i) => Math.hypot(found.x[i]! - x, found.y[i]! - y)));
}

/** A DXF drawing with these entities, each a list of code and value. */
export function dxf(
  entities: readonly (readonly (string | number)[])[],
  header: readonly (string | number)[] = [],
): string {
  return [
    ...['0', 'SECTION', '2', 'HEADER', ...header, '0', 'ENDSEC'],
    ...['0', 'SECTION', '2', 'ENTITIES', ...entities.flat(), '0', 'ENDSEC', '0', 'EOF'],
  ].join('\n');
}

export const lightPolyline = (points: readonly Point[], closed: boolean): (string | number)[] => [
  ...[0, 'LWPOLYLINE', 8, 'OUTLINE', 90, points.length, 70, closed ? 1 : 0],
  ...points.flatMap(({ x, y }) => [10, x, 20, y]),
];
