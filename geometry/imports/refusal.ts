/** Why a file from outside is not read. */
export type ImportRefusalCode =
  /** Nothing in it. */
  | 'empty'
  /** More bytes than IMPORT_LIMITS.bytes. */
  | 'too-large'
  /** Bytes that are no text. */
  | 'binary'
  /** Another kind of file: a picture, a document, a drawing where coordinates were expected. */
  | 'wrong-type'
  /** HTML or XML. */
  | 'markup'
  /** A cell that a spreadsheet would calculate. */
  | 'formula'
  /** A line that is not two numbers. */
  | 'not-numbers'
  | 'too-few-points'
  | 'too-many-points'
  /** More than one outline. */
  | 'several-contours'
  /** The outline crosses or touches itself. */
  | 'crossing'
  /** One outline, but not that of a wing section. */
  | 'not-a-section'
  /** A drawing without an outline that can be read. */
  | 'no-outline'
  /** A drawing that breaks the rules of its format. */
  | 'broken-drawing';

/** A file from outside that cannot be taken, in a sentence for the person who chose it. */
export class ImportRefusal extends Error {
  readonly code: ImportRefusalCode;
  /** The line at fault, counted from 1; null when it is the file as a whole. */
  readonly line: number | null;

  constructor(code: ImportRefusalCode, message: string, line: number | null = null) {
    super(message);
    this.name = 'ImportRefusal';
    this.code = code;
    this.line = line;
  }
}

/** The most that is read. Beyond it a file is refused before any work is done on it. */
export const IMPORT_LIMITS = {
  /** 5 MB. */
  bytes: 5 * 1024 * 1024,
  /** Lines of a list of coordinates, comments included, and characters in one of them. */
  lines: 100_000,
  lineLength: 1000,
  points: { min: 10, max: 10_000 },
} as const;

const SHOWN = 40;

/** A piece of the file as it may stand in a sentence: one line, short, without control characters. */
export function quoted(text: string): string {
  const start = text.slice(0, 2 * SHOWN).trim();
  const plain = Array.from(start, (character) =>
    character < ' ' || character === '\u007f' ? ' ' : character,
  );
  const short = plain.length > SHOWN ? `${plain.slice(0, SHOWN).join('')}…` : plain.join('');
  return `“${short}”`;
}
