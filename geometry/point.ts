/** A point of the drawing sheet: x aft along the chord, y up, both in fractions of chord. */
export interface Point {
  readonly x: number;
  readonly y: number;
}
