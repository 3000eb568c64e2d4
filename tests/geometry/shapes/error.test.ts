import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import { ShapeError, shapeError, shapeErrorOf } from '#geometry/shapes/error.ts';

describe('ShapeError', () => {
  test('carries every issue and says them in its message', () => {
    const error = new ShapeError([
      { path: 'upper.3', message: 'is too large' },
      { path: '', message: 'no shape' },
    ]);
    expect(error).toBeInstanceOf(Error);
    expect(error.name).toBe('ShapeError');
    expect(error.message).toBe('upper.3: is too large; no shape');
    expect(error.issues).toHaveLength(2);
  });

  test('shapeError is about one field', () => {
    expect(shapeError('n1', 'no').issues).toEqual([{ path: 'n1', message: 'no' }]);
  });

  test('shapeErrorOf names nested fields with dots and unknown keys by their own name', () => {
    const schema = z.strictObject({
      weights: z.array(z.number({ error: 'a number' })),
      part: z.strictObject({}),
    });
    const result = schema.safeParse({ weights: [1, 'x'], part: { more: 1 }, extra: 2, other: 3 });
    expect(shapeErrorOf(result.error!).issues).toEqual([
      { path: 'weights.1', message: 'a number' },
      { path: 'part.more', message: 'more is not a value of this shape' },
      { path: 'extra', message: 'extra is not a value of this shape' },
      { path: 'other', message: 'other is not a value of this shape' },
    ]);
  });
});
