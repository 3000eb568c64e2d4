import { type Point } from '../point.ts';
import { LETTER, textWidth } from './lettering.ts';
import { area, segment, text } from './marks.ts';
import { type Mark } from './page.ts';

/** A linear dimension in the drawing, all places in mm of the page. */
export interface LinearDimension {
  readonly from: Point;
  readonly to: Point;
  readonly direction: 'level' | 'upright';
  /** Where the dimension line stands: its y when level, its x when upright. */
  readonly at: number;
  readonly text: string;
  /** Where a text stands that does not fit between the arrows: beyond the right or lower end, or before the other one. */
  readonly outside?: 'beyond' | 'before';
}

/** Closed, filled arrowheads of about 15° (ISO 129-1), mm. */
const ARROW = { length: 2.5, halfWidth: 0.33 } as const;
/** From the outline to the extension line, its end beyond the dimension line, the tail of an arrow from outside, and the gap about the text, mm. */
const GAP = 0.8;
const BEYOND = 1.5;
const TAIL = 5;
const CLEAR = 0.8;

/**
 * A dimension after ISO 129-1: extension lines, dimension line with arrowheads, the text in a gap of the line. Where the text does not
 * fit between the arrows they point inwards from outside, and the text stands beyond one of them.
 */
export function dimension(of: LinearDimension): Mark[] {
  const level = of.direction === 'level';
  const along = (point: Point) => (level ? point.x : point.y);
  const across = (point: Point) => (level ? point.y : point.x);
  const place = (a: number, b: number): Point => (level ? { x: a, y: b } : { x: b, y: a });
  const stroke = (a1: number, b1: number, a2: number, b2: number) => {
    const [p, q] = [place(a1, b1), place(a2, b2)];
    return segment(p.x, p.y, q.x, q.y, { ink: 'graphite' });
  };
  const arrow = (tip: number, towards: 1 | -1) =>
    area(
      [
        place(tip, of.at),
        place(tip - towards * ARROW.length, of.at - ARROW.halfWidth),
        place(tip - towards * ARROW.length, of.at + ARROW.halfWidth),
      ],
      'graphite',
    );
  const extensions = [of.from, of.to].map((point) => {
    const way = Math.sign(of.at - across(point)) || 1;
    return stroke(along(point), across(point) + way * GAP, along(point), of.at + way * BEYOND);
  });
  const [low, high] = [Math.min(along(of.from), along(of.to)), Math.max(along(of.from), along(of.to))];
  const width = textWidth(of.text, LETTER.plain);
  const words = (middle: number) =>
    text(
      level ? { x: middle, y: of.at + LETTER.plain / 2 } : { x: of.at + LETTER.plain / 2, y: middle },
      of.text,
      LETTER.plain,
      { anchor: 'middle', weight: 600, turned: !level },
    );
  if (high - low >= width + 2 * (ARROW.length + CLEAR + 0.6)) {
    const middle = (low + high) / 2;
    return [
      ...extensions,
      stroke(low, of.at, middle - width / 2 - CLEAR, of.at),
      stroke(middle + width / 2 + CLEAR, of.at, high, of.at),
      arrow(low, -1),
      arrow(high, 1),
      words(middle),
    ];
  }
  const aside = TAIL + CLEAR + width / 2;
  return [
    ...extensions,
    stroke(low - TAIL, of.at, high + TAIL, of.at),
    arrow(low, 1),
    arrow(high, -1),
    words(of.outside === 'before' ? low - aside : high + aside),
  ];
}
