import type { FileIdentity } from './identity.ts';

/** Long enough for a telling name, short enough for the 8-bit controllers that cut names at about 64 characters. */
const SLUG_LENGTH = 40;

/** Letters that Unicode does not take apart into a plain letter and a mark. */
const PLAIN_LETTERS: Readonly<Record<string, string>> = {
  ß: 'ss',
  æ: 'ae',
  œ: 'oe',
  ø: 'o',
  đ: 'd',
  ð: 'd',
  ħ: 'h',
  ı: 'i',
  ł: 'l',
  þ: 'th',
};

/**
 * The name that a file is saved under, for instance `marsh-2412_v3_220mm.dxf`, or `marsh-2412_v3_unit.dat` for a unit chord.
 * Only a-z, 0-9, `.`, `_` and `-`; the section's name is folded to ASCII and cut at 40 characters, and is `section` when
 * nothing of it is left. The chord carries at most three decimals.
 *
 * @param chordMm chord in mm, or null for a unit chord
 * @param extension without the point
 */
export function fileNameOf(identity: FileIdentity, chordMm: number | null, extension: string): string {
  const chord = chordMm === null ? 'unit' : `${shortLength(chordMm)}mm`;
  return `${slugOf(identity.sectionName) || 'section'}_v${identity.versionNumber}_${chord}.${extension}`;
}

/** A name folded to a-z, 0-9 and `-`, at most 40 characters, neither beginning nor ending with `-`; may be empty. */
export function slugOf(name: string): string {
  return name
    .toLowerCase()
    .replace(/[ßæœøđðħıłþ]/g, (letter) => PLAIN_LETTERS[letter] ?? '')
    .normalize('NFKD')
    .replace(/[\u0300-\u036f]/g, '')
    .replace(/[^a-z0-9]+/g, '-')
    .slice(0, SLUG_LENGTH)
    .replace(/^-+|-+$/g, '');
}

/** A length in mm for a file's name: at most three decimals. */
export function shortLength(lengthMm: number): string {
  return String(Number(lengthMm.toFixed(3)));
}
