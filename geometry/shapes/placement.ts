import { type Point } from '../point.ts';
import { type Placement } from './cst-schema.ts';

/** A similarity of the plane: x' = x + a·u − b·v, y' = y + b·u + a·v. */
interface Similarity {
  readonly x: number;
  readonly y: number;
  readonly a: number;
  readonly b: number;
}

/** The similarity from a shape's own chord, (0, 0) to (1, 0), to the sheet; the identity without a placement. */
export function similarityOf(placement: Placement | undefined): Similarity {
  if (!placement) return { x: 0, y: 0, a: 1, b: 0 };
  const angle = (placement.rotationDeg * Math.PI) / 180;
  return {
    x: placement.x,
    y: placement.y,
    a: placement.scale * Math.cos(angle),
    b: placement.scale * Math.sin(angle),
  };
}

/** A point of the shape's own chord frame on the sheet. */
export function toSheet(frame: Similarity, u: number, v: number): Point {
  return { x: frame.x + frame.a * u - frame.b * v, y: frame.y + frame.b * u + frame.a * v };
}

/** A point of the sheet in the shape's own chord frame. */
export function toChord(frame: Similarity, point: Point): Point {
  const dx = point.x - frame.x;
  const dy = point.y - frame.y;
  const square = frame.a * frame.a + frame.b * frame.b;
  return { x: (frame.a * dx + frame.b * dy) / square, y: (frame.a * dy - frame.b * dx) / square };
}
