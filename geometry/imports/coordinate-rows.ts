import { singleLine } from '../formats/text.ts';
import { type DecimalMark, numbersIn } from './numbers.ts';
import { IMPORT_LIMITS, ImportRefusal, quoted } from './refusal.ts';
import { type Line, linesOf } from './text.ts';

/** A line of a coordinate file by what it holds. */
export type Row =
  | { readonly kind: 'numbers'; readonly values: readonly number[]; readonly line: number }
  /** A blank line or a line of words: what stands before and after may be different surfaces. */
  | { readonly kind: 'break'; readonly line: number };

export interface Rows {
  /** The first line of words before the numbers. */
  readonly name: string | null;
  readonly rows: readonly Row[];
  /** Whether words or comments speak of mm. */
  readonly namesMm: boolean;
  readonly notes: readonly string[];
}

/** Lines of words that are passed over before the first numbers, and between them. */
const MOST_WORDS = { before: 50, between: 20 } as const;
/** Numbers looked at on a line. */
const MOST_NUMBERS = 5;
const LONGEST_NAME = 120;

/**
 * The rows of a coordinate file, comments taken out.
 * @throws ImportRefusal for a line that is neither numbers nor plain words, or too many lines of numbers
 */
export function readRows(text: string): Rows {
  const mark = decimalMark(text);
  const rows: Row[] = [];
  let name: string | null = null;
  let [numbers, before, between] = [0, 0, 0];
  let namesMm = false;
  for (const line of linesOf(text)) {
    refuseLong(line);
    const content = withoutComment(line.text);
    if (content.length < line.text.length && before + between <= MOST_WORDS.before) {
      namesMm ||= speaksOfMm(line.text);
    }
    const values = numbersIn(content, mark, MOST_NUMBERS);
    if (values && values.length > 0) {
      numbers++;
      refuseTooMany(numbers);
      rows.push({ kind: 'numbers', values, line: line.number });
      continue;
    }
    if (!values) {
      refuseNoWords({ ...line, text: content });
      namesMm ||= speaksOfMm(content);
      if (numbers === 0 && isName(content)) name ??= singleLine(content).slice(0, LONGEST_NAME);
      if (numbers === 0) before++;
      else between++;
      refuseText(numbers === 0 ? before <= MOST_WORDS.before : isLabel(content), line, content);
      if (between > MOST_WORDS.between) refuseText(false, line, content);
    }
    const comment = content.trim() === '' && line.text.trim() !== '';
    if (!comment && rows.at(-1)?.kind === 'numbers') rows.push({ kind: 'break', line: line.number });
  }
  const words = counted(between);
  return { name, rows, namesMm, notes: [...(mark === ',' ? ['read decimal commas'] : []), ...words] };
}

function counted(between: number): string[] {
  if (between === 0) return [];
  return [`passed over ${between} ${between === 1 ? 'line' : 'lines'} of words between the points`];
}

function refuseTooMany(numbers: number): void {
  // Count lines are not points: a few more lines than points may be read.
  const { max } = IMPORT_LIMITS.points;
  if (numbers > max + 10) throw new ImportRefusal('too-many-points', `The file has more than ${max} points.`);
}

function refuseLong({ text, number }: Line): void {
  const { lines, lineLength } = IMPORT_LIMITS;
  if (number > lines) throw new ImportRefusal('too-large', `The file has more than ${lines} lines.`);
  if (text.length <= lineLength) return;
  const message = `Line ${number} is longer than ${lineLength} characters: it is not two numbers.`;
  throw new ImportRefusal('not-numbers', message, number);
}

function refuseText(accepted: boolean, line: Line, content: string): void {
  if (accepted) return;
  const message = `Line ${line.number} should hold two numbers, but holds ${quoted(content)}.`;
  throw new ImportRefusal('not-numbers', message, line.number);
}

/** Marks that make the whole line a comment. */
const COMMENT_LINES = ['#', '!', ';', '*', '%', '//'];

function withoutComment(line: string): string {
  const start = line.trimStart();
  if (COMMENT_LINES.some((mark) => start.startsWith(mark))) return '';
  const ends = ['#', '!', '//'].map((mark) => line.indexOf(mark)).filter((at) => at >= 0);
  return ends.length === 0 ? line : line.slice(0, Math.min(...ends));
}

const MM_LOOKED_AT = 300;

function speaksOfMm(text: string): boolean {
  return /(?:^|[^a-z])mm(?:[^a-z]|$)|millimet/i.test(text.slice(0, MM_LOOKED_AT));
}

/** Words that are numbers to a computer. */
const NO_WORDS = ['nan', 'inf', 'infinity', '-nan', '-inf', '+inf', '1.#'];

/** Headings of columns are shorter. */
function isName(content: string): boolean {
  return /[\p{L}\d]{3}/u.test(content);
}

/** Words between the points: they begin with a letter and hold no number with a fraction. */
function isLabel(content: string): boolean {
  const text = content.trim();
  const first = text.split(/[\s,;]/, 1)[0]?.toLowerCase() ?? '';
  return /^\p{L}/u.test(text) && !NO_WORDS.includes(first) && !/\d[.,]\d/.test(text);
}

/** Refuses markup and cells that a spreadsheet would calculate. */
function refuseNoWords({ text, number }: Line): void {
  if (text.trimStart().startsWith('<')) {
    throw new ImportRefusal('markup', `Line ${number} is HTML or XML, not coordinates.`, number);
  }
  const formula = text.split(/[,;\t]/).find((cell) => /^\s*["']?(?:=[^=\s]|@\p{L}|[+-][\p{L}(])/u.test(cell));
  if (formula === undefined) return;
  const message = `Line ${number} holds a formula, ${quoted(formula)}: write the values instead.`;
  throw new ImportRefusal('formula', message, number);
}

const TRIED_LINES = 400;
const SEARCHED_LINES = 20_000;

/** How much numbers of a line are like a point: a pair twice as much as three. */
function likeness(numbers: readonly number[] | null): number {
  return numbers?.length === 2 ? 2 : numbers?.length === 3 ? 1 : 0;
}

/** The decimal mark under which more of the first lines are pairs of numbers; the point when both do. */
function decimalMark(text: string): DecimalMark {
  let [points, commas, tried] = [0, 0, 0];
  for (const line of linesOf(text)) {
    if (tried >= TRIED_LINES || line.number > SEARCHED_LINES) break;
    if (line.text.length > IMPORT_LIMITS.lineLength) break;
    const content = withoutComment(line.text);
    const [byPoint, byComma] = [numbersIn(content, '.', MOST_NUMBERS), numbersIn(content, ',', MOST_NUMBERS)];
    if ((byPoint?.length ?? 0) === 0 && (byComma?.length ?? 0) === 0) continue;
    tried++;
    points += likeness(byPoint);
    commas += likeness(byComma);
  }
  return commas > points ? ',' : '.';
}
