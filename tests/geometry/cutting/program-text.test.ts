import fc from 'fast-check';
import { expect, test } from 'vitest';
import { comment, commentText, decimal } from '#geometry/cutting/program-text.ts';

test('text for comments keeps what is plain and replaces the rest', () => {
  expect(commentText('Möwe „2“ (links)')).toBe('Mowe -2- -links-');
  expect(commentText('  two   blanks ')).toBe('two blanks');
  expect(commentText('x'.repeat(100))).toHaveLength(70);
});

test('no text can leave its comment', () => {
  const nasty = fc.oneof(
    fc.string({ unit: 'binary' }),
    fc.constantFrom(') G0 X9 (', 'a\nG28', '(MSG', ';M3', '%'),
  );
  fc.assert(
    fc.property(nasty, (text) => {
      expect(comment('Part', text)).toMatch(/^\([A-Za-z0-9 .,:/+-]*\)$/);
    }),
  );
});

test('a comment begins with its fixed word and is that alone without a text', () => {
  expect(comment('Part', 'Slot: Cap')).toBe('(Part: Slot: Cap)');
  expect(comment('Part', '')).toBe('(Part)');
  expect(comment('Part', ' ')).toBe('(Part)');
});

test('numbers have fixed decimals, no exponent and no negative zero', () => {
  expect(decimal(-0.00001, 3)).toBe('0.000');
  expect(decimal(-1.5, 3)).toBe('-1.500');
  expect(decimal(1e-7, 4)).toBe('0.0000');
  expect(decimal(123456.5, 0)).toBe('123457');
});
