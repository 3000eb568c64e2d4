import { expect, test } from 'vitest';
import { readOutline } from '#geometry/imports/read-outline.ts';
import { SHARP, bytesOf, dxf, largestShift, lightPolyline, listed, refusalOf } from './files.ts';

const drawing = dxf([lightPolyline(SHARP.slice(0, -1), true)]);

test.each([
  ['a list', listed(SHARP), 'marsh.dat'],
  ['a drawing', drawing, 'marsh.dxf'],
  ['a drawing under another name', drawing, 'marsh.txt'],
  ['a drawing that begins with a comment', `999\nmade by hand\n${drawing}`, 'marsh'],
])('%s is read as what it is', (_, text, name) => {
  expect(largestShift(readOutline(bytesOf(text), name), SHARP)).toBeLessThan(1e-15);
});

test('a file named as a drawing that is none is refused as a drawing', () => {
  expect(refusalOf(() => readOutline(bytesOf(listed(SHARP)), 'MARSH.DXF')).code).toBe('broken-drawing');
  expect(refusalOf(() => readOutline(bytesOf('words'), 'marsh.txt')).code).toBe('not-numbers');
});
