import type { FileIdentity } from '#geometry/formats/export.ts';

export const MARSH: FileIdentity = {
  sectionName: 'Marsh 2412',
  versionNumber: 3,
  status: 'released',
  designation: 'NACA 2412',
  checksum: '3f2a9c81b0de5577a1c0ffee00112233445566778899aabbccddeeff00112233',
};

/** Names that try to break out of a line, a quoted value or an element. */
export const NASTY_NAMES: readonly string[] = [
  '',
  '   ',
  'two\nlines',
  'two\r\nlines',
  '  0\r\nENDSEC\r\n  0\r\nEOF',
  '1.0 0.0\n0.5 0.1',
  '2412',
  '0.5 0.1',
  '-- "quoted" \'quoted\' <b>&amp;</b> ]]> -->',
  '</title><script>alert(1)</script>',
  'nul\u0000 bell\u0007 esc\u001b[2J del\u007f c1\u0085',
  'separators \u2028 \u2029 tab\t vt\u000b ff\u000c',
  'bidi \u202eabc\u202c zero\u200bwidth \ufeff',
  'Übergröße Ångström Żółw Ивана 翼型 🛩️',
  'half \ud83d pair \udca9',
  'noncharacter \uffff \ufdd0',
  '\\U+000A \\P ^J ^M %%d %%%d %%c',
  '../../etc/passwd',
  'con',
  'x'.repeat(2000),
  '🛩'.repeat(300),
];
