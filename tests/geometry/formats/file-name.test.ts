import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { fileNameOf, shortLength, slugOf } from '#geometry/formats/file-name.ts';
import { MARSH, NASTY_NAMES } from './identity-example.ts';

describe('fileNameOf', () => {
  test.each([
    ['Marsh 2412', 220, 'dxf', 'marsh-2412_v3_220mm.dxf'],
    ['Marsh 2412', null, 'dat', 'marsh-2412_v3_unit.dat'],
    ['Marsh 2412', 215.9, 'svg', 'marsh-2412_v3_215.9mm.svg'],
    ['Marsh 2412', 220.12345, 'svg', 'marsh-2412_v3_220.123mm.svg'],
    ['Übergröße Ångström Żółw', 220, 'dxf', 'ubergrosse-angstrom-zolw_v3_220mm.dxf'],
    ['../../etc/passwd', 220, 'dxf', 'etc-passwd_v3_220mm.dxf'],
    ['翼型', 220, 'dxf', 'section_v3_220mm.dxf'],
    ['', 220, 'dxf', 'section_v3_220mm.dxf'],
  ])('%j at %d mm as %s is %s', (sectionName, chordMm, extension, name) => {
    expect(fileNameOf({ ...MARSH, sectionName }, chordMm, extension)).toBe(name);
  });

  test('is short and safe on every system, whatever the section is called', () => {
    const names = fc.oneof(fc.constantFrom(...NASTY_NAMES), fc.string({ unit: 'binary', maxLength: 300 }));
    fc.assert(
      fc.property(names, fc.double({ min: 10, max: 5000, noNaN: true }), (sectionName, chordMm) => {
        expect(fileNameOf({ ...MARSH, sectionName }, chordMm, 'dxf')).toMatch(
          /^[a-z0-9](?:[a-z0-9-]{0,38}[a-z0-9])?_v3_\d{2,4}(?:\.\d{1,3})?mm\.dxf$/,
        );
      }),
    );
  });
});

test('a name without a letter or digit that can be folded leaves nothing, a long one 40 characters', () => {
  expect(slugOf('翼型 !')).toBe('');
  expect(slugOf('Outer panel, left')).toBe('outer-panel-left');
  expect(slugOf('a'.repeat(60))).toBe('a'.repeat(40));
});

test('a length in a name has at most three decimals and no exponent', () => {
  expect([220, 215.9, 220.12345, 10].map(shortLength)).toEqual(['220', '215.9', '220.123', '10']);
});
