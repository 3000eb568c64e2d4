import { z } from 'zod';
import { cstCrossing, naca4Fault } from './crossing.ts';
import { type CstShape, cstOutline, cstSchema, weightStation } from './cst.ts';
import { type ShapeIssue, shapeErrorOf } from './error.ts';
import { percent } from './fields.ts';
import { type Naca4Shape, designationOf, naca4Outline, naca4Schema } from './naca4.ts';
import { type Outline } from './outline.ts';

export type Shape = Naca4Shape | CstShape;
export type ShapeKind = Shape['kind'];

/** The shape of a section, of any kind. Values out of range and surfaces that cross are refused under the name of the field. */
export const shapeSchema = z
  .discriminatedUnion('kind', [naca4Schema, cstSchema], { error: 'kind must be "naca4" or "cst"' })
  .superRefine((shape, context) => {
    if (context.issues.length > 0) return;
    for (const { path, message } of crossings(shape)) {
      context.addIssue({ code: 'custom', path: path.split('.').map(key), message });
    }
  });

function key(part: string): string | number {
  return /^\d+$/.test(part) ? Number(part) : part;
}

function crossings(shape: Shape): ShapeIssue[] {
  if (shape.kind === 'naca4') {
    const fault = naca4Fault(shape);
    if (fault === null) return [];
    const what = fault === 'folds' ? 'the lower surface folds back on itself' : 'the outline crosses itself';
    const message = `${what}: take less maxThickness or maxCamber, or a maxCamberPosition nearer to the middle`;
    return [{ path: 'maxThickness', message }];
  }
  const station = cstCrossing(shape);
  if (station === null) return [];
  return (['upper', 'lower'] as const).map((surface) => ({
    path: `${surface}.${nearestWeight(shape, surface, station)}`,
    message: `the surfaces cross or touch near ${percent(station, 1)} % of chord`,
  }));
}

/** The weight that has its handle nearest to a station. */
function nearestWeight(shape: CstShape, surface: 'upper' | 'lower', station: number): number {
  const distances = shape[surface].map((_, index) =>
    Math.abs(weightStation(shape, surface, index) - station),
  );
  return distances.indexOf(Math.min(...distances));
}

/**
 * Checks anything that claims to be a shape: kind, ranges, finite numbers, number of weights, crossing surfaces.
 * @throws ShapeError with an issue for every field that is refused
 */
export function checkShape(shape: unknown): Shape {
  const result = shapeSchema.safeParse(shape);
  if (!result.success) throw shapeErrorOf(result.error);
  return result.data;
}

/** The outline of a valid shape, on the sheet. */
export function outlineOf(shape: Shape): Outline {
  return shape.kind === 'naca4' ? naca4Outline(shape) : cstOutline(shape);
}

/** The shape as JSON with sorted keys and the shortest digits that give the same numbers back: what a version's checksum is taken of. */
export function canonicalShape(shape: Shape): string {
  return JSON.stringify(shape, (_, value: unknown) =>
    typeof value === 'object' && value !== null && !Array.isArray(value)
      ? Object.fromEntries(Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1)))
      : value,
  );
}

/** A short name: "NACA 2412", "4-digit form 2.3 % at 41 %, 12.1 %", "CST order 6/6" (upper/lower). */
export function describeShape(shape: Shape): string {
  if (shape.kind === 'cst') return `CST order ${shape.upper.length - 1}/${shape.lower.length - 1}`;
  const thickness = `${percent(shape.maxThickness, 2)} %`;
  const camber = `${percent(shape.maxCamber, 2)} % at ${percent(shape.maxCamberPosition, 2)} %`;
  return (
    designationOf(shape) ?? `4-digit form ${shape.maxCamber === 0 ? 'without camber' : camber}, ${thickness}`
  );
}
