/** The part of the independent reader of machine programs that the tests use. */
declare module 'gcode-parser' {
  export interface ParsedLine {
    readonly line: string;
    readonly words: readonly (readonly [letter: string, value: number])[];
    readonly comments?: readonly string[];
    readonly ln?: number;
  }
  export function parseStringSync(text: string): ParsedLine[];
}
