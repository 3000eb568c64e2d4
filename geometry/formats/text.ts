/**
 * Text that goes into files which machines read line by line. A section's name is free text that a person typed, so it is
 * cleaned and escaped here before any writer sees it; numbers are written with a fixed number of decimals, a decimal point
 * and no exponent, because several readers of coordinate files know nothing else.
 */

/** The longest string that a DXF reader of 1992 accepts in one group (DXF reference, release 12, from memory: 255). */
const DXF_TEXT_LIMIT = 250;

const LINE_BREAKERS = /[\u0000-\u001f\u007f-\u009f\u2028\u2029\s]+/gu;
/** Soft hyphen, zero-width and direction-changing characters: they hide text or turn it round. */
const INVISIBLE = /[\u00ad\u061c\u200b-\u200f\u202a-\u202e\u2060-\u206f\ufeff]/gu;
/** Half surrogate pairs and non-characters: not allowed in XML, not encodable in UTF-8. */
const UNENCODABLE = /[\p{Surrogate}\p{Noncharacter_Code_Point}]/gu;

/**
 * The text on one line: line breaks, tabs, control characters and runs of blanks become one blank, invisible characters go,
 * what cannot be encoded becomes U+FFFD, and the ends are trimmed. May be empty.
 */
export function singleLine(text: string): string {
  return text.replace(UNENCODABLE, '\ufffd').replace(INVISIBLE, '').replace(LINE_BREAKERS, ' ').trim();
}

/**
 * Text for a DXF file in plain ASCII on one line, at most 250 characters. Other characters are written as `\U+XXXX` (the
 * escape of the DXF reference, group codes 1 to 4), as are the backslash and the caret, which would begin an escape themselves;
 * repeated per cent signs are written as `%%%` each, because `%%` begins a special character. Characters beyond the basic
 * plane have no such escape and become `?`.
 */
export function dxfText(text: string): string {
  let written = '';
  for (const character of singleLine(text).replace(/%{2,}/g, (run) => '%%%'.repeat(run.length))) {
    const piece = dxfCharacter(character);
    if (written.length + piece.length > DXF_TEXT_LIMIT) break;
    written += piece;
  }
  return written;
}

function dxfCharacter(character: string): string {
  const code = character.codePointAt(0) ?? 0;
  if (code > 0xffff) return '?';
  if (code >= 0x20 && code < 0x7f && character !== '\\' && character !== '^') return character;
  return `\\U+${code.toString(16).toUpperCase().padStart(4, '0')}`;
}

const XML_ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

/** Text for an element or a quoted attribute of an XML file, on one line. */
export function xmlText(text: string): string {
  return singleLine(text).replace(/[&<>"']/g, (sign) => XML_ENTITIES[sign] ?? '');
}

/**
 * A number with exactly `decimals` (0 to 20) decimals: decimal point, no exponent, no negative zero.
 *
 * @throws RangeError when the value is not finite or too large to be written without an exponent
 */
export function fixed(value: number, decimals: number): string {
  if (!(Math.abs(value) < 1e21)) throw new RangeError(`Not a number that can be written in a file: ${value}`);
  const text = value.toFixed(decimals);
  return text.startsWith('-') && Number(text) === 0 ? text.slice(1) : text;
}
