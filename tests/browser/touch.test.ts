import { type CDPSession, type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApp, type TestApp, type Visit } from './app.ts';
import { sectionPath } from './names.ts';
import { distance, handle, type Place, placeOf } from './sheet.ts';

let app: TestApp;
let visit: Visit;
beforeAll(async () => {
  app = await startApp();
  visit = await app.open({ as: 'designer', touch: true, width: 820, height: 700 });
});
afterAll(async () => {
  await visit.close();
  await app.stop();
});

type Touch = (type: 'touchStart' | 'touchMove' | 'touchEnd', ...fingers: readonly Place[]) => Promise<void>;

/** Fingers on the glass of this page; each call waits until the page has drawn what came of it. */
function touchOn(page: Page, session: CDPSession): Touch {
  return async (type, ...fingers) => {
    const touchPoints = fingers.map(({ x, y }, id) => ({ x, y, id }));
    await session.send('Input.dispatchTouchEvent', { type, touchPoints });
    await page.evaluate(
      () => new Promise((resolve) => requestAnimationFrame(() => requestAnimationFrame(resolve))),
    );
  };
}

async function openSheet(): Promise<{ page: Page; touch: Touch }> {
  const { page } = visit;
  await page.goto(await sectionPath(app, 'Heron winglet'));
  await handle(page, 'nose').waitFor();
  return { page, touch: touchOn(page, await page.context().newCDPSession(page)) };
}

const STEPS = 10;

/** Puts the fingers down and carries each by its own way; `lift` takes them off again. */
async function carry(touch: Touch, fingers: readonly { from: Place; by: Place }[]): Promise<void> {
  await touch('touchStart', ...fingers.map(({ from }) => from));
  for (let step = 1; step <= STEPS; step += 1) {
    const share = step / STEPS;
    await touch(
      'touchMove',
      ...fingers.map(({ from, by }) => ({ x: from.x + share * by.x, y: from.y + share * by.y })),
    );
  }
}

interface Outline extends Place {
  readonly width: number;
  readonly scrolled: number;
}

async function outlineBox(page: Page): Promise<Outline> {
  return page.locator('svg [data-part="outline"]:visible').evaluate((element) => {
    const { x, y, width } = element.getBoundingClientRect();
    return { x, y, width, scrolled: window.scrollY };
  });
}

const scrolled = (page: Page) => page.evaluate(() => window.scrollY);

/** A place on the paper of the first view, away from everything that can be taken. */
async function emptyPaper(page: Page): Promise<Place> {
  const sheet = await page.getByTestId('sheet').boundingBox();
  return { x: (sheet?.x ?? 0) + 330, y: (sheet?.y ?? 0) + 215 };
}

describe('the drawing sheet by touch', () => {
  it('carries a handle straight up under the finger, while the page stays; one undo takes it back', async () => {
    const { page, touch } = await openSheet();
    const mark = handle(page, 'camber');
    const before = await mark.getAttribute('aria-valuetext');
    const from = await placeOf(mark);
    await carry(touch, [{ from, by: { x: 0, y: -50 } }]);
    expect(distance(await placeOf(mark), { x: from.x, y: from.y - 50 })).toBeLessThan(0.5);
    expect(await scrolled(page)).toBe(0);
    await touch('touchEnd');
    expect(await mark.getAttribute('aria-valuetext')).not.toBe(before);
    await page.getByRole('button', { name: 'Undo' }).tap();
    expect(await mark.getAttribute('aria-valuetext')).toBe(before);
  });

  it('zooms about two fingers and moves the paper with them', async () => {
    const { page, touch } = await openSheet();
    const middle = await emptyPaper(page);
    const [left, right] = [
      { x: middle.x - 40, y: middle.y },
      { x: middle.x + 40, y: middle.y },
    ];
    const before = await outlineBox(page);
    await carry(touch, [
      { from: left, by: { x: -40, y: 0 } },
      { from: right, by: { x: 40, y: 0 } },
    ]);
    await touch('touchEnd');
    const zoomed = await outlineBox(page);
    expect(zoomed.width / before.width).toBeCloseTo(2, 2);
    expect(middle.x - zoomed.x).toBeCloseTo(2 * (middle.x - before.x), 0);
    const by = { x: 50, y: -30 };
    await carry(touch, [
      { from: left, by },
      { from: right, by },
    ]);
    await touch('touchEnd');
    const moved = await outlineBox(page);
    expect(distance(moved, { x: zoomed.x + 50, y: zoomed.y - 30 })).toBeLessThan(1);
    expect(moved.width / zoomed.width).toBeCloseTo(1, 3);
  });

  it('changes no value when one of two fingers lands on a handle, the first or the second', async () => {
    const { page, touch } = await openSheet();
    const mark = handle(page, 'camber');
    const value = await mark.getAttribute('aria-valuetext');
    for (const first of [true, false]) {
      await page.getByRole('button', { name: 'Fit' }).tap();
      const on = await placeOf(mark);
      const beside = { x: on.x - 90, y: on.y + 50 };
      const before = await outlineBox(page);
      await touch('touchStart', first ? on : beside);
      await carry(touch, [
        { from: first ? on : beside, by: { x: 10, y: -40 } },
        { from: first ? beside : on, by: { x: -10, y: 40 } },
      ]);
      await touch('touchEnd');
      expect((await outlineBox(page)).width).not.toBeCloseTo(before.width, 0);
      expect(await mark.getAttribute('aria-valuetext')).toBe(value);
      expect(await page.getByRole('button', { name: 'Undo' }).isEnabled()).toBe(false);
    }
  });

  it('lets one finger scroll the page, from empty paper and from beside the sheet', async () => {
    const { page, touch } = await openSheet();
    const sheet = await page.getByTestId('sheet').boundingBox();
    const places = [
      { x: 300, y: (sheet?.y ?? 0) - 60 },
      { x: 60, y: (sheet?.y ?? 0) + 480 },
    ];
    for (const from of places) {
      await page.evaluate(() => {
        window.scrollTo(0, 0);
      });
      const before = await outlineBox(page);
      await carry(touch, [{ from, by: { x: 0, y: -100 } }]);
      await touch('touchEnd');
      const after = await outlineBox(page);
      expect(after.scrolled).toBeGreaterThan(50);
      expect(after.y + after.scrolled).toBeCloseTo(before.y, 0);
    }
  });
});
