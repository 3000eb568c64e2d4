import { AxeBuilder } from '@axe-core/playwright';
import { type Locator, type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type OpenOptions, startApp, type TestApp, type Visit } from './app.ts';
import { sectionPath, sheetIdOf, sheetPath } from './names.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startApp();
});
afterAll(() => app.stop());

interface Screen {
  readonly name: string;
  readonly as: OpenOptions['as'];
  /** A request that is answered by "not found" on this screen. */
  readonly refusal?: RegExp;
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

const at = (path: string | (() => Promise<string>), sign: (page: Page) => Locator) => async (page: Page) => {
  await page.goto(typeof path === 'string' ? path : await path());
  await sign(page).first().waitFor();
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
      await page.goto('/sections');
      await page.getByRole('link', { name: 'Heron outer panel' }).waitFor();
    },
  },
  {
    name: 'new section',
    as: 'designer',
    show: async (page) => {
      await page.goto('/sections');
      await page.getByRole('button', { name: 'New section' }).click();
      await page.getByRole('dialog').waitFor();
    },
  },
  {
    name: 'released sections',
    as: 'technician',
    show: async (page) => {
      await page.goto('/sections');
      await page.getByRole('link', { name: 'Heron outer panel' }).waitFor();
    },
  },
  { name: 'editor, 4-digit with a draft', as: 'designer', show: editor('Heron outer panel') },
  { name: 'editor, free form', as: 'designer', show: editor('Curlew trainer wing') },
  { name: 'version in force', as: 'designer', show: version('Heron outer panel', 3, 'Heron outer panel v3') },
  {
    name: 'version withdrawn',
    as: 'technician',
    // The section itself is out of a technician's reach once nothing of it is in force.
    refusal: /^\/api\/sections\/[^/]+$/,
    show: version('Sedge rudder', 2, 'Sedge rudder v2'),
  },
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
    name: 'comparison',
    as: 'designer',
    show: at(
      async () => {
        const id = (await sectionPath(app, 'Heron outer panel')).split('/').at(-1) ?? '';
        return `/compare?v=${id}.3,${id}.2,${id}.1`;
      },
      (page) => page.getByRole('region', { name: 'Values side by side' }),
    ),
  },
  {
    name: 'desk',
    as: 'designer',
    show: at('/', (page) => page.getByRole('heading', { name: /^Sections changed last/ })),
  },
  {
    name: 'cut sheets',
    as: 'builder',
    show: at('/cut-sheets', (page) => page.getByRole('link', { name: 'Heron outer panel', exact: true })),
  },
  {
    name: 'planner',
    as: 'builder',
    show: at(
      () => sheetPath(app, 'Heron outer panel'),
      (page) => page.getByText('Planform, seen from above'),
    ),
  },
  {
    name: 'planner with findings',
    as: 'designer',
    show: at(
      () => sheetPath(app, 'Bittern wing'),
      (page) => page.getByRole('button', { name: /^Error/ }),
    ),
  },
  {
    name: 'cut sheet in force',
    as: 'technician',
    show: at(
      () => sheetPath(app, 'Heron outer panel', 2),
      (page) => page.getByRole('button', { name: 'Download all.zip' }),
    ),
  },
  {
    name: 'cutting list',
    as: 'technician',
    show: at('/cutting-list', (page) => page.getByRole('button', { name: 'Start' })),
  },
  {
    name: 'measuring',
    as: 'technician',
    show: at(
      async () => `/cutting-list/inspect/${await sheetIdOf(app, 'Heron outer panel')}/2`,
      (page) => page.getByRole('table', { name: 'Readings' }),
    ),
  },
  {
    name: 'inspections',
    as: 'designer',
    show: at('/inspections', (page) =>
      page.getByRole('heading', { name: 'Deviation by section and machine' }),
    ),
  },
  {
    name: 'flight conditions',
    as: 'designer',
    show: at('/flight-conditions', (page) => page.getByRole('heading', { name: 'Flight conditions' })),
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

/** One browser profile for each person: what a screen leaves behind must not trouble the next. */
const visits = new Map<OpenOptions['as'], Promise<Visit>>();
afterAll(async () => {
  for (const visit of visits.values()) await (await visit).close();
});

function visitOf(as: OpenOptions['as']): Promise<Visit> {
  const visit = visits.get(as) ?? app.open(as ? { as } : {});
  visits.set(as, visit);
  return visit;
}

const SIZES = [
  [360, 740],
  [1280, 800],
  [3840, 2160],
] as const;

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
