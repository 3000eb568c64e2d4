import type { Point } from '../point.ts';
import type { DrawingText } from './drawing.ts';

/** Heights of capitals in mm: the series of ISO 3098 (from memory). */
const LETTER_HEIGHTS_MM = [1.8, 2.5, 3.5, 5, 7, 10, 14, 20];
/** Letters of this height let a line of some 40 letters end within the width. */
const WIDTH_SHARE = 1 / 40;
const LINE_PITCH = 1.6;
const GAP = 2.5;

/**
 * Lines of text below a drawing, the first one on top, in letters that suit its width.
 * @param widthMm width of the drawing, for instance the chord
 * @param corner the drawing's lowest point at the left, mm
 */
export function textsBelow(lines: readonly string[], widthMm: number, corner: Point): readonly DrawingText[] {
  const height = LETTER_HEIGHTS_MM.findLast((h) => h <= widthMm * WIDTH_SHARE) ?? 1.8;
  return lines.map((text, i) => ({
    text,
    x: corner.x,
    y: corner.y - height * (GAP + LINE_PITCH * i),
    height,
  }));
}
