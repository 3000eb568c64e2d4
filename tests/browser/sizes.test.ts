import { type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApp, type TestApp, type Visit } from './app.ts';
import { sectionPath } from './names.ts';
import { distance, drag, handle } from './sheet.ts';

let app: TestApp;
let visit: Visit;
beforeAll(async () => {
  app = await startApp();
  visit = await app.open({ as: 'designer' });
});
afterAll(async () => {
  await visit.close();
  await app.stop();
});

async function openAt(width: number, height: number): Promise<Page> {
  const { page } = visit;
  await page.setViewportSize({ width, height });
  await page.goto(await sectionPath(app, 'Heron winglet'));
  await handle(page, 'nose').waitFor();
  return page;
}

/** Heights in CSS pixels of what is read and taken: a dimension, a mark, a button. */
async function heights(page: Page): Promise<number[]> {
  const places = ['[data-dimension="chordMm"]', '[data-handle="camber"]', 'button:has-text("Export…")'];
  const boxes = await Promise.all(places.map((place) => page.locator(place).first().boundingBox()));
  return boxes.map((box) => box?.height ?? Number.NaN);
}

describe('the editor on a very large screen', () => {
  it('draws text, marks and buttons larger, all alike', async () => {
    const usual = await heights(await openAt(1440, 900));
    const large = await heights(await openAt(3840, 2160));
    for (const [i, height] of large.entries()) {
      expect(height / (usual[i] ?? Number.NaN)).toBeCloseTo(1.5625, 1);
    }
  });

  it('keeps a handle under the pointer, the wheel about it and a typed dimension at its place', async () => {
    const page = await openAt(3840, 2160);
    const { mark, pointer } = await drag(page, handle(page, 'camber'), { x: 90, y: -60 });
    expect(distance(mark, pointer)).toBeLessThan(0.5);
    await page.mouse.move(pointer.x, pointer.y);
    await page.mouse.wheel(0, -400);
    await page.waitForFunction(() => document.querySelector('output')?.textContent !== '100 %');
    const zoomed = await handle(page, 'camber').boundingBox();
    const middle = {
      x: (zoomed?.x ?? 0) + (zoomed?.width ?? 0) / 2,
      y: (zoomed?.y ?? 0) + (zoomed?.height ?? 0) / 2,
    };
    expect(distance(middle, pointer)).toBeLessThan(1);
    await page.getByRole('button', { name: 'Fit' }).click();
    await page.waitForFunction(() => document.querySelector('output')?.textContent === '100 %');
    const chord = page.locator('[data-dimension="chordMm"]');
    const shown = await chord.boundingBox();
    await chord.click();
    const field = await page.getByRole('textbox', { name: 'Chord' }).first().boundingBox();
    expect((field?.y ?? 0) + (field?.height ?? 0) / 2).toBeCloseTo(
      (shown?.y ?? 0) + (shown?.height ?? 0) / 2,
      -1,
    );
    await page.keyboard.press('Escape');
  });
});

describe('the editor while its section is fetched', () => {
  it.each([
    [360, 740],
    [1280, 800],
  ])('has the sheet where it will be, at %i px', async (width, height) => {
    const { page } = visit;
    await page.setViewportSize({ width, height });
    await page.goto('/sections');
    let answer = (): void => undefined;
    const asked = new Promise<void>((resolve) => {
      answer = resolve;
    });
    const path = await sectionPath(app, 'Heron winglet');
    await page.route(`**/api${path}`, async (route) => {
      await asked;
      await route.continue();
    });
    await page.goto(path);
    const place = (part: string) =>
      page
        .locator(part)
        .first()
        .evaluate((element) => element.getBoundingClientRect().y);
    await page.getByRole('status', { name: 'Loading the section' }).waitFor();
    const before = await place('[data-place="sheet"]');
    answer();
    await handle(page, 'nose').waitFor();
    expect(await place('[data-place="sheet"]')).toBeCloseTo(before, 0);
    await page.unrouteAll({ behavior: 'wait' });
  });
});

describe('paper', () => {
  it('is one sheet, from the editor and of a version that is not in force', async () => {
    const { page } = visit;
    for (const path of [
      await sectionPath(app, 'Heron winglet'),
      await sectionPath(app, 'Heron outer panel', 1),
    ]) {
      await page.goto(path);
      await page.getByRole('heading', { level: 1 }).waitFor();
      await page.locator('[data-part="outline"]:visible').waitFor();
      const pdf = await page.pdf({ preferCSSPageSize: true, landscape: true });
      expect(pdf.toString('latin1').match(/\/Type\s*\/Page\b/g)).toHaveLength(1);
    }
    await page.emulateMedia({ media: 'print' });
    await page.getByText(/As superseded: do not cut from it/).waitFor();
    await page.emulateMedia({ media: null });
  });
});

describe('the editor on a narrow screen', () => {
  it('has its sheet on the first screen, and the choices of the sheet behind one button that moves nothing', async () => {
    const page = await openAt(360, 740);
    const sheet = page.getByTestId('sheet');
    const before = await sheet.boundingBox();
    expect(before?.y).toBeLessThan(240);
    const button = page.getByRole('button', { name: 'Sheet shows…' });
    await button.click();
    await page.getByRole('radio', { name: '4×' }).check();
    expect(await sheet.boundingBox()).toEqual(before);
    await page.getByText('Thickness drawn 4 times too large.').filter({ visible: true }).waitFor();
    await page.keyboard.press('Escape');
    expect(await page.getByRole('radio', { name: '4×' }).count()).toBe(0);
    expect(await button.evaluate((element) => element === document.activeElement)).toBe(true);
    await button.click();
    await page.getByRole('radio', { name: '1×' }).check();
  });
});
