import { expect, test } from 'vitest';
import { TITLE_BLOCK, titleBlock } from '#geometry/pages/title-block.ts';
import { cleanIdentity } from '#geometry/pages/words.ts';
import { faultsOf, wordsOf } from './checking.ts';
import { HOSTILE_NAMES, SHEET, namedSheet } from './samples.ts';

const WORDS = {
  owner: 'Fen Works',
  documentType: 'Cut sheet',
  scale: '1 : 2',
  paper: 'A3',
  number: 2,
  of: 3,
};
const FRAME = { x: 0, y: 0, ...TITLE_BLOCK };

test('the fields that ISO 7200 asks for are filled in', () => {
  const words = wordsOf(titleBlock(SHEET, WORDS, FRAME));
  const expected = [
    'Fen Works',
    'K7QM-3F2X',
    '2026-03-05',
    '2 / 3',
    'Reed wing, outer panel left',
    'B. Cooper',
    'A. Weaver',
    'Cut sheet',
  ];
  for (const of of expected) expect(words).toContain(of);
  expect(words).toContain('8c1f 04d9 a77e');
  expect(words).toContain('1 : 2, A3');
});

test('before the release nobody has released it', () => {
  const words = wordsOf(
    titleBlock({ ...SHEET, status: 'draft', releasedBy: null, releasedAt: null }, WORDS, FRAME),
  );
  expect(words).toContain('not released');
  expect(words).toContain('draft');
});

test.each(HOSTILE_NAMES)('nothing leaves its cell: %s', (name) => {
  const identity = cleanIdentity(namedSheet(name));
  const marks = titleBlock(identity, { ...WORDS, owner: identity.author, scale: '1 : 1000, 1 : 500' }, FRAME);
  expect(faultsOf({ widthMm: 180, heightMm: 42, frame: FRAME, marks })).toEqual([]);
});
