import { AxeBuilder } from '@axe-core/playwright';
import { type Locator, type Page } from 'playwright-core';
import { afterAll, describe, expect, it } from 'vitest';
import { type OpenOptions, type TestApp, type Visit } from './app.ts';

export interface Screen {
  readonly name: string;
  readonly as: OpenOptions['as'];
  /** A request that is answered by "not found" on this screen. */
  readonly refusal?: RegExp;
  /** Brings the screen up. */
  readonly show: (page: Page) => Promise<void>;
}

/** Goes to an address and waits for the sign that the screen is there. */
export const at =
  (path: string | (() => Promise<string>), sign: (page: Page) => Locator) => async (page: Page) => {
    await page.goto(typeof path === 'string' ? path : await path());
    await sign(page).first().waitFor();
  };

async function overflow(page: Page): Promise<number> {
  return page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
}

async function violations(page: Page): Promise<string[]> {
  const { violations: found } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
    .analyze();
  return found.flatMap(({ id, nodes }) =>
    nodes.map(({ target, failureSummary }) => `${id} ${target.join(' ')}: ${failureSummary ?? ''}`),
  );
}

const SIZES = [
  [360, 740],
  [1280, 800],
  [3840, 2160],
] as const;

/** Checks each screen by a program for accessibility, by day and by night, and at three widths for what does not fit. */
export function describeScreens(app: () => TestApp, screens: readonly Screen[]): void {
  /** One browser profile for each person: what a screen leaves behind must not trouble the next. */
  const visits = new Map<OpenOptions['as'], Promise<Visit>>();
  afterAll(async () => {
    for (const visit of visits.values()) await (await visit).close();
  });

  function visitOf(as: OpenOptions['as']): Promise<Visit> {
    const visit = visits.get(as) ?? app().open(as ? { as } : {});
    visits.set(as, visit);
    return visit;
  }

  describe.each(screens)('the screen “$name”', ({ as, show, refusal }) => {
    it('has no violations of WCAG 2.2 AA that a program can find, by day and by night, and fits every width', async () => {
      const { page, watch, check } = await visitOf(as);
      if (refusal) watch.expectRefusal('GET', refusal, 404);
      await page.emulateMedia({ colorScheme: 'light' });
      await show(page);
      expect(await violations(page), 'day').toEqual([]);
      await page.emulateMedia({ colorScheme: 'dark' });
      await page.locator('html[data-theme="night"]').waitFor();
      expect(await violations(page), 'night').toEqual([]);
      for (const [width, height] of SIZES) {
        await page.setViewportSize({ width, height });
        // The sheet takes its new size a moment after the window has.
        await expect
          .poll(() => overflow(page), { message: `${String(width)} px`, timeout: 5000 })
          .toBeLessThanOrEqual(0);
      }
      await page.setViewportSize({ width: 1280, height: 800 });
      check();
    });
  });
}
