import { expect, test } from 'vitest';
import {
  checksumText,
  cleanIdentity,
  dayOf,
  plainText,
  sectionLine,
  statusLine,
  timeText,
} from '#geometry/pages/words.ts';
import { HOSTILE_NAMES, SHEET, namedSheet } from './samples.ts';

test('free texts come on one line, and empty names are replaced', () => {
  for (const name of HOSTILE_NAMES) {
    const clean = cleanIdentity(namedSheet(name));
    const all = [clean.sheetName, clean.author, clean.root.sectionName, clean.tip.designation, clean.address];
    for (const words of all) expect(words).not.toMatch(/[\p{Cc}\u202e]/u);
  }
  expect(cleanIdentity(namedSheet('')).sheetName).toBe('Cut sheet');
  expect(cleanIdentity(namedSheet('')).root.sectionName).toBe('Section');
  expect(cleanIdentity(SHEET)).toEqual(SHEET);
});

test('a section says its name, version and designation', () => {
  expect(sectionLine(SHEET, 'root')).toBe('Marsh v3, NACA 2412');
  const root = { ...SHEET.root, sectionName: 'NACA 2412' };
  expect(sectionLine({ ...SHEET, root }, 'root')).toBe('NACA 2412 v3');
});

test('what is not released is not for cutting', () => {
  expect(statusLine(SHEET)).toBe('released 2026-03-05');
  expect(statusLine({ ...SHEET, status: 'superseded' })).toBe('superseded: not for cutting');
  expect(dayOf(null)).toBe('');
});

test('checksums, numbers and times are short', () => {
  expect(checksumText(SHEET.checksum)).toBe('8c1f 04d9 a77e');
  expect([1, 0.8, 1 / 3, 220].map(plainText)).toEqual(['1', '0.8', '0.333', '220']);
  expect([9, 61, 3600].map(timeText)).toEqual(['9 s', '1 min 1 s', '60 min 0 s']);
});
