import { IMPORT_LIMITS, ImportRefusal } from './refusal.ts';

/** The text of a file and how it was written. */
export interface ImportedText {
  readonly text: string;
  /** A sentence when the bytes were not plain UTF-8. */
  readonly note: string | null;
}

/**
 * The text in a file's bytes: UTF-8, else Latin-1; UTF-16 by its byte order mark.
 * @throws ImportRefusal when there are no bytes, too many of them, or they are no text
 */
export function textOf(bytes: Uint8Array): ImportedText {
  if (bytes.length === 0) throw new ImportRefusal('empty', 'The file is empty.');
  if (bytes.length > IMPORT_LIMITS.bytes) {
    const limit = IMPORT_LIMITS.bytes / 1024 / 1024;
    const size = (bytes.length / 1024 / 1024).toFixed(1);
    throw new ImportRefusal('too-large', `The file has ${size} MB; up to ${limit} MB are read.`);
  }
  const kind = kindBySignature(bytes);
  if (kind) throw new ImportRefusal('wrong-type', `This is ${kind}, not a file of coordinates or a drawing.`);
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return utf16(bytes, 0);
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return utf16(bytes, 1);
  const plain = refuseBinary(bytes);
  if (plain) return { text: fromUnits(bytes), note: null };
  const start = bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf ? 3 : 0;
  const units = utf8Units(bytes, start);
  if (units) return { text: fromUnits(units), note: null };
  return { text: fromUnits(bytes), note: 'read the letters as Latin-1' };
}

/** First bytes of kinds of file that people choose by mistake (the signatures of their public formats). */
const SIGNATURES: readonly (readonly [signature: string, kind: string])[] = [
  ['%PDF', 'a PDF document'],
  ['PK\x03\x04', 'a zip archive or a spreadsheet'],
  ['\xd0\xcf\x11\xe0', 'a word processor’s or spreadsheet’s document'],
  ['\x89PNG', 'a picture'],
  ['\xff\xd8\xff', 'a picture'],
  ['GIF8', 'a picture'],
  ['\x1f\x8b', 'a compressed file'],
  ['{\\rtf', 'a word processor’s document'],
];

function kindBySignature(bytes: Uint8Array): string | null {
  const starts = (signature: string) =>
    Array.from(signature).every((character, i) => bytes[i] === character.charCodeAt(0));
  return SIGNATURES.find(([signature]) => starts(signature))?.[1] ?? null;
}

/**
 * Text may hold tab, line ends, form feed and, at its very end, the old end-of-file mark.
 * @returns whether every byte is ASCII
 */
function refuseBinary(bytes: Uint8Array): boolean {
  const end = bytes[bytes.length - 1] === 0x1a ? bytes.length - 1 : bytes.length;
  let plain = true;
  for (let i = 0; i < end; i++) {
    const byte = bytes[i] ?? 0;
    if (byte >= 32 && byte < 127) continue;
    if (byte > 127) plain = false;
    else if (byte !== 9 && byte !== 10 && byte !== 12 && byte !== 13) {
      throw new ImportRefusal('binary', 'The file holds bytes that are no text.');
    }
  }
  return plain;
}

function utf16(bytes: Uint8Array, high: 0 | 1): ImportedText {
  const units = new Uint16Array((bytes.length - 2) >> 1);
  for (let i = 0; i < units.length; i++) {
    const [a, b] = [bytes[2 * i + 2] ?? 0, bytes[2 * i + 3] ?? 0];
    const unit = high === 0 ? a | (b << 8) : (a << 8) | b;
    if (unit === 0) throw new ImportRefusal('binary', 'The file holds bytes that are no text.');
    units[i] = unit;
  }
  return { text: fromUnits(units), note: 'read the text as UTF-16' };
}

/** The least code that needs so many following bytes. */
const LEAST_CODE = [0, 0x80, 0x800, 0x10000];

/** The UTF-16 units of UTF-8 bytes (RFC 3629), or null when they are not UTF-8. */
function utf8Units(bytes: Uint8Array, start: number): Uint16Array | null {
  const units = new Uint16Array(bytes.length - start);
  let length = 0;
  for (let i = start; i < bytes.length;) {
    const first = bytes[i++] ?? 0;
    if (first < 0x80) {
      units[length++] = first;
      continue;
    }
    const more = first >= 0xf0 ? 3 : first >= 0xe0 ? 2 : 1;
    if (first < 0xc2 || first > 0xf4) return null;
    let code = first & (0x3f >> more);
    for (let k = 0; k < more; k++) {
      const next = bytes[i++] ?? 0;
      if ((next & 0xc0) !== 0x80) return null;
      code = (code << 6) | (next & 0x3f);
    }
    if (code < (LEAST_CODE[more] ?? 0) || code > 0x10ffff || code >> 11 === 0x1b) return null;
    if (code < 0x10000) units[length++] = code;
    else {
      units[length++] = 0xd800 | ((code - 0x10000) >> 10);
      units[length++] = 0xdc00 | ((code - 0x10000) & 0x3ff);
    }
  }
  return units.subarray(0, length);
}

const CHUNK = 8192;

function fromUnits(units: Uint8Array | Uint16Array): string {
  const parts: string[] = [];
  for (let i = 0; i < units.length; i += CHUNK) {
    const chunk: ArrayLike<number> = units.subarray(i, i + CHUNK);
    parts.push(Reflect.apply(String.fromCharCode, null, chunk));
  }
  return parts.join('');
}

/** A line of a text and its number, counted from 1. */
export interface Line {
  readonly text: string;
  readonly number: number;
}

/** The lines of a text, whichever way they end (LF, CR LF, CR), one after the other. */
export function* linesOf(text: string): Generator<Line> {
  let number = 0;
  let returnAt = text.indexOf('\r');
  let feedAt = text.indexOf('\n');
  for (let start = 0; start <= text.length;) {
    if (returnAt >= 0 && returnAt < start) returnAt = text.indexOf('\r', start);
    if (feedAt >= 0 && feedAt < start) feedAt = text.indexOf('\n', start);
    const ends = [returnAt, feedAt].filter((at) => at >= 0);
    const end = ends.length === 0 ? text.length : Math.min(...ends);
    number++;
    yield { text: text.slice(start, end), number };
    start = end + (end === returnAt && end + 1 === feedAt ? 2 : 1);
  }
}
