import { type Point } from '../point.ts';

/**
 * Printed pages as data. All lengths in mm on the paper; x runs to the right, y down, from the upper left corner. Whoever renders
 * a page has to know these four kinds of mark and nothing else.
 */
export interface Page {
  readonly widthMm: number;
  readonly heightMm: number;
  /** Nothing stands outside of it but the zones of a drawing's frame. */
  readonly frame: Rect;
  /** Painted in this order. */
  readonly marks: readonly Mark[];
}

/** A rectangle on the page, mm. */
export interface Rect {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

export type Mark = LineMark | CircleMark | TextMark | AreaMark;

/** Line types of ISO 128-2, by their basic names. */
export type LineType = 'continuous' | 'dashed' | 'long-dash-dot' | 'long-dash-double-dot';

/** What a colour stands for; the renderer knows the colours. */
export type Ink = 'ink' | 'graphite' | 'hair' | 'foam' | 'wire' | 'paper';

export interface LineMark {
  readonly kind: 'line';
  readonly points: readonly Point[];
  readonly closed: boolean;
  readonly type: LineType;
  readonly widthMm: number;
  readonly ink: Ink;
}

export interface CircleMark {
  readonly kind: 'circle';
  readonly centre: Point;
  readonly radiusMm: number;
  readonly widthMm: number;
  readonly ink: Ink;
}

export type Weight = 400 | 600 | 800;
export type Anchor = 'start' | 'middle' | 'end';

export interface TextMark {
  readonly kind: 'text';
  /** On the baseline, at the start, middle or end of the text. */
  readonly at: Point;
  /** One line. */
  readonly text: string;
  /** Height of the capitals. */
  readonly heightMm: number;
  readonly weight: Weight;
  readonly anchor: Anchor;
  /** A quarter turn, so that it is read from the right. */
  readonly turned: boolean;
  readonly ink: Ink;
}

/** Filled; a point inside an even number of rings is outside. */
export interface AreaMark {
  readonly kind: 'area';
  readonly rings: readonly (readonly Point[])[];
  readonly ink: Ink;
}

/** What a page needs beside the identity and can't be worked out here. */
export interface PageDetails {
  /** Modules of the QR code of the version's address, row by row, true where dark. */
  readonly qr: readonly (readonly boolean[])[];
  /** The legal owner (ISO 7200): the workshop. */
  readonly owner: string;
}
