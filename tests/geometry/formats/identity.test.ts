import { describe, expect, test } from 'vitest';
import { headerLines, titleOf } from '#geometry/formats/identity.ts';
import { MARSH, NASTY_NAMES } from './identity-example.ts';

describe('headerLines', () => {
  test('state name, version, status, designation, chord, unit, spacing and 12 digits of the checksum', () => {
    expect(headerLines(MARSH, { chordMm: 220.5, spacing: 'tolerance 0.01 mm' })).toEqual([
      'Marsh 2412 v3, released',
      'NACA 2412',
      'chord 220.5 mm, unit mm, tolerance 0.01 mm',
      'checksum 3f2a9c81b0de',
    ]);
  });

  test('say when the chord is the unit', () => {
    expect(headerLines(MARSH, { chordMm: null, spacing: '100 points per surface' })[2]).toBe(
      'unit chord, 100 points per surface',
    );
  });

  test.each(NASTY_NAMES)('stay on one line each with the name %j', (sectionName) => {
    const lines = headerLines({ ...MARSH, sectionName }, { chordMm: 220, spacing: 'x' });
    expect(lines).toHaveLength(4);
    for (const line of lines) expect(line).toMatch(/^[^\p{Cc}\p{Zl}\p{Zp}]+$/u);
  });
});

test('a section without a readable name is still called something', () => {
  expect(titleOf({ ...MARSH, sectionName: ' \n\u200b' })).toBe('Section v3');
});
