import { type Point } from '../point.ts';
import { LETTER } from './lettering.ts';
import { WIDTH, area, segment, text } from './marks.ts';
import { type Mark } from './page.ts';

/** Length of the bars that are measured after printing, mm. */
export const SCALE_BAR_MM = 100;
const STEP = 10;
const HIGH = 2;

/**
 * A bar of 100 mm with a mark each 10 mm, to be measured before anything is cut. It needs 5.5 mm beside the line: above a level one, to the left of an upright one.
 * @param from its left or its lower end
 */
export function scaleBar(from: Point, direction: 'level' | 'upright'): Mark[] {
  const place = (along: number, aside: number): Point =>
    direction === 'level'
      ? { x: from.x + along, y: from.y - aside }
      : { x: from.x - aside, y: from.y - along };
  const stroke = (a: Point, b: Point, widthMm: number) => segment(a.x, a.y, b.x, b.y, { widthMm });
  const cells = Array.from({ length: SCALE_BAR_MM / STEP / 2 }, (_, i) => {
    const [a, b] = [2 * i * STEP, (2 * i + 1) * STEP];
    return area([place(a, 0), place(b, 0), place(b, 1), place(a, 1)], 'ink');
  });
  const ends = [0, SCALE_BAR_MM].map((along) => stroke(place(along, -1), place(along, HIGH), WIDTH.narrow));
  return [
    ...cells,
    stroke(place(0, 0), place(SCALE_BAR_MM, 0), WIDTH.narrow),
    ...ends,
    text(place(SCALE_BAR_MM / 2, HIGH + 0.4), `${SCALE_BAR_MM} mm`, LETTER.plain, {
      anchor: 'middle',
      weight: 600,
      turned: direction === 'upright',
    }),
  ];
}
