import { ImportRefusal, quoted } from './refusal.ts';

/** One pair of lines of a DXF file: what the value means, and the value. */
export interface DxfGroup {
  readonly code: number;
  readonly value: string;
  /** The line of the code, counted from 1. */
  readonly line: number;
}

const [ZERO, NINE, MINUS] = [48, 57, 45];
const BLANK = 32;

/**
 * Hands the code and value pairs of a DXF file, up to its end mark, to `take`: for each pair that `wants` is true for, so that the many
 * that nobody wants cost little.
 * @throws ImportRefusal when a line that should be a code is none
 */
export function eachDxfGroup(
  text: string,
  wants: (code: number) => boolean,
  take: (group: DxfGroup) => void,
): void {
  // Files of old computers end their lines with CR alone.
  const lines = text.includes('\n') ? text : text.replaceAll('\r', '\n');
  let line = 1;
  for (let start = 0; start < lines.length; line += 2) {
    const codeEnd = endOf(lines, start);
    const code = codeIn(lines, start, codeEnd);
    if (code === null) {
      if (lines.slice(start).trim() === '') return;
      const found = quoted(lines.slice(start, codeEnd));
      const message = `Line ${line} should be a group code of a DXF drawing, but is ${found}.`;
      throw new ImportRefusal('broken-drawing', message, line);
    }
    const valueEnd = endOf(lines, codeEnd + 1);
    if (code === 0 || wants(code)) {
      const value = lines.slice(codeEnd + 1, valueEnd).trim();
      if (code === 0 && value === 'EOF') return;
      take({ code, value, line });
    }
    start = valueEnd + 1;
  }
}

function endOf(text: string, from: number): number {
  const end = text.indexOf('\n', from);
  return end < 0 ? text.length : end;
}

const LONGEST_CODE = 12;

/** The whole number that a line holds with blanks beside it, or null. */
function codeIn(text: string, from: number, to: number): number | null {
  if (to - from > LONGEST_CODE) return null;
  let [start, end] = [from, to];
  while (start < end && text.charCodeAt(start) <= BLANK) start++;
  while (end > start && text.charCodeAt(end - 1) <= BLANK) end--;
  const digits = text.charCodeAt(start) === MINUS ? start + 1 : start;
  if (digits === end) return null;
  let code = 0;
  for (let i = digits; i < end; i++) {
    const character = text.charCodeAt(i);
    if (character < ZERO || character > NINE) return null;
    code = 10 * code + character - ZERO;
  }
  return digits > start ? -code : code;
}

/** The number in a group. @throws ImportRefusal when it holds none */
export function dxfNumber({ value, line }: DxfGroup): number {
  const number = value === '' || value.length > 64 ? NaN : Number(value);
  if (Number.isFinite(number)) return number;
  const message = `Line ${line + 1} should be a number, but is ${quoted(value)}.`;
  throw new ImportRefusal('broken-drawing', message, line + 1);
}
