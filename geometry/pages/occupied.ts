import { type Rect } from './page.ts';

/** Do two boxes overlap, with a gap kept between them? */
export function overlaps(a: Rect, b: Rect, gap = 0): boolean {
  return (
    a.x < b.x + b.width + gap &&
    b.x < a.x + a.width + gap &&
    a.y < b.y + b.height + gap &&
    b.y < a.y + a.height + gap
  );
}

/** Does a box lie within another? */
export function isWithin(inner: Rect, outer: Rect): boolean {
  return (
    inner.x >= outer.x - 1e-9 &&
    inner.y >= outer.y - 1e-9 &&
    inner.x + inner.width <= outer.x + outer.width + 1e-9 &&
    inner.y + inner.height <= outer.y + outer.height + 1e-9
  );
}

/** The boxes that are taken already, so that later texts find a free place. */
export interface Occupied {
  isFree(box: Rect, gap?: number): boolean;
  take(box: Rect): void;
}

/** An empty room. */
export function occupied(): Occupied {
  const taken: Rect[] = [];
  return {
    isFree: (box, gap = 0.4) => !taken.some((of) => overlaps(of, box, gap)),
    take: (box) => taken.push(box),
  };
}
