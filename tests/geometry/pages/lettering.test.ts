import fc from 'fast-check';
import { expect, test } from 'vitest';
import { fittedText, textBox, textWidth, wrappedText } from '#geometry/pages/lettering.ts';
import { text } from '#geometry/pages/marks.ts';
import { names } from './samples.ts';

test('a capital of 7.3 mm belongs to letters 6 mm wide', () => {
  expect(textWidth('four', 7.3)).toBeCloseTo(24, 9);
  expect(textWidth('ñ→🛩', 7.3)).toBeCloseTo(18, 9);
});

test('the box of a text lies where its anchor and its turn put it', () => {
  const at = { x: 100, y: 50 };
  expect(textBox(text(at, 'four', 7.3))).toMatchObject({ x: 100, y: 42.7 });
  expect(textBox(text(at, 'four', 7.3, { anchor: 'end' })).x).toBeCloseTo(76, 9);
  const turned = textBox(text(at, 'four', 7.3, { anchor: 'middle', turned: true }));
  expect(turned.y).toBeCloseTo(38, 9);
  expect(turned.height).toBeCloseTo(24, 9);
  expect(turned.x).toBeCloseTo(92.7, 9);
  expect(turned.width).toBeCloseTo(7.3 + 2.7, 9);
  // Turned about its start a text rises from there.
  const rising = textBox(text(at, 'four', 7.3, { turned: true }));
  expect(rising.y + rising.height).toBeCloseTo(50, 9);
});

test('a long text is written smaller, and then cut', () => {
  expect(fittedText('short', 50, 2.5)).toEqual({ text: 'short', heightMm: 2.5 });
  const smaller = fittedText('a longer name', 18, 2.5);
  expect(smaller.text).toBe('a longer name');
  expect(smaller.heightMm).toBeLessThan(2.5);
  expect(fittedText('a much longer name', 12, 2.5).text).toBe('a much lo…'.slice(0, 8) + '…');
});

test('no text leaves its room, and wrapped lines keep all words', () => {
  fc.assert(
    fc.property(
      names,
      fc.double({ min: 2, max: 90, noNaN: true }),
      fc.constantFrom(1.5, 1.8, 2.5, 5),
      (words, room, height) => {
        const fit = fittedText(words, room, height);
        expect(textWidth(fit.text, fit.heightMm)).toBeLessThanOrEqual(room + 1e-9);
        // A line holds one letter at least.
        const wide = Math.max(room, textWidth('W', height));
        const lines = wrappedText(words, wide, height);
        for (const line of lines) expect(textWidth(line, height)).toBeLessThanOrEqual(wide + 1e-6);
        expect(lines.join('').replaceAll(' ', '')).toBe(words.replaceAll(' ', ''));
      },
    ),
    { numRuns: 60 },
  );
});

test('lines are broken between words', () => {
  expect(wrappedText('one two three', textWidth('one two', 2), 2)).toEqual(['one two', 'three']);
  expect(wrappedText('abcdefgh', textWidth('abc', 2), 2)).toEqual(['abc', 'def', 'gh']);
});
