import { type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApp, type TestApp } from './app.ts';
import { sectionPath } from './names.ts';
import { distance, drag, handle, valueOf } from './sheet.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startApp();
});
afterAll(() => app.stop());

async function openSection(name: string, firstHandle: string) {
  const visit = await app.open({ as: 'designer', width: 1440, height: 900 });
  await visit.page.goto(await sectionPath(app, name));
  await handle(visit.page, firstHandle).waitFor();
  return visit;
}

const sheetTop = (page: Page) =>
  page
    .locator('svg:visible', { has: page.locator('[data-handle]') })
    .evaluate((sheet) => sheet.getBoundingClientRect().y);

describe('the drawing sheet', () => {
  it('moves a free-form surface exactly to the pointer, one undo step a drag', async () => {
    const visit = await openSection('Teal slow-flight wing', 'upper-3');
    const { page } = visit;
    const before = await valueOf(handle(page, 'upper-3'));
    const up = await drag(page, handle(page, 'upper-3'), { x: 0, y: -17 });
    expect(distance(up.mark, up.pointer)).toBeLessThan(0.75);
    expect(up.outline).toBeLessThan(0.75);
    const raised = await valueOf(handle(page, 'upper-3'));
    expect(raised).toBeGreaterThan(before + 0.02);

    const down = await drag(page, handle(page, 'lower-2'), { x: 0, y: 11 });
    expect(down.outline).toBeLessThan(0.75);
    expect(await valueOf(handle(page, 'upper-3'))).toBe(raised);

    await page.keyboard.press('Control+z');
    await page.keyboard.press('Control+z');
    expect(await valueOf(handle(page, 'upper-3'))).toBe(before);
    expect(await page.getByRole('button', { name: 'Undo' }).isDisabled()).toBe(true);
    await page.getByRole('button', { name: 'Redo' }).click();
    expect(await valueOf(handle(page, 'upper-3'))).toBe(raised);
    await visit.close();
  });

  it('takes a drag back on Esc', async () => {
    const visit = await openSection('Marsh 2412', 'thickness-upper');
    const { page } = visit;
    const thickness = handle(page, 'thickness-upper');
    const before = await valueOf(thickness);
    await thickness.hover();
    await page.mouse.down();
    await page.mouse.move(500, 200, { steps: 5 });
    await expect.poll(() => valueOf(thickness)).not.toBe(before);
    await page.keyboard.press('Escape');
    expect(await valueOf(thickness)).toBe(before);
    await page.mouse.up();
    expect(await valueOf(thickness)).toBe(before);
    expect(await page.getByRole('button', { name: 'Undo' }).isDisabled()).toBe(true);
    await visit.close();
  });

  it('stays where it is while values change', async () => {
    const visit = await openSection('Marsh 2412', 'camber');
    const { page } = visit;
    const before = await sheetTop(page);
    await drag(page, handle(page, 'camber'), { x: 45, y: -14 });
    await page.getByText(/kept \d+ s ago/).waitFor();
    expect(await sheetTop(page)).toBe(before);
    await page.keyboard.press('Control+z');
    await visit.close();
  });

  it('keeps the focus and the mark in sight when the keys carry it out of its view', async () => {
    const visit = await openSection('Marsh 2412', 'thickness-upper');
    const { page } = visit;
    const thickness = handle(page, 'thickness-upper');
    const room = await page.getByTestId('sheet').boundingBox();
    const inSight = async () => {
      const box = await thickness.boundingBox();
      return box !== null && room !== null && box.y > room.y && box.y + box.height < room.y + room.height;
    };
    await thickness.focus();
    await page.keyboard.press('End');
    expect(await valueOf(thickness)).toBe(40);
    expect(await inSight()).toBe(true);
    await page.keyboard.press('Control+z');
    for (let i = 0; i < 4; i += 1) await page.getByRole('button', { name: 'Zoom in' }).click();
    await thickness.focus();
    await page.keyboard.press('End');
    await page.keyboard.press('ArrowDown');
    expect(await valueOf(thickness)).toBeCloseTo(39.95, 6);
    expect(await thickness.evaluate((element) => element === document.activeElement)).toBe(true);
    expect(await inSight()).toBe(true);
    await visit.close();
  });

  it('lays another version over, and continues from it as a new version', async () => {
    const visit = await openSection('Tail fin core', 'upper-1');
    const { page } = visit;
    const ghosts = page.locator('[data-part="ghost"]:visible, path[stroke-dasharray]:visible');
    const lines = await ghosts.count();
    await page.getByRole('button', { name: 'overlay version 1' }).click();
    await expect.poll(() => ghosts.count()).toBeGreaterThan(lines);
    await page.getByRole('button', { name: 'overlay version 1', pressed: true }).click();
    await expect.poll(() => ghosts.count()).toBe(lines);

    await page.getByRole('button', { name: 'restore version 2' }).click();
    await page.getByText(/^draft on version 4/).waitFor();
    await page.getByRole('button', { name: 'Save as version 5' }).click();
    await page.getByRole('button', { name: 'Save version 5' }).click();
    await page.getByText('version 5, no unsaved changes').waitFor();
    const versions: { number: number; checksum: string }[] = await app.database
      .knex('section_versions as v')
      .join('sections as s', 's.id', 'v.section_id')
      .where('s.name', 'Tail fin core')
      .orderBy('v.number')
      .select('v.number', 'v.checksum');
    expect(versions).toHaveLength(5);
    expect(versions[4]?.checksum).toBe(versions[1]?.checksum);
    await visit.close();
  });
});

