import type { Extents } from '../contour/contour.ts';
import type { Point } from '../point.ts';
import type { Layer } from './options.ts';

/** A line of text in a drawing, its baseline beginning at (x, y). */
export interface DrawingText {
  readonly text: string;
  readonly x: number;
  readonly y: number;
  /** Height of a capital letter. */
  readonly height: number;
}

/** A chain of vertices. */
export interface Chain {
  readonly x: ArrayLike<number>;
  readonly y: ArrayLike<number>;
  /**
   * Bulge of the piece that begins at each vertex: tangent of a quarter of the arc's angle, positive when the arc runs
   * counter-clockwise, 0 for a straight piece (DXF reference, LWPOLYLINE, group 42). Absent: all straight.
   */
  readonly bulge?: ArrayLike<number>;
}

/** What the drawing formats write: a section at true size, all lengths in mm, y upwards. */
export interface Drawing {
  /** The section's name and version. */
  readonly title: string;
  /** What the file says about itself, one line each. */
  readonly header: readonly string[];
  /** The layers to write; the others are left out. */
  readonly layers: readonly Layer[];
  /** The closed outline: the last vertex is joined to the first, which is not repeated. */
  readonly outline: Chain;
  readonly chordLine: readonly [Point, Point];
  /** The mean camber line, open. */
  readonly camberLine: Chain;
  readonly texts: readonly DrawingText[];
  /** Smallest and largest coordinates of the outline. */
  readonly extents: Extents;
}

/**
 * Line type and width of each layer, by ISO 128: the outline a wide continuous line, chord and mean line narrow long-dashed
 * dotted ones. Dash lengths of ISO 128-20 (from memory) as multiples of the width: dash 24, gap 3, dot 0.5.
 */
export const OUTLINE_WIDTH_MM = 0.5;
export const THIN_WIDTH_MM = 0.25;
export const LONG_DASH_DOT_MM = [24, 3, 0.5, 3].map((multiple) => multiple * THIN_WIDTH_MM);
