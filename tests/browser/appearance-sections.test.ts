import { type Page } from 'playwright-core';
import { afterAll, beforeAll } from 'vitest';
import { at, describeScreens, type Screen } from './appearance.ts';
import { startApp, type TestApp } from './app.ts';
import { sectionPath } from './names.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startApp();
});
afterAll(() => app.stop());

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

describeScreens(() => app, screens);
