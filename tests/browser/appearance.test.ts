import { AxeBuilder } from '@axe-core/playwright';
import { type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type OpenOptions, startApp, type TestApp, type Visit } from './app.ts';
import { sectionPath } from './names.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startApp();
});
afterAll(() => app.stop());

interface Screen {
  readonly name: string;
  readonly as: OpenOptions['as'];
  /** Brings the screen up. */
  readonly show: (page: Page) => Promise<void>;
}

const version = (name: string, number: number, heading: string) => async (page: Page) => {
  await page.goto(await sectionPath(app, name, number));
  await page.getByRole('heading', { level: 1, name: heading }).waitFor();
};
const editor = (name: string) => async (page: Page) => {
  await page.goto(await sectionPath(app, name));
  await page.locator('[data-handle="nose"]').waitFor();
  await page.getByRole('button', { name: /^v1/ }).waitFor();
};

const screens: readonly Screen[] = [
  {
    name: 'sign-in',
    as: undefined,
    show: async (page) => {
      await page.goto('/sign-in');
      await page.getByLabel('E-mail').waitFor();
    },
  },
  {
    name: 'library',
    as: 'designer',
    show: async (page) => {
      await page.getByRole('link', { name: 'Heron outer panel' }).waitFor();
    },
  },
  {
    name: 'new section',
    as: 'designer',
    show: async (page) => {
      await page.getByRole('button', { name: 'New section' }).click();
      await page.getByRole('dialog').waitFor();
    },
  },
  {
    name: 'released sections',
    as: 'technician',
    show: async (page) => {
      await page.getByRole('link', { name: 'Heron outer panel' }).waitFor();
    },
  },
  { name: 'editor, 4-digit with a draft', as: 'designer', show: editor('Heron outer panel') },
  { name: 'editor, free form', as: 'designer', show: editor('Curlew trainer wing') },
  { name: 'version in force', as: 'designer', show: version('Heron outer panel', 3, 'Heron outer panel v3') },
  { name: 'version withdrawn', as: 'technician', show: version('Sedge rudder', 1, 'Sedge rudder v1') },
  {
    name: 'export',
    as: 'technician',
    show: async (page) => {
      await version('Heron outer panel', 3, 'Heron outer panel v3')(page);
      await page.getByRole('button', { name: 'Export…' }).click();
      await page.getByRole('dialog').waitFor();
    },
  },
  {
    name: 'release',
    as: 'owner',
    show: async (page) => {
      await version('Teal slow-flight wing', 2, 'Teal slow-flight wing v2')(page);
      await page.getByRole('button', { name: 'Release…' }).click();
      await page.getByRole('dialog').waitFor();
    },
  },
  {
    name: 'account',
    as: 'builder',
    show: async (page) => {
      await page.goto('/account');
      await page.getByRole('heading', { level: 1 }).waitFor();
    },
  },
  {
    name: 'no such address',
    as: 'builder',
    show: async (page) => {
      await page.goto('/no/such/place');
      await page.getByRole('heading', { level: 1 }).waitFor();
    },
  },
];

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

describe.each(screens)('the screen “$name”', ({ as, show }) => {
  it.each(['light', 'dark'] as const)(
    'has no violations of WCAG 2.2 AA that a program can find, %s',
    async (theme) => {
      const visit: Visit = await app.open({ theme, ...(as ? { as } : {}) });
      await show(visit.page);
      expect(await violations(visit.page)).toEqual([]);
      await visit.close();
    },
  );

  it('fits 360 px, 1280 px and 3840 px without scrolling sideways', async () => {
    const visit = await app.open({ width: 360, height: 740, touch: true, ...(as ? { as } : {}) });
    await show(visit.page);
    for (const [width, height] of [
      [360, 740],
      [1280, 800],
      [3840, 2160],
    ] as const) {
      await visit.page.setViewportSize({ width, height });
      expect(await overflow(visit.page), `${String(width)} px`).toBeLessThanOrEqual(0);
    }
    await visit.close();
  });
});
