/** What a point of the contour belongs to. */
export const PART = { tail: 0, upper: 1, nose: 2, lower: 3 } as const;
export type Part = (typeof PART)[keyof typeof PART];

/** One end of a pair: the point, its unit normal away from the section, and the skin allowance there. */
export interface RowEnd {
  readonly x: number;
  readonly y: number;
  readonly nx: number;
  readonly ny: number;
  readonly skin: number;
}

/** A pair of points in step. */
export interface Row {
  readonly station: number;
  readonly part: Part;
  /** Must stay a vertex. */
  readonly fixed: boolean;
  readonly root: RowEnd;
  readonly tip: RowEnd;
}
