import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { dxfText, fixed, singleLine, xmlText } from '#geometry/formats/text.ts';
import { NASTY_NAMES } from './identity-example.ts';

const anyText = fc.oneof(fc.constantFrom(...NASTY_NAMES), fc.string({ unit: 'binary', maxLength: 400 }));

describe('singleLine', () => {
  test.each([
    ['two\r\nlines', 'two lines'],
    ['  a \t b\u2028c  ', 'a b c'],
    ['nul\u0000esc\u001b', 'nul esc'],
    ['\u202eabc\u202c zero\u200bwidth', 'abc zerowidth'],
    ['half \ud83d pair', 'half \ufffd pair'],
    ['Größe 翼 🛩', 'Größe 翼 🛩'],
  ])('%j becomes %j', (text, line) => {
    expect(singleLine(text)).toBe(line);
  });

  test('is one line that can be encoded, whatever was typed', () => {
    fc.assert(
      fc.property(anyText, (text) => {
        const line = singleLine(text);
        expect(line).toMatch(/^[^\p{Cc}\p{Zl}\p{Zp}\p{Cs}]*$/u);
        expect(line).toBe(line.trim());
        expect(singleLine(line)).toBe(line);
      }),
    );
  });
});

describe('dxfText', () => {
  test.each([
    ['Größe', 'Gr\\U+00F6\\U+00DFe'],
    ['\\U+000A', '\\U+005CU+000A'],
    ['^J', '\\U+005EJ'],
    ['50 % or %%d', '50 % or %%%%%%d'],
    ['flight 🛩', 'flight ?'],
  ])('%j becomes %j', (text, written) => {
    expect(dxfText(text)).toBe(written);
  });

  test('is at most 250 printable ASCII characters and never ends inside an escape', () => {
    fc.assert(
      fc.property(anyText, (text) => {
        const written = dxfText(text);
        expect(written).toMatch(/^[\x20-\x7e]{0,250}$/);
        expect(written.replace(/\\U\+[0-9A-F]{4}/g, '')).not.toMatch(/[\\^]/);
      }),
    );
  });
});

describe('xmlText', () => {
  test('escapes what XML reserves', () => {
    expect(xmlText(`<a href="x">'&'</a>\n`)).toBe('&lt;a href=&quot;x&quot;&gt;&#39;&amp;&#39;&lt;/a&gt;');
  });
});

describe('fixed', () => {
  test.each([
    [1.5, 4, '1.5000'],
    [-0.00000001, 5, '0.00000'],
    [-0, 4, '0.0000'],
    [1e-7, 10, '0.0000001000'],
    [123456789.125, 4, '123456789.1250'],
    [-2.00005, 4, '-2.0000'],
  ])('%d with %d decimals is %s', (value, decimals, text) => {
    expect(fixed(value, decimals)).toBe(text);
  });

  test.each([NaN, Infinity, -Infinity, 1e21])('%d is refused', (value) => {
    expect(() => fixed(value, 4)).toThrow(RangeError);
  });
});
