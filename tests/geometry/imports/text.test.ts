import { describe, expect, test } from 'vitest';
import { linesOf, textOf } from '#geometry/imports/text.ts';
import { bytesOf, refusalOf } from './files.ts';

describe('the text of a file', () => {
  test.each([
    ['plain', bytesOf('a b'), 'a b', null],
    ['with a byte order mark', bytesOf('\ufeffα 1'), 'α 1', null],
    ['letters of two, three and four bytes', bytesOf('é−𝄞'), 'é−𝄞', null],
    ['Latin-1', Uint8Array.of(0x46, 0xfc, 0x72), 'Für', 'read the letters as Latin-1'],
    ['cut in the middle of a letter', Uint8Array.of(0x61, 0xc3), 'aÃ', 'read the letters as Latin-1'],
    ['an over-long form', Uint8Array.of(0xe0, 0x80, 0xaf), 'à\u0080¯', 'read the letters as Latin-1'],
    ['UTF-16, low byte first', Uint8Array.of(0xff, 0xfe, 0x31, 0, 0xb1, 3), '1α', 'read the text as UTF-16'],
    ['UTF-16, high byte first', Uint8Array.of(0xfe, 0xff, 0, 0x31), '1', 'read the text as UTF-16'],
    ['with the old end-of-file mark', bytesOf('1 2\n\u001a'), '1 2\n\u001a', null],
  ])('%s', (_, bytes, text, note) => {
    expect(textOf(bytes)).toEqual({ text, note });
  });

  test.each([
    ['nothing', new Uint8Array(0), 'empty', 'The file is empty.'],
    ['too much', new Uint8Array(5_242_881), 'too-large', 'The file has 5.0 MB; up to 5 MB are read.'],
    [
      'a PDF',
      bytesOf('%PDF-1.7 …'),
      'wrong-type',
      'This is a PDF document, not a file of coordinates or a drawing.',
    ],
    ['a zip', bytesOf('PK\x03\x04'), 'wrong-type', 'This is a zip archive or a spreadsheet, not a file'],
    ['a picture', Uint8Array.of(0x89, 0x50, 0x4e, 0x47), 'wrong-type', 'This is a picture'],
    ['control characters', bytesOf('1 0\n\u0000'), 'binary', 'The file holds bytes that are no text.'],
    [
      'UTF-16 with nothing in it',
      Uint8Array.of(0xff, 0xfe, 0, 0),
      'binary',
      'The file holds bytes that are no text.',
    ],
  ])('refused: %s', (_, bytes, code, message) => {
    const refusal = refusalOf(() => textOf(bytes));
    expect(refusal.code).toBe(code);
    expect(refusal.message).toContain(message);
  });
});

test('lines end in LF, CR LF or CR, mixed as they come', () => {
  expect([...linesOf('a\nb\r\nc\rd\r\r\n\ne')].map(({ text }) => text)).toEqual([
    'a',
    'b',
    'c',
    'd',
    '',
    '',
    'e',
  ]);
  expect([...linesOf('x\n')]).toEqual([
    { text: 'x', number: 1 },
    { text: '', number: 2 },
  ]);
});
