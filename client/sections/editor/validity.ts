import { ShapeError } from '#geometry/shapes/error.ts';
import { checkShape, type Shape } from '#geometry/shapes/shape.ts';

export type Checked =
  { readonly shape: Shape; readonly reason?: never } | { readonly reason: string; readonly shape?: never };

/** The words of the screen for the names of the fields. */
const WORDS: readonly (readonly [RegExp, string])[] = [
  [/\bmaxCamberPosition\b/g, 'camber position'],
  [/\bmaxCamber\b/g, 'camber'],
  [/\bmaxThickness\b/g, 'thickness'],
  [/\btrailingEdgeGap\b/g, 'trailing-edge gap'],
  [/\bboatTailAngleDeg\b/g, 'boat-tail angle'],
  [/\bn1\b/g, 'nose exponent'],
  [/\bn2\b/g, 'tail exponent'],
];

/** The shape when it is valid, else a plain sentence why it is not. */
export function checked(make: () => Shape): Checked {
  try {
    return { shape: checkShape(make()) };
  } catch (error) {
    if (error instanceof ShapeError) return { reason: sentence(error.issues[0]?.message ?? error.message) };
    throw error;
  }
}

/** A geometry message as a sentence in the words of the screen. */
export function sentence(message: string): string {
  const words = WORDS.reduce((text, [name, word]) => text.replace(name, word), message);
  const text = words.charAt(0).toLowerCase() + words.slice(1);
  return text.endsWith('.') ? text : `${text}.`;
}
