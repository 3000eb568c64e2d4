import { type Point } from '../../point.ts';
import { type Box, type Polyline, at, polylineOf, segmentDistance } from '../arrays.ts';
import { verticalCut } from '../feature-ends.ts';
import { strokeText, strokeWidth } from '../strokes.ts';
import { type Tick } from '../template.ts';

const LENGTH = { plain: 2, numbered: 3.5 } as const;
/** Every so many ticks carry their number, and the first and the last. */
const NUMBERED = 5;
const NUMBER_HEIGHT_MM = 2;
/** Kept between a number and whatever is next to it, mm. */
const CLEAR_MM = 0.5;
/** A number that has no room is tried so much further inwards, mm. */
const FURTHER_MM = [0, 1.5, 3];
/** A tick this far from the outline does not stand on it: the core may end ahead of the template. */
const OFF_MM = 0.1;

/**
 * The ticks of a template on an outline: lines inwards, with their numbers in strokes where there is room. Ticks off the outline are left out.
 * @param outline closed
 * @param inset how far inwards of the ticks' own places the outline lies, mm
 * @param taken where no number may stand
 */
export function tickMarks(
  ticks: readonly Tick[],
  outline: Polyline,
  inset: number,
  taken: readonly Box[],
): readonly Polyline[] {
  const lines: Polyline[] = [];
  const numbers: Polyline[] = [];
  const full = [...taken];
  for (const tick of ticks) {
    const along = (by: number): Point => ({
      x: tick.at.x + (inset + by) * tick.inwards.x,
      y: tick.at.y + (inset + by) * tick.inwards.y,
    });
    if (distanceFrom(outline, along(0)) > OFF_MM) continue;
    const main = tick.number % NUMBERED === 0 || tick.number === 1 || tick.number === ticks.length;
    const length = reach(outline, along(0), tick, main ? LENGTH.numbered : LENGTH.plain);
    lines.push(polylineOf([along(0), along(length)]));
    if (!main) continue;
    const text = String(tick.number);
    const half = { x: (strokeWidth(text) * NUMBER_HEIGHT_MM) / 2, y: NUMBER_HEIGHT_MM / 2 };
    const beside = CLEAR_MM + Math.abs(half.x * tick.inwards.x) + Math.abs(half.y * tick.inwards.y);
    const place = FURTHER_MM.map((further) => along(length + beside + further)).find((centre) => {
      const box = boxAround(centre, half);
      return isWithin(outline, box) && !full.some((other) => overlap(box, other));
    });
    if (!place) continue;
    full.push(boxAround(place, half));
    numbers.push(...strokeText(text, place, NUMBER_HEIGHT_MM));
  }
  return [...lines, ...numbers];
}

function distanceFrom({ x, y }: Polyline, point: Point): number {
  let least = Infinity;
  for (let b = 0, a = x.length - 1; b < x.length; a = b++) {
    least = Math.min(least, segmentDistance(point.x, point.y, at(x, a), at(y, a), at(x, b), at(y, b)));
  }
  return least;
}

/** A tick reaches to a third of the outline's height at most, so that those of both surfaces stay apart; at the nose they stand level. */
function reach(outline: Polyline, foot: Point, { inwards }: Tick, length: number): number {
  const cut = verticalCut(outline, foot.x);
  return !cut || Math.abs(inwards.y) < 0.5 ? length : Math.min(length, (cut.high - cut.low) / 3);
}

function boxAround({ x, y }: Point, half: Point): Box {
  const [w, h] = [half.x + CLEAR_MM / 2, half.y + CLEAR_MM / 2];
  return { minX: x - w, maxX: x + w, minY: y - h, maxY: y + h };
}

function isWithin(outline: Polyline, { minX, maxX, minY, maxY }: Box): boolean {
  return [minX, (minX + maxX) / 2, maxX].every((x) => {
    const cut = verticalCut(outline, x);
    return cut !== null && cut.low < minY && cut.high > maxY;
  });
}

function overlap(a: Box, b: Box): boolean {
  return a.minX < b.maxX && b.minX < a.maxX && a.minY < b.maxY && b.minY < a.maxY;
}
