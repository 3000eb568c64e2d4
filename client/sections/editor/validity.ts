import { ShapeError } from '#geometry/shapes/error.ts';
import { checkShape, type Shape } from '#geometry/shapes/shape.ts';
import { shapeSentence } from '#client/app/shape-words.ts';

type Checked =
  { readonly shape: Shape; readonly reason?: never } | { readonly reason: string; readonly shape?: never };

/** The shape when it is valid, else a plain sentence why it is not. */
export function checked(make: () => Shape): Checked {
  try {
    return { shape: checkShape(make()) };
  } catch (error) {
    if (error instanceof ShapeError) return { reason: reasonOf(error) };
    throw error;
  }
}

/** The first reason of a refused shape as a sentence. */
export function reasonOf(error: ShapeError): string {
  return shapeSentence(error.issues[0]?.message ?? error.message);
}
