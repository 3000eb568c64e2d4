import { expect, test } from 'vitest';
import { IMPORT_LIMITS, ImportRefusal, quoted } from '#geometry/imports/refusal.ts';

test('a refusal carries its code, its sentence and the line', () => {
  const refusal = new ImportRefusal('crossing', 'It crosses.', 7);
  expect(refusal).toBeInstanceOf(Error);
  expect([refusal.code, refusal.message, refusal.line]).toEqual(['crossing', 'It crosses.', 7]);
  expect(new ImportRefusal('empty', 'Empty.').line).toBe(null);
});

test('up to 5 MB and 10 to 10 000 points are read', () => {
  expect(IMPORT_LIMITS).toMatchObject({ bytes: 5_242_880, points: { min: 10, max: 10_000 } });
});

test.each([
  ['  0.3 zz ', '“0.3 zz”'],
  ['a\u0000b\tc', '“a b c”'],
  ['x'.repeat(60), `“${'x'.repeat(40)}…”`],
  ['x'.repeat(5_000_000), `“${'x'.repeat(40)}…”`],
])('a piece of a file stands in a sentence on one line and short', (text, expected) => {
  expect(quoted(text)).toBe(expected);
});
