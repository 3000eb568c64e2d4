import { type Box } from '../cutting/arrays.ts';
import { type Point } from '../point.ts';
import { type Rect } from './page.ts';

/** Scales of ISO 5455, from large to small. */
const SCALES = [
  50,
  20,
  10,
  5,
  2,
  1,
  1 / 2,
  1 / 5,
  1 / 10,
  1 / 20,
  1 / 50,
  1 / 100,
  1 / 200,
  1 / 500,
] as const;

/** The largest scale of ISO 5455, up to a largest one, at which an extent fits in a room of the page. */
export function scaleFor(
  { minX, maxX, minY, maxY }: Box,
  room: Pick<Rect, 'width' | 'height'>,
  most = 5,
): number {
  const fits = SCALES.find(
    (of) => of <= most && (maxX - minX) * of <= room.width && (maxY - minY) * of <= room.height,
  );
  return fits ?? 1 / 1000;
}

/** "1 : 5" */
export function scaleText(scale: number): string {
  return scale >= 1 ? `${scale} : 1` : `1 : ${Math.round(1 / scale)}`;
}

/** Draws a part, y up, on the page, y down. */
export interface View {
  readonly scale: number;
  readonly toPage: (point: Point) => Point;
}

/** A view with the middle of the extent in the middle of a room. */
export function viewOf({ minX, maxX, minY, maxY }: Box, room: Rect, scale: number): View {
  const x0 = room.x + room.width / 2 - (scale * (minX + maxX)) / 2;
  const y0 = room.y + room.height / 2 + (scale * (minY + maxY)) / 2;
  return { scale, toPage: ({ x, y }) => ({ x: x0 + scale * x, y: y0 - scale * y }) };
}
