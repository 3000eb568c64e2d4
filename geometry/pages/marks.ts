import { type Point } from '../point.ts';
import { type AreaMark, type CircleMark, type Ink, type LineMark, type Rect, type TextMark } from './page.ts';

/**
 * Line widths in mm after ISO 128-2: wide and narrow in the ratio 2 : 1, the frame of the series' next step (ISO 5457), and
 * hair lines of tables, which carry no meaning of their own.
 */
export const WIDTH = { frame: 0.7, wide: 0.5, edge: 0.35, narrow: 0.25, hair: 0.13 } as const;

/** Dash and gap lengths as multiples of the line's width (ISO 128-2, from memory: dash 12, long dash 24, gap 3, dot 0.5). */
export const DASHES = {
  continuous: [],
  dashed: [12, 3],
  'long-dash-dot': [24, 3, 0.5, 3],
  'long-dash-double-dot': [24, 3, 0.5, 3, 0.5, 3],
} as const;

type LineStyle = Partial<Omit<LineMark, 'kind' | 'points'>>;

/** A line through points: continuous, narrow, open and in ink unless said otherwise. */
export function line(points: readonly Point[], style: LineStyle = {}): LineMark {
  return {
    kind: 'line',
    points,
    closed: false,
    type: 'continuous',
    widthMm: WIDTH.narrow,
    ink: 'ink',
    ...style,
  };
}

/** A straight line between two points. */
export function segment(x1: number, y1: number, x2: number, y2: number, style: LineStyle = {}): LineMark {
  return line(
    [
      { x: x1, y: y1 },
      { x: x2, y: y2 },
    ],
    style,
  );
}

/** The corners of a rectangle. */
export function corners({ x, y, width, height }: Rect): Point[] {
  return [
    { x, y },
    { x: x + width, y },
    { x: x + width, y: y + height },
    { x, y: y + height },
  ];
}

/** A rectangle's outline. */
export function outlined(rect: Rect, style: LineStyle = {}): LineMark {
  return line(corners(rect), { ...style, closed: true });
}

/** A filled polygon. */
export function area(points: readonly Point[], ink: Ink): AreaMark {
  return { kind: 'area', rings: [points], ink };
}

/** A circle's line. */
export function circle(centre: Point, radiusMm: number, style: Partial<CircleMark> = {}): CircleMark {
  return { kind: 'circle', centre, radiusMm, widthMm: WIDTH.narrow, ink: 'ink', ...style };
}

/** A text: upright, regular, from its start and in ink unless said otherwise. */
export function text(
  at: Point,
  words: string,
  heightMm: number,
  style: Partial<Omit<TextMark, 'kind' | 'at' | 'text' | 'heightMm'>> = {},
): TextMark {
  return {
    kind: 'text',
    at,
    text: words,
    heightMm,
    weight: 400,
    anchor: 'start',
    turned: false,
    ink: 'ink',
    ...style,
  };
}
