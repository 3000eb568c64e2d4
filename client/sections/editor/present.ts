import { canonicalShape, type Shape } from '#geometry/shapes/shape.ts';
import { type Notice } from './notices.ts';

/** The chord at which a section is first shown, mm. */
export const FIRST_CHORD_MM = 220;

/** What undo brings back. */
export interface Present {
  readonly shape: Shape;
  readonly chordMm: number;
  /** Free-form only: the nose radii of both sides stay equal. */
  readonly equalNose: boolean;
}

/** An outcome of an edit: the new present, or null where nothing changed; and what there is to say. */
export interface Edit {
  readonly present: Present | null;
  readonly notice: Notice | null;
}

/** One way to write each section: without camber the camber position does not count and is 0. */
export function closeForm(shape: Shape): Shape {
  if (shape.kind !== 'naca4' || shape.maxCamber !== 0 || shape.maxCamberPosition === 0) return shape;
  return { ...shape, maxCamberPosition: 0 };
}

export function sameShape(a: Shape, b: Shape): boolean {
  return a === b || canonicalShape(closeForm(a)) === canonicalShape(closeForm(b));
}

export function samePresent(a: Present, b: Present): boolean {
  return (
    a.chordMm === b.chordMm &&
    a.equalNose === b.equalNose &&
    (a.shape === b.shape || canonicalShape(a.shape) === canonicalShape(b.shape))
  );
}

/** Are the nose radii of a free-form shape equal, so that the option starts switched on? */
export function hasEqualNose(shape: Shape): boolean {
  return shape.kind === 'cst' && shape.upper[0] !== undefined && shape.upper[0] === -(shape.lower[0] ?? 0);
}