describe('the keyboard alone', () => {
  it('signs in, shapes, saves, releases and opens the files', async () => {
    const visit = await app.open({ width: 1440, height: 900 });
    const { page } = visit;
    const press = async (...keys: string[]) => {
      for (const key of keys) await page.keyboard.press(key);
    };
    /** Tab until the focus is on what is looked for; fails where it cannot be reached. */
    const tabTo = async (label: RegExp, key = 'Tab') => {
      for (let i = 0; i < 80; i += 1) {
        const said = await page.evaluate(() => {
          const element = document.activeElement;
          const labels = element instanceof HTMLInputElement ? [...(element.labels ?? [])] : [];
          return [
            element?.getAttribute('aria-label'),
            ...labels.map((l) => l.textContent),
            element?.textContent,
          ]
            .filter(Boolean)
            .join(' ');
        });
        if (label.test(said)) return;
        await page.keyboard.press(key);
      }
      throw new Error(`The focus does not come to ${String(label)}.`);
    };
    await page.goto('/sign-in');
    await tabTo(/^E-mail/);
    await page.keyboard.type('owner@marrowfen.example');
    await press('Tab');
    await tabTo(/^Password/);
    await page.keyboard.type('marsh-reed-heron-7');
    await press('Enter');
    await page.getByRole('heading', { name: /^Desk of/ }).waitFor();
    await tabTo(/^Sections/);
    await press('Enter');
    await page.getByRole('link', { name: 'Reed tailplane' }).waitFor();
    await tabTo(/^Reed tailplane/);
    await press('Enter');
    await handle(page, 'upper-2').waitFor();
    await tabTo(/^Weight 2 of the upper surface/);
    const before = await valueOf(handle(page, 'upper-2'));
    await press('ArrowUp', 'ArrowUp', 'Shift+ArrowUp');
    expect(await valueOf(handle(page, 'upper-2'))).toBeGreaterThan(before);
    await press('Control+s');
    await page.getByRole('dialog', { name: 'Save as version 3' }).waitFor();
    await page.keyboard.type('By keys alone.');
    await press('Control+Enter');
    await page.getByText('version 3, no unsaved changes').waitFor();
    await tabTo(/^v3/);
    await press('Enter');
    await page.getByRole('heading', { level: 1, name: 'Reed tailplane v3' }).waitFor();
    await tabTo(/^Release…/);
    await press('Enter');
    await page.getByRole('dialog', { name: 'Release version 3' }).waitFor();
    await tabTo(/^Release version 3$/);
    await press('Enter');
    await page.getByText(/^In force: released on/).waitFor();
    await tabTo(/^Export…/);
    await press('Enter');
    await page.getByRole('dialog').waitFor();
    await tabTo(/^Download$/);
    await press('Escape');
    await page.getByRole('dialog').waitFor({ state: 'detached' });
    expect(await page.evaluate(() => document.activeElement?.textContent)).toBe('Export…');
    await visit.close();
  });
});
