import { AxeBuilder } from '@axe-core/playwright';
import { type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApp, type TestApp } from './app.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startApp();
});
afterAll(() => app.stop());

const kerfText = 'Kerf of Reed bench in XPS 32, blue:';

async function violations(page: Page): Promise<string[]> {
  const { violations: found } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
    .analyze();
  return found.flatMap(({ id, nodes }) =>
    nodes.map(({ target, failureSummary }) => `${id} ${target.join(' ')}: ${failureSummary ?? ''}`),
  );
}

/** By day and by night, and in the narrowest window. */
async function checkAppearance(page: Page): Promise<void> {
  for (const [scheme, theme] of [
    ['light', 'day'],
    ['dark', 'night'],
  ] as const) {
    await page.emulateMedia({ colorScheme: scheme });
    await page.locator(`html[data-theme="${theme}"]`).waitFor();
    expect(await violations(page), theme).toEqual([]);
  }
  for (const width of [360, 1280, 3840]) {
    await page.setViewportSize({ width, height: 800 });
    const over = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    );
    expect(over, `${String(width)} px`).toBeLessThanOrEqual(0);
  }
  await page.setViewportSize({ width: 1280, height: 800 });
}

describe('the shop', () => {
  it('is kept by a builder: a machine and a measured kerf', async () => {
    const visit = await app.open({ as: 'builder' });
    const { page } = visit;
    await page.getByRole('navigation', { name: 'Main' }).getByRole('link', { name: 'Shop' }).click();
    await page.getByRole('link', { name: 'Long bench', exact: true }).waitFor();
    await checkAppearance(page);

    await page.getByRole('button', { name: 'New machine' }).click();
    await page.getByLabel('Name').fill('Reed bench');
    await page.getByLabel('Between the towers').fill('1.2 m');
    await page.getByLabel('Right tower, chord').selectOption('X');
    await page.getByRole('button', { name: 'Make the machine' }).click();
    await page.getByText('Each axis needs a letter of its own.').waitFor();
    await page.getByLabel('Right tower, chord').selectOption('A');
    await page.getByRole('button', { name: 'Make the machine' }).click();
    await page.getByRole('heading', { name: 'Reed bench' }).waitFor();
    await page.getByRole('link', { name: 'Reed bench', exact: true }).waitFor();
    expect(await page.getByLabel('Between the towers').inputValue()).toBe('1200.0 mm');
    await checkAppearance(page);

    await page.getByRole('link', { name: `${kerfText} none yet` }).click();
    const kerf = page.getByRole('textbox', { name: 'Kerf' });
    await kerf.fill('0.94');
    expect(await page.getByLabel('At a wire speed of').inputValue()).toBe('200 mm/min');
    await page.getByLabel('Measured on').fill('2026-02-03');
    await checkAppearance(page);
    await page.getByRole('button', { name: 'Save the kerf' }).click();
    await page.getByText('Saved.').waitFor();
    await page.getByRole('link', { name: `${kerfText} 0.94 mm` }).waitFor();

    const stored: unknown = await app.database
      .knex('kerfs as k')
      .join('machines as m', 'm.id', 'k.machine_id')
      .join('people as p', 'p.id', 'k.person_id')
      .where('m.name', 'Reed bench')
      .first('k.kerf_mm', 'k.speed_mm_min', 'k.is_default', 'p.role');
    expect(stored).toEqual({ kerf_mm: 0.94, speed_mm_min: 200, is_default: 0, role: 'builder' });
    await visit.close();
  });

  it.each(['designer', 'technician'] as const)('is for a %s to read, and not to change', async (as) => {
    const visit = await app.open({ as });
    const { page } = visit;
    await page.goto('/shop');
    const row = page.getByRole('row', { name: 'Reed bench' });
    await row.getByText('0.94 mm').waitFor();
    expect(await row.getByText(/● measured/).textContent()).toMatch(/3 Feb/);
    expect(await page.getByRole('link', { name: /^Kerf of/ }).count()).toBe(0);
    expect(await page.getByRole('button', { name: /^New/ }).count()).toBe(0);
    await page.getByRole('link', { name: 'Reed bench', exact: true }).click();
    const facts = page.getByRole('region', { name: 'Reed bench' });
    await facts.getByText('1200.0 mm').waitFor();
    expect(await facts.getByRole('textbox').count()).toBe(0);
    await checkAppearance(page);
    await visit.close();
  });

  it('tells the second of two people what the first has changed, and loses nothing', async () => {
    const first = await app.open({ as: 'builder' });
    const second = await app.open({ as: 'owner' });
    for (const { page } of [first, second]) {
      await page.goto('/shop');
      await page.getByRole('link', { name: 'Short bench', exact: true }).click();
      await page.getByLabel('Largest feed').waitFor();
    }
    second.watch.expectRefusal('PATCH', /^\/api\/machines\//, 409);
    await first.page.getByLabel('Largest feed').fill('900');
    await first.page.getByRole('button', { name: 'Save', exact: true }).click();
    await first.page.getByText('Saved.').waitFor();
    await second.page.getByLabel('Travel in height').fill('280');
    await second.page.getByRole('button', { name: 'Save', exact: true }).click();
    await second.page.getByText('Tobin Sedgley changed this in between').waitFor();
    await second.page.getByText('Largest feed: 900 mm/min').waitFor();
    expect(await second.page.getByLabel('Travel in height').inputValue()).toBe('280');
    await checkAppearance(second.page);
    await second.page.getByRole('button', { name: 'Take what is there' }).click();
    expect(await second.page.getByLabel('Largest feed').inputValue()).toBe('900 mm/min');
    await first.close();
    await second.close();
  });
});
