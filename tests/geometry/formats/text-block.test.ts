import { expect, test } from 'vitest';
import { textsBelow } from '#geometry/formats/text-block.ts';

test('lines stand one below the other under the corner, 1.6 letter heights apart', () => {
  const texts = textsBelow(['first', 'second', 'third'], 220, { x: 12, y: -8 });
  expect(texts.map(({ text, x, height }) => ({ text, x, height }))).toEqual([
    { text: 'first', x: 12, height: 5 },
    { text: 'second', x: 12, height: 5 },
    { text: 'third', x: 12, height: 5 },
  ]);
  // -8 - 5 · 2.5, and 8 mm further down each.
  expect(texts.map(({ y }) => y)).toEqual([-20.5, -28.5, -36.5]);
});

test.each([
  [10, 1.8],
  [99, 1.8],
  [100, 2.5],
  [139.9, 2.5],
  [140, 3.5],
  [5000, 20],
])('a drawing %d mm wide has letters of %d mm, of the series and never smaller', (widthMm, height) => {
  expect(textsBelow(['a'], widthMm, { x: 0, y: 0 })[0]?.height).toBe(height);
});

test('nothing to say is no text', () => {
  expect(textsBelow([], 220, { x: 0, y: 0 })).toEqual([]);
});
