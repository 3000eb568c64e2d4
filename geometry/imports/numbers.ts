/** What parts whole and fraction in a file. */
export type DecimalMark = '.' | ',';

const ZERO = 48;
const NINE = 57;
/** Letters that begin the exponent: the usual one and that of double precision in old programs. */
const EXPONENT = new Set(['e', 'E', 'd', 'D']);
const SEPARATORS = ' \t\f\u00a0,;|"()[]';
/** Longer numbers are nobody's coordinates. */
const LONGEST = 64;

/**
 * The numbers of a line that holds nothing else but what parts numbers (blanks, tabs, commas, semicolons, bars, quotes, brackets), or
 * null. Works through the line once, and only as far as it needs.
 * @param mark with ",", a comma between digits is a decimal comma and a point is refused
 * @param most the reading stops after so many numbers
 */
export function numbersIn(line: string, mark: DecimalMark, most: number): number[] | null {
  const numbers: number[] = [];
  let i = 0;
  while (i < line.length && numbers.length < most) {
    if (SEPARATORS.includes(line[i] ?? '')) {
      i++;
      continue;
    }
    const end = numberEnd(line, i, mark);
    const next = line[end] ?? ' ';
    if (end === i || end - i > LONGEST || !(SEPARATORS.includes(next) || next === '%')) return null;
    const value = Number(plainNumber(line.slice(i, end)));
    if (!Number.isFinite(value)) return null;
    numbers.push(value);
    i = next === '%' ? end + 1 : end;
  }
  return numbers;
}

function isDigit(line: string, i: number): boolean {
  const code = line.charCodeAt(i);
  return code >= ZERO && code <= NINE;
}

function digitsEnd(line: string, from: number): number {
  let i = from;
  while (isDigit(line, i)) i++;
  return i;
}

function isSign(character: string | undefined): boolean {
  return character === '+' || character === '-' || character === '\u2212';
}

/** Where the number that begins at `from` ends; `from` itself when none does. */
function numberEnd(line: string, from: number, mark: DecimalMark): number {
  const start = isSign(line[from]) ? from + 1 : from;
  const whole = digitsEnd(line, start);
  let end = whole;
  const decimal = line[whole] === mark && (mark === '.' || isDigit(line, whole + 1));
  if (decimal) end = digitsEnd(line, whole + 1);
  if (end === start || (decimal && end === start + 1)) return from;
  if (!EXPONENT.has(line[end] ?? '')) return end;
  const power = isSign(line[end + 1]) ? end + 2 : end + 1;
  const last = digitsEnd(line, power);
  return last > power ? last : end;
}

function plainNumber(text: string): string {
  return text.replace(',', '.').replaceAll('\u2212', '-').replace(/[dD]/, 'e');
}
