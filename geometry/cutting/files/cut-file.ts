/** What can be said about a file before it is opened; lengths in mm. */
type CutFileFacts =
  | {
      /** The outline at one end of the core. */
      readonly kind: 'outline';
      /** Vertices of the outline, each on the ruling of the vertex of the same number at the other end. */
      readonly pairs: number;
      readonly widthMm: number;
      readonly heightMm: number;
    }
  | {
      /** The program of a wire machine. */
      readonly kind: 'program';
      readonly lines: number;
      /** All moves and waits together, an estimate. */
      readonly seconds: number;
    }
  | {
      /** Ribs on one sheet of their material. */
      readonly kind: 'ribs';
      readonly numbers: readonly number[];
      /** Size of the sheet. */
      readonly widthMm: number;
      readonly heightMm: number;
    }
  | {
      /** Coordinates of a section at its chord. */
      readonly kind: 'coordinates';
      readonly points: number;
      readonly widthMm: number;
      readonly heightMm: number;
    };

/** A file of a cut sheet. */
export interface CutFile {
  /** Its name within the sheet's version, as in `root.dxf`. */
  readonly name: string;
  /** The name under which it is saved: with sheet, version, part and chord. */
  readonly downloadName: string;
  /** What is made from it; `sheet`: it belongs to all parts. */
  readonly part: 'core' | 'ribs' | 'templates' | 'sheet';
  readonly mediaType: string;
  readonly text: string;
  readonly facts: CutFileFacts;
}
