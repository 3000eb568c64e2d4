import { type Locator, type Page } from 'playwright-core';

/** A handle on the drawing sheet by its name in the code of the shape: `camber`, `thickness-upper`, `upper-3`. */
export function handle(page: Page, id: string): Locator {
  return page.locator(`[data-handle="${id}"]`);
}

export interface Place {
  readonly x: number;
  readonly y: number;
}

/** Where a handle's mark stands on the screen. */
export async function placeOf(mark: Locator): Promise<Place> {
  return mark.evaluate((element) => {
    const matrix = (element as SVGGElement).getScreenCTM();
    return { x: matrix?.e ?? Number.NaN, y: matrix?.f ?? Number.NaN };
  });
}

/** What a drag has done, seen while the button is still held. */
interface Dragged {
  readonly pointer: Place;
  readonly mark: Place;
  /** Distance of the drawn outline from the pointer, pixels. */
  readonly outline: number;
}

/** Takes a handle with the mouse, carries it by so many pixels in steps, looks, and lets go. */
export async function drag(page: Page, mark: Locator, by: Place): Promise<Dragged> {
  const from = await placeOf(mark);
  const to = { x: from.x + by.x, y: from.y + by.y };
  await page.mouse.move(from.x, from.y);
  await page.mouse.down();
  await page.mouse.move(to.x, to.y, { steps: 12 });
  await nextFrame(page);
  const seen = { pointer: to, mark: await placeOf(mark), outline: await distanceFromOutline(page, to) };
  await page.mouse.up();
  return seen;
}

/** Handles move at most once a frame. */
async function nextFrame(page: Page): Promise<void> {
  await page.evaluate(
    () => new Promise((resolve) => requestAnimationFrame(() => requestAnimationFrame(resolve))),
  );
}

/** Distance of two places, pixels. */
export function distance(a: Place, b: Place): number {
  return Math.hypot(a.x - b.x, a.y - b.y);
}

/** The value that a slider handle or field of a slider says, in its own unit. */
export async function valueOf(mark: Locator): Promise<number> {
  return Number(await mark.getAttribute('aria-valuenow'));
}

/** How far the drawn outline is from a place on the screen, in pixels: the nearest of many points along its path. */
async function distanceFromOutline(page: Page, place: Place): Promise<number> {
  return page.locator('svg [data-part="outline"]:visible').evaluate((element, { x, y }) => {
    const path = element as SVGPathElement;
    const matrix = path.getScreenCTM();
    if (!matrix) return Number.NaN;
    const length = path.getTotalLength();
    const count = 8000;
    let nearest = Number.POSITIVE_INFINITY;
    for (let i = 0; i <= count; i += 1) {
      const point = path.getPointAtLength((i / count) * length).matrixTransform(matrix);
      nearest = Math.min(nearest, Math.hypot(point.x - x, point.y - y));
    }
    return nearest;
  }, place);
}

/** Waits until the unsaved work is kept on the server. */
export async function waitUntilKept(page: Page): Promise<void> {
  await page.getByText(/kept \d+ s ago/).waitFor();
}
