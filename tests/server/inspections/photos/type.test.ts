import { expect, it } from 'vitest';
import { photoTypeOf } from '#server/inspections/photos/type.ts';

const bytes = (text: string) => Buffer.from(text, 'latin1');

it.each([
  ['\xff\xd8\xff\xe0', 'jpeg'],
  ['\x89PNG\r\n\x1a\n', 'png'],
  ['RIFF\x10\0\0\0WEBPVP8 ', 'webp'],
  ['GIF89a\x01\0\x01\0', null],
  ['%PDF-1.7', null],
  ['<svg xmlns="http://www.w3.org/2000/svg"/>', null],
  ['<!doctype html>', null],
  ['RIFF\x10\0\0\0WAVEfmt ', null],
  ['\x89PNG\n\x1a\n', null],
  ['\xff\xd8', null],
  [' \xff\xd8\xff\xe0', null],
  ['', null],
])('the type of %j is %s', (text, type) => {
  expect(photoTypeOf(bytes(text))).toBe(type);
});
