/** Longest text that is put into a comment. */
const COMMENT_LENGTH = 70;

/**
 * Free text for a comment of a machine program: plain ASCII letters, digits, blanks and . , - + / : alone, so that no name can end the comment, begin
 * another, break the line or carry a code. What has no plain form becomes a hyphen.
 */
export function commentText(text: string): string {
  return text
    .normalize('NFKD')
    .replace(/[\u0300-\u036f]/g, '')
    .replace(/[^A-Za-z0-9 .,:/+-]+/g, '-')
    .replace(/ +/g, ' ')
    .trim()
    .slice(0, COMMENT_LENGTH);
}

/** A comment that begins with a fixed word, so that a controller never takes a name for a message command. */
export function comment(label: string, text = ''): string {
  const value = commentText(text);
  return value ? `(${label}: ${value})` : `(${label})`;
}

/** A number with fixed decimals, a point, no exponent and no negative zero. */
export function decimal(value: number, decimals: number): string {
  const text = value.toFixed(decimals);
  return Number(text) === 0 ? text.replace('-', '') : text;
}
