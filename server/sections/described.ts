import { createHash } from 'node:crypto';
import { measure } from '#geometry/contour/measures.ts';
import { canonicalShape, describeShape, outlineOf, type Shape } from '#geometry/shapes/shape.ts';

/** A shape with all that the database keeps about it. */
export interface DescribedShape {
  /** Canonical JSON, and the SHA-256 of it. */
  readonly text: string;
  readonly checksum: string;
  readonly kind: Shape['kind'];
  readonly description: string;
  /** Largest thickness and camber of the true contour, fractions of chord. */
  readonly thickness: number;
  readonly camber: number;
}

export function sha256(text: string): string {
  return createHash('sha256').update(text, 'utf8').digest('hex');
}

export function describe(shape: Shape): DescribedShape {
  const text = canonicalShape(shape);
  const { maxThickness, maxCamber } = measure(outlineOf(shape));
  return {
    text,
    checksum: sha256(text),
    kind: shape.kind,
    description: describeShape(shape),
    thickness: maxThickness,
    camber: maxCamber,
  };
}

/** What a request asked for, as one sum: tells a retry under the same key from something else under it. */
export function requestChecksum(...parts: readonly (string | number)[]): string {
  return sha256(JSON.stringify(parts));
}
