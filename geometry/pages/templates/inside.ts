import { type Point } from '../../point.ts';
import { textBox } from '../lettering.ts';
import { type Occupied } from '../occupied.ts';
import { type Rect, type TextMark } from '../page.ts';

/** Is a text quite inside the template, and free? */
export function fits(of: TextMark, outline: readonly Point[], room: Occupied): boolean {
  const box = textBox(of);
  return room.isFree(box) && boxInside(box, outline);
}

/** Room kept between a text and the edge, mm. */
const CLEAR = 0.6;

function boxInside({ x, y, width, height }: Rect, outline: readonly Point[]): boolean {
  const [left, right, top, bottom] = [x - CLEAR, x + width + CLEAR, y - CLEAR, y + height + CLEAR];
  const steps = Math.max(1, Math.ceil(width / 3));
  for (let k = 0; k <= steps; k += 1) {
    const across = left + ((right - left) * k) / steps;
    if (!isInside({ x: across, y: top }, outline) || !isInside({ x: across, y: bottom }, outline))
      return false;
  }
  return true;
}

/** Does a point lie within a closed line, by the even-odd rule? */
export function isInside(point: Point, outline: readonly Point[]): boolean {
  let inside = false;
  let before = outline.at(-1);
  for (const here of outline) {
    if (before && here.y > point.y !== before.y > point.y) {
      const x = here.x + ((point.y - here.y) / (before.y - here.y)) * (before.x - here.x);
      if (point.x < x) inside = !inside;
    }
    before = here;
  }
  return inside;
}

/** Is a corner, a side or the middle of a box inside of the template? */
export function touches(box: Rect, outline: readonly Point[]): boolean {
  const xs = [box.x, box.x + box.width / 2, box.x + box.width];
  const ys = [box.y, box.y + box.height / 2, box.y + box.height];
  return xs.some((x) => ys.some((y) => isInside({ x, y }, outline)));
}
