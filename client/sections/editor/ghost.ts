import { type Shape } from '#geometry/shapes/shape.ts';

/** The version behind the section, once it has arrived. */
export function ghostOf(shape: Shape | null, number: number | null) {
  return shape && number !== null ? { shape, number } : undefined;
}
