import { type Rect, type TextMark } from './page.ts';

/** Heights of capitals in mm: the series of ISO 3098-1 (from memory), and 1.5 for what is read from near. */
export const LETTER = { least: 1.5, small: 1.8, plain: 2.5, title: 3.5, large: 5, largest: 7 } as const;

/** Measures of the typeface in parts of its size; every character is equally wide (JetBrains Mono: 600, 730 and 270 of 1000 units). */
export const TYPEFACE = { advance: 0.6, capital: 0.73, descent: 0.27 } as const;

/** The width of a text, mm: exact, because the typeface has one width for all characters. */
export function textWidth(text: string, heightMm: number): number {
  return ([...text].length * heightMm * TYPEFACE.advance) / TYPEFACE.capital;
}

/** The box around a text, from the descenders to the top of the capitals. */
export function textBox({ at, text, heightMm, anchor, turned }: TextMark): Rect {
  const width = textWidth(text, heightMm);
  const below = (heightMm * TYPEFACE.descent) / TYPEFACE.capital;
  const before = anchor === 'start' ? 0 : anchor === 'middle' ? width / 2 : width;
  return turned
    ? { x: at.x - heightMm, y: at.y - width + before, width: heightMm + below, height: width }
    : { x: at.x - before, y: at.y - heightMm, width, height: heightMm + below };
}

/**
 * A text that stays within a width: smaller down to a least height where it is too long, then cut with an ellipsis.
 * @param room mm
 */
export function fittedText(
  text: string,
  room: number,
  heightMm: number,
  least: number = LETTER.least,
): { readonly text: string; readonly heightMm: number } {
  const one = textWidth(text, 1);
  const fit = one > 0 ? Math.min(heightMm, room / one) : heightMm;
  if (fit >= Math.min(least, heightMm)) return { text, heightMm: fit };
  const count = Math.floor(room / textWidth('0', least) + 1e-9) - 1;
  if (count < 0) return { text: '', heightMm: least };
  return { text: `${[...text].slice(0, count).join('').trimEnd()}…`, heightMm: least };
}

/** A text in lines no wider than the room, broken at blanks, and within a word that is wider than the room by itself. */
export function wrappedText(text: string, room: number, heightMm: number): string[] {
  const most = Math.max(1, Math.floor(room / textWidth('0', heightMm) + 1e-9));
  const lines: string[] = [];
  let line: string[] = [];
  for (const word of text.split(' ').filter((of) => of !== '')) {
    let rest = [...word];
    if (line.length > 0 && line.length + 1 + rest.length <= most) {
      line.push(' ', ...rest);
      continue;
    }
    if (line.length > 0) lines.push(line.join(''));
    for (; rest.length > most; rest = rest.slice(most)) lines.push(rest.slice(0, most).join(''));
    line = rest;
  }
  if (line.length > 0) lines.push(line.join(''));
  return lines;
}
