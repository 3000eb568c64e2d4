import { type Point } from '#geometry/point.ts';
import { type Box, overlaps, within } from './sheet-layout.ts';

/** Distance from the surfaces at which a text inside the section is clear of the wide outline. */
const INSIDE = 3;

/** What stands on the sheet already, while dimensions find their places. */
export class Occupied {
  readonly #area: Box;
  readonly #section: readonly Box[];
  readonly #kept: readonly Box[];
  readonly #texts: Box[] = [];
  readonly #lines: (readonly [Point, Point])[] = [];

  constructor(area: Box, section: readonly Box[], keepClear: readonly Box[]) {
    this.#area = area;
    this.#section = section;
    this.#kept = keepClear;
  }

  /**
   * Can a text stand here? It must be in sight, off all texts, lines and handles, and outside the section or quite
   * inside it.
   */
  isFree(box: Box, gap: number, where: 'outside' | 'inside' = 'outside'): boolean {
    if (!within(box, this.#area)) return false;
    if (this.#texts.some((text) => overlaps(box, text, gap))) return false;
    if (this.#lines.some(([a, b]) => crosses(a, b, box, 2))) return false;
    if (this.#kept.some((kept) => overlaps(box, kept, 1))) return false;
    const strips = this.#section.filter(
      (strip) => strip.x < box.x + box.width && box.x < strip.x + strip.width,
    );
    if (where === 'outside') return !strips.some((strip) => overlaps(box, strip, 2));
    return (
      strips.length > 0 &&
      strips.every(
        (strip) => box.y >= strip.y + INSIDE && box.y + box.height <= strip.y + strip.height - INSIDE,
      )
    );
  }

  crossesText(a: Point, b: Point): boolean {
    return this.#texts.some((text) => crosses(a, b, text, 2));
  }

  /** Is there a level line already within `near` pixels of this height, over the same stretch? */
  onLine(from: number, to: number, y: number, near: number): boolean {
    return this.#lines.some(
      ([a, b]) =>
        Math.abs(a.y - b.y) < 0.5 &&
        Math.abs(a.y - y) < near &&
        Math.min(a.x, b.x) < Math.max(from, to) - 0.5 &&
        Math.max(a.x, b.x) > Math.min(from, to) + 0.5,
    );
  }

  addText(box: Box): void {
    this.#texts.push(box);
  }

  addLine(a: Point, b: Point): void {
    this.#lines.push([a, b]);
  }
}

/** Does the straight line from a to b touch the box grown by `gap`? (Clipping after Liang and Barsky, 1984.) */
export function crosses(a: Point, b: Point, box: Box, gap = 0): boolean {
  const dx = b.x - a.x;
  const dy = b.y - a.y;
  const sides: readonly (readonly [number, number])[] = [
    [-dx, a.x - (box.x - gap)],
    [dx, box.x + box.width + gap - a.x],
    [-dy, a.y - (box.y - gap)],
    [dy, box.y + box.height + gap - a.y],
  ];
  let enters = 0;
  let leaves = 1;
  for (const [direction, distance] of sides) {
    if (direction === 0) {
      if (distance < 0) return false;
    } else {
      const share = distance / direction;
      if (direction < 0) enters = Math.max(enters, share);
      else leaves = Math.min(leaves, share);
    }
  }
  return enters <= leaves;
}
